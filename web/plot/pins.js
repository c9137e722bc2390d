// Pins: points of lines whose readings the reader keeps in sight. A pin remembers
// what its point is, not where it stood: on a moving line its height, on any other
// its x. So it comes back after an edit, and travels with the slider.
import { reading, withUnit } from "./scale.js";

const told = 3; // significant digits in a sentence

// coordinate is 1 where a line's points are known by their y, else 0.
const coordinate = (line) => (line.moving ? 1 : 0);
const axisOf = (line, picture) => (line.moving ? picture.y : picture.x);

// pinned is a new pin at a point of a line as the picture gives it.
export function pinned(line, index, picture) {
  return { line: line.id, index, along: line.data[index][coordinate(line)], unit: axisOf(line, picture).unit };
}

// found is a pin in a picture drawn anew; one whose line is away waits for it. After a
// change of units the point is the same one, told otherwise.
export function found(pin, picture) {
  const line = picture.lines.find((l) => l.id === pin.line && l.readings);
  if (!line || line.data.length === 0) return pin;
  if (axisOf(line, picture).unit !== pin.unit) return pinned(line, Math.min(pin.index, line.data.length - 1), picture);
  const k = coordinate(line);
  const off = (i) => (line.data[i] ? Math.abs(line.data[i][k] - pin.along) : Infinity);
  let index = Math.min(pin.index, line.data.length - 1);
  for (let i = 0; i < line.data.length; i++) if (off(i) < off(index)) index = i;
  return { ...pin, index };
}

// pinMarks are the pins that are in the picture now, as marks.
export function pinMarks(pins, lay, picture) {
  return pins.flatMap((pin) => {
    const course = lay.courses.find((c) => c.line.id === pin.line && c.shown);
    const at = course && pin.index < course.line.own && course.line.data[pin.index];
    if (!at) return [];
    return [{ label: name(course.line, at[coordinate(course.line)], picture), x: at[0], y: at[1], pin: true, moving: Boolean(course.line.moving) }];
  });
}

// pinText is a pin as a sentence: "Sw 0.52, fw 71.2 %: speed 1.31; arrives after 0.76 PV".
export function pinText(pin, lay, picture) {
  const course = lay.courses.find((c) => c.line.id === pin.line && c.shown);
  const origin = course && (course.line.origin ?? course.line);
  if (!origin?.readings || !origin.data[pin.index]) return "";
  const k = coordinate(origin), other = k === 1 ? picture.x : picture.y;
  const place = [name(origin, origin.data[pin.index][k], picture)];
  const now = pin.index < course.line.own && course.line.data[pin.index];
  if (now) place.push(withUnit(`${other.short} ${reading(now[1 - k], told)}`, other.unit));
  const several = lay.courses.filter((c) => c.line.readings).length > 1;
  return `${several ? `${origin.label}, ` : ""}${place.join(", ")}: ${details(origin, pin.index, told).map((d) => `${within(d.label)}${d.word ? ":" : ""} ${d.text}`).join("; ")}`;
}

// within is a label in the middle of a sentence; a symbol stays as it is.
const within = (label) => (/^\p{Lu}\p{Ll}*[ ,]|^\p{Lu}\p{Ll}{2,}$/u.test(label) ? label[0].toLowerCase() + label.slice(1) : label);

const name = (line, along, picture) => withUnit(`${axisOf(line, picture).short} ${reading(along, told)}`, axisOf(line, picture).unit);

// details are the readings of a point: its value, or a word where it has none.
export function details(line, index, digits) {
  return line.readings.map((r) => {
    const word = r.words?.[index];
    return { label: r.label, word: Boolean(word), text: word || withUnit(reading(r.values[index], digits), r.unit) };
  });
}

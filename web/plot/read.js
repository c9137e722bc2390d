// Reading values off a picture: every shown series at one x.
import { reading, withUnit } from "./scale.js";

const reach = 7; // dots within which a marker counts as read
const most = 3; // crossings of one line that are told

// readings lists {line, text} of all that is shown at a dot across.
export function readings(lay, dotX, picture) {
  const list = [];
  for (const { line, shown, dots, low } of lay.courses) {
    if (!shown) continue;
    const upper = line.kind === "points" ? nearest(dots, dotX) : crossings(dots, dotX);
    if (upper.length === 0) continue;
    const told = (ys) => [...new Set(ys.map((y) => reading(lay.y.value(y))))].slice(0, most).join(" and ");
    const text = low ? `${told(crossings(low, dotX))} to ${told(upper)}` : told(upper);
    list.push({ line, text: withUnit(text, picture.y.unit) });
  }
  return list;
}

// heading names the place: "Sw = 0.412".
export function heading(lay, dotX, picture) {
  return withUnit(`${picture.x.short} = ${reading(lay.x.value(dotX))}`, picture.x.unit);
}

// crossings are the heights at which a course passes a place; a straight drop
// at that very place counts with both its ends.
function crossings(dots, x) {
  const list = [];
  for (let i = 1; i < dots.length; i++) {
    const a = dots[i - 1], b = dots[i];
    if (!a || !b || !Number.isFinite(a[1]) || !Number.isFinite(b[1])) continue;
    if ((a[0] - x) * (b[0] - x) > 0) continue;
    if (a[0] === b[0]) list.push(a[1], b[1]);
    else list.push(a[1] + ((b[1] - a[1]) * (x - a[0])) / (b[0] - a[0]));
  }
  return list;
}

function nearest(dots, x) {
  const seen = dots.filter((d) => d && Number.isFinite(d[1]) && Math.abs(d[0] - x) <= reach);
  seen.sort((a, b) => Math.abs(a[0] - x) - Math.abs(b[0] - x));
  return seen.slice(0, 1).map((d) => d[1]);
}

// spotAt is the point nearest to a dot among the lines that have further readings:
// {line, index, x, y}, null where there is none. The place across counts first.
export function spotAt(lay, x, y) {
  let best = null;
  for (const { line, shown, dots } of lay.courses) {
    if (!shown || !line.readings) continue;
    const own = dots.slice(0, line.own).map((d, index) => ({ line, index, d })).filter(({ d }) => d && Number.isFinite(d[0] + d[1]));
    const across = own.reduce((least, { d }) => Math.min(least, Math.abs(d[0] - x)), Infinity);
    for (const { index, d } of own) {
      if (Math.abs(d[0] - x) > across + 1) continue;
      const off = Math.hypot(d[0] - x, d[1] - y);
      if (best === null || off < best.off) best = { line, index, x: d[0], y: d[1], off };
    }
  }
  return best;
}

// stepped is the point some dots further along a spot's line, at least the next one.
export function stepped(lay, spot, direction, dotsOn) {
  const { line, dots } = lay.courses.find((c) => c.line.id === spot.line.id);
  let index = spot.index, gone = 0, last = dots[index];
  for (let i = index + direction; i >= 0 && i < line.own && gone < dotsOn; i += direction) {
    if (!dots[i] || !Number.isFinite(dots[i][0] + dots[i][1])) continue;
    gone += Math.hypot(dots[i][0] - last[0], dots[i][1] - last[1]);
    last = dots[i];
    index = i;
  }
  return { line, index, x: last[0], y: last[1] };
}

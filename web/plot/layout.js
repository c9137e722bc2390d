// Layout: where everything of a picture stands, in dots, before anything is drawn.
import { extent, linear, log, ticks } from "./scale.js";

const size = 12; // dots, of all text
let pen;

// width of a text in dots.
export function textWidth(text, family) {
  pen ??= document.createElement("canvas").getContext("2d");
  pen.font = `${size}px ${family}`;
  return pen.measureText(text).width;
}

export const lineHeight = 16;

// layout finds the frame, both axes and each line's course in a picture that stands
// still. state: {logX, logY, view, hidden}; view is null or {x: [lo, hi], y: [lo,
// hi]} in scale coordinates.
export function layout(picture, state, width, height, family) {
  const shown = picture.lines.filter((l) => !state.hidden.has(l.id));
  const scaleX = state.logX ? log : linear, scaleY = state.logY ? log : linear;
  const whole = wholeView(picture, scaleX, scaleY);
  const view = state.view ?? whole;
  const measure = (text) => textWidth(text, family);

  const yTitle = wrap(picture.y.title, width - 8, measure);
  const top = yTitle.length * lineHeight + 12;
  const bottom = 2 * lineHeight + 12;
  const yTicks = ticks(view.y, Math.max(2, Math.round((height - top - bottom) / 48)), scaleY);
  const left = Math.ceil(yTicks.reduce((w, t) => Math.max(w, measure(t.text)), 8)) + 12;
  const upright = axis(view.y, scaleY, height - bottom, top, yTicks);
  const lead = 10; // before a label at the end of a line
  const ends = freeEnds(shown, view.x, scaleX, upright).filter((l) => measure(l.label) < (width < 480 ? 0.16 : 0.28) * width);
  const margin = ends.reduce((w, l) => Math.max(w, measure(l.label) + lead + 6), 0);
  const rect = { left, top, right: width - Math.max(margin, 14), bottom: height - bottom };
  let xTicks = [];
  const frame = () => {
    if (picture.map) toScale(rect, view);
    xTicks = fitting(view.x, scaleX, rect.right - rect.left, measure);
  };
  frame();
  // The last tick's text needs room when it stands under the end of the axis.
  const over = xTicks.reduce((most, t) => Math.max(most, axis(view.x, scaleX, rect.left, rect.right, []).dot(t.at) + measure(t.text) / 2 + 2), 0) - width;
  if (over > 0) {
    rect.right -= Math.ceil(over);
    frame();
  }

  const x = axis(view.x, scaleX, rect.left, rect.right, xTicks);
  const y = axis(view.y, scaleY, rect.bottom, top, yTicks);
  const courses = picture.lines.map((l) => course(l, !state.hidden.has(l.id), x, y));
  return {
    width, height, rect, x, y, map: picture.map, whole, view, courses, yTitle, lead, measure, size, family,
    endLabels: new Set(margin > 0 ? ends.map((l) => l.id) : []),
  };
}

// course is where a line runs, in dots.
export function course(line, shown, x, y) {
  const dots = (points) => points.map((p) => p && [x.dot(p[0]), y.dot(p[1])]);
  return { line, shown, dots: dots(line.data), low: line.low && dots(line.low) };
}

// toScale narrows a frame until both axes have the same scale.
function toScale(rect, { x, y }) {
  const dots = Math.min((rect.right - rect.left) / (x[1] - x[0]), (rect.bottom - rect.top) / (y[1] - y[0]));
  rect.right = rect.left + dots * (x[1] - x[0]);
  rect.bottom = rect.top + dots * (y[1] - y[0]);
}

function wholeView(picture, scaleX, scaleY) {
  const all = (i) => [
    ...picture.lines.flatMap((l) => [...l.data, ...(i === 1 && l.origin ? l.origin.data : []), ...(l.low ?? [])].filter(Boolean).map((p) => p[i])),
    ...picture.marks.map((m) => (i === 0 ? m.x : m.y)),
  ];
  return { x: extent(picture.x, all(0), scaleX), y: extent(picture.y, all(1), scaleY) };
}

function axis([lo, hi], scale, from, to, marks) {
  const dot = (v) => from + ((scale.to(v) - lo) / (hi - lo)) * (to - from);
  const value = (d) => scale.from(lo + ((d - from) / (to - from)) * (hi - lo));
  const place = (d) => lo + ((d - from) / (to - from)) * (hi - lo);
  return { lo, hi, scale, ticks: marks, dot, value, place };
}

// fitting are as many ticks as stand beside each other without touching.
function fitting(view, scale, width, measure) {
  for (let count = Math.max(2, Math.round(width / 80)); ; count--) {
    const marks = ticks(view, count, scale);
    const widest = marks.reduce((w, t) => Math.max(w, measure(t.text)), 0);
    if (count <= 1 || (widest + 14) * (marks.length - 1) <= width) return marks;
  }
}

// freeEnds are the lines that reach the right edge where no other line ends. A moving
// line's end would come and go, and the frame with it.
function freeEnds(lines, [lo, hi], scale, y) {
  const ends = [];
  for (const line of lines) {
    if (line.kind === "band" || line.kind === "points" || line.moving) continue;
    const last = line.data.findLast(Boolean);
    if (!last || Math.abs(scale.to(last[0]) - hi) > 0.02 * (hi - lo)) continue;
    const place = y.scale.to(last[1]);
    if (place >= y.lo && place <= y.hi) ends.push({ line, dot: y.dot(last[1]) });
  }
  const alone = (e) => ends.every((o) => o === e || Math.abs(o.dot - e.dot) >= lineHeight);
  return ends.filter(alone).map((e) => e.line);
}

// wrap breaks a title into lines of at most width dots, between words.
export function wrap(text, width, measure) {
  const rows = [];
  for (const word of text.split(" ")) {
    const longer = rows.length ? `${rows.at(-1)} ${word}` : word;
    if (rows.length && measure(longer) <= width) rows[rows.length - 1] = longer;
    else rows.push(word);
  }
  return rows;
}

// Labels stand on the picture beside what they name. Places are tried one after
// another, and each label takes the best that is left: at the end of its line
// where that end is alone, else beside the line where it is farthest from all
// others. What finds no free place is left to the buttons under the picture.
import { lineHeight } from "./layout.js";

const spacing = 6; // dots between samples of a line
const every = 3; // samples between places tried
const gap = 5; // between a line and its label
const clear = 30; // farther from other lines than this is no better

// placeLabels returns [{text, line?, x, y, w}] with x, y the upper left corner.
export function placeLabels(lay, marks) {
  const drawn = lay.courses.filter((c) => c.shown && c.line.kind !== "band");
  const samples = drawn.flatMap((c) => sample(c, lay.rect).map(([x, y]) => ({ x, y, of: c.line })));
  const placed = [];
  for (const m of marks) {
    const dot = { x: lay.x.dot(m.x), y: lay.y.dot(m.y) };
    if (!inside(dot, lay.rect)) continue;
    take(m.label, null, [...beside(dot, 8), ...beside(dot, 18, 8), ...beside(dot, 34, 16), ...over(dot, 8, 6)], false);
  }
  // Free ends of lines are the clearest places: they are given away first.
  for (const c of drawn.filter((c) => lay.endLabels.has(c.line.id))) {
    const y = c.dots.findLast(Boolean)[1] - lineHeight / 2;
    placed.push({ x: lay.rect.right + lay.lead, y, w: lay.measure(c.line.label), h: lineHeight, text: c.line.label, line: c.line.id });
  }
  for (const c of drawn) {
    if (lay.endLabels.has(c.line.id)) continue;
    const own = samples.filter((s) => s.of === c.line);
    const tried = own.filter((_, i) => i % every === 0);
    take(c.line.label, c.line, tried.flatMap((s) => beside(s, gap)), c.line.kind === "points");
  }
  return placed;

  function take(text, line, anchors, optional) {
    const w = lay.measure(text), h = lineHeight;
    const right = line ? lay.rect.right : lay.width - 2; // a mark's words may use the margin
    const far = line ? clear : clear / 2;
    let best = null;
    for (const a of anchors) {
      const box = { x: a.x - (a.leftwards ? w : a.centred ? w / 2 : 0), y: a.y - (a.upwards ? h : 0), w, h };
      if (box.x < lay.rect.left + 2 || box.x + w > right || box.y < lay.rect.top - 12 || box.y + h > lay.rect.bottom) continue;
      if (placed.some((p) => touches(box, p))) continue;
      let crossed = 0, nearest = far;
      for (const s of samples) {
        if (s.x < box.x - clear || s.x > box.x + w + clear || s.y < box.y - clear || s.y > box.y + h + clear) continue;
        const d = distance(s, box);
        if (d < 2) crossed++;
        else if (s.of !== line) nearest = Math.min(nearest, d);
      }
      const score = nearest - 12 * crossed - a.cost;
      if (best === null || score > best.score) best = { score, box, crossed };
    }
    if (best && (best.crossed === 0 || !optional)) placed.push({ ...best.box, text, line: line?.id });
  }
}

// beside are four places around a dot; cost is how much less they are worth.
function beside({ x, y }, d, cost = 0) {
  return [
    { x: x + d, y: y - d / 2, upwards: true, cost }, { x: x + d, y: y + d / 2, cost },
    { x: x - d, y: y - d / 2, leftwards: true, upwards: true, cost }, { x: x - d, y: y + d / 2, leftwards: true, cost },
  ];
}

// sample walks along what is seen of a course.
function sample({ line, dots }, rect) {
  if (line.kind === "points") return dots.filter((d) => d && inside({ x: d[0], y: d[1] }, rect));
  const list = [];
  for (let i = 1; i < dots.length; i++) {
    const a = dots[i - 1], b = dots[i];
    if (!a || !b) continue;
    const n = Math.max(1, Math.ceil(Math.min(4000, Math.hypot(b[0] - a[0], b[1] - a[1])) / spacing));
    for (let k = 0; k < n; k++) {
      const x = a[0] + ((b[0] - a[0]) * k) / n, y = a[1] + ((b[1] - a[1]) * k) / n;
      const last = list.at(-1);
      if (inside({ x, y }, rect) && !(last && Math.hypot(x - last[0], y - last[1]) < spacing)) list.push([x, y]);
    }
  }
  return list;
}

// over are the places right above and below a dot.
const over = ({ x, y }, d, cost) => [{ x, y: y - d, upwards: true, centred: true, cost }, { x, y: y + d, centred: true, cost }];

const inside = ({ x, y }, r) => x >= r.left && x <= r.right && y >= r.top && y <= r.bottom;
const touches = (a, b) => a.x < b.x + b.w + 6 && b.x < a.x + a.w + 6 && a.y < b.y + b.h && b.y < a.y + a.h;

function distance({ x, y }, b) {
  const dx = Math.max(b.x - x, 0, x - b.x - b.w), dy = Math.max(b.y - y, 0, y - b.y - b.h);
  return Math.sqrt(dx * dx + dy * dy);
}

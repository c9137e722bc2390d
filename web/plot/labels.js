// Labels stand on the picture beside what they name. Places are tried one after
// another, and each label takes the best that is left: at the end of its line
// where that end is alone, else beside the line where it is farthest from all
// others. What finds no free place is left to the buttons under the picture.
import { lineHeight } from "./layout.js";

const spacing = 6; // dots between samples of a line
const tries = 30; // places tried along a line
const gap = 5; // between a line and its label
const clear = 30; // farther from other lines than this is no better
const many = 5; // lines: among more, a label across a line could be any line's

// placeLabels returns [{text, line?, x, y, w}] with x, y the upper left corner.
export function placeLabels(lay, marks) {
  const drawn = lay.courses.filter((c) => c.shown && c.line.kind !== "band");
  const samples = drawn.flatMap((c) => sample(c, lay.rect).map(([x, y]) => ({ x, y, of: c.line })));
  const placed = [];
  const points = marks.map((m) => ({ x: lay.x.dot(m.x), y: lay.y.dot(m.y), of: m, mark: true })).filter((m) => inside(m, lay.rect));
  samples.push(...points);
  for (const dot of points) {
    take(dot.of.label, null, around(dot), false);
  }
  // Free ends of lines are the clearest places: they are given away first.
  for (const c of drawn.filter((c) => lay.endLabels.has(c.line.id))) {
    const y = c.dots.findLast(Boolean)[1] - lineHeight / 2;
    placed.push({ x: lay.rect.right + lay.lead, y, w: lay.measure(c.line.label), h: lineHeight, text: c.line.label, line: c.line.id });
  }
  for (const c of drawn) {
    if (lay.endLabels.has(c.line.id)) continue;
    const own = samples.filter((s) => s.of === c.line);
    const stride = Math.ceil(own.length / tries);
    const tried = own.filter((_, i) => i % stride === 0);
    take(c.line.label, c.line, tried.flatMap((s) => beside(s, gap)), c.line.kind === "points" || drawn.length > many || lay.map);
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
        if (d < 2 || (s.mark && d < 5)) crossed += s.mark ? 5 : 1;
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

// sample walks along what is seen of a course: one dot for each small cell of the
// picture that it meets, so that ten thousand points cost no more than a few hundred.
function sample({ line, dots }, rect) {
  const list = [], met = new Set();
  const visit = (x, y) => {
    if (!inside({ x, y }, rect)) return;
    const cell = Math.round(x / spacing) * 10000 + Math.round(y / spacing);
    if (met.has(cell)) return;
    met.add(cell);
    list.push([x, y]);
  };
  dots.forEach((b, i) => {
    const a = line.kind === "points" ? null : dots[i - 1];
    if (!b) return;
    if (!a) return visit(b[0], b[1]);
    const n = Math.max(1, Math.ceil(Math.min(4000, Math.hypot(b[0] - a[0], b[1] - a[1])) / spacing)) || 1;
    for (let k = 1; k <= n; k++) visit(a[0] + ((b[0] - a[0]) * k) / n, a[1] + ((b[1] - a[1]) * k) / n);
  });
  return list;
}

// around are the places a mark's words may take, the nearest worth most.
const around = (dot) => [
  ...beside(dot, 8), ...beside(dot, 18, 8), ...beside(dot, 34, 16), ...over(dot, 8, 6), ...over(dot, 26, 20), ...over(dot, 44, 30),
];

const over = ({ x, y }, d, cost) => [{ x, y: y - d, upwards: true, centred: true, cost }, { x, y: y + d, centred: true, cost }];

const inside = ({ x, y }, r) => x >= r.left && x <= r.right && y >= r.top && y <= r.bottom;
const touches = (a, b) => a.x < b.x + b.w + 6 && b.x < a.x + a.w + 6 && a.y < b.y + b.h && b.y < a.y + a.h;

function distance({ x, y }, b) {
  const dx = Math.max(b.x - x, 0, x - b.x - b.w), dy = Math.max(b.y - y, 0, y - b.y - b.h);
  return Math.sqrt(dx * dx + dy * dy);
}

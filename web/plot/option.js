// From a layout to what the drawing library wants.
import { look } from "./palette.js";

// option describes a whole picture. Every place is known beforehand, so nothing
// is left to the library's own layout.
export function option(lay, labels, marks, palette, title) {
  const { rect } = lay;
  const series = lay.courses.flatMap((c) => seriesOf(c, lay, palette));
  series.push(words("words", () => annotations(lay, labels, marks, palette, title), 6));
  return {
    animation: false,
    backgroundColor: "transparent",
    grid: { left: rect.left, top: rect.top, width: rect.right - rect.left, height: rect.bottom - rect.top, outerBoundsMode: "none" },
    xAxis: axisOption(lay.x, lay, palette, false),
    yAxis: axisOption(lay.y, lay, palette, true),
    series,
  };
}

// slidOption is the part of option that changes while lines move.
export function slidOption(lay, labels, marks, palette, title) {
  const moving = lay.courses.filter((c) => c.line.moving).flatMap((c) => seriesOf(c, lay, palette));
  return { series: [...moving, words("words", () => annotations(lay, labels, marks, palette, title), 6)] };
}

function axisOption(axis, lay, palette, ruled) {
  const values = axis.ticks.map((t) => t.at);
  const texts = new Map(axis.ticks.map((t) => [t.at, t.text]));
  return {
    type: "value", min: axis.lo, max: axis.hi, silent: true,
    axisLine: { show: !ruled, onZero: false, lineStyle: { color: palette.quiet, width: 1 } },
    axisTick: { show: !ruled, length: 4, lineStyle: { color: palette.quiet }, customValues: values },
    axisLabel: {
      customValues: values, formatter: (v) => texts.get(v) ?? "", hideOverlap: false, margin: ruled ? 8 : 9,
      color: palette.quiet, fontSize: lay.size, fontFamily: lay.family,
    },
    splitLine: { show: ruled, lineStyle: { color: palette.rule, width: 1 } },
  };
}

function seriesOf(course, lay, palette) {
  const { line, shown } = course;
  if (!shown) return [];
  const style = look(line, palette);
  const base = { id: line.id, silent: true, emphasis: { disabled: true } };
  const data = () => line.data.map((p) => (p ? [lay.x.scale.to(p[0]), lay.y.scale.to(p[1])] : [NaN, NaN]));
  switch (line.kind) {
    case "points":
      return [{
        ...base, type: "scatter", z: 4, data: apart(course, data()), symbol: style.marker, symbolSize: style.marker === "rect" ? 7 : 8,
        itemStyle: { color: palette.paper, borderColor: style.colour, borderWidth: 1.5, opacity: 1 },
      }];
    case "band":
      return [words(line.id, () => band(course, lay, style), 1)];
    default:
      return [{
        ...base, type: "line", z: 3, data: data(), showSymbol: false,
        lineStyle: { color: style.colour, width: style.width, type: style.dash ?? "solid", cap: "butt", join: "round" },
      }];
  }
}

// apart leaves out markers that would lie on another to within a dot or two: a
// drawing of thousands is slow and shows no more. A closer view shows them again.
function apart({ dots }, data) {
  const met = new Set();
  return data.filter((_, i) => {
    const cell = `${Math.round(dots[i][0] / 2)} ${Math.round(dots[i][1] / 2)}`;
    return !met.has(cell) && met.add(cell);
  });
}

// words is a series that draws given shapes at given dots.
function words(id, children, z) {
  return {
    id, type: "custom", coordinateSystem: "none", silent: true, z, data: [0], emphasis: { disabled: true },
    renderItem: () => ({ type: "group", $mergeChildren: false, children: children() }),
  };
}

// band is a light area, broken where a value is missing.
function band({ dots, low }, lay, style) {
  const { rect } = lay;
  const floor = (p) => (Number.isFinite(p[1]) ? p : [p[0], rect.bottom]); // below a log axis
  const areas = [];
  let upper = [], lower = [];
  const close = () => {
    if (upper.length > 1) areas.push([...upper, ...lower.reverse()]);
    upper = [];
    lower = [];
  };
  dots.forEach((p, i) => {
    if (!p || !low[i] || !Number.isFinite(p[0])) return close();
    upper.push(floor(p));
    lower.push(floor(low[i]));
  });
  close();
  const frame = { x: rect.left, y: rect.top, width: rect.right - rect.left, height: rect.bottom - rect.top };
  return areas.map((points) => ({
    type: "polygon", shape: { points }, style: { fill: style.colour, opacity: 0.16 },
    clipPath: { type: "rect", shape: frame },
  }));
}

function annotations(lay, labels, marks, palette, title) {
  const { rect } = lay;
  const font = `${lay.size}px ${lay.family}`;
  const text = (value, x, y, style) => ({ type: "text", x, y, style: { text: value, font, fill: palette.quiet, ...style } });
  const list = lay.yTitle.map((row, i) => text(row, 2, 2 + 16 * i, {}));
  list.push(text(title.x, rect.right, rect.bottom + 24, { align: "right", width: rect.right, overflow: "truncate" }));
  const courses = new Map(lay.courses.map((c) => [c.line.id, c.line]));
  for (const l of labels) {
    const fill = l.line ? look(courses.get(l.line), palette).words : palette.ink;
    list.push(text(l.text, l.x, l.y + 2, { fill, stroke: palette.paper, lineWidth: 3 }));
  }
  for (const m of marks) {
    const cx = lay.x.dot(m.x), cy = lay.y.dot(m.y);
    if (cx < rect.left || cx > rect.right || !(cy >= rect.top && cy <= rect.bottom)) continue;
    const style = m.pin ? { fill: palette.paper, stroke: palette.ink, lineWidth: 2 } : { fill: palette.ink, stroke: palette.paper, lineWidth: 1.5 };
    list.push({ type: "circle", shape: { cx, cy, r: m.pin ? 4.5 : 3.5 }, style });
  }
  return list;
}

// The row of small buttons under a picture: a line each, then what can be done.
import { look } from "./palette.js";

// controls builds the row and returns update(picture, state, palette). act:
// {toggle(id), logX(), logY(), zoomIn(), whole()}.
export function controls(row, act) {
  let built = "";
  let lines = new Map(), actions = {};
  row.setAttribute("role", "group");

  function build(picture) {
    lines = new Map(picture.lines.map((l) => [l.id, button("plot-line", l.label, () => act.toggle(l.id))]));
    actions = {
      logX: button("plot-act", "log x", act.logX), logY: button("plot-act", "log y", act.logY),
      zoomIn: button("plot-act", "zoom in", act.zoomIn), whole: button("plot-act", "whole picture", act.whole),
    };
    const right = document.createElement("span");
    right.className = "plot-acts";
    right.append(...Object.values(actions));
    row.replaceChildren(...lines.values(), right);
  }

  return function update(picture, state, palette) {
    const structure = JSON.stringify(picture.lines.map((l) => [l.id, l.label]));
    if (structure !== built) {
      build(picture);
      built = structure;
    }
    row.setAttribute("aria-label", `Lines of the picture ${picture.title}`);
    for (const line of picture.lines) {
      const b = lines.get(line.id), shown = !state.hidden.has(line.id);
      b.setAttribute("aria-pressed", shown);
      b.title = shown ? "Hide this line" : "Show this line";
      b.firstChild.replaceChildren(...swatch(line, look(line, palette)));
    }
    actions.logX.hidden = !picture.x.canLog;
    actions.logY.hidden = !picture.y.canLog;
    actions.logX.setAttribute("aria-pressed", state.logX);
    actions.logY.setAttribute("aria-pressed", state.logY);
    actions.whole.hidden = state.view === null;
  };
}

const svgSpace = "http://www.w3.org/2000/svg";

function button(name, text, act) {
  const b = document.createElement("button");
  b.type = "button";
  b.className = name;
  if (name === "plot-line") {
    const sample = document.createElementNS(svgSpace, "svg");
    for (const [k, v] of Object.entries({ width: 26, height: 12, viewBox: "0 0 26 12", "aria-hidden": "true" })) sample.setAttribute(k, v);
    b.append(sample);
  }
  b.append(text);
  b.addEventListener("click", act);
  return b;
}

const markers = {
  circle: ["circle", { cx: 13, cy: 6, r: 4 }], rect: ["rect", { x: 9.5, y: 2.5, width: 7, height: 7 }],
  diamond: ["path", { d: "M13 1.5 17.5 6 13 10.5 8.5 6Z" }], triangle: ["path", { d: "M13 2 17.5 10H8.5Z" }],
};

// swatch shows how a line is drawn.
function swatch(line, style) {
  const shape = (tag, attributes) => {
    const e = document.createElementNS(svgSpace, tag);
    for (const [k, v] of Object.entries(attributes)) e.setAttribute(k, v);
    return e;
  };
  if (line.kind === "band") return [shape("rect", { width: 26, height: 12, fill: style.colour, opacity: 0.2 })];
  if (line.kind === "points") {
    const [tag, at] = markers[style.marker];
    return [shape(tag, { ...at, fill: "none", stroke: style.colour, "stroke-width": 1.5 })];
  }
  return [shape("path", { d: "M0 6H26", stroke: style.colour, "stroke-width": style.width, "stroke-dasharray": style.dash?.join(" ") ?? "none" })];
}

import { placeLabels } from "./labels.js";
import { course, layout } from "./layout.js";
import { option, slidOption } from "./option.js";
import { pinMarks } from "./pins.js";
import { pace, still, stillLine } from "./still.js";

// drawing is everything needed to draw a picture at a size in a palette.
export function drawing(picture, state, width, height, family, palette) {
  const lay = layout(still(picture, state.at), state, width, height, family);
  const marks = [...picture.marks, ...pinMarks(state.pins, lay, picture)];
  const labels = placeLabels(lay, marks);
  return { lay, labels, marks, option: option(lay, labels, marks, palette, { x: picture.x.title }) };
}

// slid is a drawing after a step of the slider: only what moves is found anew. The
// words of moving things wait until the slider rests, since their places would jump.
export function slid(drawn, picture, state, palette) {
  const { x, y, whole } = drawn.lay, value = pace(picture.slider, state.at), max = x.scale.from(whole.x[1]);
  const moving = (c) => course(stillLine(c.line.origin, value, max), c.shown, x, y);
  const lay = { ...drawn.lay, courses: drawn.lay.courses.map((c) => (c.line.moving ? moving(c) : c)) };
  const pins = pinMarks(state.pins, lay, picture);
  const loose = new Set([...lay.courses.filter((c) => c.line.moving).map((c) => c.line.id), ...pins.filter((p) => p.moving).map((p) => p.label)]);
  const labels = drawn.labels.filter((l) => !loose.has(l.line ?? l.text));
  const marks = [...picture.marks, ...pins];
  return { lay, labels, marks, option: slidOption(lay, labels, marks, palette, { x: picture.x.title }) };
}

import { placeLabels } from "./labels.js";
import { layout } from "./layout.js";
import { option } from "./option.js";

// drawing is everything needed to draw a picture at a size in a palette.
export function drawing(picture, state, width, height, family, palette) {
  const lay = layout(picture, state, width, height, family);
  const labels = placeLabels(lay, picture.marks);
  return { lay, labels, option: option(lay, labels, picture.marks, palette, { x: picture.x.title }) };
}

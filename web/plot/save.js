// Pictures as files: a drawing that stands alone, on white, with its title.
import { init } from "echarts/core";
import { drawing } from "./drawing.js";
import { light } from "./palette.js";
import { lineHeight } from "./layout.js";
import { sliderText } from "./slide.js";
import { sliderAt } from "./still.js";

const width = 800, height = 480; // dots of a saved picture
const band = 2 * lineHeight; // for the title
const sharp = 2; // dots of a PNG per dot of the drawing

export function saveSVG(picture, state, family, name) {
  hand(new Blob([standalone(picture, state, family)], { type: "image/svg+xml" }), name);
}

export async function savePNG(picture, state, family, name) {
  const image = new Image();
  image.src = "data:image/svg+xml;charset=utf-8," + encodeURIComponent(standalone(picture, state, family));
  await image.decode();
  const canvas = document.createElement("canvas");
  canvas.width = sharp * width;
  canvas.height = sharp * (height + band);
  canvas.getContext("2d").drawImage(image, 0, 0, canvas.width, canvas.height);
  canvas.toBlob((blob) => hand(blob, name), "image/png");
}

function standalone(picture, state, family) {
  const chart = init(null, null, { renderer: "svg", ssr: true, width, height });
  chart.setOption(drawing(picture, state, width, height, family, light).option);
  const inner = chart.renderToSVGString();
  chart.dispose();
  const text = (value) => value.replace(/[&<>"]/g, (c) => ({ "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" })[c]);
  const { slider } = picture;
  const title = slider ? `${picture.title}, ${slider.short} = ${sliderText(slider, sliderAt(slider, state.at))}` : picture.title;
  const font = `font-family="${text(family)}" font-size="14" fill="${light.ink}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height + band}" viewBox="0 0 ${width} ${height + band}">
<title>${text(title)}</title>
<desc>${text(picture.summary)}</desc>
<rect width="100%" height="100%" fill="#ffffff"/>
<text x="2" y="20" font-weight="600" ${font}>${text(title)}</text>
<g transform="translate(0 ${band})">${inner}</g>
</svg>
`;
}

// hand gives a file to the person.
function hand(blob, name) {
  const link = document.createElement("a");
  link.href = URL.createObjectURL(blob);
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(link.href), 60000);
}

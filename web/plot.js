// Pictures: the only file family that knows the drawing library. The interface
// describes a picture as JSON (package plot) and names the element that holds it.
import { init, use } from "echarts/core";
import { CustomChart, LineChart, ScatterChart } from "echarts/charts";
import { GridComponent } from "echarts/components";
import { SVGRenderer } from "echarts/renderers";
import { controls } from "./plot/controls.js";
import { drawing, slid } from "./plot/drawing.js";
import { colours, darkScheme, light } from "./plot/palette.js";
import { pinList } from "./plot/pinlist.js";
import { found, pinned } from "./plot/pins.js";
import { attach } from "./plot/pointer.js";
import { savePNG, saveSVG } from "./plot/save.js";
import { slide } from "./plot/slide.js";
import { style } from "./plot/style.js";
import { settled, turn } from "./plot/turn.js";

use([LineChart, ScatterChart, CustomChart, GridComponent, SVGRenderer]);

const printedWidth = 640; // dots: the text area of A4 and of Letter, near enough; the page scales the rest
const printedHeight = 270; // so that two pictures and their words stand on a page
const plots = new Map(); // by holder
const kept = new Map(); // by holder: where the slider stands and what is pinned, while another sheet is looked at
let printing = false;

class Plot {
  constructor(holder) {
    style();
    this.holder = holder;
    this.state = { logX: false, logY: false, view: null, hidden: new Set(), at: null, pins: [], ...kept.get(holder.id) };
    this.figure = element("div", "plot-figure", { role: "img", tabindex: "0" });
    this.canvas = element("div", "plot-canvas", {});
    this.row = element("div", "plot-row", {});
    this.said = element("div", "plot-said plot-unseen", { "aria-live": "polite" });
    this.slideRow = element("div", "plot-slide", { role: "group", "aria-label": "Slider of the picture" });
    this.pinRows = element("ul", "plot-pins", { id: `${holder.id}-pins`, "aria-live": "polite", "aria-label": "Pinned readings" });
    this.hint = element("div", "plot-hint", { "aria-hidden": "true" });
    this.keys = element("div", "plot-unseen", { id: `${holder.id}-keys` });
    this.figure.setAttribute("aria-describedby", this.keys.id);
    this.figure.append(this.canvas, this.hint);
    const root = element("div", "plot", {});
    root.append(this.figure, this.keys, this.slideRow, this.pinRows, this.row, this.said);
    holder.replaceChildren(root);

    const act = {
      toggle: (id) => this.toggle(id),
      logX: () => this.change({ logX: !this.state.logX, view: null }),
      logY: () => this.change({ logY: !this.state.logY, view: null }),
      zoomIn: () => this.pointer.zoomIn(),
      whole: () => this.change({ view: null }),
    };
    this.updateRow = controls(this.row, act);
    this.slider = slide(this.slideRow, holder.id, { to: (value) => this.slideTo(value), rest: () => this.redraw() });
    this.updatePins = pinList(this.pinRows, (pin) => this.keepPins(this.state.pins.filter((p) => p !== pin)));
    this.pointer = attach({
      figure: this.figure,
      lay: () => this.newest().lay, labels: () => this.newest().labels, picture: () => this.picture, palette: () => this.palette,
      setView: (view) => this.change({ view }), toggle: act.toggle, say: (text) => { this.said.textContent = text; },
      pin: (line, index) => this.pin(line, index), pins: () => this.state.pins.length, unpin: () => this.keepPins([]),
    });
    // Size and style are asked for only when they may have changed: each question
    // makes the browser lay out the page, and a picture is redrawn at every keystroke.
    this.width = this.figure.clientWidth;
    this.watcher = new ResizeObserver(([entry]) => {
      const width = Math.floor(entry.contentRect.width);
      if (printing || width === this.width) return;
      this.width = width;
      this.show();
    });
    this.watcher.observe(this.figure);
    this.turn = turn(this.figure, () => this.redraw());
    this.restyle();
  }

  draw(json) {
    if (json === this.json) return;
    const picture = JSON.parse(json);
    if (picture.id !== this.picture?.id) {
      Object.assign(this.state, { logX: picture.x.log, logY: picture.y.log, view: null, hidden: new Set() });
    }
    const { slider } = this.picture ?? {};
    if (slider && picture.slider && slider.unit !== picture.slider.unit && this.state.at !== null) {
      // The same value told in another unit stands at the same part of the way.
      this.state.at = picture.slider.min + ((this.state.at - slider.min) / (slider.max - slider.min)) * (picture.slider.max - picture.slider.min);
    }
    this.state.pins = this.state.pins.map((pin) => found(pin, picture));
    this.json = json;
    this.picture = picture;
    this.instruct(picture.lines.some((l) => l.readings));
    this.figure.setAttribute("aria-label", `${picture.title}. ${picture.summary}`);
    this.pointer.leave();
    this.show();
  }

  // show draws what can be seen, and what is on the way to paper. Elsewhere only the
  // words are renewed, and the drawing awaits its turn; pins are words that hang on it.
  show() {
    if (printing || this.turn.inSight() || this.state.pins.length > 0) return this.redraw();
    if (!this.picture || this.width === 0) return;
    this.room();
    this.describe();
    this.turn.wait();
  }

  // newest is the drawing of the newest picture.
  newest() {
    if (this.turn.waits()) this.redraw();
    return this.drawn;
  }

  restyle() {
    this.palette = printing ? light : colours(this.holder);
    this.family = getComputedStyle(this.holder).fontFamily.replaceAll('"', "'");
  }

  change(part) {
    Object.assign(this.state, part);
    this.redraw();
  }

  // instruct says which keys there are.
  instruct(readable) {
    this.hint.textContent = `← → read   ${readable ? "Enter pin   " : ""}+ − zoom   Esc ${readable ? "clear" : "all"}`;
    this.keys.textContent = "Arrow keys read values, plus and minus zoom, Escape shows the whole picture." +
      (readable ? " Enter pins the point that is read, and takes a pin away; Escape takes all pins away first." : "");
  }

  // slideTo moves what moves, at most once a frame.
  slideTo(value) {
    this.state.at = value;
    this.keep();
    if (!this.newest()) return;
    this.frame ??= requestAnimationFrame(() => {
      this.frame = null;
      this.drawn = slid(this.newest(), this.picture, this.state, this.palette);
      this.chart.setOption(this.drawn.option);
    });
  }

  // pin keeps the readings of a point in sight, or lets go of them.
  pin(id, index) {
    const line = this.picture.lines.find((l) => l.id === id);
    const others = this.state.pins.filter((p) => p.line !== id || p.index !== index);
    const fresh = others.length === this.state.pins.length;
    this.keepPins(fresh ? [...others, pinned(line, index, this.picture)] : others);
  }

  keepPins(pins) {
    this.state.pins = pins;
    this.keep();
    this.redraw();
  }

  keep() {
    kept.set(this.holder.id, { at: this.state.at, pins: this.state.pins });
  }

  toggle(id) {
    const { hidden } = this.state;
    if (!hidden.delete(id)) hidden.add(id);
    this.redraw();
  }

  // room is the size the page gives now, and keeps it free.
  room() {
    const width = printing ? printedWidth : this.width;
    const height = printing ? printedHeight : Math.round(Math.min(420, Math.max(260, 0.58 * width)));
    if (height !== this.height) this.figure.style.height = `${height}px`;
    this.height = height;
    return { width, height };
  }

  // describe says what there is to see and to do.
  describe() {
    this.updateRow(this.picture, this.state, this.palette);
    this.slider.update(this.picture, this.state.at);
  }

  // redraw draws in the room there is; nothing while there is none.
  redraw() {
    this.turn.done();
    const { width, height } = this.room();
    if (!this.picture || width === 0) return;
    cancelAnimationFrame(this.frame); // what is drawn here is newer
    this.frame = null;
    this.drawn = drawing(this.picture, this.state, width, height, this.family, this.palette);
    this.chart ??= init(this.canvas, null, { renderer: "svg", width, height });
    if (this.size !== `${width} ${height}`) {
      this.size = `${width} ${height}`;
      this.chart.resize({ width, height });
      // A picture that is scaled, as on paper, keeps its proportions.
      this.canvas.querySelector("svg").setAttribute("viewBox", `0 0 ${this.size}`);
    }
    const structure = this.drawn.option.series.map((s) => s.type + s.id).join();
    this.chart.setOption(this.drawn.option, structure === this.structure ? {} : { notMerge: true });
    this.structure = structure;
    this.describe();
    this.updatePins(this.state.pins, this.drawn.lay, this.picture);
  }

  async save(format, name) {
    if (format === "svg") return saveSVG(this.picture, this.state, this.family, name);
    if (format === "png") return savePNG(this.picture, this.state, this.family, name);
    throw new Error(`a picture cannot be saved as ${format}; svg and png are possible`);
  }

  forget() {
    this.watcher.disconnect();
    this.turn.stop();
    this.slider.stop();
    cancelAnimationFrame(this.frame);
    this.chart?.dispose();
  }
}

function element(tag, name, attributes) {
  const e = document.createElement(tag);
  e.className = name;
  for (const [k, v] of Object.entries(attributes)) e.setAttribute(k, v);
  return e;
}

function redrawAll() {
  for (const plot of plots.values()) {
    plot.restyle();
    plot.show();
  }
}

darkScheme.addEventListener("change", redrawAll);
addEventListener("beforeprint", () => { printing = true; redrawAll(); });
addEventListener("afterprint", () => { printing = false; redrawAll(); });

self.brinefrontPlot = {
  // draw shows a picture in the element with this id, at once where it is in sight; the
  // same again costs nothing.
  draw(holderId, json) {
    const holder = document.getElementById(holderId);
    if (!holder) throw new Error(`the page has no place called ${holderId} for a picture`);
    let plot = plots.get(holderId);
    if (plot?.holder !== holder || !holder.contains(plot.figure)) {
      for (const [id, old] of plots) {
        if (id === holderId || old.holder === holder || !old.holder.isConnected) self.brinefrontPlot.forget(id);
      }
      plot = new Plot(holder);
      plots.set(holderId, plot);
    }
    plot.draw(json);
  },
  forget(holderId) {
    plots.get(holderId)?.forget();
    plots.delete(holderId);
  },
  save(holderId, format, name) {
    const plot = plots.get(holderId);
    if (!plot) throw new Error(`no picture is drawn in ${holderId}`);
    return plot.save(format, name);
  },
  // settled reports whether all that is in sight is drawn.
  settled,
  // theme reads the page's colours anew, after the page changed them by itself.
  theme: redrawAll,
};

// What mouse, finger and keyboard do on a picture. The page keeps its wheel until
// a picture has the focus.
import { look } from "./palette.js";
import { details } from "./pins.js";
import { heading, readings, spotAt, stepped } from "./read.js";
import { boxed, moved, zoomed } from "./zoom.js";

const least = 8; // dots: a shorter drag is a click
const stride = 8; // dots that an arrow key moves the reading line; with Shift one
const closer = 0.8; // one notch of the wheel

// attach gives a plot its pointer and keys. plot: {figure, lay(), picture(),
// labels(), palette(), setView(view), toggle(id), say(text), pin(line, index),
// pins(), unpin()}.
export function attach(plot) {
  const { figure } = plot;
  const hair = part("plot-hair"), box = part("plot-box"), slip = part("plot-slip"), dot = part("plot-dot");
  let from = null; // where a drag began
  let dragged = false; // the click that comes next ends a drag
  let readAt = null; // the reading line, dots
  let spot = null; // the point whose further readings are shown

  function part(name) {
    const element = document.createElement("div");
    element.className = name;
    element.hidden = true;
    figure.append(element);
    return element;
  }

  const clamp = (v, lo, hi) => Math.min(hi, Math.max(lo, v));
  const within = (event) => {
    const frame = figure.getBoundingClientRect(), { rect } = plot.lay();
    const x = event.clientX - frame.left, y = event.clientY - frame.top;
    return { x: clamp(x, rect.left, rect.right), y: clamp(y, rect.top, rect.bottom), rawX: x, rawY: y };
  };

  function read(dotX, dotY, at = spotAt(plot.lay(), dotX, dotY)) {
    const lay = plot.lay(), { rect } = lay;
    const rows = readings(lay, dotX, plot.picture());
    readAt = dotX;
    spot = at;
    place(hair, dotX, rect.top, 0, rect.bottom - rect.top);
    if (spot) place(dot, spot.x, spot.y, 0, 0);
    dot.hidden = !spot || spot.x < rect.left || spot.x > rect.right || spot.y < rect.top || spot.y > rect.bottom;
    slip.replaceChildren(row("plot-at", heading(lay, dotX, plot.picture())), ...rows.flatMap((r) => [entry(r), ...further(r.line)]));
    slip.hidden = false;
    const right = dotX + 14 + slip.offsetWidth <= lay.width;
    slip.style.left = `${right ? dotX + 14 : Math.max(0, dotX - 14 - slip.offsetWidth)}px`;
    slip.style.top = `${clamp(dotY - slip.offsetHeight / 2, 0, Math.max(0, lay.height - slip.offsetHeight))}px`;
    return rows;
  }

  function row(name, text) {
    const element = document.createElement("div");
    element.className = name;
    element.textContent = text;
    return element;
  }

  function entry({ line, text }) {
    const element = row("plot-entry", "");
    const label = row("plot-name", line.label);
    label.style.color = look(line, plot.palette()).words;
    element.append(label, row("plot-value", text));
    return element;
  }

  // further are the spot's readings, under its line.
  function further(line) {
    if (dot.hidden || line.id !== spot.line.id) return [];
    return details(spot.line, spot.index, 4).map(({ label, text }) => {
      const element = row("plot-entry plot-more", "");
      element.append(row("plot-name", label), row("plot-value", text));
      return element;
    });
  }

  function place(element, x, y, w, h) {
    Object.assign(element.style, { left: `${x}px`, top: `${y}px`, width: `${w}px`, height: `${h}px` });
    element.hidden = false;
  }

  function leave() {
    hair.hidden = slip.hidden = box.hidden = dot.hidden = true;
    from = readAt = spot = null;
  }

  const labelAt = ({ rawX, rawY }) =>
    plot.labels().find((l) => l.line && rawX >= l.x && rawX <= l.x + l.w && rawY >= l.y && rawY <= l.y + l.h);

  figure.addEventListener("pointermove", (event) => {
    const at = within(event);
    figure.style.cursor = labelAt(at) ? "pointer" : "crosshair";
    if (from) {
      hair.hidden = slip.hidden = dot.hidden = true;
      return place(box, ...corner(from, at));
    }
    read(at.x, at.y);
  });
  const corner = (a, b) => [Math.min(a.x, b.x), Math.min(a.y, b.y), Math.abs(a.x - b.x), Math.abs(a.y - b.y)];

  figure.addEventListener("pointerdown", (event) => {
    const at = within(event);
    if (event.pointerType === "touch") return void read(at.x, at.y); // a finger's drag scrolls the page
    if (event.button !== 0 || labelAt(at)) return;
    from = at;
    dragged = false;
    figure.setPointerCapture(event.pointerId);
  });
  figure.addEventListener("pointerup", (event) => {
    if (!from) return;
    const a = from, b = within(event), lay = plot.lay(), { rect } = lay;
    leave();
    const wide = Math.abs(a.x - b.x) >= least, high = Math.abs(a.y - b.y) >= least;
    if (!wide && !high) return read(b.x, b.y);
    dragged = true;
    const x = wide ? [a.x, b.x] : [rect.left, rect.right], y = high ? [a.y, b.y] : [rect.bottom, rect.top];
    plot.setView(boxed(x.map(lay.x.place), y.map(lay.y.place), lay.whole));
  });
  figure.addEventListener("pointercancel", leave);
  figure.addEventListener("pointerleave", (event) => from || event.pointerType === "touch" || leave());
  figure.addEventListener("click", (event) => {
    if (dragged) return void (dragged = false);
    const at = within(event), label = labelAt(at);
    if (label) return plot.toggle(label.line);
    read(at.x, at.y);
    pin();
  });

  function pin() {
    if (spot && !dot.hidden) plot.pin(spot.line.id, spot.index);
  }

  figure.addEventListener("dblclick", () => plot.setView(null));
  figure.addEventListener("blur", leave);

  figure.addEventListener("wheel", (event) => {
    if (document.activeElement !== figure) return;
    event.preventDefault();
    const at = within(event), lay = plot.lay();
    zoomAt(event.deltaY < 0 ? closer : 1 / closer, lay.x.place(at.x), lay.y.place(at.y));
    read(at.x, at.y);
  }, { passive: false });

  function zoomAt(factor, x, y) {
    const lay = plot.lay();
    plot.setView(zoomed(lay.view, lay.whole, factor, { x, y }));
  }

  // zoomIn and its opposite keep the reading line in place, else the middle.
  function zoomHere(factor) {
    const lay = plot.lay(), { rect } = lay;
    zoomAt(factor, lay.x.place(readAt ?? (rect.left + rect.right) / 2), (lay.y.lo + lay.y.hi) / 2);
    if (readAt !== null) read(readAt, (rect.top + rect.bottom) / 2);
  }

  // The arrows move the reading line, along a line with further readings where there
  // is one; at the edge of a part they move the part.
  function step(direction, dotsOn) {
    const { rect } = plot.lay(), middle = { x: (rect.left + rect.right) / 2, y: (rect.top + rect.bottom) / 2 };
    const near = spot ?? spotAt(plot.lay(), middle.x, middle.y);
    const next = () => (near && spot ? stepped(plot.lay(), near, direction, dotsOn) : near);
    let at = near ? next() : { x: readAt === null ? middle.x : readAt + direction * dotsOn };
    if (at.x < rect.left || at.x > rect.right) {
      const lay = plot.lay();
      plot.setView(moved(lay.view, lay.whole, Math.sign(at.x - middle.x) * 0.1, 0));
      at = near ? { ...at, x: plot.lay().courses.find((c) => c.line.id === at.line.id).dots[at.index][0] } : at;
    }
    const x = clamp(at.x, rect.left, rect.right);
    const rows = read(x, at.y ?? middle.y, near ? at : null);
    const also = near ? details(at.line, at.index, 4).map((d) => `${d.label} ${d.text}`) : [];
    plot.say([heading(plot.lay(), x, plot.picture()), ...rows.map((r) => `${r.line.label} ${r.text}`), ...also].join("; "));
  }

  const shift = (dy) => {
    const lay = plot.lay();
    plot.setView(moved(lay.view, lay.whole, 0, dy));
  };
  const keys = {
    "+": () => zoomHere(closer), "=": () => zoomHere(closer), "-": () => zoomHere(1 / closer),
    Escape: () => (plot.pins() ? plot.unpin() : plot.setView(null), leave()),
    Enter: pin, " ": pin,
    ArrowLeft: (event) => step(-1, event.shiftKey ? 1 : stride), ArrowRight: (event) => step(1, event.shiftKey ? 1 : stride),
    ArrowUp: () => shift(0.1), ArrowDown: () => shift(-0.1),
  };
  figure.addEventListener("keydown", (event) => {
    const act = keys[event.key];
    if (!act || event.ctrlKey || event.metaKey || event.altKey) return;
    const lay = plot.lay(), upright = event.key === "ArrowUp" || event.key === "ArrowDown";
    if (upright && lay.view === lay.whole) return; // the page scrolls
    event.preventDefault();
    act(event);
  });
  return { leave, zoomIn: () => zoomHere(0.5) };
}

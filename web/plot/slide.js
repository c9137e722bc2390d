// The slider under a picture: a range input, the values that have a name, and a
// button that runs through once.
import { reading, withUnit } from "./scale.js";
import { sliderAt } from "./still.js";

const notches = 200; // of the range input; its value counts them, its text tells the value
const whole = 6000; // milliseconds from one end to the other
const stills = 10; // pictures of a run for a reader who wants no motion

// slide builds the row in an element and returns update(picture, at). act:
// {to(value), rest()}: a step while it moves, and the moment it rests.
export function slide(row, id, act) {
  const label = part("label", "plot-variable"), range = part("input", "plot-range"), said = part("output", "plot-value-now");
  const stops = part("span", "plot-stops"), play = part("button", "plot-play");
  Object.assign(range, { type: "range", min: 0, max: notches, step: 1, id: `${id}-slider` });
  Object.assign(play, { type: "button", id: `${id}-play` });
  Object.assign(said, { id: `${id}-slider-at` });
  label.htmlFor = range.id;
  said.htmlFor = range.id;
  said.setAttribute("aria-live", "off"); // the range tells its own value
  row.append(label, said, stops, play, range);

  let slider = null, running = 0, named = "";

  function show(value) {
    range.value = Math.round((notches * (value - slider.min)) / (slider.max - slider.min));
    const text = sliderText(slider, value);
    range.setAttribute("aria-valuetext", text);
    said.textContent = text;
  }

  function stop() {
    cancelAnimationFrame(running);
    running = 0;
    play.textContent = "▶ Play";
    play.setAttribute("aria-pressed", "false");
  }

  function run(from) {
    const calm = matchMedia("(prefers-reduced-motion: reduce)").matches;
    const long = (whole * (slider.max - from)) / (slider.max - slider.min);
    let began = null, last = -1;
    play.textContent = "■ Stop";
    play.setAttribute("aria-pressed", "true");
    const frame = (now) => {
      began ??= now;
      const part = Math.min(1, (now - began) / long);
      const shown = calm ? Math.floor(part * stills) / stills : part;
      running = requestAnimationFrame(frame);
      if (shown !== last) {
        last = shown;
        const value = from + shown * (slider.max - from);
        show(value);
        act.to(value);
      }
      if (part < 1) return;
      stop();
      act.rest();
    };
    running = requestAnimationFrame(frame);
  }

  range.addEventListener("input", () => {
    stop();
    const value = slider.min + (range.value / notches) * (slider.max - slider.min);
    show(value);
    act.to(value);
  });
  range.addEventListener("change", () => act.rest());
  play.addEventListener("click", () => {
    if (running) {
      stop();
      return act.rest();
    }
    run(Number(range.value) >= notches ? slider.min : slider.min + (range.value / notches) * (slider.max - slider.min));
  });
  stop();

  return {
    stop,
    update(picture, at) {
      slider = picture.slider ?? null;
      row.hidden = slider === null;
      if (!slider) return stop();
      label.textContent = slider.label;
      if (JSON.stringify(slider.stops) !== named) {
        named = JSON.stringify(slider.stops);
        stops.replaceChildren(...slider.stops.map((s) => jump(s)));
      }
      if (!running) show(sliderAt(slider, at));
    },
  };

  // jump is a button that goes to a named value exactly.
  function jump(to) {
    const button = part("button", "plot-act");
    button.type = "button";
    button.textContent = to.label;
    button.addEventListener("click", () => {
      stop();
      show(to.at);
      act.to(to.at);
      act.rest();
    });
    return button;
  }
}

// sliderText is a slider's value with its unit, and its name where it has one.
export function sliderText(slider, value) {
  const text = withUnit(reading(value, 3), slider.unit);
  const named = slider.stops.find((s) => Math.abs(s.at - value) < 1e-9 * (slider.max - slider.min));
  return named ? `${text}, ${named.label}` : text;
}

function part(tag, name) {
  const element = document.createElement(tag);
  element.className = name;
  return element;
}

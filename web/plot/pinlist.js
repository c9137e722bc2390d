// The pins of a picture in words, below it.
import { pinText } from "./pins.js";

// pinList returns update(pins, lay, picture); away(pin) takes one out.
export function pinList(list, away) {
  let shown = "";
  return function update(pins, lay, picture) {
    const texts = pins.map((pin) => pinText(pin, lay, picture));
    if (JSON.stringify(texts) === shown) return; // a live region speaks of every change
    shown = JSON.stringify(texts);
    list.replaceChildren(...texts.flatMap((text, i) => (text ? [item(text, pins[i])] : [])));
  };

  function item(text, pin) {
    const li = document.createElement("li"), button = document.createElement("button");
    button.type = "button";
    button.className = "plot-act";
    button.textContent = "Remove";
    button.setAttribute("aria-label", `Remove ${text.split(":")[0]}`);
    button.addEventListener("click", () => away(pin));
    li.append(text, " ", button);
    return li;
  }
}

// Whose turn it is to be drawn: a picture in sight at once; any other when the
// browser has nothing else to do, those within a screen of the window first, and at
// the latest when it comes into sight.

const longest = 100; // milliseconds that a picture near the window waits for an idle moment
const pause = 100; // milliseconds, for browsers that do not tell when they are idle

const inSight = new Set(), nearby = new Set(); // elements, as the browser last reported
const waiting = new Map(); // by element: what draws it
let asked = 0; // the idle moment asked for

const watchers = [
  watcher(inSight, "0px", draw),
  watcher(nearby, "100% 0px", ask),
];

function watcher(elements, margin, came) {
  return new IntersectionObserver((entries) => {
    for (const { target, isIntersecting } of entries) {
      if (!isIntersecting) {
        elements.delete(target);
        continue;
      }
      elements.add(target);
      if (waiting.has(target)) came(target);
    }
  }, { rootMargin: margin });
}

function draw(element) {
  const act = waiting.get(element);
  waiting.delete(element);
  act();
}

const next = () => [...waiting.keys()].find((e) => nearby.has(e)) ?? waiting.keys().next().value;

// ask has one picture drawn in the next idle moment, and then the next.
function ask() {
  if (waiting.size === 0) return;
  const act = () => {
    asked = 0;
    try {
      if (waiting.size > 0) draw(next());
    } finally {
      ask();
    }
  };
  if (!self.requestIdleCallback) {
    asked ||= setTimeout(act, pause);
    return;
  }
  cancelIdleCallback(asked);
  asked = requestIdleCallback(act, nearby.has(next()) ? { timeout: longest } : {});
}

// seen reports whether an element is in the window now. It makes the browser lay out the page.
function seen(element) {
  const { top, bottom, left, right } = element.getBoundingClientRect();
  return right > left && bottom > 0 && top < innerHeight && right > 0 && left < innerWidth;
}

// turn gives an element its turns.
export function turn(element, act) {
  if (seen(element)) inSight.add(element); // the first report comes too late for the first drawing
  for (const w of watchers) w.observe(element);
  return {
    inSight: () => inSight.has(element),
    waits: () => waiting.has(element),
    wait() {
      waiting.set(element, act);
      ask();
    },
    done: () => waiting.delete(element),
    stop() {
      for (const w of watchers) w.unobserve(element);
      for (const list of [inSight, nearby, waiting]) list.delete(element);
    },
  };
}

// settled reports whether all that is in the window is drawn.
export const settled = () => ![...waiting.keys()].some(seen);

// Scales: from numbers to places on an axis and back, round ticks, and numbers as
// text. A log axis is a plain axis of decimal logarithms; nothing else knows.

export const linear = { to: (v) => v, from: (u) => u };
export const log = { to: (v) => (v > 0 ? Math.log10(v) : NaN), from: (u) => 10 ** u };

const steps = [1, 2, 2.5, 5, 10];
const decades = 6; // a log axis shows at most so many below its largest number

// roundStep is the round distance that divides a span into about count parts.
function roundStep(span, count) {
  const raw = span / count;
  const power = 10 ** Math.floor(Math.log10(raw));
  return steps.find((s) => s * power >= raw * (1 - 1e-9)) * power;
}

// extent is what an axis shows at first, in scale coordinates: the limits asked
// for, else the data out to round numbers, from zero where zero is near.
export function extent(axis, values, scale) {
  const seen = values.map(scale.to).filter(Number.isFinite);
  let lo = seen.reduce((a, b) => Math.min(a, b), Infinity);
  let hi = seen.reduce((a, b) => Math.max(a, b), -Infinity);
  const min = scale.to(axis.min ?? NaN), max = scale.to(axis.max ?? NaN);
  if (seen.length === 0) [lo, hi] = scale === log ? [-1, 0] : [0, 1];
  if (scale === log) {
    hi = Number.isFinite(max) ? max : -roundLog(-hi);
    lo = Number.isFinite(min) ? min : Math.max(roundLog(lo), Math.floor(hi) - decades);
    return lo < hi ? [lo, hi] : [hi - 1, hi];
  }
  if (lo === hi) [lo, hi] = lo === 0 ? [0, 1] : [Math.min(0, 2 * lo), Math.max(0, 2 * hi)];
  if (lo > 0 && lo < 0.4 * hi) lo = 0;
  if (hi < 0 && hi > 0.4 * lo) hi = 0;
  const step = roundStep(hi - lo, 5);
  lo = Number.isFinite(min) ? min : Math.floor(lo / step + 1e-9) * step;
  hi = Number.isFinite(max) ? max : Math.ceil(hi / step - 1e-9) * step;
  return lo < hi ? [lo, hi] : [lo, lo + (Math.abs(lo) || 1)];
}

// roundLog is the last of 1, 2 and 5 times a power of ten at or below 10^u; these
// are the same set seen from above, so -roundLog(-u) is the first at or above.
function roundLog(u) {
  const d = Math.floor(u + 1e-9);
  return d + [Math.log10(5), Math.log10(2), 0].find((m) => d + m <= u + 1e-9);
}

// ticks are round numbers within [lo, hi] (scale coordinates) with their texts.
export function ticks([lo, hi], count, scale) {
  if (scale === log && hi - lo >= 0.9) return logTicks(lo, hi, count);
  const from = scale.from(lo), to = scale.from(hi);
  const step = roundStep(to - from, count);
  const list = [];
  for (let k = Math.ceil(from / step - 1e-6); k * step <= to + 1e-6 * step; k++) {
    list.push({ at: scale.to(k * step), text: fixed(k * step, step) });
  }
  return list;
}

function logTicks(lo, hi, count) {
  const every = Math.max(1, Math.ceil((hi - lo) / (2 * count))); // their texts are short
  const within = hi - lo <= 2 ? [1, 2, 5] : [1];
  const plain = lo > -4 && hi < 6;
  const list = [];
  for (let d = Math.floor(lo); d <= hi + 1e-9; d++) {
    if (d % every !== 0) continue;
    for (const m of within) {
      const at = d + Math.log10(m);
      if (at > lo - 1e-9 && at < hi + 1e-9) list.push({ at, text: plain ? fixed(m * 10 ** d, m * 10 ** d) : power(m, d) });
    }
  }
  return list;
}

// fixed writes a tick with the decimals its step needs, and thousands apart.
function fixed(v, step) {
  const size = Math.max(Math.abs(v), step);
  if (v !== 0 && (size >= 1e7 || step < 1e-5)) return times10(v, step);
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const exact = Math.abs(step * 10 ** decimals - Math.round(step * 10 ** decimals)) > 1e-6 ? decimals + 1 : decimals;
  return apart(v.toFixed(exact));
}

function times10(v, step) {
  const e = Math.floor(Math.log10(Math.abs(v)) + 1e-9);
  const digits = Math.max(0, e - Math.floor(Math.log10(step) + 1e-9));
  return `${minus((v / 10 ** e).toFixed(digits))}×10${raised(e)}`;
}

function power(m, d) {
  if (d === 0) return String(m);
  return (m === 1 ? "" : `${m}×`) + `10${raised(d)}`;
}

const superscripts = { "-": "⁻", 0: "⁰", 1: "¹", 2: "²", 3: "³", 4: "⁴", 5: "⁵", 6: "⁶", 7: "⁷", 8: "⁸", 9: "⁹" };
const raised = (n) => [...String(n)].map((c) => superscripts[c]).join("");
const minus = (text) => text.replace("-", "−");

// apart sets narrow spaces between thousands, from five digits on.
function apart(text) {
  const [whole, rest] = text.split(".");
  const digits = whole.replace("-", "").length;
  const spaced = digits < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, "\u202f");
  return minus(rest === undefined ? spaced : `${spaced}.${rest}`);
}

// reading writes a number read off a picture: four significant digits, or as many as
// are asked for.
export function reading(v, digits = 4) {
  if (v === 0) return "0";
  const e = Math.floor(Math.log10(Math.abs(v)));
  if (e < -4 || e >= 9) {
    const [m, p] = v.toExponential(digits - 1).split("e");
    return `${minus(m)}×10${raised(Number(p))}`;
  }
  return apart(v.toFixed(Math.max(0, digits - 1 - e)));
}

// withUnit keeps a number and its unit on one line.
export const withUnit = (text, unit) => (unit ? `${text}\u00a0${unit}` : text);

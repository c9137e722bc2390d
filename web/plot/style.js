// The rules that pictures cannot do without. The page's own style sheet wins over
// those in :where(), which weighs nothing; the small buttons are no form buttons
// and keep their own look.
const rules = `
:where(.plot) { position: relative; }
:where(.plot-figure) { position: relative; width: 100%; touch-action: pan-y; break-inside: avoid; user-select: none; }
:where(.plot-figure:focus-visible) { outline: 2px solid var(--line-water, #1f6aa5); outline-offset: 2px; }
:where(.plot-hair) { position: absolute; border-left: 1px solid var(--quiet, #565a5c); pointer-events: none; }
:where(.plot-box) { position: absolute; border: 1px solid var(--quiet, #565a5c); background: var(--rule, #d9d4c6); opacity: 0.5; pointer-events: none; }
:where(.plot-slip) { position: absolute; z-index: 2; padding: 0.3rem 0.5rem; max-width: 70%; font-size: 0.75rem; line-height: 1.4; pointer-events: none;
  color: var(--ink, #1d2226); background: var(--paper, #fff); border: 1px solid var(--rule, #d9d4c6); font-variant-numeric: tabular-nums; }
:where(.plot-at) { color: var(--quiet, #565a5c); }
:where(.plot-entry) { display: flex; gap: 1em; justify-content: space-between; }
:where(.plot-value) { white-space: nowrap; }
:where(.plot-dot) { position: absolute; width: 11px !important; height: 11px !important; margin: -5.5px; border: 2px solid var(--ink, #1d2226); border-radius: 50%;
  background: var(--paper, #fff); pointer-events: none; }
:where(.plot-more) { padding-left: 0.6em; }
.plot-slide { display: flex; flex-wrap: wrap; align-items: center; gap: 0 0.75rem; font-size: 0.8125rem; margin-top: 0.25rem; }
.plot-slide button { font: inherit; color: var(--ink, #1d2226); background: none; border: 0; padding: 0.25rem 0.1rem; min-height: 1.75rem; cursor: pointer; }
.plot-slide .plot-play { min-width: 4.25em; text-align: left; }
.plot-range { flex: 1 1 60%; min-width: 6rem; height: 1.75rem; margin: 0; accent-color: var(--line-water, #1f6aa5); }
.plot-value-now { font-weight: 600; font-variant-numeric: tabular-nums; }
.plot-stops { display: flex; flex-wrap: wrap; gap: 0 0.75rem; margin-left: auto; }
.plot-slide .plot-act { color: var(--quiet, #565a5c); text-decoration: underline; text-decoration-thickness: 1px; text-underline-offset: 3px; }
.plot-pins { list-style: none; margin: 0.25rem 0 0; padding: 0; font-size: 0.8125rem; line-height: 1.4; }
.plot-pins:empty { margin: 0; }
.plot-pins li::before { content: "○ "; }
.plot-pins button { font: inherit; color: var(--quiet, #565a5c); background: none; border: 0; padding: 0 0.1rem; min-height: 1.5rem; cursor: pointer;
  text-decoration: underline; text-decoration-thickness: 1px; text-underline-offset: 3px; }
.plot-row { display: flex; flex-wrap: wrap; gap: 0.1rem 0.9rem; align-items: baseline; font-size: 0.75rem; margin-top: 0.2rem; }
.plot-row button { font: inherit; color: var(--ink, #1d2226); background: none; border: 0; padding: 0.25rem 0.1rem; min-height: 1.75rem; cursor: pointer; text-align: left; }
.plot-row button:focus-visible { outline: 2px solid var(--line-water, #1f6aa5); }
.plot-row svg { vertical-align: -1px; margin-right: 0.4em; }
.plot-line[aria-pressed="false"] { color: var(--quiet, #565a5c); text-decoration: line-through; }
.plot-line[aria-pressed="false"] svg { opacity: 0.25; }
.plot-acts { display: flex; flex-wrap: wrap; gap: 0 0.9rem; margin-left: auto; }
.plot-row .plot-act { color: var(--quiet, #565a5c); text-decoration: underline; text-decoration-thickness: 1px; text-underline-offset: 3px; }
.plot-row .plot-act[aria-pressed="true"] { color: var(--ink, #1d2226); font-weight: 600; }
:where(.plot-hint) { position: absolute; right: 0; bottom: 100%; z-index: 2; padding: 0.25rem; font-size: 0.75rem; line-height: 1.2; white-space: pre; visibility: hidden; pointer-events: none;
  color: var(--quiet, #565a5c); background: var(--paper, #fff); }
:where(.plot-figure:focus-visible .plot-hint) { visibility: visible; }
.plot-hair[hidden], .plot-box[hidden], .plot-slip[hidden], .plot-dot[hidden], .plot-slide[hidden], .plot-row [hidden] { display: none; }
.plot-unseen { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); white-space: nowrap; }
@media (pointer: coarse) { .plot-range, .plot-slide button { height: 2.5rem; min-height: 2.5rem; } .plot-pins button { min-height: 2rem; } }
@media print {
  .plot { break-inside: avoid; }
  .plot-figure { outline: none !important; }
  .plot-range, .plot-play, .plot-stops, .plot-pins button, .plot-dot, .plot-acts, .plot-hint, .plot-hair, .plot-box, .plot-slip, .plot-line[aria-pressed="false"] { display: none !important; }
  .plot-row button { color: #1d2226; }
  .plot-figure, .plot-canvas, .plot-canvas > div, .plot-canvas svg { width: 100% !important; height: auto !important; }
  .plot-canvas svg { position: static !important; display: block; }
}
`;

let there = false;

export function style() {
  if (there) return;
  there = true;
  const element = document.createElement("style");
  element.textContent = rules;
  document.head.append(element);
}

// Views: the part of a picture that is shown, in scale coordinates.

const closest = 1e-5; // of the whole: as near as one can go

// zoomed scales a view about a place, never beyond the whole; null is the whole.
export function zoomed(view, whole, factor, at) {
  return settled({
    x: about(view.x, whole.x, factor, at.x),
    y: about(view.y, whole.y, factor, at.y),
  }, whole);
}

function about([lo, hi], [min, max], factor, at) {
  const f = Math.max(factor, (closest * (max - min)) / (hi - lo));
  return kept([at - (at - lo) * f, at + (hi - at) * f], [min, max]);
}

// kept moves and cuts a span so that it stays within the whole.
function kept([lo, hi], [min, max]) {
  if (hi - lo >= max - min) return [min, max];
  const shift = Math.max(0, min - lo) - Math.max(0, hi - max);
  return [lo + shift, hi + shift];
}

// boxed is the view of a box; spans are ordered here.
export function boxed(x, y, whole) {
  const ordered = ([a, b]) => (a < b ? [a, b] : [b, a]);
  return settled({ x: kept(ordered(x), whole.x), y: kept(ordered(y), whole.y) }, whole);
}

// moved shifts a view by parts of itself.
export function moved(view, whole, dx, dy) {
  const by = ([lo, hi], d) => [lo + d * (hi - lo), hi + d * (hi - lo)];
  return settled({ x: kept(by(view.x, dx), whole.x), y: kept(by(view.y, dy), whole.y) }, whole);
}

function settled(view, whole) {
  const same = (a, b) => a[0] === b[0] && a[1] === b[1];
  return same(view.x, whole.x) && same(view.y, whole.y) ? null : view;
}

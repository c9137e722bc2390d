// Moving lines: a picture at one value of its slider. Every point of a moving line
// stands at its x times that value (package plot), so that a step of the slider is a
// multiplication and never a question to the engine. A line of stages holds one course
// for each of some values, and goes straight from one to the next.

// sliderAt is the value that is shown: the reader's, within the slider's range, else
// where the slider stands at first.
export function sliderAt(slider, at) {
  return Math.min(slider.max, Math.max(slider.min, at ?? slider.value));
}

// pace is what the points of moving lines are multiplied by: the value, or its root.
export function pace(slider, at) {
  const value = sliderAt(slider, at);
  return slider.root ? Math.sqrt(value) : value;
}

// still is a picture with its moving lines in place. Each line then says how many of
// its points are its own: the last may be one that was added at the axis' end.
export function still(picture, at) {
  const { slider } = picture;
  if (!slider) return { ...picture, lines: picture.lines.map((l) => ({ ...l, own: l.data.length })) };
  const max = picture.x.max ?? furthest(picture);
  const value = pace(slider, at);
  return { ...picture, x: { ...picture.x, max }, lines: picture.lines.map((l) => stillLine(l, value, max)) };
}

// furthest is as far as any line comes at the slider's end.
function furthest({ slider, lines }) {
  const reach = (l) => l.data.filter(Boolean).map((p) => (l.moving && !l.stages ? p[0] * pace(slider, slider.max) : p[0]));
  return lines.flatMap(reach).reduce((a, b) => Math.max(a, b), -Infinity);
}

// stillLine is one line at a value: cut where it leaves the axis, carried on at its
// last height where it ends before.
export function stillLine(line, value, max) {
  if (!line.moving) return { ...line, own: line.data.length };
  if (line.stages) {
    const data = staged(line, value);
    return { ...line, origin: line, data, own: data.length };
  }
  const cut = (points) => {
    const beyond = points.findIndex((p) => p && p[0] * value > max);
    const own = beyond < 0 ? points.length : beyond;
    const list = points.slice(0, own).map((p) => p && [p[0] * value, p[1]]);
    const last = list.at(-1), next = points[own];
    if (!last || last[0] >= max || line.kind === "points") return { list, own };
    const slope = next ? (next[1] - last[1]) / (next[0] * value - last[0]) : 0;
    list.push([max, last[1] + slope * (max - last[0])]);
    return { list, own };
  };
  const { list, own } = cut(line.data);
  return { ...line, origin: line, data: list, own, low: line.low && cut(line.low).list };
}

// staged is a line of stages between the two that a value lies between.
function staged({ stages, data }, value) {
  const n = data.length / stages.length, next = stages.findIndex((s) => s > value);
  const k = Math.max(0, (next < 0 ? stages.length : next) - 1), l = Math.min(k + 1, stages.length - 1);
  const u = l > k ? Math.max(0, (value - stages[k]) / (stages[l] - stages[k])) : 0;
  const from = data.slice(k * n, k * n + n), to = data.slice(l * n, l * n + n);
  return from.map((p, i) => p && to[i] && p.map((v, j) => v + u * (to[i][j] - v)));
}

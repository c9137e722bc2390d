// Colours come from the page's own custom properties, so that one style sheet
// rules all; these are the values where a property is absent. The light ones are
// also those of paper and of saved pictures, whatever the screen shows.
export const light = {
  water: "#1f6aa5", oil: "#b3521b", total: "#2c3236", aid: "#7b7768",
  1: "#7fb3cf", 2: "#4b93b8", 3: "#2b739b", 4: "#1c527a", 5: "#123555",
  ink: "#1d2226", quiet: "#565a5c", rule: "#d9d4c6", paper: "#ffffff",
};

const dark = {
  water: "#6db3ea", oil: "#ee9a5e", total: "#e7e4dc", aid: "#98958a",
  1: "#2f6284", 2: "#3f81ab", 3: "#5ba0ca", 4: "#86c0e2", 5: "#bfe0f4",
  ink: "#e7e4dc", quiet: "#a9aaa3", rule: "#363b3d", paper: "#15181a",
};

const properties = {
  water: "--line-water", oil: "--line-oil", total: "--line-total", aid: "--line-aid",
  1: "--line-1", 2: "--line-2", 3: "--line-3", 4: "--line-4", 5: "--line-5",
  ink: "--ink", quiet: "--quiet", rule: "--rule", paper: "--paper",
};

export const darkScheme = matchMedia("(prefers-color-scheme: dark)");

export function colours(element) {
  const style = getComputedStyle(element);
  const absent = darkScheme.matches ? dark : light;
  const found = {};
  for (const [name, property] of Object.entries(properties)) {
    found[name] = style.getPropertyValue(property).trim() || absent[name];
  }
  return found;
}

// How a role looks beside its colour, so that lines stay apart in grey print and
// for a reader who sees few colours: a pattern for whole lines, another for lines
// the chart calls dashed, a width, a marker. Words take the line's colour where
// that is dark enough to be read.
const roles = {
  water: { colour: "water", whole: null, dashed: [6, 4], width: 2, marker: "circle" },
  oil: { colour: "oil", whole: [14, 3], dashed: [7, 3, 1.5, 3], width: 2, marker: "rect" },
  total: { colour: "total", whole: null, dashed: [3, 3], width: 2.6, marker: "diamond" },
  aid: { colour: "aid", whole: null, dashed: [2, 3], width: 1, marker: "triangle", words: "quiet" },
  time1: { colour: 1, whole: [2, 3], dashed: [2, 3], width: 2, marker: "circle", words: "ink" },
  time2: { colour: 2, whole: [6, 3], dashed: [6, 3], width: 2, marker: "rect", words: "ink" },
  time3: { colour: 3, whole: [10, 3, 2, 3], dashed: [10, 3, 2, 3], width: 2, marker: "diamond", words: "ink" },
  time4: { colour: 4, whole: [16, 3], dashed: [16, 3], width: 2, marker: "triangle", words: "ink" },
  time5: { colour: 5, whole: null, dashed: [4, 4], width: 2, marker: "circle", words: "ink" },
};

// look is how one line of a picture is drawn.
export function look(line, palette) {
  const role = roles[line.role] ?? roles.total;
  return {
    colour: palette[role.colour],
    dash: line.kind === "dashed" ? role.dashed : role.whole,
    width: role.width,
    marker: role.marker,
    words: palette[role.words ?? role.colour],
  };
}

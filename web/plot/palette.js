// Colours come from the page's own custom properties, so that one style sheet
// rules all; these are the values where a property is absent, and the light ones
// are used for paper whatever the screen shows.
export const light = {
  water: "#1b6f8a", oil: "#8a4b14", total: "#3b3b3b", aid: "#8a8578",
  1: "#7fb0bf", 2: "#5a97a9", 3: "#3a7d92", 4: "#1f6279", 5: "#0b465c",
  ink: "#26241f", quiet: "#6a665c", rule: "#e4e0d6", paper: "#ffffff",
};

const dark = {
  water: "#6cc0d8", oil: "#e0a060", total: "#d8d4c8", aid: "#98937f",
  1: "#3f7484", 2: "#5790a1", 3: "#74adbe", 4: "#96cad9", 5: "#c0e6f0",
  ink: "#e8e4d8", quiet: "#a8a394", rule: "#3a382f", paper: "#1c1b17",
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
// the chart calls dashed, a width, a marker.
const roles = {
  water: { colour: "water", whole: null, dashed: [6, 4], width: 2, marker: "circle" },
  oil: { colour: "oil", whole: [14, 3], dashed: [7, 3, 1.5, 3], width: 2, marker: "rect" },
  total: { colour: "total", whole: null, dashed: [3, 3], width: 2.6, marker: "diamond" },
  aid: { colour: "aid", whole: null, dashed: [2, 3], width: 1, marker: "triangle" },
  time1: { colour: 1, whole: [2, 3], dashed: [2, 3], width: 2, marker: "circle" },
  time2: { colour: 2, whole: [6, 3], dashed: [6, 3], width: 2, marker: "rect" },
  time3: { colour: 3, whole: [10, 3, 2, 3], dashed: [10, 3, 2, 3], width: 2, marker: "diamond" },
  time4: { colour: 4, whole: [16, 3], dashed: [16, 3], width: 2, marker: "triangle" },
  time5: { colour: 5, whole: null, dashed: [4, 4], width: 2, marker: "circle" },
};

// look is how one line of a picture is drawn.
export function look(line, palette) {
  const role = roles[line.role] ?? roles.total;
  return {
    colour: palette[role.colour],
    dash: line.kind === "dashed" ? role.dashed : role.whole,
    width: role.width,
    marker: role.marker,
  };
}

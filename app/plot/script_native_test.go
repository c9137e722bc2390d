//go:build !js

package plot

import (
	"bytes"
	"encoding/json"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"
)

const scripts = "../../web/plot"

// evaluate runs expressions in modules of the drawing script, given in the order
// in which they need each other, in Node; each result comes back as JSON text.
func evaluate(t *testing.T, modules []string, expressions []string) []string {
	t.Helper()
	var program bytes.Buffer
	for _, m := range modules {
		text, err := os.ReadFile(filepath.Join(scripts, m))
		if err != nil {
			t.Fatal(err)
		}
		for line := range strings.Lines(string(text)) {
			if !strings.HasPrefix(line, "import ") { // what it imports stands above it
				program.WriteString(line)
			}
		}
	}
	program.WriteString("\nconsole.log(JSON.stringify([" + strings.Join(expressions, ",\n") + "]));\n")
	node := exec.Command("node", "--input-type=module")
	node.Stdin = &program
	var failure bytes.Buffer
	node.Stderr = &failure
	out, err := node.Output()
	if err != nil {
		t.Fatalf("node, which checks the drawing script, did not run: %v\n%s", err, failure.String())
	}
	var results []json.RawMessage
	if err := json.Unmarshal(out, &results); err != nil {
		t.Fatal(err)
	}
	texts := make([]string, len(results))
	for i, r := range results {
		texts[i] = string(r)
	}
	return texts
}

type expectation struct{ expression, want string }

func expect(t *testing.T, modules []string, list []expectation) {
	t.Helper()
	expressions := make([]string, len(list))
	for i, e := range list {
		expressions[i] = e.expression
	}
	for i, got := range evaluate(t, modules, expressions) {
		if got != list[i].want {
			t.Errorf("%s\n got %s\nwant %s", list[i].expression, got, list[i].want)
		}
	}
}

func TestAxesHaveRoundNumbers(t *testing.T) {
	const narrow = "\u202f"
	expect(t, []string{"scale.js"}, []expectation{
		{`ticks([0, 1], 5, linear).map((t) => t.text)`, `["0.0","0.2","0.4","0.6","0.8","1.0"]`},
		{`ticks([0, 1], 4, linear).map((t) => t.text)`, `["0.00","0.25","0.50","0.75","1.00"]`},
		{`ticks([0, 20000], 4, linear).map((t) => t.text)`, `["0","5000","10` + narrow + `000","15` + narrow + `000","20` + narrow + `000"]`},
		{`ticks([-2, 2], 4, linear).map((t) => t.text)`, `["−2","−1","0","1","2"]`},
		{`ticks([0, 4e7], 4, linear).map((t) => t.text)`, `["0","1×10⁷","2×10⁷","3×10⁷","4×10⁷"]`},
		{`ticks([-3, 0], 5, log).map((t) => t.text)`, `["0.001","0.01","0.1","1"]`},
		{`ticks([-6, 0], 5, log).map((t) => t.text)`, `["10⁻⁶","10⁻⁵","10⁻⁴","10⁻³","10⁻²","10⁻¹","1"]`},
		{`ticks([-1, 0.4], 5, log).map((t) => t.text)`, `["0.1","0.2","0.5","1","2"]`},
		{`ticks([Math.log10(5), Math.log10(50)], 3, log).map((t) => t.text)`, `["5","10","20","50"]`},
		{`ticks([Math.log10(610), Math.log10(790)], 4, log).map((t) => t.text)`, `["650","700","750"]`}, // within a decade: evenly
		// Every tick lies on the axis, says its own number, and no two say the same.
		{`[...Array(400)].map((_, i) => {
			const lo = Math.sin(i) * 10 ** (i % 9 - 4), hi = lo + (1.1 + Math.cos(3 * i)) * 10 ** (i % 7 - 3);
			const list = ticks([lo, hi], 2 + (i % 6), linear), slack = 1e-6 * (hi - lo);
			const number = (s) => { const [m, e] = s.replaceAll("\u202f", "").replaceAll("−", "-").split("×10"); return e ? NaN : Number(m); };
			const right = list.every((t) => t.at >= lo - slack && t.at <= hi + slack && !(Math.abs(number(t.text) - t.at) > slack));
			return right && new Set(list.map((t) => t.text)).size === list.length;
		}).every(Boolean)`, `true`},
	})
}

func TestAxesReachRoundTheirData(t *testing.T) {
	expect(t, []string{"scale.js"}, []expectation{
		{`extent({}, [3, 17.2], linear)`, `[0,20]`},         // from zero where zero is near
		{`extent({}, [101, 103.5], linear)`, `[101,103.5]`}, // not where it is far
		{`extent({ min: 0, max: 1 }, [0.2, 0.7], linear)`, `[0,1]`},
		{`extent({ max: 1 }, [0.9, 40], linear)`, `[0,1]`},
		{`extent({}, [5, 5], linear)`, `[0,10]`},
		{`extent({}, [], linear)`, `[0,1]`},
		{`extent({}, [NaN, 1, 4], linear)`, `[0,4]`},
		{`extent({}, [0.013, 23], log).map((u) => 10 ** u).map((v) => v.toPrecision(6))`, `["0.0100000","50.0000"]`},
		{`extent({}, [0, -1, 0.02, 0.9], log).map((u) => 10 ** u).map((v) => v.toPrecision(6))`, `["0.0200000","1.00000"]`},
		{`extent({}, [1e-30, 0.9], log)`, `[-6,0]`}, // six decades are enough
		{`extent({}, [0], log).every(Number.isFinite)`, `true`},
	})
}

func TestReadingsHaveFourDigits(t *testing.T) {
	expect(t, []string{"scale.js"}, []expectation{
		{`[0, 0.0544321, 0.5, -0.5, 12.3456, 1234.56, 12345.6, 1.5e-7, -2e12].map((v) => reading(v))`,
			`["0","0.05443","0.5000","−0.5000","12.35","1235","12` + "\u202f" + `346","1.500×10⁻⁷","−2.000×10¹²"]`},
	})
}

func TestZoomStaysWithinThePicture(t *testing.T) {
	const whole = `{ x: [0, 1], y: [0, 8] }`
	expect(t, []string{"zoom.js"}, []expectation{
		{`zoomed(` + whole + `, ` + whole + `, 0.5, { x: 0.5, y: 4 })`, `{"x":[0.25,0.75],"y":[2,6]}`},
		{`zoomed({ x: [0.25, 0.75], y: [2, 6] }, ` + whole + `, 2, { x: 0.5, y: 4 })`, `null`}, // the whole again
		{`zoomed({ x: [0, 0.5], y: [4, 8] }, ` + whole + `, 1.5, { x: 0.5, y: 4 })`, `{"x":[0,0.75],"y":[2,8]}`},
		{`zoomed({ x: [0, 1e-5], y: [0, 8e-5] }, ` + whole + `, 0.1, { x: 0, y: 0 })`, `{"x":[0,0.00001],"y":[0,0.00008]}`},
		{`boxed([0.75, 0.25], [6, 2], ` + whole + `)`, `{"x":[0.25,0.75],"y":[2,6]}`},
		{`boxed([0, 1], [8, 0], ` + whole + `)`, `null`},
		{`moved({ x: [0.5, 0.75], y: [0, 4] }, ` + whole + `, 2, -1)`, `{"x":[0.75,1],"y":[0,4]}`},
	})
}

// What a reader is told at one place: every line, a drop with both its ends, a
// marker only nearby, a gap not at all.
func TestReadingsTellEveryLineAtOnePlace(t *testing.T) {
	const lay = `{ x: { value: (d) => d / 100 }, y: { value: (d) => d }, courses: [
		{ line: { label: "straight", kind: "line" }, shown: true, dots: [[0, 10], [100, 20]] },
		{ line: { label: "drop", kind: "line" }, shown: true, dots: [[0, 70], [50, 70], [50, 20], [100, 20]] },
		{ line: { label: "gap", kind: "line" }, shown: true, dots: [[0, 1], null, [100, 1]] },
		{ line: { label: "hidden", kind: "line" }, shown: false, dots: [[0, 1], [100, 1]] },
		{ line: { label: "near", kind: "points" }, shown: true, dots: [[0, 3], [46, 4], [57, 5]] },
		{ line: { label: "far", kind: "points" }, shown: true, dots: [[10, 3]] },
		{ line: { label: "band", kind: "band" }, shown: true, dots: [[0, 9], [100, 9]], low: [[0, 7], [100, 7]] },
	] }`
	const picture = `{ x: { short: "Sw", unit: "" }, y: { short: "q", unit: "bbl/d" } }`
	const hard = "\u00a0"
	expect(t, []string{"scale.js", "read.js"}, []expectation{
		{`readings(` + lay + `, 50, ` + picture + `).map((r) => r.line.label + ": " + r.text)`,
			`["straight: 15.00` + hard + `bbl/d","drop: 70.00 and 20.00` + hard + `bbl/d","near: 4.000` + hard + `bbl/d","band: 7.000 to 9.000` + hard + `bbl/d"]`},
		{`heading(` + lay + `, 25, ` + picture + `)`, `"Sw = 0.2500"`},
	})
}

// A moving line stands at x times the slider: cut where it leaves the axis, carried on
// at its last height where it ends before (study.Line).
func TestMovingLinesStandWhereTheSliderSays(t *testing.T) {
	const line = `{ moving: true, kind: "line", data: [[0, 0.8], [0.5, 0.6], [1, 0.5], [1, 0.2]] }`
	const slider = `{ min: 0, max: 4, value: 1, stops: [] }`
	const picture = `{ x: {}, slider: ` + slider + `, lines: [` + line + `, { data: [[2, 1]] }] }`
	expect(t, []string{"still.js"}, []expectation{
		{`stillLine(` + line + `, 0.5, 1).data`, `[[0,0.8],[0.25,0.6],[0.5,0.5],[0.5,0.2],[1,0.2]]`},
		{`stillLine(` + line + `, 0.5, 1).own`, `4`},
		{`stillLine(` + line + `, 1.25, 1).data.map(([x, y]) => [x, y.toFixed(6)])`, `[[0,"0.800000"],[0.625,"0.600000"],[1,"0.540000"]]`}, // a step of 0.375 of 0.625 down
		{`stillLine(` + line + `, 1.25, 1).own`, `2`},
		{`stillLine(` + line + `, 0, 1).data`, `[[0,0.8],[0,0.6],[0,0.5],[0,0.2],[1,0.2]]`},
		{`stillLine({ ...` + line + `, kind: "points" }, 1.25, 1).data`, `[[0,0.8],[0.625,0.6]]`},
		{`[0, 0.5, 1, 2, 9].map((v) => stillLine({ moving: true, stages: [0, 1, 3], data: [[0, 0], [1, 1], [2, 0], [5, 3], [4, 8], [9, 3]] }, v, 1).data)`,
			`[[[0,0],[1,1]],[[1,0],[3,2]],[[2,0],[5,3]],[[3,4],[7,3]],[[4,8],[9,3]]]`}, // as plot.Line.at, TestLinesOfStagesGoStraightBetweenThem
		{`stillLine({ data: [[0, 1]], kind: "line" }, 3, 1)`, `{"data":[[0,1]],"kind":"line","own":1}`},
		{`still(` + picture + `, null).x.max`, `4`}, // nothing limits the axis: as far as the slider brings a line
		{`still(` + picture + `, 3).lines.map((l) => l.data.at(-1))`, `[[4,0.2],[2,1]]`},
		{`still({ ...` + picture + `, slider: { ...` + slider + `, root: true } }, 4).lines.map((l) => l.data.at(-1))`, `[[2,0.2],[2,1]]`},
		{`[null, -1, 2, 9].map((at) => sliderAt(` + slider + `, at))`, `[1,0,2,4]`},
	})
}

func TestSliderTellsItsValue(t *testing.T) {
	const slider = `{ min: 0, max: 2, unit: "PV", stops: [{ label: "breakthrough", at: 0.4123 }] }`
	const hard = "\u00a0"
	expect(t, []string{"scale.js", "still.js", "slide.js"}, []expectation{
		{`[0, 0.4123, 0.41, 1.2345].map((v) => sliderText(` + slider + `, v))`,
			`["0` + hard + `PV","0.412` + hard + `PV, breakthrough","0.410` + hard + `PV","1.23` + hard + `PV"]`},
	})
}

// A pin is the same point after an edit, after a step of the slider, in other units.
func TestPinsComeBack(t *testing.T) {
	const readings = `readings: [{ label: "speed", unit: "", values: [0, 1, 2] }, { label: "Arrives after", unit: "PV", values: [0, 1, 0.5], words: ["never", "", ""] }]`
	const curve = `{ id: "f", label: "flow", data: [[0.2, 0], [0.4, 50], [0.6, 100]], ` + readings + ` }`
	const edited = `{ id: "f", label: "flow", data: [[0.2, 0], [0.3, 9], [0.41, 70], [0.6, 100]], ` + readings + ` }`
	const profile = `{ id: "p", label: "profile", moving: true, data: [[0, 0.6], [1, 0.4], [2, 0.2]], ` + readings + ` }`
	picture := func(line string) string {
		return `{ x: { short: "Sw", unit: "" }, y: { short: "fw", unit: "%" }, lines: [` + line + `] }`
	}
	moving := `{ x: { short: "x/L", unit: "", max: 1 }, y: { short: "Sw", unit: "" }, slider: { min: 0, max: 4, value: 1, stops: [] }, lines: [` + profile + `] }`
	lay := func(lines string) string {
		return `{ courses: ` + lines + `.map((line) => ({ line, shown: true })) }`
	}
	const hard = "\u00a0"
	expect(t, []string{"scale.js", "still.js", "pins.js"}, []expectation{
		{`pinned(` + curve + `, 1, ` + picture(curve) + `)`, `{"line":"f","index":1,"along":0.4,"unit":""}`},
		{`found(pinned(` + curve + `, 1, ` + picture(curve) + `), ` + picture(edited) + `).index`, `2`}, // nearest in x, whatever y
		{`found(pinned(` + profile + `, 1, ` + moving + `), ` + moving + `).along`, `0.4`},              // known by its height
		{`found({ line: "f", index: 2, along: 9, unit: "ft" }, ` + picture(curve) + `)`, `{"line":"f","index":2,"along":0.6,"unit":""}`},
		{`found({ line: "gone", index: 2, along: 9, unit: "" }, ` + picture(curve) + `)`, `{"line":"gone","index":2,"along":9,"unit":""}`},
		{`pinText(pinned(` + curve + `, 2, ` + picture(curve) + `), ` + lay(`still(`+picture(curve)+`, null).lines`) + `, ` + picture(curve) + `)`,
			`"Sw 0.600, fw 100` + hard + `%: speed 2.00; arrives after 0.500` + hard + `PV"`},
		{`pinText(pinned(` + curve + `, 0, ` + picture(curve) + `), ` + lay(`still(`+picture(curve)+`, null).lines`) + `, ` + picture(curve) + `)`,
			`"Sw 0.200, fw 0` + hard + `%: speed 0; arrives after: never"`},
		{`pinText(pinned(` + profile + `, 1, ` + moving + `), ` + lay(`still(`+moving+`, 0.5).lines`) + `, ` + moving + `)`,
			`"Sw 0.400, x/L 0.500: speed 1.00; arrives after 1.00` + hard + `PV"`},
		{`pinText(pinned(` + profile + `, 1, ` + moving + `), ` + lay(`still(`+moving+`, 2).lines`) + `, ` + moving + `)`, // it has left the picture
			`"Sw 0.400: speed 1.00; arrives after 1.00` + hard + `PV"`},
		{`[0.5, 2].map((at) => pinMarks([pinned(` + profile + `, 1, ` + moving + `)], ` + lay(`still(`+moving+`, at).lines`) + `, ` + moving + `).map((m) => [m.label, m.x, m.y]))`,
			`[[["Sw 0.400",0.5,0.4]],[]]`},
	})
}

// The point that is read is the nearest across, then the nearest upwards; the arrow
// keys follow the line, also where it falls straight.
func TestSpotsFollowTheirLine(t *testing.T) {
	const lay = `{ courses: [
		{ line: { id: "plain", own: 1 }, shown: true, dots: [[50, 50]] },
		{ line: { id: "fall", own: 4, readings: [] }, shown: true, dots: [[0, 70], [50, 70], [50, 20], [100, 20], [130, 20]] },
	] }`
	expect(t, []string{"scale.js", "read.js"}, []expectation{
		{`[[48, 60], [48, 30], [3, 0], [99, 99]].map(([x, y]) => spotAt(` + lay + `, x, y).index)`, `[1,2,0,3]`},
		{`spotAt({ courses: [] }, 1, 1)`, `null`},
		{`[1, 60, 500].map((d) => stepped(` + lay + `, { line: { id: "fall" }, index: 1 }, 1, d).index)`, `[2,3,3]`},
		{`[1, 60].map((d) => stepped(` + lay + `, { line: { id: "fall" }, index: 1 }, -1, d).index)`, `[0,0]`},
	})
}

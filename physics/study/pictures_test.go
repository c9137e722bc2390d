package study

import (
	"math"
	"testing"
)

// area is the integral of y over x by trapezes.
func area(x, y []float64) float64 {
	sum := 0.0
	for i := 1; i < len(x); i++ {
		sum += (x[i] - x[i-1]) * (y[i] + y[i-1]) / 2
	}
	return sum
}

func must(t *testing.T, p Part, chart, id string) Line {
	t.Helper()
	l, ok := line(p, chart, id)
	if !ok {
		t.Fatalf("no line %s of %s", id, chart)
	}
	return l
}

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s is %.9g, want %.9g", what, got, want)
	}
}

// Independent SciPy computation, two methods, invented water-wet rock: recovery and
// water cut after some volumes, saturation along the flood. The pictures are polygons:
// between their points they leave the curve by less than 1e-3 of the axis.
func TestFrontPicturesAgainstIndependentValues(t *testing.T) {
	r := withoutGrid(typed([6]float64{0.213, 0.237, 0.327, 0.861, 2.7, 2.15}, 0.00047, 0.00193))
	part := r.Parts[SheetFront]
	pore, cut := must(t, part, "front.recovery", "pore"), must(t, part, "front.waterCut", "reservoir")
	for _, c := range []struct{ q, recovery, cut float64 }{{0.25, 0.25, 0}, {0.5, 0.4410268005754344, 0.8874876734723659}, {1, 0.4750341279128706, 0.9574309675635815}} {
		near(t, "recovery", interpolate(pore.X, pore.Y, c.q), c.recovery, 1e-3)
		near(t, "water cut", interpolate(cut.X, cut.Y, c.q), c.cut, 1e-3)
	}
	// The moving line stands for every volume injected: it is saturation against x/(L Q).
	profile, arrived := must(t, part, "front.profile", "profile"), must(t, part, "front.profile", "breakthrough")
	for i, xi := range []float64{0.115574, 0.462294, 0.809015, 1.155735, 1.502456, 1.849176, 2.195897} {
		want := []float64{0.731894035110887, 0.6857629950047986, 0.6576901090544651, 0.6365615563095491, 0.6191277178057073, 0.6039163801754185, 0.5900975146561885}[i]
		near(t, "saturation", interpolate(profile.X, profile.Y, xi), want, 1e-3)
		near(t, "saturation at breakthrough", interpolate(arrived.X, arrived.Y, xi*0.43262502733173935), want, 1e-3)
	}
	flow := must(t, part, "front.fractionalFlow", "reservoir")
	near(t, "fractional flow at 0.645465", interpolate(flow.X, flow.Y, 0.645465095476452), 0.9574309675635815, 1e-3)
	tangent := must(t, part, "front.fractionalFlow", "tangent")
	near(t, "slope of the tangent", (tangent.Y[1]-tangent.Y[0])/(tangent.X[1]-tangent.X[0]), 2.3114705271851834, 1e-8)
}

// What has entered and not left is in the rock: the area over the initial
// saturation under a profile is the recovery.
func TestProfilesHoldTheWater(t *testing.T) {
	for _, curve := range []string{"corey-fit", "table", "table-linear", "let"} {
		st := Demo()
		st.Rock.Curve = curve
		part := withoutGrid(st).Parts[SheetFront]
		pore := must(t, part, "front.recovery", "pore")
		bt, _ := part.Figure("front.breakthrough")
		swi, _ := part.Figure("front.initialWater")
		for _, multiple := range []float64{1.0 / 3, 2.0 / 3, 1, 2} {
			x, sw := slid(must(t, part, "front.profile", "profile"), multiple*bt.Value, 1)
			near(t, curve+", area of a profile", area(x, sw)-swi.Value, interpolate(pore.X, pore.Y, multiple*bt.Value), 2e-3)
		}
	}
}

// slid is a moving line as it is to be drawn: X times the slider's value, cut at the
// largest x, carried on to it at the last Y.
func slid(l Line, value, most float64) (x, y []float64) {
	for i := range l.X {
		at := l.X[i] * value
		if at > most {
			last := len(x) - 1
			share := (most - x[last]) / (at - x[last])
			return append(x, most), append(y, y[last]+share*(l.Y[i]-y[last]))
		}
		x, y = append(x, at), append(y, l.Y[i])
	}
	return append(x, most), append(y, l.Y[len(l.Y)-1])
}

// Volumes balance at every point and row: what is injected comes out, at reservoir
// conditions, and cumulative volumes are the areas under the rates.
func TestFieldPicturesBalance(t *testing.T) {
	for _, drive := range []string{"rate", "pressure"} {
		st := Demo()
		st.Field.Drive = drive
		part := withoutGrid(st).Parts[SheetField]
		const bw, bo = 1.02, 1.27 // of the demonstration
		oil, water, in := must(t, part, "field.rates", "oil"), must(t, part, "field.rates", "water"), must(t, part, "field.rates", "injection")
		cut := must(t, part, "field.waterCut", "surface")
		for i := range oil.X {
			near(t, "outflow", oil.Y[i]*bo+water.Y[i]*bw, in.Y[i], 1e-12*in.Y[i])
			near(t, "water cut", cut.Y[i], water.Y[i]/(water.Y[i]+oil.Y[i]), 1e-12)
		}
		last := len(oil.X) - 1
		produced, wet, injected := must(t, part, "field.cumulative", "oil"), must(t, part, "field.cumulative", "water"), must(t, part, "field.cumulative", "injection")
		near(t, "area under the oil rate", area(oil.X, oil.Y), produced.Y[last], 1e-3*produced.Y[last])
		near(t, "area under the water rate", area(water.X, water.Y), wet.Y[last], 1e-3*wet.Y[last])
		near(t, "area under the injection rate", area(in.X, in.Y), injected.Y[last], 1e-3*injected.Y[last])
		ratio := must(t, part, "field.waterOilRatio", "ratio")
		near(t, "area under the water-oil ratio", area(ratio.X, ratio.Y), wet.Y[last], 2e-3*wet.Y[last])
		pv, _ := part.Figure("field.poreVolume")
		recovery := must(t, part, "field.recovery", "pore")
		near(t, "recovery", recovery.Y[last], produced.Y[last]*bo/pv.Value, 1e-12)

		columns := map[string][]float64{}
		for _, c := range part.Tables[0].Columns {
			columns[c.Label] = c.Values
		}
		for i, at := range columns["Time"] {
			near(t, "oil rate of the table", columns["Oil rate"][i], interpolate(oil.X, oil.Y, math.Max(at, 1)), 2e-3*oil.Y[0])
			near(t, "volumes of the table", columns["Oil produced"][i]*bo+columns["Water produced"][i]*bw, columns["Injected"][i]*pv.Value, 1e-9*pv.Value)
			near(t, "water cut of the table", columns["Water cut, surface"][i], columns["Water rate"][i]/(columns["Water rate"][i]+columns["Oil rate"][i]), 1e-12)
			near(t, "recovery of the table", columns["Recovery, of the pore volume"][i], columns["Oil produced"][i]*bo/pv.Value, 1e-9)
		}
	}
}

// Curves, points and bands of the rock picture share one reference permeability.
func TestRockPictureIsInOneReference(t *testing.T) {
	const factor = 381.0 / 436.0 // ko(Swi)/k of the demonstration
	st := Demo()
	part := withoutGrid(st).Parts[SheetRock]
	for id, reported := range map[string][]float64{"krw": st.Rock.Table.Krw, "kro": st.Rock.Table.Kro} {
		points, curve, band := must(t, part, "rock.kr", id+"-points"), must(t, part, "rock.kr", id), must(t, part, "rock.kr", id+"-band")
		other := must(t, part, "rock.kr", id+"-let-fit")
		for i, kr := range reported {
			near(t, id+" point", points.Y[i], factor*kr, 1e-15)
		}
		for i := range curve.X {
			if !(band.Low[i] <= curve.Y[i] && curve.Y[i] <= band.Y[i]) {
				t.Errorf("%s at Sw = %g: %g lies outside its band %g to %g", id, curve.X[i], curve.Y[i], band.Low[i], band.Y[i])
			}
			near(t, id+" of the other family", other.Y[i], curve.Y[i], 0.05)
		}
	}
	end, _ := part.Figure("rock.krw0")
	krw := must(t, part, "rock.kr", "krw")
	near(t, "end of krw", krw.Y[len(krw.Y)-1], end.Value, 1e-15)
}

// The same independent computation, for the table of round volumes injected.
func TestVolumeTableAgainstIndependentValues(t *testing.T) {
	part := withoutGrid(typed([6]float64{0.213, 0.237, 0.327, 0.861, 2.7, 2.15}, 0.00047, 0.00193)).Parts[SheetFront]
	columns := map[string][]float64{}
	for _, g := range part.Tables {
		for _, c := range g.Columns {
			if g.ID == "front.volumes" {
				columns[c.Label] = c.Values
			}
		}
	}
	rows := map[float64]int{}
	for i, q := range columns["Injected"] {
		rows[q] = i
	}
	for _, c := range []struct{ q, outlet, cut, average, recovery float64 }{
		{0.5, 0.5977706373116174, 0.8874876734723659, 0.6540268005754344, 0.4410268005754344},
		{1, 0.645465095476452, 0.9574309675635815, 0.6880341279128706, 0.4750341279128706},
		{2, 0.6821798977027791, 0.9843009396912047, 0.7135780183203699, 0.50057801832037},
		{5, 0.7173505979136179, 0.9961723036066469, 0.736489079880383, 0.5234890798803831},
	} {
		i, ok := rows[c.q]
		if !ok {
			t.Errorf("no row of %g PV", c.q)
			continue
		}
		near(t, "outlet saturation", columns["Sw at the producer"][i], c.outlet, 1e-9)
		near(t, "water cut, reservoir", columns["Water cut, reservoir"][i], c.cut, 1e-9)
		near(t, "water cut, surface", columns["Water cut, surface"][i], c.cut, 1e-9) // Bw = Bo
		near(t, "average saturation", columns["Sw, average"][i], c.average, 1e-10)
		near(t, "recovery", columns["Recovery, of the pore volume"][i], c.recovery, 1e-10)
		near(t, "recovery of the oil in place", columns["Recovery, of the oil in place"][i], c.recovery/(1-0.213), 1e-10)
	}
}

// Marks stand where the figures say, on the line they belong to.
func TestMarksStandOnTheirFigures(t *testing.T) {
	r := withoutGrid(Demo())
	value := func(sheet Sheet, id string) float64 {
		f, ok := r.Parts[sheet].Figure(id)
		if !ok {
			t.Fatalf("no figure %s", id)
		}
		return f.Value
	}
	for _, c := range []struct {
		sheet       Sheet
		chart, mark string
		x           string
		y           string // a figure, or empty: any
	}{
		{SheetRock, "rock.kr", "curves cross", "rock.crossover", ""},
		{SheetFront, "front.fractionalFlow", "front", "front.shockSaturation", "front.cutAtBreakthrough"},
		{SheetFront, "front.fractionalFlow", "average at breakthrough", "front.averageAtBreakthrough", ""},
		{SheetFront, "front.recovery", "breakthrough", "front.breakthrough", "front.recoveryAtBreakthrough"},
		{SheetField, "field.recovery", "breakthrough", "field.breakthrough", "field.recoveryAtBreakthrough"},
		{SheetField, "field.recovery", "limit", "field.limitTime", "field.recoveryAtLimit"},
		{SheetField, "field.waterCut", "limit", "field.limitTime", "field.limit"},
		{SheetField, "field.cumulative", "limit", "field.limitTime", "field.oilAtLimit"},
		{SheetField, "field.waterCut", "breakthrough", "field.breakthrough", ""},
	} {
		found := false
		for _, chart := range r.Parts[c.sheet].Charts {
			for _, m := range chart.Marks {
				if chart.ID != c.chart || m.Label != c.mark {
					continue
				}
				found = true
				near(t, c.chart+" "+c.mark+", x", m.X, value(c.sheet, c.x), 1e-9*m.X)
				if c.y != "" {
					near(t, c.chart+" "+c.mark+", y", m.Y, value(c.sheet, c.y), 1e-9*m.Y)
				}
			}
		}
		if !found {
			t.Errorf("%s has no mark %q", c.chart, c.mark)
		}
	}
}

package study

import (
	"fmt"
	"math"
	"math/rand/v2"
	"reflect"
	"strings"
	"testing"

	"brinefront/physics/pattern"
)

// endCases are a block and a pattern of layers; ends are those of the study's curve.
func endCases(t *testing.T) map[string]Study {
	t.Helper()
	block, _, _, _ := layeredCase(t)
	five := block
	five.Field.Pattern.Kind = string(pattern.FiveSpot)
	put(&five, "field.pattern.spacing", 200, "m")
	put(&five, "field.pattern.tubes", 20, "")
	return map[string]Study{"block": block, "five-spot": five}
}

// Columns that repeat the study's own saturations change nothing, to the last bit.
func TestOwnEndsOfTheStudyChangeNothing(t *testing.T) {
	for name, plain := range endCases(t) {
		for _, initial := range []float64{0.213, 0.31} {
			if initial > 0.213 {
				put(&plain, "front.initialWater", initial, "fraction")
			}
			typed := plain
			head, rows, _ := strings.Cut(plain.Field.Layers.Table, "\n")
			typed.Field.Layers.Table = strings.ReplaceAll(head, " ", "\t") + "\tSor(%)\tSwc\tSwi"
			for _, row := range strings.Split(rows, "\n") {
				typed.Field.Layers.Table += fmt.Sprintf("\n%s\t23.7\t0.213\t%v", row, initial)
			}
			got, want := Run(typed), Run(plain)
			if len(got.Problems) > 0 || want.Parts[SheetField].Status != Ready || !reflect.DeepEqual(got.Parts[SheetField], want.Parts[SheetField]) {
				t.Errorf("%s from %g: the answer differs; %v", name, initial, got.Problems)
			}
		}
	}
}

// Two layers of different ends at one pressure difference are two runs of one layer, each
// with its ends typed as those of the curve. The tolerance is that of the tabulated bodies.
func TestLayersOfOwnEndsAreRunsOfTheirOwn(t *testing.T) {
	for name, both := range endCases(t) {
		both.Field.Layers.Table = "m um2 fraction swc swi sor\n3 0.4 0.22 0.15 0.15 0.3\n5 0.09 0.19 0.28 0.34 0.16"
		put(&both, "field.horizon", 300, "d")
		sum := make([]float64, 3)
		place, arrivals := 0.0, []float64{}
		for _, l := range []struct{ h, k, phi, swc, swi, sor float64 }{{3, 0.4, 0.22, 0.15, 0.15, 0.3}, {5, 0.09, 0.19, 0.28, 0.34, 0.16}} {
			one := both
			one.Field.Layers.Table = fmt.Sprintf("m um2 fraction\n%v %v %v", l.h, l.k, l.phi)
			put(&one, "rock.corey.swc", l.swc, "fraction")
			put(&one, "rock.corey.sor", l.sor, "fraction")
			put(&one, "front.initialWater", l.swi, "fraction")
			r := Run(one)
			for i, v := range lastVolumes(t, r) {
				sum[i] += v
			}
			n, _ := r.Parts[SheetField].Figure("field.oilInPlace")
			place += n.Value
			first, _ := r.Parts[SheetFront].Figure("front.breakthrough")
			arrivals = append(arrivals, first.Value)
		}
		r := Run(both)
		tolerance := 1e-7
		if name != "block" {
			tolerance = 4 * tubeTolerance
		}
		for i, v := range lastVolumes(t, r) {
			near(t, name+" volume", v/sum[i], 1, tolerance)
		}
		expect(t, r, 1e-12, map[string]float64{"field.oilInPlace": place})
		tables := r.Parts[SheetField].Tables
		columns := tables[len(tables)-1].Columns
		if columns[8].Values[1] >= 1 {
			t.Errorf("%s: no front is under way", name)
		}
		for i, arrival := range arrivals {
			if name == "block" {
				near(t, "front", columns[8].Values[i], math.Min(1, columns[6].Values[i]/arrival), 1e-8)
			}
			near(t, "residual told", columns[10].Values[i], []float64{0.3, 0.16}[i], 0)
		}
		for _, fault := range faults(r) {
			t.Errorf("%s: %s", name, fault)
		}
	}
}

// lastVolumes are oil, water and injection at the end of the forecast.
func lastVolumes(t *testing.T, r Result) []float64 {
	t.Helper()
	var list []float64
	for _, id := range []string{"oil", "water", "injection"} {
		l := must(t, r.Parts[SheetField], "field.cumulative", id)
		list = append(list, l.Y[len(l.Y)-1])
	}
	return list
}

// Whatever the ends are, what goes in comes out, and in the end all the oil that can move
// does, with crossflow and without it: each layer's own.
func TestVolumesBalanceWithOwnEnds(t *testing.T) {
	rng := rand.New(rand.NewPCG(11, 5))
	st := endCases(t)["block"]
	put(&st, "rock.corey.no", 1.2, "") // little tail, so that the end comes
	for range 12 {
		st.Field.Layers.Table = "m um2 fraction Swc Swi Sor"
		movable, place, pores := 0.0, 0.0, 0.0
		for range 2 + rng.IntN(6) {
			h, phi := 1+4*rng.Float64(), 0.1+0.2*rng.Float64()
			swc, sor := 0.05+0.25*rng.Float64(), 0.1+0.25*rng.Float64()
			st.Field.Layers.Table += fmt.Sprintf("\n%v %v %v %v - %v", h, 0.1+0.3*rng.Float64(), phi, swc, sor)
			movable, place, pores = movable+h*phi*(1-swc-sor), place+h*phi*(1-swc), pores+h*phi
		}
		for _, crossflow := range Crossflows {
			st.Field.Layers.Crossflow = crossflow.Value
			put(&st, "field.horizon", 3000, "yr")
			r := Run(st)
			v := lastVolumes(t, r)
			near(t, "balance", (v[0]+v[1])/v[2], 1, 1e-9)
			n, _ := r.Parts[SheetField].Figure("field.oilInPlace")
			near(t, "oil that moves "+crossflow.Value, v[0]/n.Value, movable/place, 1e-3)
			pistons := must(t, r.Parts[SheetField], "field.recovery", "pistons").Y
			near(t, "oil before pistons", pistons[len(pistons)-1], movable/pores, 1e-6)
		}
	}
}

func TestEndsOfLayersAreRefused(t *testing.T) {
	st := endCases(t)["block"]
	for text, read := range map[string]string{
		"m um2 fraction Swi\n3 0.4 0.2 0.3":                "",
		"m um2 fraction Swi(%) Sor\n3 0.4 0.2 30 -":        "",
		"m um2 fraction Sxi\n3 0.4 0.2 0.3":                "in line 1, \"Sxi\" over column 4",
		"m um2 fraction Swi Swi\n3 0.4 0.2 0.3 0.3":        "in line 1, \"Swi\" over column 5",
		"m um2 fraction Swi\n3 0.4 0.2 30":                 "in line 2, 30",
		"m um2 fraction Swi(ft)\n3 0.4 0.2 0.3":            "in line 1, \"Swi(ft)\" over the column of initial water saturation",
		"m um2 fraction Swi\n3 0.4 0.2 0.3 0.2":            "in line 2, 5 cells",
		"m um2 fraction Swi\n3 0.4 0.2 0.3\n3 0.4 0.2 0.2": "in row 2, Swi = 0.2",
		"m um2 fraction Sor Swi\n3 0.4 0.2 0.4 0.62":       "in row 1, Swi = 0.62",
		"m um2 fraction Sor Swc\n3 0.4 0.2 0.4 0.6":        "in row 1, Swc = 0.6 and Sor = 0.4",
	} {
		st.Field.Layers.Table = text
		problems := Run(st).Problems
		if (len(problems) == 0) != (read == "") || len(problems) > 0 && (!strings.Contains(problems[0].Read, read) || problems[0].Path != layerTable.path || problems[0].Allowed == "") {
			t.Errorf("%q: %+v", text, problems)
		}
		p := CheckText(&st, layerTable.path, text)
		if (p == nil) == (strings.Contains(read, "in line")) {
			t.Errorf("%q is read as %+v", text, p)
		}
	}
	gas := st
	gas.Fluids.Pair = "gas-oil"
	if p := CheckText(&gas, layerTable.path, "m um2 fraction Swi\n3 0.4 0.2 0.3"); p == nil || strings.Contains(p.Allowed, "Swi") {
		t.Errorf("water in a flood of gas: %+v", p)
	}
}

// A layer of less residual oil makes more, one of more water at first makes less.
func TestOwnEndsMatter(t *testing.T) {
	st := endCases(t)["block"]
	at := func(ends string) float64 {
		st.Field.Layers.Table = "m um2 fraction Swi Sor\n3 0.4 0.2 - -\n4 0.1 0.2 " + ends
		f, ok := Run(st).Parts[SheetField].Figure("field.recoveryFull")
		if !ok {
			return math.NaN()
		}
		return f.Value
	}
	if same := at("- -"); !(at("- 0.15") > same && at("0.3 -") < same) {
		t.Errorf("%g, %g with less residual oil, %g with more water", same, at("- 0.15"), at("0.3 -"))
	}
}

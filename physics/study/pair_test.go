package study

import (
	"regexp"
	"strings"
	"testing"

	"brinefront/physics/fluid"
	"brinefront/physics/units"
)

// textsOf are all texts of a part that a reader sees, those that the pair itself says
// left out.
func textsOf(p Part) []string {
	var list []string
	for _, a := range p.Answer {
		list = append(list, a.Text)
	}
	for _, f := range p.Figures {
		list = append(list, f.Label, f.Symbol, f.Working.Formula, f.Working.Method)
		for _, term := range f.Working.Terms {
			list = append(list, term.Label, term.Symbol)
		}
	}
	for _, c := range p.Charts {
		list = append(list, c.Title, c.Summary, c.X.Label, c.X.Symbol, c.Y.Label, c.Y.Symbol)
		for _, l := range c.Lines {
			list = append(list, l.Label)
			for _, r := range l.Readings {
				list = append(list, r.Label, r.Symbol)
			}
		}
	}
	for _, g := range p.Tables {
		for _, c := range g.Columns {
			list = append(list, append([]string{c.Label, c.Symbol}, c.Words...)...)
		}
	}
	for _, n := range p.Notes {
		if !strings.HasPrefix(n.ID, "front.pair.") {
			list = append(list, n.Text, n.Cause, n.Do)
		}
	}
	return list
}

// No word of water and oil is left in a result about other phases.
func TestEveryTextFollowsThePair(t *testing.T) {
	strange := map[fluid.PairID]*regexp.Regexp{
		fluid.GasOil:   regexp.MustCompile(`\b[Ww]ater\b|\bS[w]|\bf[w]\b|krw|µw`),
		fluid.BrineGas: regexp.MustCompile(`\b[Oo]il\b|\bSo|kro|µo`),
		fluid.CO2Brine: regexp.MustCompile(`\b[Oo]il\b|\b[Ww]ater\b|\bSw[^i]|kro|µo|\bfw`),
	}
	for id, words := range strange {
		st := Demo()
		st.Fluids.Pair = string(id)
		dips(&st, 12)
		put(&st, "fluids.tension", 30, "mN/m")
		put(&st, "rock.land", 2, "")
		r := withoutGrid(st)
		for sheet, part := range r.Parts {
			if part.Status != Ready {
				t.Errorf("%s: %s is %s", id, sheet, part.Status)
			}
			for _, text := range textsOf(part) {
				// What is immobile has a name of its own, which may speak of connate water and residual oil.
				pair := pairOf(&st)
				for _, name := range []string{pair.Displacing.ImmobileName, pair.Resident.ImmobileName} {
					text = strings.ReplaceAll(strings.ReplaceAll(text, name, ""), capital(name), "")
				}
				if left := words.FindString(text); left != "" {
					t.Errorf("%s, %s: %q is left in %q", id, sheet, left, text)
				}
			}
		}
		for _, spec := range Specs() {
			if told := spec.For(&st); id == fluid.BrineGas && strings.Contains(told.Label, "il ") || told.Path != spec.Path {
				t.Errorf("%s: the form says %q for %s", id, told.Label, spec.Path)
			}
		}
	}
}

// Names change, numbers do not.
func TestPairChangesNoNumber(t *testing.T) {
	st := Demo()
	want := withoutGrid(st)
	for _, pair := range Pairs {
		st.Fluids.Pair = pair.Value
		got := withoutGrid(st)
		for sheet, part := range want.Parts {
			for _, f := range part.Figures {
				other, ok := got.Parts[sheet].Figure(f.ID)
				if inPlace := strings.HasSuffix(f.ID, "InPlace"); inPlace && pair.Value == string(fluid.GasOil) {
					if ok { // the liquid saturation counts connate water
						t.Errorf("%s: %s is told", pair.Value, f.ID)
					}
				} else if !ok || other.Value != f.Value {
					t.Errorf("%s: %s is %v, with brine and oil %v", pair.Value, f.ID, other.Value, f.Value)
				}
			}
		}
	}
}

func TestWordsAreToldWhole(t *testing.T) {
	p, _ := fluid.PairByID(fluid.CO2Brine)
	w := wordsOf(p)
	for text, want := range map[string]string{
		"Water cut, water-oil ratio of oil and water":   "CO₂ cut, CO₂-brine ratio of brine and CO₂",
		"waterflood, boiled, soil":                      "waterflood, boiled, soil",
		"{fwf} = {krw} / {µw} + {kro} / {µo}, Swf, Sw2": "{fgf} = {krg} / {µg} + {krw} / {µw}, Sgf, Sg2",
		"Swc and Sor":                "Sgc and Swirr",
		"To lower it. So no change.": "To lower it. So no change.",
		"":                           "",
	} {
		if got := w.tell(text); got != want {
			t.Errorf("%q is told as %q, want %q", text, got, want)
		}
	}
	if w.symbol("no") != "nw" || w.symbol("nw") != "ng" || w.symbol("To") != "Tw" {
		t.Errorf("exponents are %s, %s and %s", w.symbol("no"), w.symbol("nw"), w.symbol("To"))
	}
	if brine, _ := fluid.PairByID(fluid.BrineOil); wordsOf(brine) != nil {
		t.Error("texts are changed for the pair they are written for")
	}
}

// Land (1968), by hand: C = 2, Swc = 0.2 and Sgi = 0.8 leave 0.8/(1 + 2) = 0.8/3.
func TestTrappedGas(t *testing.T) {
	st := typed([6]float64{0.2, 0.8 / 3, 0.3, 0.8, 2, 2}, 0.5e-3, 0.02e-3)
	st.Fluids.Pair = "brine-gas"
	put(&st, "rock.land", 2, "")
	r := withoutGrid(st)
	expect(t, r, 1e-14, map[string]float64{"front.trapped": 0.8 / 3})
	f, _ := r.Parts[SheetFront].Figure("front.trapped")
	if note, _ := noteOf(r.Parts[SheetFront], "front.land"); note.Level != "remark" || f.Label != "Trapped gas by Land's law" || f.Symbol != "Sgr,L" {
		t.Errorf("%s, %s: %+v", f.Label, f.Symbol, note)
	}
	put(&st, "rock.corey.sor", 0.1, "fraction")
	if note, _ := noteOf(withoutGrid(st).Parts[SheetFront], "front.land"); note.Level != "caution" {
		t.Errorf("a curve that leaves less than is trapped: %+v", note)
	}
	st.Fluids.Pair = "brine-oil"
	if _, told := withoutGrid(st).Parts[SheetFront].Figure("front.trapped"); told {
		t.Error("oil is trapped by a law for gas")
	}
}

// Perry's Chemical Engineers' Handbook, 9th ed., table 2-135 (read): saturated water at
// 360 K has 326.1 µPa s and 53.698 mol/dm3; at 1 bar, 0.4 bar above saturation, liquid
// water is the same to more than the digits printed. 18.015268 g/mol (IAPWS). The table's
// older formulation of viscosity differs by less than 0.1 %.
func TestWaterByTemperature(t *testing.T) {
	st := typed([6]float64{0.2, 0.2, 0.3, 0.8, 2, 2}, 1, 5e-3)
	dips(&st, 10)
	st.Fluids.WaterViscosity, st.Fluids.WaterDensity = nil, nil
	put(&st, "fluids.temperature", 360, "K")
	put(&st, "fluids.pressure", 1, "bar")
	put(&st, "field.permeability", 100, "md")
	put(&st, "front.velocity", 1, "ft/d")
	r := withoutGrid(st)
	expect(t, r, 1e-3, map[string]float64{"front.waterViscosity": 326.1e-6})
	expect(t, r, 1e-4, map[string]float64{"front.waterDensity": 53698 * 18.015268e-3})
	// Typed values win.
	put(&st, "fluids.waterViscosity", 0.5, "cp")
	typedToo := withoutGrid(st)
	if _, computed := typedToo.Parts[SheetFront].Figure("front.waterViscosity"); computed {
		t.Error("a viscosity is computed though one is typed")
	}
	ratio := func(r Result) float64 { f, _ := r.Parts[SheetFront].Figure("front.endPointMobility"); return f.Value }
	near(t, "mobility ratio", ratio(r)/ratio(typedToo), 0.5e-3/326.1e-6, 1.6e-3)
	// In rock full of brine it is the resident phase that follows from temperature.
	st.Fluids.Pair = "co2-brine"
	st.Fluids.OilViscosity = nil
	put(&st, "fluids.waterDensity", 600, "kg/m3")
	expect(t, withoutGrid(st), 1e-3, map[string]float64{"front.oilViscosity": 326.1e-6})
}

// By definition, u µ/σ.
func TestCapillaryNumber(t *testing.T) {
	st := typed([6]float64{0.2, 0.2, 0.3, 0.8, 2, 2}, 0.5e-3, 5e-3)
	put(&st, "front.velocity", 3.6, "cm/h") // 1e-5 m/s
	put(&st, "fluids.tension", 25, "dyn/cm")
	expect(t, withoutGrid(st), 1e-14, map[string]float64{"front.capillaryNumber": 1e-5 * 0.5e-3 / 0.025})
	for tension, want := range map[float64]string{25: "remark", 1e-3: "caution"} {
		put(&st, "fluids.tension", tension, "mN/m")
		if note, _ := noteOf(withoutGrid(st).Parts[SheetFront], "front.capillarity"); note.Level != want {
			t.Errorf("at %g mN/m: %+v", tension, note)
		}
	}
	st.Front.Velocity = nil
	if f, told := withoutGrid(st).Parts[SheetFront].Figure("front.capillaryNumber"); told {
		t.Errorf("a capillary number of %g without a velocity", f.Value)
	}
}

// Land (1968), by hand as above, from 0.72 of gas: 1/(1/0.72 + 2/0.8) = 0.72/2.8. The curve
// stretched to that is a Corey curve with that residual, so that both answer alike.
func TestCurveEndsByLandsLaw(t *testing.T) {
	const trapped = 0.72 / 2.8
	st := typed([6]float64{0.2, 0.1, 0.3, 0.9, 2.4, 1.9}, 0.4e-3, 0.02e-3)
	st.Fluids.Pair, st.Front.Ending = string(fluid.BrineGas), byLand
	put(&st, "front.initialWater", 0.28, "fraction")
	if missing := withoutGrid(st).Parts[SheetFront].Missing; len(missing) != 1 || missing[0] != "rock.land" {
		t.Fatalf("without Land's coefficient the front waits for %v", missing)
	}
	put(&st, "rock.land", 2, "")
	is := withoutGrid(st)
	st.Front.Ending = "curve"
	put(&st, "rock.corey.sor", trapped, "fraction")
	like := withoutGrid(st)
	want := map[string]float64{}
	for _, id := range []string{"front.breakthrough", "front.recoveryAtOne", "front.shockSaturation", "front.injectedWater"} {
		f, ok := like.Parts[SheetFront].Figure(id)
		if !ok {
			t.Fatalf("no %s", id)
		}
		want[id] = f.Value
	}
	expect(t, is, 1e-9, want)
	near(t, "held at the inlet", want["front.injectedWater"], 1-trapped, 1e-12)
	if _, ok := noteOf(is.Parts[SheetFront], "front.stretched"); !ok {
		t.Error("nothing says that the curve is stretched")
	}
	st.Front.Ending = byLand
	put(&st, "rock.land", 0, "")
	put(&st, "front.initialWater", 0.2, "fraction")
	if problems := withoutGrid(st).Problems; len(problems) != 1 || problems[0].Path != "rock.land" {
		t.Errorf("all gas trapped: %+v", problems)
	}
}

// Gas at surface is told as gas: by hand, 1 rb/Mscf is 5.614583e-3, so that water at equal
// rates of flow in the reservoir and Bw = 1 comes with 5.614583e-3 volumes a volume of gas.
func TestGasIsToldInGasUnits(t *testing.T) {
	for id, want := range map[string]map[string]units.Quantity{
		"brine-gas": {"field.oilAtLimit": units.GasVolume, "field.waterAtLimit": units.Volume, "field.startOilRate": units.GasRate, "field.waterOilRatioAtLimit": units.WaterGasRatio, "field.poreVolume": units.Volume},
		"gas-oil":   {"field.oilAtLimit": units.Volume, "field.waterAtLimit": units.GasVolume, "field.startOilRate": units.Rate, "field.waterOilRatioAtLimit": units.GasOilRatio, "field.startRate": units.Rate},
	} {
		st := Demo()
		st.Fluids.Pair = id
		put(&st, "fluids.waterFormationFactor", 1, "m3/m3")
		put(&st, "fluids.oilFormationFactor", 1, "rb/Mscf")
		put(&st, "field.waterCut", 0.99, "fraction")
		part := withoutGrid(st).Parts[SheetField]
		for figure, quantity := range want {
			if f, ok := part.Figure(figure); !ok || f.Quantity != quantity {
				t.Errorf("%s: %s is a %s, want %s", id, figure, f.Quantity, quantity)
			}
		}
		if id == "brine-gas" {
			cut, _ := part.Figure("field.limitCut")
			ratio, _ := part.Figure("field.waterOilRatioAtLimit")
			near(t, "water-gas ratio", ratio.Value, 5.614583e-3*cut.Value/(1-cut.Value), 1e-6*ratio.Value)
		}
	}
}

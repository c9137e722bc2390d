package study

import (
	"encoding/json"
	"fmt"
	"math"
	"reflect"
	"slices"
	"strings"
	"testing"

	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// variants are studies of every kind that Run meets, by name.
func variants() map[string]Study {
	all := map[string]Study{"empty": Empty(), "demo": Demo(), "full": full(), "cases": withCases()}
	add := func(name string, change func(*Study)) {
		st := Demo()
		change(&st)
		all[name] = st
	}
	for _, curve := range CurveKinds {
		for _, drive := range Drives {
			for _, limit := range Limits {
				for _, reference := range References {
					add(strings.Join([]string{curve.Value, drive.Value, limit.Value, reference.Value}, " "), func(st *Study) {
						st.Rock.Curve, st.Rock.Reference, st.Field.Drive, st.Field.Limit = curve.Value, reference.Value, drive.Value, limit.Value
					})
				}
			}
		}
	}
	for _, spec := range Specs() {
		add("without "+spec.Path, func(st *Study) { spec.Set(st, nil) })
		add("typed curve without "+spec.Path, func(st *Study) { st.Rock.Curve = "corey"; spec.Set(st, nil) })
		for name, si := range map[string]float64{"lowest": spec.Min, "highest": spec.Max} {
			add(name+" "+spec.Path, func(st *Study) {
				unit := units.Of(spec.Quantity)[0]
				spec.Set(st, &Input{Value: unit.FromSI(si), Unit: unit.Symbol})
			})
		}
	}
	for _, kind := range PcKinds {
		for _, at := range PcConditions {
			for _, unit := range []string{"psi", inJ} {
				add(strings.Join([]string{"pc", kind.Value, at.Value, unit}, " "), func(st *Study) {
					withPc(st, kind.Value)
					st.Rock.Capillary.At, st.Rock.Capillary.Unit = at.Value, unit
				})
			}
		}
		for _, spec := range capillarySpecs {
			if asked := (&Study{Rock: Rock{Capillary: Capillary{Curve: kind.Value, At: inLaboratory}}}); !spec.Applies(asked) || spec.Group == amottGroup && kind.Value != "table" {
				continue
			}
			for name, si := range map[string]float64{"lowest": spec.Min, "highest": spec.Max} {
				add(strings.Join([]string{kind.Value, name, spec.Path}, " "), func(st *Study) {
					withPc(st, kind.Value)
					st.Rock.Capillary.At = inLaboratory
					unit := units.Of(spec.Quantity)[0]
					if in := (&Input{Value: unit.FromSI(si), Unit: unit.Symbol}); Check(spec, in.Value, unit) == nil {
						spec.Set(st, in)
					}
				})
				add(strings.Join([]string{kind.Value, "without", spec.Path}, " "), func(st *Study) { withPc(st, kind.Value); spec.Set(st, nil) })
			}
		}
	}
	add("fractured", func(st *Study) { *st = Fractured() })
	for _, flow := range SoakFlows {
		for _, kind := range pcTyped {
			add("soaking "+flow.Value+" "+kind, func(st *Study) {
				*st = soaking()
				st.Soak.Flow, st.Rock.Capillary.Curve = flow.Value, kind
			})
		}
	}
	for _, spec := range soakSpecs {
		for name, si := range map[string]float64{"lowest": spec.Min, "highest": spec.Max, "low": spec.Min + 0.3*(math.Min(spec.Max, 1)-spec.Min)} {
			add("soaking "+name+" "+spec.Path, func(st *Study) {
				*st = soaking()
				st.Soak.Flow = mixedCurrent
				put(st, spec.Path, units.Of(spec.Quantity)[0].FromSI(si), units.Of(spec.Quantity)[0].Symbol)
			})
		}
	}
	add("no table", func(st *Study) { st.Rock.Table = nil })
	add("empty table", func(st *Study) { st.Rock.Table = &Table{} })
	add("no table, typed", func(st *Study) { st.Rock.Table = nil; st.Rock.Curve = "let" })
	add("mobile water", func(st *Study) { st.Front.InitialWater = &Input{Value: 0.41, Unit: "fraction"} })
	add("oil injected too", func(st *Study) { st.Front.InjectedWater = &Input{Value: 0.66, Unit: "fraction"} })
	add("short horizon", func(st *Study) { st.Field.Horizon = &Input{Value: 200, Unit: "d"} })
	add("long horizon", func(st *Study) { st.Field.Horizon = &Input{Value: 300, Unit: "yr"} })
	add("limit in the jump", func(st *Study) { st.Field.WaterCut.Value = 30 })
	add("limit from the start", func(st *Study) { st.Field.Limit = "oilRate"; st.Field.OilRate.Value = 5000 })
	for _, pair := range Pairs {
		add(pair.Value, func(st *Study) {
			st.Fluids.Pair = pair.Value
			put(st, "rock.land", 1.5, "")
		})
	}
	for _, degrees := range []float64{-90, -50, -4, 4, 50, 90} {
		for _, rate := range []float64{2, 50, 960} {
			for _, swi := range []float64{0.227, 0.35, 0.6} {
				add(fmt.Sprintf("dip %g, rate %g, Swi %g", degrees, rate, swi), func(st *Study) {
					dips(st, degrees)
					put(st, "field.rate", rate, "bbl/d")
					put(st, "front.initialWater", swi, "fraction")
					put(st, "fluids.tension", 22, "mN/m")
				})
			}
		}
	}
	add("dip and straight lines", func(st *Study) { dips(st, 33); st.Rock.Curve = "table-linear" })
	add("two steps", func(st *Study) { *st = twoSteps() })
	for _, curve := range []string{"table", "table-linear"} {
		for rate := 800.0; rate < 6000; rate += 800 { // most are passed while one state stays at the producer
			add(fmt.Sprintf("%s at a pressure, to %g bbl/d", curve, rate), func(st *Study) {
				*st = twoSteps()
				st.Rock.Curve, st.Field.Drive, st.Field.Limit = curve, "pressure", "oilRate"
				put(st, "fluids.waterViscosity", 3, "cp")
				put(st, "fluids.oilViscosity", 1, "cp")
				put(st, "field.oilRate", rate, "bbl/d")
			})
		}
	}
	add("no jump", func(st *Study) {
		st.Rock.Curve = "corey"
		st.Rock.Corey.Nw.Value, st.Rock.Corey.No.Value = 1, 1
	})
	add("three points", func(st *Study) {
		st.Rock.Table = &Table{Sw: []float64{0.2, 0.5, 0.7}, Krw: []float64{0, 0.1, 0.3}, Kro: []float64{1, 0.2, 0}}
	})
	add("four points, straight", func(st *Study) {
		st.Rock.Curve = "table-linear"
		st.Rock.Table = &Table{Sw: []float64{0.2, 0.4, 0.5, 0.7}, Krw: []float64{0, 0.05, 0.1, 0.3}, Kro: []float64{1, 0.4, 0.2, 0}}
	})
	add("percent", func(st *Study) {
		for i := range st.Rock.Table.Sw {
			st.Rock.Table.Sw[i] *= 100
		}
	})
	add("swapped", func(st *Study) { t := st.Rock.Table; t.Krw, t.Kro = t.Kro, t.Krw })
	add("turned", func(st *Study) { st.Rock.Table.Krw[5] = 0.001; st.Rock.Curve = "table" })
	for _, limit := range Limits {
		for _, crossflow := range Crossflows {
			for _, drive := range Drives {
				add("layers "+limit.Value+" "+crossflow.Value+" "+drive.Value, func(st *Study) {
					st.Field.Limit, st.Field.Layers.Crossflow, st.Field.Drive = limit.Value, crossflow.Value, drive.Value
					st.Field.Layers.Table = "ft md frac\n7 137 .21\n13 63 0.19\n5 412 24.7%\n10 22 0.163\n9 231 0.228\n"
					put(st, "field.money.oil", 61, "per bbl")
				})
			}
		}
	}
	add("layers lumped, wells, gas", func(st *Study) {
		st.Field.Layers.Table = "m;md;frac\n2,3;137;0,21\n4;63;.19\n1;412;.25\n3;22;.16\n3;231;.23\n2;97;.2"
		put(st, "field.layers.groups", 3, "")
		put(st, "field.wells.radius", 0.35, "ft")
		put(st, "field.wells.injectorSkin", -1, "")
		put(st, "field.wells.producerSkin", 4, "")
		put(st, "field.wells.gas", 0.05, "fraction")
		put(st, "field.wells.pressureLimit", 900, "psi")
		put(st, "field.wells.producerPressure", 600, "psi")
		put(st, "field.wells.depth", 2900, "ft")
		put(st, "field.wells.fractureGradient", 0.7, "psi/ft")
	})
	add("layers in a pattern of wide wells", func(st *Study) {
		st.Field.Pattern.Kind, st.Field.Layers.Table = "seven-spot", "ft md frac\n10 100 0.2\n3 20 0.1"
		put(st, "field.pattern.spacing", 300, "m")
		put(st, "field.wells.radius", 0.7, "m")
		put(st, "field.wells.injectorSkin", -2.4, "")
		put(st, "fluids.waterViscosity", 5, "cp")
		put(st, "fluids.oilViscosity", 0.3, "cp")
	})
	add("soaking behind a steep front", func(st *Study) {
		*st = soaking()
		put(st, "rock.corey.sor", 0, "fraction")
		put(st, "rock.corey.nw", 11.1147712036217, "")
		put(st, "rock.corey.no", 6.895797534116068, "")
		put(st, "rock.capillary.p0", 4792.848905791222, "Pa")
		put(st, "rock.capillary.n", 1.5931551812160405, "")
		put(st, "rock.capillary.swr", 0, "fraction")
	})
	add("soaking above a level stretch", func(st *Study) {
		*st = soaking()
		st.Rock.Capillary.Curve, st.Rock.Capillary.Unit = "table-linear", "psi"
		st.Rock.Capillary.Table = &PcTable{Sw: []float64{0.227, 0.3, 0.4, 0.716}, Pc: []float64{9, 5, 5, 0}}
		put(st, "soak.inlet", 0.38, "fraction")
		put(st, "block.length", 1, "m")
		st.Block.Shape = "box-6"
	})
	add("schedule", func(st *Study) {
		st.Field.Wells.Schedule = "date bbl/d psi\n2027-03-01 500 -\n2028-03-01 - -\n2028-09-01 1200 1500\n2035-01-01 - 1100"
	})
	add("history", func(st *Study) {
		st.Field.History.Table = "date bbl/d bbl/d\n2028-01-01 500 20\n2029-01-01 300 400\n2030-01-01 210 500\n2031-01-01 150 560\n2032-01-01 - 600\n2033-01-01 90 640"
	})
	add("schedule, shut in", func(st *Study) { st.Field.Wells.Schedule = "d bbl/d\n0 500\n90 0" })
	add("not a number", func(st *Study) { st.Rock.Table.Krw[5] = math.NaN() })
	add("plug", func(st *Study) {
		st.Field.Length = &Input{Value: 7.31, Unit: "cm"}
		st.Field.Width = &Input{Value: 3.35, Unit: "cm"}
		st.Field.Thickness = &Input{Value: 3.35, Unit: "cm"}
		st.Field.Rate = &Input{Value: 0.87, Unit: "cm3/min"}
	})
	return all
}

// TestEveryResultIsSound walks through the results of every kind of study.
func TestEveryResultIsSound(t *testing.T) {
	ready := 0
	for name, st := range variants() {
		r := withoutGrid(st)
		if r.Parts[SheetField].Status == Ready {
			ready++
		}
		for _, fault := range faults(r) {
			t.Errorf("%s: %s", name, fault)
		}
		if again := withoutGrid(st); !reflect.DeepEqual(r, again) {
			t.Errorf("%s: a second run differs", name)
		}
	}
	if ready < 50 {
		t.Errorf("only %d kinds of study are answered to the end", ready)
	}
}

// faults lists what is wrong with the form of a result.
func faults(r Result) []string {
	var list []string
	blame := func(format string, a ...any) { list = append(list, fmt.Sprintf(format, a...)) }
	numbers(reflect.ValueOf(r), "result", blame)
	for _, p := range r.Problems {
		if !knownPath(p.Path) || p.Read == "" || p.Allowed == "" {
			blame("problem %+v", p)
		}
	}
	for _, sheet := range Sheets() {
		part, ok := r.Parts[sheet]
		if !ok && (sheet == SheetCompare || sheet == SheetSoak || sheet == SheetMatch || sheet == SheetGrid) {
			continue // the study has no cases, no capillary pressure, asks for no match; the result is withoutGrid
		}
		if !ok {
			blame("no part %s", sheet)
		}
		ids, strip := map[string]bool{}, 0
		for _, f := range part.Figures {
			if f.Strip {
				strip++
			}
			if ids[f.ID] || !strings.HasPrefix(f.ID, string(sheet)+".") || f.Label == "" || f.Symbol == "" {
				blame("figure %q (twice: %v)", f.ID, ids[f.ID])
			}
			ids[f.ID] = true
			if err := checkWorking(f); err != nil {
				blame("%v", err)
			}
			for _, source := range f.Working.Sources {
				if !slices.ContainsFunc(ref.All(), func(s ref.Source) bool { return s.ID == source }) {
					blame("%s cites %q", f.ID, source)
				}
			}
			if len(f.Working.Inputs) == 0 && f.ID != "field.uptime" {
				blame("%s rests on no input", f.ID)
			}
			for _, path := range f.Working.Inputs {
				if !knownPath(path) {
					blame("%s rests on %q", f.ID, path)
				}
			}
		}
		if sheet != SheetCompare && part.Status == Ready && (strip < 4 || strip > 7) {
			blame("the strip of %s has %d figures, want 4 to 7", sheet, strip)
		}
		for _, phrase := range part.Answer {
			if phrase.Figure != "" && !ids[phrase.Figure] {
				blame("the answer of %s names %q", sheet, phrase.Figure)
			}
		}
		for _, path := range part.Missing {
			if !knownPath(path) {
				blame("%s misses %q", sheet, path)
			}
		}
		for _, n := range part.Notes {
			if n.ID == "" || n.Text == "" || n.Do == "" || (n.Level != "caution" && n.Level != "remark") {
				blame("note %+v", n)
			}
			for _, path := range n.Paths {
				if !knownPath(path) {
					blame("note %s is about %q", n.ID, path)
				}
			}
		}
		switch part.Status {
		case Ready:
			if len(part.Answer) == 0 || len(part.Figures) == 0 && sheet != SheetCompare || len(part.Charts) == 0 || len(part.Missing) > 0 {
				blame("%s is ready without an answer", sheet)
			}
		case Waiting:
			if len(part.Missing) == 0 || len(part.Figures) > 0 {
				blame("%s waits for nothing, or has figures", sheet)
			}
		case Refused:
			if len(r.Problems) == 0 || len(part.Figures) > 0 {
				blame("%s is refused without a problem, or has figures", sheet)
			}
		case Stopped:
			if !slices.ContainsFunc(part.Notes, func(n Note) bool { return n.Level == "caution" }) && sheet == SheetRock {
				blame("%s stopped without a note", sheet)
			}
		default:
			blame("%s has status %q", sheet, part.Status)
		}
		for _, c := range part.Charts {
			list = append(list, chartFaults(c)...)
		}
		for _, g := range part.Tables {
			list = append(list, gridFaults(g)...)
		}
	}
	text, err := json.Marshal(r)
	var back Result
	if err != nil || json.Unmarshal(text, &back) != nil || !reflect.DeepEqual(back, r) {
		blame("the result does not survive the way to the interface (%v)", err)
	}
	return list
}

func chartFaults(c Chart) []string {
	var list []string
	if c.ID == "" || c.Title == "" || c.Summary == "" || len(c.Lines) == 0 {
		list = append(list, "chart "+c.ID+" lacks something")
	}
	ids := map[string]bool{}
	for _, l := range c.Lines {
		switch {
		case len(l.X) != len(l.Y) || (l.Kind == "band") != (len(l.Low) == len(l.X) && l.Low != nil):
			list = append(list, fmt.Sprintf("%s %s: %d x, %d y, %d low", c.ID, l.ID, len(l.X), len(l.Y), len(l.Low)))
		case len(l.X) < 2 && l.Kind != "points":
			list = append(list, c.ID+" "+l.ID+" is no line")
		case len(l.X) > 700*max(1, len(l.Stages)) && l.Kind != "points":
			list = append(list, fmt.Sprintf("%s %s has %d points", c.ID, l.ID, len(l.X)))
		case l.Kind == "line" && !c.Map && !slices.IsSorted(l.X):
			list = append(list, c.ID+" "+l.ID+" runs back")
		case ids[l.ID] && l.ID != "tangent":
			list = append(list, c.ID+" "+l.ID+" is there twice")
		}
		ids[l.ID] = true
		for _, reading := range l.Readings {
			if !columnHolds(reading, len(l.X)) || reading.Values == nil {
				list = append(list, c.ID+" "+l.ID+", reading "+reading.Label)
			}
		}
		if (l.Moving || l.Stages != nil) && (c.Slider == nil || c.X.Max == nil || l.Stages != nil && (len(l.Stages) < 2 || len(l.X)%len(l.Stages) != 0 || !slices.IsSorted(l.Stages))) {
			list = append(list, c.ID+" "+l.ID+" moves by nothing")
		}
	}
	if s := c.Slider; s != nil && !(s.Min < s.Max && s.Min <= s.Value && s.Value <= s.Max && s.Label != "") {
		list = append(list, fmt.Sprintf("%s has a slider %+v", c.ID, *s))
	}
	return list
}

func gridFaults(g Grid) []string {
	var list []string
	rows := max(len(g.Columns[0].Values), len(g.Columns[0].Words))
	for _, c := range g.Columns {
		if !columnHolds(c, rows) {
			list = append(list, "table "+g.ID+", column "+c.Label)
		}
	}
	return list
}

// columnHolds reports whether a column has an entry in every row: numbers, words, or
// both, where an empty word leaves the number standing.
func columnHolds(c Column, rows int) bool {
	numbers, words := len(c.Values) == rows, len(c.Words) == rows
	whole := numbers && (words || c.Words == nil) || words && c.Values == nil
	return whole && c.Quantity != "" && c.Label != ""
}

// numbers walks through a value: every number finite, every list there.
func numbers(v reflect.Value, at string, blame func(string, ...any)) {
	switch v.Kind() {
	case reflect.Float64:
		if math.IsNaN(v.Float()) || math.IsInf(v.Float(), 0) {
			blame("%s is %g", at, v.Float())
		}
	case reflect.Slice:
		for i := range v.Len() {
			numbers(v.Index(i), fmt.Sprintf("%s[%d]", at, i), blame)
		}
	case reflect.Map:
		for _, key := range v.MapKeys() {
			numbers(v.MapIndex(key), at+"."+key.String(), blame)
		}
	case reflect.Pointer:
		if !v.IsNil() {
			numbers(v.Elem(), at, blame)
		}
	case reflect.Struct:
		for i := range v.NumField() {
			field := v.Type().Field(i)
			if v.Field(i).Kind() == reflect.Slice && v.Field(i).IsNil() && !strings.Contains(field.Tag.Get("json"), "omitempty") {
				blame("%s.%s is no list", at, field.Name)
			}
			numbers(v.Field(i), at+"."+field.Name, blame)
		}
	}
}

// knownPath reports whether a path names something of the document.
func knownPath(path string) bool {
	if _, inner, ok := AtCase(path); ok {
		path = inner
	}
	if _, ok := Find(path); ok || path == "name" {
		return true
	}
	_, tabled := FindTable(path)
	return tabled || Choices(path) != nil || HasMeaning(path)
}

func TestForecastNeverRunsBack(t *testing.T) {
	rising := map[string]bool{"Time": true, "Injected": true, "Water cut, surface": true, "Oil produced": true, "Water produced": true, "Recovery, of the pore volume": true}
	for name, st := range variants() {
		part := withoutGrid(st).Parts[SheetField]
		for _, g := range part.Tables {
			for _, c := range g.Columns {
				if !rising[c.Label] {
					continue
				}
				for i := 1; i < len(c.Values); i++ {
					if c.Values[i] < c.Values[i-1]*(1-1e-12) {
						t.Errorf("%s: %s falls from %g to %g", name, c.Label, c.Values[i-1], c.Values[i])
					}
				}
			}
		}
	}
}

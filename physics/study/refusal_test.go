package study

import (
	"math"
	"slices"
	"strings"
	"testing"
)

func TestWhatCannotBeUsedIsSaid(t *testing.T) {
	for _, c := range []struct {
		name          string
		change        func(*Study)
		path          string
		read, allowed string
		sheets        []Sheet // refused; the ones before are ready
	}{
		{"Swc + Sor", func(st *Study) {
			st.Rock.Curve = "corey"
			put(st, "rock.corey.swc", 0.5, "fraction")
			put(st, "rock.corey.sor", 50, "%")
		}, "rock.corey.sor", "50 % beside Swc = 0.5", "below 1", []Sheet{SheetRock, SheetFront, SheetField}},
		{"Swc + Sor, at the other field", func(st *Study) {
			st.Rock.Curve = "corey"
			put(st, "rock.corey.swc", 0.5, "fraction")
			put(st, "rock.corey.sor", 50, "%")
		}, "rock.corey.swc", "0.5 beside Sor = 0.5", "Swc below 0.5", []Sheet{SheetRock, SheetFront, SheetField}},
		{"Swi below Swc", func(st *Study) { put(st, "front.initialWater", 20, "%") }, "front.initialWater", "20 %", "from 0.227 to 0.716", []Sheet{SheetFront, SheetField}},
		{"Swi above 1 - Sor", func(st *Study) { put(st, "front.initialWater", 0.8, "fraction") }, "front.initialWater", "0.8", "from 0.227 to 0.716", []Sheet{SheetFront, SheetField}},
		{"Swi at 1 - Sor", func(st *Study) { put(st, "front.initialWater", 0.716, "fraction") }, "front.initialWater", "0.716", "no oil moves", []Sheet{SheetFront, SheetField}},
		{"Swj below Swi", func(st *Study) {
			put(st, "front.initialWater", 0.5, "fraction")
			put(st, "front.injectedWater", 0.4, "fraction")
		}, "front.injectedWater", "0.4", "above the initial saturation Swi = 0.5", []Sheet{SheetFront, SheetField}},
		{"percent", func(st *Study) {
			for i := range st.Rock.Table.Sw {
				st.Rock.Table.Sw[i] *= 100
			}
		}, "rock.table", "Sw up to 71.6", "percent", []Sheet{SheetRock, SheetFront, SheetField}},
		{"swapped", func(st *Study) { st.Rock.Table.Krw, st.Rock.Table.Kro = st.Rock.Table.Kro, st.Rock.Table.Krw }, "rock.table", "krw falls", "swapped", []Sheet{SheetRock, SheetFront, SheetField}},
		{"a table that turns", func(st *Study) { st.Rock.Curve = "table"; st.Rock.Table.Krw[5] = 0.001 }, "rock.table.5.krw", "0.001", "not less than", []Sheet{SheetRock, SheetFront, SheetField}},
		{"out of range", func(st *Study) { put(st, "field.porosity", 130, "%") }, "field.porosity", "130 %", "above 0 to below 100 %", []Sheet{SheetField}},
		{"infinite", func(st *Study) { put(st, "fluids.oilViscosity", math.Inf(1), "cp") }, "fluids.oilViscosity", "", "from", []Sheet{SheetFront, SheetField}},
		{"a unit of another kind", func(st *Study) { put(st, "fluids.oilViscosity", 1, "md") }, "fluids.oilViscosity", "md", `"cp"`, []Sheet{SheetFront, SheetField}},
		{"a dip at constant pressure", func(st *Study) { dips(st, 12); st.Field.Drive = "pressure" }, "front.dip", "12 °", "constant injection rate", []Sheet{SheetFront, SheetField}},
		{"water that boils", func(st *Study) { warm(st, 200, 0); put(st, "fluids.pressure", 10, "bar") }, "fluids.pressure", "10 bar", "from 15.5", []Sheet{SheetFront, SheetField}},
		{"brine too hot", func(st *Study) { warm(st, 300, 5) }, "fluids.temperature", "300 °C", "from 0 to 250 °C", []Sheet{SheetFront, SheetField}},
		{"a tension of nothing", func(st *Study) { put(st, "fluids.tension", 0, "mN/m") }, "fluids.tension", "0 mN/m", "above 0", []Sheet{SheetFront, SheetField}},
		{"not a day", func(st *Study) { st.Field.Start = "tomorrow" }, "field.start", "tomorrow", "year-month-day", []Sheet{SheetField}},
	} {
		st := Demo()
		c.change(&st)
		r := Run(st)
		i := slices.IndexFunc(r.Problems, func(p Problem) bool { return p.Path == c.path })
		if i < 0 {
			t.Errorf("%s: problems %+v, want one at %s", c.name, r.Problems, c.path)
			continue
		}
		if p := r.Problems[i]; !strings.Contains(p.Read, c.read) || !strings.Contains(p.Allowed, c.allowed) {
			t.Errorf("%s: %+v", c.name, p)
		}
		for _, sheet := range []Sheet{SheetRock, SheetFront, SheetField} {
			want := Ready
			if slices.Contains(c.sheets, sheet) {
				want = Refused
			}
			if got := r.Parts[sheet].Status; got != want {
				t.Errorf("%s: %s is %s, want %s", c.name, sheet, got, want)
			}
		}
	}
}

func TestWhatIsMissingIsNamed(t *testing.T) {
	r := Run(Empty())
	for sheet, want := range map[Sheet][]string{
		SheetRock:  {"rock.table"},
		SheetFront: {"rock.table", "fluids.waterViscosity", "fluids.oilViscosity", "fluids.waterFormationFactor", "fluids.oilFormationFactor"},
		SheetField: {"rock.table", "fluids.waterViscosity", "fluids.oilViscosity", "fluids.waterFormationFactor", "fluids.oilFormationFactor",
			"field.length", "field.width", "field.thickness", "field.porosity", "field.rate", "field.waterCut"},
	} {
		part := r.Parts[sheet]
		if part.Status != Waiting || !slices.Equal(part.Missing, want) {
			t.Errorf("%s is %s and misses %v, want %v", sheet, part.Status, part.Missing, want)
		}
	}
}

// Front answers without a word about the field, Rock without one about fluids.
func TestEarlierSheetsAnswerAlone(t *testing.T) {
	st := Demo()
	st.Field = Empty().Field
	r := Run(st)
	if r.Parts[SheetRock].Status != Ready || r.Parts[SheetFront].Status != Ready || r.Parts[SheetField].Status != Waiting {
		t.Errorf("without a field: %s, %s, %s", r.Parts[SheetRock].Status, r.Parts[SheetFront].Status, r.Parts[SheetField].Status)
	}
	st.Fluids = Fluids{}
	if r = Run(st); r.Parts[SheetRock].Status != Ready || r.Parts[SheetFront].Status != Waiting {
		t.Errorf("without fluids: %s, %s", r.Parts[SheetRock].Status, r.Parts[SheetFront].Status)
	}
}

// Every caution and remark that the sheets can raise is raised by a study made for it.
func TestNotesAreRaised(t *testing.T) {
	for id, change := range map[string]func(*Study){
		"front.unstable": func(st *Study) { put(st, "fluids.oilViscosity", 300, "cp") },
		"front.stable":   func(st *Study) { put(st, "fluids.oilViscosity", 1, "cp") },
		"front.noShock": func(st *Study) {
			st.Rock.Curve = "corey"
			put(st, "rock.corey.nw", 1, "")
			put(st, "rock.corey.no", 1, "")
		},
		"front.inlet":                         func(st *Study) { put(st, "front.injectedWater", 0.66, "fraction") },
		"front.mobileWater":                   func(st *Study) { put(st, "front.initialWater", 0.4, "fraction") },
		"front.staircase":                     func(st *Study) { st.Rock.Curve = "table-linear" },
		"unusual.fluids.oilFormationFactor":   func(st *Study) { put(st, "fluids.oilFormationFactor", 0.8, "rb/stb") },
		"unusual.fluids.waterFormationFactor": func(st *Study) { put(st, "fluids.waterFormationFactor", 1.3, "rb/stb") },
		"front.sparse": func(st *Study) {
			t := st.Rock.Table
			t.Sw, t.Krw, t.Kro = thinned(t.Sw), thinned(t.Krw), thinned(t.Kro)
		},
		"field.limitAtStart":     func(st *Study) { st.Field.Limit = "oilRate"; put(st, "field.oilRate", 9000, "bbl/d") },
		"field.limitNever":       func(st *Study) { put(st, "front.injectedWater", 0.55, "fraction") },
		"field.limitLater":       func(st *Study) { put(st, "field.horizon", 1, "yr") },
		"field.long":             func(st *Study) { put(st, "field.rate", 30, "bbl/d") },
		"field.fracture":         func(st *Study) {},
		"field.permeability":     func(st *Study) { st.Field.Drive = "pressure"; put(st, "field.permeability", 5, "md") },
		"rock.converted":         func(st *Study) {},
		"rock.referenceStart":    func(st *Study) { st.Rock.Curve = "corey"; put(st, "rock.corey.kro0", 0.8, "fraction") },
		"rock.referenceAbsolute": func(st *Study) { st.Rock.Curve = "corey"; st.Rock.Reference = "absolute" },
		"rock.points.reference":  func(st *Study) { st.Rock.Reference = "absolute" },
		"rock.fit":               func(st *Study) {},
		"rock.wettability":       func(st *Study) {},
		"rock.exponents":         func(st *Study) {},
		"front.mobility":         func(st *Study) {},
		"front.gravityWeight":    func(st *Study) { dips(st, 12) },
		"front.dipStability":     func(st *Study) { dips(st, 12) },
		"front.waterBack": func(st *Study) {
			dips(st, 40)
			put(st, "field.rate", 20, "bbl/d")
			put(st, "front.initialWater", 0.3, "fraction")
		},
		"front.oilBack": func(st *Study) { dips(st, -40); put(st, "field.rate", 20, "bbl/d") },
		"field.backflow": func(st *Study) {
			dips(st, 40)
			put(st, "field.rate", 20, "bbl/d")
			put(st, "front.initialWater", 0.3, "fraction")
		},
		"field.oilBack":         func(st *Study) { dips(st, -40); put(st, "field.rate", 20, "bbl/d") },
		"field.limitInJump":     func(st *Study) { put(st, "field.waterCut", 0.95, "%") },
		"field.pressureHuge":    func(st *Study) { put(st, "field.permeability", 1e-5, "md") },
		"front.pair.inPlace":    func(st *Study) { st.Fluids.Pair = "gas-oil" },
		"front.gravityUnjudged": func(st *Study) { dips(st, 12); put(st, "front.initialWater", 0.4, "fraction") },
		"front.gravityHolds": func(st *Study) {
			dips(st, 40)
			put(st, "fluids.oilViscosity", 30, "cp")
			put(st, "field.rate", 20, "bbl/d")
		},
		"front.velocityDiffers":      func(st *Study) { dips(st, 12); put(st, "front.velocity", 1, "ft/d") },
		"front.capillarity":          func(st *Study) { put(st, "fluids.tension", 30, "mN/m") },
		"front.land":                 func(st *Study) { st.Fluids.Pair = "brine-gas"; put(st, "rock.land", 2, "") },
		"front.brinePressure":        func(st *Study) { warm(st, 80, 3) },
		"front.brineExtrapolated":    func(st *Study) { warm(st, 15, 3) },
		"front.pair.roles":           func(st *Study) { st.Fluids.Pair = "gas-oil" },
		"front.pair.gas-oil.fingers": func(st *Study) { st.Fluids.Pair = "gas-oil" },
		"front.nothingMoves": func(st *Study) {
			dips(st, -60)
			put(st, "field.rate", 0.2, "bbl/d")
			put(st, "front.initialWater", 0.65, "fraction")
		},
		"rock.otherFamily": func(st *Study) { st.Rock.Table = letTable() },
	} {
		st := Demo()
		change(&st)
		r := Run(st)
		found := false
		for _, part := range r.Parts {
			found = found || slices.ContainsFunc(part.Notes, func(n Note) bool { return n.ID == id })
		}
		if !found {
			t.Errorf("%s is not raised; problems %+v", id, r.Problems)
		}
	}
}

// dips tilts a study's layer, with usual densities.
func dips(st *Study, degrees float64) {
	put(st, "front.dip", degrees, "deg")
	put(st, "fluids.waterDensity", 1031, "kg/m3")
	put(st, "fluids.oilDensity", 797, "kg/m3")
}

// warm gives brine by its temperature and salinity.
func warm(st *Study, celsius, percent float64) {
	st.Fluids.WaterViscosity, st.Fluids.WaterDensity = nil, nil
	put(st, "fluids.temperature", celsius, "degC")
	put(st, "fluids.salinity", percent, "wt%")
}

// letTable holds points of LET curves that no power has the shape of.
func letTable() *Table {
	t := &Table{}
	for i := range 15 {
		s := float64(i) / 14
		t.Sw = append(t.Sw, 0.2+0.5*s)
		t.Krw = append(t.Krw, 0.4*math.Pow(s, 4)/(math.Pow(s, 4)+3*math.Pow(1-s, 4)))
		t.Kro = append(t.Kro, math.Pow(1-s, 4)/(math.Pow(1-s, 4)+3*math.Pow(s, 4)))
	}
	return t
}

// thinned keeps the ends and every fourth value.
func thinned(values []float64) []float64 {
	var list []float64
	for i, v := range values {
		if i%4 == 0 || i == len(values)-1 {
			list = append(list, v)
		}
	}
	return list
}

// Craig's (1971) rules of thumb as the published table prints them: krw at Sor below
// 0.3 of ko(Swi), crossover above 0.5, Swc above 0.2 to 0.25: water-wet; krw above
// 0.5, crossover below 0.5, Swc below 0.15: oil-wet. krw is relative to ko(Swi), not to
// absolute permeability: 0.26 of 0.9 is 0.289 and water-wet.
func TestWettabilitySigns(t *testing.T) {
	for _, c := range []struct {
		corey [6]float64
		says  string
	}{
		{[6]float64{0.26, 0.3, 0.26, 0.9, 4, 2}, "Of 3 signs, 3 point to water-wet and 0 to oil-wet rock: the curves look water-wet."},
		{[6]float64{0.08, 0.2, 0.8, 0.9, 2, 4}, "Of 3 signs, 0 point to water-wet and 3 to oil-wet rock: the curves look oil-wet."},
		{[6]float64{0.26, 0.2, 0.8, 0.9, 2, 4}, "Of 3 signs, 1 point to water-wet and 2 to oil-wet rock: they contradict each other"},
		{[6]float64{0.26, 0.3, 0.36, 0.9, 4, 2}, "Of 3 signs, 2 point to water-wet and 0 to oil-wet rock: the curves look water-wet."},
	} {
		st := typed(c.corey, 1e-3, 2e-3)
		note, ok := noteOf(Run(st).Parts[SheetRock], "rock.wettability")
		if !ok || !strings.HasPrefix(note.Text, c.says) {
			t.Errorf("%v: %+v", c.corey, note)
		}
		st.Fluids.Pair = "gas-oil"
		if _, told := noteOf(Run(st).Parts[SheetRock], "rock.wettability"); told {
			t.Errorf("%v: rules for water and oil are told of gas and oil", c.corey)
		}
	}
}

func noteOf(p Part, id string) (Note, bool) {
	for _, n := range p.Notes {
		if n.ID == id {
			return n, true
		}
	}
	return Note{}, false
}

// Dates are the calendar's own: 2028 is a leap year.
func TestForecastDates(t *testing.T) {
	for _, c := range []struct {
		days float64
		want string
	}{{0, "2028-02-28"}, {1, "2028-02-29"}, {2, "2028-03-01"}, {366, "2029-02-28"}, {1e9, "beyond the calendar"}} {
		if got := date("2028-02-28", c.days*86400); got != c.want {
			t.Errorf("after %g days: %s, want %s", c.days, got, c.want)
		}
	}
}

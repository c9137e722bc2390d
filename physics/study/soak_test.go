package study

import (
	"math"
	"slices"
	"strings"
	"testing"

	"brinefront/physics/units"
)

// soaking is the demonstration with a capillary pressure and a block.
func soaking() Study {
	st := Demo()
	st.Rock.Curve = "corey"
	st.Rock.Capillary.Curve = "van-genuchten"
	for _, given := range []struct {
		path  string
		value float64
		unit  string
	}{
		{"rock.capillary.p0", 3.1, "psi"}, {"rock.capillary.n", 2.9, ""}, {"rock.capillary.entry", 2, "psi"}, {"rock.capillary.lambda", 2.1, ""},
		{"rock.capillary.cw", 0.8, "psi"}, {"rock.capillary.aw", 0.7, ""}, {"rock.capillary.co", -1.1, "psi"}, {"rock.capillary.ao", 0.6, ""},
		{"rock.capillary.a", 0.2, ""}, {"rock.capillary.b", 0.8, ""}, {"fluids.tension", 27, "mN/m"},
		{"soak.length", 31, "cm"}, {"soak.ratio", 0.9, ""},
	} {
		put(&st, given.path, given.value, given.unit)
	}
	return st
}

func soakOf(t *testing.T, st Study) Part {
	t.Helper()
	r := Run(st)
	part := r.Parts[SheetSoak]
	if part.Status != Ready {
		t.Fatalf("Soak is %s, wants %v, refuses %v, notes %v", part.Status, part.Missing, r.Problems, part.Notes)
	}
	return part
}

// TestSoakKeepsItsLaws: uptake is 2 A √t, the profile holds what was taken up, the front is at the far
// boundary when the sheet says so. Identities, by hand.
func TestSoakKeepsItsLaws(t *testing.T) {
	for _, kind := range pcTyped {
		st := soaking()
		st.Rock.Capillary.Curve = kind
		put(&st, "soak.time", 2, "min")
		part := soakOf(t, st)
		a, time := value(t, part, "soak.a"), value(t, part, "soak.time")
		if got := value(t, part, "soak.uptake"); math.Abs(got/(2*a*math.Sqrt(120))-1) > 1e-12 || time != 120 {
			t.Errorf("%s: uptake %v after %v s with A = %v", kind, got, time, a)
		}
		if got, want := value(t, part, "soak.reach"), 0.31*math.Sqrt(time/value(t, part, "soak.arrival")); math.Abs(got/want-1) > 1e-9 {
			t.Errorf("%s: %v deep, by its arrival %v", kind, got, want)
		}
		profile := must(t, part, "soak.profile", "profile")
		water := 0.0 // (Sw - Swi) dx by the trapezium rule, for a root of one second
		start := value(t, part, "soak.initial")
		for i := 1; i < len(profile.X); i++ {
			water += (profile.X[i] - profile.X[i-1]) * (profile.Y[i] + profile.Y[i-1] - 2*start) / 2
		}
		if porosity := 0.213; math.Abs(water*porosity/(2*a)-1) > 1e-2 {
			t.Errorf("%s: the profile holds %v, taken up %v", kind, water*porosity, 2*a)
		}
		if slices.ContainsFunc(profile.Y, func(sw float64) bool { return sw < start-1e-12 }) {
			t.Errorf("%s: a saturation below the start", kind)
		}
	}
}

// TestSoakRate: lower ratio, lower uptake; a mixed flow of ratio 0 is counter-current.
func TestSoakRate(t *testing.T) {
	last := 0.0
	for _, ratio := range []float64{0, 0.5, 0.9, 0.99, 0.999} {
		st := soaking()
		st.Soak.Flow = mixedCurrent
		put(&st, "soak.ratio", ratio, "")
		part := soakOf(t, st)
		a := value(t, part, "soak.a")
		if a <= last {
			t.Errorf("A = %v at R = %v, %v at less", a, ratio, last)
		}
		last = a
		if _, told := noteOf(part, "soak.nearOne"); told != (ratio >= 0.9) {
			t.Errorf("R = %v: told near one %v", ratio, told)
		}
		if ratio == 0 {
			if counter := value(t, soakOf(t, soaking()), "soak.a"); counter != a {
				t.Errorf("counter-current A = %v, with R = 0 %v", counter, a)
			}
		}
	}
}

// TestSoakCautions: each is told where its cause is there, and not otherwise.
func TestSoakCautions(t *testing.T) {
	for _, c := range []struct {
		note, plain string
		change      func(*Study)
		status      Status
	}{
		{"soak.tail", "no front", func(st *Study) { put(st, "soak.initial", 0.3, "fraction") }, Ready},
		{"soak.mixedWet", "short of residual oil", func(st *Study) { st.Rock.Capillary.Curve = "skjaeveland" }, Ready},
		{"soak.ends", "relative permeability from", func(st *Study) { put(st, "rock.capillary.sor", 0.2, "fraction") }, Ready},
		{"soak.past", "far boundary", func(st *Study) { put(st, "soak.time", 3, "yr") }, Ready},
		{"soak.unbounded", "nothing limits the rate", func(st *Study) { st.Soak.Flow = coCurrent }, Stopped},
		{"soak.drainage", "does not soak", func(st *Study) { st.Fluids.Pair = "co2-brine" }, Stopped},
		{"soak.none", "does not soak up", func(st *Study) {
			st.Rock.Capillary.Curve = "skjaeveland"
			put(st, "rock.capillary.cw", 0, "psi")
		}, Stopped},
	} {
		st := soaking()
		if _, told := noteOf(Run(st).Parts[SheetSoak], c.note); told {
			t.Errorf("%s is told without its cause", c.note)
		}
		c.change(&st)
		r := Run(st)
		n, told := noteOf(r.Parts[SheetSoak], c.note)
		if !told || !strings.Contains(n.Text, c.plain) || r.Parts[SheetSoak].Status != c.status {
			t.Errorf("%s: told %v, %q, %s, problems %v", c.note, told, n.Text, r.Parts[SheetSoak].Status, r.Problems)
		}
	}
}

// TestSoakRefuses beside the input at fault.
func TestSoakRefuses(t *testing.T) {
	for path, change := range map[string]func(*Study){
		"soak.initial": func(st *Study) { put(st, "soak.initial", 0.1, "fraction") },
		"front.initialWater": func(st *Study) {
			st.Rock.Capillary.Curve = "skjaeveland"
			put(st, "front.initialWater", 0.65, "fraction")
		},
		"soak.inlet": func(st *Study) { put(st, "soak.inlet", 0.9, "fraction") },
		"soak.ratio": func(st *Study) { st.Soak.Flow = mixedCurrent; put(st, "soak.ratio", 1, "") },
	} {
		st := soaking()
		change(&st)
		part := Run(st).Parts[SheetSoak]
		if part.Status != Refused || len(part.Problems) != 1 || part.Problems[0].Path != path {
			t.Errorf("%s: %s, problems %v", path, part.Status, part.Problems)
		}
	}
}

// TestSoakWaits for what it needs, and is not there without a capillary pressure.
func TestSoakWaits(t *testing.T) {
	st := soaking()
	for _, path := range []string{"soak.length", "field.porosity", "rock.capillary.p0"} {
		spec, _ := Find(path)
		spec.Set(&st, nil)
	}
	part := Run(st).Parts[SheetSoak]
	if part.Status != Waiting || !slices.Equal(part.Missing, []string{"field.porosity", "soak.length", "rock.capillary.p0"}) {
		t.Errorf("%s, missing %v", part.Status, part.Missing)
	}
	if _, asked := Run(Demo()).Parts[SheetSoak]; asked {
		t.Error("a study without capillary pressure is asked to soak")
	}
}

// TestSoakFollowsThePair: brine soaks up into gas, in its own words.
func TestSoakFollowsThePair(t *testing.T) {
	st := soaking()
	st.Fluids.Pair = "brine-gas"
	for _, text := range textsOf(soakOf(t, st)) {
		if strings.Contains(text, "oil") && !strings.Contains(text, "residual oil") {
			t.Errorf("oil is left in %q", text)
		}
	}
}

// TestSoakSliderGoesWithTheRoot: the profile stands at the root of its slider's time.
func TestSoakSliderGoesWithTheRoot(t *testing.T) {
	part := soakOf(t, soaking())
	c := chartOf(t, part, "soak.profile")
	if front := c.Lines[0].X[len(c.Lines[0].X)-1] * math.Sqrt(c.Slider.Marks[0].X); !c.Slider.Root || math.Abs(front/0.31-1) > 1e-9 || c.Slider.Quantity != units.Duration {
		t.Errorf("the front stands at %v m when it meets the far boundary; slider %+v", front, c.Slider)
	}
}

// TestFracturedDemonstration: every sheet answers, and every number says that it is invented.
func TestFracturedDemonstration(t *testing.T) {
	st := DemoOf(FracturedDemo)
	for sheet, part := range Run(st).Parts {
		if part.Status != Ready {
			t.Errorf("%s is %s", sheet, part.Status)
		}
	}
	for _, spec := range Specs() {
		if in := spec.Get(&st); in != nil && in.Source != Invented {
			t.Errorf("%s comes from %q", spec.Path, in.Source)
		}
	}
	if first := DemoOf(""); first.Title != Demo().Title || st.Title == first.Title {
		t.Errorf("the demonstrations are %q and %q", first.Title, st.Title)
	}
}

// TestReleasedSoakKeepsItsMeaning: a block that soaks both ways, between two saturations.
func TestReleasedSoakKeepsItsMeaning(t *testing.T) {
	st := released(t, "v1-soak.json")
	part := soakOf(t, st)
	if st.Soak.Flow != mixedCurrent || value(t, part, "soak.ratio") != 0.4 || value(t, part, "soak.time") != 20*86400 ||
		value(t, part, "soak.initial") != 0.21 || value(t, part, "soak.inlet") != 0.57 {
		t.Errorf("%+v", st.Soak)
	}
}

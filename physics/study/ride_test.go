package study

import (
	"encoding/json"
	"math"
	"math/rand/v2"
	"os"
	"strings"
	"testing"

	"brinefront/physics/units"
)

// riders fill the inputs of every kind with invented values.
var riders = map[string]func(*Study){
	polymer: func(st *Study) {
		put(st, "front.rider.viscosity", 9.4, "cp")
		put(st, "front.rider.retention", 0.17, "PV")
		put(st, "front.rider.inaccessible", 0.08, "fraction")
	},
	salt: func(st *Study) {
		put(st, "front.rider.sor", 0.21, "fraction")
		put(st, "front.rider.krw0", 0.22, "fraction")
		put(st, "front.rider.nw", 3.6, "")
		put(st, "front.rider.no", 2.1, "")
		put(st, "front.rider.retention", 0.09, "PV")
	},
	tracer: func(st *Study) { put(st, "front.rider.peclet", 61, "") },
	riderOfHeat: func(st *Study) {
		put(st, "fluids.temperature", 43, "degC")
		put(st, "front.rider.temperature", 119, "degC")
		put(st, "front.rider.oilViscosity", 1.9, "cp")
		put(st, "front.rider.rockHeat", 2.3, "MJ/(m3.K)")
		put(st, "front.rider.oilHeat", 1.7, "MJ/(m3.K)")
	},
}

// ridden is the demonstration with something that rides along.
func ridden(kind string) Study {
	st := Demo()
	st.Front.Rider.Kind = kind
	riders[kind](&st)
	return st
}

// readRide reads reference values of fronts that ride along.
func readRide(t *testing.T, file string, into any) {
	t.Helper()
	text, err := os.ReadFile("../../testdata/" + file)
	if err == nil {
		err = json.Unmarshal(text, into)
	}
	if err != nil {
		t.Fatal(err)
	}
}

type coreyPair struct {
	Kr  struct{ Swc, Sor, Krw0, Kro0, Nw, No float64 }
	MuW float64 `json:"mu_w"`
	MuO float64 `json:"mu_o"`
}

// Independent SciPy computation, two methods: polymer (chem-01) and water of low salinity
// (chem-03) through the study's door. The estimates of their errors are 1e-10 and less.
func TestIndependentRiders(t *testing.T) {
	var file struct {
		Cases []struct {
			ID     string
			Inputs struct {
				Ahead   coreyPair `json:"fluid_ahead"`
				Behind  coreyPair `json:"fluid_behind"`
				B       float64
				Queries []float64 `json:"pvi_list"`
			}
			Outputs struct {
				Front     float64   `json:"s_front"`
				Speed     float64   `json:"v_front"`
				Bank      float64   `json:"s_bank"`
				Cut       float64   `json:"f_bank"`
				BankPVI   float64   `json:"bank_breakthrough_pvi"`
				FrontPVI  float64   `json:"front_breakthrough_pvi"`
				Recovered []float64 `json:"recovery"`
			}
		}
	}
	readRide(t, "independent/ride.json", &file)
	if len(file.Cases) != 2 {
		t.Fatalf("%d cases, want 2", len(file.Cases))
	}
	for _, c := range file.Cases {
		a, b := c.Inputs.Ahead, c.Inputs.Behind
		st := typed([6]float64{a.Kr.Swc, a.Kr.Sor, a.Kr.Krw0, a.Kr.Kro0, a.Kr.Nw, a.Kr.No}, a.MuW, a.MuO)
		put(&st, "front.rider.retention", c.Inputs.B, "PV")
		st.Front.Rider.Kind = polymer
		if a.Kr == b.Kr {
			put(&st, "front.rider.viscosity", b.MuW, "Pa.s")
		} else {
			st.Front.Rider.Kind = salt
			for name, value := range map[string]float64{"sor": b.Kr.Sor, "krw0": b.Kr.Krw0, "kro0": b.Kr.Kro0} {
				put(&st, "front.rider."+name, value, "fraction")
			}
			put(&st, "front.rider.nw", b.Kr.Nw, "")
			put(&st, "front.rider.no", b.Kr.No, "")
		}
		r, o := withoutGrid(st), c.Outputs
		expect(t, r, 1e-9, map[string]float64{
			"front.ride.speed": o.Speed, "front.ride.arrival": o.FrontPVI, "front.ride.saturation": o.Front,
			"front.ride.bankSaturation": o.Bank, "front.ride.bankCut": o.Cut, "front.ride.bankArrival": o.BankPVI,
		})
		// The pictures are polygons, good to 1e-3 of their axis.
		with := must(t, r.Parts[SheetFront], "front.ride.recovery", "with")
		for i, q := range c.Inputs.Queries {
			if q <= with.X[len(with.X)-1] {
				near(t, c.ID+", recovery", interpolate(with.X, with.Y, q), o.Recovered[i], 1e-3)
			}
		}
		profile := must(t, r.Parts[SheetFront], "front.ride.profile", "saturation")
		near(t, c.ID+", bank in the profile", interpolate(profile.X, profile.Y, (o.Speed+1/o.BankPVI)/2), o.Bank, 1e-3)
		if share := must(t, r.Parts[SheetFront], "front.ride.profile", "share"); share.X[1] != share.X[2] || math.Abs(share.X[1]-o.Speed) > 1e-9 || !share.Moving {
			t.Errorf("%s: the polymer ends at the speeds %v", c.ID, share.X)
		}
		line := must(t, r.Parts[SheetFront], "front.ride.construction", "front")
		near(t, c.ID+", slope of the line", (line.Y[1]-line.Y[0])/(line.X[1]-line.X[0]), o.Speed, 1e-9)
		near(t, c.ID+", the pivot", line.X[0], -c.Inputs.B, 1e-15)
		near(t, c.ID+", the pivot", line.Y[0], 0, 1e-15)
	}
}

// Pope's (1980) construction for quadratic curves, from memory; the derived numbers of the
// cubic 2 (1-S)(S+D) = S [M S² + (1-S)²], Mw = 10, Mp = 1, to their five or six digits.
func TestQuadraticPolymer(t *testing.T) {
	for _, c := range []struct{ d, s3, v, s1, f1, water float64 }{
		{0.1, 0.732477, 1.05986, 0.16502, 0.28088, 1.70211}, {0.2, 0.752244, 0.94738, 0.19719, 0.37629, 1.90827},
	} {
		st := typed([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, 1e-2)
		st.Front.Rider.Kind = polymer
		put(&st, "front.rider.viscosity", 10, "cp")
		put(&st, "front.rider.retention", c.d, "PV")
		expect(t, withoutGrid(st), 4e-5, map[string]float64{
			"front.ride.saturation": c.s3, "front.ride.speed": c.v, "front.ride.arrival": 1 / c.v, "front.ride.bankSaturation": c.s1, "front.ride.bankCut": c.f1, "front.ride.bankArrival": 1 / c.water,
			"front.ride.leastSlug": c.d, // what the rock keeps of a stream of water alone
		})
	}
}

// A slug of polymer by its balance: size x = size/D, and beyond the least slug it lasts.
func TestSlugOfPolymer(t *testing.T) {
	st := ridden(polymer)
	for _, c := range []struct {
		size float64
		note bool
	}{{0.05, true}, {0.16, true}, {0.18, false}, {0.6, false}} {
		put(&st, "front.rider.slug", c.size, "PV")
		r := withoutGrid(st)
		expect(t, r, 1e-12, map[string]float64{"front.ride.spentAt": c.size / 0.17, "front.ride.leastSlug": 0.17})
		part := r.Parts[SheetFront]
		if _, small := noteOf(part, "front.ride.slugSmall"); small != c.note {
			t.Errorf("a slug of %g PV is too small: %v", c.size, small)
		}
		if _, arrives := part.Figure("front.ride.rearArrival"); arrives == c.note {
			t.Errorf("the rear of %g PV arrives: %v", c.size, arrives)
		}
		front, _ := part.Figure("front.ride.arrival")
		if late := front.Label == "Polymer front would arrive after"; late != c.note || part.Answer[len(part.Answer)-1].Text != "." {
			t.Errorf("a slug of %g PV: %s, %+v", c.size, front.Label, part.Answer)
		}
		rear := must(t, part, "front.ride.slug", "rear")
		near(t, "the slug's rear sets out", rear.Y[0], c.size, 0)
		if last := rear.X[len(rear.X)-1]; c.note {
			near(t, "the slug's rear ends", last, c.size/0.17, 1e-6)
		}
	}
}

// Ogata & Banks (1961), from memory, derived numbers to five decimals: concentration at
// the outlet where water alone flows, so that the tracer moves at 1; Pe 10 and 100. Nearly
// all oil is gone at the start: what is left moves the speed by less than the tolerance.
func TestTracerResponse(t *testing.T) {
	for pe, want := range map[float64][3]float64{10: {0.38338, 0.58529, 0.73663}, 100: {0.06492, 0.52807, 0.9138}} {
		st := typed([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, 1e-3)
		put(&st, "front.initialWater", 1-1e-7, "fraction")
		st.Front.Rider.Kind = tracer
		put(&st, "front.rider.peclet", pe, "")
		r := withoutGrid(st)
		expect(t, r, 1e-6, map[string]float64{"front.ride.arrival": 1})
		expect(t, r, 1e-4, map[string]float64{"front.ride.mixing": 3.625 / math.Sqrt(pe)}) // Lake (1989), from memory: four digits
		response := must(t, r.Parts[SheetFront], "front.ride.response", "response")
		for i, q := range []float64{0.8, 1, 1.2} {
			near(t, "concentration", interpolate(response.X, response.Y, q), want[i], 1e-3)
		}
		put(&st, "front.rider.slug", 0.2, "PV")
		r = withoutGrid(st)
		pulse := must(t, r.Parts[SheetFront], "front.ride.response", "response")
		near(t, "pulse", interpolate(pulse.X, pulse.Y, 1), want[1]-want[0], 1e-3)
		near(t, "pulse", interpolate(pulse.X, pulse.Y, 1.2), want[2]-want[1], 1e-3)
	}
	// Retained, it moves at 1/(1 + D).
	st := typed([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, 1e-3)
	put(&st, "front.initialWater", 1-1e-7, "fraction")
	st.Front.Rider.Kind = tracer
	put(&st, "front.rider.retention", 1.5, "PV")
	expect(t, withoutGrid(st), 1e-6, map[string]float64{"front.ride.arrival": 2.5})
}

// Where water alone flows a front of heat moves at 1/(1 + D) of the water, whatever the oil
// holds; derived numbers, from memory, for three porosities, sandstone and fresh water at
// 20 °C: 2650 kg/m3 of 880 J/(kg K) in 998 kg/m3 of 4182 J/(kg K).
func TestFrontOfHeat(t *testing.T) {
	for porosity, want := range map[float64]float64{0.1: 0.1659, 0.2: 0.3091, 0.3: 0.4341} {
		st := typed([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, 1e-3)
		put(&st, "front.initialWater", 1-1e-9, "fraction")
		put(&st, "field.porosity", porosity, "fraction")
		put(&st, "fluids.temperature", 20, "degC")
		put(&st, "fluids.pressure", 1, "atm")
		st.Front.Rider.Kind = riderOfHeat
		put(&st, "front.rider.temperature", 20.001, "degC")
		put(&st, "front.rider.oilViscosity", 1, "cp")
		put(&st, "front.rider.rockHeat", 2650*880, "J/(m3.K)")
		for _, oil := range []float64{0, 1.7} {
			put(&st, "front.rider.oilHeat", oil, "MJ/(m3.K)")
			r := withoutGrid(st)
			f, _ := r.Parts[SheetFront].Figure("front.ride.speed")
			near(t, "speed of heat", f.Value, want, 3e-4) // four digits; water's own 4.177 MJ/(m³ K) for their 4.174 is worth 2.2e-4
		}
	}
	// Perry's handbook, 9th ed., table 2-135 (read): 360 K, 326.1 µPa s; water at 20 °C has
	// 1.0016 mPa s (IAPWS, from memory). A typed viscosity keeps their ratio.
	st := ridden(riderOfHeat)
	put(&st, "fluids.temperature", 20, "degC")
	put(&st, "fluids.pressure", 1, "bar")
	put(&st, "front.rider.temperature", 360, "K")
	put(&st, "fluids.waterViscosity", 2.0032, "cp")
	expect(t, withoutGrid(st), 1e-3, map[string]float64{"front.ride.waterViscosity": 2 * 326.1e-6}) // four digits printed, both sources within 0.1 %
}

// The rear of a slug of heat feels what the front does: all heat is given back, so that no
// slug is ever spent, a larger one adds more, and one as long as all that is drawn adds what
// heat without end does.
func TestSlugOfHeat(t *testing.T) {
	st := ridden(riderOfHeat)
	added := func(part Part) (q, gain float64) {
		line := must(t, part, "front.ride.recovery", "added")
		return line.X[len(line.X)-1], line.Y[len(line.Y)-1]
	}
	end, most := added(withoutGrid(st).Parts[SheetFront])
	last := 0.0
	for _, size := range []float64{0.1, 0.4, 0.9, 5} {
		put(&st, "front.rider.slug", size, "PV")
		part := withoutGrid(st).Parts[SheetFront]
		if note, unfollowed := noteOf(part, "front.ride.slugUnfollowed"); unfollowed {
			t.Fatal(note.Text)
		}
		q, gain := added(part)
		if q != end || gain <= last {
			t.Errorf("a slug of %g PV adds %g after %g PV, a smaller one %g after %g PV", size, gain, q, last, end)
		}
		last = gain
		if _, spent := part.Figure("front.ride.spent"); spent {
			t.Errorf("%g PV of heat are spent", size)
		}
		front, _ := part.Figure("front.ride.arrival")
		if rear, arrives := part.Figure("front.ride.rearArrival"); !arrives || rear.Value <= front.Value {
			t.Errorf("the rear of %g PV arrives after %g, the front after %g", size, rear.Value, front.Value)
		}
	}
	near(t, "a slug longer than all that is injected", last, most, 1e-12)
}

// A passenger that changes nothing adds nothing.
func TestIdlePassengers(t *testing.T) {
	st := ridden(polymer)
	put(&st, "front.rider.viscosity", st.Fluids.WaterViscosity.Value, "cp")
	f, ok := withoutGrid(st).Parts[SheetFront].Figure("front.ride.gainAtOne")
	if !ok || math.Abs(f.Value) > 1e-9 {
		t.Errorf("polymer without viscosity adds %v", f.Value)
	}
}

// The answer of the water flood, its figures and those of the field are the same with
// whatever rides along; only the strip makes room.
func TestWaterFloodStandsBesideRiders(t *testing.T) {
	base := withoutGrid(Demo())
	for kind := range riders {
		got := withoutGrid(ridden(kind))
		for sheet, part := range base.Parts {
			for _, f := range part.Figures {
				if other, ok := got.Parts[sheet].Figure(f.ID); !ok || other.Value != f.Value {
					t.Errorf("%s: %s is %v, alone %v", kind, f.ID, other.Value, f.Value)
				}
			}
		}
		text := ""
		for _, p := range got.Parts[SheetFront].Answer {
			text += p.Text
			if p.Figure != "" {
				text += "{" + p.Figure + "}"
			}
		}
		if !strings.Contains(text, "The "+fronts[kind]+" arrives after {front.ride.arrival}") {
			t.Errorf("%s: %s", kind, text)
		}
	}
}

// riderVariants are studies with riders of every kind, whole and with every input left
// out, at its least and at its most.
func riderVariants() map[string]Study {
	all := map[string]Study{}
	for kind := range riders {
		add := func(name string, change func(*Study)) {
			st := ridden(kind)
			change(&st)
			all[kind+" "+name] = st
		}
		add("whole", func(*Study) {})
		add("with a slug", func(st *Study) { put(st, "front.rider.slug", 0.31, "PV") })
		add("in a dip", func(st *Study) { dips(st, 14) })
		add("down a dip", func(st *Study) { dips(st, -40); put(st, "field.rate", 20, "bbl/d") })
		add("of gas", func(st *Study) { st.Fluids.Pair = "gas-oil" })
		add("into gas", func(st *Study) { st.Fluids.Pair = "brine-gas" })
		add("after water", func(st *Study) {
			put(st, "front.initialWater", 0.55, "fraction")
			put(st, "front.rider.slug", 0.3, "PV")
		})
		add("with oil injected", func(st *Study) { put(st, "front.injectedWater", 0.62, "fraction") })
		add("at constant pressure", func(st *Study) { st.Field.Drive = "pressure" })
		for _, curve := range CurveKinds {
			add(curve.Value, func(st *Study) { st.Rock.Curve = curve.Value; put(st, "front.rider.slug", 0.5, "PV") })
		}
		for _, spec := range riderSpecs {
			if st := ridden(kind); !spec.Applies(&st) {
				continue
			}
			add("without "+spec.Path, func(st *Study) { spec.Set(st, nil) })
			for name, share := range map[string]float64{"least": 1e-6, "most": 1 - 1e-6} {
				add(name+" "+spec.Path, func(st *Study) {
					unit := units.Of(spec.Quantity)[0]
					spec.Set(st, &Input{Value: unit.FromSI(spec.Min + share*(spec.Max-spec.Min)), Unit: unit.Symbol})
				})
			}
		}
	}
	return all
}

func TestEveryRiderIsSound(t *testing.T) {
	answered := 0
	for name, st := range riderVariants() {
		r := withoutGrid(st)
		if _, ok := r.Parts[SheetFront].Figure("front.ride.arrival"); ok {
			answered++
		}
		for _, fault := range faults(r) {
			t.Errorf("%s: %s", name, fault)
		}
		if _, err := Read(Write(st)); err != nil {
			t.Errorf("%s: %v", name, err)
		}
	}
	if answered < 60 {
		t.Errorf("only %d riders are answered", answered)
	}
}

// Random studies with riders whose inputs lie about those of the demonstration.
func TestRandomRidersAreSound(t *testing.T) {
	answered, slugs, count := 0, 0, draws(200)
	for seed := range uint64(count) {
		r := rand.New(rand.NewPCG(seed, 11))
		kind := []string{polymer, salt, tracer, riderOfHeat}[r.IntN(4)]
		st := ridden(kind)
		if r.IntN(2) == 0 && kind != riderOfHeat {
			put(&st, "front.rider.slug", math.Exp(1.2*r.NormFloat64()-1), "PV")
		}
		if r.IntN(3) == 0 {
			put(&st, "front.initialWater", 0.23+0.45*r.Float64(), "fraction")
		}
		st.Rock.Curve = []string{"corey-fit", "corey", "table", "let"}[r.IntN(4)]
		for _, spec := range riderSpecs {
			if in := spec.Get(&st); in != nil {
				unit, _ := units.Find(spec.Quantity, in.Unit)
				if moved := in.Value * math.Exp(0.6*r.NormFloat64()); Check(spec, moved, unit) == nil {
					spec.Set(&st, &Input{Value: moved, Unit: in.Unit})
				}
			}
		}
		result := withoutGrid(st)
		part := result.Parts[SheetFront]
		if _, ok := part.Figure("front.ride.arrival"); ok {
			answered++
		}
		for _, c := range part.Charts {
			if c.ID == "front.ride.slug" {
				slugs++
			}
		}
		for _, fault := range faults(result) {
			t.Errorf("seed %d: %s", seed, fault)
		}
	}
	if answered < count/2 || slugs < count/10 {
		t.Errorf("%d are answered, %d with a slug", answered, slugs)
	}
}

func TestRidersThatCannotBe(t *testing.T) {
	for _, c := range []struct {
		name, kind    string
		change        func(*Study)
		path, allowed string
	}{
		{"pores out of reach", polymer, func(st *Study) { put(st, "front.rider.inaccessible", 0.45, "fraction") }, "front.rider.inaccessible", "up to 0.397, Swc and the retention"},
		{"pores out of reach of a slug", polymer, func(st *Study) {
			put(st, "front.rider.inaccessible", 0.3, "fraction")
			put(st, "front.rider.slug", 0.5, "PV")
		}, "front.rider.inaccessible", "up to 0.227, Swc:"},
		{"no oil to move", salt, func(st *Study) { put(st, "front.rider.sor", 0.8, "fraction") }, "front.rider.sor", "Sor below 0.773"},
		{"an oil like water", riderOfHeat, func(st *Study) { put(st, "front.rider.oilHeat", 4.5, "MJ/(m3.K)") }, "front.rider.oilHeat", "below that of the water, 4.0"},
		{"steam", riderOfHeat, func(st *Study) {
			put(st, "front.rider.temperature", 200, "degC")
			put(st, "fluids.pressure", 10, "bar")
		}, "front.rider.temperature", "liquid at the reservoir pressure"},
	} {
		st := ridden(c.kind)
		c.change(&st)
		r := withoutGrid(st)
		if len(r.Problems) != 1 || r.Problems[0].Path != c.path || !strings.Contains(r.Problems[0].Allowed, c.allowed) {
			t.Errorf("%s: %+v", c.name, r.Problems)
		}
		if r.Parts[SheetRock].Status != Ready || r.Parts[SheetFront].Status != Refused {
			t.Errorf("%s: %s, %s", c.name, r.Parts[SheetRock].Status, r.Parts[SheetFront].Status)
		}
	}
}

func TestRiderNotesAreRaised(t *testing.T) {
	for id, st := range map[string]Study{
		"front.ride.assumptions": ridden(salt), "front.ride.field": ridden(riderOfHeat), "front.ride.sharp": func() Study {
			st := ridden(tracer)
			st.Front.Rider.Peclet = nil
			return st
		}(),
		"front.ride.pair": func() Study { st := ridden(polymer); st.Fluids.Pair = "gas-oil"; return st }(),
		"front.ride.rear": func() Study { st := ridden(polymer); put(&st, "front.rider.slug", 0.5, "PV"); return st }(),
		// Injected with so much oil that its rear outruns it.
		"front.ride.slugUnfollowed": func() Study {
			st := ridden(polymer)
			put(&st, "front.injectedWater", 0.4, "fraction")
			put(&st, "front.rider.slug", 0.5, "PV")
			return st
		}(),
		"front.ride.unsolved": func() Study {
			st := ridden(polymer)
			put(&st, "front.rider.retention", 100, "PV")
			put(&st, "front.injectedWater", 0.24, "fraction")
			return st
		}(),
	} {
		if _, raised := noteOf(withoutGrid(st).Parts[SheetFront], id); !raised {
			t.Errorf("%s is not raised", id)
		}
	}
}

// Into gas nothing is said of oil.
func TestRidersFollowThePair(t *testing.T) {
	for kind := range riders {
		st := ridden(kind)
		st.Fluids.Pair = "brine-gas"
		for _, text := range textsOf(withoutGrid(st).Parts[SheetFront]) {
			if strings.Contains(text, "oil") || strings.Contains(text, "µo") || strings.Contains(text, "kro") {
				t.Errorf("%s: %q", kind, text)
			}
		}
	}
}

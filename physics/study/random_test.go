package study

import (
	"math"
	"math/rand/v2"
	"slices"
	"testing"

	"brinefront/physics/units"
)

// draws are how many random studies a test runs: fewer where it is to be quick, as in
// WebAssembly, where the same ones are run again.
func draws(n int) int {
	if testing.Short() {
		return n / 4
	}
	return n
}

// TestRandomStudiesAreSound runs studies of lawful but arbitrary content, always
// the same ones.
func TestRandomStudiesAreSound(t *testing.T) {
	count := draws(300)
	answered := 0
	for seed := range uint64(count) {
		st := randomStudy(rand.New(rand.NewPCG(seed, 7)))
		if _, err := Read(Write(st)); err != nil {
			t.Fatalf("seed %d: no lawful study: %v", seed, err)
		}
		r := withoutGrid(st)
		if r.Parts[SheetField].Status == Ready {
			answered++
		}
		for _, fault := range faults(r) {
			t.Errorf("seed %d: %s", seed, fault)
		}
	}
	if answered < count/10 {
		t.Errorf("only %d of %d are answered to the end", answered, count)
	}
}

// TestRandomDippingStudiesAreSound: the same for layers that dip, at any rate.
func TestRandomDippingStudiesAreSound(t *testing.T) {
	count := draws(200)
	answered, back := 0, 0
	for seed := range uint64(count) {
		r := rand.New(rand.NewPCG(seed, 11))
		st := randomStudy(r)
		st.Rock.Curve, st.Field.Drive, st.Fluids.Pair = "corey", "rate", Pairs[r.IntN(len(Pairs))].Value
		put(&st, "front.dip", 180*(r.Float64()-0.5), "deg")
		put(&st, "fluids.waterDensity", 100+1000*r.Float64(), "kg/m3")
		put(&st, "fluids.oilDensity", 100+1000*r.Float64(), "kg/m3")
		put(&st, "field.permeability", math.Pow(10, 1+3*r.Float64()), "md")
		put(&st, "front.velocity", math.Pow(10, 1-4*r.Float64()), "ft/d")
		result := withoutGrid(st)
		if part := result.Parts[SheetFront]; part.Status == Ready {
			answered++
			if _, drawn := line(part, "front.fractionalFlow", "back"); drawn {
				back++
			}
		}
		for _, fault := range faults(result) {
			t.Errorf("seed %d: %s", seed, fault)
		}
	}
	if answered < count/5 || back < count/20 {
		t.Errorf("of %d, %d are answered, %d with a phase that flows back", count, answered, back)
	}
}

// randomStudy draws every choice, most inputs and a table. Half of the inputs lie
// near the demonstration's, the rest anywhere in their range.
func randomStudy(r *rand.Rand) Study {
	st := Demo()
	for _, f := range choiceFields {
		*f.at(&st) = f.list[r.IntN(len(f.list))].Value
	}
	for _, spec := range Specs() {
		unit := units.Of(spec.Quantity)[r.IntN(len(units.Of(spec.Quantity)))]
		in := spec.Get(&st)
		switch dice := r.Float64(); {
		case dice < 0.03:
			spec.Set(&st, nil)
			continue
		case in == nil && dice < 0.8:
			continue
		case in != nil && dice < 0.9:
			from, _ := units.Find(spec.Quantity, in.Unit)
			in = &Input{Value: unit.FromSI(from.ToSI(in.Value) * math.Exp(0.4*r.NormFloat64())), Unit: unit.Symbol}
		default:
			share := math.Pow(r.Float64(), 3)
			in = &Input{Value: unit.FromSI(spec.Min + share*(spec.Max-spec.Min)), Unit: unit.Symbol}
		}
		if Check(spec, in.Value, unit) == nil {
			spec.Set(&st, in)
		}
	}
	st.Rock.Table = randomTable(r)
	if table := randomTable(r); r.IntN(3) > 0 {
		st.Rock.Capillary.Table = &PcTable{Sw: table.Sw, Pc: table.Kro}
		for i := range table.Kro {
			table.Kro[i] = 100*table.Kro[i] - 10*r.Float64()
		}
	}
	randomCases(r, &st)
	return st
}

// randomCases gives one study in three some cases, which change a few inputs and
// choices to anything they may be.
func randomCases(r *rand.Rand, st *Study) {
	if r.IntN(3) > 0 {
		return
	}
	for i := range r.IntN(MaxCases + 1) {
		c := Case{Name: "case " + string(rune('A'+i)), Set: map[string]Input{}, Choose: map[string]string{}}
		for range r.IntN(4) {
			spec := specs[r.IntN(len(specs))]
			unit := units.Of(spec.Quantity)[0]
			value := unit.FromSI(spec.Min + math.Pow(r.Float64(), 3)*(spec.Max-spec.Min))
			if Check(spec, value, unit) == nil {
				c.Set[spec.Path] = Input{Value: value, Unit: unit.Symbol}
			}
			f := choiceFields[r.IntN(len(choiceFields))]
			if slices.Contains(CaseChoices(), f.path) {
				c.Choose[f.path] = f.list[r.IntN(len(f.list))].Value
			}
		}
		st.Cases = append(st.Cases, c)
	}
}

// randomTable is a table of a few to some dozens of rows: most rise and fall as
// they must, some are rough, a few are out of order.
func randomTable(r *rand.Rand) *Table {
	rows := 1 + r.IntN(30)
	t := &Table{}
	for range rows {
		t.Sw = append(t.Sw, math.Round(1000*(0.1+0.8*r.Float64()))/1000)
		t.Krw = append(t.Krw, r.Float64()*math.Pow(10, -3*r.Float64()))
		t.Kro = append(t.Kro, r.Float64()*math.Pow(10, -3*r.Float64()))
	}
	if r.Float64() < 0.9 {
		slices.Sort(t.Sw)
		slices.Sort(t.Krw)
		slices.Sort(t.Kro)
		slices.Reverse(t.Kro)
	}
	if r.Float64() < 0.7 {
		t.Krw[0], t.Kro[rows-1] = 0, 0
	}
	return t
}

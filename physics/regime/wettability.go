package regime

import (
	"math"
	"strings"

	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// What the curves say about the rock.
const (
	WaterWet        Class = "water-wet"
	IntermediateWet Class = "intermediate-wet"
	OilWet          Class = "oil-wet"
	Contradictory   Class = "contradictory"
)

// CraigSigns are the three features of water-oil curves that Craig's rules of thumb
// read. Math.NaN() means not known, such as a crossover of curves that do not cross.
type CraigSigns struct {
	// KrwEnd is krw at residual oil relative to ko(Swi), never to absolute permeability:
	// divide krw0 by kro0 where kr refers to absolute.
	KrwEnd float64
	// Crossover is the water saturation at which krw = kro.
	Crossover float64
	// Swc is the connate water saturation.
	Swc float64
}

// Judge reads each sign, in the order of the fields.
//
// Source: Craig (1971), rules of thumb for end point and crossover and for Swc in water-wet
// rock (read), for Swc in oil-wet rock from memory. A saturation between 0.15 and
// 0.25 is left undecided, since Craig's 0.20 to 0.25 is itself a spread.
func (c CraigSigns) Judge() []Verdict {
	between := "between the rules for water-wet and oil-wet rock"
	says := func(w Class) string { return "a sign of " + string(w) + " rock" }
	return []Verdict{
		judge("krw at residual oil relative to ko(Swi)", c.KrwEnd, []band{
			{0.3, false, WaterWet, says(WaterWet)}, {0.5, true, Undecided, between}, {class: OilWet, means: says(OilWet)},
		}, "water-wet below 0.30, oil-wet above 0.50", ref.Craig1971),
		judge("The water saturation where krw = kro", c.Crossover, []band{
			{0.5, false, OilWet, says(OilWet)}, {0.5, true, Undecided, between}, {class: WaterWet, means: says(WaterWet)},
		}, "water-wet above 0.50, oil-wet below 0.50", ref.Craig1971),
		judge("The connate water saturation", c.Swc, []band{
			{0.15, false, OilWet, says(OilWet)}, {0.25, true, Undecided, between}, {class: WaterWet, means: says(WaterWet)},
		}, "water-wet above 0.20 to 0.25, oil-wet below 0.15", ref.Craig1971),
	}
}

// Summary counts the signs. It says water-wet or oil-wet only when at least one sign points
// there and none the other way.
func (c CraigSigns) Summary() Verdict {
	water, oil, all := 0, 0, 0
	for i, v := range c.Judge() {
		switch v.Class {
		case WaterWet:
			water++
		case OilWet:
			oil++
		}
		if known := []float64{c.KrwEnd, c.Crossover, c.Swc}[i]; !math.IsNaN(known) {
			all++
		}
	}
	v := Verdict{Class: Undecided, Range: "Craig's three signs together", Source: ref.Craig1971}
	count := "Of " + units.Format(float64(all), 1) + " signs, " + units.Format(float64(water), 1) + " point to water-wet and " + units.Format(float64(oil), 1) + " to oil-wet rock"
	switch {
	case water > 0 && oil > 0:
		v.Class, v.Text = Contradictory, count+": they contradict each other, as in rock of mixed wettability or with curves from altered rock."
	case water > 0:
		v.Class, v.Text = WaterWet, count+": the curves look water-wet."
	case oil > 0:
		v.Class, v.Text = OilWet, count+": the curves look oil-wet."
	default:
		v.Text = count + ": the curves do not tell."
	}
	return v
}

// AmottHarvey says what the index of Amott and Harvey, from -1 to 1, is a sign of.
//
// Source: Cuiec (1984), from memory.
func AmottHarvey(index float64) Verdict {
	says := func(w Class) string { return "a sign of " + string(w) + " rock" }
	return judge("The Amott-Harvey index", index, []band{
		{-0.3, true, OilWet, says(OilWet)}, {0.3, false, IntermediateWet, says(IntermediateWet)}, {class: WaterWet, means: says(WaterWet)},
	}, "oil-wet up to −0.3, water-wet from 0.3 (from memory)", ref.Cuiec1984)
}

// exponents are Corey exponents by wettability: McPhee, Reed & Zubizarreta (2015) and
// other handbooks of core analysis, from memory. The ranges overlap.
var exponents = []struct {
	class                        Class
	nwLow, nwHigh, noLow, noHigh float64
}{
	{WaterWet, 5, 8, 2, 4},
	{IntermediateWet, 3, 5, 3, 6},
	{OilWet, 2, 3, 6, 8},
}

// CoreyExponents says which wettability both exponents of a Corey pair agree with.
func CoreyExponents(nw, no float64) Verdict {
	v := Verdict{Class: Undecided, Source: ref.McPhee2015}
	var fit, rules []string
	for _, e := range exponents {
		rules = append(rules, string(e.class)+" nw "+number(e.nwLow)+" to "+number(e.nwHigh)+", no "+number(e.noLow)+" to "+number(e.noHigh))
		if e.nwLow <= nw && nw <= e.nwHigh && e.noLow <= no && no <= e.noHigh {
			fit = append(fit, string(e.class))
			v.Class = e.class
		}
	}
	v.Range = strings.Join(rules, "; ") + " (from memory)"
	pair := "Corey exponents nw = " + number(nw) + " and no = " + number(no)
	switch len(fit) {
	case 0:
		v.Text = pair + " together fit no class of wettability."
	case 1:
		v.Text = pair + " are usual for " + fit[0] + " rock."
	default:
		v.Class, v.Text = Undecided, pair+" are usual for "+strings.Join(fit, " and for ")+" rock alike."
	}
	return v
}

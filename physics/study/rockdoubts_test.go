package study

import (
	"strings"
	"testing"

	"brinefront/physics/ref"
	"brinefront/physics/relperm"
)

func answerOf(p Part) string {
	var b strings.Builder
	for _, phrase := range p.Answer {
		b.WriteString(phrase.Text)
	}
	return b.String()
}

// What is doubted in the end points and their reference, and what is not.
func TestRockDoubts(t *testing.T) {
	const absolute, start, exchanged, converted, above, points = "rock.referenceAbsolute", "rock.points.reference", "rock.exchanged", "rock.convertedAboveOne", "rock.aboveOne", "rock.points.above-one"
	corey := func(swc, krw0, kro0 float64) Study {
		return typed([6]float64{swc, 0.2, krw0, kro0, 2, 2}, 0.5e-3, 2e-3)
	}
	toOil := func(st Study, k, ko float64) Study {
		st.Rock.Reference = "oil"
		put(&st, "rock.permeability", k, "md")
		put(&st, "rock.oilPermeability", ko, "md")
		return st
	}
	pair := func(st Study, id string) Study {
		st.Fluids.Pair = id
		return st
	}
	table := func(swc float64, id string) Study {
		st := pair(Demo(), id)
		st.Rock.Reference, st.Rock.Curve = "absolute", "table"
		st.Rock.Table = &Table{Sw: []float64{swc, 0.3, 0.4, 0.5, 0.6}, Krw: []float64{0, 0.02, 0.06, 0.14, 0.3}, Kro: []float64{1, 0.4, 0.2, 0.06, 0}}
		return st
	}
	for name, c := range map[string]struct {
		st    Study
		doubt string // empty: none
	}{
		"kro starts at 1":                    {corey(0.2, 0.3, 1), absolute},
		"oil beside connate water":           {pair(corey(0, 0.3, 1), "gas-oil"), absolute},
		"brine fills the rock":               {pair(corey(0, 0.3, 1), "co2-brine"), ""},
		"CO2 is there at first":              {pair(corey(0.1, 0.3, 1), "co2-brine"), absolute},
		"points from a rock full of brine":   {table(0, "co2-brine"), ""},
		"points from a rock with CO2":        {table(0.1, "co2-brine"), start},
		"points of brine and oil":            {table(0.1, "brine-oil"), start},
		"krw0 above 1":                       {corey(0.2, 1.2, 0.8), above},
		"kro0 above 1":                       {corey(0.2, 0.3, 1.1), above},
		"sound":                              {corey(0.2, 0.3, 0.8), ""},
		"ko(Swi) above k":                    {toOil(corey(0.2, 0.3, 1), 381, 436), exchanged},
		"ko(Swi) below k":                    {toOil(corey(0.2, 0.3, 1), 436, 381), ""},
		"converted above 1":                  {toOil(corey(0.2, 1.5, 1), 436, 381), converted},
		"above 1 only until it is converted": {toOil(corey(0.2, 1.1, 1), 436, 381), ""},
	} {
		t.Run(name, func(t *testing.T) {
			part := withoutGrid(c.st).Parts[SheetRock]
			if part.Status != Ready {
				t.Fatalf("status %s, missing %v", part.Status, part.Missing)
			}
			for _, id := range []string{absolute, start, exchanged, converted, above, points} {
				note, got := noteOf(part, id)
				if got != (id == c.doubt) || got && (note.Level != "caution" || note.Cause == "" || note.Do == "" || len(note.Paths) == 0) {
					t.Errorf("%s is there: %v, want %q: %+v", id, got, c.doubt, note)
				}
			}
		})
	}
}

// A table that starts and ends short of the immobile states is not said to reach them.
func TestTableShortOfItsEnds(t *testing.T) {
	whole := Demo()
	whole.Rock.Curve = "table"
	short := whole
	rows := *whole.Rock.Table
	last := len(rows.Sw) - 1
	short.Rock.Table = &Table{Sw: rows.Sw[3:last], Krw: rows.Krw[3:last], Kro: rows.Kro[3:last]}

	r := withoutGrid(whole)
	if text := answerOf(r.Parts[SheetRock]); !strings.Contains(text, "begins to flow at Swc") || !strings.Contains(text, "oil stops at Sor") {
		t.Errorf("whole table: %q", text)
	}
	r = withoutGrid(short)
	if text := answerOf(r.Parts[SheetRock]); !strings.Contains(text, "flows in the first row") || !strings.Contains(text, "flows in the last row") || strings.Contains(text, "Swc") || strings.Contains(text, "Sor ") {
		t.Errorf("short table: %q", text)
	}
	for id, not := range map[string]string{"front.mobileWater": "above the connate water", "front.inlet": "1 − Sor"} {
		note, found := noteOf(r.Parts[SheetFront], id)
		if !found || strings.Contains(note.Cause, not) || !strings.Contains(note.Cause, "row of the table") {
			t.Errorf("%s: %v, %q", id, found, note.Cause)
		}
	}
	put(&whole, "front.initialWater", 0.41, "fraction")
	if note, _ := noteOf(withoutGrid(whole).Parts[SheetFront], "front.mobileWater"); !strings.Contains(note.Cause, "above the connate water") {
		t.Errorf("whole table from mobile water: %q", note.Cause)
	}
}

// A table's figures say how its rows are joined, and time at a constant pressure
// difference rests on Darcy's law over the displacement, which no handbook need vouch for.
func TestMethodsCiteWhatTheyRestOn(t *testing.T) {
	st := Demo()
	st.Rock.Curve, st.Field.Drive = "table", "pressure"
	put(&st, "field.pressure", 3, "MPa")
	r := withoutGrid(st)
	if f, _ := r.Parts[SheetRock].Figure("rock.krw0"); !strings.Contains(f.Working.Method, "three-point slopes, limited") {
		t.Errorf("krw0: %q", f.Working.Method)
	}
	f, found := r.Parts[SheetField].Figure("field.timePerPoreVolume")
	if !found || !strings.HasPrefix(f.Working.Method, "Darcy's law") {
		t.Errorf("time: %v, %q", found, f.Working.Method)
	}
	for _, source := range f.Working.Sources {
		if source == ref.Dake1978 {
			t.Errorf("time cites %v", f.Working.Sources)
		}
	}
}

// Points that stop short of both ends: the fit tells them where it may, and the figures say
// whether they are ends or rows.
func TestEndsBeyondThePoints(t *testing.T) {
	const swc, sor = 0.18, 0.24
	st := typed([6]float64{swc, sor, 0.35, 0.9, 2.6, 2.1}, 0.5e-3, 2e-3)
	curve := relperm.Corey{Swc: swc, Sor: sor, Krw0: 0.35, Kro0: 0.9, Nw: 2.6, No: 2.1}
	st.Rock.Table = &Table{}
	for i := range 12 {
		sw := swc + 0.03 + (1-sor-swc-0.07)*float64(i)/11
		p := curve.At(sw)
		st.Rock.Table.Sw, st.Rock.Table.Krw, st.Rock.Table.Kro = append(st.Rock.Table.Sw, sw), append(st.Rock.Table.Krw, p.Krw), append(st.Rock.Table.Kro, p.Kro)
	}
	st.Rock.Curve = "table"
	rows := withoutGrid(st).Parts[SheetRock]
	if f, _ := rows.Figure("rock.swc"); f.Label != "Water saturation of the first row" {
		t.Errorf("the first row is called %q", f.Label)
	}
	if f, _ := rows.Figure("rock.sor"); f.Label != "Oil saturation of the last row" {
		t.Errorf("the last row is called %q", f.Label)
	}
	st.Rock.Curve, st.Rock.Ends = "corey-fit", freeEnds
	fitted := withoutGrid(st)
	expect(t, fitted, 1e-5, map[string]float64{"rock.swc": swc, "rock.sor": sor})
	if f, _ := fitted.Parts[SheetRock].Figure("rock.swc"); f.Label != "Connate water" {
		t.Errorf("the fitted end is called %q", f.Label)
	}
	st.Rock.Ends = "table"
	expect(t, withoutGrid(st), 1e-12, map[string]float64{"rock.swc": swc + 0.03, "rock.sor": sor + 0.04})
}

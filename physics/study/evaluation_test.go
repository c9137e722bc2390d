package study

import (
	"reflect"
	"slices"
	"testing"
)

// evaluated is a study taken through every sheet.
func evaluated(st Study) *Evaluation {
	e := (*Memory)(nil).Begin(st)
	for range e.Pieces("") {
	}
	return e
}

// TestPiecesAreTheWhole: whichever sheet is asked for first, it comes first, each comes
// once, and together they are the result of Run; so they are when the iteration is
// broken off anywhere and gone on with from another sheet.
func TestPiecesAreTheWhole(t *testing.T) {
	wrong := Demo()
	wrong.Fluids.OilViscosity.Value = -1
	wrong.Field.Porosity.Value = 3
	gas := withCases()
	gas.Fluids.Pair = "gas-oil"
	for name, st := range map[string]Study{"demo": Demo(), "empty": Empty(), "cases": withCases(), "refused": wrong, "pair": gas} {
		want := withoutGrid(st)
		for _, first := range Sheets() {
			for stop := range len(want.Parts) {
				for _, then := range Sheets() {
					e := skippingGrid((*Memory)(nil).Begin(st))
					var order []Sheet
					parts := map[Sheet]Part{}
					take := func(p Piece) {
						order = append(order, p.Sheet)
						parts[p.Sheet] = p.Part
					}
					for p := range e.Pieces(first) {
						take(p)
						if len(order) > stop {
							break
						}
					}
					for p := range e.Pieces(then) {
						take(p)
					}
					if len(order) != len(want.Parts) || want.Parts[first].Status != "" && order[0] != first {
						t.Errorf("%s, %s first: came %v", name, first, order)
					}
					if got := Whole(parts); !reflect.DeepEqual(got, want) {
						t.Errorf("%s, %s first, broken off after %d, then %s: another result", name, first, stop+1, then)
					}
				}
			}
		}
	}
}

// TestOnlyWhatIsNeededIsComputed: the sheet asked for costs no other than those it needs.
func TestOnlyWhatIsNeededIsComputed(t *testing.T) {
	for first, want := range map[Sheet][]Sheet{
		SheetRock: {SheetRock}, SheetFront: {SheetRock, SheetFront}, SheetField: {SheetRock, SheetFront, SheetField},
	} {
		e := (*Memory)(nil).Begin(withCases())
		for range e.Pieces(first) {
			break
		}
		var computed []Sheet
		for _, sheet := range Sheets() {
			if _, done := e.parts[sheet]; done {
				computed = append(computed, sheet)
			}
		}
		if !slices.Equal(computed, want) {
			t.Errorf("for %s were computed %v, want %v", first, computed, want)
		}
	}
}

// TestJobsAreInOrder: what a sheet needs stands before it, so that there is no ring.
func TestJobsAreInOrder(t *testing.T) {
	var before []Sheet
	for _, j := range jobs() {
		for _, needed := range j.needs {
			if !slices.Contains(before, needed) {
				t.Errorf("%s needs %s, which does not stand before it", j.sheet, needed)
			}
		}
		before = append(before, j.sheet)
	}
}

// slow is an evaluation with a sheet that takes four steps and counts those it took.
func slow(st Study) (e *Evaluation, steps *int) {
	const of = 4
	e, steps = skippingGrid((*Memory)(nil).Begin(st)), new(int)
	e.jobs = append(e.jobs, job{sheet: "slow", needs: []Sheet{SheetRock}, run: func(e *Evaluation, grow growing) Part {
		for i := range of {
			*steps++
			p := newSheet(e.st).close(e.parts[SheetRock].Status)
			if p.Left = 1 - float64(i+1)/of; p.Left == 0 || !grow(p) {
				return p
			}
		}
		panic("not reached")
	}})
	return e, steps
}

// TestALongSheetGrows: its parts come one by one, the last of them whole; broken off it
// goes no further, and is begun anew when it is asked for again.
func TestALongSheetGrows(t *testing.T) {
	e, steps := slow(Demo())
	var left []float64
	for p := range e.Pieces("slow") {
		if p.Sheet == "slow" {
			left = append(left, p.Part.Left)
		}
	}
	if !slices.Equal(left, []float64{0.75, 0.5, 0.25, 0}) || *steps != 4 {
		t.Errorf("left %v after %d steps", left, *steps)
	}
	e, steps = slow(Demo())
	for range e.Pieces("slow") {
		if *steps == 2 {
			break
		}
	}
	if _, done := e.parts["slow"]; done || *steps != 2 {
		t.Errorf("broken off it took %d steps and is done: %t", *steps, done)
	}
	var order []Sheet
	for p := range e.Pieces(SheetFront) {
		order = append(order, p.Sheet)
	}
	if want := []Sheet{SheetFront, SheetRock, SheetField, "slow", "slow", "slow", "slow"}; !slices.Equal(order, want) || *steps != 6 {
		t.Errorf("gone on with, came %v after %d steps", order, *steps)
	}
}

func TestSheetsAreThoseOfTheJobs(t *testing.T) {
	var want []Sheet
	for _, j := range jobs() {
		want = append(want, j.sheet)
	}
	if !slices.Equal(Sheets(), want) {
		t.Errorf("Sheets are %q, the jobs are for %q", Sheets(), want)
	}
}

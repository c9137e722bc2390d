package serve

import (
	"encoding/json"
	"slices"
	"testing"

	"brinefront/app/wire"
	"brinefront/physics/study"
)

// asked is a request for the pieces of a study; nil goes on with the last one.
func asked(t testing.TB, id int, st *study.Study, first study.Sheet) string {
	return written(t, wire.Request{ID: id, Kind: wire.Pieces, Study: st, First: first})
}

// together are the parts of replies as the interface holds them, and the sheets in the
// order in which they came.
func together(replies []wire.Reply) (parts map[study.Sheet]study.Part, order []study.Sheet) {
	parts = map[study.Sheet]study.Part{}
	for _, r := range replies {
		for _, p := range r.Pieces {
			order = append(order, p.Sheet)
			if p.Part != nil {
				parts[p.Sheet] = *p.Part
			}
		}
	}
	return parts, order
}

func text(t *testing.T, v any) string {
	t.Helper()
	b, err := json.Marshal(v)
	if err != nil {
		t.Fatal(err)
	}
	return string(b)
}

// The sheet that is looked at comes in a reply of its own before the others, and
// together they are the result.
func TestTheSheetLookedAtComesFirst(t *testing.T) {
	demo := study.Demo()
	want := text(t, study.Run(demo))
	for _, first := range []study.Sheet{study.SheetRock, study.SheetFront, study.SheetField} {
		replies := answers(t, asked(t, 7, &demo, first))
		parts, order := together(replies)
		if len(replies) < 2 || len(replies[0].Pieces) != 1 || order[0] != first {
			t.Fatalf("%s: %d replies, the sheets came as %v", first, len(replies), order)
		}
		for i, r := range replies {
			if r.ID != 7 || r.Kind != wire.Pieces || r.Failure != "" || r.More != (i < len(replies)-1) {
				t.Errorf("%s: reply %d is %d %s, failure %q, more %t", first, i, r.ID, r.Kind, r.Failure, r.More)
			}
		}
		if got := text(t, study.Whole(parts)); got != want {
			t.Errorf("%s: the pieces make %.300s, want %.300s", first, got, want)
		}
	}
}

// A part that is as it was last sent travels by name alone.
func TestWhatDidNotChangeDoesNotTravel(t *testing.T) {
	var d Desk
	st := study.Demo()
	whole, _ := together(at(t, &d, asked(t, 1, &st, study.SheetFront)))
	st.Field.Porosity = &study.Input{Value: 0.2, Unit: "fraction"}
	changed, order := together(at(t, &d, asked(t, 2, &st, study.SheetFront)))
	want := study.Run(st)
	for _, sheet := range []study.Sheet{study.SheetRock, study.SheetFront, study.SheetField} {
		_, travelled := changed[sheet]
		if differs := text(t, want.Parts[sheet]) != text(t, whole[sheet]); travelled != differs || !slices.Contains(order, sheet) {
			t.Errorf("%s travelled: %t, changed: %t, of %v", sheet, travelled, differs, order)
		}
	}
	if _, travelled := changed[study.SheetRock]; travelled {
		t.Error("the porosity of the field changes the rock")
	}
}

// A newer study that comes in between is answered at once, and the older one no more.
func TestTheNewestStudyWins(t *testing.T) {
	var d Desk
	old, next := study.Demo(), study.Empty()
	var first, last []wire.Reply
	d.Take([]byte(asked(t, 1, &old, study.SheetFront)), heardBy(t, &first))
	turns := 0
	d.Work(func() {
		if turns++; turns == 1 {
			d.Take([]byte(asked(t, 2, &old, study.SheetFront)), func([]byte) { t.Error("one that was superseded before it began is answered") })
			d.Take([]byte(asked(t, 3, &next, study.SheetRock)), heardBy(t, &last))
		}
	})
	if _, order := together(first); len(order) != 1 || !first[len(first)-1].More {
		t.Errorf("of the older study came %v, to the end: %t", order, !first[len(first)-1].More)
	}
	if parts, _ := together(last); text(t, study.Whole(parts)) != text(t, study.Run(next)) {
		t.Error("the newer study is not answered whole")
	}
}

// Another sheet looked at meanwhile comes next, and nothing twice.
func TestAnotherSheetGoesOnWithTheStudy(t *testing.T) {
	var d Desk
	demo := study.Demo()
	var replies []wire.Reply
	hear := heardBy(t, &replies)
	d.Take([]byte(asked(t, 1, &demo, study.SheetRock)), hear)
	turns := 0
	d.Work(func() {
		if turns++; turns == 1 {
			d.Take([]byte(asked(t, 2, nil, study.SheetField)), hear)
		}
	})
	parts, order := together(replies)
	if want := []study.Sheet{study.SheetRock, study.SheetField, study.SheetFront, study.SheetGrid}; !slices.Equal(order, want) || replies[len(replies)-1].ID != 2 {
		t.Errorf("came %v, want %v", order, want)
	}
	if text(t, study.Whole(parts)) != text(t, study.Run(demo)) {
		t.Error("together they are not the result")
	}

	// Both wait: the study of the first is not lost with it.
	replies = nil
	d.Take([]byte(asked(t, 3, &demo, study.SheetRock)), hear)
	d.Take([]byte(asked(t, 4, nil, study.SheetField)), hear)
	d.Work(func() {})
	if _, order := together(replies); len(order) != len(parts) || order[0] != study.SheetField || replies[0].Failure != "" {
		t.Errorf("of two that waited came %v, failure %q", order, replies[0].Failure)
	}
}

// A whole answer, as other pages ask for, is not superseded.
func TestAWholeAnswerIsNotSuperseded(t *testing.T) {
	var d Desk
	demo, empty := study.Demo(), study.Empty()
	var replies []wire.Reply
	hear := heardBy(t, &replies)
	d.Take([]byte(asked(t, 1, &demo, study.SheetRock)), hear)
	d.Take([]byte(written(t, wire.Request{ID: 2, Kind: wire.Run, Study: &demo})), hear)
	d.Take([]byte(written(t, wire.Request{ID: 3, Kind: wire.Run, Study: &empty})), hear)
	d.Take([]byte(asked(t, 4, &empty, study.SheetRock)), hear)
	d.Work(func() {})
	if len(replies) < 3 || replies[0].ID != 2 || replies[1].ID != 3 || text(t, replies[0].Result) != text(t, study.Run(demo)) {
		t.Errorf("%d replies, the first to %d", len(replies), replies[0].ID)
	}
}

// Warming begins after the first answer, ends by itself, and makes way for a request.
func TestWarmingMakesWay(t *testing.T) {
	var d Desk
	turns := 0
	count := func() { turns++ }
	if d.Warm(count) || turns > 0 {
		t.Error("it warms before anything was asked")
	}
	empty := study.Empty()
	at(t, &d, asked(t, 1, &empty, study.SheetFront))
	var replies []wire.Reply
	if !d.Warm(func() {
		if turns++; turns == 2 {
			d.Take([]byte(asked(t, 2, &empty, study.SheetRock)), heardBy(t, &replies))
		}
	}) || turns != 2 {
		t.Errorf("a request has to wait for %d turns", turns)
	}
	d.Work(count)
	if len(replies) == 0 || replies[len(replies)-1].More {
		t.Error("the request that it made way for is not answered")
	}
	turns = 0
	if d.Warm(count) || turns == 0 || turns > rounds*len(study.Sheets()) {
		t.Errorf("it goes on for %d turns", turns)
	}
	turns = 0
	if d.Warm(count) || turns > 0 {
		t.Error("it never ends")
	}
}

package state

import (
	"strings"
	"testing"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// play acts on messages in their order and gathers what is asked for.
func play(m Model, msgs ...Msg) (Model, []Effect) {
	var all []Effect
	for _, msg := range msgs {
		var effects []Effect
		m, effects = Update(m, msg)
		all = append(all, effects...)
	}
	return m, all
}

// after is the model after messages.
func after(m Model, msgs ...Msg) Model {
	m, _ = play(m, msgs...)
	return m
}

// of are the effects of one type.
func of[E Effect](effects []Effect) []E {
	var list []E
	for _, effect := range effects {
		if e, ok := effect.(E); ok {
			list = append(list, e)
		}
	}
	return list
}

// empty is the model of a new study.
func empty() Model { return after(New(), Restored{study.Write(study.Empty())}) }

// given tells what a study holds at a path, as "value unit"; "" for nothing.
func given(t *testing.T, m Model, path string) string {
	t.Helper()
	spec, ok := study.Find(path)
	if !ok {
		t.Fatalf("the study has no input %s", path)
	}
	in := spec.Get(&m.Study)
	if in == nil {
		return ""
	}
	return strings.TrimSpace(units.Exact(in.Value) + " " + in.Unit)
}

// holds fails unless a text holds every piece.
func holds(t *testing.T, what, text string, pieces ...string) {
	t.Helper()
	for _, piece := range pieces {
		if !strings.Contains(text, piece) {
			t.Errorf("%s is %q; want it to hold %q", what, text, piece)
		}
	}
}

// type types a text key by key.
func typed(path, unit, text string) []Msg {
	var msgs []Msg
	for i := range text {
		msgs = append(msgs, Edited{path, text[:i+1], unit})
	}
	return msgs
}

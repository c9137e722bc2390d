package state

import (
	"testing"

	"brinefront/app/wire"
)

func TestEvidence(t *testing.T) {
	stated := []wire.Evidence{{ID: "a", Title: "A", Items: []wire.Item{{Label: "x"}}}, {ID: "b", Title: "B"}}
	m, effects := Update(New(), EvidenceAsked{})
	if !m.Checking || len(of[ListEvidence](effects)) != 1 {
		t.Fatalf("asked for %v", effects)
	}
	if _, effects := Update(m, EvidenceAsked{}); len(effects) > 0 {
		t.Error("asked twice at a time")
	}
	m, effects = Update(m, EvidenceListed{stated})
	if got := of[CheckEvidence](effects); len(got) != 1 || got[0].ID != "a" {
		t.Fatalf("after the list: %v, want the first check only", effects)
	}
	m, effects = Update(m, EvidenceDone{wire.Evidence{ID: "a", Failure: "a bug"}})
	if m.Evidence[0].Title != "A" || !m.Evidence[0].Done || m.Evidence[0].Failure != "a bug" || stated[0].Done {
		t.Errorf("a failed check stands as %+v", m.Evidence[0])
	}
	if got := of[CheckEvidence](effects); len(got) != 1 || got[0].ID != "b" {
		t.Fatalf("after the first: %v, want the second", effects)
	}
	m, effects = Update(m, EvidenceDone{wire.Evidence{ID: "b", Title: "B", How: "by hand"}})
	if m.Checking || len(effects) > 0 || !m.Evidence[1].Done || m.Evidence[1].How != "by hand" {
		t.Errorf("after the last: checking %t, %v", m.Checking, effects)
	}
	if again := after(m, EvidenceAsked{}); !again.Checking {
		t.Error("the checks cannot be computed again")
	}
	if n, effects := Update(m, EvidenceDone{wire.Evidence{ID: "unheard of"}}); len(n.Evidence) != 2 || len(effects) > 0 {
		t.Error("a check that is not in the list was taken")
	}
}

func TestEvidenceStopsWithTheEngine(t *testing.T) {
	m := after(New(), EvidenceAsked{}, EvidenceListed{[]wire.Evidence{{ID: "a"}}}, EngineFailed{0, "it stopped"})
	if m.Checking || m.Failure != "it stopped" {
		t.Errorf("checking %t, failure %q", m.Checking, m.Failure)
	}
	if m = after(m, EvidenceAsked{}); !m.Checking {
		t.Error("the checks cannot be asked for again")
	}
}

package serve

import (
	"encoding/json"
	"reflect"
	"strings"
	"testing"

	"brinefront/app/wire"
	"brinefront/physics/evidence"
	"brinefront/physics/study"
)

// answers serves a request at a new desk and reads what comes back.
func answers(t *testing.T, request string) []wire.Reply {
	t.Helper()
	var d Desk
	return at(t, &d, request)
}

// at serves a request at a desk.
func at(t testing.TB, d *Desk, request string) []wire.Reply {
	t.Helper()
	var replies []wire.Reply
	d.Take([]byte(request), heardBy(t, &replies))
	d.Work(func() {})
	return replies
}

// heardBy reads replies into a list.
func heardBy(t testing.TB, replies *[]wire.Reply) func([]byte) {
	return func(text []byte) {
		t.Helper()
		r, err := wire.Read(text)
		if err != nil {
			t.Fatalf("a reply that cannot be read: %v", err)
		}
		*replies = append(*replies, r)
	}
}

func written(t testing.TB, r wire.Request) string {
	t.Helper()
	text, err := json.Marshal(r)
	if err != nil {
		t.Fatal(err)
	}
	return string(text)
}

// The result reaches the interface as it was computed, to the last bit.
func TestRunAnswersWithTheResult(t *testing.T) {
	demo := study.Demo()
	replies := answers(t, written(t, wire.Request{ID: 7, Kind: wire.Run, Study: &demo}))
	if len(replies) != 1 || replies[0].ID != 7 || replies[0].Kind != wire.Run || replies[0].Failure != "" {
		t.Fatalf("replies: %+v", replies)
	}
	compared := 0
	for name, part := range study.Run(demo).Parts {
		got := replies[0].Result.Parts[name]
		if got.Status != part.Status {
			t.Errorf("%s: status %q, computed %q", name, got.Status, part.Status)
		}
		for i, figure := range part.Figures {
			compared++
			if got.Figures[i].ID != figure.ID || got.Figures[i].Value != figure.Value {
				t.Errorf("%s: figure %+v, computed %+v", name, got.Figures[i], figure)
			}
		}
	}
	if compared == 0 {
		t.Error("the demonstration study has no figure")
	}
}

func TestUnusableStudyIsNoFailure(t *testing.T) {
	empty := study.Empty()
	replies := answers(t, written(t, wire.Request{ID: 1, Kind: wire.Run, Study: &empty}))
	if len(replies) != 1 || replies[0].Failure != "" || replies[0].Result == nil {
		t.Errorf("replies: %+v", replies)
	}
}

func TestEvidenceIsListedThenComputedOneByOne(t *testing.T) {
	listed := answers(t, written(t, wire.Request{ID: 2, Kind: wire.Checks}))
	if len(listed) != 1 || len(listed[0].Checks) != len(evidence.All()) || len(listed[0].Checks) == 0 {
		t.Fatalf("listed: %+v", listed)
	}
	first := listed[0].Checks[0]
	if first.Done {
		t.Error("a listed check says that it is computed")
	}
	done := answers(t, written(t, wire.Request{ID: 3, Kind: wire.Check, CheckID: first.ID}))
	if len(done) != 1 || len(done[0].Checks) != 1 || !done[0].Checks[0].Done || done[0].Checks[0].ID != first.ID {
		t.Fatalf("computed: %+v", done)
	}
	for i, item := range done[0].Checks[0].Items {
		stated := first.Items[i]
		stated.Computed, stated.Pass = item.Computed, item.Pass
		if !reflect.DeepEqual(item, stated) {
			t.Errorf("computing changed what was stated: %+v, was %+v", item, stated)
		}
	}
}

// What should never reach the engine is answered all the same, as a bug with
// what to send.
func TestOwnMistakesAreReportedAsBugs(t *testing.T) {
	for name, c := range map[string]struct {
		request string
		id      int
		says    string
	}{
		"no JSON":       {`{"id":`, 0, "cannot be read"},
		"unknown kind":  {`{"id": 4, "kind": "guess"}`, 4, `"guess"`},
		"no study":      {`{"id": 5, "kind": "run"}`, 5, "holds no study"},
		"none before":   {`{"id": 9, "kind": "pieces"}`, 9, "follows none"},
		"no such study": {`{"id": 9, "kind": "pieces", "study": 3}`, 9, "cannot be read"},
		"unknown check": {`{"id": 6, "kind": "check", "checkId": "none-such"}`, 6, "none-such"},
	} {
		replies := answers(t, c.request)
		if len(replies) != 1 || replies[0].ID != c.id || !strings.Contains(replies[0].Failure, c.says) || !strings.Contains(replies[0].Failure, "send us") {
			t.Errorf("%s: %+v", name, replies)
		}
	}
}

func TestResultThatJSONCannotSayIsReported(t *testing.T) {
	kinds["not a number"] = func(_ *Desk, _ wire.Request, send func(wire.Reply, ...[]byte), _ func()) {
		zero := 0.0
		send(wire.Reply{Checks: []wire.Evidence{{Items: []wire.Item{{Computed: zero / zero}}}}})
	}
	defer delete(kinds, "not a number")
	replies := answers(t, `{"id": 8, "kind": "not a number"}`)
	if len(replies) != 1 || !strings.Contains(replies[0].Failure, "NaN") {
		t.Errorf("replies: %+v", replies)
	}
}

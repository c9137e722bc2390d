package state

import (
	"bytes"
	"compress/flate"
	"runtime"
	"strings"
	"testing"

	"brinefront/physics/study"
)

// pack makes a link of any text.
func pack(t testing.TB, text []byte) string {
	t.Helper()
	var b bytes.Buffer
	w, err := flate.NewWriter(&b, flate.BestCompression)
	if err != nil {
		t.Fatal(err)
	}
	if _, err := w.Write(text); err != nil {
		t.Fatal(err)
	}
	if err := w.Close(); err != nil {
		t.Fatal(err)
	}
	return linkText.EncodeToString(b.Bytes())
}

func TestLinkThereAndBack(t *testing.T) {
	m, effects := play(New(), Routed{"/field"}, Edited{oil, "4.25", "cp"}, ShareAsked{})
	links := of[CopyLink](effects)
	if len(links) != 1 || !strings.HasPrefix(links[0].Fragment, "/field?study=") {
		t.Fatalf("shared is %v", links)
	}
	if n := len(links[0].Fragment); n > 8000 {
		t.Errorf("the link of an ordinary study has %d characters", n)
	}
	own := after(New(), Restored{mine()})
	n, effects := play(own, Routed{links[0].Fragment})
	if study.Write(n.Study) != study.Write(m.Study) || n.Route != (Route{Sheet: "field"}) {
		t.Errorf("the link opens %q on %v", n.Study.Title, n.Route)
	}
	if len(of[Run](effects)) != 1 || len(of[Keep](effects)) > 0 {
		t.Errorf("opening a link asks for %v; want a run, and the autosave left alone", effects)
	}
	if back := after(n, Undone{}); study.Write(back.Study) != mine() {
		t.Error("one undo does not lead back to the study before the link")
	}
	if again, effects := Update(n, Routed{links[0].Fragment}); again.Revision != n.Revision || len(effects) > 0 {
		t.Error("the same link opened again is a step")
	}
}

func TestLinkIsKeptOnceItIsChanged(t *testing.T) {
	link, err := writeLink(study.Demo())
	if err != nil {
		t.Fatal(err)
	}
	m, effects := play(empty(), Routed{"/rock?study=" + link}, Written{"title", "My version"})
	if keeps := of[Keep](effects); len(keeps) != 1 || keeps[0].Study.Title != "My version" {
		t.Errorf("kept are %d studies", len(keeps))
	}
	if moves := of[Go](effects); len(moves) != 1 || moves[0].Fragment != "/rock" {
		t.Errorf("the address goes to %v, want /rock, since it holds another study", moves)
	}
	if _, effects := Update(m, Written{"title", "My other version"}); len(of[Go](effects)) > 0 {
		t.Error("the address moves at every change")
	}
}

func TestEmbeddedStudyIsNotKept(t *testing.T) {
	link, err := writeLink(study.Demo())
	if err != nil {
		t.Fatal(err)
	}
	m, effects := play(New(), Restored{mine()}, Routed{"/front?embed&study=" + link}, Written{"title", "x"}, Undone{})
	if len(of[Keep](effects)) > 0 || len(m.Notices) > 0 {
		t.Errorf("a page within another page keeps its study: %v, or says %v", of[Keep](effects), m.Notices)
	}
	if moves := of[Go](effects); len(moves) != 1 || moves[0].Fragment != "/front?embed" {
		t.Errorf("the address goes to %v", moves)
	}
}

func TestLinkRefused(t *testing.T) {
	good, err := writeLink(study.Demo())
	if err != nil {
		t.Fatal(err)
	}
	packed, err := linkText.DecodeString(good)
	if err != nil {
		t.Fatal(err)
	}
	for name, test := range map[string]struct{ link, said string }{
		"cut":              {good[:len(good)/2], "cut or changed"},
		"no base64url":     {"a+b/c", "cut or changed"},
		"padded":           {good + "==", "cut or changed"},
		"line breaks":      {good[:20] + "\n" + good[20:], "cut or changed"},
		"something behind": {linkText.EncodeToString(append(packed, "more"...)), "cut or changed"},
		"no study":         {pack(t, []byte("hello")), "cannot be opened"},
		"endless":          {strings.Repeat("A", maxLink+1), "at most"},
	} {
		t.Run(name, func(t *testing.T) {
			before := New()
			m, effects := Update(before, Routed{"/rock?study=" + test.link})
			if m.Revision != before.Revision || len(effects) > 0 || m.Route.Sheet != "rock" {
				t.Errorf("a refused link changed the study, or left the sheet unopened")
			}
			holds(t, "notice", lastNotice(m), test.said)
		})
	}
}

// One study has one link: bits that decoding would pass over are not passed over.
func TestLinkIsReadToItsLastBit(t *testing.T) {
	st := study.Empty()
	for i := range 9 {
		st.Title = strings.Repeat("x", i)
		link, err := writeLink(st)
		if err != nil {
			t.Fatal(err)
		}
		if len(link)%4 == 0 {
			continue // no bits are left over
		}
		const digits = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_"
		last := strings.IndexByte(digits, link[len(link)-1])
		if _, err := readLink(link[:len(link)-1] + string(digits[last|1])); err == nil {
			t.Errorf("a link of %d characters opens with its last bit changed", len(link))
		}
		return
	}
	t.Error("no link has bits left over")
}

// A small link may not fill the memory.
func TestLinkThatSwells(t *testing.T) {
	bomb := pack(t, make([]byte, 40<<20))
	var before, after runtime.MemStats
	runtime.ReadMemStats(&before)
	_, err := readLink(bomb)
	runtime.ReadMemStats(&after)
	if err == nil || !strings.Contains(err.Error(), "more than 4 MB") {
		t.Errorf("a link that swells to 40 MB: %v", err)
	}
	if used := after.TotalAlloc - before.TotalAlloc; used > 40<<20 {
		t.Errorf("it used %d MB before it was refused", used>>20)
	}
}

func TestStudyTooLargeForALink(t *testing.T) {
	st := study.Empty()
	// A chaotic sequence compresses badly.
	values := make([]float64, 6_000)
	x := 0.3
	for i := range values {
		x = 3.99 * x * (1 - x)
		values[i] = x
	}
	st.Rock.Table = &study.Table{Sw: values, Krw: values, Kro: values}
	m, effects := play(New(), Restored{study.Write(st)}, ShareAsked{})
	if len(of[CopyLink](effects)) > 0 {
		t.Error("a link was made that is too long to arrive")
	}
	holds(t, "notice", lastNotice(m), "does not fit", "Save it as a file")
}

func TestRouted(t *testing.T) {
	for fragment, want := range map[string]Route{
		"":                     {Sheet: "front"},
		"/rock":                {Sheet: "rock"},
		"#/field":              {Sheet: "field"},
		"/evidence/":           {Sheet: "evidence"},
		"/report?embed":        {Sheet: "report", Embed: true},
		"/attic":               {Sheet: "front"},
		"/rock?colour=red&&=&": {Sheet: "rock"},
	} {
		m, effects := Update(answer(New()), Routed{fragment})
		if m.Route != want || len(effects) > 0 {
			t.Errorf("%q leads to %v and asks for %v, want %v", fragment, m.Route, effects, want)
		}
		if again, _ := readFragment(want.fragment()); again != want {
			t.Errorf("the address of %v leads to %v", want, again)
		}
	}
}

func FuzzLink(f *testing.F) {
	good, err := writeLink(study.Demo())
	if err != nil {
		f.Fatal(err)
	}
	f.Add(good)
	f.Add(good[:40])
	f.Add("")
	f.Add(pack(f, []byte("{}")))
	f.Fuzz(func(t *testing.T, link string) {
		st, err := readLink(link)
		if err != nil {
			if err.Error() == "" {
				t.Error("a link is refused without a reason")
			}
			return
		}
		again, err := writeLink(st)
		if err != nil {
			return // packed less well by us than by another, it is too long
		}
		back, err := readLink(again)
		if err != nil || study.Write(back) != study.Write(st) {
			t.Errorf("what a link held is another study when it is linked again: %v", err)
		}
	})
}

package main

import (
	"fmt"
	"strings"
	"testing"

	"brinefront/physics/study"

	"github.com/chromedp/chromedp/kb"
)

// oil is an input that every refusal below leaves at its last good value.
const oil = "fluids.oilViscosity"

func message(path string) string { return "#msg-" + strings.ReplaceAll(path, ".", "-") }

// TestBadTextIsExplainedBesideItsField: what was read and what is allowed stand
// beside the field, the text stays as typed, the last good answer stays in use.
func TestBadTextIsExplainedBesideItsField(t *testing.T) {
	p := OpenFile(t, At("#/front"))
	p.WaitIdle()
	before := p.figures()
	for _, bad := range []string{"thick", "-3", "1e999", "1,234", "3 psi", "0", "NaN", "99999999 cp"} {
		p.Retype(field(oil), bad)
		p.WaitIdle()
		if said := p.Text(message(oil)); !strings.Contains(said, "llowed") || !strings.Contains(said, "In use: 8.3") {
			t.Errorf("%q is answered by %q", bad, said)
		}
		if kept := Eval[string](p, fmt.Sprintf(`document.querySelector(%s).value`, quote(field(oil)))); kept != bad {
			t.Errorf("%q became %q", bad, kept)
		}
		if after := p.figures(); fmt.Sprint(after) != fmt.Sprint(before) {
			t.Errorf("%q changed the answer", bad)
		}
	}
	p.Retype(field("front.initialWater"), "120 %")
	p.WaitIdle()
	if said := p.Text(message("front.initialWater")); !strings.Contains(said, "120") || !strings.Contains(said, "llowed") {
		t.Errorf("a saturation of 120 %% is answered by %q", said)
	}
	p.Retype(field(oil), "")
	p.WaitIdle()
	if screen := p.Screen(); len(p.figures()) > 0 || !strings.Contains(screen, "Oil viscosity") {
		t.Errorf("without an oil viscosity the sheet shows\n%s", screen)
	}
	p.NoTrouble()
}

// TestEndPointsThatMeetAreRefused: Swc + Sor >= 1, each lawful by itself. Both fields
// say so, and the last good answer stays, marked as such.
func TestEndPointsThatMeetAreRefused(t *testing.T) {
	p := OpenFile(t, At("#/rock"))
	p.WaitIdle()
	p.Focus("#in-rock-curve")
	p.Type("Corey, typed")
	p.WaitIdle()
	stale := func() bool { return Eval[bool](p, `document.querySelector(".answers").hasAttribute("data-stale")`) }
	p.Retype(field("rock.corey.swc"), "0.6")
	p.Retype(field("rock.corey.sor"), "0.2")
	p.Press(kb.Tab)
	p.WaitIdle()
	before := p.figures()
	if len(before) == 0 || stale() {
		t.Fatalf("Swc 0.6 and Sor 0.2 give %v, marked as stale: %t", before, stale())
	}
	p.Retype(field("rock.corey.sor"), "0.5")
	p.Press(kb.Tab)
	p.WaitIdle()
	if after := p.figures(); fmt.Sprint(after) != fmt.Sprint(before) || !stale() {
		t.Errorf("Swc 0.6 and Sor 0.5 give %v, marked as stale: %t; want %v, marked", after, stale(), before)
	}
	for _, path := range []string{"rock.corey.swc", "rock.corey.sor"} {
		marked := Eval[bool](p, fmt.Sprintf(`document.querySelector(%s).getAttribute("aria-invalid") !== null`, quote(field(path))))
		if said := p.Text(message(path)); !marked || !strings.Contains(said, "below 1") {
			t.Errorf("beside %s stands %q, marked: %t", path, said, marked)
		}
	}
	p.Focus("#inputs")
	p.Press("z", kb.ModifierCtrl)
	p.WaitIdle()
	if after := p.figures(); fmt.Sprint(after) != fmt.Sprint(before) || stale() {
		t.Errorf("undo gives %v, marked as stale: %t", after, stale())
	}
	p.NoTrouble()
}

// TestPastes: what a paste cannot be used for is said in its preview, and the
// table in use stays.
func TestPastes(t *testing.T) {
	p := OpenFile(t, At("#/rock"))
	p.WaitIdle()
	before := p.figures()
	for name, test := range map[string]struct{ text, said string }{
		"letters":        {"Sw\tkrw\tkro\n0.2\t0\t0.8\n0.5\tten\t0.3\n0.8\t0.3\t0\n", "ten"},
		"swapped":        {"0.2\t0.8\t0\n0.5\t0.3\t0.1\n0.8\t0\t0.3\n", "krw"},
		"percent":        {"20\t0\t0.8\n50\t0.1\t0.3\n80\t0.3\t0\n", "percent"},
		"beyond numbers": {"0.2\t0\t0.8\n0.5\t1e999\t0.3\n0.8\t0.3\t0\n", "1e999"},
		"too much":       {strings.Repeat("0.2\t0\t0.8\n", 500_000), "allowed"},
	} {
		p.Focus("#paste-box")
		p.Paste(test.text)
		p.WaitFor(`!document.querySelector("#paste-preview").hidden`)
		if said := p.Text("#paste-preview"); !strings.Contains(said, test.said) {
			t.Errorf("%s: the preview lacks %q:\n%s", name, test.said, said)
		}
		p.Click("#paste-forget")
		p.WaitFor(`document.querySelector("#paste-preview").hidden`)
		p.WaitIdle()
		if after := p.figures(); fmt.Sprint(after) != fmt.Sprint(before) {
			t.Errorf("%s: a paste that was forgotten changed the answer", name)
		}
	}
	p.NoTrouble()
}

// TestFilesThatCannotBeOpened are refused with a reason, and nothing changes.
func TestFilesThatCannotBeOpened(t *testing.T) {
	good := study.Write(study.Demo())
	p := OpenFile(t, At("#/front"))
	p.WaitIdle()
	before := p.figures()
	for name, test := range map[string]struct{ content, said string }{
		"cut in half":   {good[:len(good)/2], "end"},
		"newer":         {strings.Replace(good, `"version": 1`, `"version": 99`, 1), "99"},
		"unknown field": {strings.Replace(good, `"note":`, `"colour": "red", "note":`, 1), "colour"},
		"no study":      {"hello", "study"},
	} {
		p.choose([]byte(test.content))
		p.WaitFor(fmt.Sprintf(`document.querySelector("#notices").innerText.includes(%s)`, quote(test.said)))
		p.WaitIdle()
		if after := p.figures(); fmt.Sprint(after) != fmt.Sprint(before) {
			t.Errorf("%s: a refused file changed the answer", name)
		}
	}
	tag := `<script>document.title = "taken"</script><img src=x onerror="document.title='taken'">`
	st := study.Demo()
	st.Title, st.Note = tag, tag
	p.choose([]byte(study.Write(st)))
	p.WaitFor(fmt.Sprintf(`document.querySelector("#in-title").value === %s`, quote(tag)))
	p.Go("#/report")
	p.WaitIdle()
	if title := Eval[string](p, `document.title`); title == "taken" || !strings.Contains(p.Screen(), "<script>") {
		t.Errorf("a tag in a title was run or lost; the document's title is %q", title)
	}
	p.NoTrouble()
}

package main

import (
	"fmt"
	"strings"
	"testing"

	"brinefront/physics/study"

	"github.com/chromedp/chromedp/kb"
)

// A case is added, named and changed by keyboard; the differences on screen are
// those of a native run of the same study, and undo takes the case away again.
func TestCasesAreComparedInTheBrowser(t *testing.T) {
	p := OpenFile(t, At("#/compare"))
	p.WaitIdle()
	if !p.Has("#no-cases:not([hidden])") {
		t.Error("a study without cases does not say so")
	}
	p.Focus("#case-add")
	p.Type(kb.Enter)
	p.WaitIdle()
	p.Retype("#case-0-name", "More viscous oil")
	p.pick("#case-0-more", "fluids.oilViscosity")
	p.WaitIdle()
	if on := p.Focused(); !strings.HasPrefix(on, "input#case-0-input-fluids-oilViscosity") {
		t.Errorf("after an input is chosen the keyboard is on %q", on)
	}
	p.Retype("#case-0-input-fluids-oilViscosity", "24")
	p.pick("#case-0-more", "rock.curve")
	p.WaitIdle()
	p.pick("#case-0-input-rock-curve", "let")
	p.WaitIdle()

	st := study.Demo()
	st.Cases = []study.Case{{
		Name: "More viscous oil", Choose: map[string]string{"rock.curve": "let"},
		Set: map[string]study.Input{"fluids.oilViscosity": {Value: 24, Unit: "cp"}},
	}}
	p.compare(study.Run(st).Parts[study.SheetCompare])
	if said := p.Text("#answer-compare"); !strings.Contains(said, "“More viscous oil” brings water") {
		t.Errorf("the answer is %q", said)
	}

	p.Retype("#case-0-input-fluids-oilViscosity", "thick")
	p.WaitIdle()
	if said := p.Text("#msg-cases-0-fluids-oilViscosity"); !strings.Contains(said, "thick") || !strings.Contains(said, "In use: 24 cp") {
		t.Errorf("beside a bad text stands %q", said)
	}
	p.compare(study.Run(st).Parts[study.SheetCompare])

	p.Click("#case-0-remove")
	p.WaitIdle()
	if !p.Has("#no-cases:not([hidden])") || p.Has("#case-0-name") {
		t.Error("the case is still there")
	}
	p.NoTrouble()
}

// pick takes a value from a list, as a person does who opens it.
func (p *Page) pick(selector, value string) {
	p.t.Helper()
	Eval[bool](p, fmt.Sprintf(`(list => { list.value = %s; return list.dispatchEvent(new Event("change", { bubbles: true })); })(document.querySelector(%s))`, quote(value), quote(selector)))
}

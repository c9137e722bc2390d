package widget

import (
	"reflect"
	"strings"
	"testing"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
)

func TestEverySortOfInputSendsItsMessage(t *testing.T) {
	for _, c := range []struct {
		in   Input
		want state.Msg
	}{
		{Input{Sort: NumberInput, Path: "fluids.oilViscosity", With: "cp"}, state.Edited{Path: "fluids.oilViscosity", Text: "7", Unit: "cp"}},
		{Input{Sort: CellInput, Path: "rock.table.2.krw"}, state.Edited{Path: "rock.table.2.krw", Text: "7"}},
		{Input{Sort: LowInput, Path: "field.length", With: "9"}, state.Ranged{Path: "field.length", Low: "7", High: "9"}},
		{Input{Sort: HighInput, Path: "field.length", With: "5"}, state.Ranged{Path: "field.length", Low: "5", High: "7"}},
		{Input{Sort: SourceInput, Path: "field.length"}, state.Sourced{Path: "field.length", Text: "7"}},
		{Input{Sort: WordsInput, Path: "title"}, state.Written{Path: "title", Text: "7"}},
		{Input{Sort: BlockInput, Path: "note"}, state.Written{Path: "note", Text: "7"}},
		{Input{Sort: PasteInput, Path: "rock.table"}, state.Pasted{Table: "rock.table", Text: "7"}},
	} {
		if got := c.in.message("7"); !reflect.DeepEqual(got, c.want) {
			t.Errorf("%s sends %#v, want %#v", c.in.Sort, got, c.want)
		}
	}
}

// A rendering that comes late must not bring back an older text: what the element
// was made with never changes, so that the library has nothing to write.
func TestInputKeepsWhatItWasMadeWith(t *testing.T) {
	in := &Input{Sort: NumberInput, ID: "in-x", Text: "1"}
	first := app.HTMLString(in.Render())
	in.Text = "12"
	again := app.HTMLString(in.Render())
	for _, html := range []string{first, again} {
		if !strings.Contains(html, `value="1"`) {
			t.Errorf("rendered as %s, want the value it was made with", html)
		}
	}
	if in.typed != "1" {
		t.Errorf("rendering changed what is known to be typed to %q", in.typed)
	}
}

func TestFieldIDs(t *testing.T) {
	for path, want := range map[string]string{
		"fluids.oilViscosity": "in-fluids-oilViscosity", "rock.table.3.sw": "in-rock-table-3-sw", "rock.table": "paste-box", "rock.capillary.table": "paste-box-rock-capillary-table",
	} {
		if got := FieldID(path); got != want {
			t.Errorf("FieldID(%q) = %q, want %q", path, got, want)
		}
	}
}

// The library keeps a handler whose scope is the same: two messages must never share one.
func TestHandlersOfDifferentMessagesHaveDifferentScopes(t *testing.T) {
	seen := map[string]state.Msg{}
	for _, msg := range []state.Msg{
		state.RowRemoved{Table: "rock.table", Row: 1}, state.RowRemoved{Table: "rock.table", Row: 2}, state.RowAdded{Table: "rock.table", After: 1}, state.Undone{}, state.Redone{},
		state.Chosen{Path: "field.drive", Value: "rate"}, state.Chosen{Path: "field.drive", Value: "pressure"}, state.Dismissed{Notice: 1},
	} {
		_, scope := does(nil, msg)
		if other, twice := seen[scope]; twice {
			t.Errorf("%#v and %#v share the scope %q", msg, other, scope)
		}
		seen[scope] = msg
	}
}

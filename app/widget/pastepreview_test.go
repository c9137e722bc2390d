package widget

import (
	"strings"
	"testing"

	"brinefront/app/state"
)

// TestPreviewSaysOnlyWhatIsKnown: the sentence on how a text was cut, and what is
// wrong with it.
func TestPreviewSaysOnlyWhatIsKnown(t *testing.T) {
	for text, want := range map[string]struct{ layout, wrong string }{
		"hello":                               {"No table found.", "The table: read no row of numbers; allowed: a table"},
		strings.Repeat("1", 2<<20):            {"No table found.", "The table: read a text of 2.0 MB; allowed: at most 1 MB"},
		"0,2,0,0,0,85\n0,4,0,05,0,4\n0,6,0,1": {"No table found.", "The table: read commas that may"},
		"Sw\tkrw\tkro\n0,2\t0\t1\n0,4\tten\t0,5\n0,6\t0,2\t0": {"Columns parted by tabs, decimal commas, header row Sw | krw | kro, 3 rows of numbers.", `Row 2, column 2: read "ten"; allowed: a number`},
		"0.2\t0\t1\n0.4\t\t0.5\n0.6\t0.2\t0":                  {"Columns parted by tabs, decimal points, no header row, 3 rows of numbers.", "Row 2, column 2: read an empty cell; allowed: a fraction"},
	} {
		m, _ := state.Update(state.New(), state.Pasted{Table: "rock.table", Text: text})
		if got := layout(m.Paste); got != want.layout {
			t.Errorf("%.20q: %q, want %q", text, got, want.layout)
		}
		p := m.Paste.Reading.Problems[0]
		if got := wrong(p.Row, p.Column, p.Quoted(), p.Allowed); !strings.HasPrefix(got, want.wrong) {
			t.Errorf("%.20q: %q, want %q", text, got, want.wrong)
		}
	}
	if got := wrong(-1, -1, "", "three columns"); got != "The table: needs three columns." {
		t.Errorf("with nothing read: %q", got)
	}
}

package browser

import (
	"strings"
	"testing"
)

func TestSeveralCells(t *testing.T) {
	for _, c := range []struct {
		text string
		want bool
	}{
		{"", false},
		{"0.25", false},
		{"0.25\r\n", false}, // one cell as a spreadsheet copies it
		{"0.25\t0.10", true},
		{"0.25\n0.30", true},
		{"0.25\t0.10\r\n0.30\t0.08\r\n", true},
	} {
		if got := severalCells(c.text); got != c.want {
			t.Errorf("severalCells(%q) = %v", c.text, got)
		}
	}
}

func TestShortcuts(t *testing.T) {
	for _, c := range []struct {
		key   string
		shift bool
		want  string
	}{
		{"z", false, KeyUndo}, {"Z", true, KeyRedo}, {"y", false, KeyRedo}, {"s", false, KeySave}, {"o", false, KeyOpen},
		{"Z", false, KeyUndo}, // caps lock
		{"s", true, ""}, {"o", true, ""}, {"a", false, ""}, {"Control", false, ""},
	} {
		if got := shortcut(c.key, c.shift); got != c.want {
			t.Errorf("shortcut(%q, shift %v) = %q, want %q", c.key, c.shift, got, c.want)
		}
	}
}

func TestTooLargeSaysWhatWasReadAndWhatIsAllowed(t *testing.T) {
	message := tooLarge("plug.csv", 5_240_000, 2_000_000).Error()
	for _, part := range []string{"plug.csv", "5.2 MB", "2.0 MB"} {
		if !strings.Contains(message, part) {
			t.Errorf("%q does not say %q", message, part)
		}
	}
}

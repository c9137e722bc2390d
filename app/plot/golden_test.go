package plot

import (
	"bytes"
	"encoding/json"
	"flag"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"brinefront/physics/units"
)

var update = flag.Bool("update", false, "rewrite the golden file and print what changed")

const goldens = "../../testdata/golden/plot"

// TestGoldenPicture pins what the drawing script and a spreadsheet are given, so
// that a change of the contract is seen on both sides.
func TestGoldenPicture(t *testing.T) {
	p := From(invented(), units.Metric)
	var drawn bytes.Buffer
	if err := json.Indent(&drawn, []byte(p.JSON()), "", " "); err != nil {
		t.Fatal(err)
	}
	got := drawn.String() + "\n\n" + strings.ReplaceAll(p.CSV(), "\r", "")
	file := filepath.Join(goldens, t.Name()+".txt")
	old, err := os.ReadFile(file)
	if err != nil && !*update {
		t.Fatal(err)
	}
	was, is := strings.Split(string(old), "\n"), strings.Split(got, "\n")
	same := true
	for i := range max(len(was), len(is)) {
		a, b := line(was, i), line(is, i)
		if a != b {
			same = false
			t.Logf("line %d\n- %s\n+ %s", i+1, a, b)
		}
	}
	switch {
	case same:
	case *update:
		if err := os.WriteFile(file, []byte(got), 0o644); err != nil {
			t.Fatal(err)
		}
	default:
		t.Errorf("%s differs; run with -update when that is meant", file)
	}
	files, err := filepath.Glob(filepath.Join(goldens, "*"))
	if err != nil || len(files) != 1 {
		t.Errorf("golden files without a test of their name: %q (%v)", files, err)
	}
}

func line(lines []string, i int) string {
	if i < len(lines) {
		return lines[i]
	}
	return "(nothing)"
}

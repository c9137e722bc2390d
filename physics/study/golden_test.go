package study

import (
	"flag"
	"os"
	"path/filepath"
	"strings"
	"testing"
)

var update = flag.Bool("update", false, "rewrite the golden files and print what changed")

const goldens = "../../testdata/golden/study"

// golden compares a text with the file named after the test.
func golden(t *testing.T, got string) {
	t.Helper()
	file := filepath.Join(goldens, t.Name()+".txt")
	old, err := os.ReadFile(file)
	if err != nil && !*update {
		t.Fatal(err)
	}
	if string(old) == got {
		return
	}
	if *update {
		t.Logf("%s changes:\n%s", file, differing(string(old), got))
		if err := os.WriteFile(file, []byte(got), 0o644); err != nil {
			t.Fatal(err)
		}
		return
	}
	t.Errorf("%s differs (run with -update when that is meant):\n%s", file, differing(string(old), got))
}

// differing lists the lines that only one of two texts has.
func differing(old, got string) string {
	count := map[string]int{}
	for _, line := range strings.Split(old, "\n") {
		count[line]--
	}
	for _, line := range strings.Split(got, "\n") {
		count[line]++
	}
	var b strings.Builder
	for _, line := range strings.Split(old, "\n") {
		if count[line] < 0 {
			b.WriteString("- " + line + "\n")
		}
	}
	for _, line := range strings.Split(got, "\n") {
		if count[line] > 0 {
			b.WriteString("+ " + line + "\n")
		}
	}
	return b.String()
}

// TestGoldenFilesBelongToATest keeps a golden from outliving its test.
func TestGoldenFilesBelongToATest(t *testing.T) {
	sources, err := filepath.Glob("*_test.go")
	if err != nil {
		t.Fatal(err)
	}
	var all strings.Builder
	for _, source := range sources {
		text, err := os.ReadFile(source)
		if err != nil {
			t.Fatal(err)
		}
		all.Write(text)
	}
	files, err := filepath.Glob(filepath.Join(goldens, "*"))
	if err != nil || len(files) == 0 {
		t.Fatalf("no golden files (%v)", err)
	}
	for _, file := range files {
		name := strings.TrimSuffix(filepath.Base(file), ".txt")
		if !strings.Contains(all.String(), "func "+name+"(") {
			t.Errorf("%s: no test of that name is left", file)
		}
	}
}

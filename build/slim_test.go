package main

import (
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// Another go-app must not be built with stand-ins that were written for this one.
func TestStandInsAreHeldToTheFilesTheyReplace(t *testing.T) {
	t.Chdir("..")
	from, to := t.TempDir(), t.TempDir()
	module, err := moduleFolder(goApp)
	must(t, err)
	must(t, os.CopyFS(from, os.DirFS(module)))
	must(t, copySlim(from, to))
	for name := range leftOut {
		if _, err := os.Stat(filepath.Join(to, "pkg", "app", name)); err == nil {
			t.Errorf("%s was copied", name)
		}
	}
	if _, err := os.Stat(filepath.Join(to, "LICENSE")); err != nil {
		t.Error("the licence was left behind")
	}
	for name := range leftOut {
		t.Run(name, func(t *testing.T) {
			path := filepath.Join(from, "pkg", "app", name)
			text, err := os.ReadFile(path)
			must(t, err)
			must(t, os.Chmod(path, 0o644))
			must(t, os.WriteFile(path, append(text, '\n'), 0o644))
			if err := copySlim(from, to); err == nil || !strings.Contains(err.Error(), name) {
				t.Errorf("a changed file: %v", err)
			}
			must(t, os.Remove(path))
			if err := copySlim(from, to); err == nil || !strings.Contains(err.Error(), name) {
				t.Errorf("a file that is gone: %v", err)
			}
			must(t, os.WriteFile(path, text, 0o644))
		})
	}
}

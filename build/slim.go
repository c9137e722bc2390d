package main

import (
	"crypto/sha256"
	"encoding/hex"
	"encoding/json"
	"errors"
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
)

// The interface program is linked with a copy of go-app that leaves out what a
// page without a server has no use for. Packages set up their variables whether
// they are called or not, so go-app's handler for servers alone brings net/http,
// TLS and its curves into every page; its router brings regular expressions, and
// the name it gives a page brings ciphers: together a quarter of the program, to
// download, to compile and to set up at every start.
//
// go.mod knows nothing of this: whatever else is built or tested uses go-app as it
// is. The copy is made of the module that go.mod names and go.sum vouches for.
const (
	goApp      = "github.com/maxence-charriere/go-app/v9"
	uuid       = "github.com/google/uuid"
	standIns   = "build/_slim"        // the sources that take the place of what is left out
	slimFolder = outFolder + "/goapp" // the copy
	slimMod    = outFolder + "/slim.mod"
)

// leftOut are the files of go-app's package app that are not copied, by their
// SHA-256. Another sum means another go-app: whoever raises its version compares
// the files with the stand-ins before writing the new sum.
var leftOut = map[string]string{
	"http.go":     "970d42ad2eb2897f5d179802189449eac5bcc162062707c759fa72b42cc48154",
	"resource.go": "e291206c020f804adff4df09fa7fa792bb15a6fccacffe2c409833b6f1ffae19",
	"route.go":    "164adabe8fbf70301f946a60ac22ee4f714b503ea4dbc170e57505057bd41365",
}

// slimGoApp writes the copy and a module file that builds with it.
func slimGoApp() error {
	folder, err := moduleFolder(goApp)
	if err != nil {
		return err
	}
	mod, err := os.ReadFile("go.mod")
	if err != nil {
		return err
	}
	sum, err := os.ReadFile("go.sum")
	if err != nil {
		return err
	}
	mod = fmt.Appendf(mod, "\nreplace %s => ./%s\n\nreplace %s => ./%s/uuid\n", goApp, slimFolder, uuid, standIns)
	return errors.Join(
		copySlim(folder, slimFolder),
		os.WriteFile(slimMod, mod, 0o644),
		os.WriteFile(strings.TrimSuffix(slimMod, ".mod")+".sum", sum, 0o644))
}

// moduleFolder is where Go keeps a module of go.mod, after it has checked its sum.
func moduleFolder(path string) (string, error) {
	said, err := exec.Command("go", "mod", "download", "-json", path).Output()
	if err != nil {
		return "", fmt.Errorf("%s: %w", path, err)
	}
	var module struct{ Dir string }
	err = json.Unmarshal(said, &module)
	return module.Dir, err
}

// copySlim copies the packages that the interface uses, without what is left out
// and with the stand-in.
func copySlim(from, to string) error {
	if err := os.RemoveAll(to); err != nil {
		return err
	}
	standIn, err := os.ReadFile(filepath.Join(standIns, "app.go"))
	if err != nil {
		return err
	}
	for name, known := range leftOut {
		text, err := os.ReadFile(filepath.Join(from, "pkg", "app", name))
		if sum := sha256.Sum256(text); err != nil || hex.EncodeToString(sum[:]) != known {
			return fmt.Errorf("%s of %s is not the file that %s stands in for: compare them, then correct build/slim.go", name, from, standIns)
		}
	}
	files := map[string][]byte{"pkg/app/slim.go": standIn}
	for _, pattern := range []string{"go.mod", "LICENSE", "pkg/app/*.go", "pkg/errors/*.go"} {
		paths, err := filepath.Glob(filepath.Join(from, pattern))
		if err != nil || len(paths) == 0 {
			return fmt.Errorf("%s has no %s", from, pattern)
		}
		for _, path := range paths {
			if _, out := leftOut[filepath.Base(path)]; out || strings.HasSuffix(path, "_test.go") {
				continue
			}
			name := filepath.Join(filepath.Dir(pattern), filepath.Base(path))
			if files[name], err = os.ReadFile(path); err != nil {
				return err
			}
		}
	}
	for name, text := range files {
		path := filepath.Join(to, name)
		if err := errors.Join(os.MkdirAll(filepath.Dir(path), 0o755), os.WriteFile(path, text, 0o644)); err != nil {
			return err
		}
	}
	return nil
}

package main

import (
	"bytes"
	"encoding/json"
	"errors"
	"io"
	"os"
	"os/exec"
	"slices"
	"strings"
	"testing"
)

// arrows says what each package may import of ours; tests may import more. The
// arrows point one way: to the left and up. Do not widen a row to fix a build:
// a package that needs more than its row holds something that belongs elsewhere.
// Some rows wait for rooms that the design has and the house has not yet.
var arrows = map[string][]string{
	"physics/ref":     {},
	"physics/units":   {},
	"physics/numeric": {},
	"physics/paste":   {"physics/units"},

	"physics/relperm":   {"physics/units", "physics/numeric"},
	"physics/capillary": {"physics/units", "physics/numeric"},
	"physics/regime":    {"physics/ref", "physics/units"},
	"physics/fluid":     {"physics/units", "physics/numeric"},
	"physics/fv":        {"physics/numeric"},
	"physics/spread":    {"physics/numeric"},
	"physics/imbibe":    {"physics/numeric", "physics/relperm", "physics/capillary", "physics/fluid"},
	"physics/fit":       {"physics/units", "physics/numeric", "physics/relperm", "physics/capillary"},
	"physics/fracflow":  {"physics/numeric", "physics/relperm"},
	"physics/displace":  {"physics/numeric", "physics/relperm", "physics/fracflow"},
	"physics/gridding":  {"physics/numeric", "physics/fracflow", "physics/displace", "physics/fv"},
	"physics/ride":      {"physics/units", "physics/numeric", "physics/relperm", "physics/fracflow", "physics/displace"},
	"physics/pattern":   {"physics/numeric"},
	"physics/reservoir": {"physics/numeric", "physics/relperm", "physics/fracflow", "physics/displace", "physics/pattern"},

	"physics/evidence": {
		"physics/ref", "physics/units", "physics/numeric", "physics/relperm", "physics/capillary", "physics/fluid",
		"physics/fit", "physics/fracflow", "physics/displace", "physics/imbibe", "physics/fv", "physics/gridding", "physics/reservoir",
		"physics/ride", "physics/regime", "physics/spread", "physics/pattern",
	},
	"physics/study": {
		"physics/ref", "physics/units", "physics/numeric", "physics/relperm", "physics/capillary", "physics/fluid",
		"physics/fit", "physics/fracflow", "physics/displace", "physics/imbibe", "physics/fv", "physics/gridding", "physics/reservoir",
		"physics/ride", "physics/regime", "physics/spread", "physics/pattern",
	},
	"physics/report": {"physics/ref", "physics/units", "physics/study"},

	"app/wire":    {"physics/study"},
	"app/plot":    {"physics/units", "physics/study"},
	"app/browser": {},
	"app/state":   {"physics/units", "physics/paste", "physics/study", "physics/report", "app/wire", "app/plot"},
	"app/runner":  {"physics/study", "app/wire", "app/state", "app/browser"},
	"app/widget":  {"physics/units", "physics/study", "physics/report", "app/plot", "app/state", "app/browser"},
	"app/sheet": {
		"physics/units", "physics/study", "physics/report",
		"app/wire", "app/state", "app/browser", "app/runner", "app/widget",
	},
	"app": {"app/sheet"},

	"app/browser/port": {},
	"app/engine/serve": {"physics/study", "physics/evidence", "app/wire"},
	"app/engine":       {"app/engine/serve", "app/browser/port"},

	"build": {"physics/study"},
}

// outsiders are the modules that a room may import packages of, besides the
// standard library; the longest row that fits counts.
var outsiders = map[string][]string{
	"physics":    {"gonum.org/v1/gonum"},
	"app":        {},
	"app/sheet":  {"github.com/maxence-charriere/go-app/v9"},
	"app/widget": {"github.com/maxence-charriere/go-app/v9"},
	"build":      {"github.com/evanw/esbuild"},
}

// closed are the parts of the standard library that physics does without: with
// them a result could depend on something other than its inputs.
var closed = []string{"os", "net", "syscall", "plugin", "unsafe", "runtime", "crypto", "math/rand", "hash/maphash", "log"}

const ours = "brinefront/"

type goPackage struct {
	ImportPath string
	Standard   bool
	Imports    []string
}

func (p goPackage) room() string {
	if p.ImportPath+"/" == ours {
		return ""
	}
	return strings.TrimPrefix(p.ImportPath, ours)
}

// packages lists ours, with what each imports, for the browser and natively.
func packages(t *testing.T) []goPackage {
	t.Helper()
	var list []goPackage
	for _, system := range [][]string{nil, {"GOOS=js", "GOARCH=wasm"}} {
		cmd := exec.Command("go", "list", "-e", "-json=ImportPath,Imports", "../...")
		cmd.Env = append(os.Environ(), system...)
		out, err := cmd.Output()
		must(t, err)
		for read := json.NewDecoder(bytes.NewReader(out)); ; {
			var p goPackage
			if err := read.Decode(&p); errors.Is(err, io.EOF) {
				break
			} else if err != nil {
				t.Fatal(err)
			}
			list = append(list, p)
		}
	}
	if len(list) == 0 {
		t.Fatal("no package was found")
	}
	return list
}

func TestArrowsPointOneWay(t *testing.T) {
	for _, p := range packages(t) {
		room := p.room()
		allowed, known := arrows[room]
		if !known {
			t.Errorf("%s has no row in the table of arrows: give it one that says what it may know", room)
			continue
		}
		for _, path := range p.Imports {
			if of, own := strings.CutPrefix(path, ours); own && !slices.Contains(allowed, of) {
				t.Errorf("%s imports %s, which its row does not hold. Do not widen the row to fix the build", room, of)
			}
		}
	}
	for room, allowed := range arrows {
		for _, of := range allowed {
			if _, known := arrows[of]; !known {
				t.Errorf("the row of %s holds %s, which is no package", room, of)
			}
		}
	}
}

// within reports whether a path is a package or one inside it.
func within(path, pack string) bool { return path == pack || strings.HasPrefix(path, pack+"/") }

// rowFor is the longest row of outsiders that a room lies in.
func rowFor(room string) (modules []string) {
	longest := -1
	for row, list := range outsiders {
		if within(room, row) && len(row) > longest {
			longest, modules = len(row), list
		}
	}
	return modules
}

func TestOutsidersStayWhereTheyMayBe(t *testing.T) {
	for _, p := range packages(t) {
		room := p.room()
		modules := rowFor(room)
		if room == "app" {
			modules = outsiders["app/sheet"] // the interface's main starts it
		}
		for _, path := range p.Imports {
			first, _, _ := strings.Cut(path, "/")
			foreign := strings.Contains(first, ".")
			if foreign && !slices.ContainsFunc(modules, func(module string) bool { return within(path, module) }) {
				t.Errorf("%s imports %s; it may import of others only %q", room, path, modules)
			}
			if within(room, "physics") && slices.ContainsFunc(closed, func(shut string) bool { return within(path, shut) }) && path != "math/rand/v2" {
				t.Errorf("%s imports %s: physics depends on its inputs only", room, path)
			}
		}
	}
}

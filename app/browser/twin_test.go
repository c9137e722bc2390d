package browser

import (
	"bytes"
	"go/ast"
	"go/parser"
	"go/printer"
	"go/token"
	"maps"
	"path/filepath"
	"slices"
	"strings"
	"testing"
)

// signatures lists the exported functions and methods of one file, each with its
// parameters and results as written.
func signatures(t *testing.T, file string) map[string]string {
	t.Helper()
	set := token.NewFileSet()
	parsed, err := parser.ParseFile(set, file, nil, 0)
	if err != nil {
		t.Fatal(err)
	}
	list := map[string]string{}
	for _, d := range parsed.Decls {
		f, ok := d.(*ast.FuncDecl)
		if !ok || !f.Name.IsExported() {
			continue
		}
		var text bytes.Buffer
		if f.Recv != nil {
			must(t, printer.Fprint(&text, set, f.Recv.List[0].Type))
			text.WriteByte('.')
		}
		name := text.String() + f.Name.Name
		must(t, printer.Fprint(&text, set, f.Type))
		list[name] = text.String()
	}
	return list
}

func must(t *testing.T, err error) {
	t.Helper()
	if err != nil {
		t.Fatal(err)
	}
}

// A program that compiles for the browser must compile for a native test, and
// the other way round: the twins say the same.
func TestTwinsHaveTheSameSignatures(t *testing.T) {
	files, err := filepath.Glob("*_js.go")
	must(t, err)
	compared := 0
	for _, file := range files {
		real := signatures(t, file)
		if len(real) == 0 {
			continue // helpers of the browser side only
		}
		twin := signatures(t, strings.TrimSuffix(file, "_js.go")+"_native.go")
		for _, name := range slices.Sorted(maps.Keys(real)) {
			compared++
			if twin[name] != real[name] {
				t.Errorf("%s: %s\n  for the browser %s\n  native          %s", file, name, real[name], twin[name])
			}
		}
	}
	if compared == 0 {
		t.Fatal("no pair of twins was compared")
	}
}

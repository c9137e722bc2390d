package main

import (
	"bytes"
	"go/ast"
	"go/parser"
	"go/token"
	"io/fs"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"
)

// top is what the top level of the repository holds, and nothing else.
var top = []string{
	".ci", ".git", ".gitignore", "DEVELOPERS.md", "Makefile", "README.md",
	"app", "build", "go.mod", "go.sum", "physics", "testdata", "web",
}

func TestTopLevelHoldsWhatTheDesignSays(t *testing.T) {
	entries, err := os.ReadDir("..")
	must(t, err)
	for _, entry := range entries {
		if !slices.Contains(top, entry.Name()) {
			t.Errorf("%s lies at the top level, which holds only %q", entry.Name(), top)
		}
	}
}

// sources calls visit with every file that people write: its path from the top,
// with slashes, and its text.
func sources(t *testing.T, visit func(path string, text []byte)) {
	t.Helper()
	count := 0
	written := []string{".go", ".js", ".css", ".html", ".md"}
	must(t, filepath.WalkDir("..", func(path string, entry fs.DirEntry, err error) error {
		if err != nil {
			return err
		}
		name := filepath.ToSlash(strings.TrimPrefix(path, ".."+string(filepath.Separator)))
		if entry.IsDir() {
			if slices.Contains([]string{".git", "web/node_modules", "build/site", "build/out"}, name) {
				return filepath.SkipDir
			}
			return nil
		}
		if !slices.Contains(written, filepath.Ext(name)) && entry.Name() != "Makefile" {
			return nil
		}
		text, err := os.ReadFile(path)
		if err != nil {
			return err
		}
		count++
		visit(name, text)
		return nil
	}))
	if count == 0 {
		t.Fatal("no source was found")
	}
}

func TestNoFileIsTooLongToRead(t *testing.T) {
	const longest = 500
	sources(t, func(path string, text []byte) {
		if lines := bytes.Count(text, []byte("\n")); lines > longest {
			t.Errorf("%s has %d lines; a concept fits in %d", path, lines, longest)
		}
	})
}

// Put together, so that this file does not find itself.
var unfinished = []string{"TO" + "DO", "FIX" + "ME", "XX" + "X"}

func TestNothingIsLeftUnfinished(t *testing.T) {
	sources(t, func(path string, text []byte) {
		for _, mark := range unfinished {
			if bytes.Contains(text, []byte(mark)) {
				t.Errorf("%s holds %q", path, mark)
			}
		}
	})
}

// goFiles calls visit with every Go file, parsed.
func goFiles(t *testing.T, visit func(path string, file *ast.File, where *token.FileSet)) {
	t.Helper()
	sources(t, func(path string, text []byte) {
		if filepath.Ext(path) != ".go" {
			return
		}
		where := token.NewFileSet()
		file, err := parser.ParseFile(where, path, text, parser.SkipObjectResolution)
		must(t, err)
		visit(path, file, where)
	})
}

func TestOnlyBrowserTalksToJavaScript(t *testing.T) {
	doors := 0
	goFiles(t, func(path string, file *ast.File, _ *token.FileSet) {
		door := strings.HasPrefix(path, "app/browser/") && strings.HasSuffix(path, "_js.go")
		if door {
			doors++
		}
		for _, spec := range file.Imports {
			if spec.Path.Value == `"syscall/js"` && !door {
				t.Errorf("%s imports syscall/js; only app/browser/**/*_js.go may", path)
			}
		}
		if !door && strings.HasSuffix(path, "_js.go") {
			t.Errorf("%s is for the browser only; such files belong to app/browser", path)
		}
		if !door || !slices.ContainsFunc(file.Decls, exported) {
			return // helpers of the browser side need no twin
		}
		twin := strings.TrimSuffix(path, "_js.go") + "_native.go"
		if _, err := os.Stat(filepath.Join("..", filepath.FromSlash(twin))); err != nil {
			t.Errorf("%s has no native twin %s", path, twin)
		}
	})
	if doors == 0 {
		t.Error("no file of app/browser was seen")
	}
}

func exported(d ast.Decl) bool {
	f, ok := d.(*ast.FuncDecl)
	return ok && f.Name.IsExported()
}

// calls lists what a file takes from a package, as "time.Now", by the name that
// the package goes by in the file.
func calls(file *ast.File, pack string) (names []*ast.SelectorExpr) {
	local := ""
	for _, spec := range file.Imports {
		if spec.Path.Value != `"`+pack+`"` {
			continue
		}
		local = strings.TrimSuffix(pack, "/v2")
		local = local[strings.LastIndex(local, "/")+1:]
		if spec.Name != nil {
			local = spec.Name.Name
		}
	}
	ast.Inspect(file, func(n ast.Node) bool {
		selector, ok := n.(*ast.SelectorExpr)
		if !ok {
			return true
		}
		if left, ok := selector.X.(*ast.Ident); ok && local != "" && left.Name == local {
			names = append(names, selector)
		}
		return true
	})
	return names
}

// The same study gives the same bytes, today and tomorrow, in tests as well.
func TestPhysicsHasNoClockAndNoDice(t *testing.T) {
	clock := []string{"Now", "Since", "Until", "After", "AfterFunc", "Tick", "NewTicker", "NewTimer", "Sleep"}
	seeded := []string{"New", "NewPCG", "NewChaCha8", "NewZipf", "Rand", "Source", "PCG", "ChaCha8", "Zipf"}
	goFiles(t, func(path string, file *ast.File, where *token.FileSet) {
		if !strings.HasPrefix(path, "physics/") {
			return
		}
		for _, s := range calls(file, "time") {
			if slices.Contains(clock, s.Sel.Name) {
				t.Errorf("%s: time.%s: physics has no clock", where.Position(s.Pos()), s.Sel.Name)
			}
		}
		for _, s := range calls(file, "math/rand/v2") {
			if !slices.Contains(seeded, s.Sel.Name) {
				t.Errorf("%s: rand.%s draws without a seed of ours", where.Position(s.Pos()), s.Sel.Name)
			}
		}
		if len(calls(file, "math/rand")) > 0 {
			t.Errorf("%s uses math/rand; math/rand/v2 has seeds that last", path)
		}
	})
}

// A test waits for conditions and always tests.
func TestTestsNeitherSkipNorSleep(t *testing.T) {
	goFiles(t, func(path string, file *ast.File, where *token.FileSet) {
		if !strings.HasSuffix(path, "_test.go") {
			return
		}
		ast.Inspect(file, func(n ast.Node) bool {
			call, ok := n.(*ast.CallExpr)
			if !ok {
				return true
			}
			if s, ok := call.Fun.(*ast.SelectorExpr); ok && slices.Contains([]string{"Skip", "Skipf", "SkipNow", "Sleep"}, s.Sel.Name) {
				t.Errorf("%s calls %s", where.Position(call.Pos()), s.Sel.Name)
			}
			return true
		})
	})
}

// A folder of goldens belongs to a package that keeps and checks them.
func TestGoldensBelongToAPackage(t *testing.T) {
	folders, err := filepath.Glob("../testdata/golden/*")
	must(t, err)
	keepers, err := filepath.Glob("../*/*/golden_test.go")
	must(t, err)
	for _, folder := range folders {
		if !slices.ContainsFunc(keepers, func(keeper string) bool { return filepath.Base(filepath.Dir(keeper)) == filepath.Base(folder) }) {
			t.Errorf("%s belongs to no package with a golden_test.go", folder)
		}
	}
}

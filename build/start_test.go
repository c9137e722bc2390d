package main

import (
	"math"
	"os"
	"path/filepath"
	"regexp"
	"slices"
	"strings"
	"testing"

	"brinefront/physics/study"
)

// policy is what the page may do: run its own files and compute. Nothing leaves.
const policy = "default-src 'none'; script-src 'self' 'wasm-unsafe-eval'; style-src 'self' 'unsafe-inline'; img-src 'self' data: blob:; " +
	"worker-src blob:; connect-src 'none'; base-uri 'none'; form-action 'none'"

// places are the ways to open the site; it has to be the same in all.
var places = map[string]func(t testing.TB, options ...Option) *Page{
	"double-click":   OpenFile,
	"HTTP subfolder": OpenHTTPSubfolder,
}

func TestSiteOpensAndComputesWithoutAnyRequestFromOutside(t *testing.T) {
	for name, open := range places {
		t.Run(name, func(t *testing.T) {
			p := open(t)
			p.WaitIdle()
			p.Settle()
			atStart := len(p.Requests())
			if atStart == 0 {
				t.Fatal("no request was seen, not even for the page itself")
			}
			parts := Eval[int](p, `brinefront.run({type: "brinefront/study", version: 1}).then(result => Object.keys(result.parts).length)`)
			if parts == 0 {
				t.Error("the engine answered without any part")
			}
			for _, sheet := range []string{"#/rock", "#/front", "#/field", "#/report"} {
				p.Go(sheet)
				p.WaitIdle()
			}
			p.NoTrouble()
			later := slices.DeleteFunc(p.Requests()[atStart:], func(address string) bool {
				return strings.HasPrefix(address, "blob:") // the worker of brinefront.run, made in the page
			})
			if len(later) > 0 {
				t.Errorf("after its start the page asked for %q", later)
			}
		})
	}
}

// A page of somebody else's computes with engine.js alone, and gets what the
// native program gets.
func TestAnotherPageCanCompute(t *testing.T) {
	folder := t.TempDir()
	must(t, os.CopyFS(filepath.Join(folder, "brinefront"), os.DirFS(built(t))))
	page := `<!doctype html><title>Another page</title><body><p>Nothing yet</p><script src="brinefront/engine.js"></script>`
	must(t, os.WriteFile(filepath.Join(folder, "index.html"), []byte(page), 0o644))
	p := OpenFile(t, func(s *settings) { s.site = folder })
	demo := study.Demo()
	got := Eval[study.Result](p, `brinefront.run(`+study.Write(demo)+`)`)
	want := study.Run(demo).Parts[study.SheetField].Figures
	if len(want) == 0 || len(got.Parts[study.SheetField].Figures) != len(want) {
		t.Fatalf("%d figures, natively %d", len(got.Parts[study.SheetField].Figures), len(want))
	}
	for i, figure := range want {
		value := got.Parts[study.SheetField].Figures[i].Value
		if math.Abs(value-figure.Value) > 1e-9*math.Abs(figure.Value) {
			t.Errorf("%s is %v, natively %v", figure.ID, value, figure.Value)
		}
	}
	failed := Eval[string](p, `brinefront.run({}, {kind: "guess"}).then(() => "answered", (fault) => fault.message)`)
	if !strings.Contains(failed, "unknown kind") {
		t.Errorf("an unknown request: %q", failed)
	}
	p.NoTrouble()
}

func TestPolicyIsAsStrictAsDesigned(t *testing.T) {
	p := OpenFile(t)
	got := Eval[[]string](p, `[...document.querySelectorAll("meta[http-equiv=Content-Security-Policy]")].map(e => e.content)`)
	if !slices.Equal(got, []string{policy}) {
		t.Errorf("the policy is\n%q\nand has to be\n%q", got, policy)
	}
	// What the policy is for, tried out.
	for what, attempt := range map[string]string{
		"reach a server":               `fetch("data:text/plain,x")`,
		"make a function of a text":    `new Promise(resolve => resolve(new Function("return 1")()))`,
		"start a worker of an address": `new Promise((resolve, reject) => { const w = new Worker("engine.js"); w.onmessage = resolve; w.onerror = reject; })`,
	} {
		if Eval[bool](p, `(async () => await `+attempt+`)().then(() => true, () => false)`) {
			t.Errorf("the page may %s", what)
		}
	}
}

func TestMissingFileIsNamed(t *testing.T) {
	for _, file := range siteFiles {
		if file == "index.html" || !strings.HasSuffix(file, ".js") && !strings.HasSuffix(file, ".css") {
			continue
		}
		t.Run(file, func(t *testing.T) {
			p := OpenFile(t, Without(t, file))
			p.WaitFor(`document.body.innerText.includes(` + quote("The file "+file+" of this folder did not load.") + `)`)
		})
	}
}

func TestScriptsOffIsSaid(t *testing.T) {
	p := OpenFile(t, ScriptsOff())
	shown := p.Screen()
	if !strings.Contains(shown, "Scripts are switched off in this browser") {
		t.Errorf("the page shows %q", shown)
	}
	if strings.Contains(shown, "did not load") {
		t.Errorf("the page blames a file: %q", shown)
	}
}

func TestOldBrowserIsSaid(t *testing.T) {
	for _, lacks := range []string{"WebAssembly", "DecompressionStream", "Worker", "BigInt"} {
		t.Run(lacks, func(t *testing.T) {
			p := OpenFile(t, Before(`delete self.`+lacks))
			p.WaitFor(`document.body.innerText.includes(` + quote("This browser is too old to compute here (it has no "+lacks+").") + `)`)
			for _, address := range p.Requests() {
				if strings.HasSuffix(address, "-program.js") {
					t.Errorf("it loaded %s all the same", address)
				}
			}
		})
	}
}

// An old browser reads boot.js whole before it runs any of it.
func TestBootKeepsToOldSyntax(t *testing.T) {
	text, err := os.ReadFile("site/boot.js")
	must(t, err)
	newer := regexp.MustCompile("=>|`|\\b(const|let|class|async function|await)\\b|\\?\\.|\\?\\?")
	if found := newer.FindString(string(text)); found != "" {
		t.Errorf("boot.js holds %q, which old browsers cannot read", found)
	}
}

// The files that the page asks for and the files that are built are the same.
func TestPageAsksForWhatIsBuilt(t *testing.T) {
	p := OpenFile(t)
	p.WaitIdle()
	asked := []string{"study.schema.json", "THIRD-PARTY.txt"} // for people, not for the page
	for _, address := range p.Requests() {
		if name, own := strings.CutPrefix(address, p.Folder); own {
			asked = append(asked, name)
		}
	}
	want := slices.Sorted(slices.Values(siteFiles))
	if got := slices.Compact(slices.Sorted(slices.Values(asked))); !slices.Equal(got, want) {
		t.Errorf("the page asks for\n%q\nand the site holds\n%q", got, want)
	}
}

package main

import (
	"bytes"
	"compress/gzip"
	"encoding/base64"
	"errors"
	"fmt"
	"os"
	"path/filepath"

	"brinefront/physics/study"
)

// A program of the site: compiled to WebAssembly and carried in a script.
type program struct {
	pack   string   // the Go package with its main
	script string   // the file of the site that carries it
	global string   // the global that the script sets
	flags  []string // for the compiler
}

var programs = []program{
	// The interface computes nothing: without inlined copies of small functions it
	// is a twentieth smaller to download and as quick to the hand.
	{"./app", "interface-program.js", "brinefrontInterfaceProgram", []string{"-modfile=" + slimMod, "-gcflags=all=-l"}},
	// So is the part of the engine that words and orders its results.
	{"./app/engine", "engine-program.js", "brinefrontEngineProgram", []string{"-gcflags=brinefront/physics/study=-l"}},
}

// siteFiles are what a site holds, no more and no less. Only their names are
// spelled out in web/index.html and web/boot.js, and a test compares.
var siteFiles = []string{
	"index.html", "boot.js", "start.js", "engine.js", "plot.js", "interface-program.js", "engine-program.js",
	"style.css", "print.css", "study.schema.json", "THIRD-PARTY.txt",
}

// buildSite writes build/site anew. Every address in it is relative, so that the
// folder works wherever it is copied.
func buildSite() error {
	if err := errors.Join(os.RemoveAll(siteFolder), os.MkdirAll(siteFolder, 0o755), os.MkdirAll(outFolder, 0o755)); err != nil {
		return err
	}
	if err := slimGoApp(); err != nil {
		return err
	}
	for _, p := range programs {
		if err := p.build(); err != nil {
			return fmt.Errorf("%s: %w", p.pack, err)
		}
	}
	if err := bundle(); err != nil {
		return err
	}
	index, err := indexPage()
	if err != nil {
		return err
	}
	if err := writeSite("index.html", index); err != nil {
		return err
	}
	if err := writeSite("study.schema.json", []byte(study.Schema())); err != nil {
		return err
	}
	notices, err := thirdParty()
	if err != nil {
		return err
	}
	return writeSite("THIRD-PARTY.txt", notices)
}

// indexPage is index.html with its icon in it: browsers ask for an icon again
// whenever the address changes, and after its start a page asks for nothing.
func indexPage() ([]byte, error) {
	page, err := os.ReadFile(filepath.Join(webFolder, "index.html"))
	if err != nil {
		return nil, err
	}
	const icon = "icons/brinefront.svg"
	drawing, err := os.ReadFile(filepath.Join(webFolder, icon))
	if err != nil {
		return nil, err
	}
	if bytes.Count(page, []byte(icon)) != 1 {
		return nil, fmt.Errorf("index.html has to name its icon once, as %s", icon)
	}
	inline := "data:image/svg+xml;base64," + base64.StdEncoding.EncodeToString(drawing)
	return bytes.Replace(page, []byte(icon), []byte(inline), 1), nil
}

func writeSite(name string, content []byte) error {
	path := filepath.Join(siteFolder, name)
	if err := os.MkdirAll(filepath.Dir(path), 0o755); err != nil {
		return err
	}
	return os.WriteFile(path, content, 0o644)
}

// build compiles the program and writes its script. The unstripped program stays
// in build/out: checkSite looks at what it links.
func (p program) build() error {
	if err := compileWasm(p.pack, p.unstripped(), p.flags...); err != nil {
		return err
	}
	whole, err := os.ReadFile(p.unstripped())
	if err != nil {
		return err
	}
	code, err := packWasm(whole)
	if err != nil {
		return err
	}
	zipped, err := gzipped(code)
	if err != nil {
		return err
	}
	fmt.Printf("%-22s %5.2f MB, %.2f MB gzipped\n", p.script, megabytes(len(code)), megabytes(len(zipped)))
	return writeSite(p.script, fmt.Appendf(nil, "self.%s=%q;\n", p.global, base64.StdEncoding.EncodeToString(zipped)))
}

func (p program) unstripped() string {
	return filepath.Join(outFolder, p.global+".wasm")
}

func gzipped(content []byte) ([]byte, error) {
	var out bytes.Buffer
	w, err := gzip.NewWriterLevel(&out, gzip.BestCompression)
	if err != nil {
		return nil, err
	}
	_, err = w.Write(content)
	err = errors.Join(err, w.Close()) // before the bytes are taken: closing writes the end
	return out.Bytes(), err
}

func megabytes(bytes int) float64 { return float64(bytes) / 1e6 }

package main

import (
	"encoding/binary"
	"errors"
	"fmt"
	"os"
	"os/exec"
)

// compileWasm compiles a program for the browser, without debugging data but
// with the names of its functions.
func compileWasm(pack, out string, flags ...string) error {
	arguments := append([]string{"build", "-trimpath", "-ldflags=-w", "-o", out}, flags...)
	cmd := exec.Command("go", append(arguments, pack)...)
	cmd.Env = append(os.Environ(), "GOOS=js", "GOARCH=wasm")
	cmd.Stderr = os.Stderr
	return cmd.Run()
}

var errWasm = errors.New("this is no WebAssembly module")

// customSection is the kind of section that a module runs without: names and
// notes (WebAssembly Core Specification 2.0, section 5.5.3).
const customSection = 0

// sections calls visit with every section of a module: its kind, the whole of
// its bytes and its content.
func sections(module []byte, visit func(kind byte, whole, content []byte)) error {
	const header = 8 // magic number and version
	if len(module) < header || string(module[:4]) != "\x00asm" {
		return errWasm
	}
	for rest := module[header:]; len(rest) > 0; {
		size, n := binary.Uvarint(rest[1:])
		end := 1 + n + int(size)
		if n <= 0 || end > len(rest) {
			return errWasm
		}
		visit(rest[0], rest[:end], rest[1+n:end])
		rest = rest[end:]
	}
	return nil
}

// stripWasm takes out what a module runs without.
func stripWasm(module []byte) ([]byte, error) {
	bare := append([]byte{}, module[:min(8, len(module))]...)
	err := sections(module, func(kind byte, whole, _ []byte) {
		if kind != customSection {
			bare = append(bare, whole...)
		}
	})
	return bare, err
}

// functionNames lists the functions of a module by the names the linker kept
// (section "name", subsection 1; appendix "Custom Sections" of the specification).
func functionNames(module []byte) (names []string, err error) {
	err = sections(module, func(kind byte, _, content []byte) {
		r := &wasmReader{rest: content}
		if kind != customSection || r.text() != "name" {
			return
		}
		for len(r.rest) > 0 {
			subsection, size := r.number(), r.number()
			part := &wasmReader{rest: r.take(size)}
			const functions = 1
			if subsection != functions {
				continue
			}
			for range part.number() {
				part.number() // index
				names = append(names, part.text())
			}
		}
	})
	if err == nil && len(names) == 0 {
		err = fmt.Errorf("the module names no function")
	}
	return names, err
}

// wasmReader reads a section; what is not there reads as nothing, and a module
// without names is an error of functionNames.
type wasmReader struct{ rest []byte }

func (r *wasmReader) number() uint64 {
	v, n := binary.Uvarint(r.rest)
	if n <= 0 {
		r.rest = nil
		return 0
	}
	r.rest = r.rest[n:]
	return v
}

func (r *wasmReader) take(n uint64) []byte {
	n = min(n, uint64(len(r.rest)))
	taken := r.rest[:n]
	r.rest = r.rest[n:]
	return taken
}

func (r *wasmReader) text() string { return string(r.take(r.number())) }

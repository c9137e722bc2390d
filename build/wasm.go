package main

import (
	"bytes"
	"encoding/binary"
	"errors"
	"fmt"
	"os"
	"os/exec"
	"slices"
)

// compileWasm compiles a program for the browser, without debugging data but
// with the names of its functions. It leaves out the state of the repository, which
// Go would write in: the same sources give the same bytes.
func compileWasm(pack, out string, flags ...string) error {
	arguments := append([]string{"build", "-trimpath", "-buildvcs=false", "-ldflags=-w", "-o", out}, flags...)
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

// packWasm takes out what a module runs without, and joins its data.
func packWasm(module []byte) ([]byte, error) {
	packed := append([]byte{}, module[:min(8, len(module))]...)
	var dataErr error
	err := sections(module, func(kind byte, whole, content []byte) {
		switch kind {
		case customSection:
		case dataSection:
			var data []byte
			data, dataErr = joinData(content)
			packed = binary.AppendUvarint(append(packed, dataSection), uint64(len(data)))
			packed = append(packed, data...)
		default:
			packed = append(packed, whole...)
		}
	})
	return packed, errors.Join(err, dataErr)
}

// dataSection fills the memory: a count and so many segments, each an expression
// for its address and its bytes (section 5.5.14).
const dataSection = 11

// segment is a piece of memory that the module fills when it starts.
type segment struct {
	at      uint64
	content []byte
}

func (s segment) end() uint64 { return s.at + uint64(len(s.content)) }

// joinData joins segments that lie close together, zeros between them written out.
// Go's linker ends a segment at every eight zeros and fills the 100,000 that a
// browser allows: their addresses, a tenth of the program when it is compressed,
// cost more than the zeros.
func joinData(section []byte) ([]byte, error) {
	const (
		active, constant, end = 0, 0x41, 0x0b // in memory 0, at: i32.const ... end
		zeros                 = 256           // the longest gap that is filled
	)
	var list []segment
	r := &wasmReader{rest: section}
	for range r.number() {
		head, at := r.take(2), r.number() // no address has the bit of the sign
		if head = append(slices.Clone(head), r.take(1)...); !bytes.Equal(head, []byte{active, constant, end}) {
			return nil, errWasm
		}
		size := r.number()
		content := r.take(size)
		if uint64(len(content)) != size {
			return nil, errWasm
		}
		last := len(list) - 1
		if last < 0 || at < list[last].end() || at-list[last].end() > zeros {
			list = append(list, segment{at, slices.Clone(content)})
			continue
		}
		list[last].content = append(list[last].content, make([]byte, at-list[last].end())...)
		list[last].content = append(list[last].content, content...)
	}
	out := binary.AppendUvarint(nil, uint64(len(list)))
	for _, s := range list {
		out = appendSigned(append(out, active, constant), s.at)
		out = binary.AppendUvarint(append(out, end), uint64(len(s.content)))
		out = append(out, s.content...)
	}
	return out, nil
}

// appendSigned writes a number that is not negative as the format writes signed
// ones (LEB128, section 5.2.2): bit 6 of the last byte is the sign.
func appendSigned(out []byte, v uint64) []byte {
	for ; v > 0x3f; v >>= 7 {
		out = append(out, byte(v)|0x80)
	}
	return append(out, byte(v))
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

package main

import (
	"reflect"
	"testing"
)

// What go test -bench prints, as the testing package documents it: name with the
// number of processors, count, then values each with a unit.
func TestTimingsAreReadAsGoPrintsThem(t *testing.T) {
	got, err := readTimings("goos: linux\nBenchmarkPoints/100-2 \t 48\t  22555767 ns/op\t 1.5 ms-median\nPASS\nok  \tsome/package\t6.1s\n")
	must(t, err)
	want := timings{{"Points/100", map[string]float64{"ns/op": 22555767, "ms-median": 1.5}}}
	if !reflect.DeepEqual(got, want) {
		t.Errorf("read %v, want %v", got, want)
	}
	if _, err := readTimings("BenchmarkX-2 10 fast ns/op\n"); err == nil {
		t.Error("a value that is no number was read")
	}
}

func TestFunctionsAreToldByTheirPackage(t *testing.T) {
	names := []string{
		"brinefront_physics_fit.Corey", "brinefront_physics_fit.init", "brinefront_physics_fit.init.func1", "brinefront_physics_fit.map.init.0",
		"brinefront_physics_fit_inner._T_.Do", "brinefront_physics_fitting.Do", "runtime.main", "brinefront_physics_fit.initial",
	}
	want := []string{"brinefront_physics_fit.Corey", "brinefront_physics_fit_inner._T_.Do", "brinefront_physics_fit.initial"}
	if got := functionsOf("brinefront/physics/fit", names); !reflect.DeepEqual(got, want) {
		t.Errorf("told %q, want %q", got, want)
	}
}

// A module by hand, after the WebAssembly Core Specification 2.0, section 5.5 and
// the appendix on names: a type section and the name of one function.
func TestNamesAreReadAndStripped(t *testing.T) {
	bare := []byte("\x00asm\x01\x00\x00\x00" + "\x01\x04\x01\x60\x00\x00")
	named := append(append([]byte{}, bare...), "\x00\x0d\x04name"+"\x01\x06\x01\x00\x03a.b"...)
	names, err := functionNames(named)
	if err != nil || !reflect.DeepEqual(names, []string{"a.b"}) {
		t.Errorf("names %q, %v", names, err)
	}
	stripped, err := packWasm(named)
	if err != nil || !reflect.DeepEqual(stripped, bare) {
		t.Errorf("stripped to %q, %v", stripped, err)
	}
	for _, broken := range []string{"", "\x00asm", "no module at all", "\x00asm\x01\x00\x00\x00\x01\x7f"} {
		if _, err := packWasm([]byte(broken)); err == nil {
			t.Errorf("%q passed for a module", broken)
		}
	}
	if _, err := functionNames(bare); err == nil {
		t.Error("a module without names passed for one that links nothing")
	}
}

// Data sections by hand, after section 5.5.14: a count, then {0, i32.const address,
// end, size, bytes}. 0x40 alone would be a negative address, so 64 takes two bytes.
func TestDataIsJoinedAcrossFewZeros(t *testing.T) {
	const header = "\x00asm\x01\x00\x00\x00\x0b"
	for _, c := range []struct{ what, from, to string }{
		{"neighbours", "\x0e\x02" + "\x00\x41\x04\x0b\x02ab" + "\x00\x41\x08\x0b\x01c", "\x0b\x01" + "\x00\x41\x04\x0b\x05ab\x00\x00c"},
		{"far apart", "\x0f\x02" + "\x00\x41\xc0\x00\x0b\x01a" + "\x00\x41\x80\x10\x0b\x01b", "\x0f\x02" + "\x00\x41\xc0\x00\x0b\x01a" + "\x00\x41\x80\x10\x0b\x01b"},
		{"out of order", "\x0d\x02" + "\x00\x41\x08\x0b\x01a" + "\x00\x41\x04\x0b\x01b", "\x0d\x02" + "\x00\x41\x08\x0b\x01a" + "\x00\x41\x04\x0b\x01b"},
	} {
		got, err := packWasm([]byte(header + c.from))
		if err != nil || string(got) != header+c.to {
			t.Errorf("%s: packed to %q, %v; want %q", c.what, got, err, header+c.to)
		}
	}
	for what, broken := range map[string]string{
		"passive":         "\x04\x01\x01\x01a",
		"shorter than it": "\x07\x01\x00\x41\x04\x0b\x09a",
	} {
		if _, err := packWasm([]byte(header + broken)); err == nil {
			t.Errorf("a segment that is %s passed", what)
		}
	}
}

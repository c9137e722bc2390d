package main

import (
	"bytes"
	"errors"
	"fmt"
	"io"
	"os"
	"os/exec"
	"path/filepath"
	"strconv"
	"strings"
)

// Timings of the same benchmarks, native and in WebAssembly on Node, side by side.
var timed = []string{"./app/engine/serve"}

// slowest is how much longer WebAssembly may take than native code, by the budget.
const slowest = 2.5

func bench() error {
	path, err := wasmTestPath()
	if err != nil {
		return err
	}
	native, err := benchmark(nil, timed...)
	if err != nil {
		return err
	}
	wasm, err := benchmark([]string{"GOOS=js", "GOARCH=wasm", "PATH=" + path}, timed...)
	if err != nil {
		return err
	}
	fmt.Printf("\n%-44s %12s %12s %8s\n", "computing", "native", "WebAssembly", "ratio")
	for _, row := range native {
		other, ok := wasm.find(row.name)
		if !ok {
			return fmt.Errorf("%s did not run in WebAssembly", row.name)
		}
		ratio := other.values["ns/op"] / row.values["ns/op"]
		over := ""
		if ratio > slowest {
			over = fmt.Sprintf("  over the budget of %g", slowest)
		}
		fmt.Printf("%-44s %9.3f ms %9.3f ms %8.2f%s\n", row.name, row.values["ns/op"]/1e6, other.values["ns/op"]/1e6, ratio, over)
	}
	if err := cellSteps(path); err != nil {
		return err
	}

	seen, err := benchmark(nil, "./build")
	if err != nil {
		return err
	}
	fmt.Printf("\n%-44s %12s %12s %12s\n", "in Chromium", "first", "median", "90 % within")
	for _, row := range seen {
		fmt.Printf("%-44s %9.0f ms %9.0f ms %9.0f ms\n", row.name, row.values["ms-first"], row.values["ms-median"], row.values["ms-p90"])
	}
	return nil
}

// timing is one line of go test -bench: a name and values by unit.
type timing struct {
	name   string
	values map[string]float64
}

type timings []timing

func (list timings) find(name string) (timing, bool) {
	for _, row := range list {
		if row.name == name {
			return row, true
		}
	}
	return timing{}, false
}

// benchmark runs the benchmarks of packages. What it prints goes to the error
// output too: they take minutes.
func benchmark(environment []string, packages ...string) (timings, error) {
	cmd := exec.Command("go", append([]string{"test", "-run=^$", "-bench=.", "-timeout=30m"}, packages...)...)
	cmd.Env = append(os.Environ(), environment...)
	var said bytes.Buffer
	cmd.Stdout = io.MultiWriter(&said, os.Stderr)
	cmd.Stderr = os.Stderr
	if err := cmd.Run(); err != nil {
		return nil, err
	}
	rows, err := readTimings(said.String())
	if err == nil && len(rows) == 0 {
		err = errors.New("no benchmark ran")
	}
	return rows, err
}

// readTimings reads what go test -bench prints: a name that ends in the number
// of processors, a count, and pairs of a value and its unit.
func readTimings(text string) (rows timings, err error) {
	for line := range strings.Lines(text) {
		words := strings.Fields(line)
		if len(words) < 4 || !strings.HasPrefix(words[0], "Benchmark") {
			continue
		}
		name, _, _ := strings.Cut(strings.TrimPrefix(words[0], "Benchmark"), "-")
		row := timing{name, map[string]float64{}}
		for i := 2; i+1 < len(words); i += 2 {
			value, err := strconv.ParseFloat(words[i], 64)
			if err != nil {
				return nil, fmt.Errorf("a benchmark printed %q: %w", line, err)
			}
			row.values[words[i+1]] = value
		}
		rows = append(rows, row)
	}
	return rows, nil
}

// wasmTestPath is the search path with the folder of go_js_wasm_exec in front:
// go test runs WebAssembly by that program, which needs Node.
func wasmTestPath() (string, error) {
	root, err := exec.Command("go", "env", "GOROOT").Output()
	if err != nil {
		return "", err
	}
	folder := filepath.Join(strings.TrimSpace(string(root)), "lib", "wasm")
	return folder + string(os.PathListSeparator) + os.Getenv("PATH"), nil
}

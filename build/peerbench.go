package main

import (
	"fmt"
	"os/exec"
	"strconv"
	"strings"
)

// Finite volumes are to be so many times faster than a script that does the same, to the same
// accuracy, with whole vectors in NumPy. That with a coarse table in the script is printed beside.
const (
	nativeOverPeer = 5
	wasmOverPeer   = 2
)

// peerCells are the grids that the benchmark of fv and the script both run.
var peerCells = []string{"100", "1000", "10000"}

// cellSteps prints the speed of the finite volumes, in million cell-steps a second, by the number
// of cells: native, in WebAssembly on Node and, where python3-numpy is there, of the script.
func cellSteps(path string) error {
	native, err := benchmark(nil, "./physics/fv")
	if err != nil {
		return err
	}
	wasm, err := benchmark([]string{"GOOS=js", "GOARCH=wasm", "PATH=" + path}, "./physics/fv")
	if err != nil {
		return err
	}
	const unit = "Mcell-steps/s"
	peer := peerSpeeds()
	fmt.Printf("\n%-44s %12s %12s %12s %12s\n", "million cell-steps a second", "native", "WebAssembly", "NumPy", "NumPy, 1e-6")
	for _, row := range native {
		speed, ok := row.values[unit]
		if !ok {
			continue
		}
		other, ok := wasm.find(row.name)
		if !ok {
			return fmt.Errorf("%s did not run in WebAssembly", row.name)
		}
		fmt.Printf("%-44s %12.1f %12.1f", row.name, speed, other.values[unit])
		// The script does what a first-order run with a table does.
		cells, same := strings.CutPrefix(row.name, "Run/table/upstream/")
		if there := peer[cells]; same && there.exact > 0 {
			fmt.Printf(" %12.1f %12.1f  %.1f and %.1f times the exact script%s", there.exact, there.table, speed/there.exact, other.values[unit]/there.exact, short(speed/there.exact, other.values[unit]/there.exact))
		}
		fmt.Println()
	}
	if len(peer) == 0 {
		fmt.Println("Not beside the script testdata/peer/upstream.py: no Python with NumPy here (apt-get install python3-numpy).")
	}
	return nil
}

// short says which of two ratios is below what it should be.
func short(native, wasm float64) string {
	said := ""
	if native < nativeOverPeer {
		said += fmt.Sprintf("  below %d native", nativeOverPeer)
	}
	if wasm < wasmOverPeer {
		said += fmt.Sprintf("  below %d in WebAssembly", wasmOverPeer)
	}
	return said
}

// peerSpeeds runs the script; nothing where there is no Python that has NumPy. Debian's own is
// tried too, where another comes first on the search path.
func peerSpeeds() map[string]peerSpeed {
	for _, python := range []string{"python3", "/usr/bin/python3"} {
		out, err := exec.Command(python, append([]string{"testdata/peer/upstream.py"}, peerCells...)...).Output()
		if err == nil {
			return readPeer(string(out))
		}
	}
	return nil
}

// peerSpeed is the speed of the script with f to rounding and with f from its table.
type peerSpeed struct{ exact, table float64 }

// readPeer reads lines of cells and the two speeds.
func readPeer(text string) map[string]peerSpeed {
	speeds := map[string]peerSpeed{}
	for line := range strings.Lines(text) {
		words := strings.Fields(line)
		if len(words) != 3 {
			continue
		}
		exact, err := strconv.ParseFloat(words[1], 64)
		table, other := strconv.ParseFloat(words[2], 64)
		if err == nil && other == nil {
			speeds[words[0]] = peerSpeed{exact, table}
		}
	}
	return speeds
}

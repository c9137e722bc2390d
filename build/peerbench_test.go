package main

import "testing"

// Lines of the script are read by their number of cells; others are passed over.
func TestReadPeer(t *testing.T) {
	got := readPeer("100 3.5 20\nwarning: slow\n1000 12.25 40\n1 2 x\n")
	if len(got) != 2 || got["100"] != (peerSpeed{3.5, 20}) || got["1000"] != (peerSpeed{12.25, 40}) {
		t.Errorf("read %v", got)
	}
	if short(6, 3) != "" || short(4, 3) == "" || short(6, 1) == "" {
		t.Error("ratios are judged otherwise")
	}
}

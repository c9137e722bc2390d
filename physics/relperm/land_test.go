package relperm

import (
	"math"
	"testing"
)

// TestLand compares with Land (1968): values derived from his formula, four decimals,
// told in several connate waters, since the law is one in normalised saturations.
func TestLand(t *testing.T) {
	var file struct {
		C, Sgi []float64
		Sgr    [][]float64
	}
	readData(t, &file, "published", "land.json")
	if len(file.C) == 0 {
		t.Fatal("no values")
	}
	for i, c := range file.C {
		for j, s := range file.Sgi {
			for _, swc := range []float64{0, 0.15, 0.4} {
				sgi := s * (1 - swc)
				got := Land{C: c, Swc: swc}.Trapped(sgi)
				if want := file.Sgr[i][j]; math.Abs(got/(1-swc)-want) > 0.51e-4 {
					t.Errorf("C = %g, swc = %g: Sgr*(%g) = %v, want %g", c, swc, s, got/(1-swc), want)
				}
			}
		}
	}
}

// TestLandLimits: the special cases of the law.
func TestLandLimits(t *testing.T) {
	inf := math.Inf(1)
	for _, c := range []struct {
		name      string
		c, sgi    float64
		want, tol float64
	}{
		{"C = 0 traps all", 0, 0.37, 0.37, 1e-16},
		{"C infinite traps nothing", inf, 0.37, 0, 0},
		{"nothing to trap", 1.27, 0, 0, 0},
		{"nothing to trap, C infinite", inf, 0, 0, 0},
		{"small saturations are trapped whole", 2, 1e-9, 1e-9, 1e-17},
		{"large C traps (1 - swc)/C", 1e9, 0.6, 0.8e-9, 1e-17},
	} {
		if got := (Land{C: c.c, Swc: 0.2}).Trapped(c.sgi); !(math.Abs(got-c.want) <= c.tol) {
			t.Errorf("%s: %v, want %v", c.name, got, c.want)
		}
	}
}

// TestLandRises: more gas before never leaves less behind, and less than itself.
func TestLandRises(t *testing.T) {
	for _, c := range []float64{0.1, 1.27, 5} {
		l, last := Land{C: c, Swc: 0.22}, 0.0
		for sgi := 0.01; sgi <= 0.78; sgi += 0.01 {
			sgr := l.Trapped(sgi)
			if sgr <= last || sgr >= sgi {
				t.Errorf("C = %g: %v trapped of %v after %v", c, sgr, sgi, last)
			}
			last = sgr
		}
	}
}

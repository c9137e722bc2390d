package fit

import (
	"errors"
	"math"
	"math/rand/v2"
	"slices"
	"strings"
	"testing"

	"brinefront/physics/capillary"
)

var pcFamilies = []struct {
	family pcFamily
	run    func(PcPoints, PcOptions) (PcFit, error)
	random func(*rand.Rand) []float64
}{
	{brooksCorey, BrooksCorey, func(r *rand.Rand) []float64 {
		return []float64{0.3 * r.Float64(), 0.3 * r.Float64(), 500 + 1e5*r.Float64(), 0.3 + 5*r.Float64()}
	}},
	{vanGenuchten, VanGenuchten, func(r *rand.Rand) []float64 {
		return []float64{0.3 * r.Float64(), 0.3 * r.Float64(), 500 + 1e5*r.Float64(), 1.3 + 6*r.Float64()}
	}},
	{skjaeveland, Skjaeveland, func(r *rand.Rand) []float64 {
		return []float64{0.3 * r.Float64(), 0.3 * r.Float64(), 500 + 1e4*r.Float64(), 0.2 + r.Float64(), -500 - 1e4*r.Float64(), 0.2 + r.Float64()}
	}},
}

// pcTable draws rows from a curve, from near one end to near the other.
func pcTable(c capillary.Curve, rows int) PcPoints {
	low, high := c.Ends()
	var p PcPoints
	for i := range rows {
		sw := low + (high-low)*(0.02+0.96*float64(i)/float64(rows-1))
		pc, _ := c.At(sw)
		p.Sw, p.Pc = append(p.Sw, sw), append(p.Pc, pc)
	}
	return p
}

// TestPcSlopes compares the slopes with respect to every parameter with differences.
func TestPcSlopes(t *testing.T) {
	random := rand.New(rand.NewPCG(11, 12))
	for _, f := range pcFamilies {
		for range 200 {
			v := f.random(random)
			sw := v[0] + (1-v[1]-v[0])*(0.02+0.96*random.Float64())
			slopes := make([]float64, len(v))
			f.family.slopes(v, sw, slopes)
			pc, _ := f.family.curve(v).At(sw)
			for j := range v {
				step := 1e-5 * max(math.Abs(v[j]), 1e-2)
				at := func(by float64) float64 {
					w := slices.Clone(v)
					w[j] += by
					pc, _ := f.family.curve(w).At(sw)
					return pc
				}
				want := (8*(at(step)-at(-step)) - (at(2*step) - at(-2*step))) / (12 * step)
				if math.Abs(slopes[j]-want) > 1e-7*math.Abs(want)+1e-9*math.Abs(pc)/step*1e-5 {
					t.Fatalf("%s %v: d/d%s at %v is %v, by differences %v", f.family.name, v, f.family.specs[j].symbol, sw, slopes[j], want)
				}
			}
		}
	}
}

// TestPcRecovers: points without scatter give their curve back, held ends or free.
func TestPcRecovers(t *testing.T) {
	random := rand.New(rand.NewPCG(13, 14))
	for _, f := range pcFamilies {
		for i := range 60 {
			v := f.random(random)
			curve := f.family.curve(v)
			options := PcOptions{}
			if i%2 == 0 {
				options.Ends = &[2]float64{v[0], v[1]}
			}
			points := pcTable(curve, 25)
			fitted, err := f.run(points, options)
			if err != nil {
				t.Fatal(err)
			}
			if fitted.Status != Converged || fitted.RMS > 1e-9 {
				t.Errorf("%s through points of %v: %v, off by %g, parameters %+v", f.family.name, v, fitted.Status, fitted.RMS, fitted.state.values)
				continue
			}
			for k, sw := range points.Sw {
				if pc, _ := fitted.Curve.At(sw); math.Abs(pc-points.Pc[k]) > 1e-7*max(math.Abs(points.Pc[k]), 1) {
					t.Errorf("%s of %v: %v at %v, point %v", f.family.name, v, pc, sw, points.Pc[k])
				}
			}
		}
	}
}

// TestPcIntervals: with scatter in percent, the 95 % intervals hold the truth about as
// often as they say, by the binomial distribution over the draws.
func TestPcIntervals(t *testing.T) {
	random := rand.New(rand.NewPCG(15, 16))
	const draws = 400
	for _, f := range pcFamilies {
		v := f.random(random)
		clean := pcTable(f.family.curve(v), 20)
		held, inBand := make([]int, len(v)), 0
		for range draws {
			points := PcPoints{Sw: clean.Sw, Pc: slices.Clone(clean.Pc)}
			for i := range points.Pc {
				points.Pc[i] *= 1 + 0.02*random.NormFloat64()
			}
			fitted, err := f.run(points, PcOptions{Ends: &[2]float64{v[0], v[1]}})
			if err != nil {
				t.Fatal(err)
			}
			for j, p := range fitted.Parameters {
				if p.Low <= v[j] && v[j] <= p.High {
					held[j]++
				}
			}
			low, high := fitted.Band(clean.Sw[7])
			if low <= clean.Pc[7] && clean.Pc[7] <= high {
				inBand++
			}
		}
		// 400 draws at 0.95: standard deviation 4.4; four of them either way.
		within := func(name string, n int) {
			if n < 362 || n > 398 {
				t.Errorf("%s: the interval of %s holds the truth in %d of %d draws", f.family.name, name, n, draws)
			}
		}
		for j := 2; j < len(v); j++ {
			within(f.family.specs[j].symbol, held[j])
		}
		within("the band", inBand)
	}
}

// TestPcVerdict: what points cannot tell is said.
func TestPcVerdict(t *testing.T) {
	wet := capillary.Skjaeveland{Swr: 0.1, Sor: 0.2, Cw: 4000, Aw: 0.6}
	scattered := pcTable(wet, 20)
	for i := range scattered.Pc {
		scattered.Pc[i] *= 1 + 0.02*math.Sin(float64(7*i))
	}
	fitted, err := Skjaeveland(scattered, PcOptions{})
	if err != nil {
		t.Fatal(err)
	}
	said := strings.Join(fitted.Verdict, " ")
	if !strings.Contains(said, "Exponent of the oil branch ao is not determined") {
		t.Errorf("water-wet points are said to determine the oil branch: %s", said)
	}
	points := pcTable(capillary.BrooksCorey{Swr: 0.1, Snr: 0.2, Entry: 4000, Lambda: 1.5}, 20)
	points.Sw, points.Pc = append(points.Sw, 0.9), append(points.Pc, -50)
	points.Pc[8] *= 1.5
	fitted, err = BrooksCorey(points, PcOptions{})
	if err != nil {
		t.Fatal(err)
	}
	said = strings.Join(fitted.Verdict, " ")
	for _, want := range []string{"1 row is left out", "Further from the curve than chance allows lies Pc at Sw"} {
		if !strings.Contains(said, want) {
			t.Errorf("verdict lacks %q: %s", want, said)
		}
	}
}

// TestPcRefuses names what no curve can be drawn through.
func TestPcRefuses(t *testing.T) {
	var refused *RefusedError
	for name, p := range map[string]PcPoints{
		"few":      {[]float64{0.2, 0.3}, []float64{5, 3}},
		"missing":  {[]float64{0.2, 0.3, 0.4}, []float64{500, math.NaN(), 3}},
		"outside":  {[]float64{20, 30, 40}, []float64{500, 400, 300}},
		"constant": {[]float64{0.2, 0.3, 0.4}, []float64{500, 500, 500}},
		"sign":     {[]float64{0.2, 0.3, 0.4}, []float64{100, 400, 900}},
	} {
		if _, err := BrooksCorey(p, PcOptions{}); !errors.As(err, &refused) || len(refused.Findings) != 1 || refused.Findings[0].ID != name {
			t.Errorf("%s: %v", name, err)
		}
	}
	if _, err := Skjaeveland(PcPoints{[]float64{0.2, 0.3, 0.4, 0.5}, []float64{900, 400, 100, -5}}, PcOptions{}); !errors.As(err, &refused) || !strings.Contains(refused.Reason, "at least 7") {
		t.Errorf("four rows for six parameters: %v", err)
	}
}

// TestPcDoubts finds what is doubtful, and nothing in sound points.
func TestPcDoubts(t *testing.T) {
	for _, c := range []struct {
		want string
		p    PcPoints
	}{
		{"", PcPoints{[]float64{0.2, 0.3, 0.4, 0.5}, []float64{9e4, 4e4, 1e4, -500}}},
		{"rises", PcPoints{[]float64{0.2, 0.3, 0.4, 0.5}, []float64{9e4, 1e4, 4e4, 500}}},
		{"negative", PcPoints{[]float64{0.2, 0.3, 0.4, 0.5}, []float64{-1e4, -2e4, -3e4, -5e4}}},
		{"plateau", PcPoints{[]float64{0.2, 0.3, 0.4, 0.5}, []float64{9e4, 4e4, 4e4, 500}}},
		{"unit", PcPoints{[]float64{0.2, 0.3, 0.4, 0.5}, []float64{9, 4, 1, -0.5}}},
		{"order", PcPoints{[]float64{0.5, 0.4, 0.3, 0.2}, []float64{-500, 1e4, 4e4, 9e4}}},
		{"duplicate", PcPoints{[]float64{0.2, 0.3, 0.3, 0.5}, []float64{9e4, 4e4, 1e4, -500}}},
	} {
		var got []string
		for _, f := range InspectPc(c.p) {
			got = append(got, f.ID)
		}
		if strings.Join(got, " ") != c.want {
			t.Errorf("%v: found %v, want %q", c.p, got, c.want)
		}
	}
}

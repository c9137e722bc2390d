package fv

import (
	"encoding/json"
	"math"
	"os"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %.15g, want %.15g: off by %.2g, allowed %.2g", what, got, want, got-want, tolerance)
	}
}

// reference is case fv-01: independent SciPy computation, two methods.
type reference struct {
	ID     string
	Inputs struct {
		Fluid struct {
			Kr  relperm.Corey
			MuW float64 `json:"mu_w"`
			MuO float64 `json:"mu_o"`
		}
		Injected float64 `json:"s_injected"`
		Initial  float64 `json:"s_initial"`
		PVI      float64
		CFL      float64
		Fastest  float64 `json:"max_df_dS"`
		Cells    []int
	}
	Outputs struct {
		Steps        []int
		L1, L2, Linf []float64
		Order        []float64 `json:"l1_order"`
		Width        []float64 `json:"front_width_10_90"`
		InCells      []float64 `json:"front_width_in_cells"`
		Profile      []float64 `json:"profile_N50"`
		Mean         []float64 `json:"savg"`
	}
	Errors map[string]float64 `json:"est_error"`
}

func readReference(t testing.TB) reference {
	t.Helper()
	text, err := os.ReadFile("../../testdata/independent/fv.json")
	var file struct{ Cases []reference }
	if err == nil {
		err = json.Unmarshal(text, &file)
	}
	if err != nil {
		t.Fatal(err)
	}
	if len(file.Cases) != 1 || file.Cases[0].ID != "fv-01" {
		t.Fatalf("cases %+v, want fv-01", file.Cases)
	}
	return file.Cases[0]
}

func (c reference) flow() fracflow.Flow {
	in := c.Inputs.Fluid
	return fracflow.Flow{Curves: in.Kr, MuW: in.MuW, MuO: in.MuO}
}

func (c reference) law(t testing.TB) *Law {
	return newLaw(t, c.flow(), c.Inputs.Initial, c.Inputs.Injected)
}

func newLaw(t testing.TB, fn Function, a, b float64) *Law {
	t.Helper()
	law, err := NewLaw(fn, a, b)
	if err != nil {
		t.Fatal(err)
	}
	return law
}

func tabulated(t testing.TB, law *Law) *Law {
	t.Helper()
	table, err := law.Tabulated(1024)
	if err != nil {
		t.Fatal(err)
	}
	return table
}

func newRun(t testing.TB, law *Law, s Settings) *Run {
	t.Helper()
	run, err := New(law, s)
	if err != nil {
		t.Fatal(err)
	}
	return run
}

// averages are the exact cell averages of a displacement at q, from the mean state up to
// each face, which is that of a flood of a shorter rock.
func averages(d *displace.Displacement, q float64, n int) []float64 {
	out := make([]float64, n)
	before := 0.0
	for i := range out {
		x := float64(i+1) / float64(n)
		sum := x * d.Average(q/x)
		out[i] = (sum - before) * float64(n)
		before = sum
	}
	return out
}

// Independent SciPy computation, two methods: case fv-01, explicit upstream. Each number
// to the estimated error given with it; f itself and f from a table alike.
func TestIndependentUpstream(t *testing.T) {
	c := readReference(t)
	in, out := c.Inputs, c.Outputs
	law := c.law(t)
	near(t, "max df/dS", law.Fastest(in.Initial, in.Injected), in.Fastest, 1e-13*in.Fastest)
	d, err := displace.New(c.flow(), in.Injected, in.Initial)
	if err != nil {
		t.Fatal(err)
	}
	behind, ahead, _ := d.Front()
	for name, law := range map[string]*Law{"exact": law, "table": tabulated(t, law)} {
		before := 0.0
		for i, n := range in.Cells {
			run := newRun(t, law, Settings{Cells: n, CFL: in.CFL, Injected: in.Injected, Initial: in.Initial})
			run.Advance(in.PVI, nil)
			check := func(key string, got, want float64) {
				t.Helper()
				near(t, name+" "+key, got, want, c.Errors[key])
			}
			if run.Steps() != out.Steps[i] {
				t.Errorf("%s: %d steps, want %d", name, run.Steps(), out.Steps[i])
			}
			l1, l2, linf := Norms(run.Cells(), averages(d, in.PVI, n))
			check("l1", l1, out.L1[i])
			check("l2", l2, out.L2[i])
			check("linf", linf, out.Linf[i])
			if i > 0 {
				check("l1_order", math.Log2(before/l1), out.Order[i-1])
			}
			before = l1
			width, ok := FrontWidth(run.Cells(), behind, ahead)
			if !ok {
				t.Fatalf("%s: no front in %d cells", name, n)
			}
			check("front_width_10_90", width, out.Width[i])
			check("front_width_in_cells", width*float64(n), out.InCells[i])
			check("savg", mean(run.Cells()), out.Mean[i])
			if n == len(out.Profile) {
				for k, s := range run.Cells() {
					check("profile_N50", s, out.Profile[k])
				}
			}
		}
	}
}

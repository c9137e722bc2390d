package regime

import (
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"brinefront/physics/ref"
)

// published is testdata/published/regime.json; its entries say where they come from.
type published struct {
	Dietz struct {
		KMd, KrwEnd, AreaFt2, SpecificGravityDifference, DipDeg, MuWCp, M, MovablePV float64
		CriticalRbD, AngleDegAt0p9Critical                                           float64
		HorizontalBreakthroughPV, HorizontalCompletePV                               float64
		RateRbD, LengthFt, WidthFt, HeightFt, Porosity, BreakthroughYr               float64
	}
	Mobility struct {
		EndPoint, Front           []float64
		EndPointClass, FrontClass []Class
	}
	Craig struct {
		WaterWet struct{ KrwEndBelow, CrossoverAbove, SwcAbove float64 }
		OilWet   struct{ KrwEndAbove, CrossoverBelow, SwcBelow float64 }
	}
	Corey struct {
		Classes []Class
		No, Nw  [][2]float64
	}
	Desaturation struct{ NonWettingBegin, WettingBegin, Full [2]float64 }
}

func readPublished(t *testing.T) published {
	t.Helper()
	raw, err := os.ReadFile(filepath.Join("..", "..", "testdata", "published", "regime.json"))
	if err != nil {
		t.Fatal(err)
	}
	var p published
	if err := json.Unmarshal(raw, &p); err != nil {
		t.Fatal(err)
	}
	return p
}

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %.10g, want %.10g within %.2g", what, got, want, tolerance)
	}
}

// complete fails unless a verdict is a sentence with a class and a range, and its
// source, if any, is in the bibliography.
func complete(t *testing.T, v Verdict) {
	t.Helper()
	if v.Class == "" || v.Range == "" || !strings.HasSuffix(v.Text, ".") || strings.Count(v.Text, ". ") > 0 {
		t.Errorf("incomplete verdict %+v", v)
	}
	if v.Source != "" && ref.Get(v.Source).Title == "" {
		t.Errorf("source %q has no title", v.Source)
	}
}

// a hair below and above x.
func around(x float64) (below, above float64) { return x * (1 - 1e-9), x * (1 + 1e-9) }

// TestMobility: Dake's three cases (from memory) and the edge.
func TestMobility(t *testing.T) {
	m := readPublished(t).Mobility
	if len(m.EndPoint) == 0 || len(m.Front) == 0 {
		t.Fatal("no values")
	}
	expect := func(v Verdict, want Class) {
		t.Helper()
		complete(t, v)
		if v.Class != want {
			t.Errorf("%q is %s, want %s", v.Text, v.Class, want)
		}
	}
	for i, x := range m.EndPoint {
		expect(EndPointMobility(x), m.EndPointClass[i])
	}
	for i, x := range m.Front {
		expect(FrontMobility(x), m.FrontClass[i])
	}
	_, above := around(1)
	expect(EndPointMobility(1), Favourable)
	expect(EndPointMobility(above), Unfavourable)
	expect(FrontMobility(1), Stable)
	expect(FrontMobility(above), Unstable)
	expect(FrontMobility(math.NaN()), Undecided)
	expect(FrontMobility(math.Inf(1)), Unstable)
	if text := FrontMobility(1.4).Text; !strings.Contains(text, "1.4") {
		t.Errorf("%q does not tell the number", text)
	}
}

func TestGravityWeight(t *testing.T) {
	for _, c := range []struct {
		g       float64
		want    Class
		against bool
	}{
		{0, ViscousRules, false}, {0.09, ViscousRules, false}, {0.1, BothMatter, false}, {10, BothMatter, false}, {11, GravityRules, false},
		{-0.05, ViscousRules, true}, {-0.1, BothMatter, true}, {-10, BothMatter, true}, {-11, GravityRules, true}, {math.Inf(1), GravityRules, false}, {math.NaN(), Undecided, false},
	} {
		v := GravityWeight(c.g)
		complete(t, v)
		if v.Class != c.want || strings.Contains(v.Text, "against") != c.against {
			t.Errorf("G = %g: %+v", c.g, v)
		}
	}
}

// TestDesaturation: each side of each published edge (Lake 1989, from memory).
func TestDesaturation(t *testing.T) {
	p := readPublished(t).Desaturation
	for _, c := range []struct {
		d     Desaturation
		begin [2]float64
	}{{NonWettingResidual, p.NonWettingBegin}, {WettingResidual, p.WettingBegin}} {
		edges := []float64{c.begin[0], c.begin[1], p.Full[0], p.Full[1]}
		classes := []Class{Trapped, OnTheVerge, PartlyFreed, NearlyFreed, Freed}
		for i, edge := range edges {
			below, above := around(edge)
			for x, want := range map[float64]Class{below: classes[i], above: classes[i+1]} {
				v := c.d.Judge(x, "oil")
				complete(t, v)
				if v.Class != want || !strings.Contains(v.Text, "oil") {
					t.Errorf("Nc = %g: %+v, want %s", x, v, want)
				}
			}
		}
	}
}

// TestCapillaryNumber: the ordinary waterflood, 1 ft/d of 0.5 mPa s water against 30 mN/m,
// worked by hand: 0.3048/86400*0.0005/0.03 = 5.8796e-8.
func TestCapillaryNumber(t *testing.T) {
	const u, mu, sigma = 0.3048 / 86400, 0.5e-3, 30e-3
	nc := CapillaryNumber(u, mu, sigma)
	near(t, "Nc", nc, 5.8796e-8, 1e-12)
	v := NonWettingResidual.Judge(nc, "oil")
	if v.Class != Trapped {
		t.Errorf("an ordinary waterflood frees residual oil: %+v", v)
	}
	if !strings.Contains(v.Range, "from memory") {
		t.Errorf("%q does not say that the spread is from memory", v.Range)
	}
}

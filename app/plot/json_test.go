package plot

import (
	"encoding/json"
	"math"
	"math/rand/v2"
	"reflect"
	"strings"
	"testing"

	"brinefront/physics/units"
)

func readBack(t *testing.T, text string) (p Picture) {
	t.Helper()
	if err := json.Unmarshal([]byte(text), &p); err != nil {
		t.Fatalf("%v in %s", err, text)
	}
	return p
}

// What is written by hand is what the standard library would write, but for the
// digits that no screen shows.
func TestJSONHoldsTheWholePicture(t *testing.T) {
	p := From(invented(), units.Field)
	got := readBack(t, p.JSON())
	rounded := readBack(t, From(invented(), units.Field).JSON())
	if !reflect.DeepEqual(got, rounded) {
		t.Fatal("the same picture is written in two ways")
	}
	standard, err := json.Marshal(got)
	if err != nil {
		t.Fatal(err)
	}
	var a, b any
	for text, into := range map[string]*any{p.JSON(): &a, string(standard): &b} {
		if err := json.Unmarshal([]byte(text), into); err != nil {
			t.Fatal(err)
		}
	}
	if !reflect.DeepEqual(a, b) {
		t.Errorf("by hand  %s\nstandard %s", p.JSON(), standard)
	}
}

func TestJSONKeepsSevenDigits(t *testing.T) {
	random := rand.New(rand.NewPCG(1, 2))
	p := Picture{Lines: []Line{{Kind: "line"}}}
	for range 2000 {
		p.Lines[0].Data = append(p.Lines[0].Data, [2]float64{
			(random.Float64() - 0.5) * math.Pow(10, float64(random.IntN(60)-30)), random.Float64(),
		})
	}
	for i, got := range readBack(t, p.JSON()).Lines[0].Data {
		for k, v := range p.Lines[0].Data[i] {
			// Half of the seventh digit at most, at worst 5e-7 of the number.
			if math.Abs(got[k]-v) > 5e-7*math.Abs(v) {
				t.Fatalf("%v was written as %v", v, got[k])
			}
		}
	}
}

func TestNothingButNumbersReachesJSON(t *testing.T) {
	for _, bad := range badNumbers {
		text := From(broken(bad), units.Field).JSON()
		got := readBack(t, text)
		if strings.Contains(text, "NaN") || strings.Contains(text, "Inf") {
			t.Errorf("%v came through: %s", bad, text)
		}
		if n := strings.Count(text, "null"); n != 3 {
			t.Errorf("%v: %d gaps, want one each in the line, the dashed line and the band's lower edge", bad, n)
		}
		if len(got.Lines) != 5 {
			t.Errorf("%v: %d lines", bad, len(got.Lines))
		}
		// Even a picture that did not come from From is still lawful JSON.
		readBack(t, Picture{X: Axis{Min: &bad}, Marks: []Mark{{X: bad, Y: bad}}, Lines: []Line{{Data: [][2]float64{{bad, 1}}}}}.JSON())
	}
}

func TestJSONQuotesWhatAPersonTyped(t *testing.T) {
	for _, text := range []string{`say "kr"`, "</script><script>alert(1)</script>", "two\nlines", "back\\slash", "Öl, ½ \u2028"} {
		p := Picture{Title: text, Summary: text, Lines: []Line{{Label: text}}, Marks: []Mark{{Label: text}}}
		written := p.JSON()
		got := readBack(t, written)
		if got.Title != text || got.Summary != text || got.Lines[0].Label != text || got.Marks[0].Label != text {
			t.Errorf("%q came back as %q", text, got.Title)
		}
		if strings.Contains(written, "</script>") {
			t.Errorf("%q could end a script: %s", text, written)
		}
	}
}

func large() Picture {
	p := Picture{ID: "large"}
	for range 5 {
		l := Line{Kind: "line"}
		for i := range 400 {
			l.Data = append(l.Data, [2]float64{float64(i) / 399, math.Exp(-float64(i) / 50)})
		}
		p.Lines = append(p.Lines, l)
	}
	return p
}

func BenchmarkJSON(b *testing.B) {
	p := large()
	for b.Loop() {
		_ = p.JSON()
	}
}

// BenchmarkStandardJSON is what the hand-written encoder is worth it against.
func BenchmarkStandardJSON(b *testing.B) {
	p := large()
	for b.Loop() {
		if _, err := json.Marshal(p); err != nil {
			b.Fatal(err)
		}
	}
}

package wire

import (
	"encoding/json"
	"math"
	"reflect"
	"slices"
	"testing"

	"brinefront/physics/study"
)

// over is a result with one chart and one table.
func over(lines []study.Line, columns []study.Column) study.Result {
	return study.Result{Parts: map[study.Sheet]study.Part{
		study.SheetRock:  {Charts: []study.Chart{{ID: "a", Lines: lines}}},
		study.SheetField: {Tables: []study.Grid{{ID: "b", Columns: columns}}},
	}}
}

// A result comes back to the last bit, and packing leaves the original alone.
func TestPackedAndBack(t *testing.T) {
	shared := []float64{0, 1.0 / 3, math.MaxFloat64}
	odd := over(
		[]study.Line{{ID: "x", X: shared, Y: []float64{math.Copysign(0, -1), 5e-324, math.Pi}}, {ID: "y", X: shared, Y: shared, Low: shared[:2]}, {ID: "again", X: slices.Clone(shared)}, {ID: "none"}},
		[]study.Column{{Values: shared}, {Words: []string{"word"}}})
	for name, whole := range map[string]study.Result{"demo": study.Run(study.Demo()), "empty": study.Run(study.Empty()), "odd": odd} {
		before := text(t, whole)
		rest, numbers := Pack(whole)
		if text(t, whole) != before {
			t.Errorf("%s: packing changed the original", name)
		}
		reply, err := Read([]byte(text(t, Reply{Result: &rest, Numbers: &numbers})))
		if err != nil {
			t.Fatalf("%s: %v", name, err)
		}
		got := *reply.Result
		for i, series := range all(whole) {
			if again := *all(got)[i]; len(again) != len(*series) {
				t.Errorf("%s: series %d of %d numbers, had %d", name, i, len(again), len(*series))
			} else {
				for j, v := range *series {
					if math.Float64bits(v) != math.Float64bits(again[j]) {
						t.Errorf("%s: series %d holds %g, had %g", name, i, again[j], v)
					}
				}
			}
		}
		if again, _ := Pack(got); text(t, again) != text(t, rest) {
			t.Errorf("%s: the rest came back changed", name)
		}
	}
	// The field's table comes first: its shared column, then the lines of the rock.
	if _, numbers := Pack(odd); !reflect.DeepEqual(numbers.Place, []int{0, -1, 0, 1, -1, 0, 0, 2, 0, -1, -1, -1, -1, -1}) {
		t.Errorf("shared series lie at %v", numbers.Place)
	}
}

func TestForeignNumbers(t *testing.T) {
	rest, numbers := Pack(over([]study.Line{{X: []float64{1, 2}, Y: []float64{3, 4}}}, nil))
	for name, bad := range map[string]Numbers{
		"short":         {numbers.Place, numbers.Lengths, numbers.Bytes[:8]},
		"long":          {numbers.Place, numbers.Lengths, append(numbers.Bytes, 0)},
		"negative":      {numbers.Place, []int{-2, 2}, numbers.Bytes},
		"huge":          {numbers.Place, []int{math.MaxInt, 2}, numbers.Bytes},
		"fewer series":  {numbers.Place[:1], numbers.Lengths, numbers.Bytes},
		"unknown place": {[]int{0, 2, -1}, numbers.Lengths, numbers.Bytes},
	} {
		if _, err := Unpack(rest, bad); err == nil {
			t.Errorf("%s: taken", name)
		}
	}
}

func text(t *testing.T, v any) string {
	t.Helper()
	b, err := json.Marshal(v)
	if err != nil {
		t.Fatal(err)
	}
	return string(b)
}

// BenchmarkReply is what the interface does with a reply: plain and packed.
func BenchmarkReply(b *testing.B) {
	whole := study.Run(study.Demo())
	rest, numbers := Pack(whole)
	for name, reply := range map[string]Reply{"plain": {Result: &whole}, "packed": {Result: &rest, Numbers: &numbers}} {
		sent, err := json.Marshal(reply)
		if err != nil {
			b.Fatal(err)
		}
		b.Run(name, func(b *testing.B) {
			b.ReportMetric(float64(len(sent))/1e3, "kB")
			for b.Loop() {
				if _, err := Read(sent); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

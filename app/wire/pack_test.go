package wire

import (
	"encoding/json"
	"math"
	"reflect"
	"slices"
	"testing"

	"brinefront/physics/study"
)

// over is a part with one chart and one table.
func over(lines []study.Line, columns []study.Column) study.Part {
	return study.Part{Charts: []study.Chart{{ID: "a", Lines: lines}}, Tables: []study.Grid{{ID: "b", Columns: columns}}}
}

// A part comes back to the last bit, and packing leaves the original alone.
func TestPackedAndBack(t *testing.T) {
	shared := []float64{0, 1.0 / 3, math.MaxFloat64}
	odd := over(
		[]study.Line{{ID: "x", X: shared, Y: []float64{math.Copysign(0, -1), 5e-324, math.Pi}}, {ID: "y", X: shared, Y: shared, Low: shared[:2]}, {ID: "again", X: slices.Clone(shared)}, {ID: "none", Readings: []study.Column{{Values: shared[1:]}, {}}}},
		[]study.Column{{Values: shared}, {Words: []string{"word"}}})
	parts := map[string]study.Part{"odd": odd, "empty": study.Run(study.Empty()).Parts[study.SheetFront]}
	for sheet, part := range study.Run(study.Demo()).Parts {
		parts[string(sheet)] = part
	}
	for name, whole := range parts {
		before := text(t, whole)
		rest, numbers := Pack(whole)
		if text(t, whole) != before {
			t.Errorf("%s: packing changed the original", name)
		}
		reply, err := Read([]byte(text(t, Reply{Pieces: []Piece{{Sheet: "x"}, {Sheet: "y", Part: &rest, Numbers: numbers}}})))
		if err != nil {
			t.Fatalf("%s: %v", name, err)
		}
		if same := reply.Pieces[0]; same.Sheet != "x" || same.Part != nil {
			t.Errorf("%s: a part that is as it was came as %+v", name, same)
		}
		got := *reply.Pieces[1].Part
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
	// The lines of the chart come first, then the column of the table.
	if _, numbers := Pack(odd); !reflect.DeepEqual(numbers.Place, []int{0, 1, -1, 0, 0, 2, 0, -1, -1, -1, -1, -1, 3, -1, 0, -1}) {
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
		if _, err := Read([]byte(text(t, Reply{Pieces: []Piece{{Part: &rest, Numbers: bad}}}))); err == nil {
			t.Errorf("%s: read", name)
		}
	}
}

func text(t testing.TB, v any) string {
	t.Helper()
	b, err := json.Marshal(v)
	if err != nil {
		t.Fatal(err)
	}
	return string(b)
}

// BenchmarkReply is what the interface does with a reply of one sheet.
func BenchmarkReply(b *testing.B) {
	for sheet, whole := range study.Run(study.Demo()).Parts {
		rest, numbers := Pack(whole)
		sent := []byte(text(b, Reply{Pieces: []Piece{{Sheet: sheet, Part: &rest, Numbers: numbers}}}))
		b.Run(string(sheet), func(b *testing.B) {
			for b.Loop() {
				if _, err := Read(sent); err != nil {
					b.Fatal(err)
				}
			}
			b.ReportMetric(float64(len(sent))/1e3, "kB")
		})
	}
}

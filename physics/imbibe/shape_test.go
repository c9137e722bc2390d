package imbibe

import (
	"math"
	"testing"
)

// TestCharacteristicLength: Ma, Morrow & Zhang (1997), from memory, for d = 3.8 and L = 5.
func TestCharacteristicLength(t *testing.T) {
	const d, l = 3.8, 5.0
	for _, c := range []struct {
		name  string
		shape Shape
		want  float64
	}{
		{"cylinder, all faces", Cylinder(d, l, true, 2), l * d / (2 * math.Sqrt(d*d+2*l*l))},
		{"cylinder, all faces, as recomputed", Cylinder(d, l, true, 2), 1.1834389},
		{"cylinder, side", Cylinder(d, l, true, 0), d / (2 * math.Sqrt2)},
		{"cylinder, one end", Cylinder(d, l, false, 1), l},
		{"cylinder, two ends", Cylinder(d, l, false, 2), l / 2},
		{"sphere", Sphere(d), d / (2 * math.Sqrt(3))},
	} {
		within(t, c.name, c.shape.CharacteristicLength(), c.want, 1e-7)
	}
	// From the definition: V, and the area of each open face over its distance.
	box := Box([3]float64{2, 3, 5}, [3]int{1, 2, 0})
	within(t, "box", box.CharacteristicLength(), math.Sqrt(30/(15/2.0+2*10/1.5)), 1e-14)
	within(t, "open area of a box", box.OpenArea(), (15+2*10)/30.0, 1e-14)
	within(t, "open area of a cylinder", Cylinder(d, l, true, 2).OpenArea(), 4/d+2/l, 1e-14)
}

// TestShapeFactors: Warren & Root (1963), read in a review of 2020; Kazemi et al. (1976)
// and Lim & Aziz (1995), from memory. The last prints 25.67 for a sphere.
func TestShapeFactors(t *testing.T) {
	const l = 3.0
	side := [3]float64{l, l, l}
	for _, c := range []struct {
		name                        string
		shape                       Shape
		warrenRoot, kazemi, limAziz float64
	}{
		{"slab", Slab(l, 2), 12, 4, 9.87},
		{"column", Box(side, [3]int{2, 2, 0}), 32, 8, 19.74},
		{"cube", Box(side, [3]int{2, 2, 2}), 60, 12, 29.6},
		{"cylinder of the same section", Cylinder(2*l/math.Sqrt(math.Pi), 1, true, 0), 0, 8 * math.Pi / 4, 18.17},
		{"sphere of the same volume", Sphere(l * math.Cbrt(6/math.Pi)), 0, 12 * math.Pow(math.Pi/6, 2.0/3), 25.65},
	} {
		got, ok := c.shape.WarrenRoot()
		if ok != (c.warrenRoot > 0) {
			t.Errorf("%s: Warren and Root %v", c.name, ok)
		}
		within(t, c.name+", Warren and Root", got*l*l, c.warrenRoot, 1e-12)
		within(t, c.name+", Kazemi", c.shape.Kazemi()*l*l, c.kazemi, 1e-12)
		within(t, c.name+", Lim and Aziz", c.shape.LimAziz()*l*l, c.limAziz, 0.01)
	}
	// Unequal spacings: Warren & Root's l = 3abc/(ab+bc+ca).
	got, _ := Box([3]float64{1, 2, 3}, [3]int{2, 2, 2}).WarrenRoot()
	mean := 3 * 6.0 / (2 + 6 + 3)
	within(t, "Warren and Root, unequal", got, 60/(mean*mean), 1e-12)
}

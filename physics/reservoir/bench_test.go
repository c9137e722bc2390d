package reservoir

import (
	"fmt"
	"math"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// BenchmarkFlood times each step from curves to a forecast, over table sizes.
func BenchmarkFlood(b *testing.B) {
	curves := map[string]relperm.Curves{"Corey": viscous}
	for _, n := range []int{10, 100, 1000, 10000} {
		sw, krw, kro := make([]float64, n), make([]float64, n), make([]float64, n)
		for i := range n {
			u := float64(i) / float64(n-1)
			sw[i], krw[i], kro[i] = 0.213+0.55*u, 0.327*math.Pow(u, 2.7), 0.861*math.Pow(1-u, 2.15)
		}
		for name, kind := range map[string]relperm.Kind{"cubic": relperm.MonotoneCubic, "straight": relperm.StraightLine} {
			table, err := relperm.NewTable(sw, krw, kro, kind)
			if err != nil {
				b.Fatal(err)
			}
			curves[fmt.Sprintf("%s-%d", name, n)] = table
		}
	}
	for name, curve := range curves {
		flow := fracflow.Flow{Curves: curve, MuW: 0.47e-3, MuO: 5.93e-3}
		lo, hi := flow.Ends()
		d, err := displace.New(flow, hi, lo)
		if err != nil {
			b.Fatal(err)
		}
		l, err := NewLinear(rock(ConstantPressure{2.3e6}), flow, d)
		if err != nil {
			b.Fatal(err)
		}
		run := func(step string, f func()) {
			b.Run(step+"/"+name, func(b *testing.B) {
				for b.Loop() {
					f()
				}
			})
		}
		late := l.TimeAt(0.7)
		run("displace.New", func() { displace.New(flow, hi, lo) })
		run("Saturation", func() { d.Saturation(1 / 0.7) })
		run("NewLinear", func() { NewLinear(l.Layer, flow, d) })
		run("At", func() { l.At(late) })
	}
}

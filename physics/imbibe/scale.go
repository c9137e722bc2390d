package imbibe

import "math"

// Conditions are what scaling laws know of a block that soaks: not its curves, which they
// take to be the same wherever they carry a result.
type Conditions struct {
	Permeability, Porosity       float64 // m2, fraction
	Tension                      float64 // interfacial, N/m
	WaterViscosity, OilViscosity float64 // Pa s
	Length                       float64 // characteristic, m
}

// MattaxKyte is dimensionless time over time, 1/s, of Mattax and Kyte (1962),
//
//	tD/t = sqrt(k/phi) sigma/(muw L²)
//
// It takes the ratio of viscosities to be the same. They used the size of the block for L;
// with the characteristic length shapes can be compared.
func (c Conditions) MattaxKyte() float64 { return c.group(c.WaterViscosity) }

// Ma is that of Ma, Morrow and Zhang (1997), with the geometric mean of the viscosities,
//
//	tD/t = sqrt(k/phi) sigma/(sqrt(muw muo) Lc²)
func (c Conditions) Ma() float64 { return c.group(math.Sqrt(c.WaterViscosity * c.OilViscosity)) }

func (c Conditions) group(viscosity float64) float64 {
	return math.Sqrt(c.Permeability/c.Porosity) * c.Tension / (viscosity * c.Length * c.Length)
}

// SolutionBased is dimensionless time over time, 1/s, of Schmid and Geiger (2012),
//
//	tD/t = (2A/(phi Lc))²
//
// with A, m/s^1/2, of the self-similar solution: it holds what kr, Pc and both viscosities do
// until the front meets the end. sqrt(tD) is then the water taken up in pore volumes; over
// S0 - Si it is the share of what can be soaked up.
func SolutionBased(a, porosity, length float64) float64 {
	return math.Pow(2*a/(porosity*length), 2)
}

// Uptake is the share of what can be soaked up against time, and its rate, 1/s.
type Uptake interface {
	At(t float64) (share, rate float64)
}

// Stretched is an uptake with every time a factor longer: what a scaling law makes of it.
type Stretched struct {
	Of     Uptake
	Factor float64
}

// At implements Uptake.
func (s Stretched) At(t float64) (share, rate float64) {
	share, rate = s.Of.At(t / s.Factor)
	return share, rate / s.Factor
}

// Misfit is how far one uptake is from another, in shares of what can be soaked up.
type Misfit struct {
	Worst, At float64 // largest difference, with its sign, and its time, s
	RMS       float64
}

// Compare measures guess - truth at the given times, at least one.
func Compare(guess, truth Uptake, times []float64) (m Misfit) {
	for _, t := range times {
		g, _ := guess.At(t)
		w, _ := truth.At(t)
		if math.Abs(g-w) > math.Abs(m.Worst) {
			m.Worst, m.At = g-w, t
		}
		m.RMS += (g - w) * (g - w)
	}
	m.RMS = math.Sqrt(m.RMS / float64(len(times)))
	return m
}

// Spaced are n times, at least 2, even in their logarithm, from where 1% to where 98% of what
// can be soaked up has been.
func (r *Recovery) Spaced(n int) []float64 {
	from, to := math.Log(r.TimeAt(0.01)), math.Log(r.TimeAt(0.98))
	times := make([]float64, n)
	for i := range times {
		times[i] = math.Exp(from + (to-from)*float64(i)/float64(n-1))
	}
	return times
}

// TimeOf is when an uptake reaches a share from above 0 to below 1, s.
func TimeOf(u Uptake, share float64) float64 {
	low, high := 0.0, 1.0
	for s, _ := u.At(high); s < share; s, _ = u.At(high) {
		high *= 4
	}
	for s, _ := u.At(high / 4); s > share; s, _ = u.At(high / 4) {
		high /= 4
	}
	for range 60 {
		middle := (low + high) / 2
		if s, _ := u.At(middle); s < share {
			low = middle
		} else {
			high = middle
		}
	}
	return high
}

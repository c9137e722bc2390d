// Package reservoir puts a displacement into a rock body and a calendar: rates at
// surface, cumulative volumes, pressure and the time at which a limit is met.
package reservoir

import (
	"fmt"
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
)

// Drive is how a flood is driven: ConstantRate or ConstantPressure.
type Drive interface {
	fmt.Stringer
	value() float64
}

// ConstantRate injects at a constant rate while the wells are on.
type ConstantRate struct {
	Q float64 // reservoir volume of total fluid, m3/s, > 0
}

// ConstantPressure keeps the pressure difference between inlet and outlet constant
// while the wells are on.
type ConstantPressure struct {
	DP float64 // Pa, > 0
}

func (d ConstantRate) value() float64     { return d.Q }
func (d ConstantPressure) value() float64 { return d.DP }
func (ConstantRate) String() string       { return "injection rate" }
func (ConstantPressure) String() string   { return "pressure difference" }

// Layer is the rock body and the way it is operated. All SI.
type Layer struct {
	Length, Area float64 // m, m2; > 0
	Porosity     float64 // 0 < porosity <= 1
	Permeability float64 // m2, the one that kr refers to; > 0
	Bw, Bo       float64 // formation volume factors, reservoir over surface; > 0
	Uptime       float64 // fraction of calendar time on injection; 0 < uptime <= 1
	Drive        Drive
}

// PoreVolume is phi L A.
func (l Layer) PoreVolume() float64 { return l.Porosity * l.Length * l.Area }

// InputError is an input that cannot be used.
type InputError struct {
	Name    string
	Value   float64
	Allowed string
}

func (e *InputError) Error() string {
	return fmt.Sprintf("reservoir: %s is %.6g; it must be %s", e.Name, e.Value, e.Allowed)
}

func (l Layer) check() error {
	type rule struct {
		name    string
		value   float64
		most    float64
		allowed string
	}
	inf := math.MaxFloat64
	rules := []rule{
		{"length", l.Length, inf, "above 0"}, {"cross-section", l.Area, inf, "above 0"},
		{"porosity", l.Porosity, 1, "above 0, at most 1"}, {"permeability", l.Permeability, inf, "above 0"},
		{"water volume factor", l.Bw, inf, "above 0"}, {"oil volume factor", l.Bo, inf, "above 0"},
		{"uptime", l.Uptime, 1, "above 0, at most 1"},
	}
	if l.Drive == nil {
		return &InputError{"drive", 0, "a constant rate or a constant pressure difference"}
	}
	rules = append(rules, rule{l.Drive.String(), l.Drive.value(), inf, "above 0"})
	for _, r := range rules {
		if !(r.value > 0 && r.value <= r.most) {
			return &InputError{r.name, r.value, r.allowed}
		}
	}
	return nil
}

// Linear is one layer flooded from end to end. Time t is calendar time in seconds;
// injection is on for the fraction Uptime of it, evenly spread, so that calendar rates
// are the on-rates times Uptime.
//
// At constant rate Q = uptime q t/PV. At constant pressure difference the flux is
//
//	u = k dp/(L R(Q)),   R(Q) = int_0^1 dx/lt,   t = phi L^2/(k dp uptime) int_0^Q R dQ
//
// with R as in Resistance. R leaves out the weight of the fluids; at constant pressure the
// gravity number would change with the flux and the displacement would not be
// self-similar, so that NewLinear refuses the two together.
type Linear struct {
	Layer
	Displacement *displace.Displacement
	Flow         fracflow.Flow
	resistance   resistance
	scale        float64 // calendar seconds for one unit of the drive's own time
}

// NewLinear checks the inputs and precomputes. The displacement must have been made of
// the same flow. Errors are *InputError.
func NewLinear(layer Layer, flow fracflow.Flow, d *displace.Displacement) (*Linear, error) {
	if err := layer.check(); err != nil {
		return nil, err
	}
	l := &Linear{Layer: layer, Displacement: d, Flow: flow}
	switch drive := layer.Drive.(type) {
	case ConstantRate:
		l.scale = layer.PoreVolume() / (drive.Q * layer.Uptime)
	case ConstantPressure:
		if flow.Gravity != 0 {
			return nil, &InputError{"gravity number", flow.Gravity, "0 at constant pressure difference, where it would change with the rate"}
		}
		l.scale = layer.Porosity * layer.Length * layer.Length / (layer.Permeability * drive.DP * layer.Uptime)
	}
	l.resistance = newResistance(flow, d)
	return l, nil
}

// TimeAt is the calendar time at which pvi pore volumes have been injected.
func (l *Linear) TimeAt(pvi float64) float64 {
	if _, ok := l.Drive.(ConstantRate); ok {
		return l.scale * pvi
	}
	_, spent := l.resistance.at(pvi)
	return l.scale * spent
}

// PVIAt is the inverse of TimeAt; 0 for t <= 0.
func (l *Linear) PVIAt(t float64) float64 {
	if !(t > 0) {
		return 0
	}
	if _, ok := l.Drive.(ConstantRate); ok {
		return t / l.scale
	}
	return l.resistance.pvi(t / l.scale)
}

// Resistance is R(Q), Pa s: the pressure difference, without the weight of the fluids,
// over (u L/k) when Q pore volumes have been injected.
func (l *Linear) Resistance(q float64) float64 {
	r, _ := l.resistance.at(q)
	return r
}

// Breakthrough returns the PVI and the calendar time of the foremost wave's arrival;
// both +Inf when nothing moves.
func (l *Linear) Breakthrough() (t, pvi float64) {
	pvi = l.Displacement.Breakthrough()
	if math.IsInf(pvi, 1) {
		return pvi, pvi
	}
	return l.TimeAt(pvi), pvi
}

// onRate is the total reservoir rate while the wells are on.
func (l *Linear) onRate(resistance float64) float64 {
	switch drive := l.Drive.(type) {
	case ConstantRate:
		return drive.Q
	default:
		return l.Permeability * l.Area * drive.value() / (l.Length * resistance)
	}
}

// State is the flood at one time.
type State struct {
	Time, PVI          float64 // s (calendar), pore volumes
	InjectionRate      float64 // calendar, reservoir m3/s
	OilRate, WaterRate float64 // calendar, surface m3/s
	WaterCut, WOR      float64 // surface; WOR is +Inf once no oil flows
	ReservoirCut       float64 // water cut at reservoir conditions
	CumInjected        float64 // reservoir m3
	CumOil, CumWater   float64 // surface m3
	OutletSaturation   float64
	AverageSaturation  float64
	Recovery           float64 // pore volumes
	PressureDrop       float64 // Pa while on, without the weight of the fluids
}

// At is the state at calendar time t.
func (l *Linear) At(t float64) State {
	s := l.AtPVI(l.PVIAt(t))
	s.Time = t
	return s
}

// AtPVI is the state when q pore volumes have been injected.
func (l *Linear) AtPVI(q float64) State {
	out := l.Displacement.After(q)
	f := out.Cut
	resistance, spent := l.resistance.at(q)
	on := l.onRate(resistance)
	rate := on * l.Uptime
	pv := l.PoreVolume()
	if _, ok := l.Drive.(ConstantRate); ok {
		spent = q
	}
	s := State{
		Time: l.scale * spent, PVI: q,
		InjectionRate: rate,
		OilRate:       rate * (1 - f) / l.Bo, WaterRate: rate * f / l.Bw,
		WaterCut: fracflow.SurfaceCut(f, l.Bw, l.Bo), ReservoirCut: f,
		CumInjected: q * pv, CumOil: out.Oil * pv / l.Bo, CumWater: out.Water * pv / l.Bw,
		OutletSaturation: out.Sw, AverageSaturation: out.Average, Recovery: out.Recovery,
		PressureDrop: on * l.Length / (l.Permeability * l.Area) * resistance,
	}
	s.WOR = s.WaterRate / s.OilRate
	return s
}

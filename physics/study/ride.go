package study

import (
	"errors"
	"math"

	"brinefront/physics/fluid"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
	"brinefront/physics/ride"
	"brinefront/physics/units"
)

// rider is what rides along with the injected water, and the displacement it makes of the
// water flood, which stays the answer of the sheets without it.
type rider struct {
	kind     string
	name     string             // of its front, within a sentence
	given    map[string]float64 // its inputs by path, SI
	behind   fracflow.Flow      // of the water that carries it
	injected float64            // saturation
	pivot    ride.Pivot
	heat     *warmth // nil for all but heat

	flood     *ride.Flood // nil where it could not be solved
	slug      *ride.Slug  // nil: injected without end, or not followed
	unsolved  error       // why there is no flood
	unfollows error       // why a slug that is given is not followed
}

// fronts name the front of every kind.
var fronts = map[string]string{polymer: "polymer front", salt: "salinity front", tracer: "tracer front", riderOfHeat: "temperature front"}

// rider reads what rides along; nil when nothing does.
func (s *sheet) rider(f *front) *rider {
	kind := riderKind(s.st)
	if kind == noRider {
		return nil
	}
	r := &rider{kind: kind, name: fronts[kind], given: map[string]float64{}}
	for _, spec := range riderSpecs {
		if !spec.Applies(s.st) {
			continue
		}
		if value, given := s.input(spec.Path); given {
			r.given[spec.Path] = value
		}
	}
	if kind == riderOfHeat {
		r.heat = s.warmth(f.brine, r)
	}
	return r
}

// at is an input of the rider, or what an empty one means.
func (r *rider) at(name string, empty float64) float64 {
	if value, given := r.given[riderPath(name)]; given {
		return value
	}
	return empty
}

func riderPath(name string) string { return "front.rider." + name }

// size is the slug, +Inf without end.
func (r *rider) size() float64 { return r.at("slug", math.Inf(1)) }

// place gives the water that carries it its fractional flow and its pivot, and refuses
// what the curves do not allow. It may be asked once nothing is missing.
func (r *rider) place(s *sheet, f *front, rock *rock) {
	r.behind, r.injected = f.flow, f.swj
	switch r.kind {
	case polymer:
		r.behind.MuW = r.at("viscosity", f.flow.MuW)
		r.reach(s, rock.swc)
	case salt:
		r.curves(s, f, rock)
	case riderOfHeat:
		r.behind.MuW, r.behind.MuO = f.flow.MuW*r.heat.thinning(), r.at("oilViscosity", f.flow.MuO)
		r.heat.place(s, r)
	}
	if r.kind != riderOfHeat {
		r.pivot = r.retention().Front()
	}
}

// retention is how the rock holds the solute: what polymer leaves there stays for good,
// what changes salinity or marks water is given back.
func (r *rider) retention() ride.Retention {
	d := r.at("retention", 0)
	if r.kind == polymer {
		return ride.Retention{Irreversible: d, Inaccessible: r.at("inaccessible", 0)}
	}
	return ride.Retention{Reversible: d}
}

// rear is the pivot that the rear of a slug feels: rock gives back all heat.
func (r *rider) rear() ride.Pivot {
	if r.kind == riderOfHeat {
		return r.pivot
	}
	return r.retention().Rear()
}

// reach refuses an inaccessible pore volume beyond the water at rest, beside which only
// what the rock holds as well may be out of reach; the rear of a slug finds nothing held.
func (r *rider) reach(s *sheet, swc float64) {
	most, and := swc, ""
	if math.IsInf(r.size(), 1) {
		most, and = swc+r.at("retention", 0), " and the retention"
	}
	if r.at("inaccessible", 0) > most {
		path := riderPath("inaccessible")
		s.problem(path, s.typed(path), "up to "+units.Format(most, 6)+", Swc"+and+": the smallest pores hold water at rest")
	}
}

// curves are those of the rock in the changed water.
func (r *rider) curves(s *sheet, f *front, rock *rock) {
	if path, sor := riderPath("sor"), r.at("sor", 0); rock.swc+sor >= 1 {
		s.problem(path, s.typed(path)+" beside Swc = "+units.Format(rock.swc, 6), "Swc + Sor below 1, so that some oil can move: Sor below "+units.Format(1-rock.swc, 6))
		return
	}
	corey := relperm.Corey{Swc: rock.swc, Sor: r.at("sor", 0), Krw0: rock.factor * r.at("krw0", 1), Nw: r.at("nw", 1), No: r.at("no", 1)}
	corey.Kro0 = rock.curves.At(rock.swc).Kro
	if kro0, given := r.given[riderPath("kro0")]; given {
		corey.Kro0 = rock.factor * kro0
	}
	r.behind.Curves = corey
	if r.injected = 1 - corey.Sor; s.st.Front.InjectedWater != nil {
		r.injected = math.Min(r.injected, f.swj)
	}
}

// patience is the pore volumes after which a front that has not come is not waited for.
const patience = 1e5

// solve finds the displacement.
func (r *rider) solve(f *front) {
	flood, err := ride.New(f.flow, r.behind, r.pivot, r.injected, f.swi)
	if err == nil && !(flood.Arrival() < patience) {
		err = errors.New("it does not arrive within " + units.Format(patience, 6) + " pore volumes")
	}
	if err != nil {
		r.unsolved = err
		return
	}
	r.flood = flood
	if size := r.size(); r.kind != tracer && !math.IsInf(size, 1) {
		r.slug, r.unfollows = ride.NewSlug(flood, f.flow, f.swj, r.rear(), size)
	}
}

// after is the state after q pore volumes; false once the slug is spent.
func (r *rider) after(q float64) (ride.State, bool) {
	if r.slug != nil {
		return r.slug.After(q)
	}
	return r.flood.After(q), true
}

// short reports whether a slug is spent before the producer, so that its front never arrives.
func (r *rider) short() bool {
	if r.slug == nil {
		return false
	}
	_, place := r.slug.Spent()
	return place < 1
}

// arrives says that the front does, or would if its slug lasted.
func (r *rider) arrives() string {
	if r.short() {
		return r.name + " would arrive"
	}
	return r.name + " arrives"
}

// tracer is the concentration at the producer, where it rides through a uniform stream.
func (r *rider) tracer() ride.Tracer {
	speed, _, _ := r.flood.Front()
	return ride.Tracer{Speed: speed, Peclet: r.at("peclet", math.Inf(1))}
}

// warmth is the water of a front of heat at both temperatures.
type warmth struct {
	cold, hot fluid.Liquid // in the reservoir, and injected
	water     float64      // heat capacity per volume at the mean temperature
	porosity  float64
}

// thinning is the viscosity of the injected water over that of the water in place.
func (w *warmth) thinning() float64 { return w.hot.Viscosity / w.cold.Viscosity }

// warmth computes the water at the temperature of injection.
func (s *sheet) warmth(b *brine, r *rider) *warmth {
	s.need("fluids.temperature")
	porosity, _ := s.input("field.porosity")
	injected, given := r.given[riderPath("temperature")]
	if b == nil || !given {
		return nil
	}
	w := &warmth{cold: b.salty, porosity: porosity}
	hot, err := fluid.Brine(injected, b.pressure, b.salinity)
	mean, other := fluid.Brine((injected+b.temperature)/2, b.pressure, b.salinity)
	if err == nil {
		err = other
	}
	if err != nil {
		path := riderPath("temperature")
		s.problem(path, s.typed(path), "a temperature at which the water is liquid at the reservoir pressure and its properties are known: with salt up to 250 °C, without up to 350 °C")
		return nil
	}
	w.hot, w.water = hot, mean.Density*mean.HeatCapacity
	return w
}

// place is the pivot of the front of heat.
func (w *warmth) place(s *sheet, r *rider) {
	oil := r.at("oilHeat", 0)
	if oil >= w.water {
		path := riderPath("oilHeat")
		spec, _ := Find(path)
		unit, _ := units.Find(spec.Quantity, spec.Get(s.st).Unit)
		s.problem(path, s.typed(path), withUnit("below that of the water, "+units.Format(unit.FromSI(w.water), 4), unit))
		return
	}
	pivot, err := ride.Heat{Porosity: w.porosity, Grains: r.at("rockHeat", 0), Water: w.water, Oil: oil}.Pivot()
	if err != nil {
		panic("study: " + err.Error()) // ranges of inputs and the check above leave none
	}
	r.pivot = pivot
}

package study

import (
	"math"

	"brinefront/physics/fv"
	"brinefront/physics/gridding"
	"brinefront/physics/imbibe"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// smearing is the number of cells on which the grid smears the front as much as capillary
// pressure does, where a capillary pressure, a front and its velocity are known.
func (g *grid) smearing(s *sheet) {
	rock := g.rock
	behind, ahead, shock := g.flood.Exact.Front()
	if rock == nil || !shock || !(g.front.velocity > 0) || !given(s.st, "field.length") || !given(s.st, "field.permeability") {
		return
	}
	curve, _ := rock.capillary()
	if curve == nil || g.scheme.Limiter != fv.None {
		return
	}
	r := imbibe.Rock{Permeability: s.needed("field.permeability"), Kr: g.front.flow.Curves, Pc: curve, WaterViscosity: g.front.flow.MuW, OilViscosity: g.front.flow.MuO}
	potential, err := fv.NewPotential(r.Diffusion, ahead, behind, curve.Knots())
	if err != nil {
		return // Pc has no bound inside the front
	}
	whole, _ := potential.At(behind)
	mean := whole / (behind - ahead) // m2/s
	v := g.flood.Exact.FrontSpeed()
	cfl := g.scheme.CFL * v / g.flood.Fastest() // of the front
	if g.scheme.Implicit {
		cfl = -cfl
	}
	length := s.needed("field.length")
	n := gridding.SameSmearing(v, mean/(g.front.velocity*length), cfl)
	if !(n > 0) || math.IsInf(n, 0) {
		return
	}
	s.figure(Figure{ID: "grid.sameSmearing", Label: "Cells on which the grid smears the front as capillary pressure does", Symbol: "Nd", Value: n, Quantity: units.Number},
		s.by("{Nd} = {v} (1 - {CFLf}) {u} {L} / (2 {Dm})", "The truncation of the upstream scheme acts as the diffusion (v Δx/2)(1 − CFL), implicitly with + for −; capillary pressure as the diffusion k λw λo/(λw + λo) |dPc/dSw|, here its mean Dm over the states of the front, in length² over time. On fewer cells what smears the front is the grid; on more, the rock.", ref.LeVeque2002).
			value("v", "front speed", v, units.Number).value("CFLf", "CFL number of the front, below 0 when implicit", cfl, units.Number).
			value("u", "total Darcy velocity", g.front.velocity, units.Velocity).input("field.length").
			value("Dm", "mean capillary diffusion over the front, SI", mean, units.Number).
			rests("field.permeability").rests(rock.suction.inputs...).on("front.breakthrough"))
}

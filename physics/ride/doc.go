// Package ride solves displacements in which something rides along with the injected
// water and changes it: polymer, salt, heat, or a tracer that changes nothing.
//
// # The problem
//
// Two fluids of one rock, each with its own fractional flow: the one behind, f2 (with
// polymer, of low salinity, hot), and the one ahead, f1 (the water in place, or what has
// lost its polymer or heat to the rock). Which of the two is at a place is told by what
// rides along, c = 1 behind and 0 ahead. With Q the pore volumes injected and x the place
// as a fraction of the length,
//
//	dS/dQ + df/dx = 0                       water
//	d[(S + b) c]/dQ + d[(f + a) c]/dx = 0   what rides along
//
// a and b, the pivot, are what the water's passenger finds besides flowing water: b
// what stands still (adsorbed on rock, or rock heated), a what flows with the oil
// (heat). Where c jumps both balances hold across the jump only if its speed is
//
//	v = (f2(S2) + a)/(S2 + b) = (f1(S1) + a)/(S1 + b)
//
// that is, if the states on both sides lie on one straight line through the pivot point
// (-b, -a) of the f-S diagram. The front can therefore be drawn with a ruler: Pope (1980).
//
// # Which line
//
// Behind the front run waves of f2, from the injected state to S2, none faster than the
// front; ahead of it waves of f1, from S1 to the initial state, none slower. Many lines
// allow that. The one that a little mixing picks (Johansen & Winther 1988: along the
// front the states go over into one another without crossing the place of the steepest
// line) is the steepest that both sides can feed:
//
//	v2 = max of (f2 + a)/(S + b) over S <= injected
//	v1 = max of (f1 + a)/(S + b) over S >= initial
//	v  = min(v1, v2)
//
// v2 is the tangent from the pivot to f2 when the curve has one below the injected state, and
// the line to the injected state itself otherwise; with several inflections it is the
// outermost tangent. Water thickened by polymer has v2 < v1 unless little oil is left ahead, and
// this is the textbook construction. v1 may be the lesser where little is left, or for
// water that runs more easily than the one in place: then water in place is pushed ahead
// at its own tangent state, or at the initial one.
//
// The two states are those met first on v: S2 going from the injected state (down when
// the line to it is less steep than v, up when it is steeper), S1 going from the initial
// state the other way. So S1 is the lower root, f1'(S1) > v; below the initial saturation
// it is a true oil bank. By this choice f lies on the proper side of the line all the way, so
// that the speeds rise from the inlet outwards whatever the curves. The sole assumption is that
// mixtures of both fluids are ranked between them: none has a lower steepest line than both.
//
// Curves may end at different saturations (water of low salinity leaves less oil).
// Beyond its ends a curve goes on level: one phase alone flows. A state there is
// as lawful as any: less oil than this water would have left.
//
// # What follows
//
// Everything depends on xi = x/Q alone, so that Welge's (1952) integrals hold with the f
// of the fluid that is at the outlet. The bank has no width where the first wave ahead
// would run as fast as the front: the two are then one jump.
//
// # Slugs
//
// The rear of a slug is another jump of c, with the chase water behind it. What it feels of
// the rock may differ from what the front feels: adsorption that is not given back
// holds up the front only, so the rear has its own, smaller b. The rear outruns every wave of
// the slug behind the front and so meets the states that continuous injection would
// have put there: the solution ahead of it is untouched by the chase. Its path needs no
// stepping. The balance of the passenger seen by the rear makes
//
//	phi = integral of (f + a) dQ - (S + b_rear) dx
//
// independent of the way from the origin, and the rear keeps the phi it started with:
//
//	Q [f2 + a - xi (S + b_rear)] = size (f_inlet + a),   x = xi Q
//
// At the front the bracket is v (b - b_rear), which gives the place where the slug is
// spent, size (f_inlet + a)/(b - b_rear). If the passenger is given back in full the rear
// never catches up, as its balance says: only mixing wears such a slug down (Tracer.Peak).
// The chase water behind the rear is followed along its own straight characteristics, as
// long as these do not cross; with curves of several inflections they may, and then its
// states are not given.
//
// Chase water that is thinner than the slug fingers into it. That is not modelled: the
// times given for the rear are the latest that can be hoped for.
//
// # Not in it
//
// No change of volume, no diffusion (but see Tracer), instantaneous exchange with the
// rock proportional to c, no heat lost to layers above and below.
//
// Sources: Pope (1980); Johansen & Winther (1988); for heat Fayers (1962) and Hovdan
// (1986); all four from memory.
package ride

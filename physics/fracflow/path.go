package fracflow

import "math"

// path collects waves from the inlet outwards.
type path struct{ waves []Wave }

// add appends a wave. A fan without width is left out; one whose states all travel
// at the same speed is a contact, that is a shock; a shock that travels with the one
// before it joins it. Speeds are kept in order against rounding.
func (p *path) add(kind Kind, behind, ahead node, speedBehind, speedAhead float64) {
	if behind.y == ahead.y {
		return
	}
	if n := len(p.waves); n > 0 {
		speedBehind = math.Max(speedBehind, p.waves[n-1].SpeedAhead)
	}
	speedAhead = math.Max(speedAhead, speedBehind)
	if !rises(speedBehind, speedAhead, alike) {
		kind, speedAhead = Shock, speedBehind
	}
	if n := len(p.waves); n > 0 && kind == Shock {
		last := &p.waves[n-1]
		if last.Kind == Shock && !rises(last.SpeedAhead, speedBehind, alike) {
			if math.Abs(last.Ahead-last.Behind) < math.Abs(ahead.y-behind.y) {
				last.SpeedBehind, last.SpeedAhead = speedBehind, speedBehind
			}
			last.Ahead = ahead.y
			return
		}
	}
	p.waves = append(p.waves, Wave{kind, behind.y, ahead.y, speedBehind, speedAhead})
}

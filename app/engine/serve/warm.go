package serve

import (
	"brinefront/app/wire"
	"brinefront/physics/study"
)

// rounds are enough for the browser's optimising compiler to have seen the hot paths.
const rounds = 12

// Warm evaluates the demonstration while nothing is asked, once the first answer is out,
// so that a person's first edits are computed by code that is compiled as well as any.
// It reports whether a request has come instead; it goes on when it is called again.
func (d *Desk) Warm(turn func()) (asked bool) {
	for d.evaluation != nil && d.warmed < rounds {
		d.warmed++
		for piece := range (*study.Memory)(nil).Begin(study.Demo()).Pieces(study.SheetFront) {
			rest, numbers := wire.Pack(piece.Part)
			encoded(wire.Piece{Sheet: piece.Sheet, Part: &rest, Numbers: numbers})
			turn()
			if d.waiting() > 0 {
				return true
			}
		}
	}
	return false
}

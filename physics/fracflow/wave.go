package fracflow

// Kind tells the two sorts of wave apart.
type Kind string

const (
	Fan   Kind = "fan"   // states spread out, each at its own speed df/ds
	Shock Kind = "shock" // a jump; a contact, where the speed on both sides is that of the jump, is one too
)

// Wave is one wave of a displacement. Speeds are in df/ds: pore lengths travelled
// for each pore volume injected. A wave that starts faster than the one before it
// ended leaves a constant state between them.
type Wave struct {
	Kind                    Kind
	Behind, Ahead           float64 // saturation on the inlet side and on the outlet side
	SpeedBehind, SpeedAhead float64 // equal in a shock; SpeedBehind <= SpeedAhead in a fan
}

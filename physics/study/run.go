package study

// Run evaluates a study: rock, then front, then field, each as far as the inputs
// allow, and then what its cases change, when it has some. It is SI throughout,
// has no state and no clock, and gives the same result for the same study. What
// cannot be used is a Problem, what is still to be given a Missing path; neither
// keeps an earlier part from answering.
func Run(st Study) Result { return (*Memory)(nil).Run(st) }

// Run evaluates a study; see the function Run.
func (m *Memory) Run(st Study) Result {
	parts := map[Sheet]Part{}
	for piece := range m.Begin(st).Pieces("") {
		parts[piece.Sheet] = piece.Part
	}
	return Whole(parts)
}

package study

// Run evaluates a study: rock, then front, then field, each as far as the inputs
// allow, and then what its cases change, when it has some. It is SI throughout,
// has no state and no clock, and gives the same result for the same study. What
// cannot be used is a Problem, what is still to be given a Missing path; neither
// keeps an earlier part from answering.
func Run(st Study) Result { return (*Memory)(nil).Run(st) }

// Run evaluates a study; see the function Run.
func (m *Memory) Run(st Study) Result {
	base := m.evaluate(&st)
	parts := map[Sheet]Part{SheetRock: base.rockPart, SheetFront: base.frontPart, SheetField: base.fieldPart}
	if len(st.Cases) > 0 {
		parts[SheetCompare] = runCompare(&st, base)
	}
	r := told(Result{Problems: append([]Problem{}, base.problems...), Parts: parts}, pairOf(&st))
	if compared, ok := r.Parts[SheetCompare]; ok {
		r.Parts[SheetCompare] = caseNames(st.Cases).part(compared)
	}
	return r
}

// evaluation is a study taken through the sheets of the job.
type evaluation struct {
	st                             *Study
	problems                       []Problem
	rockPart, frontPart, fieldPart Part
	rock                           *rock
	front                          *front
}

func (m *Memory) evaluate(st *Study) evaluation {
	e := evaluation{st: st}
	e.rockPart, e.rock = runRock(st, &e.problems, m)
	e.answer()
	return e
}

// answer goes on from the rock.
func (e *evaluation) answer() {
	e.frontPart, e.front = runFront(e.st, &e.problems, e.rockPart, e.rock)
	e.fieldPart = runField(e.st, &e.problems, e.frontPart, e.front)
	e.frontPart.unusual(e.st, SheetFront)
	e.fieldPart.unusual(e.st, SheetField)
}

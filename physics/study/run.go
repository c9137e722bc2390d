package study

// Run evaluates a study: rock, then front, then field, each as far as the inputs
// allow. It is SI throughout, has no state and no clock, and gives the same
// result for the same study. What cannot be used is a Problem, what is still to
// be given a Missing path; neither keeps an earlier part from answering.
func Run(st Study) Result {
	var problems []Problem
	rockPart, rock := runRock(&st, &problems)
	frontPart, front := runFront(&st, &problems, rockPart, rock)
	fieldPart := runField(&st, &problems, frontPart, front)
	return Result{
		Problems: append([]Problem{}, problems...),
		Parts:    map[Sheet]Part{SheetRock: rockPart, SheetFront: frontPart, SheetField: fieldPart},
	}
}

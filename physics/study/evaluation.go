package study

import (
	"iter"
	"maps"
	"slices"
)

// job is how a sheet is answered.
type job struct {
	sheet Sheet
	needs []Sheet                                // answered before it
	run   func(e *Evaluation, grow growing) Part // reads the parts of what it needs from e
	asked func(*Study) bool                      // nil: of every study
}

// growing shows a part before it is whole, for a job that takes long: Left says how
// much is to come, and the next call or the part returned takes its place. When it
// answers false nobody waits any more: the job returns at once, with any part.
type growing func(Part) bool

// jobs are the sheets in the order of the job. A new sheet is a line here and in
// Sheets, and the function it names. It is no variable, since cases go through it too.
func jobs() []job {
	return []job{
		{sheet: SheetRock, run: func(e *Evaluation, _ growing) (p Part) {
			p, e.rock = runRock(e.st, e.memory)
			return p
		}},
		{sheet: SheetFront, needs: []Sheet{SheetRock}, run: func(e *Evaluation, _ growing) (p Part) {
			p, e.front = runFront(e.st, e.parts[SheetRock], e.rock)
			return p
		}},
		{sheet: SheetSoak, needs: []Sheet{SheetRock, SheetFront}, run: func(e *Evaluation, _ growing) (p Part) {
			p, e.block = runSoak(e.st, e.parts[SheetRock], e.rock, e.front)
			return p
		},
			asked: withCapillary},
		{sheet: SheetField, needs: []Sheet{SheetFront}, run: func(e *Evaluation, _ growing) Part {
			return runField(e.st, e.memory, e.parts[SheetFront], e.front)
		}},
		{sheet: SheetGrid, needs: []Sheet{SheetFront, SheetField}, run: runGrid},
		{sheet: SheetCompare, needs: compared, run: func(e *Evaluation, _ growing) Part { return runCompare(e) },
			asked: func(st *Study) bool { return len(st.Cases) > 0 }},
		{sheet: SheetMatch, needs: []Sheet{SheetField}, run: runMatch, asked: matching},
	}
}

// Sheets are the sheets that a study is taken through, in the order of the job: the
// names of jobs once more, for the interface, which would link every solver with them.
func Sheets() []Sheet {
	return []Sheet{SheetRock, SheetFront, SheetSoak, SheetField, SheetGrid, SheetCompare, SheetMatch}
}

// Evaluation is a study on its way through the sheets: each is computed when it is
// first wanted, after those it needs.
type Evaluation struct {
	st     *Study
	memory *Memory
	jobs   []job
	parts  map[Sheet]Part // so far, in the words of water and oil
	told   map[Sheet]bool // those that Pieces has given away whole

	rock  *rock
	front *front
	block *soakingBlock // nil where none soaks
}

// Piece is what is known of one sheet: its part, whole unless Part.Left says otherwise.
type Piece struct {
	Sheet Sheet
	Part  Part
}

// Begin starts the evaluation of a study; nothing is computed yet. The study must not
// be written to meanwhile.
func (m *Memory) Begin(st Study) *Evaluation {
	return &Evaluation{st: &st, memory: m, jobs: jobs(), parts: map[Sheet]Part{}, told: map[Sheet]bool{}}
}

// Pieces answers the sheets: first the one named, as soon as what it needs is there,
// then the others in the order of the job. A sheet that takes long may come several
// times, the latest standing for those before. An iteration that is broken off
// computes no further; another one, which may begin with another sheet, gives what is
// still to be given and computes nothing twice that had come to its end.
func (e *Evaluation) Pieces(first Sheet) iter.Seq[Piece] {
	return func(yield func(Piece) bool) {
		give := func(sheet Sheet, p Part) bool { return yield(Piece{sheet, e.tell(sheet, p)}) }
		list := e.jobs
		if i := slices.IndexFunc(list, func(j job) bool { return j.sheet == first }); i > 0 {
			list = slices.Insert(slices.Delete(slices.Clone(list), i, i+1), 0, list[i])
		}
		for _, j := range list {
			if e.told[j.sheet] || j.asked != nil && !j.asked(e.st) {
				continue
			}
			if !e.answer(j.sheet, give) {
				return
			}
			e.told[j.sheet] = true
			if !give(j.sheet, e.parts[j.sheet]) {
				return
			}
		}
	}
}

// answer computes a sheet after what it needs, unless that is done; false when it was
// broken off.
func (e *Evaluation) answer(sheet Sheet, give func(Sheet, Part) bool) bool {
	if _, done := e.parts[sheet]; done {
		return true
	}
	j := e.jobs[slices.IndexFunc(e.jobs, func(j job) bool { return j.sheet == sheet })]
	for _, needed := range j.needs {
		if !e.answer(needed, give) {
			return false
		}
	}
	wanted := true
	part := j.run(e, func(p Part) bool {
		wanted = wanted && give(sheet, p)
		return wanted
	})
	if !wanted {
		return false
	}
	part.unusual(e.st, sheet)
	e.parts[sheet] = part
	return true
}

// through computes a sheet to its end, with nobody to see it grow.
func (e *Evaluation) through(sheet Sheet) {
	e.answer(sheet, func(Sheet, Part) bool { return true })
}

// Whole is a result of all its parts: with every problem once, since an input that
// two sheets read is not refused twice.
func Whole(parts map[Sheet]Part) Result {
	r := Result{Problems: []Problem{}, Parts: maps.Clone(parts)}
	for _, sheet := range Sheets() {
		r.Problems = once(r.Problems, parts[sheet].Problems)
	}
	return r
}

// once is a list with those problems added that it does not name yet.
func once(list, more []Problem) []Problem {
	for _, p := range more {
		if !slices.Contains(list, p) {
			list = append(list, p)
		}
	}
	return list
}

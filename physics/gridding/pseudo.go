package gridding

import (
	"math"

	"brinefront/physics/fv"
)

// Pseudo is the curve of one block of a coarse grid: what flows out of it against its mean state.
type Pseudo struct {
	S, F     []float64
	Krw, Kro []float64 // times reference permeability over viscosity: mobilities; nil when the law has none
}

// Pseudos are curves for a coarse grid that make it repeat what a fine one says.
//
// Of the fine run, for each coarse block, the mean state and the fractional flow through the
// block's outlet face are noted together: the flux part of Kyte & Berry's (1975) dynamic
// pseudo-functions, in the form of Stone (1991), who takes fractional flow and total mobility so
// that no potentials have to be averaged. The total mobility of a block is the harmonic mean over
// its fine cells, which keeps its pressure difference.
//
// They hold for the displacement that they were made from: this rate, these initial and injected states, this
// number of blocks and each curve in its place.
type Pseudos struct {
	Blocks []Pseudo
	Fine   Measured // the run that they were made from
	Before Measured // the coarse grid with the rock's own curves
	After  Measured // the coarse grid with these
	Single Measured // the coarse grid with the curve of the last block in every place
}

// mobile is a law that knows the mobilities too.
type mobile interface {
	Mobility(s float64) (total, slope float64)
}

// Pseudos makes curves for so many blocks from a run with perBlock fine cells in each, first
// order upstream, until q has been injected, and tests them. It is for displacements in which f nowhere falls: otherwise the error says so.
func (f *Flood) Pseudos(s Scheme, blocks, perBlock int, q float64) (Pseudos, error) {
	var p Pseudos
	inlet, _ := f.Exact.InletFace()
	n := blocks * perBlock
	run, err := fv.New(f.law, fv.Settings{Cells: n, Injected: f.Exact.Injected(), Initial: f.Exact.Initial()})
	if err != nil {
		return p, err
	}
	p.Blocks = make([]Pseudo, blocks)
	flow, mobile := f.fn.(mobile)
	step := (inlet - f.Exact.Initial()) / 300 // between two points of a curve
	note := func(r *fv.Run) {
		cells := r.Cells()
		for b := range p.Blocks {
			part := cells[b*perBlock : (b+1)*perBlock]
			s, c := mean(part), &p.Blocks[b]
			k := len(c.S)
			if k > 0 && !(s > c.S[k-1]+step) {
				continue
			}
			// The flux of the outlet face in a step is f of the cell before it.
			out, _ := f.fn.At(part[perBlock-1])
			if k > 0 {
				out = math.Max(out, c.F[k-1])
			}
			c.S, c.F = append(c.S, s), append(c.F, out)
			if mobile {
				resist := 0.0
				for _, x := range part {
					total, _ := flow.Mobility(x)
					resist += 1 / total
				}
				total := float64(perBlock) / resist
				c.Krw, c.Kro = append(c.Krw, out*total), append(c.Kro, (1-out)*total)
			}
		}
	}
	note(run)
	p.Fine = f.measure(run, Scheme{CFL: 0.5}, n, q, func(to float64, each func(float64)) {
		run.Advance(to, func(r *fv.Run) bool { note(r); each(r.Q()); return true })
	})
	p.Fine.CellSteps = float64(p.Fine.Steps) * float64(n)
	// On, until the last block has seen what it will: then the curve goes on to its end.
	run.Advance(math.Max(q, 2), func(r *fv.Run) bool { note(r); return true })
	laws := make([]*fv.Law, blocks)
	for b := range p.Blocks {
		c := &p.Blocks[b]
		if inlet > c.S[len(c.S)-1]+step {
			last, _ := f.fn.At(inlet)
			c.S, c.F = append(c.S, inlet), append(c.F, math.Max(last, c.F[len(c.F)-1]))
			if mobile {
				total, _ := flow.Mobility(inlet)
				c.Krw, c.Kro = append(c.Krw, last*total), append(c.Kro, (1-last)*total)
			}
		}
		lo, hi := f.law.Ends()
		if laws[b], err = fv.Points(c.S, c.F, lo, hi); err != nil {
			return p, err
		}
	}
	if p.Before, err = f.Run(s, blocks, q); err != nil {
		return p, err
	}
	if p.After, err = f.chained(laws, q); err != nil {
		return p, err
	}
	for b := range laws {
		laws[b] = laws[blocks-1]
	}
	p.Single, err = f.chained(laws, q)
	return p, err
}

// chained is a coarse run in which every block has its own law.
func (f *Flood) chained(laws []*fv.Law, q float64) (Measured, error) {
	chain, err := fv.Chain(f.law, laws)
	if err != nil {
		return Measured{}, err
	}
	run, err := fv.New(chain, fv.Settings{Cells: len(laws), Injected: f.Exact.Injected(), Initial: f.Exact.Initial()})
	if err != nil {
		return Measured{}, err
	}
	m := f.measure(run, Scheme{CFL: 0.5}, len(laws), q, func(to float64, each func(float64)) {
		run.Advance(to, func(r *fv.Run) bool { each(r.Q()); return true })
	})
	m.CellSteps = float64(m.Steps) * float64(m.Cells)
	return m, nil
}

package fit

import (
	"fmt"
	"math"
	"strings"
)

// verdict says in plain sentences what to make of a fit.
func (t *task) verdict(f Fit, off []row) []string {
	said := []string{fmt.Sprintf("The fit describes krw within %.2g and kro within %.2g (root mean square).", f.RMSKrw, f.RMSKro)}
	if f.Status == IterationLimit {
		said = append(said, "The fit stopped at its iteration limit; the curve is the best found so far.")
	}
	said = append(said, t.missedEnds(f)...)
	doubts := 0
	for j, p := range f.Parameters {
		switch {
		case p.Held:
			continue
		case p.AtBound:
			said = append(said, fmt.Sprintf("%s lies at its bound %.4g; the points ask for a value beyond it.", p.Symbol, p.Value))
		case !p.Determined:
			said = append(said, fmt.Sprintf("%s %s is not determined by these points: %s.", p.Label, p.Symbol, t.doubt(f, j)))
		default:
			continue
		}
		doubts++
	}
	if doubts == 0 && len(f.state.active) > 0 {
		said = append(said, "The points determine every fitted parameter.")
	}
	if len(off) > 0 {
		said = append(said, listOff(off, phaseNames))
	}
	if len(f.state.active) > 0 {
		said = append(said, t.suppositions(f)...)
	}
	return said
}

// suppositions says under what conditions the intervals hold, where these are not
// what a reader would take for granted.
func (t *task) suppositions(f Fit) []string {
	var said []string
	for k, s := range f.state.scatter {
		if s.borrowed {
			said = append(said, fmt.Sprintf("%s has as many points as parameters: its intervals borrow the scatter of %s.", phaseNames[k], phaseNames[1-k]))
		}
	}
	if t.options.Weights == Absolute {
		said = append(said, "With absolute weights the intervals hold only if the scatter is as large at small kr as at large.")
	}
	return said
}

var phaseNames = [2]string{"krw", "kro"}

// doubt is the reason why a parameter is not determined.
func (t *task) doubt(f Fit, j int) string {
	p := f.Parameters[j]
	for i, active := range f.state.active {
		if active == j && f.state.blind[i] {
			return "the curves stay the same at the points when it changes"
		}
	}
	if other, r := strongest(f.Correlation, j); math.Abs(r) > entangled {
		return fmt.Sprintf("it cannot be told apart from %s (correlation %.3f)", f.Parameters[other].Symbol, r)
	}
	return fmt.Sprintf("its standard error is %.2g beside a value of %.3g", p.StdErr, p.Value)
}

// listOff names points that lie off the curve, the first few.
func listOff(off []row, curves [2]string) string {
	const most = 5
	var names []string
	for _, r := range off[:min(len(off), most)] {
		names = append(names, fmt.Sprintf("%s at Sw = %.4g", curves[r.phase], r.sw))
	}
	if more := len(off) - most; more > 0 {
		names = append(names, fmt.Sprintf("%d more", more))
	}
	verb := "lie"
	if len(off) == 1 {
		verb = "lies"
	}
	return "Further from the curve than chance allows " + verb + " " + strings.Join(names, ", ") + "."
}

// missedEnds names end points that were fitted far from the measured row: the form
// does not suit the points, and the end point is the best measured of them.
func (t *task) missedEnds(f Fit) []string {
	const far = 0.1 // of the measured value
	first, last := ends(t.points.Sw)
	var said []string
	for _, end := range []struct {
		j, row   int
		measured float64
	}{{iKrw0, last, t.points.Krw[last]}, {iKro0, first, t.points.Kro[first]}} {
		p := f.Parameters[end.j]
		if !t.held[iSwc] || !t.held[iSor] || p.Held || math.Abs(p.Value-end.measured) <= far*end.measured {
			continue
		}
		said = append(said, fmt.Sprintf("The fitted %s is %.3g where the points have %.3g at Sw = %.4g: this form does not follow the points to that end; hold the end points, or use a form with more parameters.",
			p.Symbol, p.Value, end.measured, t.points.Sw[end.row]))
	}
	return said
}

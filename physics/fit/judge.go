package fit

import (
	"fmt"
	"math"
)

// voice is how a verdict speaks of what was fitted to.
type voice struct{ ask, these, same, all string }

// judged says of every fitted parameter what keeps it from being told, or that nothing does.
func (c confidence) judged(list []Parameter, correlation [][]float64, v voice) []string {
	var said []string
	for j, p := range list {
		switch {
		case p.Held:
		case p.AtBound:
			said = append(said, p.Label+" "+p.Symbol+" lies at its bound; "+v.ask+" for a value beyond it.")
		case !p.Determined:
			said = append(said, p.Label+" "+p.Symbol+" is not determined by "+v.these+": "+c.doubt(list, correlation, j, v.same)+".")
		}
	}
	if said == nil {
		said = append(said, v.all)
	}
	return said
}

// doubt is the reason why a parameter is not determined.
func (c confidence) doubt(list []Parameter, correlation [][]float64, j int, same string) string {
	for i, active := range c.active {
		if active == j && c.blind[i] {
			return same + " when it changes"
		}
	}
	if other, r := strongest(correlation, j); math.Abs(r) > entangled {
		return fmt.Sprintf("it cannot be told apart from %s (correlation %.3f)", list[other].Symbol, r)
	}
	return fmt.Sprintf("its standard error is %.2g %% of it", 100*list[j].StdErr/math.Abs(c.size(j)))
}

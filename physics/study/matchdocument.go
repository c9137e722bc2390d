package study

import "slices"

// Match says which inputs may be moved so that the forecast follows the measured history.
// Each stays within its typed range.
type Match struct {
	Run    string `json:"run,omitempty"`   // see MatchRuns; empty: off
	First  string `json:"first,omitempty"` // see Matchable; empty, here and below: none
	Second string `json:"second,omitempty"`
	Third  string `json:"third,omitempty"`
	Fourth string `json:"fourth,omitempty"`
}

// MatchRuns say whether a match is asked for.
var MatchRuns = []Choice{{"off", "not asked for"}, {matchOn, "match"}}

const (
	matchOn = "on"
	unmoved = "none"
)

// Matchable are the inputs that a match may move, by path.
var Matchable = []Choice{
	{unmoved, "nothing more"},
	{"field.width", "width, and with it the pore volume"},
	{"field.thickness", "thickness"},
	{"field.porosity", "porosity"},
	{"field.pattern.spacing", "distance of the wells of a pattern"},
	{"field.permeability", "permeability"},
	{"field.rate", "injection rate"},
	{"field.pressure", "pressure difference"},
	{"field.uptime", "share of time on"},
	{"field.wells.injectorSkin", "skin of the injector"},
	{"fluids.oilViscosity", "oil viscosity"},
	{"front.initialWater", "initial water saturation"},
	{"rock.corey.swc", "Swc of Corey, typed"},
	{"rock.corey.sor", "Sor of Corey, typed"},
	{"rock.corey.krw0", "krw at Sor of Corey, typed"},
	{"rock.corey.nw", "water exponent of Corey, typed"},
	{"rock.corey.no", "oil exponent of Corey, typed"},
}

// Asked reports whether a match is asked for.
func (m Match) Asked() bool { return m.Run == matchOn }

func matching(st *Study) bool { return st.Match.Asked() }

// Moved are the inputs that the match of a study is to move, each once.
func (m Match) Moved() []string {
	var paths []string
	for _, path := range []string{m.First, m.Second, m.Third, m.Fourth} {
		if path != "" && path != unmoved && !slices.Contains(paths, path) {
			paths = append(paths, path)
		}
	}
	return paths
}

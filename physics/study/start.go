package study

// Empty is a new study: choices at their usual values, nothing given.
func Empty() Study {
	st := usual()
	st.Type, st.Version, st.Program = Type, Version, Program
	st.Rock.Curve = "corey-fit"
	return st
}

// Invented is the source note of every number of the demonstration.
const Invented = "invented for demonstration"

// Demo is the study that is open on a first visit. Everything in it is invented
// and says so: a water-wet sandstone plug with scattered points, a medium oil and
// a flood of the usual size. It is an example of a filled form, never the
// authority for a number.
func Demo() Study {
	st := Empty()
	st.Title = "Demonstration: an invented sandstone flood"
	st.Note = "Every number of this study is invented. Replace them with your own, or start empty."
	st.Rock.Reference = "oil"
	st.Rock.Table = &Table{
		Sw:     []float64{0.227, 0.256, 0.295, 0.339, 0.383, 0.427, 0.471, 0.516, 0.56, 0.604, 0.657, 0.716},
		Krw:    []float64{0, 2.6e-05, 0.0004, 0.00219, 0.0066, 0.014, 0.0281, 0.0465, 0.0781, 0.113, 0.181, 0.274},
		Kro:    []float64{1, 0.853, 0.71, 0.523, 0.408, 0.286, 0.184, 0.12, 0.0675, 0.0285, 0.00648, 0},
		Source: Invented,
	}
	st.Field.Start = "2027-03-01"
	st.invent([]example{
		{"rock.permeability", 436, "md"},
		{"rock.oilPermeability", 381, "md"},

		{"rock.corey.swc", 0.227, "fraction"},
		{"rock.corey.sor", 0.284, "fraction"},
		{"rock.corey.krw0", 0.274, "fraction"},
		{"rock.corey.kro0", 1, "fraction"},
		{"rock.corey.nw", 3.3, ""},
		{"rock.corey.no", 2.4, ""},

		{"rock.let.swc", 0.227, "fraction"},
		{"rock.let.sor", 0.284, "fraction"},
		{"rock.let.krw0", 0.274, "fraction"},
		{"rock.let.kro0", 1, "fraction"},
		{"rock.let.lw", 3.1, ""},
		{"rock.let.ew", 2.7, ""},
		{"rock.let.tw", 0.9, ""},
		{"rock.let.lo", 2.3, ""},
		{"rock.let.eo", 1.9, ""},
		{"rock.let.to", 1.1, ""},

		{"fluids.waterViscosity", 0.47, "cp"},
		{"fluids.oilViscosity", 8.3, "cp"},
		{"fluids.waterFormationFactor", 1.02, "rb/stb"},
		{"fluids.oilFormationFactor", 1.27, "rb/stb"},

		{"field.length", 1910, "ft"},
		{"field.width", 830, "ft"},
		{"field.pattern.spacing", 890, "ft"},
		{"field.pattern.row", 890, "ft"},
		{"field.thickness", 41, "ft"},
		{"field.porosity", 0.213, "fraction"},
		{"field.permeability", 391, "md"},
		{"field.rate", 960, "bbl/d"},
		{"field.pressure", 1340, "psi"},
		{"field.uptime", 93, "%"},
		{"field.waterCut", 97, "%"},
		{"field.oilRate", 40, "bbl/d"},
	})
	return st
}

// example is an input of a demonstration.
type example struct {
	path  string
	value float64
	unit  string
}

// invent fills in the inputs of a demonstration.
func (st *Study) invent(list []example) {
	for _, e := range list {
		spec, ok := Find(e.path)
		if !ok {
			panic("study: a demonstration names no input " + e.path)
		}
		spec.Set(st, &Input{Value: e.value, Unit: e.unit, Source: Invented})
	}
}

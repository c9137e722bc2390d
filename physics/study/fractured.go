package study

// Fractured is the other demonstration, invented like the first: a tight carbonate of mixed
// wettability, cut by fractures into blocks that soak up water from them.
func Fractured() Study {
	st := Empty()
	st.Title = "Demonstration: an invented fractured carbonate"
	st.Note = "Every number of this study is invented. Replace them with your own, or start empty."
	st.Rock.Curve, st.Rock.Capillary.Curve = "corey", "skjaeveland"
	st.Field.Start = "2027-06-01"
	st.Block.Sizes = "ft %\n1.7 20\n4.6 55\n9.1 25"
	st.invent([]example{
		{"rock.permeability", 3.7, "md"},

		{"rock.corey.swc", 0.187, "fraction"},
		{"rock.corey.sor", 0.263, "fraction"},
		{"rock.corey.krw0", 0.217, "fraction"},
		{"rock.corey.kro0", 0.784, "fraction"},
		{"rock.corey.nw", 3.1, ""},
		{"rock.corey.no", 2.7, ""},

		{"rock.capillary.cw", 1.87, "psi"},
		{"rock.capillary.aw", 0.57, ""},
		{"rock.capillary.co", -1.34, "psi"},
		{"rock.capillary.ao", 0.46, ""},

		{"fluids.waterViscosity", 0.58, "cp"},
		{"fluids.oilViscosity", 2.9, "cp"},
		{"fluids.waterFormationFactor", 1.01, "rb/stb"},
		{"fluids.oilFormationFactor", 1.34, "rb/stb"},
		{"fluids.tension", 26, "mN/m"},

		{"soak.length", 2.3, "ft"},
		{"block.length", 4.6, "ft"},
		{"block.fracturePorosity", 0.004, "fraction"},
		{"block.plug.diameter", 1.5, "in"},
		{"block.plug.length", 2.4, "in"},
		{"block.plug.oilViscosity", 8.7, "cp"},
		{"soak.ratio", 0.4, ""},

		{"field.length", 1270, "ft"},
		{"field.width", 540, "ft"},
		{"field.thickness", 63, "ft"},
		{"field.porosity", 0.274, "fraction"},
		{"field.permeability", 3.7, "md"},
		{"field.rate", 70, "bbl/d"},
		{"field.pressure", 1850, "psi"},
		{"field.uptime", 94, "%"},
		{"field.waterCut", 95, "%"},
		{"field.oilRate", 4, "bbl/d"},
	})
	return st
}

// FracturedDemo names the fractured demonstration.
const FracturedDemo = "fractured"

// DemoOf is the demonstration of a name; the first where there is none of that name.
func DemoOf(name string) Study {
	if name == FracturedDemo {
		return Fractured()
	}
	return Demo()
}

package study

import (
	"errors"
	"slices"
	"strconv"
	"strings"

	"brinefront/physics/capillary"
	"brinefront/physics/fit"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// suction is the capillary pressure of the rock at reservoir conditions, and where it
// comes from.
type suction struct {
	curve   capillary.Curve
	factor  float64           // Pa of the reservoir over Pa, or J, as given
	scale   float64           // Pa of the reservoir where J = 1; 0: not known
	points  fit.PcPoints      // laboratory points at reservoir conditions; empty: none
	typed   []float64         // their Pc as given, in Pa or J
	fitted  *fit.PcFit        // nil unless fitted
	values  []fit.Parameter   // of a form that is typed or fitted
	origins map[string]string // how a parameter was found, by symbol
	inputs  []string          // the inputs behind the curve
	sources []ref.ID
	how     string // where the curve comes from, in words
}

// capillary returns the capillary pressure at reservoir conditions, or else the paths of
// what has to be given or put right before there is one.
func (r *rock) capillary() (capillary.Curve, []string) {
	if r.suction == nil {
		return nil, r.pcWants
	}
	return r.suction.curve, nil
}

// pcForm is a parametric form that is typed or can be drawn through points.
type pcForm struct {
	kind, name string
	source     ref.ID
	typed      func(v func(name string) float64) capillary.Curve
	inputs     []string
	through    func(fit.PcPoints, fit.PcOptions) (fit.PcFit, error)
}

var pcForms = []pcForm{
	{"brooks-corey", "Brooks-Corey", ref.BrooksCorey1964, func(v func(string) float64) capillary.Curve {
		return capillary.BrooksCorey{Swr: v("swr"), Snr: v("sor"), Entry: v("entry"), Lambda: v("lambda")}
	}, []string{"entry", "lambda"}, fit.BrooksCorey},
	{"van-genuchten", "van Genuchten", ref.VanGenuchten1980, func(v func(string) float64) capillary.Curve {
		return capillary.VanGenuchten{Swr: v("swr"), Snr: v("sor"), P0: v("p0"), N: v("n"), M: v("m")}
	}, []string{"p0", "n", "m"}, fit.VanGenuchten},
	{"skjaeveland", "two branches", ref.Skjaeveland2000, func(v func(string) float64) capillary.Curve {
		return capillary.Skjaeveland{Swr: v("swr"), Sor: v("sor"), Cw: v("cw"), Aw: v("aw"), Co: v("co"), Ao: v("ao")}
	}, []string{"cw", "aw", "co", "ao"}, fit.Skjaeveland},
	{"j-power", "J-function", ref.Leverett1941, func(v func(string) float64) capillary.Curve {
		return capillary.Power{Swr: v("swr"), Snr: v("sor"), A: v("a"), B: v("b"), C: v("c")}
	}, []string{"a", "b", "c"}, nil},
}

// capillaryPressure answers what the sheet says of capillary pressure. It keeps nothing else from
// answering: what it still wants is told in a note, what it cannot use is a problem.
func (r *rock) capillaryPressure(s *sheet) {
	c := &s.st.Rock.Capillary
	r.pcWants = []string{"rock.capillary.curve"}
	if !withCapillary(s.st) {
		return
	}
	own := &sheet{st: s.st, others: s.others, part: Part{Missing: []string{}}}
	p := &suction{factor: 1, origins: map[string]string{}, inputs: []string{"rock.capillary.curve"}}
	p.convert(own)
	switch {
	case c.ByTable():
		p.measured(own, r)
	default:
		p.form(own, r, pcForms[slices.IndexFunc(pcForms, func(f pcForm) bool { return f.kind == c.Curve })])
	}
	s.problems = append(s.problems, own.problems...)
	s.part.Notes = append(s.part.Notes, own.part.Notes...)
	if own.standing() == Ready {
		r.suction, r.pcWants = p, nil
		p.tell(s, r)
		return
	}
	r.pcWants = own.part.Missing
	for _, problem := range own.problems {
		if !slices.Contains(r.pcWants, problem.Path) {
			r.pcWants = append(r.pcWants, problem.Path)
		}
	}
	s.note(Note{ID: "rock.pcWaits", Level: "caution", Text: "Capillary pressure is not told yet.", Cause: "Inputs that it rests on are not given, or cannot be used.", Do: "Give them, or choose another curve.", Paths: r.pcWants})
}

// stopped reports whether the fit stopped short.
func (p *suction) stopped() bool { return p.fitted != nil && p.fitted.Status != fit.Converged }

// convert finds what takes Pc as given to the reservoir.
func (p *suction) convert(s *sheet) {
	c := &s.st.Rock.Capillary
	angle := func(path string) float64 {
		v, given := s.input(path)
		if !given {
			return 0
		}
		p.inputs = append(p.inputs, path)
		return v
	}
	optional := func(path string) float64 { v, _ := s.input(path); return v }
	reservoir := capillary.System{Tension: optional("fluids.tension"), Angle: angle("rock.capillary.angle"),
		Permeability: optional("field.permeability"), Porosity: optional("field.porosity")}
	if scale := reservoir.Scale(); scale > 0 && s.standing() == Ready {
		p.scale = scale
	}
	switch {
	case c.ByJ():
		s.need("fluids.tension")
		s.need("field.permeability")
		s.need("field.porosity")
		p.factor = p.scale
		p.inputs = append(p.inputs, "fluids.tension", "field.permeability", "field.porosity")
		p.sources = []ref.ID{ref.Leverett1941}
	case measuredElsewhere(s.st):
		s.need("fluids.tension")
		lab := capillary.System{Tension: s.need("rock.capillary.labTension"), Angle: angle("rock.capillary.labAngle")}
		p.factor = reservoir.Adhesion() / lab.Adhesion()
		p.inputs = append(p.inputs, "fluids.tension", "rock.capillary.labTension")
		if c.LabPermeability != nil || c.LabPorosity != nil {
			lab.Permeability, lab.Porosity = s.need("rock.capillary.labPermeability"), s.need("rock.capillary.labPorosity")
			s.need("field.permeability")
			s.need("field.porosity")
			p.factor = reservoir.Scale() / lab.Scale()
			p.inputs = append(p.inputs, "rock.capillary.labPermeability", "rock.capillary.labPorosity", "field.permeability", "field.porosity")
		}
		p.sources = []ref.ID{ref.Leverett1941}
	default:
		s.problems = slices.DeleteFunc(s.problems, func(q Problem) bool { return !strings.HasPrefix(q.Path, "rock.") }) // of inputs that only J rests on
	}
}

// form reads a typed form.
func (p *suction) form(s *sheet, r *rock, f pcForm) {
	p.sources, p.how = append([]ref.ID{f.source}, p.sources...), "As typed."
	values := map[string]float64{"swr": r.swc, "sor": 1 - r.swmax}
	for _, name := range append([]string{"swr", "sor"}, f.inputs...) {
		path := "rock.capillary." + name
		v, given := s.input(path)
		spec, _ := Find(path)
		how := "As typed."
		switch {
		case given:
			values[name] = v
			p.inputs = append(p.inputs, path)
		case name == "swr" || name == "sor":
			how = "That of relative permeability."
			p.inputs = append(p.inputs, r.inputs...)
		case name == "m":
			values[name] = capillary.Mualem(values["n"])
			how = "1 − 1/n."
		}
		p.values = append(p.values, fit.Parameter{Symbol: spec.Symbol, Label: spec.Label, Value: values[name]})
		p.origins[spec.Symbol] = how
	}
	if values["swr"]+values["sor"] >= 1 {
		s.problem("rock.capillary.swr", units.Format(values["swr"], 6)+" beside "+units.Format(values["sor"], 6)+" of oil that stays", "a sum below 1")
	}
	if f.kind == "skjaeveland" && values["cw"] == 0 && values["co"] == 0 {
		s.problem("rock.capillary.cw", "0, and 0 for the oil branch", "at least one branch that is not 0")
	}
	p.curve = f.typed(func(name string) float64 { return values[name] })
	if p.factor != 1 {
		p.curve = capillary.Scaled{Curve: p.curve, Factor: p.factor}
	}
}

// measured makes the curve of the laboratory points: the table itself or a fit.
func (p *suction) measured(s *sheet, r *rock) {
	c := &s.st.Rock.Capillary
	p.inputs = append(p.inputs, "rock.capillary.table", "rock.capillary.unit")
	if c.Table == nil || len(c.Table.Sw) == 0 {
		s.miss("rock.capillary.table")
		return
	}
	unit, _ := units.Find(units.Pressure, c.Unit)
	if c.Unit == inJ {
		unit.Factor = 1
	}
	p.points.Sw = slices.Clone(c.Table.Sw)
	for _, pc := range c.Table.Pc {
		p.typed = append(p.typed, pc*unit.Factor)
		p.points.Pc = append(p.points.Pc, pc*unit.Factor*p.factor)
	}
	if s.standing() != Ready || !p.inspect(s) {
		return
	}
	if !c.Fitted() {
		p.table(s, map[string]capillary.Kind{"table": capillary.MonotoneCubic, "table-linear": capillary.StraightLine}[c.Curve])
		return
	}
	f := pcForms[slices.IndexFunc(pcForms, func(f pcForm) bool { return f.kind == strings.TrimSuffix(c.Curve, "-fit") })]
	options := fit.PcOptions{}
	if c.Weights == "absolute" {
		options.Weights = fit.Absolute
	}
	if c.Ends != "fitted" {
		options.Ends = &[2]float64{r.swc, 1 - r.swmax}
		p.inputs = append(p.inputs, r.inputs...)
	}
	p.inputs = append(p.inputs, "rock.capillary.ends", "rock.capillary.weights")
	p.sources = append([]ref.ID{f.source}, p.sources...)
	fitted, err := recall(r.memory, c.Curve, p.points, options, func() (fit.PcFit, error) { return f.through(p.points, options) })
	if err != nil {
		s.problem("rock.capillary.table", strconv.Itoa(len(p.points.Sw))+" rows: "+err.Error(), "points that determine the curve, or another kind of curve")
		return
	}
	p.fitted, p.curve, p.values, p.how = &fitted, fitted.Curve, fitted.Parameters, "Of "+f.name+", fitted to the points."
	for _, v := range fitted.Parameters {
		p.origins[v.Symbol] = pcOrigin(v, fitted.Used)
	}
}

// inspect tells what is wrong with the points; false when they cannot be used.
func (p *suction) inspect(s *sheet) bool {
	sound := true
	for _, f := range fit.InspectPc(p.points) {
		if f.Refuse {
			sound = false
			s.problem("rock.capillary.table", f.Read, f.Allowed)
			continue
		}
		s.note(Note{ID: "rock.pcPoints." + f.ID, Level: "caution", Text: f.Text, Cause: "Read: " + f.Read + ".", Do: f.Do, Paths: []string{"rock.capillary.table"}})
	}
	return sound
}

func (p *suction) table(s *sheet, kind capillary.Kind) {
	table, err := capillary.NewTable(p.points.Sw, p.points.Pc, kind)
	var bad *capillary.TableError
	if errors.As(err, &bad) {
		path, read, allowed := "rock.capillary.table", bad.Read, bad.Allowed
		if bad.Row > 0 {
			path += "." + strconv.Itoa(bad.Row-1) + "." + bad.Column
			if bad.Column == "pc" {
				typed := s.st.Rock.Capillary.Table.Pc
				read, allowed = units.Exact(typed[bad.Row-1]), "not more than "+units.Exact(typed[max(bad.Row-2, 0)])+" of the row before"
			}
		}
		s.problem(path, read, allowed)
		return
	}
	p.curve, p.how = table, "Laboratory points joined by straight lines."
	if kind == capillary.MonotoneCubic {
		p.how = "Laboratory points joined by a monotone cubic."
		p.sources = append([]ref.ID{ref.FritschCarlson1980}, p.sources...)
	}
}

// pcOrigin says in words how a fitted parameter was found.
func pcOrigin(p fit.Parameter, rows int) string {
	if p.Held {
		return "That of relative permeability."
	}
	return origin(p, rows)
}

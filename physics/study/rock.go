package study

import (
	"errors"
	"strconv"
	"strings"

	"brinefront/physics/fit"
	"brinefront/physics/ref"
	"brinefront/physics/relperm"
	"brinefront/physics/units"
)

// rock is the pair of curves that the study uses, and where it comes from.
type rock struct {
	curves     relperm.Curves // relative to absolute permeability
	reported   relperm.Curves // as typed, fitted or tabled
	factor     float64        // curves over reported: ko(Swi)/k, or 1
	swc, swmax float64
	inputs     []string // the inputs behind the curves
	sources    []ref.ID
	ends       string            // where the end points come from, in words
	parameters []fit.Parameter   // of a parametric curve, in its own order
	origins    map[string]string // how a parameter was found, by symbol
	fitted     *fit.Fit          // nil unless fitted
	memory     *Memory           // of fits
	others     []candidate       // other families through the same points
	suction    *suction          // capillary pressure; nil: none, see pcWants
	pcWants    []string          // what has to be given before there is one
}

// runRock answers the Rock sheet; nil when there is no curve to build on.
func runRock(st *Study, m *Memory) (Part, *rock) {
	s := newSheet(st)
	r := &rock{memory: m, factor: 1, origins: map[string]string{}}
	if st.Rock.Reference == "oil" {
		r.factor = s.need("rock.oilPermeability") / s.need("rock.permeability")
	}
	switch st.Rock.Curve {
	case "corey":
		r.typed(s, "rock.corey.", func(v map[string]float64) relperm.Curves {
			return relperm.Corey{Swc: v["swc"], Sor: v["sor"], Krw0: v["krw0"], Kro0: v["kro0"], Nw: v["nw"], No: v["no"]}
		}, ref.Corey1954)
	case "let":
		r.typed(s, "rock.let.", func(v map[string]float64) relperm.Curves {
			return relperm.LET{Swc: v["swc"], Sor: v["sor"], Krw0: v["krw0"], Kro0: v["kro0"], Lw: v["lw"], Ew: v["ew"], Tw: v["tw"], Lo: v["lo"], Eo: v["eo"], To: v["to"]}
		}, ref.Lomeland2005)
	default:
		r.measured(s)
	}
	if status := s.standing(); status != Ready {
		return s.close(status), nil
	}
	r.curves = r.reported
	if r.factor != 1 {
		r.curves = relperm.Scaled{Curves: r.reported, Factor: r.factor}
	}
	r.swc, r.swmax = r.curves.Ends()
	r.figures(s)
	s.part.Charts = append(s.part.Charts, r.chart(s))
	r.tables(s)
	r.notes(s)
	r.capillaryPressure(s)
	begins, stops := "Water begins to flow at Swc = {rock.swc}", "oil stops at Sor = {rock.sor}"
	water, oil := flowAtEnds(r.reported)
	if water {
		begins = "Water already flows in the first row, at Sw = {rock.swc}"
	}
	if oil {
		stops = "oil still flows in the last row, with {rock.sor} of it left"
	}
	s.answer(begins+" and "+stops,
		"; the curves cross at Sw = {rock.crossover}", "; krw ends at {rock.krw0} of the absolute permeability", "; rock soaks up water by itself to Sw = {rock.pcZero}", ".")
	status := Ready
	if r.fitted != nil && r.fitted.Status != fit.Converged || r.suction != nil && r.suction.stopped() {
		status = Stopped
	}
	return s.close(status), r
}

// flowAtEnds reports whether water flows at the smallest saturation of the curves and
// oil at the largest: a table may start and end short of the states where they stop.
func flowAtEnds(c relperm.Curves) (water, oil bool) {
	low, high := c.Ends()
	return c.At(low).Krw > 0, c.At(high).Kro > 0
}

// measures reports whether the curve rests on the laboratory points.
func (r *rock) measures() bool { return len(r.inputs) > 0 && r.inputs[0] == "rock.table" }

// typed reads a parametric curve from the inputs under a path.
func (r *rock) typed(s *sheet, under string, curves func(map[string]float64) relperm.Curves, source ref.ID) {
	values := map[string]float64{}
	for _, spec := range specs {
		if len(spec.Path) <= len(under) || spec.Path[:len(under)] != under {
			continue
		}
		value := s.need(spec.Path)
		values[spec.Path[len(under):]] = value
		r.inputs = append(r.inputs, spec.Path)
		r.parameters = append(r.parameters, fit.Parameter{Symbol: spec.Symbol, Label: spec.Label, Value: value})
		r.origins[spec.Symbol] = "As typed."
	}
	r.ends, r.sources = "As typed.", []ref.ID{source}
	if swc, sor := values["swc"], values["sor"]; swc+sor >= 1 {
		const allowed = "Swc + Sor below 1, so that some oil can move: "
		s.problem(under+"swc", s.typed(under+"swc")+" beside Sor = "+units.Format(sor, 6), allowed+"Swc below "+units.Format(1-sor, 6))
		s.problem(under+"sor", s.typed(under+"sor")+" beside Swc = "+units.Format(swc, 6), allowed+"Sor below "+units.Format(1-swc, 6))
	}
	r.reported = curves(values)
	if points, given := s.points(); given {
		s.inspect(points, false)
	}
}

// measured makes the curve of the laboratory points: the table itself or a fit.
func (r *rock) measured(s *sheet) {
	r.inputs = []string{"rock.table", "rock.curve"}
	points, given := s.points()
	if !given {
		s.miss("rock.table")
		return
	}
	if !s.inspect(points, true) {
		return
	}
	options := fit.Options{FreeSaturations: s.st.Rock.Ends == freeEnds}
	if s.st.Rock.Weights == "absolute" {
		options.Weights = fit.Absolute
	}
	switch s.st.Rock.Curve {
	case "table":
		r.sources = []ref.ID{ref.FritschCarlson1980}
		r.table(s, points, relperm.MonotoneCubic)
	case "table-linear":
		r.table(s, points, relperm.StraightLine)
	}
	for _, f := range families {
		if f.kind == s.st.Rock.Curve {
			r.fit(s, f, points, options)
		} else {
			r.compare(f, points, options)
		}
	}
}

func (r *rock) fit(s *sheet, f family, points fit.Points, options fit.Options) {
	r.inputs = append(r.inputs, "rock.weights", "rock.ends")
	r.sources = []ref.ID{f.source}
	fitted, err := r.memory.through(f, points, options)
	if err != nil {
		s.problem("rock.table", strconv.Itoa(len(points.Sw))+" rows: "+err.Error(), "points that determine the curve, or another kind of curve")
		return
	}
	r.fitted, r.reported, r.parameters = &fitted, fitted.Curves, fitted.Parameters
	for _, p := range fitted.Parameters {
		r.origins[p.Symbol] = origin(p, len(points.Sw))
	}
	r.ends = "Of the fitted curve."
}

// origin says in words how a fitted parameter was found.
func origin(p fit.Parameter, rows int) string {
	switch {
	case p.Held:
		return "Held at the laboratory points' own end."
	case p.AtBound:
		return "Least squares over " + strconv.Itoa(rows) + " points; it ended at its bound."
	}
	text := "Least squares over " + strconv.Itoa(rows) + " points; 95 % interval " + units.Format(p.Low, 3) + " to " + units.Format(p.High, 3) + "."
	if !p.Determined {
		text += " The points do not determine it."
	}
	return text
}

func (r *rock) table(s *sheet, points fit.Points, kind relperm.Kind) {
	table, err := relperm.NewTable(points.Sw, points.Krw, points.Kro, kind)
	var bad *relperm.TableError
	if errors.As(err, &bad) {
		path := "rock.table"
		if bad.Row > 0 && !strings.Contains(bad.Column, ",") {
			path += "." + strconv.Itoa(bad.Row-1) + "." + bad.Column
		}
		s.problem(path, bad.Read, bad.Allowed)
		return
	}
	r.reported, r.ends = table, "First and last row of the table."
	if kind == relperm.MonotoneCubic {
		r.ends += " Between the rows a monotone cubic: three-point slopes, limited."
	}
}

// points are the laboratory points; false when none are given.
func (s *sheet) points() (fit.Points, bool) {
	t := s.st.Rock.Table
	if t == nil || len(t.Sw) == 0 || len(t.Krw) != len(t.Sw) || len(t.Kro) != len(t.Sw) {
		return fit.Points{}, false
	}
	return fit.Points{Sw: t.Sw, Krw: t.Krw, Kro: t.Kro, RelativeToOil: s.st.Rock.Reference == "oil", FilledByOil: pairOf(s.st).FilledByResident()}, true
}

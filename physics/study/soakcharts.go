package study

import (
	"math"

	"brinefront/physics/units"
)

func (k *soak) charts(s *sheet) {
	s.part.Charts = append(s.part.Charts, k.profileChart(), k.uptakeChart(), k.flowChart(), k.diffusionChart(), k.convergenceChart())
}

// profileChart is saturation against depth, for any time: a state stands at
// (2 A/phi) F' times the root of the time.
func (k *soak) profileChart() Chart {
	end := k.arrival
	if !k.past() {
		end = math.Max(k.time, k.arrival)
	}
	c := Chart{ID: "soak.profile", Title: "Saturation inward from the open face",
		X: axis("Depth from the open face", "x", units.Length).from(0, k.length), Y: saturationAxis,
		Slider:  &Slider{Label: "Time", Symbol: "t", Quantity: units.Duration, Root: true, Min: 0, Max: end, Value: math.Min(k.time, end), Marks: []Mark{{Label: "far boundary", X: k.arrival}}},
		Marks:   []Mark{},
		Summary: "Water saturation against depth after a time that the reader moves: highest at the open face, Sw = " + units.Format(k.Inlet, 3) + ", and every state moves inward as the root of time."}
	profile := Line{ID: "profile", Label: "saturation", Role: "water", Kind: "line", Moving: true}
	samples := k.Samples(1.0 / 150)
	former := 0.0 // the last digits of a steep front may run back
	for i := len(samples) - 1; i >= 0; i-- {
		if x := 2 * k.A / k.Porosity * samples[i].Prime; !math.IsInf(x, 1) {
			former = math.Max(former, x)
			profile.X, profile.Y = append(profile.X, former), append(profile.Y, samples[i].Sw)
		}
	}
	if k.FiniteFront() { // and level from the front on
		profile.X, profile.Y = append(profile.X, profile.X[len(profile.X)-1]), append(profile.Y, k.Initial)
	}
	c.Lines = []Line{profile}
	return c
}

func (k *soak) uptakeChart() Chart {
	c := Chart{ID: "soak.uptake", Title: "Uptake against the root of time", X: axis("Root of time", "√t", units.RootDuration), Y: axis("Taken up, volume on area", "I", units.Length),
		Marks:   []Mark{},
		Summary: "A straight line of slope 2 A until the water meets the far boundary; drawn on, dashed, where the solution no longer holds and the block takes up less."}
	root := math.Sqrt(k.arrival)
	end := math.Max(root*1.3, math.Sqrt(k.time))
	c.Lines = []Line{
		{ID: "uptake", Label: "uptake", Role: "water", Kind: "line", X: []float64{0, root}, Y: []float64{0, 2 * k.A * root}},
		{ID: "beyond", Label: "no longer", Role: "aid", Kind: "dashed", X: []float64{root, end}, Y: []float64{2 * k.A * root, 2 * k.A * end}},
	}
	if !k.past() {
		c.Marks = append(c.Marks, Mark{"time asked about", math.Sqrt(k.time), k.Uptake(k.time)})
	}
	return c
}

// flowChart is F beside R f, or f where all flow is counter-current.
func (k *soak) flowChart() Chart {
	c := Chart{ID: "soak.flow", Title: "Share of the flux at the face", X: saturationAxis, Y: axis("Water flux over that at the face", "F", units.Fraction).from(0, 1), Marks: []Mark{},
		Summary: "F, the share of the water entering that passes each saturation, rises from the dry end to 1 at the open face; beside it the fractional flow of viscous displacement."}
	share := Line{ID: "share", Label: "F", Role: "water", Kind: "line"}
	viscous := Line{ID: "viscous", Label: "f", Role: "aid", Kind: "dashed"}
	pushed := Line{ID: "pushed", Label: "R f", Role: "total", Kind: "dashed"}
	for _, p := range k.Samples(1.0 / 100) {
		f, _ := k.FractionalFlow(p.Sw)
		for line, y := range map[*Line]float64{&share: p.F, &viscous: f, &pushed: k.Ratio * f} {
			line.X, line.Y = append(line.X, p.Sw), append(line.Y, math.Max(0, math.Min(1, y)))
		}
	}
	c.Lines = []Line{share, viscous}
	if k.Ratio > 0 && k.Ratio < 1 {
		c.Lines = append(c.Lines, pushed)
	}
	return c
}

func (k *soak) diffusionChart() Chart {
	c := Chart{ID: "soak.diffusion", Title: "Capillary diffusion", X: saturationAxis, Y: axis("Capillary diffusion", "Dc", units.Diffusivity), Marks: []Mark{},
		Summary: "Capillary diffusion against water saturation: small where either phase hardly flows, largest between."}
	l := Line{ID: "diffusion", Label: "Dc", Role: "water", Kind: "line"}
	samples := k.Samples(1.0 / 100)
	for _, p := range samples[1 : len(samples)-1] {
		l.X, l.Y = append(l.X, p.Sw), append(l.Y, k.Diffusion(p.Sw))
	}
	c.Lines = []Line{l}
	return c
}

// convergenceChart is how the solver came to its answer.
func (k *soak) convergenceChart() Chart {
	c := Chart{ID: "soak.convergence", Title: "How the solution converged", X: axis("Step of the solver", "n", units.Number), Y: axis("Missed of the equations", "δ", units.Number), Marks: []Mark{},
		Summary: "What the unknowns miss of their equations after each step, as a share of the whole, on a logarithmic axis: quadratic falls, and a new rise wherever panels were halved."}
	const least = 1e-17 // below rounding
	c.Y.Log, c.Y.CanLog = true, true
	most := 1.0
	l := Line{ID: "defect", Label: "missed", Role: "total", Kind: "line"}
	for n, step := range k.History {
		l.X, l.Y = append(l.X, float64(n+1)), append(l.Y, math.Max(step.Defect, least))
		most = math.Max(most, step.Defect)
	}
	c.Y = c.Y.from(least, most)
	c.Lines = []Line{l}
	return c
}

// table is the solution, state by state.
func (k *soak) table() Grid {
	g := Grid{ID: "soak.states", Title: "States after the time asked about", Columns: []Column{
		{Label: "Water saturation", Symbol: "Sw", Quantity: units.Fraction}, {Label: "Depth", Symbol: "x", Quantity: units.Length},
		{Label: "Share of the flux", Symbol: "F", Quantity: units.Fraction}, {Label: "Fractional flow", Symbol: "f", Quantity: units.Fraction},
		{Label: "Capillary diffusion", Symbol: "Dc", Quantity: units.Diffusivity},
	}}
	time := math.Min(k.time, k.arrival)
	const rows = 20
	for n := range rows + 1 {
		sw := k.Inlet - k.Width()*float64(n)/rows
		if n == rows {
			if sw = k.Initial; !k.FiniteFront() {
				break
			}
		}
		share, _ := k.Flow(sw)
		f, _ := k.FractionalFlow(sw)
		d := 0.0
		switch {
		case n == 0:
			d, _ = k.FromInlet(1e-12 * k.Width())
		case n < rows:
			d = k.Diffusion(sw)
		}
		for i, v := range []float64{sw, k.At(sw, time), math.Max(0, share), f, d} {
			g.Columns[i].Values = append(g.Columns[i].Values, v)
		}
	}
	if k.past() {
		g.Title = "States when the water meets the far boundary"
	}
	return g
}

package main

import (
	"strings"
	"testing"

	"brinefront/physics/study"
)

// TestSoak opens the fractured demonstration, asks about a time, lets some of the oil leave
// ahead, and finds the figures that the engine computes natively; as a double-click opens
// the page and as a folder of a web host does.
func TestSoak(t *testing.T) {
	for name, open := range map[string]func(testing.TB, ...Option) *Page{"file": OpenFile, "sub-folder": OpenHTTPSubfolder} {
		t.Run(name, func(t *testing.T) {
			p := open(t, At("#/soak"))
			p.WaitIdle()
			if !p.Has("#no-suction") {
				t.Error("a study without capillary pressure is not led to it")
			}
			p.Click("#do-demo-fractured")
			p.WaitIdle()
			st := study.Fractured()
			p.compare(study.Run(st).Parts[study.SheetSoak])

			p.Retype("#in-soak-time", "30")
			p.pick("#in-soak-flow", "mixed")
			p.Retype("#in-soak-ratio", "0.8")
			p.WaitIdle()
			st.Soak.Flow = "mixed"
			for path, in := range map[string]study.Input{"soak.time": {Value: 30, Unit: "d"}, "soak.ratio": {Value: 0.8}} {
				spec, _ := study.Find(path)
				spec.Set(&st, &in)
			}
			p.compare(study.Run(st).Parts[study.SheetSoak])
			if said := p.Screen(); !strings.Contains(said, "The rock takes up water as 2 A √t") || !strings.Contains(said, "short of residual oil") {
				t.Errorf("the sheet says:\n%s", said)
			}
			p.pick("#in-soak-flow", "co")
			p.WaitIdle()
			st = chosenFlow(st, "co")
			p.compare(study.Run(st).Parts[study.SheetSoak])

			p.pick("#in-block-shape", "cylinder-all")
			p.WaitIdle()
			p.Retype("#in-block-diameter", "3.1")
			p.WaitIdle()
			st.Block.Shape = "cylinder-all"
			diameter, _ := study.Find("block.diameter")
			diameter.Set(&st, &study.Input{Value: 3.1, Unit: "ft"})
			p.compare(study.Run(st).Parts[study.SheetSoak])
			if said := p.Screen(); !strings.Contains(said, "A block can take up") || !strings.Contains(said, "From the plug to the block") {
				t.Errorf("of blocks the sheet says:\n%s", said)
			}
			p.NoTrouble()
		})
	}
}

// chosenFlow is a study with another way for the oil to leave.
func chosenFlow(st study.Study, flow string) study.Study {
	st.Soak.Flow = flow
	return st
}

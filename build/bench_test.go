package main

import (
	"slices"
	"testing"
)

// What a person waits for, timed in the page itself by its own clock, which
// starts when the page is asked for. Each is a median of several.

// report prints the median of times in milliseconds, the first, and the 90th percentile.
func report(b *testing.B, times []float64) {
	b.Helper()
	b.ReportMetric(times[0], "ms-first")
	slices.Sort(times)
	b.ReportMetric(times[len(times)/2], "ms-median")
	b.ReportMetric(times[len(times)*9/10], "ms-p90")
}

// edits is how many a sheet gets at least, one after another, once it is open.
const edits = 20

// BenchmarkColdStart is the time from the double-click until the bench is open
// with the first answer on screen, in a browser that has no trace of it.
func BenchmarkColdStart(b *testing.B) {
	const usable = `(() => {
		const look = () => self.brinefrontIdle?.() ? self.usable = performance.now() : setTimeout(look, 4);
		look();
	})()`
	var times []float64
	for b.Loop() {
		p := OpenFile(b, Before(usable))
		p.WaitFor(`self.usable`)
		times = append(times, Eval[float64](p, `usable`))
		p.Close()
	}
	report(b, times)
}

// BenchmarkEditToPicture is the time from the last key in a field until the last
// picture in the window has changed for good.
func BenchmarkEditToPicture(b *testing.B) {
	const watch = `(() => {
		self.edited = 0;
		self.drawn = 0;
		addEventListener("input", () => self.edited = performance.now(), true);
		const seen = (svg) => {
			const place = svg?.getBoundingClientRect();
			return place && place.bottom > 0 && place.top < innerHeight;
		};
		const pictures = new MutationObserver((changes) => {
			const now = performance.now(); // before the layout that the question costs
			if (changes.some((c) => seen(c.target.closest?.(".drawing .plot-canvas svg")))) self.drawn = now;
		});
		pictures.observe(document.body, { subtree: true, childList: true, attributes: true });
		return true;
	})()`
	for _, c := range []struct {
		sheet, input string
		texts        [2]string // in turn, so that every edit changes the answer
	}{
		{"rock", "#in-rock-table-4-krw", [2]string{"0.0071", "0.0075"}},
		{"front", "#in-fluids-oilViscosity", [2]string{"2.2", "2.4"}},
		{"field", "#in-field-porosity", [2]string{"0.21", "0.22"}},
	} {
		b.Run(c.sheet, func(b *testing.B) {
			p := OpenFile(b, At("#/"+c.sheet))
			p.WaitIdle()
			Eval[bool](p, watch)
			p.Focus(c.input)
			var times []float64
			for b.Loop() {
				for n := range edits {
					p.command("a", "selectAll")
					p.Type(c.texts[n%2])
					p.WaitFor(`drawn > edited`)
					p.WaitIdle()
					times = append(times, Eval[float64](p, `drawn - edited`))
				}
			}
			report(b, times)
			p.Close()
		})
	}
}

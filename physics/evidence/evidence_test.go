package evidence

import (
	"math"
	"testing"

	"brinefront/physics/ref"
)

// TestAll computes every check: the same list that the Evidence sheet shows.
func TestAll(t *testing.T) {
	if len(All()) < 20 {
		t.Fatalf("%d checks; the house was opened with more", len(All()))
	}
	for _, c := range All() {
		t.Run(c.ID, func(t *testing.T) {
			computed, err := c.Run()
			if err != nil {
				t.Fatal(err)
			}
			for i, item := range c.Items {
				if !item.Agrees(computed[i]) {
					t.Errorf("%s: published %v, computed %v, off by %.3g, allowed %.3g (%s)",
						item.Label, item.Published, computed[i], math.Abs(computed[i]-item.Published), item.Tolerance, item.Why)
				}
			}
		})
	}
}

// TestStated demands that a check says everything a reader needs to judge it.
func TestStated(t *testing.T) {
	seen := map[string]bool{}
	for _, c := range All() {
		if seen[c.ID] {
			t.Errorf("%s stands twice", c.ID)
		}
		seen[c.ID] = true
		for name, text := range map[string]string{
			"topic": c.Topic, "title": c.Title, "place": c.Place, "provenance": string(c.Provenance), "inputs": c.Inputs, "how": c.How,
		} {
			if text == "" {
				t.Errorf("%s does not say its %s", c.ID, name)
			}
		}
		if c.Source != "" {
			ref.Get(c.Source)
		}
		for _, item := range c.Items {
			if item.Label == "" || item.Why == "" {
				t.Errorf("%s has an item without label or reason", c.ID)
			}
			if !(item.Tolerance > 0) || item.Tolerance > 0.12*math.Abs(item.Published) {
				t.Errorf("%s, %s: a tolerance of %v for %v proves nothing", c.ID, item.Label, item.Tolerance, item.Published)
			}
		}
	}
}

// TestNotANumber: a value that is not a number never agrees.
func TestNotANumber(t *testing.T) {
	if (Item{Published: 1, Tolerance: math.Inf(1)}).Agrees(math.NaN()) {
		t.Error("NaN agrees")
	}
}

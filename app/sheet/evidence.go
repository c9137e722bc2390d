package sheet

import (
	"math"
	"strconv"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/app/wire"
	"brinefront/physics/units"
)

// Evidence is the sheet of published values beside those computed here.
type Evidence struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// OnMount starts the checks by itself when none has been computed yet.
func (e *Evidence) OnMount(app.Context) {
	if len(e.Model.Evidence) == 0 && !e.Model.Checking {
		e.Desk.Send(state.EvidenceAsked{})
	}
}

// Render draws the list.
func (e *Evidence) Render() app.UI {
	checks := make([]app.UI, len(e.Model.Evidence))
	for i, c := range e.Model.Evidence {
		checks[i] = check(c)
	}
	return app.Article().Class("sheet evidence").DataSet("sheet", "evidence").Body(
		heading("evidence"),
		app.P().Class("sentence").ID("answer-evidence").Role("status").Text(tally(e.Model.Evidence)),
		app.Div().Class("actions").ID("inputs").TabIndex(-1).Body(
			widget.Action(e.Desk, "evidence-run", "Compute here, now", state.EvidenceAsked{}, !e.Model.Checking),
		),
		app.Ol().Class("checks").Body(checks...),
	)
}

// agreement counts the checks computed and those that agree in every value.
func agreement(all []wire.Evidence) (done, agree int) {
	for _, c := range all {
		if c.Done {
			done++
			if agrees(c) {
				agree++
			}
		}
	}
	return done, agree
}

func agrees(c wire.Evidence) bool {
	for _, item := range c.Items {
		if !item.Pass {
			return false
		}
	}
	return c.Done && c.Failure == ""
}

// checked is the standing shown on the rail.
func checked(all []wire.Evidence) string {
	done, agree := agreement(all)
	switch {
	case done == 0:
		return ""
	case agree == done:
		return "● " + strconv.Itoa(agree) + " of " + strconv.Itoa(len(all)) + " agree"
	}
	return "✕ " + strconv.Itoa(done-agree) + " differ"
}

func tally(all []wire.Evidence) string {
	done, agree := agreement(all)
	switch {
	case len(all) == 0:
		return "The list of checks is being read."
	case done < len(all):
		return strconv.Itoa(done) + " of " + strconv.Itoa(len(all)) + " checks computed so far."
	case agree == len(all):
		return "All " + strconv.Itoa(len(all)) + " checks agree with what was published, computed in this browser just now."
	}
	return strconv.Itoa(agree) + " of " + strconv.Itoa(len(all)) + " checks agree with what was published; " + strconv.Itoa(len(all)-agree) + " differ."
}

func check(c wire.Evidence) app.UI {
	return app.Li().Class("check").DataSet("check", c.ID).DataSet("verdict", verdict(c)).Body(
		app.H2().Body(app.Span().Class("verdict").Text(mark(c)+" "), app.Text(c.Title)),
		app.P().Class("quiet").Text(c.Topic+". Source: "+c.Source+". Where from: "+c.Provenance+"."),
		app.P().Text("Inputs: "+c.Inputs),
		app.P().Text("Computed here by: "+c.How),
		app.P().Class("message").Hidden(c.Failure == "").Text(c.Failure),
		app.Div().Class("scroll").TabIndex(0).Role("group").Aria("label", "Values of "+c.Title).Body(values(c)),
	)
}

func verdict(c wire.Evidence) string {
	switch {
	case !c.Done:
		return "pending"
	case agrees(c):
		return "agrees"
	}
	return "differs"
}

func mark(c wire.Evidence) string {
	switch verdict(c) {
	case "pending":
		return "… not computed yet:"
	case "agrees":
		return "● agrees:"
	}
	return "✕ differs:"
}

// shownDigits is as many digits as any source prints.
const shownDigits = 8

// tellingDigits is how many digits of a number reach down to its tolerance: further
// ones would say nothing of the agreement.
func tellingDigits(number, tolerance float64) int {
	if number == 0 || !(tolerance > 0) {
		return shownDigits
	}
	place := func(v float64) int { return int(math.Floor(math.Log10(math.Abs(v)))) }
	return min(shownDigits, max(1, place(number)-place(tolerance)+1))
}

func values(c wire.Evidence) app.UI {
	rows := make([]app.UI, len(c.Items))
	for i, item := range c.Items {
		computed, said := "", ""
		if c.Done {
			computed, said = units.Format(item.Computed, tellingDigits(item.Computed, item.Tolerance)), "✕ differs"
			if item.Pass {
				said = "● agrees"
			}
		}
		rows[i] = app.Tr().Body(
			app.Th().Scope("row").Text(item.Label),
			app.Td().Class("number").Text(units.Format(item.Published, shownDigits)),
			app.Td().Class("number").Text(computed),
			app.Td().Class("number").Text("± "+units.Format(item.Tolerance, 3)),
			app.Td().Class("words").Text(item.Why),
			app.Td().Text(said),
		)
	}
	var head []app.UI
	for _, title := range []string{"Value", "Published", "Computed here", "Tolerance", "Why this tolerance", "Verdict"} {
		head = append(head, app.Th().Scope("col").Text(title))
	}
	return app.Table().Class("grid").Body(app.THead().Body(app.Tr().Body(head...)), app.TBody().Body(rows...))
}

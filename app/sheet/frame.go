package sheet

import (
	"fmt"
	"strconv"
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// screen is the whole page for a model.
func screen(d widget.Desk, m state.Model) app.UI {
	class := "bench"
	if m.Route.Embed {
		class += " embed"
	}
	return app.Div().ID("bench").Class(class).Body(
		top(d, m),
		rail(m),
		widget.Notices(d, m.Notices),
		app.Main().ID("main").TabIndex(-1).Body(
			failure(d, m),
			demonstration(d, m),
			current(d, m),
		),
		foot(m),
		running(m.Study.Title),
	)
}

// running prints the study's title at the head of every page. The head of a page
// takes its words from a style sheet alone.
func running(title string) app.UI {
	return app.Style().Text("@page { @top-right { content: " + quoted(title) + "; } }")
}

// quoted is a text as a string of a style sheet (CSS Syntax, section 4.3.5): what
// could end it, and what could end the element, is written by its number.
func quoted(text string) string {
	var b strings.Builder
	for _, r := range text {
		if r < ' ' || strings.ContainsRune(`"\<`, r) {
			fmt.Fprintf(&b, `\%x `, r)
			continue
		}
		b.WriteRune(r)
	}
	return `"` + b.String() + `"`
}

// current is the sheet the address names.
func current(d widget.Desk, m state.Model) app.UI {
	switch m.Route.Sheet {
	case "rock":
		return &Rock{Desk: d, Model: m}
	case "soak":
		return &Soak{Desk: d, Model: m}
	case "field":
		return &Field{Desk: d, Model: m}
	case "grid":
		return &Grid{Desk: d, Model: m}
	case "compare":
		return &Compare{Desk: d, Model: m}
	case "match":
		return &Match{Desk: d, Model: m}
	case "report":
		return &Report{Desk: d, Model: m}
	case "evidence":
		return &Evidence{Desk: d, Model: m}
	}
	return &Front{Desk: d, Model: m}
}

func top(d widget.Desk, m state.Model) app.UI {
	if m.Route.Embed {
		return app.Header().Class("top").Hidden(true)
	}
	return app.Header().Class("top").Hidden(false).Body(
		app.A().Class("skip").Href("#main").Text("Skip to the sheet"),
		app.A().Class("skip").Href("#inputs").Text("Skip to the inputs"),
		app.P().Class("product").Text("Brinefront"),
		widget.Words(d, m, "title", "Study", m.Study.Title, "Untitled study", ""),
		app.P().Class("kept").ID("kept").Title("Whether this browser keeps the study until you come back").Text(kept(m.Saved)),
		widget.Radios(d, "system", "Units", string(m.System), systems),
		app.Div().Class("actions").Role("group").Aria("label", "Study").Body(
			widget.Action(d, "undo", "Undo", state.Undone{}, m.CanUndo),
			widget.Action(d, "redo", "Redo", state.Redone{}, m.CanRedo),
			widget.Action(d, "open", "Open…", state.OpenAsked{}, true),
			widget.Action(d, "save", "Save", state.SaveAsked{}, true),
			widget.Action(d, "share", "Copy link", state.ShareAsked{}, true),
			widget.Action(d, "new", "New", state.StartedEmpty{}, true),
			widget.Action(d, "demo", "Demo: flood", state.DemoOpened{}, true),
			widget.Action(d, "demo-fractured", "Demo: soak", state.DemoOpened{Which: study.FracturedDemo}, true),
		),
	)
}

// systems are the unit systems by their short names; the form has little room.
var systems = []study.Choice{{Value: "field", Label: "field"}, {Value: "metric", Label: "metric"}, {Value: "lab", Label: "lab"}}

func kept(s state.Saving) string {
	switch {
	case s.Reason != "":
		return "✕ Not kept in this browser: " + s.Reason
	case s.Done:
		return "✓ Kept"
	}
	return ""
}

// sheets are the sheets in the order of the job, and the question each answers.
var sheets = []struct{ name, title, question string }{
	{"rock", "Rock", "Which curves do the laboratory points support?"},
	{"front", "Front", "When does water arrive, and how much oil is out by then?"},
	{"soak", "Soak", "How much water does the rock take up by itself, and how fast?"},
	{"field", "Field", "What does the flood make in time, and when does it stop paying?"},
	{"grid", "Grid", "How coarse may a simulation grid be before its smearing hides the physics?"},
	{"compare", "Compare", "What comes of it when an input is another?"},
	{"match", "Match", "Which inputs make the forecast follow what was measured?"},
	{"report", "Report", "Everything on paper: inputs, answers, workings, cautions."},
	{"evidence", "Evidence", "Which published values does this very program reproduce, here, now?"},
}

func rail(m state.Model) app.UI {
	if m.Route.Embed {
		return app.Nav().Hidden(true)
	}
	tabs := make([]app.UI, len(sheets))
	for i, s := range sheets {
		tab := app.A().ID("tab-"+s.name).Href("#/"+s.name).Body(
			app.Span().Class("title").Text(s.title),
			app.Span().Class("standing").Text(standing(m, s.name)),
		)
		if s.name == m.Route.Sheet {
			tab = tab.Aria("current", "page")
		}
		tabs[i] = app.Li().Body(tab)
	}
	return app.Nav().Class("rail").Aria("label", "Sheets").Hidden(false).Body(app.Ul().Body(tabs...))
}

// standing says in a mark and words how a sheet stands.
func standing(m state.Model, sheet string) string {
	switch sheet {
	case "report":
		return ""
	case "evidence":
		return checked(m.Evidence)
	}
	switch {
	case sheet == string(study.SheetCompare) && len(m.Study.Cases) == 0:
		return "○ no cases yet"
	case sheet == string(study.SheetSoak) && !m.Study.Rock.Capillary.Given():
		return "○ no capillary pressure yet"
	}
	if sheet == string(study.SheetMatch) && !m.Study.Match.Asked() {
		return "○ not asked for"
	}
	if refusesText(m, sheet) {
		return "✕ input refused"
	}
	part := m.Result.Parts[study.Sheet(sheet)]
	if part.Left > 0 {
		return "… " + widget.Done(part) + " computed"
	}
	switch part.Status {
	case study.Waiting:
		return "○ waiting for input"
	case study.Refused:
		return "✕ input refused"
	case study.Stopped:
		return "◐ stopped short"
	case study.Ready:
		cautions := 0
		for _, n := range part.Notes {
			if n.Level == "caution" {
				cautions++
			}
		}
		switch cautions {
		case 0:
			return "● ready"
		case 1:
			return "▲ 1 caution"
		}
		return "▲ " + strconv.Itoa(cautions) + " cautions"
	}
	return "… computing"
}

// refusesText reports whether a text typed into the form of a sheet cannot be used.
// A row of the table that is merely unfinished is no such text.
func refusesText(m state.Model, sheet string) bool {
	for path := range m.Messages {
		for _, about := range []string{".low", ".high", ".source"} {
			path = strings.TrimSuffix(path, about)
		}
		if t, _ := study.FindTable(path); t.Path != path && sheetOf(path) == sheet {
			return true
		}
	}
	return false
}

// failure is the program's own fault, in words, with what to send.
func failure(d widget.Desk, m state.Model) app.UI {
	return app.Section().ID("failure").Class("failure").Hidden(m.Failure == "").Role("alert").Body(
		app.H2().Text("✕ The program failed, not your study"),
		app.P().Text(m.Failure),
		app.P().Text("This is a fault of Brinefront. Please report it with the text above and the saved study; your inputs are safe and nothing is lost."),
		widget.Action(d, "failure-save", "Save the study", state.SaveAsked{}, true),
	)
}

// invented counts the inputs in use that are still the demonstration's, and says
// whether all that are given are.
func invented(st study.Study) (n int, all bool) {
	all = true
	count := func(source string) {
		if source == study.Invented {
			n++
		} else {
			all = false
		}
	}
	for _, spec := range study.Specs() {
		if in := spec.Get(&st); in != nil && spec.Applies(&st) {
			count(in.Source)
		}
	}
	for _, t := range study.LabTables() {
		if columns, source := t.Get(&st); columns != nil {
			count(source)
		}
	}
	return n, all
}

// origin says how much of a study is the invented demonstration's.
func origin(n int, all bool) string {
	switch {
	case all:
		return "This is an invented demonstration study. "
	case n == 1:
		return "This study began as the invented demonstration; 1 input in use is still invented. "
	}
	return "This study began as the invented demonstration; " + strconv.Itoa(n) + " inputs in use are still invented. "
}

// demonstration says that what is open is invented, and how to start one's own;
// beside it stands what could not be restored.
func demonstration(d widget.Desk, m state.Model) app.UI {
	n, all := invented(m.Study)
	return app.Div().Class("openings").Body(
		app.P().ID("demonstration").Hidden(n == 0).Body(
			app.Text(origin(n, all)),
			app.Span().Hidden(m.Route.Embed).Body(
				widget.Link(d, "start-empty", "Start empty", state.StartedEmpty{}),
				app.Text(" or "),
				widget.Link(d, "start-open", "open a file", state.OpenAsked{}),
				app.Text("."),
			),
		),
		former(d, m),
		app.P().ID("damaged").Hidden(m.Damaged == "").Body(
			app.Text("✕ What this browser had kept could not be read and was set aside unchanged. "),
			widget.Link(d, "damaged-download", "Download it", state.ExportAsked{What: "damaged"}),
			app.Text("."),
		),
	)
}

// former leads back to the study that the present one took the place of.
func former(d widget.Desk, m state.Model) app.UI {
	title, ok := m.CanBringBack()
	name := "“" + title + "”"
	if title == "" {
		name = "the untitled study"
	}
	return app.P().ID("former").Hidden(!ok || m.Route.Embed).Body(
		widget.Link(d, "bring-back", "Bring back "+name, state.BroughtBack{}),
	)
}

func foot(m state.Model) app.UI {
	return app.Footer().Class("foot").Hidden(m.Route.Embed).Body(
		app.P().Body(
			app.Strong().Text("Keys: "),
			app.Text("Tab moves on. In the table Enter, ↑ and ↓ change row; paste a table into any cell. Ctrl+S saves, Ctrl+O opens, Ctrl+Z and Ctrl+Y undo and redo outside a text field."),
		),
		app.P().Text("Brinefront "+study.Program+". Everything is computed on this machine; nothing leaves the page."),
	)
}

package widget

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// Input is one line, or one block, of text that the model holds.
//
// The element is written to only when the model holds something else than what
// the person last typed. A rendering that comes a keystroke late then never
// takes the keystroke back, and the caret stays where it is.
type Input struct {
	app.Compo

	Desk  Desk
	ID    string
	Path  string
	Sort  InputSort
	Text  string
	With  string // sent along: the unit of a number, the other end of a range
	Bad   bool   // the text cannot be used
	Told  string // ids of the elements that describe it
	Name  string // accessible name, where no label element names it
	Empty string // shown while nothing is typed

	drawn bool
	first string // what the element was made with
	typed string // what the element holds now
}

// InputSort decides what an edit sends, and how the element looks.
type InputSort string

// The sorts of input.
const (
	NumberInput InputSort = "number"  // Edited
	CellInput   InputSort = "cell"    // Edited; arrows move between rows
	LowInput    InputSort = "low"     // Ranged
	HighInput   InputSort = "high"    // Ranged
	SourceInput InputSort = "source"  // Sourced
	WordsInput  InputSort = "words"   // Written
	BlockInput  InputSort = "block"   // Written, many lines
	PasteInput  InputSort = "pasting" // Pasted, many lines

	CaseNameInput InputSort = "name" // CaseNamed
)

// message is what an edit sends.
func (i *Input) message(text string) state.Msg {
	switch i.Sort {
	case LowInput:
		return state.Ranged{Path: i.Path, Low: text, High: i.With}
	case HighInput:
		return state.Ranged{Path: i.Path, Low: i.With, High: text}
	case SourceInput:
		return state.Sourced{Path: i.Path, Text: text}
	case WordsInput, BlockInput:
		return state.Written{Path: i.Path, Text: text}
	case PasteInput:
		return state.Pasted{Table: i.Path, Text: text}
	case CaseNameInput:
		i, _, _ := study.AtCase(i.Path)
		return state.CaseNamed{Index: i, Text: text}
	}
	return state.Edited{Path: i.Path, Text: text, Unit: i.With}
}

// edited is the same handler at every rendering, so that the element keeps it.
func (i *Input) edited(ctx app.Context, _ app.Event) {
	i.typed = valueOf(ctx)
	i.Desk.Send(i.message(i.typed))
}

// left is when the element loses the keyboard after an edit.
func (i *Input) left(app.Context, app.Event) { i.Desk.Send(state.Left{}) }

// OnUpdate writes the model's text where it differs from what was typed.
func (i *Input) OnUpdate(app.Context) {
	if i.Text != i.typed {
		i.typed = i.Text
		i.JSValue().Set("value", i.Text)
	}
}

// Render draws the element.
func (i *Input) Render() app.UI {
	if !i.drawn {
		i.drawn, i.first, i.typed = true, i.Text, i.Text
	}
	if i.Sort == BlockInput || i.Sort == PasteInput {
		return i.block()
	}
	return i.line()
}

func (i *Input) line() app.UI {
	in := app.Input().ID(i.ID).Type("text").Class(string(i.Sort)).AutoComplete(false).OnInput(i.edited).OnChange(i.left)
	if i.first != "" {
		in = in.Attr("value", i.first)
	}
	switch i.Sort {
	case CellInput:
		in = in.Attr("inputmode", "decimal").OnKeyDown(i.moved)
	case NumberInput, LowInput, HighInput:
		in = in.Attr("inputmode", "decimal")
	}
	for name, value := range i.described() {
		in = in.Attr(name, value)
	}
	return in
}

func (i *Input) block() app.UI {
	area := app.Textarea().ID(i.ID).Class(string(i.Sort)).Rows(3).OnInput(i.edited).OnChange(i.left)
	if i.first != "" {
		area = area.Attr("value", i.first)
	}
	for name, value := range i.described() {
		area = area.Attr(name, value)
	}
	return area
}

// described are the attributes that tell a screen reader and a test what this is.
func (i *Input) described() map[string]string {
	all := map[string]string{
		"data-path": i.Path, "aria-describedby": i.Told, "aria-label": i.Name, "placeholder": i.Empty,
		"spellcheck": "false",
	}
	if i.Bad {
		all["aria-invalid"] = "true"
	}
	for name, value := range all {
		if value == "" {
			delete(all, name)
		}
	}
	return all
}

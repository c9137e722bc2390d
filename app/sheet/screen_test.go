package sheet

import (
	"slices"
	"strconv"
	"strings"
	"testing"

	"github.com/maxence-charriere/go-app/v9/pkg/app"
	"golang.org/x/net/html"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/app/wire"
	"brinefront/physics/report"
	"brinefront/physics/study"
)

// desk keeps what widgets send.
type desk struct{ sent []state.Msg }

func (d *desk) Send(msg state.Msg) { d.sent = append(d.sent, msg) }
func (d *desk) Find(string)        {}
func (d *desk) Await()             {}
func (d *desk) Label(path string) string {
	st := study.Empty()
	return report.Label(&st, path)
}

// after is the model after messages, answered as the engine would.
func after(messages ...state.Msg) state.Model {
	m := state.New()
	for _, msg := range messages {
		m, _ = state.Update(m, msg)
	}
	m, _ = state.Update(m, state.Answered{Revision: m.Revision, Parts: study.Run(m.Study).Parts})
	return m
}

// on shows a model on a sheet.
func on(sheet string, m state.Model) state.Model {
	m.Route.Sheet = sheet
	return m
}

// refused is the demonstration with an oil viscosity that cannot be used.
func refused(sheet string) state.Model {
	return on(sheet, after(state.Edited{Path: "fluids.oilViscosity", Text: "-2", Unit: "cp"}))
}

// pasted is an empty study with a table being looked at.
func pasted() state.Model {
	return on("rock", after(state.StartedEmpty{}, state.Pasted{Table: "rock.table", Text: "Sw\tkrw\tkro\n0.2\t0\t1\n0.4\t0.1\t0.4\n0.6\t0.2\t0.1\n0.7\t0.3\t0\n"}))
}

func evidenced() state.Model {
	m := on("evidence", after())
	item := wire.Item{Label: "front saturation", Published: 0.5, Computed: 0.5001, Tolerance: 0.001, Why: "printed to three digits", Pass: true}
	wrong := item
	wrong.Pass, wrong.Computed = false, 0.7
	m.Evidence = []wire.Evidence{
		{ID: "a", Title: "One", Items: []wire.Item{item}, Done: true},
		{ID: "b", Title: "Two", Items: []wire.Item{item, wrong}, Done: true},
		{ID: "c", Title: "Three", Items: []wire.Item{item}},
	}
	return m
}

// capillary gives the demonstration a capillary pressure table, in use by a kind of curve.
func capillary(kind string) []state.Msg {
	return []state.Msg{
		state.Chosen{Path: "rock.capillary.curve", Value: kind},
		state.Pasted{Table: "rock.capillary.table", Text: "Sw\tPc, kPa\n0.24\t90\n0.3\t20\n0.4\t6\n0.5\t1\n0.55\t-2\n0.6\t-6\n0.66\t-17\n0.7\t-80\n"},
		state.PasteAccepted{},
	}
}

// models are the states of the screen that every rule below must hold in.
func models() map[string]state.Model {
	all := map[string]state.Model{"paste preview": pasted(), "evidence": evidenced()}
	for _, kind := range study.PcKinds {
		all["capillary "+kind.Value] = on("rock", after(capillary(kind.Value)...))
		all["capillary laboratory "+kind.Value] = on("rock", after(append(capillary(kind.Value), state.Chosen{Path: "rock.capillary.at", Value: "laboratory"})...))
	}
	all["capillary preview"] = on("rock", after(capillary("table")[:2]...))
	for _, s := range sheets {
		all["cases, "+s.name] = compared(s.name)
		all["demonstration, "+s.name] = on(s.name, after())
		all["fractured, "+s.name] = on(s.name, after(state.DemoOpened{Which: "fractured"}))
		all["empty, "+s.name] = on(s.name, after(state.StartedEmpty{}))
		all["refused, "+s.name] = refused(s.name)
		all["embedded, "+s.name] = after(state.Routed{Fragment: "/" + s.name + "?embed"})
		for _, curve := range study.CurveKinds {
			all[curve.Value+", "+s.name] = on(s.name, after(state.Chosen{Path: "rock.curve", Value: curve.Value}))
		}
	}
	return all
}

// page is a rendered screen.
type page struct {
	nodes []*html.Node // elements in reading order, hidden ones left out
	byID  map[string]*html.Node
	twice []string // ids that stand more than once
}

func rendered(t *testing.T, m state.Model) page {
	t.Helper()
	root, err := html.Parse(strings.NewReader(app.HTMLString(screen(&desk{}, m))))
	if err != nil {
		t.Fatal(err)
	}
	p := page{byID: map[string]*html.Node{}}
	p.gather(root)
	return p
}

func (p *page) gather(n *html.Node) {
	if n.Type == html.ElementNode {
		if value, ok := attribute(n, "hidden"); ok && value != "false" {
			return
		}
		if id, ok := attribute(n, "id"); ok {
			if p.byID[id] != nil {
				p.twice = append(p.twice, id)
			}
			p.byID[id] = n
		}
		p.nodes = append(p.nodes, n)
	}
	for child := n.FirstChild; child != nil; child = child.NextSibling {
		p.gather(child)
	}
}

func (p page) all(tags ...string) []*html.Node {
	var list []*html.Node
	for _, n := range p.nodes {
		if slices.Contains(tags, n.Data) {
			list = append(list, n)
		}
	}
	return list
}

func (p page) text(t *testing.T, id string) string {
	t.Helper()
	n := p.byID[id]
	if n == nil {
		t.Fatalf("no element has the id %q", id)
	}
	return strings.Join(strings.Fields(textOf(n)), " ")
}

func textOf(n *html.Node) string {
	if n.Type == html.TextNode {
		return n.Data
	}
	var b strings.Builder
	for child := n.FirstChild; child != nil; child = child.NextSibling {
		b.WriteString(textOf(child))
	}
	return b.String()
}

func attribute(n *html.Node, name string) (string, bool) {
	for _, a := range n.Attr {
		if a.Key == name {
			return a.Val, true
		}
	}
	return "", false
}

func TestEveryControlHasItsOwnIDAndAName(t *testing.T) {
	for name, m := range models() {
		p := rendered(t, m)
		if len(p.twice) > 0 {
			t.Errorf("%s: ids stand twice: %v", name, p.twice)
		}
		named := map[string]bool{}
		for _, label := range p.all("label") {
			target, _ := attribute(label, "for")
			if p.byID[target] == nil {
				t.Errorf("%s: the label %q names the field %q, which is not there", name, textOf(label), target)
			}
			named[target] = strings.TrimSpace(textOf(label)) != ""
		}
		controls := p.all("input", "select", "textarea", "button")
		if len(controls) == 0 && !m.Route.Embed {
			t.Errorf("%s: the screen has no control", name)
		}
		for _, c := range controls {
			id, _ := attribute(c, "id")
			label, _ := attribute(c, "aria-label")
			if !named[id] && label == "" && (c.Data != "button" || strings.TrimSpace(textOf(c)) == "") {
				t.Errorf("%s: a %s with the id %q has no name that a screen reader could say", name, c.Data, id)
			}
			if c.Data != "button" && id == "" {
				t.Errorf("%s: a %s has no id", name, c.Data)
			}
		}
	}
}

func TestDescriptionsPointSomewhere(t *testing.T) {
	for name, m := range models() {
		p := rendered(t, m)
		for _, n := range p.nodes {
			for _, key := range []string{"aria-describedby", "aria-labelledby", "aria-controls"} {
				value, _ := attribute(n, key)
				for _, id := range strings.Fields(value) {
					if p.byID[id] == nil {
						t.Errorf("%s: %s of a %s points to %q, which is not there", name, key, n.Data, id)
					}
				}
			}
		}
	}
}

func TestHeadingsAreInOrder(t *testing.T) {
	for name, m := range models() {
		p := rendered(t, m)
		level, firsts := 0, 0
		for _, h := range p.all("h1", "h2", "h3", "h4") {
			now := int(h.Data[1] - '0')
			if now > level+1 {
				t.Errorf("%s: the heading %q is of level %d under level %d", name, textOf(h), now, level)
			}
			if now == 1 {
				firsts++
			}
			level = now
		}
		if firsts != 1 {
			t.Errorf("%s: %d headings of the first level, want 1", name, firsts)
		}
	}
}

func TestDemonstrationShowsItsAnswers(t *testing.T) {
	for _, sheet := range []string{"rock", "front", "field", "grid"} {
		m := on(sheet, after())
		p := rendered(t, m)
		part := m.Result.Parts[study.Sheet(sheet)]
		if part.Status != study.Ready {
			t.Fatalf("%s: the demonstration is %q, want ready", sheet, part.Status)
		}
		shown := map[string]bool{}
		for _, n := range p.nodes {
			if id, ok := attribute(n, "data-figure"); ok {
				shown[id] = true
			}
		}
		for _, f := range part.Figures {
			if !shown[f.ID] {
				t.Errorf("%s: the figure %s is not on the page", sheet, f.ID)
			}
		}
		for _, c := range part.Charts {
			if p.byID["pic-"+c.ID] == nil {
				t.Errorf("%s: the picture %s has no holder", sheet, c.ID)
			}
		}
		if p.text(t, "answer-"+sheet) == "" {
			t.Errorf("%s: no sentence", sheet)
		}
		if p.byID["demonstration"] == nil {
			t.Errorf("%s: nothing says that the study is invented", sheet)
		}
	}
}

func TestEmptyStudyAsksForItsInputs(t *testing.T) {
	p := rendered(t, on("front", after(state.StartedEmpty{})))
	if p.byID["demonstration"] != nil {
		t.Error("an empty study is called a demonstration")
	}
	asked := map[string]bool{}
	for _, n := range p.nodes {
		if path, ok := attribute(n, "data-find"); ok {
			asked[path] = true
		}
	}
	for _, path := range []string{"fluids.oilViscosity", "fluids.waterViscosity"} {
		if !asked[path] {
			t.Errorf("nothing brings the person to %s", path)
		}
		if p.byID[widget.FieldID(path)] == nil {
			t.Errorf("the field of %s is not on the sheet", path)
		}
	}
}

func TestRefusedInputSaysSoBesideItsField(t *testing.T) {
	p := rendered(t, refused("front"))
	field := p.byID["in-fluids-oilViscosity"]
	if field == nil {
		t.Fatal("the field is not there")
	}
	if value, _ := attribute(field, "value"); value != "-2" {
		t.Errorf("the field shows %q, want what was typed", value)
	}
	if _, invalid := attribute(field, "aria-invalid"); !invalid {
		t.Error("the field is not marked invalid")
	}
	if said := p.text(t, "msg-fluids-oilViscosity"); !strings.Contains(said, "-2") || !strings.Contains(said, "allowed") {
		t.Errorf("the message reads %q", said)
	}
	if other := p.byID["in-fluids-waterViscosity"]; other == nil {
		t.Error("another field is gone")
	} else if _, invalid := attribute(other, "aria-invalid"); invalid {
		t.Error("another field is marked invalid too")
	}
}

func TestPastePreviewSaysHowItWasRead(t *testing.T) {
	p := rendered(t, pasted())
	said := p.text(t, "paste-preview")
	for _, part := range []string{"tab", "decimal point", "4 rows"} {
		if !strings.Contains(said, part) {
			t.Errorf("the preview does not say %q: %s", part, said)
		}
	}
	for _, id := range []string{"paste-accept", "paste-forget", "paste-column-1", "paste-column-3"} {
		if p.byID[id] == nil {
			t.Errorf("%s is not there", id)
		}
	}
	if disabled, ok := attribute(p.byID["paste-accept"], "disabled"); ok && disabled != "false" {
		t.Error("a table without problems cannot be used")
	}
}

// A column of oil saturation may be named as such, and then is shown so.
func TestPasteMayNameOilSaturation(t *testing.T) {
	m := pasted()
	m, _ = state.Update(m, state.PasteMapped{Column: 0, As: "so"})
	chosen := ""
	for _, n := range rendered(t, m).nodes {
		if parent, _ := attribute(n.Parent, "id"); n.Data == "option" && parent == "paste-column-1" {
			if value, selected := attribute(n, "selected"); selected && value != "false" {
				chosen, _ = attribute(n, "value")
			}
		}
	}
	if chosen != "so" {
		t.Errorf("the column is shown as %q, want so", chosen)
	}
}

func TestEmbeddedSheetHasNoFrame(t *testing.T) {
	p := rendered(t, after(state.Routed{Fragment: "/front?embed"}))
	for _, id := range []string{"tab-front", "do-undo", "in-title"} {
		if p.byID[id] != nil {
			t.Errorf("%s is there", id)
		}
	}
	if p.text(t, "answer-front") == "" {
		t.Error("the answer is missing")
	}
}

func TestEvidenceCountsEveryVerdict(t *testing.T) {
	m := evidenced()
	if got, want := tally(m.Evidence), "2 of 3 checks computed so far."; got != want {
		t.Errorf("tally reads %q, want %q", got, want)
	}
	var verdicts []string
	for _, n := range rendered(t, m).nodes {
		if v, ok := attribute(n, "data-verdict"); ok {
			verdicts = append(verdicts, v)
		}
	}
	if want := []string{"agrees", "differs", "pending"}; !slices.Equal(verdicts, want) {
		t.Errorf("verdicts %v, want %v", verdicts, want)
	}
}

func TestEvidenceShowsTheDigitsThatTell(t *testing.T) {
	for _, c := range []struct {
		number, tolerance float64
		want              int
	}{
		{5.6145833, 0.0005, 5}, {-7758.3673, 0.5, 5}, {0.0070818794, 5e-6, 4}, {9.8692327e-13, 5e-20, 8}, {0.5001, 0, 8}, {0, 0.1, 8}, {0.002, 0.1, 1},
	} {
		if got := tellingDigits(c.number, c.tolerance); got != c.want {
			t.Errorf("%v within %v is told with %d digits, want %d", c.number, c.tolerance, got, c.want)
		}
	}
}

func TestSheetOfPath(t *testing.T) {
	for path, want := range map[string]string{
		"fluids.oilViscosity": "front", "front.initialWater": "front", "rock.table": "rock", "rock.table.3.sw": "rock",
		"rock.curve": "rock", "field.start": "field", "block.sizes": "soak", "block.plug.shape": "soak", "soak.flow": "soak", "author": "report",
	} {
		if got := sheetOf(path); got != want {
			t.Errorf("%s is on %q, want %q", path, got, want)
		}
	}
}

// A form shows an input exactly when the study asks for it.
func TestFormsHoldWhatTheStudyAsksFor(t *testing.T) {
	for name, choices := range map[string][]state.Msg{
		"demonstration":      nil,
		"typed Corey":        {state.Chosen{Path: "rock.curve", Value: "corey"}},
		"typed LET":          {state.Chosen{Path: "rock.curve", Value: "let"}},
		"absolute reference": {state.Chosen{Path: "rock.reference", Value: "absolute"}},
		"held pressure":      {state.Chosen{Path: "field.drive", Value: "pressure"}, state.Chosen{Path: "field.limit", Value: "oilRate"}},
		"dipping, warm":      {state.Edited{Path: "front.dip", Text: "5", Unit: "deg"}, state.Edited{Path: "fluids.temperature", Text: "60", Unit: "degC"}},
		"soaking":            {state.DemoOpened{Which: "fractured"}},
		"soaking both ways":  {state.DemoOpened{Which: "fractured"}, state.Chosen{Path: "soak.flow", Value: "mixed"}},
		"another pair":       {state.Chosen{Path: "fluids.pair", Value: study.Choices("fluids.pair")[2].Value}},
	} {
		m := after(choices...)
		pages := map[study.Sheet]page{}
		for _, sheet := range study.Sheets() {
			pages[sheet] = rendered(t, on(string(sheet), m))
		}
		for _, spec := range study.Specs() {
			if there, wanted := pages[spec.Sheet].byID[widget.FieldID(spec.Path)] != nil, spec.Applies(&m.Study); there != wanted {
				t.Errorf("%s: the field of %s is there: %t, and the study asks for it: %t", name, spec.Path, there, wanted)
			}
		}
	}
}

func TestFoldOpensForWhatIsGiven(t *testing.T) {
	open := func(m state.Model) bool {
		fold := rendered(t, on("front", m)).byID["fold-dip"]
		if fold == nil {
			t.Fatal("there is no group for gravity and dip")
		}
		value, there := attribute(fold, "open")
		return there && value != "false"
	}
	if open(after(state.StartedEmpty{})) {
		t.Error("an empty study shows the dip")
	}
	if !open(after(state.Edited{Path: "front.dip", Text: "5", Unit: "deg"})) {
		t.Error("a dip that is given is folded away")
	}
	if !open(after(state.Edited{Path: "front.dip", Text: "steep", Unit: "deg"})) {
		t.Error("a dip that was refused is folded away")
	}
}

func TestDemonstrationSaysHowMuchIsInvented(t *testing.T) {
	if said := rendered(t, after()).text(t, "demonstration"); !strings.HasPrefix(said, "This is an invented demonstration study.") {
		t.Errorf("untouched, it says %q", said)
	}
	all, _ := invented(study.Demo())
	said := rendered(t, after(state.Edited{Path: "fluids.oilViscosity", Text: "3", Unit: "cp"})).text(t, "demonstration")
	if want := "This study began as the invented demonstration; " + strconv.Itoa(all-1) + " inputs in use are still invented."; !strings.HasPrefix(said, want) {
		t.Errorf("after one edit it says %q, want %q", said, want)
	}
	own := study.Demo()
	for _, spec := range study.Specs() {
		if in := spec.Get(&own); in != nil {
			spec.Set(&own, &study.Input{Value: in.Value, Unit: in.Unit})
		}
	}
	own.Rock.Table.Source = "report, page 4"
	m := after(state.FileChosen{Name: "own.json", Data: study.Write(own)})
	if rendered(t, m).byID["demonstration"] != nil {
		t.Error("a study without an invented number is called a demonstration")
	}
}

// CSS Syntax Module Level 3, section 4.3.7: an escape is a backslash, hexadecimal
// digits and one space.
func TestRunningTitleStaysWithinItsQuotes(t *testing.T) {
	for text, want := range map[string]string{
		"Plain, title": `"Plain, title"`, `say "no"`: `"say \22 no\22 "`, `a\b`: `"a\5c b"`, "two\nlines": `"two\a lines"`, "</style>": `"\3c /style>"`,
	} {
		if got := quoted(text); got != want {
			t.Errorf("%q is written %s, want %s", text, got, want)
		}
	}
}

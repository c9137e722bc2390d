package main

import (
	"bytes"
	"context"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
	"time"

	"brinefront/physics/paste"
	"brinefront/physics/study"

	"github.com/chromedp/cdproto/browser"
	"github.com/chromedp/cdproto/dom"
	"github.com/chromedp/cdproto/emulation"
	"github.com/chromedp/cdproto/page"
	"github.com/chromedp/chromedp"
	"github.com/chromedp/chromedp/kb"
)

// The plug of the job is invented: it is here to be typed, not to be right. What
// the page computes from it is compared with study.Run, native, on a study that
// this test fills by itself.
const plug = "Sw (%)\tkrw\tkro\n" +
	"21,9\t0\t0,81\n" +
	"28,4\t0,0021\t0,57\n" +
	"35,2\t0,0113\t0,382\n" +
	"42,6\t0,0318\t0,226\n" +
	"50,3\t0,0701\t0,117\n" +
	"57,7\t0,126\t0,0492\n" +
	"64,1\t0,197\t0,0147\n" +
	"71,3\t0,311\t0\n"

// typed are the inputs of the job, in the order of the sheets.
var typed = []struct{ sheet, path, text, unit string }{
	{"front", "fluids.waterViscosity", "0.52", "cp"},
	{"front", "fluids.oilViscosity", "3.7 cp", "cp"},
	{"front", "fluids.waterFormationFactor", "1.01", "rb/stb"},
	{"front", "fluids.oilFormationFactor", "1.31", "rb/stb"},
	{"field", "field.length", "1480", "ft"},
	{"field", "field.width", "620", "ft"},
	{"field", "field.thickness", "33", "ft"},
	{"field", "field.porosity", "0.19", "fraction"},
	{"field", "field.rate", "710", "bbl/d"},
	{"field", "field.waterCut", "96", "%"},
}

// expected is the study of the job, filled without the interface.
func expected(t testing.TB) study.Study {
	st := study.Empty()
	columns, _, ok := paste.Read(plug, paste.RelativePermeability).Table()
	if !ok {
		t.Fatal("the plug's table cannot be read")
	}
	st.Rock.Table = &study.Table{Sw: columns[0], Krw: columns[1], Kro: columns[2]}
	st.Rock.Curve = "table"
	for _, in := range typed {
		spec, ok := study.Find(in.path)
		if !ok {
			t.Fatal("no input " + in.path)
		}
		number, err := strconv.ParseFloat(strings.TrimSuffix(in.text, " cp"), 64)
		must(t, err)
		spec.Set(&st, &study.Input{Value: number, Unit: in.unit})
	}
	return st
}

func field(path string) string { return "#in-" + strings.ReplaceAll(path, ".", "-") }

// figures reads what a sheet shows, by figure ID, in SI.
func (p *Page) figures() map[string]string {
	p.t.Helper()
	return Eval[map[string]string](p, `Object.fromEntries([...document.querySelectorAll("[data-figure]")].map(e => [e.dataset.figure, e.dataset.value]))`)
}

// compare holds the figures on screen against those of a native run.
func (p *Page) compare(part study.Part) {
	p.t.Helper()
	shown := p.figures()
	if len(part.Figures) == 0 || len(shown) != len(part.Figures) {
		p.t.Fatalf("%d figures are shown, %d computed natively", len(shown), len(part.Figures))
	}
	for _, f := range part.Figures {
		got, err := strconv.ParseFloat(shown[f.ID], 64)
		if err != nil || math.Abs(got-f.Value) > 1e-9*math.Abs(f.Value) {
			p.t.Errorf("%s: the page shows %q, native is %v", f.ID, shown[f.ID], f.Value)
		}
	}
}

// sheet goes to a sheet by the keyboard: Enter on its entry in the rail.
func (p *Page) sheet(name string) {
	p.t.Helper()
	p.Focus("#tab-" + name)
	p.Type(kb.Enter)
	p.WaitFor(fmt.Sprintf(`location.hash.startsWith("#/%s")`, name))
	p.WaitIdle()
}

// fill does the job up to the forecast, by keyboard and paste alone.
func (p *Page) fill() {
	p.t.Helper()
	p.WaitIdle()
	p.sheet("rock")
	p.Focus("#do-new")
	p.Type(kb.Enter)
	p.WaitIdle()
	p.Focus("#paste-box")
	p.Paste(plug)
	p.WaitFor(`!document.querySelector("#paste-preview").hidden`)
	for _, said := range []string{"tab", "comma", "percent"} {
		if preview := p.Text("#paste-preview"); !strings.Contains(preview, said) {
			p.t.Errorf("the preview does not say %q:\n%s", said, preview)
		}
	}
	p.Focus("#paste-accept")
	p.Type(kb.Enter)
	p.WaitIdle()
	p.Focus("#in-rock-curve")
	p.Type(kb.Home)
	p.WaitIdle()
	for _, in := range typed {
		if !p.Has(field(in.path)) {
			p.sheet(in.sheet)
		}
		p.Retype(field(in.path), in.text)
	}
	p.WaitIdle()
}

func TestWholeJob(t *testing.T) {
	for name, open := range map[string]func(testing.TB, ...Option) *Page{"file": OpenFile, "http": OpenHTTPSubfolder} {
		t.Run(name, func(t *testing.T) { job(t, open(t)) })
	}
}

func job(t *testing.T, p *Page) {
	want := study.Run(expected(t))
	p.fill()
	for _, sheet := range []study.Sheet{study.SheetRock, study.SheetFront, study.SheetField} {
		p.sheet(string(sheet))
		p.compare(want.Parts[sheet])
	}

	p.sheet("report")
	text := p.printed()
	for _, needed := range []string{"Summary", "Inputs and where they come from", "Workings", "Cautions", "fracture pressure", "0.52 cp", "Water arrives after", "Printed", time.Now().Format(time.DateOnly)} {
		if !strings.Contains(text, needed) {
			t.Errorf("the printed report lacks %q", needed)
		}
	}

	saved := p.save()
	st, err := study.Read(string(saved))
	if err != nil {
		t.Fatalf("the saved file cannot be read: %v", err)
	}
	if got := study.Write(st); got != study.Write(expected(t)) {
		t.Errorf("saved is\n%s\nwant\n%s", got, study.Write(expected(t)))
	}

	p.Reload()
	p.WaitIdle()
	p.sheet("field")
	p.compare(want.Parts[study.SheetField])

	p.Focus("#do-demo")
	p.Type(kb.Enter)
	p.WaitIdle()
	p.choose(saved)
	p.WaitFor(`document.querySelector("#notices").innerText.includes("study.json")`)
	p.WaitIdle()
	p.sheet("front")
	p.compare(want.Parts[study.SheetFront])
	p.NoTrouble()
}

// printed prints the page and returns the text it has on paper.
func (p *Page) printed() string {
	p.t.Helper()
	pdf := p.PDF()
	if pages := bytes.Count(pdf, []byte("/Type /Page\n")); !bytes.HasPrefix(pdf, []byte("%PDF")) || pages < 5 {
		p.t.Errorf("the printed report has %d pages and begins %q", pages, pdf[:min(len(pdf), 8)])
	}
	p.media("print")
	defer p.media("")
	cut := Eval[int](p, `[...document.querySelectorAll("#document figure")].filter(e => getComputedStyle(e).breakInside !== "avoid").length`)
	if pictures := Eval[int](p, `document.querySelectorAll("#document figure").length`); cut > 0 || pictures == 0 {
		p.t.Errorf("%d of %d pictures may be cut by the end of a page", cut, pictures)
	}
	return strings.ReplaceAll(p.Text("#document"), "\u00a0", " ")
}

// media shows the page as on another medium; "" is the screen.
func (p *Page) media(name string) {
	p.t.Helper()
	ask(p, func(ctx context.Context, _ *chromedp.Target) (chromedp.Void, error) {
		_, err := chromedp.Call(ctx, emulation.SetEmulatedMedia, emulation.SetEmulatedMediaParams{Media: name})
		return chromedp.Void{}, err
	})
}

// save presses Ctrl+S and returns the file that the browser wrote.
func (p *Page) save() []byte {
	p.t.Helper()
	folder := p.t.TempDir()
	ask(p, func(ctx context.Context, _ *chromedp.Target) (chromedp.Void, error) {
		_, err := chromedp.Call(ctx, browser.SetDownloadBehavior, browser.SetDownloadBehaviorParams{
			Behavior: "allow", DownloadPath: folder, BrowserContextID: chromedp.FromContext(ctx).BrowserContextID,
		})
		return chromedp.Void{}, err
	})
	p.Press("s", kb.ModifierCtrl)
	for deadline := time.Now().Add(patience); time.Now().Before(deadline); p.Settle() {
		files, err := filepath.Glob(filepath.Join(folder, "*.json"))
		must(p.t, err)
		if len(files) == 1 {
			content, err := os.ReadFile(files[0])
			must(p.t, err)
			if len(content) > 0 {
				return content
			}
		}
	}
	p.t.Fatal("Ctrl+S wrote no file")
	return nil
}

// choose opens a study file through the file picker.
func (p *Page) choose(content []byte) {
	p.t.Helper()
	file := filepath.Join(p.t.TempDir(), "study.json")
	must(p.t, os.WriteFile(file, content, 0o644))
	asked := make(chan *page.EventFileChooserOpened, 1)
	must(p.t, chromedp.Listen(p.ctx, func(event any) {
		if e, ok := event.(*page.EventFileChooserOpened); ok {
			select {
			case asked <- e:
			default: // an earlier choice's listener
			}
		}
	}))
	ask(p, func(ctx context.Context, _ *chromedp.Target) (chromedp.Void, error) {
		_, err := chromedp.Call(ctx, page.SetInterceptFileChooserDialog, page.SetInterceptFileChooserDialogParams{Enabled: true})
		return chromedp.Void{}, err
	})
	p.Focus("#do-open")
	p.Type(kb.Enter)
	var picker *page.EventFileChooserOpened
	select {
	case picker = <-asked:
	case <-time.After(patience):
		p.t.Fatal("no file picker opened")
	}
	ask(p, func(ctx context.Context, _ *chromedp.Target) (chromedp.Void, error) {
		_, err := chromedp.Call(ctx, dom.SetFileInputFiles, dom.SetFileInputFilesParams{Files: []string{file}, BackendNodeID: picker.BackendNodeID})
		return chromedp.Void{}, err
	})
}

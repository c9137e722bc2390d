package main

import (
	"context"
	"encoding/json"
	"errors"
	"fmt"
	"os"
	"slices"
	"strings"

	"github.com/chromedp/cdproto/emulation"
	"github.com/chromedp/cdproto/input"
	"github.com/chromedp/cdproto/page"
	"github.com/chromedp/cdproto/runtime"
	"github.com/chromedp/chromedp"
	"github.com/chromedp/chromedp/kb"
)

// prepare sets a new tab up before it loads anything.
func (s settings) prepare(ctx context.Context) error {
	_, err := chromedp.Run(ctx, chromedp.EmulateViewport(s.width, s.height))
	if s.dark {
		_, e := chromedp.Call(ctx, emulation.SetEmulatedMedia, emulation.SetEmulatedMediaParams{
			Features: []*emulation.MediaFeature{{Name: "prefers-color-scheme", Value: "dark"}},
		})
		err = errors.Join(err, e)
	}
	if s.noScripts {
		_, e := chromedp.Call(ctx, emulation.SetScriptExecutionDisabled, emulation.SetScriptExecutionDisabledParams{Value: true})
		err = errors.Join(err, e)
	}
	if s.before != "" {
		_, e := chromedp.Call(ctx, page.AddScriptToEvaluateOnNewDocument, page.AddScriptToEvaluateOnNewDocumentParams{Source: s.before})
		err = errors.Join(err, e)
	}
	return err
}

// do carries out steps.
func (p *Page) do(steps ...chromedp.Action[chromedp.Void]) {
	p.t.Helper()
	ctx, cancel := context.WithTimeout(p.ctx, patience)
	defer cancel()
	must(p.t, chromedp.Do(ctx, steps...))
}

// ask carries out a step that yields something.
func ask[T any](p *Page, step chromedp.Action[T]) T {
	p.t.Helper()
	ctx, cancel := context.WithTimeout(p.ctx, patience)
	defer cancel()
	value, err := chromedp.Run(ctx, step)
	must(p.t, err)
	return value
}

// Eval computes a script expression in the page; a promise is waited for.
func Eval[T any](p *Page, expression string) T {
	p.t.Helper()
	return ask(p, chromedp.Evaluate[T](expression, chromedp.EvalAwaitPromise, underPolicy))
}

// underPolicy holds what a test evaluates to the policy of the page; tools for
// developers are free of it unless they say so.
func underPolicy(how *runtime.EvaluateParams) {
	no := false
	how.AllowUnsafeEvalBlockedByCSP = &no
}

// WaitFor waits until a script expression is true. It looks again and again in
// the page itself: the security policy allows no function made of a text.
func (p *Page) WaitFor(condition string) {
	p.t.Helper()
	look := fmt.Sprintf(`new Promise(resolve => {
		const look = () => (%s) ? resolve(true) : setTimeout(look, 5);
		look();
	})`, condition)
	ctx, cancel := context.WithTimeout(p.ctx, patience)
	defer cancel()
	if _, err := chromedp.Run(ctx, chromedp.Evaluate[bool](look, chromedp.EvalAwaitPromise)); err != nil {
		p.t.Fatalf("%s did not come true: %v\nthe page shows:\n%s\nthe console said:\n%s",
			condition, err, p.Screen(), strings.Join(p.Trouble(), "\n"))
	}
}

// WaitIdle waits until nothing is pending and the newest answer is on screen.
func (p *Page) WaitIdle() {
	p.t.Helper()
	p.WaitFor(`window.brinefrontIdle && window.brinefrontIdle()`)
}

// Screen is the text that the page shows now, whole.
func (p *Page) Screen() string {
	p.t.Helper()
	return Eval[string](p, `document.body.innerText`)
}

// Text is the visible text of the first element that a selector finds.
func (p *Page) Text(selector string) string {
	p.t.Helper()
	return Eval[string](p, fmt.Sprintf(`(document.querySelector(%[1]s) ?? {innerText: "no element is "+%[1]s}).innerText`, quote(selector)))
}

// Has reports whether a selector finds an element.
func (p *Page) Has(selector string) bool {
	p.t.Helper()
	return Eval[bool](p, fmt.Sprintf(`!!document.querySelector(%s)`, quote(selector)))
}

// Go moves to another sheet, as an address typed by hand does.
func (p *Page) Go(fragment string) {
	p.t.Helper()
	Eval[string](p, fmt.Sprintf(`location.hash = %s`, quote(fragment)))
}

// Reload loads the page anew, with what the browser has kept.
func (p *Page) Reload() { p.t.Helper(); p.do(chromedp.Reload()) }

// Close closes the tab before the test ends; otherwise that happens by itself.
func (p *Page) Close() { p.t.Helper(); must(p.t, chromedp.Cancel(p.ctx)) }

// Focus gives an element the keyboard.
func (p *Page) Focus(selector string) { p.t.Helper(); p.do(chromedp.Focus(selector)) }

// Click clicks in the middle of an element.
func (p *Page) Click(selector string) { p.t.Helper(); p.do(chromedp.Click(selector)) }

// Type types into whatever has the keyboard. Keys without a character are in
// package kb: Type(kb.Tab + "0.2" + kb.Enter).
func (p *Page) Type(keys string) { p.t.Helper(); p.do(chromedp.KeyEvent(keys)) }

// Press presses keys with modifiers held: Press("z", kb.ModifierCtrl).
func (p *Page) Press(keys string, held ...kb.Modifier) {
	p.t.Helper()
	p.do(chromedp.KeyEvent(keys, chromedp.KeyModifiers(held...)))
}

// Retype replaces the whole text of a field and leaves it.
func (p *Page) Retype(selector, text string) {
	p.t.Helper()
	p.Focus(selector)
	p.command("a", "selectAll")
	if text == "" {
		p.Press(kb.Delete)
	}
	p.Type(text + kb.Tab)
}

// Focused describes the element that has the keyboard: its tag, id and label.
func (p *Page) Focused() string {
	p.t.Helper()
	return Eval[string](p, `(e => e.tagName.toLowerCase() + (e.id ? "#" + e.id : "") + " " + (e.ariaLabel || e.labels?.[0]?.innerText || e.innerText || "").trim().slice(0, 60))(document.activeElement)`)
}

// Paste puts a text on the clipboard and presses Ctrl+V: what has the keyboard
// gets a paste as from any other program.
func (p *Page) Paste(text string) {
	p.t.Helper()
	// A field of our own and the browser's copy command: the clipboard of scripts
	// asks for a permission.
	Eval[bool](p, fmt.Sprintf(`(text => {
		const had = document.activeElement;
		const carrier = document.body.appendChild(document.createElement("textarea"));
		carrier.value = "to be copied"; // a long text would be laid out
		carrier.addEventListener("copy", (e) => { e.clipboardData.setData("text/plain", text); e.preventDefault(); e.stopPropagation(); });
		carrier.select();
		self.pasteReturn = () => { carrier.remove(); had.focus(); return true; };
		return true;
	})(%s)`, quote(text)))
	p.command("c", "copy")
	Eval[bool](p, `pasteReturn()`)
	p.command("v", "paste")
}

// command presses a control key together with the editing command that a
// browser with a screen would make of it.
func (p *Page) command(key, command string) {
	p.t.Helper()
	for _, kind := range []input.DispatchKeyEventType{input.DispatchKeyEventTypeRawKeyDown, input.DispatchKeyEventTypeKeyUp} {
		press := input.DispatchKeyEventParams{
			Type: kind, Key: key, Code: "Key" + strings.ToUpper(key), Modifiers: int64(kb.ModifierCtrl),
			WindowsVirtualKeyCode: int64(strings.ToUpper(key)[0]),
		}
		if kind == input.DispatchKeyEventTypeRawKeyDown {
			press.Commands = []string{command}
		}
		ask(p, func(ctx context.Context, _ *chromedp.Target) (chromedp.Void, error) {
			_, err := chromedp.Call(ctx, input.DispatchKeyEvent, press)
			return chromedp.Void{}, err
		})
	}
}

// Screenshot writes a picture of the window, a PNG, to a file.
func (p *Page) Screenshot(file string) {
	p.t.Helper()
	must(p.t, os.WriteFile(file, ask(p, chromedp.CaptureScreenshot()), 0o644))
}

// PDF prints the page, with its colours, and returns the file.
func (p *Page) PDF() []byte {
	p.t.Helper()
	return ask(p, chromedp.PrintToPDF(func(how *page.PrintToPDFParams) {
		yes := true
		how.PrintBackground, how.PreferCSSPageSize = &yes, &yes
	}))
}

// Trouble lists what the console has said so far.
func (p *Page) Trouble() []string {
	p.mu.Lock()
	defer p.mu.Unlock()
	return slices.Clone(p.trouble)
}

// Requests lists the addresses that the page has asked for so far, in order.
func (p *Page) Requests() []string {
	p.mu.Lock()
	defer p.mu.Unlock()
	return slices.Clone(p.requests)
}

// NoTrouble fails the test when the console said something, or when the page
// asked for anything but a file of its own folder.
func (p *Page) NoTrouble() {
	p.t.Helper()
	p.Settle()
	if said := p.Trouble(); len(said) > 0 {
		p.t.Errorf("the console of %s said:\n%s", p.Address, strings.Join(said, "\n"))
	}
	for _, address := range p.Requests() {
		within := strings.HasPrefix(address, p.Folder)
		inPage := strings.HasPrefix(address, "data:") || strings.HasPrefix(address, "blob:")
		if !within && !inPage {
			p.t.Errorf("%s asked for %s, which is no file of its folder", p.Address, address)
		}
	}
}

// Settle waits until events that were on their way have arrived: the browser
// sends them in order, so that an answer comes after all of them.
func (p *Page) Settle() { p.t.Helper(); Eval[int](p, `1`) }

func quote(text string) string {
	quoted, err := json.Marshal(text)
	if err != nil {
		panic(err) // a string can always be written
	}
	return string(quoted)
}

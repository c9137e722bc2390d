package main

import (
	"context"
	"errors"
	"fmt"
	"net/http"
	"net/http/httptest"
	"net/url"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"sync"
	"testing"
	"time"

	"github.com/chromedp/cdproto/log"
	"github.com/chromedp/cdproto/network"
	"github.com/chromedp/cdproto/runtime"
	"github.com/chromedp/chromedp"
)

// The harness drives the built site in a headless Chromium. A test reads
//
//	p := OpenFile(t)                         // or OpenHTTPSubfolder(t)
//	p.WaitIdle()                             // the newest answer is on screen
//	p.Focus("#field-porosity")               // a CSS selector
//	p.Type("0.21")                           // keys, as a person types
//	p.Press(kb.Tab)
//	p.Paste("Sw\tkrw\tkro\n...")             // through the clipboard
//	got := p.Text("#answer")
//	p.NoTrouble()                            // nothing on the console, nothing from outside
//
// Every step fails the test by itself when it cannot be done. Nothing waits for
// a time: WaitFor and WaitIdle wait for a condition and fail after patience.

// patience is how long a condition may take before a test gives it up: far more
// than it should, for machines that do much at once.
const patience = 60 * time.Second

// Page is one tab, with storage of its own: pages do not see each other's.
type Page struct {
	t       testing.TB
	ctx     context.Context
	Address string // of index.html
	Folder  string // the address of the folder that holds it, with a slash at its end

	mu       sync.Mutex
	trouble  []string // what the console said: errors, warnings, uncaught exceptions
	requests []string // addresses in order
}

// Option changes how a page is opened.
type Option func(*settings)

type settings struct {
	site          string // the folder on disk
	fragment      string
	width, height int64
	dark          bool
	noScripts     bool
	before        string // script to run before any of the page's
}

// At opens an address within the site, as At("#/rock").
func At(fragment string) Option { return func(s *settings) { s.fragment = fragment } }

// Sized sets the window in CSS pixels; the default is 1440 by 900.
func Sized(width, height int64) Option {
	return func(s *settings) { s.width, s.height = width, height }
}

// Dark asks for dark colours.
func Dark() Option { return func(s *settings) { s.dark = true } }

// ScriptsOff opens the page as a browser does that allows no scripts.
func ScriptsOff() Option { return func(s *settings) { s.noScripts = true } }

// Before runs a script before any of the page's own.
func Before(script string) Option { return func(s *settings) { s.before = script } }

// Without opens a copy of the site that lacks a file.
func Without(t testing.TB, file string) Option {
	folder := t.TempDir()
	must(t, os.CopyFS(folder, os.DirFS(built(t))))
	must(t, os.Remove(filepath.Join(folder, file)))
	return func(s *settings) { s.site = folder }
}

// OpenFile opens the site as a double-click on index.html does.
func OpenFile(t testing.TB, options ...Option) *Page {
	t.Helper()
	s := gather(t, options)
	folder := (&url.URL{Scheme: "file", Path: s.site + "/"}).String()
	return open(t, folder, s)
}

// OpenHTTPSubfolder opens the site as a folder of a web host that has nothing else.
func OpenHTTPSubfolder(t testing.TB, options ...Option) *Page {
	t.Helper()
	s := gather(t, options)
	folder := url.URL{Path: "/wells/some folder/"} // a name that addresses spell in another way
	server := httptest.NewServer(http.StripPrefix(folder.Path, http.FileServer(http.Dir(s.site))))
	t.Cleanup(server.Close)
	return open(t, server.URL+folder.String(), s)
}

// built is the site on disk.
func built(t testing.TB) string {
	t.Helper()
	folder, err := filepath.Abs("site")
	must(t, err)
	// Every file is looked at, so that go test knows what the result depends on.
	for _, name := range siteFiles {
		if _, err := os.Stat(filepath.Join(folder, name)); err != nil {
			t.Fatalf("the built site is not whole; make site builds it: %v", err)
		}
	}
	return folder
}

func gather(t testing.TB, options []Option) settings {
	t.Helper()
	s := settings{site: built(t), width: 1440, height: 900}
	for _, o := range options {
		o(&s)
	}
	return s
}

// chromiumContext starts the one browser of all tests when the first asks for it.
var chromiumContext = sync.OnceValues(func() (context.Context, error) {
	program, err := findChromium()
	if err != nil {
		return nil, err
	}
	profile, err := os.MkdirTemp("", "brinefront-chromium-")
	if err != nil {
		return nil, err
	}
	options := append(slices.Clone(chromedp.DefaultExecAllocatorOptions[:]),
		chromedp.ExecPath(program), chromedp.UserDataDir(profile), chromedp.NoSandbox, chromedp.DisableGPU,
		chromedp.Flag("disable-quic", true), chromedp.Flag("disable-component-update", true),
	)
	allocator, stop := chromedp.NewExecAllocator(context.Background(), options...)
	ctx, _ := chromedp.NewContext(allocator)
	stopChromium = func() error {
		closed := chromedp.Cancel(ctx) // waits until the browser has ended
		stop()
		return errors.Join(closed, os.RemoveAll(profile))
	}
	return ctx, chromedp.Do(ctx)
})

// stopChromium ends the browser if one was started.
var stopChromium = func() error { return nil }

func TestMain(m *testing.M) {
	code := m.Run()
	if err := stopChromium(); err != nil {
		// The browser may still write to its profile while it ends: the system
		// clears its temporary folder, and no test depends on it.
		fmt.Fprintln(os.Stderr, err)
	}
	os.Exit(code)
}

func open(t testing.TB, folder string, s settings) *Page {
	t.Helper()
	browser, err := chromiumContext()
	must(t, err)
	ctx, cancel := chromedp.NewContext(browser, chromedp.WithNewBrowserContext())
	t.Cleanup(cancel)
	p := &Page{t: t, ctx: ctx, Folder: folder, Address: folder + "index.html" + s.fragment}
	must(t, chromedp.Listen(ctx, p.hear))
	must(t, s.prepare(ctx))
	p.do(chromedp.Navigate(p.Address))
	return p
}

// hear keeps what the page does that a test may ask for later.
func (p *Page) hear(event any) {
	p.mu.Lock()
	defer p.mu.Unlock()
	complain := func(kind, text string) { p.trouble = append(p.trouble, kind+": "+text) }
	switch e := event.(type) {
	case *network.EventRequestWillBeSent:
		p.requests = append(p.requests, e.Request.URL)
	case *runtime.EventConsoleAPICalled:
		switch e.Type {
		case runtime.ConsoleAPICalledTypeError, runtime.ConsoleAPICalledTypeWarning, runtime.ConsoleAPICalledTypeAssert:
			var words []string
			for _, arg := range e.Args {
				words = append(words, strings.Trim(string(arg.Value), `"`)+arg.Description)
			}
			complain("console "+string(e.Type), strings.Join(words, " "))
		}
	case *runtime.EventExceptionThrown:
		complain("uncaught", thrown(e.ExceptionDetails))
	case *log.EventEntryAdded:
		if e.Entry.Level == log.EntryLevelError || e.Entry.Level == log.EntryLevelWarning {
			complain(string(e.Entry.Source), e.Entry.Text+" "+e.Entry.URL)
		}
	}
}

func must(t testing.TB, err error) {
	t.Helper()
	if err != nil {
		t.Fatal(err)
	}
}

// thrown is an exception in words, with the place it came from.
func thrown(details *runtime.ExceptionDetails) string {
	text := details.Text
	if details.Exception != nil {
		text += " " + details.Exception.Description
	}
	return text
}

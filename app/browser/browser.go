// Package browser is the only door to the browser's own machinery: workers,
// storage, files, clipboard, address, printing, pictures. Every file that talks
// to the browser has a native twin with the same functions, which keeps what it
// was asked in Pretend, so that everything above this package is tested without
// a browser.
//
// Every callback runs while the browser waits: it may take note and dispatch,
// never block. What a browser may withhold (storage, clipboard, a script of the
// folder) comes back as an error in words for the person, never as a crash.
package browser

import (
	"errors"
	"fmt"
	"strings"
)

// What a person asked for by keyboard, as OnShortcut tells it.
const (
	KeyUndo = "undo" // Ctrl+Z
	KeyRedo = "redo" // Ctrl+Shift+Z or Ctrl+Y
	KeySave = "save" // Ctrl+S
	KeyOpen = "open" // Ctrl+O
)

// Formats a picture can be saved in.
const (
	SVG = "svg"
	PNG = "png"
)

var (
	errNoEngine  = errors.New("The file engine.js of this folder did not load, so nothing can be computed. Copy the whole folder again and reload the page.")
	errNoPlot    = errors.New("The file plot.js of this folder did not load, so no picture can be drawn. Copy the whole folder again and reload the page.")
	errOneFile   = errors.New("Several files were dropped. Drop one file at a time.")
	errNoCopying = errors.New("This browser did not let the page write to the clipboard. Select the text and copy it by hand.")
)

// refused says in words that the browser did not allow something.
func refused(what string, cause error) error {
	return fmt.Errorf("This browser did not let the page %s: %w.", what, cause)
}

// tooLarge says what was read and what is allowed.
func tooLarge(name string, size, limit int) error {
	return fmt.Errorf("The file %q holds %s; at most %s can be read.", name, amount(size), amount(limit))
}

func amount(bytes int) string {
	switch {
	case bytes >= 1e6:
		return fmt.Sprintf("%.1f MB", float64(bytes)/1e6)
	case bytes >= 1e3:
		return fmt.Sprintf("%.1f kB", float64(bytes)/1e3)
	}
	return fmt.Sprintf("%d bytes", bytes)
}

// severalCells reports whether a pasted text is more than the content of one
// cell. Spreadsheets end even a single cell with a line break.
func severalCells(text string) bool {
	return strings.ContainsAny(strings.TrimRight(text, "\r\n"), "\t\r\n")
}

// ours reports whether a fragment is an address of the program ("/front", or
// none at all) and not the target of a link within the page ("main").
func ours(fragment string) bool {
	return fragment == "" || strings.HasPrefix(fragment, "/")
}

// Command build makes the site out of the two programs and the files of web,
// serves it, packs it, checks it and times it.
//
//	go run ./build site          build/site/, ready to be copied anywhere
//	go run ./build serve [port]  the site on 127.0.0.1, for looking at it
//	go run ./build usb           build/out/brinefront-usb.zip: unpack and double-click
//	go run ./build check         what a site has to hold; fails when it does not
//	go run ./build bench         timings, native beside WebAssembly, and in Chromium
//	go run ./build chromium      finds the Chromium that tests use, or installs it
package main

import (
	"fmt"
	"maps"
	"os"
	"slices"
	"strings"
)

// Where things are, seen from the top of the repository.
const (
	siteFolder = "build/site"
	outFolder  = "build/out"
	webFolder  = "web"
)

var commands = map[string]func(args []string) error{
	"site":     func([]string) error { return buildSite() },
	"serve":    serve,
	"usb":      func([]string) error { return packUSB() },
	"check":    func([]string) error { return checkSite() },
	"bench":    func([]string) error { return bench() },
	"chromium": func([]string) error { return ensureChromium() },
}

func main() {
	if err := run(os.Args[1:]); err != nil {
		fmt.Fprintln(os.Stderr, "build:", err)
		os.Exit(1)
	}
}

func run(args []string) error {
	if _, err := os.Stat("go.mod"); err != nil {
		return fmt.Errorf("run this at the top of the repository: %w", err)
	}
	usage := "say one of: " + strings.Join(slices.Sorted(maps.Keys(commands)), ", ")
	if len(args) == 0 {
		return fmt.Errorf("%s", usage)
	}
	command, known := commands[args[0]]
	if !known {
		return fmt.Errorf("%q is no command; %s", args[0], usage)
	}
	return command(args[1:])
}

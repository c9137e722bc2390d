package main

import (
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
	"regexp"
	"slices"
	"strings"
)

// budget is what a browser may download in all, gzipped.
const budget = 4e6 // bytes

// links says what a program has to hold and what it must not: the interface
// computes nothing, and the engine knows no page. A package of which a program
// only needs the types leaves no function behind.
// Fitting is told by the library it rests on: the table of what can be fitted is
// set up in both programs. The systems of a fit are too small for the library's
// linear algebra, which is a seventh of the engine.
var links = map[string]struct{ needed, foreign []string }{
	"./app": {
		needed: []string{"github.com/maxence-charriere/go-app/v9/pkg/app"},
		foreign: []string{
			"brinefront/physics/displace", "brinefront/physics/fracflow", "brinefront/physics/reservoir",
			"brinefront/physics/relperm", "brinefront/physics/numeric", "gonum.org/v1/gonum/mathext/internal/cephes",
		},
	},
	"./app/engine": {
		needed:  []string{"brinefront/physics/displace", "brinefront/physics/fracflow", "brinefront/physics/reservoir"},
		foreign: []string{"github.com/maxence-charriere", "net/http", "brinefront/app/state", "brinefront/app/sheet", "gonum.org/v1/gonum/lapack", "gonum.org/v1/gonum/mat"},
	},
}

// checkSite says what is wrong with a built site, all of it.
func checkSite() error {
	var faults []error
	total, err := weight()
	if err != nil {
		return fmt.Errorf("%w (build the site first: make site)", err)
	}
	fmt.Printf("the whole site has %.2f MB, gzipped; %.0f MB are allowed\n", megabytes(total), budget/1e6)
	if total > budget {
		faults = append(faults, fmt.Errorf("the site has %.2f MB gzipped and may have %.0f", megabytes(total), budget/1e6))
	}
	faults = append(faults, strangers())
	for _, p := range programs {
		faults = append(faults, p.checkLinks())
	}
	return errors.Join(faults...)
}

// weight is the gzipped size of the site. Every file must be there.
func weight() (total int, err error) {
	for _, name := range siteFiles {
		content, err := os.ReadFile(filepath.Join(siteFolder, name))
		if err != nil {
			return 0, err
		}
		if len(content) == 0 {
			return 0, fmt.Errorf("%s is empty", name)
		}
		zipped, err := gzipped(content)
		if err != nil {
			return 0, err
		}
		total += len(zipped)
	}
	return total, nil
}

// strangers reports files that nobody listed: they would be passed on unseen.
func strangers() error {
	var faults []error
	err := filepath.WalkDir(siteFolder, func(path string, entry fs.DirEntry, err error) error {
		if err != nil || entry.IsDir() {
			return err
		}
		name, err := filepath.Rel(siteFolder, path)
		if err == nil && !slices.Contains(siteFiles, filepath.ToSlash(name)) {
			faults = append(faults, fmt.Errorf("%s is in the site and in no list", name))
		}
		return err
	})
	return errors.Join(append(faults, err)...)
}

// checkLinks holds a program to its row of links.
func (p program) checkLinks() error {
	module, err := os.ReadFile(p.unstripped())
	if err != nil {
		return err
	}
	names, err := functionNames(module)
	if err != nil {
		return fmt.Errorf("%s: %w", p.pack, err)
	}
	var faults []error
	for _, pack := range links[p.pack].foreign {
		if held := functionsOf(pack, names); len(held) > 0 {
			faults = append(faults, fmt.Errorf("%s links %d functions of %s, as %s", p.pack, len(held), pack, held[0]))
		}
	}
	// Without these, a linker that spells names in another way would pass for a
	// program that links nothing.
	for _, pack := range links[p.pack].needed {
		if len(functionsOf(pack, names)) == 0 {
			faults = append(faults, fmt.Errorf("%s links nothing of %s", p.pack, pack))
		}
	}
	return errors.Join(faults...)
}

// setting tells the functions that set a package's variables, or lie in them.
var setting = regexp.MustCompile(`^(map\.)?init(\.|$)`)

// functionsOf lists the functions of a package and of those within it. The
// linker writes an underscore for what is neither a letter, a digit nor a dot. A
// package that is only imported still sets its variables: that is not counted.
func functionsOf(pack string, names []string) []string {
	spelled := strings.Map(func(r rune) rune {
		if strings.ContainsRune("/-", r) {
			return '_'
		}
		return r
	}, pack)
	return slices.DeleteFunc(slices.Clone(names), func(name string) bool {
		rest, within := strings.CutPrefix(name, spelled)
		function, own := strings.CutPrefix(rest, ".")
		sets := own && setting.MatchString(function)
		return !within || sets || !own && !strings.HasPrefix(rest, "_")
	})
}

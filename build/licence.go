package main

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"io"
	"maps"
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"slices"
	"strings"
)

// A part of the site that others wrote.
type component struct {
	name, version string
	folder        string // where its licence files are
}

// licenceName tells the files whose text has to go along with the code.
var licenceName = regexp.MustCompile(`(?i)^(licen[cs]e|copying|notice|patents)`)

// thirdParty is the text of every licence of what the site holds: the modules
// that the two programs link, Go itself, and the packages that the scripts
// import. A component without a licence is an error.
func thirdParty() ([]byte, error) {
	modules, err := linkedModules()
	if err != nil {
		return nil, err
	}
	packages, err := npmPackages()
	if err != nil {
		return nil, err
	}
	var out bytes.Buffer
	out.WriteString("This folder holds work of others. Here is what it is, and the licences it comes under.\n")
	for _, c := range append(modules, packages...) {
		texts, err := licences(c.folder)
		if err != nil {
			return nil, err
		}
		if len(texts) == 0 {
			return nil, fmt.Errorf("%s %s has no licence file, so it cannot be passed on", c.name, c.version)
		}
		fmt.Fprintf(&out, "\n%s\n%s %s\n\n%s\n", strings.Repeat("=", 78), c.name, c.version, strings.Join(texts, "\n\n"))
	}
	return out.Bytes(), nil
}

// licences reads the licence files of a folder; echarts keeps some in a folder
// of that name.
func licences(folder string) ([]string, error) {
	entries, err := os.ReadDir(folder)
	if err != nil {
		return nil, err
	}
	var texts []string
	for _, entry := range entries {
		path := filepath.Join(folder, entry.Name())
		if !licenceName.MatchString(entry.Name()) {
			continue
		}
		if entry.IsDir() {
			more, err := licences(path)
			if err != nil {
				return nil, err
			}
			texts = append(texts, more...)
			continue
		}
		text, err := os.ReadFile(path)
		if err != nil {
			return nil, err
		}
		texts = append(texts, fmt.Sprintf("[%s]\n\n%s", entry.Name(), bytes.TrimSpace(text)))
	}
	return texts, nil
}

// linkedModules lists Go and every module of which a package is in one of the
// programs.
func linkedModules() ([]component, error) {
	type pack struct {
		Standard bool
		Module   *struct {
			Path, Version, Dir string
			Main               bool
		}
	}
	args := []string{"list", "-deps", "-json=Standard,Module"}
	for _, p := range programs {
		args = append(args, p.pack)
	}
	cmd := exec.Command("go", args...)
	cmd.Env = append(os.Environ(), "GOOS=js", "GOARCH=wasm")
	cmd.Stderr = os.Stderr
	listing, err := cmd.Output()
	if err != nil {
		return nil, err
	}
	found := map[string]component{}
	for read := json.NewDecoder(bytes.NewReader(listing)); ; {
		var p pack
		if err := read.Decode(&p); errors.Is(err, io.EOF) {
			break
		} else if err != nil {
			return nil, err
		}
		if m := p.Module; m != nil && !m.Main {
			found[m.Path] = component{m.Path, m.Version, m.Dir}
		}
	}
	golang, err := toolchain()
	if err != nil {
		return nil, err
	}
	list := []component{golang}
	for _, path := range slices.Sorted(maps.Keys(found)) {
		list = append(list, found[path])
	}
	return list, nil
}

// toolchain is Go itself: its standard library is in both programs.
func toolchain() (component, error) {
	said, err := exec.Command("go", "env", "GOVERSION", "GOROOT").Output()
	if err != nil {
		return component{}, err
	}
	lines := strings.Split(strings.TrimSpace(string(said)), "\n")
	if len(lines) != 2 {
		return component{}, fmt.Errorf("go env said %q", said)
	}
	root := lines[1]
	if _, err := os.Stat(filepath.Join(root, "LICENSE")); err != nil {
		// Distributions keep the licence elsewhere than the archive does.
		root = "/usr/share/doc/golang-go"
	}
	return component{"Go", lines[0], root}, nil
}

// npmPackages lists what the lock file installs: nothing in it is for building
// only.
func npmPackages() ([]component, error) {
	text, err := os.ReadFile(filepath.Join(webFolder, "package-lock.json"))
	if err != nil {
		return nil, err
	}
	var lock struct {
		Packages map[string]struct{ Version string }
	}
	if err := json.Unmarshal(text, &lock); err != nil {
		return nil, err
	}
	var list []component
	for _, path := range slices.Sorted(maps.Keys(lock.Packages)) {
		if name, installed := strings.CutPrefix(path, "node_modules/"); installed {
			list = append(list, component{name, lock.Packages[path].Version, filepath.Join(webFolder, path)})
		}
	}
	return list, nil
}

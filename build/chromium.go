package main

import (
	"errors"
	"fmt"
	"os"
	"os/exec"
)

// errNoChromium says how to get one.
var errNoChromium = errors.New("there is no Chromium here, and the tests of the pages need one: install the package chromium (apt-get install chromium), or let CHROMIUM name the program")

// findChromium is the browser that tests and timings use: the one that CHROMIUM
// names, else the first that is installed.
func findChromium() (string, error) {
	if named := os.Getenv("CHROMIUM"); named != "" {
		return exec.LookPath(named)
	}
	for _, name := range []string{"chromium", "chromium-browser", "google-chrome", "google-chrome-stable"} {
		if path, err := exec.LookPath(name); err == nil {
			return path, nil
		}
	}
	return "", errNoChromium
}

// ensureChromium prints the browser, and installs one first where there is none
// and this user may install packages without being asked.
func ensureChromium() error {
	path, err := findChromium()
	if errors.Is(err, errNoChromium) {
		if err := installChromium(); err != nil {
			return fmt.Errorf("%w (%v)", errNoChromium, err)
		}
		path, err = findChromium()
	}
	if err == nil {
		fmt.Println("Chromium:", path)
	}
	return err
}

func installChromium() error {
	apt := []string{"env", "DEBIAN_FRONTEND=noninteractive", "apt-get"}
	if os.Geteuid() != 0 {
		if err := exec.Command("sudo", "-n", "true").Run(); err != nil {
			return errors.New("this user may not install packages")
		}
		apt = append([]string{"sudo", "-n"}, apt...)
	}
	for _, arguments := range [][]string{{"update"}, {"install", "-y", "--no-install-recommends", "chromium"}} {
		command := append(apt[:len(apt):len(apt)], arguments...)
		cmd := exec.Command(command[0], command[1:]...)
		cmd.Stdout, cmd.Stderr = os.Stderr, os.Stderr
		if err := cmd.Run(); err != nil {
			return fmt.Errorf("apt-get %s: %w", arguments[0], err)
		}
	}
	return nil
}

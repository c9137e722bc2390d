package main

import (
	"errors"
	"fmt"
	"os"
	"os/exec"
)

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
	return "", errors.New("there is no Chromium here: install the package chromium (apt-get install chromium), or let CHROMIUM name the program")
}

func printChromium() error {
	path, err := findChromium()
	if err == nil {
		fmt.Println(path)
	}
	return err
}

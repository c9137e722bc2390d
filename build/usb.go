package main

import (
	"archive/zip"
	"errors"
	"fmt"
	"os"
	"path/filepath"
	"time"
)

// packUSB writes one zip that unpacks to one folder.
func packUSB() (err error) {
	if err := checkSite(); err != nil {
		return err
	}
	path := filepath.Join(outFolder, "brinefront-usb.zip")
	file, err := os.Create(path)
	if err != nil {
		return err
	}
	defer func() { err = errors.Join(err, file.Close()) }()
	pack := zip.NewWriter(file)
	for _, name := range siteFiles {
		content, err := os.ReadFile(filepath.Join(siteFolder, name))
		if err != nil {
			return err
		}
		w, err := pack.CreateHeader(&zip.FileHeader{Name: "brinefront/" + name, Method: zip.Deflate, Modified: time.Now()})
		if err != nil {
			return err
		}
		if _, err := w.Write(content); err != nil {
			return err
		}
	}
	if err := pack.Close(); err != nil {
		return err
	}
	fmt.Printf("%s: unpack it and double-click brinefront/index.html\n", path)
	return nil
}

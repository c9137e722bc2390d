package main

import (
	"fmt"
	"net"
	"net/http"
	"path/filepath"
)

// serve shows the site on this machine only, on a free port or the given one.
func serve(args []string) error {
	port := "0"
	if len(args) > 0 {
		port = args[0]
	}
	index := filepath.Join(siteFolder, "index.html")
	whole, err := filepath.Abs(index)
	if err != nil {
		return err
	}
	listener, err := net.Listen("tcp", net.JoinHostPort("127.0.0.1", port))
	if err != nil {
		return err
	}
	fmt.Printf("\nOpen     http://%s/\nor double-click %s\nStop with Ctrl+C.\n", listener.Addr(), whole)
	return http.Serve(listener, fresh(http.FileServer(http.Dir(siteFolder))))
}

// fresh keeps browsers from showing the site of an earlier build.
func fresh(files http.Handler) http.Handler {
	return http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		w.Header().Set("Cache-Control", "no-store")
		files.ServeHTTP(w, r)
	})
}

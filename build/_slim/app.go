// This file stands in for http.go, resource.go and route.go of go-app when the
// interface program is built; build/slim.go puts it there and says why. What is
// used of those files is here, under the names that the rest of go-app and the
// program call.
package app

import "strings"

// Handler is what serves a go-app program from a Go server; ours is served by
// nobody.
type Handler struct{}

func isRemoteLocation(path string) bool {
	return strings.HasPrefix(path, "https://") || strings.HasPrefix(path, "http://")
}

func isStaticResourcePath(path string) bool {
	return strings.HasPrefix(path, "/web/") || strings.HasPrefix(path, "web/")
}

// RouteWithRegexpFunc takes the one pattern of a program with one screen.
func RouteWithRegexpFunc(pattern string, newComponent func() Composer) {
	if pattern != ".*" {
		panic("app: only .* is routed, every address")
	}
	routes.screen = newComponent
}

var routes router

type router struct{ screen func() Composer }

func (r *router) createComponent(string) (Composer, bool) { return r.screen(), true }

// Command app is the interface: it starts the bench in the browser. It holds no
// formula; the engine, a program of its own, computes in a worker.
package main

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/sheet"
)

func main() {
	// One bench for every address: sheets are told apart by the fragment, which
	// works from a folder as well as from a host.
	app.RouteWithRegexpFunc(".*", func() app.Composer { return &sheet.Bench{} })
	app.RunWhenOnBrowser()
}

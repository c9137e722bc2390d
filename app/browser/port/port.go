// Package port is the engine's door inside its worker: texts come in and are
// answered. It is apart from the rest of browser so that the engine program
// links nothing of the page.
package port

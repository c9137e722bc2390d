//go:build !js

package port

import (
	"bufio"
	"fmt"
	"os"
)

// Listen serves the lines of the standard input and replies in lines on the
// standard output, so that the engine can be asked from a terminal. It returns at
// the end of the input.
func Listen(serve func(text string, reply func(text string))) {
	const longest = 64 << 20 // bytes of one request
	lines := bufio.NewScanner(os.Stdin)
	lines.Buffer(nil, longest)
	for lines.Scan() {
		serve(lines.Text(), func(text string) { fmt.Println(text) })
	}
	if err := lines.Err(); err != nil {
		fmt.Fprintln(os.Stderr, "reading requests:", err)
		os.Exit(1)
	}
}

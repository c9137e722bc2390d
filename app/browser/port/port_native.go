//go:build !js

package port

import (
	"bufio"
	"fmt"
	"os"
)

// Listen takes the lines of the standard input, works on each, and replies in lines on
// the standard output, so that the engine can be asked from a terminal. It returns at
// the end of the input.
func Listen(take func(text string, reply func(text string)), work func(turn func())) {
	const longest = 64 << 20 // bytes of one request
	lines := bufio.NewScanner(os.Stdin)
	lines.Buffer(nil, longest)
	for lines.Scan() {
		take(lines.Text(), func(text string) { fmt.Println(text) })
		work(func() {})
	}
	if err := lines.Err(); err != nil {
		fmt.Fprintln(os.Stderr, "reading requests:", err)
		os.Exit(1)
	}
}

//go:build !js

package browser

// Copy keeps the text for Pretend.Copied.
func Copy(text string, done func(err error)) {
	Pretend.mu.Lock()
	Pretend.copied = text
	Pretend.mu.Unlock()
	done(nil)
}

// OnPaste waits for Pretend.Paste.
func OnPaste(use func(into, text string) (used bool)) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.pasted = use
}

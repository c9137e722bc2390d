//go:build !js

package browser

// Print is counted in Pretend.Prints.
func Print() {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.prints++
}

// PublishIdle answers Pretend.Idle.
func PublishIdle(idle func() bool) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.idle = idle
}

// Announce keeps the text for Pretend.Announced.
func Announce(text string) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.announced = append(Pretend.announced, text)
}

// OnShortcut waits for Pretend.Press.
func OnShortcut(use func(key string) (used bool)) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.pressed = use
}

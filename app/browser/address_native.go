//go:build !js

package browser

// Fragment is the one last set, or moved to by Pretend.Go.
func Fragment() string {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	return Pretend.fragment
}

// Address is a made-up address.
func Address() string { return "https://bench.invalid/index.html" }

// SetFragment changes the address.
func SetFragment(fragment string) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.fragment = fragment
}

// OnFragment waits for Pretend.Go.
func OnFragment(moved func(fragment string)) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.moved = moved
}

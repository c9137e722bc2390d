//go:build !js

package browser

// Load reads what was kept in Pretend.
func Load(key string) (text string, ok bool, err error) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	if Pretend.storeFault != nil {
		return "", false, refused("read what it kept here earlier", Pretend.storeFault)
	}
	text, ok = Pretend.store[key]
	return text, ok, nil
}

// Save keeps a text in Pretend.
func Save(key, text string) error {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	if Pretend.storeFault != nil {
		return refused("keep the study on this device", Pretend.storeFault)
	}
	Pretend.store[key] = text
	return nil
}

//go:build !js

package browser

// Download keeps the file for Pretend.Downloads.
func Download(name, mime, data string) error {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.downloads = append(Pretend.downloads, File{name, mime, data})
	return nil
}

// PickFile waits for Pretend.Choose.
func PickFile(accept string, limit int, done func(name, data string, err error)) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.chosen = within(limit, done)
}

// OnDropFile waits for Pretend.Drop.
func OnDropFile(limit int, done func(name, data string, err error)) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.dropped = within(limit, done)
}

// within hands a file over, or the reason why it is too large.
func within(limit int, done func(name, data string, err error)) func(name, data string) {
	return func(name, data string) {
		if len(data) > limit {
			done(name, "", tooLarge(name, len(data), limit))
			return
		}
		done(name, data, nil)
	}
}

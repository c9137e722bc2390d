//go:build !js

package browser

// Draw keeps the picture for Pretend.Pictures.
func Draw(holder, picture string) error {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.pictures[holder] = picture
	return nil
}

// Drawn is true: Draw is all there is to it.
func Drawn() bool { return true }

// Forget drops the picture.
func Forget(holder string) {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	delete(Pretend.pictures, holder)
}

// SavePicture keeps the file for Pretend.Downloads, with the picture's JSON as its data.
func SavePicture(holder, format, filename string) error {
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.downloads = append(Pretend.downloads, File{filename, format, Pretend.pictures[holder]})
	return nil
}

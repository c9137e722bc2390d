package browser

import "strings"

// shortcut names what a key asks for while Ctrl (or Cmd) is held; "" for none of ours.
func shortcut(key string, shift bool) string {
	switch key = strings.ToLower(key); {
	case key == "z" && !shift:
		return KeyUndo
	case key == "z" && shift, key == "y" && !shift:
		return KeyRedo
	case key == "s" && !shift:
		return KeySave
	case key == "o" && !shift:
		return KeyOpen
	}
	return ""
}

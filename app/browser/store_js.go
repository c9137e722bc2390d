package browser

import "syscall/js"

// storage is asked for by Reflect.get because merely naming localStorage throws
// where the person has forbidden it.
func storage() (store js.Value, err error) {
	err = attempt(func() { store = js.Global().Get("Reflect").Call("get", js.Global(), "localStorage") })
	return store, err
}

// Load reads what was kept under a key; ok is false when nothing was.
func Load(key string) (text string, ok bool, err error) {
	store, err := storage()
	if err == nil {
		err = attempt(func() {
			item := store.Call("getItem", key)
			if ok = !item.IsNull(); ok {
				text = item.String()
			}
		})
	}
	if err != nil {
		return "", false, refused("read what it kept here earlier", err)
	}
	return text, ok, nil
}

// Save keeps a text under a key on this device, in this browser.
func Save(key, text string) error {
	store, err := storage()
	if err == nil {
		err = attempt(func() { store.Call("setItem", key, text) })
	}
	if err != nil {
		return refused("keep the study on this device", err)
	}
	return nil
}

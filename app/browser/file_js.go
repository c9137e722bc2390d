package browser

import (
	"errors"
	"syscall/js"
)

// Download hands a file to the person: a temporary link is clicked, which the
// interface's own link handling passes by because it carries a name to save as.
func Download(name, mime, data string) error {
	err := attempt(func() {
		bytes := js.Global().Get("Uint8Array").New(len(data))
		js.CopyBytesToJS(bytes, []byte(data))
		blob := js.Global().Get("Blob").New([]any{bytes}, map[string]any{"type": mime})
		url := js.Global().Get("URL").Call("createObjectURL", blob)
		link := document().Call("createElement", "a")
		link.Set("href", url)
		link.Set("download", name)
		link.Call("click")
		revokeLater(url)
	})
	if err != nil {
		return refused("save the file "+name, err)
	}
	return nil
}

// revokeLater frees a file's memory once the browser has surely taken it.
func revokeLater(url js.Value) {
	var revoke js.Func
	revoke = js.FuncOf(func(js.Value, []js.Value) any {
		js.Global().Get("URL").Call("revokeObjectURL", url)
		revoke.Release()
		return nil
	})
	const minute = 60000 // ms
	js.Global().Call("setTimeout", revoke, minute)
}

// picker is the one hidden file field; chosen is who waits for its answer. A
// picker that is closed without a choice says nothing, so there is no function
// to release then.
var picker struct {
	input  js.Value
	limit  int
	chosen func(name, data string, err error)
}

// PickFile opens the file picker. accept is a list as of the accept attribute,
// e.g. ".json,application/json"; a file of more than limit bytes is refused
// unread. done is not called when the person closes the picker.
func PickFile(accept string, limit int, done func(name, data string, err error)) {
	if picker.input.IsUndefined() {
		picker.input = document().Call("createElement", "input")
		picker.input.Set("type", "file")
		listen(picker.input, "change", func(js.Value) {
			if files := picker.input.Get("files"); files.Length() == 1 {
				read(files.Index(0), picker.limit, picker.chosen)
			}
		})
	}
	picker.limit, picker.chosen = limit, done
	picker.input.Set("accept", accept)
	picker.input.Set("value", "") // the same file may be chosen again
	picker.input.Call("click")
}

// OnDropFile lets a file be dropped anywhere on the page.
func OnDropFile(limit int, done func(name, data string, err error)) {
	carriesFiles := func(event js.Value) bool {
		transfer := event.Get("dataTransfer")
		return transfer.Truthy() && transfer.Get("types").Call("includes", "Files").Bool()
	}
	listen(document(), "dragover", func(event js.Value) {
		if carriesFiles(event) {
			event.Call("preventDefault") // says that a drop is welcome
		}
	})
	listen(document(), "drop", func(event js.Value) {
		if !carriesFiles(event) {
			return
		}
		event.Call("preventDefault") // else the browser leaves the page for the file
		switch files := event.Get("dataTransfer").Get("files"); files.Length() {
		case 0:
		case 1:
			read(files.Index(0), limit, done)
		default:
			done("", "", errOneFile)
		}
	})
}

// read hands over a file's bytes as they are.
func read(file js.Value, limit int, done func(name, data string, err error)) {
	name, size := file.Get("name").String(), file.Get("size").Int()
	if size > limit {
		done(name, "", tooLarge(name, size, limit))
		return
	}
	settle(file.Call("arrayBuffer"), func(buffer js.Value) {
		data := make([]byte, size)
		n := js.CopyBytesToGo(data, js.Global().Get("Uint8Array").New(buffer))
		done(name, string(data[:n]), nil)
	}, func(cause js.Value) {
		done(name, "", refused("read the file "+name, errors.New(words(cause))))
	})
}

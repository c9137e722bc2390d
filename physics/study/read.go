package study

import (
	"math"
	"reflect"
	"slices"
	"strconv"
	"strings"

	"brinefront/physics/units"
)

// FileError is why a study file was refused: the first thing in it that is not
// as it must be. Path is empty when it is about the file as a whole.
type FileError struct{ Path, Reason string }

// Error is a sentence for the person.
func (e *FileError) Error() string {
	if e.Path == "" {
		return "This file cannot be opened: " + e.Reason + "."
	}
	return "This file cannot be opened: at " + e.Path + ", " + e.Reason + "."
}

func refuse(path, reason string) *FileError { return &FileError{path, reason} }

// Read opens a study file of any released version. It is strict: a file is read
// whole and as it was meant, or refused with the place and the reason
// (*FileError). Unknown and repeated names, missing ones, wrong kinds of value,
// unknown units and choices, and numbers out of range are all refused, so a
// study in memory is always lawful. Texts are kept as they are; they are never
// anything but text. The study that is returned belongs to this program's
// version, whichever version wrote it.
func Read(text string) (Study, error) {
	root, err := parse(text)
	if err != nil {
		return Study{}, err
	}
	if err := recognise(root); err != nil {
		return Study{}, err
	}
	// Of files from before these could be chosen.
	st := usual()
	if err := lay(root, reflect.ValueOf(&st).Elem(), ""); err != nil {
		return Study{}, err
	}
	if err := lawful(&st); err != nil {
		return Study{}, err
	}
	if len(st.Cases) == 0 {
		st.Cases = nil // an empty list says no more than none
	}
	st.Version, st.Program = Version, Program
	return st, nil
}

// recognise says whether a tree is a study that this program can read, before
// anything else of it is looked at: a newer study has names unknown here, and
// its age is the better reason.
func recognise(root node) error {
	if root.kind != isObject {
		return refuse("", "it holds "+string(root.kind)+", not a study")
	}
	if kindOf, _ := root.member("type"); kindOf.kind != isString || kindOf.text != Type {
		return refuse("", "it does not say that it is a study (\"type\" must be \""+Type+"\")")
	}
	written, _ := root.member("version")
	version, err := strconv.Atoi(written.text)
	if written.kind != isNumber || err != nil || version < 1 {
		return refuse("version", "read "+quoted(written.text)+", allowed: a whole number from 1 to "+strconv.Itoa(Version))
	}
	if version > Version {
		program := "a newer program"
		if by, _ := root.member("program"); by.kind == isString {
			program = "program " + quoted(by.text)
		}
		return refuse("", "it is a study of version "+strconv.Itoa(version)+", written by "+program+", and this program ("+Program+") reads up to version "+strconv.Itoa(Version)+"; open it with the newer program")
	}
	return nil
}

// lay puts a node into a field of the document.
func lay(n node, field reflect.Value, path string) error {
	switch field.Kind() {
	case reflect.Pointer:
		fresh := reflect.New(field.Type().Elem())
		if err := lay(n, fresh.Elem(), path); err != nil {
			return err
		}
		field.Set(fresh)
		return nil
	case reflect.Struct:
		return layObject(n, field, path)
	case reflect.Slice:
		return layList(n, field, path)
	case reflect.Map:
		return layMap(n, field, path)
	case reflect.String:
		if n.kind != isString {
			return wrongKind(n, isString, path)
		}
		if limit := TextLimit(path); len([]rune(n.text)) > limit {
			return refuse(path, "the text is longer than "+strconv.Itoa(limit)+" characters")
		}
		field.SetString(n.text)
		return nil
	}
	number, err := layNumber(n, path)
	if err != nil {
		return err
	}
	if field.CanInt() {
		field.SetInt(int64(number))
		return nil
	}
	field.SetFloat(number)
	return nil
}

func layNumber(n node, path string) (float64, error) {
	if n.kind != isNumber {
		return 0, wrongKind(n, isNumber, path)
	}
	number, err := strconv.ParseFloat(n.text, 64)
	if err != nil || math.IsInf(number, 0) {
		return 0, refuse(path, "read "+n.text+", allowed: a number that fits double precision")
	}
	return number, nil
}

func layObject(n node, field reflect.Value, path string) error {
	if n.kind != isObject {
		return wrongKind(n, isObject, path)
	}
	names := namesOf(field.Type())
	for _, m := range n.members {
		if !slices.ContainsFunc(names, func(known name) bool { return known.name == m.name }) {
			return refuse(join(path, m.name), "no such name is known in a study of version "+strconv.Itoa(Version))
		}
	}
	for i, name := range names {
		value, given := n.member(name.name)
		switch {
		case given:
			if err := lay(value, field.Field(i), join(path, name.name)); err != nil {
				return err
			}
		case !name.optional:
			return refuse(join(path, name.name), "it is missing")
		}
	}
	return nil
}

func layList(n node, field reflect.Value, path string) error {
	if n.kind != isArray {
		return wrongKind(n, isArray, path)
	}
	if len(n.items) > MaxRows {
		return refuse(path, "read "+strconv.Itoa(len(n.items))+" rows, allowed: up to "+strconv.Itoa(MaxRows))
	}
	list := reflect.MakeSlice(field.Type(), len(n.items), len(n.items))
	for i, item := range n.items {
		if err := lay(item, list.Index(i), join(path, strconv.Itoa(i))); err != nil {
			return err
		}
	}
	field.Set(list)
	return nil
}

// layMap puts an object whose names are the person's paths into a map; which
// paths there may be is for lawful to say. An object without names is none.
func layMap(n node, field reflect.Value, path string) error {
	if n.kind != isObject {
		return wrongKind(n, isObject, path)
	}
	if len(n.members) == 0 {
		return nil
	}
	field.Set(reflect.MakeMap(field.Type()))
	for _, m := range n.members {
		value := reflect.New(field.Type().Elem()).Elem()
		if err := lay(m.value, value, join(path, m.name)); err != nil {
			return err
		}
		field.SetMapIndex(reflect.ValueOf(m.name), value)
	}
	return nil
}

func wrongKind(n node, want kind, path string) error {
	return refuse(path, "read "+string(n.kind)+", allowed: "+string(want))
}

// name is what a field of the document is called in the file.
type name struct {
	name     string
	optional bool
}

// namesOf lists the names of a type of the document, in the order of its fields.
func namesOf(t reflect.Type) []name {
	names := make([]name, t.NumField())
	for i := range names {
		text, options, _ := strings.Cut(t.Field(i).Tag.Get("json"), ",")
		names[i] = name{text, options != ""}
	}
	return names
}

// lawful checks what the kinds of value cannot say: choices, units, ranges.
func lawful(st *Study) error {
	for _, f := range choiceFields {
		if value := *f.at(st); !holds(f.list, value) {
			return refuse(f.path, "read "+quoted(value)+", allowed: one of "+valuesOf(f.list))
		}
	}
	for _, spec := range specs {
		if err := lawfulInput(spec, spec.Get(st)); err != nil {
			return err
		}
	}
	for path, text := range map[string]string{"field.start": st.Field.Start, layerTable.path: st.Field.Layers.Table, scheduleTable.path: st.Field.Wells.Schedule, historyTable.path: st.Field.History.Table, sizeTable.path: st.Block.Sizes} {
		if p := CheckText(st, path, text); p != nil {
			return asFileError(p)
		}
	}
	if err := lawfulCases(st); err != nil {
		return err
	}
	for _, t := range labTables {
		columns, _ := t.get(st)
		read, equal := "", true
		for i, c := range columns {
			between := ", "
			switch {
			case i == 0:
				between = "read "
			case i == len(columns)-1:
				between = " and "
			}
			read += between + strconv.Itoa(len(c))
			if i == 0 {
				read += " values"
			}
			read += " of " + t.Columns[i].Path
			equal = equal && len(c) == len(columns[0])
		}
		if !equal {
			return refuse(t.Path, read+", allowed: columns of equal length")
		}
	}
	return nil
}

func lawfulInput(spec Spec, in *Input) error {
	if in == nil {
		return nil
	}
	if p := CheckSpread(spec, *in); p != nil {
		return asFileError(p)
	}
	unit, _ := units.Find(spec.Quantity, in.Unit) // CheckSpread has found it
	if p := Check(spec, in.Value, unit); p != nil {
		return asFileError(p)
	}
	return nil
}

func asFileError(p *Problem) error {
	return refuse(p.Path, "read "+p.Read+", allowed: "+p.Allowed)
}

func valuesOf(list []Choice) string {
	values := make([]string, len(list))
	for i, c := range list {
		values[i] = quoted(c.Value)
	}
	return strings.Join(values, ", ")
}

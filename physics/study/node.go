package study

import (
	"bytes"
	"encoding/json"
	"errors"
	"io"
	"strconv"
	"strings"
	"unicode/utf8"
)

// A study file is read in two steps: the text becomes a tree of nodes, which
// keeps what encoding/json would hide (repeated names, unknown names, what kind
// of value stands where), and the tree is then laid into the document's fields.

// node is one JSON value.
type node struct {
	kind    kind
	text    string // string: its content; number: as written
	items   []node // array
	members []member
}

type member struct {
	name  string
	value node
}

type kind string

const (
	isObject kind = "an object"
	isArray  kind = "a list"
	isString kind = "a text"
	isNumber kind = "a number"
	isBool   kind = "true or false"
	isNull   kind = "null"
)

func (n node) member(name string) (node, bool) {
	for _, m := range n.members {
		if m.name == name {
			return m.value, true
		}
	}
	return node{}, false
}

// maxDepth is deeper than any study: rock.corey.swc.value is four.
const maxDepth = 8

// parse turns a text into a tree.
func parse(text string) (node, error) {
	text = strings.TrimPrefix(text, "\ufeff")
	switch {
	case len(text) > MaxBytes:
		return node{}, refuse("", "it is larger than 4 MB; a study is far smaller, so this is some other file")
	case strings.TrimSpace(text) == "":
		return node{}, refuse("", "it is empty")
	case !utf8.ValidString(text):
		return node{}, refuse("", "it is not UTF-8 text, so it is some other file or it is damaged")
	}
	d := json.NewDecoder(bytes.NewReader([]byte(text)))
	d.UseNumber()
	root, err := parseValue(d, "", 0)
	if err != nil {
		return node{}, syntax(err)
	}
	if _, err := d.Token(); !errors.Is(err, io.EOF) {
		return node{}, refuse("", "something follows the end of the study; the file is damaged or two files were joined")
	}
	return root, nil
}

func syntax(err error) error {
	var file *FileError
	switch {
	case errors.As(err, &file):
		return file
	case errors.Is(err, io.EOF), errors.Is(err, io.ErrUnexpectedEOF):
		return refuse("", "it ends in the middle; the file was cut off, perhaps while it was copied or sent")
	}
	return refuse("", "it is not a JSON text ("+err.Error()+"), so it is some other file or it is damaged")
}

func parseValue(d *json.Decoder, path string, depth int) (node, error) {
	if depth > maxDepth {
		return node{}, refuse(path, "it is nested deeper than any study")
	}
	token, err := d.Token()
	if err != nil {
		return node{}, err
	}
	switch t := token.(type) {
	case json.Delim:
		if t == '{' {
			return parseObject(d, path, depth)
		}
		return parseArray(d, path, depth)
	case string:
		return node{kind: isString, text: t}, nil
	case json.Number:
		return node{kind: isNumber, text: t.String()}, nil
	case bool:
		return node{kind: isBool}, nil
	}
	return node{kind: isNull}, nil
}

func parseObject(d *json.Decoder, path string, depth int) (node, error) {
	n := node{kind: isObject}
	seen := map[string]bool{}
	for d.More() {
		token, err := d.Token()
		if err != nil {
			return node{}, err
		}
		name, ok := token.(string)
		if !ok {
			return node{}, refuse(path, "a name is missing in front of a value")
		}
		if seen[name] {
			return node{}, refuse(join(path, name), "it is given twice; a study says everything once")
		}
		seen[name] = true
		value, err := parseValue(d, join(path, name), depth+1)
		if err != nil {
			return node{}, err
		}
		n.members = append(n.members, member{name, value})
	}
	_, err := d.Token()
	return n, err
}

func parseArray(d *json.Decoder, path string, depth int) (node, error) {
	n := node{kind: isArray}
	for d.More() {
		value, err := parseValue(d, join(path, strconv.Itoa(len(n.items))), depth+1)
		if err != nil {
			return node{}, err
		}
		n.items = append(n.items, value)
	}
	_, err := d.Token()
	return n, err
}

func join(path, name string) string {
	if path == "" {
		return name
	}
	return path + "." + name
}

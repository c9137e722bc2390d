package study

import (
	"encoding/json"
	"reflect"
	"strconv"
	"strings"

	"brinefront/physics/units"
)

// schemaURI is the dialect that Schema is written in.
const schemaURI = "https://json-schema.org/draft/2020-12/schema"

// Schema is the JSON Schema (draft 2020-12) of a study of this version, made
// from the document's own types, Specs and choices. Read holds a file to more
// than a schema can say: names given once, columns of equal length, ranges in
// order, days of the calendar.
func Schema() string {
	root := schemaOf(reflect.TypeFor[Study](), "")
	root["$schema"] = schemaURI
	root["title"] = "Brinefront study, version " + strconv.Itoa(Version)
	text, err := json.MarshalIndent(root, "", "  ")
	if err != nil {
		panic("study: " + err.Error()) // maps of texts and finite numbers only
	}
	return string(text) + "\n"
}

type schema = map[string]any

func schemaOf(t reflect.Type, path string) schema {
	if t == reflect.TypeFor[*Input]() {
		return inputSchema(path)
	}
	switch t.Kind() {
	case reflect.Pointer:
		return schemaOf(t.Elem(), path)
	case reflect.Struct:
		return objectSchema(t, path)
	case reflect.Slice:
		most := MaxRows
		if path == "cases" {
			most = MaxCases
		}
		return schema{"type": "array", "maxItems": most, "items": schemaOf(t.Elem(), path)}
	case reflect.Map:
		return changesSchema(t)
	case reflect.Int:
		return schema{"const": Version}
	case reflect.Float64:
		return schema{"type": "number"}
	}
	return textSchema(path)
}

func objectSchema(t reflect.Type, path string) schema {
	properties, required := schema{}, []string{}
	for i, name := range namesOf(t) {
		properties[name.name] = schemaOf(t.Field(i).Type, join(path, name.name))
		if !name.optional {
			required = append(required, name.name)
		}
	}
	return schema{"type": "object", "additionalProperties": false, "properties": properties, "required": required}
}

// changesSchema is that of a case's changes: each as the study itself has it.
func changesSchema(t reflect.Type) schema {
	paths := CaseChoices()
	if t.Elem() == reflect.TypeFor[Input]() {
		paths = nil
		for _, spec := range specs {
			paths = append(paths, spec.Path)
		}
	}
	properties := schema{}
	for _, path := range paths {
		properties[path] = schema{"$ref": "#/properties/" + strings.ReplaceAll(path, ".", "/properties/")}
	}
	return schema{"type": "object", "additionalProperties": false, "properties": properties}
}

func textSchema(path string) schema {
	if path == "type" {
		return schema{"const": Type}
	}
	if list := Choices(path); list != nil {
		values := make([]string, len(list))
		for i, c := range list {
			values[i] = c.Value
		}
		return schema{"enum": values}
	}
	if path == "cases.name" {
		return schema{"type": "string", "maxLength": MaxCaseName, "pattern": `\S`}
	}
	if path == "field.start" {
		return schema{"type": "string", "pattern": `^(\d{4}-\d{2}-\d{2})?$`}
	}
	return schema{"type": "string", "maxLength": TextLimit(path)}
}

// inputSchema allows a number in each unit of its quantity, with the range told
// in that unit.
func inputSchema(path string) schema {
	spec, ok := Find(path)
	if !ok {
		panic("study: no input is described at " + path)
	}
	var written []schema
	for _, unit := range units.Of(spec.Quantity) {
		lawful := rangeSchema(spec, unit)
		written = append(written, schema{"properties": schema{
			"unit": schema{"const": unit.Symbol}, "value": lawful, "low": lawful, "high": lawful,
		}})
	}
	object := objectSchema(reflect.TypeFor[Input](), path)
	object["title"] = strings.TrimSuffix(spec.Label+", "+spec.Symbol, ", ")
	if spec.Help != "" {
		object["description"] = spec.Help
	}
	object["oneOf"] = written
	return object
}

func rangeSchema(spec Spec, unit units.Unit) schema {
	low, high := "minimum", "maximum"
	if spec.OpenMin {
		low = "exclusiveMinimum"
	}
	if spec.OpenMax {
		high = "exclusiveMaximum"
	}
	return schema{"type": "number", low: unit.FromSI(spec.Min), high: unit.FromSI(spec.Max)}
}

package study

import (
	"cmp"
	"encoding/json"
	"fmt"
	"maps"
	"reflect"
	"regexp"
	"slices"
	"strings"
	"testing"
	"unicode/utf8"
)

// obeys holds a decoded JSON value to the part of JSON Schema that Schema uses.
// Unknown keywords are an error, so that the schema cannot outgrow this reader.
func obeys(rule map[string]any, value any, at string) error {
	// The kind of value first: the other keywords rely on it.
	for _, keyword := range slices.SortedFunc(maps.Keys(rule), func(a, b string) int { return cmp.Compare(position(a), position(b)) }) {
		want, ok := rule[keyword], false
		switch keyword {
		case "$schema", "title", "description":
			ok = true
		case "type":
			names := map[string]string{"string": "string", "float64": "number", "map[string]interface {}": "object", "[]interface {}": "array"}
			ok = names[fmt.Sprintf("%T", value)] == want
		case "const":
			ok = reflect.DeepEqual(value, want)
		case "enum":
			ok = slices.Contains(want.([]any), value)
		case "maxLength":
			text, is := value.(string)
			ok = is && float64(utf8.RuneCountInString(text)) <= want.(float64)
		case "pattern":
			// The days of the calendar are read by CheckStart; the dialect's regular
			// expressions are Go's as far as the schema uses them.
			text, is := value.(string)
			ok = is && regexp.MustCompile(want.(string)).MatchString(text)
		case "minimum":
			ok = value.(float64) >= want.(float64)
		case "maximum":
			ok = value.(float64) <= want.(float64)
		case "exclusiveMinimum":
			ok = value.(float64) > want.(float64)
		case "exclusiveMaximum":
			ok = value.(float64) < want.(float64)
		case "maxItems":
			list, is := value.([]any)
			ok = is && float64(len(list)) <= want.(float64)
		case "items":
			for i, item := range value.([]any) {
				if err := obeys(want.(map[string]any), item, fmt.Sprintf("%s.%d", at, i)); err != nil {
					return err
				}
			}
			ok = true
		case "required":
			ok = !slices.ContainsFunc(want.([]any), func(name any) bool { _, given := value.(map[string]any)[name.(string)]; return !given })
		case "additionalProperties":
			ok = true
			for name := range value.(map[string]any) {
				_, known := rule["properties"].(map[string]any)[name]
				ok = ok && known
			}
		case "properties":
			for name, inner := range want.(map[string]any) {
				if given, is := value.(map[string]any)[name]; is {
					if err := obeys(inner.(map[string]any), given, at+"."+name); err != nil {
						return err
					}
				}
			}
			ok = true
		case "oneOf":
			matches := 0
			for _, alternative := range want.([]any) {
				if obeys(alternative.(map[string]any), value, at) == nil {
					matches++
				}
			}
			ok = matches == 1
		default:
			return fmt.Errorf("%s: the keyword %s is unknown", at, keyword)
		}
		if !ok {
			return fmt.Errorf("%s: %v does not obey %s %v", at, value, keyword, want)
		}
	}
	return nil
}

// inlined is a rule with every reference within the schema replaced by what it
// refers to.
func inlined(t *testing.T, rule any, root map[string]any) any {
	switch r := rule.(type) {
	case []any:
		for i := range r {
			r[i] = inlined(t, r[i], root)
		}
	case map[string]any:
		if to, ok := r["$ref"].(string); ok {
			var at any = root
			for _, name := range strings.Split(strings.TrimPrefix(to, "#/"), "/") {
				inner, ok := at.(map[string]any)
				if !ok || inner[name] == nil {
					t.Fatalf("the schema refers to %s, where nothing is", to)
				}
				at = inner[name]
			}
			return at
		}
		for name, inner := range r {
			r[name] = inlined(t, inner, root)
		}
	}
	return rule
}

func position(keyword string) int {
	if keyword == "type" {
		return 0
	}
	return 1
}

// TestSchemaAgreesWithRead: what Read opens obeys the schema, and what the schema
// can refuse is refused.
func TestSchemaAgreesWithRead(t *testing.T) {
	var rule map[string]any
	if err := json.Unmarshal([]byte(Schema()), &rule); err != nil {
		t.Fatal(err)
	}
	inlined(t, rule, rule)
	holds := func(text string) error {
		var value any
		if err := json.Unmarshal([]byte(text), &value); err != nil {
			t.Fatal(err)
		}
		return obeys(rule, value, "study")
	}
	demo := Write(Demo())
	for name, st := range map[string]Study{"empty": Empty(), "demo": Demo(), "full": full(), "cases": withCases()} {
		if err := holds(Write(st)); err != nil {
			t.Errorf("%s: %v", name, err)
		}
	}
	cases := Write(withCases())
	for _, change := range [][2]string{
		{`"rock.curve": "let"`, `"rock.curve": "hope"`}, {`"rock.curve": "let"`, `"system": "lab"`}, {`"value": 41.7`, `"value": -1`}, {`"value": 41.7`, `"values": 41.7`},
		{`"fluids.oilViscosity"`, `"fluids.oilVicsosity"`}, {`"name": "Thick oil"`, `"name": " "`}, {`"name": "Thick oil"`, `"name": "` + strings.Repeat("x", MaxCaseName+1) + `"`},
		{`"name": "Thick oil"`, `"nom": "Thick oil"`}, {`"cases": [`, `"cases": [` + strings.Repeat(`{"name": "x"},`, MaxCases)},
	} {
		refusedByBoth(t, cases, change, holds)
	}
	for _, change := range [][2]string{
		{Type, "something/else"}, {`"version": 1`, `"version": 2`}, {`"title"`, `"tittle"`}, {`"drive": "rate"`, `"drive": "hope"`},
		{`"value": 0.213`, `"value": 1.3`}, {`"value": 0.213`, `"value": "0.213"`}, {`"unit": "md"`, `"unit": "cp"`}, {`"value": 436`, `"value": 0`},
		{`"author": ""`, `"author": "` + strings.Repeat("x", MaxText+1) + `"`}, {"      \"value\": 0.213,\n", ""}, {`"krw": [`, `"krw": [ "x",`},
	} {
		refusedByBoth(t, demo, change, holds)
	}
}

// refusedByBoth changes a written study into one that neither Read nor the schema
// may allow.
func refusedByBoth(t *testing.T, written string, change [2]string, holds func(string) error) {
	t.Helper()
	text := strings.Replace(written, change[0], change[1], 1)
	if text == written {
		t.Fatalf("the study does not hold %q", change[0])
	}
	if _, err := Read(text); err == nil {
		t.Errorf("Read opens a study with %s", change[1])
	}
	if holds(text) == nil {
		t.Errorf("the schema allows a study with %s", change[1])
	}
}

package study

import (
	"errors"
	"os"
	"path/filepath"
	"reflect"
	"strings"
	"testing"

	"brinefront/physics/units"
)

// full is a study in which every input is given, with a range and a source.
func full() Study {
	st := Demo()
	for _, spec := range Specs() {
		unit := units.Of(spec.Quantity)[0]
		low, high := spec.Min, spec.Max
		if spec.OpenMin {
			low += (high - low) * 1e-6
		}
		if spec.OpenMax {
			high -= (high - low) * 1e-6
		}
		low, high = unit.FromSI(low), unit.FromSI(high)
		inside := low + 0.25*(high-low)
		lower, upper := inside, low+0.75*(high-low)
		spec.Set(&st, &Input{Value: inside, Unit: unit.Symbol, Source: "<script>alert(1)</script> & \u2028", Low: &lower, High: &upper})
	}
	return st
}

func TestReadGivesBackWhatWasWritten(t *testing.T) {
	for name, st := range map[string]Study{"empty": Empty(), "demo": Demo(), "full": full(), "cases": withCases()} {
		got, err := Read(Write(st))
		if err != nil {
			t.Errorf("%s: %v", name, err)
			continue
		}
		if !reflect.DeepEqual(got, st) {
			t.Errorf("%s: read back differently:\n%s\n%s", name, Write(got), Write(st))
		}
	}
}

func TestEveryInputTravels(t *testing.T) {
	for _, spec := range Specs() {
		st := Empty()
		given := full()
		spec.Set(&st, spec.Get(&given))
		got, err := Read(Write(st))
		if err != nil {
			t.Errorf("%s: %v", spec.Path, err)
			continue
		}
		if !reflect.DeepEqual(spec.Get(&got), spec.Get(&given)) {
			t.Errorf("%s: %+v came back as %+v", spec.Path, spec.Get(&given), spec.Get(&got))
		}
		for _, other := range Specs() {
			if other.Path != spec.Path && other.Get(&got) != nil {
				t.Errorf("setting %s also set %s", spec.Path, other.Path)
			}
		}
	}
}

// TestReleasedStudiesOpen holds the promise that a study once written opens for
// ever: one file at least for every version, none of them ever changed.
func TestReleasedStudiesOpen(t *testing.T) {
	files, err := filepath.Glob("../../testdata/cases/*.json")
	if err != nil || len(files) < 3 {
		t.Fatalf("found %d released studies (%v)", len(files), err)
	}
	for _, file := range files {
		text, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		st, err := Read(string(text))
		if err != nil {
			t.Errorf("%s: %v", file, err)
			continue
		}
		if again, err := Read(Write(st)); err != nil || !reflect.DeepEqual(again, st) {
			t.Errorf("%s does not survive being saved again (%v)", file, err)
		}
	}
}

func TestReleasedDemoKeepsItsMeaning(t *testing.T) {
	st := released(t, "v1-demo.json")
	if in := st.Fluids.OilViscosity; in == nil || in.Value != 8.3 || in.Unit != "cp" {
		t.Errorf("oil viscosity: %+v", in)
	}
	if table := st.Rock.Table; table == nil || len(table.Sw) != 12 || table.Sw[3] != 0.339 || table.Krw[3] != 0.00219 || table.Kro[3] != 0.523 {
		t.Errorf("table: %+v", table)
	}
	if st.Rock.Reference != "oil" || st.Field.Start != "2027-03-01" {
		t.Errorf("choices: %+v %+v", st.Rock.Reference, st.Field.Start)
	}
}

// TestReleasedDipKeepsItsMeaning: a pair, a dip, brine by its temperature; and of a file
// from before there were pairs, that it is about brine and oil.
func TestReleasedDipKeepsItsMeaning(t *testing.T) {
	st := released(t, "v1-dip.json")
	if st.Fluids.Pair != "brine-gas" {
		t.Errorf("the pair is %q", st.Fluids.Pair)
	}
	for path, want := range map[string]float64{"front.dip": 17, "fluids.temperature": 74, "fluids.salinity": 4.1, "fluids.oilDensity": 141, "rock.land": 1.9, "front.velocity": 0.23, "fluids.tension": 41} {
		spec, _ := Find(path)
		if in := spec.Get(&st); in == nil || in.Value != want {
			t.Errorf("%s: %+v, want %g", path, in, want)
		}
	}
	if part := Run(st).Parts[SheetFront]; part.Status != Ready {
		t.Errorf("its front is %s, misses %v", part.Status, part.Missing)
	}
	if old := released(t, "v1-demo.json"); old.Fluids.Pair != "brine-oil" || old.Front.Dip != nil {
		t.Errorf("an older file is about %q and dips by %+v", old.Fluids.Pair, old.Front.Dip)
	}
}

func released(t *testing.T, name string) Study {
	t.Helper()
	text, err := os.ReadFile("../../testdata/cases/" + name)
	if err != nil {
		t.Fatal(err)
	}
	st, err := Read(string(text))
	if err != nil {
		t.Fatal(err)
	}
	return st
}

func TestReadRefuses(t *testing.T) {
	demo := Write(Demo())
	swap := func(old, new string) string {
		if !strings.Contains(demo, old) {
			t.Fatalf("the demonstration does not hold %q", old)
		}
		return strings.Replace(demo, old, new, 1)
	}
	porosity := "\"porosity\": {\n      \"value\": 0.213,"
	cases := []struct{ name, text, path, reason string }{
		{"an unknown pair", swap(`"pair": "brine-oil"`, `"pair": "oil-oil"`), "fluids.pair", `"oil-oil", allowed: one of "brine-oil", "gas-oil", "brine-gas", "co2-brine"`},
		{"nothing", " \n", "", "empty"},
		{"too large", strings.Repeat(" ", MaxBytes+1), "", "larger than 4 MB"},
		{"not text", "\xff\xfe\x00", "", "UTF-8"},
		{"not JSON", "Sw\tkrw\tkro", "", "not a JSON text"},
		{"cut in half", demo[:len(demo)/2], "", "cut off"},
		{"cut at the end", strings.TrimSuffix(demo, "}\n"), "", "cut off"},
		{"followed by more", demo + demo, "", "something follows"},
		{"a list", "[1, 2]", "", "a list"},
		{"a number", "7", "", "a number"},
		{"null", "null", "", "null"},
		{"another type", swap(Type, "something/else"), "", "does not say that it is a study"},
		{"newer", swap(`"version": 1`, `"version": 3`), "", "version 3, written by program \"0.1.0\""},
		{"version as text", swap(`"version": 1`, `"version": "1"`), "version", "whole number"},
		{"version not whole", swap(`"version": 1`, `"version": 1.5`), "version", "whole number"},
		{"version zero", swap(`"version": 1`, `"version": 0`), "version", "whole number"},
		{"unknown at the top", swap(`"title"`, `"tittle": "", "title"`), "tittle", "no such name"},
		{"unknown in an input", swap(porosity, porosity+` "unti": "m",`), "field.porosity.unti", "no such name"},
		{"name in capitals", swap(`"title"`, `"Title": "", "title"`), "Title", "no such name"},
		{"given twice", swap(porosity, porosity+` "value": 0.2,`), "field.porosity.value", "twice"},
		{"missing", swap("      \"value\": 0.213,\n", ""), "field.porosity.value", "missing"},
		{"text for a number", swap(porosity, strings.Replace(porosity, "0.213", `"0.213"`, 1)), "field.porosity.value", "read a text, allowed: a number"},
		{"number for a text", swap(`"unit": "md"`, `"unit": 7`), "rock.permeability.unit", "read a number, allowed: a text"},
		{"null for an input", swap(`"front": {`, `"front": {"initialWater": null,`), "front.initialWater", "read null, allowed: an object"},
		{"object for a list", swap(`"sw": [`, `"sw": {}, "krw": [`), "rock.table.krw", "twice"},
		{"text in the table", swap(`"krw": [`, `"krw": [ "x",`), "rock.table.krw.0", "a number"},
		{"columns of unequal length", swap(`"krw": [`, `"krw": [ 0,`), "rock.table", "12 values of sw, 13 of krw and 12 of kro"},
		{"infinite", swap(porosity, strings.Replace(porosity, "0.213", "1e999", 1)), "field.porosity.value", "1e999"},
		{"out of range", swap(porosity, strings.Replace(porosity, "0.213", "1.3", 1)), "field.porosity", "read 1.3, allowed: above 0"},
		{"unknown unit", swap(`"unit": "md"`, `"unit": "furlong"`), "rock.permeability", `"furlong", allowed: one of the units "md"`},
		{"unknown choice", swap(`"drive": "rate"`, `"drive": "hope"`), "field.drive", `"hope", allowed: one of "rate", "pressure"`},
		{"not a day", swap("2027-03-01", "2027-02-30"), "field.start", "2027-02-30"},
		{"a range upside down", swap(porosity, porosity+` "low": 0.3, "high": 0.2,`), "field.porosity", "from 0.3 to 0.2"},
		{"a range out of range", swap(porosity, porosity+` "low": -1, "high": 0.2,`), "field.porosity", "-1"},
		{"too long a text", swap(`"author": ""`, `"author": "`+strings.Repeat("x", MaxText+1)+`"`), "author", "longer than 1000"},
		{"nested deep", swap(`"author": ""`, `"author": `+strings.Repeat("[", 5000)+strings.Repeat("]", 5000)), "author.0.0.0.0.0.0.0.0", "deeper"},
		{"too many rows", swap(`"krw": [`, `"krw": [`+strings.Repeat("0,", MaxRows)), "rock.table.krw", "rows"},
	}
	for _, c := range cases {
		_, err := Read(c.text)
		var file *FileError
		if !errors.As(err, &file) {
			t.Errorf("%s: got %v, want a refusal", c.name, err)
			continue
		}
		if file.Path != c.path || !strings.Contains(file.Reason, c.reason) {
			t.Errorf("%s: refused at %q because %q, want at %q because %q", c.name, file.Path, file.Reason, c.path, c.reason)
		}
	}
}

func TestEveryCutIsRefused(t *testing.T) {
	demo := strings.TrimSpace(Write(Demo()))
	for i := range len(demo) - 1 {
		if _, err := Read(demo[:i]); err == nil {
			t.Fatalf("a study cut after %d bytes was opened", i)
		}
	}
}

func TestCloneSharesNothing(t *testing.T) {
	original, touched := full(), full()
	c := touched.Clone()
	if !reflect.DeepEqual(c, touched) {
		t.Fatal("a clone differs from its original")
	}
	c.Rock.Table.Sw[0] = 0.9
	for _, spec := range Specs() {
		in := spec.Get(&c)
		in.Value, *in.Low, *in.High = -7, -8, -9
	}
	if !reflect.DeepEqual(original, touched) {
		t.Error("changing a clone changed its original")
	}
}

func TestCheckSpeaksInTheUnitTyped(t *testing.T) {
	percent, _ := units.Find(units.Fraction, "%")
	spec, _ := Find("field.porosity")
	if p := Check(spec, 21.3, percent); p != nil {
		t.Errorf("21.3 %% was refused: %+v", p)
	}
	p := Check(spec, 130, percent)
	if p == nil || p.Path != "field.porosity" || p.Read != "130 %" || p.Allowed != "above 0 to below 100 %" {
		t.Errorf("130 %%: %+v", p)
	}
	for _, spec := range Specs() {
		for _, unit := range units.Of(spec.Quantity) {
			if (Check(spec, unit.FromSI(spec.Min), unit) != nil) != spec.OpenMin {
				t.Errorf("%s in %q: the lower end is treated wrongly", spec.Path, unit.Symbol)
			}
			if p := Check(spec, unit.FromSI(spec.Min)-1, unit); p == nil || p.Read == "" || p.Allowed == "" {
				t.Errorf("%s in %q: below the range: %+v", spec.Path, unit.Symbol, p)
			}
			if p := Check(spec, unit.FromSI(spec.Max)*1.001+1e-9, unit); p == nil {
				t.Errorf("%s in %q: above the range was allowed", spec.Path, unit.Symbol)
			}
		}
	}
}

func TestSpecsAreDescribed(t *testing.T) {
	seen := map[string]bool{}
	for _, spec := range Specs() {
		switch {
		case seen[spec.Path]:
			t.Errorf("%s is described twice", spec.Path)
		case spec.Label == "" || spec.Symbol == "" || spec.Group == "":
			t.Errorf("%s has no label, symbol or group", spec.Path)
		case len(units.Of(spec.Quantity)) == 0:
			t.Errorf("%s: %q has no unit", spec.Path, spec.Quantity)
		case spec.Optional != (spec.Default != ""):
			t.Errorf("%s: an optional input, and only it, says what empty means", spec.Path)
		case !(spec.Min < spec.Max):
			t.Errorf("%s: the range is empty", spec.Path)
		}
		seen[spec.Path] = true
	}
}

func TestDemoSaysThatItIsInvented(t *testing.T) {
	st := Demo()
	if !strings.Contains(st.Title, "invented") || st.Rock.Table.Source != Invented {
		t.Error("title or table does not say so")
	}
	for _, spec := range Specs() {
		if in := spec.Get(&st); in != nil && in.Source != Invented {
			t.Errorf("%s does not say so", spec.Path)
		}
	}
}

func TestChoose(t *testing.T) {
	st := Empty()
	for _, f := range choiceFields {
		for _, c := range f.list {
			if !Choose(&st, f.path, c.Value) || *f.at(&st) != c.Value {
				t.Errorf("%s did not take %q", f.path, c.Value)
			}
		}
		before := *f.at(&st)
		if Choose(&st, f.path, "hope") || *f.at(&st) != before {
			t.Errorf("%s took a value it may not hold", f.path)
		}
	}
	if Choose(&st, "title", "rate") {
		t.Error("a text field was chosen")
	}
}

func TestSchemaIsAsPublished(t *testing.T) { golden(t, Schema()) }

func FuzzRead(f *testing.F) {
	f.Add(Write(Demo()))
	f.Add(Write(Empty()))
	f.Add(Write(full()))
	f.Add(Write(withCases()))
	f.Add(`{"type": "brinefront/study", "version": 2}`)
	f.Add(`{"type": "brinefront/study", "version": 1, "rock": {"table": {"sw": [1e999]}}}`)
	f.Fuzz(func(t *testing.T, text string) {
		st, err := Read(text)
		if err != nil {
			var file *FileError
			if !errors.As(err, &file) || file.Reason == "" {
				t.Fatalf("refused without a reason: %v", err)
			}
			return
		}
		again, err := Read(Write(st))
		if err != nil || !reflect.DeepEqual(again, st) {
			t.Fatalf("accepted, but not after being written again (%v)", err)
		}
		for _, fault := range faults(Run(st)) {
			t.Error(fault)
		}
	})
}

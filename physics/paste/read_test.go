package paste

import (
	"math"
	"strings"
	"testing"
)

// The tables pasted here are invented; each row says what a careful person would
// read in it. A row with no wanted problems must give a table.
var sw4, krw4, kro4 = []float64{0.2, 0.4, 0.6, 0.75}, []float64{0, 0.05, 0.18, 0.3}, []float64{0.85, 0.4, 0.1, 0}

// kr is a table of relative permeability, column by column.
func kr(r Reading) (sw, krw, kro []float64, ok bool) {
	columns, _, ok := r.Table()
	if !ok {
		return nil, nil, nil, false
	}
	return columns[0], columns[1], columns[2], true
}

func TestRead(t *testing.T) {
	tests := []struct {
		name, text string
		separator  string
		decimal    string
		as         string // roles in column order, e.g. "sw krw kro -"
		remarks    []string
	}{
		{"spreadsheet", "Sw\tkrw\tkro\n0.2\t0\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1\n0.75\t0.3\t0\n", "tab", point, "sw krw kro", nil},
		{"spreadsheet, decimal comma", "Sw\tkrw\tkro\r\n0,2\t0\t0,85\r\n0,4\t0,05\t0,4\r\n0,6\t0,18\t0,1\r\n0,75\t0,3\t0\r\n", "tab", comma, "sw krw kro", nil},
		{"csv", "Sw,krw,kro\n0.2,0,0.85\n0.4,0.05,0.4\n0.6,0.18,0.1\n0.75,0.3,0", "comma", point, "sw krw kro", nil},
		{"csv with spaces", "Sw, krw, kro\n0.20, 0.00, 0.85\n0.40, 0.05, 0.40\n0.60, 0.18, 0.10\n0.75, 0.30, 0.00", "comma", point, "sw krw kro", nil},
		{"csv, semicolons, decimal comma, trailing separators", "\ufeffSw;krw;kro;\n0,2;0;0,85;\n0,4;0,05;0,4;\n0,6;0,18;0,1;\n0,75;0,3;0;\n;;;\n", "semicolon", comma, "sw krw kro", nil},
		{"semicolons, decimal point", "Sw;krw;kro\n0.2;0;0.85\n0.4;.05;0.4\n0.6;.18;0.1\n0.75;.3;0", "semicolon", point, "sw krw kro", nil},
		{"quoted csv, decimal comma", "\"Sw\",\"krw\",\"kro\"\n\"0,2\",\"0\",\"0,85\"\n\"0,4\",\"0,05\",\"0,4\"\n\"0,6\",\"0,18\",\"0,1\"\n\"0,75\",\"0,3\",\"0\"", "comma", comma, "sw krw kro", nil},
		{"quoted heading with a comma", "\"Sw, v/v\",\"krw, v/v\",\"kro, v/v\"\n0.2,0,0.85\n0.4,0.05,0.4\n0.6,0.18,0.1\n0.75,0.3,0", "comma", point, "sw krw kro", nil},
		{"unquoted heading with a comma", "Sw, v/v, krw, kro\n0.2, 0, 0.85\n0.4, 0.05, 0.4\n0.6, 0.18, 0.1\n0.75, 0.3, 0", "comma", point, "sw krw kro", nil},
		{"comma and space, decimal comma", "Sw, krw, kro\n0,2, 0,00, 0,85\n0,4, 0,05, 0,4\n0,6, 0,18, 0,1\n0,75, 0,3, 0,0", "comma", comma, "sw krw kro", nil},
		{"report", "  Sw      krw     kro\n 0.200   0.000   0.850\n 0.400   0.050   0.400\n 0.600   0.180   0.100\n 0.750   0.300   0.000\n", "spaces", point, "sw krw kro", nil},
		{"report, decimal comma", "Sw krw kro\n0,2 0 0,85\n0,4 0,05 0,4\n0,6 0,18 0,1\n0,75 0,3 0", "spaces", comma, "sw krw kro", nil},
		{"units in the heading, spaces", "Sw (%) krw [frac] kro [frac]\n20 0 0.85\n40 0.05 0.4\n60 0.18 0.1\n75 0.3 0", "spaces", point, "sw krw kro", []string{"Column 1 (water saturation) is in percent"}},
		{"words in the heading, spaces", "Invented plug 7A\nWater saturation kr water kr oil\nfraction fraction fraction\n0.2 0 0.85\n0.4 0.05 0.4\n0.6 0.18 0.1\n0.75 0.3 0", "spaces", point, "sw krw kro", nil},
		{"units row", "Sw\tk_rw\tk_ro\n%\tfrac\tfrac\n20\t0\t0.85\n40\t0.05\t0.4\n60\t0.18\t0.1\n75\t0.3\t0", "tab", point, "sw krw kro", []string{"its values were divided by 100"}},
		{"units row of dashes", "Sw\tkrw\tkro\n-\t-\t-\n0.2\t0\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1\n0.75\t0.3\t0", "tab", point, "sw krw kro", nil},
		{"all in percent", "Sw, %\tkrw, %\tkrow, %\n20\t0\t85\n40\t5\t40\n60\t18\t10\n75\t30\t0", "tab", point, "sw krw kro", []string{"Column 3 (kro) is in percent"}},
		{"percent signs", "Sw\tkrw\tkro\n20 %\t0\t0.85\n40 %\t0.05\t0.4\n60 %\t0.18\t0.1\n75 %\t0.3\t0", "tab", point, "sw krw kro", []string{"percent sign"}},
		{"percent signs between spaces", "20 % 0 % 85 %\n40 % 5 % 40 %\n60 % 18 % 10 %\n75 % 30 % 0 %", "spaces", point, "sw krw kro", []string{"percent sign", "by position"}},
		{"percent without a word", "Sw\tkrw\tkro\n20\t0\t0.85\n40\t0.05\t0.4\n60\t0.18\t0.1\n75\t0.3\t0", "tab", point, "sw krw kro", []string{"so it was read as percent; no heading says so"}},
		{"kr in percent without a word", "Sw\tkrw\tkro\n20\t0\t85\n40\t5\t40\n60\t18\t10\n75\t30\t0", "tab", point, "sw krw kro", []string{"Column 1 (water saturation) reaches", "Column 2 (krw) reaches beyond 1 and stays within 100, so it was read as percent", "Column 3 (kro) reaches"}},
		{"saturation headed as percent, kr bare", "Sw (%)\tkrw\tkro\n20\t0\t85\n40\t5\t40\n60\t18\t10\n75\t30\t0", "tab", point, "sw krw kro", []string{"Column 2 (krw) reaches", "Column 3 (kro) reaches"}},
		{"kr in percent beside fractions", "Sw\tkrw\tkro\n0.2\t0\t85\n0.4\t5\t40\n0.6\t18\t10\n0.75\t30\t0", "tab", point, "sw krw kro", []string{"Column 2 (krw) reaches", "Column 3 (kro) reaches"}},
		{"one kr bare, the other headed", "Sw (%)\tkrw (frac)\tkro\n20\t0\t85\n40\t0.05\t40\n60\t0.18\t10\n75\t0.3\t0", "tab", point, "sw krw kro", []string{"Column 3 (kro) reaches"}},
		{"whole percents between commas", "Sw (%),krw (%),kro (%)\n20,0,85\n40,5,40\n60,18,10\n75,30,0", "comma", point, "sw krw kro", []string{"percent"}},
		{"oil saturation", "So\tkrw\tkro\n0.8\t0\t0.85\n0.6\t0.05\t0.4\n0.4\t0.18\t0.1\n0.25\t0.3\t0", "tab", point, "sw krw kro", []string{"1 − So"}},
		{"oil saturation in percent", "Oil saturation (%);krw;kro\n80;0;0,85\n60;0,05;0,4\n40;0,18;0,1\n25;0,3;0", "semicolon", comma, "sw krw kro", []string{"1 − So", "in percent"}},
		{"both saturations", "So\tSw\tkro\tkrw\n0.8\t0.2\t0.85\t0\n0.6\t0.4\t0.4\t0.05\n0.4\t0.6\t0.1\t0.18\n0.25\t0.75\t0\t0.3", "tab", point, "- sw kro krw", nil},
		{"no heading", "0.2\t0\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1\n0.75\t0.3\t0", "tab", point, "sw krw kro", []string{"by position: column 1 as water saturation, column 2 as krw, column 3 as kro"}},
		{"no heading, oil before water", "0.2\t0.85\t0\n0.4\t0.4\t0.05\n0.6\t0.1\t0.18\n0.75\t0\t0.3", "tab", point, "sw kro krw", []string{"Column 3 rises and column 2 falls"}},
		{"numbered rows without heading", "1 0.2 0 0.85\n2 0.4 0.05 0.4\n3 0.6 0.18 0.1\n4 0.75 0.3 0", "spaces", point, "- sw krw kro", []string{"by position"}},
		{"extra columns", "No.\tSw\tPc, psi\tkrw\tkro\tkrw/kro\n1\t0.2\t12\t0\t0.85\t0\n2\t0.4\t5\t0.05\t0.4\t0.125\n3\t0.6\t2\t0.18\t0.1\t1.8\n4\t0.75\t0\t0.3\t0\t", "tab", point, "- sw - krw kro -", nil},
		{"names over two rows", "Water\tRelative permeability\tRelative permeability\nsaturation\tto water\tto oil\n0.2\t0\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1\n0.75\t0.3\t0", "tab", point, "sw krw kro", nil},
		{"one name only", "Sw\tA\tB\n0.2\t0\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1\n0.75\t0.3\t0", "tab", point, "sw krw kro", []string{"by position: column 2 as krw, column 3 as kro"}},
		{"on its side", "Sw\t0.2\t0.4\t0.6\t0.75\nkrw\t0\t0.05\t0.18\t0.3\nkro\t0.85\t0.4\t0.1\t0", "tab", point, "sw krw kro", []string{"on its side"}},
		{"falling rows", "Sw\tkrw\tkro\n0.75\t0.3\t0\n0.6\t0.18\t0.1\n0.4\t0.05\t0.4\n0.2\t0\t0.85", "tab", point, "sw krw kro", []string{"turned round"}},
		{"captions, blank lines, footnote", "Plug 7A, invented, 2134.5 m\n\n\tSw\tkrw\tkro\n\n\t0.2\t0\t0.85\n\t0.4\t0.05\t0.4\n\n\t0.6\t0.18\t0.1\n\t0.75\t0.3\t0\nMeasured at room temperature\n", "tab", point, "- sw krw kro", []string{"Line 7, \"Measured at room temperature\", holds no number"}},
		{"two footnotes", "Sw\tkrw\tkro\n0.2\t0\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1\n0.75\t0.3\t0\nInvented\nSee page nine", "tab", point, "sw krw kro", []string{"2 lines, the first of them line 6, \"Invented\", hold no number"}},
		{"heading repeated on the next page", "Sw krw kro\n0.2 0 0.85\n0.4 0.05 0.4\nSw krw kro\n0.6 0.18 0.1\n0.75 0.3 0", "spaces", point, "sw krw kro", []string{"Line 4"}},
		{"non-breaking spaces, unicode minus, exponent", "Sw\u00a0(frac)\tkrw\tkro\n0.2\u00a0\t\u22120\t8.5e\u22121\n0.4\t5E-2\t0.4\n0.6\t0.18\t+0.1\n0.75\t0.3\t0", "tab", point, "sw krw kro", nil},
		{"old line ends", "Sw\tkrw\tkro\r0.2\t0\t0.85\r0.4\t0.05\t0.4\r0.6\t0.18\t0.1\r0.75\t0.3\t0\r", "tab", point, "sw krw kro", nil},
		{"headed twice", "Sw\tkrw (lab)\tkro\tkrw smoothed\n0.2\t0\t0.85\t0\n0.4\t0.05\t0.4\t0.06\n0.6\t0.18\t0.1\t0.17\n0.75\t0.3\t0\t0.3", "tab", point, "sw krw kro -", []string{"Column 4 is headed krw as well"}},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			r := Read(test.text, RelativePermeability)
			if len(r.Problems) > 0 {
				t.Fatalf("problems %+v", r.Problems)
			}
			if r.Separator != test.separator || r.Decimal != test.decimal {
				t.Errorf("read with %s and decimal %s, want %s and %s", r.Separator, r.Decimal, test.separator, test.decimal)
			}
			if got := rolesOf(r); got != test.as {
				t.Errorf("roles %q, want %q", got, test.as)
			}
			for _, want := range test.remarks {
				if !strings.Contains(strings.Join(r.Remarks, "\n"), want) {
					t.Errorf("no remark %q in %q", want, r.Remarks)
				}
			}
			if test.remarks == nil && len(r.Remarks) > 0 {
				t.Errorf("remarks %q, want none", r.Remarks)
			}
			sw, krw, kro, ok := kr(r)
			if !ok || !same(sw, sw4) || !same(krw, krw4) || !same(kro, kro4) {
				t.Errorf("table %v %v %v %v", sw, krw, kro, ok)
			}
		})
	}
}

func rolesOf(r Reading) string {
	var roles []string
	for _, c := range r.Columns {
		if c.As == "" {
			roles = append(roles, "-")
		} else {
			roles = append(roles, c.As)
		}
	}
	return strings.Join(roles, " ")
}

// same holds decimals as written: 20 % is 0.2 to the last bit.
func same(got, want []float64) bool {
	if len(got) != len(want) {
		return false
	}
	for i := range got {
		if got[i] != want[i] {
			return false
		}
	}
	return true
}

func TestReadProblems(t *testing.T) {
	const head = "Sw\tkrw\tkro\n"
	tests := []struct {
		name, text    string
		row, column   int
		read, allowed string
	}{
		{"empty", "", -1, -1, "an empty text", "at least 3 rows"},
		{"blank", " \n\t\t\n;;\n", -1, -1, "an empty text", "at least 3 rows"},
		{"words only", "once upon a time\nthere was a plug", -1, -1, "no row of numbers", "at least 3 rows"},
		{"ambiguous commas", "0,2,0,0,0,85\n0,4,0,05,0,4\n0,6,0,18,0,1", -1, -1, "commas that may separate columns or mark decimals, as in \"0,2,0,0,0,85\"", "semicolons"},
		{"ambiguous commas, ragged", "Sw,krw,kro\n0,2,0,0,85\n0,4,0,05,0,4\n0,6,0,18,0,1", -1, -1, "commas that may", "decimal points"},
		{"letters", head + "0.2\t0\t0.85\n0.4\tabc\t0.4\n0.6\t0.18\t0.1", 1, 1, "abc", "a number"},
		{"spreadsheet error", head + "0.2\t0\t0.85\n0.4\t#DIV/0!\t0.4\n0.6\t0.18\t0.1", 1, 1, "#DIV/0!", "a number"},
		{"row of letters", head + "0.2\t0\t0.85\na\tb\tc\n0.6\t0.18\t0.1", 1, 0, "a", "a number"},
		{"negative", head + "0.2\t-0.01\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "-0.01", "from 0 to 1"},
		{"above one", head + "0.2\t0\t1.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 2, "1.85", "from 0 to 1"},
		{"kr to 1.85 beside percent", head + "20\t0\t1.85\n40\t0.05\t0.4\n60\t0.18\t0.1", 0, 2, "1.85", "from 0 to 1"},
		{"one kr in percent, one not", head + "20\t0\t85\n40\t0.05\t40\n60\t0.18\t10", 0, 2, "85", "write % in its heading"},
		{"kr beyond 100", head + "20\t0\t850\n40\t5\t40\n60\t18\t10", 0, 2, "850", "from 0 to 1"},
		{"one slip of the decimal mark", head + "0.2\t0\t0.85\n0.4\t5\t0.4\n0.6\t0.18\t0.1", 1, 1, "5", "from 0 to 1"},
		{"a slip in each column", head + "0.2\t0\t85\n0.4\t5\t0.4\n0.6\t0.18\t0.1", 0, 2, "85", "from 0 to 1"},
		{"percent against the heading", "Sw (frac)\tkrw\tkro\n20\t0\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 0, "20", "write % in its heading"},
		{"over 100 percent", "Sw (%)\tkrw\tkro\n20\t0\t0.85\n140\t0.05\t0.4\n60\t0.18\t0.1", 1, 0, "140", "from 0 to 100"},
		{"too large for a number", head + "0.2\t1e999\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "1e999", "from 0 to 1"},
		{"not a number by name", head + "0.2\tNaN\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "NaN", "a number"},
		{"infinite by name", head + "0.2\tinf\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "inf", "a number"},
		{"hexadecimal", head + "0.2\t0x1p-2\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "0x1p-2", "a number"},
		{"two marks", head + "0.2\t1.000.5\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "1.000.5", "a number"},
		{"the other decimal mark", head + "0.2\t0,01\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "0,01", "decimal point"},
		{"empty cell", head + "0.2\t\t0.85\n0.4\t0.05\t0.4\n0.6\t0.18\t0.1", 0, 1, "an empty cell", "from 0 to 1"},
		{"short row", head + "0.2\t0\t0.85\n0.4\t0.05\n0.6\t0.18\t0.1", 1, 2, "an empty cell", "from 0 to 1"},
		{"two rows", head + "0.2\t0\t0.85\n0.4\t0.05\t0.4", -1, -1, "2 rows of numbers", "at least 3 rows"},
		{"two columns", "Sw\tkrw\n0.2\t0\n0.4\t0.05\n0.6\t0.18", -1, -1, "no column for kro", "three columns"},
		{"one column", "0.2\n0.4\n0.6", -1, -1, "no column for krw", "three columns"},
		{"too many columns", strings.Repeat("0.1\t", 101) + "0.2\n", -1, -1, "a row of 102 cells", "at most 100"},
		{"too many rows", strings.Repeat("0.2\t0\t0.85\n", MaxRows+1), -1, -1, "10,001 rows", "at most 10,000 rows"},
		{"far too many rows", strings.Repeat("0.2\t0\t0.85\n", 3*MaxRows), -1, -1, "more than 10,000 rows", "at most 10,000 rows"},
		{"too long", strings.Repeat("0.2\t0\t0.85\n", 500_000), -1, -1, "a text of 5.2 MB", "at most 1 MB"},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			r := Read(test.text, RelativePermeability)
			if _, _, _, ok := kr(r); ok {
				t.Error("the table is offered for use")
			}
			for _, p := range r.Problems {
				if p.Row == test.row && p.Column == test.column && strings.Contains(p.Read, test.read) && strings.Contains(p.Allowed, test.allowed) {
					return
				}
			}
			t.Errorf("no such problem in %+v", r.Problems)
		})
	}
}

// TestBadCellKeepsTheRest: one bad cell is one problem; what else was read stays.
func TestBadCellKeepsTheRest(t *testing.T) {
	r := Read("Sw\tkrw\tkro\n0.2\t0\t0.85\n0.4\t1.2\toops\n0.6\t0.18\t0.1", RelativePermeability)
	if len(r.Problems) != 2 {
		t.Fatalf("problems %+v, want two", r.Problems)
	}
	if v := r.Columns[1].Values[1]; v != 1.2 {
		t.Errorf("the value out of range reads %v, want it kept as 1.2", v)
	}
	if v := r.Columns[2].Values[1]; !math.IsNaN(v) {
		t.Errorf("the word reads %v, want NaN", v)
	}
	if v := r.Columns[2].Values[2]; v != 0.1 {
		t.Errorf("the cell below reads %v, want 0.1", v)
	}
}

// TestFalling: values stay beside their cells; only the table is turned.
func TestFalling(t *testing.T) {
	r := Read("Sw\tkrw\tkro\n0.7\t0.3\t0\n0.5\t0.1\t0.2\n0.2\t0\t0.8", RelativePermeability)
	if r.Columns[0].Values[0] != 0.7 || r.Cells[0][0] != "0.7" {
		t.Errorf("values %v do not stand beside their cells", r.Columns[0].Values)
	}
	sw, _, kro, ok := kr(r)
	if !ok || !same(sw, []float64{0.2, 0.5, 0.7}) || !same(kro, []float64{0.8, 0.2, 0}) {
		t.Errorf("table %v %v %v", sw, kro, ok)
	}
}

// TestShapes: named columns are never turned over, only remarked on.
func TestShapes(t *testing.T) {
	r := Read("Sw\tkrw\tkro\n0.2\t0.85\t0\n0.4\t0.4\t0.05\n0.6\t0.1\t0.18\n0.75\t0\t0.3", RelativePermeability)
	if got := rolesOf(r); got != "sw krw kro" {
		t.Errorf("roles %q", got)
	}
	if !strings.Contains(strings.Join(r.Remarks, " "), "look swapped") {
		t.Errorf("remarks %q do not say that the curves look swapped", r.Remarks)
	}
	r = Read("Sw\tkrw\tkro\n0.2\t0\t0.85\n0.6\t0.18\t0.1\n0.4\t0.05\t0.4", RelativePermeability)
	if !strings.Contains(strings.Join(r.Remarks, " "), "falls from row 2 to row 3") {
		t.Errorf("remarks %q do not tell the row out of order", r.Remarks)
	}
}

func TestWith(t *testing.T) {
	r := Read("a\tb\tc\td\n0.2\t0\t0.85\t7\n0.4\t0.05\t0.4\t7\n0.6\t0.18\t0.1\t7\n0.75\t0.3\t0\t7", RelativePermeability)
	if got := rolesOf(r); got != "sw krw kro -" {
		t.Fatalf("roles %q", got)
	}
	before := r.Remarks[0]
	moved := r.With(2, Krw)
	if got := rolesOf(moved); got != "sw - krw -" {
		t.Errorf("roles after moving krw: %q", got)
	}
	if _, _, _, ok := kr(moved); ok || len(moved.Problems) != 1 {
		t.Errorf("kro has no column, problems %+v", moved.Problems)
	}
	if moved = moved.With(1, Kro); rolesOf(moved) != "sw kro krw -" || len(moved.Problems) != 0 {
		t.Errorf("roles %q, problems %+v", rolesOf(moved), moved.Problems)
	}
	if bad := r.With(3, Kro); len(bad.Problems) != 4 {
		t.Errorf("a column of sevens as kro has problems %+v, want one a cell", bad.Problems)
	}
	if none := r.With(1, ""); rolesOf(none) != "sw - kro -" || none.Columns[1].Values != nil {
		t.Errorf("roles %q", rolesOf(none))
	}
	oil := r.With(0, So)
	if sw := oil.Columns[0].Values; !oil.Columns[0].Oil || !same(sw, []float64{0.8, 0.6, 0.4, 0.25}) {
		t.Errorf("as oil saturation column 1 gives sw %v", sw)
	}
	for _, same := range []Reading{r.With(-1, Sw), r.With(4, Sw), r.With(0, "pc"), Read("", RelativePermeability).With(0, Sw)} {
		if len(same.Columns) != 0 && rolesOf(same) != "sw krw kro -" {
			t.Errorf("an impossible change gave %q", rolesOf(same))
		}
	}
	if rolesOf(r) != "sw krw kro -" || r.Remarks[0] != before {
		t.Error("With changed the reading it was called on")
	}
}

// Tables of other phases: by hand, each heading takes the role that its phase has in the
// pair, and the other saturation is turned over.
func TestPairs(t *testing.T) {
	for name, c := range map[string]struct {
		displacing, resident, text, roles, remark, problem string
		sw, krw                                            []float64
	}{
		"gas and oil":           {"g", "o", "Sg\tkrg\tkrog\n0.1\t0\t0.9\n0.3\t0.2\t0.4\n0.5\t0.6\t0\n", "sw krw kro", "", "", []float64{0.1, 0.3, 0.5}, []float64{0, 0.2, 0.6}},
		"by liquid":             {"g", "o", "SL\tkro\tkrg\n0.5\t0\t0.6\n0.7\t0.4\t0.2\n0.9\t0.9\t0\n", "sw kro krw", "liquid saturation; gas saturation was taken as 1 − SL", "", []float64{0.1, 0.3, 0.5}, []float64{0, 0.2, 0.6}},
		"brine into gas":        {"w", "g", "Sw\tkrg\tkrw\n0.2\t0.9\t0\n0.5\t0.3\t0.1\n0.7\t0\t0.3\n", "sw kro krw", "", "", []float64{0.2, 0.5, 0.7}, []float64{0, 0.1, 0.3}},
		"CO2 by brine":          {"g", "w", "Sw\tkrw\tkrg\n1\t1\t0\n0.8\t0.5\t0.1\n0.5\t0\t0.4\n", "sw kro krw", "water saturation; gas saturation was taken as 1 − Sw", "", []float64{0, 0.2, 0.5}, []float64{0, 0.1, 0.4}},
		"no headings":           {"g", "o", "0.1\t0\t0.9\n0.3\t0.2\t0.4\n0.5\t0.6\t0\n", "sw krw kro", "column 1 as gas saturation, column 2 as krg, column 3 as kro", "", []float64{0.1, 0.3, 0.5}, []float64{0, 0.2, 0.6}},
		"water's are not gas's": {"g", "o", "Sw\tkrw\tkro\n0.2\t0\t0.9\n0.5\t0.1\t0.3\n0.7\t0.3\t0\n", "- - kro", "", "no column for gas saturation", nil, nil},
	} {
		r := Read(c.text, RelativePermeability.Between(c.displacing, c.resident))
		if rolesOf(r) != c.roles {
			t.Errorf("%s: roles %q, want %q", name, rolesOf(r), c.roles)
		}
		if !strings.Contains(strings.Join(r.Remarks, " "), c.remark) {
			t.Errorf("%s: remarks %q lack %q", name, r.Remarks, c.remark)
		}
		if c.problem != "" {
			if len(r.Problems) == 0 || r.Problems[0].Read != c.problem {
				t.Errorf("%s: problems %+v", name, r.Problems)
			}
			continue
		}
		if columns, _, ok := r.Table(); !ok || !same(columns[0], c.sw) || !same(columns[1], c.krw) {
			t.Errorf("%s: %v, want %v and %v", name, columns, c.sw, c.krw)
		}
	}
}

func TestNameOf(t *testing.T) {
	for title, want := range map[string]string{
		"Sw": Sw, "SW (%)": Sw, "Sw, v/v": Sw, "S_w [frac]": Sw, "Water Saturation, % PV": Sw, "Average Sw": Sw, "Sw -": Sw,
		"So": So, "Oil saturation (fraction)": So,
		"krw": Krw, "k_rw": Krw, "Kr,w": Krw, "kr water": Krw, "kr (water)": Krw, "Relative permeability to water": Krw, "krw smoothed": Krw,
		"Kro": Kro, "krow": Kro, "k ro [-]": Kro, "Oil relative permeability": Kro,
		"krw/kro": "", "Sw*": "", "Sw norm": "", "Swi": "", "krg": "krg", "krog": Kro, "Sg, %": "sg", "Gas saturation": "sg", "SL": "sl", "kr CO2": "krg", "Pc": "pc", "": "", "%": "", "saturation": "", "Sw So": "",
	} {
		if got := nameOf(title); got != want {
			t.Errorf("%q names %q, want %q", title, got, want)
		}
	}
}

func TestManyProblems(t *testing.T) {
	r := Read("Sw\tkrw\tkro\n"+strings.Repeat("-1\t2\t3\n", 9000), RelativePermeability)
	if n := len(r.Problems); n != maxProblems+1 || !strings.HasPrefix(r.Problems[n-1].Read, "26,800 more") {
		t.Errorf("%d problems, the last %+v", n, r.Problems[n-1])
	}
}

// TestLongHeading: a heading of a megabyte is looked at no longer than a short one.
func TestLongHeading(t *testing.T) {
	r := Read("Sw"+strings.Repeat(" a", MaxBytes/2-100)+"\tkrw\tkro\n0.2\t0\t0.8\n0.3\t0.1\t0.5\n0.4\t0.2\t0.3", RelativePermeability)
	if got := rolesOf(r); got != "sw krw kro" || len(r.Problems) > 0 {
		t.Errorf("roles %q, problems %v", got, r.Problems)
	}
}

// TestReadPressure: headings, units and order of capillary pressure tables.
func TestReadPressure(t *testing.T) {
	for name, test := range map[string]struct {
		text   string
		sw, pc []float64
		unit   string
	}{
		"unit in brackets":    {"Sw\tPc (psi)\n0.2\t9.5\n0.4\t2\n0.7\t-3.5\n", []float64{0.2, 0.4, 0.7}, []float64{9.5, 2, -3.5}, "psi"},
		"percent, spelled":    {"Water saturation, %\tCapillary pressure, kPa\n20\t95\n40\t20\n70\t-35\n", []float64{0.2, 0.4, 0.7}, []float64{95, 20, -35}, "kPa"},
		"unit row, turned":    {"Pc\tSw\nbar\tfrac\n-0.3\t0.7\n0.1\t0.4\n0.9\t0.2\n", []float64{0.2, 0.4, 0.7}, []float64{0.9, 0.1, -0.3}, "bar"},
		"J":                   {"Sw;J(Sw)\n0,2;0,9\n0,4;0,1\n0,7;0,05\n", []float64{0.2, 0.4, 0.7}, []float64{0.9, 0.1, 0.05}, "J"},
		"oil, kr beside it":   {"So,kro,Pc Pa\n0.8,1,900\n0.6,0.4,100\n0.3,0,50\n", []float64{0.2, 0.4, 0.7}, []float64{900, 100, 50}, "Pa"},
		"no heading, no unit": {"0.2 900\n0.4 100\n0.7 50\n", []float64{0.2, 0.4, 0.7}, []float64{900, 100, 50}, ""},
	} {
		r := Read(test.text, CapillaryPressure)
		columns, unit, ok := r.Table()
		if !ok || !same(columns[0], test.sw) || !same(columns[1], test.pc) || unit != test.unit {
			t.Errorf("%s: %v in %q; problems %+v", name, columns, unit, r.Problems)
		}
		if told := strings.Contains(strings.Join(r.Remarks, " "), "No unit stands"); told != (unit == "") {
			t.Errorf("%s: remarks %q", name, r.Remarks)
		}
	}
	r := Read("Sw\tPc psi\n0.2\t9.5\n0.4\tx\n0.7\t5%\n0.8\n", CapillaryPressure)
	if len(r.Problems) != 3 {
		t.Errorf("cells without a number: %+v", r.Problems)
	}
	if r = Read("Sw\tkrw\n0.2\t0\n0.4\t0.1\n0.7\t0.2\n", CapillaryPressure); len(r.Problems) != 1 || !strings.Contains(r.Problems[0].Allowed, "two columns") {
		t.Errorf("no capillary pressure: %+v", r.Problems)
	}
}

func FuzzRead(f *testing.F) {
	for _, seed := range []string{
		"", "Sw\tkrw\tkro\n0,2\t0\t0,85\n0.4\t5E-2\t0.4\n", "\"Sw, v/v\";krw;kro\n20 %;0;1", "Sw\tPc, kPa\n0.2\t\u22129\n0,4\t1\n0.7\t-3%\n", "0,2,0,0,0,85\n0,4", "So (%) kr water kr oil\n80 0 1\n1e999 - \u2212",
		"\ufeff;;;\n\"", "1 2 3 4\n2 3 4 5\n3 4 5 6\n4 a b c", "Sw,krw,kro\n25,10,80\n30,20,70\n", "0,25, 0,1, 0,8\r0,3, 0,2, 0,5", "%\n%\n1 %", "\xff\xfe0\x001\x00",
	} {
		f.Add(seed)
	}
	f.Fuzz(func(t *testing.T, text string) {
		for _, layout := range []Layout{RelativePermeability, CapillaryPressure} {
			r := Read(text, layout)
			for column := range len(r.Columns) + 1 {
				for _, as := range []string{"", Sw, Krw, Kro, So, Pc} {
					check(t, r.With(column, as))
				}
			}
			check(t, r)
		}
	})
}

// check holds what every reading promises.
func check(t *testing.T, r Reading) {
	for _, c := range r.Columns {
		if (c.As == "") != (c.Values == nil) || c.Values != nil && len(c.Values) != len(r.Cells) {
			t.Fatalf("column %+v with %d rows", c, len(r.Cells))
		}
	}
	for _, p := range r.Problems {
		if p.Read == "" || p.Allowed == "" || p.Row >= len(r.Cells) || p.Column >= len(r.Columns) {
			t.Fatalf("problem %+v", p)
		}
	}
	columns, _, ok := r.Table()
	if ok != (len(r.Problems) == 0) {
		t.Fatalf("table is ok: %v, with problems %+v", ok, r.Problems)
	}
	for i, values := range columns {
		if ok && len(values) < MinRows {
			t.Fatalf("a table of %d rows", len(values))
		}
		for _, v := range values {
			if pressure := r.want.columns[i] == Pc; math.IsNaN(v) || math.IsInf(v, 0) || !pressure && !(v >= 0 && v <= 1) {
				t.Fatalf("table holds %v", v)
			}
		}
	}
}

func BenchmarkRead(b *testing.B) {
	plug := "Sw;krw;kro\n" + strings.Repeat("0,25;0,01;0,8\n", 13)
	long := "Sw;krw;kro\n" + strings.Repeat("0,25;0,01;0,8\n", 10_000)
	huge := strings.Repeat(long, 36)
	for _, bench := range []struct{ name, text string }{{"13 rows", plug}, {"10000 rows", long}, {"5 MB", huge}} {
		b.Run(bench.name, func(b *testing.B) {
			for b.Loop() {
				Read(bench.text, RelativePermeability)
			}
		})
	}
}

func TestQuoted(t *testing.T) {
	for text, want := range map[string]string{"Sw krw kro\n0.2 ten 1\n0.4 0.1 0.5\n0.6 0.2 0": `"ten"`, "Sw\tkrw\tkro\n0.2\t\t1\n0.4\t0.1\t0.5\n0.6\t0.2\t0": "an empty cell", "hello": "no row of numbers"} {
		if got := Read(text, RelativePermeability).Problems[0].Quoted(); got != want {
			t.Errorf("of %q it says %s, want %s", text, got, want)
		}
	}
}

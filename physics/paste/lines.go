package paste

import (
	"strconv"
	"strings"
)

// maxHeading is how many heading lines may stand above a full-length table.
const maxHeading = 40

// plain replaces what spreadsheets and reports put in the place of a space, a
// minus sign or a line end. It drops the byte order mark.
var plain = strings.NewReplacer(
	"\ufeff", "", "\r\n", "\n", "\r", "\n", "\u2028", "\n", "\x00", "",
	"\u00a0", " ", "\u202f", " ", "\u2007", " ", "\u2009", " ", "\u200b", "",
	"\u2212", "-", "\u2013", "-",
)

// split cuts a text into its lines, without blank ones. It is not ok when there
// are more than a table may have; the rest is then not looked at.
func split(text string) (lines []string, ok bool) {
	text = plain.Replace(text)
	for line := range strings.SplitSeq(text, "\n") {
		if strings.Trim(line, " \t;,\"") == "" {
			continue
		}
		if len(lines) == MaxRows+maxHeading {
			return nil, false
		}
		lines = append(lines, line)
	}
	return lines, true
}

// clip shortens a text that is quoted in a message.
func clip(text string) string {
	const most = 40
	count := 0
	for i := range text {
		if count == most {
			return text[:i] + "…"
		}
		count++
	}
	return text
}

// thousands prints a count with a comma between groups of three digits.
func thousands(n int) string {
	s := strconv.Itoa(n)
	for i := len(s) - 3; i > 0; i -= 3 {
		s = s[:i] + "," + s[i:]
	}
	return s
}

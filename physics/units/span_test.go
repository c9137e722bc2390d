package units

import (
	"math"
	"testing"
)

func TestSpan(t *testing.T) {
	for _, c := range []struct {
		seconds    float64
		two, three string // ~ is the no-break space, ' the narrow one
	}{
		{0, "0~seconds", "0~seconds"}, {0.25, "0.25~seconds", "0.25~seconds"}, {0.9494, "0.95~seconds", "0.949~seconds"}, {0.9999, "1~second", "1~second"},
		{1, "1~second", "1~second"}, {1.04, "1~second", "1.04~seconds"}, {12.44, "12~seconds", "12.4~seconds"}, {59.4, "59~seconds", "59.4~seconds"},
		{59.7, "1~minute", "59.7~seconds"}, {59.97, "1~minute", "1~minute"}, {90, "1.5~minutes", "1.5~minutes"}, {2400, "40~minutes", "40~minutes"},
		{3599, "1~hour", "1~hour"}, {5.234 * 3600, "5.2~hours", "5.23~hours"}, {23.4 * 3600, "23~hours", "23.4~hours"}, {23.8 * 3600, "1~day", "23.8~hours"},
		{37 * 86400, "37~days", "37~days"}, {37.26 * 86400, "37~days", "37.3~days"}, {1.25 * 86400, "1.3~days", "1.25~days"},
		{365 * 86400, "365~days", "365~days"}, {365.25 * 86400, "1~year", "1~year"}, {1.4 * year, "1.4~years", "1.4~years"}, {2.462 * year, "2.5~years", "2.46~years"},
		{12.34 * year, "12~years", "12.3~years"}, {99.97 * year, "100~years", "100~years"}, {123.4 * year, "123~years", "123~years"},
		{1234 * year, "1234~years", "1234~years"}, {10_000 * year, "10'000~years", "10'000~years"}, {10_001 * year, "more than 10'000~years", "more than 10'000~years"},
		{1e300, "more than 10'000~years", "more than 10'000~years"}, {-1e300, "less than −10'000~years", "less than −10'000~years"},
		{-37 * 86400, "−37~days", "−37~days"}, {math.Inf(1), "∞", "∞"}, {math.NaN(), "not a number", "not a number"},
	} {
		if got := seen(Span(c.seconds, 2)); got != c.two {
			t.Errorf("Span(%v, 2) = %q, want %q", c.seconds, got, c.two)
		}
		if got := seen(Span(c.seconds, 3)); got != c.three {
			t.Errorf("Span(%v, 3) = %q, want %q", c.seconds, got, c.three)
		}
	}
}

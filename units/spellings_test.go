package units

import (
	"math"
	"slices"
	"strings"
	"testing"

	"example.com/coolward/internal/table"
)

// Spellings of the SI Brochure (9th ed., ch. 5 and tables 2 to 8), of ISO 80000-1 and of UCUM (codes from
// memory): all spellings of a unit read as the same quantity. What is not read, and why:
var notRead = map[string]string{
	"1":          "the number one has no symbol",
	"1 or {Nu}":  "the number one has no symbol",
	"%":          "a ratio is a float64",
	"none":       "no spelling",
	"in_i'H2O":   "an apostrophe and a digit within a symbol",
	"[in_i'H2O]": "an apostrophe and a digit within a symbol",
	"[in_i'Hg]":  "an apostrophe within a symbol",
	"[degF]":     "a scale with an offset, which is read as a temperature in °F only",
	"K":          "alone, a point or a difference",
	"°R":         "alone, a point or a difference",
	"[degR]":     "alone, a point or a difference",
}

func TestSpellingsOfStandards(t *testing.T) {
	list := func(s string, separators ...string) (all []string) {
		for _, sep := range separators {
			s = strings.ReplaceAll(s, sep, "|")
		}
		for _, one := range strings.Split(s, "|") {
			if one = strings.TrimSpace(one); one != "" {
				all = append(all, one)
			}
		}
		return all
	}
	checked := 0
	for _, row := range table.Named(t, "testdata/spellings.csv") {
		si := row["si_brochure"]
		if strings.HasPrefix(si, "(") && strings.HasSuffix(si, ")") { // usual abbreviations outside the SI stand in brackets
			si = si[1 : len(si)-1]
		}
		if notRead[si] != "" && notRead[row["ucum"]] != "" {
			continue
		}
		var columns [][]Value
		for _, spellings := range [][]string{list(si, ",", " or "), list(row["si_alternative"], " ; "), list(row["ucum"], ", ", " or ")} {
			var values []Value
			for _, s := range spellings {
				if notRead[s] != "" || s == "m2 typeset as superscript" || strings.HasPrefix(s, "1 (") || strings.HasPrefix(s, "12000.") {
					continue
				}
				v, err := ParseValue("1 " + s)
				if err != nil {
					t.Errorf("%s: %v", row["quantity"], err)
					continue
				}
				values = append(values, v)
			}
			if len(values) > 0 {
				columns = append(columns, values)
			}
		}
		for _, other := range columns[min(1, len(columns)):] {
			for i, v := range other {
				want := columns[0][min(i, len(columns[0])-1)]
				checked++
				same := v.dim == want.dim && math.Abs(v.si/want.si-1) < 4e-16
				if !same && !slices.Contains([]string{"calorie IT, th", "Btu (IT), Btu (th)"}, row["quantity"]) {
					t.Errorf("%s: %q is %v (%s), want %v (%s)", row["quantity"], v.unit, v.si, v.Dimension(), want.si, want.Dimension())
				}
			}
		}
	}
	if checked < 60 {
		t.Errorf("only %d spellings were compared", checked)
	}
}

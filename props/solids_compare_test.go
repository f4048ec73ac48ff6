package props_test

import (
	"fmt"
	"maps"
	"math"
	"slices"
	"strings"
	"testing"

	"example.com/coolward/props"
)

// The sources of testdata/solids_other_sources.csv.
var otherSources = map[string]string{
	"databook":      "C. P. Kothandaraman, S. Subramanyan, Heat and Mass Transfer Data Book, metals at 20 °C, read on a copy; its values at 27 °C have the same origin as those of Incropera et al. and witness the digits only",
	"crc":           "CRC Handbook, thermal conductivity of alloys (after Powell and Childs 1972, Ho et al. 1978), read on a copy; approximate by its own statement",
	"elements":      "CRC Handbook of Chemistry and Physics, properties of the elements (density and specific heat at 25 °C, conductivity at 27 °C), from memory",
	"holman":        "J. P. Holman, Heat Transfer, 10th ed., table A.2, from memory",
	"cibse":         "CIBSE Guide A, tables 3.36 and 3.37, read on a copy",
	"iso10456":      "EN ISO 10456:2007, table 3, 10 °C to 23 °C, from memory",
	"iso10456S":     "EN ISO 10456:2007, table 3, 10 °C to 23 °C, read as prEN 12524:1998 on a page that quotes it",
	"incropera":     "Incropera et al., Fundamentals of Heat and Mass Transfer, 6th ed., tables A.1 to A.3, from memory",
	"timberEC5":     "EN 1995-1-2:2004, Annex B, from memory",
	"handbooks":     "usual handbook values, from memory",
	"munro":         "R. G. Munro, J. Am. Ceram. Soc. 80 (1997) 1919, sintered alumina, from memory",
	"crawford":      "R. J. Crawford, Plastics Engineering, table 1.8, read; rounded to 15 %",
	"plasticRanges": "table of thermal properties of plastic materials at 23 °C, read",
	"farouki":       "O. T. Farouki, CRREL Report 82-8 (1982), middle of the range over five methods, read as quoted on a page",
	"iapws":         "IAPWS R10-06(2009), ice, coefficients from memory that reproduce its check table",
	"tissueReview":  "table of a review of tissue properties (PMC5459687, table 4), read",
	"ashraeFood":    "ASHRAE Handbook Refrigeration, chapter Thermal properties of foods, table 3, read or from memory as the composition",
	"quickFood":     "R. L. Earle, Unit Operations in Food Processing, appendix 7, rules by the water content, read; a strong simplification by its own statement",
}

// A comparison is a row of testdata/solids_other_sources.csv with what we have for it.
type comparison struct {
	solid           props.Solid
	grade, property string
	kelvin          float64
	theirs          cell
	got             float64
	uncertainty     float64
	source          string // key
	ratio, reason   string
}

func comparisons(t *testing.T) []comparison {
	t.Helper()
	s := readSheet(t, "solids_other_sources.csv")
	text := func(i int, column string) string { return s.text(t, i, column) }
	all := make([]comparison, len(s.rows))
	for i := range s.rows {
		solid, err := props.FindSolid(text(i, "solid"))
		if err != nil {
			t.Fatal(err)
		}
		r := comparison{
			solid: solid, grade: text(i, "grade"), property: text(i, "property"), kelvin: s.cell(t, i, "T_K").value,
			theirs: s.cell(t, i, "value"), source: text(i, "source"), ratio: text(i, "ratio"), reason: text(i, "reason"),
		}
		switch r.property {
		case "rho":
			r.got, r.uncertainty = solid.Density().SI(), solid.DensityUncertainty()
		case "c":
			r.got, r.uncertainty = c(t, solid, r.kelvin), solid.SpecificHeatUncertainty()
		case "k":
			r.got, r.uncertainty = k(t, solid, r.kelvin), solid.ConductivityUncertainty()
		default:
			t.Fatalf("property %q", r.property)
		}
		if otherSources[r.source] == "" {
			t.Fatalf("%s: no source %q", r.solid.Name(), r.source)
		}
		// Trailing zeros of a whole number are no digits: only the decimals of a printed value widen the tolerance.
		if r.theirs.half > 0.4 {
			r.theirs.half = 0
		}
		all[i] = r
	}
	return all
}

func (r comparison) String() string {
	return fmt.Sprintf("%s of %s (%s) at %g K", r.property, r.solid.Name(), r.grade, r.kelvin)
}

// Values from sources other than the one that an entry was made from, within the stated uncertainty; those outside it have the
// reason beside them, and the ratio of ours to theirs is held, so that a change of either is seen.
func TestSolidsAgainstOtherSources(t *testing.T) {
	for _, r := range comparisons(t) {
		if r.ratio == "" {
			check(t, r.String(), r.got, r.theirs, r.uncertainty, otherSources[r.source])
			continue
		}
		ratio := parseCell(t, r.ratio)
		if got := r.got / r.theirs.value; math.Abs(got-ratio.value) > ratio.half*1.02 || r.reason == "" {
			t.Errorf("%v: got %.4g, %.3f of %g, want %s of it (%s: %s)", r, r.got, got, r.theirs.value, r.ratio, otherSources[r.source], r.reason)
		}
		if math.Abs(r.got-r.theirs.value) <= r.uncertainty*r.got {
			t.Errorf("%v: got %.4g, within the uncertainty of %g; it is no known difference", r, r.got, r.theirs.value)
		}
	}
}

// solidsSection returns the part of DEVIATIONS.md on the solids.
func solidsSection(t *testing.T) string {
	t.Helper()
	of := map[string][]comparison{}
	for _, r := range comparisons(t) {
		of[r.solid.Name()] = append(of[r.solid.Name()], r)
	}
	var table, single []string
	for s := range props.Solids() {
		rows := of[s.Name()]
		if s.Name() == iceRow {
			continue // with the fluids
		}
		if len(rows) < compared {
			single = append(single, s.Name())
			continue
		}
		line := []string{s.Name(), fmt.Sprint(len(rows))}
		for _, property := range []string{"rho", "c", "k"} {
			line = append(line, largest(rows, property))
		}
		table = append(table, "| "+strings.Join(line, " | ")+" |")
	}
	var b strings.Builder
	fmt.Fprintf(&b, `## Solids

An asterisk has its reason in testdata/solids_other_sources.csv. Ice stands with the fluids.

| solid | values | density | specific heat | conductivity |
|---|---|---|---|---|
%s

%d solids. The other %d have fewer than %d values from another source and are checked for consistency alone:
%s.

## Sources of the solids

`, strings.Join(table, "\n"), len(table), len(single), compared, strings.Join(single, "; "))
	for _, key := range slices.Sorted(maps.Keys(otherSources)) {
		fmt.Fprintf(&b, "- %s: %s\n", key, otherSources[key])
	}
	return b.String()
}

// largest returns the largest deviation of a property.
func largest(rows []comparison, property string) string {
	worst, text := -1.0, "–"
	for _, r := range rows {
		d := r.got/r.theirs.value - 1
		if r.property != property || math.Abs(d) <= worst {
			continue
		}
		worst = math.Abs(d)
		mark := ""
		if r.ratio != "" {
			mark = "*"
		}
		if math.Abs(d) < 5e-4 {
			d = 0 // without the sign of a rounding error
		}
		text = fmt.Sprintf("%+.1f %%%s at %g K, %s (%.0f %%)", 100*d, mark, r.kelvin, r.source, 100*r.uncertainty)
	}
	return text
}

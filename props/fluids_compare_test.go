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

// The sources that the fluids are compared with, other than those that they were made from.
var fluidSources = map[string]string{
	"ashrae":      "ASHRAE Handbook Fundamentals, chapter 31, from memory",
	"bich":        "E. Bich, R. Hellmann, E. Vogel (2007), helium ab initio, from memory",
	"cengel":      "Y. A. Çengel, Heat and Mass Transfer, tables A-11, A-13 and A-14, from memory; of the origin of Incropera et al. in part",
	"cengelAir":   "Y. A. Çengel, A. J. Ghajar, Heat and Mass Transfer, table A-15, read on two pages that quote it",
	"choiOkos":    "M. A. Choi, M. R. Okos (1986), ice, coefficients read",
	"corechem":    "Corechem Inc., page Ethylene Glycol / Water Mixture Properties, read",
	"iapws":       "IAPWS R7-97(2012), R12-08 and R15-11, evaluated by an independent script",
	"incropera":   "Incropera et al., Fundamentals of Heat and Mass Transfer, 6th and 7th ed., tables A.3 to A.6, from memory",
	"kestin":      "J. Kestin et al., J. Phys. Chem. Ref. Data 13 (1984) 229, dilute gas, from memory",
	"laloui":      "L. Laloui, A. F. Rotta Loria, Analysis and Design of Energy Geostructures, tables 3.7 and 3.8, read",
	"mikheev":     "M. A. Mikheev, I. M. Mikheeva, Basics of Heat Transfer, flue gas of mean composition, from memory",
	"nasa":        "B. J. McBride, M. J. Zehe, S. Gordon, NASA/TP-2002-211556, mixture of N2, O2 and Ar, coefficients from memory",
	"perry":       "R. H. Perry, D. W. Green, Chemical Engineers Handbook, 9th ed., table 2-135, read on a copy",
	"realGas":     "E. W. Lemmon et al., J. Phys. Chem. Ref. Data 29 (2000) 331, real gas, evaluated by an independent script",
	"realVapour":  "IAPWS R7-97(2012), real vapour at its own pressure beside ideal air",
	"segur":       "J. B. Segur, H. E. Oberstar, Ind. Eng. Chem. 43 (1951) 2117, from memory",
	"thermal":     "Thermal-Fluids Central, encyclopedia, page Thermophysical Properties: Sodium, read",
	"tsonopoulos": "C. Tsonopoulos, AIChE J. 20 (1974) 263, second virial coefficient at 200 kPa, from memory",
}

// Reasons that more than one comparison has.
const (
	olderHotGas = "older viscosities of the handbook fall below the newer equations as the gas gets hot; polynomials of NASA for nitrogen side with ours"
	misprint    = "a misprint, it breaks the trend of its neighbours"
)

// Rows of DEVIATIONS.md for what has no name of its own, after those of props.Fluids.
const (
	ethyleneRow   = "ethylene glycol in water"
	propyleneRow  = "propylene glycol in water"
	moistAirRow   = "moist air"
	combustionRow = "combustion gas"
	iceRow        = "ice"
)

// The comparisons with other sources. Their reasons stand beside them.
var fluidComparisons = []struct {
	name    string
	compare func(*testing.T, *fluidRecord)
}{
	{"air, mixture", airAgainstMixture},
	{"air, real gas", airAgainstRealGas},
	{"air, Incropera", airAgainstIncropera},
	{"air, Cengel", airAgainstCengel},
	{"compressed air, Incropera", compressedAirAgainstIncropera},
	{"water, general formulations", waterAgainstGeneralFormulations},
	{"water, Perry", waterAgainstPerry},
	{"water, Incropera", waterAgainstIncropera},
	{"pressurised water, Perry", pressurisedWaterAgainstPerry},
	{"saturated, Incropera", saturatedAgainstIncropera},
	{"towards the critical point", conductivityTowardsTheCriticalPoint},
	{"steam, Incropera", steamAgainstIncropera},
	{"gases, Incropera", gasesAgainstIncropera},
	{"gases, virial", idealGasesAgainstVirial},
	{"argon, Kestin", argonAgainstKestin},
	{"helium, ab initio", heliumAgainstAbInitio},
	{"liquids, Cengel", liquidsAgainstCengel},
	{"glycerin, Segur", glycerinAgainstSegur},
	{"sodium, table", sodiumAgainstTable},
	{"ammonia, Cengel", ammoniaAgainstCengel},
	{"ethylene glycol, densities", ethyleneGlycolAgainstDensities},
	{"glycol, handbooks", glycolAgainstHandbooks},
	{"moist air, real vapour", moistAirAgainstRealVapour},
	{"combustion gas, Mikheev", flueGasAgainstMikheev},
	{"ice, others", iceAgainstOthers},
}

func TestFluidsAgainstOtherSources(t *testing.T) {
	for _, c := range fluidComparisons {
		t.Run(c.name, func(t *testing.T) { c.compare(t, new(fluidRecord)) })
	}
}

// fluidProperties are the columns of DEVIATIONS.md.
var fluidProperties = []struct {
	name        string
	value       func(props.FluidState) float64
	uncertainty func(uncertain) float64
}{
	{"density", func(s props.FluidState) float64 { return s.Density.SI() }, uncertain.DensityUncertainty},
	{"specific heat", func(s props.FluidState) float64 { return s.SpecificHeat.SI() }, uncertain.SpecificHeatUncertainty},
	{"conductivity", func(s props.FluidState) float64 { return s.Conductivity.SI() }, uncertain.ConductivityUncertainty},
	{"viscosity", func(s props.FluidState) float64 { return s.Viscosity.SI() }, uncertain.ViscosityUncertainty},
}

// uncertain has the relative uncertainties of a fluid.
type uncertain interface {
	DensityUncertainty() float64
	SpecificHeatUncertainty() float64
	ConductivityUncertainty() float64
	ViscosityUncertainty() float64
}

// A fluidRecord keeps what is compared.
type fluidRecord struct{ rows []fluidComparison }

type fluidComparison struct {
	fluid, property, source string
	kelvin                  float64
	deviation               float64 // ours over theirs, less one
	uncertainty             float64
	outside                 bool   // of the uncertainty
	leftOut                 bool   // and not compared
	reason                  string // why it is either
}

// A witness compares one fluid with one source.
type witness struct {
	record *fluidRecord
	row    string // of DEVIATIONS.md
	fluid  uncertain
	source string
	known  reasons
}

// reasons say by property why a source is outside the stated uncertainty.
type reasons map[string]string

func (r *fluidRecord) witness(row string, f uncertain, source string, known reasons) witness {
	return witness{r, row, f, source, known}
}

// check checks and records a property of the state s.
func (w witness) check(t *testing.T, s props.FluidState, property string, want cell, tolerance float64) {
	t.Helper()
	got := w.add(t, s, property, want, false, w.known[property])
	check(t, fmt.Sprintf("%s at %g K and %g Pa, %s", w.row, s.Temperature.SI(), s.Pressure.SI(), property), got, want, tolerance, fluidSources[w.source])
}

// note records a property that is checked in another way.
func (w witness) note(t *testing.T, s props.FluidState, property string, want cell) {
	t.Helper()
	w.add(t, s, property, want, false, w.known[property])
}

// leaveOut records that a property is not compared.
func (w witness) leaveOut(t *testing.T, s props.FluidState, property string, want cell, reason string) {
	t.Helper()
	w.add(t, s, property, want, true, reason)
}

func (w witness) add(t *testing.T, s props.FluidState, property string, want cell, leftOut bool, reason string) (got float64) {
	t.Helper()
	if fluidSources[w.source] == "" {
		t.Fatalf("no source %q", w.source)
	}
	for _, p := range fluidProperties {
		if p.name != property {
			continue
		}
		got = p.value(s)
		u := p.uncertainty(w.fluid)
		c := fluidComparison{
			fluid: w.row, property: property, source: w.source, kelvin: s.Temperature.SI(),
			deviation: got/want.value - 1, uncertainty: u,
			outside: math.Abs(got-want.value) > u*got, leftOut: leftOut, reason: reason,
		}
		if c.outside && reason == "" {
			t.Errorf("%s at %g K, %s: %.3g %% off %s, outside the uncertainty, without a reason", w.row, c.kelvin, property, 100*c.deviation, w.source)
		}
		w.record.rows = append(w.record.rows, c)
		return got
	}
	t.Fatalf("no property %q", property)
	return 0
}

// fluidsSection returns the part of DEVIATIONS.md on the fluids.
func fluidsSection(t *testing.T) string {
	t.Helper()
	r := new(fluidRecord)
	for _, c := range fluidComparisons {
		c.compare(t, r)
	}
	of := map[string][]fluidComparison{}
	var left []fluidComparison
	for _, c := range r.rows {
		if c.leftOut {
			left = append(left, c)
		} else {
			of[c.fluid] = append(of[c.fluid], c)
		}
	}
	var names []string
	for f := range props.Fluids() {
		names = append(names, f.Name())
	}
	names = append(names, ethyleneRow, propyleneRow, moistAirRow, combustionRow, iceRow)
	for name := range of {
		if !slices.Contains(names, name) {
			t.Errorf("no row for %q", name)
		}
	}
	var table, single []string
	var outside []fluidComparison
	for _, name := range names {
		if len(of[name]) < compared {
			single = append(single, name)
			continue
		}
		line := []string{name, fmt.Sprint(len(of[name]))}
		var none []string
		for _, p := range fluidProperties {
			rows := slices.DeleteFunc(slices.Clone(of[name]), func(c fluidComparison) bool { return c.property != p.name })
			line = append(line, largestOfFluid(rows))
			if len(rows) == 0 && (name != iceRow || p.name != "viscosity") {
				none = append(none, p.name)
			}
			for _, c := range rows {
				witnessed := func(o fluidComparison) bool { return o.source == c.source && o.outside }
				if c.reason != "" && !slices.ContainsFunc(rows, witnessed) {
					t.Errorf("%s, %s: %s is within the uncertainty, and has a reason", name, p.name, c.source)
				}
			}
			outside = append(outside, slices.DeleteFunc(rows, func(c fluidComparison) bool { return !c.outside })...)
		}
		if none != nil {
			single = append(single, name+" ("+strings.Join(none, ", ")+")")
		}
		table = append(table, "| "+strings.Join(line, " | ")+" |")
	}
	var b strings.Builder
	fmt.Fprintf(&b, `## Fluids

To two digits. The reason of an asterisk stands below. A source that is an equation counts at each state that the tests take. Humidity, saturation, latent
heats and surface tension have tests of their own.

| fluid | values | density | specific heat | conductivity | viscosity |
|---|---|---|---|---|---|
%s

%d fluids. Outside the uncertainty:

%s

Left out of the table:

%s

From a single source, with nothing to compare with: %s.

## Sources of the fluids

`, strings.Join(table, "\n"), len(table), explained(outside), explained(left), strings.Join(single, "; "))
	for _, key := range slices.Sorted(maps.Keys(fluidSources)) {
		if !slices.ContainsFunc(r.rows, func(c fluidComparison) bool { return c.source == key }) {
			t.Errorf("nothing is compared with %s", key)
		}
		fmt.Fprintf(&b, "- %s: %s\n", key, fluidSources[key])
	}
	return b.String()
}

// largestOfFluid returns the largest deviation of the rows of one property.
func largestOfFluid(rows []fluidComparison) string {
	if len(rows) == 0 {
		return "–"
	}
	worst := worstOf(rows)
	mark := ""
	if worst.outside {
		mark = "*"
	}
	return fmt.Sprintf("%s%s at %.6g K, %s (%.2g %%)", twoDigits(worst.deviation), mark, worst.kelvin, worst.source, 100*worst.uncertainty)
}

// worstOf returns the row with the largest deviation, the first of those that differ by rounding alone.
func worstOf(rows []fluidComparison) fluidComparison {
	worst := rows[0]
	for _, c := range rows {
		if math.Abs(c.deviation) > math.Abs(worst.deviation)*(1+1e-9)+1e-12 {
			worst = c
		}
	}
	return worst
}

// twoDigits prints a deviation in per cent.
func twoDigits(deviation float64) string {
	if math.Abs(deviation) < 5e-7 {
		return "0 %" // without the sign of a rounding error
	}
	return fmt.Sprintf("%+.2g %%", 100*deviation)
}

// explained lists the rows with their reasons, those together that have fluid, source and reason in common.
func explained(rows []fluidComparison) string {
	var lines []string
	for len(rows) > 0 {
		first := rows[0]
		group, rest, properties := []fluidComparison{}, []fluidComparison{}, []string{}
		low, high := first.kelvin, first.kelvin
		for _, c := range rows {
			if c.fluid != first.fluid || c.source != first.source || c.reason != first.reason {
				rest = append(rest, c)
				continue
			}
			group = append(group, c)
			low, high = min(low, c.kelvin), max(high, c.kelvin)
			if !slices.Contains(properties, c.property) {
				properties = append(properties, c.property)
			}
		}
		at := fmt.Sprintf("%.6g K", low)
		if high > low {
			at += fmt.Sprintf(" to %.6g K", high)
		}
		lines = append(lines, fmt.Sprintf("- %s, %s (%s; values: %d) at %s, up to %s: %s.",
			first.fluid, first.source, strings.Join(properties, ", "), len(group), at, twoDigits(worstOf(group).deviation), first.reason))
		rows = rest
	}
	return strings.Join(lines, "\n")
}

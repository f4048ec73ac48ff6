package fdm_test

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// printed returns the number of a line as it is printed, in SI.
func printed(t *testing.T, r derivation.Record, symbol string) float64 {
	t.Helper()
	v, ok := r.Value(symbol)
	if !ok {
		t.Fatalf("no line %s", symbol)
	}
	for _, line := range strings.Split(r.String(), "\n") {
		name, rest, found := strings.Cut(line, " = ")
		if fields := strings.Fields(name); !found || len(fields) == 0 || fields[len(fields)-1] != symbol {
			continue
		}
		x := table.Number(t, strings.Fields(rest)[0])
		if v.Number() == 0 {
			return 0
		}
		if v.IsPoint() {
			return v.SI() + x - v.Number()
		}
		return x * v.SI() / v.Number() // the unit that is printed
	}
	t.Fatalf("no printed line %s", symbol)
	return 0
}

// What can be recomputed from the printed numbers is, to their ten digits.
func TestDerivationRecomputes(t *testing.T) {
	records := map[string]derivation.Record{}
	for name, p := range map[string]fdm.Problem{"constant": scaled(0.7, 0), "steel": steelSphere(0)} {
		p.Sources, p.Notes = []string{"a mill certificate"}, []string{"the rack touches at three points"}
		records[name] = solve(t, p).Derivation()
	}
	for name, r := range records {
		v := func(symbol string) float64 { return printed(t, r, symbol) }
		checks := []struct {
			symbol    string
			got, want float64
		}{
			{"R", v("R"), v("D") / 2},
			{"A", v("A"), math.Pi * v("D") * v("D")},
			{"V", v("V"), math.Pi * v("D") * v("D") * v("D") / 6},
			{"Q", v("Q"), v("ρ") * v("V") * (v("i0") - v("i,m"))},
		}
		if name == "constant" {
			checks = append(checks, []struct {
				symbol    string
				got, want float64
			}{
				{"α", v("α"), v("k0") / (v("ρ") * v("c0"))},
				{"R²/α", v("R²/α"), v("R") * v("R") / v("α")},
				{"Bi", v("Bi"), v("h") * v("R") / v("k0")},
				{"T,lim", v("T,lim"), v("T∞")},
			}...)
		}
		for _, c := range checks {
			if !near(c.got, c.want, 2e-9*math.Abs(c.want)) {
				t.Errorf("%s: %s printed as %.10g, recomputed %.10g", name, c.symbol, c.got, c.want)
			}
		}
		if v("n,f") < 6*v("n") || v("tol") > 1e-2 || math.Mod(v("N"), 8) != 0 || v("Δr,s") >= v("Δr,c") || v("ε,Q") > 1e-11 {
			t.Errorf("%s: statistics\n%v", name, r)
		}
		text := r.String()
		for _, want := range []string{"source: a mill certificate", "note: the rack touches at three points"} {
			if !strings.Contains(text, want) {
				t.Errorf("%s: no line %q", name, want)
			}
		}
		if len(r.Warnings) > 0 {
			t.Errorf("%s: warnings %q", name, r.Warnings)
		}
	}
	if _, ok := records["steel"].Value("Bi"); ok {
		t.Error("a Biot number although conditions vary")
	}
	if T := printed(t, records["steel"], "T,lim"); !near(T, 293.15, 1e-6) {
		t.Errorf("limit %g K, want 293.15 K", T)
	}
}

// A crude grid and crude steps say so.
func TestDerivationWarns(t *testing.T) {
	for _, c := range []struct {
		start, tolerance float64
		want             string
	}{{400, 0.1, "more cells"}, {301, 10, "smaller tolerance"}} {
		p := scaled(100, 8)
		p.Initial, p.Tolerance = kelvin(c.start), units.KelvinDifference.Of(c.tolerance)
		if text := strings.Join(solve(t, p).Derivation().Warnings, "\n"); !strings.Contains(text, c.want) {
			t.Errorf("tolerance %g K: warnings %q, want one with %q", c.tolerance, text, c.want)
		}
	}
}

// The record is that of the solution: what it says of the end is what At says.
func TestDerivationAgreesWithSolution(t *testing.T) {
	s := solve(t, steelSphere(30))
	r := s.Derivation()
	for symbol, place := range map[string]shape.Place{"T,c": shape.Centre(), "T,s": shape.Surface(), "T,m": shape.Mean()} {
		if v, _ := r.Value(symbol); v.SI() != at(t, s, place, 3600) {
			t.Errorf("%s is %s K, want %g K", symbol, strconv.FormatFloat(v.SI(), 'g', -1, 64), at(t, s, place, 3600))
		}
	}
}

// What a prediction does not decide stands beside it: fire, freezing, cracks, and a material that changes.
func TestDerivationCautions(t *testing.T) {
	changing := scaled(1, 10)
	changing.Material = fdm.Changing{Material: plain{1000, 1000, 1}, At: kelvin(450), Into: plain{1000, 1000, 2}}
	cracks := scaled(1, 10)
	cracks.Stop = []fdm.Event{fdm.Differs(shape.Surface(), shape.Centre(), units.KelvinDifference.Of(1))}
	freezes := scaled(1, 10)
	freezes.Material, freezes.Initial, freezes.Surface, freezes.Horizon = stillWater(0.5), kelvin(280), constant(10, 260), seconds(1000)
	for want, p := range map[string]fdm.Problem{
		"licensed practice": steelSphere(10), "measured temperatures": freezes, "its flaws": cracks, "changes for good": changing,
	} {
		if text := solve(t, p).Derivation().String(); !strings.Contains(text, want) {
			t.Errorf("no line with %q:\n%s", want, text)
		}
	}
	if text := solve(t, scaled(1, 10)).Derivation().String(); strings.Contains(text, "licensed") || strings.Contains(text, "measured") {
		t.Errorf("cautions of what is not:\n%s", text)
	}
}

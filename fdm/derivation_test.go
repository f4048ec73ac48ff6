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
			tol := 2e-9 * math.Abs(c.want)
			if c.symbol == "Q" { // the enthalpies are those of the material, the heat and T,m those of its table
				tol += v("Q") / (v("T0") - v("T,m")) * v("δT,table")
			}
			if !near(c.got, c.want, tol) {
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
		for _, w := range r.Warnings {
			if name != "steel" || !strings.HasPrefix(w, "quench: ") { // from 800 °C
				t.Errorf("%s: warning %q", name, w)
			}
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

// An accuracy that is asked for is what the error is compared with, however little the temperature changes; one that is
// missed is told beside the error.
func TestDerivationAndAccuracy(t *testing.T) {
	p := scaled(10, 0)
	p.Initial, p.Accuracy = kelvin(302), units.KelvinDifference.Of(0.5)
	if w := solve(t, p).Derivation().Warnings; len(w) > 0 {
		t.Errorf("2 K to 0.5 K: warnings %q", w)
	}
	p = scaled(10, 0)
	p.Uniform, p.Horizon, p.Accuracy = true, seconds(1e-7), units.KelvinDifference.Of(1e-5)
	s, err := p.Solve(t.Context())
	if err == nil || !strings.Contains(strings.Join(s.Derivation().Warnings, "\n"), "the accuracy that was asked for, 0.01 mK") {
		t.Errorf("%v, warnings %q", err, s.Derivation().Warnings)
	}
}

// What a prediction does not decide stands beside it: fire, quench, freezing, cracks; and a material that changes.
func TestDerivationCautions(t *testing.T) {
	changing := scaled(1, 10)
	changing.Material = fdm.Changing{Material: plain{1000, 1000, 1}, At: kelvin(450), Into: plain{1000, 1000, 2}}
	cracks := scaled(1, 10)
	cracks.Stop = []fdm.Event{fdm.Differs(shape.Surface(), shape.Centre(), units.KelvinDifference.Of(1))}
	freezes := scaled(1, 10)
	freezes.Material, freezes.Initial, freezes.Surface, freezes.Horizon = stillWater(0.5), kelvin(280), constant(10, 260), seconds(1000)
	fire := scaled(1, 10)
	fire.Surface = constant(100, 900)
	inside := scaled(1, 10)
	inside.Body, inside.Surface, inside.Opposite = sheet(0.1), constant(10, 400), constant(100, 900)
	oven := scaled(1, 10)
	oven.Surface = constant(100, 460)
	for _, c := range []struct {
		name    string
		problem fdm.Problem
		want    string // the one caution
	}{
		{"steel from 800 °C", steelSphere(100), "quench: "},
		{"heated to 900 K", fire, "fire: a face is heated above 200 °C;"},
		{"heated from the other side", inside, "fire: "},
		{"water that freezes", freezes, "melting and freezing: "},
		{"a limit of difference", cracks, "cracks: "},
		{"heated to 460 K", oven, ""},
		{"cooled from 400 K", scaled(1, 10), ""},
	} {
		var got []string
		for _, w := range solve(t, c.problem).Derivation().Warnings {
			if !strings.Contains(w, "0.1 %") {
				got = append(got, w)
			}
		}
		if len(got) > 1 || c.want == "" && len(got) > 0 || c.want != "" && (len(got) == 0 || !strings.HasPrefix(got[0], c.want)) {
			t.Errorf("%s: cautions %q, want one with %q", c.name, got, c.want)
		}
	}
	if text := solve(t, changing).Derivation().String(); !strings.Contains(text, "note: a material changes for good") {
		t.Errorf("no note of the change:\n%s", text)
	}
}

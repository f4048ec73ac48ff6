package lumped

import (
	"encoding/json"
	"math"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// printed reads the numbers of a derivation back from its text, in SI units.
func printed(t *testing.T, text string) map[string]float64 {
	t.Helper()
	scale := map[string]float64{"mm": 1e-3, "cm²": 1e-4, "mm²": 1e-6, "mL": 1e-6, "min": 60, "h": 3600}
	out := map[string]float64{}
	for _, m := range regexp.MustCompile(`(?m)(\S+) += (-?[0-9.e+-]+)(?: (\S+))?`).FindAllStringSubmatch(text, -1) {
		x, err := strconv.ParseFloat(m[2], 64)
		if err != nil {
			continue
		}
		if f, ok := scale[m[3]]; ok {
			x *= f
		} else if m[3] == "°C" {
			x += 273.15
		}
		out[m[1]] = x
	}
	return out
}

// The printed numbers alone give the answer again.
func TestRecomputeFromDerivation(t *testing.T) {
	s := solve(t, Problem{
		Body: sphere(0.05), Material: constantStuff(7800, 460, 35), Initial: units.Celsius.Of(450),
		Surface: constant(10, 373.15), Sources: []string{"a log book"}, Notes: []string{"chrome steel"},
	})
	text := s.Derivation().String()
	v := printed(t, text)
	tau := v["ρ"] * v["c"] * v["V"] / v["A"] / v["h"]
	within(t, "τ", v["τ"], tau, 1e-8*tau)
	within(t, "V/A", v["V/A"], v["V"]/v["A"], 1e-10)
	within(t, "Bi", v["Bi"], v["h"]*v["R"]/v["k"], 1e-10)
	within(t, "Bi(V/A)", v["Bi(V/A)"], v["h"]*v["V/A"]/v["k"], 1e-10)
	when := -tau * math.Log((423.15-v["T∞"])/(v["T0"]-v["T∞"]))
	got, err := s.TimeTo(shape.Centre(), kelvin(423.15))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "time", got.SI(), when, 1e-7*when)
	heat, err := s.HeatReleased(got)
	if err != nil {
		t.Fatal(err)
	}
	want := v["ρ"] * v["V"] * v["c"] * (v["T0"] - 423.15)
	within(t, "heat", heat.SI(), want, 1e-8*want)
	for _, text2 := range []string{"source: a log book", "note: chrome steel", "bound over all time"} {
		if !strings.Contains(text, text2) {
			t.Errorf("the derivation lacks %q:\n%s", text2, text)
		}
	}
	if strings.Count(text, "warning") != 1 || !strings.Contains(text, caution) {
		t.Errorf("a warning at a Biot number of %g:\n%s", s.Biot().Conduction, text)
	}
}

// Every kind of run has a derivation that marshals, with distinct symbols, and warns where lumping is
// poor.
func TestDerivations(t *testing.T) {
	poor := ball()
	poor.Material = constantStuff(1000, 2000, 0.2)
	endless := ball()
	endless.Until, endless.Surface = units.Temperature{}, flux(func(_, _ float64) float64 { return -100 })
	still := ball()
	still.Surface = constant(0, 300)
	for _, c := range []struct {
		name    string
		p       Problem
		warning bool
		symbol  string
	}{
		{"function", ball(), false, "T_limit"},
		{"poor conductor", poor, true, "steps"},
		{"no limit", endless, false, "evaluations"},
		{"no exchange", still, false, "T∞"},
	} {
		r := solve(t, c.p).Derivation()
		if _, err := json.Marshal(r); err != nil {
			t.Errorf("%s: %v", c.name, err)
		}
		if _, ok := r.Value(c.symbol); !ok {
			t.Errorf("%s: no %s in\n%v", c.name, c.symbol, r)
		}
		if len(r.Warnings) < 1 || r.Warnings[0] != caution || (len(r.Warnings) > 1) != c.warning {
			t.Errorf("%s: warnings %q", c.name, r.Warnings)
		}
		seen := map[string]bool{}
		for _, l := range r.Lines {
			if seen[l.Symbol] {
				t.Errorf("%s: symbol %s twice", c.name, l.Symbol)
			}
			seen[l.Symbol] = true
		}
	}
}

// The records of all closed forms marshal, have each symbol once, and say how.
func TestDerivationsOfClosedForms(t *testing.T) {
	for name, p := range closedCases() {
		r := solve(t, p).Derivation()
		if _, err := json.Marshal(r); err != nil {
			t.Errorf("%s: %v", name, err)
		}
		if !strings.Contains(r.String(), "closed form") {
			t.Errorf("%s: no closed form in\n%v", name, r)
		}
		seen := map[string]bool{}
		for _, l := range r.Lines {
			if seen[l.Symbol] {
				t.Errorf("%s: symbol %s twice\n%v", name, l.Symbol, r)
			}
			seen[l.Symbol] = true
		}
	}
}

package correlations_test

import (
	"errors"
	"math"
	"strings"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

func TestEveryCorrelationSaysWhatItIs(t *testing.T) {
	names := map[string]bool{}
	for c := range correlations.All() {
		if names[c.Name()] {
			t.Errorf("two correlations are named %q", c.Name())
		}
		names[c.Name()] = true
		if got, err := correlations.Lookup(c.Name()); err != nil || got != c {
			t.Errorf("Lookup(%q) = %v, %v", c.Name(), got.Name(), err)
		}
		for what, text := range map[string]string{
			"body": c.Body(), "formula": c.Formula(), "length": c.Length(), "citation": c.Citation(), "evidence": c.Evidence(),
			"scatter origin": c.Scatter().Origin,
		} {
			if text == "" {
				t.Errorf("%s has no %s", c.Name(), what)
			}
		}
		if strings.HasPrefix(c.Regime().String(), "no ") || strings.HasPrefix(c.Reference().String(), "no ") || strings.HasPrefix(c.Status().String(), "no ") {
			t.Errorf("%s: regime %s, reference %s, status %s", c.Name(), c.Regime(), c.Reference(), c.Status())
		}
		text := c.String()
		for _, part := range []string{c.Name(), c.Formula(), c.Length(), c.Citation(), c.Status().String(), c.Reference().String()} {
			if !strings.Contains(text, part) {
				t.Errorf("%s: String does not contain %q:\n%s", c.Name(), part, text)
			}
		}
		for r := range c.Ranges() {
			if !strings.Contains(text, r.String()) {
				t.Errorf("%s: String does not contain %q", c.Name(), r)
			}
		}
		if !strings.Contains(c.Source(), c.Citation()) {
			t.Errorf("source %q", c.Source())
		}
	}
	if len(names) != 4 {
		t.Errorf("%d correlations, want 4", len(names))
	}
	for range correlations.All() {
		break // a loop may stop early
	}
}

func TestUnknownNameListsTheKnown(t *testing.T) {
	_, err := correlations.Lookup("Smith cube")
	var bad *units.ArgumentError
	if !errors.As(err, &bad) || bad.Value != "Smith cube" || !strings.Contains(bad.Accepted, correlations.WhitakerSphere().Name()) {
		t.Errorf("error %v", err)
	}
}

func TestZeroCorrelationIsNone(t *testing.T) {
	var c correlations.Correlation
	g := groups{Re: 10, Pr: 0.7, ViscosityRatio: 1}
	for _, f := range []func(groups) (correlations.Result, error){c.Nu, c.Extrapolate} {
		var bad *units.ArgumentError
		if r, err := f(g); !errors.As(err, &bad) || r != (correlations.Result{}) {
			t.Errorf("the zero Correlation gives %v, %v", r, err)
		}
	}
	if c.Admits(g) || c.Name() != "no correlation" || c.String() != "no correlation" || c.Source() != "no correlation" || c.Regime().String() != "no regime" {
		t.Errorf("the zero Correlation is %v", c)
	}
	for r := range c.Ranges() {
		t.Errorf("the zero Correlation has a range %v", r)
	}
}

func TestBadGroups(t *testing.T) {
	for c := range correlations.All() {
		for _, x := range []float64{-1, math.NaN(), math.Inf(1), math.Inf(-1)} {
			good := groups{Re: 10, Pr: 1, Ra: 10, ViscosityRatio: 1}
			for name, g := range map[string]groups{
				"Reynolds number": {Re: x, Pr: good.Pr, Ra: good.Ra, ViscosityRatio: 1},
				"Prandtl number":  {Re: good.Re, Pr: x, Ra: good.Ra, ViscosityRatio: 1},
				"Rayleigh number": {Re: good.Re, Pr: good.Pr, Ra: x, ViscosityRatio: 1},
				"viscosity ratio": {Re: good.Re, Pr: good.Pr, Ra: good.Ra, ViscosityRatio: x},
			} {
				for _, f := range []func(groups) (correlations.Result, error){c.Nu, c.Extrapolate} {
					var bad *units.ArgumentError
					if _, err := f(g); !errors.As(err, &bad) || bad.Field != name {
						t.Errorf("%s with %s %v: %v", c.Name(), name, x, err)
					}
				}
				if c.Admits(g) {
					t.Errorf("%s admits %s %v", c.Name(), name, x)
				}
			}
		}
	}
	for _, x := range []float64{1.9, -1, math.NaN(), math.Inf(1)} {
		for i, pair := range [][2]float64{{x, 3}, {3, x}} {
			var bad *units.ArgumentError
			if _, err := correlations.Mix(correlations.Result{Nu: pair[0]}, correlations.Result{Nu: pair[1]}); !errors.As(err, &bad) {
				t.Errorf("Mix with Nu %v at %d: %v", x, i, err)
			}
		}
	}
	huge := correlations.Result{Nu: math.MaxFloat64}
	var bad *units.ArgumentError
	if m, err := correlations.Mix(huge, huge); !errors.As(err, &bad) || m != (correlations.Mixture{}) {
		t.Errorf("Mix that overflows: %v, %v", m, err)
	}
}

func TestWordsOfNoValue(t *testing.T) {
	for _, tt := range []struct{ got, want string }{
		{correlations.Regime(99).String(), "no regime"},
		{correlations.Reference(99).String(), "no reference temperature"},
		{correlations.Status(99).String(), "no status"},
		{correlations.Group(99).String(), "unknown group"},
		{correlations.Mixed.String(), "mixed"},
		{correlations.Prandtl.String(), "Prandtl number"},
	} {
		if tt.got != tt.want {
			t.Errorf("got %q, want %q", tt.got, tt.want)
		}
	}
}

func TestNuDoesNotAllocate(t *testing.T) {
	g := groups{Re: 100, Pr: 0.7, Ra: 1e6, ViscosityRatio: 1}
	for c := range correlations.All() {
		if n := testing.AllocsPerRun(100, func() { _, _ = c.Nu(g) }); n != 0 {
			t.Errorf("%s: Nu allocates %v times", c.Name(), n)
		}
		if n := testing.AllocsPerRun(100, func() { _ = c.Admits(g) }); n != 0 {
			t.Errorf("%s: Admits allocates %v times", c.Name(), n)
		}
	}
}

func FuzzNu(f *testing.F) {
	f.Add(0.0, 0.0, 0.0, 0.0)
	f.Add(100.0, 0.7, 1e6, 1.0)
	f.Add(1e308, 1e-308, 1e308, 1e308)
	f.Add(1e308, 1e308, 1e308, 1e308)
	f.Add(math.NaN(), math.Inf(1), -1.0, 5e-324)
	f.Fuzz(func(t *testing.T, re, pr, ra, mu float64) {
		g := groups{Re: re, Pr: pr, Ra: ra, ViscosityRatio: mu}
		for c := range correlations.All() {
			for _, nu := range []func(groups) (correlations.Result, error){c.Nu, c.Extrapolate} {
				r, err := nu(g)
				var bad *units.ArgumentError
				var out *units.RangeError
				switch {
				case err == nil && !(r.Nu >= 2 && r.Nu <= math.MaxFloat64):
					t.Errorf("%s at %+v: %+v without an error", c.Name(), g, r)
				case err != nil && !errors.As(err, &bad) && !errors.As(err, &out):
					t.Errorf("%s at %+v: error of type %T", c.Name(), g, err)
				}
			}
			if _, err := c.Nu(g); (err == nil) != c.Admits(g) {
				if _, ex := c.Extrapolate(g); ex == nil { // an overflow is no matter of the range
					t.Errorf("%s at %+v: Admits %v, error %v", c.Name(), g, c.Admits(g), err)
				}
			}
		}
	})
}

func BenchmarkNu(b *testing.B) {
	g := groups{Re: 100, Pr: 0.7, Ra: 1e6, ViscosityRatio: 1}
	for c := range correlations.All() {
		b.Run(c.Name(), func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				_, _ = c.Nu(g)
			}
		})
	}
}

package lumped

import (
	"context"
	"errors"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/units"
)

// radiating returns times at which a body that only radiates to surroundings near 0 K has the given temperatures:
// t = C (T⁻³ − T0⁻³)/(3 A ε σ).
func radiating(c, area, emissivity, T0 float64, kelvins []float64) []float64 {
	times := make([]float64, len(kelvins))
	for i, T := range kelvins {
		times[i] = c * (math.Pow(T, -3) - math.Pow(T0, -3)) / (3 * area * emissivity * sigma)
	}
	return times
}

// Radiation alone against its closed form: the emissivity of noiseless readings comes back.
func TestEmissivityAgainstClosedForm(t *testing.T) {
	const c, area, T0 = 250.0, 0.015, 1200.0
	falls := []float64{1200, 1150, 1100, 1020, 950, 900, 820, 700}
	for _, emissivity := range []float64{0.08, 0.35, 0.8, 1} {
		times := radiating(c, area, emissivity, T0, falls)
		var l Log
		for i, at := range times {
			l.Times = append(l.Times, seconds(at+500))
			l.Temperatures = append(l.Temperatures, kelvin(falls[i]))
		}
		for _, initial := range []units.Temperature{{}, kelvin(T0)} {
			s, err := SurfaceFit{
				Log: l, Capacity: joule(c), Area: units.SquareMetre.Of(area), Ambient: kelvin(300), Surroundings: kelvin(1), Initial: initial,
			}.Solve(context.Background())
			if err != nil {
				t.Fatal(err)
			}
			got, err := s.Emissivity()
			if err != nil {
				t.Fatal(err)
			}
			within(t, "emissivity", got.Value, emissivity, 1e-6)
			start, err := s.Initial()
			if err != nil {
				t.Fatal(err)
			}
			within(t, "start", start.Value.SI(), T0, 1e-4)
		}
	}
}

// Without radiation the coefficient is that of the fitted exponential.
func TestCoefficientAgainstExponential(t *testing.T) {
	r := rand.New(rand.NewSource(1))
	l := logOf(every(60, 15), func(x float64) float64 { return 290 + 80*math.Exp(-x/600) + 0.2*r.NormFloat64() })
	f := SurfaceFit{Log: l, Capacity: joule(600), Area: units.SquareMetre.Of(0.1), Ambient: kelvin(290), Find: FindCoefficient}
	s, err := f.Solve(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	got, err1 := s.Coefficient()
	want, err2 := solveFit(t, Fit{Log: l, Ambient: kelvin(290), Capacity: joule(600), Area: units.SquareMetre.Of(0.1)}).Coefficient()
	if err1 != nil || err2 != nil {
		t.Fatal(err1, err2)
	}
	within(t, "coefficient", got.Value.SI(), want.Value.SI(), 1e-5)
	within(t, "its error", got.StandardError.SI(), want.StandardError.SI(), 1e-4)
	within(t, "low", got.Low.SI(), want.Low.SI(), 0.02)
	within(t, "high", got.High.SI(), want.High.SI(), 0.02)
	if e, err := s.Emissivity(); err != nil || e.Value != 0 || e.High != 0 || !s.Agrees() {
		t.Errorf("stated emissivity: %v, %v", e, err)
	}
}

// The intervals of 300 logs of a body that loses heat by both hold the truth in 95 ± 4 %; one that is taken for
// radiating less than it does is doubted.
func TestCoverageOfEmissivity(t *testing.T) {
	r := rand.New(rand.NewSource(2))
	truth := solveNetwork(t, Network{
		Nodes: []Node{{Name: "x", Capacity: joule(300), Initial: kelvin(700)}},
		Links: []Link{{From: "x", To: "hall", Flow: func(a, b units.Temperature) (units.Power, error) {
			return units.Watt.Of(0.02 * (8*a.Sub(b).SI() + 0.7*sigma*(math.Pow(a.SI(), 4)-math.Pow(b.SI(), 4)))), nil
		}}},
		Surroundings: []Surroundings{steadily("hall", 295)},
		Horizon:      seconds(1500),
	})
	const trials = 300
	in, agrees := 0, 0
	for range trials {
		l := logOf(every(100, 16), func(x float64) float64 {
			T, err := truth.At("x", seconds(x))
			if err != nil {
				t.Fatal(err)
			}
			return T.SI() + 0.5*r.NormFloat64()
		})
		s, err := SurfaceFit{Log: l, Capacity: joule(300), Area: units.SquareMetre.Of(0.02), Ambient: kelvin(295), Coefficient: units.WattPerSquareMetreKelvin.Of(8)}.Solve(context.Background())
		if err != nil {
			t.Fatal(err)
		}
		e, err := s.Emissivity()
		if err != nil {
			t.Fatal(err)
		}
		in += holds(e.Low, 0.7, e.High, e.OpenLow, e.OpenHigh)
		one := solveFit(t, Fit{Log: l, Ambient: kelvin(295)})
		if s.Agrees() && !one.OneExponential() {
			agrees++
		}
	}
	asked(t, "emissivity", in, trials, 0.91, 0.99)
	if agrees < trials*95/100 {
		t.Errorf("agrees with radiation and not with one exponential in %d of %d", agrees, trials)
	}
}

func TestSurfaceFitRefusals(t *testing.T) {
	good := SurfaceFit{
		Log:      logOf(every(60, 6), func(x float64) float64 { return 290 + 80*math.Exp(-x/600) }),
		Capacity: joule(600), Area: units.SquareMetre.Of(0.1), Ambient: kelvin(290),
	}
	change := func(f func(f *SurfaceFit)) SurfaceFit {
		g := good
		g.Log = good.Log.copy()
		f(&g)
		return g
	}
	for _, c := range []struct {
		name string
		f    SurfaceFit
	}{
		{"nothing", SurfaceFit{}},
		{"no capacity", change(func(f *SurfaceFit) { f.Capacity = joule(0) })},
		{"no area", change(func(f *SurfaceFit) { f.Area = units.Area{} })},
		{"no ambient", change(func(f *SurfaceFit) { f.Ambient = units.Temperature{} })},
		{"emissivity 2", change(func(f *SurfaceFit) { f.Find, f.Emissivity = FindCoefficient, 2 })},
		{"emissivity stated and asked for", change(func(f *SurfaceFit) { f.Emissivity = 0.5 })},
		{"coefficient stated and asked for", change(func(f *SurfaceFit) { f.Find, f.Coefficient = FindCoefficient, units.WattPerSquareMetreKelvin.Of(1) })},
		{"negative coefficient", change(func(f *SurfaceFit) { f.Coefficient = units.WattPerSquareMetreKelvin.Of(-1) })},
		{"surroundings below 0 K", change(func(f *SurfaceFit) { f.Surroundings = kelvin(-1) })},
		{"initial below 0 K", change(func(f *SurfaceFit) { f.Initial = kelvin(-1) })},
		{"something else", change(func(f *SurfaceFit) { f.Find = 9 })},
		{"coverage", change(func(f *SurfaceFit) { f.Coverage = 0.1 })},
		{"two readings", change(func(f *SurfaceFit) { f.Log.Times, f.Log.Temperatures = f.Log.Times[:2], f.Log.Temperatures[:2] })},
		{"unsorted", change(func(f *SurfaceFit) { f.Log.Times[1] = seconds(-5) })},
	} {
		var a *units.ArgumentError
		if s, err := c.f.Solve(context.Background()); !errors.As(err, &a) || s != nil {
			t.Errorf("%s: %v", c.name, err)
		}
	}
	var none context.Context
	var a *units.ArgumentError
	if _, err := good.Solve(none); !errors.As(err, &a) {
		t.Errorf("no context: %v", err)
	}
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	if _, err := good.Solve(ctx); !errors.Is(err, context.Canceled) {
		t.Errorf("ended context: %v", err)
	}
	// A body at the ambient tells nothing.
	var c *units.ConvergenceError
	rest := change(func(f *SurfaceFit) {
		f.Ambient, f.Log = kelvin(290), logOf(every(60, 6), func(float64) float64 { return 290 })
	})
	if s, err := rest.Solve(context.Background()); !errors.As(err, &c) {
		t.Errorf("at rest: %v, %v", s, err)
	}
	zero := &FittedSurface{}
	for name, err := range map[string]error{
		"emissivity": second(zero.Emissivity()), "coefficient": second(zero.Coefficient()), "initial": second((*FittedSurface)(nil).Initial()),
	} {
		if !errors.As(err, &a) {
			t.Errorf("%s: %v", name, err)
		}
	}
	if d, n := zero.Deviation(); d.SI() != 0 || n != 0 || zero.Agrees() || len(zero.Derivation().Lines) != 0 {
		t.Error("the zero fit answers")
	}
}

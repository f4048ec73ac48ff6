package series_test

import (
	"context"
	"errors"
	"math"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// Whatever the readings, a fit is a body that gives them, or there is a typed error.
func FuzzFit(f *testing.F) {
	f.Add(0.016, 1.0, 2e6, 300.0, 363.15, 293.15, 0.0, 10.0, 340.0, 0.008, 20.0, 320.0, 0.5, uint8(0))
	f.Add(0.1, 0.5, 3.6e6, 0.0, 300.0, 400.0, 0.05, 3600.0, 320.0, 0.0, 3600.0, 380.0, 0.0, uint8(1))
	f.Add(1.0, 1e-3, 1e3, -1.0, 300.0, 250.0, 0.3, 1.0, 299.0, 0.1, 1e6, 260.0, 0.01, uint8(2))
	f.Add(1e-6, 400.0, 3e6, 1e9, 1e4, 1.0, 1e-7, 1e-9, 5e3, 0.0, 5e-324, 2.0, 1e3, uint8(3))
	f.Fuzz(func(t *testing.T, d, k, capacity, h, start, ambient, depth1, t1, T1, depth2, t2, T2, off float64, kind uint8) {
		size := units.Metre.Of(d)
		p := series.Problem{
			Body: []shape.Body{
				shape.Sphere(size), shape.Cylinder(size, size).Exposing(shape.Outside), shape.Plate(size, units.SquareMetre.Of(1)), shape.Brick(size, size.Scale(2), size.Scale(3)),
			}[kind%4],
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Density:      units.KilogramPerCubicMetre.Of(1000),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(capacity / 1000),
			Initial:      units.Kelvin.Of(start),
			Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Kelvin.Of(ambient)),
		}
		if h < 0 {
			p.Surface = boundary.Temperature(units.Kelvin.Of(ambient))
		}
		read := func(depth, seconds, kelvin float64) series.Reading {
			place := shape.Below(units.Metre.Of(depth))
			if depth < 0 {
				place = shape.Mean()
			}
			return series.Reading{Place: place, Time: units.Second.Of(seconds), Temperature: units.Kelvin.Of(kelvin), Error: units.KelvinDifference.Of(off)}
		}
		first, second := read(depth1, t1, T1), read(depth2, t2, T2)
		check := func(name string, fit series.Fit, err error, readings ...series.Reading) {
			t.Helper()
			if err != nil {
				var argument *units.ArgumentError
				var unidentified *series.UnidentifiedError
				var convergence *units.ConvergenceError
				if !errors.As(err, &argument) && !errors.As(err, &unidentified) && !errors.As(err, &convergence) {
					t.Errorf("%s: %v, want a typed error", name, err)
				}
				return
			}
			for _, x := range []float64{fit.Biot, fit.Fourier, fit.BiotSpread, fit.DiffusivitySpread} {
				if math.IsNaN(x) || x < 0 {
					t.Errorf("%s: Bi %v, Fo %v, spread %v and %v", name, fit.Biot, fit.Fourier, fit.BiotSpread, fit.DiffusivitySpread)
				}
			}
			s, err := fit.Problem.Solve(context.Background())
			if err != nil {
				t.Fatalf("%s: the problem of the fit: %v", name, err)
			}
			for _, r := range readings {
				T, err := s.At(r.Place, r.Time)
				if err != nil || !(math.Abs(T.SI()-r.Temperature.SI()) <= 1e-6*math.Abs(start-ambient)+1e-12*math.Max(start, ambient)) {
					t.Errorf("%s: %s after %v at %v, %v, want %v", name, r.Place, r.Time, T, err, r.Temperature)
				}
			}
		}
		ctx := context.Background()
		fit, err := p.FitCoefficient(ctx, first)
		check("coefficient", fit, err, first)
		fit, err = p.FitConductivity(ctx, first)
		check("conductivity", fit, err, first)
		fit, err = p.FitDiffusivity(ctx, first)
		check("diffusivity", fit, err, first)
		fit, err = p.FitBiotAndDiffusivity(ctx, first, second)
		check("both", fit, err, first, second)
		half := series.SemiInfinite{Conductivity: p.Conductivity, Density: p.Density, SpecificHeat: p.SpecificHeat, Initial: p.Initial, Surface: p.Surface}
		if h, err := half.FitCoefficient(ctx, units.Metre.Of(depth1), first.Time, first.Temperature); err == nil && !(h.SI() >= 0 && h.IsFinite()) {
			t.Errorf("coefficient of a thick body: %v", h)
		}
		if a, err := half.FitDiffusivity(ctx, units.Metre.Of(depth1), first.Time, first.Temperature); err == nil && !(a.SI() > 0 && a.IsFinite()) {
			t.Errorf("diffusivity of a thick body: %v", a)
		}
	})
}

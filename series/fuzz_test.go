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

// Whatever the numbers, nothing panics, nothing is NaN or infinite beside a nil error, temperatures stay
// between start and ambient, and what TimeTo says is so.
func FuzzSolve(f *testing.F) {
	f.Add(0.016, 1.0, 2500.0, 800.0, 300.0, 363.15, 293.15, 10.0, 313.15, 0.004)
	f.Add(1.0, 1.0, 1.0, 1.0, 2.0, 300.0, 400.0, 0.00625, 399.0, 0.5)
	f.Add(1e-9, 400.0, 9000.0, 385.0, 1e-12, 1e4, 1.0, 1e300, 1.0000001, 0.0)
	f.Add(1e30, 1e-3, 1e4, 1e4, 1e200, 1.0, 1e4, 5e-324, 2.0, 1e29)
	f.Add(0.1, 1.0, 1.0, 1.0, 0.0, 300.0, 200.0, 1.0, 250.0, math.NaN())
	f.Add(2.0, 1.0, 1.0, 1.0, 1e-320, 300.0, 200.0, math.Inf(1), 299.9999999999, -1.0)
	f.Fuzz(func(t *testing.T, d, k, rho, c, h, start, ambient, seconds, target, depth float64) {
		s, err := series.Problem{
			Body:         shape.Sphere(units.Metre.Of(d)),
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Density:      units.KilogramPerCubicMetre.Of(rho),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(c),
			Initial:      units.Kelvin.Of(start),
			Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Kelvin.Of(ambient)),
		}.Solve(context.Background())
		if err != nil {
			var argument *units.ArgumentError
			if s != nil || !errors.As(err, &argument) {
				t.Fatalf("%v, %v, want an ArgumentError alone", s, err)
			}
			return
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Error(err)
		}
		when := units.Second.Of(seconds)
		low, high := math.Min(start, ambient), math.Max(start, ambient)
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean(), shape.Below(units.Metre.Of(depth))} {
			if T, err := s.At(place, when); err == nil && !(T.SI() >= low && T.SI() <= high) {
				t.Errorf("%s after %v: %v K, want between %v and %v", place, when, T.SI(), low, high)
			}
			answer, err := s.TimeTo(place, units.Kelvin.Of(target))
			if err != nil {
				continue
			}
			if !(answer.SI() >= 0 && answer.IsFinite()) {
				t.Fatalf("%s at %v K after %v", place, target, answer)
			}
			T, err := s.At(place, answer)
			if err != nil {
				t.Fatal(err)
			}
			// a surface falls faster than the least time can say
			if answer.SI() > 1e-300 && !(math.Abs(T.SI()-target) <= 1e-12*high) {
				t.Errorf("%s at %v K after %v, where it is at %v K", place, target, answer, T.SI())
			}
		}
		if q, err := s.HeatReleased(when); err == nil && !q.IsFinite() {
			t.Errorf("released after %v: %v", when, q)
		}
		if e, err := s.TruncationError(when); err == nil && !(e.SI() > 0 && e.IsFinite()) {
			t.Errorf("error bound after %v: %v", when, e)
		}
	})
}

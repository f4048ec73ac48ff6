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

// Whatever the numbers of a wall, nothing panics, nothing is NaN or infinite beside a nil error, errors are typed, and
// what TimeTo says is so.
func FuzzWall(f *testing.F) {
	f.Add(0.16, 0.1, 1.2, 15.0, 80.0, 20.0, 600.0, 0.0, 300.0, 0.01, 250.0, uint16(0))
	f.Add(1.0, 0.5, 1.0, -1.0, 1e-9, 300.0, 400.0, 1e5, 0.00625, 0.1, 399.0, uint16(0x11))
	f.Add(1.0, 0.999999, 400.0, 1e12, -2.0, 1e4, 1.0, -1e9, 1e300, 1e-7, 2.0, uint16(0x102))
	f.Add(1.0, 1e-6, 1e-3, 0.0, 0.0, 300.0, 200.0, 1.0, 1e-30, 0.2, 310.0, uint16(0x203))
	f.Add(0.1, 0.0, 1.0, 3.0, math.NaN(), 300.0, 200.0, 1.0, 1.0, 0.2, 250.0, uint16(0x104))
	f.Add(0.1, 0.05, 1.0, 1e-200, 1e-200, 300.0, 200.0, 1e3, 1e9, 0.0, 250.0, uint16(0x111))
	f.Fuzz(func(t *testing.T, outer, inner, k, h1, h2, T1, T2, g, seconds, depth, target float64, kind uint16) {
		metre := units.Metre.Of
		condition := func(h, T float64) boundary.Condition {
			switch {
			case h == -1:
				return boundary.Temperature(units.Kelvin.Of(T))
			case h < 0:
				return boundary.Flux(units.WattPerSquareMetre.Of(h + 2))
			}
			return boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Kelvin.Of(T))
		}
		body := []shape.Body{
			shape.Plate(metre(outer), units.SquareMetre.Of(1)),
			shape.Tube(metre(outer), metre(inner), metre(1)),
			shape.HollowSphere(metre(outer), metre(inner)),
			shape.HollowSphere(metre(outer), metre(inner)).Exposing(shape.Inside),
			shape.Sphere(metre(outer)),
		}[kind%16%5]
		p := series.Problem{
			Body: body, Conductivity: units.WattPerMetreKelvin.Of(k), Density: units.KilogramPerCubicMetre.Of(1000), SpecificHeat: units.JoulePerKilogramKelvin.Of(1000),
			Initial: units.Kelvin.Of(280), Surface: condition(h1, T1), Source: units.WattPerCubicMetre.Of(g),
		}
		if kind%16%5 != 4 {
			p.Opposite = condition(h2, T2)
		}
		if kind&0x100 != 0 {
			p.Initial, p.Profile = units.Temperature{}, func(d units.Length) (units.Temperature, error) {
				return units.Kelvin.Of(300 + 90*math.Cos(9*d.SI())), nil
			}
		}
		if kind&0x200 != 0 {
			p.SourceLog = []series.SourceReading{{units.Second.Of(0), units.WattPerCubicMetre.Of(g)}, {units.Second.Of(seconds), units.WattPerCubicMetre.Of(-g)}, {units.Second.Of(seconds), units.WattPerCubicMetre.Of(h1)}, {units.Second.Of(3 * seconds), units.HeatSource{}}}
		}
		typed := func(what string, err error) {
			var argument *units.ArgumentError
			var never *units.NeverError
			var horizon *units.HorizonError
			var convergence *units.ConvergenceError
			if err != nil && !errors.As(err, &argument) && !errors.As(err, &never) && !errors.As(err, &horizon) && !errors.As(err, &convergence) {
				t.Errorf("%s: %v, want a typed error", what, err)
			}
		}
		s, err := p.Solve(context.Background())
		typed("solve", err)
		if err != nil {
			return
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Error(err)
		}
		when := units.Second.Of(seconds)
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Opposite(), shape.Mean(), shape.Below(metre(depth))} {
			T, err := s.At(place, when)
			if typed("at", err); err == nil && !(T.SI() > 0 && T.IsFinite()) {
				t.Errorf("%s after %v: %v K", place, when, T.SI())
			}
			answer, err := s.TimeTo(place, units.Kelvin.Of(target))
			if typed("time", err); err != nil {
				continue
			}
			if !(answer.SI() >= 0 && answer.IsFinite()) {
				t.Fatalf("%s at %v K after %v", place, target, answer)
			}
			now, err := s.At(place, answer)
			if typed("then", err); err != nil || answer.SI() == 0 {
				continue
			}
			bound, err := s.TruncationError(answer)
			if err != nil {
				t.Fatal(err)
			}
			if slack := 100*bound.SI() + 1e-7*(math.Max(target, now.SI())+math.Abs(g)); answer.SI() > 1e-290 && !(math.Abs(now.SI()-target) <= slack) {
				t.Errorf("%s at %v K after %v, where it is at %v K, bound %v", place, target, answer, now.SI(), bound)
			}
		}
		if e, err := s.TruncationError(when); err == nil && !(e.SI() >= 0 && e.IsFinite()) {
			t.Errorf("error bound after %v: %v", when, e)
		}
		for _, face := range []shape.Place{shape.Surface(), shape.Opposite()} {
			q, err := s.Flux(face, when)
			if typed("flux", err); err == nil && !q.IsFinite() {
				t.Errorf("flux %v", q)
			}
			heat, err := s.HeatThrough(face, when)
			if typed("heat", err); err == nil && !heat.IsFinite() {
				t.Errorf("heat %v", heat)
			}
		}
		if q, err := s.HeatReleased(when); err == nil && !q.IsFinite() {
			t.Errorf("released %v", q)
		}
	})
}

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
	f.Add(0.016, 1.0, 2500.0, 800.0, 300.0, 363.15, 293.15, 10.0, 313.15, 0.004, uint8(0))
	f.Add(1.0, 1.0, 1.0, 1.0, 2.0, 300.0, 400.0, 0.00625, 399.0, 0.5, uint8(1))
	f.Add(1e-9, 400.0, 9000.0, 385.0, 1e-12, 1e4, 1.0, 1e300, 1.0000001, 0.0, uint8(2))
	f.Add(1e30, 1e-3, 1e4, 1e4, 1e200, 1.0, 1e4, 5e-324, 2.0, 1e29, uint8(3))
	f.Add(0.1, 1.0, 1.0, 1.0, 0.0, 300.0, 200.0, 1.0, 250.0, math.NaN(), uint8(4))
	f.Add(2.0, 1.0, 1.0, 1.0, 1e-320, 300.0, 200.0, math.Inf(1), 299.9999999999, -1.0, uint8(5))
	f.Add(0.03, 1.0, 1.0, 1.0, -1.0, 300.0, 200.0, 1e-5, 201.0, 0.01, uint8(6))
	f.Add(0.03, 1.0, 1.0, 1.0, 1e17, 300.0, 200.0, 1e-7, 201.0, 1e-9, uint8(1))
	f.Fuzz(func(t *testing.T, d, k, rho, c, h, start, ambient, seconds, target, depth float64, kind uint8) {
		size := units.Metre.Of(d)
		body := []shape.Body{
			shape.Sphere(size),
			shape.Cylinder(size, size).Exposing(shape.Outside),
			shape.Plate(size, units.SquareMetre.Of(1)),
			shape.Plate(size, units.SquareMetre.Of(1)).Exposing(shape.Back),
			shape.Cylinder(size, size.Scale(1.7)),
			shape.Brick(size, size.Scale(3), size.Scale(1e3)),
			shape.Brick(size, size, size.Scale(1e160)),
		}[kind%7]
		surface := boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Kelvin.Of(ambient))
		if h < 0 {
			surface = boundary.Temperature(units.Kelvin.Of(ambient))
		}
		s, err := series.Problem{
			Body:         body,
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Density:      units.KilogramPerCubicMetre.Of(rho),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(c),
			Initial:      units.Kelvin.Of(start),
			Surface:      surface,
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
			if one, off, err := s.OneTerm(place, when); err == nil && !(one.IsFinite() && off.IsFinite()) {
				t.Errorf("%s after %v: first term %v, off by %v", place, when, one, off)
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
			met := h < 0 && answer.SI() == 0 // a prescribed surface is past the target at once
			// a surface falls faster than the least time can say
			if answer.SI() > 1e-300 && !met && !(math.Abs(T.SI()-target) <= 1e-12*high) {
				t.Errorf("%s at %v K after %v, where it is at %v K", place, target, answer, T.SI())
			}
		}
		if q, err := s.HeatReleased(when); err == nil && !q.IsFinite() {
			t.Errorf("released after %v: %v", when, q)
		}
		if e, err := s.TruncationError(when); err == nil && !(e.SI() >= 0 && e.IsFinite()) {
			t.Errorf("error bound after %v: %v", when, e)
		}
	})
}

// Whatever the numbers, a log gives finite temperatures or an ArgumentError.
func FuzzTrack(f *testing.F) {
	f.Add(0.016, 1.0, 300.0, 363.15, 293.15, 1.0, 300.0, 2.0, 310.0, uint8(0))
	f.Add(1.0, 1e-3, 0.0, 363.15, 293.15, 0.0, 400.0, 0.0, 310.0, uint8(1))
	f.Add(1e-6, 1e3, 1e9, 363.15, 293.15, 1e-30, 400.0, 1e30, 1e-3, uint8(2))
	f.Add(90.004, 1.0, 182.0, 386.15, 576.67, 100.0, 55.0, 141.0, 2170.0, uint8(0)) // a thin layer of a large body
	f.Add(1e-6, 1e3, -1.0, 363.15, 293.15, 1e-9, 400.0, 1e300, 1e4, uint8(2))
	f.Fuzz(func(t *testing.T, d, k, h, start, ambient, t1, T1, t2, T2 float64, kind uint8) {
		size := units.Metre.Of(d)
		surface := boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Kelvin.Of(ambient))
		if h < 0 {
			surface = boundary.Temperature(units.Kelvin.Of(ambient))
		}
		s, err := series.Problem{
			Body: []shape.Body{
				shape.Sphere(size), shape.Cylinder(size, size).Exposing(shape.Outside), shape.Plate(size, units.SquareMetre.Of(1)),
			}[kind%3],
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Density:      units.KilogramPerCubicMetre.Of(1000),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(1000),
			Initial:      units.Kelvin.Of(start),
			Surface:      surface,
		}.Solve(context.Background())
		if err != nil || math.Max(start, ambient) > 1e5 {
			return
		}
		var argument *units.ArgumentError
		for _, place := range places {
			track, err := s.Track(place)
			if err != nil {
				if !errors.As(err, &argument) {
					t.Errorf("%s: %v, want an ArgumentError", place, err)
				}
				continue
			}
			low, high := math.Min(start, ambient), math.Max(start, ambient)
			for _, sample := range [][2]float64{{t1, T1}, {t1, T2}, {t2, T1}, {t2 + t1, T2}} {
				T, err := track.Add(units.Second.Of(sample[0]), units.Kelvin.Of(sample[1]))
				if err != nil {
					if !errors.As(err, &argument) {
						t.Errorf("%s: %v, want an ArgumentError", place, err)
					}
					continue
				}
				low, high = math.Min(low, sample[1]), math.Max(high, sample[1])
				if slack := 1e-4 * high; !(T.SI() >= low-slack && T.SI() <= high+slack) {
					t.Errorf("%s at %v: %v K, beyond %v to %v", place, sample, T.SI(), low, high)
				}
			}
			if o, err := s.Oscillation(place, units.Second.Of(t1)); err == nil && !(o.Ratio >= 0 && o.Ratio <= 1 && o.Lag.SI() >= 0 && o.Lag.IsFinite()) {
				t.Errorf("%s: ratio %v, lag %v", place, o.Ratio, o.Lag)
			}
		}
	})
}

// Whatever the course, temperatures stay between those of the start and the ambient, and what TimeTo says is so.
func FuzzFollowing(f *testing.F) {
	f.Add(0.016, 1.0, 300.0, 363.15, 293.15, 10.0, 30.0, 310.0, uint8(0))
	f.Add(0.1, 0.5, -1.0, 300.0, 280.0, 600.0, 0.01, 320.0, uint8(1))
	f.Add(0.1, 50.0, 1e4, 300.0, 280.0, 100.0, -0.01, 320.0, uint8(2))
	f.Add(0.02, 1.0, 0.0, 300.0, 280.0, 0.0, 400.0, 290.0, uint8(7))
	f.Fuzz(func(t *testing.T, d, k, h, start, ambient, seconds, x, target float64, kind uint8) {
		size, K, when := units.Metre.Of(d), units.Kelvin.Of, units.Second.Of(seconds)
		course := []boundary.Course{
			boundary.Oscillation(K(ambient), units.KelvinDifference.Of(x), when, units.Second.Of(start)),
			boundary.Ramp(K(ambient), units.KelvinPerSecond.Of(x)),
			boundary.Log([]units.Duration{{}, when, when, when.Scale(2)}, []units.Temperature{K(ambient), K(x), K(target), K(ambient)}),
			boundary.Log([]units.Duration{{}, when, when, when.Scale(2)}, []units.Temperature{K(ambient), K(x), K(target), K(ambient)}).Holding(),
		}[kind%4]
		surface := boundary.Following(units.WattPerSquareMetreKelvin.Of(h), course)
		if h < 0 {
			surface = boundary.TemperatureFollowing(course)
		}
		s, err := series.Problem{
			Body: []shape.Body{
				shape.Sphere(size), shape.Cylinder(size, size).Exposing(shape.Outside), shape.Plate(size, units.SquareMetre.Of(1)), shape.Cylinder(size, size),
			}[kind/4%4],
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Density:      units.KilogramPerCubicMetre.Of(1000),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(1000),
			Initial:      K(start),
			Surface:      surface,
		}.Solve(context.Background())
		var argument *units.ArgumentError
		if err != nil {
			if s != nil || !errors.As(err, &argument) {
				t.Fatalf("%v, %v, want an ArgumentError alone", s, err)
			}
			return
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Error(err)
		}
		low, high := math.Min(start, ambient), math.Max(start, ambient)
		switch kind % 4 {
		case 0:
			low, high = math.Min(low, ambient-math.Abs(x)), math.Max(high, ambient+math.Abs(x))
		case 1:
			low, high = math.Min(low, ambient+x*seconds), math.Max(high, ambient+x*seconds)
		default:
			low, high = math.Min(low, math.Min(x, target)), math.Max(high, math.Max(x, target))
		}
		for _, place := range places {
			T, err := s.At(place, when)
			if slack := 1e-11 * high; err == nil && !(T.SI() >= low-slack && T.SI() <= high+slack) {
				t.Errorf("%s after %v: %v K, beyond %v to %v", place, when, T.SI(), low, high)
			}
			answer, err := s.TimeTo(place, K(target))
			if err != nil || answer.SI() == 0 {
				continue
			}
			if !(answer.SI() > 0 && answer.IsFinite()) {
				t.Fatalf("%s at %v K after %v", place, target, answer)
			}
			now, _ := course.At(answer)
			if T, err := s.At(place, answer); err != nil {
				t.Errorf("%s at %v K after %v: %v", place, target, answer, err)
			} else if answer.SI() > 1e-280 && place != shape.Surface() && !(math.Abs(T.SI()-target) <= 1e-9*math.Max(high, now.SI())) { // which may jump
				t.Errorf("%s at %v K after %v, where it is at %v K", place, target, answer, T.SI())
			}
		}
		if q, err := s.HeatReleased(when); err == nil && !q.IsFinite() {
			t.Errorf("released after %v: %v", when, q)
		}
		if e, err := s.TruncationError(when); err == nil && !(e.SI() >= 0 && e.IsFinite()) {
			t.Errorf("error bound after %v: %v", when, e)
		}
	})
}

// Whatever the numbers, a thick body gives finite answers or typed errors, and what TimeTo says is so.
func FuzzSemiInfinite(f *testing.F) {
	f.Add(1.0, 1e6, 300.0, 363.15, 293.15, 10.0, 0.01, 313.15, uint8(0))
	f.Add(1e-9, 1e3, 1e-12, 1.0, 1e4, 1e-20, 1e-9, 2.0, uint8(1))
	f.Add(1e3, 1e9, -5.0, 300.0, 250.0, 1e20, 1e3, 299.0, uint8(2))
	f.Add(400.0, 3e6, 1e200, 300.0, 250.0, 5e-324, 0.0, 250.0000001, uint8(0))
	f.Fuzz(func(t *testing.T, k, capacity, h, start, ambient, seconds, depth, target float64, kind uint8) {
		s, err := series.SemiInfinite{
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Density:      units.KilogramPerCubicMetre.Of(1),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(capacity),
			Initial:      units.Kelvin.Of(start),
			Surface: []boundary.Condition{
				boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Kelvin.Of(ambient)),
				boundary.Temperature(units.Kelvin.Of(ambient)), boundary.Flux(units.WattPerSquareMetre.Of(h)),
			}[kind%3],
		}.Solve(context.Background())
		var argument *units.ArgumentError
		if err != nil {
			if s != nil || !errors.As(err, &argument) {
				t.Fatalf("%v, %v, want an ArgumentError alone", s, err)
			}
			return
		}
		x, when, wanted := units.Metre.Of(depth), units.Second.Of(seconds), units.Kelvin.Of(target)
		if T, err := s.At(x, when); err == nil && !(T.SI() > 0 && T.IsFinite()) {
			t.Errorf("%v after %v: %v", x, when, T)
		}
		if q, err := s.Flux(when); err == nil && !q.IsFinite() {
			t.Errorf("flux after %v: %v", when, q)
		}
		if q, err := s.HeatReleased(units.SquareMetre.Of(1), when); err == nil && !q.IsFinite() {
			t.Errorf("heat after %v: %v", when, q)
		}
		if d, err := s.Depth(wanted, when); err == nil && !(d.SI() >= 0 && d.IsFinite()) {
			t.Errorf("depth of %v after %v: %v", wanted, when, d)
		}
		if o, err := s.Oscillation(x, when); err == nil && !(o.Ratio >= 0 && o.Ratio <= 1 && o.Lag.SI() >= 0 && o.Lag.IsFinite()) {
			t.Errorf("oscillation: ratio %v, lag %v", o.Ratio, o.Lag)
		}
		if d, err := s.PenetrationDepth(when); err == nil && !d.IsFinite() {
			t.Errorf("penetration depth %v", d)
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Error(err)
		}
		answer, err := s.TimeTo(x, wanted)
		if err != nil {
			return
		}
		if !(answer.SI() >= 0 && answer.IsFinite()) {
			t.Fatalf("%v at %v after %v", x, wanted, answer)
		}
		high := math.Max(start, math.Max(ambient, target))
		if T, err := s.At(x, answer); err == nil && answer.SI() > 1e-290 && !(math.Abs(T.SI()-target) <= 1e-10*high) {
			t.Errorf("%v at %v K after %v, where it is at %v K", x, target, answer, T.SI())
		}
	})
}

// Whatever the numbers, a constant flux gives finite answers or typed errors, and what TimeTo says is so.
func FuzzFlux(f *testing.F) {
	f.Add(0.016, 1.0, 2e6, 300.0, 363.15, 10.0, 313.15, 0.004, uint8(0))
	f.Add(1e-9, 400.0, 9e3, -1e9, 300.0, 1e-20, 1e4, 0.0, uint8(1))
	f.Add(1e9, 1e-3, 1e9, 1e-9, 300.0, 1e300, 299.9999, 1.0, uint8(4))
	f.Add(75.0, 447.0, 9e4, -5.6e11, 300.0, 56.0, 925.925925925926, -50.0, uint8(1)) // rounding of q R/k shows
	f.Add(0.1, 1.0, 1.0, 1.0, 300.0, 0.0051, 299.9999999, 0.05, uint8(5))
	f.Fuzz(func(t *testing.T, d, k, capacity, q, start, seconds, target, depth float64, kind uint8) {
		size := units.Metre.Of(d)
		s, err := series.Problem{
			Body: []shape.Body{
				shape.Sphere(size), shape.Cylinder(size, size).Exposing(shape.Outside), shape.Plate(size, units.SquareMetre.Of(1)),
				shape.Cylinder(size, size.Scale(1.7)), shape.Brick(size, size.Scale(3), size.Scale(1e3)),
			}[kind%5],
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Density:      units.KilogramPerCubicMetre.Of(1),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(capacity),
			Initial:      units.Kelvin.Of(start),
			Surface:      boundary.Flux(units.WattPerSquareMetre.Of(q)),
		}.Solve(context.Background())
		var argument *units.ArgumentError
		if err != nil {
			if s != nil || !errors.As(err, &argument) {
				t.Fatalf("%v, %v, want an ArgumentError alone", s, err)
			}
			return
		}
		when := units.Second.Of(seconds)
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean(), shape.Below(units.Metre.Of(depth))} {
			if T, err := s.At(place, when); err == nil && !(T.SI() > 0 && T.IsFinite()) {
				t.Errorf("%s after %v: %v", place, when, T)
			}
			answer, err := s.TimeTo(place, units.Kelvin.Of(target))
			if err != nil {
				continue
			}
			if !(answer.SI() >= 0 && answer.IsFinite()) {
				t.Fatalf("%s at %v K after %v", place, target, answer)
			}
			bound, err := s.TruncationError(answer)
			if err != nil {
				continue
			}
			if T, err := s.At(place, answer); err == nil && answer.SI() > 1e-290 && !(math.Abs(T.SI()-target) <= 1e-10*math.Max(start, target)+2*bound.SI()) {
				t.Errorf("%s at %v K after %v, where it is at %v K", place, target, answer, T.SI())
			}
		}
		if q, err := s.HeatReleased(when); err == nil && !q.IsFinite() {
			t.Errorf("released %v", q)
		}
		if e, err := s.TruncationError(when); err == nil && !(e.SI() >= 0 && e.IsFinite()) {
			t.Errorf("error bound %v", e)
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Error(err)
		}
	})
}

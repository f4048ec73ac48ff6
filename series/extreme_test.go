package series_test

import (
	"errors"
	"math/rand"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// The slowest place is the centre, which no point comes after; the fastest is the corner, which no point comes before.
func TestSlowestAndFastest(t *testing.T) {
	target := units.Celsius.Of(45)
	r := rand.New(rand.NewSource(11))
	for _, stone := range stones() {
		for _, surface := range []boundary.Condition{
			boundary.Constant(units.WattPerSquareMetreKelvin.Of(300), units.Celsius.Of(20)),
			boundary.Temperature(units.Celsius.Of(20)),
			boundary.Flux(units.WattPerSquareMetre.Of(4000)),
		} {
			p := stone.problem
			p.Surface = surface
			s := solve(t, p)
			slow, err1 := s.TimeTo(shape.Slowest(), target)
			fast, err2 := s.TimeTo(shape.Fastest(), target)
			centre, err3 := s.TimeTo(shape.Centre(), target)
			if err := errors.Join(err1, err2, err3); err != nil {
				t.Fatal(err)
			}
			if slow != centre || !(fast.SI() < slow.SI()) {
				t.Errorf("%s, %v: slowest %v, centre %v, fastest %v", stone.name, surface, slow, centre, fast)
			}
			for range 200 {
				var point []units.Length
				for _, f := range stone.problem.Body.Factors() {
					point = append(point, f.ConductionLength().Scale(r.Float64()))
				}
				late, err1 := s.AtPoint(slow, point...)
				early, err2 := s.AtPoint(fast, point...)
				if err := errors.Join(err1, err2); err != nil {
					t.Fatal(err)
				}
				if late.Sub(target).SI() > 1e-10 || early.Sub(target).SI() < -1e-10 {
					t.Fatalf("%s, %v: the point %v is at %v when the slowest, and at %v when the fastest is at %v", stone.name, surface, point, late, early, target)
				}
			}
			var corner []units.Length
			for _, f := range stone.problem.Body.Factors() {
				corner = append(corner, f.ConductionLength())
			}
			if T, err := s.AtPoint(fast, corner...); err != nil || (T.Sub(target).Abs().SI() > 1e-9 && fast.SI() > 0) {
				t.Errorf("%s, %v: the corner is at %v, %v, want %v", stone.name, surface, T, err, target)
			}
		}
	}
}

// They are places of the time to a temperature alone, which say what they are where it is never reached.
func TestSlowestIsNoPlaceOtherwise(t *testing.T) {
	s := solve(t, marble())
	var argument *units.ArgumentError
	for _, place := range []shape.Place{shape.Slowest(), shape.Fastest()} {
		if _, err := s.At(place, units.Second.Of(1)); !errors.As(err, &argument) {
			t.Errorf("temperature of the %s: %v, want an ArgumentError", place, err)
		}
		var never *units.NeverError
		if _, err := s.TimeTo(place, units.Celsius.Of(10)); !errors.As(err, &never) || never.Place != place.String() {
			t.Errorf("%s at 10 °C: %v, want a NeverError", place, err)
		}
	}
	var none series.Solution
	if _, err := none.TimeTo(shape.Slowest(), units.Celsius.Of(30)); !errors.As(err, &argument) {
		t.Errorf("zero Solution: %v, want an ArgumentError", err)
	}
}

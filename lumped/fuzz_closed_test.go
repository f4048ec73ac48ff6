package lumped

import (
	"context"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// Whatever the constants of the surface are, nothing panics and a nil error comes with finite numbers; a time is one at which the
// body is at the target.
func FuzzConstants(f *testing.F) {
	f.Add(uint8(0), 10.0, 300.0, 0.25, 50.0, 400.0, 0.0, 0.02, 320.0, 900.0)
	f.Add(uint8(1), 0.8, 300.0, 0.0, 1.0, 1200.0, 1e5, 0.02, 600.0, 900.0)
	f.Add(uint8(2), 10.0, 300.0, 0.01, 200.0, 290.0, -1e4, 0.02, 295.0, 900.0)
	f.Add(uint8(3), 10.0, 300.0, 20.0, 86400.0, 290.0, 0.0, 0.02, 305.0, 1e5)
	f.Add(uint8(4), 10.0, 300.0, 20.0, 50.0, 290.0, 0.0, 0.02, 305.0, 1e5)
	f.Add(uint8(5), -500.0, 300.0, 20.0, 50.0, 290.0, 1.0, 0.02, 305.0, 1e5)
	f.Add(uint8(14), 10.0, 300.0, 20.0, 50.0, 290.0, 0.0, 0.02, 305.0, 1e5)
	f.Add(uint8(1), 0.275, 548.0, 18356.0, 373.0, 20.45, 24224.0, 11.92, 9476.0, 4.9e7)
	f.Add(uint8(1), 1e-300, 1e-3, 0.0, 1.0, 1e300, 1e300, 1e-20, 1e-3, 1e300)
	f.Fuzz(func(t *testing.T, kind uint8, a, ambient, b, c, start, source, diameter, target, when float64) {
		h := units.WattPerSquareMetreKelvin.Of(a)
		surfaces := []boundary.Condition{
			boundary.Power(h, units.KelvinDifference.Of(c), b, kelvin(ambient)),
			boundary.Radiation(a, kelvin(ambient)),
			boundary.Following(h, boundary.Ramp(kelvin(ambient), units.KelvinPerSecond.Of(b))),
			boundary.Following(h, boundary.Oscillation(kelvin(ambient), units.KelvinDifference.Of(b), seconds(c), seconds(b))),
			boundary.Following(h, boundary.Log([]units.Duration{seconds(0), seconds(c), seconds(c), seconds(2 * c)}, []units.Temperature{kelvin(ambient), kelvin(ambient + b), kelvin(ambient), kelvin(start)}).Holding()),
			boundary.Flux(units.WattPerSquareMetre.Of(a)),
			boundary.Sum(boundary.Constant(h, kelvin(ambient)), boundary.Flux(units.WattPerSquareMetre.Of(b))),
		}
		p := Problem{
			Body: sphere(diameter), Material: constantStuff(2000, 1000, 3), Initial: kelvin(start), Horizon: seconds(when),
			Surface: surfaces[int(kind)%len(surfaces)], Source: units.WattPerCubicMetre.Of(source), FirstOrder: kind >= 128,
		}
		if tau := 2e6 * diameter / a; kind%7 == 3 && !(when < 1e4*c && when < 1e6*tau) {
			return // long, not wrong
		}
		ctx, cancel := context.WithTimeout(context.Background(), 0)
		cancel()
		if _, err := p.Solve(ctx); err == nil {
			t.Error("a context that has ended is not noticed")
		}
		s, _ := p.solveBriefly()
		if s == nil {
			return
		}
		for _, x := range []float64{0, when / 3, when} {
			if got, err := s.Mean(seconds(x)); err == nil && !(got.SI() > 0 && got.IsFinite()) {
				t.Errorf("%v at %g s", got, x)
			}
			if got, err := s.HeatReleased(seconds(x)); err == nil && !got.IsFinite() {
				t.Errorf("heat %v", got)
			}
			if got, err := s.Rate(seconds(x)); err == nil && !got.IsFinite() {
				t.Errorf("rate %v", got)
			}
			if got, err := s.TimeConstant(seconds(x)); err == nil && !(got.SI() > 0 && got.IsFinite()) {
				t.Errorf("time constant %v", got)
			}
			if got, err := s.InternalDifference(seconds(x)); err == nil && !got.IsFinite() {
				t.Errorf("difference %v", got)
			}
		}
		if got, err := s.TimeTo(shape.Mean(), kelvin(target)); err == nil {
			if !(got.SI() >= 0 && got.IsFinite()) {
				t.Errorf("time %v", got)
			}
			at, err := s.Mean(got)
			if got.SI() > 0 && (err != nil || math.Abs(at.SI()-target) > 1e-6*(math.Abs(target)+start)) {
				t.Errorf("%g K at %v, where it is at %v, %v", target, got, at, err)
			}
		}
		if all, err := s.Crossings(shape.Surface(), kelvin(target)); err == nil {
			for i, c := range all {
				if !(c.Time.SI() >= 0 && c.Time.IsFinite()) || i > 0 && c.Time.Compare(all[i-1].Time) <= 0 {
					t.Errorf("crossings %v", all)
				}
			}
		}
		if all, err := s.Within(shape.Mean(), kelvin(target), kelvin(target+b)); err == nil {
			for _, stay := range all {
				if !(stay.To.Compare(stay.From) > 0 && stay.To.IsFinite()) {
					t.Errorf("stays %v", all)
				}
			}
		}
		s.RateCrossings(units.KelvinPerSecond.Of(b))
		if got, err := s.LumpingError(shape.Surface()); err == nil && !(got.SI() >= 0 && got.IsFinite()) {
			t.Errorf("lumping error %v", got)
		}
		if got, err := s.LumpingErrorInTime(shape.Centre(), kelvin(target)); err == nil && !got.IsFinite() {
			t.Errorf("lumping error in time %v", got)
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Errorf("derivation: %v", err)
		}
	})
}

// solveBriefly ends an integration that takes long, for a stiff problem is no fault.
func (p Problem) solveBriefly() (*Solution, error) {
	ctx, cancel := context.WithCancel(context.Background())
	defer cancel()
	calls := 0
	if s, err := p.Solve(ctx); err == nil && s.path == nil {
		return s, nil
	}
	q := p
	inner := p.Surface
	q.Surface = boundary.Function(func(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
		if calls++; calls > 5000 {
			cancel()
		}
		return inner.Flux(t, wall)
	})
	return q.Solve(ctx)
}

package lumped

import (
	"context"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// Whatever goes in, nothing panics, a nil error comes with finite numbers, and a body between two
// temperatures stays between them.
func FuzzSolve(f *testing.F) {
	f.Add(0.05, 1000.0, 2000.0, 0.0, 15.0, 10.0, 373.15, 298.15, 318.15, 3600.0, true)
	f.Add(0.05, 1000.0, 2000.0, 1.0, 15.0, 10.0, 373.15, 298.15, 318.15, 3600.0, false)
	f.Add(1e-300, 1e300, 1e-9, 0.0, 1e9, 1e300, 1e-3, 1e9, 5.0, 1e-9, true)
	f.Add(math.Inf(1), math.NaN(), -1.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.0, false)
	f.Fuzz(func(t *testing.T, diameter, rho, c0, c1, k, h, start, ambient, target, when float64, byConstants bool) {
		m := stuff{rho: rho, c0: c0, c1: c1, k0: k, low: 1, high: 5000}
		surface := constant(h, ambient)
		if !byConstants {
			surface = flux(func(_, wall float64) float64 { return h * (wall - ambient) })
		}
		ctx, cancel := context.WithCancel(context.Background())
		defer cancel()
		calls := 0
		limited := boundary.Function(func(at units.Duration, wall units.Temperature) (units.HeatFlux, error) {
			if calls++; calls > 5000 { // a stiff problem over a long time is no fault
				cancel()
			}
			return surface.Flux(at, wall)
		})
		if byConstants {
			limited = surface
		}
		if tau := rho * c0 * diameter / h; byConstants && !(when < 1e4*tau) {
			return
		}
		s, _ := Problem{
			Body: sphere(diameter), Material: m, Initial: kelvin(start), Surface: limited, Horizon: seconds(when),
		}.Solve(ctx)
		if s == nil {
			return
		}
		low, high := min(start, ambient)*(1-1e-9)-0.01, max(start, ambient)*(1+1e-9)+0.01
		if got, err := s.Mean(seconds(when / 2)); err == nil && h >= 0 && !(got.SI() >= low && got.SI() <= high) {
			t.Errorf("%v is not between %g K and %g K", got, start, ambient)
		}
		if got, err := s.TimeTo(shape.Centre(), kelvin(target)); err == nil && !(got.SI() >= 0 && got.IsFinite()) {
			t.Errorf("time %v", got)
		}
		if got, err := s.HeatReleased(seconds(when / 3)); err == nil && !got.IsFinite() {
			t.Errorf("heat %v", got)
		}
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

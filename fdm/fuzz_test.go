package fdm_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// FuzzWall solves walls of two layers with a contact, two faces, a lump, a source and an event: a solution balances and gives
// finite numbers, an error has a type.
func FuzzWall(f *testing.F) {
	f.Add(0.02, 0.1, 0.01, 10.0, 25.0, 300.0, 1000.0, 50.0, 350.0, 3600.0, 12)
	f.Add(1e-9, 0.1, 0.0, 1e6, 0.0, 1200.0, 0.0, 1e-3, 350.0, 1.0, 8)
	f.Add(0.02, 0.0, 0.01, 10.0, 25.0, 300.0, 1e9, 50.0, 350.0, 3600.0, 12)
	f.Add(1.0, 1e-3, 1e9, 1e-9, 1e9, 4000.0, -1e6, 1e9, 401.0, 1e7, 5)
	f.Add(0.02, 0.1, math.NaN(), 10.0, math.Inf(1), 300.0, 1000.0, -1.0, math.NaN(), 1e300, 40)
	f.Fuzz(func(t *testing.T, outer, inner, contact, h, emitted, ambient, source, capacity, limit, horizon float64, cells int) {
		if cells == 0 || cells > 60 {
			return // too long for a fuzz target
		}
		p := fdm.Problem{
			Body: shape.Plate(metres(outer+inner), units.SquareMetre.Of(1)).Exposing(shape.Front),
			Layers: []fdm.Layer{
				{Material: plain{2000, 900, 0.8}, Thickness: metres(outer), Contact: units.SquareMetreKelvinPerWatt.Of(contact)},
				{Material: plain{50, 1000, 0.04}, Thickness: metres(inner)},
			},
			Initial:  kelvin(400),
			Surface:  boundary.Sum(constant(h, ambient), boundary.Radiation(0.9, kelvin(ambient))),
			Opposite: boundary.Flux(units.WattPerSquareMetre.Of(emitted)),
			OppositeLump: &fdm.Lump{
				HeatCapacity: units.JoulePerKelvin.Of(capacity), Coefficient: units.WattPerSquareMetreKelvin.Of(8), Initial: kelvin(390),
			},
			Source: func(_ units.Length, _ units.Duration, T units.Temperature) (units.HeatSource, error) {
				return units.WattPerCubicMetre.Of(source * T.SI() / 400), nil
			},
			Stop:    []fdm.Event{fdm.Reaches(shape.Surface(), kelvin(limit))},
			Horizon: seconds(horizon), Cells: cells, Tolerance: units.KelvinDifference.Of(0.01),
		}
		s, err := p.Solve(t.Context())
		var a *units.ArgumentError
		var r *units.RangeError
		var c *units.ConvergenceError
		if err != nil && !errors.As(err, &a) && !errors.As(err, &r) && !errors.As(err, &c) {
			t.Fatalf("%v has no type", err)
		}
		if s == nil {
			if err == nil {
				t.Fatal("neither solution nor error")
			}
			return
		}
		balanced(t, "wall", s)
		finite := func(name string, x float64, err error) {
			if err == nil && (math.IsNaN(x) || math.IsInf(x, 0)) {
				t.Errorf("%s is %g without an error", name, x)
			}
		}
		end := s.Horizon()
		for _, face := range []shape.Place{shape.Surface(), shape.Opposite()} {
			T, err := s.At(face, end)
			finite("temperature", T.SI(), err)
			q, err := s.Flux(face, end)
			finite("flux", q.SI(), err)
			e, err := s.ErrorEstimate(face, end)
			finite("estimate", e.SI(), err)
			when, err := s.TimeTo(face, kelvin(350))
			finite("time", when.SI(), err)
		}
		T, err := s.LumpAt(shape.Opposite(), end)
		finite("lump", T.SI(), err)
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Errorf("derivation: %v", err)
		}
	})
}

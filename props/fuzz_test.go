package props_test

import (
	"math"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// No temperature, pressure or enthalpy makes a panic, or a number that cannot be beside a nil error.
func FuzzProperties(f *testing.F) {
	for _, x := range []float64{0, -1, 1e-320, 200, 273.15, 293.15, 300, 1008.15, 1473.15, 1e308, math.Inf(1), math.NaN()} {
		f.Add(x, 101325.0)
		f.Add(300.0, x)
	}
	f.Fuzz(func(t *testing.T, a, b float64) {
		T := units.Kelvin.Of(a)
		for _, s := range append(everySolid(t), props.Solid{}) {
			if k, err := s.Conductivity(T); err == nil && !(k.SI() > 0 && k.IsFinite()) {
				t.Errorf("%s at %g K: conductivity %g", s.Name(), a, k.SI())
			}
			if c, err := s.SpecificHeat(T); err == nil && !(c.SI() > 0 && c.IsFinite()) {
				t.Errorf("%s at %g K: specific heat %g", s.Name(), a, c.SI())
			}
			if h, err := s.Enthalpy(T); err == nil && !h.IsFinite() {
				t.Errorf("%s at %g K: enthalpy %g", s.Name(), a, h.SI())
			}
			if back, err := s.Temperature(units.JoulePerKilogram.Of(b)); err == nil && !(back.SI() > 0 && back.IsFinite()) {
				t.Errorf("%s at %g J/kg: temperature %g", s.Name(), b, back.SI())
			}
		}
		for _, fluid := range []props.Medium{props.Air(), props.Water(), {}} {
			s, err := fluid.At(T, units.Pascal.Of(b))
			if err == nil && !(s.Density.SI() > 0 && s.SpecificHeat.SI() > 0 && s.Conductivity.SI() > 0 && s.Viscosity.SI() > 0 &&
				s.Expansion.IsFinite() && s.Prandtl() > 0 && !math.IsInf(s.Prandtl(), 0)) {
				t.Errorf("%s at %g K and %g Pa: %v", fluid.Name(), a, b, s)
			}
		}
	})
}

// Whatever a table or constants hold: an error, or a solid without NaN.
func FuzzOwn(f *testing.F) {
	f.Add(300.0, 1.0, 500.0, 400.0, 2.0, 600.0, 350.0)
	f.Add(300.0, 1e308, 500.0, 300.0000001, 1e-300, 1e308, 300.00000001)
	f.Add(1e-320, 1.0, 1e-310, 1e308, 2.0, 600.0, 1e100)
	f.Fuzz(func(t *testing.T, t1, k1, c1, t2, k2, c2, at float64) {
		rho := units.KilogramPerCubicMetre.Of(1000)
		row := func(t, k, c float64) props.Row {
			return props.Row{Temperature: units.Kelvin.Of(t), Conductivity: units.WattPerMetreKelvin.Of(k), SpecificHeat: units.JoulePerKilogramKelvin.Of(c)}
		}
		constant, err1 := props.Constant("x", rho, units.JoulePerKilogramKelvin.Of(c1), units.WattPerMetreKelvin.Of(k1))
		two, err2 := props.Tabulated("x", rho, []props.Row{row(t1, k1, c1), row(t2, k2, c2)}, "")
		three, err3 := props.Tabulated("x", rho, []props.Row{row(t1, k1, c1), row(at, k2, c2), row(t2, k1, c2)}, "")
		for i, s := range []props.Solid{constant, two, three} {
			if []error{err1, err2, err3}[i] != nil {
				continue
			}
			T := units.Kelvin.Of(at)
			if k, err := s.Conductivity(T); err == nil && !(k.SI() > 0 && k.IsFinite()) {
				t.Errorf("conductivity %g", k.SI())
			}
			if c, err := s.SpecificHeat(T); err == nil && !(c.SI() > 0 && c.IsFinite()) {
				t.Errorf("specific heat %g", c.SI())
			}
			if h, err := s.Enthalpy(T); err == nil {
				if !h.IsFinite() {
					t.Errorf("enthalpy %g", h.SI())
				}
				if back, err := s.Temperature(h); err == nil && !(back.SI() > 0 && back.IsFinite()) {
					t.Errorf("temperature %g", back.SI())
				}
			}
		}
	})
}

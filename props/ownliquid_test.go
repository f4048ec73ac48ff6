package props_test

import (
	"errors"
	"math"
	"slices"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func liquidRow(celsius, rho, c, k, mu float64) props.LiquidRow {
	return props.LiquidRow{
		Temperature:  units.Celsius.Of(celsius),
		Density:      units.KilogramPerCubicMetre.Of(rho),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(c),
		Conductivity: units.WattPerMetreKelvin.Of(k),
		Viscosity:    units.PascalSecond.Of(mu),
	}
}

// moltenSalt is about what the makers of solar salt print.
func moltenSalt() []props.LiquidRow {
	return []props.LiquidRow{
		liquidRow(260, 1924, 1488, 0.492, 4.34e-3),
		liquidRow(300, 1899, 1495, 0.500, 3.26e-3),
		liquidRow(400, 1835, 1512, 0.519, 1.78e-3),
		liquidRow(500, 1772, 1529, 0.538, 1.31e-3),
		liquidRow(600, 1708, 1546, 0.557, 0.99e-3),
	}
}

func TestTabulatedLiquidPassesThroughItsRows(t *testing.T) {
	f, err := props.TabulatedLiquid("salt", moltenSalt(), units.Kilopascal.Of(50), units.Bar.Of(10), "data sheet")
	if err != nil {
		t.Fatal(err)
	}
	if f.Source() != "data sheet" || f.ViscosityUncertainty() != 0 {
		t.Errorf("source %q, uncertainty %g", f.Source(), f.ViscosityUncertainty())
	}
	for _, r := range moltenSalt() {
		s, err := f.At(r.Temperature, units.Bar.Of(1))
		if err != nil {
			t.Fatal(err)
		}
		if s.Density != r.Density || s.SpecificHeat != r.SpecificHeat || s.Conductivity != r.Conductivity || s.Gas {
			t.Errorf("at %v: %v", r.Temperature, s)
		}
		check(t, "viscosity at "+r.Temperature.String(), s.Viscosity.SI(), cell{r.Viscosity.SI(), 0}, 1e-14, "row")
	}
	line, err := props.TabulatedLiquid("line", []props.LiquidRow{liquidRow(0, 1000, 2000, 0.1, 1e-2), liquidRow(100, 900, 2200, 0.2, 1e-4)},
		units.Bar.Of(1), units.Bar.Of(2), "")
	if err != nil {
		t.Fatal(err)
	}
	s := state(t, line, 323.15, 1.5e5)
	check(t, "density of a line", s.Density.SI(), cell{950, 1e-10}, 0, "mean")
	check(t, "expansion of a line", s.Expansion.SI(), cell{1.0 / 950, 0}, 1e-12, "slope")
	check(t, "viscosity by its logarithm", s.Viscosity.SI(), cell{1e-3, 0}, 1e-12, "geometric mean")
}

func TestTabulatedLiquidIsChecked(t *testing.T) {
	rows := func(change func(r []props.LiquidRow)) []props.LiquidRow {
		r := slices.Clone(moltenSalt())
		change(r)
		return r
	}
	bar, tenBar := units.Bar.Of(1), units.Bar.Of(10)
	for _, c := range []struct {
		what      string
		name      string
		rows      []props.LiquidRow
		low, high units.Pressure
		field     string
	}{
		{"no name", "", moltenSalt(), bar, tenBar, "name"},
		{"no rows", "x", nil, bar, tenBar, "rows of x"},
		{"one row", "x", moltenSalt()[:1], bar, tenBar, "rows of x"},
		{"no pressure", "x", moltenSalt(), units.Pressure{}, tenBar, "lowest pressure"},
		{"infinite pressure", "x", moltenSalt(), bar, units.Pascal.Of(math.Inf(1)), "highest pressure"},
		{"pressures upside down", "x", moltenSalt(), tenBar, bar, "lowest pressure"},
		{"row not rising", "x", rows(func(r []props.LiquidRow) { r[2].Temperature = r[1].Temperature }), bar, tenBar, "row 3: temperature"},
		{"row at 0 K", "x", rows(func(r []props.LiquidRow) { r[0].Temperature = units.Temperature{} }), bar, tenBar, "row 1: temperature"},
		{"row without density", "x", rows(func(r []props.LiquidRow) { r[1].Density = units.Density{} }), bar, tenBar, "row 2: density"},
		{"row with NaN", "x", rows(func(r []props.LiquidRow) { r[1].SpecificHeat = units.JoulePerKilogramKelvin.Of(math.NaN()) }), bar, tenBar, "row 2: specific heat"},
		{"row with negative k", "x", rows(func(r []props.LiquidRow) { r[4].Conductivity = r[4].Conductivity.Neg() }), bar, tenBar, "row 5: conductivity"},
		{"row without viscosity", "x", rows(func(r []props.LiquidRow) { r[3].Viscosity = units.Viscosity{} }), bar, tenBar, "row 4: viscosity"},
		{"row too large to interpolate", "x", rows(func(r []props.LiquidRow) { r[1].Density = units.KilogramPerCubicMetre.Of(1e308) }), bar, tenBar, "row"},
	} {
		_, err := props.TabulatedLiquid(c.name, c.rows, c.low, c.high, "")
		var e *units.ArgumentError
		if !errors.As(err, &e) || !strings.Contains(e.Field, c.field) || e.Accepted == "" {
			t.Errorf("%s: got %v, want an argument error of %q", c.what, err, c.field)
		}
	}
}

// Whatever a table holds: an error, or a liquid without NaN.
func FuzzTabulatedLiquid(f *testing.F) {
	f.Add(300.0, 400.0, 1000.0, 900.0, 2000.0, 0.1, 1e-3, 1e-4, 350.0)
	f.Add(1e-320, 1e300, 1e-310, 1e308, 2.0, 600.0, 1e100, 1e-300, 1.0)
	f.Fuzz(func(t *testing.T, t1, t2, rho1, rho2, c, k, mu1, mu2, at float64) {
		row := func(T, rho, mu float64) props.LiquidRow {
			r := liquidRow(0, rho, c, k, mu)
			r.Temperature = units.Kelvin.Of(T)
			return r
		}
		fluid, err := props.TabulatedLiquid("x", []props.LiquidRow{row(t1, rho1, mu1), row(t2, rho2, mu2)}, units.Pascal.Of(1), units.Bar.Of(1), "")
		if err != nil {
			return
		}
		s, err := fluid.At(units.Kelvin.Of(at), units.Bar.Of(1))
		if err == nil && !(s.Density.SI() > 0 && s.SpecificHeat.SI() > 0 && s.Conductivity.SI() > 0 && s.Viscosity.SI() > 0 && s.Expansion.IsFinite()) {
			t.Errorf("%v", s)
		}
	})
}

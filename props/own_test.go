package props_test

import (
	"errors"
	"math"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func row(celsius, k, c float64) props.Row {
	return props.Row{
		Temperature:  units.Celsius.Of(celsius),
		Conductivity: units.WattPerMetreKelvin.Of(k),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(c),
	}
}

var someDensity = units.KilogramPerCubicMetre.Of(1000)

// law is a solid with a jump of c and a bend of k at 400 K.
func law() props.Law {
	return props.Law{
		Name: "own law", Density: someDensity,
		Conductivity: func(T units.Temperature) units.Conductivity {
			return units.WattPerMetreKelvin.Of(1 + 0.01*math.Abs(T.SI()-400))
		},
		SpecificHeat: func(T units.Temperature) units.SpecificHeat {
			if T.SI() < 400 {
				return units.JoulePerKilogramKelvin.Of(500 + T.SI())
			}
			return units.JoulePerKilogramKelvin.Of(2000 * math.Exp(-T.SI()/1000))
		},
		Low: units.Kelvin.Of(250), High: units.Kelvin.Of(900),
		Kinks: []units.Temperature{units.Kelvin.Of(400)},
	}
}

func ownSolids(t *testing.T) []props.Solid {
	t.Helper()
	constant, err := props.Constant("own constant", someDensity, units.JoulePerKilogramKelvin.Of(500), units.WattPerMetreKelvin.Of(2))
	if err != nil {
		t.Fatal(err)
	}
	narrow, err := constant.Within(units.Kelvin.Of(280), units.Kelvin.Of(320))
	if err != nil {
		t.Fatal(err)
	}
	tabulated, err := props.Tabulated("own table", someDensity, []props.Row{
		row(-20, 2, 700), row(0, 1.5, 800), row(50, 1.2, 780), row(60, 1.3, 2000), row(200, 1.3, 900),
	}, "measured")
	if err != nil {
		t.Fatal(err)
	}
	function, err := props.Function(law())
	if err != nil {
		t.Fatal(err)
	}
	return append([]props.Solid{constant, narrow, tabulated, function}, mixed(t, constant, tabulated)...)
}

// A table passes through its rows, and the enthalpy of two rows is that of a straight line.
func TestTabulatedPassesThroughItsRows(t *testing.T) {
	s := ownSolids(t)[2]
	for _, r := range []props.Row{row(-20, 2, 700), row(0, 1.5, 800), row(60, 1.3, 2000), row(200, 1.3, 900)} {
		if got, err := s.Conductivity(r.Temperature); err != nil || got != r.Conductivity {
			t.Errorf("k at %v: got %v, want %v (%v)", r.Temperature, got, r.Conductivity, err)
		}
		if got, err := s.SpecificHeat(r.Temperature); err != nil || got != r.SpecificHeat {
			t.Errorf("c at %v: got %v, want %v (%v)", r.Temperature, got, r.SpecificHeat, err)
		}
	}
	line, err := props.Tabulated("line", someDensity, []props.Row{row(0, 1, 400), row(100, 2, 600)}, "")
	if err != nil {
		t.Fatal(err)
	}
	check(t, "heat of a linear c", h(t, line, celsius(100))-h(t, line, celsius(0)), cell{50000, 1e-7}, 0, "trapezium")
	check(t, "k of a line", k(t, line, celsius(25)), cell{1.25, 1e-12}, 0, "straight line")
}

// The enthalpy of a function against the integral done by hand.
func TestFunctionIntegrates(t *testing.T) {
	s := ownSolids(t)[3]
	check(t, "heat from 250 K to 400 K", h(t, s, 400)-h(t, s, 250), cell{500*150 + (400*400-250*250)/2, 1e-6}, 0, "by hand")
	want := 2e6 * (math.Exp(-0.4) - math.Exp(-0.9))
	check(t, "heat from 400 K to 900 K", h(t, s, 900)-h(t, s, 400), cell{want, 1e-6}, 0, "by hand")
}

func TestWithin(t *testing.T) {
	steel, err := props.CarbonSteel().Within(units.Celsius.Of(20), units.Celsius.Of(735))
	if err != nil {
		t.Fatal(err)
	}
	if kinks := steel.Kinks(); len(kinks) != 1 || kinks[0] != units.Celsius.Of(600) {
		t.Errorf("kinks %v, want 600 °C alone", kinks)
	}
	if low, high := steel.Range(); low != units.Celsius.Of(20) || high != units.Celsius.Of(735) {
		t.Errorf("range %v to %v", low, high)
	}
	if _, err := steel.Conductivity(units.Celsius.Of(10)); err == nil {
		t.Error("10 °C accepted")
	}
	if _, high := props.CarbonSteel().Range(); high != units.Celsius.Of(1200) {
		t.Errorf("the original is changed: it ends at %v", high)
	}
}

// IsConstant is what a solver for constant properties asks.
func TestIsConstant(t *testing.T) {
	own := ownSolids(t)
	for _, r := range []struct {
		s    props.Solid
		want bool
	}{
		{own[0], true},
		{own[1], true},
		{own[2], false},
		{own[3], false},
		{props.PVC(), true},
		{props.Softwood(), true},
		{props.Glass(), false},
		{props.Copper(), false},
		{props.Solid{}, false},
	} {
		if r.s.IsConstant() != r.want {
			t.Errorf("%q: IsConstant %v, want %v", r.s.Name(), r.s.IsConstant(), r.want)
		}
	}
}

// Whatever cannot be used is refused when the solid is made, with the field named.
func TestOwnSolidsAreChecked(t *testing.T) {
	good := []props.Row{row(0, 1, 500), row(100, 1, 500)}
	rows := func(change func(r []props.Row)) []props.Row {
		r := append([]props.Row(nil), good...)
		change(r)
		return r
	}
	tabulated := func(name string, density units.Density, r []props.Row) error {
		_, err := props.Tabulated(name, density, r, "")
		return err
	}
	function := func(change func(l *props.Law)) error {
		l := law()
		change(&l)
		_, err := props.Function(l)
		return err
	}
	constant := func(name string, rho, cp, k float64) error {
		_, err := props.Constant(name, units.KilogramPerCubicMetre.Of(rho), units.JoulePerKilogramKelvin.Of(cp), units.WattPerMetreKelvin.Of(k))
		return err
	}
	within := func(low, high float64) error {
		_, err := props.Copper().Within(units.Kelvin.Of(low), units.Kelvin.Of(high))
		return err
	}
	nan, inf := math.NaN(), math.Inf(1)
	for _, r := range []struct {
		what  string
		err   error
		field string
	}{
		{"empty name", constant(" ", 1, 1, 1), "name"},
		{"density 0", constant("x", 0, 1, 1), "density of x"},
		{"density infinite", constant("x", inf, 1, 1), "density of x"},
		{"specific heat negative", constant("x", 1, -1, 1), "specific heat of x"},
		{"conductivity NaN", constant("x", 1, 1, nan), "conductivity of x"},
		{"no rows", tabulated("x", someDensity, nil), "rows of x"},
		{"one row", tabulated("x", someDensity, good[:1]), "rows of x"},
		{"table without density", tabulated("x", units.Density{}, good), "density of x"},
		{"row not rising", tabulated("x", someDensity, rows(func(r []props.Row) { r[1].Temperature = r[0].Temperature })), "row 2: temperature"},
		{"row NaN", tabulated("x", someDensity, rows(func(r []props.Row) { r[0].Temperature = units.Kelvin.Of(nan) })), "row 1: temperature"},
		{"row without k", tabulated("x", someDensity, rows(func(r []props.Row) { r[1].Conductivity = units.Conductivity{} })), "row 2: conductivity"},
		{"row with negative c", tabulated("x", someDensity, rows(func(r []props.Row) { r[0].SpecificHeat = r[0].SpecificHeat.Neg() })), "row 1: specific heat"},
		{"row too large to interpolate", tabulated("x", someDensity, rows(func(r []props.Row) { r[1].SpecificHeat = units.JoulePerKilogramKelvin.Of(1e308) })), "row 2"},
		{"nil conductivity", function(func(l *props.Law) { l.Conductivity = nil }), "conductivity of own law"},
		{"nil specific heat", function(func(l *props.Law) { l.SpecificHeat = nil }), "specific heat of own law"},
		{"law without name", function(func(l *props.Law) { l.Name = "" }), "name"},
		{"law without low end", function(func(l *props.Law) { l.Low = units.Temperature{} }), "low end"},
		{"law with NaN high end", function(func(l *props.Law) { l.High = units.Kelvin.Of(nan) }), "high end"},
		{"law upside down", function(func(l *props.Law) { l.Low, l.High, l.Kinks = l.High, l.Low, nil }), "high end"},
		{"kink outside", function(func(l *props.Law) { l.Kinks = []units.Temperature{units.Kelvin.Of(100)} }), "kinks"},
		{"kink at the end", function(func(l *props.Law) { l.Kinks = append(l.Kinks, l.High) }), "kinks"},
		{"kink NaN", function(func(l *props.Law) { l.Kinks = []units.Temperature{units.Kelvin.Of(nan)} }), "kinks"},
		{"k NaN above 700 K", function(func(l *props.Law) {
			l.Conductivity = func(T units.Temperature) units.Conductivity {
				if T.SI() > 700 {
					return units.WattPerMetreKelvin.Of(nan)
				}
				return units.WattPerMetreKelvin.Of(1)
			}
		}), "conductivity of own law"},
		{"c negative below 300 K", function(func(l *props.Law) {
			l.SpecificHeat = func(T units.Temperature) units.SpecificHeat { return units.JoulePerKilogramKelvin.Of(T.SI() - 300) }
		}), "specific heat of own law"},
		{"c rough", function(func(l *props.Law) {
			l.SpecificHeat = func(T units.Temperature) units.SpecificHeat {
				return units.JoulePerKilogramKelvin.Of(500 + 100*math.Sin(1e9*T.SI()))
			}
		}), "specific heat of own law"},
		{"range upside down", within(400, 300), "range of copper"},
		{"range empty", within(300, 300), "range of copper"},
	} {
		var e *units.ArgumentError
		if !errors.As(r.err, &e) || !strings.Contains(e.Field, r.field) || e.Accepted == "" {
			t.Errorf("%s: got %v, want an argument error of %q", r.what, r.err, r.field)
		}
	}
	var e *units.RangeError
	if err := within(100, 300); !errors.As(err, &e) {
		t.Errorf("wider than the source: got %v, want a range error", err)
	}
}

// A function that goes wrong where it was not called while the solid was made gives an error later.
func TestFunctionGoesWrongLater(t *testing.T) {
	broken := false
	l := law()
	good, heat := l.Conductivity, l.SpecificHeat
	l.Conductivity = func(T units.Temperature) units.Conductivity {
		if broken {
			return units.Conductivity{}
		}
		return good(T)
	}
	l.SpecificHeat = func(T units.Temperature) units.SpecificHeat {
		if broken {
			return units.JoulePerKilogramKelvin.Of(math.NaN())
		}
		return heat(T)
	}
	s, err := props.Function(l)
	if err != nil {
		t.Fatal(err)
	}
	broken = true
	T := units.Kelvin.Of(300)
	_, errK := s.Conductivity(T)
	_, errC := s.SpecificHeat(T)
	_, errH := s.Enthalpy(T)
	for _, err := range []error{errK, errC, errH} {
		var e *units.ArgumentError
		if !errors.As(err, &e) || !strings.Contains(e.Field, "own law") {
			t.Errorf("got %v, want an argument error", err)
		}
	}
}

// The ends of the range of a constant come back as they are, whatever the rounding of c T / c.
func TestWithinKeepsItsEnds(t *testing.T) {
	for c := 500.1; c < 560; c += 0.77 {
		s, err := props.Constant("x", someDensity, units.JoulePerKilogramKelvin.Of(c), units.WattPerMetreKelvin.Of(1))
		if err != nil {
			t.Fatal(err)
		}
		low, high := units.Celsius.Of(-18.3), units.Celsius.Of(61.7)
		if s, err = s.Within(low, high); err != nil {
			t.Fatal(err)
		}
		for _, end := range []units.Temperature{low, high} {
			enthalpy, err := s.Enthalpy(end)
			if err != nil {
				t.Fatal(err)
			}
			back, err := s.Temperature(enthalpy)
			if err != nil || back.Compare(low) < 0 || back.Compare(high) > 0 {
				t.Errorf("c %g: T(h(%v)) is outside %v to %v by rounding (%v)", c, end, low, high, err)
			}
		}
	}
}

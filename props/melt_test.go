package props_test

import (
	"errors"
	"math"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func constantOf(t *testing.T, name string, rho, cp, k float64) props.Solid {
	t.Helper()
	s, err := props.Constant(name, units.KilogramPerCubicMetre.Of(rho), units.JoulePerKilogramKelvin.Of(cp), units.WattPerMetreKelvin.Of(k))
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// pureMelt is tin-like: 2 and 1 in the ratios of properties, a melting point of 500 K.
func pureMelt(t *testing.T) props.Melt {
	t.Helper()
	low, err := constantOf(t, "solid", 7000, 250, 60).Within(units.Kelvin.Of(250), units.Kelvin.Of(505))
	if err != nil {
		t.Fatal(err)
	}
	high, err := constantOf(t, "liquid", 7000, 240, 30).Within(units.Kelvin.Of(490), units.Kelvin.Of(900))
	if err != nil {
		t.Fatal(err)
	}
	return props.Melt{
		Name: "own pure metal", Solid: low, Liquid: high, LatentHeat: units.JoulePerKilogram.Of(60e3),
		Solidus: units.Kelvin.Of(500), Liquidus: units.Kelvin.Of(500),
	}
}

// eutectic is an alloy of which a part melts at the solidus at once.
func eutectic(t *testing.T) props.Melt {
	t.Helper()
	m := pureMelt(t)
	m.Name = "own alloy with eutectic"
	m.Solidus, m.Liquidus = units.Kelvin.Of(456), units.Kelvin.Of(495)
	m.SolidFraction = props.Scheil(units.Kelvin.Of(505), m.Liquidus, 0.2)
	return m
}

// plateaus has the jumps of the enthalpy of the solids of these tests at a temperature.
var plateaus = map[string]map[float64]float64{
	"own pure metal":          {500: 60e3},
	"own alloy with eutectic": {456: 60e3 * math.Pow(49.0/10, 1/(0.2-1))},
}

// mixed makes a solid of each kind that is composed of others.
func mixed(t *testing.T, constant, tabulated props.Solid) []props.Solid {
	t.Helper()
	must := func(s props.Solid, err error) props.Solid {
		t.Helper()
		if err != nil {
			t.Fatal(err)
		}
		return s
	}
	alloy := pureMelt(t)
	alloy.Name, alloy.Solidus, alloy.Liquidus = "own alloy", units.Kelvin.Of(490), units.Kelvin.Of(500)
	open := pureMelt(t)
	open.Name, open.Solidus, open.Liquidus = "own open alloy", units.Kelvin.Of(490), units.Kelvin.Of(500)
	open.Solid, open.Liquid = constantOf(t, "solid", 7000, 250, 60), constantOf(t, "liquid", 7000, 240, 30)
	all := []props.Solid{
		must(props.Melting(pureMelt(t))), must(props.Melting(alloy)), must(props.Melting(eutectic(t))), must(props.Melting(open)),
		must(props.Moist("own moist table", tabulated, 0.1, 4)),
	}
	for i, name := range []string{"own dispersion", "own parallel layers", "own series layers", "own mean"} {
		structure := props.Structure(i)
		all = append(all,
			must(props.Composite(name, structure, props.Part{Solid: tabulated, Volume: 0.7}, props.Part{Solid: constant, Volume: 0.3})),
			must(props.Food(props.Recipe{
				Name: "own food " + name, Composition: props.Composition{Water: 0.6, Protein: 0.2, Fat: 0.15, Carbohydrate: 0.02, Fibre: 0.02, Ash: 0.01},
				Freezing: units.Celsius.Of(-1.5), Porosity: 0.1, Structure: structure,
			})))
	}
	return append(all, must(props.Composite("own constant mixture", props.Dispersed, props.Part{Solid: constant, Volume: 0.5}, props.Part{Solid: constantOf(t, "x", 100, 1000, 0.05), Volume: 0.5})))
}

// The enthalpy of a pure substance, by hand: 250 J/(kg K) to 500 K, 60 kJ/kg there, 240 J/(kg K) above.
func TestMeltingOfAPureSubstance(t *testing.T) {
	s, err := props.Melting(pureMelt(t))
	if err != nil {
		t.Fatal(err)
	}
	solid := h(t, s, 500)
	check(t, "heat of the solid from 400 K to 500 K", solid-h(t, s, 400), cell{25e3, 1e-6}, 0, "by hand")
	check(t, "heat from the melting solid to 600 K", h(t, s, 600)-solid, cell{60e3 + 24e3, 1e-6}, 0, "by hand")
	check(t, "heat of melting", h(t, s, math.Nextafter(500, 600))-solid, cell{60e3, 1e-6}, 0, "by hand")
	for _, f := range []float64{0, 1e-9, 0.3, 0.5, 1} {
		T, err := s.Temperature(units.JoulePerKilogram.Of(solid + f*60e3))
		if err != nil || T != units.Kelvin.Of(500) {
			t.Errorf("%g melted: temperature %v, %v; want 500 K", f, T, err)
		}
	}
	check(t, "k of the solid at the melting point", k(t, s, 500), cell{60, 0}, 0, "by hand")
	check(t, "k of the liquid", k(t, s, 500.001), cell{30, 0}, 0, "by hand")
	if kinks := s.Kinks(); len(kinks) != 1 || kinks[0] != units.Kelvin.Of(500) {
		t.Errorf("kinks %v, want 500 K", kinks)
	}
}

// The heat of an alloy does not depend on the path of its solid fraction but for the sensible heat: mean specific
// heats between.
func TestMeltingOfAnAlloy(t *testing.T) {
	for _, fraction := range []func(units.Temperature) float64{nil, props.LeverRule(units.Kelvin.Of(510), units.Kelvin.Of(500), 0.5)} {
		m := pureMelt(t)
		m.Solidus, m.Liquidus, m.SolidFraction = units.Kelvin.Of(490), units.Kelvin.Of(500), fraction
		s, err := props.Melting(m)
		if err != nil {
			t.Fatal(err)
		}
		got := h(t, s, 500) - h(t, s, 490)
		check(t, "heat from solidus to liquidus", got, cell{60e3 + 2450, 51}, 0, "latent heat and 10 K at 240 to 250 J/(kg K)")
		if fraction == nil {
			check(t, "heat from solidus to half", h(t, s, 495)-h(t, s, 490), cell{30e3 + 5*(250+245)/2.0, 1e-3}, 0, "by hand")
			check(t, "c half way", c(t, s, 495), cell{245 + 6000, 1e-6}, 0, "by hand")
			check(t, "k half way", k(t, s, 495), cell{45, 1e-9}, 0, "by hand")
			check(t, "k a quarter of the way", k(t, s, 492.5), cell{52.5, 1e-9}, 0, "by hand")
		}
		if kinks := s.Kinks(); len(kinks) != 2 || kinks[0] != units.Kelvin.Of(490) || kinks[1] != units.Kelvin.Of(500) {
			t.Errorf("kinks %v, want 490 K and 500 K", kinks)
		}
	}
}

// A material that is a third solid up to its liquidus melts two thirds at the solidus and one third at the liquidus.
func TestMeltingInTwoSteps(t *testing.T) {
	m := pureMelt(t)
	m.Solidus, m.Liquidus = units.Kelvin.Of(490), units.Kelvin.Of(500)
	m.SolidFraction = func(units.Temperature) float64 { return 1.0 / 3 }
	s, err := props.Melting(m)
	if err != nil {
		t.Fatal(err)
	}
	step := func(at float64) float64 { return h(t, s, math.Nextafter(at, 600)) - h(t, s, at) }
	check(t, "heat at the solidus", step(490), cell{40e3, 1e-3}, 0, "by hand")
	check(t, "heat at the liquidus", step(500), cell{20e3, 1e-3}, 0, "by hand")
	check(t, "heat between", h(t, s, 500)-h(t, s, math.Nextafter(490, 600)), cell{10 * (250.0/3 + 240*2.0/3), 1e-3}, 0, "by hand")
	for _, r := range []struct{ more, T float64 }{{39e3, 490}, {40e3 + 10*(250.0/3+240*2.0/3) + 1e3, 500}} {
		if T, err := s.Temperature(units.JoulePerKilogram.Of(h(t, s, 490) + r.more)); err != nil || T != units.Kelvin.Of(r.T) {
			t.Errorf("%g J/kg above the solid at the solidus: %v, %v; want %g K", r.more, T, err, r.T)
		}
	}
}

// Solid fractions: the ends and a value by hand (lever rule (TL − T)/((1 − k)(TM − T)), Scheil 1 − ((TM − T)/(TM −
// TL))^(1/(k − 1))).
func TestSolidFractions(t *testing.T) {
	K := units.Kelvin.Of
	lever, scheil := props.LeverRule(K(900), K(850), 0.2), props.Scheil(K(900), K(850), 0.2)
	for _, r := range []struct {
		what      string
		got, want float64
	}{
		{"lever at the liquidus", lever(K(850)), 0},
		{"lever at 800 K", lever(K(800)), 50 / (0.8 * 100)},
		{"lever at its solidus", lever(K(900 - 50/0.2)), 1},
		{"lever below", lever(K(500)), 1},
		{"lever above", lever(K(870)), 0},
		{"Scheil at the liquidus", scheil(K(850)), 0},
		{"Scheil at 800 K", scheil(K(800)), 1 - math.Pow(2, -1.25)},
		{"Scheil above", scheil(K(899)), 0},
	} {
		check(t, r.what, r.got, cell{r.want, 1e-12}, 0, "by hand")
	}
	for _, f := range []float64{props.LeverRule(K(900), K(950), 0.2)(K(800)), props.Scheil(K(900), K(850), 1)(K(800)), props.Scheil(K(900), K(850), math.NaN())(K(800))} {
		if !math.IsNaN(f) {
			t.Errorf("got %g for arguments that cannot be, want NaN", f)
		}
	}
}

// With two melting points, one above the other, both plateaus are there.
func TestMeltingTwice(t *testing.T) {
	s, err := props.Melting(pureMelt(t))
	if err != nil {
		t.Fatal(err)
	}
	m := pureMelt(t)
	m.Name, m.Solid, m.Liquid = "own two points", s, constantOf(t, "gas-like", 7000, 300, 10)
	m.Solidus, m.Liquidus = units.Kelvin.Of(700), units.Kelvin.Of(700)
	twice, err := props.Melting(m)
	if err != nil {
		t.Fatal(err)
	}
	if kinks := twice.Kinks(); len(kinks) != 2 {
		t.Errorf("kinks %v, want 500 K and 700 K", kinks)
	}
	for _, r := range []struct{ at, T float64 }{{500, 500}, {700, 700}} {
		T, err := twice.Temperature(units.JoulePerKilogram.Of(h(t, twice, r.at) + 30e3))
		if err != nil || math.Abs(T.SI()-r.T) > 1e-9 {
			t.Errorf("half way through the melting at %g K: %v, %v", r.at, T, err)
		}
	}
}

func TestMeltingIsChecked(t *testing.T) {
	melt := func(change func(m *props.Melt)) error {
		m := pureMelt(t)
		change(&m)
		_, err := props.Melting(m)
		return err
	}
	K := units.Kelvin.Of
	wide := func(m *props.Melt) { m.Solidus, m.Liquidus = K(490), K(500) }
	for _, r := range []struct {
		what, field string
		err         error
	}{
		{"no name", "name", melt(func(m *props.Melt) { m.Name = "" })},
		{"no solid", "Solid", melt(func(m *props.Melt) { m.Solid = props.Solid{} })},
		{"no latent heat", "latent heat", melt(func(m *props.Melt) { m.LatentHeat = units.SpecificEnergy{} })},
		{"tiny latent heat", "latent heat", melt(func(m *props.Melt) { m.LatentHeat = units.JoulePerKilogram.Of(1e-300) })},
		{"huge latent heat", "latent heat", melt(func(m *props.Melt) { m.LatentHeat = units.JoulePerKilogram.Of(math.MaxFloat64) })},
		{"solidus above the range", "solidus", melt(func(m *props.Melt) { m.Solidus, m.Liquidus = K(510), K(520) })},
		{"liquidus below the solidus", "liquidus", melt(func(m *props.Melt) { m.Liquidus = K(495) })},
		{"liquidus too near", "liquidus", melt(func(m *props.Melt) { m.Liquidus = K(math.Nextafter(500, 600)) })},
		{"fraction rising", "solid fraction", melt(func(m *props.Melt) {
			wide(m)
			m.SolidFraction = func(T units.Temperature) float64 { return (T.SI() - 490) / 10 }
		})},
		{"fraction above 1", "solid fraction", melt(func(m *props.Melt) { wide(m); m.SolidFraction = func(units.Temperature) float64 { return 1.1 } })},
		{"fraction NaN", "solid fraction", melt(func(m *props.Melt) { wide(m); m.SolidFraction = props.Scheil(K(1), K(2), 3) })},
	} {
		var e *units.ArgumentError
		if !errors.As(r.err, &e) || !strings.Contains(e.Field, r.field) || e.Accepted == "" {
			t.Errorf("%s: got %v, want an argument error of %q", r.what, r.err, r.field)
		}
	}
}

package props_test

import (
	"errors"
	"fmt"
	"math"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// M. A. Mikheev, I. M. Mikheeva, Basics of Heat Transfer, table of flue gas of mean composition at 760 mm Hg, 13 % CO2, 11 % H2O and
// 76 % N2 by volume, from memory; the Pr of the table is µ c/k of its rows within 2 %.
//
// The table is older than the equations. Its viscosity is taken as good to 3 %, its specific heat to 1.5 %. Its conductivity is above that of every
// part alone (at 200 °C 0.0401 W/(m K), while N2 has 0.0373, CO2 0.0304 and H2O 0.0334), which no rule of mixing gives: it is not
// compared, but must be missed in that direction. Its density at 1000 °C is 0.9 % off the proportion to 1/T of the
// other rows.
func flueGasAgainstMikheev(t *testing.T, record *fluidRecord) {
	f, err := props.CombustionGas("flue gas", props.GasComposition{Nitrogen: 0.76, CarbonDioxide: 0.13, Steam: 0.11})
	if err != nil {
		t.Fatal(err)
	}
	with := record.witness(combustionRow, f, "mikheev", reasons{
		"conductivity": "the table is above every part of the gas alone, which no rule of mixing gives",
	})
	for _, r := range []struct{ celsius, rho, cp, k, mu float64 }{
		{200, 0.748, 1097, 4.01e-2, 24.5e-6},
		{300, 0.617, 1122, 4.84e-2, 28.2e-6},
		{400, 0.525, 1151, 5.70e-2, 31.7e-6},
		{500, 0.457, 1185, 6.56e-2, 34.8e-6},
		{600, 0.405, 1214, 7.42e-2, 37.9e-6},
		{700, 0.363, 1239, 8.27e-2, 40.7e-6},
		{800, 0.330, 1264, 9.15e-2, 43.4e-6},
		{900, 0.301, 1290, 10.00e-2, 45.9e-6},
		{1000, 0.275, 1306, 10.90e-2, 48.4e-6},
		{1100, 0.257, 1323, 11.75e-2, 50.7e-6},
		{1200, 0.240, 1340, 12.62e-2, 53.0e-6},
	} {
		g := state(t, f, r.celsius+273.15, atmosphere)
		if rho := (cell{r.rho, 0.0005}); r.celsius != 1000 {
			with.check(t, g, "density", rho, 0.002)
		} else {
			with.note(t, g, "density", rho)
		}
		with.check(t, g, "specific heat", cell{r.cp, 0.5}, 0.015)
		with.check(t, g, "viscosity", cell{r.mu, 5e-8}, math.Hypot(f.ViscosityUncertainty(), 0.03))
		with.note(t, g, "conductivity", cell{r.k, 5e-5})
		if g.Conductivity.SI() > r.k*0.95 {
			t.Errorf("flue gas at %g °C: conductivity %g is near that of the table, %g", r.celsius, g.Conductivity.SI(), r.k)
		}
	}
}

// A mixture of one gas is that gas. Only the pure gas has the residual part of the transport properties: 5e-4 at 10 kPa.
func TestMixtureOfOneGasIsTheGas(t *testing.T) {
	for _, c := range []struct {
		composition props.GasComposition
		gas         props.Medium
	}{
		{props.GasComposition{Nitrogen: 1}, props.Nitrogen()},
		{props.GasComposition{Oxygen: 1}, props.Oxygen()},
		{props.GasComposition{Argon: 1}, props.Argon()},
		{props.GasComposition{CarbonDioxide: 1}, props.CarbonDioxide()},
	} {
		f, err := props.CombustionGas("pure", c.composition)
		if err != nil {
			t.Fatal(err)
		}
		for _, T := range []float64{250, 400, 1000, 1500} {
			a, b := state(t, f, T, 10e3), state(t, c.gas, T, 10e3)
			at := fmt.Sprintf("%s at %g K, ", c.gas.Name(), T)
			check(t, at+"density", a.Density.SI(), cell{b.Density.SI(), 0}, 1e-15, "pure gas")
			check(t, at+"specific heat", a.SpecificHeat.SI(), cell{b.SpecificHeat.SI(), 0}, 1e-15, "pure gas")
			check(t, at+"viscosity", a.Viscosity.SI(), cell{b.Viscosity.SI(), 0}, 5e-4, "pure gas")
			check(t, at+"conductivity", a.Conductivity.SI(), cell{b.Conductivity.SI(), 0}, 5e-4, "pure gas")
		}
	}
}

// Each component opens or closes the range.
func TestRangeOfCombustionGas(t *testing.T) {
	for _, c := range []struct {
		composition props.GasComposition
		low         float64
	}{
		{props.GasComposition{Nitrogen: 0.8, Oxygen: 0.2}, 200},
		{props.GasComposition{Nitrogen: 0.8, CarbonDioxide: 0.2}, 250},
		{props.GasComposition{Nitrogen: 0.8, Steam: 0.2}, 373.2},
	} {
		f, err := props.CombustionGas("gas", c.composition)
		if err != nil {
			t.Fatal(err)
		}
		if low, high := f.Range(); low.SI() != c.low || high.SI() != 1500 {
			t.Errorf("%v: range %v to %v", c.composition, low, high)
		}
	}
	// Water boils at 105 °C at 120.90 kPa (IAPWS R7-97, from memory): the gas condenses where its steam has that pressure.
	T := units.Celsius.Of(105)
	for _, x := range []float64{1, 0.8, 0.7} {
		f, err := props.CombustionGas("gas", props.GasComposition{Steam: x, Nitrogen: 1 - x})
		if err != nil {
			t.Fatal(err)
		}
		_, high, err := f.PressureRange(T)
		if err != nil {
			t.Fatal(err)
		}
		check(t, fmt.Sprintf("dew pressure of %g steam", x), high.SI(), cell{120.90e3 / x, 5 / x}, 0, "IAPWS R7-97")
	}
}

func TestCompositionIsChecked(t *testing.T) {
	for _, c := range []struct {
		what, name  string
		composition props.GasComposition
		field       string
	}{
		{"nothing", "x", props.GasComposition{}, "all gases together"},
		{"per cent", "x", props.GasComposition{Nitrogen: 79, Oxygen: 21}, "nitrogen"},
		{"99 %", "x", props.GasComposition{Nitrogen: 0.79, Oxygen: 0.2}, "all gases together"},
		{"more than all", "x", props.GasComposition{Nitrogen: 0.79, Oxygen: 0.21, Argon: 0.01}, "all gases together"},
		{"negative", "x", props.GasComposition{Nitrogen: 1.0, Steam: -0.1}, "steam"},
		{"NaN", "x", props.GasComposition{Nitrogen: 1, CarbonDioxide: math.NaN()}, "carbon dioxide"},
		{"no name", " ", props.GasComposition{Nitrogen: 1}, "name"},
	} {
		_, err := props.CombustionGas(c.name, c.composition)
		var e *units.ArgumentError
		if !errors.As(err, &e) || !strings.Contains(e.Field, c.field) || e.Accepted == "" {
			t.Errorf("%s: got %v, want an argument error of %q", c.what, err, c.field)
		}
	}
	if _, err := props.CombustionGas("thirds", props.GasComposition{Nitrogen: 1.0 / 3, Oxygen: 1.0 / 3, Argon: 1.0 / 3}); err != nil {
		t.Error(err)
	}
}

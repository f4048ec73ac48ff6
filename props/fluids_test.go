package props_test

import (
	"errors"
	"fmt"
	"math"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// flueGas is what leaves a burner of natural gas, moist.
var flueGas = props.GasComposition{Nitrogen: 0.71, Oxygen: 0.02, Argon: 0.01, CarbonDioxide: 0.09, Steam: 0.17}

// everyFluid returns the fluids of the package and some of those that are made.
func everyFluid(t testing.TB) []props.Medium {
	t.Helper()
	var all []props.Medium
	for f := range props.Fluids() {
		all = append(all, f)
	}
	add := func(f props.Medium, err error) {
		t.Helper()
		if err != nil {
			t.Fatal(err)
		}
		all = append(all, f)
	}
	add(props.CombustionGas("flue gas", flueGas))
	add(props.CombustionGas("dry flue gas", props.GasComposition{Nitrogen: 0.85, CarbonDioxide: 0.15}))
	add(props.EthyleneGlycol(0.15))
	add(props.EthyleneGlycol(0.6))
	add(props.PropyleneGlycol(0.33))
	add(props.TabulatedLiquid("molten salt", moltenSalt(), units.Kilopascal.Of(50), units.Bar.Of(10), "data sheet"))
	return all
}

// Everything is positive, the state repeats what was asked, Pr = µ c/k, and β is the slope of the density.
func TestFluidsAreConsistent(t *testing.T) {
	for _, f := range everyFluid(t) {
		low, high := f.Range()
		const steps = 23
		for i := range steps {
			T := low.SI() + (high.SI()-low.SI())*(float64(i)+0.5)/steps
			pLow, pHigh, err := f.PressureRange(units.Kelvin.Of(T))
			if err != nil {
				t.Fatal(err)
			}
			p := math.Sqrt(pLow.SI() * pHigh.SI())
			s := state(t, f, T, p)
			at := fmt.Sprintf("%s at %g K and %g Pa", f.Name(), T, p)
			if s.Temperature.SI() != T || s.Pressure.SI() != p {
				t.Errorf("%s: the state is that of %v and %v", at, s.Temperature, s.Pressure)
			}
			for what, x := range map[string]float64{
				"density": s.Density.SI(), "specific heat": s.SpecificHeat.SI(), "conductivity": s.Conductivity.SI(), "viscosity": s.Viscosity.SI(),
			} {
				if !(x > 0 && x <= math.MaxFloat64) {
					t.Errorf("%s: %s %g", at, what, x)
				}
			}
			if want := s.Viscosity.SI() * s.SpecificHeat.SI() / s.Conductivity.SI(); s.Prandtl() != want {
				t.Errorf("%s: Pr %g, want µ c/k = %g", at, s.Prandtl(), want)
			}
			e := 1e-5 * T
			a, b := state(t, f, T-e, p), state(t, f, T+e, p)
			slope := (a.Density.SI() - b.Density.SI()) / (2 * e * s.Density.SI())
			if got := s.Expansion.SI(); math.Abs(got-slope) > 1e-3*math.Abs(slope)+1e-8 {
				t.Errorf("%s: β is %g, and the slope of the density %g", at, got, slope)
			}
			if s.Gas != a.Gas || s.Gas && math.Abs(s.Density.SI()/(2*state(t, f, T, p/2).Density.SI())-1) > 0.35 {
				t.Errorf("%s: no gas", at)
			}
		}
	}
}

// Fluids that are made follow the rules of those of the package at the ends of the range: a value there, and one ULP beyond an error.
func TestEveryFluidEndsWithItsRange(t *testing.T) {
	for _, f := range everyFluid(t) {
		low, high := f.Range()
		for _, T := range []units.Temperature{low, high} {
			pLow, pHigh, err := f.PressureRange(T)
			if err != nil {
				t.Fatal(err)
			}
			for _, c := range []struct {
				p      float64
				inside bool
			}{
				{pLow.SI(), true},
				{pHigh.SI(), true},
				{math.Nextafter(pLow.SI(), 0), false},
				{math.Nextafter(pHigh.SI(), math.Inf(1)), false},
			} {
				_, err := f.At(T, units.Pascal.Of(c.p))
				var r *units.RangeError
				if c.inside && err != nil || !c.inside && (!errors.As(err, &r) || r.Quantity != "pressure" || r.Source != f.Source()) {
					t.Errorf("%s at %v and %g Pa: %v", f.Name(), T, c.p, err)
				}
			}
		}
		for _, T := range []float64{math.Nextafter(low.SI(), 0), math.Nextafter(high.SI(), 1e9)} {
			var r *units.RangeError
			if _, err := f.At(units.Kelvin.Of(T), units.Pascal.Of(1e5)); !errors.As(err, &r) || r.Quantity != "temperature" || r.Min.SI() != low.SI() || r.Max.SI() != high.SI() {
				t.Errorf("%s at %g K: %v", f.Name(), T, err)
			}
		}
	}
}

// What is no temperature or no pressure is an argument error, not a range error.
func TestEveryFluidRefusesTheImpossible(t *testing.T) {
	for _, f := range everyFluid(t) {
		T, p := common(t, f, 380)
		var e *units.ArgumentError
		for _, x := range []float64{0, -1, math.NaN(), math.Inf(1), math.Inf(-1)} {
			if _, err := f.At(units.Kelvin.Of(x), p); !errors.As(err, &e) {
				t.Errorf("%s at %g K: got %v, want an argument error", f.Name(), x, err)
			}
			if _, err := f.At(T, units.Pascal.Of(x)); !errors.As(err, &e) {
				t.Errorf("%s at %g Pa: got %v, want an argument error", f.Name(), x, err)
			}
		}
	}
}

func TestNoFluidAllocates(t *testing.T) {
	for _, f := range everyFluid(t) {
		T, p := common(t, f, 380)
		if n := testing.AllocsPerRun(10, func() { _, _ = f.At(T, p) }); n != 0 {
			t.Errorf("%s: %g allocations", f.Name(), n)
		}
	}
}

func FuzzFluids(f *testing.F) {
	for _, x := range []float64{0, -1, 1e-320, 100, 200, 293.15, 373.2, 1000, 1500, 1e308, math.Inf(1), math.NaN()} {
		f.Add(x, 101325.0)
		f.Add(400.0, x)
	}
	f.Fuzz(func(t *testing.T, temp, p float64) {
		for _, fluid := range everyFluid(t) {
			s, err := fluid.At(units.Kelvin.Of(temp), units.Pascal.Of(p))
			if err == nil && !(s.Density.SI() > 0 && s.SpecificHeat.SI() > 0 && s.Conductivity.SI() > 0 && s.Viscosity.SI() > 0 &&
				s.Expansion.IsFinite() && s.Prandtl() > 0 && !math.IsInf(s.Prandtl(), 0)) {
				t.Errorf("%s at %g K and %g Pa: %v", fluid.Name(), temp, p, s)
			}
		}
	})
}

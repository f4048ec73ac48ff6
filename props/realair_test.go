package props_test

import (
	"errors"
	"fmt"
	"math"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// The arithmetic, against an independent evaluation of the same equations, at 1 atm and 1 MPa, to its seven digits.
func TestCompressedAirArithmetic(t *testing.T) {
	s := readSheet(t, "air_real_gas_computed.csv")
	for i := range s.rows {
		T, p := s.cell(t, i, "T_K").value, s.cell(t, i, "p_Pa").value
		a := state(t, props.CompressedAir(), T, p)
		for column, got := range map[string]float64{
			"rho_kg_m3": a.Density.SI(), "cp_J_kgK": a.SpecificHeat.SI(), "mu_Pa_s": a.Viscosity.SI(), "k_W_mK": a.Conductivity.SI(), "beta_1_K": a.Expansion.SI(),
		} {
			want := s.cell(t, i, column)
			want.half = 5.1e-7 * want.value
			check(t, fmt.Sprintf("air at %g K and %g Pa, %s", T, p, column), got, want, 0, s.name)
		}
	}
}

// A handbook table, all rows from 100 K to 1300 K, at 100 kPa as its densities show. Tolerances as for [airAgainstIncropera]; the
// rows from 1400 K up are headed for other values (k 4 % and 9 % higher than the equation, against 1.4 % by which
// two equations for nitrogen differ there): air that dissociates.
func compressedAirAgainstIncropera(t *testing.T, record *fluidRecord) {
	s := readSheet(t, "air_1atm_incropera.csv")
	air := props.CompressedAir()
	with := record.witness("compressed air", air, "incropera", reasons{"viscosity": olderHotGas})
	n := 0
	for i := range s.rows {
		T := s.cell(t, i, "T_K").value
		if T > 2000 {
			continue
		}
		a := state(t, air, T, 100e3)
		if T > 1300 {
			leaveOutReactingAir(t, with, a, s, i)
			continue
		}
		n++
		muTolerance, kTolerance := math.Hypot(air.ViscosityUncertainty(), 0.02), math.Hypot(air.ConductivityUncertainty(), 0.02)
		if T == 1300 {
			muTolerance = 0.035 // the trend of the rows at 1100 K and 1200 K goes on
		}
		with.check(t, a, "density", s.cell(t, i, "rho_kg_m3"), 0.003)
		with.check(t, a, "specific heat", s.cell(t, i, "cp_J_kgK"), math.Hypot(air.SpecificHeatUncertainty(), 0.005))
		with.check(t, a, "viscosity", s.cell(t, i, "mu_Pa_s"), muTolerance)
		with.check(t, a, "conductivity", s.cell(t, i, "k_W_mK"), kTolerance)
	}
	if n < 12 {
		t.Errorf("only %d rows compared", n)
	}
}

// Where both fluids hold, the ideal gas is within its stated uncertainties of the real one.
func TestAirIsCompressedAirNearAtmosphericPressure(t *testing.T) {
	air, real := props.Air(), props.CompressedAir()
	low, high := air.Range()
	for T := low.SI(); T <= high.SI(); T += 25 {
		for _, p := range []float64{10e3, 100e3, 200e3} {
			a, r := state(t, air, T, p), state(t, real, T, p)
			at := fmt.Sprintf("air at %g K and %g Pa, ", T, p)
			check(t, at+"density", a.Density.SI(), cell{r.Density.SI(), 0}, air.DensityUncertainty(), "real gas")
			check(t, at+"specific heat", a.SpecificHeat.SI(), cell{r.SpecificHeat.SI(), 0}, air.SpecificHeatUncertainty(), "real gas")
			check(t, at+"viscosity", a.Viscosity.SI(), cell{r.Viscosity.SI(), 0}, 2e-5, "real gas")
			check(t, at+"conductivity", a.Conductivity.SI(), cell{r.Conductivity.SI(), 0}, 5e-5, "real gas")
		}
	}
}

// Air at 100 K is a liquid above 0.57 MPa.
func TestCompressedAirCondenses(t *testing.T) {
	T := units.Kelvin.Of(100)
	if _, err := props.CompressedAir().At(T, units.Megapascal.Of(0.56)); err != nil {
		t.Error(err)
	}
	var r *units.RangeError
	if _, err := props.CompressedAir().At(T, units.Megapascal.Of(0.58)); !errors.As(err, &r) || r.Quantity != "pressure" || r.Max.SI() > 0.58e6 {
		t.Errorf("got %v, want a range error of the pressure", err)
	}
}

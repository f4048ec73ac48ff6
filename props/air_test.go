package props_test

import (
	"fmt"
	"math"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

const atmosphere = 101325.0 // Pa

func state(t *testing.T, f props.Fluid, kelvin, pascal float64) props.FluidState {
	t.Helper()
	s, err := f.At(units.Kelvin.Of(kelvin), units.Pascal.Of(pascal))
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// The arithmetic, against an independent evaluation of the same equations, to all seven printed digits.
func TestAirArithmetic(t *testing.T) {
	s := readSheet(t, "air_dry_1atm_computed.csv")
	for i := range s.rows {
		T := s.cell(t, i, "T_K").value
		a := state(t, props.Air(), T, atmosphere)
		for column, got := range map[string]float64{
			"rho_kg_m3": a.Density.SI(), "cp_J_kgK": a.SpecificHeat.SI(), "mu_Pa_s": a.Viscosity.SI(), "k_W_mK": a.Conductivity.SI(),
			"nu_m2_s": a.KinematicViscosity().SI(), "alpha_m2_s": a.Diffusivity().SI(), "Pr": a.Prandtl(), "beta_1_K": a.Expansion.SI(),
		} {
			want := s.cell(t, i, column)
			// Trailing zeros are not printed, so that the half digit is taken as that of seven digits.
			want.half = 5.1e-7 * want.value
			check(t, fmt.Sprintf("air at %g K, %s", T, column), got, want, 0, s.name)
		}
	}
}

// The equation of cp0 against a mixture of the components by other polynomials, which agrees to 6e-5 from 200 K to
// 1200 K and to 1.6e-4 at 1500 K; the mixture leaves out CO2 and trace gases (0.05 %).
func airAgainstMixture(t *testing.T, record *fluidRecord) {
	s := readSheet(t, "air_cp0_mixture.csv")
	with := record.witness("air", props.Air(), "nasa", nil)
	n := 0
	for i := range s.rows {
		T := s.cell(t, i, "T_K").value
		if T > 1500 {
			continue
		}
		tolerance := 1e-4
		if T == 1500 {
			tolerance = 2e-4
		}
		n++
		with.check(t, state(t, props.Air(), T, atmosphere), "specific heat", s.cell(t, i, "cp0_mixture_J_kgK"), tolerance)
	}
	if n < 12 {
		t.Errorf("only %d rows compared", n)
	}
}

// What the ideal gas leaves out is within the stated uncertainties, also at the highest pressure: the second virial
// coefficient makes it proportional to the pressure. The density alone is from another source.
func airAgainstRealGas(t *testing.T, record *fluidRecord) {
	s := readSheet(t, "air_real_gas_1atm.csv")
	air := props.Air()
	with := record.witness("air", air, "realGas", nil)
	for i := range s.rows {
		T := s.cell(t, i, "T_K").value
		a := state(t, air, T, atmosphere)
		at := fmt.Sprintf("air at %g K, ", T)
		const highest = 200e3 / atmosphere
		with.check(t, a, "density", s.cell(t, i, "rho_kg_m3"), air.DensityUncertainty()/highest)
		check(t, at+"specific heat", a.SpecificHeat.SI(), s.cell(t, i, "cp_J_kgK"), air.SpecificHeatUncertainty()/highest, s.name)
		check(t, at+"viscosity", a.Viscosity.SI(), s.cell(t, i, "mu_Pa_s"), 1e-5, s.name)
		check(t, at+"conductivity", a.Conductivity.SI(), s.cell(t, i, "k_W_mK"), 1e-5, s.name)
		if T >= 270 {
			check(t, at+"density from 270 K up", a.Density.SI(), s.cell(t, i, "rho_kg_m3"), 1e-3, s.name)
		}
		// The expansion coefficient of the real gas is higher by up to 0.9 % at 200 K.
		check(t, at+"expansion", a.Expansion.SI(), s.cell(t, i, "beta_1_K"), 0.009, s.name)
	}
}

// A handbook table, all of its rows from 200 K to 1300 K. The tolerance joins our uncertainty with that of the
// table, for which 0.5 % in specific heat, 2 % in viscosity and conductivity are taken.
//
// The densities of the table, which is headed "atmospheric pressure", are those at 100 kPa: 1.3 % below those at 1 atm in
// every row. They are compared there, to the uncertainty of our density at that pressure.
//
// From 1100 K up the viscosity of the handbook is 2.5 % to 3.4 % below the equation of 2004. The polynomials of R. A.
// Svehla, NASA TM 4647 (1995), agree for nitrogen with the equation to 0.2 % from 1000 K to 1500 K: the older
// data of the handbook are low. These rows have 3.5 %. From 1400 K up
// the conductivity of the handbook leaves that of air which does not react, by 4 % and 9 %: those rows are left out.
func airAgainstIncropera(t *testing.T, record *fluidRecord) {
	s := readSheet(t, "air_1atm_incropera.csv")
	air := props.Air()
	with := record.witness("air", air, "incropera", reasons{"viscosity": olderHotGas})
	n := 0
	for i := range s.rows {
		T := s.cell(t, i, "T_K").value
		if T < 200 || T > 1500 {
			continue
		}
		a := state(t, air, T, 100e3)
		if T > 1300 {
			leaveOutReactingAir(t, with, a, s, i)
			continue
		}
		n++
		at := fmt.Sprintf("air at %g K, ", T)
		muTolerance := math.Hypot(air.ViscosityUncertainty(), 0.02)
		if T >= 1100 {
			muTolerance = 0.035
		}
		kTolerance := math.Hypot(air.ConductivityUncertainty(), 0.02)
		with.check(t, a, "density", s.cell(t, i, "rho_kg_m3"), air.DensityUncertainty()/2)
		with.check(t, a, "specific heat", s.cell(t, i, "cp_J_kgK"), 0.005)
		with.check(t, a, "viscosity", s.cell(t, i, "mu_Pa_s"), muTolerance)
		with.check(t, a, "conductivity", s.cell(t, i, "k_W_mK"), kTolerance)
		check(t, at+"Prandtl number", a.Prandtl(), s.cell(t, i, "Pr"), math.Hypot(muTolerance, kTolerance), s.name)
	}
	if n < 12 {
		t.Errorf("only %d rows compared", n)
	}
}

// leaveOutReactingAir leaves out a row of the handbook at 1400 K or above.
func leaveOutReactingAir(t *testing.T, with witness, a props.FluidState, s sheet, i int) {
	t.Helper()
	for _, c := range [][2]string{{"density", "rho_kg_m3"}, {"specific heat", "cp_J_kgK"}, {"conductivity", "k_W_mK"}, {"viscosity", "mu_Pa_s"}} {
		with.leaveOut(t, a, c[0], s.cell(t, i, c[1]), "the handbook leaves air that does not react")
	}
}

// A second handbook table. Its conductivity is 2 % to 3 % below the equation of 2004 between −100 and 100 °C, and so below
// the first handbook as well, which is within 0.4 % at 300 K: the table is known for it, and its Prandtl number is as
// much too high (0.731 at 20 °C against 0.707). The conductivity is compared after multiplication by 1.026.
func airAgainstCengel(t *testing.T, record *fluidRecord) {
	s := readSheet(t, "air_1atm_cengel.csv")
	air := props.Air()
	with := record.witness("air", air, "cengelAir", reasons{
		"conductivity": "the table is known to be 2 % to 3 % low, and its Prandtl numbers as much too high; another handbook agrees with ours within 0.4 % at 300 K",
	})
	n := 0
	for i := range s.rows {
		celsius := s.cell(t, i, "t_degC").value
		if celsius < -60 {
			continue // below 200 K, and a specific heat below that of the ideal gas at −100 °C
		}
		n++
		a := state(t, air, celsius+273.15, atmosphere)
		k := s.cell(t, i, "k_W_mK")
		with.check(t, a, "density", s.cell(t, i, "rho_kg_m3"), 0.002)
		with.check(t, a, "specific heat", s.cell(t, i, "cp_J_kgK"), 0.005)
		with.check(t, a, "viscosity", s.cell(t, i, "mu_Pa_s"), air.ViscosityUncertainty())
		with.note(t, a, "conductivity", k)
		k.value *= 1.026
		check(t, fmt.Sprintf("air at %g °C, conductivity", celsius), a.Conductivity.SI(), k, 0.012, s.name)
	}
	if n < 12 {
		t.Errorf("only %d rows compared", n)
	}
}

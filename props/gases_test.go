package props_test

import (
	"fmt"
	"math"
	"testing"

	"example.com/coolward/props"
)

var gasesBySymbol = map[string]props.Medium{
	"N2": props.Nitrogen(), "O2": props.Oxygen(), "Ar": props.Argon(), "CO2": props.CarbonDioxide(), "H2": props.Hydrogen(), "He": props.Helium(),
}

// The arithmetic, against an independent evaluation of the same equations, to its six digits. It takes the gas at zero density
// for the transport properties; at 10 kPa the density adds at most 4e-4 to the conductivity.
func TestGasArithmetic(t *testing.T) {
	const p = 10e3
	s := readSheet(t, "gases_1atm_computed.csv")
	for i := range s.rows {
		symbol := s.text(t, i, "gas")
		f := gasesBySymbol[symbol]
		T := s.cell(t, i, "T_K").value
		if low, _ := f.Range(); T < low.SI() {
			continue // CO2 at 200 K
		}
		g := state(t, f, T, p)
		for column, got := range map[string]float64{
			"rho_kg_m3": g.Density.SI() * atmosphere / p, "cp_J_kgK": g.SpecificHeat.SI(), "mu_Pa_s": g.Viscosity.SI(), "k_W_mK": g.Conductivity.SI(),
		} {
			want := s.cell(t, i, column)
			want.half = 5.1e-6 * want.value
			tolerance := 0.0
			if column == "mu_Pa_s" || column == "k_W_mK" {
				tolerance = 4e-4
			}
			check(t, fmt.Sprintf("%s at %g K, %s", symbol, T, column), got, want, tolerance, s.name)
		}
	}
}

// A handbook, all of its rows in the range. The tolerance joins our uncertainty with that of the table, for which 0.5 % in
// specific heat and 2 % in viscosity and conductivity are taken.
//
// Its densities, headed "atmospheric pressure", are those at 100 kPa, but for helium, which is at 1 atm; those of carbon dioxide are
// of the real gas. The specific heat of nitrogen at 800 K is a misprint (the neighbours are 1098 and 1146) and must be missed by it.
//
// Older viscosities of nitrogen, carbon dioxide and helium fall below the newer equations at high temperature, as those of air do: 3.7 % in N2 at 1000 K,
// 4.1 % in CO2 at 450 K, 3.6 % in He at 1000 K. Nitrogen has 4 % from 800 K up; the others are within the joined uncertainties.
func gasesAgainstIncropera(t *testing.T, record *fluidRecord) {
	s := readSheet(t, "gases_1atm_incropera.csv")
	rows := map[string]int{}
	known := map[string]reasons{
		"N2":  {"viscosity": olderHotGas},
		"CO2": {"viscosity": olderHotGas},
		"O2": {
			"viscosity":    olderHotGas,
			"conductivity": "from 350 K to 450 K it breaks the trend of the table, whose Prandtl number rises from 0.711 to 0.741 and falls to 0.716",
		},
	}
	for i := range s.rows {
		symbol := s.text(t, i, "gas")
		f := gasesBySymbol[symbol]
		T := s.cell(t, i, "T_K").value
		low, high := f.Range()
		if T < low.SI() || T > high.SI() {
			continue
		}
		rows[symbol]++
		p := 100e3
		if symbol == "He" {
			p = atmosphere
		}
		g := state(t, f, T, p)
		with := record.witness(f.Name(), f, "incropera", known[symbol])
		muTolerance := math.Hypot(f.ViscosityUncertainty(), 0.02)
		if symbol == "N2" && T >= 800 {
			muTolerance = 0.04
		}
		kTolerance := math.Hypot(f.ConductivityUncertainty(), 0.02)
		cpTolerance := math.Hypot(f.SpecificHeatUncertainty(), 0.005)
		with.check(t, g, "density", s.cell(t, i, "rho_kg_m3"), f.DensityUncertainty())
		with.check(t, g, "viscosity", s.cell(t, i, "mu_Pa_s"), muTolerance)
		with.check(t, g, "conductivity", s.cell(t, i, "k_W_mK"), kTolerance)
		if symbol == "N2" && T == 800 {
			if off := s.cell(t, i, "cp_J_kgK").value/g.SpecificHeat.SI() - 1; off < 0.08 {
				t.Errorf("N2 at 800 K: off the misprinted specific heat by %.3g only", off)
			}
			with.leaveOut(t, g, "specific heat", s.cell(t, i, "cp_J_kgK"), misprint)
			continue
		}
		with.check(t, g, "specific heat", s.cell(t, i, "cp_J_kgK"), cpTolerance)
		check(t, fmt.Sprintf("%s at %g K, Prandtl number", symbol, T), g.Prandtl(), s.cell(t, i, "Pr"), math.Hypot(cpTolerance, math.Hypot(muTolerance, kTolerance)), s.name)
	}
	for symbol := range gasesBySymbol {
		if want := 5; rows[symbol] < want && symbol != "Ar" {
			t.Errorf("%s: only %d rows compared, want %d", symbol, rows[symbol], want)
		}
	}
}

// Argon, which the handbook leaves out: viscosity of J. Kestin et al., J. Phys. Chem. Ref. Data 13 (1984) 229, dilute gas, and conductivity k = 15 R µ/(4 M) of a
// monatomic gas to 0.2 % (kinetic theory, first order times 1.002); viscosities from memory, four digits, taken as good to 0.5 %.
func argonAgainstKestin(t *testing.T, record *fluidRecord) {
	f := props.Argon()
	with := record.witness("argon", f, "kestin", nil)
	for _, r := range []struct{ T, mu float64 }{{273.15, 21.03e-6}, {298.15, 22.60e-6}, {373.15, 27.16e-6}, {473.15, 32.63e-6}, {673.15, 42.1e-6}} {
		g := state(t, f, r.T, 10e3)
		with.check(t, g, "viscosity", cell{r.mu, 0}, 0.01)
		k := 15.0 / 4 * 8.314462618 / 39.948e-3 * g.Viscosity.SI() * 1.002
		check(t, fmt.Sprintf("argon at %g K, conductivity", r.T), g.Conductivity.SI(), cell{k, 0}, 0.01, "kinetic theory")
	}
}

// Helium likewise: k = 15 R µ/(4 M) from 200 K to 2000 K within 0.5 %, and 19.94 µPa s, 156.0 mW/(m K) at 300 K ab initio (E. Bich, R. Hellmann, E. Vogel 2007, from memory).
func heliumAgainstAbInitio(t *testing.T, record *fluidRecord) {
	for _, T := range []float64{200, 300, 700, 1500, 2000} {
		g := state(t, props.Helium(), T, 1e5)
		k := 15.0 / 4 * 8.314462618 / 4.002602e-3 * g.Viscosity.SI()
		check(t, fmt.Sprintf("helium at %g K, conductivity", T), g.Conductivity.SI(), cell{k, 0}, 0.006, "kinetic theory")
	}
	g := state(t, props.Helium(), 300, 1e5)
	with := record.witness("helium", props.Helium(), "bich", nil)
	with.check(t, g, "viscosity", cell{19.94e-6, 0}, 0.001)
	with.check(t, g, "conductivity", cell{156.0e-3, 0}, 0.003)
}

// What the ideal gas leaves out is within the stated uncertainty of the density all over the range: second virial coefficient of C. Tsonopoulos, AIChE J. 20 (1974) 263,
// with critical constants and acentric factors, all from memory.
func idealGasesAgainstVirial(t *testing.T, record *fluidRecord) {
	for _, g := range []struct {
		symbol     string
		tc, pc, ac float64 // K, Pa, acentric factor
	}{
		{"N2", 126.19, 3.396e6, 0.037},
		{"O2", 154.58, 5.043e6, 0.022},
		{"Ar", 150.69, 4.863e6, -0.002},
		{"CO2", 304.13, 7.377e6, 0.224},
		{"H2", 33.19, 1.313e6, -0.216},
		{"He", 5.195, 0.2275e6, -0.39},
	} {
		f := gasesBySymbol[g.symbol]
		with := record.witness(f.Name(), f, "tsonopoulos", nil)
		low, high := f.Range()
		for T := low.SI(); T <= high.SI(); T += 50 {
			const p = 200e3
			r := T / g.tc
			b := 0.1445 - 0.330/r - 0.1385/(r*r) - 0.0121/(r*r*r) - 0.000607/math.Pow(r, 8) +
				g.ac*(0.0637+0.331/(r*r)-0.423/(r*r*r)-0.008/math.Pow(r, 8))
			z := 1 + b*g.tc/g.pc*p/T
			s := state(t, f, T, p)
			with.check(t, s, "density", cell{s.Density.SI() / z, 0}, f.DensityUncertainty())
		}
	}
}

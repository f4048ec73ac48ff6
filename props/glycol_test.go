package props_test

import (
	"errors"
	"fmt"
	"math"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func glycol(t *testing.T, kind string, x float64) props.Medium {
	t.Helper()
	constructor := props.EthyleneGlycol
	if kind == "PG" {
		constructor = props.PropyleneGlycol
	}
	f, err := constructor(x)
	if err != nil {
		t.Fatal(err)
	}
	return f
}

// The arithmetic, against an independent evaluation of the same equations, to the five digits that it prints.
func TestGlycolArithmetic(t *testing.T) {
	s := readSheet(t, "glycol_computed.csv")
	for i := range s.rows {
		kind, x, T := s.text(t, i, "glycol"), s.cell(t, i, "x_mass").value, s.cell(t, i, "T_K").value
		f := glycol(t, kind, x)
		g := state(t, f, T, atmosphere)
		at := fmt.Sprintf("%s, %g by mass, at %g K, ", kind, x, T)
		for column, got := range map[string]float64{
			"rho_kg_m3": g.Density.SI(), "cp_J_kgK": g.SpecificHeat.SI(), "mu_Pa_s": g.Viscosity.SI(), "k_W_mK": g.Conductivity.SI(),
		} {
			want := s.cell(t, i, column)
			want.half = 5.1e-5 * want.value
			check(t, at+column, got, want, 0, s.name)
		}
		low, _ := f.Range()
		check(t, at+"freezing", low.SI()-273.15, s.cell(t, i, "Tfreeze_degC"), 0, s.name)
	}
}

// Densities that were read.
func ethyleneGlycolAgainstDensities(t *testing.T, record *fluidRecord) {
	s := readSheet(t, "glycol_density_read.csv")
	if len(s.rows) < 5 {
		t.Errorf("only %d rows", len(s.rows))
	}
	for i := range s.rows {
		x, T := s.cell(t, i, "x_mass").value, s.cell(t, i, "T_K").value
		f := glycol(t, "EG", x)
		with := record.witness(ethyleneRow, f, "corechem", nil)
		with.check(t, state(t, f, T, atmosphere), "density", s.cell(t, i, "seen_rho_kg_m3"), 2e-4)
	}
}

// Handbook values. L. Laloui, A. F. Rotta Loria, Analysis and Design of Energy Geostructures, tables 3.7 and 3.8, read: 25 % and 50 % of ethylene glycol at
// 20 °C; its viscosities, 1.33 and 2.02 mPa s, are about half of the others and are left out. ASHRAE Fundamentals, chapter 31, from memory: 50 % by
// volume at 20 °C, which is 52.3 % of ethylene and 50.9 % of propylene glycol by mass, with viscosities that are those of inhibited fluids.
//
// For propylene glycol this row and the freezing temperatures are all that there is from another source.
func glycolAgainstHandbooks(t *testing.T, record *fluidRecord) {
	for _, r := range []struct {
		kind             string
		x                float64
		rho, cp, k, mu   float64
		dRho, dCp, dK, d float64 // half digits
		source           string
	}{
		{"EG", 0.25, 1038, 3760, 0.499, 0, 0.5, 0.5, 5e-4, 0, "laloui"},
		{"EG", 0.50, 1079, 3321, 0.406, 0, 0.5, 0.5, 5e-4, 0, "laloui"},
		{"EG", 0.523, 0, 3280, 0.385, 3.9e-3, 0, 5, 0.005, 5e-5, "ashrae"},
		{"PG", 0.509, 1045, 3560, 0.36, 6.4e-3, 0.5, 5, 0.005, 5e-5, "ashrae"},
	} {
		f := glycol(t, r.kind, r.x)
		g := state(t, f, 293.15, atmosphere)
		with := record.witness(map[string]string{"EG": ethyleneRow, "PG": propyleneRow}[r.kind], f, r.source, nil)
		if r.rho != 0 {
			with.check(t, g, "density", cell{r.rho, r.dRho}, f.DensityUncertainty())
		}
		with.check(t, g, "specific heat", cell{r.cp, r.dCp}, f.SpecificHeatUncertainty())
		with.check(t, g, "conductivity", cell{r.k, r.dK}, f.ConductivityUncertainty())
		if r.mu != 0 {
			with.check(t, g, "viscosity", cell{r.mu, r.d}, f.ViscosityUncertainty())
		}
	}
}

// Where it freezes: ASHRAE Fundamentals, chapter 31, from memory, to the 1 K and 2 K by which handbooks differ.
func TestGlycolFreezes(t *testing.T) {
	for _, r := range []struct {
		kind              string
		x, celsius, slack float64
	}{
		{"EG", 0.30, -14.5, 1},
		{"EG", 0.50, -35, 2},
		{"PG", 0.312, -13, 1.5}, // 30 % by volume
		{"PG", 0.509, -33, 1.5}, // 50 % by volume
	} {
		f := glycol(t, r.kind, r.x)
		low, _ := f.Range()
		check(t, f.Name()+" freezes, °C", low.SI()-273.15, cell{r.celsius, r.slack}, 0, "ASHRAE, from memory")
		var e *units.RangeError
		if _, err := f.At(units.Kelvin.Of(low.SI()-0.01), units.Bar.Of(1)); !errors.As(err, &e) || e.Quantity != "temperature" {
			t.Errorf("%s below its freezing temperature: %v", f.Name(), err)
		}
	}
}

// The lowest pressure is that at which water boils: 611.2 Pa at 0 °C, and not less below, and 47.4 kPa at 80 °C (IAPWS R7-97).
func TestGlycolLowestPressure(t *testing.T) {
	f := glycol(t, "EG", 0.5)
	for _, r := range []struct{ celsius, p, half float64 }{{-20, 611.2, 0.05}, {0, 611.2, 0.05}, {80, 47.4e3, 50}} {
		low, _, err := f.PressureRange(units.Celsius.Of(r.celsius))
		if err != nil {
			t.Fatal(err)
		}
		check(t, fmt.Sprintf("lowest pressure at %g °C", r.celsius), low.SI(), cell{r.p, r.half}, 0, "IAPWS R7-97")
	}
}

func TestGlycolConcentration(t *testing.T) {
	if f := glycol(t, "EG", 0.3); f.Name() != "ethylene glycol 30 %" {
		t.Errorf("name %q", f.Name())
	}
	for _, x := range []float64{math.Nextafter(0.15, 0), math.Nextafter(0.6, 1), 30, -0.3, 0, math.NaN(), math.Inf(1)} {
		var e *units.ArgumentError
		if _, err := props.EthyleneGlycol(x); !errors.As(err, &e) {
			t.Errorf("ethylene glycol %g: %v", x, err)
		}
		if _, err := props.PropyleneGlycol(x); !errors.As(err, &e) {
			t.Errorf("propylene glycol %g: %v", x, err)
		}
	}
}

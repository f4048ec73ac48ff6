package property

import (
	"fmt"
	"math"
	"testing"
)

// The density check table of Lemmon et al. (2000), from memory, 5 digits, 0.1 MPa to 2000 MPa: the published pressure lies
// between those of the published density, half a digit less and more.
func TestRealAirCheckTable(t *testing.T) {
	for _, c := range []struct {
		temp, p, rho, half float64 // K, MPa, mol/dm³
	}{
		{140, 0.101325, 0.087718, 5e-7},
		{270, 0.101325, 0.045164, 5e-7},
		{400, 0.101325, 0.030461, 5e-7},
		{2000, 0.101325, 0.0060922, 5e-8},
		{140, 10, 19.810, 5e-4},
		{270, 10, 4.6064, 5e-5},
		{400, 10, 2.9202, 5e-5},
		{2000, 10, 0.59094, 5e-6},
		{270, 2000, 47.327, 5e-4},
		{400, 2000, 45.208, 5e-4},
		{2000, 2000, 32.893, 5e-4},
	} {
		low, high := RealAirPressure(c.temp, (c.rho-c.half)*1e3)/1e6, RealAirPressure(c.temp, (c.rho+c.half)*1e3)/1e6
		if !(low <= c.p && c.p <= high) {
			t.Errorf("%g K, %g mol/dm³: pressure %g to %g MPa, want %g MPa between them", c.temp, c.rho, low, high, c.p)
		}
	}
}

// The density returns the pressure, all over the range.
func TestRealAirDensity(t *testing.T) {
	for _, temp := range []float64{100, 101, 105, 108, 110, 120, 132.6, 133, 150, 200, 300, 500, 1000, 2000} {
		for _, p := range []float64{1e4, 1e5, 3e5, 5e5, 7e5, 1e6} {
			if p = min(p, AirDewPressure(temp)); p == 0 {
				continue
			}
			rho, _, _, _, _ := RealAir(temp, p)
			near(t, fmt.Sprintf("pressure of the density at %g K and %g Pa", temp, p), RealAirPressure(temp, rho/airMolarMass), p, 1e-11*p)
		}
	}
}

// A small step of the density changes the powers to the first order: what is left is of the second.
func TestAirPowersMove(t *testing.T) {
	const d, step = 0.12, 1e-5
	got, want := newAirPowers(d).moved(step), newAirPowers(d+step)
	for i, x := range []struct{ got, want float64 }{{got.d, want.d}, {got.d2, want.d2}, {got.d3, want.d3}, {got.e1, want.e1}, {got.e2, want.e2}, {got.e3, want.e3}} {
		near(t, fmt.Sprintf("power %d", i), x.got, x.want, 2*step*step)
	}
}

// cp, β and the pressure against derivatives of the Helmholtz energy by differences: the enthalpy is
// h/(R T) = 1 + τ(α⁰_τ + α_τ) + δ α_δ, and its derivative at constant pressure is cp. α_τ comes from differences of α,
// so that the derivatives in the kernel are tested against the sum itself.
func TestRealAirDerivatives(t *testing.T) {
	alpha := func(temp, molar float64) float64 {
		d, tau := molar/airReducingDens, airReducingTemp/temp
		sum := 0.0
		for _, x := range airTerms {
			e := 1.0
			if x.l > 0 {
				e = math.Exp(-math.Pow(d, x.l))
			}
			sum += x.n * math.Pow(d, x.i) * math.Pow(tau, x.j) * e
		}
		return sum
	}
	for _, c := range []struct{ temp, p float64 }{{110, 5e5}, {150, 1e6}, {200, 1e5}, {300, 1e6}, {1000, 1e6}} {
		density := func(temp float64) float64 {
			rho, _, _, _, _ := RealAir(temp, c.p)
			return rho / airMolarMass
		}
		// Residual enthalpy over R: T (τ α_τ + δ α_δ), and τ α_τ = −T ∂α/∂T.
		residual := func(temp float64) float64 {
			m, e := density(temp), 1e-3*temp
			alphaT := (8*(alpha(temp+e, m)-alpha(temp-e, m)) - (alpha(temp+2*e, m) - alpha(temp-2*e, m))) / (12 * e)
			q := c.p/(m*lemmonR*temp) - 1
			return temp * (-temp*alphaT + q)
		}
		e := 1e-3 * c.temp
		_, cp, _, _, beta := RealAir(c.temp, c.p)
		want := AirCp0(c.temp) + airCp0Unit*(8*(residual(c.temp+e)-residual(c.temp-e))-(residual(c.temp+2*e)-residual(c.temp-2*e)))/(12*e)
		near(t, fmt.Sprintf("cp at %g K, %g Pa", c.temp, c.p), cp, want, 1e-6*want)
		slope := (8*(density(c.temp+e)-density(c.temp-e)) - (density(c.temp+2*e) - density(c.temp-2*e))) / (12 * e)
		near(t, fmt.Sprintf("β at %g K, %g Pa", c.temp, c.p), beta, -slope/density(c.temp), 1e-6*beta)
	}
}

// Where air condenses: 81.72 K at 1 atm (Lemmon et al. 2000, from memory), and not above 132.6312 K, where the equation gives
// 3.78502 MPa.
func TestAirDewPressure(t *testing.T) {
	near(t, "dew pressure at 81.72 K", AirDewPressure(81.72), 101325, 60) // 5e-3 K times 11.6 kPa/K
	near(t, "dew pressure at 132.6312 K", AirDewPressure(airReducingTemp), 3.78502e6, 1)
	if p := AirDewPressure(132.64); !math.IsInf(p, 1) {
		t.Errorf("dew pressure at 132.64 K: %g", p)
	}
}

func BenchmarkRealAir(b *testing.B) {
	for i := 0; b.Loop(); i++ {
		RealAir(300+float64(i&63), 7e5)
	}
}

package property

import (
	"math"

	"example.com/coolward/internal/pow"
)

// Constants of dry air: the molar gas constant is exact (SI Brochure, 9th ed., 2019); the molar mass
// and the reducing point are those of Lemmon et al. (2000) and Lemmon and Jacobsen (2004).
const (
	gasConstant     = 8.314462618 // J/(mol K)
	airMolarMass    = 28.9586e-3  // kg/mol
	airReducingTemp = 132.6312    // K
	airReducingDens = 10.4477e3   // mol/m³
	airEpsilon      = 103.3       // K, ε/k of the Lennard-Jones potential
	lemmonR         = 8.314510    // J/(mol K), the gas constant of the cp0 equation
	airCp0Unit      = lemmonR / airMolarMass
)

// Air returns density, isobaric specific heat, thermal conductivity and viscosity of dry air at the
// temperature t and the pressure p: the density of an ideal gas, the heat capacity of the ideal gas,
// and the transport properties at that density.
func Air(t, p float64) (rho, cp, k, mu float64) {
	molar := p / (gasConstant * t)
	k, mu = AirTransport(t, molar)
	return molar * airMolarMass, AirCp0(t), k, mu
}

// AirCp0 returns the isobaric specific heat of dry air as an ideal gas: E. W. Lemmon, R. T.
// Jacobsen, S. G. Penoncello, D. G. Friend, J. Phys. Chem. Ref. Data 29 (2000) 331–385, from the
// second derivative of the ideal-gas Helmholtz energy, 60 K to 2000 K. Coefficients from memory.
func AirCp0(t float64) float64 {
	const (
		n1, n2, n3 = 6.057194e-8, -2.10274769e-5, -1.58860716e-4
		n6, n7     = -1.9536342e-4, 2.490888032
		n8, n9     = 0.791309509, 0.212236768
		n10        = -0.197938904
		n11, n12   = 25.36365, 16.90741
		n13        = 87.31279
	)
	tau := airReducingTemp / t
	inv := 1 / tau
	// The terms i = 4 and 5 vanish by the factor (i − 4)(i − 5).
	a := ((12*n1*inv+6*n2)*inv + 2*n3) * inv
	a += 0.75*n6*tau*math.Sqrt(tau) - n7
	a -= n8*einstein(n11*tau) + n9*einstein(n12*tau)
	x := n13 * tau
	e := 2.0 / 3 * exp(-x)
	a += n10 * x * x * e / ((e + 1) * (e + 1))
	return airCp0Unit * (1 - a)
}

// einstein returns x² eˣ/(eˣ − 1)², without overflow for a large x.
func einstein(x float64) float64 {
	e := exp(-x)
	return x * x * e / ((1 - e) * (1 - e))
}

// exp returns eˣ in half the time of math.Exp, with a relative error of a few 1e-16 (1 + |x|).
func exp(x float64) float64 { return pow.Exp2(math.Log2E * x) }

// AirTransport returns thermal conductivity and viscosity of air at the temperature t and the molar
// density rho: E. W. Lemmon, R. T. Jacobsen, Int. J. Thermophys. 25 (2004) 21–69, dilute and
// residual parts, without the critical enhancement of the conductivity, which is nil in a gas near
// atmospheric pressure. Coefficients from memory.
//
// Every power of τ = Tc/T is a multiple of 0.05, so that one exponential serves them all.
func AirTransport(t, rho float64) (k, mu float64) {
	lnT := math.Ln2 * pow.Log2(t)
	d := rho / airReducingDens
	z := exp(0.05 * (lnAirReducing - lnT))
	return airTransport(t, lnT, z, airPowers{d: d, d2: d * d, e1: exp(-d), e2: exp(-d * d)})
}

// airTransport is [AirTransport] with z = τ^0.05 and those powers of the reduced density that it needs.
func airTransport(t, lnT, z float64, x airPowers) (k, mu float64) {
	l := lnT - lnAirEpsilon
	inverse := exp(-(0.431 + l*(-0.4623+l*(0.08406+l*(0.005341+l*-0.00331))))) // of the collision integral
	mu0 := airDilute * math.Sqrt(t) * inverse                                  // µPa s

	z2 := z * z
	z4 := z2 * z2
	z6 := z4 * z2
	z10 := z6 * z4
	z12 := z6 * z6
	z24 := z12 * z12
	z26 := z24 * z2
	z48 := z24 * z24
	z54 := z48 * z6
	z72 := z48 * z24

	d, d2, e1, e2 := x.d, x.d2, x.e1, x.e2
	d4 := d2 * d2
	d8 := d4 * d4

	muR := 10.72*z4*d + 1.122*z*d4 + 0.002019*z48*d8*d + (-8.876*z12*d-0.02916*z72*d8)*e1
	k0 := 1.308*mu0 + 1.405/(z10*z12) - 1.036/z6 // mW/(m K)
	kR := 8.743*z2*d + 14.76*d2 +
		(-16.62*z10*d2*d+(3.793*z54-6.142*z6)*d4*d2*d-0.3778*z26*d8*d2*d)*e2
	return (k0 + kR) * 1e-3, (mu0 + muR) * 1e-6
}

var (
	lnAirEpsilon  = math.Log(airEpsilon)
	lnAirReducing = math.Log(airReducingTemp)
	airDilute     = 0.0266958 * math.Sqrt(airMolarMass*1e3) / (0.36 * 0.36) // σ = 0.36 nm
)

package property

import (
	"math"
	"math/cmplx"
)

// Triple point of water.
const (
	tripleTemp     = 273.16  // K
	triplePressure = 611.657 // Pa
)

// Ice is ice Ih at 101325 Pa: IAPWS R10-06(2009), equations (1) to (4), with the conductivity of Y.-C. Yen, CRREL Report
// 81-10 (1981). Coefficients from memory; those of R10-06 reproduce the table of check values of the release.
type Ice struct{}

var (
	iceT1 = complex(0.368017112855051e-1, 0.510878114959572e-1)
	iceR1 = complex(0.447050716285388e2, 0.656876847463481e2)
	iceT2 = complex(0.337315741065416, 0.335449415919309)
	iceR2 = [3]complex128{
		complex(-0.725974574329220e2, -0.781008427112870e2),
		complex(-0.557107698030123e-4, 0.464578634580806e-4),
		complex(0.234801409215913e-10, -0.285651142904972e-10),
	}
	iceG0 = [5]float64{-0.632020233335886e6, 0.655022213658955, -0.189369929326131e-7, 0.339746123271053e-14, -0.556464869058991e-21}
)

// icePressure is π − π0, the pressure against 101325 Pa in units of that of the triple point.
func icePressure(p float64) float64 { return (p - 101325) / triplePressure }

func iceR2At(x float64) complex128 {
	return iceR2[0] + complex(x, 0)*(iceR2[1]+complex(x, 0)*iceR2[2])
}

// SpecificHeat returns the isobaric specific heat.
func (Ice) SpecificHeat(t float64) float64 { return IceSpecificHeat(t, 101325) }

// IceSpecificHeat returns the isobaric specific heat at the temperature t and the pressure p, to 273.16 K and 210 MPa.
func IceSpecificHeat(t, p float64) float64 {
	tau := complex(t/tripleTemp, 0)
	// 1/(t − τ) + 1/(t + τ) − 2/t
	curve := func(r, k complex128) float64 { return real(r * 2 * tau * tau / (k * (k*k - tau*tau))) }
	return -t / tripleTemp * (curve(iceR1, iceT1) + curve(iceR2At(icePressure(p)), iceT2))
}

// Enthalpy returns the specific enthalpy at 101325 Pa, zero at 0 K.
func (Ice) Enthalpy(t float64) float64 { return IceEnthalpy(t) - iceG0[0] }

// IceEnthalpy returns the specific enthalpy at 101325 Pa, with the zero of [Gibbs.Enthalpy].
func IceEnthalpy(t float64) float64 {
	tau := complex(t/tripleTemp, 0)
	part := func(r, k complex128) float64 {
		return real(r * (k*(cmplx.Log(k-tau)+cmplx.Log(k+tau)-2*cmplx.Log(k)) + tau*tau/k))
	}
	return iceG0[0] + tripleTemp*(part(iceR1, iceT1)+part(iceR2[0], iceT2))
}

// IceDensity returns the density at the temperature t and the pressure p, to 273.16 K and 210 MPa.
func IceDensity(t, p float64) float64 {
	tau := complex(t/tripleTemp, 0)
	x := icePressure(p)
	g := iceG0[1] + x*(2*iceG0[2]+x*(3*iceG0[3]+x*4*iceG0[4]))
	r := iceR2[1] + complex(2*x, 0)*iceR2[2]
	k := iceT2
	g += tripleTemp * real(r*((k-tau)*cmplx.Log(k-tau)+(k+tau)*cmplx.Log(k+tau)-2*k*cmplx.Log(k)-tau*tau/k))
	return triplePressure / g
}

// Conductivity returns the thermal conductivity.
func (Ice) Conductivity(t float64) float64 { return 9.828 * math.Exp(-0.0057*t) }

// IceSublimation returns the pressure of vapour above ice at the temperature t: IAPWS R14-08(2011), equation (6), 50 K to 273.16 K.
// Coefficients from memory; they reproduce the check value at 230 K.
func IceSublimation(t float64) float64 {
	const (
		a1, a2, a3 = -0.212144006e2, 0.273203819e2, -0.610598130e1
		b1, b2, b3 = 0.333333333e-2, 0.120666667e1, 0.170333333e1
	)
	theta := t / tripleTemp
	l := math.Log(theta)
	return triplePressure * math.Exp((a1*math.Exp(b1*l)+a2*math.Exp(b2*l)+a3*math.Exp(b3*l))/theta)
}

package property

import (
	"math"

	"example.com/coolward/internal/pow"
)

// Water returns density, isobaric specific heat, thermal conductivity, viscosity and the isobaric
// expansion coefficient of liquid water at 0.1 MPa: IAPWS SR6-08(2011), Supplementary Release on
// Properties of Liquid Water at 0.1 MPa. Coefficients from memory.
//
// Every power of T/300 K is a multiple of 0.05, so that one logarithm and one exponential serve
// them all.
func Water(t float64) (rho, cp, k, mu, beta float64) {
	const (
		r  = 461.51805 // J/(kg K)
		p0 = 1e5       // Pa
	)
	tau := t / 10
	a := 10 / (593 - t)
	b := 10 / (t - 232)
	a2 := a * a
	a4 := a2 * a2
	b2 := b * b

	va := a4 * (6744.58446 + a*(-222521.604+a2*(100231247.0+a*(-1635521180.0+a*8322996580.0))))
	vb := b * (0.00578545292 + b*(-0.0153195665+b*(0.0311337859+b*(-0.0423546241+b*(0.0338713507+b*-0.0119946761)))))
	v := 0.0193763157 + va + vb
	// dα/dT = α²/(10 K) and dβ/dT = −β²/(10 K).
	dv := a4*a*(4*6744.58446+a*(5*-222521.604+a2*(7*100231247.0+a*(8*-1635521180.0+a*9*8322996580.0)))) -
		b2*(0.00578545292+b*(2*-0.0153195665+b*(3*0.0311337859+b*(4*-0.0423546241+b*(5*0.0338713507+b*6*-0.0119946761)))))

	ga := a4 * a2 * (20*-166147.0539 + a*(30*2708781.64+a2*56*-155719154.4))
	gb := b2 * b2 * (6*-0.8237426256 + b*(12*1.908956353+b*(20*-2.017597384+b*30*0.8546361348)))
	cp = -r * (-8.983025854 + tau*(ga+gb))

	y := pow.Exp2(-0.05 * pow.Log2(t/300)) // (T/300 K)^-0.05
	y2 := y * y
	y4 := y2 * y2
	y8 := y4 * y4
	y16 := y8 * y8
	y32 := y16 * y16
	y64 := y32 * y32
	y128 := y64 * y64
	y256 := y128 * y128
	y512 := y256 * y256
	mu = 280.68*y32*y4*y2 + 511.45*y128*y16*y8*y2 + 61.131*y256*y128*y8 + 0.45903*y512*y256*y32
	k = 1.663*y16*y4*y2*y - 1.7781*y64*y4 + 1.1567*y64*y32*y16*y8 - 0.432115*y128*y16*y8
	return p0 / (10 * r * v), cp, k, mu * 1e-6, dv / v / 10
}

// WaterSaturation returns the pressure at which water boils at the temperature t: IAPWS R7-97(2012),
// region 4, equations (29) and (30), 273.15 K to 647.096 K. Coefficients from memory.
func WaterSaturation(t float64) float64 {
	const (
		n1, n2, n3, n4, n5  = 0.11670521452767e4, -0.72421316703206e6, -0.17073846940092e2, 0.12020824702470e5, -0.32325550322333e7
		n6, n7, n8, n9, n10 = 0.14915108613530e2, -0.48232657361591e4, 0.40511340542057e6, -0.23855557567849, 0.65017534844798e3
	)
	th := t + n9/(t-n10)
	a := (th+n1)*th + n2
	b := (n3*th+n4)*th + n5
	c := (n6*th+n7)*th + n8
	x := 2 * c / (-b + math.Sqrt(b*b-4*a*c))
	x *= x
	return x * x * 1e6
}

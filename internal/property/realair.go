package property

import "math"

// airResidual is the residual Helmholtz energy of air at one temperature, α = Σ a δⁱ exp(−δˡ) with δ = ρ/(10.4477 mol/dm³):
// E. W. Lemmon, R. T. Jacobsen, S. G. Penoncello, D. G. Friend, J. Phys. Chem. Ref. Data 29 (2000)
// 331–385, air as a pseudo-pure fluid. Coefficients from memory. Terms with the same i and l are added up.
type airResidual struct {
	plain, first, second airSum // with a = N τʲ, j N τʲ and j(j − 1) N τʲ
}

// airSum holds the factors of δⁱ exp(−δˡ), by i for each l.
type airSum struct {
	a1, a2, a3, a4, a6 float64 // l = 0
	b1, b3, b5, b6     float64 // l = 1
	c1, c3, c11        float64 // l = 2
	d1, d3             float64 // l = 3
}

// airTerms holds N, i, j and l of the residual part.
var airTerms = [19]struct{ n, i, j, l float64 }{
	{0.118160747229, 1, 0, 0},
	{0.713116392079, 1, 0.33, 0},
	{-1.61824192067, 1, 1.01, 0},
	{0.0714140178971, 2, 0, 0},
	{-0.0865421396646, 3, 0, 0},
	{0.134211176704, 3, 0.15, 0},
	{0.0112626704218, 4, 0, 0},
	{-0.0420533228842, 4, 0.2, 0},
	{0.0349008431982, 4, 0.35, 0},
	{0.000164957183186, 6, 1.35, 0},
	{-0.101365037912, 1, 1.6, 1},
	{-0.17381369097, 3, 0.8, 1},
	{-0.0472103183731, 5, 0.95, 1},
	{-0.0122523554253, 6, 1.25, 1},
	{-0.146629609713, 1, 3.6, 2},
	{-0.0316055879821, 3, 6, 2},
	{0.000233594806142, 11, 3.25, 2},
	{0.0148287891978, 1, 3.5, 3},
	{-0.00938782884667, 3, 15, 3},
}

// set computes the factors for ln τ, and τ^0.05. All powers are multiples of 0.05 but two, so that two
// exponentials serve them all.
func (a *airResidual) set(lnTau float64) (z float64) {
	w := math.Exp(0.01 * lnTau) // τ^0.01
	w2 := w * w
	z = w2 * w2 * w // τ^0.05
	z2 := z * z
	z3 := z2 * z
	z4 := z2 * z2
	z7 := z4 * z3
	z16 := z4 * z4 * z4 * z4
	z19 := z16 * z3
	z20 := z16 * z4
	z32 := z16 * z16
	z64 := z32 * z32
	z70 := z64 * z4 * z2
	z100 := z64 * z32 * z4
	power := [len(airTerms)]float64{
		1, z7 / w2, z20 * w, 1, 1, z3, 1, z4, z7, z20 * z7,
		z32, z16, z19, z19 * z4 * z2,
		z70 * z2, z100 * z20, z64 * z,
		z70, z100 * z100 * z100,
	}
	var n0, n1, n2 [len(airTerms)]float64
	for i := range airTerms {
		t := &airTerms[i]
		n0[i] = t.n * power[i]
		n1[i] = n0[i] * t.j
		n2[i] = n1[i] * (t.j - 1)
	}
	a.plain.set(&n0)
	a.first.set(&n1)
	a.second.set(&n2)
	return z
}

// set adds up the terms with the same i and l.
func (c *airSum) set(n *[len(airTerms)]float64) {
	c.a1, c.a2, c.a3, c.a4, c.a6 = n[0]+n[1]+n[2], n[3], n[4]+n[5], n[6]+n[7]+n[8], n[9]
	c.b1, c.b3, c.b5, c.b6 = n[10], n[11], n[12], n[13]
	c.c1, c.c3, c.c11 = n[14], n[15], n[16]
	c.d1, c.d3 = n[17], n[18]
}

// airPowers are powers of δ, and exp(−δˡ).
type airPowers struct{ d, d2, d3, e1, e2, e3 float64 }

func newAirPowers(d float64) airPowers {
	d2 := d * d
	return airPowers{d, d2, d2 * d, math.Exp(-d), math.Exp(-d2), math.Exp(-d2 * d)}
}

// moved returns the powers at d + step to the first order of a small step.
func (x airPowers) moved(step float64) airPowers {
	d := x.d + step
	d2 := d * d
	return airPowers{d, d2, d2 * d, x.e1 * (1 - step), x.e2 * (1 - 2*x.d*step), x.e3 * (1 - 3*x.d2*step)}
}

// value returns Σ a δⁱ exp(−δˡ).
func (c *airSum) value(x airPowers) float64 {
	d, d2 := x.d, x.d2
	return d * (c.a1 + d*(c.a2+d*(c.a3+d*(c.a4+d2*c.a6))) +
		x.e1*(c.b1+d2*(c.b3+d2*(c.b5+d*c.b6))) +
		x.e2*(c.c1+d2*(c.c3+x.d3*x.d3*d2*c.c11)) +
		x.e3*(c.d1+d2*c.d3))
}

// slope returns δ ∂/∂δ of the value.
func (c *airSum) slope(x airPowers) float64 {
	d, d2, d3 := x.d, x.d2, x.d3
	l2, l3 := 2*d2, 3*d3
	return d * (c.a1 + d*(2*c.a2+d*(3*c.a3+d*(4*c.a4+d2*6*c.a6))) +
		x.e1*(c.b1*(1-d)+d2*(c.b3*(3-d)+d2*(c.b5*(5-d)+d*c.b6*(6-d)))) +
		x.e2*(c.c1*(1-l2)+d2*(c.c3*(3-l2)+d3*d3*d2*c.c11*(11-l2))) +
		x.e3*(c.d1*(1-l3)+d2*c.d3*(3-l3)))
}

// curvature returns δ² ∂²/∂δ² of the value: a term with y = i − l δˡ has the factor y(y − 1) − l² δˡ.
func (c *airSum) curvature(x airPowers) float64 {
	d, d2, d3 := x.d, x.d2, x.d3
	l2, l3 := 2*d2, 3*d3
	f := func(y, z float64) float64 { return y*(y-1) - z }
	return d * (d*(2*c.a2+d*(6*c.a3+d*(12*c.a4+d2*30*c.a6))) +
		x.e1*(c.b1*f(1-d, d)+d2*(c.b3*f(3-d, d)+d2*(c.b5*f(5-d, d)+d*c.b6*f(6-d, d)))) +
		x.e2*(c.c1*f(1-l2, 2*l2)+d2*(c.c3*f(3-l2, 2*l2)+d3*d3*d2*c.c11*f(11-l2, 2*l2))) +
		x.e3*(c.d1*f(1-l3, 3*l3)+d2*c.d3*f(3-l3, 3*l3)))
}

// RealAirPressure returns the pressure of air at the temperature t and the molar density rho.
func RealAirPressure(t, rho float64) float64 {
	var a airResidual
	a.set(lnAirReducing - math.Log(t))
	return rho * lemmonR * t * (1 + a.plain.slope(newAirPowers(rho/airReducingDens)))
}

// RealAir returns density, isobaric specific heat, thermal conductivity, viscosity and isobaric expansion coefficient of
// gaseous air at the temperature t and the pressure p, from 100 K to 2000 K and to 1 MPa or [AirDewPressure]: the density
// solves the equation of [RealAirPressure], the transport properties are those of [AirTransport] at it.
func RealAir(t, p float64) (rho, cp, k, mu, beta float64) {
	lnT := math.Log(t)
	var a airResidual
	z := a.set(lnAirReducing - lnT)
	ideal := p / (lemmonR * t * airReducingDens)
	d, x := a.density(ideal)
	q := a.plain.slope(x)
	slope := 1 + 2*q + a.plain.curvature(x) // (∂p/∂ρ)/(R T)
	thermal := 1 + q - a.first.slope(x)     // (∂p/∂T)/(ρ R)
	cp = AirCp0(t) + airCp0Unit*(thermal*thermal/slope-1-a.second.value(x))
	k, mu = airTransport(t, lnT, z, x)
	return d * airReducingDens * airMolarMass, cp, k, mu, thermal / (t * slope)
}

// density returns the reduced density of the gas that as an ideal gas would have the reduced density ideal, by Newton's
// method from the virial equation with the second and third coefficient, and its powers.
func (a *airResidual) density(ideal float64) (d float64, x airPowers) {
	c := &a.plain
	second := c.a1 + c.b1 + c.c1 + c.d1 // times δ in δ α_δ
	third := 2 * (c.a2 - c.b1)          // times δ²
	d = 2 * ideal / (1 + math.Sqrt(max(1+4*second*ideal, 0)))
	d -= third * d * d * d / (1 + d*(2*second+d*3*third))
	for range 8 {
		x = newAirPowers(d)
		q := c.slope(x)
		step := (d*(1+q) - ideal) / (1 + 2*q + c.curvature(x))
		d -= step
		if math.Abs(step) <= 1e-5*d { // the next would be less than its square
			return d, x.moved(-step)
		}
	}
	return d, newAirPowers(d)
}

// AirDewPressure returns the pressure at which air begins to condense at the temperature t, and +Inf above
// 132.6312 K, where it does not: ancillary equation of Lemmon et al. (2000). Coefficients from memory; they return the dew point
// at 1 atm, 81.72 K.
func AirDewPressure(t float64) float64 {
	x := 1 - t/airReducingTemp
	if !(x >= 0) {
		return math.Inf(1)
	}
	const pj = 3.78502e6 // Pa
	root := math.Sqrt(x)
	x2 := x * x
	return pj * math.Exp((-0.1567266*root-5.539635*x+0.7567212*x2*root-3.514322*x2*x2)*airReducingTemp/t)
}

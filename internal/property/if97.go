package property

import "math"

// SteamR is the specific gas constant of IAPWS R7-97(2012) in J/(kg K).
const SteamR = 461.526

// Gibbs is a state of water or steam: the dimensionless Gibbs function γ = g/(R T) at the temperature T and the pressure P, and its
// derivatives times the powers of π and τ that they are derivatives by, so that one set of relations (IAPWS R7-97(2012),
// tables 3 and 12) serves both regions.
type Gibbs struct {
	T, P        float64
	G           float64 // γ
	Pi, PiPi    float64 // π γπ, π² γππ
	Tau, TauTau float64 // τ γτ, τ² γττ
	PiTau       float64 // π τ γπτ
}

// Volume is the specific volume.
func (g *Gibbs) Volume() float64 { return SteamR * g.T / g.P * g.Pi }

// Enthalpy is the specific enthalpy. Its zero makes the internal energy of the liquid zero at the triple point.
func (g *Gibbs) Enthalpy() float64 { return SteamR * g.T * g.Tau }

// InternalEnergy is the specific internal energy.
func (g *Gibbs) InternalEnergy() float64 { return SteamR * g.T * (g.Tau - g.Pi) }

// Entropy is the specific entropy.
func (g *Gibbs) Entropy() float64 { return SteamR * (g.Tau - g.G) }

// Energy is the specific Gibbs energy h − T s.
func (g *Gibbs) Energy() float64 { return SteamR * g.T * g.G }

// HeatCapacity is the isobaric specific heat.
func (g *Gibbs) HeatCapacity() float64 { return -SteamR * g.TauTau }

// HeatCapacityRatio is cp/cv.
func (g *Gibbs) HeatCapacityRatio() float64 {
	a := g.Pi - g.PiTau
	return 1 / (1 - a*a/(g.TauTau*g.PiPi))
}

// SpeedOfSound is the speed of sound.
func (g *Gibbs) SpeedOfSound() float64 {
	a := g.Pi - g.PiTau
	return math.Sqrt(SteamR * g.T * g.Pi * g.Pi / (a*a/g.TauTau - g.PiPi))
}

// Expansion is the isobaric expansion coefficient (1/v) (∂v/∂T).
func (g *Gibbs) Expansion() float64 { return (1 - g.PiTau/g.Pi) / g.T }

// Compressibility is the isothermal compressibility −(1/v) (∂v/∂p).
func (g *Gibbs) Compressibility() float64 { return -g.PiPi / (g.Pi * g.P) }

// Water97 returns the state of liquid water: IAPWS R7-97(2012), region 1, equation (7), 273.15 K to 623.15 K, from the
// pressure of saturation to 100 MPa.
func Water97(t, p float64) Gibbs {
	const lowest, highest = -41, 17 // exponents of y
	pi, tau := p/16.53e6, 1386/t
	x, y := 7.1-pi, tau-1.222
	var xs [33]float64
	var ys [highest - lowest + 1]float64
	powers(xs[:], x)
	powers(ys[-lowest:], y)
	for i, inv := -lowest-1, 1/y; i >= 0; i-- {
		ys[i] = ys[i+1] * inv
	}
	var s sums
	for k := range region1 {
		c := &region1[k]
		s.add(c, c.n*xs[c.i]*ys[c.j-lowest])
	}
	a, b := -pi/x, tau/y
	return Gibbs{
		T: t, P: p, G: s.one,
		Pi: s.i * a, PiPi: s.ii * a * a, Tau: s.j * b, TauTau: s.jj * b * b, PiTau: s.ij * a * b,
	}
}

// Steam97 returns the state of steam: IAPWS R7-97(2012), region 2, equations (15) to (17), 273.15 K to 1073.15 K, up to
// the pressure of [SteamGreatestPressure].
func Steam97(t, p float64) Gibbs {
	pi, tau := p/1e6, 540/t
	y := tau - 0.5
	var xs [25]float64
	var ys [59]float64
	powers(xs[:], pi)
	powers(ys[:], y)
	var s sums
	for k := range region2 {
		c := &region2[k]
		s.add(c, c.n*xs[c.i]*ys[c.j])
	}
	b := tau / y
	g, gTau, gTauTau := idealSteam(tau)
	return Gibbs{
		T: t, P: p, G: math.Log(pi) + g + s.one,
		Pi: 1 + s.i, PiPi: s.ii - 1, Tau: gTau + s.j*b, TauTau: gTauTau + s.jj*b*b, PiTau: s.ij * b,
	}
}

// IdealSteam returns enthalpy and isobaric specific heat of steam as an ideal gas: IAPWS R7-97(2012), region 2, equation (16). The
// zero of the enthalpy is that of [Gibbs.Enthalpy].
func IdealSteam(t float64) (h, cp float64) {
	_, gTau, gTauTau := idealSteam(540 / t)
	return SteamR * t * gTau, -SteamR * gTauTau
}

// idealSteam returns the part of the ideal gas without ln π, and its derivatives times τ and τ². Coefficients from memory, table 10; with
// those of region 2 they reproduce table 15.
func idealSteam(tau float64) (g, gTau, gTauTau float64) {
	const (
		n0, n1, n2, n3     = -0.96927686500217e1, 0.10086655968018e2, -0.28408632460772, 0.21268463753307e-1
		m1, m2, m3, m4, m5 = -0.43839511319450e1, 0.14240819171444e1, -0.40710498223928, 0.71452738081455e-1, -0.56087911283020e-2
	)
	r := 1 / tau
	g = n0 + tau*(n1+tau*(n2+tau*n3)) + r*(m1+r*(m2+r*(m3+r*(m4+r*m5))))
	gTau = tau*(n1+tau*(2*n2+tau*3*n3)) - r*(m1+r*(2*m2+r*(3*m3+r*(4*m4+r*5*m5))))
	gTauTau = tau*tau*(2*n2+tau*6*n3) + r*(2*m1+r*(6*m2+r*(12*m3+r*(20*m4+r*30*m5))))
	return g, gTau, gTauTau
}

// powers fills z with the powers of x from 0 on.
func powers(z []float64, x float64) {
	p := 1.0
	for i := range z {
		z[i] = p
		p *= x
	}
}

// sums adds the terms of a Gibbs function, weighted by the factors that its derivatives need.
type sums struct{ one, i, ii, j, jj, ij float64 }

func (s *sums) add(c *term, v float64) {
	i, j := float64(c.i), float64(c.j)
	iv, jv := i*v, j*v
	s.one += v
	s.i += iv
	s.ii += (i - 1) * iv
	s.j += jv
	s.jj += (j - 1) * jv
	s.ij += i * jv
}

// SteamGreatestPressure returns the pressure up to which region 2 of IAPWS R7-97(2012) reaches at the temperature t: that of
// saturation to 623.15 K, that of the boundary to region 3, equation (5), from there to 863.15 K, and 100 MPa above.
// Coefficients of the boundary from memory; they give 16.5291643 MPa at 623.15 K, where the release has 16.5291643 MPa.
func SteamGreatestPressure(t float64) float64 {
	const limit = 100e6
	switch {
	case t <= 623.15:
		return WaterSaturation(t)
	case t <= 863.15:
		return min(limit, 1e6*(0.34805185628969e3+t*(-0.11671859879975e1+t*0.10192970039326e-2)))
	default:
		return limit
	}
}

// WaterBoiling returns the temperature at which water boils at the pressure p: IAPWS R7-97(2012), region 4, equation (31),
// 611.213 Pa to 22.064 MPa. It is the inverse of [WaterSaturation].
func WaterBoiling(p float64) float64 {
	const (
		n1, n2, n3, n4, n5  = 0.11670521452767e4, -0.72421316703206e6, -0.17073846940092e2, 0.12020824702470e5, -0.32325550322333e7
		n6, n7, n8, n9, n10 = 0.14915108613530e2, -0.48232657361591e4, 0.40511340542057e6, -0.23855557567849, 0.65017534844798e3
	)
	b := math.Sqrt(math.Sqrt(p / 1e6))
	e := b*(b+n3) + n6
	f := b*(n1*b+n4) + n7
	g := b*(n2*b+n5) + n8
	d := 2 * g / (-f - math.Sqrt(f*f-4*e*g))
	s := n10 + d
	return (s - math.Sqrt(s*s-4*(n9+n10*d))) / 2
}

package wall

import (
	"math"

	"example.com/coolward/internal/eigen"
)

// A Mode is one eigenfunction Φ of a body with its root. Its scale is arbitrary; Norm goes with it.
type Mode struct {
	Zeta, Rate   float64 // ζ, and ζ², with which it decays
	Inner, Outer float64 // Φ at the faces
	InnerPull    float64 // H Φ at the inner face: dΦ/dy, what leaves there
	OuterPull    float64 // H Φ at the outer face: −dΦ/dy
	Norm         float64 // ∫ w Φ² dy
	Integral     float64 // ∫ w Φ dy

	form form
	a, b float64
}

// A form is how Φ is computed.
type form uint8

const (
	uniform form = iota // 1
	wavy                // (Rb/r)^{m/2} √S cos(ζ y + c(x) + a), c = 0 but for a cylinder
	bessel              // a J0(ζ r) + b Y0(ζ r)
	gentle              // (a cos ζy + b sin(ζy)/ζ) Rb/r in a sphere
	taylor              // a polynomial
	round               // cos ζy, J0(ζy) or sin(ζy)/(ζy) in a solid
)

// Modes are the modes of a body with the conditions at its faces, in the order of their roots. They do not change.
type Modes struct {
	Body   Body
	Ha, Hb float64
	All    []Mode
	poly   []float64 // of the first mode, if that is a polynomial
}

// New returns count modes of a body with H from 0 to +Inf at its faces; that of the inner face of a solid is of no
// account.
func New(b Body, ha, hb float64, count int) *Modes {
	m := &Modes{Body: b, Ha: ha, Hb: hb, All: make([]Mode, count)}
	if b.Solid {
		m.Ha = 0
		m.solid()
		return m
	}
	for n := range m.All {
		if n > 0 || !m.first(&m.All[0]) {
			m.wave(n+1, &m.All[n])
		}
	}
	return m
}

// wave sets mode n from its phases.
func (m *Modes) wave(n int, mode *Mode) {
	b := &m.Body
	zeta, e := b.root(n, m.Ha, m.Hb)
	mode.Zeta, mode.Rate, mode.Norm = zeta, zeta*zeta, e.slope/2
	scale := 1.0 // (Rb/Ra)^{m/2}
	if b.Dimension > 0 {
		scale = math.Pow(b.Rb/b.Ra, float64(b.Dimension)/2)
	}
	mode.Inner, mode.InnerPull = face(m.Ha, zeta, e.a.size, e.ga)
	mode.Inner, mode.InnerPull = scale*mode.Inner, scale*mode.InnerPull
	mode.Outer, mode.OuterPull = face(m.Hb, zeta, e.b.size, e.gb)
	if n%2 == 0 {
		mode.Outer, mode.OuterPull = -mode.Outer, -mode.OuterPull
	}
	mode.form, mode.a = wavy, -e.inner
	if b.Dimension == 1 {
		mode.a -= e.a.extra
		if !e.a.far {
			mode.form = bessel
			size := math.Sqrt(math.Pi / 2 * zeta * b.Rb)
			mode.a, mode.b = size*math.Cos(e.inner+e.a.phase), size*math.Sin(e.inner+e.a.phase)
		}
	}
	m.integrate(mode)
}

// face returns √S cos β and H times that where |tan β| is g = H S/ζ ± p, also for an infinite H.
func face(h, zeta, size, g float64) (value, pull float64) {
	root := math.Sqrt(size)
	if math.IsInf(h, 1) {
		return 0, zeta / root
	}
	value = root / math.Hypot(1, g)
	if h > zeta { // H/√(1 + g²) with g = H S/ζ + (g − H S/ζ)
		return value, root / math.Hypot(1/h, g/h)
	}
	return value, h * value
}

// integrate sets ∫ w Φ dy = (w HΦ outside + w HΦ inside)/ζ².
func (m *Modes) integrate(mode *Mode) {
	mode.Integral = (mode.OuterPull + m.Body.Inside()*mode.InnerPull) / mode.Zeta / mode.Zeta
}

// At returns Φ of a mode at y.
func (m *Modes) At(mode *Mode, y float64) float64 {
	b := &m.Body
	switch mode.form {
	case uniform:
		return 1
	case wavy:
		switch b.Dimension {
		case 0:
			return math.Cos(mode.Zeta*y + mode.a)
		case 2:
			return b.Rb / (b.Ra + y) * math.Cos(mode.Zeta*y+mode.a)
		}
		r := b.Ra + y
		w := farWave(mode.Zeta * r)
		return math.Sqrt(w.size*b.Rb/r) * math.Cos(mode.Zeta*y+w.extra+mode.a)
	case bessel:
		x := mode.Zeta * (b.Ra + y)
		return mode.a*math.J0(x) + mode.b*math.Y0(x)
	case gentle:
		return b.Rb / (b.Ra + y) * (mode.a*math.Cos(mode.Zeta*y) + mode.b*y*sinc(mode.Zeta*y))
	case taylor:
		total := 0.0
		for k := len(m.poly) - 1; k >= 0; k-- {
			total = total*y + m.poly[k]
		}
		return total
	}
	return roundWave(b.Dimension, mode.Zeta*y)
}

// roundWave returns cos z, J0(z) or sin z/z.
func roundWave(dimension int, z float64) float64 {
	switch dimension {
	case 0:
		return math.Cos(z)
	case 1:
		return math.J0(z)
	}
	return sinc(z)
}

func sinc(z float64) float64 {
	if math.Abs(z) < 1e-4 {
		return 1 - z*z/6
	}
	return math.Sin(z) / z
}

// solid sets the modes of a solid from the roots of package eigen.
func (m *Modes) solid() {
	var s eigen.Solution
	switch m.Body.Dimension {
	case 0:
		s = eigen.NewPlate(m.Hb)
	case 1:
		s = eigen.NewCylinder(m.Hb)
	default:
		s = eigen.NewSphere(m.Hb)
	}
	volume := m.Body.Volume(1)
	for n := range m.All {
		mode := &m.All[n]
		zeta, c, surface, mean := eigen.AnyTerm(s, n+1)
		mode.Zeta, mode.Rate, mode.form = zeta, zeta*zeta, round
		if zeta == 0 {
			*mode = Mode{Inner: 1, Outer: 1, Norm: volume, Integral: volume}
			continue
		}
		mode.Inner = 1
		if n == 0 { // with what does not cancel at small coefficients
			mode.Integral = mean * volume / c
			mode.Norm = mode.Integral / c
			mode.Outer, mode.OuterPull = surface/c, mode.Rate*mode.Integral
			continue
		}
		mode.Outer, mode.OuterPull = roundWave(m.Body.Dimension, zeta), 0
		slope := 0.0 // −dΦ/dy at the surface
		switch m.Body.Dimension {
		case 0:
			slope = zeta * math.Sin(zeta)
			mode.Norm = (1 + sinc(2*zeta)) / 2
		case 1:
			slope = zeta * math.J1(zeta)
			mode.Norm = (mode.Outer*mode.Outer + slope*slope/mode.Rate) / 2
		default:
			slope = mode.Outer - math.Cos(zeta)
			mode.Norm = (1 - sinc(2*zeta)) / (2 * mode.Rate)
		}
		if mode.OuterPull = slope; m.Hb < zeta {
			mode.OuterPull = m.Hb * mode.Outer
		}
		m.integrate(mode)
	}
}

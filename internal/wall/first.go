package wall

import (
	"math"

	"example.com/coolward/internal/root"
	"gonum.org/v1/gonum/integrate/quad"
)

// first sets the first mode where it is nearly uniform, so that its phases would cancel, and reports whether it
// did. Its rate then is far below that of the others, and 0 where no heat is exchanged.
func (m *Modes) first(mode *Mode) bool {
	b := &m.Body
	if m.Ha == 0 && m.Hb == 0 {
		v := b.Volume(1)
		*mode = Mode{Inner: 1, Outer: 1, Norm: v, Integral: v}
		return true
	}
	switch {
	case b.Dimension == 2:
		return m.firstSphere(mode)
	case b.Dimension == 1 && b.Ra >= thin:
		return m.firstThin(mode)
	case b.Dimension == 1:
		return m.firstThick(mode)
	}
	return false
}

// thin is the radius over the wall from which a cylinder is expanded about its inner face.
const thin = 10

// rateBound returns an upper bound of the first rate, that of a uniform trial function by Rayleigh's principle.
func (m *Modes) rateBound() float64 {
	return (m.Hb + m.Body.Inside()*m.Ha) / m.Body.Volume(1)
}

// solve returns where g, which is below 0 for small rates, is 0 at a rate up to hi.
func (m *Modes) solve(g func(rate float64) float64, hi float64) (float64, bool) {
	hi = math.Min(hi, m.rateBound()*(1+1e-9))
	if !(g(hi) >= 0) {
		return 0, false
	}
	lo := hi
	for g(lo) >= 0 {
		if lo /= 4; lo == 0 {
			return 0, false
		}
	}
	return root.Find(g, lo, hi, 0)
}

// firstSphere sets the first mode of a hollow sphere if its root is below 1. With ψ = r Φ, Ba = Ha + 1/Ra and
// Bb = Hb − 1/Rb the condition is (ζ² − Ba Bb) sin ζ/ζ = (Ba + Bb) cos ζ. Less its value at ζ = 0, the uniform body,
// that is D = ζ² sin ζ/ζ + (Ba + Bb)(1 − cos ζ) + Ba Bb (1 − sin ζ/ζ), where
// D = Ha Ra/Rb + Hb Rb/Ra + Ha Hb has no difference.
func (m *Modes) firstSphere(mode *Mode) bool {
	b := &m.Body
	if math.IsInf(m.Hb, 1) {
		return false
	}
	k := 1 / (b.Ra * b.Rb) // 1/Ra − 1/Rb
	bb := m.Hb - 1/b.Rb
	unit := 1.0 // by which all is divided
	one, sum, product, d := 0.0, 1.0, bb, m.Hb+b.Ra/b.Rb
	if !math.IsInf(m.Ha, 1) {
		unit = 1 / (1 + m.Ha + 1/b.Ra)
		one, sum, product = unit, unit*(m.Ha+m.Hb+k), unit*(m.Ha+1/b.Ra)*bb
		d = unit * (m.Ha*b.Ra/b.Rb + m.Hb*b.Rb/b.Ra + m.Ha*m.Hb)
	}
	rate, ok := m.solve(func(rate float64) float64 {
		c, s := shortfalls(rate)
		return rate*(one*(1-s)) + sum*c + product*s - d
	}, 1)
	if !ok {
		return false
	}
	mode.Rate, mode.Zeta, mode.form = rate, math.Sqrt(rate), gentle
	mode.a, mode.b = b.Ra/b.Rb*unit, b.Ra/b.Rb*unit*(m.Ha+1/b.Ra)
	if math.IsInf(m.Ha, 1) {
		mode.a, mode.b = 0, b.Ra/b.Rb
	}
	mode.InnerPull = m.Ha * unit
	if math.IsInf(m.Ha, 1) {
		mode.InnerPull = 1
	}
	m.finishFirst(mode)
	return true
}

// shortfalls returns 1 − cos ζ and 1 − sin ζ/ζ for ζ² up to 1.
func shortfalls(rate float64) (c, s float64) {
	h := math.Sin(math.Sqrt(rate) / 2)
	for k := 9.0; k >= 1; k-- {
		s = rate / ((2 * k) * (2*k + 1)) * (1 - s)
	}
	return 2 * h * h, s
}

// firstThin sets the first mode of a tube of a thin wall if its argument is too small for the expansions of the other
// modes. The series of Φ over y about the inner face follows from (1 + y/Ra)(Φ” + ζ² Φ) + Φ'/Ra = 0.
func (m *Modes) firstThin(mode *Mode) bool {
	b := &m.Body
	limit := farFrom / b.Ra
	condition := func(rate float64) float64 {
		value, slope := b.series(m.Ha, rate, nil)
		if math.IsInf(m.Hb, 1) {
			return -value
		}
		return -(slope/(1+m.Hb) + m.Hb/(1+m.Hb)*value)
	}
	rate, ok := m.solve(condition, limit*limit)
	if !ok {
		return false
	}
	m.poly = make([]float64, seriesTerms)
	b.series(m.Ha, rate, m.poly)
	mode.Rate, mode.Zeta, mode.form = rate, math.Sqrt(rate), taylor
	mode.InnerPull = m.poly[1]
	m.finishFirst(mode)
	return true
}

// seriesTerms is enough for ζ up to 2.5 and Ra from 10.
const seriesTerms = 32

// series returns Φ and Φ' at the outer face of a tube, with Φ = 1 and Φ' = Ha at the inner one, both over 1 + Ha.
func (b *Body) series(ha, rate float64, into []float64) (value, slope float64) {
	thirdLast, last, this := 0.0, 1/(1+ha), 1.0 // coefficients k − 2, k − 1 and k
	if !math.IsInf(ha, 1) {
		this = ha / (1 + ha)
	}
	e := 1 / b.Ra
	if into != nil {
		into[0], into[1] = last, this
	}
	value, slope = last+this, this
	for k := 1; k < seriesTerms-1; k++ {
		n := float64(k)
		next := -(e*n*n*this + rate*(last+e*thirdLast)) / (n * (n + 1))
		thirdLast, last, this = last, this, next
		if into != nil {
			into[k+1] = next
		}
		value += next
		slope += (n + 1) * next
	}
	return value, slope
}

// firstThick sets the first mode of a tube of a thick wall if its root is below 1, from the determinant of both
// conditions, in which J0, J1, Y0 and Y1 do not cancel then.
func (m *Modes) firstThick(mode *Mode) bool {
	b := &m.Body
	inner := func(zeta float64) (j, y float64) { // H − d/dr of J0 and Y0
		x := zeta * b.Ra
		return mix(m.Ha, math.J0(x), zeta*math.J1(x)), mix(m.Ha, math.Y0(x), zeta*math.Y1(x))
	}
	rate, ok := m.solve(func(rate float64) float64 {
		zeta := math.Sqrt(rate)
		ja, ya := inner(zeta)
		x := zeta * b.Rb
		jb, yb := mix(m.Hb, math.J0(x), -zeta*math.J1(x)), mix(m.Hb, math.Y0(x), -zeta*math.Y1(x))
		return ya*jb - ja*yb
	}, 1)
	if !ok {
		return false
	}
	mode.Rate, mode.Zeta, mode.form = rate, math.Sqrt(rate), bessel
	ja, ya := inner(mode.Zeta)
	size := math.Max(math.Abs(ja), math.Abs(ya))
	mode.a, mode.b = -ya/size, ja/size
	mode.InnerPull = mode.gradient(b.Ra)
	m.finishFirst(mode)
	return true
}

// mix returns (h·value + slope)/(1 + h), also for an infinite h.
func mix(h, value, slope float64) float64 {
	if math.IsInf(h, 1) {
		return value
	}
	return h/(1+h)*value + slope/(1+h)
}

// gradient returns dΦ/dr of a mode of Bessel functions.
func (mode *Mode) gradient(r float64) float64 {
	x := mode.Zeta * r
	return -mode.Zeta * (mode.a*math.J1(x) + mode.b*math.Y1(x))
}

// finishFirst sets the values at the faces and the integrals of a first mode. Those are by quadrature: the mode is
// positive, and as smooth as the logarithm of the radius over which it is integrated.
func (m *Modes) finishFirst(mode *Mode) {
	b := &m.Body
	mode.Inner, mode.Outer = m.At(mode, 0), m.At(mode, 1)
	if !math.IsInf(m.Ha, 1) {
		mode.InnerPull = m.Ha * mode.Inner
	} else {
		mode.Inner = 0
	}
	mode.Norm = b.Integrate(func(y float64) float64 {
		phi := m.At(mode, y)
		return phi * phi
	})
	mode.Integral = b.Integrate(func(y float64) float64 { return m.At(mode, y) })
	if math.IsInf(m.Hb, 1) {
		mode.Outer = 0
		mode.OuterPull = mode.Rate*mode.Integral - b.Inside()*mode.InnerPull
	} else {
		mode.OuterPull = m.Hb * mode.Outer
	}
}

// Integrate returns ∫ w f dy from 0 to 1 of a smooth f, by Gauss's quadrature over panels in which the radius doubles.
func (b *Body) Integrate(f func(y float64) float64) float64 {
	total := 0.0
	for lo := 0.0; lo < 1; {
		hi := 1.0
		if b.Dimension > 0 && !b.Solid {
			if hi = math.Min(1, b.Ra+2*lo); hi > 0.75 {
				hi = 1
			}
		}
		for i, x := range gauss.x {
			y := lo + (hi-lo)*x
			total += (hi - lo) * gauss.weight[i] * b.Weight(y) * f(y)
		}
		lo = hi
	}
	return total
}

// gauss holds the points and weights of Gauss's quadrature from 0 to 1.
var gauss = func() (g struct{ x, weight [gaussPoints]float64 }) {
	quad.Legendre{}.FixedLocations(g.x[:], g.weight[:], 0, 1)
	return g
}()

const gaussPoints = 20

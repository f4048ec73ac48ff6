package series

import (
	"math"
	"math/cmplx"
	"slices"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/internal/eigen"
)

// An echo is how a place answers a step: θ, which from the join on is the sum of its terms.
type echo struct {
	theta, loss func(fo float64) float64 // θ and 1 − θ
	fromStart   func(fo float64) float64 // ∫ θ dFo from 0 on before the join, if there is a form for it
	c, rate     []float64
	join        float64
	whole       float64 // ∫ θ dFo from 0 to the join
	hasWhole    bool
}

// forgotten is the exponent from which a term is nothing beside 1.
const forgotten = 50

// echo returns the answer of a position, or of the mean for nil, over the Fourier number of the first factor. The terms of
// a product are the products of terms, their rates added.
func (s *Solution) echo(p *position) *echo {
	e := &echo{c: []float64{1}, rate: []float64{0}, theta: s.meanTheta, loss: s.loss}
	if p != nil {
		at := *p
		e.theta = func(fo float64) float64 { return s.theta(&at, fo) }
		e.loss = func(fo float64) float64 { return 1 - s.theta(&at, fo) }
	}
	if s.count == 1 {
		modes := s.factors[0].modes
		e.fromStart = func(fo float64) float64 { return eigen.IntegralOfMean(modes, fo) }
		if p != nil {
			x := p[0]
			e.fromStart = func(fo float64) float64 { return eigen.Integral(modes, x, fo) }
		}
	}
	slowest := 0.0
	for i := range s.count {
		f := &s.factors[i]
		e.join = math.Max(e.join, f.modes.Join()/f.ratio)
		slowest += f.ratio * f.modes.Decay()
	}
	for i := range s.count {
		at := spot{mean: p == nil}
		if p != nil {
			at.x = p[i]
		}
		c, rate := termsOf(&s.factors[i], at)
		var both, sum []float64
		for n := range e.c {
			for m := range c {
				if (e.rate[n]+rate[m]-slowest)*e.join < 45 {
					both, sum = append(both, e.c[n]*c[m]), append(sum, e.rate[n]+rate[m])
				}
			}
		}
		e.c, e.rate = both, sum
	}
	return e
}

// termsOf returns the coefficients of the terms of a factor at a place and their rates over the Fourier number of the
// first factor.
func termsOf(f *factor, at spot) (c, rate []float64) {
	if f.modes.Biot() == 0 {
		return []float64{1}, []float64{0}
	}
	for n := 1; ; n++ {
		zeta, centre, mean := f.modes.Term(n)
		if zeta == 0 {
			return c, rate
		}
		if at.mean {
			centre = mean
		} else {
			value, _ := eigenfunction(f.body.Family(), zeta*at.x)
			centre *= value
		}
		c, rate = append(c, centre), append(rate, f.ratio*zeta*zeta)
	}
}

// between returns ∫ θ dFo from lo to hi, which may be +Inf, without a difference of integrals.
func (e *echo) between(lo, hi float64) float64 {
	switch {
	case !(lo < hi):
		return 0
	case hi <= e.join && lo == 0 && e.fromStart != nil:
		return e.fromStart(hi)
	case hi <= e.join:
		return real(e.quadrature(lo, hi, 0))
	case lo < e.join:
		return e.early(lo) + e.between(e.join, hi)
	}
	total := 0.0
	for n, c := range e.c {
		if x := e.rate[n] * lo; x < forgotten {
			total += c * math.Exp(-x) * eigen.Decayed(e.rate[n], hi-lo)
		}
	}
	return total
}

// early returns ∫ θ dFo from lo to the join.
func (e *echo) early(lo float64) float64 {
	if lo > 0 {
		return e.between(lo, e.join)
	}
	if !e.hasWhole {
		e.whole, e.hasWhole = e.between(0, e.join), true
	}
	return e.whole
}

// amplitude returns the complex amplitude under an oscillation e^{iω Fo}, 1 − iω ∫ θ e^{−iω σ} dσ over all times.
func (e *echo) amplitude(omega float64) complex128 {
	return e.left(0, omega) + complex(1-e.theta(0), 0) // a prescribed surface has answered by 1 at once
}

// left returns what the start of an oscillation at time 0 has left at a Fourier number: Σ c λ/(λ + iω) e^{−λ Fo} over all
// terms, which before the join is θ − iω ∫ θ e^{−iω(σ − Fo)} dσ from Fo on.
func (e *echo) left(fo, omega float64) complex128 {
	late := math.Max(fo, e.join)
	total := complex(0, 0)
	for n, c := range e.c {
		value := complex(c*math.Exp(-e.rate[n]*late), 0) / complex(e.rate[n], omega)
		if fo < e.join {
			total += value
		} else {
			total += value * complex(e.rate[n], 0)
		}
	}
	if fo >= e.join {
		return total
	}
	rest := e.quadrature(fo, e.join, omega) + total*cmplx.Rect(1, -omega*(e.join-fo))
	return complex(e.theta(fo), 0) - complex(0, omega)*rest
}

// gauss holds the nodes on (−1, 1) and weights of the quadrature.
var gauss = func() (g struct{ x, w [12]float64 }) {
	quad.Legendre{}.FixedLocations(g.x[:], g.w[:], -1, 1)
	return g
}()

// quadrature returns ∫ θ e^{−iω(σ − from)} dσ between two early Fourier numbers. It is over the root of σ, in which θ is
// smooth, on pieces that double their length from the start on, where a large Biot number makes θ fast, and
// that turn the exponential by less than 3.
func (e *echo) quadrature(from, to, omega float64) complex128 {
	lo, hi := math.Sqrt(from), math.Sqrt(to)
	edges := []float64{hi}
	for u := hi; u > lo && u > hi*0x1p-30; {
		u /= 2
		edges = append(edges, math.Max(lo, u))
	}
	if last := edges[len(edges)-1]; last > lo {
		edges = append(edges, lo)
	}
	slices.Reverse(edges)
	total := complex(0, 0)
	for i := 1; i < len(edges); i++ {
		a, b := edges[i-1], edges[i]
		pieces := math.Ceil(omega*(b-a)*(b+a)/3 + 1e-9)
		for k := 0.0; k < pieces; k++ {
			middle, half := a+(b-a)*(k+0.5)/pieces, (b-a)/(2*pieces)
			for j, x := range gauss.x {
				u := middle + half*x
				size := gauss.w[j] * half * 2 * u * e.theta(u*u)
				sin, cos := math.Sincos(omega * (u*u - from))
				total += complex(size*cos, -size*sin)
			}
		}
	}
	return total
}

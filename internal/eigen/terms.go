package eigen

import (
	"math"
	"sync"
	"sync/atomic"
)

// Join is the Fourier number from which the series of eigenfunctions is summed. There the first
// image left out by the short-time form is below exp(−40), and the series needs 14 terms at most.
const Join = 0.025

// Terms is how many terms of the series there are. From Join on no further one is needed: for a sphere
// ζ_15 > 14π, so that (ζ_15² − ζ_1²) Join > 48, which is more than negligible.
const Terms = 14

// negligible is the exponent by which a term must have decayed more than the first to be left out: exp(−38) is a
// quarter of the rounding of 1.
const negligible = 38

// A term is one of the series: ζ_n, ζ_n², and its coefficients at the centre, at the surface and of the mean.
type term struct {
	zeta, rate float64
	c          [3]float64
}

// decayed returns exp(−ζ_n² Fo).
func (t *term) decayed(fo float64) float64 {
	a := t.rate * fo
	if a <= decayEnd {
		return raised(parted(a))
	}
	return math.Exp(-a)
}

// The places whose coefficients a term holds.
const (
	centre = iota
	surface
	mean
)

// A series holds the terms that have been asked for so far. The first one comes with it; each further batch is
// computed when a sum first reaches it, once for all goroutines.
type series struct {
	bi      float64
	ready   atomic.Int32  // how many terms are there
	early   atomic.Uint64 // 1 − mean at the join as bits, 0 before it is first needed
	growing sync.Mutex
	compute func(n int, bi float64) term // term n, from 1 on, of positive coefficients
	terms   []term                       // room for all
}

// batch is how many terms are computed at a time behind the first: with that, as many as a Fourier number of 0.2 needs.
const batch = 5

// start prepares the first term; a Biot number that cannot be makes all of them NaN.
func (s *series) start(bi float64, room []term, compute func(n int, bi float64) term) {
	if !(bi >= 0) {
		bi = math.NaN()
	}
	s.bi, s.terms, s.compute = bi, room, compute
	s.grow(0)
}

// grow computes the batch behind the terms that a reader has found ready, and returns how many are there.
func (s *series) grow(found int) int {
	s.growing.Lock()
	defer s.growing.Unlock()
	if ready := int(s.ready.Load()); ready > found {
		return ready
	}
	ready := min(found+batch, len(s.terms))
	if found == 0 {
		ready = 1
	}
	for n := found; n < ready; n++ {
		s.terms[n] = s.compute(n+1, s.bi)
		if n%2 == 1 {
			s.terms[n].c[centre] *= -1
		}
	}
	s.ready.Store(int32(ready))
	return ready
}

// upTo returns the first n terms, or all if there are fewer.
func (s *series) upTo(n int) []term {
	n = min(n, len(s.terms))
	for ready := int(s.ready.Load()); ready < n; {
		ready = s.grow(ready)
	}
	return s.terms[:n]
}

// sum returns Σ c_n exp(−ζ_n² Fo) for one of the places, and its derivative. A first rate of 0 stands for a body that
// exchanges no heat.
func (s *series) sum(at int, fo float64) (theta, slope float64) {
	first := s.terms[0].rate
	if first == 0 {
		return s.terms[0].c[at], 0
	}
	last := first + negligible/fo
	ready := int(s.ready.Load())
	for n := range s.terms {
		if n == ready {
			ready = s.grow(n)
		}
		t := &s.terms[n]
		if t.rate > last {
			break
		}
		part := t.c[at] * t.decayed(fo)
		theta += part
		slope -= t.rate * part
	}
	return theta, slope
}

// lossBehind returns the loss at Fo ≥ join from that at join and the series of the mean, of which every
// term is positive.
func (s *series) lossBehind(join float64, early func(bi, fo float64) float64, fo float64) float64 {
	loss := math.Float64frombits(s.early.Load())
	if loss == 0 {
		loss = early(s.bi, join)
		s.early.Store(math.Float64bits(loss))
	}
	for _, t := range s.upTo(len(s.terms)) {
		if t.rate*join > negligible {
			break
		}
		if t.rate > 0 {
			loss -= t.c[mean] * math.Exp(-t.rate*join) * math.Expm1(-t.rate*(fo-join))
		}
	}
	return loss
}

// Biot returns the Biot number.
func (s *series) Biot() float64 { return s.bi }

// Decay returns ζ_1².
func (s *series) Decay() float64 { return s.terms[0].rate }

// Term returns ζ_n, C_n and the coefficient of the mean for n from 1 to [Terms], or [CylinderTerms], and zeros for
// another n.
func (s *series) Term(n int) (zeta, c, ofMean float64) {
	if n < 1 || n > len(s.terms) {
		return 0, 0, 0
	}
	t := &s.upTo(n)[n-1]
	return t.zeta, t.c[centre], t.c[mean]
}

// Truncation bounds what is left out of θ at every place, at Fo ≥ 0, in absolute terms. The series leaves out terms of
// at most 2 exp(−ζ_n² Fo), of which the first is below exp(−negligible) of the first of all, and all of them make
// less than 1.5 of it. What is left out at short times is less: for a plate and a sphere images of 2 exp(−1/Fo), 9e-18
// at the join, and for a cylinder the 3e-17 of cylinderline.go.
func (s *series) Truncation(fo float64) float64 {
	return 3 * math.Exp(-negligible-s.terms[0].rate*fo)
}

// ErrorBound bounds the absolute error of θ at every place, at Fo ≥ 0: what is left out and rounding.
func (s *series) ErrorBound(fo float64) float64 {
	return s.Truncation(fo) + roundingOf(s.terms[0].rate*fo)
}

// rounding bounds what rounding does to θ, in absolute terms: some four times what the comparison
// with values of many digits shows at random Biot and Fourier numbers and places.
const rounding = 5e-15

// roundingOf is rounding less what has decayed by an exponent: the first coefficient is 2 at most, and the rounding of
// the exponent grows with it.
func roundingOf(exponent float64) float64 {
	if !(exponent <= 700) {
		return math.SmallestNonzeroFloat64
	}
	return rounding * math.Min(1, 2*(1+exponent)*math.Exp(-exponent))
}

// unit takes a rounding error beyond 0 or 1 off a value that cannot be there.
func unit(theta float64) float64 { return math.Max(0, math.Min(1, theta)) }

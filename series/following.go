package series

import (
	"math"
	"math/cmplx"
	"slices"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// Following returns the temperature of a place, or of [shape.Mean], at time t ≥ 0 if from time 0 on the ambient, or the
// prescribed surface temperature, follows a course in place of that of the problem, for every body (Duhamel's
// superposition: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., section 1.14, from memory). It is
// exact to rounding, from the start temperature on: an oscillation with what the start adds to it until that is
// forgotten, a log piece by piece. For a long log sample by sample, [Solution.Track] is faster.
//
// The errors are those of [Solution.At] and of the course at that time; besides, an [*units.ArgumentError] reports
// a constant flux, and an oscillation with more than some ten thousand periods in 0.025 R²/α, R the longest way out.
func (s *Solution) Following(place shape.Place, course boundary.Course, t units.Duration) (units.Temperature, error) {
	if err := s.plain(); err != nil {
		return units.Temperature{}, err
	}
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	where, err := s.positionOf(place)
	if err != nil {
		return units.Temperature{}, err
	}
	now, err := course.At(t)
	if err != nil {
		return units.Temperature{}, err
	}
	first, err := course.At(units.Duration{})
	if err != nil {
		return units.Temperature{}, err
	}
	e := s.echo(where)
	fo, initial := s.Fourier(t), s.problem.Initial.SI()
	if mean, amplitude, period, lag, ok := course.Oscillation(); ok {
		omega := 2 * math.Pi / s.Fourier(period)
		if !(omega > 1e-290 && omega*e.join <= mostTurns) {
			return units.Temperature{}, &units.ArgumentError{Field: "course: period", Value: period, Accepted: units.Second.Of(2*math.Pi*e.join*s.scale/mostTurns).String() + " or more in this body"}
		}
		begin := cmplx.Rect(1, -2*math.Pi*math.Mod(lag.Ratio(period), 1))
		turn := cmplx.Rect(1, 2*math.Pi*math.Mod(t.Ratio(period), 1))
		swing := imag(begin * (e.amplitude(omega)*turn - e.left(fo, omega)))
		return units.Kelvin.Of(mean.SI() + (initial-mean.SI())*e.theta(fo) + amplitude.SI()*swing), nil
	}
	behind := (initial - first.SI()) * e.theta(fo)
	if _, rate, ok := course.Ramp(); ok {
		behind -= rate.SI() * s.scale * e.integral(fo)
	} else if times, temperatures, ok := course.Readings(); ok {
		behind -= s.behindLog(e, times, temperatures, t)
	}
	return units.Kelvin.Of(now.SI() + behind), nil
}

// mostTurns is the angle by which an oscillation may turn before the series of all factors converge, which bounds the work.
const mostTurns = 100000

// behindLog returns how far a place is behind a log at time t, but for what the start adds.
func (s *Solution) behindLog(e *echo, times []units.Duration, temperatures []units.Temperature, t units.Duration) float64 {
	total := 0.0
	for i := 1; i < len(times) && times[i-1].Compare(t) < 0; i++ {
		from, to := math.Max(0, times[i-1].SI()), math.Min(times[i].SI(), t.SI())
		rise := temperatures[i].Sub(temperatures[i-1]).SI()
		switch length := times[i].Sub(times[i-1]).SI(); {
		case times[i].SI() <= 0:
		case length == 0:
			total += rise * e.theta((t.SI()-to)/s.scale)
		default:
			total += rise / length * s.scale * (e.integral((t.SI()-from)/s.scale) - e.integral((t.SI()-to)/s.scale))
		}
	}
	return total
}

// An echo is how a place answers a step: θ, which from the join on is the sum of its terms.
type echo struct {
	theta    func(fo float64) float64
	c, rate  []float64
	join     float64
	early    float64 // ∫ θ dFo from 0 to the join
	hasEarly bool
}

// echo returns the answer of a position, or of the mean for nil, over the Fourier number of the first factor. The terms of
// a product are the products of terms, their rates added.
func (s *Solution) echo(p *position) *echo {
	e := &echo{c: []float64{1}, rate: []float64{0}, theta: s.meanTheta}
	if p != nil {
		e.theta = func(fo float64) float64 { return s.theta(p, fo) }
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

// integral returns ∫ θ dFo from 0 to fo.
func (e *echo) integral(fo float64) float64 {
	if fo <= 0 {
		return 0
	}
	if fo < e.join {
		return real(e.quadrature(0, fo, 0))
	}
	if !e.hasEarly {
		e.early, e.hasEarly = real(e.quadrature(0, e.join, 0)), true
	}
	total := e.early
	for n, c := range e.c {
		total += c * math.Exp(-e.rate[n]*e.join) * eigen.Decayed(e.rate[n], fo-e.join)
	}
	return total
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

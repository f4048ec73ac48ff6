package wall

import "math"

// A Problem is a body with what acts on it from Fo = 0 on. Temperatures are over a reference, that of a uniform start.
type Problem struct {
	Body   Body
	Ha, Hb float64
	Drive  Drive
	Start  func(y float64) float64 // excess at Fo = 0; nil for none
	Source Course                  // besides the constant one
}

// A Quantity is what a solution is asked for.
type Quantity uint8

// The quantities; those of a face are per its area, and positive outwards.
const (
	Value Quantity = iota // temperature at a place
	Mean                  // over the volume
	InnerFlux
	OuterFlux
	InnerHeat // ∫ flux dFo
	OuterHeat
)

// A Probe is a quantity and, for a Value, its place.
type Probe struct {
	Quantity Quantity
	Y        float64
}

// A Solution answers for every Fo ≥ 0, or up to the end of its source. It does not change, and may be used
// from many goroutines.
type Solution struct {
	Modes  *Modes
	Steady Steady
	Join   float64 // Fourier number from which the modes are summed if the start is uniform

	problem      Problem
	inner, outer skin
	all, unit    response // to everything at Fo = 0, and to a source of 1
	weak         bool     // little heat is exchanged; see lateHeat
	size         float64  // of temperatures
	highest      float64  // excess of the start
	settled      float64  // size of the steady state
	heatable     float64  // size of the steady state for a source of 1
	unresolved   float64  // root of ∫ w (what the modes leave out of the start)² dy
	spread       float64  // bound of Φ²/N of the modes left out
	source       track
}

// A response is a steady state and what is to be added to it, by modes.
type response struct {
	steady         Steady
	c              []float64
	inside, beyond float64 // heat through the inner and the outer face for good beyond that of the steady state

	slow float64 // coefficient of exp(−ζ² Fo) − 1 of the first mode if that is slow; see settleSlowly
}

const (
	fewModes  = 32
	manyModes = 512
	midModes  = 128
)

// gone is the exponent by which what is left out has decayed.
const gone = 40

// Solve returns the solution.
func Solve(p Problem) *Solution {
	b := p.Body
	count := fewModes
	if b.Dimension == 1 {
		// so many that, once a short-time form without them ends, it is good to 1e-9 at the smaller radius
		smaller := b.Ra
		if b.Solid {
			smaller = b.Rb
		}
		count = int(math.Max(fewModes, math.Min(manyModes, 1300/smaller)))
	}
	if p.Start != nil || p.Source.used() {
		count = midModes
	}
	s := &Solution{problem: p, Modes: New(b, p.Ha, p.Hb, count)}
	s.Join = gone / s.Modes.All[count-1].Rate
	s.inner, s.outer = s.Modes.skins()
	s.weak = s.Modes.All[0].Rate < weakRate && s.outer.missing(s.Join) < 1e-9 && (b.Solid || s.inner.missing(s.Join) < 1e-9)
	s.all = s.Modes.respond(p.Drive)
	s.unit = s.Modes.respond(Drive{G: 1})
	s.Steady = s.all.steady
	s.settled, s.heatable = s.Steady.Size(), s.unit.steady.Size()
	s.size = math.Max(s.settled, math.Max(math.Abs(p.Drive.Ua), math.Abs(p.Drive.Ub)))
	s.size = math.Max(s.size, 2*math.Abs(p.Drive.G))
	if p.Start != nil {
		s.begin(p.Start)
	}
	s.source = s.Modes.follow(p.Source)
	return s
}

// respond returns the response of a body that starts at 0. With the transform ∫ w Φ T dy the equation becomes one for
// each mode, so that c = [Σ w (Φ Q − HΦ U) − G ∫ w Φ dy]/(ζ² N).
func (m *Modes) respond(d Drive) response {
	b := &m.Body
	r := response{steady: m.Steady(d), c: make([]float64, len(m.All))}
	for n := range m.All {
		mode := &m.All[n]
		if mode.Rate == 0 {
			continue
		}
		sum := -d.G * mode.Integral
		sum += given(m.Hb, mode.Outer, mode.OuterPull, d.Ub, d.Qb)
		sum += b.Inside() * given(m.Ha, mode.Inner, mode.InnerPull, d.Ua, d.Qa)
		r.c[n] = sum / mode.Rate / mode.Norm
	}
	if m.slow() {
		m.settleSlowly(&r, d)
	} else {
		m.settle(&r)
	}
	return r
}

// given returns what acts on a mode at one face.
func given(h, phi, pull, u, q float64) float64 {
	if h == 0 {
		return phi * q
	}
	return -pull * u
}

// settle sets the heat beyond that of the steady state: ∫ w χ (start − steady) dy with a start of 0, where χ is the
// steady state for surroundings of 1 at that face.
func (m *Modes) settle(r *response) {
	b := &m.Body
	if m.Hb > 0 {
		chi := m.Steady(Drive{Ub: 1})
		r.beyond = b.Integrate(func(y float64) float64 { return -chi.At(y) * r.steady.At(y) })
	}
	if m.Ha > 0 && !b.Solid {
		chi := m.Steady(Drive{Ua: 1})
		r.inside = b.Integrate(func(y float64) float64 { return -chi.At(y) * r.steady.At(y) }) / b.Inside()
	}
}

// weight returns the part of a mode in a quantity.
func (s *Solution) weight(p Probe, mode *Mode) float64 {
	switch p.Quantity {
	case Value:
		return s.Modes.At(mode, p.Y)
	case Mean:
		return mode.Integral / s.Modes.Body.Volume(1)
	case InnerFlux:
		return mode.InnerPull
	case OuterFlux:
		return mode.OuterPull
	case InnerHeat:
		return -mode.InnerPull / mode.Rate
	}
	return -mode.OuterPull / mode.Rate
}

// base returns what the steady state of a response, times height, whose integral over Fo is area, gives to a quantity.
func (r *response) base(p Probe, height, area float64) float64 {
	s := &r.steady
	switch p.Quantity {
	case Value:
		return height*s.At(p.Y) + area*s.Rise
	case Mean:
		return height*s.Mean + area*s.Rise
	case InnerFlux:
		return height * s.Inside()
	case OuterFlux:
		return height * s.Outside()
	case InnerHeat:
		return area*s.Inside() + height*r.inside
	}
	return area*s.Outside() + height*r.beyond
}

// fixed reports whether a quantity is given: the flux at a face that does not exchange heat.
func (s *Solution) fixed(p Probe) bool {
	switch p.Quantity {
	case InnerFlux, InnerHeat:
		return s.Modes.Ha == 0
	case OuterFlux, OuterHeat:
		return s.Modes.Hb == 0
	}
	return false
}

// late sums the modes.
func (s *Solution) late(r *response, p Probe, fo float64) float64 {
	if r.slow != 0 {
		return s.lateSlow(r, p, 0, fo)
	}
	total := r.base(p, 1, fo)
	if s.fixed(p) {
		return total
	}
	first := s.Modes.All[0].Rate
	for n := range r.c {
		mode := &s.Modes.All[n]
		if (mode.Rate-first)*fo > gone+5 {
			break
		}
		if r.c[n] != 0 {
			total += r.c[n] * s.weight(p, mode) * math.Exp(-mode.Rate*fo)
		}
	}
	return total
}

// weakRate is the first rate below which the heat is a small difference of what the steady state and the modes give.
const weakRate = 0.1

// lateHeat returns the heat since the join, in which nothing cancels at small coefficients.
func (s *Solution) lateHeat(p Probe, fo float64) float64 {
	r := &s.all
	if r.slow != 0 {
		return s.lateSlow(r, p, s.Join, fo)
	}
	since := fo - s.Join
	total := r.steady.Outside() * since
	if p.Quantity == InnerHeat {
		total = r.steady.Inside() * since
	}
	for n := range r.c {
		mode := &s.Modes.All[n]
		if mode.Rate > 0 && mode.Rate*s.Join < gone+5 {
			total += r.c[n] * s.weight(p, mode) * math.Exp(-mode.Rate*s.Join) * math.Expm1(-mode.Rate*since)
		}
	}
	return total
}

// early returns a quantity shortly after the start, from the skins.
func (s *Solution) early(d Drive, p Probe, fo float64) float64 {
	switch p.Quantity {
	case Value:
		total := d.G * fo
		total += early(&s.outer, 1-p.Y, fo, d.Ub, d.Qb, d.G)
		if !s.Modes.Body.Solid {
			total += early(&s.inner, p.Y, fo, d.Ua, d.Qa, d.G)
		}
		return total
	case Mean:
		lost := s.early(d, Probe{Quantity: OuterHeat}, fo)
		if inside := s.Modes.Body.Inside(); inside > 0 {
			lost += inside * s.early(d, Probe{Quantity: InnerHeat}, fo)
		}
		return d.G*fo - lost/s.Modes.Body.Volume(1)
	}
	skin, u, q := &s.outer, d.Ub, d.Qb
	if p.Quantity == InnerFlux || p.Quantity == InnerHeat {
		skin, u, q = &s.inner, d.Ua, d.Qa
	}
	heat := p.Quantity == InnerHeat || p.Quantity == OuterHeat
	switch {
	case skin.h == 0 && heat:
		return q * fo
	case skin.h == 0:
		return q
	case heat && d.G == 0:
		return -u * skin.loss(fo)
	case heat:
		return d.G*skin.lossIntegral(fo) - u*skin.loss(fo)
	}
	return d.G*skin.loss(fo) - u*skin.flux(fo)
}

// early returns what a face adds to the temperature at the distance d.
func early(s *skin, d, fo, u, q, g float64) float64 {
	if s.h == 0 {
		if q == 0 {
			return 0
		}
		return -q * s.step(d, fo)
	}
	total := 0.0
	if u != 0 {
		total = u * s.step(d, fo)
	}
	if g != 0 {
		total -= g * s.ramp(d, fo)
	}
	return total
}

// Ask returns a quantity at Fo ≥ 0.
func (s *Solution) Ask(p Probe, fo float64) float64 {
	total := 0.0
	switch start := s.problem.Start; {
	case start != nil && fo == 0 && p.Quantity == Value:
		total = start(p.Y)
	case start != nil && fo == 0 && p.Quantity == InnerFlux && s.Modes.Ha > 0:
		total = s.Modes.Ha * (start(0) - s.problem.Drive.Ua)
	case start != nil && fo == 0 && p.Quantity == OuterFlux && s.Modes.Hb > 0:
		total = s.Modes.Hb * (start(1) - s.problem.Drive.Ub)
	case start == nil && fo == 0 && p.Quantity != InnerFlux && p.Quantity != OuterFlux:
	case start == nil && fo < s.Join:
		total = s.early(s.problem.Drive, p, fo)
	case start == nil && p.Quantity >= InnerHeat && s.weak && !s.fixed(p):
		total = s.early(s.problem.Drive, p, s.Join) + s.lateHeat(p, fo)
	default:
		total = s.late(&s.all, p, fo)
	}
	if s.source.used() && !s.fixed(p) {
		total += s.heated(p, fo)
	}
	return total
}

// rounding is what rounding does to a temperature over the largest one.
const rounding = 1e-13

// Span returns how far temperatures are apart by Fo, about: the excesses of the start and of the surroundings, and
// what source and fluxes add.
func (s *Solution) Span(fo float64) float64 {
	d := s.problem.Drive
	power := math.Abs(d.G) + math.Abs(d.Qa) + math.Abs(d.Qb)
	span := math.Max(math.Max(math.Abs(d.Ua), math.Abs(d.Ub)), s.highest)
	return math.Max(span, math.Max(math.Min(s.settled, power*(1+fo)), s.source.highest(fo)*s.heatable))
}

// Bound bounds the error of a temperature at Fo ≥ 0 at every place: what is left out and rounding.
func (s *Solution) Bound(fo float64) float64 {
	return rounding*(s.size+s.source.highest(fo)*s.heatable) + s.LeftOut(fo)
}

// LeftOut bounds what the modes kept, or the short-time form, leave out of a temperature at Fo ≥ 0 at every place.
func (s *Solution) LeftOut(fo float64) float64 {
	left := math.Exp(-gone)*s.size + s.source.missing(s, fo)
	if s.problem.Start != nil {
		if fo == 0 {
			return left
		}
		// by the inequality of Cauchy and Schwarz, with ζ_n ≥ (n − 1)π
		first := math.Pi * float64(len(s.Modes.All))
		k := 2 * fo
		rest := math.Exp(-first*first*k) + math.Sqrt(math.Pi/k)/(2*math.Pi)*math.Erfc(first*math.Sqrt(k))
		return left + s.unresolved*math.Sqrt(s.spread*rest)
	}
	if fo < s.Join {
		left += s.outer.missing(fo) * s.size
		if !s.Modes.Body.Solid {
			left += s.inner.missing(fo) * s.size
		}
	}
	return left
}

// Part returns what mode n, from 0 on, adds to a Value or Mean at Fo = 0. That of a slow first mode is what it takes away
// in the end: it adds nothing at 0.
func (s *Solution) Part(n int, p Probe) float64 {
	c := s.all.c[n]
	if n == 0 {
		c += s.all.slow
	}
	return c * s.weight(p, &s.Modes.All[n])
}

// Slow reports whether the steady state and the first mode, which is slow, are put together.
func (s *Solution) Slow() bool { return s.Modes.slow() }

package wall

import "math"

// A body that hardly exchanges heat comes to a steady state that may be far beyond any temperature of interest, and its
// first mode takes all of that away again. Both are put together then: T = D + slow Φ (exp(−ζ² Fo) − 1) + the other modes,
// where D + slow Φ·(−1) is the steady state, and D, to within the coefficients, that of a body without exchange, less
// its rise, under what the faces let through at the start.

// Below the slowest rate and the least coefficients a first mode is slow: then neither way loses more than 1e-8.
const (
	slowestRate = 1e-8
	leastH      = 1e-7
)

// slow reports whether the first mode is slow.
func (m *Modes) slow() bool {
	rate := m.All[0].Rate
	return rate > 0 && rate < slowestRate && m.Ha < leastH && m.Hb < leastH
}

// settleSlowly puts the first mode apart.
func (m *Modes) settleSlowly(r *response, d Drive) {
	still := Modes{Body: m.Body}
	r.slow, r.c[0] = r.c[0], 0
	r.steady = still.Steady(Drive{Qa: d.Qa - m.Ha*d.Ua, Qb: d.Qb - m.Hb*d.Ub, G: d.G})
	r.steady.Rise = 0
}

// lateSlow is late for a slow first mode; a heat is counted from the given time on.
func (s *Solution) lateSlow(r *response, p Probe, from, fo float64) float64 {
	if s.fixed(p) {
		return r.base(p, 1, fo)
	}
	first := &s.Modes.All[0]
	if p.Quantity == InnerHeat || p.Quantity == OuterHeat {
		pull, flux := first.InnerPull, r.steady.Inside()+s.Modes.Ha*r.steady.At(0)
		if p.Quantity == OuterHeat {
			pull, flux = first.OuterPull, r.steady.Outside()+s.Modes.Hb*r.steady.At(1)
		}
		total := flux*(fo-from) + r.slow*pull*shortfall(first.Rate, from, fo)
		for n, c := range r.c {
			if mode := &s.Modes.All[n]; c != 0 {
				total += c * s.weight(p, mode) * math.Exp(-mode.Rate*from) * math.Expm1(-mode.Rate*(fo-from))
			}
		}
		return total
	}
	total := r.base(p, 1, 0) + r.slow*s.weight(p, first)*math.Expm1(-first.Rate*fo)
	switch p.Quantity {
	case InnerFlux:
		total += s.Modes.Ha * r.steady.At(0)
	case OuterFlux:
		total += s.Modes.Hb * r.steady.At(1)
	}
	for n, c := range r.c {
		if c != 0 {
			mode := &s.Modes.All[n]
			total += c * s.weight(p, mode) * math.Exp(-mode.Rate*fo)
		}
	}
	return total
}

// shortfall returns ∫ (exp(−rate τ) − 1) dτ from a to b.
func shortfall(rate, a, b float64) float64 {
	if rate*b > 1e-2 {
		return math.Exp(-rate*a)*-math.Expm1(-rate*(b-a))/rate - (b - a)
	}
	antiderivative := func(x float64) float64 {
		z := rate * x
		return -x * z * (1.0/2 - z*(1.0/6-z*(1.0/24-z*(1.0/120-z*(1.0/720-z/5040)))))
	}
	return antiderivative(b) - antiderivative(a)
}

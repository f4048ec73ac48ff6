package lumped

import (
	"math"

	"example.com/coolward/internal/ode"
	"example.com/coolward/units"
)

// A trajectory is the state y over time. Fall returns T0 − y, and crossings visits every time at which y is at
// a level, rising.
type trajectory interface {
	fall(t float64) float64
	crossings(y float64, visit func(t float64) bool)
}

// A straightforward trajectory is a law on its way from the start to a limit.
type straightforward struct {
	law
	start, limit float64
}

func (h *straightforward) crossings(y float64, visit func(t float64) bool) {
	if part := (h.start - y) / (h.start - h.limit); part > 0 && part < 1 || part == 0 {
		if t := h.when(y); t >= 0 && isFinite(t) {
			visit(t)
		}
	}
}

// An integrated trajectory is what the integrator found.
type integrated struct {
	path  *ode.Solution
	start float64
}

func (h *integrated) fall(t float64) float64 {
	y, _ := h.path.At(t)
	return h.start - y
}

func (h *integrated) crossings(y float64, visit func(t float64) bool) { h.path.Crossings(y, visit) }

// solveClosed looks for a closed form, and reports whether one applies.
func (s *Solution) solveClosed() (bool, error) {
	e := &s.exchange
	switch {
	case len(e.functions) > 0:
		return false, nil
	case e.linear() && !e.steady():
		return s.solveMoving()
	}
	l, limit, ok := s.law()
	if !ok {
		return false, nil
	}
	s.end, s.limit, s.limitKnown = math.MaxFloat64, limit, true
	if line, ok := l.(straight); ok {
		s.end, s.limitKnown = line.when(limit), false
	}
	if !s.content.constantBetween(s.start, s.limit) {
		s.end, s.limit, s.limitKnown = 0, 0, false
		return false, nil
	}
	s.content.linear = true
	s.last = s.limit
	s.straight = straightforward{l, s.start, limit}
	s.trajectory = &s.straight
	if x, ok := l.(exponential); ok {
		s.exponential, s.excess, s.rate = true, s.start-limit, x.rate
		if !isFinite(x.rate) {
			return false, &units.ArgumentError{Field: "surface condition: heat transfer coefficient", Value: units.WattPerSquareMetreKelvin.Of(e.conductance(s.start) / e.area), Accepted: "one with a time constant ρ c (V/A)/h above 0 s"}
		}
	}
	return true, nil
}

// law returns the closed form of an exchange that is the same at all times, and the limit.
func (s *Solution) law() (l law, limit float64, ok bool) {
	e, c := &s.exchange, s.content.capacity
	net := e.source - e.damping()*e.given // what comes in whatever the temperature is
	switch {
	case e.linear() && len(e.ambients) == 0:
		if net == 0 {
			return exponential{s.start, s.start, 0}, s.start, true
		}
		slope := net / c
		limit = max(s.content.low, 0)
		if slope > 0 {
			limit = min(s.content.high, farthest)
		}
		return straight{s.start, slope}, limit, limit != s.start && isFinite((limit-s.start)/slope)
	case e.linear():
		g, heat := 0.0, net
		for i := range e.ambients {
			k := e.damping() * e.factor * e.ambients[i].conductance
			g += k
			heat += k * e.ambients[i].at
		}
		limit = heat / g
		if len(e.ambients) == 1 && net == 0 {
			limit = e.ambients[0].at
		}
		return exponential{s.start, limit, -g / c}, limit, limit > 0 && isFinite(limit)
	case e.insulate != 0:
		return nil, 0, false
	case len(e.ambients) == 0 && len(e.powers) == 0:
		total, sink := 0.0, e.source-e.given
		for _, r := range e.radiators {
			total += r.strength
			sink += r.strength * math.Pow(r.surroundings, 4)
		}
		limit = math.Sqrt(math.Sqrt(sink / total))
		if len(e.radiators) == 1 && e.source == e.given {
			limit = e.radiators[0].surroundings
		}
		return glow{s.start, limit, c / (4 * total * limit * limit * limit)}, limit, limit > 0 && isFinite(limit)
	case len(e.radiators) == 0 && len(e.ambients) == 0 && e.source == e.given:
		first, strength := e.powers[0], 0.0
		for _, p := range e.powers {
			if p.exponent != first.exponent || p.ambient != first.ambient {
				return nil, 0, false
			}
			strength += e.factor * p.strength
		}
		tau := c / (strength * math.Pow(math.Abs(s.start-first.ambient), first.exponent))
		if first.exponent == 0 || s.start == first.ambient {
			return exponential{s.start, first.ambient, -1 / tau}, first.ambient, true
		}
		return slackening{s.start, first.ambient, first.exponent, tau}, first.ambient, tau > 0 && isFinite(tau)
	}
	return nil, 0, false
}

// solveMoving takes the closed form under ambients that go with time.
func (s *Solution) solveMoving() (bool, error) {
	end := s.problem.Horizon.SI()
	if end == 0 {
		return false, nil
	}
	e := &s.exchange
	for i := range e.ambients {
		a := &e.ambients[i]
		if a.steady {
			continue
		}
		if _, err := a.course.At(units.Second.Of(end + e.shift)); err != nil {
			return false, err
		}
		if mean, amplitude, _, _, ok := a.course.Oscillation(); ok && !(mean.SI() > math.Abs(amplitude.SI())) {
			return false, nil
		}
	}
	m, err := newMoving(e, s.content.capacity, s.start, end)
	if err != nil {
		return false, err
	}
	low, high := m.span()
	if !(low > 0) || !(m.tau > 0) || !isFinite(m.tau) || !s.content.constantBetween(low, high) {
		return false, nil
	}
	s.content.linear = true
	s.trajectory, s.end, s.moving = m, end, m
	s.last = s.start - m.fall(end)
	s.limit, s.limitKnown = m.limit(e), true
	return true, nil
}

// limit returns the temperature without exchange if the ambients stay as at the end.
func (m *moving) limit(e *exchange) float64 {
	p := &m.pieces[len(m.pieces)-1]
	s := m.end - p.from
	limit := p.ambient + p.slope*s
	for _, w := range p.waves {
		limit += w.size * math.Hypot(1, w.omega*m.tau) * math.Sin(w.omega*s+w.phase+math.Atan(w.omega*m.tau))
	}
	return limit
}

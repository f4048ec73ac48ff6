package fdm

import (
	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// opposite returns what happens at the opposite face; the zero Condition if it is insulated.
func (p Problem) opposite() boundary.Condition {
	if p.Opposite.IsZero() && p.bothExposed() && p.OppositeLump == nil {
		return p.Surface
	}
	return p.Opposite
}

// exchange returns a condition in plain numbers: constant coefficients apart from what is a function to the
// solver.
func exchange(c boundary.Condition) fv.Exchange {
	var e fv.Exchange
	if c.IsZero() {
		return e
	}
	if course, ok := c.SurfaceCourse(); ok {
		e.Prescribed = func(t float64) (T, rate float64, err error) {
			at, err := course.At(units.Second.Of(t))
			if err != nil {
				return 0, 0, err
			}
			slope, err := course.Rate(units.Second.Of(t))
			return at.SI(), slope.SI(), err
		}
		return e
	}
	var rest []boundary.Condition
	pull := 0.0 // Σ h (ambient − first ambient)
	for _, part := range c.Parts() {
		h, ambient, ok := part.Constants()
		switch {
		case !ok:
			rest = append(rest, part)
		case e.Coefficient == 0:
			e.Coefficient, e.Ambient = h.SI(), ambient.SI()
		default:
			e.Coefficient += h.SI()
			pull += h.SI() * (ambient.SI() - e.Ambient)
		}
	}
	if pull != 0 {
		e.Ambient += pull / e.Coefficient
	}
	if len(rest) == 0 {
		return e
	}
	other := rest[0]
	if len(rest) > 1 {
		other = boundary.Sum(rest...)
	}
	e.Function = func(t, T float64) (float64, error) {
		q, err := other.Flux(units.Second.Of(t), units.Kelvin.Of(T))
		return q.SI(), err
	}
	e.Slope = func(T float64) (float64, bool) {
		s, ok := other.Slope(units.Kelvin.Of(T))
		return s.SI(), ok
	}
	e.Steady = !inTime(other)
	return e
}

// inTime reports whether a condition may go with time.
func inTime(c boundary.Condition) bool { return !c.ByConstants() || c.Moves() }

// conditions returns all conditions of a problem.
func (p Problem) conditions() []boundary.Condition {
	var all []boundary.Condition
	for _, c := range []boundary.Condition{p.Surface, p.opposite()} {
		if !c.IsZero() {
			all = append(all, c)
		}
	}
	for _, l := range []*Lump{p.SurfaceLump, p.OppositeLump} {
		if l != nil && !l.Exchange.IsZero() {
			all = append(all, l.Exchange)
		}
	}
	return all
}

// steady reports whether nothing in the problem goes with time by itself.
func (p Problem) steady() bool {
	for _, c := range p.conditions() {
		if inTime(c) {
			return false
		}
	}
	return p.Source == nil
}

// inSI returns a lump in plain numbers; nil stays nil.
func (l *Lump) inSI(face float64) *fv.Lump {
	if l == nil {
		return nil
	}
	area := l.Area.SI()
	if area == 0 {
		area = face
	}
	return &fv.Lump{
		Capacity: l.HeatCapacity.SI(), Coefficient: l.Coefficient.SI(), Initial: l.Initial.SI(),
		Exchange: exchange(l.Exchange), Area: area,
	}
}

// contact returns the resistance below a layer.
func contact(l Layer) fv.Contact {
	c := fv.Contact{Resistance: l.Contact.SI()}
	if l.ContactAt != nil {
		c.Function = func(inner, outer float64) (float64, error) {
			r, err := l.ContactAt(units.Kelvin.Of(outer), units.Kelvin.Of(inner))
			return r.SI(), err
		}
	}
	return c
}

// reach returns temperatures that enclose all that the body may come to, by the maximum principle, and
// whether they are known.
func (p Problem) reach(start float64) (low, high float64, ok bool) {
	low, high = start, start
	if p.Source != nil || p.Profile != nil || p.Scheme == CrankNicolson { // which may oscillate beyond
		return 0, 0, false
	}
	for _, l := range []*Lump{p.SurfaceLump, p.OppositeLump} {
		if l != nil {
			low, high = min(low, l.Initial.SI()), max(high, l.Initial.SI())
		}
	}
	for _, c := range p.conditions() {
		for _, part := range c.Parts() {
			if h, _, constant := part.Constants(); constant && h.SI() == 0 {
				continue
			}
			course, given := part.SurfaceCourse()
			if _, follows, ok := part.Following(); ok {
				course, given = follows, true
			}
			if rest, ok := part.Rest(); ok {
				course, given = boundary.Steady(rest), true
			}
			if !given {
				return 0, 0, false
			}
			a, b, ok := p.extent(course)
			if !ok {
				return 0, 0, false
			}
			low, high = min(low, a), max(high, b)
		}
	}
	return low, high, true
}

// extent returns the least and greatest temperature of a course over the horizon.
func (p Problem) extent(c boundary.Course) (low, high float64, ok bool) {
	if T, ok := c.Steady(); ok {
		return T.SI(), T.SI(), true
	}
	if start, rate, ok := c.Ramp(); ok {
		end := start.SI() + rate.SI()*p.Horizon.SI()
		return min(start.SI(), end), max(start.SI(), end), true
	}
	if mean, amplitude, _, _, ok := c.Oscillation(); ok {
		a := abs(amplitude.SI())
		return mean.SI() - a, mean.SI() + a, true
	}
	_, temperatures, ok := c.Readings()
	if !ok || len(temperatures) == 0 {
		return 0, 0, false
	}
	low, high = temperatures[0].SI(), temperatures[0].SI()
	for _, T := range temperatures {
		low, high = min(low, T.SI()), max(high, T.SI())
	}
	return low, high, true
}

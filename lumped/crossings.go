package lumped

import (
	"math"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Crossing is a time at which a temperature, or a rate, is passed.
type Crossing struct {
	Time   units.Duration
	Rising bool // it is higher afterwards
}

// Crossings returns every time at which a place is at the target, in their order; the first is that of
// [Solution.TimeTo], unless the target is met at the start from the far side. There is none for a target that is never reached.
// Times that the course only touches count as one, neither rising nor falling for certain. Errors are those of At, and an
// [*units.ArgumentError] for a target that cannot be.
func (s *Solution) Crossings(place shape.Place, target units.Temperature) ([]Crossing, error) {
	if err := s.checkAsked(&place); err != nil {
		return nil, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return nil, err
	}
	if s.differs(place) {
		return s.crossingsOf(func(t float64) (float64, error) {
			at, err := s.place(place, t)
			return at.SI() - target.SI(), err
		})
	}
	y := target.SI()
	if s.path != nil {
		var err error
		if y, err = s.content.state(y); err != nil {
			return nil, nil // beyond what the material, and so the body, can be
		}
		if s.onlyTendsTo(target) {
			return nil, nil
		}
	}
	var all []Crossing
	s.trajectory.crossings(y, func(t float64) bool {
		all = append(all, Crossing{units.Second.Of(t), s.netAt(t) > 0})
		return true
	})
	return all, nil
}

// netAt returns what comes into the body at time t, in W; 0 where that cannot be found.
func (s *Solution) netAt(t float64) float64 {
	kelvin, err := s.mean(t)
	if err != nil {
		return 0
	}
	out, err := s.exchange.out(t, kelvin)
	if err != nil {
		return 0
	}
	return s.exchange.source - out
}

// crossingsOf finds the zeros of f over the solution. It looks at every piece between the nodes of the solution in
// eight parts, so it may pass over two zeros that are closer together.
func (s *Solution) crossingsOf(f func(t float64) (float64, error)) ([]Crossing, error) {
	const parts = 8
	var all []Crossing
	nodes := s.nodes()
	for i := 1; i < len(nodes); i++ {
		from, to := nodes[i-1], nodes[i]
		if i < len(nodes)-1 || s.path != nil || s.moving != nil {
			to = math.Nextafter(to, from) // this side of a jump
		}
		a := from
		fa, err := f(a)
		if err != nil {
			return nil, err
		}
		for j := 1; j <= parts; j++ {
			b := from + (to-from)*float64(j)/parts
			fb, err := f(b)
			if err != nil {
				return nil, err
			}
			if fa == 0 && (len(all) == 0 || all[len(all)-1].Time.SI() < a) {
				all = append(all, Crossing{units.Second.Of(a), fb > 0})
			} else if fa < 0 && fb > 0 || fa > 0 && fb < 0 {
				var failure error
				at, ok := root.Find(func(t float64) float64 {
					y, err := f(t)
					if err != nil {
						failure, y = err, math.NaN()
					}
					return y
				}, a, b, 0)
				if failure != nil {
					return nil, failure
				}
				if ok {
					all = append(all, Crossing{units.Second.Of(at), fb > fa})
				}
			}
			a, fa = b, fb
		}
	}
	return all, nil
}

// nodes returns times between which the solution is smooth.
func (s *Solution) nodes() []float64 {
	var nodes []float64
	switch {
	case s.path != nil:
		s.path.Nodes(func(t, _, _ float64) bool { nodes = append(nodes, t); return true })
		return nodes
	case s.moving != nil:
		return s.moving.nodes()
	}
	// A law: from a thousandth of its time constant to where nothing is left of it.
	tau := s.start / math.Abs(s.startRate()/s.content.capacity)
	if d := math.Abs(s.start - s.limit); d > 0 && s.limitKnown {
		tau = d / math.Abs(s.startRate()/s.content.capacity)
	}
	if !isFinite(tau) || tau < math.SmallestNonzeroFloat64*1e6 {
		return []float64{0, min(s.end, 1)}
	}
	nodes = append(nodes, 0)
	for t := tau / 1000; t < min(1e4*tau, s.end); t *= 1.5 {
		nodes = append(nodes, t)
	}
	return append(nodes, min(1e4*tau, s.end))
}

// nodes returns the bends, and enough times between for the transient and for each wave.
func (m *moving) nodes() []float64 {
	var nodes []float64
	for i := range m.pieces {
		p, end := &m.pieces[i], m.end
		if i+1 < len(m.pieces) {
			end = m.pieces[i+1].from
		}
		longest := end - p.from
		for _, w := range p.waves {
			longest = min(longest, math.Pi/2/w.omega)
		}
		longest = max(longest, (end-p.from)/1e5)
		step := min(m.tau/4, longest)
		for t := p.from; t < end; t += step {
			nodes = append(nodes, t)
			if t > p.from+40*m.tau {
				step = longest
			}
			if step < 1e-14*t {
				step = longest
			}
		}
	}
	return append(nodes, m.end)
}

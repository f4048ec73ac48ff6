package lumped

import (
	"math"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// farthest is where the search for a limit ends if the material has no upper bound, in kelvin.
const farthest = 1e5

// findLimit looks for the temperature that the body tends to if conditions stay as at the end of the
// path: where nothing comes or goes, nearest to the last temperature in the direction of flow. The steps of the
// search grow by half, so two such temperatures closer together than a step are passed over. If there is none
// before the end of the range of the material, the limit is that end and limitKnown is false.
func (s *Solution) findLimit() {
	e := s.exchange
	if e.linear() && len(e.ambients) > 0 {
		g, heat := 0.0, e.source-e.damping()*e.given
		for i := range e.ambients {
			a := &e.ambients[i]
			at := a.at
			if !a.steady {
				now, err := a.course.At(units.Second.Of(s.end + e.shift))
				if err != nil {
					s.limit, s.limitError = s.last, err
					return
				}
				at = now.SI()
			}
			k := e.damping() * e.factor * a.conductance
			g += k
			heat += k * at
		}
		if limit := heat / g; limit > 0 {
			s.limit, s.limitKnown = limit, true
			return
		}
	}
	net := func(kelvin float64) (float64, error) {
		out, err := e.out(s.end, kelvin)
		return out - e.source, err
	}
	at, q := s.last, -s.endRate()*s.content.capacity
	if q == 0 {
		s.limit, s.limitKnown = at, true
		return
	}
	stop := max(s.content.low, 0)
	if q < 0 {
		stop = min(s.content.high, farthest)
	}
	step := math.Copysign(s.firstStep(), stop-at)
	for at != stop {
		next := at + step
		if (stop-next)*step <= 0 {
			next = stop
		}
		if next <= 0 { // absolute zero itself cannot be asked for
			break
		}
		qn, err := net(next)
		if err != nil {
			s.limit, s.limitError = at, err
			return
		}
		if (qn > 0) != (q > 0) || qn == 0 {
			s.limit, s.limitError = zero(net, at, q, next, qn)
			s.limitKnown = s.limitError == nil
			return
		}
		at, q, step = next, qn, 1.5*step
	}
	s.limit = stop
}

// endRate returns dy/dt at the end of the path.
func (s *Solution) endRate() float64 {
	rate, _ := s.path.Rate(s.end)
	return rate
}

// firstStep guesses the distance from the last temperature to the limit from the last two nodes, as
// if dy/dt were a straight line over y.
func (s *Solution) firstStep() float64 {
	var y0, y, r0, r float64
	s.path.Nodes(func(_, yi, ri float64) bool {
		y0, r0, y, r = y, r, yi, ri
		return true
	})
	guess := math.Abs(r * (y - y0) / (r - r0))
	if !(guess < 50) {
		return 5
	}
	return max(guess*1.02, 0.01)
}

// zero returns where net is zero between a and b, where it has the values fa and fb of opposite
// sign, to a microkelvin.
func zero(net func(float64) (float64, error), a, fa, b, fb float64) (float64, error) {
	var failure error
	x, ok := root.Find(func(kelvin float64) float64 {
		switch kelvin {
		case a:
			return fa
		case b:
			return fb
		}
		q, err := net(kelvin)
		if err != nil {
			failure, q = err, math.NaN()
		}
		return q
	}, a, b, 1e-6)
	if failure == nil && !ok {
		failure = &units.ConvergenceError{Method: "limit temperature of the exchange", Reason: "the flux changes sign without a zero"}
	}
	return x, failure
}

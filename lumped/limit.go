package lumped

import (
	"math"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// The search for a limit ends there if the material has no bound, K.
const (
	coldest  = 1e-3
	farthest = 1e5

	limitTolerance = 1e-6 // of the limit, K
)

// findLimit looks for the temperature that the body tends to if conditions stay as at the end of the
// path: where nothing comes or goes, nearest to the last temperature in the direction of flow. Two such
// temperatures closer together than a step of the search are passed over. If there is none before the end of the range of the material, the limit is that end and limitKnown is false.
func (s *Solution) findLimit() {
	e := &s.exchange
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
	rate := s.endRate()
	stop := max(s.content.low, coldest)
	if rate > 0 {
		stop = min(s.content.high, farthest)
	}
	net := func(kelvin float64) (float64, error) {
		if kelvin == s.last { // known
			return -rate * s.content.capacity, nil
		}
		out, err := e.out(s.end, kelvin)
		return out - e.source, err
	}
	s.limit, s.limitKnown, s.limitError = root.Seek(net, s.last, stop, s.firstStep(), limitTolerance)
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

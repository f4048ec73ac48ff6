package fdm

import (
	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// A limit is what the body tends to.
type limit struct {
	temperature float64 // K
	open        bool    // no limit was found within the range of the material; temperature is the end of it
}

// findLimit returns what the body tends to: the constant ambient, or the start if it is insulated. For an exchange function it is
// the temperature at which no heat would flow at the end of the solution, the nearest to the mean of the
// body in the direction in which that changes.
func (s *Solution) findLimit() limit {
	if h, ambient, ok := s.problem.Surface.Constants(); ok {
		if h.SI() == 0 {
			return limit{temperature: s.problem.Initial.SI()}
		}
		return limit{temperature: ambient.SI()}
	}
	end := s.Horizon()
	failed := false
	flux := func(T float64) float64 {
		q, err := s.problem.Surface.Flux(end, units.Kelvin.Of(T))
		failed = failed || err != nil
		return q.SI()
	}
	low, high := s.problem.supported()
	mean := s.fine.system.MeanTemperature(s.heat(end.SI()))
	mean = min(max(mean, low), high) // it may lie beyond an end by the tolerance
	q := flux(mean)
	if q == 0 && !failed {
		return limit{temperature: mean}
	}
	edge, sign := low, -1.0
	if q < 0 {
		edge, sign = high, 1
	}
	from := mean
	for step := 1.0; !failed && from != edge; step *= 1.5 {
		to := from + sign*step
		if (to-edge)*sign > 0 {
			to = edge
		}
		now := flux(to)
		if failed {
			break
		}
		if now == 0 || (now > 0) != (q > 0) {
			T, ok := root.Find(flux, from, to, 1e-9)
			if !ok || failed {
				break
			}
			return limit{temperature: T}
		}
		from = to
	}
	return limit{temperature: edge, open: true}
}

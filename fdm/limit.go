package fdm

import (
	"math"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// A limit is what the body tends to.
type limit struct {
	temperature float64 // K
	open        bool    // there is none within the range of the material; temperature is the end of it
	failure     error   // of the exchange function, which leaves the limit unknown
	startFlux   float64 // heat flux at the start, W/m²
}

// findLimit returns what the body tends to: the constant ambient, or the start if it is insulated. For an
// exchange function it is the temperature at which no heat would flow at the end of the solution, the
// nearest to the mean of the body in the direction in which that changes. The steps of the search grow by
// half, so two zeros closer together than a step are passed over.
func (s *Solution) findLimit() limit {
	start := s.problem.Initial
	if h, ambient, ok := s.problem.Surface.Constants(); ok {
		if h.SI() == 0 {
			ambient = start
		}
		return limit{temperature: ambient.SI(), startFlux: h.SI() * (start.SI() - ambient.SI())}
	}
	l := limit{temperature: start.SI()}
	flux := func(t units.Duration, T float64) float64 {
		q, err := s.problem.Surface.Flux(t, units.Kelvin.Of(T))
		if err != nil {
			l.failure = err
			return math.NaN()
		}
		return q.SI()
	}
	l.startFlux = flux(units.Duration{}, start.SI())
	end := s.Horizon()
	low, high := s.problem.supported()
	from := s.fine.system.MeanTemperature(s.heat(end.SI()))
	from = min(max(from, low), high) // it may lie beyond an end by the tolerance
	q := flux(end, from)
	edge, sign := low, -1.0
	if q < 0 {
		edge, sign = high, 1
	}
	for step := firstSearch; l.failure == nil && q != 0 && from != edge; step *= 1.5 {
		to := from + sign*step
		if (to-edge)*sign > 0 {
			to = edge
		}
		now := flux(end, to)
		if now == 0 || (now > 0) != (q > 0) {
			zero, ok := root.Find(func(T float64) float64 { return flux(end, T) }, from, to, limitError)
			if ok {
				l.temperature = zero
			}
			return l
		}
		from = to
	}
	l.temperature, l.open = from, q != 0
	return l
}

const (
	firstSearch = 1.0  // K, the first step of the search
	limitError  = 1e-9 // K
)

package fdm

import (
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// GreatestDifference returns by how much one place is at most hotter or colder than another over the
// solution, and when: the largest magnitude of their difference, with its sign: negative where the one is colder. Of
// surface and centre it tells where a brittle body is pulled, at the surface while that is colder and in the centre while
// it is hotter; whether it cracks depends on its strength, its restraint and its flaws too. It returns an [*units.ArgumentError] for a place that has no temperature in the body.
func (s *Solution) GreatestDifference(one, other shape.Place) (units.TemperatureDifference, units.Duration, error) {
	if err := s.check(); err != nil {
		return units.TemperatureDifference{}, units.Duration{}, err
	}
	p, err := s.gauge(one)
	if err != nil {
		return units.TemperatureDifference{}, units.Duration{}, err
	}
	q, err := s.gauge(other)
	if err != nil {
		return units.TemperatureDifference{}, units.Duration{}, err
	}
	difference := func(t float64) float64 { return s.at(&p, t) - s.at(&q, t) }
	h := s.fine.history
	best, at := difference(0), 0.0
	reach := 0.0
	const samples = 4
	for k := range h.Steps() {
		from, length := h.Time(k), h.Time(k+1)-h.Time(k)
		for i := 1; i <= samples; i++ {
			t := from + length*float64(i)/samples
			if t > s.fine.end {
				break
			}
			if d := difference(t); math.Abs(d) > math.Abs(best) {
				best, at, reach = d, t, length/samples
			}
		}
	}
	at = peak(func(t float64) float64 { return math.Abs(difference(t)) }, max(at-reach, 0), min(at+reach, s.fine.end))
	return units.KelvinDifference.Of(difference(at)), units.Second.Of(at), nil
}

// peak returns where f is greatest between two points, where it has one peak: by the golden section (J. Kiefer,
// Proc. Amer. Math. Soc. 4, 1953, from memory).
func peak(f func(float64) float64, from, to float64) float64 {
	ratio := (math.Sqrt(5) - 1) / 2
	a, b := to-ratio*(to-from), from+ratio*(to-from)
	fa, fb := f(a), f(b)
	for range 60 {
		if fa >= fb {
			to, b, fb = b, a, fa
			a = to - ratio*(to-from)
			fa = f(a)
		} else {
			from, a, fa = a, b, fb
			b = from + ratio*(to-from)
			fb = f(b)
		}
	}
	return (from + to) / 2
}

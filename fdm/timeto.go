package fdm

import (
	"math"
	"slices"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// TimeTo returns the first time at which a place is at the target, to 1e-12 of that time on the
// solution as computed. A target that is met at the start, or that lies on the far side of the start
// from where the body tends to, is met at 0.
//
// It returns a [*units.NeverError] if the place tends to a temperature that is not beyond the target, a
// [*units.HorizonError] if it gets there after the end of the solution only, and an [*units.ArgumentError] for a place that is
// not in the body or a target that cannot be. Where it tends to is the constant ambient; for an
// exchange function the temperature nearest in the direction of flow at which no heat would flow at the end of the
// solution, or the end of the material's range if there is none.
func (s *Solution) TimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	if err := units.CheckTemperature("target temperature", target); err != nil {
		return units.Duration{}, err
	}
	p, err := s.fine.probe(place, s.problem.Body)
	if err != nil {
		return units.Duration{}, err
	}
	start := s.problem.Initial.SI()
	if target.SI() == start {
		return units.Duration{}, nil
	}
	if t, ok := s.fine.crossing(p, target.SI(), start); ok {
		return units.Second.Of(t), nil
	}
	reached := s.fine.at(p, s.fine.history.End())
	limit := s.limit.temperature
	// Which way it goes from here; at the limit itself, which way it came.
	way := limit - reached
	if abs(way) <= 100*s.problem.tolerance() {
		way = limit - start
	}
	switch {
	case abs(way) > 0 && (target.SI()-reached)*way < 0:
		return units.Duration{}, nil
	case abs(way) > 0 && ((limit-target.SI())*way > 0 || s.limit.open):
		return units.Duration{}, &units.HorizonError{
			Place: place.String(), Target: target, Horizon: s.Horizon(),
			Reached: units.Kelvin.Of(reached), Limit: units.Kelvin.Of(limit),
		}
	}
	never := &units.NeverError{Place: place.String(), Target: target, Limit: units.Kelvin.Of(limit)}
	if _, _, constant := s.problem.Surface.Constants(); !constant {
		never.Condition = "if conditions stay as at " + s.Horizon().String()
	}
	return units.Duration{}, never
}

// crossing returns the first time at which the probe is at the target, which is not start.
func (tr *track) crossing(p probe, target, start float64) (float64, bool) {
	h := tr.history
	last := start - target
	for k := range h.Steps() {
		var points [9]float64
		ends := tr.turns(p, k, points[:0])
		from := 0.0
		for _, s := range ends {
			now := tr.temperature(p, k, s) - target
			if now == 0 || (now > 0) != (last > 0) {
				t0, length := h.Time(k), h.Time(k+1)-h.Time(k)
				fraction, ok := root.Find(func(s float64) float64 { return tr.temperature(p, k, s) - target }, from, s, 1e-13)
				if !ok { // equal signs by rounding at a point just evaluated
					fraction = s
				}
				return min(t0+fraction*length, h.End()), true
			}
			last, from = now, s
		}
	}
	return 0, false
}

// turns appends the fractions of step k between which the states around a probe rise or fall
// throughout, in rising order and with 1 at the end.
func (tr *track) turns(p probe, k int, ends []float64) []float64 {
	for j := range p.count {
		c := tr.history.Cubic(k, p.first+j)
		// 3 c3 s² + 2 c2 s + c1 = 0, by the form without cancellation.
		d := c[2]*c[2] - 3*c[3]*c[1]
		if !(d > 0) {
			continue
		}
		q := -(c[2] + math.Copysign(math.Sqrt(d), c[2]))
		for _, s := range [2]float64{q / (3 * c[3]), c[1] / q} {
			if s > 0 && s < 1 {
				ends = append(ends, s)
			}
		}
	}
	slices.Sort(ends)
	return append(ends, 1)
}

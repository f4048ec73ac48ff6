package lumped

import (
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// TimeTo returns when the body is first at the target. A target that is met at the start is reached
// at 0: the start itself, or one on the far side of the start from the limit (a cooling body is
// below it already).
//
// It returns an [*units.NeverError] if the body tends to a limit that does not pass the target by more than the
// tolerance, and an [*units.HorizonError] if the limit lies beyond the target but the solution ends before. For an
// exchange function the limit is where q = 0 if conditions stay as at the end of the solution, or the
// end of the range of the material if there is no such temperature within it; if it cannot be found
// because the exchange function fails, the error is an [*units.ConvergenceError] with that cause. An
// [*units.ArgumentError] reports a place that is not in the body, or a target that cannot be.
func (s *Solution) TimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	if err := s.checkPlace(place); err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	if target.SI() == s.start {
		return units.Duration{}, nil
	}
	if s.closed {
		return s.closedTimeTo(place, target)
	}
	if t, ok := s.crossing(target); ok && !s.onlyTendsTo(target) {
		return t, nil
	}
	return units.Duration{}, s.notReached(place, target)
}

// crossing returns the first time at which the path is at the target.
func (s *Solution) crossing(target units.Temperature) (units.Duration, bool) {
	y, err := s.state(target)
	if err != nil {
		return units.Duration{}, false
	}
	t, ok := s.path.Crossing(y)
	return units.Second.Of(t), ok
}

// atLimit is how near to the limit a target counts as the limit, in kelvin.
const atLimit = 1e-3

// onlyTendsTo reports whether the target is the limit, and the path does not go beyond it by more than
// the tolerance. Where such a path crosses the target is an accident of the integration.
func (s *Solution) onlyTendsTo(target units.Temperature) bool {
	tolerance := s.problem.Tolerance
	if !s.limitKnown || math.Abs(target.SI()-s.limit) > atLimit {
		return false
	}
	_, beyond := s.crossing(target.Add(units.KelvinDifference.Of(math.Copysign(tolerance.SI(), target.SI()-s.start))))
	return !beyond
}

// closedTimeTo inverts the closed form.
func (s *Solution) closedTimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	part := (target.SI() - s.start) / s.excess // −1 at the limit, 0 at the start
	switch {
	case s.excess == 0 || part <= -1:
		return units.Duration{}, &units.NeverError{Place: place.String(), Target: target, Limit: units.Kelvin.Of(s.limit)}
	case part >= 0:
		return units.Duration{}, nil
	}
	logarithm := math.Log1p(part)
	if part < -0.5 {
		logarithm = math.Log((target.SI() - s.limit) / s.excess)
	}
	t := units.Second.Of(logarithm / s.rate)
	if math.IsInf(logarithm, 0) || !t.IsFinite() {
		return units.Duration{}, &units.NeverError{Place: place.String(), Target: target, Limit: units.Kelvin.Of(s.limit)}
	}
	return t, nil
}

// notReached returns the answer for a target that the path does not cross: nil if it is met at the
// start.
func (s *Solution) notReached(place shape.Place, target units.Temperature) error {
	if s.limitError != nil {
		return &units.ConvergenceError{
			Method: "limit temperature of the exchange",
			Time:   units.Second.Of(s.end),
			Reason: "not reached until then, and the exchange function fails beyond " + units.Kelvin.Of(s.limit).String() + "; use a longer horizon",
			Cause:  s.limitError,
		}
	}
	limit := units.Kelvin.Of(s.limit)
	ahead := target.SI() - s.start
	if ahead*(s.limit-s.start) < 0 && ahead*s.startRate() <= 0 {
		return nil
	}
	if ahead*(s.limit-target.SI()) > 0 && !s.onlyTendsTo(target) {
		return &units.HorizonError{
			Place: place.String(), Target: target, Horizon: units.Second.Of(s.end),
			Reached: units.Kelvin.Of(s.last), Limit: limit,
		}
	}
	never := &units.NeverError{Place: place.String(), Target: target, Limit: limit}
	if _, _, ok := s.problem.Surface.Constants(); !ok {
		never.Condition = "if conditions stay as at " + units.Second.Of(s.end).String()
	}
	return never
}

// startRate returns dy/dt at the start of the path.
func (s *Solution) startRate() (rate float64) {
	s.path.Nodes(func(_, _, r float64) bool { rate = r; return false })
	return rate
}

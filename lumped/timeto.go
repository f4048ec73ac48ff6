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
// exchange function, and for ambients that go with time, the limit is where nothing comes or goes if conditions
// stay as at the end of the solution, or the end of the range of the material if there is no such temperature
// within it; if it cannot be found because the exchange function fails, the error is an
// [*units.ConvergenceError] with that cause. An [*units.ArgumentError] reports a place that is not in the body, or
// a target that cannot be.
//
// Where the course is not straight, [Solution.Crossings] gives the later times too.
func (s *Solution) TimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	if err := s.checkAsked(&place); err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	switch {
	case target.SI() == s.start:
		return units.Duration{}, nil
	case s.differs(place):
		return s.timeInside(place, target)
	case s.path == nil && s.moving == nil:
		return s.lawTimeTo(place, target)
	}
	if t, ok := s.first(target); ok && !s.onlyTendsTo(target) {
		return t, nil
	}
	return units.Duration{}, s.notReached(place, target)
}

// checkAsked checks a place of which a time is asked, for which the slowest and the fastest place may stand.
func (s *Solution) checkAsked(place *shape.Place) error {
	switch {
	case place.IsSlowest():
		*place = shape.Centre()
	case place.IsFastest():
		*place = shape.Surface()
	}
	return s.checkPlace(*place)
}

// differs reports whether the place has another temperature than the mean.
func (s *Solution) differs(place shape.Place) bool { return s.inside != nil && !place.IsMean() }

// first returns the first time at which the mean of a solution that is no law is at the target.
func (s *Solution) first(target units.Temperature) (t units.Duration, ok bool) {
	y := target.SI()
	if s.path != nil {
		var err error
		if y, err = s.content.state(y); err != nil {
			return units.Duration{}, false
		}
		at, ok := s.path.Crossing(y)
		return units.Second.Of(at), ok
	}
	return s.moving.first(y)
}

// first returns the first time at which T is at the target.
func (m *moving) first(target float64) (t units.Duration, ok bool) {
	m.crossings(target, func(at float64) bool { t, ok = units.Second.Of(at), true; return false })
	return t, ok
}

// atLimit is how near to the limit a target counts as the limit, in kelvin.
const atLimit = 1e-3

// onlyTendsTo reports whether the target is the limit, and the path does not go beyond it by more than
// the tolerance. Where such a path crosses the target is an accident of the integration.
func (s *Solution) onlyTendsTo(target units.Temperature) bool {
	tolerance := s.problem.Tolerance
	if s.path == nil || !s.limitKnown || math.Abs(target.SI()-s.limit) > atLimit {
		return false
	}
	_, beyond := s.first(target.Add(units.KelvinDifference.Of(math.Copysign(tolerance.SI(), target.SI()-s.start))))
	return !beyond
}

// lawTimeTo inverts a closed form that is straight on its way to a limit.
func (s *Solution) lawTimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	excess := s.start - s.limit
	part := (s.start - target.SI()) / excess // 0 at the start, 1 at the limit
	switch {
	case excess == 0 || part > 1 || part == 1 && s.limitKnown:
		return units.Duration{}, s.never(place, target)
	case part < 0:
		return units.Duration{}, nil
	}
	t := units.Second.Of(s.straight.when(target.SI()))
	if !t.IsFinite() {
		return units.Duration{}, s.never(place, target)
	}
	return t, nil
}

func (s *Solution) never(place shape.Place, target units.Temperature) *units.NeverError {
	return &units.NeverError{Place: place.String(), Target: target, Limit: units.Kelvin.Of(s.limit)}
}

// notReached returns the answer for a target that the body does not come to: nil if it is met at the
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
	never := s.never(place, target)
	if !s.exchange.steady() {
		never.Condition = "if conditions stay as at " + units.Second.Of(s.end).String()
	}
	return never
}

// startRate returns dy/dt at the start.
func (s *Solution) startRate() float64 {
	out, err := s.exchange.out(0, s.start)
	if err != nil {
		return 0
	}
	return s.exchange.source - out
}

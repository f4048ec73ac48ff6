package lumped

import (
	"context"
	"errors"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// LatestStart returns how late, after time 0, the body may start at its initial temperature so that the place is at the
// target at the deadline at the latest. The conditions at the surface keep their time: an ambient that goes with time goes on
// while the body waits. It looks at 64 starts, later ones first, and then between two of them, so a start that is in time within
// a shorter span alone may be missed.
//
// Where no start is in time, it returns the error of [Solution.TimeTo] for the start at 0: an [*units.NeverError] or an
// [*units.HorizonError] with the deadline for its horizon. Errors are those of Solve besides, and an [*units.ArgumentError] for
// a deadline that is not above 0.
func (p Problem) LatestStart(ctx context.Context, place shape.Place, target units.Temperature, deadline units.Duration) (units.Duration, error) {
	if err := units.CheckPositive("deadline", deadline); err != nil {
		return units.Duration{}, err
	}
	end := deadline.SI()
	// spare returns what is left between the time at the target and the deadline, below 0 if it is not reached.
	spare := func(start float64) (float64, error) {
		s, err := p.until(ctx, start, target, end)
		if err != nil {
			return 0, err
		}
		t, err := s.TimeTo(place, target)
		if err != nil {
			return -1, err
		}
		return end - start - t.SI(), nil
	}
	first, err := p.until(ctx, 0, target, end)
	if err != nil {
		return units.Duration{}, err
	}
	if first.exchange.steady() {
		t, err := first.TimeTo(place, target)
		if err == nil && t.Compare(deadline) > 0 {
			err = first.late(place, target, deadline)
		}
		return deadline.Sub(t), err
	}
	const starts = 64
	late := end
	for i := starts - 1; i >= 0; i-- {
		start := end * float64(i) / starts
		left, err := spare(start)
		switch {
		case err != nil && (!notYet(err) || i == 0):
			return units.Duration{}, err
		case left < 0 && i == 0: // it would be in time were there no deadline
			return units.Duration{}, first.late(place, target, deadline)
		case left < 0:
			late = start
			continue
		}
		for late-start > 1e-12*end {
			mid := start + (late-start)/2
			left, err := spare(mid)
			if err != nil && !notYet(err) {
				return units.Duration{}, err
			}
			if left >= 0 {
				start = mid
			} else {
				late = mid
			}
		}
		return units.Second.Of(start), nil
	}
	return units.Duration{}, nil
}

// until solves the problem for a body that starts at a time and has to be at the target before the end.
func (p Problem) until(ctx context.Context, start float64, target units.Temperature, end float64) (*Solution, error) {
	p.Horizon, p.Until = units.Second.Of(end-start), target
	return p.solve(ctx, variant{factor: 1, start: start})
}

// late returns the error for a target that a solution from time 0 comes to after the deadline.
func (s *Solution) late(place shape.Place, target units.Temperature, deadline units.Duration) error {
	if err := s.checkAsked(&place); err != nil {
		return err
	}
	reached, err := s.At(place, deadline)
	if err != nil {
		return err
	}
	return &units.HorizonError{Place: place.String(), Target: target, Horizon: deadline, Reached: reached, Limit: units.Kelvin.Of(s.limit)}
}

// notYet reports whether an error says that a temperature is not reached.
func notYet(err error) bool {
	var never *units.NeverError
	var horizon *units.HorizonError
	return errors.As(err, &never) || errors.As(err, &horizon)
}

package lumped

import (
	"context"
	"fmt"
	"math"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Variable is what a design may vary: every quantity of package units, and a temperature. S is the type of its
// differences.
type Variable[Q, S any] interface {
	SI() float64
	Add(difference S) Q
	Sub(other Q) S
}

// A Span is the difference of two values of a variable.
type Span[S any] interface{ Scale(factor float64) S }

// JustMeeting returns the value between low and high, of a size, a coefficient, an ambient temperature or anything
// else, with which the place is just at the target after the given time:
//
//	d, err := lumped.JustMeeting(ctx, units.Millimetre.Of(5), units.Millimetre.Of(80), shape.Centre(), target, after,
//		func(d units.Length) lumped.Problem { return cooling(d) })
//
// It solves the problem that the function makes of a value some ten times, with the given time for its horizon. If the place is on
// the same side of the target at both ends, it returns an [*units.ArgumentError] that says how far off they are; if there
// are several such values, one of them. Errors are those of Solve and At besides.
func JustMeeting[Q Variable[Q, S], S Span[S]](ctx context.Context, low, high Q, place shape.Place, target units.Temperature, after units.Duration, problem func(Q) Problem) (Q, error) {
	if problem == nil {
		return low, &units.ArgumentError{Field: "problem", Accepted: "a function that makes a problem of a value"}
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return low, err
	}
	if err := units.CheckPositive("time to the target", after); err != nil {
		return low, err
	}
	value := func(part float64) Q {
		switch part {
		case 0:
			return low
		case 1:
			return high
		}
		return low.Add(high.Sub(low).Scale(part))
	}
	var failure error
	beyond := func(part float64) float64 {
		if failure != nil {
			return math.NaN()
		}
		var at units.Temperature
		if at, failure = problem(value(part)).after(ctx, place, after); failure != nil {
			return math.NaN()
		}
		return at.Sub(target).SI()
	}
	first, last := beyond(0), beyond(1)
	if failure != nil {
		return low, failure
	}
	if first*last > 0 {
		return low, &units.ArgumentError{
			Field: "range of the design", Value: fmt.Sprintf("%v to %v", low, high),
			Accepted: fmt.Sprintf("ends of which one is above and one below %v after %v; they are at %v and %v", target, after,
				target.Add(units.KelvinDifference.Of(first)), target.Add(units.KelvinDifference.Of(last))),
		}
	}
	part, ok := root.Find(func(part float64) float64 {
		switch part {
		case 0:
			return first
		case 1:
			return last
		}
		return beyond(part)
	}, 0, 1, 0)
	if failure == nil && !ok {
		failure = &units.ConvergenceError{Method: "design", Reason: "the temperature jumps over the target between two values"}
	}
	return value(part), failure
}

// after returns the temperature of a place after some time.
func (p Problem) after(ctx context.Context, place shape.Place, t units.Duration) (units.Temperature, error) {
	p.Horizon, p.Until = t, units.Temperature{}
	s, err := p.Solve(ctx)
	if err != nil {
		return units.Temperature{}, err
	}
	if err := s.checkAsked(&place); err != nil {
		return units.Temperature{}, err
	}
	return s.At(place, t)
}

package series

import (
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Solution is the exact solution of a [Problem]. It does not change and may be used from many
// goroutines. Make one with [Problem.Solve]; the zero Solution is refused by every method that
// returns an error.
type Solution struct {
	problem     Problem
	coefficient units.HeatTransferCoefficient
	ambient     units.Temperature
	diffusivity float64 // m²/s
	scale       float64 // R²/α, s
	excess      float64 // T0 − T∞, K
	heat        float64 // ρ c V (T0 − T∞), J
	modes       eigen.Sphere
}

// At returns the temperature of a place at time t ≥ 0; at [shape.Mean] it is that of [Solution.Mean].
// It returns an [*units.ArgumentError] for a place that is not in the body and for a time that is
// negative or not finite.
func (s *Solution) At(place shape.Place, t units.Duration) (units.Temperature, error) {
	if place.IsMean() {
		return s.Mean(t)
	}
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	x, err := place.Position(s.problem.Body)
	if err != nil {
		return units.Temperature{}, err
	}
	return s.temperature(s.modes.At(x, s.Fourier(t))), nil
}

// Mean returns the mean temperature over the volume at time t ≥ 0, with the errors of [Solution.At].
func (s *Solution) Mean(t units.Duration) (units.Temperature, error) {
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	return s.temperature(s.modes.Mean(s.Fourier(t))), nil
}

// TimeTo returns when a place, or the mean, reaches the target: 0 if it is met at the start or lies on
// the far side of the start. The temperature at that time is the target to within rounding.
//
// It returns a [*units.NeverError] if the place does not come to the target however long one waits:
// the target is the ambient or beyond, or the body exchanges no heat; a [*units.ConvergenceError] if
// no float64 holds the time; and an [*units.ArgumentError] for a place that is not in the body and a
// target that is no temperature.
func (s *Solution) TimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	if err := s.check(units.Duration{}); err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	x := 0.0
	if !place.IsMean() {
		var err error
		if x, err = place.Position(s.problem.Body); err != nil {
			return units.Duration{}, err
		}
	}
	start, limit := s.problem.Initial, s.ambient
	if s.modes.Biot() == 0 {
		limit = start
	}
	left := target.SI() - limit.SI()
	theta := left / s.excess
	switch {
	case target == start:
		return units.Duration{}, nil
	case limit == start, left == 0, (left > 0) != (s.excess > 0):
		return units.Duration{}, &units.NeverError{Place: place.String(), Target: target, Limit: limit}
	case theta >= 1:
		return units.Duration{}, nil
	}
	find := s.modes.TimeOfMean
	if !place.IsMean() {
		find = func(theta float64) (float64, bool) { return s.modes.TimeAt(x, theta) }
	}
	fo, ok := find(theta)
	t := units.Second.Of(fo * s.scale)
	if !ok || !t.IsFinite() {
		return units.Duration{}, &units.ConvergenceError{
			Method: "time to a temperature", Place: place.String(),
			Reason: "the target " + target.String() + " is reached at a time beyond the range of float64",
		}
	}
	return t, nil
}

// HeatReleased returns the heat that has left the body by time t ≥ 0, ρ c V (T0 − T∞)(1 − θ) with θ of
// the mean; it is negative for a body that is heated. It keeps its digits also when little has been
// exchanged. The errors are those of [Solution.Mean].
func (s *Solution) HeatReleased(t units.Duration) (units.Energy, error) {
	if err := s.check(t); err != nil {
		return units.Energy{}, err
	}
	return units.Joule.Of(s.heat * s.modes.Loss(s.Fourier(t))), nil
}

// TruncationError bounds how far the temperature of any place at time t ≥ 0 may be from the exact
// solution for the given numbers: the terms of the series, or the images of the short-time form, that are
// left out, and rounding. The errors are those of [Solution.Mean].
func (s *Solution) TruncationError(t units.Duration) (units.TemperatureDifference, error) {
	if err := s.check(t); err != nil {
		return units.TemperatureDifference{}, err
	}
	highest := math.Max(s.problem.Initial.SI(), s.ambient.SI())
	bound := math.Abs(s.excess)*s.modes.ErrorBound(s.Fourier(t)) + 2*epsilon*highest
	return units.KelvinDifference.Of(bound), nil
}

const epsilon = 0x1p-52

// Biot returns the Biot number h R/k, NaN for the zero Solution.
func (s *Solution) Biot() float64 {
	if !s.made() {
		return math.NaN()
	}
	return s.modes.Biot()
}

// Fourier returns the Fourier number α t/R² of a time, NaN for the zero Solution. It is +Inf where
// float64 ends.
func (s *Solution) Fourier(t units.Duration) float64 {
	if !s.made() {
		return math.NaN()
	}
	return t.SI() / s.scale
}

// made reports whether s comes from [Problem.Solve].
func (s *Solution) made() bool { return s != nil && s.scale > 0 }

// check refuses the zero Solution and a time that cannot be.
func (s *Solution) check(t units.Duration) error {
	if !s.made() {
		return &units.ArgumentError{Field: "solution", Accepted: "a solution made by Problem.Solve"}
	}
	return units.CheckNotNegative("time", t)
}

// temperature returns T for θ, from the nearer of the start and the ambient, so that both are met
// exactly and no rounding leads beyond them.
func (s *Solution) temperature(theta float64) units.Temperature {
	if theta > 0.5 {
		return units.Kelvin.Of(s.problem.Initial.SI() - s.excess*(1-theta))
	}
	return units.Kelvin.Of(s.ambient.SI() + s.excess*theta)
}

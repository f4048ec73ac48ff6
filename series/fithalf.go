package series

import (
	"context"
	"math"

	"example.com/coolward/units"
)

// FitCoefficient finds the heat transfer coefficient from the temperature that a depth, 0 for the surface, has at
// time t; all else is known, and the coefficient in p.Surface, a boundary.Constant, is of no account. So do the
// methods work that read the surface of a thick model. There is one answer at most, as the reading is nearer to
// the ambient the larger the coefficient is.
//
// It returns an [*UnidentifiedError] for a reading that no coefficient gives and an [*units.ArgumentError] for a
// field that cannot be used, such as a temperature that is not between the start and the ambient.
func (p SemiInfinite) FitCoefficient(ctx context.Context, depth units.Length, t units.Duration, reading units.Temperature) (units.HeatTransferCoefficient, error) {
	s, part, err := p.read(ctx, depth, t, reading)
	if err != nil {
		return units.HeatTransferCoefficient{}, err
	}
	if _, _, ok := p.Surface.Constants(); !ok {
		return units.HeatTransferCoefficient{}, &units.ArgumentError{Field: "surface condition", Value: p.Surface.String(), Accepted: "boundary.Constant(h, ambient), of which the ambient counts"}
	}
	with := func(h float64) float64 {
		trial := *s
		trial.coefficient = h
		return math.Abs(trial.fall(depth.SI(), t.SI()))
	}
	if most := with(math.Inf(1)); !(part < most) {
		return units.HeatTransferCoefficient{}, &UnidentifiedError{Wanted: coefficientName, Reason: "the largest coefficient moves the reading by " + units.KelvinDifference.Of(most).String() + ", and not by " + units.KelvinDifference.Of(part).String()}
	}
	spread, _, _ := s.groups(depth.SI(), t.SI())
	h, ok := rising(func(h float64) float64 { return with(h) / part }, math.Log(s.conduct/spread))
	if !ok {
		return units.HeatTransferCoefficient{}, notFound(coefficientName)
	}
	return units.WattPerSquareMetreKelvin.Of(h), nil
}

// FitDiffusivity finds the diffusivity from the temperature that a depth has at time t. The conductivity is known,
// or of no account where p.Surface is a boundary.Temperature; density and specific heat are of no account. There is one
// answer at most, because heat comes farther the larger the diffusivity is.
//
// It returns an [*UnidentifiedError] for a reading that does not depend on it and an [*units.ArgumentError] for a field
// that cannot be used.
func (p SemiInfinite) FitDiffusivity(ctx context.Context, depth units.Length, t units.Duration, reading units.Temperature) (units.Diffusivity, error) {
	s, part, err := p.read(ctx, depth, t, reading)
	if err != nil {
		return units.Diffusivity{}, err
	}
	if depth.SI() == 0 && math.IsInf(s.coefficient, 1) {
		return units.Diffusivity{}, &UnidentifiedError{Wanted: diffusivityName, Reason: "the temperature of the surface is prescribed"}
	}
	if s.kind == towardsAmbient && s.coefficient == 0 {
		return units.Diffusivity{}, &UnidentifiedError{Wanted: diffusivityName, Reason: "a coefficient of 0 leaves the body as it is"}
	}
	alpha, ok := rising(func(alpha float64) float64 {
		trial := *s
		trial.diffusivity = alpha
		return math.Abs(trial.fall(depth.SI(), t.SI())) / part
	}, math.Log(s.diffusivity))
	if !ok {
		return units.Diffusivity{}, notFound(diffusivityName)
	}
	return units.SquareMetrePerSecond.Of(alpha), nil
}

// read returns the solution and by how much the reading is away from the start, in K.
func (p SemiInfinite) read(ctx context.Context, depth units.Length, t units.Duration, reading units.Temperature) (*SemiInfiniteSolution, float64, error) {
	s, err := p.Solve(ctx)
	if err != nil {
		return nil, 0, err
	}
	for _, err := range []error{
		s.check(depth, t),
		units.CheckPositive("time", t),
		units.CheckTemperature("reading", reading),
	} {
		if err != nil {
			return nil, 0, err
		}
	}
	fall := p.Initial.SI() - reading.SI()
	if s.kind == towardsAmbient {
		if part := fall / s.excess; !(part > 0 && part < 1) {
			return nil, 0, &units.ArgumentError{Field: "reading", Value: reading, Accepted: "between the start of " + p.Initial.String() + " and the ambient of " + units.Kelvin.Of(s.ambient).String()}
		}
	} else if !(fall*s.flux > 0) {
		return nil, 0, &units.ArgumentError{Field: "reading", Value: reading, Accepted: "on the side of the start of " + p.Initial.String() + " to which the flux leads"}
	}
	return s, math.Abs(fall), nil
}

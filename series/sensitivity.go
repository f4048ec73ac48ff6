package series

import (
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Sensitivity is by how much the temperature of a place at a time changes with each input, to first order. For
// inputs that have a natural zero it is the change for a relative change of 1: a coefficient that is 1 % higher moves
// the temperature by a hundredth of Coefficient.
type Sensitivity struct {
	Coefficient  units.TemperatureDifference // h; 0 for a prescribed surface temperature
	Conductivity units.TemperatureDifference
	Density      units.TemperatureDifference
	SpecificHeat units.TemperatureDifference
	Size         units.TemperatureDifference // all measures of the body, and the depth of the place with them
	Depth        units.TemperatureDifference // the depth of a place below the surface alone, in the same body
	Time         units.TemperatureDifference
	Initial      float64 // of the start temperature, K/K
	Ambient      float64 // of the ambient or the surface temperature, K/K
}

// Sensitivity returns how the temperature of a place, or of [shape.Mean], at time t depends on each input, by the
// derivatives of the exact solution. The errors are those of [Solution.At]; besides, an [*units.ArgumentError] reports a
// constant flux, an ambient that goes with time, and what is solved as a wall: a hollow body, faces that differ, a
// profile and a source.
func (s *Solution) Sensitivity(place shape.Place, t units.Duration) (Sensitivity, error) {
	if err := s.plain(); err != nil {
		return Sensitivity{}, err
	}
	if err := s.check(t); err != nil {
		return Sensitivity{}, err
	}
	if place.IsMean() {
		return s.sensitivity(nil, s.Fourier(t)), nil
	}
	p, err := s.position(place)
	if err != nil {
		return Sensitivity{}, err
	}
	return s.sensitivity(&p, s.Fourier(t)), nil
}

// plain refuses a solution that is not a product of θ of bodies of one coordinate.
func (s *Solution) plain() error {
	if s.walled() {
		return &units.ArgumentError{Field: "problem", Value: s.problem.Body.String(), Accepted: "a solid body with one condition all round, a uniform start and no source"}
	}
	if err := s.check(units.Duration{}); err != nil {
		return err
	}
	return s.towardsOneTemperature()
}

// sensitivity differentiates the product of θ over the factors, at a position or of the mean for nil.
func (s *Solution) sensitivity(p *position, fo float64) Sensitivity {
	var each [len(s.factors)]slopes
	theta, depth := 1.0, 0.0
	for i := range s.count {
		f, at := &s.factors[i], spot{mean: p == nil}
		if p != nil {
			at.x = p[i]
		}
		each[i] = slopesOf(f.body.Family(), f.modes, at, fo*f.ratio)
		theta *= each[i].theta
	}
	if p != nil {
		depth = 1 - p[0]
	}
	biot, fourier := 0.0, 0.0
	for i := range s.count {
		rest := 1.0
		for j := range s.count {
			if j != i {
				rest *= each[j].theta
			}
		}
		biot += each[i].biot * rest
		fourier += each[i].fourier * rest
		each[i].place *= rest
	}
	change := func(x float64) units.TemperatureDifference { return units.KelvinDifference.Of(s.excess * x) }
	return Sensitivity{
		Coefficient:  change(biot),
		Conductivity: change(fourier - biot),
		Density:      change(-fourier),
		SpecificHeat: change(-fourier),
		Size:         change(biot - 2*fourier),
		Depth:        change(-depth * each[0].place),
		Time:         change(fourier),
		Initial:      theta,
		Ambient:      1 - theta,
	}
}

// A TimeSensitivity is by how much the time to a temperature changes with each input, to first order: for a relative
// change of 1 of those that have a natural zero, and for a rise by 1 K of the temperatures.
type TimeSensitivity struct {
	Time         units.Duration // to the temperature itself
	Coefficient  units.Duration // h; 0 for a prescribed surface temperature
	Conductivity units.Duration
	Density      units.Duration
	SpecificHeat units.Duration
	Size         units.Duration // all measures of the body, and the depth of the place with them
	Depth        units.Duration // the depth of a place below the surface alone, in the same body
	Initial      units.Duration // for a start that is 1 K higher
	Ambient      units.Duration // for an ambient that is 1 K higher
	Target       units.Duration // for a target that is 1 K higher
}

// TimeSensitivity returns how the time at which a place, or [shape.Mean], reaches the target depends on each input:
// the sensitivity of its temperature then over the rate at which that changes. The errors are those of
// [Solution.TimeTo]; besides, an [*units.ArgumentError] reports what [Solution.Sensitivity] refuses and a target that is
// met at the start, and a [*units.ConvergenceError] a target so near to the start or the ambient that no change is left to divide by.
func (s *Solution) TimeSensitivity(place shape.Place, target units.Temperature) (TimeSensitivity, error) {
	if err := s.plain(); err != nil {
		return TimeSensitivity{}, err
	}
	t, err := s.TimeTo(place, target)
	if err != nil {
		return TimeSensitivity{}, err
	}
	if t.SI() == 0 {
		return TimeSensitivity{}, &units.ArgumentError{Field: "target", Value: target, Accepted: "one that is not met at the start"}
	}
	var p *position
	if !place.IsMean() {
		where, err := s.whereTo(place)
		if err != nil {
			return TimeSensitivity{}, err
		}
		p = &where
	}
	T := s.sensitivity(p, s.Fourier(t))
	rate := T.Time.SI() / t.SI() // K/s
	later := func(kelvins float64) units.Duration { return units.Second.Of(-kelvins / rate) }
	if sound := later(1); !sound.IsFinite() || math.Abs(T.Time.SI()) < 1e-9*math.Abs(s.excess) {
		return TimeSensitivity{}, &units.ConvergenceError{
			Method: "sensitivity of the time to a temperature", Time: t, Place: place.String(),
			Reason: "the temperature hardly changes at " + target.String(),
		}
	}
	return TimeSensitivity{
		Time:         t,
		Coefficient:  later(T.Coefficient.SI()),
		Conductivity: later(T.Conductivity.SI()),
		Density:      later(T.Density.SI()),
		SpecificHeat: later(T.SpecificHeat.SI()),
		Size:         later(T.Size.SI()),
		Depth:        later(T.Depth.SI()),
		Initial:      later(T.Initial),
		Ambient:      later(T.Ambient),
		Target:       later(-1),
	}, nil
}

package lumped

import (
	"math"

	"example.com/coolward/internal/ode"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Solution is the temperature of the body over time. It does not change, and is safe for many
// goroutines. [Problem.Solve] makes one; the zero Solution answers with an [*units.ArgumentError].
type Solution struct {
	problem Problem
	solved  bool
	closed  bool // the closed form applies; else path holds the integration

	start  float64 // T0, K
	last   float64 // temperature at the end of the path, K
	end    float64 // s
	limit  float64 // what the body tends to, K; see findLimit
	excess float64 // T0 − limit of the closed form, K
	rate   float64 // −1/τ of the closed form, 1/s

	limitKnown bool  // limit is a temperature without exchange
	limitError error // why no limit could be found

	path         *ode.Solution
	linear       bool    // the state is the temperature
	low, high    float64 // range of the material, K
	enthalpy     float64 // at the start, J/kg
	specificHeat float64 // of the state, J/(kg K)
	capacity     float64 // ρ V times that, J/K
	length       float64 // V/A, m
	biot         Biot
	leastAt      float64 // where the conductivity is least, K
	span         float64 // temperature difference that the lumping error is a part of, K
}

// At returns the temperature at a place and time. All places of the body are at one temperature; the
// place must be one of it. It returns an [*units.ArgumentError] for a place that is not, and for a
// time below zero or beyond what was solved for.
func (s *Solution) At(place shape.Place, t units.Duration) (units.Temperature, error) {
	if err := s.checkPlace(place); err != nil {
		return units.Temperature{}, err
	}
	return s.at(t.SI())
}

// Mean returns the temperature of the body at time t, as At does.
func (s *Solution) Mean(t units.Duration) (units.Temperature, error) {
	if err := s.usable(); err != nil {
		return units.Temperature{}, err
	}
	return s.at(t.SI())
}

func (s *Solution) at(seconds float64) (units.Temperature, error) {
	if !(seconds >= 0 && seconds <= s.end) {
		return units.Temperature{}, s.refuse(seconds)
	}
	if s.closed {
		return units.Kelvin.Of(s.limit + s.excess*math.Exp(s.rate*seconds)), nil
	}
	y, _ := s.path.At(seconds)
	kelvin, err := s.temperature(y)
	if err != nil {
		return units.Temperature{}, err
	}
	return units.Kelvin.Of(kelvin), nil
}

// HeatReleased returns the heat that has left the body until time t, the change of its enthalpy; it is
// negative if the body has taken up heat. Errors are those of Mean.
func (s *Solution) HeatReleased(t units.Duration) (units.Energy, error) {
	if err := s.usable(); err != nil {
		return units.Energy{}, err
	}
	seconds := t.SI()
	if !(seconds >= 0 && seconds <= s.end) {
		return units.Energy{}, s.refuse(seconds)
	}
	var fall float64 // of the state, K
	if s.closed {
		fall = -s.excess * math.Expm1(s.rate*seconds)
	} else {
		y, _ := s.path.At(seconds)
		fall = s.start - y
	}
	heat := units.Joule.Of(s.capacity * fall)
	if err := units.CheckFinite("heat released", heat); err != nil {
		return units.Energy{}, err
	}
	return heat, nil
}

// IntegrationError returns an estimate of the largest temperature error of the integration, to be
// added to that of lumping; zero for the closed form. It is usually several times too large.
func (s *Solution) IntegrationError() units.TemperatureDifference {
	if s == nil || s.path == nil {
		return units.TemperatureDifference{}
	}
	return units.KelvinDifference.Of(s.path.Statistics().Error)
}

// usable returns an error for a Solution that Solve did not make.
func (s *Solution) usable() error {
	if s != nil && s.solved {
		return nil
	}
	return errNotSolved()
}

func errNotSolved() error {
	return &units.ArgumentError{Field: "lumped solution", Accepted: "one that Problem.Solve returned"}
}

// checkPlace returns an error for a place that is not in the body.
func (s *Solution) checkPlace(place shape.Place) error {
	if s != nil && s.solved && place.InEveryBody() {
		return nil
	}
	return s.searchPlace(place)
}

// searchPlace is the rest of checkPlace, apart so that the common case is in line.
func (s *Solution) searchPlace(place shape.Place) error {
	if s == nil || !s.solved {
		return errNotSolved()
	}
	_, err := place.Position(s.problem.Body)
	return err
}

// refuse returns the error for a time that was not solved for.
func (s *Solution) refuse(seconds float64) error {
	accepted := "0 s or later, finite"
	if !s.closed {
		accepted = "0 s to " + units.Second.Of(s.end).String()
	}
	return &units.ArgumentError{Field: "time", Value: units.Second.Of(seconds), Accepted: accepted}
}

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
	solved      bool
	exponential bool // the closed form T∞ + (T0 − T∞) exp(−t/τ), which has a way of its own for its speed

	limit  float64 // what the body tends to, K; see findLimit
	excess float64 // T0 − limit of the exponential, K
	rate   float64 // −1/τ of the exponential, 1/s
	end    float64 // s

	problem    Problem
	content    content
	exchange   exchange
	trajectory trajectory // one of the next two, or moving
	straight   straightforward
	integrated integrated

	start float64 // T0, K
	last  float64 // temperature at the end, K

	limitKnown bool  // limit is a temperature without exchange
	limitError error // why no limit could be found

	path    *ode.Solution // nil for a closed form
	moving  *moving       // nil but for the closed form under ambients that go with time
	inside  *inside       // nil unless the resistance inside counts
	length  float64       // V/A, m
	biot    Biot
	leastAt float64   // where the conductivity is least, K
	faces   *twoFaced // nil unless the faces differ
	span    float64   // temperature difference that the lumping error is a part of, K
}

// At returns the temperature at a place and time. All places of the body are at one temperature, unless
// [Problem.FirstOrder] was set; the place must be one of the body. It returns an [*units.ArgumentError] for a
// place that is not, and for a time below zero or beyond what was solved for.
func (s *Solution) At(place shape.Place, t units.Duration) (units.Temperature, error) {
	if s != nil && s.exponential && s.inside == nil && place.InEveryBody() {
		if seconds := t.SI(); seconds >= 0 && seconds <= s.end {
			return units.Kelvin.Of(s.limit + s.excess*math.Exp(s.rate*seconds)), nil
		}
	}
	if err := s.checkPlace(place); err != nil {
		return units.Temperature{}, err
	}
	return s.place(place, t.SI())
}

// Mean returns the temperature of the body at time t, as At does.
func (s *Solution) Mean(t units.Duration) (units.Temperature, error) {
	if err := s.usable(); err != nil {
		return units.Temperature{}, err
	}
	kelvin, err := s.mean(t.SI())
	return units.Kelvin.Of(kelvin), err
}

// place returns the temperature of a place of the body.
func (s *Solution) place(place shape.Place, seconds float64) (units.Temperature, error) {
	kelvin, err := s.mean(seconds)
	if err == nil && s.inside != nil && !place.IsMean() {
		var above float64
		above, err = s.above(place, seconds, kelvin)
		kelvin += above
		if err == nil {
			err = units.CheckTemperature("temperature of the "+place.String(), units.Kelvin.Of(kelvin))
		}
	}
	if err != nil {
		return units.Temperature{}, err
	}
	return units.Kelvin.Of(kelvin), nil
}

// mean returns the state of the body as a temperature in kelvin.
func (s *Solution) mean(seconds float64) (float64, error) {
	if !(seconds >= 0 && seconds <= s.end) {
		return 0, s.refuse(seconds)
	}
	if s.exponential {
		return s.limit + s.excess*math.Exp(s.rate*seconds), nil
	}
	y := s.start - s.trajectory.fall(seconds)
	if s.path == nil {
		return y, nil
	}
	return s.content.temperature(y)
}

// HeatReleased returns the heat that has left the body until time t: what its enthalpy has lost, and what was made
// inside. It is negative if the body has taken up heat. Errors are those of Mean.
func (s *Solution) HeatReleased(t units.Duration) (units.Energy, error) {
	if err := s.usable(); err != nil {
		return units.Energy{}, err
	}
	seconds := t.SI()
	if !(seconds >= 0 && seconds <= s.end) {
		return units.Energy{}, s.refuse(seconds)
	}
	heat := units.Joule.Of(s.content.capacity*s.trajectory.fall(seconds) + s.exchange.source*seconds)
	if err := units.CheckFinite("heat released", heat); err != nil {
		return units.Energy{}, err
	}
	return heat, nil
}

// IntegrationError returns an estimate of the largest temperature error of the integration, to be
// added to that of lumping; zero for a closed form. It is usually several times too large.
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
	if _, err := place.Position(s.problem.Body); err != nil {
		_, err = place.Depth(s.problem.Body)
		return err
	}
	return nil
}

// refuse returns the error for a time that was not solved for.
func (s *Solution) refuse(seconds float64) error {
	accepted := "0 s or later, finite"
	if s.end < math.MaxFloat64 {
		accepted = "0 s to " + units.Second.Of(s.end).String()
	}
	return &units.ArgumentError{Field: "time", Value: units.Second.Of(seconds), Accepted: accepted}
}

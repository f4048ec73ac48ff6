package lumped

import (
	"math"

	"example.com/coolward/units"
)

// TimeConstant returns the time constant at time t: the heat that warms the body by one kelvin over the power that leaves it
// for each kelvin more. It is the τ of the closed form where the coefficient is constant, for all t; else it holds for small
// changes about the temperature of that time. Of an exchange function the slope is found over a twentieth of a kelvin. Errors
// are those of Mean and of the exchange, and a [*units.ConvergenceError] where the exchange does not rise with the temperature.
func (s *Solution) TimeConstant(t units.Duration) (units.Duration, error) {
	if err := s.usable(); err != nil {
		return units.Duration{}, err
	}
	kelvin, err := s.mean(t.SI())
	if err != nil {
		return units.Duration{}, err
	}
	e := &s.exchange
	g := e.conductance(kelvin)
	if len(e.functions) > 0 || e.insulate != 0 && !e.linear() {
		const apart = 0.05
		low, err := e.out(t.SI(), kelvin-apart/2)
		if err != nil {
			return units.Duration{}, err
		}
		high, err := e.out(t.SI(), kelvin+apart/2)
		if err != nil {
			return units.Duration{}, err
		}
		g = (high - low) / apart
	} else {
		g *= e.damping()
	}
	perState, err := s.perState(t.SI())
	if err != nil {
		return units.Duration{}, err
	}
	tau := units.Second.Of(s.content.capacity / perState / g)
	if !(g > 0) || !tau.IsFinite() || math.IsInf(1/perState, 0) {
		return units.Duration{}, &units.ConvergenceError{Method: "time constant", Time: t, Reason: "there is none where the exchange does not rise with the temperature, or heat does not warm the body"}
	}
	return tau, nil
}

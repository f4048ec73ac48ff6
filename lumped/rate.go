package lumped

import "example.com/coolward/units"

// Rate returns how fast the temperature of the body changes at time t: negative while it cools. Errors are those of Mean and
// of the exchange.
func (s *Solution) Rate(t units.Duration) (units.TemperatureRate, error) {
	if err := s.usable(); err != nil {
		return units.TemperatureRate{}, err
	}
	rate, err := s.rateAt(t.SI())
	if err != nil {
		return units.TemperatureRate{}, err
	}
	r := units.KelvinPerSecond.Of(rate)
	return r, units.CheckFinite("rate", r)
}

func (s *Solution) rateAt(t float64) (float64, error) {
	kelvin, err := s.mean(t)
	if err != nil {
		return 0, err
	}
	out, err := s.exchange.out(t, kelvin)
	if err != nil {
		return 0, err
	}
	perState, err := s.perState(t)
	return (s.exchange.source - out) / s.content.capacity * perState, err
}

// perState returns dT/dy at time t: 1 where the specific heat is constant, 0 where heat melts the body and does not warm it.
func (s *Solution) perState(t float64) (float64, error) {
	if s.content.linear {
		return 1, nil
	}
	y := s.start - s.trajectory.fall(t)
	const apart = 1e-4 // K, over which a kink is drawn out
	low, errLow := s.content.temperature(y - apart)
	high, errHigh := s.content.temperature(y + apart)
	mid, err := s.content.temperature(y)
	switch {
	case err != nil:
		return 0, err
	case errLow != nil: // at an end of the range of the material
		return (high - mid) / apart, errHigh
	case errHigh != nil:
		return (mid - low) / apart, nil
	}
	return (high - low) / (2 * apart), nil
}

// RateCrossings returns every time at which the body changes its temperature at the given rate, in their order. At a step or a
// bend of the conditions the rate jumps; a rate between both is not passed there. Errors are those of Rate.
func (s *Solution) RateCrossings(rate units.TemperatureRate) ([]Crossing, error) {
	if err := s.usable(); err != nil {
		return nil, err
	}
	if err := units.CheckFinite("rate", rate); err != nil {
		return nil, err
	}
	return s.crossingsOf(func(t float64) (float64, error) {
		r, err := s.rateAt(t)
		return r - rate.SI(), err
	})
}

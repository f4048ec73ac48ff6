package lumped

import (
	"math"

	"example.com/coolward/units"
)

// prepareState finds out whether the state is the temperature itself, and chooses its specific heat:
// the least of the material, so that the error of y bounds that of the temperature, but not below a
// tenth of that at the start.
func (s *Solution) prepareState() error {
	m := s.problem.Material
	low, high := m.Range()
	s.low, s.high = low.SI(), high.SI()
	if says, ok := m.(interface{ IsConstant() bool }); ok && says.IsConstant() {
		s.linear = true
		return nil
	}
	if isFinite(s.low) && isFinite(s.high) {
		if constantBetween(m, s.low, s.high) {
			s.linear = true
			return nil
		}
		least := s.specificHeat
		err := sample(m, s.low, s.high, func(kelvin float64) error {
			if c, err := m.SpecificHeat(units.Kelvin.Of(kelvin)); err == nil {
				least = min(least, c.SI())
			}
			return nil
		})
		if err != nil {
			return err
		}
		least = max(least, s.specificHeat/10)
		s.capacity *= least / s.specificHeat
		s.specificHeat = least
	}
	h, err := m.Enthalpy(s.problem.Initial)
	if err != nil {
		return err
	}
	s.enthalpy = h.SI()
	return nil
}

// state returns y at a temperature.
func (s *Solution) state(t units.Temperature) (float64, error) {
	if s.linear {
		if k := t.SI(); k >= s.low && k <= s.high {
			return k, nil
		}
		_, err := s.problem.Material.SpecificHeat(t)
		return t.SI(), err
	}
	h, err := s.problem.Material.Enthalpy(t)
	if err != nil {
		return 0, err
	}
	return s.start + (h.SI()-s.enthalpy)/s.specificHeat, nil
}

// temperature returns the temperature in kelvin at y.
func (s *Solution) temperature(y float64) (float64, error) {
	if !s.linear {
		t, err := s.problem.Material.Temperature(units.JoulePerKilogram.Of(s.enthalpy + s.specificHeat*(y-s.start)))
		if err != nil {
			return 0, err
		}
		y = t.SI()
	} else if !(y >= s.low && y <= s.high) {
		if _, err := s.problem.Material.SpecificHeat(units.Kelvin.Of(y)); err != nil {
			return 0, err
		}
	}
	return y, units.CheckTemperature("temperature of the body", units.Kelvin.Of(y))
}

// derivative returns dy/dt = −q /(ρ c V/A).
func (s *Solution) derivative(t, y float64) (float64, error) {
	kelvin, err := s.temperature(y)
	if err != nil {
		return 0, err
	}
	q, err := s.problem.Surface.Flux(units.Second.Of(t), units.Kelvin.Of(kelvin))
	if err != nil {
		return 0, err
	}
	return -q.SI() / s.perFlux(), nil
}

// perFlux returns ρ c V/A, the heat per surface that changes y by one kelvin.
func (s *Solution) perFlux() float64 {
	return s.problem.Material.Density().SI() * s.specificHeat * s.length
}

func isFinite(x float64) bool { return math.Abs(x) <= math.MaxFloat64 }

package boundary

import (
	"math"

	"example.com/coolward/internal/physics"
	"example.com/coolward/units"
)

// Flux returns the heat flux that leaves the body at time t when its surface is at temperature wall. It
// returns the error of the exchange function or of a course, and an [*units.ArgumentError] if that function gives
// a flux that is not finite, if the temperature of the surface is stated, from which no flux follows, or
// if the condition is not usable.
func (c Condition) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if c.kind == function && c.exchange != nil {
		q, err := c.exchange(t, wall)
		if err != nil {
			return units.HeatFlux{}, err
		}
		if !q.IsFinite() {
			return units.HeatFlux{}, &units.ArgumentError{Field: "surface condition: flux of the exchange function at " + t.String() + " and " + wall.String(), Value: q, Accepted: "finite"}
		}
		return q, nil
	}
	q, err := c.flow(t, wall)
	if err != nil {
		return units.HeatFlux{}, err
	}
	if math.IsNaN(q) || math.IsInf(q, 0) || c.coefficient.SI() < 0 || c.number < 0 {
		if err := c.CheckExchange(); err != nil {
			return units.HeatFlux{}, err
		}
		return units.HeatFlux{}, &units.ArgumentError{Field: "surface condition: wall temperature", Value: wall, Accepted: "a temperature that gives a finite flux"}
	}
	return units.WattPerSquareMetre.Of(q), nil
}

// flow returns the flux in W/m²; what is not usable gives NaN or an error.
func (c Condition) flow(t units.Duration, wall units.Temperature) (float64, error) {
	switch c.kind {
	case constant:
		return c.coefficient.SI() * (wall.SI() - c.temperature.SI()), nil
	case following:
		ambient, err := c.course.At(t)
		return c.coefficient.SI() * (wall.SI() - ambient.SI()), err
	case power:
		d := wall.SI() - c.temperature.SI()
		return c.coefficient.SI() * math.Pow(math.Abs(d)/c.difference.SI(), c.number) * d, nil
	case radiation:
		T, s := wall.SI(), c.temperature.SI()
		return c.number * physics.StefanBoltzmann * (T*T + s*s) * (T + s) * (T - s), nil
	case flux:
		return c.flux.SI(), nil
	case sum:
		total := 0.0
		for _, part := range c.parts {
			q, err := part.Flux(t, wall)
			if err != nil {
				return 0, err
			}
			total += q.SI()
		}
		if len(c.parts) > 0 {
			return total, nil
		}
	}
	return math.NaN(), nil
}

// Slope returns the derivative of the flux to the temperature of the wall where c is stated by constants, and
// whether it is, with a finite derivative.
func (c Condition) Slope(wall units.Temperature) (slope units.HeatTransferCoefficient, ok bool) {
	s := math.NaN()
	switch c.kind {
	case constant, following:
		s = c.coefficient.SI()
	case power:
		s = c.coefficient.SI() * (1 + c.number) * math.Pow(math.Abs(wall.SI()-c.temperature.SI())/c.difference.SI(), c.number)
	case radiation:
		T := wall.SI()
		s = 4 * c.number * physics.StefanBoltzmann * T * T * T
	case flux:
		s = 0
	case sum:
		total := 0.0
		for _, part := range c.parts {
			p, ok := part.Slope(wall)
			if !ok {
				return units.HeatTransferCoefficient{}, false
			}
			total += p.SI()
		}
		if len(c.parts) > 0 {
			s = total
		}
	}
	if math.IsNaN(s) || math.IsInf(s, 0) {
		return units.HeatTransferCoefficient{}, false
	}
	return units.WattPerSquareMetreKelvin.Of(s), true
}

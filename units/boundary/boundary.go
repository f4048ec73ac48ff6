// Package boundary states what happens at the surface of a body, in exactly one of two ways: by
// constants, from which closed forms follow, or by an exchange function, of which a solver knows
// nothing.
package boundary

import "example.com/coolward/units"

// An Exchange gives the heat flux that leaves a body at time t when its surface is at temperature
// wall. It is positive outwards. A solver calls it from one goroutine at a time.
type Exchange = func(t units.Duration, wall units.Temperature) (units.HeatFlux, error)

// A Condition is what happens at a surface. Make one with [Constant], [Temperature], [Flux] or
// [Function]; the zero Condition is refused wherever one is needed.
type Condition struct {
	kind        kind
	coefficient units.HeatTransferCoefficient
	temperature units.Temperature // of the ambient, or of the surface
	flux        units.HeatFlux
	exchange    Exchange
}

type kind uint8

const (
	none kind = iota
	constant
	temperature
	flux
	function
)

// Constant returns the condition q = h (T − ambient) with a constant coefficient h, 0 or above, and
// a constant ambient temperature.
func Constant(h units.HeatTransferCoefficient, ambient units.Temperature) Condition {
	return Condition{kind: constant, coefficient: h, temperature: ambient}
}

// Temperature returns the condition that the surface is at a constant temperature from time 0 on, the
// limit of [Constant] for a large coefficient.
func Temperature(surface units.Temperature) Condition {
	return Condition{kind: temperature, temperature: surface}
}

// Flux returns the condition that a constant heat flux q leaves the body; one that enters is negative.
func Flux(q units.HeatFlux) Condition { return Condition{kind: flux, flux: q} }

// Function returns the condition that q is whatever f gives.
func Function(f Exchange) Condition { return Condition{kind: function, exchange: f} }

// Check returns an [*units.ArgumentError] if c is the zero Condition, if its function is nil, or if
// one of its constants cannot be.
func (c Condition) Check() error {
	switch c.kind {
	case constant:
		if err := units.CheckNotNegative("surface condition: heat transfer coefficient", c.coefficient); err != nil {
			return err
		}
		return units.CheckTemperature("surface condition: ambient", c.temperature)
	case temperature:
		return units.CheckTemperature("surface condition: temperature", c.temperature)
	case flux:
		return units.CheckFinite("surface condition: heat flux", c.flux)
	}
	if c.exchange == nil {
		return &units.ArgumentError{Field: "surface condition", Accepted: "boundary.Constant(h, ambient), Temperature(T), Flux(q), or Function(f) with a function"}
	}
	return nil
}

// CheckExchange is [Condition.Check] for a solver that knows no other conditions than [Constant] and
// [Function].
func (c Condition) CheckExchange() error {
	if c.kind == temperature || c.kind == flux {
		return &units.ArgumentError{Field: "surface condition", Value: c.String(), Accepted: "boundary.Constant(h, ambient) or boundary.Function(f)"}
	}
	return c.Check()
}

// Constants returns the coefficient and the ambient temperature, and whether c states them.
func (c Condition) Constants() (h units.HeatTransferCoefficient, ambient units.Temperature, ok bool) {
	if c.kind != constant {
		return units.HeatTransferCoefficient{}, units.Temperature{}, false
	}
	return c.coefficient, c.temperature, true
}

// SurfaceTemperature returns the temperature of the surface, and whether c states it.
func (c Condition) SurfaceTemperature() (surface units.Temperature, ok bool) {
	if c.kind != temperature {
		return units.Temperature{}, false
	}
	return c.temperature, true
}

// ConstantFlux returns the heat flux that leaves the body, and whether c states it.
func (c Condition) ConstantFlux() (q units.HeatFlux, ok bool) { return c.flux, c.kind == flux }

// Flux returns the heat flux that leaves the body. It returns the error of the exchange function,
// and an [*units.ArgumentError] if that function gives a flux that is not finite, if the temperature of
// the surface is stated, from which no flux follows, or if the condition is not usable.
func (c Condition) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	switch c.kind {
	case constant, flux:
		q := c.flux
		if c.kind == constant {
			q = units.WattPerSquareMetre.Of(c.coefficient.SI() * (wall.SI() - c.temperature.SI()))
		}
		if q.IsFinite() && (c.kind == flux || c.coefficient.SI() >= 0) {
			return q, nil
		}
		if err := c.Check(); err != nil {
			return units.HeatFlux{}, err
		}
		return units.HeatFlux{}, &units.ArgumentError{Field: "surface condition: wall temperature", Value: wall, Accepted: "a temperature that gives a finite flux"}
	case temperature:
		return units.HeatFlux{}, c.CheckExchange()
	}
	if c.exchange == nil {
		return units.HeatFlux{}, c.Check()
	}
	q, err := c.exchange(t, wall)
	if err != nil {
		return units.HeatFlux{}, err
	}
	if !q.IsFinite() {
		return units.HeatFlux{}, &units.ArgumentError{Field: "surface condition: flux of the exchange function at " + t.String() + " and " + wall.String(), Value: q, Accepted: "finite"}
	}
	return q, nil
}

// String says what the condition is, such as "heat transfer coefficient 20 W/(m²·K), ambient 20 °C".
func (c Condition) String() string {
	switch c.kind {
	case constant:
		return "heat transfer coefficient " + c.coefficient.String() + ", ambient " + c.temperature.String()
	case temperature:
		return "surface temperature " + c.temperature.String()
	case flux:
		return "heat flux " + c.flux.String()
	case function:
		return "exchange function"
	}
	return "no surface condition"
}

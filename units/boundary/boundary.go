// Package boundary states what happens at the surface of a body, in exactly one of two ways: by
// constants, from which closed forms follow, or by an exchange function, of which a solver knows
// nothing.
package boundary

import "example.com/coolward/units"

// An Exchange gives the heat flux that leaves a body at time t when its surface is at temperature
// wall. It is positive outwards. A solver calls it from one goroutine at a time.
type Exchange = func(t units.Duration, wall units.Temperature) (units.HeatFlux, error)

// A Condition is what happens at a surface. Make one with [Constant] or [Function]; the zero
// Condition is refused wherever one is needed.
type Condition struct {
	constant    bool
	coefficient units.HeatTransferCoefficient
	ambient     units.Temperature
	exchange    Exchange
}

// Constant returns the condition q = h (T − ambient) with a constant coefficient h, 0 or above, and
// a constant ambient temperature.
func Constant(h units.HeatTransferCoefficient, ambient units.Temperature) Condition {
	return Condition{constant: true, coefficient: h, ambient: ambient}
}

// Function returns the condition that q is whatever f gives.
func Function(f Exchange) Condition { return Condition{exchange: f} }

// Check returns an [*units.ArgumentError] if c is the zero Condition, if its function is nil, or if
// one of its constants cannot be.
func (c Condition) Check() error {
	if !c.constant {
		if c.exchange == nil {
			return &units.ArgumentError{Field: "surface condition", Accepted: "boundary.Constant(h, ambient) or boundary.Function(f) with a function"}
		}
		return nil
	}
	if err := units.CheckNotNegative("surface condition: heat transfer coefficient", c.coefficient); err != nil {
		return err
	}
	return units.CheckTemperature("surface condition: ambient", c.ambient)
}

// Constants returns the coefficient and the ambient temperature, and whether c states them.
func (c Condition) Constants() (h units.HeatTransferCoefficient, ambient units.Temperature, ok bool) {
	return c.coefficient, c.ambient, c.constant
}

// Flux returns the heat flux that leaves the body. It returns the error of the exchange function,
// and an [*units.ArgumentError] if that function gives a flux that is not finite or if the condition
// is not usable.
func (c Condition) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if c.constant {
		return units.WattPerSquareMetre.Of(c.coefficient.SI() * (wall.SI() - c.ambient.SI())), nil
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

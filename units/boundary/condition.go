package boundary

import "example.com/coolward/units"

// An Exchange gives the heat flux that leaves a body at time t when its surface is at temperature
// wall. It is positive outwards. A solver calls it from one goroutine at a time.
type Exchange = func(t units.Duration, wall units.Temperature) (units.HeatFlux, error)

// A Condition is what happens at a surface. Make one with [Constant], [Following], [Power], [Radiation],
// [Flux], [Sum], [Temperature], [TemperatureFollowing] or [Function]; the zero Condition is refused
// wherever one is needed.
type Condition struct {
	kind        kind
	coefficient units.HeatTransferCoefficient
	temperature units.Temperature           // of the ambient, the surroundings or the surface
	difference  units.TemperatureDifference // at which the coefficient of a power law holds
	number      float64                     // exponent or emissivity
	flux        units.HeatFlux
	course      *Course // not nil for the kinds that have one
	parts       []Condition
	exchange    Exchange
}

type kind uint8

const (
	none kind = iota
	constant
	following
	power
	radiation
	flux
	sum
	temperature
	temperatureFollowing
	function
)

// Constant returns the condition q = h (T − ambient) with a constant coefficient h, 0 or above, and
// a constant ambient temperature.
func Constant(h units.HeatTransferCoefficient, ambient units.Temperature) Condition {
	return Condition{kind: constant, coefficient: h, temperature: ambient}
}

// Following returns the condition q = h (T − ambient(t)) with a constant coefficient h, 0 or above, and
// an ambient temperature that goes with time.
func Following(h units.HeatTransferCoefficient, ambient Course) Condition {
	return Condition{kind: following, coefficient: h, course: &ambient}
}

// Power returns the condition q = h (|T − ambient|/at)^exponent (T − ambient): h is the coefficient at
// the temperature difference at, which must be above 0, and the exponent is 0 to 10. Natural convection
// has an exponent of about 1/4 where the flow is laminar and 1/3 where it is turbulent.
func Power(h units.HeatTransferCoefficient, at units.TemperatureDifference, exponent float64, ambient units.Temperature) Condition {
	return Condition{kind: power, coefficient: h, difference: at, number: exponent, temperature: ambient}
}

// Radiation returns the condition q = ε σ (T⁴ − surroundings⁴), the exchange of a grey body with large
// surroundings: emissivity ε from 0 to 1, and σ of CODATA 2018.
func Radiation(emissivity float64, surroundings units.Temperature) Condition {
	return Condition{kind: radiation, number: emissivity, temperature: surroundings}
}

// Flux returns the condition that a constant heat flux q leaves the body; one that enters is negative.
func Flux(q units.HeatFlux) Condition { return Condition{kind: flux, flux: q} }

// Sum returns the condition under which the fluxes of all the given ones add up, none of which may state the
// temperature of the surface.
func Sum(conditions ...Condition) Condition {
	c := Condition{kind: sum}
	for _, part := range conditions {
		if part.kind == sum {
			c.parts = append(c.parts, part.parts...)
		} else {
			c.parts = append(c.parts, part)
		}
	}
	return c
}

// Temperature returns the condition that the surface is at a constant temperature from time 0 on, the
// limit of [Constant] for a large coefficient.
func Temperature(surface units.Temperature) Condition {
	return Condition{kind: temperature, temperature: surface}
}

// TemperatureFollowing returns the condition that the surface is at a temperature that goes with time.
func TemperatureFollowing(surface Course) Condition {
	return Condition{kind: temperatureFollowing, course: &surface}
}

// Function returns the condition that q is whatever f gives.
func Function(f Exchange) Condition { return Condition{kind: function, exchange: f} }

// Check returns an [*units.ArgumentError] if c is the zero Condition, if its function is nil, or if
// one of its constants cannot be.
func (c Condition) Check() error {
	switch c.kind {
	case constant:
		return first(checkCoefficient(c.coefficient), units.CheckTemperature("surface condition: ambient", c.temperature))
	case following:
		return first(checkCoefficient(c.coefficient), c.course.Check())
	case power:
		return first(
			checkCoefficient(c.coefficient),
			units.CheckPositive("surface condition: temperature difference", c.difference),
			units.CheckNumber("surface condition: exponent", c.number, 0, 10),
			units.CheckTemperature("surface condition: ambient", c.temperature),
		)
	case radiation:
		return first(
			units.CheckNumber("surface condition: emissivity", c.number, 0, 1),
			units.CheckTemperature("surface condition: surroundings", c.temperature),
		)
	case flux:
		return units.CheckFinite("surface condition: heat flux", c.flux)
	case sum:
		if len(c.parts) == 0 {
			return &units.ArgumentError{Field: "surface condition: sum", Value: "of nothing", Accepted: "one condition or more"}
		}
		for _, part := range c.parts {
			if err := part.CheckExchange(); err != nil {
				return err
			}
		}
		return nil
	case temperature:
		return units.CheckTemperature("surface condition: temperature", c.temperature)
	case temperatureFollowing:
		return c.course.Check()
	}
	if c.exchange == nil {
		return &units.ArgumentError{Field: "surface condition", Accepted: "one made by a constructor of package boundary, such as boundary.Constant(h, ambient) or boundary.Function(f) with a function"}
	}
	return nil
}

func checkCoefficient(h units.HeatTransferCoefficient) error {
	return units.CheckNotNegative("surface condition: heat transfer coefficient", h)
}

// first returns the first error.
func first(errs ...error) error {
	for _, err := range errs {
		if err != nil {
			return err
		}
	}
	return nil
}

// CheckExchange is [Condition.Check] for where a heat flux must follow from the condition: it refuses one
// that states the temperature of the surface.
func (c Condition) CheckExchange() error {
	if c.kind == temperature || c.kind == temperatureFollowing {
		return &units.ArgumentError{Field: "surface condition", Value: c.String(), Accepted: "one from which a heat flux follows, such as boundary.Constant(h, ambient) or boundary.Function(f)"}
	}
	return c.Check()
}

// String says what the condition is, such as "heat transfer coefficient 20 W/(m²·K), ambient 20 °C".
func (c Condition) String() string {
	switch c.kind {
	case constant:
		return "heat transfer coefficient " + c.coefficient.String() + ", ambient " + c.temperature.String()
	case following:
		return "heat transfer coefficient " + c.coefficient.String() + ", ambient " + c.course.String()
	case power:
		return "heat transfer coefficient " + c.coefficient.String() + " at a difference of " + c.difference.String() +
			", with its power " + number(c.number) + ", ambient " + c.temperature.String()
	case radiation:
		return "radiation, emissivity " + number(c.number) + ", surroundings " + c.temperature.String()
	case flux:
		return "heat flux " + c.flux.String()
	case sum:
		text := "no surface condition"
		for i, part := range c.parts {
			if i == 0 {
				text = part.String()
			} else {
				text += "; " + part.String()
			}
		}
		return text
	case temperature:
		return "surface temperature " + c.temperature.String()
	case temperatureFollowing:
		return "surface temperature " + c.course.String()
	case function:
		return "exchange function"
	}
	return "no surface condition"
}

package boundary

import (
	"strconv"

	"example.com/coolward/units"
)

// IsZero reports whether c is the zero Condition, which states nothing.
func (c Condition) IsZero() bool { return c.kind == none }

// ByConstants reports whether c is stated by constants alone, so that [Condition.Slope] is exact.
func (c Condition) ByConstants() bool {
	if c.kind == sum {
		for _, part := range c.parts {
			if !part.ByConstants() {
				return false
			}
		}
		return len(c.parts) > 0
	}
	return c.kind != none && c.kind != function
}

// Constants returns the constants of [Constant], and whether c is one.
func (c Condition) Constants() (h units.HeatTransferCoefficient, ambient units.Temperature, ok bool) {
	if c.kind != constant {
		return units.HeatTransferCoefficient{}, units.Temperature{}, false
	}
	return c.coefficient, c.temperature, true
}

// Following returns the constants of [Following], and whether c is one.
func (c Condition) Following() (h units.HeatTransferCoefficient, ambient Course, ok bool) {
	if c.kind != following {
		return units.HeatTransferCoefficient{}, Course{}, false
	}
	return c.coefficient, *c.course, true
}

// Power returns the constants of [Power], and whether c is one.
func (c Condition) Power() (h units.HeatTransferCoefficient, at units.TemperatureDifference, exponent float64, ambient units.Temperature, ok bool) {
	if c.kind != power {
		return units.HeatTransferCoefficient{}, units.TemperatureDifference{}, 0, units.Temperature{}, false
	}
	return c.coefficient, c.difference, c.number, c.temperature, true
}

// Radiation returns the constants of [Radiation], and whether c is one.
func (c Condition) Radiation() (emissivity float64, surroundings units.Temperature, ok bool) {
	if c.kind != radiation {
		return 0, units.Temperature{}, false
	}
	return c.number, c.temperature, true
}

// ConstantFlux returns the heat flux that leaves the body, and whether c states it.
func (c Condition) ConstantFlux() (q units.HeatFlux, ok bool) { return c.flux, c.kind == flux }

// Parts returns the conditions that c is the sum of: itself, unless it was made by [Sum].
func (c Condition) Parts() []Condition {
	if c.kind == sum {
		return append([]Condition(nil), c.parts...)
	}
	return []Condition{c}
}

// Courses returns the courses of c and of its parts, those of [Following] and of [TemperatureFollowing].
func (c Condition) Courses() []Course {
	switch c.kind {
	case following, temperatureFollowing:
		return []Course{*c.course}
	case sum:
		var all []Course
		for _, part := range c.parts {
			all = append(all, part.Courses()...)
		}
		return all
	}
	return nil
}

// Moves reports whether c goes with time by a course that is not steady.
func (c Condition) Moves() bool {
	for _, course := range c.Courses() {
		if _, steady := course.Steady(); !steady {
			return true
		}
	}
	return false
}

// SurfaceTemperature returns the constant temperature of the surface, and whether c states it.
func (c Condition) SurfaceTemperature() (surface units.Temperature, ok bool) {
	if c.kind != temperature {
		return units.Temperature{}, false
	}
	return c.temperature, true
}

// SurfaceCourse returns the temperature of the surface over time, and whether c states it: by [Temperature] or by
// [TemperatureFollowing].
func (c Condition) SurfaceCourse() (surface Course, ok bool) {
	switch c.kind {
	case temperature:
		return Steady(c.temperature), true
	case temperatureFollowing:
		return *c.course, true
	}
	return Course{}, false
}

// Rest returns the temperature at which no heat flows, for all time, and whether c states one: the ambient,
// the surroundings or the temperature of the surface. Without an exchange, at a coefficient or an emissivity
// of 0, there is none.
func (c Condition) Rest() (at units.Temperature, ok bool) {
	switch c.kind {
	case constant, power:
		return c.temperature, c.coefficient.SI() > 0
	case radiation:
		return c.temperature, c.number > 0
	case temperature:
		return c.temperature, true
	}
	return units.Temperature{}, false
}

func number(x float64) string { return strconv.FormatFloat(x, 'g', 4, 64) }

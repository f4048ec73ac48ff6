package units

import (
	"cmp"
	"math"
)

// A Temperature is a point on the thermodynamic scale, kept in kelvin. Two temperatures do not add;
// their difference is a [TemperatureDifference]. The zero value is absolute zero, which every
// function that needs a temperature refuses, so that a forgotten one is found.
type Temperature struct{ kelvin float64 }

// A Scale is a temperature scale. Scales are constants.
type Scale uint8

// The temperature scales. T/K = t/°C + 273.15 = (t/°F + 459.67)·5/9 = (T/°R)·5/9, exact by definition
// (SI Brochure, 9th ed., 2.3.1; NIST SP 811, B.8, from memory).
const (
	Kelvin     Scale = iota // K
	Celsius                 // °C
	Fahrenheit              // °F
	Rankine                 // °R
)

var scaleSymbols = [...]string{Kelvin: "K", Celsius: "°C", Fahrenheit: "°F", Rankine: "°R"}

// String returns the symbol of the scale.
func (s Scale) String() string {
	if int(s) < len(scaleSymbols) {
		return scaleSymbols[s]
	}
	return "unknown scale"
}

// Of returns the temperature v on the scale. On a scale that does not exist it is NaN.
func (s Scale) Of(v float64) Temperature {
	switch s {
	case Kelvin:
		return Temperature{v}
	case Celsius:
		return Temperature{v + 273.15}
	case Fahrenheit:
		return Temperature{(v + 459.67) / 1.8}
	case Rankine:
		return Temperature{v / 1.8}
	}
	return Temperature{math.NaN()}
}

// In returns the number on scale s. On a scale that does not exist it is NaN.
func (t Temperature) In(s Scale) float64 {
	switch s {
	case Kelvin:
		return t.kelvin
	case Celsius:
		return t.kelvin - 273.15
	case Fahrenheit:
		return t.kelvin*1.8 - 459.67
	case Rankine:
		return t.kelvin * 1.8
	}
	return math.NaN()
}

// SI returns the number of kelvins above absolute zero.
func (t Temperature) SI() float64 { return t.kelvin }

// Add returns the temperature that lies d above t.
func (t Temperature) Add(d TemperatureDifference) Temperature { return Temperature{t.kelvin + d.si} }

// Sub returns the difference t − u.
func (t Temperature) Sub(u Temperature) TemperatureDifference {
	return TemperatureDifference{si: t.kelvin - u.kelvin}
}

// Compare returns -1, 0 or +1 as t is below, equal to or above u. A NaN is below every number.
func (t Temperature) Compare(u Temperature) int { return cmp.Compare(t.kelvin, u.kelvin) }

// Equal reports whether t and u are the same number. It is ==, in the form that go-cmp looks for.
func (t Temperature) Equal(u Temperature) bool { return t.kelvin == u.kelvin }

// IsFinite reports whether t is neither infinite nor NaN.
func (t Temperature) IsFinite() bool { return isFinite(t.kelvin) }

// MeanTemperature returns the mean of the temperatures, such as the film temperature of a wall and
// a stream. The mean of none is NaN.
func MeanTemperature(ts ...Temperature) Temperature {
	var sum float64
	for _, t := range ts {
		sum += t.kelvin
	}
	return Temperature{sum / float64(len(ts))}
}

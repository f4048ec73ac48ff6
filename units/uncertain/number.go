package uncertain

import (
	"encoding"
	"strconv"

	"example.com/coolward/units"
)

// A Number is a number of dimension 1 as an input or an answer: a factor, an emissivity, a concentration
// ratio. float64(n) is its value.
type Number float64

// SI returns n.
func (n Number) SI() float64 { return float64(n) }

// Add returns n + m.
func (n Number) Add(m Number) Number { return n + m }

// Sub returns n − m.
func (n Number) Sub(m Number) Number { return n - m }

// Scale returns f n.
func (n Number) Scale(f float64) Number { return Number(f * float64(n)) }

// Dynamic returns n as a [units.Value].
func (n Number) Dynamic() units.Value { return units.Number(float64(n)) }

// String writes n with six significant digits.
func (n Number) String() string { return strconv.FormatFloat(float64(n), 'g', 6, 64) }

// A Point is what can be uncertain: every quantity of package units, a temperature, and a [Number].
// S is the type of its differences, which a standard uncertainty has: for a temperature a temperature
// difference, and for all others the type Q itself.
type Point[Q, S any] interface {
	SI() float64
	Add(difference S) Q
	Sub(other Q) S
	Dynamic() units.Value
}

// A Difference is the difference of two points.
type Difference[S any] interface {
	SI() float64
	Add(other S) S
	Scale(factor float64) S
	Dynamic() units.Value
}

// A Scalable is a point with a zero of its own, so that per cent and factors of it mean something:
// every quantity and a [Number], and no temperature.
type Scalable[Q any] interface {
	Point[Q, Q]
	Scale(factor float64) Q
}

// builder returns the function that makes a Q from its number in the coherent SI unit, and nil for a
// type that is none of those that [Point] lists.
func builder[Q Point[Q, S], S Difference[S]]() func(float64) Q {
	one := unit[S]()
	if one.SI() != 1 {
		return nil
	}
	var zero Q
	return func(x float64) Q { return zero.Add(one.Scale(x)) }
}

// unit returns one of the coherent SI unit of S. No constructor of package units is generic over the kinds,
// but their texts are: zero is written "0 m", and "1 m" is read as exactly one.
func unit[S Difference[S]]() S {
	var one S
	switch pointer := any(&one).(type) {
	case *Number:
		*pointer = 1
	case interface {
		encoding.TextMarshaler
		encoding.TextUnmarshaler
	}:
		if text, err := pointer.MarshalText(); err == nil && len(text) > 0 {
			text[0] = '1'
			if pointer.UnmarshalText(text) != nil {
				var zero S
				return zero
			}
		}
	}
	return one
}

// unknownKind is the fault of a type that is no [Point].
func unknownKind(field string) error {
	return &units.ArgumentError{Field: field, Accepted: "a quantity or a temperature of package units, or an uncertain.Number"}
}

// Package reject must not compile: every line marked "want" is a mistake that the compiler has to catch.
package reject

import "example.com/coolward/units"

var (
	length   = units.Millimetre.Of(50)
	duration = units.Second.Of(2)
	hot      = units.Celsius.Of(180)
	cold     = units.Celsius.Of(20)
	rise     = units.KelvinDifference.Of(5)

	_ units.Length                = 50                               // want "cannot use 50"
	_ units.Length                = 50 * units.Millimetre            // want "cannot use 50"
	_                             = length.Add(5)                    // want "cannot use 5"
	_ units.Length                = duration                         // want "cannot use duration"
	_                             = length.Add(duration)             // want "cannot use duration"
	_                             = units.Length(duration)           // want "cannot convert duration"
	_                             = length.In(units.Second)          // want "cannot use units.Second"
	_ units.Length                = units.AreaOf(length, length)     // want "cannot use units.AreaOf"
	_                             = length * length                  // want "operator . not defined on length"
	_                             = length + length                  // want "operator . not defined on length"
	_                             = length < length                  // want "operator < not defined"
	_                             = hot.Add(cold)                    // want "cannot use cold"
	_                             = hot + cold                       // want "operator . not defined on hot"
	_ units.TemperatureDifference = hot                              // want "cannot use hot"
	_ units.Temperature           = rise                             // want "cannot use rise"
	_                             = units.Temperature(rise)          // want "cannot convert rise"
	_                             = units.TemperatureDifference(hot) // want "cannot convert hot"
	_                             = rise.Add(hot)                    // want "cannot use hot"
	_                             = hot.Sub(rise)                    // want "cannot use rise"
	_                             = hot.Scale(2)                     // want "hot.Scale undefined"
	_                             = length == duration               // want "mismatched types"
	_                             = units.Length{5}                  // want "implicit assignment to unexported field"
	_ units.Quantity[kelvins]                                        // want "kelvins does not satisfy units.Dimension"
)

type kelvins struct{}

func init() { units.Metre = 2 } // want "cannot assign to"

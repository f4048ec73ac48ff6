// Package units has the quantities of heat transfer as types that the compiler checks.
//
//	d := units.Millimetre.Of(60)      // a Length
//	d.In(units.Inch)                  // 2.362…
//	hot := units.Celsius.Of(180)      // a Temperature, a point on a scale
//	hot.In(units.Fahrenheit)          // 356
//	rise := hot.Sub(units.Celsius.Of(20))            // a TemperatureDifference, 160 K
//	T, err := units.Parse[units.Temperature]("356 °F")
//
// A quantity is made from a number and a unit, and a number leaves it only with a unit named. The
// compiler rejects a bare number where a quantity is due, a length where a duration is due, a product
// of lengths as a length, the sum of two temperatures, and a temperature where a difference is due.
// Products that change the kind are functions with concrete types, such as [AreaOf] and [TimeConstantOf].
// Dimensionless groups are plain float64.
//
// A quantity is one float64 in the coherent SI unit, and its arithmetic costs what float64 costs.
// Units are constants. Going in and out of a unit rounds twice: 1.1 mm is 0.0011000000000000001 m, and
// (20.01 °C).In(Celsius) is 20.01 only to 3e-14. Compare with a tolerance, and print 15 digits at most.
//
// [Value] carries a number whose kind is known only at run time. The error types of the whole module
// live here: [ArgumentError], [RangeError], [NeverError], [HorizonError], [ConvergenceError],
// [SyntaxError] and [DimensionError]; one errors.As serves every package.
//
// Plain Btu and cal are those of the International Table; the thermochemical ones are named so.
package units

// Package unitstest compares quantities in tests.
//
// Assertions take the wanted value, the value under test and how far apart they may be:
//
//	unitstest.Within(t, units.Minute.Of(51.1), got, units.Minute.Of(0.5))
//	unitstest.WithinRelative(t, units.WattPerMetreKelvin.Of(0.0263), state.Conductivity, 0.02)
//	unitstest.TemperatureWithin(t, units.Celsius.Of(50), T, units.KelvinDifference.Of(0.01))
//
// A failure shows both values in a readable unit, the difference as a difference, and the tolerance. For
// structures that hold quantities there are options for go-cmp: [Absolute], [Relative], [ULP] and
// [Temperatures].
package unitstest

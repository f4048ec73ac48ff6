// Package boundary states what happens at the surface of a body, in exactly one of two ways: by
// constants, from which closed forms follow, or by an exchange function, of which a solver knows
// nothing.
//
//	still := boundary.Sum(
//		boundary.Power(units.WattPerSquareMetreKelvin.Of(6), units.KelvinDifference.Of(50), 0.25, room),
//		boundary.Radiation(0.9, room),
//	)
//
// An ambient that goes with time is a [Course]: a ramp, an oscillation, or a log of readings.
package boundary

package correlations

import (
	"math"

	"example.com/coolward/units"
)

// YawedRe returns the Reynolds number for the correlations of a cylinder across a stream where the stream, at the Reynolds number
// re of its whole speed, is at the angle yaw to the plane across the axis,
//
//	Re cos(yaw)
//
// for a yaw from 0°, which is across, to 60°. The part of the stream along the axis of a long cylinder does nothing to the flow
// across it, which is exact where that is laminar: W. R. Sears, The boundary layer of yawed cylinders, J. Aeronaut. Sci. 15 (1948)
// 49-52 (from memory). It returns an [*units.ArgumentError] for a Reynolds number that is not finite and 0 or above, and
// a [*units.RangeError] for a yaw outside.
func YawedRe(re float64, yaw units.Angle) (float64, error) {
	if !(re >= 0 && re <= math.MaxFloat64) {
		return 0, &units.ArgumentError{Field: "Reynolds number", Value: units.Number(re), Accepted: "finite, 0 or above"}
	}
	if !(yaw.SI() >= 0 && yaw.In(units.Degree) <= 60*(1+1e-12)) {
		return 0, &units.RangeError{Model: "yawed cylinder", Quantity: "yaw", Value: yaw.Dynamic(), Min: units.Degree.Of(0).Dynamic(), Max: units.Degree.Of(60).Dynamic(), Source: "W. R. Sears, J. Aeronaut. Sci. 15 (1948) 49-52 (from memory)"}
	}
	return re * math.Cos(yaw.SI()), nil
}

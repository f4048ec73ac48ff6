package shape

import (
	"gonum.org/v1/gonum/interp"

	"example.com/coolward/units"
)

// A Profile is a temperature over the depth below the surface of a body of one coordinate. It is asked for
// depths from 0 to the thickness of the body, from several goroutines, and must give the same each time.
type Profile = func(depth units.Length) (units.Temperature, error)

// TabulatedProfile returns the profile that is straight between the given depths, which rise, with a
// temperature at each. It copies them. It returns an [*units.ArgumentError] for fewer than two, for depths that do not
// rise and for what is no temperature. The profile gives a [*units.RangeError] for a depth outside the table.
func TabulatedProfile(depths []units.Length, temperatures []units.Temperature) (Profile, error) {
	if len(depths) < 2 || len(depths) != len(temperatures) {
		return nil, &units.ArgumentError{Field: "depths of the profile", Value: len(depths), Accepted: "two or more, and as many temperatures"}
	}
	x, y := make([]float64, len(depths)), make([]float64, len(depths))
	for i, d := range depths {
		if err := units.CheckNotNegative("depth of the profile", d); err != nil {
			return nil, err
		}
		if err := units.CheckTemperature("temperature of the profile", temperatures[i]); err != nil {
			return nil, err
		}
		if x[i], y[i] = d.SI(), temperatures[i].SI(); i > 0 && !(x[i] > x[i-1]) {
			return nil, &units.ArgumentError{Field: "depth of the profile", Value: d, Accepted: "above the one before it, " + depths[i-1].String()}
		}
	}
	var line interp.PiecewiseLinear
	if err := line.Fit(x, y); err != nil {
		return nil, &units.ArgumentError{Field: "depths of the profile", Accepted: "depths that rise"}
	}
	first, last := depths[0], depths[len(depths)-1]
	return func(depth units.Length) (units.Temperature, error) {
		if d := depth.SI(); !(d >= first.SI() && d <= last.SI()) {
			return units.Temperature{}, &units.RangeError{
				Model: "profile", Quantity: "depth", Value: depth.Dynamic(), Min: first.Dynamic(), Max: last.Dynamic(), Source: "first and last depth of the table",
			}
		}
		return units.Kelvin.Of(line.Predict(depth.SI())), nil
	}, nil
}

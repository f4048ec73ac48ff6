package series

import (
	"gonum.org/v1/gonum/interp"

	"example.com/coolward/units"
)

// A Profile is a temperature over the depth below the surface. It is asked for depths from 0 to the whole way of the one
// coordinate, and must give the same each time.
type Profile = func(depth units.Length) units.Temperature

// TabulatedProfile returns the profile that is linear between the given depths, which rise, with a temperature at each.
// It returns an [*units.ArgumentError] for fewer than two, for depths that do not rise and for what is no temperature.
// [Problem.Solve] refuses a profile that ends before the body does.
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
	first, last := x[0], x[len(x)-1]
	return func(depth units.Length) units.Temperature {
		if d := depth.SI(); d < first || d > last {
			return units.Temperature{} // no temperature: the table does not say
		}
		return units.Kelvin.Of(line.Predict(depth.SI()))
	}, nil
}

// A profile asks the user's one in the terms of the modes and keeps what is wrong with it.
type profile struct {
	given Profile
	wall  *wall
	err   error
}

func newProfile(p *Problem, w *wall) *profile {
	if p.InitialProfile == nil {
		return nil
	}
	return &profile{given: p.InitialProfile, wall: w}
}

// excess returns the excess over the reference. What is no temperature is kept as an error, while the problem is
// solved.
func (p *profile) excess(y float64) float64 {
	depth := units.Metre.Of(y * p.wall.length)
	if !p.wall.flipped {
		depth = units.Metre.Of((1 - y) * p.wall.length)
	}
	T := p.given(depth)
	if units.CheckTemperature("", T) != nil {
		if p.wall.solution == nil && p.err == nil {
			p.err = units.CheckTemperature("initial profile at "+depth.String(), T)
		}
		return 0
	}
	return T.SI() - p.wall.reference
}

package series

import (
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A profile asks the user's one in the terms of the modes and keeps what is wrong with it.
type profile struct {
	given shape.Profile
	wall  *wall
	err   error
}

func newProfile(p *Problem, w *wall) *profile {
	if p.Profile == nil {
		return nil
	}
	return &profile{given: p.Profile, wall: w}
}

// excess returns the excess over the reference. What is no temperature is kept as an error, while the problem is
// solved.
func (p *profile) excess(y float64) float64 {
	depth := units.Metre.Of(y * p.wall.length)
	if !p.wall.flipped {
		depth = units.Metre.Of((1 - y) * p.wall.length)
	}
	T, err := startAt(p.given, depth)
	if err != nil {
		if p.wall.solution == nil && p.err == nil {
			p.err = err
		}
		return 0
	}
	return T.SI() - p.wall.reference
}

// startAt returns the temperature that a profile gives, or what is wrong with it.
func startAt(given shape.Profile, depth units.Length) (units.Temperature, error) {
	T, err := given(depth)
	if err != nil {
		return units.Temperature{}, err
	}
	return T, units.CheckTemperature("initial profile at "+depth.String(), T)
}

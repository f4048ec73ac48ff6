package series

import "example.com/coolward/units/shape"

// whereTo returns the position of a place for the time to a temperature, which may be the slowest or the fastest one.
// θ falls outwards along every coordinate, and with a constant flux so does the temperature towards where that leaves:
// the slowest place is the centre, or the insulated face of a plate, and the fastest is the corner where the faces of
// all factors meet.
func (s *Solution) whereTo(place shape.Place) (position, error) {
	if err := s.whereFollowing(place); err != nil {
		return position{}, err
	}
	switch {
	case place.IsSlowest():
		return position{}, nil
	case place.IsFastest():
		return position{1, 1, 1}, nil
	}
	return s.position(place)
}

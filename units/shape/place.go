package shape

import "example.com/coolward/units"

type placeKind uint8

const (
	nowhere placeKind = iota
	centre
	surface
	mean
	below
	opposite
	slowest
	fastest
)

// A Place is where in a body a temperature is asked for: [Centre], [Surface], [Opposite], [Mean] or
// [Below] the surface; and for the time to a temperature [Slowest] or [Fastest]. The zero Place is
// refused.
type Place struct {
	kind  placeKind
	depth units.Length
}

// Centre returns the place farthest from the surface: the centre of a sphere.
func Centre() Place { return Place{kind: centre} }

// Surface returns the exposed surface: of a plate the front and of a hollow body the outside, unless
// only the other face is exposed.
func Surface() Place { return Place{kind: surface} }

// Opposite returns the face across the wall from [Surface]: the back of a plate, the inside of a
// hollow body.
func Opposite() Place { return Place{kind: opposite} }

// Slowest returns the place that comes to a temperature last, wherever that is. Only a question for the
// time to a temperature can ask for it.
func Slowest() Place { return Place{kind: slowest} }

// Fastest returns the place that comes to a temperature first, wherever that is. Only a question for
// the time to a temperature can ask for it.
func Fastest() Place { return Place{kind: fastest} }

// Mean returns the mean over the volume, which stands for the heat that is left in the body.
func Mean() Place { return Place{kind: mean} }

// Below returns the place at the given depth below the exposed surface.
func Below(depth units.Length) Place { return Place{below, depth} }

// InEveryBody reports whether p is a place that every body has: centre, surface or mean.
func (p Place) InEveryBody() bool { return p.kind == centre || p.kind == surface || p.kind == mean }

// IsSlowest reports whether p is the place that comes to a temperature last.
func (p Place) IsSlowest() bool { return p.kind == slowest }

// IsFastest reports whether p is the place that comes to a temperature first.
func (p Place) IsFastest() bool { return p.kind == fastest }

// IsMean reports whether p is the mean over the volume.
func (p Place) IsMean() bool { return p.kind == mean }

// Position returns the place as a fraction of the conduction length of b, 0 at the centre and 1 at
// the surface, which both faces of a plate are that is exposed on both. It returns an
// [*units.ArgumentError] for the zero Place, for [Mean], [Slowest] and [Fastest], which have no position,
// and for a place that is not in the body.
func (p Place) Position(b Body) (float64, error) {
	switch p.kind {
	case centre:
		return 0, nil
	case surface:
		return 1, nil
	case below:
		if length := b.ConductionLength(); p.depth.SI() >= 0 && p.depth.SI() <= length.SI() {
			return 1 - p.depth.SI()/length.SI(), nil
		}
		return 0, p.outside(b.ConductionLength())
	case opposite:
		if b.twoFaced() {
			if b.bothExposed() {
				return 1, nil
			}
			return 0, nil
		}
	}
	return 0, p.refused(b)
}

// Depth returns how far the place is below the surface of a body of one coordinate: 0 at [Surface],
// the whole wall at [Opposite], the conduction length at [Centre]. Unlike [Place.Position] it goes
// across the middle of a plate or of a hollow body that is exposed on both faces. It returns an
// [*units.ArgumentError] for the zero Place, for [Mean], [Slowest] and [Fastest], and for a place that
// is not in the body.
func (p Place) Depth(b Body) (units.Length, error) {
	switch wall := b.Thickness(); p.kind {
	case centre:
		return b.ConductionLength(), nil
	case surface:
		return units.Length{}, nil
	case below:
		if wall == (units.Length{}) {
			wall = b.ConductionLength()
		}
		if p.depth.SI() >= 0 && p.depth.SI() <= wall.SI() {
			return p.depth, nil
		}
		return units.Length{}, p.outside(wall)
	case opposite:
		if b.twoFaced() {
			return wall, nil
		}
	}
	return units.Length{}, p.refused(b)
}

func (p Place) outside(deepest units.Length) error {
	return &units.ArgumentError{Field: "place: depth", Value: p.depth, Accepted: "0 m to " + deepest.String()}
}

// refused says what is wrong with a place that has no position in b.
func (p Place) refused(b Body) error {
	switch p.kind {
	case mean, slowest, fastest:
		return &units.ArgumentError{Field: "place", Value: p.String(), Accepted: "a place that has a position: centre, surface or a depth"}
	case opposite:
		return &units.ArgumentError{Field: "place", Value: p.String(), Accepted: "in " + b.String() + ": centre, surface, mean or a depth"}
	}
	return &units.ArgumentError{Field: "place", Accepted: "shape.Centre, Surface, Opposite, Mean or Below"}
}

// String names the place, such as "centre" or "place 5 mm below the surface".
func (p Place) String() string {
	switch p.kind {
	case centre:
		return "centre"
	case surface:
		return "surface"
	case mean:
		return "mean"
	case opposite:
		return "opposite face"
	case slowest:
		return "slowest place"
	case fastest:
		return "fastest place"
	case below:
		return "place " + p.depth.String() + " below the surface"
	}
	return "no place"
}

package shape

import "example.com/coolward/units"

type placeKind uint8

const (
	nowhere placeKind = iota
	centre
	surface
	mean
	below
)

// A Place is where in a body a temperature is asked for: [Centre], [Surface], [Mean] or [Below] the
// surface. The zero Place is refused.
type Place struct {
	kind  placeKind
	depth units.Length
}

// Centre returns the place farthest from the surface: the centre of a sphere.
func Centre() Place { return Place{kind: centre} }

// Surface returns the exposed surface.
func Surface() Place { return Place{kind: surface} }

// Mean returns the mean over the volume, which stands for the heat that is left in the body.
func Mean() Place { return Place{kind: mean} }

// Below returns the place at the given depth below the exposed surface.
func Below(depth units.Length) Place { return Place{below, depth} }

// InEveryBody reports whether p is a place that every body has: centre, surface or mean.
func (p Place) InEveryBody() bool { return p.kind == centre || p.kind == surface || p.kind == mean }

// IsMean reports whether p is the mean over the volume.
func (p Place) IsMean() bool { return p.kind == mean }

// Position returns the place as a fraction of the conduction length of b, 0 at the centre and 1 at
// the surface. It returns an [*units.ArgumentError] for the zero Place, for [Mean], which has no
// position, and for a depth that is not within the body.
func (p Place) Position(b Body) (float64, error) {
	switch p.kind {
	case centre:
		return 0, nil
	case surface:
		return 1, nil
	case below:
		length := b.ConductionLength()
		if d := p.depth.SI(); d >= 0 && d <= length.SI() {
			return 1 - d/length.SI(), nil
		}
		return 0, &units.ArgumentError{Field: "place: depth", Value: p.depth, Accepted: "0 m to " + length.String()}
	case mean:
		return 0, &units.ArgumentError{Field: "place", Value: p.String(), Accepted: "a place that has a position: centre, surface or a depth"}
	}
	return 0, &units.ArgumentError{Field: "place", Accepted: "shape.Centre, Surface, Mean or Below"}
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
	case below:
		return "place " + p.depth.String() + " below the surface"
	}
	return "no place"
}

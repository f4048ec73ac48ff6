package shape

import (
	"math"

	"example.com/coolward/units"
)

// VolumeToArea returns V/A with the exposed surface A, the length of lumped analysis: D/6 for a
// sphere, half the thickness for a plate that is exposed on both faces.
func (b Body) VolumeToArea() units.Length {
	if b.form == sphere {
		return b.a.Scale(1.0 / 6)
	}
	return units.Metre.Of(b.Volume().SI() / b.Area().SI())
}

// ConductionLength returns the longest way that heat takes to the exposed surface, the length of the
// Biot and Fourier numbers of the exact solutions: the radius of a sphere and of a long cylinder, half
// the thickness of a plate that is exposed on both faces, the whole thickness of one that is exposed
// on one, and the radius of the largest inscribed sphere of a compact body.
//
// For a measured body it is 3V/A, which no convex body exceeds and a sphere reaches.
func (b Body) ConductionLength() units.Length {
	d, e, l := b.a.SI(), b.b.SI(), b.c.SI()
	length := 0.0
	switch b.form {
	case sphere, capsule:
		length = d / 2
	case hollowSphere:
		length = across((d-e)/2, b.faces, Outside, Inside)
	case cylinder:
		length = math.Min(wayOut(b.faces&Outside != 0, d/2), wayOut(b.faces&Ends != 0, e/2))
	case tube:
		length = math.Min(across((d-e)/2, b.faces, Outside, Inside), wayOut(b.faces&Ends != 0, l/2))
	case plate:
		length = across(d, b.faces, Front, Back)
	case brick:
		length = math.Min(d, math.Min(e, l)) / 2
	case cone:
		slant := math.Hypot(d/2, e)
		switch b.faces {
		case Outside:
			length = d / 2 * e / slant
		case Ends:
			length = e
		default:
			length = d / 2 * e / (d/2 + slant)
		}
	case measured:
		length = 3 * b.volume.SI() / b.area.SI()
	}
	return units.Metre.Of(length)
}

// Thickness returns the whole way along the one coordinate of heat: the thickness of a plate, the wall of a
// hollow body, the radius of a solid sphere or of a cylinder with insulated ends, and the length between
// exposed ends where the mantle is insulated. It is zero for a body of several coordinates.
func (b Body) Thickness() units.Length {
	switch b.Family() {
	case Spherical, Cylindrical:
		return b.a.Scale(0.5)
	case HollowSpherical, HollowCylindrical:
		return b.a.Sub(b.b).Scale(0.5)
	case Planar:
		switch b.form {
		case cylinder:
			return b.b
		case tube:
			return b.c
		}
		return b.a
	}
	return units.Length{}
}

// InnerDiameter returns the inner diameter of a hollow sphere, a tube or a ring, and zero for others.
func (b Body) InnerDiameter() units.Length {
	if b.form == hollowSphere || b.form == tube {
		return b.b
	}
	return units.Length{}
}

// Length returns the length of a cylinder, a tube or a capsule, and the height of a ring or a cone. It is
// zero for others.
func (b Body) Length() units.Length {
	switch b.form {
	case cylinder, cone, capsule:
		return b.b
	case tube:
		return b.c
	}
	return units.Length{}
}

// Edges returns the edges of a brick in the order in which they were given, and zeros for others.
func (b Body) Edges() (first, second, third units.Length) {
	if b.form != brick {
		return units.Length{}, units.Length{}, units.Length{}
	}
	return b.a, b.b, b.c
}

// twoFaced reports whether heat flows across a wall between two faces.
func (b Body) twoFaced() bool {
	switch b.Family() {
	case Planar, HollowSpherical, HollowCylindrical:
		return true
	}
	return false
}

// bothExposed reports whether a body of two faces is exposed on both.
func (b Body) bothExposed() bool {
	switch b.form {
	case cylinder, tube:
		if b.faces == Ends {
			return true
		}
	case plate:
		return b.faces == Front|Back
	}
	return b.faces == Outside|Inside
}

// across is the way out of a wall: half of it if both faces are exposed, infinite if none is.
func across(wall float64, faces, one, other Face) float64 {
	switch {
	case faces&one != 0 && faces&other != 0:
		return wall / 2
	case faces&(one|other) != 0:
		return wall
	}
	return math.Inf(1)
}

func wayOut(exposed bool, length float64) float64 {
	if exposed {
		return length
	}
	return math.Inf(1)
}

// FlowLength returns the length of the Nusselt, Reynolds and Rayleigh numbers: the outer diameter of
// a round body, and the square root of the exposed surface of any other, the length that suits bodies
// of any form (M. M. Yovanovich, AIAA-87-1643, from memory).
func (b Body) FlowLength() units.Length {
	if d := b.Diameter(); d.SI() != 0 {
		return d
	}
	return units.Metre.Of(math.Sqrt(b.Area().SI()))
}

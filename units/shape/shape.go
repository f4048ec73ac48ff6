package shape

import (
	"math"

	"example.com/coolward/units"
)

// A Family tells bodies apart by the equation of conduction that holds in them.
type Family uint8

// The families of bodies. In all but Compact heat flows along one coordinate.
const (
	Unknown           Family = iota // the zero Body, refused wherever a body is needed
	Spherical                       // a solid sphere
	Cylindrical                     // a solid cylinder with insulated ends, as in a long one
	Planar                          // a plate
	HollowSpherical                 // a spherical shell
	HollowCylindrical               // a tube with insulated ends
	Compact                         // heat flows along two or three coordinates
)

// A form is the constructor that a body comes from.
type form uint8

const (
	noForm form = iota
	sphere
	hollowSphere
	cylinder
	tube
	plate
	brick
	cone
	capsule
	measured
)

// A Body is a shape with its measures and its exposed faces. Make one with a constructor, such as
// [Sphere]; the zero Body is refused wherever one is needed. Bodies compare with ==.
type Body struct {
	form    form
	name    string
	a, b, c units.Length // in the order of the constructor
	area    units.Area   // of one face of a plate; of a measured body
	volume  units.Volume // of a measured body
	faces   Face
}

// Sphere returns the solid sphere of the given diameter.
func Sphere(diameter units.Length) Body {
	return Body{form: sphere, name: "sphere", a: diameter, faces: Outside}
}

// HollowSphere returns the spherical shell between two diameters. Its outside is exposed, its
// inside is not.
func HollowSphere(outer, inner units.Length) Body {
	return Body{form: hollowSphere, name: "hollow sphere", a: outer, b: inner, faces: Outside}
}

// Cylinder returns the solid cylinder of the given diameter and length, exposed all round and at
// its ends. A long cylinder, in which heat flows along the radius alone, is
//
//	shape.Cylinder(diameter, length).Exposing(shape.Outside)
func Cylinder(diameter, length units.Length) Body {
	return Body{form: cylinder, name: "cylinder", a: diameter, b: length, faces: Outside | Ends}
}

// Tube returns the hollow cylinder between two diameters. Its outside is exposed, its inside and its
// ends are not.
func Tube(outer, inner, length units.Length) Body {
	return Body{form: tube, name: "tube", a: outer, b: inner, c: length, faces: Outside}
}

// Ring returns the hollow cylinder between two diameters, exposed on all its faces.
func Ring(outer, inner, height units.Length) Body {
	return Body{form: tube, name: "ring", a: outer, b: inner, c: height, faces: Outside | Inside | Ends}
}

// Plate returns the plate of the given thickness and of the given area of one face. Both faces are
// exposed; its edges are not, as in a plate that is wide against its thickness.
func Plate(thickness units.Length, area units.Area) Body {
	return Body{form: plate, name: "plate", a: thickness, area: area, faces: Front | Back}
}

// Brick returns the block with three edges at right angles, exposed on all its faces.
func Brick(a, b, c units.Length) Body {
	return Body{form: brick, name: "brick", a: a, b: b, c: c, faces: Outside}
}

// Cone returns the right circular cone of the given base diameter and height, exposed on its mantle
// and its base.
func Cone(diameter, height units.Length) Body {
	return Body{form: cone, name: "cone", a: diameter, b: height, faces: Outside | Ends}
}

// Capsule returns the cylinder with hemispheres for ends, of the given diameter and length over all.
func Capsule(diameter, length units.Length) Body {
	return Body{form: capsule, name: "capsule", a: diameter, b: length, faces: Outside}
}

// Measured returns a body of any shape from its volume and its exposed surface, as found by weighing
// and by wrapping.
func Measured(volume units.Volume, area units.Area) Body {
	return Body{form: measured, name: "body", volume: volume, area: area, faces: Outside}
}

// Family returns the family of b, which depends on its form and on the faces that are exposed.
func (b Body) Family() Family {
	switch b.form {
	case sphere:
		return Spherical
	case hollowSphere:
		return HollowSpherical
	case plate:
		return Planar
	case cylinder:
		switch b.faces {
		case Outside:
			return Cylindrical
		case Ends:
			return Planar
		}
	case tube:
		switch {
		case b.faces&Ends == 0:
			return HollowCylindrical
		case b.faces == Ends:
			return Planar
		}
	case noForm:
		return Unknown
	}
	return Compact
}

// Diameter returns the outer diameter of a round body: sphere, hollow sphere, cylinder, tube, cone at
// its base, capsule. It is zero for the others.
func (b Body) Diameter() units.Length {
	switch b.form {
	case sphere, hollowSphere, cylinder, tube, cone, capsule:
		return b.a
	}
	return units.Length{}
}

// Area returns the exposed surface of b.
func (b Body) Area() units.Area {
	total := 0.0
	for f := Outside; f <= Back; f <<= 1 {
		if b.faces&f != 0 {
			total += b.faceArea(f)
		}
	}
	return units.SquareMetre.Of(total)
}

// faceArea returns the area of one face in m².
func (b Body) faceArea(f Face) float64 {
	d, e, l := b.a.SI(), b.b.SI(), b.c.SI()
	switch b.form {
	case sphere:
		return math.Pi * d * d
	case hollowSphere:
		if f == Inside {
			return math.Pi * e * e
		}
		return math.Pi * d * d
	case cylinder:
		if f == Ends {
			return math.Pi / 2 * d * d
		}
		return math.Pi * d * e
	case tube:
		switch f {
		case Ends:
			return math.Pi / 2 * (d - e) * (d + e)
		case Inside:
			return math.Pi * e * l
		}
		return math.Pi * d * l
	case brick:
		return 2 * (d*e + e*l + l*d)
	case cone:
		if f == Ends {
			return math.Pi / 4 * d * d
		}
		return math.Pi / 2 * d * math.Hypot(d/2, e)
	case capsule:
		return math.Pi * d * e
	}
	return b.area.SI()
}

// Volume returns the volume of b.
func (b Body) Volume() units.Volume {
	d, e, l := b.a.SI(), b.b.SI(), b.c.SI()
	v := b.volume.SI()
	switch b.form {
	case sphere:
		v = math.Pi / 6 * d * d * d
	case hollowSphere:
		v = math.Pi / 6 * (d - e) * (d*d + d*e + e*e)
	case cylinder:
		v = math.Pi / 4 * d * d * e
	case tube:
		v = math.Pi / 4 * (d - e) * (d + e) * l
	case plate:
		v = d * b.area.SI()
	case brick:
		v = d * e * l
	case cone:
		v = math.Pi / 12 * d * d * e
	case capsule:
		v = math.Pi / 4 * d * d * (e - d/3)
	}
	return units.CubicMetre.Of(v)
}

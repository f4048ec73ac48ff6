package shape

import "example.com/coolward/units"

// A Family tells bodies apart by the equation of conduction that holds in them.
type Family uint8

// The families of bodies.
const (
	Unknown   Family = iota // the zero Body, refused wherever a body is needed
	Spherical               // conduction along the radius of a sphere
)

// A Body is a shape with its measures. Make one with a constructor, such as [Sphere]; the zero Body
// is refused wherever one is needed.
type Body struct {
	family Family
	size   units.Length // diameter
}

// Sphere returns the solid sphere of the given diameter, exposed on its whole surface.
func Sphere(diameter units.Length) Body { return Body{Spherical, diameter} }

// Check returns an [*units.ArgumentError] if b is the zero Body or if one of its measures is not
// finite and above zero.
func (b Body) Check() error {
	switch b.family {
	case Spherical:
		return units.CheckPositive("sphere: diameter", b.size)
	}
	return &units.ArgumentError{Field: "body", Accepted: "a body with its measures, such as shape.Sphere(diameter)"}
}

// Family returns the family of b.
func (b Body) Family() Family { return b.family }

// Diameter returns the diameter of a sphere.
func (b Body) Diameter() units.Length { return b.size }

// Area returns the exposed surface of b: πD² for a sphere.
func (b Body) Area() units.Area { return units.SquareMetre.Of(pi * b.size.SI() * b.size.SI()) }

// Volume returns the volume of b: πD³/6 for a sphere.
func (b Body) Volume() units.Volume {
	d := b.size.SI()
	return units.CubicMetre.Of(pi / 6 * d * d * d)
}

// VolumeToArea returns V/A, the length of lumped analysis: D/6 for a sphere.
func (b Body) VolumeToArea() units.Length { return b.size.Scale(1.0 / 6) }

// ConductionLength returns the longest way that heat takes to the surface, the length of the
// Biot and Fourier numbers of the exact solutions: the radius of a sphere.
func (b Body) ConductionLength() units.Length { return b.size.Scale(0.5) }

// FlowLength returns the length of the Nusselt, Reynolds and Rayleigh numbers: the diameter of a sphere.
func (b Body) FlowLength() units.Length { return b.size }

// String names the body and its measures, such as "sphere, diameter 60 mm".
func (b Body) String() string {
	switch b.family {
	case Spherical:
		return "sphere, diameter " + b.size.String()
	}
	return "no body"
}

const pi = 3.14159265358979323846

package wall

import "math"

// A Body is a wall or a solid with its measures over L.
type Body struct {
	Dimension int     // m: 0 for a plate, 1 for a cylinder, 2 for a sphere
	Ra, Rb    float64 // radii of the faces over L; Rb is Ra + 1 but for a plate, which has none
	Solid     bool    // y is the distance from the centre: there is no inner face
}

// Plate returns the plate.
func Plate() Body { return Body{} }

// Hollow returns the tube (m = 1) or the hollow sphere (m = 2) with the radius Ra of its inner face over the wall.
func Hollow(m int, ra float64) Body { return Body{Dimension: m, Ra: ra, Rb: ra + 1} }

// Solid returns the cylinder (m = 1) or the sphere (m = 2), or half of a plate (m = 0).
func Solid(m int) Body { return Body{Dimension: m, Rb: 1, Solid: true} }

// Weight returns w = (r/Rb)^m, the area there over that of the outer face.
func (b *Body) Weight(y float64) float64 {
	switch b.Dimension {
	case 1:
		return (b.Ra + y) / b.Rb
	case 2:
		return (b.Ra + y) / b.Rb * ((b.Ra + y) / b.Rb)
	}
	return 1
}

// Inside returns the weight of the inner face, 0 in a solid.
func (b *Body) Inside() float64 {
	if b.Solid {
		return 0
	}
	return b.Weight(0)
}

// Volume returns V = ∫ w dy from 0 to y.
func (b *Body) Volume(y float64) float64 {
	switch b.Dimension {
	case 1:
		return y * (2*b.Ra + y) / (2 * b.Rb)
	case 2:
		return y * (b.Ra*b.Ra + b.Ra*y + y*y/3) / (b.Rb * b.Rb)
	}
	return y
}

// Resistance returns u = ∫ dy/w from 0 to y of a wall: that of the material between the inner face and y, for
// a heat flow per area of the outer face.
func (b *Body) Resistance(y float64) float64 {
	switch b.Dimension {
	case 1:
		return b.Rb * math.Log1p(y/b.Ra)
	case 2:
		return b.Rb / b.Ra * (b.Rb / (b.Ra + y)) * y
	}
	return y
}

// Bulge returns the solution p of (w p')' = −w with p = p' = 0 at the inner face or the centre. It is −∫ V/w dy.
func (b *Body) Bulge(y float64) float64 {
	switch {
	case b.Dimension == 0:
		return -y * y / 2
	case b.Solid:
		return -y * y / float64(2*(b.Dimension+1))
	case b.Dimension == 2:
		return -y * y * (3*b.Ra + y) / (6 * (b.Ra + y))
	}
	return -b.Ra * b.Ra * cylinderBulge(y/b.Ra)
}

// cylinderBulge returns (2x + x²)/4 − log(1 + x)/2, which is x²/2 − x³/6 + x⁴/8 − … for small x.
func cylinderBulge(x float64) float64 {
	if x > 0.3 {
		return (2*x+x*x)/4 - math.Log1p(x)/2
	}
	total := 0.0
	for k := 32; k >= 3; k-- { // −log(1+x) + x − x²/2 = Σ (−x)^k/k from 3 on
		total = -x * (total + 1/float64(k))
	}
	return (x*x + x*x*total) / 2
}

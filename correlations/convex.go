package correlations

import (
	"iter"
	"math"
	"slices"

	"example.com/coolward/units"
)

// YovanovichBody returns Yovanovich's correlation for natural convection from a convex body with a
// Nusselt number at rest Nu0 and a body gravity function G,
//
//	Nu = Nu0 + 0.67 G Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)
//
// for Ra up to 1e8, Pr above 0, a Nusselt number at rest above 0 and a gravity function above 0,
// with the properties at the film temperature.
func YovanovichBody() Correlation { return Correlation{&yovanovichBody} }

// YovanovichVanoverbekeBody returns the correlation of Yovanovich and Vanoverbeke for a convex body
// in a stream, with a Nusselt number at rest Nu0 and the largest perimeter P normal to the stream,
//
//	Nu = Nu0 + (0.15 (P/A^(1/2))^(1/2) Re^(1/2) + 0.35 Re^0.566) Pr^(1/3)
//
// for Re up to 2e5, Pr from 0.7 up, a Nusselt number at rest above 0 and a perimeter above 0, with
// the properties at the film temperature.
func YovanovichVanoverbekeBody() Correlation { return Correlation{&yovanovichVanoverbekeBody} }

var yovanovichBody = record{
	name:      "Yovanovich convex body, natural",
	body:      "convex body",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = Nu0 + 0.67 G Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)",
	length:    "square root of the whole wetted surface",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "0", "1e8"), positive(Prandtl), positive(BodyNusselt), positive(Gravity)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "M. M. Yovanovich, New Nusselt and Sherwood numbers for arbitrary isopotential geometries at near zero Peclet and Rayleigh numbers, AIAA-87-1643 (1987); S. Lee, M. M. Yovanovich and K. Jafarpur, Effects of geometry and orientation on laminar natural convection from isothermal bodies, J. Thermophys. Heat Transfer 5 (1991) 208-216",
	status:    FromMemory,
	evidence:  "recalled; the Nusselt numbers at rest agree with the capacitances of sphere, cube and disk",
	note:      "the bodies of ConvexBodies, or others by their own Nu0 and G; 0.9 % above Churchill for the sphere",
	nu: func(g Groups) float64 {
		return g.BodyNu + 0.67*g.Gravity*quarter(g.Ra)*power(prandtlFactor(0.492, g.Pr), -4.0/9)
	},
}

var yovanovichVanoverbekeBody = record{
	name:      "Yovanovich and Vanoverbeke convex body, forced",
	body:      "convex body",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = Nu0 + (0.15 (P/A^(1/2))^(1/2) Re^(1/2) + 0.35 Re^0.566) Pr^(1/3)",
	length:    "square root of the whole wetted surface",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "0", "2e5"),
		within(Prandtl, "0.7", open),
		positive(BodyNusselt),
		positive(Perimeter),
	},
	scatter:  Scatter{0.20, usualForced},
	citation: "M. M. Yovanovich and C. A. Vanoverbeke, Combined natural and forced convection heat transfer from isothermal spheroids, AIAA-88-2623 (1988)",
	status:   FromMemory,
	evidence: recalled,
	note:     "measured on spheroids; for a sphere P/A^(1/2) is π^(1/2)",
	nu: func(g Groups) float64 {
		return g.BodyNu + (0.15*math.Sqrt(g.Perimeter*g.Re)+0.35*power(g.Re, 0.566))*cubeRoot(g.Pr)
	},
}

// A ConvexBody is a body of one proportion and position, for [YovanovichBody].
type ConvexBody struct {
	Name    string
	BodyNu  float64 // Nusselt number at rest on the square root of the surface
	Gravity float64 // body gravity function
}

// ConvexBodies lists the bodies of Lee, Yovanovich and Jafarpur, J. Thermophys. Heat Transfer 5 (1991)
// 208-216, from memory. The numbers at rest of sphere, cube and cylinder agree with those of potential theory.
func ConvexBodies() iter.Seq[ConvexBody] {
	return slices.Values([]ConvexBody{
		{"sphere", 3.545, 1.023},
		{"two spheres that touch", 3.475, 0.928},
		{"cube, face up", 3.388, 0.951},
		{"cube, edge up", 3.388, 0.990},
		{"cube, corner up", 3.388, 1.014},
		{"cylinder as long as wide, vertical", 3.444, 0.967},
		{"cylinder as long as wide, horizontal", 3.444, 1.019},
		{"cylinder as long as wide, at 45°", 3.444, 1.004},
		{"prolate spheroid 1.93", 3.566, 1.012},
		{"oblate spheroid 0.5", 3.529, 0.973},
		{"oblate spheroid 0.1", 3.342, 0.768},
	})
}

// SphereGravity is the body gravity function of a sphere, integrated from its definition
//
//	G = (1/A ∫ (P sin θ / A^(1/2))^(1/3) dA)^(3/4)
//
// with the local perimeter P and the angle θ of the normal from the vertical.
const SphereGravity = 1.01358572889

// PlateGravity returns the body gravity function of both sides of a vertical plate of that width over
// height, (2 W/H)^(1/8). It returns an [*units.ArgumentError] unless the ratio is finite and above 0.
func PlateGravity(width float64) (float64, error) {
	if !(width > 0 && width <= math.MaxFloat64) {
		return 0, &units.ArgumentError{Field: "width over height", Value: width, Accepted: "finite and above 0"}
	}
	return math.Exp((math.Ln2 + math.Log(width)) / 8), nil
}

// VerticalCylinderGravity returns the body gravity function of the side of a vertical cylinder of that
// length over diameter, (π D/L)^(1/8). It returns an [*units.ArgumentError] unless the ratio is finite
// and above 0.
func VerticalCylinderGravity(slenderness float64) (float64, error) {
	if !(slenderness > 0 && slenderness <= math.MaxFloat64) {
		return 0, &units.ArgumentError{Field: "slenderness", Value: slenderness, Accepted: "finite and above 0"}
	}
	return math.Exp((math.Log(math.Pi) - math.Log(slenderness)) / 8), nil
}

// HorizontalCylinderGravity returns the body gravity function of the side of a horizontal cylinder of that
// length over diameter,
//
//	(2/π^(1/2))^(1/4) (L/D)^(1/8) (Γ(2/3) / (π^(1/2) Γ(7/6)))^(3/4) = 0.890969 (L/D)^(1/8)
//
// It returns an [*units.ArgumentError] unless the ratio is finite and above 0.
func HorizontalCylinderGravity(slenderness float64) (float64, error) {
	if !(slenderness > 0 && slenderness <= math.MaxFloat64) {
		return 0, &units.ArgumentError{Field: "slenderness", Value: slenderness, Accepted: "finite and above 0"}
	}
	root := math.Sqrt(math.Pi)
	form := quarter(2/root) * power(math.Gamma(2.0/3)/(root*math.Gamma(7.0/6)), 0.75)
	return form * math.Exp(math.Log(slenderness)/8), nil
}

// CylinderBodyNu returns the Nusselt number at rest of a cylinder with its ends, on the square root of the
// surface, for its length over diameter,
//
//	Nu0 = (3.1915 + 2.7726 (L/D)^0.76) / (1 + 2 L/D)^(1/2)
//
// from 0, a disk, to 8. It is from M. M. Yovanovich, from memory; the disk is exact. It returns a
// [*units.RangeError] outside and an [*units.ArgumentError] for what is no number.
func CylinderBodyNu(slenderness float64) (float64, error) {
	if math.IsNaN(slenderness) {
		return 0, &units.ArgumentError{Field: "slenderness", Value: slenderness, Accepted: "from 0 to 8"}
	}
	r := within(Slenderness, "0", "8")
	if !r.Admits(slenderness) {
		return 0, r.outside("Nusselt number at rest of a cylinder", "M. M. Yovanovich, from memory", slenderness)
	}
	return (3.1915 + 2.7726*power(slenderness, 0.76)) / math.Sqrt(1+2*slenderness), nil
}

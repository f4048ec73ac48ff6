package correlations

import (
	"math"

	"example.com/coolward/internal/pow"
	"example.com/coolward/units"
)

// LeFevreEdeCylinder returns the correlation of Le Fevre and Ede for natural convection from the
// side of a vertical cylinder,
//
//	Nu = 4/3 (7 Ra Pr / (5 (20 + 21 Pr)))^(1/4) + 4 (272 + 315 Pr) (L/D) / (35 (64 + 63 Pr))
//
// for Ra 1e4 to 1e9, Pr above 0 and a curvature up to 5, with the properties at the film
// temperature.
func LeFevreEdeCylinder() Correlation { return Correlation{&leFevreEdeCylinder} }

// PopielCylinder returns Popiel's correction for the curvature of a vertical cylinder on the
// laminar plate of Churchill and Chu,
//
//	Nu = Nu plate (1 + B (32^(1/2) Gr^(-1/4) L/D)^C)
//	B = 0.0571322 + 0.20305 Pr^(-0.43)
//	C = 0.9165 - 0.0043 Pr^(1/2) + 0.01333 ln Pr + 0.0004809/Pr
//	Nu plate = 0.68 + 0.670 Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)
//
// for Ra 1e4 to 1e9, Pr 0.01 to 100 and a curvature up to 5, with the properties at the film
// temperature.
func PopielCylinder() Correlation { return Correlation{&popielCylinder} }

var leFevreEdeCylinder = record{
	name:      "Le Fevre and Ede vertical cylinder, natural",
	body:      "vertical cylinder",
	regime:    Natural,
	formula:   "Nu = 4/3 (7 Ra Pr / (5 (20 + 21 Pr)))^(1/4) + 4 (272 + 315 Pr) (L/D) / (35 (64 + 63 Pr))",
	length:    "height",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), positive(Prandtl), upTo(Curvature, "5")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "E. J. Le Fevre and A. J. Ede, Laminar free convection from the outer surface of a vertical circular cylinder, 9th Int. Congr. Appl. Mech. 4 (1956) 175-183",
	status:    FromMemory,
	evidence:  recalled,
	note:      "without the ends; the lower limit of Ra and that of the curvature are our own choice: the limit at rest is not physical",
	nu: func(g Groups) float64 {
		return 4.0/3*quarter(7*g.Ra*g.Pr/(5*(20+21*g.Pr))) + 4*(272+315*g.Pr)*g.Slenderness/(35*(64+63*g.Pr))
	},
}

var popielCylinder = record{
	name:      "Popiel vertical cylinder, natural",
	body:      "vertical cylinder",
	regime:    Natural,
	formula:   "Nu = Nu plate (1 + B (32^(1/2) Gr^(-1/4) L/D)^C); B = 0.0571322 + 0.20305 Pr^(-0.43); C = 0.9165 - 0.0043 Pr^(1/2) + 0.01333 ln Pr + 0.0004809/Pr; Nu plate = 0.68 + 0.670 Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)",
	length:    "height",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), within(Prandtl, "0.01", "100"), upTo(Curvature, "5")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "C. O. Popiel, Free convection heat transfer from vertical slender cylinders: a review, Heat Transfer Eng. 29 (2008) 521-536, a fit to T. Cebeci 1974",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the lower limit of Ra and that of the curvature are our own choice",
	nu: func(g Groups) float64 {
		log2 := pow.Log2(g.Pr)
		b := 0.0571322 + 0.20305*pow.Exp2(-0.43*log2)
		c := 0.9165 - 0.0043*math.Sqrt(g.Pr) + 0.01333*math.Ln2*log2 + 0.0004809/g.Pr
		xi := math.Sqrt(32) * g.Slenderness / quarter(g.Ra/g.Pr)
		return churchillChuLaminar(g.Ra, g.Pr) * (1 + b*power(xi, c))
	},
}

// SparrowGreggLimit returns the least diameter over height at which a vertical cylinder may be taken as a
// plate, with an error of less than 5 %, at the Grashof number gr on its height:
//
//	D/L ≥ 35 / Gr^(1/4)
//
// It is from E. M. Sparrow and J. L. Gregg, Trans. ASME 78 (1956) 1823-1829, read in engineer's notes on
// free convection. It returns an [*units.ArgumentError] unless gr is finite and above 0.
func SparrowGreggLimit(gr float64) (float64, error) {
	if !(gr > 0 && gr <= math.MaxFloat64) {
		return 0, &units.ArgumentError{Field: "Grashof number", Value: gr, Accepted: "finite and above 0"}
	}
	return 35 / quarter(gr), nil
}

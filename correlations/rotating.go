package correlations

import "math"

// RotatingDisk returns the laminar correlation for a disk that rotates in air at rest,
//
//	Nu = 0.36 Re^(1/2)
//
// for Re up to 2.4e5 and Pr about 0.7, with the properties at the film temperature.
func RotatingDisk() Correlation { return Correlation{&rotatingDisk} }

// RotatingDiskTurbulentLocal returns the turbulent correlation at a radius of a disk that rotates
// in air at rest,
//
//	Nu = 0.0195 Re^0.8
//
// for Re 2.4e5 to 5e6 and Pr about 0.7, with the properties at the film temperature. It gives the
// local number.
func RotatingDiskTurbulentLocal() Correlation { return Correlation{&rotatingDiskTurbulentLocal} }

// RotatingDiskMixed returns the mean correlation for a disk that rotates in air at rest, whose
// boundary layer turns turbulent at a Re of transition Rc,
//
//	Nu = 0.36 Re^(1/2) x² + 0.015 Re^0.8 (1 - x^2.6), x = (Rc/Re)^(1/2)
//	Nu = 0.36 Re^(1/2), Re ≤ Rc
//
// for Re up to 5e6, Pr about 0.7 and a Re of transition 2e5 to 3e5, with the properties at the film
// temperature.
func RotatingDiskMixed() Correlation { return Correlation{&rotatingDiskMixed} }

// KreithRotatingSphere returns the correlation of Kreith and others for a sphere that rotates in a
// fluid at rest,
//
//	Nu = max(2, 0.43 Re^0.5 Pr^0.4), Re < 5e4
//	Nu = 0.066 Re^0.67 Pr^0.4, Re ≥ 5e4
//
// for Re up to 7e5, Pr from 0.7 up and a Richardson number up to 0.1, with the properties at the
// film temperature.
func KreithRotatingSphere() Correlation { return Correlation{&kreithRotatingSphere} }

var rotatingDisk = record{
	name:      "rotating disk, laminar",
	body:      "rotating disk",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 0.36 Re^(1/2)",
	length:    "radius; Re is angular velocity in rad/s × radius² / kinematic viscosity",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "2.4e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.20, usualForced},
	citation:  "E. C. Cobb and O. A. Saunders, Heat transfer from a rotating disk, Proc. R. Soc. A 236 (1956) 343-351",
	status:    FromMemory,
	evidence:  recalled,
	note:      "one side; the coefficient does not vary with the radius; 10 % above the similarity solution, 0.326 at Pr 0.71",
	nu:        func(g Groups) float64 { return 0.36 * math.Sqrt(g.Re) },
}

var rotatingDiskTurbulentLocal = record{
	name:      "rotating disk, turbulent, local",
	body:      "rotating disk",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.0195 Re^0.8",
	length:    "radius; Re is angular velocity in rad/s × radius² / kinematic viscosity",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "2.4e5", "5e6"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.20, usualForced},
	citation:  "F. Kreith, Convection heat transfer in rotating systems, Adv. Heat Transfer 5 (1968) 129-251",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the upper limit is our own choice",
	nu:        func(g Groups) float64 { return 0.0195 * power(g.Re, 0.8) },
}

var rotatingDiskMixed = record{
	name:      "rotating disk, laminar then turbulent",
	body:      "rotating disk",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 0.36 Re^(1/2) x² + 0.015 Re^0.8 (1 - x^2.6), x = (Rc/Re)^(1/2); Nu = 0.36 Re^(1/2), Re ≤ Rc",
	length:    "radius; Re is angular velocity in rad/s × radius² / kinematic viscosity",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "0", "5e6"),
		within(Prandtl, "0.7", "0.7"),
		within(TransitionReynolds, "2e5", "3e5"),
	},
	scatter:  Scatter{0.20, usualForced},
	citation: "F. Kreith, Convection heat transfer in rotating systems, Adv. Heat Transfer 5 (1968) 129-251",
	status:   FromMemory,
	evidence: "recalled; it is the mean of the two local laws over the area",
	note:     "one side; transition is usual at 2.4e5; the limits of it and of Re are our own choice",
	nu: func(g Groups) float64 {
		if g.Re <= g.TransitionRe {
			return 0.36 * math.Sqrt(g.Re)
		}
		x := g.TransitionRe / g.Re
		return 0.36*math.Sqrt(g.Re)*x + 0.015*power(g.Re, 0.8)*(1-power(x, 1.3))
	},
}

var kreithRotatingSphere = record{
	name:      "Kreith rotating sphere",
	body:      "rotating sphere",
	regime:    Forced,
	formula:   "Nu = max(2, 0.43 Re^0.5 Pr^0.4), Re < 5e4; Nu = 0.066 Re^0.67 Pr^0.4, Re ≥ 5e4",
	length:    "diameter; Re is angular velocity in rad/s × diameter² / kinematic viscosity",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "7e5"), within(Prandtl, "0.7", open), within(Richardson, "0", "0.1")},
	scatter:   Scatter{0.20, usualForced},
	citation:  "F. Kreith, L. G. Roberts, J. A. Sullivan and S. N. Sinha, Convection heat transfer and flow phenomena of rotating spheres, Int. J. Heat Mass Transfer 6 (1963) 881-895",
	status:    FromMemory,
	evidence:  recalled,
	note:      "not below 2, the conduction limit, is our own choice; jumps by -3.4 % at Re 5e4; for buoyancy small against rotation",
	nu: func(g Groups) float64 {
		if g.Re < 5e4 {
			return max(2, 0.43*math.Sqrt(g.Re)*power(g.Pr, 0.4))
		}
		return 0.066 * product(g.Re, 0.67, g.Pr, 0.4)
	},
}

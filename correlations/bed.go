package correlations

import "math"

// WakaoBed returns the correlation of Wakao, Kaguei and Funazkri for the particles of a packed bed,
//
//	Nu = 2 + 1.1 Re^0.6 Pr^(1/3)
//
// for Re 15 to 8500, Pr above 0 and a void fraction about 0.4, with the properties at the film
// temperature.
func WakaoBed() Correlation { return Correlation{&wakaoBed} }

// GunnBed returns Gunn's correlation for the particles of a packed or fluidised bed of void
// fraction ε,
//
//	Nu = (7 - 10 ε + 5 ε²) (1 + 0.7 Re^0.2 Pr^(1/3)) + (1.33 - 2.4 ε + 1.2 ε²) Re^0.7 Pr^(1/3)
//
// for Re up to 1e5, Pr above 0 and a void fraction 0.35 to 1, with the properties at the film
// temperature.
func GunnBed() Correlation { return Correlation{&gunnBed} }

// GnielinskiBed returns Gnielinski's correlation for the spheres of a packed bed of void fraction
// ε,
//
//	Nu = (1 + 1.5 (1 - ε)) Nu sphere(Re/ε)
//	Nu sphere = 2 + (Nl² + Nt²)^(1/2), as for the single sphere
//
// for Re up to 1e5, Pr 0.7 to 600 and a void fraction 0.26 to 1, with the properties at the film
// temperature.
func GnielinskiBed() Correlation { return Correlation{&gnielinskiBed} }

var wakaoBed = record{
	name:      "Wakao, Kaguei and Funazkri packed bed",
	body:      "packed bed",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 2 + 1.1 Re^0.6 Pr^(1/3)",
	length:    "diameter of the particles",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "15", "8500"), positive(Prandtl), within(VoidFraction, "0.4", "0.4")},
	scatter:   Scatter{0.30, "own choice for packed beds"},
	citation:  "N. Wakao, S. Kaguei and T. Funazkri, Effect of fluid dispersion coefficients on particle-to-fluid heat transfer coefficients in packed beds, Chem. Eng. Sci. 34 (1979) 325-336",
	status:    FromMemory,
	evidence:  recalled,
	note:      "Re with the superficial velocity; gas and liquid",
	nu:        func(g Groups) float64 { return 2 + 1.1*product(g.Re, 0.6, g.Pr, 1.0/3) },
}

var gunnBed = record{
	name:      "Gunn packed or fluidised bed",
	body:      "packed bed",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = (7 - 10 ε + 5 ε²) (1 + 0.7 Re^0.2 Pr^(1/3)) + (1.33 - 2.4 ε + 1.2 ε²) Re^0.7 Pr^(1/3)",
	length:    "diameter of the particles",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "0", "1e5"),
		positive(Prandtl),
		{VoidFraction, limit("0.35"), exact(1)},
	},
	scatter:  Scatter{0.30, "own choice for packed beds"},
	citation: "D. J. Gunn, Transfer of heat or mass to particles in fixed and fluidised beds, Int. J. Heat Mass Transfer 21 (1978) 467-476",
	status:   FromMemory,
	evidence: recalled,
	note:     "Re with the superficial velocity; a single sphere at void fraction 1",
	nu: func(g Groups) float64 {
		e, third := g.VoidFraction, cubeRoot(g.Pr)
		fifth := power(g.Re, 0.2)
		return (7-10*e+5*e*e)*(1+0.7*fifth*third) + (1.33-2.4*e+1.2*e*e)*math.Sqrt(g.Re)*fifth*third
	},
}

var gnielinskiBed = record{
	name:      "Gnielinski packed bed",
	body:      "packed bed",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = (1 + 1.5 (1 - ε)) Nu sphere(Re/ε); Nu sphere = 2 + (Nl² + Nt²)^(1/2), as for the single sphere",
	length:    "diameter of the particles",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "0", "1e5"),
		within(Prandtl, "0.7", "600"),
		{VoidFraction, limit("0.26"), exact(1)},
	},
	scatter:  Scatter{0.30, "own choice for packed beds"},
	citation: "V. Gnielinski, Equations for the calculation of heat and mass transfer during flow through stationary spherical packings at moderate and high Peclet numbers, Int. Chem. Eng. 21 (1981) 378-383",
	status:   FromMemory,
	evidence: "recalled; the citation was read in a reference list",
	note:     "Re with the superficial velocity; the limits of Re and of the void fraction are our own choice",
	nu: func(g Groups) float64 {
		return (1 + 1.5*(1-g.VoidFraction)) * (2 + gnielinskiFlow(over(g.Re, g.VoidFraction), g.Pr))
	},
}

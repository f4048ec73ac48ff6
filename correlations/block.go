package correlations

// SparrowAnsariCylinder returns the correlation of Sparrow and Ansari for a vertical cylinder as
// long as wide in air,
//
//	Nu = 0.775 Ra^0.208
//
// for Ra 1.4e4 to 1.4e5 and Pr about 0.7, with the properties at the film temperature.
func SparrowAnsariCylinder() Correlation { return Correlation{&sparrowAnsariCylinder} }

// LienhardBody returns Lienhard's rule for a body of any form,
//
//	Nu = 0.52 Ra^(1/4)
//
// for Ra 1e4 to 1e9 and Pr from 0.7 up, with the properties at the film temperature.
func LienhardBody() Correlation { return Correlation{&lienhardBody} }

// KingBlock returns King's rule for a rectangular block,
//
//	Nu = 0.60 Ra^(1/4)
//
// for Ra 1e4 to 1e9 and Pr from 0.7 up, with the properties at the film temperature.
func KingBlock() Correlation { return Correlation{&kingBlock} }

var sparrowAnsariCylinder = record{
	name:      "Sparrow and Ansari short vertical cylinder, natural",
	body:      "vertical cylinder as long as wide",
	regime:    Natural,
	formula:   "Nu = 0.775 Ra^0.208",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1.4e4", "1.4e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "E. M. Sparrow and M. A. Ansari, A refutation of King's rule for multi-dimensional external natural convection, Int. J. Heat Mass Transfer 26 (1983) 1357-1365",
	status:    FromMemory,
	evidence:  recalled,
	note:      "with its ends; the upper limit is not known: a decade is our own choice",
	nu:        func(g Groups) float64 { return 0.775 * power(g.Ra, 0.208) },
}

var lienhardBody = record{
	name:      "Lienhard body of any form, natural",
	body:      "body of any form",
	regime:    Natural,
	formula:   "Nu = 0.52 Ra^(1/4)",
	length:    "length of the path of the fluid along the surface",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.30, "own choice for a rule without a form"},
	citation:  "J. H. Lienhard, On the commonality of equations for natural convection from immersed bodies, Int. J. Heat Mass Transfer 16 (1973) 2121-2123",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the range of Pr is our own choice",
	nu:        func(g Groups) float64 { return 0.52 * quarter(g.Ra) },
}

var kingBlock = record{
	name:      "King block, natural",
	body:      "block",
	regime:    Natural,
	formula:   "Nu = 0.60 Ra^(1/4)",
	length:    "1/(1/horizontal + 1/vertical)",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.50, "own choice: refuted for short blocks"},
	citation:  "W. J. King, The basic laws and data of heat transmission, Mech. Eng. 54 (1932) 347-353",
	status:    FromMemory,
	evidence:  recalled,
	note:      "refuted by Sparrow and Ansari 1983 for short blocks: for comparison only; the range of Pr is our own choice",
	nu:        func(g Groups) float64 { return 0.60 * quarter(g.Ra) },
}

package correlations

// ChurchillChuCylinder returns the correlation of Churchill and Chu for natural convection from a
// long horizontal cylinder,
//
//	Nu = (0.60 + 0.387 Ra^(1/6) / (1 + (0.559/Pr)^(9/16))^(8/27))²
//
// for Ra 1e-5 to 1e12 and Pr above 0, with the properties at the film temperature.
func ChurchillChuCylinder() Correlation { return Correlation{&churchillChuCylinder} }

// ChurchillChuCylinderLaminar returns the laminar correlation of Churchill and Chu for a long
// horizontal cylinder,
//
//	Nu = 0.36 + 0.518 Ra^(1/4) / (1 + (0.559/Pr)^(9/16))^(4/9)
//
// for Ra 1e-6 to 1e9 and Pr above 0, with the properties at the film temperature.
func ChurchillChuCylinderLaminar() Correlation { return Correlation{&churchillChuCylinderLaminar} }

// MorganCylinderNatural returns Morgan's table for natural convection from a horizontal cylinder or
// wire,
//
//	Nu = 0.675 Ra^0.058, Ra < 1e-2
//	Nu = 1.02 Ra^0.148, Ra < 1e2
//	Nu = 0.850 Ra^0.188, Ra < 1e4
//	Nu = 0.480 Ra^0.250, Ra < 1e7
//	Nu = 0.125 Ra^0.333, Ra ≥ 1e7
//
// for Ra 1e-10 to 1e12, with the properties at the film temperature.
func MorganCylinderNatural() Correlation { return Correlation{&morganCylinderNatural} }

var churchillChuCylinder = record{
	name:      "Churchill and Chu horizontal cylinder, natural",
	body:      "horizontal cylinder",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = (0.60 + 0.387 Ra^(1/6) / (1 + (0.559/Pr)^(9/16))^(8/27))²",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e-5", "1e12"), positive(Prandtl)},
	scatter:   Scatter{0.20, usualAnyNatural},
	citation:  "S. W. Churchill and H. H. S. Chu, Correlating equations for laminar and turbulent free convection from a horizontal cylinder, Int. J. Heat Mass Transfer 18 (1975) 1049-1053",
	status:    ReadOnPage,
	evidence:  "Free convection, engineer's notes, vivek-s.com (formula, Ra to 1e12); the lower limit is from memory",
	note:      "tends to 0.36 at rest, where the limit of an infinite cylinder is 0",
	nu:        func(g Groups) float64 { return churchillChu(0.60, 0.559, g.Ra, g.Pr) },
}

var churchillChuCylinderLaminar = record{
	name:      "Churchill and Chu horizontal cylinder, natural, laminar",
	body:      "horizontal cylinder",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 0.36 + 0.518 Ra^(1/4) / (1 + (0.559/Pr)^(9/16))^(4/9)",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e-6", "1e9"), positive(Prandtl)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "S. W. Churchill and H. H. S. Chu, Correlating equations for laminar and turbulent free convection from a horizontal cylinder, Int. J. Heat Mass Transfer 18 (1975) 1049-1053",
	status:    FromMemory,
	evidence:  recalled,
	note:      "lies 39 to 42 % below the form for all Ra at 1e9; never change from one to the other at a threshold",
	nu:        func(g Groups) float64 { return 0.36 + 0.518*quarter(g.Ra)*power(prandtlFactor(0.559, g.Pr), -4.0/9) },
}

var morganCylinderNatural = record{
	name:      "Morgan horizontal cylinder, natural",
	body:      "horizontal cylinder",
	regime:    Natural,
	formula:   "Nu = 0.675 Ra^0.058, Ra < 1e-2; Nu = 1.02 Ra^0.148, Ra < 1e2; Nu = 0.850 Ra^0.188, Ra < 1e4; Nu = 0.480 Ra^0.250, Ra < 1e7; Nu = 0.125 Ra^0.333, Ra ≥ 1e7",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e-10", "1e12")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "V. T. Morgan, The overall convective heat transfer from smooth circular cylinders, Adv. Heat Transfer 11 (1975) 199-264",
	status:    FromMemory,
	evidence:  "recalled; the branches join to 0.8 %",
	note:      "5 % is claimed at best; jumps by -0.16, 0.19, -0.04 and -0.76 % at Ra 1e-2, 1e2, 1e4 and 1e7",
	nu:        func(g Groups) float64 { return morganNatural.at(g.Ra) },
}

var morganNatural = powerLaws{
	{1e-10, 0.675, 0.058}, {1e-2, 1.02, 0.148}, {1e2, 0.850, 0.188}, {1e4, 0.480, 0.250}, {1e7, 0.125, 0.333},
}

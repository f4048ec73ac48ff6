package correlations

// YugeSphereNatural returns Yuge's correlation for natural convection from a sphere in air,
//
//	Nu = 2 + 0.392 Gr^(1/4)
//
// for a Grashof number 1 to 1e5 and Pr about 0.7, with the properties at the film temperature.
func YugeSphereNatural() Correlation { return Correlation{&yugeSphereNatural} }

// YugeSphereRayleigh returns the variant of Yuge's correlation on the Rayleigh number,
//
//	Nu = 2 + 0.43 Ra^(1/4)
//
// for Ra 1 to 1e5 and Pr about 1, with the properties at the film temperature.
func YugeSphereRayleigh() Correlation { return Correlation{&yugeSphereRayleigh} }

// AmatoTienSphere returns the correlation of Amato and Tien for natural convection from a sphere in
// water,
//
//	Nu = 2 + 0.50 Ra^(1/4)
//
// for Ra 3e5 to 8e8 and Pr 1.7 to 13, with the properties at the film temperature.
func AmatoTienSphere() Correlation { return Correlation{&amatoTienSphere} }

// RaithbyHollandsSphere returns the laminar part of the method of Raithby and Hollands for a
// sphere,
//
//	Nu = 2 + 0.878 · 0.671 Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)
//
// for Ra up to 1e8 and Pr above 0, with the properties at the film temperature.
func RaithbyHollandsSphere() Correlation { return Correlation{&raithbyHollandsSphere} }

var yugeSphereNatural = record{
	name:      "Yuge sphere, natural",
	body:      "sphere",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 2 + 0.392 Gr^(1/4)",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Grashof, "1", "1e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "T. Yuge, Experiments on heat transfer from spheres including combined natural and forced convection, J. Heat Transfer 82 (1960) 214-220",
	status:    FromMemory,
	evidence:  recalled,
	note:      "measured in air, Pr 0.72; Gr = Ra/Pr",
	nu:        func(g Groups) float64 { return 2 + 0.392*quarter(over(g.Ra, g.Pr)) },
}

var yugeSphereRayleigh = record{
	name:      "Yuge sphere, natural, Rayleigh form",
	body:      "sphere",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 2 + 0.43 Ra^(1/4)",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1", "1e5"), within(Prandtl, "1", "1")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "T. Yuge, Experiments on heat transfer from spheres including combined natural and forced convection, J. Heat Transfer 82 (1960) 214-220",
	status:    FromMemory,
	evidence:  recalled,
	note:      "for a Pr near 1",
	nu:        func(g Groups) float64 { return 2 + 0.43*quarter(g.Ra) },
}

var amatoTienSphere = record{
	name:      "Amato and Tien sphere, natural",
	body:      "sphere",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 2 + 0.50 Ra^(1/4)",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "3e5", "8e8"), within(Prandtl, "1.7", "13")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "W. S. Amato and C. Tien, Free convection heat transfer from isothermal spheres in water, Int. J. Heat Mass Transfer 15 (1972) 327-339",
	status:    FromMemory,
	evidence:  recalled,
	note:      "measured in water with Nu 10 to 90; the range of Pr is that of liquid water from 0 to 100 °C, our own choice",
	nu:        func(g Groups) float64 { return 2 + 0.50*quarter(g.Ra) },
}

var raithbyHollandsSphere = record{
	name:      "Raithby and Hollands sphere, natural, laminar",
	body:      "sphere",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 2 + 0.878 · 0.671 Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "0", "1e8"), positive(Prandtl)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "G. D. Raithby and K. G. T. Hollands, A general method of obtaining approximate solutions to laminar and turbulent free convection problems, Adv. Heat Transfer 11 (1975) 265-315",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the turbulent part of the method is left out; the upper limit is our own choice",
	nu:        func(g Groups) float64 { return 2 + 0.878*0.671*quarter(g.Ra)*power(prandtlFactor(0.492, g.Pr), -4.0/9) },
}

package correlations

import "math"

// ChurchillChuPlate returns the correlation of Churchill and Chu for natural convection from a
// vertical plate,
//
//	Nu = (0.825 + 0.387 Ra^(1/6) / (1 + (0.492/Pr)^(9/16))^(8/27))²
//
// for Ra 0.1 to 1e12 and Pr above 0, with the properties at the film temperature.
func ChurchillChuPlate() Correlation { return Correlation{&churchillChuPlate} }

// ChurchillChuPlateLaminar returns the laminar correlation of Churchill and Chu for a vertical
// plate,
//
//	Nu = 0.68 + 0.670 Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)
//
// for Ra up to 1e9 and Pr above 0, with the properties at the film temperature.
func ChurchillChuPlateLaminar() Correlation { return Correlation{&churchillChuPlateLaminar} }

// ChurchillChuPlateFlux returns the correlation of Churchill and Chu for natural convection from a
// vertical plate of uniform flux,
//
//	Nu = (0.825 + 0.387 Ra^(1/6) / (1 + (0.437/Pr)^(9/16))^(8/27))²
//
// for Ra 0.1 to 1e12 and Pr above 0, with the properties at the film temperature.
func ChurchillChuPlateFlux() Correlation { return Correlation{&churchillChuPlateFlux} }

// McAdamsPlateVertical returns McAdams's correlation for natural convection from a vertical plate,
//
//	Nu = 0.59 Ra^(1/4), Ra < 1e9
//	Nu = 0.10 Ra^(1/3), Ra ≥ 1e9
//
// for Ra 1e4 to 1e13, with the properties at the film temperature.
func McAdamsPlateVertical() Correlation { return Correlation{&mcAdamsPlateVertical} }

// LeFevrePlateLocal returns Le Fevre's interpolation of the similarity solution at a distance from
// the leading edge of a vertical plate,
//
//	Nu = (Gr/4)^(1/4) 0.75 Pr^(1/2) / (0.609 + 1.221 Pr^(1/2) + 1.238 Pr)^(1/4)
//
// for Ra 1e4 to 1e9 and Pr above 0, with the properties at the film temperature. It gives the local
// number.
func LeFevrePlateLocal() Correlation { return Correlation{&leFevrePlateLocal} }

// LeFevrePlate returns the mean of Le Fevre's interpolation for a vertical plate,
//
//	Nu = 4/3 (Gr/4)^(1/4) 0.75 Pr^(1/2) / (0.609 + 1.221 Pr^(1/2) + 1.238 Pr)^(1/4)
//
// for Ra 1e4 to 1e9 and Pr above 0, with the properties at the film temperature.
func LeFevrePlate() Correlation { return Correlation{&leFevrePlate} }

// EckertPlateLocal returns Eckert's integral method at a distance from the leading edge of a
// vertical plate,
//
//	Nu = 0.508 Pr^(1/2) (0.952 + Pr)^(-1/4) Gr^(1/4)
//
// for Ra 1e4 to 1e9 and Pr above 0, with the properties at the film temperature. It gives the local
// number.
func EckertPlateLocal() Correlation { return Correlation{&eckertPlateLocal} }

// VlietPlateFluxLocal returns the laminar correlation of Vliet and Liu at a distance from the
// leading edge of a vertical plate of uniform flux,
//
//	Nu = 0.60 Ra*^(1/5)
//
// for flux Ra 1e5 to 1e11 and Pr 1.7 to 13, with the properties at the film temperature. It gives
// the local number.
func VlietPlateFluxLocal() Correlation { return Correlation{&vlietPlateFluxLocal} }

// VlietPlateFluxTurbulent returns the turbulent correlation of Vliet and Liu at a distance from the
// leading edge of a vertical plate of uniform flux,
//
//	Nu = 0.17 Ra*^(1/4)
//
// for flux Ra 2e13 to 1e16 and Pr 1.7 to 13, with the properties at the film temperature. It gives
// the local number.
func VlietPlateFluxTurbulent() Correlation { return Correlation{&vlietPlateFluxTurbulent} }

var churchillChuPlate = record{
	name:      "Churchill and Chu vertical plate, natural",
	body:      "vertical plate",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = (0.825 + 0.387 Ra^(1/6) / (1 + (0.492/Pr)^(9/16))^(8/27))²",
	length:    "height",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "0.1", "1e12"), positive(Prandtl)},
	scatter:   Scatter{0.20, "from memory, 15 to 20 %"},
	citation:  "S. W. Churchill and H. H. S. Chu, Correlating equations for laminar and turbulent free convection from a vertical plate, Int. J. Heat Mass Transfer 18 (1975) 1323-1329",
	status:    ReadOnPage,
	evidence:  "encyclopaedia article on the heat transfer coefficient, tickerdossier.com (formula); the range is from memory",
	nu:        func(g Groups) float64 { return churchillChu(0.825, 0.492, g.Ra, g.Pr) },
}

var churchillChuPlateLaminar = record{
	name:      "Churchill and Chu vertical plate, natural, laminar",
	body:      "vertical plate",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 0.68 + 0.670 Ra^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)",
	length:    "height",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "0", "1e9"), positive(Prandtl)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "S. W. Churchill and H. H. S. Chu, Correlating equations for laminar and turbulent free convection from a vertical plate, Int. J. Heat Mass Transfer 18 (1975) 1323-1329",
	status:    ReadOnPage,
	evidence:  "encyclopaedia article on the heat transfer coefficient, tickerdossier.com; another page prints 0.663, a misprint",
	note:      "the form for all Ra lies 33 to 39 % above at Ra 1e9; never change from one to the other at a threshold",
	nu:        func(g Groups) float64 { return churchillChuLaminar(g.Ra, g.Pr) },
}

var churchillChuPlateFlux = record{
	name:      "Churchill and Chu vertical plate, natural, uniform flux",
	body:      "vertical plate, uniform flux",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = (0.825 + 0.387 Ra^(1/6) / (1 + (0.437/Pr)^(9/16))^(8/27))²",
	length:    "height",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "0.1", "1e12"), positive(Prandtl)},
	scatter:   Scatter{0.20, "from memory, 15 to 20 %"},
	citation:  "S. W. Churchill and H. H. S. Chu, Correlating equations for laminar and turbulent free convection from a vertical plate, Int. J. Heat Mass Transfer 18 (1975) 1323-1329",
	status:    FromMemory,
	evidence:  recalled,
	note:      "with the mean difference of temperatures, or that at half height",
	nu:        func(g Groups) float64 { return churchillChu(0.825, 0.437, g.Ra, g.Pr) },
}

var mcAdamsPlateVertical = record{
	name:      "McAdams vertical plate, natural",
	body:      "vertical plate",
	regime:    Natural,
	formula:   "Nu = 0.59 Ra^(1/4), Ra < 1e9; Nu = 0.10 Ra^(1/3), Ra ≥ 1e9",
	length:    "height",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e13")},
	scatter:   Scatter{0.20, usualAnyNatural},
	citation:  "W. H. McAdams, Heat Transmission, 3rd ed., McGraw-Hill, 1954, with C. Y. Warner and V. S. Arpaci, and F. J. Bayley, for the turbulent part",
	status:    ReadOnPage,
	evidence:  "Free convection, engineer's notes, vivek-s.com",
	note:      "jumps by -4.7 % at Ra 1e9",
	nu: func(g Groups) float64 {
		if g.Ra < 1e9 {
			return 0.59 * quarter(g.Ra)
		}
		return 0.10 * cubeRoot(g.Ra)
	},
}

var leFevrePlateLocal = record{
	name:      "Le Fevre vertical plate, natural, laminar, local",
	body:      "vertical plate",
	regime:    Natural,
	kind:      Local,
	formula:   "Nu = (Gr/4)^(1/4) 0.75 Pr^(1/2) / (0.609 + 1.221 Pr^(1/2) + 1.238 Pr)^(1/4)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), positive(Prandtl)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "E. J. Le Fevre, Laminar free convection from a vertical plane surface, 9th Int. Congr. Appl. Mech. 4 (1956) 168-174",
	status:    FromMemory,
	evidence:  "recalled; engineer's notebook, frank-engineering-notebook.pages.dev, free and mixed convection prints Pr^(1/4), with which the similarity solution is not met; 0.5 % from it with Pr^(1/2)",
	note:      "the lower limit of Ra is our own choice",
	nu:        func(g Groups) float64 { return leFevre(g.Ra, g.Pr) },
}

var leFevrePlate = record{
	name:      "Le Fevre vertical plate, natural, laminar",
	body:      "vertical plate",
	regime:    Natural,
	formula:   "Nu = 4/3 (Gr/4)^(1/4) 0.75 Pr^(1/2) / (0.609 + 1.221 Pr^(1/2) + 1.238 Pr)^(1/4)",
	length:    "height",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), positive(Prandtl)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "E. J. Le Fevre, Laminar free convection from a vertical plane surface, 9th Int. Congr. Appl. Mech. 4 (1956) 168-174",
	status:    FromMemory,
	evidence:  recalled,
	note:      "4/3 of the local one at the trailing edge; the lower limit of Ra is our own choice",
	nu:        func(g Groups) float64 { return 4.0 / 3 * leFevre(g.Ra, g.Pr) },
}

var eckertPlateLocal = record{
	name:      "Eckert vertical plate, natural, laminar, local",
	body:      "vertical plate",
	regime:    Natural,
	kind:      Local,
	formula:   "Nu = 0.508 Pr^(1/2) (0.952 + Pr)^(-1/4) Gr^(1/4)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), positive(Prandtl)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "E. R. G. Eckert, Introduction to the Transfer of Heat and Mass, McGraw-Hill, 1950",
	status:    ReadOnPage,
	evidence:  "engineer's notebook, frank-engineering-notebook.pages.dev, free and mixed convection, as the thickness of the boundary layer",
	note:      "the mean is 4/3 of it; the limits of Ra are our own choice",
	nu:        func(g Groups) float64 { return 0.508 * math.Sqrt(g.Pr) * quarter(g.Ra/g.Pr/(0.952+g.Pr)) },
}

var vlietPlateFluxLocal = record{
	name:      "Vliet and Liu vertical plate, natural, laminar, uniform flux, local",
	body:      "vertical plate, uniform flux",
	regime:    Natural,
	kind:      Local,
	formula:   "Nu = 0.60 Ra*^(1/5)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(FluxRayleigh, "1e5", "1e11"), within(Prandtl, "1.7", "13")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "G. C. Vliet and C. K. Liu, An experimental study of turbulent natural convection boundary layers, J. Heat Transfer 91 (1969) 517-531",
	status:    FromMemory,
	evidence:  recalled,
	note:      "a value for water: the similarity solution has 0.519 at Pr 0.7 and 0.620 at Pr 100 in place of 0.60; the mean is 1.25 times it; 31 % below the turbulent one at Ra* 2e13; the range of Pr is that of liquid water, our own choice",
	nu:        func(g Groups) float64 { return 0.60 * power(g.FluxRa, 0.2) },
}

var vlietPlateFluxTurbulent = record{
	name:      "Vliet and Liu vertical plate, natural, turbulent, uniform flux, local",
	body:      "vertical plate, uniform flux",
	regime:    Natural,
	kind:      Local,
	formula:   "Nu = 0.17 Ra*^(1/4)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(FluxRayleigh, "2e13", "1e16"), within(Prandtl, "1.7", "13")},
	scatter:   Scatter{0.30, usualTurbulent},
	citation:  "G. C. Vliet and C. K. Liu, An experimental study of turbulent natural convection boundary layers, J. Heat Transfer 91 (1969) 517-531",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the mean is the same, since the coefficient does not vary; the range of Pr is that of liquid water, our own choice",
	nu:        func(g Groups) float64 { return 0.17 * quarter(g.FluxRa) },
}

// leFevre is (Gr/4)^(1/4) 0.75 Pr^(1/2) / (0.609 + 1.221 Pr^(1/2) + 1.238 Pr)^(1/4).
func leFevre(ra, pr float64) float64 {
	root := math.Sqrt(pr)
	return 0.75 * root * quarter(ra/pr/4/(0.609+1.221*root+1.238*pr))
}

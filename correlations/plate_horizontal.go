package correlations

import "math"

// HorizontalPlateUp returns the correlation of McAdams and of Lloyd and Moran for a horizontal
// plate with its hot face up, or its cold face down,
//
//	Nu = 0.54 Ra^(1/4), Ra < 1e7
//	Nu = 0.15 Ra^(1/3), Ra ≥ 1e7
//
// for Ra 1e4 to 1e11 and Pr from 0.7 up, with the properties at the film temperature.
func HorizontalPlateUp() Correlation { return Correlation{&horizontalPlateUp} }

// McAdamsPlateDown returns McAdams's correlation for a horizontal plate with its hot face down, or
// its cold face up,
//
//	Nu = 0.27 Ra^(1/4)
//
// for Ra 1e5 to 1e10 and Pr from 0.7 up, with the properties at the film temperature.
func McAdamsPlateDown() Correlation { return Correlation{&mcAdamsPlateDown} }

// RadziemskaPlateDown returns the correlation of Radziemska and Lewandowski for a horizontal plate
// with its hot face down, or its cold face up,
//
//	Nu = 0.52 Ra^(1/5)
//
// for Ra 1e4 to 1e9 and Pr from 0.7 up, with the properties at the film temperature.
func RadziemskaPlateDown() Correlation { return Correlation{&radziemskaPlateDown} }

// GoldsteinPlateUp returns the correlation of Goldstein, Sparrow and Jones for a small horizontal
// plate with its hot face up,
//
//	Nu = 0.96 Ra^(1/6), Ra < 200
//	Nu = 0.59 Ra^(1/4), Ra ≥ 200
//
// for Ra 1 to 1e4 and Pr from 0.7 up, with the properties at the film temperature.
func GoldsteinPlateUp() Correlation { return Correlation{&goldsteinPlateUp} }

// FujiiImuraPlateFluxDown returns the correlation of Fujii and Imura for a horizontal plate of
// uniform flux with its hot face down,
//
//	Nu = 0.58 Ra^(1/5)
//
// for Ra 1e6 to 1e11 and Pr from 0.7 up, with the properties at the wall temperature less a quarter
// of the difference to the stream.
func FujiiImuraPlateFluxDown() Correlation { return Correlation{&fujiiImuraPlateFluxDown} }

// FujiiImuraPlateFluxUp returns the correlation of Fujii and Imura for a horizontal plate of
// uniform flux with its hot face up,
//
//	Nu = 0.13 Ra^(1/3), Ra < 2e8
//	Nu = 0.16 Ra^(1/3), Ra ≥ 2e8
//
// for Ra 1e6 to 1e11 and Pr from 0.7 up, with the properties at the wall temperature less a quarter
// of the difference to the stream.
func FujiiImuraPlateFluxUp() Correlation { return Correlation{&fujiiImuraPlateFluxUp} }

var horizontalPlateUp = record{
	name:      "horizontal plate, natural, hot face up",
	body:      "horizontal plate, hot face up",
	regime:    Natural,
	formula:   "Nu = 0.54 Ra^(1/4), Ra < 1e7; Nu = 0.15 Ra^(1/3), Ra ≥ 1e7",
	length:    "surface over perimeter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e11"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.20, usualAnyNatural},
	citation:  "W. H. McAdams, Heat Transmission, 3rd ed., McGraw-Hill, 1954; J. R. Lloyd and W. R. Moran, Natural convection adjacent to horizontal surface of various planforms, J. Heat Transfer 96 (1974) 443-447",
	status:    ReadOnPage,
	evidence:  "Free convection, engineer's notes, vivek-s.com",
	note:      "jumps by 6.4 % at Ra 1e7; McAdams's own length was the side, with which the numbers differ",
	nu: func(g Groups) float64 {
		if g.Ra < 1e7 {
			return 0.54 * quarter(g.Ra)
		}
		return 0.15 * cubeRoot(g.Ra)
	},
}

var mcAdamsPlateDown = record{
	name:      "McAdams horizontal plate, natural, hot face down",
	body:      "horizontal plate, hot face down",
	regime:    Natural,
	formula:   "Nu = 0.27 Ra^(1/4)",
	length:    "surface over perimeter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e5", "1e10"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.30, "own choice: it lies 46 % above Radziemska and Lewandowski at Ra 1e9 and 8 % below at 1e5"},
	citation:  "W. H. McAdams, Heat Transmission, 3rd ed., McGraw-Hill, 1954",
	status:    ReadOnPage,
	evidence:  "Free convection, engineer's notes, vivek-s.com; Mechanical Engineer's Data Handbook, p. 134, has 0.25",
	note:      "Pr from 0.7 is our own choice",
	nu:        func(g Groups) float64 { return 0.27 * quarter(g.Ra) },
}

var radziemskaPlateDown = record{
	name:      "Radziemska and Lewandowski horizontal plate, natural, hot face down",
	body:      "horizontal plate, hot face down",
	regime:    Natural,
	formula:   "Nu = 0.52 Ra^(1/5)",
	length:    "surface over perimeter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1e4", "1e9"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.30, "own choice: McAdams lies 46 % above at Ra 1e9 and 8 % below at 1e5"},
	citation:  "E. Radziemska and W. M. Lewandowski, Heat transfer by natural convection from an isothermal downward-facing round plate in unlimited space, Applied Energy 68 (2001) 347-366",
	status:    ReadOnPage,
	evidence:  "Free convection, engineer's notes, vivek-s.com (formula; the page has Ra 1e5 to 1e10, the range here is from memory)",
	nu:        func(g Groups) float64 { return 0.52 * power(g.Ra, 0.2) },
}

var goldsteinPlateUp = record{
	name:      "Goldstein, Sparrow and Jones horizontal plate, natural, hot face up",
	body:      "horizontal plate, hot face up",
	regime:    Natural,
	formula:   "Nu = 0.96 Ra^(1/6), Ra < 200; Nu = 0.59 Ra^(1/4), Ra ≥ 200",
	length:    "surface over perimeter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "1", "1e4"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "R. J. Goldstein, E. M. Sparrow and D. C. Jones, Natural convection mass transfer adjacent to horizontal plates, Int. J. Heat Mass Transfer 16 (1973) 1025-1035",
	status:    FromMemory,
	evidence:  recalled,
	note:      "measured with naphthalene, Sc 2.5; the range of Pr is our own choice; jumps by -4.4 % at Ra 200 and lies 9 % above the plate of McAdams at 1e4; below Ra 1 the conduction limit of the plate counts",
	nu: func(g Groups) float64 {
		if g.Ra < 200 {
			return 0.96 * cubeRoot(math.Sqrt(g.Ra))
		}
		return 0.59 * quarter(g.Ra)
	},
}

var fujiiImuraPlateFluxDown = record{
	name:      "Fujii and Imura horizontal plate, natural, uniform flux, hot face down",
	body:      "horizontal plate, hot face down, uniform flux",
	regime:    Natural,
	formula:   "Nu = 0.58 Ra^(1/5)",
	length:    "short side",
	reference: QuarterToStream,
	ranges:    []Range{within(Rayleigh, "1e6", "1e11"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.20, usualAnyNatural},
	citation:  "T. Fujii and H. Imura, Natural-convection heat transfer from a plate with arbitrary inclination, Int. J. Heat Mass Transfer 15 (1972) 755-767",
	status:    FromMemory,
	evidence:  recalled,
	note:      "which length is meant is not certain: the short side, or surface over perimeter; Pr from 0.7 is our own choice",
	nu:        func(g Groups) float64 { return 0.58 * power(g.Ra, 0.2) },
}

var fujiiImuraPlateFluxUp = record{
	name:      "Fujii and Imura horizontal plate, natural, uniform flux, hot face up",
	body:      "horizontal plate, hot face up, uniform flux",
	regime:    Natural,
	formula:   "Nu = 0.13 Ra^(1/3), Ra < 2e8; Nu = 0.16 Ra^(1/3), Ra ≥ 2e8",
	length:    "short side",
	reference: QuarterToStream,
	ranges:    []Range{within(Rayleigh, "1e6", "1e11"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.30, usualTurbulent},
	citation:  "T. Fujii and H. Imura, Natural-convection heat transfer from a plate with arbitrary inclination, Int. J. Heat Mass Transfer 15 (1972) 755-767",
	status:    FromMemory,
	evidence:  recalled,
	note:      "jumps by 23 % at Ra 2e8; which length is meant is not certain: the short side, or surface over perimeter; Pr from 0.7 and Ra from 1e6 are our own choice",
	nu: func(g Groups) float64 {
		if g.Ra < 2e8 {
			return 0.13 * cubeRoot(g.Ra)
		}
		return 0.16 * cubeRoot(g.Ra)
	},
}

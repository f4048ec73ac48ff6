package correlations

import "math"

// BarCohenChannel returns the correlation of Bar-Cohen and Rohsenow for an open vertical channel
// between two plates of the same temperature,
//
//	Nu = (576/El² + 2.873/El^(1/2))^(-1/2), El = Ra gap/height
//
// for Ra over slenderness up to 1e5 and Pr about 0.7, with the properties at the film temperature.
func BarCohenChannel() Correlation { return Correlation{&barCohenChannel} }

// BarCohenChannelOneSide returns the correlation of Bar-Cohen and Rohsenow for an open vertical
// channel between a heated plate and an adiabatic one,
//
//	Nu = (144/El² + 2.873/El^(1/2))^(-1/2), El = Ra gap/height
//
// for Ra over slenderness up to 1e5 and Pr about 0.7, with the properties at the film temperature.
func BarCohenChannelOneSide() Correlation { return Correlation{&barCohenChannelOneSide} }

// BarCohenChannelFlux returns the correlation of Bar-Cohen and Rohsenow for the exit of an open
// vertical channel between two plates of uniform flux,
//
//	Nu = (48/El* + 2.51/El*^(2/5))^(-1/2), El* = Ra* gap/height
//
// for flux Ra over slenderness up to 1e5 and Pr about 0.7, with the properties at the film
// temperature. It gives the local number.
func BarCohenChannelFlux() Correlation { return Correlation{&barCohenChannelFlux} }

// BarCohenChannelFluxOneSide returns the correlation of Bar-Cohen and Rohsenow for the exit of an
// open vertical channel between a plate of uniform flux and an insulated one,
//
//	Nu = (24/El* + 2.51/El*^(2/5))^(-1/2), El* = Ra* gap/height
//
// for flux Ra over slenderness up to 1e5 and Pr about 0.7, with the properties at the film
// temperature. It gives the local number.
func BarCohenChannelFluxOneSide() Correlation { return Correlation{&barCohenChannelFluxOneSide} }

// BarCohenChannelFluxMiddle returns the correlation of Bar-Cohen and Rohsenow for half height of an
// open vertical channel between two plates of uniform flux,
//
//	Nu = (12/El* + 1.88/El*^(2/5))^(-1/2), El* = Ra* gap/height
//
// for flux Ra over slenderness up to 1e5 and Pr about 0.7, with the properties at the film
// temperature. It gives the local number.
func BarCohenChannelFluxMiddle() Correlation { return Correlation{&barCohenChannelFluxMiddle} }

// ElenbaasChannel returns Elenbaas's correlation for an open vertical channel between two plates of
// the same temperature,
//
//	Nu = El/24 (1 - exp(-35/El))^(3/4), El = Ra gap/height
//
// for Ra over slenderness 0.1 to 1e5 and Pr about 0.7, with the properties at the film temperature.
func ElenbaasChannel() Correlation { return Correlation{&elenbaasChannel} }

var barCohenChannel = record{
	name:      "Bar-Cohen and Rohsenow channel, both walls",
	body:      "vertical channel",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = (576/El² + 2.873/El^(1/2))^(-1/2), El = Ra gap/height",
	length:    "gap",
	reference: FilmTemperature,
	ranges:    []Range{within(ChannelRayleigh, "0", "1e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "A. Bar-Cohen and W. M. Rohsenow, Thermally optimum spacing of vertical, natural convection cooled, parallel plates, J. Heat Transfer 106 (1984) 116-123",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 387, table 1",
	note:      "for air; the range of El is that of the data of Elenbaas; tends to El/24 and to 0.59 El^(1/4)",
	nu:        func(g Groups) float64 { return barCohen(g.Ra, g.Slenderness, 576) },
}

var barCohenChannelOneSide = record{
	name:      "Bar-Cohen and Rohsenow channel, one wall adiabatic",
	body:      "vertical channel, one wall adiabatic",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = (144/El² + 2.873/El^(1/2))^(-1/2), El = Ra gap/height",
	length:    "gap",
	reference: FilmTemperature,
	ranges:    []Range{within(ChannelRayleigh, "0", "1e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "A. Bar-Cohen and W. M. Rohsenow, Thermally optimum spacing of vertical, natural convection cooled, parallel plates, J. Heat Transfer 106 (1984) 116-123",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 387, table 1",
	note:      "for air; the range of El is that of the data of Elenbaas; tends to El/12 and to 0.59 El^(1/4)",
	nu:        func(g Groups) float64 { return barCohen(g.Ra, g.Slenderness, 144) },
}

var barCohenChannelFlux = record{
	name:      "Bar-Cohen and Rohsenow channel, both walls, uniform flux",
	body:      "vertical channel, uniform flux",
	regime:    Natural,
	kind:      Local,
	driver:    byFlux,
	formula:   "Nu = (48/El* + 2.51/El*^(2/5))^(-1/2), El* = Ra* gap/height",
	length:    "gap",
	reference: FilmTemperature,
	ranges:    []Range{within(ChannelFluxRayleigh, "0", "1e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "A. Bar-Cohen and W. M. Rohsenow, Thermally optimum spacing of vertical, natural convection cooled, parallel plates, J. Heat Transfer 106 (1984) 116-123",
	status:    FromMemory,
	evidence:  "recalled; 48 follows from the limit (El*/48)^(1/2), which was read in Mechanical Engineers' Handbook, vol. 4, p. 387, table 1",
	note:      "for air; on the temperature at the exit; the upper limit of El* is our own choice",
	nu:        func(g Groups) float64 { return barCohenFlux(g.FluxRa, g.Slenderness, 48, 2.51) },
}

var barCohenChannelFluxOneSide = record{
	name:      "Bar-Cohen and Rohsenow channel, one wall insulated, uniform flux",
	body:      "vertical channel, one wall insulated, uniform flux",
	regime:    Natural,
	kind:      Local,
	driver:    byFlux,
	formula:   "Nu = (24/El* + 2.51/El*^(2/5))^(-1/2), El* = Ra* gap/height",
	length:    "gap",
	reference: FilmTemperature,
	ranges:    []Range{within(ChannelFluxRayleigh, "0", "1e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "A. Bar-Cohen and W. M. Rohsenow, Thermally optimum spacing of vertical, natural convection cooled, parallel plates, J. Heat Transfer 106 (1984) 116-123",
	status:    FromMemory,
	evidence:  "recalled; 24 follows from the limit (El*/24)^(1/2), which was read in Mechanical Engineers' Handbook, vol. 4, p. 387, table 1",
	note:      "for air; on the temperature at the exit; the upper limit of El* is our own choice",
	nu:        func(g Groups) float64 { return barCohenFlux(g.FluxRa, g.Slenderness, 24, 2.51) },
}

var barCohenChannelFluxMiddle = record{
	name:      "Bar-Cohen and Rohsenow channel, both walls, uniform flux, half height",
	body:      "vertical channel, uniform flux",
	regime:    Natural,
	kind:      Local,
	driver:    byFlux,
	formula:   "Nu = (12/El* + 1.88/El*^(2/5))^(-1/2), El* = Ra* gap/height",
	length:    "gap",
	reference: FilmTemperature,
	ranges:    []Range{within(ChannelFluxRayleigh, "0", "1e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "A. Bar-Cohen and W. M. Rohsenow, Thermally optimum spacing of vertical, natural convection cooled, parallel plates, J. Heat Transfer 106 (1984) 116-123",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 387, table 1",
	note:      "for air; on the temperature at half height; the upper limit of El* is our own choice",
	nu:        func(g Groups) float64 { return barCohenFlux(g.FluxRa, g.Slenderness, 12, 1.88) },
}

var elenbaasChannel = record{
	name:      "Elenbaas channel",
	body:      "vertical channel",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = El/24 (1 - exp(-35/El))^(3/4), El = Ra gap/height",
	length:    "gap",
	reference: FilmTemperature,
	ranges:    []Range{within(ChannelRayleigh, "0.1", "1e5"), within(Prandtl, "0.7", "0.7")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "W. Elenbaas, Heat dissipation of parallel plates by free convection, Physica 9 (1942) 1-28",
	status:    FromMemory,
	evidence:  "recalled; its limits are those of Bar-Cohen and Rohsenow",
	note:      "for air",
	nu: func(g Groups) float64 {
		el := over(g.Ra, g.Slenderness)
		if el == 0 {
			return 0
		}
		root := math.Sqrt(-math.Expm1(-35 / el))
		return el / 24 * root * math.Sqrt(root)
	},
}

// barCohen is (c/El² + 2.873/El^(1/2))^(-1/2), multiplied out so that it holds at El = 0.
func barCohen(ra, slenderness, c float64) float64 {
	el := over(ra, slenderness)
	return el / math.Sqrt(c+2.873*el*math.Sqrt(el))
}

// barCohenFlux is (c1/El + c2/El^(2/5))^(-1/2), multiplied out so that it holds at El = 0.
func barCohenFlux(ra, slenderness, c1, c2 float64) float64 {
	el := over(ra, slenderness)
	return math.Sqrt(el / (c1 + c2*power(el, 0.6)))
}

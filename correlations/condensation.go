package correlations

import "math"

// NusseltPlate returns Nusselt's solution for a film of condensate on a vertical plate,
//
//	Nu = 0.943 N^(1/4), N the film number
//
// for a film number above 0, with the properties at the mean of wall and saturation.
func NusseltPlate() Correlation { return Correlation{&nusseltPlate} }

// NusseltCylinder returns Nusselt's solution for a film of condensate on a horizontal tube,
//
//	Nu = 0.729 N^(1/4), N the film number
//
// for a film number above 0, with the properties at the mean of wall and saturation.
func NusseltCylinder() Correlation { return Correlation{&nusseltCylinder} }

// NusseltSphere returns Nusselt's solution for a film of condensate on a sphere,
//
//	Nu = 0.826 N^(1/4), N the film number
//
// for a film number above 0, with the properties at the mean of wall and saturation.
func NusseltSphere() Correlation { return Correlation{&nusseltSphere} }

// WavyFilmPlate returns the mean correlation for a wavy film of condensate on a vertical plate,
//
//	Nu = Re / (1.08 Re^1.22 - 5.2)
//
// for Re 30 to 1800, with the properties at the mean of wall and saturation.
func WavyFilmPlate() Correlation { return Correlation{&wavyFilmPlate} }

// TurbulentFilmPlate returns the mean correlation for a turbulent film of condensate on a vertical
// plate,
//
//	Nu = Re / (8750 + 58 Pr^(-1/2) (Re^0.75 - 253))
//
// for Re from 1800 up and Pr from 1 up, with the properties at the mean of wall and saturation.
func TurbulentFilmPlate() Correlation { return Correlation{&turbulentFilmPlate} }

var nusseltPlate = record{
	name:      "Nusselt vertical plate, condensation",
	body:      "vertical plate",
	regime:    Condensing,
	formula:   "Nu = 0.943 N^(1/4), N the film number",
	length:    "height",
	reference: LiquidFilm,
	ranges:    []Range{positive(FilmRayleigh)},
	scatter:   Scatter{0.20, usualFilm},
	citation:  "W. Nusselt, Die Oberflächenkondensation des Wasserdampfes, VDI-Z. 60 (1916) 541-546, with the heat of vaporisation after W. M. Rohsenow 1956",
	status:    FromMemory,
	evidence:  "recalled; the exact integration has 0.942809",
	note:      "h is the heat of vaporisation plus 0.68 cp ΔT of the liquid; pure vapour at rest; laminar to a film Re of 30",
	nu:        func(g Groups) float64 { return 0.943 * quarter(g.FilmRa) },
}

var nusseltCylinder = record{
	name:      "Nusselt horizontal cylinder, condensation",
	body:      "horizontal cylinder",
	regime:    Condensing,
	formula:   "Nu = 0.729 N^(1/4), N the film number",
	length:    "diameter",
	reference: LiquidFilm,
	ranges:    []Range{positive(FilmRayleigh)},
	scatter:   Scatter{0.20, usualFilm},
	citation:  "W. Nusselt, Die Oberflächenkondensation des Wasserdampfes, VDI-Z. 60 (1916) 541-546, with the heat of vaporisation after W. M. Rohsenow 1956",
	status:    FromMemory,
	evidence:  "recalled; the exact integration has 0.728019",
	note:      "h is the heat of vaporisation plus 0.68 cp ΔT of the liquid; pure vapour at rest; laminar to a film Re of 30; for n tubes below each other multiply by n^(-1/4)",
	nu:        func(g Groups) float64 { return 0.729 * quarter(g.FilmRa) },
}

var nusseltSphere = record{
	name:      "Nusselt sphere, condensation",
	body:      "sphere",
	regime:    Condensing,
	formula:   "Nu = 0.826 N^(1/4), N the film number",
	length:    "diameter",
	reference: LiquidFilm,
	ranges:    []Range{positive(FilmRayleigh)},
	scatter:   Scatter{0.20, usualFilm},
	citation:  "W. Nusselt, Die Oberflächenkondensation des Wasserdampfes, VDI-Z. 60 (1916) 541-546, with the heat of vaporisation after W. M. Rohsenow 1956",
	status:    FromMemory,
	evidence:  "recalled; the exact integration has 0.828210",
	note:      "h is the heat of vaporisation plus 0.68 cp ΔT of the liquid; pure vapour at rest; laminar to a film Re of 30; older books have 0.815",
	nu:        func(g Groups) float64 { return 0.826 * quarter(g.FilmRa) },
}

var wavyFilmPlate = record{
	name:      "wavy film on a vertical plate, condensation",
	body:      "vertical plate",
	regime:    Condensing,
	formula:   "Nu = Re / (1.08 Re^1.22 - 5.2)",
	length:    "(ν²/g)^(1/3); Re is four times the flow of condensate per width over its viscosity",
	reference: LiquidFilm,
	ranges:    []Range{within(Reynolds, "30", "1800")},
	scatter:   Scatter{0.20, usualFilm},
	citation:  "S. S. Kutateladze, Fundamentals of Heat Transfer, Academic Press, 1963",
	status:    FromMemory,
	evidence:  recalled,
	note:      "joins the laminar film to 0.2 % at Re 30",
	nu:        func(g Groups) float64 { return g.Re / (1.08*power(g.Re, 1.22) - 5.2) },
}

var turbulentFilmPlate = record{
	name:      "turbulent film on a vertical plate, condensation",
	body:      "vertical plate",
	regime:    Condensing,
	formula:   "Nu = Re / (8750 + 58 Pr^(-1/2) (Re^0.75 - 253))",
	length:    "(ν²/g)^(1/3); Re is four times the flow of condensate per width over its viscosity",
	reference: LiquidFilm,
	ranges:    []Range{within(Reynolds, "1800", open), within(Prandtl, "1", open)},
	scatter:   Scatter{0.20, usualFilm},
	citation:  "D. A. Labuntsov, Heat transfer in film condensation of pure steam on vertical surfaces and horizontal tubes, Teploenergetika 4 (1957) 72-80",
	status:    FromMemory,
	evidence:  recalled,
	note:      "3 % above the wavy film at Re 1800, Pr 1.76; Pr from 1 is our own choice",
	nu:        func(g Groups) float64 { return g.Re / (8750 + 58/math.Sqrt(g.Pr)*(power(g.Re, 0.75)-253)) },
}

package correlations

// BromleyCylinder returns Bromley's correlation for film boiling on a horizontal cylinder,
//
//	Nu = 0.62 N^(1/4), N the film number
//
// for a film number above 0, with the properties at the mean of wall and saturation.
func BromleyCylinder() Correlation { return Correlation{&bromleyCylinder} }

// BromleySphere returns Bromley's correlation for film boiling on a sphere,
//
//	Nu = 0.67 N^(1/4), N the film number
//
// for a film number above 0, with the properties at the mean of wall and saturation.
func BromleySphere() Correlation { return Correlation{&bromleySphere} }

// BerensonPlate returns Berenson's correlation for film boiling on a horizontal plate,
//
//	Nu = 0.425 N^(1/4), N the film number
//
// for a film number above 0, with the properties at the mean of wall and saturation.
func BerensonPlate() Correlation { return Correlation{&berensonPlate} }

// FrederkingClarkSphere returns the correlation of Frederking and Clark for film boiling with a
// turbulent film on a large sphere,
//
//	Nu = 0.15 N^(1/3), N the film number
//
// for a film number from 5e7 up, with the properties at the mean of wall and saturation.
func FrederkingClarkSphere() Correlation { return Correlation{&frederkingClarkSphere} }

var bromleyCylinder = record{
	name:      "Bromley horizontal cylinder, film boiling",
	body:      "horizontal cylinder",
	regime:    Boiling,
	formula:   "Nu = 0.62 N^(1/4), N the film number",
	length:    "diameter",
	reference: VapourFilm,
	ranges:    []Range{positive(FilmRayleigh)},
	scatter:   Scatter{0.15, "from memory"},
	citation:  "L. A. Bromley, Heat transfer in stable film boiling, Chem. Eng. Prog. 46 (1950) 221-227",
	status:    FromMemory,
	evidence:  recalled,
	note:      "h is the heat of vaporisation plus 0.80 cp ΔT of the vapour; Bromley's own 0.4 to 0.5 in place of 0.80; without radiation; for a diameter near the Taylor wavelength",
	nu:        func(g Groups) float64 { return 0.62 * quarter(g.FilmRa) },
}

var bromleySphere = record{
	name:      "Bromley sphere, film boiling",
	body:      "sphere",
	regime:    Boiling,
	formula:   "Nu = 0.67 N^(1/4), N the film number",
	length:    "diameter",
	reference: VapourFilm,
	ranges:    []Range{positive(FilmRayleigh)},
	scatter:   Scatter{0.15, "from memory"},
	citation:  "L. A. Bromley, Heat transfer in stable film boiling, Chem. Eng. Prog. 46 (1950) 221-227",
	status:    ReadOnPage,
	evidence:  "worked solution of a textbook problem, a sphere of 20 mm at 500 °C, pastebin.com",
	note:      "h is the heat of vaporisation plus 0.80 cp ΔT of the vapour; without radiation",
	nu:        func(g Groups) float64 { return 0.67 * quarter(g.FilmRa) },
}

var berensonPlate = record{
	name:      "Berenson plate, film boiling",
	body:      "horizontal plate, hot face up",
	regime:    Boiling,
	formula:   "Nu = 0.425 N^(1/4), N the film number",
	length:    "(σ/(g (ρ liquid - ρ vapour)))^(1/2)",
	reference: VapourFilm,
	ranges:    []Range{positive(FilmRayleigh)},
	scatter:   Scatter{0.15, "from memory"},
	citation:  "P. J. Berenson, Film-boiling heat transfer from a horizontal surface, J. Heat Transfer 83 (1961) 351-358",
	status:    FromMemory,
	evidence:  recalled,
	note:      "h is the heat of vaporisation plus 0.5 cp ΔT of the vapour; without radiation",
	nu:        func(g Groups) float64 { return 0.425 * quarter(g.FilmRa) },
}

var frederkingClarkSphere = record{
	name:      "Frederking and Clark sphere, turbulent film boiling",
	body:      "sphere",
	regime:    Boiling,
	formula:   "Nu = 0.15 N^(1/3), N the film number",
	length:    "diameter",
	reference: VapourFilm,
	ranges:    []Range{within(FilmRayleigh, "5e7", open)},
	scatter:   Scatter{0.30, "own choice"},
	citation:  "T. H. K. Frederking and J. A. Clark, Natural convection film boiling on a sphere, Adv. Cryog. Eng. 8 (1963) 501-506",
	status:    FromMemory,
	evidence:  recalled,
	note:      "h is the heat of vaporisation plus 0.4 cp ΔT of the vapour; without radiation",
	nu:        func(g Groups) float64 { return 0.15 * cubeRoot(g.FilmRa) },
}

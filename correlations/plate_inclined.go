package correlations

import "math"

// ChurchillChuPlateInclined returns the laminar correlation of Churchill and Chu for an inclined
// plate whose hot face is down, or whose cold face is up,
//
//	Nu = 0.68 + 0.670 (Ra cos θ)^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)
//
// for Ra cos(inclination) up to 1e9, Pr above 0 and an inclination up to 60°, with the properties
// at the film temperature.
func ChurchillChuPlateInclined() Correlation { return Correlation{&churchillChuPlateInclined} }

// FujiiImuraPlateDown returns the correlation of Fujii and Imura for an inclined plate whose hot
// face is down, or whose cold face is up,
//
//	Nu = 0.56 (Ra cos θ)^(1/4)
//
// for Ra cos(inclination) 1e5 to 1e11 and an inclination up to 88°, with the properties at the wall
// temperature less a quarter of the difference to the stream.
func FujiiImuraPlateDown() Correlation { return Correlation{&fujiiImuraPlateDown} }

// FujiiImuraPlateUp returns the correlation of Fujii and Imura for an inclined plate whose hot face
// is up, with vortices above a Ra of transition Rc,
//
//	Nu = 0.14 (Ra^(1/3) - Rc^(1/3)) + 0.56 (Rc cos θ)^(1/4)
//	Nu = 0.56 (Ra cos θ)^(1/4), Ra ≤ Rc
//
// for Ra 1e5 to 1e11, an inclination 15 to 75° and a Ra of transition 1e6 to 5e9, with the
// properties at the wall temperature less a quarter of the difference to the stream.
func FujiiImuraPlateUp() Correlation { return Correlation{&fujiiImuraPlateUp} }

var churchillChuPlateInclined = record{
	name:      "Churchill and Chu inclined plate, natural, laminar",
	body:      "inclined plate, hot face down",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 0.68 + 0.670 (Ra cos θ)^(1/4) / (1 + (0.492/Pr)^(9/16))^(4/9)",
	length:    "length along the slope",
	reference: FilmTemperature,
	ranges:    []Range{within(InclinedRayleigh, "0", "1e9"), positive(Prandtl), within(Inclination, "0", "60")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "S. W. Churchill and H. H. S. Chu, Correlating equations for laminar and turbulent free convection from a vertical plate, Int. J. Heat Mass Transfer 18 (1975) 1323-1329; with the part of gravity along the plate",
	status:    FromMemory,
	evidence:  recalled,
	note:      "not for a hot face up, where it is low once vortices start; in turbulent flow gravity counts as a whole",
	nu:        func(g Groups) float64 { return churchillChuLaminar(max(0, g.inclined()), g.Pr) },
}

var fujiiImuraPlateDown = record{
	name:      "Fujii and Imura inclined plate, natural, hot face down",
	body:      "inclined plate, hot face down",
	regime:    Natural,
	formula:   "Nu = 0.56 (Ra cos θ)^(1/4)",
	length:    "length along the slope",
	reference: QuarterToStream,
	ranges:    []Range{within(InclinedRayleigh, "1e5", "1e11"), within(Inclination, "0", "88")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "T. Fujii and H. Imura, Natural-convection heat transfer from a plate with arbitrary inclination, Int. J. Heat Mass Transfer 15 (1972) 755-767",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the expansion coefficient at the stream plus a quarter of the difference",
	nu:        func(g Groups) float64 { return 0.56 * quarter(max(0, g.inclined())) },
}

var fujiiImuraPlateUp = record{
	name:      "Fujii and Imura inclined plate, natural, hot face up",
	body:      "inclined plate, hot face up",
	regime:    Natural,
	formula:   "Nu = 0.14 (Ra^(1/3) - Rc^(1/3)) + 0.56 (Rc cos θ)^(1/4); Nu = 0.56 (Ra cos θ)^(1/4), Ra ≤ Rc",
	length:    "length along the slope",
	reference: QuarterToStream,
	ranges: []Range{
		within(Rayleigh, "1e5", "1e11"),
		within(Inclination, "15", "75"),
		within(TransitionRayleigh, "1e6", "5e9"),
	},
	scatter:  Scatter{0.30, usualTurbulent},
	citation: "T. Fujii and H. Imura, Natural-convection heat transfer from a plate with arbitrary inclination, Int. J. Heat Mass Transfer 15 (1972) 755-767",
	status:   FromMemory,
	evidence: recalled,
	note:     "transition at 5e9, 2e9, 1e8 and 1e6 for 15, 30, 60 and 75°, which some sources print as Grashof numbers; 0.145 circulates in place of 0.14; the expansion coefficient at the stream plus a quarter of the difference",
	nu: func(g Groups) float64 {
		cos := max(0, math.Cos(g.Inclination.SI()))
		if g.Ra <= g.TransitionRa {
			return 0.56 * quarter(g.Ra*cos)
		}
		return 0.14*(cubeRoot(g.Ra)-cubeRoot(g.TransitionRa)) + 0.56*quarter(g.TransitionRa*cos)
	},
}

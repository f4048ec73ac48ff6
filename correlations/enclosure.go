package correlations

import (
	"math"

	"example.com/coolward/internal/pow"
)

// CattonEnclosureLow returns Catton's correlation for a low enclosure between a hot and a cold
// vertical wall,
//
//	Nu = max(1, 0.18 (Ra Pr/(0.2 + Pr))^0.29)
//
// for Ra Pr/(0.2 + Pr) from 1e3 up, Pr 1e-3 to 1e5 and a slenderness 1 to 2, with the properties at
// the mean of the walls.
func CattonEnclosureLow() Correlation { return Correlation{&cattonEnclosureLow} }

// CattonEnclosure returns Catton's correlation for an enclosure between a hot and a cold vertical
// wall,
//
//	Nu = max(1, 0.22 (Ra Pr/(0.2 + Pr))^0.28 (H/L)^(-1/4))
//
// for Ra 1e3 to 1e10, Pr up to 1e5 and a slenderness 2 to 10, with the properties at the mean of
// the walls.
func CattonEnclosure() Correlation { return Correlation{&cattonEnclosure} }

// MacGregorEmeryEnclosure returns the correlation of MacGregor and Emery for a tall enclosure
// between a hot and a cold vertical wall,
//
//	Nu = max(1, 0.42 Ra^(1/4) Pr^0.012 (H/L)^(-0.3))
//
// for Ra 1e4 to 1e7, Pr 1 to 2e4 and a slenderness 10 to 40, with the properties at the mean of the
// walls.
func MacGregorEmeryEnclosure() Correlation { return Correlation{&macGregorEmeryEnclosure} }

// MacGregorEmeryEnclosureTurbulent returns the turbulent correlation of MacGregor and Emery for an
// enclosure between a hot and a cold vertical wall,
//
//	Nu = 0.046 Ra^(1/3)
//
// for Ra 1e6 to 1e9, Pr 1 to 20 and a slenderness 1 to 40, with the properties at the mean of the
// walls.
func MacGregorEmeryEnclosureTurbulent() Correlation {
	return Correlation{&macGregorEmeryEnclosureTurbulent}
}

// ElSherbinyEnclosure returns the correlation of ElSherbiny, Raithby and Hollands for air between a
// hot and a cold vertical wall,
//
//	Nu = max(0.0605 Ra^(1/3), (1 + (0.104 Ra^0.293 / (1 + (6310/Ra)^1.36))³)^(1/3), 0.242 (Ra L/H)^0.272)
//
// for Ra up to 1e7, Pr about 0.7 and a slenderness 5 to 110, with the properties at the mean of the
// walls.
func ElSherbinyEnclosure() Correlation { return Correlation{&elSherbinyEnclosure} }

// GlobeDropkinLayer returns the correlation of Globe and Dropkin for a layer of liquid heated from
// below,
//
//	Nu = 0.069 Ra^(1/3) Pr^0.074
//
// for Ra 3e5 to 7e9 and Pr 0.02 to 8750, with the properties at the mean of the walls.
func GlobeDropkinLayer() Correlation { return Correlation{&globeDropkinLayer} }

// HollandsLayer returns the correlation of Hollands, Unny, Raithby and Konicek for an inclined
// layer of air heated from below, at an angle τ from the horizontal,
//
//	Nu = 1 + 1.44 [1 - 1708/X] (1 - 1708 (sin 1.8 τ)^1.6 / X) + [(X/5830)^(1/3) - 1]
//	X = Ra cos τ; [a] = max(0, a)
//
// for Ra up to 1e5, Pr about 0.7, an inclination up to 60° and a slenderness from 12 up, with the
// properties at the mean of the walls.
func HollandsLayer() Correlation { return Correlation{&hollandsLayer} }

var cattonEnclosureLow = record{
	name:      "Catton enclosure, low",
	body:      "enclosure between vertical walls",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = max(1, 0.18 (Ra Pr/(0.2 + Pr))^0.29)",
	length:    "gap",
	reference: WallMean,
	ranges: []Range{
		within(ScaledRayleigh, "1e3", open),
		within(Prandtl, "1e-3", "1e5"),
		within(Slenderness, "1", "2"),
	},
	scatter:  Scatter{0.20, "not printed in the source; usual for enclosures, common practice, no source"},
	citation: "I. Catton, Natural convection in enclosures, 6th Int. Heat Transfer Conf. 6 (1978) 13-31",
	status:   ReadOnPage,
	evidence: "Free convection, engineer's notes, vivek-s.com",
	note:     "other walls adiabatic; lies 10 % above the form for tall enclosures at height over gap 2",
	nu:       func(g Groups) float64 { return max(1, 0.18*power(g.Ra*g.Pr/(0.2+g.Pr), 0.29)) },
}

var cattonEnclosure = record{
	name:      "Catton enclosure, tall",
	body:      "enclosure between vertical walls",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = max(1, 0.22 (Ra Pr/(0.2 + Pr))^0.28 (H/L)^(-1/4))",
	length:    "gap",
	reference: WallMean,
	ranges:    []Range{within(Rayleigh, "1e3", "1e10"), upTo(Prandtl, "1e5"), within(Slenderness, "2", "10")},
	scatter:   Scatter{0.20, "not printed in the source; usual for enclosures, common practice, no source"},
	citation:  "I. Catton, Natural convection in enclosures, 6th Int. Heat Transfer Conf. 6 (1978) 13-31",
	status:    ReadOnPage,
	evidence:  "Free convection, engineer's notes, vivek-s.com",
	note:      "other walls adiabatic; lies 10 % below the form for low enclosures at height over gap 2, and 18 % below MacGregor and Emery at 10, Ra 1e6, Pr 1",
	nu: func(g Groups) float64 {
		if g.Ra == 0 {
			return 1
		}
		return max(1, 0.22*power(g.Ra*g.Pr/(0.2+g.Pr), 0.28)/quarter(g.Slenderness))
	},
}

var macGregorEmeryEnclosure = record{
	name:      "MacGregor and Emery enclosure",
	body:      "enclosure between vertical walls",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = max(1, 0.42 Ra^(1/4) Pr^0.012 (H/L)^(-0.3))",
	length:    "gap",
	reference: WallMean,
	ranges: []Range{
		within(Rayleigh, "1e4", "1e7"),
		within(Prandtl, "1", "2e4"),
		within(Slenderness, "10", "40"),
	},
	scatter:  Scatter{0.20, "not printed in the source; usual for enclosures, common practice, no source"},
	citation: "R. K. MacGregor and A. F. Emery, Free convection through vertical plane layers: moderate and high Prandtl number fluids, J. Heat Transfer 91 (1969) 391-403",
	status:   FromMemory,
	evidence: recalled,
	note:     "not below 1 is our own choice; lies 16 % above the turbulent form at Ra 1e7, H/L 10, Pr 1",
	nu: func(g Groups) float64 {
		if g.Ra == 0 {
			return 1
		}
		return max(1, 0.42*quarter(g.Ra)*product(g.Pr, 0.012, g.Slenderness, -0.3))
	},
}

var macGregorEmeryEnclosureTurbulent = record{
	name:      "MacGregor and Emery enclosure, turbulent",
	body:      "enclosure between vertical walls",
	regime:    Natural,
	formula:   "Nu = 0.046 Ra^(1/3)",
	length:    "gap",
	reference: WallMean,
	ranges:    []Range{within(Rayleigh, "1e6", "1e9"), within(Prandtl, "1", "20"), within(Slenderness, "1", "40")},
	scatter:   Scatter{0.20, "not printed in the source; usual for enclosures, common practice, no source"},
	citation:  "R. K. MacGregor and A. F. Emery, Free convection through vertical plane layers: moderate and high Prandtl number fluids, J. Heat Transfer 91 (1969) 391-403",
	status:    FromMemory,
	evidence:  recalled,
	nu:        func(g Groups) float64 { return 0.046 * cubeRoot(g.Ra) },
}

var elSherbinyEnclosure = record{
	name:      "ElSherbiny, Raithby and Hollands air layer, vertical",
	body:      "enclosure between vertical walls",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = max(0.0605 Ra^(1/3), (1 + (0.104 Ra^0.293 / (1 + (6310/Ra)^1.36))³)^(1/3), 0.242 (Ra L/H)^0.272)",
	length:    "gap",
	reference: WallMean,
	ranges: []Range{
		within(Rayleigh, "0", "1e7"),
		within(Prandtl, "0.7", "0.7"),
		within(Slenderness, "5", "110"),
	},
	scatter:  Scatter{0.09, "from memory"},
	citation: "S. M. ElSherbiny, G. D. Raithby and K. G. T. Hollands, Heat transfer by natural convection across vertical and inclined air layers, J. Heat Transfer 104 (1982) 96-102",
	status:   FromMemory,
	evidence: recalled,
	note:     "the upper limit of Ra is our own choice",
	nu: func(g Groups) float64 {
		if g.Ra == 0 {
			return 1
		}
		log2 := pow.Log2(g.Ra)
		x := 0.104 * pow.Exp2(0.293*log2) / (1 + pow.Exp2(1.36*(onset-log2)))
		return max(0.0605*pow.Exp2(log2/3), cubeRoot(1+x*x*x), 0.242*power(g.Ra/g.Slenderness, 0.272))
	},
}

var globeDropkinLayer = record{
	name:      "Globe and Dropkin layer, heated from below",
	body:      "layer heated from below",
	regime:    Natural,
	formula:   "Nu = 0.069 Ra^(1/3) Pr^0.074",
	length:    "gap",
	reference: WallMean,
	ranges:    []Range{within(Rayleigh, "3e5", "7e9"), within(Prandtl, "0.02", "8750")},
	scatter:   Scatter{0.20, "not printed in the source; usual for enclosures, common practice, no source"},
	citation:  "S. Globe and D. Dropkin, Natural-convection heat transfer in liquids confined by two horizontal plates and heated from below, J. Heat Transfer 81 (1959) 24-28",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 386, eq. 33a, as 0.069 Gr^(1/3) Pr^0.407; the range of Pr is from memory",
	nu:        func(g Groups) float64 { return 0.069 * product(g.Ra, 1.0/3, g.Pr, 0.074) },
}

var hollandsLayer = record{
	name:      "Hollands, Unny, Raithby and Konicek air layer, heated from below",
	body:      "layer heated from below",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 1 + 1.44 [1 - 1708/X] (1 - 1708 (sin 1.8 τ)^1.6 / X) + [(X/5830)^(1/3) - 1]; X = Ra cos τ; [a] = max(0, a)",
	length:    "gap",
	reference: WallMean,
	ranges: []Range{
		within(Rayleigh, "0", "1e5"),
		within(Prandtl, "0.7", "0.7"),
		within(Inclination, "0", "60"),
		within(Slenderness, "12", open),
	},
	scatter:  Scatter{0.05, "from memory"},
	citation: "K. G. T. Hollands, T. E. Unny, G. D. Raithby and L. Konicek, Free convective heat transfer across inclined air layers, J. Heat Transfer 98 (1976) 189-193",
	status:   FromMemory,
	evidence: recalled,
	note:     "horizontal at 0; to 70° with care",
	nu: func(g Groups) float64 {
		x := g.inclined()
		if x <= 1708 {
			return 1
		}
		nu := 1.0 + max(0, cubeRoot(x/5830)-1)
		vortices := 1.44 * (1 - 1708/x)
		if s := math.Sin(1.8 * g.Inclination.SI()); s > 0 {
			vortices *= 1 - 1708*power(s, 1.6)/x
		}
		return nu + vortices
	},
}

// onset is the binary logarithm of the Rayleigh number of the onset in a tall air layer.
var onset = math.Log2(6310)

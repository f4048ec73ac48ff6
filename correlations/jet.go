package correlations

import "math"

// MartinJet returns Martin's correlation for a surface under a single round jet of gas,
//
//	Nu = Pr^0.42 G 2 Re^(1/2) (1 + 0.005 Re^0.55)^(1/2)
//	G = 2 a (1 - 2.2 a) / (1 + 0.2 (H/D - 6) a), a = D/(2 r)
//
// for Re 2e3 to 4e5, Pr above 0, a standoff 2 to 12 and a reach 2.5 to 7.5, with the properties at
// the film temperature.
func MartinJet() Correlation { return Correlation{&martinJet} }

// MartinJetArray returns Martin's correlation for a surface under an array of round jets of gas,
//
//	Nu = 0.5 Pr^0.42 K G Re^(2/3)
//	G = 2 a (1 - 2.2 a) / (1 + 0.2 (H/D - 6) a), a = Ar^(1/2)
//	K = (1 + (H/D / (0.6/a))^6)^(-0.05)
//
// for Re 2e3 to 1e5, Pr above 0, a standoff 2 to 12 and a jet area 0.004 to 0.04, with the
// properties at the film temperature.
func MartinJetArray() Correlation { return Correlation{&martinJetArray} }

// MartinSlotJet returns Martin's correlation for a surface under a single slot jet of gas of width
// W,
//
//	Nu = Pr^0.42 3.06 Re^m / (x/W + H/W + 2.78)
//	m = 0.695 - 1/(x/(2 W) + (H/(2 W))^1.33 + 3.06)
//
// for Re 3e3 to 9e4, Pr above 0, a standoff 2 to 10 and a reach 4 to 20, with the properties at the
// film temperature.
func MartinSlotJet() Correlation { return Correlation{&martinSlotJet} }

// MartinSlotJetArray returns Martin's correlation for a surface under an array of slot jets of gas
// of width W,
//
//	Nu = Pr^0.42 2/3 Ao^(3/4) (2 Re / (Ar/Ao + Ao/Ar))^(2/3)
//	Ao = (60 + 4 (H/(2 W) - 2)²)^(-1/2)
//
// for Re 1500 to 4e4, Pr above 0, a standoff 2 to 80, a jet area from 0.008 up and a slot area over
// the best one up to 2.5, with the properties at the film temperature.
func MartinSlotJetArray() Correlation { return Correlation{&martinSlotJetArray} }

var martinJet = record{
	name:      "Martin round jet",
	body:      "surface under a round gas jet",
	regime:    Forced,
	formula:   "Nu = Pr^0.42 G 2 Re^(1/2) (1 + 0.005 Re^0.55)^(1/2); G = 2 a (1 - 2.2 a) / (1 + 0.2 (H/D - 6) a), a = D/(2 r)",
	length:    "diameter of the nozzle",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "2e3", "4e5"),
		positive(Prandtl),
		within(Standoff, "2", "12"),
		within(Reach, "2.5", "7.5"),
	},
	scatter:  Scatter{0.20, usualForced},
	citation: "H. Martin, Heat and mass transfer between impinging gas jets and solid surfaces, Adv. Heat Transfer 13 (1977) 1-60",
	status:   ReadOnPage,
	evidence: "notes to a heat-transfer text, ch. 7, frank-engineering-notebook.pages.dev",
	note:     "mean over the surface that the nozzle serves",
	nu: func(g Groups) float64 {
		a := 1 / (2 * g.Reach)
		form := 2 * a * (1 - 2.2*a) / (1 + 0.2*(g.Standoff-6)*a)
		return power(g.Pr, 0.42) * form * 2 * math.Sqrt(g.Re*(1+0.005*power(g.Re, 0.55)))
	},
}

var martinJetArray = record{
	name:      "Martin array of round jets",
	body:      "surface under an array of round gas jets",
	regime:    Forced,
	formula:   "Nu = 0.5 Pr^0.42 K G Re^(2/3); G = 2 a (1 - 2.2 a) / (1 + 0.2 (H/D - 6) a), a = Ar^(1/2); K = (1 + (H/D / (0.6/a))^6)^(-0.05)",
	length:    "diameter of the nozzle",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "2e3", "1e5"),
		positive(Prandtl),
		within(Standoff, "2", "12"),
		within(JetArea, "0.004", "0.04"),
	},
	scatter:  Scatter{0.20, usualForced},
	citation: "H. Martin, Heat and mass transfer between impinging gas jets and solid surfaces, Adv. Heat Transfer 13 (1977) 1-60",
	status:   FromMemory,
	evidence: recalled,
	note:     "mean over the surface that the nozzle serves",
	nu: func(g Groups) float64 {
		a := math.Sqrt(g.JetArea)
		form := 2 * a * (1 - 2.2*a) / (1 + 0.2*(g.Standoff-6)*a)
		x := g.Standoff * a / 0.6
		x *= x * x
		return 0.5 * form * product(g.Re, 2.0/3, g.Pr, 0.42) * power(1+x*x, -0.05)
	},
}

var martinSlotJet = record{
	name:      "Martin slot jet",
	body:      "surface under a slot gas jet",
	regime:    Forced,
	formula:   "Nu = Pr^0.42 3.06 Re^m / (x/W + H/W + 2.78); m = 0.695 - 1/(x/(2 W) + (H/(2 W))^1.33 + 3.06)",
	length:    "twice the width of the slot",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "3e3", "9e4"),
		positive(Prandtl),
		within(Standoff, "2", "10"),
		within(Reach, "4", "20"),
	},
	scatter:  Scatter{0.20, usualForced},
	citation: "H. Martin, Heat and mass transfer between impinging gas jets and solid surfaces, Adv. Heat Transfer 13 (1977) 1-60",
	status:   FromMemory,
	evidence: recalled,
	note:     "mean over the surface that the nozzle serves; standoff and reach are over the width, Re and Nu on twice the width",
	nu: func(g Groups) float64 {
		m := 0.695 - 1/(g.Reach/2+power(g.Standoff/2, 1.33)+3.06)
		return 3.06 / (g.Reach + g.Standoff + 2.78) * product(g.Re, m, g.Pr, 0.42)
	},
}

var martinSlotJetArray = record{
	name:      "Martin array of slot jets",
	body:      "surface under an array of slot gas jets",
	regime:    Forced,
	formula:   "Nu = Pr^0.42 2/3 Ao^(3/4) (2 Re / (Ar/Ao + Ao/Ar))^(2/3); Ao = (60 + 4 (H/(2 W) - 2)²)^(-1/2)",
	length:    "twice the width of the slot",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "1500", "4e4"),
		positive(Prandtl),
		within(Standoff, "2", "80"),
		within(JetArea, "0.008", open),
		upTo(SlotArea, "2.5"),
	},
	scatter:  Scatter{0.20, usualForced},
	citation: "H. Martin, Heat and mass transfer between impinging gas jets and solid surfaces, Adv. Heat Transfer 13 (1977) 1-60",
	status:   FromMemory,
	evidence: recalled,
	note:     "mean over the surface that the nozzle serves; the standoff is over the width, Re and Nu on twice the width",
	nu: func(g Groups) float64 {
		best := g.bestSlots()
		x := 2 * g.Re / (g.JetArea/best + best/g.JetArea)
		return 2.0 / 3 * math.Sqrt(best) * quarter(best) * product(x, 2.0/3, g.Pr, 0.42)
	},
}

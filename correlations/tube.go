package correlations

import "math"

// TubeLaminar returns the exact solution for developed laminar flow in a tube of one temperature,
//
//	Nu = 3.656793458
//
// for Re up to 2300, with the properties at the mean bulk temperature.
func TubeLaminar() Correlation { return Correlation{&tubeLaminar} }

// TubeLaminarFlux returns the exact solution for developed laminar flow in a tube of uniform flux,
//
//	Nu = 48/11
//
// for Re up to 2300, with the properties at the mean bulk temperature.
func TubeLaminarFlux() Correlation { return Correlation{&tubeLaminarFlux} }

// HausenTubeLaminar returns Hausen's mean correlation for a tube of one temperature in which the
// flow is developed and laminar,
//
//	Nu = 3.66 + 0.0668 Gz / (1 + 0.04 Gz^(2/3))
//
// for Re up to 2300, Pr above 0 and a slenderness above 0, with the properties at the mean bulk
// temperature.
func HausenTubeLaminar() Correlation { return Correlation{&hausenTubeLaminar} }

// SiederTateTubeLaminar returns the mean correlation of Sieder and Tate for laminar flow in a tube,
//
//	Nu = 1.86 Gz^(1/3) (μ/μs)^0.14, not below 1.86 · 2, else 3.66
//
// for Re up to 2100, Pr 0.48 to 16700, a viscosity ratio 0.0044 to 9.75 and a slenderness above 0,
// with the properties at the mean bulk temperature.
func SiederTateTubeLaminar() Correlation { return Correlation{&siederTateTubeLaminar} }

// GnielinskiTubeLaminar returns Gnielinski's mean correlation for a tube of one temperature in
// which the flow is developed and laminar,
//
//	Nu = (3.66³ + 0.7³ + (1.615 Gz^(1/3) - 0.7)³)^(1/3)
//
// for Re up to 2300, Pr above 0 and a slenderness above 0, with the properties at the mean bulk
// temperature.
func GnielinskiTubeLaminar() Correlation { return Correlation{&gnielinskiTubeLaminar} }

// BaehrStephanTube returns the mean correlation of Baehr and Stephan for laminar flow in a tube of
// one temperature in which velocity and temperature develop,
//
//	Nu = (3.66 / tanh(2.264 Gz^(-1/3) + 1.7 Gz^(-2/3)) + 0.0499 Gz tanh(1/Gz)) / tanh(2.432 Pr^(1/6) Gz^(-1/6))
//
// for Re up to 2300, Pr from 0.1 up and a slenderness above 0, with the properties at the mean bulk
// temperature.
func BaehrStephanTube() Correlation { return Correlation{&baehrStephanTube} }

// HausenTubeTransition returns Hausen's mean correlation for a tube between laminar and turbulent
// flow,
//
//	Nu = 0.116 (Re^(2/3) - 125) Pr^(1/3) (μ/μs)^0.14 (1 + (D/L)^(2/3))
//
// for Re 2100 to 1e4, Pr from 0.6 up, a viscosity ratio above 0 and a slenderness above 0, with the
// properties at the mean bulk temperature.
func HausenTubeTransition() Correlation { return Correlation{&hausenTubeTransition} }

// DittusBoelterHeating returns McAdams's form of the correlation of Dittus and Boelter for a fluid
// that is heated in turbulent flow in a tube,
//
//	Nu = 0.023 Re^0.8 Pr^0.4
//
// for Re from 1e4 up, Pr 0.6 to 160 and a slenderness from 10 up, with the properties at the mean
// bulk temperature.
func DittusBoelterHeating() Correlation { return Correlation{&dittusBoelterHeating} }

// DittusBoelterCooling returns McAdams's form of the correlation of Dittus and Boelter for a fluid
// that is cooled in turbulent flow in a tube,
//
//	Nu = 0.023 Re^0.8 Pr^0.3
//
// for Re from 1e4 up, Pr 0.6 to 160 and a slenderness from 10 up, with the properties at the mean
// bulk temperature.
func DittusBoelterCooling() Correlation { return Correlation{&dittusBoelterCooling} }

// SiederTateTube returns the correlation of Sieder and Tate for turbulent flow in a tube,
//
//	Nu = 0.027 Re^0.8 Pr^(1/3) (μ/μs)^0.14
//
// for Re from 1e4 up, Pr 0.7 to 16700, a viscosity ratio above 0 and a slenderness from 10 up, with
// the properties at the mean bulk temperature.
func SiederTateTube() Correlation { return Correlation{&siederTateTube} }

// PetukhovTube returns Petukhov's correlation for developed turbulent flow in a smooth tube,
//
//	Nu = (f/8) Re Pr / (1.07 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1))
//	f = (0.790 ln Re - 1.64)^(-2)
//
// for Re 1e4 to 5e6 and Pr 0.5 to 2000, with the properties at the mean bulk temperature.
func PetukhovTube() Correlation { return Correlation{&petukhovTube} }

// GnielinskiTube returns Gnielinski's correlation for developed turbulent flow in a smooth tube,
//
//	Nu = (f/8) (Re - 1000) Pr / (1 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1))
//	f = (0.790 ln Re - 1.64)^(-2)
//
// for Re 3000 to 5e6 and Pr 0.5 to 2000, with the properties at the mean bulk temperature.
func GnielinskiTube() Correlation { return Correlation{&gnielinskiTube} }

// GnielinskiTubeEntry returns Gnielinski's mean correlation for turbulent flow in a smooth tube of
// some length, with the influence of the wall on the properties of a liquid,
//
//	Nu = (f/8) (Re - 1000) Pr / (1 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1)) (1 + (D/L)^(2/3)) (Pr/Pr wall)^0.11
//	f = (0.790 ln Re - 1.64)^(-2)
//
// for Re 3000 to 5e6, Pr 0.5 to 2000, a Prandtl ratio above 0 and a slenderness from 1 up, with the
// properties at the mean bulk temperature.
func GnielinskiTubeEntry() Correlation { return Correlation{&gnielinskiTubeEntry} }

// GnielinskiTubeAll returns Gnielinski's mean correlations for a tube, laminar up to Re 2300,
// turbulent from 4000, and linear in Re between,
//
//	Nu = (3.66³ + 0.7³ + (1.615 Gz^(1/3) - 0.7)³)^(1/3), Re ≤ 2300
//	Nu = (1 - γ) Nu(2300) + γ Nu(4000), γ = (Re - 2300)/1700
//	Nu = (f/8) (Re - 1000) Pr / (1 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1)) (1 + (D/L)^(2/3)), Re ≥ 4000
//	f = (0.790 ln Re - 1.64)^(-2)
//
// for Re up to 5e6, Pr 0.5 to 2000 and a slenderness from 1 up, with the properties at the mean
// bulk temperature.
func GnielinskiTubeAll() Correlation { return Correlation{&gnielinskiTubeAll} }

// SebanShimazakiTube returns the correlation of Seban and Shimazaki for a liquid metal in a tube of
// one temperature,
//
//	Nu = 5.0 + 0.025 Pe^0.8
//
// for a Péclet number from 100 up, Pr up to 0.05 and a slenderness from 60 up, with the properties
// at the mean bulk temperature.
func SebanShimazakiTube() Correlation { return Correlation{&sebanShimazakiTube} }

// SkupinskiTube returns the correlation of Skupinski, Tortel and Vautrey for a liquid metal in a
// tube of uniform flux,
//
//	Nu = 4.82 + 0.0185 Pe^0.827
//
// for Re 3.6e3 to 9.05e5, a Péclet number 1e2 to 1e4 and Pr up to 0.05, with the properties at the
// mean bulk temperature.
func SkupinskiTube() Correlation { return Correlation{&skupinskiTube} }

var tubeLaminar = record{
	name:      "tube, laminar, developed",
	body:      "tube",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 3.656793458",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "0", "2300")},
	scatter:   Scatter{0, "exact for constant properties"},
	citation:  "L. Graetz, Über die Wärmeleitungsfähigkeit von Flüssigkeiten, Ann. Phys. 18 (1883) 79-94",
	status:    FromMemory,
	evidence:  "recomputed: half the square of the first zero of the confluent hypergeometric function",
	nu:        func(g Groups) float64 { return 3.656793458 },
}

var tubeLaminarFlux = record{
	name:      "tube, laminar, developed, uniform flux",
	body:      "tube, uniform flux",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 48/11",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "0", "2300")},
	scatter:   Scatter{0, "exact for constant properties"},
	citation:  "developed laminar flow in a tube of uniform heat flux, exact solution",
	status:    FromMemory,
	evidence:  "recomputed",
	nu:        func(g Groups) float64 { return 48.0 / 11 },
}

var hausenTubeLaminar = record{
	name:      "Hausen tube, laminar",
	body:      "tube",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 3.66 + 0.0668 Gz / (1 + 0.04 Gz^(2/3))",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "0", "2300"), positive(Prandtl), positive(Slenderness)},
	scatter:   Scatter{0.15, usualLaminar},
	citation:  "H. Hausen, Darstellung des Wärmeüberganges in Rohren durch verallgemeinerte Potenzbeziehungen, VDI-Z. Beih. Verfahrenstechnik 4 (1943) 91-98",
	status:    FromMemory,
	evidence:  recalled,
	nu: func(g Groups) float64 {
		gz := g.graetz()
		return 3.66 + 0.0668*gz/(1+0.04*power(gz, 2.0/3))
	},
}

var siederTateTubeLaminar = record{
	name:      "Sieder and Tate tube, laminar",
	body:      "tube",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 1.86 Gz^(1/3) (μ/μs)^0.14, not below 1.86 · 2, else 3.66",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "0", "2100"),
		within(Prandtl, "0.48", "16700"),
		within(ViscosityRatio, "0.0044", "9.75"),
		positive(Slenderness),
	},
	scatter:  Scatter{0.15, usualLaminar},
	citation: "E. N. Sieder and G. E. Tate, Heat transfer and pressure drop of liquids in tubes, Ind. Eng. Chem. 28 (1936) 1429-1435",
	status:   ReadOnPage,
	evidence: "Mechanical Engineers' Handbook, vol. 4, p. 400, eq. 69 (formula, Re below 2100); the other ranges are from memory",
	note:     "newer books have Pr 0.6 to 5; jumps by 1.6 % where Gz^(1/3) (μ/μs)^0.14 is 2, from 3.66, the developed flow",
	nu: func(g Groups) float64 {
		x := product(g.graetz(), 1.0/3, g.ViscosityRatio, 0.14)
		if x < 2 {
			return 3.66
		}
		return 1.86 * x
	},
}

var gnielinskiTubeLaminar = record{
	name:      "Gnielinski tube, laminar",
	body:      "tube",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = (3.66³ + 0.7³ + (1.615 Gz^(1/3) - 0.7)³)^(1/3)",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "0", "2300"), positive(Prandtl), positive(Slenderness)},
	scatter:   Scatter{0.15, usualLaminar},
	citation:  "V. Gnielinski, Berechnung des Druckverlustes und Wärmeübergangs in durchströmten Rohren, VDI-Wärmeatlas",
	status:    FromMemory,
	evidence:  recalled,
	nu:        func(g Groups) float64 { return gnielinskiLaminar(g.graetz()) },
}

var baehrStephanTube = record{
	name:      "Baehr and Stephan tube, laminar, entry",
	body:      "tube",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = (3.66 / tanh(2.264 Gz^(-1/3) + 1.7 Gz^(-2/3)) + 0.0499 Gz tanh(1/Gz)) / tanh(2.432 Pr^(1/6) Gz^(-1/6))",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "0", "2300"), within(Prandtl, "0.1", open), positive(Slenderness)},
	scatter:   Scatter{0.15, usualLaminar},
	citation:  "H. D. Baehr and K. Stephan, Heat and Mass Transfer, Springer",
	status:    FromMemory,
	evidence:  recalled,
	nu: func(g Groups) float64 {
		gz := g.graetz()
		if gz == 0 {
			return 3.66
		}
		third := power(gz, -1.0/3)
		return (3.66/tanh(third*(2.264+1.7*third)) + 0.0499*gz*tanh(1/gz)) / tanh(2.432*math.Sqrt(third*cubeRoot(g.Pr)))
	},
}

var hausenTubeTransition = record{
	name:      "Hausen tube, transition",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = 0.116 (Re^(2/3) - 125) Pr^(1/3) (μ/μs)^0.14 (1 + (D/L)^(2/3))",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "2100", "1e4"),
		within(Prandtl, "0.6", open),
		positive(ViscosityRatio),
		positive(Slenderness),
	},
	scatter:  Scatter{0.25, usualTube},
	citation: "H. Hausen, VDI-Z. Beih. Verfahrenstechnik 4 (1943) 91-98",
	status:   ReadOnPage,
	evidence: "Mechanical Engineers' Handbook, vol. 4, p. 400, eq. 71",
	note:     "negative below Re 1398; 15 % above Gnielinski at Re 1e4, Pr 0.7; Pr from 0.6 is our own choice",
	nu: func(g Groups) float64 {
		return 0.116 * (power(g.Re, 2.0/3) - 125) * product(g.Pr, 1.0/3, g.ViscosityRatio, 0.14) * entry(g.Slenderness)
	},
}

var dittusBoelterHeating = record{
	name:      "Dittus and Boelter tube, turbulent, fluid heated",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = 0.023 Re^0.8 Pr^0.4",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "1e4", open),
		within(Prandtl, "0.6", "160"),
		within(Slenderness, "10", open),
	},
	scatter:  Scatter{0.25, "from memory"},
	citation: "W. H. McAdams, Heat Transmission, 3rd ed., McGraw-Hill, 1954, after F. W. Dittus and L. M. K. Boelter 1930",
	status:   ReadOnPage,
	evidence: "Automotive Aerodynamics, p. 527, eqs. 11.57 and 11.58; Rules of Thumb for Mechanical Engineers, p. 24 (ranges; it exchanges the two exponents)",
	note:     "for moderate differences of temperature; 0.0243 and 0.0265 are the coefficients of 1930",
	nu:       func(g Groups) float64 { return 0.023 * product(g.Re, 0.8, g.Pr, 0.4) },
}

var dittusBoelterCooling = record{
	name:      "Dittus and Boelter tube, turbulent, fluid cooled",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = 0.023 Re^0.8 Pr^0.3",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "1e4", open),
		within(Prandtl, "0.6", "160"),
		within(Slenderness, "10", open),
	},
	scatter:  Scatter{0.25, "from memory"},
	citation: "W. H. McAdams, Heat Transmission, 3rd ed., McGraw-Hill, 1954, after F. W. Dittus and L. M. K. Boelter 1930",
	status:   ReadOnPage,
	evidence: "Automotive Aerodynamics, p. 527, eqs. 11.57 and 11.58; Rules of Thumb for Mechanical Engineers, p. 24 (ranges; it exchanges the two exponents)",
	note:     "for moderate differences of temperature; 0.0243 and 0.0265 are the coefficients of 1930",
	nu:       func(g Groups) float64 { return 0.023 * product(g.Re, 0.8, g.Pr, 0.3) },
}

var siederTateTube = record{
	name:      "Sieder and Tate tube, turbulent",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = 0.027 Re^0.8 Pr^(1/3) (μ/μs)^0.14",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "1e4", open),
		within(Prandtl, "0.7", "16700"),
		positive(ViscosityRatio),
		within(Slenderness, "10", open),
	},
	scatter:  Scatter{0.25, usualTube},
	citation: "E. N. Sieder and G. E. Tate, Heat transfer and pressure drop of liquids in tubes, Ind. Eng. Chem. 28 (1936) 1429-1435",
	status:   FromMemory,
	evidence: recalled,
	note:     "a handbook prints 0.023 with the same exponents",
	nu: func(g Groups) float64 {
		return 0.027 * product(g.Re, 0.8, g.Pr, 1.0/3) * power(g.ViscosityRatio, 0.14)
	},
}

var petukhovTube = record{
	name:      "Petukhov tube, turbulent",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = (f/8) Re Pr / (1.07 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1)); f = (0.790 ln Re - 1.64)^(-2)",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "1e4", "5e6"), within(Prandtl, "0.5", "2000")},
	scatter:   Scatter{0.10, "from memory; 6 % for Pr to 200"},
	citation:  "B. S. Petukhov, Heat transfer and friction in turbulent pipe flow with variable physical properties, Adv. Heat Transfer 6 (1970) 503-564",
	status:    FromMemory,
	evidence:  recalled,
	nu: func(g Groups) float64 {
		f := petukhov(g.Re) / 8
		third := cubeRoot(g.Pr)
		return f * g.Re * g.Pr / (1.07 + 12.7*math.Sqrt(f)*(third*third-1))
	},
}

var gnielinskiTube = record{
	name:      "Gnielinski tube, turbulent",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = (f/8) (Re - 1000) Pr / (1 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1)); f = (0.790 ln Re - 1.64)^(-2)",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "3000", "5e6"), within(Prandtl, "0.5", "2000")},
	scatter:   Scatter{0.10, "from memory"},
	citation:  "V. Gnielinski, New equations for heat and mass transfer in turbulent pipe and channel flow, Int. Chem. Eng. 16 (1976) 359-368",
	status:    ReadOnPage,
	evidence:  "petroleum-engineering wiki nafta.wiki, Nusselt number (formula); the ranges are from memory",
	note:      "negative below Re 1000; for gases that are heated multiply by (T/T wall)^0.45",
	nu:        func(g Groups) float64 { return gnielinskiTurbulent(g.Re, g.Pr) },
}

var gnielinskiTubeEntry = record{
	name:      "Gnielinski tube, turbulent, with entry",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = (f/8) (Re - 1000) Pr / (1 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1)) (1 + (D/L)^(2/3)) (Pr/Pr wall)^0.11; f = (0.790 ln Re - 1.64)^(-2)",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "3000", "5e6"),
		within(Prandtl, "0.5", "2000"),
		positive(PrandtlRatio),
		within(Slenderness, "1", open),
	},
	scatter:  Scatter{0.10, "from memory"},
	citation: "V. Gnielinski, New equations for heat and mass transfer in turbulent pipe and channel flow, Int. Chem. Eng. 16 (1976) 359-368",
	status:   FromMemory,
	evidence: "recalled; the formula without the two factors was read in the petroleum-engineering wiki nafta.wiki",
	note:     "in gases the Prandtl ratio is 1; for gases that are heated multiply by (T/T wall)^0.45 instead; slenderness from 1 is our own choice",
	nu: func(g Groups) float64 {
		return gnielinskiTurbulent(g.Re, g.Pr) * entry(g.Slenderness) * power(g.PrandtlRatio, 0.11)
	},
}

var gnielinskiTubeAll = record{
	name:      "Gnielinski tube, all Reynolds numbers",
	body:      "tube",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = (3.66³ + 0.7³ + (1.615 Gz^(1/3) - 0.7)³)^(1/3), Re ≤ 2300; Nu = (1 - γ) Nu(2300) + γ Nu(4000), γ = (Re - 2300)/1700; Nu = (f/8) (Re - 1000) Pr / (1 + 12.7 (f/8)^(1/2) (Pr^(2/3) - 1)) (1 + (D/L)^(2/3)), Re ≥ 4000; f = (0.790 ln Re - 1.64)^(-2)",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "0", "5e6"),
		within(Prandtl, "0.5", "2000"),
		within(Slenderness, "1", open),
	},
	scatter:  Scatter{0.15, "own choice: 15 % is usual for laminar flow"},
	citation: "V. Gnielinski, On heat transfer in tubes, Int. J. Heat Mass Transfer 63 (2013) 134-140",
	status:   ReadOnPage,
	evidence: "first page of the paper (how the regimes join); the laminar part and the factor of the entry are from memory, the turbulent part was read in the petroleum-engineering wiki nafta.wiki",
	note:     "continuous; without the influence of the wall on the properties; slenderness from 1 is our own choice",
	nu: func(g Groups) float64 {
		if g.Re <= 2300 {
			return gnielinskiLaminar(g.graetz())
		}
		if g.Re >= 4000 {
			return gnielinskiTurbulent(g.Re, g.Pr) * entry(g.Slenderness)
		}
		share := (g.Re - 2300) / 1700
		return (1-share)*gnielinskiLaminar(2300*g.Pr/g.Slenderness) + share*gnielinskiTurbulent(4000, g.Pr)*entry(g.Slenderness)
	},
}

var sebanShimazakiTube = record{
	name:      "Seban and Shimazaki tube, liquid metal",
	body:      "tube",
	regime:    Forced,
	formula:   "Nu = 5.0 + 0.025 Pe^0.8",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Peclet, "100", open), upTo(Prandtl, "0.05"), within(Slenderness, "60", open)},
	scatter:   Scatter{0.20, usualTube},
	citation:  "R. A. Seban and T. T. Shimazaki, Heat transfer to a fluid flowing turbulently in a smooth pipe with walls at constant temperature, Trans. ASME 73 (1951) 803-809",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the upper limit of Pr is our own choice",
	nu:        func(g Groups) float64 { return 5.0 + 0.025*power(g.Re*g.Pr, 0.8) },
}

var skupinskiTube = record{
	name:      "Skupinski tube, liquid metal, uniform flux",
	body:      "tube, uniform flux",
	regime:    Forced,
	formula:   "Nu = 4.82 + 0.0185 Pe^0.827",
	length:    "diameter, or four times section over perimeter",
	reference: Bulk,
	ranges:    []Range{within(Reynolds, "3.6e3", "9.05e5"), within(Peclet, "1e2", "1e4"), upTo(Prandtl, "0.05")},
	scatter:   Scatter{0.20, usualTube},
	citation:  "E. Skupinski, J. Tortel and L. Vautrey, Détermination des coefficients de convection d'un alliage sodium-potassium dans un tube circulaire, Int. J. Heat Mass Transfer 8 (1965) 937-951",
	status:    FromMemory,
	evidence:  recalled,
	note:      "the upper limit of Pr is our own choice",
	nu:        func(g Groups) float64 { return 4.82 + 0.0185*power(g.Re*g.Pr, 0.827) },
}

// entry is 1 + (D/L)^(2/3).
func entry(slenderness float64) float64 {
	return 1 + power(slenderness, -2.0/3)
}

// gnielinskiLaminar is (3.66³ + 0.7³ + (1.615 Gz^(1/3) - 0.7)³)^(1/3).
func gnielinskiLaminar(gz float64) float64 {
	x := 1.615*cubeRoot(gz) - 0.7
	return cubeRoot(3.66*3.66*3.66 + 0.7*0.7*0.7 + x*x*x)
}

// gnielinskiTurbulent is the developed turbulent correlation of Gnielinski.
func gnielinskiTurbulent(re, pr float64) float64 {
	f := petukhov(re) / 8
	third := cubeRoot(pr)
	return f * (re - 1000) * pr / (1 + 12.7*math.Sqrt(f)*(third*third-1))
}

// petukhov is the friction factor (0.790 ln Re - 1.64)^(-2) of a smooth tube.
func petukhov(re float64) float64 {
	x := 0.790*math.Log(re) - 1.64
	return 1 / (x * x)
}

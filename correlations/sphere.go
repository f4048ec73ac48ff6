package correlations

import "math"

// SphereConduction returns the limit of a sphere in a fluid at rest that only conducts, Nu = 2: the
// exact solution of steady conduction from a sphere of one temperature into an infinite medium. It
// uses no group.
func SphereConduction() Correlation { return Correlation{&sphereConduction} }

// ChurchillSphere returns Churchill's correlation for natural convection from a sphere,
//
//	Nu = 2 + 0.589 Ra^(1/4) / (1 + (0.469/Pr)^(9/16))^(4/9)
//
// for Ra up to 1e11 and Pr from 0.7 up, at the film temperature.
func ChurchillSphere() Correlation { return Correlation{&churchillSphere} }

// RanzMarshallSphere returns the correlation of Ranz and Marshall for a sphere in a stream,
//
//	Nu = 2 + 0.6 Re^(1/2) Pr^(1/3)
//
// for Re 2 to 200 and Pr 0.6 to 2.7, the range of the data, at the film temperature.
func RanzMarshallSphere() Correlation { return Correlation{&ranzMarshallSphere} }

// WhitakerSphere returns Whitaker's correlation for a sphere in a stream,
//
//	Nu = 2 + (0.4 Re^(1/2) + 0.06 Re^(2/3)) Pr^0.4 (μ∞/μs)^(1/4)
//
// for Re 3.5 to 7.6e4, Pr 0.7 to 380 and a viscosity ratio of 1.0 to 3.2, at the free stream but for
// the viscosity μs at the wall. In gases the viscosity ratio is 1.
func WhitakerSphere() Correlation { return Correlation{&whitakerSphere} }

var sphereConduction = record{
	name:      "sphere, conduction",
	body:      "sphere",
	regime:    Conduction,
	formula:   "Nu = 2",
	length:    "diameter",
	reference: FilmTemperature,
	scatter:   Scatter{0, "exact for a constant conductivity"},
	citation:  "steady conduction from a sphere into an infinite medium, exact solution",
	status:    ReadOnPage,
	evidence:  "I. Tosun, Modelling in Transport Phenomena, p. 82, eq. 4.3-28",
	note:      "the end state: after a sudden change of the surface temperature the coefficient starts higher",
	nu:        func(Groups) float64 { return 2 },
}

var churchillSphere = record{
	name:      "Churchill sphere, natural",
	body:      "sphere",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = 2 + 0.589 Ra^(1/4) / (1 + (0.469/Pr)^(9/16))^(4/9)",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Rayleigh, "0", "1e11"), within(Prandtl, "0.7", open)},
	scatter:   Scatter{0.15, "not printed in the source; usual for laminar natural convection, common practice, no source"},
	citation:  "S. W. Churchill, Free convection around immersed bodies, Heat Exchanger Design Handbook, sec. 2.5.7, Hemisphere, 1983",
	status:    FromMemory,
	evidence:  "quoted in the same form in F. P. Incropera and D. P. DeWitt, Fundamentals of Heat and Mass Transfer, 4th ed., p. 502 (from memory); 0.469 is the constant of the textbooks, 0.43 that of a handbook form for all Ra",
	nu: func(g Groups) float64 {
		return 2 + 0.589*quarter(g.Ra)*power(prandtlFactor(0.469, g.Pr), -4.0/9)
	},
}

var ranzMarshallSphere = record{
	name:      "Ranz and Marshall sphere, forced",
	body:      "sphere",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 2 + 0.6 Re^(1/2) Pr^(1/3)",
	length:    "diameter",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "2", "200"), within(Prandtl, "0.6", "2.7")},
	scatter:   Scatter{0.20, "not printed in the source; usual for forced convection on a single body, common practice, no source"},
	citation:  "W. E. Ranz and W. R. Marshall, Evaporation from drops, Chem. Eng. Prog. 48 (1952) 141-146 and 173-180",
	status:    ReadOnPage,
	evidence:  "I. Tosun, Modelling in Transport Phenomena, p. 82, eq. 4.3-29; the range is that of the mass-transfer form, p. 84, eq. 4.3-33",
	note:      "often stretched to Re 5e4 and Pr 380, which its data do not support; low above Re 1e4",
	nu: func(g Groups) float64 {
		return 2 + 0.6*math.Sqrt(g.Re)*cubeRoot(g.Pr)
	},
}

var whitakerSphere = record{
	name:      "Whitaker sphere, forced",
	body:      "sphere",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 2 + (0.4 Re^(1/2) + 0.06 Re^(2/3)) Pr^0.4 (μ∞/μs)^(1/4)",
	length:    "diameter",
	reference: FreeStream,
	ranges: []Range{
		within(Reynolds, "3.5", "7.6e4"),
		within(Prandtl, "0.7", "380"),
		within(ViscosityRatio, "1.0", "3.2"),
	},
	scatter:  Scatter{0.30, "from memory"},
	citation: "S. Whitaker, Forced convection heat transfer correlations for flow in pipes, past flat plates, single cylinders, single spheres, and for flow in packed beds and tube bundles, AIChE J. 18 (1972) 361-371",
	status:   ReadOnPage,
	evidence: "I. Tosun, Modelling in Transport Phenomena, p. 82 (Re 3.5 to 7.6e4, Pr 0.71 to 380); Mechanical Engineers' Handbook, vol. 4, p. 171 (Re to 8e4, Pr from 0.7, viscosity ratio 1.0 to 3.2)",
	note:     "the narrower Re and the wider Pr of the two pages are taken, since it was measured in air; in gases the viscosity ratio is 1; a ratio below 1, a liquid that is cooled, is outside the range",
	nu: func(g Groups) float64 {
		return 2 + whitakerFlow(g.Re)*power(g.Pr, 0.4)*quarter(g.ViscosityRatio)
	},
}

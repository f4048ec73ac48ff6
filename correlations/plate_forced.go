package correlations

import "math"

// PlateLaminarLocal returns the laminar solution of Pohlhausen at a distance from the leading edge
// of a plate along a stream,
//
//	Nu = 0.332 Re^(1/2) Pr^(1/3)
//
// for Re up to 5e5 and Pr from 0.6 up, with the properties at the film temperature. It gives the
// local number.
func PlateLaminarLocal() Correlation { return Correlation{&plateLaminarLocal} }

// PlateLaminar returns the mean of the laminar solution of Pohlhausen for a plate along a stream,
//
//	Nu = 0.664 Re^(1/2) Pr^(1/3)
//
// for Re up to 5e5 and Pr from 0.6 up, with the properties at the film temperature.
func PlateLaminar() Correlation { return Correlation{&plateLaminar} }

// PlateLiquidMetalLocal returns the limit of small Pr at a distance from the leading edge of a
// plate along a stream,
//
//	Nu = 0.565 Pe^(1/2)
//
// for Re up to 5e5, Pr up to 0.05 and a Péclet number from 100 up, with the properties at the film
// temperature. It gives the local number.
func PlateLiquidMetalLocal() Correlation { return Correlation{&plateLiquidMetalLocal} }

// PlateLiquidMetal returns the mean of the limit of small Pr for a plate along a stream,
//
//	Nu = 1.13 Pe^(1/2)
//
// for Re up to 5e5, Pr up to 0.05 and a Péclet number from 100 up, with the properties at the film
// temperature.
func PlateLiquidMetal() Correlation { return Correlation{&plateLiquidMetal} }

// ChurchillOzoePlateLocal returns the laminar correlation of Churchill and Ozoe for all Pr at a
// distance from the leading edge of a plate along a stream,
//
//	Nu = 0.3387 Re^(1/2) Pr^(1/3) / (1 + (0.0468/Pr)^(2/3))^(1/4)
//
// for Re up to 5e5 and a Péclet number from 100 up, with the properties at the film temperature. It
// gives the local number.
func ChurchillOzoePlateLocal() Correlation { return Correlation{&churchillOzoePlateLocal} }

// ChurchillOzoePlate returns the mean of the laminar correlation of Churchill and Ozoe for a plate
// along a stream,
//
//	Nu = 0.6774 Re^(1/2) Pr^(1/3) / (1 + (0.0468/Pr)^(2/3))^(1/4)
//
// for Re up to 5e5 and a Péclet number from 100 up, with the properties at the film temperature.
func ChurchillOzoePlate() Correlation { return Correlation{&churchillOzoePlate} }

// ChurchillOzoePlateFluxLocal returns the laminar correlation of Churchill and Ozoe at a distance
// from the leading edge of a plate of uniform flux,
//
//	Nu = 0.4637 Re^(1/2) Pr^(1/3) / (1 + (0.0207/Pr)^(2/3))^(1/4)
//
// for Re up to 5e5 and a Péclet number from 100 up, with the properties at the film temperature. It
// gives the local number.
func ChurchillOzoePlateFluxLocal() Correlation { return Correlation{&churchillOzoePlateFluxLocal} }

// PlateTurbulentLocal returns the turbulent correlation at a distance from the leading edge of a
// plate along a stream,
//
//	Nu = 0.0296 Re^0.8 Pr^(1/3)
//
// for Re 5e5 to 1e7 and Pr 0.6 to 60, with the properties at the film temperature. It gives the
// local number.
func PlateTurbulentLocal() Correlation { return Correlation{&plateTurbulentLocal} }

// PlateTurbulent returns the mean turbulent correlation for a plate along a stream that is tripped
// at its edge,
//
//	Nu = 0.037 Re^0.8 Pr^(1/3)
//
// for Re 5e5 to 1e8 and Pr 0.6 to 60, with the properties at the film temperature.
func PlateTurbulent() Correlation { return Correlation{&plateTurbulent} }

// PlateMixed returns the mean correlation for a plate along a stream whose boundary layer turns
// turbulent at a Re of transition Rc,
//
//	Nu = (0.037 Re^0.8 - A) Pr^(1/3)
//	A = 0.037 Rc^0.8 - 0.664 Rc^(1/2)
//	Nu = 0.664 Re^(1/2) Pr^(1/3), Re ≤ Rc
//
// for Re 5e5 to 1e8, Pr 0.6 to 60 and a Re of transition 1e5 to 3e6, with the properties at the
// film temperature.
func PlateMixed() Correlation { return Correlation{&plateMixed} }

// WhitakerPlateMixed returns Whitaker's mean correlation for a plate along a stream whose boundary
// layer turns turbulent at a Re of transition Rc,
//
//	Nu = 0.036 Pr^(1/3) (Re^0.8 - Rc^0.8 + 18.44 Rc^(1/2))
//	Nu = 0.036 · 18.44 Re^(1/2) Pr^(1/3), Re ≤ Rc
//
// for Re 1e5 to 5.5e6, Pr 0.7 to 380 and a Re of transition 1e5 to 3e6, with the properties at the
// film temperature.
func WhitakerPlateMixed() Correlation { return Correlation{&whitakerPlateMixed} }

// GnielinskiPlate returns Gnielinski's mean correlation for a plate along a stream,
//
//	Nu = (Nl² + Nt²)^(1/2)
//	Nl = 0.664 Re^(1/2) Pr^(1/3)
//	Nt = 0.037 Re^0.8 Pr / (1 + 2.443 Re^(-0.1) (Pr^(2/3) - 1))
//
// for Re 10 to 1e7 and Pr 0.6 to 2000, with the properties at the film temperature.
func GnielinskiPlate() Correlation { return Correlation{&gnielinskiPlate} }

// SchultzGrunowPlateLocal returns the turbulent correlation with the friction of Schultz-Grunow at
// a distance from the leading edge of a plate along a stream,
//
//	Nu = 0.185 Re (log10 Re)^(-2.584) Pr^(1/3)
//
// for Re 1e7 to 1e9 and Pr 0.6 to 60, with the properties at the film temperature. It gives the
// local number.
func SchultzGrunowPlateLocal() Correlation { return Correlation{&schultzGrunowPlateLocal} }

// UnheatedPlateLaminarLocal returns the laminar solution at a distance x from the leading edge of a
// plate along a stream that is heated from ξ on,
//
//	Nu = 0.332 Re^(1/2) Pr^(1/3) (1 - (ξ/x)^(3/4))^(-1/3)
//
// for Re up to 5e5, Pr from 0.6 up and an unheated start below 1, with the properties at the film
// temperature. It gives the local number.
func UnheatedPlateLaminarLocal() Correlation { return Correlation{&unheatedPlateLaminarLocal} }

// UnheatedPlateTurbulentLocal returns the turbulent correlation at a distance x from the leading
// edge of a plate along a stream that is heated from ξ on,
//
//	Nu = 0.0296 Re^0.8 Pr^(1/3) (1 - (ξ/x)^(9/10))^(-1/9)
//
// for Re 5e5 to 1e7, Pr 0.6 to 60 and an unheated start below 1, with the properties at the film
// temperature. It gives the local number.
func UnheatedPlateTurbulentLocal() Correlation { return Correlation{&unheatedPlateTurbulentLocal} }

// UnheatedPlateLaminar returns the mean over the heated part of a plate of length L along a laminar
// stream that is heated from ξ on,
//
//	Nu = 0.664 Re^(1/2) Pr^(1/3) (1 - (ξ/L)^(3/4))^(2/3) / (1 - ξ/L)
//
// for Re up to 5e5, Pr from 0.6 up and an unheated start below 1, with the properties at the film
// temperature.
func UnheatedPlateLaminar() Correlation { return Correlation{&unheatedPlateLaminar} }

// UnheatedPlateTurbulent returns the mean over the heated part of a plate of length L along a
// stream, tripped at its edge, that is heated from ξ on,
//
//	Nu = 0.037 Re^0.8 Pr^(1/3) (1 - (ξ/L)^(9/10))^(8/9) / (1 - ξ/L)
//
// for Re 5e5 to 1e8, Pr 0.6 to 60 and an unheated start below 1, with the properties at the film
// temperature.
func UnheatedPlateTurbulent() Correlation { return Correlation{&unheatedPlateTurbulent} }

// PlateFluxLaminarLocal returns the laminar solution at a distance from the leading edge of a plate
// of uniform flux along a stream,
//
//	Nu = 0.453 Re^(1/2) Pr^(1/3)
//
// for Re up to 5e5 and Pr from 0.6 up, with the properties at the film temperature. It gives the
// local number.
func PlateFluxLaminarLocal() Correlation { return Correlation{&plateFluxLaminarLocal} }

// PlateFluxTurbulentLocal returns the turbulent correlation at a distance from the leading edge of
// a plate of uniform flux along a stream,
//
//	Nu = 0.0308 Re^0.8 Pr^(1/3)
//
// for Re 5e5 to 1e7 and Pr 0.6 to 60, with the properties at the film temperature. It gives the
// local number.
func PlateFluxTurbulentLocal() Correlation { return Correlation{&plateFluxTurbulentLocal} }

var plateLaminarLocal = record{
	name:      "plate, forced, laminar, local",
	body:      "plate in a stream",
	regime:    Forced,
	kind:      Local,
	driver:    byReynolds,
	formula:   "Nu = 0.332 Re^(1/2) Pr^(1/3)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Prandtl, "0.6", open)},
	scatter:   Scatter{0.10, "own choice: within 2 % of the similarity solution for Pr 0.7 to 1000; the stream and the edge are never ideal"},
	citation:  "E. Pohlhausen, Der Wärmeaustausch zwischen festen Körpern und Flüssigkeiten mit kleiner Reibung und kleiner Wärmeleitung, Z. angew. Math. Mech. 1 (1921) 115-121",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 170; I. Tosun, Modelling in Transport Phenomena, p. 67, table 4.1",
	nu:        func(g Groups) float64 { return 0.332 * math.Sqrt(g.Re) * cubeRoot(g.Pr) },
}

var plateLaminar = record{
	name:      "plate, forced, laminar",
	body:      "plate in a stream",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 0.664 Re^(1/2) Pr^(1/3)",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Prandtl, "0.6", open)},
	scatter:   Scatter{0.10, "own choice: within 2 % of the similarity solution for Pr 0.7 to 1000; the stream and the edge are never ideal"},
	citation:  "E. Pohlhausen, Der Wärmeaustausch zwischen festen Körpern und Flüssigkeiten mit kleiner Reibung und kleiner Wärmeleitung, Z. angew. Math. Mech. 1 (1921) 115-121",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 170; I. Tosun, Modelling in Transport Phenomena, p. 67, table 4.1",
	note:      "twice the local one at the trailing edge; continuous with the mean of laminar and turbulent at its transition",
	nu:        func(g Groups) float64 { return 0.664 * math.Sqrt(g.Re) * cubeRoot(g.Pr) },
}

var plateLiquidMetalLocal = record{
	name:      "plate, forced, liquid metal, local",
	body:      "plate in a stream",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.565 Pe^(1/2)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), upTo(Prandtl, "0.05"), within(Peclet, "100", open)},
	scatter:   Scatter{0.20, usualForced},
	citation:  "limit of the laminar boundary layer for Pr → 0, where the exact coefficient is π^(-1/2) = 0.564",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 170 (coefficient; the limit of Pr is not legible there and stands from memory)",
	nu:        func(g Groups) float64 { return 0.565 * math.Sqrt(g.Re*g.Pr) },
}

var plateLiquidMetal = record{
	name:      "plate, forced, liquid metal",
	body:      "plate in a stream",
	regime:    Forced,
	formula:   "Nu = 1.13 Pe^(1/2)",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), upTo(Prandtl, "0.05"), within(Peclet, "100", open)},
	scatter:   Scatter{0.20, usualForced},
	citation:  "limit of the laminar boundary layer for Pr → 0, where the exact coefficient is π^(-1/2) = 0.564",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 170 (coefficient; the limit of Pr is not legible there and stands from memory)",
	nu:        func(g Groups) float64 { return 1.13 * math.Sqrt(g.Re*g.Pr) },
}

var churchillOzoePlateLocal = record{
	name:      "Churchill and Ozoe plate, forced, laminar, local",
	body:      "plate in a stream",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.3387 Re^(1/2) Pr^(1/3) / (1 + (0.0468/Pr)^(2/3))^(1/4)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Peclet, "100", open)},
	scatter:   Scatter{0.10, "own choice: within 1.4 % of the similarity solution for Pr 0.01 to 1000; the stream and the edge are never ideal"},
	citation:  "S. W. Churchill and H. Ozoe, Correlations for laminar forced convection in flow over an isothermal flat plate and in developing and fully developed flow in an isothermal tube, J. Heat Transfer 95 (1973) 416-419",
	status:    FromMemory,
	evidence:  recalled,
	nu:        func(g Groups) float64 { return churchillOzoe(0.3387, 0.0468, g.Re, g.Pr) },
}

var churchillOzoePlate = record{
	name:      "Churchill and Ozoe plate, forced, laminar",
	body:      "plate in a stream",
	regime:    Forced,
	formula:   "Nu = 0.6774 Re^(1/2) Pr^(1/3) / (1 + (0.0468/Pr)^(2/3))^(1/4)",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Peclet, "100", open)},
	scatter:   Scatter{0.10, "own choice: within 1.4 % of the similarity solution for Pr 0.01 to 1000; the stream and the edge are never ideal"},
	citation:  "S. W. Churchill and H. Ozoe, Correlations for laminar forced convection in flow over an isothermal flat plate and in developing and fully developed flow in an isothermal tube, J. Heat Transfer 95 (1973) 416-419",
	status:    FromMemory,
	evidence:  recalled,
	note:      "twice the local one at the trailing edge",
	nu:        func(g Groups) float64 { return churchillOzoe(2*0.3387, 0.0468, g.Re, g.Pr) },
}

var churchillOzoePlateFluxLocal = record{
	name:      "Churchill and Ozoe plate, forced, laminar, uniform flux, local",
	body:      "plate in a stream, uniform flux",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.4637 Re^(1/2) Pr^(1/3) / (1 + (0.0207/Pr)^(2/3))^(1/4)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Peclet, "100", open)},
	scatter:   Scatter{0.20, usualForced},
	citation:  "S. W. Churchill and H. Ozoe, Correlations for laminar forced convection with uniform heating in flow over a plate and in developing and fully developed flow in a tube, J. Heat Transfer 95 (1973) 573-574",
	status:    FromMemory,
	evidence:  recalled,
	nu:        func(g Groups) float64 { return churchillOzoe(0.4637, 0.0207, g.Re, g.Pr) },
}

var plateTurbulentLocal = record{
	name:      "plate, forced, turbulent, local",
	body:      "plate in a stream",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.0296 Re^0.8 Pr^(1/3)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "5e5", "1e7"), within(Prandtl, "0.6", "60")},
	scatter:   Scatter{0.15, "from memory"},
	citation:  "Chilton-Colburn analogy with the friction factor 0.0592 Re^(-1/5)",
	status:    ReadOnPage,
	evidence:  "I. Tosun, Modelling in Transport Phenomena, p. 67, table 4.1",
	note:      "4.6 times the laminar one at Re 5e5; a handbook has 0.0292",
	nu:        func(g Groups) float64 { return 0.0296 * product(g.Re, 0.8, g.Pr, 1.0/3) },
}

var plateTurbulent = record{
	name:      "plate, forced, turbulent from the edge",
	body:      "plate in a stream",
	regime:    Forced,
	formula:   "Nu = 0.037 Re^0.8 Pr^(1/3)",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "5e5", "1e8"), within(Prandtl, "0.6", "60")},
	scatter:   Scatter{0.15, "from memory"},
	citation:  "Chilton-Colburn analogy with the friction factor 0.0592 Re^(-1/5)",
	status:    ReadOnPage,
	evidence:  "I. Tosun, Modelling in Transport Phenomena, p. 67, table 4.1",
	note:      "a handbook has 0.036",
	nu:        func(g Groups) float64 { return 0.037 * product(g.Re, 0.8, g.Pr, 1.0/3) },
}

var plateMixed = record{
	name:      "plate, forced, laminar then turbulent",
	body:      "plate in a stream",
	regime:    Forced,
	formula:   "Nu = (0.037 Re^0.8 - A) Pr^(1/3); A = 0.037 Rc^0.8 - 0.664 Rc^(1/2); Nu = 0.664 Re^(1/2) Pr^(1/3), Re ≤ Rc",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "5e5", "1e8"),
		within(Prandtl, "0.6", "60"),
		within(TransitionReynolds, "1e5", "3e6"),
	},
	scatter:  Scatter{0.15, "from memory"},
	citation: "laminar solution of Pohlhausen up to the transition, Chilton-Colburn analogy with the friction factor 0.0592 Re^(-1/5) from there",
	status:   FromMemory,
	evidence: "recalled; quoted in this form in many textbooks, with A = 871 at Rc 5e5",
	note:     "A is computed, so that the mean is continuous at the transition",
	nu: func(g Groups) float64 {
		third := cubeRoot(g.Pr)
		if g.Re <= g.TransitionRe {
			return 0.664 * math.Sqrt(g.Re) * third
		}
		a := 0.037*power(g.TransitionRe, 0.8) - 0.664*math.Sqrt(g.TransitionRe)
		return (0.037*power(g.Re, 0.8) - a) * third
	},
}

var whitakerPlateMixed = record{
	name:      "Whitaker plate, forced, laminar then turbulent",
	body:      "plate in a stream",
	regime:    Forced,
	formula:   "Nu = 0.036 Pr^(1/3) (Re^0.8 - Rc^0.8 + 18.44 Rc^(1/2)); Nu = 0.036 · 18.44 Re^(1/2) Pr^(1/3), Re ≤ Rc",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges: []Range{
		within(Reynolds, "1e5", "5.5e6"),
		within(Prandtl, "0.7", "380"),
		within(TransitionReynolds, "1e5", "3e6"),
	},
	scatter:  Scatter{0.20, usualForced},
	citation: "S. Whitaker, Forced convection heat transfer correlations for flow in pipes, past flat plates, single cylinders, single spheres, and for flow in packed beds and tube bundles, AIChE J. 18 (1972) 361-371",
	status:   ReadOnPage,
	evidence: "Mechanical Engineers' Handbook, vol. 4, p. 170; course sheet Homework materials - convection correlations, studylib.net; the ranges are from memory",
	note:     "the paper has Pr^0.43 (μ∞/μs)^(1/4), from memory",
	nu: func(g Groups) float64 {
		third := cubeRoot(g.Pr)
		if g.Re <= g.TransitionRe {
			return 0.036 * 18.44 * math.Sqrt(g.Re) * third
		}
		return 0.036 * third * (power(g.Re, 0.8) - power(g.TransitionRe, 0.8) + 18.44*math.Sqrt(g.TransitionRe))
	},
}

var gnielinskiPlate = record{
	name:      "Gnielinski plate, forced",
	body:      "plate in a stream",
	regime:    Forced,
	formula:   "Nu = (Nl² + Nt²)^(1/2); Nl = 0.664 Re^(1/2) Pr^(1/3); Nt = 0.037 Re^0.8 Pr / (1 + 2.443 Re^(-0.1) (Pr^(2/3) - 1))",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "10", "1e7"), within(Prandtl, "0.6", "2000")},
	scatter:   Scatter{0.20, usualForced},
	citation:  "V. Gnielinski, Berechnung mittlerer Wärme- und Stoffübergangskoeffizienten an laminar und turbulent überströmten Einzelkörpern mit Hilfe einer einheitlichen Gleichung, Forsch. Ing.-Wes. 41 (1975) 145-153, with the turbulent part of B. S. Petukhov and V. N. Popov",
	status:    FromMemory,
	evidence:  recalled,
	note:      "smooth for all Re; above the mean of laminar then turbulent below Re 1e6, and 60 % above the analogy of Chilton and Colburn at Pr 7, Re 1e7",
	nu:        func(g Groups) float64 { return gnielinskiFlow(g.Re, g.Pr) },
}

var schultzGrunowPlateLocal = record{
	name:      "Schultz-Grunow plate, forced, turbulent, local",
	body:      "plate in a stream",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.185 Re (log10 Re)^(-2.584) Pr^(1/3)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "1e7", "1e9"), within(Prandtl, "0.6", "60")},
	scatter:   Scatter{0.20, usualForced},
	citation:  "F. Schultz-Grunow 1941, friction factor 0.37 (log10 Re)^(-2.584), with the Chilton-Colburn analogy",
	status:    FromMemory,
	evidence:  "recalled; the friction factor was read in engineer's notebook, frank-engineering-notebook.pages.dev, forced flows",
	nu: func(g Groups) float64 {
		if g.Re <= 1 {
			return math.NaN()
		}
		return 0.185 * g.Re * product(math.Log10(g.Re), -2.584, g.Pr, 1.0/3)
	},
}

var unheatedPlateLaminarLocal = record{
	name:      "plate, forced, laminar, unheated start, local",
	body:      "plate in a stream, unheated start",
	regime:    Forced,
	kind:      Local,
	driver:    byReynolds,
	formula:   "Nu = 0.332 Re^(1/2) Pr^(1/3) (1 - (ξ/x)^(3/4))^(-1/3)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Prandtl, "0.6", open), below1(UnheatedStart)},
	scatter:   Scatter{0.10, "own choice, as without the unheated start"},
	citation:  "E. Pohlhausen, Der Wärmeaustausch zwischen festen Körpern und Flüssigkeiten mit kleiner Reibung und kleiner Wärmeleitung, Z. angew. Math. Mech. 1 (1921) 115-121; unheated start by the integral method",
	status:    ReadOnPage,
	evidence:  "engineer's notebook, frank-engineering-notebook.pages.dev, forced flows",
	note:      "singular where heating starts",
	nu: func(g Groups) float64 {
		return 0.332 * math.Sqrt(g.Re) * product(g.Pr, 1.0/3, 1-math.Sqrt(g.UnheatedStart)*quarter(g.UnheatedStart), -1.0/3)
	},
}

var unheatedPlateTurbulentLocal = record{
	name:      "plate, forced, turbulent, unheated start, local",
	body:      "plate in a stream, unheated start",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.0296 Re^0.8 Pr^(1/3) (1 - (ξ/x)^(9/10))^(-1/9)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "5e5", "1e7"), within(Prandtl, "0.6", "60"), below1(UnheatedStart)},
	scatter:   Scatter{0.15, "from memory, as without the unheated start"},
	citation:  "Chilton-Colburn analogy with the friction factor 0.0592 Re^(-1/5); unheated start by the integral method",
	status:    FromMemory,
	evidence:  recalled,
	note:      "singular where heating starts",
	nu: func(g Groups) float64 {
		return 0.0296 * product(g.Re, 0.8, g.Pr, 1.0/3) * power(1-power(g.UnheatedStart, 0.9), -1.0/9)
	},
}

var unheatedPlateLaminar = record{
	name:      "plate, forced, laminar, unheated start",
	body:      "plate in a stream, unheated start",
	regime:    Forced,
	driver:    byReynolds,
	formula:   "Nu = 0.664 Re^(1/2) Pr^(1/3) (1 - (ξ/L)^(3/4))^(2/3) / (1 - ξ/L)",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Prandtl, "0.6", open), below1(UnheatedStart)},
	scatter:   Scatter{0.10, "own choice, as without the unheated start"},
	citation:  "mean of the local solution with an unheated start",
	status:    FromMemory,
	evidence:  recalled,
	note:      "length from the leading edge, coefficient over the heated part",
	nu: func(g Groups) float64 {
		return 0.664 * math.Sqrt(g.Re) * cubeRoot(g.Pr) * unheatedLaminar(g.UnheatedStart)
	},
}

var unheatedPlateTurbulent = record{
	name:      "plate, forced, turbulent, unheated start",
	body:      "plate in a stream, unheated start",
	regime:    Forced,
	formula:   "Nu = 0.037 Re^0.8 Pr^(1/3) (1 - (ξ/L)^(9/10))^(8/9) / (1 - ξ/L)",
	length:    "length along the stream",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "5e5", "1e8"), within(Prandtl, "0.6", "60"), below1(UnheatedStart)},
	scatter:   Scatter{0.15, "from memory, as without the unheated start"},
	citation:  "mean of the local solution with an unheated start",
	status:    FromMemory,
	evidence:  recalled,
	note:      "length from the leading edge, coefficient over the heated part",
	nu: func(g Groups) float64 {
		return 0.037 * product(g.Re, 0.8, g.Pr, 1.0/3) * unheatedTurbulent(g.UnheatedStart)
	},
}

var plateFluxLaminarLocal = record{
	name:      "plate, forced, laminar, uniform flux, local",
	body:      "plate in a stream, uniform flux",
	regime:    Forced,
	kind:      Local,
	driver:    byReynolds,
	formula:   "Nu = 0.453 Re^(1/2) Pr^(1/3)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "0", "5e5"), within(Prandtl, "0.6", open)},
	scatter:   Scatter{0.10, "own choice: the stream and the edge are never ideal"},
	citation:  "laminar boundary layer on a plate of uniform heat flux, similarity solution",
	status:    FromMemory,
	evidence:  "recalled; 0.453 was read in engineer's notebook, frank-engineering-notebook.pages.dev, forced flows",
	note:      "on the mean difference of temperatures the mean has 0.680 in place of 0.453",
	nu:        func(g Groups) float64 { return 0.453 * math.Sqrt(g.Re) * cubeRoot(g.Pr) },
}

var plateFluxTurbulentLocal = record{
	name:      "plate, forced, turbulent, uniform flux, local",
	body:      "plate in a stream, uniform flux",
	regime:    Forced,
	kind:      Local,
	formula:   "Nu = 0.0308 Re^0.8 Pr^(1/3)",
	length:    "distance from the leading edge",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "5e5", "1e7"), within(Prandtl, "0.6", "60")},
	scatter:   Scatter{0.15, "from memory"},
	citation:  "turbulent boundary layer on a plate of uniform heat flux",
	status:    FromMemory,
	evidence:  recalled,
	nu:        func(g Groups) float64 { return 0.0308 * product(g.Re, 0.8, g.Pr, 1.0/3) },
}

// churchillOzoe is a Re^(1/2) Pr^(1/3) / (1 + (c/Pr)^(2/3))^(1/4).
func churchillOzoe(a, c, re, pr float64) float64 {
	return a * math.Sqrt(re) * cubeRoot(pr) / quarter(1+power(c/pr, 2.0/3))
}

// unheatedLaminar is the mean over the heated part of a plate over that of a plate heated from its edge, with
// the unheated share x: (1 - x^(3/4))^(2/3) / (1 - x).
func unheatedLaminar(x float64) float64 {
	return power(1-math.Sqrt(x)*quarter(x), 2.0/3) / (1 - x)
}

// unheatedTurbulent is the same for a turbulent boundary layer: (1 - x^(9/10))^(8/9) / (1 - x).
func unheatedTurbulent(x float64) float64 { return power(1-power(x, 0.9), 8.0/9) / (1 - x) }

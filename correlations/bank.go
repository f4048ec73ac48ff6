package correlations

import "gonum.org/v1/gonum/interp"

// ZukauskasBankAligned returns Zukauskas's correlation for a bank of aligned tubes,
//
//	Nu = F C Re^m Pr^0.36 (Pr/Pr wall)^(1/4), F for the rows
//	C, m = 0.80, 0.40 for Re < 100; 0.51, 0.50 for Re < 1000; 0.27, 0.63 for Re < 2e5; 0.021, 0.84 from there
//
// for Re 10 to 2e6, Pr 0.7 to 500, a Prandtl ratio above 0, rows from 1 up and a pitch ratio from
// 0.7 up, with the properties at the mean bulk temperature.
func ZukauskasBankAligned() Correlation { return Correlation{&zukauskasBankAligned} }

// ZukauskasBankStaggered returns Zukauskas's correlation for a bank of staggered tubes with the
// ratio P of transverse to longitudinal pitch,
//
//	Nu = F C Re^m Pr^0.36 (Pr/Pr wall)^(1/4), F for the rows
//	C, m = 0.90, 0.40 for Re < 100; 0.51, 0.50 for Re < 1000; 0.35 P^(1/5), or 0.40 for P ≥ 2, and 0.60 for Re < 2e5; 0.022, 0.84 from there
//
// for Re 10 to 2e6, Pr 0.7 to 500, a Prandtl ratio above 0, rows from 1 up and a pitch ratio above
// 0, with the properties at the mean bulk temperature.
func ZukauskasBankStaggered() Correlation { return Correlation{&zukauskasBankStaggered} }

// TubeBankLiquidMetal returns the correlation for the inner rows of a bank of tubes in a liquid
// metal,
//
//	Nu = 4.03 + 0.228 (Re Pr)^0.67
//
// for Re 2e4 to 8e4 and Pr up to 0.03, with the properties at the film temperature.
func TubeBankLiquidMetal() Correlation { return Correlation{&tubeBankLiquidMetal} }

var zukauskasBankAligned = record{
	name:      "Zukauskas tube bank, aligned",
	body:      "tube bank, aligned",
	regime:    Forced,
	formula:   "Nu = F C Re^m Pr^0.36 (Pr/Pr wall)^(1/4), F for the rows; C, m = 0.80, 0.40 for Re < 100; 0.51, 0.50 for Re < 1000; 0.27, 0.63 for Re < 2e5; 0.021, 0.84 from there",
	length:    "diameter; Re on the largest mean velocity",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "10", "2e6"),
		within(Prandtl, "0.7", "500"),
		positive(PrandtlRatio),
		{Rows, exact(1), limit(open)},
		within(PitchRatio, "0.7", open),
	},
	scatter:  Scatter{0.15, "from memory"},
	citation: "A. Zukauskas, Heat transfer from tubes in crossflow, Adv. Heat Transfer 8 (1972) 93-160, and 18 (1987) 87-159",
	status:   ReadOnPage,
	evidence: "Mechanical Engineers' Handbook, vol. 4, p. 172, table 14; course sheet Homework materials - convection correlations, studylib.net (Re below 1000); the handbook prints 0.21 for 0.021: a misprint, since only 0.021 joins at Re 2e5; the factors of the rows are from memory",
	note:     "jumps by 1, 30 and 0.9 % at Re 100, 1000 and 2e5; the branch from 100 to 1000 is that of a single tube; in gases the Prandtl ratio is 1; factor of the rows linear between the printed ones",
	nu: func(g Groups) float64 {
		return bankAligned.times(g.Re, g.Pr, 0.36) * rowFactor(&rowsAligned, g.Rows) * quarter(g.PrandtlRatio)
	},
}

var zukauskasBankStaggered = record{
	name:      "Zukauskas tube bank, staggered",
	body:      "tube bank, staggered",
	regime:    Forced,
	formula:   "Nu = F C Re^m Pr^0.36 (Pr/Pr wall)^(1/4), F for the rows; C, m = 0.90, 0.40 for Re < 100; 0.51, 0.50 for Re < 1000; 0.35 P^(1/5), or 0.40 for P ≥ 2, and 0.60 for Re < 2e5; 0.022, 0.84 from there",
	length:    "diameter; Re on the largest mean velocity",
	reference: Bulk,
	ranges: []Range{
		within(Reynolds, "10", "2e6"),
		within(Prandtl, "0.7", "500"),
		positive(PrandtlRatio),
		{Rows, exact(1), limit(open)},
		positive(PitchRatio),
	},
	scatter:  Scatter{0.15, "from memory"},
	citation: "A. Zukauskas, Heat transfer from tubes in crossflow, Adv. Heat Transfer 8 (1972) 93-160, and 18 (1987) 87-159",
	status:   ReadOnPage,
	evidence: "Mechanical Engineers' Handbook, vol. 4, p. 172, table 14; course sheet Homework materials - convection correlations, studylib.net (Re below 1000), which has 0.81 for 0.80 in the aligned bank; the factors of the rows are from memory",
	note:     "jumps by -10, 37 and 18 % at Re 100, 1000 and 2e5 for equal pitches; the branch from 100 to 1000 is that of a single tube; -0.5 % at pitch ratio 2; in gases the Prandtl ratio is 1; factor of the rows linear between the printed ones",
	nu: func(g Groups) float64 {
		nu := bankStaggered.times(g.Re, g.Pr, 0.36)
		if g.Re >= 1000 && g.Re < 2e5 {
			if g.PitchRatio < 2 {
				nu *= 0.35 * power(g.PitchRatio, 0.2)
			} else {
				nu *= 0.40
			}
		}
		return nu * rowFactor(&rowsStaggered, g.Rows) * quarter(g.PrandtlRatio)
	},
}

var tubeBankLiquidMetal = record{
	name:      "tube bank, liquid metal",
	body:      "tube bank",
	regime:    Forced,
	formula:   "Nu = 4.03 + 0.228 (Re Pr)^0.67",
	length:    "diameter; Re on the largest mean velocity",
	reference: FilmTemperature,
	ranges:    []Range{within(Reynolds, "2e4", "8e4"), upTo(Prandtl, "0.03")},
	scatter:   Scatter{0.20, usualForced},
	citation:  "correlation for liquid metals in tube banks, as printed in the handbook that was read",
	status:    ReadOnPage,
	evidence:  "Mechanical Engineers' Handbook, vol. 4, p. 172",
	nu:        func(g Groups) float64 { return 4.03 + 0.228*power(g.Re*g.Pr, 0.67) },
}

var (
	bankAligned = powerLaws{{10, 0.80, 0.40}, {100, 0.51, 0.50}, {1e3, 0.27, 0.63}, {2e5, 0.021, 0.84}}
	// The factor of the third branch depends on the pitches.
	bankStaggered = powerLaws{{10, 0.90, 0.40}, {100, 0.51, 0.50}, {1e3, 1, 0.60}, {2e5, 0.022, 0.84}}

	rowsAligned   = fitted(rowsPrinted[:], []float64{0.70, 0.80, 0.86, 0.90, 0.92, 0.95, 0.97, 0.98, 0.99, 1})
	rowsStaggered = fitted(rowsPrinted[:], []float64{0.64, 0.76, 0.84, 0.89, 0.92, 0.95, 0.97, 0.98, 0.99, 1})
	rowsPrinted   = [...]float64{1, 2, 3, 4, 5, 7, 10, 13, 16, 20}
)

// fitted returns the linear interpolation of a printed table.
func fitted(x, y []float64) (table interp.PiecewiseLinear) {
	if err := table.Fit(x, y); err != nil {
		return interp.PiecewiseLinear{} // not reached: the tables above increase
	}
	return table
}

// rowFactor is the mean coefficient of a bank of so many rows over that of a deep one.
func rowFactor(table *interp.PiecewiseLinear, rows float64) float64 { return table.Predict(rows) }

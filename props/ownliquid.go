package props

import (
	"math"
	"strconv"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// A LiquidRow is one line of a table of a liquid.
type LiquidRow struct {
	Temperature  units.Temperature
	Density      units.Density
	SpecificHeat units.SpecificHeat
	Conductivity units.Conductivity
	Viscosity    units.Viscosity // dynamic viscosity µ
}

// TabulatedLiquid returns a liquid, such as a molten salt or an oil, from a table of at least two rows with rising temperatures. Its
// range ends with the table, and with the pressures lowest, at which it must still be liquid, and highest.
//
// Between the rows stands the monotone piecewise cubic of F. N. Fritsch and J. Butland (SIAM J. Sci. Stat. Comput. 5
// (1984) 300–304), in the viscosity that of its logarithm. It passes through every row and never overshoots. The expansion coefficient is
// the slope of the density between the rows, so that it is only as good as the digits of the densities allow.
//
// It returns a [*units.ArgumentError] that names the row for a table that cannot be used. Source is repeated by
// [Medium.Source] and may be empty. The uncertainties of the liquid are 0: not stated.
func TabulatedLiquid(name string, rows []LiquidRow, lowest, highest units.Pressure, source string) (Medium, error) {
	const who = "props.TabulatedLiquid"
	if err := checkName(who, name); err != nil {
		return Medium{}, err
	}
	if err := units.CheckPositive(who+": lowest pressure of "+name, lowest); err != nil {
		return Medium{}, err
	}
	if err := units.CheckPositive(who+": highest pressure of "+name, highest); err != nil {
		return Medium{}, err
	}
	if lowest.SI() >= highest.SI() {
		return Medium{}, &units.ArgumentError{Field: who + ": lowest pressure of " + name, Value: lowest, Accepted: "below the highest, " + highest.String()}
	}
	if len(rows) < 2 {
		return Medium{}, &units.ArgumentError{Field: who + ": rows of " + name, Value: len(rows), Accepted: "at least 2 rows"}
	}
	for i, r := range rows {
		field := who + ": " + name + ", row " + strconv.Itoa(i+1)
		if err := r.check(field); err != nil {
			return Medium{}, err
		}
		if i > 0 && r.Temperature.SI() <= rows[i-1].Temperature.SI() {
			return Medium{}, &units.ArgumentError{Field: field + ": temperature", Value: r.Temperature, Accepted: "above " + rows[i-1].Temperature.String() + ", the row before"}
		}
	}
	l, err := newLiquid(rows)
	if err != nil {
		return Medium{}, &units.ArgumentError{Field: who + ": rows of " + name, Value: len(rows), Accepted: "rows that can be interpolated: " + err.Error()}
	}
	// Rows at extreme distances or with extreme values overflow the slopes of the interpolant.
	for i := 1; i < len(rows); i++ {
		a, b := rows[i-1].Temperature.SI(), rows[i].Temperature.SI()
		for j := 0; j <= 8; j++ {
			if !usableState(l.At(min(a+(b-a)*float64(j)/8, b))) {
				return Medium{}, &units.ArgumentError{
					Field: who + ": " + name + ", row " + strconv.Itoa(i+1) + ": temperature", Value: rows[i].Temperature,
					Accepted: "rows far enough apart, and values moderate enough, to be interpolated",
				}
			}
		}
	}
	return Medium{tableMedium(l, medium{
		name: name, source: sourceOr(source),
		low: rows[0].Temperature.SI(), high: rows[len(rows)-1].Temperature.SI(),
		pLow: lowest.SI(), pHigh: highest.SI(),
		uncertainty: fluidUncertainty{source: "not stated"},
	})}, nil
}

func (r LiquidRow) check(field string) error {
	if err := units.CheckTemperature(field+": temperature", r.Temperature); err != nil {
		return err
	}
	if err := units.CheckPositive(field+": density", r.Density); err != nil {
		return err
	}
	if err := units.CheckPositive(field+": specific heat", r.SpecificHeat); err != nil {
		return err
	}
	if err := units.CheckPositive(field+": conductivity", r.Conductivity); err != nil {
		return err
	}
	return units.CheckPositive(field+": viscosity", r.Viscosity)
}

// newLiquid interpolates rows that have been checked.
func newLiquid(rows []LiquidRow) (*property.Liquid, error) {
	var t, rho, c, k, mu []float64
	for _, r := range rows {
		t = append(t, r.Temperature.SI())
		rho = append(rho, r.Density.SI())
		c = append(c, r.SpecificHeat.SI())
		k = append(k, r.Conductivity.SI())
		mu = append(mu, r.Viscosity.SI())
	}
	return property.NewLiquid(t, rho, c, k, mu)
}

// tableMedium completes the data of a liquid that is interpolated.
func tableMedium(l *property.Liquid, m medium) *medium {
	m.at = func(t, p float64) FluidState {
		rho, c, k, mu, beta := l.At(t)
		return fluidState(t, p, rho, c, k, mu, beta)
	}
	return &m
}

func usableState(rho, c, k, mu, beta float64) bool {
	return usable(rho) && usable(c) && usable(k) && usable(mu) && !math.IsNaN(beta) && !math.IsInf(beta, 0) && usable(mu*c/k)
}

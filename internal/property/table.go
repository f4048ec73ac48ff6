package property

import (
	"math"
	"sort"

	"gonum.org/v1/gonum/interp"
)

// Table is a solid given by rows, interpolated by the monotone piecewise cubics of F. N. Fritsch and
// J. Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300–304, with a continuous slope and no overshoot. The
// enthalpy is the exact integral of the interpolant of the specific heat, zero at the first row.
type Table struct {
	t    []float64
	k, c interp.FritschButland
	h    []float64 // enthalpy at each row
}

// NewTable returns the table of at least two rows, with t strictly increasing, which the caller has checked.
func NewTable(t, k, c []float64) (*Table, error) {
	tab := &Table{t: append([]float64(nil), t...), h: make([]float64, len(t))}
	if err := tab.k.Fit(t, k); err != nil {
		return nil, err
	}
	if err := tab.c.Fit(t, c); err != nil {
		return nil, err
	}
	for i := 1; i < len(t); i++ {
		tab.h[i] = tab.h[i-1] + tab.segment(t[i-1], t[i])
	}
	return tab, nil
}

// Conductivity returns the interpolant of the conductivity.
func (tab *Table) Conductivity(t float64) float64 { return tab.k.Predict(t) }

// SpecificHeat returns the interpolant of the specific heat.
func (tab *Table) SpecificHeat(t float64) float64 { return tab.c.Predict(t) }

// Enthalpy returns the integral of the specific heat from the first row.
func (tab *Table) Enthalpy(t float64) float64 {
	i := sort.SearchFloat64s(tab.t, t)
	if i < len(tab.t) && tab.t[i] == t {
		return tab.h[i]
	}
	if i == 0 {
		return math.NaN()
	}
	return tab.h[i-1] + tab.segment(tab.t[i-1], t)
}

// segment integrates the specific heat between two temperatures of one segment. Two Gauss points
// are exact for the cubic of a segment.
func (tab *Table) segment(a, b float64) float64 {
	half := (b - a) / 2
	mid := a + half
	d := half / math.Sqrt(3)
	return half * (tab.c.Predict(mid-d) + tab.c.Predict(mid+d))
}

package fv

import (
	"fmt"
	"math"

	"example.com/coolward/internal/tridiagonal"
)

// A Surface is what leaves through the exposed surface, as heat flux: h (T − ambient), or what a
// function gives.
type Surface struct {
	Coefficient, Ambient float64
	Function             func(t, T float64) (float64, error) // nil for the constants
}

// An ExchangeError reports that the function of a surface failed.
type ExchangeError struct {
	Time, Temperature float64
	Cause             error
}

func (e *ExchangeError) Error() string {
	return fmt.Sprintf("exchange at %g s and %g K: %v", e.Time, e.Temperature, e.Cause)
}

// Unwrap returns the cause.
func (e *ExchangeError) Unwrap() error { return e.Cause }

// A RangeError reports that a node left the range of the table.
type RangeError struct {
	Node        int
	Temperature float64
}

func (e *RangeError) Error() string {
	return fmt.Sprintf("node %d at %g K left the range of the material", e.Node, e.Temperature)
}

// A System is the set of equations of a body; it is what package rosenbrock integrates.
type System struct {
	Grid  *Grid
	Table *Table

	surface   Surface
	tolerance float64 // K
	perVolume []float64
	phi       []float64
	// at the state that was linearised
	dphi, dT      []float64 // to the enthalpy of each volume
	fluxSlope     float64   // of the exchanged heat, to the enthalpy of the outermost volume
	lower, diag   []float64
	upper         []float64
	diagonalShift float64
	solver        *tridiagonal.Solver
}

// NewSystem returns the equations of a body with the error norm in units of tolerance, in kelvin.
func NewSystem(g *Grid, t *Table, s Surface, tolerance float64) *System {
	n := len(g.Nodes)
	y := &System{Grid: g, Table: t, surface: s, tolerance: tolerance, solver: tridiagonal.New(n)}
	for _, p := range []*[]float64{&y.perVolume, &y.phi, &y.dphi, &y.dT, &y.lower, &y.diag, &y.upper} {
		*p = make([]float64, n)
	}
	for i, v := range g.Volumes {
		y.perVolume[i] = 1 / v
	}
	return y
}

// Start returns the state at the start.
func (y *System) Start() []float64 { return make([]float64, len(y.Grid.Nodes)+1) }

// NodeTemperature returns the temperature of node i with the enthalpy e.
func (y *System) NodeTemperature(i int, e float64) float64 {
	return y.Table.Temperature(e * y.perVolume[i])
}

// NodeSlope returns the derivative of the temperature of node i to its enthalpy e.
func (y *System) NodeSlope(i int, e float64) float64 {
	_, slope := y.Table.Slope(e * y.perVolume[i])
	return slope * y.perVolume[i]
}

// MeanTemperature returns the temperature of the mean enthalpy after the given heat has left.
func (y *System) MeanTemperature(heat float64) float64 {
	return y.Table.Temperature(-heat / y.Grid.Volume)
}

// Balance returns what is missing in the sum of the enthalpies of a state and the heat that has left, in
// joule.
func (y *System) Balance(state []float64) float64 {
	sum := 0.0
	for _, e := range state {
		sum += e
	}
	return sum
}

// Rate implements rosenbrock.System.
func (y *System) Rate(t float64, state, f []float64) error {
	n := len(y.phi)
	y.Table.potentials(state[:n], y.perVolume, y.phi)
	T := y.Table.Temperature(state[n-1] * y.perVolume[n-1])
	q, err := y.flux(t, T)
	if err != nil {
		return err
	}
	y.fluxes(q*y.Grid.Area, f)
	return nil
}

// fluxes sets the rates from the potentials and the heat flow at the surface.
func (y *System) fluxes(out float64, f []float64) {
	n := len(y.phi)
	g := y.Grid.Conductance
	phi := y.phi[1 : len(g)+1]
	f0 := f[:len(g)]
	last, in := y.phi[0], 0.0
	for i := range g {
		through := g[i] * (last - phi[i])
		f0[i] = in - through
		in, last = through, phi[i]
	}
	f[n-1], f[n] = in-out, out
}

func (y *System) flux(t, T float64) (float64, error) {
	if y.surface.Function == nil {
		return y.surface.Coefficient * (T - y.surface.Ambient), nil
	}
	q, err := y.surface.Function(t, T)
	if err != nil {
		return 0, &ExchangeError{t, T, err}
	}
	if math.IsNaN(q) || math.IsInf(q, 0) {
		return 0, &ExchangeError{t, T, fmt.Errorf("heat flux is %g", q)}
	}
	return q, nil
}

const (
	wallStep = 1e-3 // K, for the slope of the flux over the wall temperature
	timeStep = 1e-4 // of the step, for its slope over time
)

// Linearise implements rosenbrock.System.
func (y *System) Linearise(t, h float64, state, f, ft []float64) error {
	n := len(y.phi)
	y.Table.slopes(state[:n], y.perVolume, y.phi, y.dphi, y.dT)
	T := y.Table.Temperature(state[n-1] * y.perVolume[n-1])
	q, err := y.flux(t, T)
	if err != nil {
		return err
	}
	slope, inTime := y.surface.Coefficient, 0.0
	if y.surface.Function != nil {
		d := wallStep
		q1, err := y.flux(t, T+d)
		if err != nil { // T may be at an end of what the function accepts
			d = -d
			if q1, err = y.flux(t, T+d); err != nil {
				return err
			}
		}
		slope = (q1 - q) / d
		d = timeStep * h
		if q1, err = y.flux(t+d, T); err != nil {
			return err
		}
		q2, err := y.flux(t+2*d, T)
		if err != nil {
			return err
		}
		inTime = (4*q1 - q2 - 3*q) / (2 * d)
	}
	y.fluxes(q*y.Grid.Area, f)
	clear(ft)
	ft[n-1], ft[n] = -inTime*y.Grid.Area, inTime*y.Grid.Area
	y.fluxSlope = slope * y.Grid.Area * y.dT[n-1]
	g := y.Grid.Conductance
	for i := range g {
		y.upper[i] = -g[i] * y.dphi[i+1]
		y.lower[i+1] = -g[i] * y.dphi[i]
	}
	return nil
}

// Factor implements rosenbrock.System.
func (y *System) Factor(d float64) {
	n := len(y.diag)
	y.diag[0] = d - y.lower[1]
	diag, lower, upper := y.diag[:n], y.lower[:n], y.upper[:n]
	for i := 1; i < n-1; i++ {
		diag[i] = d - upper[i-1] - lower[i+1]
	}
	diag[n-1] = d - upper[n-2] + y.fluxSlope
	y.diagonalShift = d
	y.solver.Factor(lower, diag, upper)
}

// Solve implements rosenbrock.System.
func (y *System) Solve(b []float64) {
	n := len(y.diag)
	y.solver.Solve(b[:n])
	b[n] = (b[n] + y.fluxSlope*b[n-1]) / y.diagonalShift
}

// Norm implements rosenbrock.System: the largest error in temperature.
func (y *System) Norm(e []float64) float64 {
	worst, sum := 0.0, 0.0
	dT := y.dT
	e = e[:len(dT)]
	for i := range dT {
		x := math.Abs(e[i] * dT[i])
		sum += x
		if x > worst {
			worst = x
		}
	}
	if math.IsNaN(sum) { // of which a comparison knows nothing
		return sum
	}
	return worst / y.tolerance
}

// Check implements rosenbrock.System. A node may lie beyond the range by the tolerance of one step,
// since a temperature that tends to an end of the range overshoots by that.
func (y *System) Check(state []float64) error {
	low, high := y.Table.lowU, y.Table.highU
	for i, v := range y.perVolume {
		u := state[i] * v
		if u >= low && u <= high {
			continue
		}
		T := y.Table.Temperature(u)
		if !(T >= y.Table.Low-y.tolerance && T <= y.Table.High+y.tolerance) {
			return &RangeError{i, T}
		}
	}
	return nil
}

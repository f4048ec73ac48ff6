package fdm

import (
	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Solution is the history of temperatures that a [Problem] leads to. It does not change and may be
// used from many goroutines.
type Solution struct {
	problem       Problem
	table         *fv.Table
	fine, coarse  *track
	coarseFailure error
	limit         limit
	grid          [3]float64 // estimated grid error, greatest over the run: centre, surface, mean; K
}

// Statistics counts what the solution took, without the run for the grid error.
type Statistics struct {
	Cells       int // between centre and surface
	Steps       int // accepted
	Rejected    int // repeated with a shorter step
	Evaluations int // of the whole system of equations
}

// Horizon returns the time at which the solution ends: that of the problem, or earlier if Until was
// reached or if an error ended it.
func (s *Solution) Horizon() units.Duration {
	if !s.made() {
		return units.Duration{}
	}
	return units.Second.Of(s.fine.history.End())
}

// made reports whether s comes from a problem that was solved.
func (s *Solution) made() bool { return s != nil && s.fine != nil }

// check returns an [*units.ArgumentError] for a solution that was not made by solving a problem.
func (s *Solution) check() error {
	if s.made() {
		return nil
	}
	return &units.ArgumentError{Field: "fdm.Solution", Accepted: "one that Problem.Solve returned"}
}

// At returns the temperature at a place and time. On a node it is that of the node, between nodes of the
// cubic through four of them, never beyond its neighbours. It returns an [*units.ArgumentError] for a
// place that is not in the body and for a time outside the solution.
func (s *Solution) At(place shape.Place, t units.Duration) (units.Temperature, error) {
	if err := s.checkTime(t); err != nil {
		return units.Temperature{}, err
	}
	p, err := s.fine.probe(place, s.problem.Body)
	if err != nil {
		return units.Temperature{}, err
	}
	return units.Kelvin.Of(s.fine.at(p, t.SI())), nil
}

// Mean returns the temperature at which the body would settle if it were insulated at time t: that
// of its mean enthalpy. It is the mean over the volume if the specific heat is constant.
// The error is that of [Solution.At].
func (s *Solution) Mean(t units.Duration) (units.Temperature, error) {
	return s.At(shape.Mean(), t)
}

// HeatReleased returns the heat that has left the body since the start; it is negative if heat has
// entered. It returns an [*units.ArgumentError] for a time outside the solution.
func (s *Solution) HeatReleased(t units.Duration) (units.Energy, error) {
	if err := s.checkTime(t); err != nil {
		return units.Energy{}, err
	}
	return units.Joule.Of(s.heat(t.SI())), nil
}

func (s *Solution) heat(t float64) float64 {
	h := s.fine.history
	k, fraction := h.Find(t)
	return h.Value(k, fraction, len(s.fine.system.Grid.Nodes))
}

// Statistics counts cells, steps and evaluations.
func (s *Solution) Statistics() Statistics {
	if !s.made() {
		return Statistics{}
	}
	st := s.fine.statistics
	return Statistics{s.problem.cells(), st.Steps, st.Rejected, st.Evaluations}
}

// checkTime returns an [*units.ArgumentError] for a time outside the solution.
func (s *Solution) checkTime(t units.Duration) error {
	if err := s.check(); err != nil {
		return err
	}
	if t.SI() >= 0 && t.SI() <= s.fine.history.End() {
		return nil
	}
	return &units.ArgumentError{Field: "time", Value: t, Accepted: "0 s to " + s.Horizon().String()}
}

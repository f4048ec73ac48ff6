package lumped

import (
	"context"
	"math"
	"slices"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// A Network is a few bodies, each at one temperature, that exchange heat with each other and with their
// surroundings: a cup with its content, a cabinet with what stands in it, a sensor in its sheath.
//
// Where every exchange is a conductance or stated by a constant coefficient, the solution is the sum of the
// exponentials of the network, exact at any time and for any ratio of the time constants, with
// surroundings that are steady, rise at a constant rate, swing, or follow a log straight from reading to
// reading. Any other exchange (radiation, natural convection, a function) is integrated with adaptive
// steps by a method for stiff equations.
type Network struct {
	Nodes        []Node
	Surroundings []Surroundings
	Links        []Link
	Exposures    []Exposure

	// Horizon is how long to solve for. It is needed where surroundings change with time, or where an
	// exchange has to be integrated; else the solution holds for all time and ignores it.
	Horizon units.Duration

	// Tolerance is the temperature error that a step of an integration may make; zero means 1 mK.
	Tolerance units.TemperatureDifference

	Sources, Notes []string // repeated unread in the derivation
}

// A Node is a body at one temperature. Its heat capacity is above 0: two conductances in series are one
// link, not a node without capacity.
type Node struct {
	Name     string // unique among nodes and surroundings
	Capacity units.HeatCapacity
	Initial  units.Temperature
	Power    units.Power // constant heat that is set free in it, such as that of a heater
}

// Surroundings are at a temperature that the network does not change.
type Surroundings struct {
	Name        string // unique among nodes and surroundings
	Temperature boundary.Course
}

// A Link lets heat pass between two nodes, or between a node and surroundings, named by From and To. It
// has a conductance, or a Flow that gives the power from the first to the second for their temperatures.
type Link struct {
	From, To    string
	Conductance units.Conductance
	Flow        func(from, to units.Temperature) (units.Power, error)
}

// An Exposure is a surface through which a node exchanges heat with what the condition states.
type Exposure struct {
	Node    string
	Area    units.Area
	Surface boundary.Condition
}

// Solve solves the network. It calls the functions of links and exposures from this goroutine only.
//
// It returns an [*units.ArgumentError] for what cannot be used, and a [*units.RangeError] for a log that ends
// before the horizon. If an integration has to end early (a function returns an error, ctx ends, too many
// steps) the error is a [*units.ConvergenceError] with that cause, and the solution holds what was computed
// until then; it is nil if that is nothing.
func (n Network) Solve(ctx context.Context) (*NetworkSolution, error) {
	if ctx == nil {
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	n.Nodes, n.Sources, n.Notes = slices.Clone(n.Nodes), slices.Clone(n.Sources), slices.Clone(n.Notes)
	w, err := n.wire()
	if err != nil {
		return nil, err
	}
	s := &NetworkSolution{network: n, wiring: w, end: math.MaxFloat64}
	if !w.steady() {
		if n.Horizon.SI() == 0 {
			return nil, &units.ArgumentError{Field: "horizon", Accepted: "above 0 s; only constant conductances with steady surroundings are solved for all time"}
		}
		s.end = n.Horizon.SI()
		if err := w.checkCourses(n.Horizon); err != nil {
			return nil, err
		}
	}
	if err := ctx.Err(); err != nil {
		return nil, &units.ConvergenceError{Method: "network", Reason: "the context has ended", Cause: err}
	}
	if w.linear() {
		if err := s.solveClosed(); err != nil {
			return nil, err
		}
		return s, nil
	}
	return s.integrate(ctx)
}

package fdm

import (
	"context"
	"errors"

	"example.com/coolward/internal/fv"
	"example.com/coolward/internal/rosenbrock"
	"example.com/coolward/units"
)

// A track is one run: the equations of one grid and what came of them.
type track struct {
	system     *fv.System
	history    *rosenbrock.History
	statistics rosenbrock.Statistics
	stepErrors []float64 // at the end of each step, the sum of estimated errors until then, K
	balance    float64   // largest residual of the heat balance, J
	exchanged  float64   // largest heat that had been exchanged, J
}

// A runner makes tracks.
type runner struct {
	ctx         context.Context
	problem     Problem
	done, share float64 // part of the work that is done before, and in this run
}

// run solves up to a time, or until every node has passed a temperature. The track is never nil and
// holds what was computed before an error.
func (r runner) run(system *fv.System, end float64, until units.Temperature) (*track, error) {
	tr := &track{system: system, stepErrors: make([]float64, 1, 256)}
	longest := end
	if _, _, ok := r.problem.Surface.Constants(); !ok {
		longest = end / stepsPerHorizon
	}
	surface := len(system.Grid.Nodes)
	passed := r.passed(system, until)
	options := rosenbrock.Options{
		End: end, MaxStep: longest, MaxSteps: mostSteps,
		Accepted: func(t float64, y []float64, size float64) (bool, error) {
			tr.stepErrors = append(tr.stepErrors, tr.stepErrors[len(tr.stepErrors)-1]+size*r.problem.tolerance())
			tr.balance = max(tr.balance, abs(system.Balance(y)))
			tr.exchanged = max(tr.exchanged, abs(y[surface]))
			if r.problem.Progress != nil {
				r.problem.Progress(r.done + r.share*t/end)
			}
			if err := r.ctx.Err(); err != nil {
				return false, err
			}
			return passed != nil && passed(y), nil
		},
	}
	err := r.ctx.Err()
	if err != nil {
		options.MaxSteps = 0 // nothing but the start
	}
	var failure error
	tr.history, tr.statistics, failure = rosenbrock.Integrate(system, system.Start(), options)
	if err == nil {
		err = failure
	}
	if err != nil {
		return tr, r.problem.failure(tr, err)
	}
	return tr, nil
}

// passed returns a function that tells whether every node has passed a temperature; nil if there is
// none to pass.
func (r runner) passed(system *fv.System, until units.Temperature) func(y []float64) bool {
	start := r.problem.Initial.SI()
	if until == (units.Temperature{}) || until.SI() == start {
		return nil
	}
	sign := 1.0
	if until.SI() < start {
		sign = -1
	}
	nodes := len(system.Grid.Nodes)
	return func(y []float64) bool {
		// The centre is nearly always the last, so that one look suffices.
		for i := range nodes {
			if sign*(system.NodeTemperature(i, y[i])-until.SI()) < 0 {
				return false
			}
		}
		return true
	}
}

// failure turns what ended a run into the error that says when, where and why.
func (p Problem) failure(tr *track, err error) error {
	e := &units.ConvergenceError{Method: "finite volumes", Time: units.Second.Of(tr.history.End()), Cause: err}
	var exchange *fv.ExchangeError
	var left *fv.RangeError
	switch {
	case errors.As(err, &exchange):
		e.Place, e.Cause = "surface", exchange.Cause
		e.Reason = "the exchange function failed at a surface temperature of " + units.Kelvin.Of(exchange.Temperature).String()
	case errors.As(err, &left):
		T := units.Kelvin.Of(left.Temperature)
		e.Place = tr.nodeName(left.Node)
		e.Reason = "the body leaves the range of its material; take a material with a wider range, or a shorter horizon"
		e.Cause = p.inRange(T)
		if e.Cause == nil { // a range that is open: the table ends first
			low, high := p.supported()
			e.Cause = &units.RangeError{
				Model: "material as tabulated", Quantity: "temperature", Value: T.Dynamic(),
				Min: units.Kelvin.Of(low).Dynamic(), Max: units.Kelvin.Of(high).Dynamic(),
			}
		}
	case errors.Is(err, rosenbrock.ErrSteps):
		e.Cause = nil
		e.Reason = "the greatest number of steps is used up; take a shorter horizon, a larger tolerance or a smoother exchange function"
	case errors.Is(err, rosenbrock.ErrShort):
		e.Cause = nil
		e.Reason = "no step is short enough for the tolerance; take a larger tolerance or an exchange function without jumps"
	default:
		e.Reason = "stopped by the caller"
	}
	return e
}

// nodeName names the place of a node.
func (tr *track) nodeName(i int) string {
	nodes := tr.system.Grid.Nodes
	switch i {
	case 0:
		return "centre"
	case len(nodes) - 1:
		return "surface"
	}
	return "place " + units.Metre.Of(nodes[len(nodes)-1]-nodes[i]).String() + " below the surface"
}

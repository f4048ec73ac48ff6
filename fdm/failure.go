package fdm

import (
	"errors"

	"example.com/coolward/internal/fv"
	"example.com/coolward/internal/rosenbrock"
	"example.com/coolward/units"
)

// failure turns what ended a run into the error that says when, where and why.
func (p Problem) failure(tr *track, err error) error {
	e := &units.ConvergenceError{Method: "finite volumes", Time: units.Second.Of(tr.end), Cause: err}
	var function *fv.FunctionError
	var left *fv.RangeError
	var event *eventError
	switch {
	case errors.As(err, &function):
		e.Place, e.Reason = tr.functionFailed(function)
		e.Cause = function.Cause
	case errors.As(err, &left):
		e.Place = tr.nodeName(left.Node)
		e.Reason = "the body leaves the range of its material; take a material with a wider range, or a shorter horizon"
		e.Cause = tr.wall.leftRange(left)
	case errors.As(err, &event):
		e.Reason, e.Cause = "the event "+event.name+" failed", event.cause
	case errors.Is(err, rosenbrock.ErrSteps), errors.Is(err, fv.ErrSteps):
		e.Cause = nil
		e.Reason = "the greatest number of steps is used up; take a shorter horizon, a larger tolerance or a smoother exchange function"
	case errors.Is(err, rosenbrock.ErrShort):
		e.Cause = nil
		e.Reason = "no step is short enough for the tolerance; take a larger tolerance or an exchange function without jumps"
	case errors.Is(err, fv.ErrNewton), errors.Is(err, rosenbrock.ErrNewton):
		e.Cause = nil
		e.Reason = "the equations of a step do not settle; take a shorter time step"
	default:
		e.Reason = "stopped by the caller"
	}
	return e
}

// functionFailed names the place at which a function of the caller failed, and how.
func (tr *track) functionFailed(f *fv.FunctionError) (place, reason string) {
	at := " at a temperature of " + units.Kelvin.Of(f.Temperature).String()
	switch f.What {
	case fv.Source:
		return tr.nodeName(f.Node), "the source failed" + at
	case fv.Between:
		return tr.nodeName(f.Node), "the contact between layers failed" + at
	case fv.Opposite:
		place = "opposite face"
	case fv.SurfaceLump:
		return "lump at the surface", "the exchange function failed" + at
	case fv.OppositeLump:
		return "lump at the opposite face", "the exchange function failed" + at
	default:
		place = "surface"
	}
	return place, "the exchange function failed at a surface temperature of " + units.Kelvin.Of(f.Temperature).String()
}

// leftRange returns the error of the material of a node, or of its table where its range is open.
func (w wall) leftRange(left *fv.RangeError) error {
	T := units.Kelvin.Of(left.Temperature)
	l := w.layerOf(left.Node)
	if err := inRange(l.Material, T); err != nil {
		return err
	}
	low, high := supported(l.Material, T)
	return &units.RangeError{
		Model: "material as tabulated", Quantity: "temperature", Value: T.Dynamic(),
		Min: units.Kelvin.Of(low).Dynamic(), Max: units.Kelvin.Of(high).Dynamic(),
	}
}

// layerOf returns the layer of a node of the fine grid.
func (w wall) layerOf(node int) Layer {
	for j := len(w.layers) - 1; j > 0; j-- {
		if node -= w.cells[j] + 1; node < 0 {
			return w.layers[j]
		}
	}
	return w.layers[0]
}

// atStart returns the error of a start that cannot be.
func (s *Solution) atStart(err error) error {
	var left *fv.RangeError
	var function *fv.FunctionError
	switch {
	case errors.As(err, &left):
		return s.wall.leftRange(left)
	case errors.As(err, &function):
		return function.Cause
	}
	return err
}

// nodeName names the place of a node.
func (tr *track) nodeName(i int) string {
	nodes := tr.system.Grid.Nodes
	switch {
	case i == 0 && (tr.system.Grid.Geometry.Radius == 0 && tr.system.Grid.Geometry.Exponent > 0 || tr.wall.half):
		return "centre"
	case i == 0:
		return "opposite face"
	case i == len(nodes)-1:
		return "surface"
	}
	return "place " + units.Metre.Of(tr.system.Grid.Length-nodes[i]).String() + " below the surface"
}

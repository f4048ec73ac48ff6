package fdm

import (
	"context"

	"example.com/coolward/internal/fv"
	"example.com/coolward/internal/rosenbrock"
	"example.com/coolward/units"
)

// A history is what came of the steps in time.
type history interface {
	Steps() int
	Time(k int) float64
	State(k int) []float64
	Find(t float64) (k int, s float64)
	Value(k int, s float64, i int) float64
	Cubic(k, i int) [4]float64
}

// A track is one run: the equations of one grid and what came of them.
type track struct {
	system     *fv.System
	wall       wall
	history    history
	end        float64 // of the solution
	statistics rosenbrock.Statistics
	stepErrors []float64 // at the end of each step, the sum of estimated errors until then, K
	stopped    string    // the event that ended it, or nothing
	events     *watch    // over what ends it
}

// A runner makes tracks.
type runner struct {
	ctx         context.Context
	problem     Problem
	wall        wall
	start       float64
	done, share float64 // part of the work that is done before, and in this run
}

// run solves up to a time, until every node has passed a temperature, or to an event. The track is never nil
// and holds what was computed before an error.
func (r runner) run(system *fv.System, end float64, until units.Temperature, events []Event) (*track, error) {
	p := r.problem
	tr := &track{system: system, wall: r.wall, stepErrors: make([]float64, 1, 64)}
	longest := end
	if !p.steady() || len(events) > 0 {
		longest = end / stepsPerHorizon
	}
	passed := r.passed(system, until)
	watch, err := tr.watch(events, p)
	if err != nil {
		tr.history, tr.end = noHistory(system.Start()), 0
		return tr, p.failure(tr, err)
	}
	accepted := func(t float64, y []float64, size float64) (bool, error) {
		system.Switch(len(tr.stepErrors), y)
		tr.stepErrors = append(tr.stepErrors, tr.stepErrors[len(tr.stepErrors)-1]+fv.LocalError*size*p.tolerance())
		if p.Progress != nil {
			p.Progress(r.done + r.share*t/end)
		}
		if err := r.ctx.Err(); err != nil {
			return false, err
		}
		if stop, err := watch.passed(t, y); stop || err != nil {
			return stop, err
		}
		return passed != nil && passed(y), nil
	}
	steps := mostSteps
	if err = r.ctx.Err(); err != nil {
		steps = 0 // nothing but the start
	}
	var failure error
	if p.Scheme == Adaptive {
		tr.history, tr.statistics, failure = integrate(system, p.bends(end), rosenbrock.Options{
			MaxStep: longest, MaxSteps: steps, Accepted: accepted, Work: p.work.steps(),
		})
	} else {
		var h *fv.Record
		h, tr.statistics.Steps, tr.statistics.Evaluations, failure = system.March(fv.Scheme{
			Implicitness: p.Scheme.implicitness(), Step: p.TimeStep.SI(), End: end, MostSteps: p.mostSteps(steps), Accepted: accepted,
		})
		tr.history = h
	}
	tr.end = tr.history.Time(tr.history.Steps())
	if err == nil {
		err = failure
	}
	if err == nil {
		err = watch.locate(nil)
	}
	if err != nil {
		return tr, p.failure(tr, err)
	}
	tr.events = watch
	return tr, nil
}

// again solves by steps that end at the times of a run that was made.
func (r runner) again(system *fv.System, times []float64) (*track, error) {
	p := r.problem
	tr := &track{system: system, wall: r.wall}
	steps, end := 0, times[len(times)-1]
	var err error
	tr.history, tr.statistics, err = integrate(system, p.bends(end), rosenbrock.Options{
		Times: times, MaxStep: end, MaxSteps: len(times), Work: p.work.steps(),
		Accepted: func(t float64, y []float64, _ float64) (bool, error) {
			steps++
			system.Switch(steps, y)
			if p.Progress != nil {
				p.Progress(r.done + r.share*t/end)
			}
			return false, r.ctx.Err()
		},
	})
	tr.end = tr.history.Time(tr.history.Steps())
	if err != nil {
		return tr, p.failure(tr, err)
	}
	return tr, nil
}

// A workspace is the storage that runs use one after the other.
type workspace struct {
	integration rosenbrock.Workspace
	scratch     fv.Scratch
}

func (w *workspace) steps() *rosenbrock.Workspace {
	if w == nil {
		return nil
	}
	return &w.integration
}

func (w *workspace) scratchOf() *fv.Scratch {
	if w == nil {
		return nil
	}
	return &w.scratch
}

// noHistory is that of a run that did not begin.
func noHistory(start []float64) history { return fv.NewRecord(start) }

// passed returns a function that tells whether every node has passed a temperature; nil if there is
// none to pass.
func (r runner) passed(system *fv.System, until units.Temperature) func(y []float64) bool {
	if until == (units.Temperature{}) || until.SI() == r.start {
		return nil
	}
	sign := 1.0
	if until.SI() < r.start {
		sign = -1
	}
	nodes := len(system.Grid.Nodes)
	return func(y []float64) bool {
		// The inner end is often the last, so that one look suffices.
		for i := range nodes {
			if sign*(system.NodeTemperature(i, fv.Latest, y[system.Index(i)])-until.SI()) < 0 {
				return false
			}
		}
		return true
	}
}

package fdm

import (
	"context"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
)

// A ladder is what a solution is made of: runs on a grid, on one with half the cells and on one with a quarter, all by
// the steps of the first, and once more on the coarsest by steps of half the length. All but the first may be missing.
type ladder struct {
	fine, coarse *track
	coarsest     *track
	halved       *track  // of a textbook scheme on the fine grid
	weight       float64 // of what the fine grid differs by from the coarse one in the values reported; 0: none
	stepFactor   float64 // of the difference to steps of half the length, in the error of the steps
	throughCell  float64 // s, until heat has come through the outermost cell
	pilot        bool    // it is the first of several grids
	first        float64 // s, from when on the largest error is looked for
}

// timeOrder returns the order of the steps in time.
func (s *Solution) timeOrder() float64 {
	switch {
	case s.problem.Scheme == CrankNicolson:
		return 2
	case s.problem.Scheme != Adaptive || s.changesForGood():
		return 1
	case s.fine.system.Melts():
		return 2
	}
	return 4
}

// changesForGood reports whether a material does.
func (s *Solution) changesForGood() bool {
	for _, c := range s.changes {
		if c.Table != nil {
			return true
		}
	}
	return false
}

// climb makes the runs on coarser grids. What ends one of them leaves the solution without extrapolation or without
// an estimate, but for the context, whose error it returns.
func (s *Solution) climb(ctx context.Context) error {
	r := runner{ctx: ctx, problem: s.problem, wall: s.wall, start: s.start.SI(), done: shareOfFine, share: shareOfRung}
	system, err := s.system(1)
	if err != nil {
		s.coarseFailure = s.atStart(err)
		return nil
	}
	if s.problem.Scheme != Adaptive {
		if s.coarse, s.coarseFailure = r.run(system, s.fine.end, units.Temperature{}, nil); s.coarseFailure == nil {
			s.coarseFailure = s.halve(ctx)
		}
		return s.cancelled(ctx)
	}
	times := make([]float64, s.fine.history.Steps())
	for k := range times {
		times[k] = s.fine.history.Time(k + 1)
	}
	if s.coarse, s.coarseFailure = r.again(system, times); s.coarseFailure != nil && ctx.Err() == nil {
		// The coarse grid may ask for other steps.
		if system, s.coarseFailure = s.system(1); s.coarseFailure == nil {
			s.coarse, s.coarseFailure = r.run(system, s.fine.end, units.Temperature{}, nil)
		}
	}
	if s.coarseFailure != nil {
		return s.cancelled(ctx)
	}
	if !s.fine.system.Melts() && !s.changesForGood() {
		s.weight = 1 / s.refinement(0)
	}
	halvings := 2
	if s.wall.least()>>halvings < leastOfGrid {
		halvings = 1
	}
	s.coarsest = s.coarse
	if halvings == 2 {
		r.done += r.share
		if s.coarsest = s.rung(r, halvings, times); s.coarsest == nil {
			return s.cancelled(ctx)
		}
	}
	r.done += r.share
	s.halved = s.rung(r, halvings, halve(times))
	return s.cancelled(ctx)
}

// leastOfGrid is the least number of cells of a layer on the coarsest grid.
const leastOfGrid = 2

// Parts of the work.
const (
	shareOfFine = 0.55
	shareOfRung = 0.15
)

// rung returns the run on a coarser grid, or nil if it ends early.
func (s *Solution) rung(r runner, halvings int, times []float64) *track {
	system, err := s.system(halvings)
	if err != nil {
		return nil
	}
	tr, err := r.again(system, times)
	if err != nil {
		return nil
	}
	return tr
}

// cancelled returns the error of a context that ended.
func (s *Solution) cancelled(ctx context.Context) error {
	if err := ctx.Err(); err != nil {
		return s.problem.failure(s.fine, err)
	}
	return nil
}

// halve returns the ends of steps of half the length.
func halve(times []float64) []float64 {
	halves := make([]float64, 0, 2*len(times))
	last := 0.0
	for _, t := range times {
		halves = append(halves, (last+t)/2, t)
		last = t
	}
	return halves
}

// halve runs a textbook scheme once more with steps of half the length.
func (s *Solution) halve(ctx context.Context) error {
	p := s.problem
	p.TimeStep, p.Progress = p.TimeStep.Scale(0.5), nil
	system, err := s.system(0)
	if err != nil {
		return s.atStart(err)
	}
	tr, err := runner{ctx: ctx, problem: p, wall: s.wall, start: s.start.SI()}.run(system, s.fine.end, units.Temperature{}, nil)
	if err == nil {
		s.halved = tr
	}
	return err
}

// refinement returns what the difference between a grid and that with half the cells is divided by: 3 where all layers
// have exactly half.
func (s *Solution) refinement(halvings int) float64 {
	ratio := float64(s.wall.count(halvings)) / float64(s.wall.count(halvings+1))
	return ratio*ratio - 1
}

// sum returns a sum of components of the state at a time, as extrapolated.
func (s *Solution) sum(of func(y *fv.System) fv.Sum, t float64) float64 {
	q := s.fine.value(of(s.fine.system), t)
	if s.weight != 0 {
		q += s.weight * (q - s.coarse.value(of(s.coarse.system), t))
	}
	return q
}

// released returns the heat that has left through a face.
func (s *Solution) released(face string, t float64) float64 {
	return s.sum(func(y *fv.System) fv.Sum { return y.Released(face) }, t)
}

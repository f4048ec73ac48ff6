package fdm

import (
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// EnergyBalance returns the largest residual of the heat balance over the run, the change of the
// enthalpy of all volumes and lumps against the heat that has left and that a source has given, relative to
// the largest heat exchanged. It is 0 if no heat was exchanged, and of the order of rounding else.
func (s *Solution) EnergyBalance() float64 {
	if !s.made() || s.fine.exchanged == 0 {
		return 0
	}
	return s.fine.balance / s.fine.exchanged
}

// StepError returns an estimate of the error that the steps in time have made until t: the sum of the
// errors estimated for each, the largest over the body. The estimate belongs to the embedded method of
// order 3, the solution to that of order 4, and conduction evens errors out, so that the true error is
// usually far smaller. For a textbook scheme it is taken from a run with steps of half the length, by its
// order. The error is that of [Solution.At], or a [*units.ConvergenceError] if that run failed.
func (s *Solution) StepError(t units.Duration) (units.TemperatureDifference, error) {
	if err := s.checkTime(t); err != nil {
		return units.TemperatureDifference{}, err
	}
	if s.problem.Scheme != Adaptive && s.halved == nil {
		return units.TemperatureDifference{}, s.coarseFailure
	}
	return units.KelvinDifference.Of(s.stepError(t.SI())), nil
}

func (s *Solution) stepError(t float64) float64 {
	if t == 0 || s.fine.history.Steps() == 0 {
		return 0
	}
	if s.problem.Scheme == Adaptive {
		k, _ := s.fine.history.Find(t)
		return s.fine.stepErrors[k+1]
	}
	if s.halved == nil {
		return 0
	}
	worst := 0.0
	for i := range s.fine.system.Grid.Nodes {
		p := probe{first: i, count: 1}
		worst = max(worst, abs(s.fine.at(&p, t)-s.halved.at(&p, t)))
	}
	if s.problem.Scheme == CrankNicolson {
		return worst * 4 / 3
	}
	return worst * 2
}

// GridError returns an estimate of the error that the cells make at a place and time: the difference to
// the run with half the cells, over 3 as the error falls with the square of the number of cells (L. F.
// Richardson's extrapolation; P. J. Roache, J. Fluids Eng. 116, 1994, from memory). It is not negative.
// In the first moments, while the temperature has changed over a few cells at the surface only, the
// surface may be off by several times the estimate.
//
// The error is that of [Solution.At], or a [*units.ConvergenceError] if that run failed.
func (s *Solution) GridError(place shape.Place, t units.Duration) (units.TemperatureDifference, error) {
	if err := s.checkTime(t); err != nil {
		return units.TemperatureDifference{}, err
	}
	e, err := s.gridError(place, t.SI())
	return units.KelvinDifference.Of(e), err
}

func (s *Solution) gridError(place shape.Place, t float64) (float64, error) {
	if s.coarseFailure != nil {
		return 0, s.coarseFailure
	}
	p, err := s.fine.probe(place, s.problem.Body)
	if err != nil {
		return 0, err
	}
	q, err := s.coarse.probe(place, s.problem.Body)
	if err != nil {
		return 0, err
	}
	return abs(s.fine.at(&p, t)-s.coarse.at(&q, t)) / s.refinement(), nil
}

// refinement returns what the difference between both grids is divided by: 3 for half the cells.
func (s *Solution) refinement() float64 {
	half := 0
	for _, n := range s.wall.cells {
		half += n / 2
	}
	ratio := float64(s.wall.count()) / float64(half)
	return ratio*ratio - 1
}

// ErrorEstimate returns an estimate of the whole numerical error at a place and time: that of the grid,
// that of the steps and that of the table of the material. The error is that of [Solution.GridError].
func (s *Solution) ErrorEstimate(place shape.Place, t units.Duration) (units.TemperatureDifference, error) {
	grid, err := s.GridError(place, t)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	return units.KelvinDifference.Of(grid.SI() + s.stepError(t.SI()) + s.tableError()), nil
}

// tableError returns that of the worst table, in kelvin.
func (s *Solution) tableError() float64 {
	worst := 0.0
	for j, t := range s.tables {
		worst = max(worst, t.Error)
		if t := s.changes[j].Table; t != nil {
			worst = max(worst, t.Error)
		}
	}
	return worst
}

// estimate keeps the greatest grid error over the ends of all steps, at centre, surface and mean.
func (s *Solution) estimate() {
	if s.coarseFailure != nil {
		return
	}
	for i, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
		p, _ := s.fine.probe(place, s.problem.Body)
		q, _ := s.coarse.probe(place, s.problem.Body)
		h := s.fine.history
		for k := range h.Steps() + 1 {
			t := h.Time(k)
			if t > min(s.fine.end, s.coarse.end) {
				break
			}
			s.grid[i] = max(s.grid[i], abs(s.fine.at(&p, t)-s.coarse.at(&q, t))/s.refinement())
		}
	}
}

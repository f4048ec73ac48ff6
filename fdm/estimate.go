package fdm

import (
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// EnergyBalance returns the largest residual of the heat balance over the runs, the change of the
// enthalpy of all volumes and lumps against the heat that has left and that a source has given, relative to
// the largest heat exchanged. It is 0 if no heat was exchanged, and of the order of rounding else.
func (s *Solution) EnergyBalance() float64 {
	if !s.made() {
		return 0
	}
	worst := 0.0
	for _, tr := range []*track{s.fine, s.coarse} {
		if tr == nil {
			continue
		}
		balance, exchanged := 0.0, 0.0
		for k := range tr.history.Steps() + 1 {
			state := tr.history.State(k)
			balance = max(balance, abs(tr.system.Balance(state)))
			exchanged = max(exchanged, tr.system.Exchanged(state))
		}
		if exchanged > 0 {
			worst = max(worst, balance/exchanged)
		}
	}
	return worst
}

// GridError returns an estimate of the error that the cells make at a place and time, in the value that is
// reported: half of the difference between what the grids with all, half and a quarter of the cells extrapolate
// to, the greatest around that time. Where the error of the extrapolated value falls with the fourth power of the
// number of cells, that is seven times too much. Where nothing is extrapolated, in a body that melts or changes for good and
// with a textbook scheme, it is a third of the difference to half the cells, or more where that does not fall fourfold
// (P. J. Roache, J. Fluids Eng. 116, 1994, from memory). It is not negative.
//
// The error is that of [Solution.At], or a [*units.ConvergenceError] if the run with half the cells failed.
func (s *Solution) GridError(place shape.Place, t units.Duration) (units.TemperatureDifference, error) {
	g, err := s.toEstimate(place, t)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	grid, _ := s.around(&g, t.SI())
	return units.KelvinDifference.Of(grid), nil
}

// StepError returns an estimate of the error that the steps in time have made in the value that is reported at a place and
// time: by how much a run with steps of half the length differs, on the grid with a quarter of the cells, over what
// the order of the steps makes of it, 1.4 times that, and in the first moments a part of the tolerance. For a textbook scheme that run has all the cells. If it failed
// it is the sum of the errors estimated for each step, which is far more. The error is that of [Solution.GridError].
func (s *Solution) StepError(place shape.Place, t units.Duration) (units.TemperatureDifference, error) {
	g, err := s.toEstimate(place, t)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	_, step := s.around(&g, t.SI())
	return units.KelvinDifference.Of(step), nil
}

// ErrorEstimate returns an estimate of the whole numerical error at a place and time: that of the grid,
// that of the steps and that of the table of the material. The error is that of [Solution.GridError].
func (s *Solution) ErrorEstimate(place shape.Place, t units.Duration) (units.TemperatureDifference, error) {
	g, err := s.toEstimate(place, t)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	grid, step := s.around(&g, t.SI())
	return units.KelvinDifference.Of(grid + step + s.tableError() + rounding*s.at(&g, t.SI())), nil
}

// LargestError returns the largest [Solution.ErrorEstimate] over the solution at the places that people ask for: the surface,
// the centre or the opposite face, where layers meet, and the mean; from a Fourier number of 1e-4 of the outermost
// layer on, before which heat has come from its outermost hundredth only. The error is a
// [*units.ConvergenceError] if there is no estimate.
func (s *Solution) LargestError() (units.TemperatureDifference, error) {
	if err := s.check(); err != nil {
		return units.TemperatureDifference{}, err
	}
	if s.coarseFailure != nil {
		return units.TemperatureDifference{}, s.coarseFailure
	}
	return units.KelvinDifference.Of(s.worst.all), nil
}

// toEstimate returns the gauge of a place for an estimate at a time.
func (s *Solution) toEstimate(place shape.Place, t units.Duration) (gauge, error) {
	if err := s.checkTime(t); err != nil {
		return gauge{}, err
	}
	if s.coarseFailure != nil {
		return gauge{}, s.coarseFailure
	}
	return s.gauge(place)
}

const (
	rounding   = 1e-12 // of a temperature
	stepSafety = 1.4
	unseen     = 0.2 // of the tolerance, until a Fourier number of 0.01
	// What the difference of extrapolated values is divided by, and where the differences fall fourfold, to a half.
	leastErrors   = 2.0
	fallsFourfold = 5.0
)

// around returns the greatest estimates in the step in which a time lies, since an error changes its sign and is none at
// some moment by accident: of the grid at that time and at both ends, of the steps in the quarters too.
func (s *Solution) around(g *gauge, t float64) (grid, step float64) {
	h := s.fine.history
	if t == 0 || h.Steps() == 0 {
		return 0, 0
	}
	k, f := h.Find(t)
	end := s.endOf(k)
	grid = max(s.gridError(g, k, f), s.gridError(g, k, 0), s.gridError(g, k, end))
	step = s.stepError(g, k, f)
	for _, q := range quarters {
		step = max(step, s.stepError(g, k, q*end))
	}
	return grid, step
}

// endOf returns the fraction of a step at which the solution ends: 1 but for the last step of one that an event ended.
func (s *Solution) endOf(k int) float64 {
	h := s.fine.history
	return min((s.fine.end-h.Time(k))/(h.Time(k+1)-h.Time(k)), 1)
}

// in reads a run in a step of the fine grid after the fraction f of it; each of those may be several steps of the run.
func (s *Solution) in(tr *track, p *probe, k int, f float64) float64 {
	h, own := s.fine.history, tr.history
	switch own.Steps() {
	case h.Steps():
		if own.Time(k+1) == h.Time(k+1) {
			return tr.temperature(p, k, f)
		}
	case 2 * h.Steps():
		if own.Time(2*k+2) == h.Time(k+1) {
			i := min(int(2*f), 1)
			return tr.temperature(p, 2*k+i, 2*f-float64(i))
		}
	}
	return tr.at(p, h.Time(k)+f*(h.Time(k+1)-h.Time(k)))
}

var quarters = [...]float64{0, 0.25, 0.5, 0.75, 1}

// gridError returns the estimate in step k after the fraction f of it.
func (s *Solution) gridError(g *gauge, k int, f float64) float64 {
	a, b := s.fine.temperature(&g.fine, k, f), s.in(s.coarse, &g.coarse, k, f)
	if s.coarsest == nil || s.coarsest == s.coarse {
		return abs(a-b) / s.refinement(0)
	}
	c := s.in(s.coarsest, &g.coarsest, k, f)
	d, e := (a-b)/s.refinement(0), (b-c)/s.refinement(1)
	if s.weight == 0 {
		return max(abs(d), abs(e)/4)
	}
	divisor := leastErrors
	if 4*d < 1.5*e && 4*d > 0.75*e || 4*d > 1.5*e && 4*d < 0.75*e {
		divisor = fallsFourfold
	}
	return abs((a+d)-(b+e))/divisor + abs(a+d-s.temperature(g, k, f)) + s.unresolved(k, f)*abs(a-b)
}

// unresolved returns how many times the difference to half the cells the error may be while heat has not come through the
// outermost cell: its temperature goes with time then, that of a surface with the square root of it.
func (s *Solution) unresolved(k int, f float64) float64 {
	h := s.fine.history
	t := h.Time(k) + f*(h.Time(k+1)-h.Time(k))
	if t >= s.throughCell {
		return 0
	}
	return 2 * (math.Sqrt(s.throughCell/max(t, 1e-12*s.throughCell)) - 1)
}

// timeThroughCell returns the time in which heat comes through the outermost cell.
func (s *Solution) timeThroughCell() float64 {
	r := s.fine.system.Grid.Nodes
	n := len(r) - 1
	return (r[n] - r[n-1]) * (r[n] - r[n-1]) / s.diffusivity(0)
}

// stepError returns the estimate in step k after the fraction f of it.
func (s *Solution) stepError(g *gauge, k int, f float64) float64 {
	switch {
	case s.problem.Scheme != Adaptive:
		return abs(s.fine.temperature(&g.fine, k, f)-s.in(s.halved, &g.fine, k, f)) * s.stepFactor
	case s.halved == nil:
		return s.fine.stepErrors[k+1]
	}
	// What a coarse grid does not see of the first moments is a part of the tolerance.
	first := unseen * s.problem.tolerance() * s.first / (s.first + 0.01*s.fine.history.Time(k))
	return abs(s.in(s.coarsest, &g.coarsest, k, f)-s.in(s.halved, &g.coarsest, k, f))*s.stepFactor + first
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

// worst are the largest estimates over a solution, in kelvin.
type worst struct {
	all, steps, grid      float64
	centre, surface, mean float64 // of the grid
}

// estimate keeps the largest estimates over all steps.
func (s *Solution) estimate() {
	if s.coarseFailure != nil {
		return
	}
	w := &s.worst
	first := s.first
	h := s.fine.history
	within := quarters[2:3] // where steps are looked at, besides at their ends
	if s.weight == 0 {
		within = quarters[1:4]
	}
	for _, l := range s.places() {
		for k := range h.Steps() {
			from, length, end := h.Time(k), h.Time(k+1)-h.Time(k), s.endOf(k)
			if from+length < first && k < h.Steps()-1 {
				continue
			}
			step := s.stepError(&l.gauge, k, end)
			for _, q := range within {
				if from+q*end*length >= first {
					step = max(step, s.stepError(&l.gauge, k, q*end))
				}
			}
			grid := s.gridError(&l.gauge, k, end)
			if l.grid != nil {
				*l.grid = max(*l.grid, grid)
			}
			w.steps, w.grid = max(w.steps, step), max(w.grid, grid)
			w.all = max(w.all, grid+step)
		}
	}
	if w.all > 0 {
		w.all += s.tableError()
	}
}

// firstTime returns the time at which the Fourier number of the outermost layer is 1e-4.
func (s *Solution) firstTime() float64 {
	d := min(s.wall.layers[0].Thickness.SI(), s.problem.Body.ConductionLength().SI())
	return 1e-4 * d * d / s.diffusivity(0)
}

// diffusivity returns that of a layer at the start; infinity where it has none there.
func (s *Solution) diffusivity(layer int) float64 {
	m := s.wall.layers[layer].Material
	k, err1 := m.Conductivity(s.start)
	c, err2 := m.SpecificHeat(s.start)
	if err1 != nil || err2 != nil {
		return math.Inf(1)
	}
	return k.SI() / (m.Density().SI() * c.SI())
}

// A watched place is one at which the largest error is kept.
type watched struct {
	gauge gauge
	grid  *float64 // that of the grid alone, where it is asked for
}

// places returns the places that people ask for: the ends of all layers, and the mean.
func (s *Solution) places() []watched {
	g := s.fine.system.Grid
	var all []watched
	for part := len(g.First) - 2; part >= 0; part-- {
		from, to := g.First[part], g.First[part+1]-1
		surface, inner := watched{gauge: s.nodeGauge(to)}, watched{gauge: s.nodeGauge(from)}
		if part == len(g.First)-2 {
			surface.grid = &s.worst.surface
		}
		if part == 0 {
			inner.grid = &s.worst.centre
		}
		all = append(all, surface, inner)
	}
	mean, _ := s.gauge(shape.Mean())
	return append(all, watched{mean, &s.worst.mean})
}

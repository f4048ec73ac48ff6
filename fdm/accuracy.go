package fdm

import (
	"context"
	"math"
	"strconv"

	"example.com/coolward/units"
)

// Constants of the choice of the grid.
const (
	defaultAccuracy  = 0.01  // K
	leastAccuracy    = 1e-6  // K
	forSteps         = 0.25  // of the accuracy, the tolerance of a step
	forStepsOfLayers = 0.07  // likewise, first, in a body of several layers
	guessedCells     = 44    // of a first grid, at a steepness of 100 K and the default accuracy
	mostGuessed      = 96    // of a first grid, at the default accuracy
	forTable         = 0.003 // of the accuracy, the error of the table of a material
	mostForSteps     = 0.6   // of the accuracy, for the error of the steps
	pilotFactor      = 24    // on the first grid, the tolerance over that of the others
	pilotExcess      = 4.0
	cellsInLayer     = 4  // of the first grid, in the layer that heat comes through until the horizon
	firstCells       = 32 // a multiple of 8, as are all
	mostGrowth       = 8  // from one grid to the next
	leastGrowth      = 1.25
	aim              = 0.8 // of what is allowed, for the next grid
	mostAttempts     = 12
	leastPart        = 0.003 // of a tolerance, for the next one
	settleMelting    = 128   // cells beyond which an accuracy that nobody asked for is left in a body that melts
	settleTolerance  = 1e-3  // K, likewise
	settleFor        = 512   // cells, beyond which an accuracy that nobody asked for is left
)

// choosesGrid reports whether the grid and the tolerance are to be chosen.
func (p Problem) choosesGrid() bool {
	return p.Cells == 0 && p.Tolerance.SI() == 0 && p.Smallest.SI() == 0 && p.Scheme == Adaptive
}

func (p Problem) checkAccuracy() error {
	a := p.Accuracy.SI()
	switch {
	case a == 0:
		return nil
	case !(a >= leastAccuracy && a <= mostTolerance):
		return &units.ArgumentError{Field: "accuracy", Value: p.Accuracy, Accepted: "0 for the default, or 1 µK to 10 K"}
	case !p.choosesGrid():
		return &units.ArgumentError{Field: "accuracy", Value: p.Accuracy, Accepted: "none beside cells, a smallest cell, a tolerance or a textbook scheme"}
	}
	return nil
}

// accuracy returns the error in kelvin that is aimed at.
func (p Problem) accuracy() float64 {
	if a := p.Accuracy.SI(); a != 0 {
		return a
	}
	return defaultAccuracy
}

// search solves on finer and finer grids until the estimated error is within the accuracy. The first is a guess, or is to
// find out with few steps how fine the next has to be; the next ones follow from the errors of the last: that of
// extrapolated values falls with the fourth power of the number of cells at best.
func (s *Solution) search(ctx context.Context) (*Solution, error) {
	wanted := s.problem.accuracy()
	own := s.problem.Accuracy.SI() == 0
	next, err := s.begin(ctx, wanted)
	if err != nil || !next.pilot && next.worst.all <= wanted {
		return next, err
	}
	first := 2
	if next.pilot {
		first = 1
	}
	for i := first; ; i++ {
		cells, tolerance := next.nextCells(wanted), next.nextTolerance(wanted)
		if most, least := s.farthest(next); cells > most || tolerance < least || i > mostAttempts {
			is := "the estimated error is " + units.KelvinDifference.Of(next.worst.all).String() + " with " + strconv.Itoa(next.wall.count(0)) + " cells"
			if !own {
				return next, &units.ConvergenceError{Method: "finite volumes", Time: next.Horizon(), Reason: is + "; take a larger accuracy"}
			}
			cells, tolerance = min(cells, most), max(tolerance, least)
			if i > mostAttempts || i > 1 && cells <= next.problem.Cells && tolerance >= next.problem.tolerance() {
				next.warnings = append(next.warnings, is)
				return next, nil
			}
		}
		if cells <= next.problem.Cells && tolerance >= next.problem.tolerance() {
			tolerance /= 2
		}
		if next, err = s.attempt(ctx, i, cells, tolerance); err != nil || next.worst.all <= wanted {
			return next, err
		}
	}
}

// begin solves on the first grid: one that is likely to do, or where nothing is known of that, a coarse one with few steps.
func (s *Solution) begin(ctx context.Context, wanted float64) (*Solution, error) {
	if cells, part := s.guess(wanted); cells > 0 {
		return s.attempt(ctx, 1, cells, part*wanted)
	}
	return s.attempt(ctx, 0, firstCells, min(pilotFactor*s.problem.tolerance(), mostTolerance))
}

// guess returns the number of cells and the part of the accuracy for a step that are likely to keep the accuracy: of a body
// of one material by the fourth root of what the temperature would fall by over its length if the heat flow at the start
// went through. It is 0 where nothing is known, in a body that melts or changes for good, and for accuracies far below
// the default.
func (s *Solution) guess(wanted float64) (cells int, forStep float64) {
	if wanted < defaultAccuracy/10 {
		return 0, 0
	}
	for j, t := range s.tables {
		if t.Melts() || s.changes[j].Table != nil {
			return 0, 0
		}
	}
	finer := math.Pow(defaultAccuracy/wanted, 0.25)
	n := mostGuessed * min(finer, 1)
	forStep = forStepsOfLayers
	if len(s.tables) == 1 {
		n, forStep = min(n, guessedCells*finer*math.Pow(s.steepness()/100, 0.25)), forSteps
	}
	return 8 * int(math.Ceil(max(n, firstCells)/8)), forStep
}

// steepness returns the heat flux through the faces of a body of one material at its start, at the beginning or the end,
// times its length over its conductivity, in kelvin; infinity where it is not known.
func (s *Solution) steepness() float64 {
	p, most := s.problem, 0.0
	k, err := p.Material.Conductivity(s.start)
	if err != nil || p.Profile != nil || p.Source != nil {
		return math.Inf(1)
	}
	for _, c := range p.conditions() {
		for _, t := range []units.Duration{{}, p.Horizon} {
			q, err := c.Flux(t, s.start)
			if err != nil || math.IsNaN(q.SI()) {
				return math.Inf(1)
			}
			most = max(most, abs(q.SI()))
		}
	}
	return most * s.wall.length / k.SI()
}

// farthest returns the greatest number of cells and the least tolerance that are taken for an accuracy.
func (s *Solution) farthest(last *Solution) (cells int, tolerance float64) {
	switch {
	case s.problem.Accuracy.SI() != 0:
		return mostCells, leastTolerance
	case last.weight == 0:
		return settleMelting, settleTolerance
	}
	return settleFor, settleTolerance / 100
}

// attempt solves on one grid.
func (s *Solution) attempt(ctx context.Context, number, cells int, tolerance float64) (*Solution, error) {
	next := *s
	next.pilot = number == 0
	next.problem.Cells, next.problem.Tolerance = cells, units.KelvinDifference.Of(tolerance)
	if d := math.Sqrt(s.diffusivity(0)*s.problem.Horizon.SI()) / cellsInLayer; d < s.problem.Body.Thickness().SI()*0.2/firstCells && !s.problem.Uniform {
		next.problem.Smallest = units.Metre.Of(d * firstCells / float64(cells))
	}
	next.wall = next.problem.wall(s.start)
	if told := s.problem.Progress; told != nil { // a tenth, and half of what is left, each
		done, share := 0.0, 0.1
		if number > 0 {
			share = 0.9 * math.Pow(0.5, float64(number))
			done = 1 - 2*share
		}
		next.problem.Progress = func(part float64) { told(done + share*part) }
	}
	if err := next.solve(ctx); err != nil {
		return &next, err
	}
	return &next, next.coarseFailure
}

// nextCells returns how many cells are to keep the error of the grid within its part of the accuracy.
func (s *Solution) nextCells(wanted float64) int {
	excess := s.worst.grid / ((1 - mostForSteps) * aim * wanted)
	if s.pilot { // whose first steps see less of the first moments
		excess *= pilotExcess
	}
	if excess <= 1 {
		return s.problem.Cells
	}
	order := 4.0
	if s.weight == 0 {
		order = 1.5
	}
	growth := min(max(math.Pow(excess, 1/order), leastGrowth), mostGrowth)
	return 8 * int(math.Ceil(float64(s.problem.Cells)*growth/8))
}

// nextTolerance returns the tolerance that is to keep the error of the steps within its part.
func (s *Solution) nextTolerance(wanted float64) float64 {
	part := mostForSteps * aim * wanted / s.worst.steps
	if s.pilot {
		return s.problem.tolerance() * min(max(part, leastPart), 1)
	}
	if s.worst.steps > mostForSteps*wanted {
		return s.problem.tolerance() * max(math.Pow(part, 1.5), leastPart)
	}
	return s.problem.tolerance()
}

package fdm

import (
	"context"
	"math"
	"strconv"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A Problem is a body that starts at one temperature and exchanges heat through its surface. Fields
// without a default must be set.
type Problem struct {
	Body     shape.Body // a solid sphere, a long cylinder or a plate: of the families Spherical, Cylindrical, Planar
	Material Material
	Initial  units.Temperature
	Surface  boundary.Condition

	// Horizon is how long the body is followed. A surface that jumps in time is best solved up to the
	// jump, since a short event may pass between steps, which are at most a sixteenth of the horizon
	// for an exchange function.
	Horizon units.Duration

	// Until, if it is set, ends the solution once every node of the body has passed that temperature;
	// the solution then ends there. It does nothing if it equals Initial.
	Until units.Temperature

	// Cells is the number of cells between centre and surface, 8 to 10 000; 0 stands for 100. The error
	// falls with its square.
	Cells int

	// Tolerance is the estimated error allowed in one step, 1 nK to 10 K; 0 stands for 1 mK. With a
	// material whose specific heat jumps many-fold, a larger one takes more steps, not fewer.
	Tolerance units.TemperatureDifference

	// Progress, if it is set, is called after every step with the part of the horizon that is done,
	// 0 to 1, from the goroutine that solves.
	Progress func(done float64)

	Sources, Notes []string // repeated unread in the derivation
}

const (
	defaultCells     = 100
	defaultTolerance = 1e-3 // K
	leastCells       = 8
	mostCells        = 10_000
	leastTolerance   = 1e-9
	mostTolerance    = 10.0
	mostSteps        = 20_000
	stepsPerHorizon  = 16 // least number of steps with an exchange function
)

// Solve computes the temperatures over the horizon, and once more with half the cells for the
// estimate of the grid error. The context ends it between two steps.
//
// Errors: [*units.ArgumentError] for a field that cannot be, and [*units.RangeError] for a start outside
// the range of the material, both with a nil solution; [*units.ConvergenceError] when the run ended
// early, because the body left the range of its material (the cause is a [*units.RangeError]), the
// exchange function failed (the cause is its error), the context ended (the cause is its error) or the
// tolerance could not be kept. The solution beside a ConvergenceError is not nil and is readable until
// then.
func (p Problem) Solve(ctx context.Context) (*Solution, error) {
	if err := p.check(ctx); err != nil {
		return nil, err
	}
	table, err := p.table()
	if err != nil {
		return nil, err
	}
	if err := p.checkDerived(); err != nil {
		return nil, err
	}
	s := &Solution{problem: p, table: table}
	s.problem.Sources = append([]string(nil), p.Sources...)
	s.problem.Notes = append([]string(nil), p.Notes...)
	cells := p.cells()
	fine := runner{ctx: ctx, problem: p, share: 0.75}
	s.fine, err = fine.run(s.system(cells), p.Horizon.SI(), p.Until)
	s.limit = s.findLimit()
	if err != nil {
		s.coarseFailure = err
		return s, err
	}
	coarse := runner{ctx: ctx, problem: p, share: 0.25, done: 0.75}
	s.coarse, s.coarseFailure = coarse.run(s.system(cells/2), s.fine.history.End(), units.Temperature{})
	if s.coarseFailure != nil && ctx.Err() != nil {
		return s, s.coarseFailure
	}
	if p.Progress != nil {
		p.Progress(1)
	}
	s.estimate()
	return s, nil
}

// system returns the equations with the given number of cells.
func (s *Solution) system(cells int) *fv.System {
	p := s.problem
	surface := fv.Surface{}
	if h, ambient, ok := p.Surface.Constants(); ok {
		surface.Coefficient, surface.Ambient = h.SI(), ambient.SI()
	} else {
		surface.Function = func(t, T float64) (float64, error) {
			q, err := p.Surface.Flux(units.Second.Of(t), units.Kelvin.Of(T))
			return q.SI(), err
		}
	}
	return fv.NewSystem(grid(p.Body, cells), s.table, surface, p.tolerance())
}

// grid divides the body. A plate that is exposed on both faces is half of it with the area of both.
func grid(b shape.Body, cells int) *fv.Grid {
	length, area := b.ConductionLength().SI(), b.Area().SI()
	switch b.Family() {
	case shape.Cylindrical:
		return fv.Cylinder(length, area/(2*math.Pi*length), cells)
	case shape.Planar:
		return fv.Slab(length, area, cells)
	}
	return fv.Sphere(length, cells)
}

func (p Problem) cells() int {
	if p.Cells == 0 {
		return defaultCells
	}
	return p.Cells
}

// tolerance returns the tolerance in kelvin.
func (p Problem) tolerance() float64 {
	if t := p.Tolerance.SI(); t != 0 {
		return t
	}
	return defaultTolerance
}

// check returns an [*units.ArgumentError] for the first field that cannot be used.
func (p Problem) check(ctx context.Context) error {
	if ctx == nil {
		return &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if err := p.Body.Check(); err != nil {
		return err
	}
	switch p.Body.Family() {
	case shape.Spherical, shape.Cylindrical, shape.Planar:
	default:
		return &units.ArgumentError{Field: "body", Value: p.Body, Accepted: "a solid sphere, a cylinder whose ends are not exposed, or a plate"}
	}
	// Volumes and areas of the smallest cells must be ordinary numbers.
	if r := p.Body.ConductionLength().SI(); !(r >= 1e-9 && r <= 1e9) {
		return &units.ArgumentError{Field: "body: conduction length", Value: p.Body.ConductionLength(), Accepted: "1 nm to 1e9 m"}
	}
	if p.Material == nil {
		return &units.ArgumentError{Field: "material", Accepted: "a material"}
	}
	if err := units.CheckPositive("material: density", p.Material.Density()); err != nil {
		return err
	}
	low, high := p.Material.Range()
	if math.IsNaN(low.SI()) || math.IsNaN(high.SI()) || !(low.SI() < high.SI()) {
		return &units.ArgumentError{Field: "material: range from", Value: low, Accepted: "a temperature below the upper end, " + high.String()}
	}
	if err := units.CheckTemperature("initial temperature", p.Initial); err != nil {
		return err
	}
	if err := p.Surface.CheckExchange(); err != nil {
		return err
	}
	if err := units.CheckPositive("horizon", p.Horizon); err != nil {
		return err
	}
	if p.Until != (units.Temperature{}) {
		if err := units.CheckTemperature("until", p.Until); err != nil {
			return err
		}
	}
	if n := p.Cells; n != 0 && (n < leastCells || n > mostCells) {
		return &units.ArgumentError{Field: "cells", Value: n, Accepted: "0 for the default, or " + strconv.Itoa(leastCells) + " to " + strconv.Itoa(mostCells)}
	}
	if t := p.tolerance(); !(t >= leastTolerance && t <= mostTolerance) {
		return &units.ArgumentError{Field: "tolerance", Value: p.Tolerance, Accepted: "0 for the default, or 1 nK to 10 K"}
	}
	return nil
}

// checkDerived refuses fields that are possible one by one but lead towards the ends of the range of float64.
func (p Problem) checkDerived() error {
	k, err := p.Material.Conductivity(p.Initial)
	if err != nil {
		return err
	}
	c, err := p.Material.SpecificHeat(p.Initial)
	if err != nil {
		return err
	}
	h, _, _ := p.Surface.Constants()
	radius, capacity := p.Body.ConductionLength().SI(), p.Material.Density().SI()*c.SI()
	for _, d := range []struct {
		name string
		x    float64
	}{
		{"heat capacity ρ c V in J/K", capacity * p.Body.Volume().SI()},
		{"diffusivity k/(ρ c) in m²/s", k.SI() / capacity},
		{"time R²/α in s", radius * radius * capacity / k.SI()},
		{"1 + Biot number h R/k", 1 + h.SI()*radius/k.SI()},
		{"horizon in s", p.Horizon.SI()},
	} {
		if !(d.x >= 1e-100 && d.x <= 1e100) {
			return &units.ArgumentError{Field: d.name, Value: d.x, Accepted: "fields that give 1e-100 to 1e100"}
		}
	}
	return nil
}

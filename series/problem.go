package series

import (
	"context"
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A Problem is a body that is put into surroundings at time 0. Body, the properties, Initial and Surface must be set;
// the fields from Opposite to SourceLog are for bodies of one coordinate.
type Problem struct {
	Body         shape.Body         // a plate, a long cylinder, a tube, a sphere, a hollow sphere, or a cylinder or brick exposed on all its faces
	Conductivity units.Conductivity // of the body, above 0
	Density      units.Density      // of the body, above 0
	SpecificHeat units.SpecificHeat // of the body, above 0
	Initial      units.Temperature  // of the whole body at time 0; none beside a Profile
	Surface      boundary.Condition // of boundary.Constant, where a coefficient of 0 is an insulated face, Temperature, Flux, Following or TemperatureFollowing

	Opposite  boundary.Condition // at the opposite face: the back of a plate, the inside of a hollow body; zero: that of Surface if the face is exposed, else insulated
	Profile   shape.Profile      // temperature at the start over the depth below Surface, in place of Initial
	Source    units.HeatSource   // set free in the body from time 0 on; one that takes up heat is negative
	SourceLog []SourceReading    // what is set free besides, over time; the solution ends with it

	Sources []string // where the data come from; the derivation repeats them
	Notes   []string // remarks that the derivation repeats
}

// Solve prepares the solution: within microseconds, a wall or a source within tens of them and a tube of a thick wall or
// an initial profile within some milliseconds. It returns an [*units.ArgumentError] for a field that cannot be used,
// and for fields whose Biot number, diffusivity, time scale or heat content no float64 holds; and the error of ctx if
// that is done.
func (p Problem) Solve(ctx context.Context) (*Solution, error) {
	if err := checkSolid(ctx, p.Conductivity, p.Density, p.SpecificHeat); err != nil {
		return nil, err
	}
	if err := p.check(); err != nil {
		return nil, err
	}
	p.keep()
	p.Surface, p.Opposite = settledSurface(p.Surface), settledSurface(p.Opposite)
	if p.needsWall() {
		w, err := p.solveWall()
		if err != nil {
			return nil, err
		}
		return &Solution{problem: p, wall: w}, nil
	}
	h, ambient, _ := p.Surface.Constants()
	surface, prescribed := p.Surface.SurfaceTemperature()
	q, flux := p.Surface.ConstantFlux()
	switch {
	case prescribed:
		ambient = surface
	case flux:
		ambient = units.Kelvin.Of(0) // of no account
	}
	course, follows := courseOf(p.Surface)
	if follows {
		var err error
		if ambient, err = course.At(units.Duration{}); err != nil {
			return nil, err
		}
		h, _, prescribed = p.Surface.Following()
		prescribed = !prescribed
	}
	s := &Solution{
		problem:     p,
		coefficient: h,
		ambient:     ambient,
		prescribed:  prescribed,
		diffusivity: p.Conductivity.SI() / (p.Density.SI() * p.SpecificHeat.SI()),
		excess:      p.Initial.SI() - ambient.SI(),
	}
	s.heat = p.Body.Volume().SI() * p.Density.SI() * p.SpecificHeat.SI() * s.excess
	if err := s.addFactors(p.Body.Factors()); err != nil {
		return nil, err
	}
	switch {
	case flux:
		if err := s.setFlux(q); err != nil {
			return nil, err
		}
	case follows:
		if err := s.follow(course); err != nil {
			return nil, err
		}
	}
	return s, nil
}

// addFactors solves the bodies of one coordinate that the body is made of.
func (s *Solution) addFactors(bodies []shape.Body) error {
	first := bodies[0].ConductionLength().SI()
	s.scale = first * first / s.diffusivity
	if err := s.checkDerived(); err != nil {
		return err
	}
	for i, b := range bodies {
		length := b.ConductionLength().SI()
		ratio := first / length
		bi := math.Inf(1)
		if !s.prescribed {
			bi = s.coefficient.SI() * length / s.problem.Conductivity.SI()
			if math.IsInf(bi, 0) || (bi == 0) != (s.coefficient.SI() == 0) {
				return outOfRange("Biot number h R/k", bi)
			}
		}
		if slow := s.scale / (ratio * ratio); math.IsInf(slow, 0) {
			return outOfRange("time scale R²/alpha in s", slow)
		}
		if i > 0 && length == bodies[i-1].ConductionLength().SI() && b.Family() == bodies[i-1].Family() {
			s.factors[i] = s.factors[i-1]
			s.factors[i].body = b
		} else {
			s.factors[i] = factor{body: b, ratio: ratio * ratio, modes: newModes(b.Family(), bi)}
		}
	}
	s.count = len(bodies)
	return nil
}

// newModes returns the solution for a body of one coordinate.
func newModes(family shape.Family, bi float64) eigen.Solution {
	switch family {
	case shape.Planar:
		return eigen.NewPlate(bi)
	case shape.Cylindrical:
		return eigen.NewCylinder(bi)
	}
	return eigen.NewSphere(bi)
}

func (p Problem) check() error {
	for _, err := range []error{
		p.Body.Check(),
		p.checkStart(),
		p.Surface.Check(),
	} {
		if err != nil {
			return err
		}
	}
	if p.Body.Factors() == nil {
		return &units.ArgumentError{Field: "body", Value: p.Body.String(), Accepted: "a plate, sphere, hollow sphere or brick, a tube without its ends, or a cylinder exposed all round, at its ends or both"}
	}
	_, _, constant := p.Surface.Constants()
	_, prescribed := p.Surface.SurfaceTemperature()
	_, flux := p.Surface.ConstantFlux()
	_, follows := courseOf(p.Surface)
	if !constant && !prescribed && !flux && !follows {
		return &units.ArgumentError{Field: "surface condition", Value: p.Surface.String(), Accepted: "boundary.Constant(h, ambient), boundary.Temperature(T), boundary.Flux(q), boundary.Following(h, course) or boundary.TemperatureFollowing(course)"}
	}
	if p.needsWall() {
		return p.checkWall()
	}
	return nil
}

// checkStart checks a uniform start.
func (p *Problem) checkStart() error {
	if p.Profile != nil {
		return nil
	}
	return units.CheckTemperature("initial temperature", p.Initial)
}

// checkDerived refuses fields that are possible one by one but lead out of the range of float64.
func (s *Solution) checkDerived() error {
	for _, d := range []struct {
		name string
		x    float64
		bad  bool
	}{
		{"diffusivity k/(rho c) in m²/s", s.diffusivity, !(s.diffusivity > 0)},
		{"time scale R²/alpha in s", s.scale, !(s.scale > 0)},
		{"heat content rho c V (T0 − Tinf) in J", s.heat, math.IsNaN(s.heat) || (s.heat == 0) != (s.excess == 0)},
	} {
		if d.bad || math.IsInf(d.x, 0) {
			return outOfRange(d.name, d.x)
		}
	}
	return nil
}

func outOfRange(name string, x float64) error {
	return &units.ArgumentError{Field: name, Value: x, Accepted: "fields that give a number within the range of float64"}
}

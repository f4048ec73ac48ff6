package series

import (
	"context"
	"math"
	"slices"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A Problem is a body of one start temperature that is put into surroundings at time 0. Every field
// but Sources and Notes must be set.
type Problem struct {
	Body         shape.Body         // of the family shape.Spherical
	Conductivity units.Conductivity // of the body, above 0
	Density      units.Density      // of the body, above 0
	SpecificHeat units.SpecificHeat // of the body, above 0
	Initial      units.Temperature  // of the whole body at time 0
	Surface      boundary.Condition // of boundary.Constant; a coefficient of 0 is an insulated body
	Sources      []string           // where the data come from; the derivation repeats them
	Notes        []string           // remarks that the derivation repeats
}

// Solve prepares the solution, within microseconds and for all times. It returns an
// [*units.ArgumentError] for a field that cannot be used, and for fields whose Biot number, diffusivity,
// time scale or heat content no float64 holds; and the error of ctx if that is done.
func (p Problem) Solve(ctx context.Context) (*Solution, error) {
	if ctx == nil {
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if err := ctx.Err(); err != nil {
		return nil, err
	}
	if err := p.check(); err != nil {
		return nil, err
	}
	p.Sources, p.Notes = slices.Clone(p.Sources), slices.Clone(p.Notes)
	h, ambient, _ := p.Surface.Constants()
	radius := p.Body.ConductionLength().SI()
	diffusivity := p.Conductivity.SI() / (p.Density.SI() * p.SpecificHeat.SI())
	s := &Solution{
		problem:     p,
		coefficient: h,
		ambient:     ambient,
		diffusivity: diffusivity,
		scale:       radius * radius / diffusivity,
		excess:      p.Initial.SI() - ambient.SI(),
	}
	s.heat = p.Body.Volume().SI() * p.Density.SI() * p.SpecificHeat.SI() * s.excess
	bi := h.SI() * radius / p.Conductivity.SI()
	if err := s.checkDerived(bi); err != nil {
		return nil, err
	}
	s.modes = *eigen.NewSphere(bi)
	return s, nil
}

func (p Problem) check() error {
	for _, err := range []error{
		p.Body.Check(),
		units.CheckPositive("conductivity", p.Conductivity),
		units.CheckPositive("density", p.Density),
		units.CheckPositive("specific heat", p.SpecificHeat),
		units.CheckTemperature("initial temperature", p.Initial),
		p.Surface.Check(),
	} {
		if err != nil {
			return err
		}
	}
	if p.Body.Family() != shape.Spherical {
		return &units.ArgumentError{Field: "body", Value: p.Body.String(), Accepted: "a sphere, shape.Sphere(diameter)"}
	}
	if _, _, ok := p.Surface.Constants(); !ok {
		return &units.ArgumentError{Field: "surface condition", Value: "boundary.Function", Accepted: "boundary.Constant(h, ambient)"}
	}
	return nil
}

// checkDerived refuses fields that are possible one by one but lead out of the range of float64.
func (s *Solution) checkDerived(bi float64) error {
	for _, d := range []struct {
		name string
		x    float64
		bad  bool
	}{
		{"Biot number h R/k", bi, math.IsInf(bi, 0) || (bi == 0) != (s.coefficient.SI() == 0)},
		{"diffusivity k/(rho c) in m²/s", s.diffusivity, !(s.diffusivity > 0)},
		{"time scale R²/alpha in s", s.scale, !(s.scale > 0)},
		{"heat content rho c V (T0 − Tinf) in J", s.heat, math.IsNaN(s.heat) || (s.heat == 0) != (s.excess == 0)},
	} {
		if d.bad || math.IsInf(d.x, 0) {
			return &units.ArgumentError{Field: d.name, Value: d.x, Accepted: "fields that give a number within the range of float64"}
		}
	}
	return nil
}

package series

import (
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// walled reports whether s is solved as a wall.
func (s *Solution) walled() bool { return s != nil && s.wall != nil }

// wallBiot returns the Biot number of Surface with the way out of the body.
func (s *Solution) wallBiot() float64 {
	if _, ok := s.problem.Surface.SurfaceTemperature(); ok {
		return math.Inf(1)
	}
	if h, _, ok := s.problem.Surface.Constants(); ok {
		return h.SI() * s.problem.Body.ConductionLength().SI() / s.problem.Conductivity.SI()
	}
	return math.NaN()
}

// wallFourier returns the Fourier number with the way out of the body.
func (s *Solution) wallFourier(t units.Duration) float64 {
	ratio := s.wall.length / s.problem.Body.ConductionLength().SI()
	return t.SI() / s.wall.scale * ratio * ratio
}

// Flux returns the heat flux that leaves through a face, [shape.Surface] or [shape.Opposite], at time t ≥ 0; one
// that enters is negative. It returns an [*units.ArgumentError] for another place, for a body of several coordinates, for
// an ambient that goes with time, for a time that cannot be, and for time 0 where the temperature of the face is prescribed: the flux is infinite then.
func (s *Solution) Flux(face shape.Place, t units.Duration) (units.HeatFlux, error) {
	w, err := s.asWall()
	if err != nil {
		return units.HeatFlux{}, err
	}
	return w.flux(face, s.problem.Body, t)
}

// HeatThrough returns the heat that has left through a face, [shape.Surface] or [shape.Opposite], by time t ≥ 0; what has
// entered is negative. Both faces together make [Solution.HeatReleased]. The errors are those of [Solution.Flux], but for
// that of time 0.
func (s *Solution) HeatThrough(face shape.Place, t units.Duration) (units.Energy, error) {
	w, err := s.asWall()
	if err != nil {
		return units.Energy{}, err
	}
	return w.heat(face, s.problem.Body, t)
}

// asWall returns the solution of a body of one coordinate with its faces apart.
func (s *Solution) asWall() (*wall, error) {
	if s.walled() {
		return s.wall, nil
	}
	if err := s.check(units.Duration{}); err != nil {
		return nil, err
	}
	if s.count > 1 {
		return nil, &units.ArgumentError{Field: "body", Value: s.problem.Body.String(), Accepted: "a body of one coordinate, which has one flux all over a face"}
	}
	return s.problem.solveWall()
}

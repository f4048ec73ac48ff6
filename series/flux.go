package series

import (
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A given flux leaves every exposed face alike. The temperature then is the start less the sum over the
// factors, each of which falls by q R/k times its dimensionless change.
type given struct {
	fall  [3]float64 // q R/k, K
	modes [3]eigen.Flux
}

// newFlux returns the dimensionless change in a body of one coordinate.
func newFlux(family shape.Family) eigen.Flux {
	switch family {
	case shape.Planar:
		return eigen.NewPlateFlux()
	case shape.Cylindrical:
		return eigen.NewCylinderFlux()
	}
	return eigen.NewSphereFlux()
}

// setFlux prepares a body with a given flux.
func (s *Solution) setFlux(q units.HeatFlux) error {
	g := &given{}
	for i := range s.count {
		f := s.factors[i].body
		g.fall[i] = q.SI() * f.ConductionLength().SI() / s.problem.Conductivity.SI()
		if math.IsInf(g.fall[i], 0) || (g.fall[i] == 0) != (q.SI() == 0) {
			return outOfRange("q R/k in K", g.fall[i])
		}
		g.modes[i] = newFlux(f.Family())
	}
	s.given = g
	return nil
}

// fallen returns by how much a position, or the mean for nil, has fallen at the Fourier number of the first factor.
func (s *Solution) fallen(p *position, fo float64) float64 {
	total := 0.0
	for i := range s.count {
		if f := fo * s.factors[i].ratio; p == nil {
			total += s.given.fall[i] * s.given.modes[i].Mean(f)
		} else {
			total += s.given.fall[i] * s.given.modes[i].At(p[i], f)
		}
	}
	return total
}

// givenAt returns the temperature where it is above 0 K.
func (s *Solution) givenAt(p *position, fo float64) (units.Temperature, error) {
	T := units.Kelvin.Of(s.problem.Initial.SI() - s.fallen(p, fo))
	return T, units.CheckTemperature("temperature that the flux leads to", T)
}

// givenTimeTo returns when a position, or the mean for nil, is at the target.
func (s *Solution) givenTimeTo(p *position, place string, target units.Temperature) (units.Duration, error) {
	start := s.problem.Initial
	wanted := start.SI() - target.SI()
	switch direction := s.given.fall[0]; {
	case wanted == 0:
		return units.Duration{}, nil
	case direction == 0:
		return units.Duration{}, &units.NeverError{Place: place, Target: target, Limit: start}
	case (wanted > 0) != (direction > 0):
		return units.Duration{}, nil
	}
	fo, ok := rising(func(fo float64) float64 { return s.fallen(p, fo) / wanted }, 0)
	t := units.Second.Of(fo * s.scale)
	if !ok || !t.IsFinite() {
		return units.Duration{}, &units.ConvergenceError{
			Method: "time to a temperature", Place: place,
			Reason: "the target " + target.String() + " is reached at a time beyond the range of float64",
		}
	}
	return t, nil
}

// rising returns where f, which rises from 0 at 0 without end or to more than 1, is 1, and false if that is not
// within the range of float64. The search is over the logarithm and begins at exp(guess).
func rising(f func(x float64) float64, guess float64) (float64, bool) {
	over := func(u float64) float64 {
		if y := f(math.Exp(u)); !(y <= 0) {
			return math.Log(y)
		}
		return math.Inf(-1) // nothing has come in yet, or less than the rounding
	}
	const most, stride = 700, 4 // of the logarithm
	u := math.Max(-most, math.Min(most, guess))
	lo, hi := u, u
	for over(hi) < 0 {
		if lo, hi = hi, hi+stride; hi > most {
			return 0, false
		}
	}
	for over(lo) > 0 {
		if lo, hi = lo-stride, lo; lo < -most {
			return 0, false
		}
	}
	for math.IsInf(over(lo), -1) && hi-lo > 1e-12 {
		if mid := lo + (hi-lo)/2; over(mid) > 0 {
			hi = mid
		} else {
			lo = mid
		}
	}
	u, ok := root.Find(over, lo, hi, 0)
	return math.Exp(u), ok
}

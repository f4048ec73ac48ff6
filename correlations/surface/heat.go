package surface

import (
	"math"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/units"
)

// A Contribution is the heat that one part of a [Sum] took over a run.
type Contribution struct {
	Name   string
	Energy units.Energy // positive out of the body
	Share  float64      // of the sum of the magnitudes of all, with the sign of Energy; 0 if there is none
}

// Accuracy of the integrals of [Sum.Heat]: the error that is admitted in one interval, against the sum of the
// magnitudes of all parts, and how many intervals may be tried.
const (
	heatError     = 1e-7
	heatIntervals = 10000
)

// Heat returns the heat that each part took from a surface of that area between the beginning and time end, in the
// order of s, when the surface had the temperature wall(t), such as that of a solution:
//
//	wall := func(t units.Duration) (units.Temperature, error) { return solution.At(shape.Surface(), t) }
//	heat, err := air.Heat(ball.Area(), wall, end)
//
// It is integrated by Gauss's rule with 5 points in intervals that are halved until halving them no longer
// changes the sum by 1e-7. Its errors are those of [Sum.Flux] and of wall, an [*units.ArgumentError] for an area or a
// time that is not finite and above 0, and a [*units.ConvergenceError] if 10 000 intervals do not
// suffice.
func (s Sum) Heat(area units.Area, wall TemperatureCourse, end units.Duration) ([]Contribution, error) {
	if err := s.Check(); err != nil {
		return nil, err
	}
	if err := units.CheckPositive("heat: area", area); err != nil {
		return nil, err
	}
	if err := units.CheckPositive("heat: end", end); err != nil {
		return nil, err
	}
	if wall == nil {
		return nil, &units.ArgumentError{Field: "heat: wall", Accepted: "the course of the temperature of the surface"}
	}
	run := heating{sum: s, wall: wall}
	quad.Legendre{}.FixedLocations(run.x[:], run.weight[:], -1, 1)
	total, err := run.gauss(0, end.SI())
	if err != nil {
		return nil, err
	}
	if total, err = run.halve(0, end.SI(), total); err != nil {
		return nil, err
	}
	list := make([]Contribution, len(s))
	all := 0.0
	for i, q := range total {
		list[i] = Contribution{Name: s[i].Name(), Energy: units.Joule.Of(q * area.SI())}
		all += math.Abs(list[i].Energy.SI())
	}
	if !(all <= math.MaxFloat64) {
		return nil, &units.ArgumentError{Field: "heat: energy", Value: units.Joule.Of(all), Accepted: "an area and a time that give a finite one"}
	}
	for i := range list {
		if all > 0 {
			list[i].Share = list[i].Energy.SI() / all
		}
	}
	return list, nil
}

// heating is one integration over time of all fluxes of a sum.
type heating struct {
	sum       Sum
	wall      TemperatureCourse
	x, weight [5]float64
	intervals int
	scale     float64 // the largest sum of magnitudes seen so far, J/m²
}

// gauss returns the integral of every flux from a to b, in J/m².
func (r *heating) gauss(a, b float64) ([]float64, error) {
	r.intervals++
	total := make([]float64, len(r.sum))
	half, size := (b-a)/2, 0.0
	for j, x := range r.x {
		t := units.Second.Of(a + half*(1+x))
		T, err := r.wall(t)
		if err != nil {
			return nil, err
		}
		for i, p := range r.sum {
			q, err := p.Flux(t, T)
			if err != nil {
				return nil, err
			}
			total[i] += r.weight[j] * half * q.SI()
		}
	}
	for _, q := range total {
		size += math.Abs(q)
	}
	r.scale = max(r.scale, size)
	return total, nil
}

// halve returns the integral from a to b to the accuracy wanted; whole is what gauss gives there.
func (r *heating) halve(a, b float64, whole []float64) ([]float64, error) {
	if r.intervals > heatIntervals {
		return nil, &units.ConvergenceError{
			Method: "heat of a surface by its parts", Time: units.Second.Of(a),
			Reason: "the fluxes change too often; give a course of the wall that is smooth but for a few places",
		}
	}
	mid := a + (b-a)/2
	left, err := r.gauss(a, mid)
	if err != nil {
		return nil, err
	}
	right, err := r.gauss(mid, b)
	if err != nil {
		return nil, err
	}
	change := 0.0
	for i := range whole {
		change += math.Abs(left[i] + right[i] - whole[i])
	}
	if change > heatError*r.scale {
		if left, err = r.halve(a, mid, left); err != nil {
			return nil, err
		}
		if right, err = r.halve(mid, b, right); err != nil {
			return nil, err
		}
	}
	for i := range left {
		left[i] += right[i]
	}
	return left, nil
}

package lumped

import (
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// LumpingError returns a bound on |T_lumped − T_exact| at a place over all time, for constant h, k
// and c: what it costs to take the body as one temperature. It compares with the exact series (H. S.
// Carslaw, J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., sec. 3.11, 7.7 and 9.4, from memory) on
// a dense grid of times; the bound is at most 2 % above the largest error on it. There is one for plates,
// long cylinders and spheres.
//
// For an exchange function, or properties that vary, it is an estimate: the same for the largest
// Biot number of the run ([Solution.Biot]). It returns an [*units.ArgumentError] for a place that is
// not in the body, and for another body.
func (s *Solution) LumpingError(place shape.Place) (units.TemperatureDifference, error) {
	if err := s.checkPlace(place); err != nil {
		return units.TemperatureDifference{}, err
	}
	theta, err := s.exact(place)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	return units.KelvinDifference.Of(s.span * lumpingBound(s.biot.Conduction, s.lengthRatio(), theta)), nil
}

// LumpingErrorInTime returns how much later the place is at the target by the exact series than by
// [Solution.TimeTo]; it is negative for a place that is ahead of the mean, such as the surface. What
// is said of [Solution.LumpingError] on constants and estimates holds here. It returns the errors of TimeTo,
// and an [*units.ArgumentError] for a target that does not lie between the start and the limit.
func (s *Solution) LumpingErrorInTime(place shape.Place, target units.Temperature) (units.Duration, error) {
	t, err := s.TimeTo(place, target)
	if err != nil || t.SI() == 0 {
		return units.Duration{}, err
	}
	if _, err := s.exact(place); err != nil {
		return units.Duration{}, err
	}
	theta := (target.SI() - s.limit) / (s.start - s.limit)
	fourier, ok := s.exactTime(place, theta)
	if !s.limitKnown || !ok {
		return units.Duration{}, &units.ArgumentError{Field: "target", Value: target, Accepted: "between the start and the limit of the body"}
	}
	lumped := -math.Log(theta) / (s.biot.Conduction * s.lengthRatio())
	late := t.Scale(fourier/lumped - 1)
	if err := units.CheckFinite("lumping error in time", late); err != nil {
		return units.Duration{}, err
	}
	return late, nil
}

// lengthRatio returns R/(V/A): 1 for a plate, 2 for a long cylinder, 3 for a sphere.
func (s *Solution) lengthRatio() float64 { return s.problem.Body.ConductionLength().SI() / s.length }

// modes returns the exact solution in the body for the Biot number of the run.
func (s *Solution) modes() (eigen.Solution, error) {
	bi := s.biot.Conduction
	switch s.problem.Body.Family() {
	case shape.Planar:
		return eigen.NewPlate(bi), nil
	case shape.Cylindrical:
		return eigen.NewCylinder(bi), nil
	case shape.Spherical:
		return eigen.NewSphere(bi), nil
	}
	return nil, &units.ArgumentError{Field: "body of the lumping error", Value: s.problem.Body.String(), Accepted: "a plate, a long cylinder or a sphere"}
}

// exact returns the exact solution θ(Fo) at a place, for the Biot number of the run.
func (s *Solution) exact(place shape.Place) (func(fo float64) float64, error) {
	modes, err := s.modes()
	if err != nil {
		return nil, err
	}
	if place.IsMean() {
		return modes.Mean, nil
	}
	x, err := place.Position(s.problem.Body)
	return func(fo float64) float64 { return modes.At(x, fo) }, err
}

// exactTime returns the Fourier number at which the exact solution has fallen to theta.
func (s *Solution) exactTime(place shape.Place, theta float64) (float64, bool) {
	modes, err := s.modes()
	if err != nil || !(theta > 0 && theta < 1) {
		return 0, false
	}
	if place.IsMean() {
		return modes.TimeOfMean(theta)
	}
	x, err := place.Position(s.problem.Body)
	if err != nil {
		return 0, false
	}
	return modes.TimeAt(x, theta)
}

const (
	pointsPerDecade = 32
	boundMargin     = 1.02  // more than what a maximum between two points can add
	boundRounding   = 1e-14 // rounding of the series
)

// lumpingBound returns a bound on |θ(Fo) − exp(−ratio Bi Fo)| over all Fo.
//
// The difference rises while heat from the inside is on its way and falls with the slower of both
// exponentials; over ln Fo it is smooth on the scale of 1. At the surface the first thing that happens
// is a fall by 2 Bi √(Fo/π), so the scan starts where that is a hundredth of its later size.
func lumpingBound(bi, ratio float64, theta func(fo float64) float64) float64 {
	if bi == 0 {
		return 0
	}
	first := 1e-4 * min(1, 1/(bi*bi))
	last := 30 * max(1/(ratio*bi), 0.1)
	n := int(pointsPerDecade*math.Log10(last/first)) + 1
	largest := 0.0
	for i := range n + 1 {
		fo := first * math.Pow(last/first, float64(i)/float64(n))
		largest = max(largest, math.Abs(theta(fo)-math.Exp(-ratio*bi*fo)))
	}
	return min(1, boundMargin*largest+boundRounding)
}

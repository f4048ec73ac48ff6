package series

import (
	"math"
	"strconv"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Solution is the exact solution of a [Problem]. It does not change and may be used from many
// goroutines. Make one with [Problem.Solve]; the zero Solution is refused by every method that
// returns an error.
//
// The places in a plate with an insulated face: [shape.Centre] is that face. In a brick, and in a
// cylinder that is exposed on all its faces, [shape.Surface] is the middle of the face that is
// nearest to the centre, and [shape.Below] lies on the line from there to the centre.
type Solution struct {
	problem     Problem
	coefficient units.HeatTransferCoefficient
	ambient     units.Temperature
	prescribed  bool    // the surface is at the ambient temperature
	diffusivity float64 // m²/s
	scale       float64 // R²/α of the first factor, s
	excess      float64 // T0 − T∞, K
	heat        float64 // ρ c V (T0 − T∞), J
	factors     [3]factor
	count       int
	given       *given     // nil but for a given flux
	following   *following // nil but for an ambient that goes with time, of which ambient is the first
	wall        *wall      // nil but for faces that differ, a start that is not uniform, and a source; all else but the problem is unset then
}

// A factor is a body of one coordinate. θ of a body is the product of θ of its factors, each at its own
// Fourier number, and so is θ of the mean.
type factor struct {
	body  shape.Body
	ratio float64 // its Fourier number over that of the first, (R_1/R)²
	modes eigen.Solution
}

// A position is a place as the fraction of the way out of each factor.
type position [3]float64

// position returns where a place is, which is off the centre of the first factor alone.
func (s *Solution) position(place shape.Place) (p position, err error) {
	p[0], err = place.Position(s.problem.Body)
	return p, err
}

// theta returns θ at a position at the Fourier number of the first factor.
func (s *Solution) theta(p *position, fo float64) float64 {
	theta := s.factors[0].modes.At(p[0], fo)
	for i := 1; i < s.count; i++ {
		theta *= s.factors[i].modes.At(p[i], fo*s.factors[i].ratio)
	}
	return theta
}

// meanTheta returns the mean of θ over the volume.
func (s *Solution) meanTheta(fo float64) float64 {
	theta := s.factors[0].modes.Mean(fo)
	for i := 1; i < s.count; i++ {
		theta *= s.factors[i].modes.Mean(fo * s.factors[i].ratio)
	}
	return theta
}

// loss returns 1 − meanTheta: what one factor has lost, what the next has lost of the rest, and so on,
// which is the rule for the heat of a product (L. S. Langston, International Journal of Heat and Mass Transfer
// 25 (1982) 149–150, from memory).
func (s *Solution) loss(fo float64) float64 {
	loss := s.factors[0].modes.Loss(fo)
	for i := 1; i < s.count; i++ {
		loss += (1 - loss) * s.factors[i].modes.Loss(fo*s.factors[i].ratio)
	}
	return loss
}

// timeAt returns the Fourier number at which θ at a position, or the mean for nil, has fallen to theta.
func (s *Solution) timeAt(p *position, theta float64) (float64, bool) {
	first := s.factors[0].modes
	switch {
	case s.count > 1:
	case p == nil:
		return first.TimeOfMean(theta)
	default:
		return first.TimeAt(p[0], theta)
	}
	coefficient, rate := 1.0, 0.0
	for i := range s.count {
		f := &s.factors[i]
		x := 0.0
		if p != nil {
			x = p[i]
		}
		c, mean := f.modes.OneTerm(x, 0)
		if p == nil {
			c = mean
		}
		coefficient *= c
		rate += f.ratio * f.modes.Decay()
	}
	return eigen.FallBySlope(func(fo float64) (float64, float64) { return s.curve(p, fo) }, coefficient, rate, theta)
}

// curve returns θ at a position, or the mean for nil, and its derivative over the Fourier number of the first factor.
func (s *Solution) curve(p *position, fo float64) (theta, slope float64) {
	theta = 1
	for i := range s.count {
		f := &s.factors[i]
		var value, rate float64
		if p == nil {
			value, rate = f.modes.CurveOfMean(fo * f.ratio)
		} else {
			value, rate = f.modes.Curve(p[i], fo*f.ratio)
		}
		slope = slope*value + theta*rate*f.ratio
		theta *= value
	}
	return theta, slope
}

// At returns the temperature of a place at time t ≥ 0; at [shape.Mean] it is that of [Solution.Mean].
// It returns an [*units.ArgumentError] for a place that is not in the body, for a time that is
// negative, not finite, past the end of a log or where the course of the ambient is at 0 K, and where a flux or a source
// would lead to 0 K or below; and a [*units.ConvergenceError] where
// the modes of a wall do not resolve an initial profile, or a tube of a small hole, shortly after the start.
func (s *Solution) At(place shape.Place, t units.Duration) (units.Temperature, error) {
	if place.IsMean() {
		return s.Mean(t)
	}
	if s.walled() {
		return s.wall.at(place, s.problem.Body, t)
	}
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	p, err := s.position(place)
	if err != nil {
		return units.Temperature{}, err
	}
	return s.atPosition(&p, t)
}

// atPosition returns the temperature of a position.
func (s *Solution) atPosition(p *position, t units.Duration) (units.Temperature, error) {
	switch {
	case s.given != nil:
		return s.givenAt(p, s.Fourier(t))
	case s.following != nil:
		return s.followingAt(p, t)
	}
	return s.temperature(s.theta(p, s.Fourier(t))), nil
}

// AtPoint returns the temperature at time t ≥ 0 at the point with the given distances from the centre, one along each
// coordinate of [shape.Body.Factors]: for a plate the distance from its middle, for a cylinder that is
// exposed on all its faces those from the axis and along it, the one of the nearer face first, and for a brick those
// along its edges, the shortest edge first. The errors are those of [Solution.At].
func (s *Solution) AtPoint(t units.Duration, distances ...units.Length) (units.Temperature, error) {
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	if len(distances) != s.count {
		return units.Temperature{}, &units.ArgumentError{Field: "distances from the centre", Value: len(distances), Accepted: strconv.Itoa(s.count) + " of them"}
	}
	var p position
	for i, d := range distances {
		length := s.factors[i].body.ConductionLength()
		if !(d.SI() >= 0 && d.SI() <= length.SI()) {
			return units.Temperature{}, &units.ArgumentError{Field: "distance from the centre", Value: d, Accepted: "0 m to " + length.String()}
		}
		p[i] = d.SI() / length.SI()
	}
	return s.atPosition(&p, t)
}

// Mean returns the mean temperature over the volume at time t ≥ 0, with the errors of [Solution.At].
func (s *Solution) Mean(t units.Duration) (units.Temperature, error) {
	if s.walled() {
		return s.wall.at(shape.Mean(), s.problem.Body, t)
	}
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	switch {
	case s.given != nil:
		return s.givenAt(nil, s.Fourier(t))
	case s.following != nil:
		return s.followingAt(nil, t)
	}
	return s.temperature(s.meanTheta(s.Fourier(t))), nil
}

// TimeTo returns when a place, or the mean, or the slowest or the fastest place, reaches the target: 0 if it is met at
// the start or lies on the far side of the start. The temperature at that time is the target to within rounding.
//
// Where faces differ, the start is a profile, heat is set free or the ambient goes with time, a temperature may come back:
// this is the first time then, and a target on the far side that is never come to counts as met. The search passes over
// an interval only if a bound of the temperature in it leaves the target out. Under an ambient that goes with time it
// may pass over an excursion beyond the target by less than 1e-8 of the largest difference between the start and
// the ambient.
//
// It returns a [*units.NeverError] if the place does not come to the target however long one waits: the target
// is the ambient, or the last of a log that is held, or beyond; it is out of the band of an oscillation; a
// ramp leads away from it; or the body exchanges no heat (a constant flux leads to any target on its side). It returns a
// [*units.HorizonError] if it does not within the log of a source or of the ambient, or before a ramp is at 0 K; a
// [*units.ConvergenceError] if no float64 holds the time, or if the temperature stays too close to the target to tell
// a first time; and an [*units.ArgumentError] for a place that is not in the body, a target that is no temperature, and
// the slowest and the fastest place under an ambient that draws the body both ways.
func (s *Solution) TimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	if !s.walled() {
		if err := s.check(units.Duration{}); err != nil {
			return units.Duration{}, err
		}
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	if s.walled() {
		return s.wall.timeTo(place, s.problem.Body, target)
	}
	var where *position
	if !place.IsMean() {
		p, err := s.whereTo(place)
		if err != nil {
			return units.Duration{}, err
		}
		where = &p
	}
	if s.given != nil {
		return s.givenTimeTo(where, place.String(), target)
	}
	if s.following != nil {
		return s.followingTimeTo(where, place.String(), target)
	}
	start, limit := s.problem.Initial, s.ambient
	if s.Biot() == 0 {
		limit = start
	}
	left := target.SI() - limit.SI()
	theta := left / s.excess
	switch {
	case target == start:
		return units.Duration{}, nil
	case limit == start, left == 0, (left > 0) != (s.excess > 0):
		return units.Duration{}, &units.NeverError{Place: place.String(), Target: target, Limit: limit}
	case theta >= 1:
		return units.Duration{}, nil
	}
	fo, ok := s.timeAt(where, theta)
	t := units.Second.Of(fo * s.scale)
	if !ok || !t.IsFinite() {
		return units.Duration{}, &units.ConvergenceError{
			Method: "time to a temperature", Place: place.String(),
			Reason: "the target " + target.String() + " is reached at a time beyond the range of float64",
		}
	}
	return t, nil
}

// HeatReleased returns the heat that has left the body by time t ≥ 0, ρ c V (T0 − T∞)(1 − θ) with θ of
// the mean; it is negative for a body that is heated. It keeps its digits also when little has been
// exchanged. Under an ambient that goes with time it is ρ c V (T0 − T) with T of the mean, and with heat set free it is what
// has left through the faces. The errors are those of [Solution.Mean].
func (s *Solution) HeatReleased(t units.Duration) (units.Energy, error) {
	if s.walled() {
		return s.wall.released(t)
	}
	if err := s.check(t); err != nil {
		return units.Energy{}, err
	}
	if s.given != nil {
		q, _ := s.problem.Surface.ConstantFlux()
		heat := units.Joule.Of(q.SI() * s.problem.Body.Area().SI() * t.SI())
		return heat, units.CheckFinite("heat that has left", heat)
	}
	if s.following != nil {
		return s.followingReleased(t)
	}
	return units.Joule.Of(s.heat * s.loss(s.Fourier(t))), nil
}

// OneTerm returns the temperature of a place, or of [shape.Mean], by the first term of the series alone, which is
// what tables and charts give, and by how much it is above the exact temperature. It is near that from a
// Fourier number of 0.2 on. The errors are those of [Solution.At]; a constant flux and an ambient that goes with time are
// refused besides.
func (s *Solution) OneTerm(place shape.Place, t units.Duration) (units.Temperature, units.TemperatureDifference, error) {
	if err := s.check(t); err != nil {
		return units.Temperature{}, units.TemperatureDifference{}, err
	}
	exact, err := s.At(place, t)
	if err == nil {
		err = s.towardsOneTemperature()
	}
	if err != nil {
		return units.Temperature{}, units.TemperatureDifference{}, err
	}
	p := position{}
	if !place.IsMean() {
		if p, err = s.position(place); err != nil {
			return units.Temperature{}, units.TemperatureDifference{}, err
		}
	}
	theta, fo := 1.0, s.Fourier(t)
	for i := range s.count {
		one, mean := s.factors[i].modes.OneTerm(p[i], fo*s.factors[i].ratio)
		if place.IsMean() {
			one = mean
		}
		theta *= one
	}
	T := units.Kelvin.Of(s.ambient.SI() + s.excess*theta)
	return T, T.Sub(exact), nil
}

// TruncationError bounds what is left out of the temperature of any place at time t ≥ 0: the terms of the series, or the
// images and what else the short-time form neglects. Under one condition and from a uniform start it is below 1e-15 of T0 − Tinf for any Biot number, place and time
// (under a constant flux, of q R/k times 1 + the Fourier number), and never more than that above a hundred times
// what is left out. Under an ambient that goes with time it is 1e-14 of all its changes by then, up and down. Rounding is not in it: that comes to some 2e-15 of T0 − Tinf for each factor of a product, see
// [Modes.ErrorBound], and to two units in the last place of a temperature. The errors are those of [Solution.Mean].
func (s *Solution) TruncationError(t units.Duration) (units.TemperatureDifference, error) {
	if s.walled() {
		return s.wall.truncation(t)
	}
	if err := s.check(t); err != nil {
		return units.TemperatureDifference{}, err
	}
	total, fo := 0.0, s.Fourier(t)
	if s.given != nil {
		for i := range s.count {
			total += math.Abs(s.given.fall[i]) * s.given.modes[i].Truncation(fo*s.factors[i].ratio)
		}
		bound := units.KelvinDifference.Of(total)
		return bound, units.CheckFinite("bound of the error", bound)
	}
	if s.following != nil {
		if err := s.following.checkWithin(t); err != nil {
			return units.TemperatureDifference{}, err
		}
		bound := units.KelvinDifference.Of(followed * s.changes(fo))
		return bound, units.CheckFinite("bound of the error", bound)
	}
	for i := range s.count {
		total += s.factors[i].modes.Truncation(fo * s.factors[i].ratio)
	}
	return units.KelvinDifference.Of(math.Abs(s.excess) * total), nil
}

const epsilon = 0x1p-52

// Biot returns the Biot number h R/k with the way out R of the body, [shape.Body.ConductionLength]. It is +Inf for
// a prescribed surface temperature, and NaN for a constant flux and for the zero Solution.
func (s *Solution) Biot() float64 {
	if s.walled() {
		return s.wallBiot()
	}
	if !s.made() || s.given != nil {
		return math.NaN()
	}
	return s.factors[0].modes.Biot()
}

// Fourier returns the Fourier number α t/R² of a time, with the same R, and NaN for the zero Solution. It is
// +Inf where float64 ends.
func (s *Solution) Fourier(t units.Duration) float64 {
	if s.walled() {
		return s.wallFourier(t)
	}
	if !s.made() {
		return math.NaN()
	}
	return t.SI() / s.scale
}

// made reports whether s comes from [Problem.Solve].
func (s *Solution) made() bool { return s != nil && s.count > 0 }

// noFlux refuses a constant flux where only a temperature to tend to makes sense.
func (s *Solution) noFlux() error {
	return &units.ArgumentError{Field: "surface condition", Value: s.problem.Surface.String(), Accepted: "boundary.Constant(h, ambient) or boundary.Temperature(T)"}
}

// towardsOneTemperature refuses a constant flux and an ambient that goes with time.
func (s *Solution) towardsOneTemperature() error {
	if s.given != nil {
		return s.noFlux()
	}
	return s.refuseFollowing()
}

// check refuses the zero Solution and a time that cannot be.
func (s *Solution) check(t units.Duration) error {
	if s.walled() {
		return &units.ArgumentError{Field: "problem", Value: "faces that differ, an initial profile, a source or a hollow body", Accepted: "for this question a uniform start in a solid body under one condition"}
	}
	if !s.made() {
		return &units.ArgumentError{Field: "solution", Accepted: "a solution made by Problem.Solve"}
	}
	return units.CheckNotNegative("time", t)
}

// temperature returns T for θ, from the nearer of the start and the ambient, so that both are met
// exactly and no rounding leads beyond them.
func (s *Solution) temperature(theta float64) units.Temperature {
	if theta > 0.5 {
		return units.Kelvin.Of(s.problem.Initial.SI() - s.excess*(1-theta))
	}
	return units.Kelvin.Of(s.ambient.SI() + s.excess*theta)
}

package lumped

import (
	"math"
	"math/cmplx"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// LumpingError returns a bound on |T_lumped − T_exact| at a place over all time: what it costs to take the body as
// one temperature. For constant h, k, c and source it is a bound in a plate, a long cylinder and a sphere, and in the
// bodies that are products of them; the ambient may go with time in the former. It is at most 3 % above the largest
// error where the ambient is steady and nothing is made inside. The exact solutions are those of H. S. Carslaw, J. C. Jaeger,
// Conduction of Heat in Solids, 2nd ed., sec. 3.11, 7.7 and 9.4 (from memory).
//
// It is an estimate for other bodies, for a coefficient or properties that vary, and for faces that differ: the same
// for the largest Biot number of the run ([Solution.Biot]), in a hollow body between plate, cylinder and
// sphere of the same resistance inside, for faces that differ to first order in the Biot number from the fluxes of both, in any other 2.5 times that of a cube of the same V/A, at its surface on average as at its centre. That is
// enough for cones of a height of 0.5 to 2.5 diameters, regular tetrahedra, hemispheres, and round bodies of up to a few
// diameters; a tip, and a body with fins, thin rims or long thin ends, can be further off. [Solution.LumpingErrorIsBound] tells which. It returns an
// [*units.ArgumentError] for a place that is not in the body.
func (s *Solution) LumpingError(place shape.Place) (units.TemperatureDifference, error) {
	if err := s.checkPlace(place); err != nil {
		return units.TemperatureDifference{}, err
	}
	part, err := s.lumpingPart(place)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	jumps, drift := s.excited()
	kelvin := part*jumps + drift
	if s.faces != nil && s.inside == nil {
		kelvin = s.faces.largest(place, s.problem.Body)
	} else if s.path != nil {
		kelvin *= marginOfEstimate
	}
	e := units.KelvinDifference.Of(kelvin)
	return e, units.CheckFinite("lumping error", e)
}

// marginOfEstimate is for a coefficient and properties that vary over the run, which the comparison with constants does not
// know: against finite volumes it would be short by up to 4 %.
const marginOfEstimate = 1.1

// LumpingErrorIsBound reports whether [Solution.LumpingError] is a bound, and not an estimate.
func (s *Solution) LumpingErrorIsBound() bool {
	if s == nil || !s.solved || s.path != nil || !s.exchange.linear() || !s.problem.Opposite.IsZero() {
		return false
	}
	switch s.problem.Body.Family() {
	case shape.Planar, shape.Cylindrical, shape.Spherical:
		return s.inside == nil || s.moving == nil && s.exchange.source == 0
	case shape.Compact:
		return s.problem.Body.Factors() != nil && s.moving == nil && s.exchange.source == 0 && s.exchange.given == 0
	}
	return false
}

// excited returns by how many kelvin the ambient jumps from the temperature of the body, and the error that a
// source and an ambient that drifts add: what they do is the integral over time of what a jump does, and the
// integral of the error of a jump is at most R²/(2 m α) at any place, m = 1 in a plate, 2 in a cylinder, 3 in a sphere. An
// ambient cannot add more than its span, within which both solutions answer it, and an oscillation not
// more than both swing.
func (s *Solution) excited() (jumps, drift float64) {
	e := &s.exchange
	if !e.linear() || s.path != nil || len(e.ambients) == 0 {
		return s.span, s.sourced()
	}
	alpha := s.biot.Conductivity.SI() / (s.content.capacity / s.problem.Body.Volume().SI())
	delay := s.delay() / alpha
	g, at := 0.0, 0.0
	for i := range e.ambients {
		a := &e.ambients[i]
		g += a.conductance
		if a.steady {
			at += a.conductance * a.at
			continue
		}
		first, steps, steepest, span := travel(a, e.shift, s.end)
		added := min(steepest*delay, span)
		if mean, amplitude, period, _, ok := a.course.Oscillation(); ok {
			if swing := math.Abs(amplitude.SI()) * s.swing(2*math.Pi/period.SI(), alpha); swing < added {
				first, added = mean.SI(), swing
			}
		}
		at += a.conductance * first
		jumps += a.conductance * steps
		drift += a.conductance * added
	}
	jumps = jumps/g + math.Abs(s.start-at/g+e.given/(e.factor*g))
	return jumps, drift/g + s.sourced()
}

// swing returns a bound on the error for an ambient that oscillates by 1 K from its mean: twice what surface and lumped body
// swing at late times, since what is left of the start is no larger than they are.
func (s *Solution) swing(omega, alpha float64) float64 {
	kind, bi, ok := s.tabulated()
	if r := s.wayOut(); ok {
		modes := []func(float64) eigen.Solution{plateModes, cylinderModes, sphereModes}[kind](bi)
		exact := cmplx.Abs(eigen.Transfer(modes, 1, omega*r*r/alpha))
		return 2 * (exact + 1/math.Hypot(1, omega*s.moving.tau))
	}
	return math.Inf(1)
}

// delay returns R²/(2 m), or what stands for it.
func (s *Solution) delay() float64 {
	r := s.wayOut()
	switch s.problem.Body.Family() {
	case shape.Cylindrical:
		return r * r / 4
	case shape.Spherical:
		return r * r / 6
	}
	return r * r / 2
}

// sourced returns the error that a source adds.
func (s *Solution) sourced() float64 {
	if s.exchange.source == 0 {
		return 0
	}
	return math.Abs(s.exchange.source) / s.problem.Body.Volume().SI() * s.delay() / s.biot.Conductivity.SI()
}

// travel returns where an ambient begins, by how much it steps in all, its steepest slope and its span.
func travel(a *ambient, from, duration float64) (first, steps, steepest, span float64) {
	at, err := a.course.At(units.Second.Of(from))
	if err != nil {
		return math.NaN(), 0, 0, 0
	}
	first = at.SI()
	if _, amplitude, period, _, ok := a.course.Oscillation(); ok {
		return first, 0, math.Abs(amplitude.SI()) * 2 * math.Pi / period.SI(), 2 * math.Abs(amplitude.SI())
	}
	if _, rate, ok := a.course.Ramp(); ok {
		return first, 0, math.Abs(rate.SI()), math.Abs(rate.SI()) * duration
	}
	times, temperatures, _ := a.course.Readings()
	level, low, high := 0.0, 0.0, 0.0 // of the log without its steps
	for i := 1; i < len(times); i++ {
		d := temperatures[i].Sub(temperatures[i-1]).SI()
		switch length := times[i].Sub(times[i-1]).SI(); {
		case times[i].SI() <= from || times[i-1].SI() > from+duration:
		case length == 0:
			steps += math.Abs(d)
		default:
			steepest = max(steepest, math.Abs(d)/length)
			level += d
			low, high = min(low, level), max(high, level)
		}
	}
	return first, steps, steepest, high - low
}

// LumpingErrorInTime returns how much later the place is at the target by the exact solution than by
// [Solution.TimeTo]; it is negative for a place that is ahead of the mean, such as the surface. What
// is said of [Solution.LumpingError] on constants and estimates holds here. It returns the errors of TimeTo,
// and an [*units.ArgumentError] for a target that does not lie between the start and the limit, and for a solution under
// ambients that go with time.
func (s *Solution) LumpingErrorInTime(place shape.Place, target units.Temperature) (units.Duration, error) {
	t, err := s.TimeTo(place, target)
	if err != nil || t.SI() == 0 {
		return units.Duration{}, err
	}
	if s.moving != nil {
		return units.Duration{}, &units.ArgumentError{Field: "ambient of the lumping error in time", Value: "one that goes with time", Accepted: "a steady one; see LumpingError"}
	}
	theta := (target.SI() - s.limit) / (s.start - s.limit)
	if !s.limitKnown || !(theta > 0 && theta < 1) {
		return units.Duration{}, errOutside(target)
	}
	exact, lumped, ok, err := s.exactTime(place, theta)
	if err != nil {
		return units.Duration{}, err
	}
	if !ok {
		return units.Duration{}, errOutside(target)
	}
	late := t.Scale(s.margin() * (exact/lumped - 1))
	return late, units.CheckFinite("lumping error in time", late)
}

func errOutside(target units.Temperature) error {
	return &units.ArgumentError{Field: "target", Value: target, Accepted: "between the start and the limit of the body"}
}

// exactTime returns the Fourier numbers at which the exact solution and the lumped one have fallen to theta.
func (s *Solution) exactTime(place shape.Place, theta float64) (exact, lumped float64, ok bool, err error) {
	m, err := s.comparison(place)
	if err != nil {
		return 0, 0, false, err
	}
	exact, ok = m.timeTo(theta)
	if s.inside == nil {
		return exact, -math.Log(theta) / m.decay, ok, nil
	}
	lumped, found := eigen.Fall(m.lumped, 1, m.decay, theta)
	return exact, lumped, ok && found, nil
}

// lumpingPart returns the largest error of θ at a place.
func (s *Solution) lumpingPart(place shape.Place) (float64, error) {
	if s.biot.Conduction == 0 {
		return 0, nil
	}
	if s.inside == nil && place.InEveryBody() {
		column := atCentre
		switch place {
		case shape.Surface():
			column = atSurface
		case shape.Mean():
			column = ofMean
		}
		switch s.problem.Body.Family() {
		case shape.Planar:
			return tabulatedBound(inPlate, column, s.biot.Conduction), nil
		case shape.Cylindrical:
			return tabulatedBound(inCylinder, column, s.biot.Conduction), nil
		case shape.Spherical:
			return tabulatedBound(inSphere, column, s.biot.Conduction), nil
		case shape.HollowCylindrical, shape.HollowSpherical:
			return s.hollowPart(column), nil
		}
	}
	if s.standsCube() && place == shape.Surface() {
		place = shape.Centre()
	}
	m, err := s.comparison(place)
	if err != nil {
		return 0, err
	}
	return min(1, s.margin()*m.largest()), nil
}

// irregular is how much larger the error in a body of which only V/A counts may be than in a cube. In a body that is
// circumscribed about a sphere of radius r, with the mean square M of the distance of its surface from the middle, the middle of slow
// cooling is above the mean by 3 M/(10 r), and the mean above the surface by M/(5 r). The former is r/2 in a cube, 0.9 r in a
// regular tetrahedron, 1.06 r in a cone of a height of 0.5 or 2.5 diameters (the solution of ∇²u = −3/r with the slope −1 at every face is −ρ²/(2 r); derived here).
const irregular = 2.5

// margin returns the factor on the error of the body that stands for the body.
func (s *Solution) margin() float64 {
	if s.standsCube() {
		return irregular
	}
	return 1
}

// standsCube reports whether a cube of the same V/A stands for the body.
func (s *Solution) standsCube() bool {
	b := s.problem.Body
	return b.Family() == shape.Compact && len(b.Factors()) == 0
}

// hollowPart returns the largest error in a hollow body from the bodies of the table with the same resistance inside. Of these the
// centre is 1.5, 2 and 2.5 resistances above the surface, and the hollow body lies between two of them.
func (s *Solution) hollowPart(column int) float64 {
	p := newProfile(s.problem.Body)
	resistance := s.biot.Coefficient.SI() * p.resistance / s.biot.Conductivity.SI()
	between := min(max(2*(p.centre-p.surface)/p.resistance-3, inPlate), inSphere)
	low := min(int(between), inCylinder)
	of := func(body int) float64 { return tabulatedBound(body, column, float64(body+3)*resistance) }
	return of(low) + (between-float64(low))*(of(low+1)-of(low))
}

// tabulated returns the body with an exact solution that stands for the body, and its Biot number: of a hollow body the plate
// of the same resistance inside.
func (s *Solution) tabulated() (kind int, bi float64, ok bool) {
	bi = s.biot.Conduction
	switch s.problem.Body.Family() {
	case shape.Planar:
		return inPlate, bi, true
	case shape.Cylindrical:
		return inCylinder, bi, true
	case shape.Spherical:
		return inSphere, bi, true
	case shape.HollowCylindrical, shape.HollowSpherical:
		p := newProfile(s.problem.Body)
		return inPlate, 3 * p.resistance / s.problem.Body.ConductionLength().SI() * bi, true
	}
	return 0, 0, false
}

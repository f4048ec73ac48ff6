package lumped

import (
	"math"

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
// sphere of the same resistance inside, in any other for a cube of the same V/A. [Solution.LumpingErrorIsBound] tells which. It returns an
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
	e := units.KelvinDifference.Of(part*jumps + drift)
	return e, units.CheckFinite("lumping error", e)
}

// LumpingErrorIsBound reports whether [Solution.LumpingError] is a bound, and not an estimate.
func (s *Solution) LumpingErrorIsBound() bool {
	if s == nil || !s.solved || s.path != nil || !s.exchange.linear() || !isNone(s.problem.Opposite) {
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
// integral of the error of a jump is at most R²/(2 m α) at any place, m = 1 in a plate, 2 in a cylinder, 3 in a sphere.
func (s *Solution) excited() (jumps, drift float64) {
	e := s.exchange
	if !e.linear() || s.path != nil || len(e.ambients) == 0 {
		return s.span, s.sourced()
	}
	g, at, slope := 0.0, 0.0, 0.0
	for i := range e.ambients {
		a := &e.ambients[i]
		g += a.conductance
		if a.steady {
			at += a.conductance * a.at
			continue
		}
		first, steps, steepest := travel(a, e.shift, s.end)
		at += a.conductance * first
		jumps += a.conductance * steps
		slope += a.conductance * steepest
	}
	jumps = jumps/g + math.Abs(s.start-at/g+e.given/(e.factor*g))
	alpha := s.biot.Conductivity.SI() / (s.content.capacity / s.problem.Body.Volume().SI())
	return jumps, slope/g*s.delay()/alpha + s.sourced()
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

// travel returns where an ambient begins, by how much it steps in all, and its steepest slope.
func travel(a *ambient, from, duration float64) (first, steps, steepest float64) {
	at, err := a.course.At(units.Second.Of(from))
	if err != nil {
		return math.NaN(), 0, 0
	}
	first = at.SI()
	if _, amplitude, period, _, ok := a.course.Oscillation(); ok {
		return first, 0, math.Abs(amplitude.SI()) * 2 * math.Pi / period.SI()
	}
	if _, rate, ok := a.course.Ramp(); ok {
		return first, 0, math.Abs(rate.SI())
	}
	times, temperatures, _ := a.course.Readings()
	for i := 1; i < len(times); i++ {
		d := math.Abs(temperatures[i].Sub(temperatures[i-1]).SI())
		switch span := times[i].Sub(times[i-1]).SI(); {
		case times[i].SI() <= from || times[i-1].SI() > from+duration:
		case span == 0:
			steps += d
		default:
			steepest = max(steepest, d/span)
		}
	}
	return first, steps, steepest
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
	late := t.Scale(exact/lumped - 1)
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
	m, err := s.comparison(place)
	if err != nil {
		return 0, err
	}
	return m.largest(), nil
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

// A comparison sets the exact solution over Fo = α t/R² beside the lumped one, at a place.
type comparison struct {
	factors []compared
	mean    bool
	decay   float64 // of the lumped θ over Fo
	delayed float64 // amplitude of the place above the mean to first order
	rate    float64 // at which that sets in, over Fo
	bi      float64
}

// A compared factor is a body of one coordinate.
type compared struct {
	modes eigen.Solution
	ratio float64 // its Fourier number over that of the first
	x     float64
}

// comparison returns what the error is found from. Body and place are those of the solution, or what stands for them.
func (s *Solution) comparison(place shape.Place) (*comparison, error) {
	m := &comparison{mean: place.IsMean(), bi: s.biot.Conduction}
	r := s.wayOut()
	factors := s.problem.Body.Factors()
	x, position := 0.0, error(nil)
	if !m.mean {
		x, position = place.Position(s.problem.Body)
	}
	k := s.biot.Conductivity.SI()
	kind, bi, one := s.tabulated()
	switch {
	case one && position != nil:
		return nil, position
	case one: // with the Biot number of the plate that stands for a hollow body
		m.factors = []compared{{[]func(float64) eigen.Solution{plateModes, cylinderModes, sphereModes}[kind](bi), 1, x}}
		m.bi = bi
		m.decay = bi * float64(1+kind)
	case factors != nil:
		if position != nil {
			return nil, position
		}
		for i, f := range factors {
			length := f.ConductionLength().SI()
			h := s.biot.Coefficient.SI()
			modes := plateModes
			if f.Family() == shape.Cylindrical {
				modes = cylinderModes
			}
			c := compared{modes(h * length / k), r * r / length / length, 0}
			if i == 0 {
				c.x = x
			}
			m.factors = append(m.factors, c)
		}
		m.decay = s.biot.Conduction * r / s.length
	default: // a cube of the same V/A
		edge := 3 * s.length
		c := compared{plateModes(s.biot.Coefficient.SI() * edge / k), 1, 0}
		m.factors = []compared{c, c, c}
		if position == nil {
			m.factors[0].x = x
		}
		r = edge
		m.bi = s.biot.Coefficient.SI() * edge / k
		m.decay = 3 * m.bi
	}
	if s.inside != nil {
		above, centre, length, err := s.standIn(place, kind, one, x)
		if err != nil {
			return nil, err
		}
		damping := s.exchange.damping()
		m.delayed = m.bi * damping * above / r
		m.decay *= damping
		m.rate = r * r / (length * centre)
	}
	return m, nil
}

// standIn returns the profile at a place and at the centre, and V/A, of the body that the exact solution is for.
func (s *Solution) standIn(place shape.Place, kind int, one bool, x float64) (above, centre, length float64, err error) {
	if !one {
		above, err = s.inside.of(place, s.problem.Body)
		return above, s.inside.centre, s.length, err
	}
	r, dimensions := s.wayOut(), float64(1+kind)
	mean := 1 / (2 + dimensions) // of the half of 1 − x²
	if !place.IsMean() {
		above = r * ((1-x*x)/2 - mean)
	}
	return above, r * (0.5 - mean), r / dimensions, nil
}

func plateModes(bi float64) eigen.Solution    { return eigen.NewPlate(bi) }
func cylinderModes(bi float64) eigen.Solution { return eigen.NewCylinder(bi) }
func sphereModes(bi float64) eigen.Solution   { return eigen.NewSphere(bi) }

// exact returns the exact θ.
func (m *comparison) exact(fo float64) float64 {
	theta := 1.0
	for i := range m.factors {
		f := &m.factors[i]
		if m.mean {
			theta *= f.modes.Mean(fo * f.ratio)
		} else {
			theta *= f.modes.At(f.x, fo*f.ratio)
		}
	}
	return theta
}

// lumped returns θ of the lumped solution.
func (m *comparison) lumped(fo float64) float64 {
	theta := math.Exp(-m.decay * fo)
	if m.delayed != 0 {
		theta *= 1 - m.delayed*math.Expm1(-m.rate*fo)
	}
	return theta
}

// timeTo returns the Fourier number at which the exact solution has fallen to theta.
func (m *comparison) timeTo(theta float64) (float64, bool) {
	if len(m.factors) == 1 {
		if m.mean {
			return m.factors[0].modes.TimeOfMean(theta)
		}
		return m.factors[0].modes.TimeAt(m.factors[0].x, theta)
	}
	coefficient, rate := 1.0, 0.0
	for i := range m.factors {
		f := &m.factors[i]
		c, mean := f.modes.OneTerm(f.x, 0)
		if m.mean {
			c = mean
		}
		coefficient *= c
		rate += f.ratio * f.modes.Decay()
	}
	return eigen.Fall(m.exact, coefficient, rate, theta)
}

const (
	pointsPerDecade = 32
	boundMargin     = 1.02  // more than what a maximum between two points can add
	boundRounding   = 1e-14 // rounding of the series
)

// largest returns a bound on |θ_exact − θ_lumped| over all Fo.
//
// The difference rises while heat from the inside is on its way and falls with the slower of both
// exponentials; over ln Fo it is smooth on the scale of 1. At the surface the first thing that happens
// is a fall by 2 Bi √(Fo/π), so the scan starts where that is a hundredth of its later size.
func (m *comparison) largest() float64 {
	if m.bi == 0 {
		return 0
	}
	first := 1e-4 * min(1, 1/(m.bi*m.bi))
	last := 30 * max(1/m.decay, 0.1)
	n := int(pointsPerDecade*math.Log10(last/first)) + 1
	largest := 0.0
	for i := range n + 1 {
		fo := first * math.Pow(last/first, float64(i)/float64(n))
		largest = max(largest, math.Abs(m.exact(fo)-m.lumped(fo)))
	}
	return min(1, boundMargin*largest+boundRounding)
}

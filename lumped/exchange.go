package lumped

import (
	"math"
	"slices"

	"example.com/coolward/internal/physics"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// An exchange is what leaves the body through its surface, over time and one temperature, taken apart into what
// has constants of its own. Numbers are in W, s and K.
type exchange struct {
	area      float64 // exposed, m²
	ambients  []ambient
	radiators []radiator
	powers    []power
	functions []function
	oneOf     struct { // room for the usual single entry of each list
		ambient  [1]ambient
		radiator [1]radiator
		function [1]function
	}
	given  float64 // W that leave whatever the temperature is
	source float64 // W made inside

	shift    float64 // how much later than 0 the body starts
	factor   float64 // on every coefficient and on functions
	insulate float64 // resistance inside, K/W, where it is counted
}

// A variant is a problem with its coefficients times a factor, which starts later than 0.
type variant struct{ factor, start float64 }

// asGiven is the problem itself.
var asGiven = variant{factor: 1}

// An ambient takes conductance (T − course).
type ambient struct {
	conductance float64
	course      boundary.Course
	steady      bool
	at          float64 // where it is steady
}

// A radiator takes strength (T⁴ − surroundings⁴).
type radiator struct{ strength, surroundings float64 }

// A power takes strength |d|^exponent d, d = T − ambient.
type power struct{ strength, exponent, ambient float64 }

// A function takes what a condition gives.
type function struct {
	area      float64
	condition boundary.Condition
}

// open takes the conditions of the surface apart, in place.
func (e *exchange) open(p *Problem, v variant) error {
	e.factor, e.shift, e.source = v.factor, v.start, p.Source.SI()*p.Body.Volume().SI()
	e.ambients, e.radiators, e.functions = e.oneOf.ambient[:0], e.oneOf.radiator[:0], e.oneOf.function[:0]
	if p.Opposite.IsZero() {
		e.area = p.Body.Area().SI()
		e.add(p.Surface, e.area)
	} else {
		front, back, ok := faceAreas(p.Body)
		if !ok {
			return &units.ArgumentError{Field: "opposite surface condition", Value: p.Opposite.String(), Accepted: "none, since " + p.Body.String() + " has no opposite face"}
		}
		e.area = front + back
		e.add(p.Surface, front)
		e.add(p.Opposite, back)
	}
	if !isFinite(e.source) || !isFinite(e.given) {
		return &units.ArgumentError{Field: "source", Value: p.Source, Accepted: "one that gives a finite power"}
	}
	return nil
}

// facesOf returns the surface and the face opposite to it, of a body of two faces.
func facesOf(b shape.Body) (surface, opposite shape.Face) {
	one, other := shape.Front, shape.Back
	if f := b.Family(); f == shape.HollowSpherical || f == shape.HollowCylindrical {
		one, other = shape.Outside, shape.Inside
	}
	if b.Exposed() == other {
		return other, one
	}
	return one, other
}

// faceAreas returns the areas of the surface and of the face opposite to it, for a body of two faces.
func faceAreas(b shape.Body) (surface, opposite float64, ok bool) {
	switch b.Family() {
	case shape.HollowSpherical, shape.HollowCylindrical:
	case shape.Planar:
		if b.Exposed() == shape.Ends {
			half := b.Area().SI() / 2
			return half, half, true
		}
	default:
		return 0, 0, false
	}
	one, other := facesOf(b)
	return b.Exposing(one).Area().SI(), b.Exposing(other).Area().SI(), true
}

// add takes one condition on an area apart. A part that exchanges nothing is left out.
func (e *exchange) add(c boundary.Condition, area float64) {
	for _, part := range c.Parts() {
		if h, at, ok := part.Constants(); ok && h.SI() > 0 {
			e.ambients = append(e.ambients, ambient{conductance: area * h.SI(), steady: true, at: at.SI()})
		} else if h, course, ok := part.Following(); ok && h.SI() > 0 {
			at, steady := course.Steady()
			e.ambients = append(e.ambients, ambient{area * h.SI(), course, steady, at.SI()})
		} else if emissivity, at, ok := part.Radiation(); ok && emissivity > 0 {
			e.radiators = append(e.radiators, radiator{area * emissivity * physics.StefanBoltzmann, at.SI()})
		} else if h, at, n, ambient, ok := part.Power(); ok && h.SI() > 0 {
			e.powers = append(e.powers, power{area * h.SI() / math.Pow(at.SI(), n), n, ambient.SI()})
		} else if q, ok := part.ConstantFlux(); ok {
			e.given += area * q.SI()
		} else if !part.ByConstants() {
			e.functions = append(e.functions, function{area, part})
		}
	}
}

// out returns what leaves the surface at time t, in W.
func (e *exchange) out(t, kelvin float64) (float64, error) {
	switch {
	case e.insulate == 0:
		return e.bare(t, kelvin)
	case e.linear():
		w, err := e.bare(t, kelvin)
		return w * e.damping(), err
	}
	return e.behind(t, kelvin)
}

// bare returns what leaves a surface that is at the given temperature.
func (e *exchange) bare(t, kelvin float64) (float64, error) {
	t += e.shift
	total := 0.0
	for i := range e.functions {
		q, err := e.functions[i].condition.Flux(units.Second.Of(t), units.Kelvin.Of(kelvin))
		if err != nil {
			return 0, err
		}
		total += e.functions[i].area * q.SI()
	}
	for i := range e.ambients {
		a := &e.ambients[i]
		at := a.at
		if !a.steady {
			now, err := a.course.At(units.Second.Of(t))
			if err != nil {
				return 0, err
			}
			at = now.SI()
		}
		total += a.conductance * (kelvin - at)
	}
	for _, p := range e.powers {
		d := kelvin - p.ambient
		total += p.strength * math.Pow(math.Abs(d), p.exponent) * d
	}
	total = e.factor*total + e.given
	for _, r := range e.radiators {
		T, s := kelvin, r.surroundings
		total += r.strength * (T*T + s*s) * (T + s) * (T - s)
	}
	if !isFinite(total) {
		return 0, &units.ArgumentError{Field: "temperature of the body", Value: units.Kelvin.Of(kelvin), Accepted: "one at which the surface exchanges a finite power"}
	}
	return total, nil
}

// behind returns what leaves the surface of a body of the given mean temperature: w = bare(T − w R) with the
// resistance R inside, by Newton's method with a secant, from a surface at T.
func (e *exchange) behind(t, kelvin float64) (float64, error) {
	w0, err := e.bare(t, kelvin)
	if err != nil || w0 == 0 {
		return 0, err
	}
	// g(w) = bare(T − w R) − w falls with w where the exchange rises with the temperature.
	x0, g0 := 0.0, w0
	x1 := w0
	if slope := e.conductance(kelvin); slope > 0 {
		x1 = w0 / (1 + slope*e.insulate)
	}
	for range 50 {
		w, err := e.bare(t, kelvin-x1*e.insulate)
		if err != nil {
			return 0, err
		}
		g1 := w - x1
		rounding := 1e-15 * kelvin * math.Abs((w0-w)/(x1*e.insulate)) // of T − w R, as a power
		if g1 == g0 || math.Abs(g1) <= 1e-13*math.Abs(w0)+rounding {
			return x1, nil
		}
		x0, x1, g0 = x1, x1-g1*(x1-x0)/(g1-g0), g1
	}
	return 0, &units.ConvergenceError{Method: "surface temperature", Time: units.Second.Of(t), Reason: "none fits the resistance inside; solve without FirstOrder"}
}

// conductance returns the slope of bare where it has constants, W/K.
func (e *exchange) conductance(kelvin float64) float64 {
	g := 0.0
	for i := range e.ambients {
		g += e.ambients[i].conductance
	}
	for _, p := range e.powers {
		g += p.strength * (1 + p.exponent) * math.Pow(math.Abs(kelvin-p.ambient), p.exponent)
	}
	g *= e.factor
	for _, r := range e.radiators {
		g += 4 * r.strength * kelvin * kelvin * kelvin
	}
	return g
}

// linear reports whether what leaves is a straight line over the temperature, at every time.
func (e *exchange) linear() bool {
	return len(e.functions) == 0 && len(e.powers) == 0 && len(e.radiators) == 0
}

// steady reports whether the exchange is the same at all times.
func (e *exchange) steady() bool {
	moves := func(a ambient) bool { return !a.steady }
	return len(e.functions) == 0 && !slices.ContainsFunc(e.ambients, moves)
}

// breaks returns the times at which an ambient has a step or a bend, after the start.
func (e *exchange) breaks() []float64 {
	var all []float64
	for i := range e.ambients {
		if e.ambients[i].steady {
			continue
		}
		for _, at := range e.ambients[i].course.Bends() {
			if t := at.SI() - e.shift; t > 0 {
				all = append(all, t)
			}
		}
	}
	slices.Sort(all)
	return slices.Compact(all)
}

// damping returns by how much the resistance inside lowers an exchange that is a straight line over the
// temperature: w = G (T − w R − T∞) gives w = G (T − T∞)/(1 + G R).
func (e *exchange) damping() float64 {
	if e.insulate == 0 {
		return 1
	}
	return 1 / (1 + e.conductance(0)*e.insulate)
}

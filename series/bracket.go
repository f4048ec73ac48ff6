package series

import (
	"context"
	"math"
	"slices"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// An Envelope holds bodies that are known to fit into an irregular one, and bodies into which that fits.
type Envelope struct {
	Inside  []shape.Body // spheres, bricks, and cylinders with their ends
	Outside []shape.Body // spheres, long cylinders, and plates with both faces
}

// A Bracket encloses the temperature of the slowest place of a body for which there is no exact solution between those of
// bodies for which there is one. It does not change and may be used from many goroutines. Make one with
// [Problem.Bracket]; the zero one is refused by every method.
//
// While it cools, a body is nowhere warmer than a sphere, a long cylinder or a plate around it with the same coefficient,
// whatever its form and the coefficient. For let w be the excess over the ambient in one of these three and g = −∂(ln w)/∂r
// outwards: it is 0 at the start and in the middle, h/k at the surface, and by its own maximum principle never more in
// between. On the surface of the body inside, which faces any way, w thus loses by conduction no more than h w, which
// makes it an upper solution there.
//
// The slowest place is no cooler than the centre of a body that fits into it. For a prescribed surface temperature that is
// the monotony of conduction in the domain; with a coefficient it is not proven for bodies of every form. For bricks and
// short cylinders, of which the exact solution is known, it held in every case tried, at all Biot numbers.
type Bracket struct {
	inside, outside []*Solution
	like            []*Solution // one or two bodies, which the likely one is like or between
	weight          float64     // of the second
}

// A TemperatureBracket holds temperatures of the slowest place.
type TemperatureBracket struct {
	Fast   units.Temperature // of the slowest body that fits into it
	Likely units.Temperature
	Slow   units.Temperature // of the fastest body into which it fits
}

// A TimeBracket holds times at which the slowest place reaches a temperature.
type TimeBracket struct {
	Fast   units.Duration // of the slowest body that fits into it
	Likely units.Duration
	Slow   units.Duration // of the fastest body into which it fits
}

// Bracket prepares the bracket of a body that is exposed on all its faces. To the bodies of the envelope, which may be
// empty but for a body of [shape.Measured], those are added that follow from the measures: the largest inscribed sphere,
// and the sphere, the cylinder and the plate around it. A measured body is taken to be convex, so that a sphere of
// the radius V/A fits into it.
//
// It returns an [*units.ArgumentError] for fields that [Problem.Solve] would refuse besides the body, for a body
// that [Problem.Solve] solves as one of one coordinate or that is insulated in part, for a body of the envelope
// that is not of those named there or cannot fit by its volume, and where nothing is known of what is around a measured
// body; and the error of ctx if that is done.
func (p Problem) Bracket(ctx context.Context, e Envelope) (*Bracket, error) {
	if err := p.Body.Check(); err != nil {
		return nil, err
	}
	if p.Body.Family() != shape.Compact || partly(p.Body) {
		return nil, &units.ArgumentError{Field: "body", Value: p.Body.String(), Accepted: "a body of several coordinates that is exposed on all its faces"}
	}
	inside, outside := around(p.Body)
	for _, body := range e.Inside {
		if family := body.Family(); body.Check() != nil || family != shape.Spherical && (family != shape.Compact || body.Factors() == nil) || larger(body, p.Body) {
			return nil, &units.ArgumentError{Field: "envelope: body inside", Value: body.String(), Accepted: "a sphere, a brick or a cylinder that fits into " + p.Body.String()}
		}
		inside = append(inside, body)
	}
	for _, body := range e.Outside {
		family := body.Family()
		if body.Check() != nil || family != shape.Spherical && family != shape.Cylindrical && (family != shape.Planar || partly(body)) || family == shape.Spherical && larger(p.Body, body) {
			return nil, &units.ArgumentError{Field: "envelope: body outside", Value: body.String(), Accepted: "a sphere, a long cylinder or a plate exposed on both faces, around " + p.Body.String()}
		}
		outside = append(outside, body)
	}
	if len(outside) == 0 {
		return nil, &units.ArgumentError{Field: "envelope: bodies outside", Accepted: "one or more, as the measures of " + p.Body.String() + " say nothing about them"}
	}
	b := &Bracket{}
	solve := func(body shape.Body) (*Solution, error) {
		q := p
		q.Body = body
		s, err := q.Solve(ctx)
		if err != nil {
			return nil, err
		}
		return s, s.plain()
	}
	for _, list := range []struct {
		bodies []shape.Body
		to     *[]*Solution
	}{{inside, &b.inside}, {outside, &b.outside}} {
		for _, body := range list.bodies {
			s, err := solve(body)
			if err != nil {
				return nil, err
			}
			*list.to = append(*list.to, s)
		}
	}
	like, weight := alike(p.Body, inside)
	b.weight = weight
	for _, body := range like {
		q := p
		if h, ambient, ok := p.Surface.Constants(); ok { // the same h A
			q.Surface = boundary.Constant(h.Scale(p.Body.Area().Ratio(body.Area())), ambient)
		}
		q.Body = body
		s, err := q.Solve(ctx)
		if err != nil {
			return nil, err
		}
		b.like = append(b.like, s)
	}
	return b, nil
}

// partly reports whether a face of a body is insulated.
func partly(body shape.Body) bool {
	for f := shape.Outside; f <= shape.Back; f <<= 1 {
		if body.Exposed()&f == 0 && body.Exposing(body.Exposed()|f).Check() == nil {
			return true
		}
	}
	return false
}

// larger reports whether a has more volume than b, beyond rounding.
func larger(a, b shape.Body) bool { return a.Volume().SI() > b.Volume().SI()*(1+1e-9) }

// around returns the bodies inside and outside of one that follow from its measures.
func around(body shape.Body) (inside, outside []shape.Body) {
	area := units.SquareMetre.Of(1)
	plate := func(thickness units.Length) shape.Body { return shape.Plate(thickness, area) }
	rod := func(d units.Length) shape.Body { return shape.Cylinder(d, d).Exposing(shape.Outside) }
	diagonal := func(lengths ...units.Length) units.Length {
		square := 0.0
		for _, l := range lengths {
			square = math.Hypot(square, l.SI())
		}
		return units.Metre.Of(square)
	}
	first, second, third := body.Edges()
	edges := []units.Length{first, second, third}
	slices.SortFunc(edges, units.Length.Compare)
	d, l := body.Diameter(), body.Length()
	sphere := shape.Sphere(body.ConductionLength().Scale(2))
	switch {
	case first.SI() > 0:
		return []shape.Body{sphere}, []shape.Body{plate(edges[0]), rod(diagonal(edges[:2]...)), shape.Sphere(diagonal(edges...))}
	case body == shape.Capsule(d, l):
		return []shape.Body{sphere}, []shape.Body{rod(d), shape.Sphere(l)}
	case d.SI() > 0:
		return []shape.Body{sphere}, []shape.Body{plate(l), rod(d), shape.Sphere(diagonal(d, l))}
	}
	return []shape.Body{shape.Sphere(body.VolumeToArea().Scale(2))}, nil
}

// alike returns one body, or two and the weight of the second, of the same volume as a body and of the same largest
// inscribed sphere: the flat and the long cylinder between which r A/V of the body lies, or a sphere where that is too
// small for a cylinder. For a measured body without anything inside, whose sphere is unknown, it returns the flat and
// the long cylinder of the same volume and surface.
func alike(body shape.Body, inside []shape.Body) ([]shape.Body, float64) {
	v, a, r := body.Volume().SI(), body.Area().SI(), body.ConductionLength().SI()
	cylinder := func(d, l float64) shape.Body { return shape.Cylinder(units.Metre.Of(d), units.Metre.Of(l)) }
	ball := []shape.Body{shape.Sphere(units.Metre.Of(math.Cbrt(6 / math.Pi * v)))}
	measured := body == shape.Measured(body.Volume(), body.Area())
	if measured && len(inside) == 1 {
		// with L = x D: 16 π (x + 1/2)³/x² = A³/V², least for x = 1
		form := a / v * a / v * a / (16 * math.Pi)
		if form < 3.375 {
			return ball, 0
		}
		excess := func(x float64) float64 { return math.Pow(x+0.5, 3)/(x*x) - form }
		low, ok1 := root.Find(excess, math.Sqrt(0.1/form), 1, 0)
		high, ok2 := root.Find(excess, 1, form, 0)
		if !ok1 || !ok2 {
			return ball, 0
		}
		d := func(x float64) float64 { return math.Cbrt(4 * v / (math.Pi * x)) }
		return []shape.Body{cylinder(d(low), d(low)*low), cylinder(d(high), d(high)*high)}, 0.5
	}
	if measured {
		r = 0
		for _, b := range inside {
			r = math.Max(r, b.ConductionLength().SI())
		}
	}
	if v < 2*math.Pi*r*r*r*(1-1e-9) {
		return ball, 0
	}
	flat, long := cylinder(math.Sqrt(2*v/(math.Pi*r)), 2*r), cylinder(2*r, v/(math.Pi*r*r))
	low, high := flat.Area().SI(), long.Area().SI()
	part := 0.0
	if high > low {
		part = math.Max(0, math.Min(1, (a-low)/(high-low)))
	}
	// a second way across speeds a body up by the square of what it is shorter
	return []shape.Body{flat, long}, part * part
}

// Bodies returns the bodies whose solutions are the ends of the bracket.
func (b *Bracket) Bodies() Envelope {
	var e Envelope
	if b == nil {
		return e
	}
	for _, s := range b.inside {
		e.Inside = append(e.Inside, s.problem.Body)
	}
	for _, s := range b.outside {
		e.Outside = append(e.Outside, s.problem.Body)
	}
	return e
}

// At returns the bracket of the temperature of the slowest place at time t ≥ 0, with the errors of [Solution.At]. The
// likely one is that of a short cylinder, or between those of two, with the same volume, the same exchanging h A and,
// where it is known, the same largest inscribed sphere; for bricks its time to a temperature was found within
// −27 and +10 % of the exact one, and at a small Biot number it is right.
func (b *Bracket) At(t units.Duration) (TemperatureBracket, error) {
	if err := b.check(t); err != nil {
		return TemperatureBracket{}, err
	}
	fast, likely, slow := b.thetas(t.SI())
	s := b.outside[0]
	return TemperatureBracket{s.temperature(fast), s.temperature(likely), s.temperature(slow)}, nil
}

// thetas returns θ at the slowest place.
func (b *Bracket) thetas(t float64) (fast, likely, slow float64) {
	centre := func(s *Solution) float64 { return s.theta(&position{}, t/s.scale) }
	slow = 1
	for _, s := range b.inside {
		fast = math.Max(fast, centre(s))
	}
	for _, s := range b.outside {
		slow = math.Min(slow, centre(s))
	}
	fast = math.Min(fast, slow) // they can be one but for rounding
	likely = centre(b.like[0])
	if len(b.like) > 1 {
		likely = math.Pow(likely, 1-b.weight) * math.Pow(centre(b.like[1]), b.weight)
	}
	return fast, math.Max(fast, math.Min(slow, likely)), slow
}

// TimeTo returns the bracket of the time at which the slowest place reaches the target, with the errors of
// [Solution.TimeTo].
func (b *Bracket) TimeTo(target units.Temperature) (TimeBracket, error) {
	if err := b.check(units.Duration{}); err != nil {
		return TimeBracket{}, err
	}
	var times TimeBracket
	for _, s := range b.inside {
		t, err := s.TimeTo(shape.Slowest(), target)
		if err != nil {
			return TimeBracket{}, err
		}
		times.Fast = units.Second.Of(math.Max(times.Fast.SI(), t.SI()))
	}
	for i, s := range b.outside {
		t, err := s.TimeTo(shape.Slowest(), target)
		if err != nil {
			return TimeBracket{}, err
		}
		if i == 0 || t.SI() < times.Slow.SI() {
			times.Slow = t
		}
	}
	times.Fast = units.Second.Of(math.Min(times.Fast.SI(), times.Slow.SI()))
	if times.Slow.SI() == 0 {
		return times, nil
	}
	s := b.outside[0]
	theta := (target.SI() - s.ambient.SI()) / s.excess
	t, ok := rising(func(t float64) float64 {
		_, likely, _ := b.thetas(t)
		return (1 - likely) / (1 - theta)
	}, math.Log(times.Slow.SI()))
	if !ok {
		return TimeBracket{}, &units.ConvergenceError{Method: "likely time to a temperature", Reason: "it is beyond the range of float64"}
	}
	times.Likely = units.Second.Of(math.Max(times.Fast.SI(), math.Min(times.Slow.SI(), t)))
	return times, nil
}

// check refuses the zero bracket and a time that cannot be.
func (b *Bracket) check(t units.Duration) error {
	if b == nil || len(b.outside) == 0 {
		return &units.ArgumentError{Field: "bracket", Accepted: "a bracket made by Problem.Bracket"}
	}
	return units.CheckNotNegative("time", t)
}

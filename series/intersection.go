package series

import (
	"context"
	"math"
	"slices"
	"strconv"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// A Product is a body where several simpler ones intersect, each with a coefficient of its own: a brick whose faces
// exchange differently along each edge, a cylinder with ends unlike its mantle, a long bar (two plates), the end of a bar
// or the corner of a thick wall (with bodies that have no other side). Every field but Sources and Notes must be set.
//
// The temperature is the product of those in the directions where all have the same ambient, and so is its mean (A. B.
// Newman, Industrial and Engineering Chemistry 28 (1936) 545–548, from memory). A [Problem] says the same with fewer
// words where the coefficient is one.
type Product struct {
	Directions   []Direction
	Conductivity units.Conductivity // above 0
	Density      units.Density      // above 0
	SpecificHeat units.SpecificHeat // above 0
	Initial      units.Temperature  // of the whole body at time 0
	Sources      []string           // where the data come from; the derivation repeats them
	Notes        []string           // remarks that the derivation repeats
}

// A Direction is one of the bodies that intersect. Plates and bodies without another side take one of the three
// coordinates each, and a long cylinder two.
type Direction struct {
	Body    shape.Body         // a plate, or a cylinder without its ends; the zero Body is one without another side, behind a plane face
	Surface boundary.Condition // of boundary.Constant or boundary.Temperature; the ambient is the same in all directions
}

// DirectionsOf returns the directions of a cylinder or a brick that is exposed on all its faces, in the order of
// [shape.Body.Factors], each with the condition of the same place in the list. It returns an [*units.ArgumentError]
// for another body or another number of conditions.
func DirectionsOf(body shape.Body, surfaces ...boundary.Condition) ([]Direction, error) {
	factors := body.Factors()
	if factors == nil {
		return nil, &units.ArgumentError{Field: "body", Value: body.String(), Accepted: "a brick, or a cylinder, plate or sphere"}
	}
	if len(surfaces) != len(factors) {
		return nil, &units.ArgumentError{Field: "surface conditions", Value: len(surfaces), Accepted: strconv.Itoa(len(factors)) + " of them"}
	}
	all := make([]Direction, len(factors))
	for i := range factors {
		all[i] = Direction{Body: factors[i], Surface: surfaces[i]}
	}
	return all, nil
}

// A ProductSolution is the exact solution of a [Product]. It does not change and may be used from many goroutines. Make
// one with [Product.Solve]; the zero one is refused by every method that returns an error.
type ProductSolution struct {
	problem     Product
	diffusivity float64 // m²/s
	ambient     float64 // K
	excess      float64 // T0 − T∞, K
	all         []axis
}

// An axis is what happens along one direction: in a body with modes, or in one without another side.
type axis struct {
	body     shape.Body
	modes    eigen.Solution // nil without another side
	scale    float64        // R²/α, s
	transfer float64        // h/k in 1/m, +Inf for a prescribed temperature
}

// A station is a place along a direction.
type station struct {
	spot          // in a body with another side
	depth float64 // m, in one without
}

// endless stands for a body without another side where a place is asked for its depth.
var endless = shape.Plate(units.Metre.Of(1e150), units.SquareMetre.Of(1))

// Solve prepares the solution. It returns an [*units.ArgumentError] for a field that cannot be used, and the error of
// ctx if that is done.
func (p Product) Solve(ctx context.Context) (*ProductSolution, error) {
	if err := checkSolid(ctx, p.Conductivity, p.Density, p.SpecificHeat); err != nil {
		return nil, err
	}
	if err := units.CheckTemperature("initial temperature", p.Initial); err != nil {
		return nil, err
	}
	p.Directions, p.Sources, p.Notes = slices.Clone(p.Directions), slices.Clone(p.Sources), slices.Clone(p.Notes)
	s := &ProductSolution{problem: p, diffusivity: p.Conductivity.SI() / (p.Density.SI() * p.SpecificHeat.SI())}
	if !(s.diffusivity > 0) || math.IsInf(s.diffusivity, 0) {
		return nil, outOfRange("diffusivity k/(rho c) in m²/s", s.diffusivity)
	}
	coordinates := 0
	for i, d := range p.Directions {
		taken, err := s.add(i, d)
		if err != nil {
			return nil, err
		}
		coordinates += taken
	}
	if coordinates < 1 || coordinates > 3 {
		return nil, &units.ArgumentError{Field: "directions: coordinates in all", Value: coordinates, Accepted: "1 to 3: a plate or a body without another side takes one, a long cylinder two"}
	}
	s.excess = p.Initial.SI() - s.ambient
	return s, nil
}

// add prepares a direction and returns how many coordinates it takes.
func (s *ProductSolution) add(i int, d Direction) (coordinates int, err error) {
	name := "direction " + strconv.Itoa(i+1) + ": "
	if err := d.Surface.Check(); err != nil {
		return 0, err
	}
	h, ambient, convective := d.Surface.Constants()
	transfer := h.SI() / s.problem.Conductivity.SI()
	if !convective {
		surface, prescribed := d.Surface.SurfaceTemperature()
		if !prescribed {
			return 0, &units.ArgumentError{Field: name + "surface condition", Value: d.Surface.String(), Accepted: "boundary.Constant(h, ambient) or boundary.Temperature(T)"}
		}
		ambient, transfer = surface, math.Inf(1)
	}
	if convective && (math.IsInf(transfer, 0) || (transfer == 0) != (h.SI() == 0)) {
		return 0, outOfRange(name+"h/k in 1/m", transfer)
	}
	switch {
	case i == 0:
		s.ambient = ambient.SI()
	case ambient.SI() != s.ambient:
		return 0, &units.ArgumentError{Field: name + "ambient", Value: ambient, Accepted: "that of the first direction, " + units.Kelvin.Of(s.ambient).String()}
	}
	if d.Body == (shape.Body{}) {
		s.all = append(s.all, axis{transfer: transfer})
		return 1, nil
	}
	if err := d.Body.Check(); err != nil {
		return 0, err
	}
	family := d.Body.Family()
	if family != shape.Planar && family != shape.Cylindrical && family != shape.Spherical {
		return 0, &units.ArgumentError{Field: name + "body", Value: d.Body.String(), Accepted: "a plate, a cylinder exposed outside, a sphere, or none"}
	}
	length := d.Body.ConductionLength().SI()
	a := axis{body: d.Body, scale: length * length / s.diffusivity, transfer: transfer}
	bi := transfer * length
	if !(a.scale > 0) || math.IsInf(a.scale, 0) || convective && (math.IsInf(bi, 0) || (bi == 0) != (transfer == 0)) {
		return 0, outOfRange(name+"Biot number, or time scale R²/alpha in s", a.scale)
	}
	a.modes = newModes(family, bi)
	s.all = append(s.all, a)
	return int(dimension(family)), nil
}

// theta returns θ along a direction.
func (s *ProductSolution) theta(a *axis, at station, t float64) float64 {
	if a.modes != nil {
		return at.spot.theta(a.modes, t/a.scale)
	}
	way := math.Sqrt(s.diffusivity) * math.Sqrt(t)
	switch prescribed := math.IsInf(a.transfer, 1); {
	case prescribed && at.depth == 0:
		return 0
	case way == 0:
		return 1
	case prescribed:
		return math.Erf(at.depth / 2 / way)
	case at.depth == 0:
		return eigen.HalfSurface(math.Min(a.transfer*way, math.MaxFloat64))
	}
	return 1 - eigen.HalfLoss(at.depth/2/way, a.transfer*way)
}

// product returns θ at a point.
func (s *ProductSolution) product(point []station, t float64) float64 {
	theta := 1.0
	for i := range point {
		theta *= s.theta(&s.all[i], point[i], t)
	}
	return theta
}

// point returns where places are, one along each direction.
func (s *ProductSolution) point(places []shape.Place) ([]station, error) {
	if len(places) != len(s.all) {
		return nil, &units.ArgumentError{Field: "places, one along each direction", Value: len(places), Accepted: strconv.Itoa(len(s.all)) + " of them"}
	}
	all := make([]station, len(places))
	for i, place := range places {
		switch {
		case s.all[i].modes == nil:
			depth, err := place.Depth(endless)
			if place.IsMean() || err == nil && depth.SI() > 1e149 {
				err = &units.ArgumentError{Field: "place in a body without another side", Value: place.String(), Accepted: "its surface or a depth"}
			}
			if err != nil {
				return nil, err
			}
			all[i].depth = depth.SI()
		case place.IsMean():
			all[i].mean = true
		default:
			x, err := place.Position(s.all[i].body)
			if err != nil {
				return nil, err
			}
			all[i].x = x
		}
	}
	return all, nil
}

// check refuses the zero solution and a time that cannot be.
func (s *ProductSolution) check(t units.Duration) error {
	if s == nil || len(s.all) == 0 {
		return &units.ArgumentError{Field: "solution", Accepted: "a solution made by Product.Solve"}
	}
	return units.CheckNotNegative("time", t)
}

// temperature is that of a [Solution].
func (s *ProductSolution) temperature(theta float64) units.Temperature {
	if theta > 0.5 {
		return units.Kelvin.Of(s.problem.Initial.SI() - s.excess*(1-theta))
	}
	return units.Kelvin.Of(s.ambient + s.excess*theta)
}

// At returns the temperature at time t ≥ 0 at the point that lies at the given places, one along each direction in
// their order. [shape.Mean] is the mean along its direction. It returns an [*units.ArgumentError] for another number of
// places, one that is not in the body, and a time that is negative or not finite.
func (s *ProductSolution) At(t units.Duration, places ...shape.Place) (units.Temperature, error) {
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	point, err := s.point(places)
	if err != nil {
		return units.Temperature{}, err
	}
	return s.temperature(s.product(point, t.SI())), nil
}

// TimeTo returns when the point that lies at the given places reaches the target: 0 if it is met at the start or
// lies on the far side of the start. The errors are those of [Solution.TimeTo].
func (s *ProductSolution) TimeTo(target units.Temperature, places ...shape.Place) (units.Duration, error) {
	if err := s.check(units.Duration{}); err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	point, err := s.point(places)
	if err != nil {
		return units.Duration{}, err
	}
	ambient := units.Kelvin.Of(s.ambient)
	theta := (target.SI() - s.ambient) / s.excess
	still := !slices.ContainsFunc(s.all, func(a axis) bool { return a.transfer != 0 })
	switch {
	case target == s.problem.Initial:
		return units.Duration{}, nil
	case s.excess == 0 || theta <= 0 || still && theta < 1:
		limit := ambient
		if still {
			limit = s.problem.Initial
		}
		return units.Duration{}, &units.NeverError{Place: "point", Target: target, Limit: limit}
	case theta >= 1, s.product(point, 0) == 0:
		return units.Duration{}, nil
	}
	t, ok := rising(func(t float64) float64 { return (1 - s.product(point, t)) / (1 - theta) }, 0)
	if !ok {
		return units.Duration{}, &units.ConvergenceError{
			Method: "time to a temperature", Place: "point",
			Reason: "the target " + target.String() + " is reached at a time beyond the range of float64",
		}
	}
	return units.Second.Of(t), nil
}

// HeatFraction returns the part of ρ c V (T0 − T∞) that has left a body by time t ≥ 0, 0 to 1 (L. S. Langston, International
// Journal of Heat and Mass Transfer 25 (1982) 149–150, from memory). It is a part and no energy, as that of
// [Solution.HeatReleased] is, since directions need not make up a body of a known volume: two plates are a bar without an
// end. The errors are those of [ProductSolution.At], and an
// [*units.ArgumentError] for a body without another side, whose heat has no end.
func (s *ProductSolution) HeatFraction(t units.Duration) (float64, error) {
	if err := s.check(t); err != nil {
		return 0, err
	}
	loss := 0.0
	for i := range s.all {
		a := &s.all[i]
		if a.modes == nil {
			return 0, &units.ArgumentError{Field: "direction " + strconv.Itoa(i+1), Value: "a body without another side", Accepted: "directions with a body, for a part of the heat"}
		}
		loss += (1 - loss) * a.modes.Loss(t.SI()/a.scale)
	}
	return loss, nil
}

// TruncationError bounds what is left out of the temperature of any point at time t ≥ 0: the terms of the series, or the
// images and what else the short-time form neglects, below 1e-15 of T0 − Tinf for each direction, and nothing in
// a body without another side. As in [Solution.TruncationError], rounding is not in it. The errors are those of
// [ProductSolution.At].
func (s *ProductSolution) TruncationError(t units.Duration) (units.TemperatureDifference, error) {
	if err := s.check(t); err != nil {
		return units.TemperatureDifference{}, err
	}
	total := 0.0
	for i := range s.all {
		if a := &s.all[i]; a.modes != nil {
			total += a.modes.Truncation(t.SI() / a.scale)
		}
	}
	return units.KelvinDifference.Of(math.Abs(s.excess) * total), nil
}

// Derivation returns every number that the solution rests on. That of the zero solution is empty.
func (s *ProductSolution) Derivation() derivation.Record {
	var r derivation.Record
	if s.check(units.Duration{}) != nil {
		return r
	}
	p := s.problem
	r.Title = "Exact conduction where simpler bodies of constant properties intersect"
	r.Add("k", "thermal conductivity", p.Conductivity, "given")
	r.Add("rho", "density", p.Density, "given")
	r.Add("c", "specific heat", p.SpecificHeat, "given")
	r.Add("alpha", "thermal diffusivity", units.SquareMetrePerSecond.Of(s.diffusivity), "k / (rho c)")
	r.Add("T0", "start temperature", p.Initial, "given")
	r.Add("Tinf", "ambient, or surface temperature", units.Kelvin.Of(s.ambient), "given")
	r.Note("T = Tinf + (T0 − Tinf) theta; theta is the product of those in the bodies 1, 2 …, and so is its mean.")
	for i := range s.all {
		a, mark := &s.all[i], "_"+strconv.Itoa(i+1)
		if h, _, ok := p.Directions[i].Surface.Constants(); ok {
			r.Add("h"+mark, "heat transfer coefficient", h, "given")
		} else {
			r.Note("Body " + strconv.Itoa(i+1) + ": the surface is at Tinf from time 0 on.")
		}
		if a.modes == nil {
			r.Note("Body " + strconv.Itoa(i+1) + " has no other side: theta = erf(a) + exp(h x/k + b²) erfc(a + b), a = x / (2 √(alpha t)), b = h √(alpha t) / k, at the depth x; the last part is 0 where the surface is at Tinf.")
			continue
		}
		how := formulasOf[a.body.Family()]
		r.Add("R"+mark, how.name+": way out", a.body.ConductionLength(), "by the measures")
		if !math.IsInf(a.transfer, 1) {
			r.AddNumber("Bi"+mark, "Biot number", a.modes.Biot(), "h R / k")
		}
		r.Add("tF"+mark, "time scale", units.Second.Of(a.scale), "R² / alpha")
		if zeta, c, _ := a.modes.Term(1); zeta > 0 {
			r.AddNumber("zeta"+mark, "first root", zeta, "first root of "+how.equation)
			r.AddNumber("C"+mark, "first coefficient", c, how.coefficient)
		}
	}
	for _, text := range p.Notes {
		r.Note(text)
	}
	r.Source("A. B. Newman, Industrial and Engineering Chemistry 28 (1936) 545–548, for the product of solutions; L. S. Langston, International Journal of Heat and Mass Transfer 25 (1982) 149–150, for its heat (both from memory)")
	r.Source("H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford University Press 1959: sections 2.7, 3.11, 5.6 and 7.7 (from memory)")
	for _, text := range p.Sources {
		r.Source(text)
	}
	return r
}

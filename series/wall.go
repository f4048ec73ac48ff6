package series

import (
	"math"

	wallmodes "example.com/coolward/internal/wall"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A wall is the solution for a body of one coordinate whose faces may differ, whose start may vary with the depth,
// or in which heat is set free: steady state and modes about it.
type wall struct {
	solution  *wallmodes.Solution
	length    float64 // L, the whole way of the coordinate, m
	scale     float64 // L²/α, s
	gradient  float64 // k/L, W/(m²·K)
	content   float64 // ρ c L, J/(m²·K)
	reference float64 // K, over which the solution counts
	flipped   bool    // Surface is the inner face
	outer     face
	inner     face
	horizon   float64       // s, of the log of the source; +Inf without
	start     shape.Profile // nil for a uniform start
}

// A face of a wall.
type face struct {
	condition boundary.Condition
	area      float64 // m²
	biot      float64 // h L/k, +Inf for a prescribed temperature, 0 where the flux is given
	excess    float64 // of the surroundings over the reference, K
	flux      float64 // q L/k, K
}

// prescribed returns the temperature of the face, and whether it is prescribed.
func (f *face) prescribed() (units.Temperature, bool) { return f.condition.SurfaceTemperature() }

// needsWall reports whether the problem asks for more than one condition all round, a uniform start and no source.
func (p *Problem) needsWall() bool {
	family := p.Body.Family()
	return family == shape.HollowSpherical || family == shape.HollowCylindrical || p.opposed() ||
		p.Profile != nil || p.Source.SI() != 0 || len(p.SourceLog) > 0
}

// checkWall refuses what the modes of a wall do not know.
func (p *Problem) checkWall() error {
	switch family := p.Body.Family(); {
	case family == shape.Compact:
		return &units.ArgumentError{Field: "body with an opposite condition, an initial profile or a source", Value: p.Body.String(), Accepted: "a body of one coordinate: plate, tube or hollow sphere, long cylinder or sphere"}
	case p.opposed() && (family == shape.Cylindrical || family == shape.Spherical):
		return &units.ArgumentError{Field: "condition of the opposite face", Value: p.Opposite.String(), Accepted: "none: a solid body has no opposite face"}
	case p.Profile != nil && p.Initial != (units.Temperature{}):
		return &units.ArgumentError{Field: "initial temperature", Value: p.Initial, Accepted: "none beside an initial profile"}
	}
	return units.CheckFinite("source", p.Source)
}

// opposed reports whether a condition is stated for the opposite face, be it a good one or not.
func (p *Problem) opposed() bool { return !p.Opposite.IsZero() }

// solveWall prepares the solution of a checked problem.
func (p *Problem) solveWall() (*wall, error) {
	w, body, err := p.newWall()
	if err != nil {
		return nil, err
	}
	k := p.Conductivity.SI()
	setup := wallmodes.Problem{Body: body, Ha: w.inner.biot, Hb: w.outer.biot}
	setup.Drive = wallmodes.Drive{
		Ua: w.inner.excess, Ub: w.outer.excess, Qa: w.inner.flux, Qb: w.outer.flux,
		G: p.Source.SI() * w.length / k * w.length,
	}
	if bad := setup.Drive.G; math.IsInf(bad, 0) || math.IsNaN(bad) {
		return nil, outOfRange("source g L²/k in K", bad)
	}
	if setup.Source, err = p.sourceCourse(w); err != nil {
		return nil, err
	}
	profile := newProfile(p, w)
	if profile != nil {
		setup.Start = profile.excess
	}
	w.solution = wallmodes.Solve(setup)
	if profile != nil && profile.err != nil {
		return nil, profile.err
	}
	for _, size := range []float64{w.solution.Steady.Size(), w.solution.Part(0, wallmodes.Probe{Y: 0.5}), w.solution.Steady.Rise, w.solution.Ask(wallmodes.Probe{Y: 0.5}, 0.1)} {
		if math.IsInf(size, 0) || math.IsNaN(size) {
			return nil, outOfRange("temperature that the body tends to in K", size)
		}
	}
	if w.solution.Slow() && len(p.SourceLog) > 0 {
		return nil, &units.ArgumentError{Field: "Biot number of both faces beside a log of the source", Value: math.Max(w.inner.biot, w.outer.biot), Accepted: "0, or above about 1e-7"}
	}
	return w, nil
}

// newWall measures the wall and states its faces.
func (p *Problem) newWall() (*wall, wallmodes.Body, error) {
	length := p.Body.Thickness().SI()
	k, capacity := p.Conductivity.SI(), p.Density.SI()*p.SpecificHeat.SI()
	w := &wall{
		length:    length,
		scale:     length / k * capacity * length,
		gradient:  k / length,
		content:   capacity * length,
		reference: p.Initial.SI(),
		flipped:   p.Body.Exposed()&^shape.Ends == shape.Inside,
		horizon:   math.Inf(1),
		start:     p.Profile,
	}
	for _, d := range []struct {
		name string
		x    float64
	}{{"time scale L²/alpha in s", w.scale}, {"k/L in W/(m²·K)", w.gradient}, {"heat content rho c L in J/(m²·K)", w.content}} {
		if !(d.x > 0) || math.IsInf(d.x, 0) {
			return nil, wallmodes.Body{}, outOfRange(d.name, d.x)
		}
	}
	body, err := bodyOf(p.Body)
	if err != nil {
		return nil, body, err
	}
	if p.Profile != nil {
		middle, err := startAt(p.Profile, units.Metre.Of(length/2))
		if err != nil {
			return nil, body, err
		}
		w.reference = middle.SI()
	}
	opposite := p.Opposite
	if !p.opposed() {
		opposite = boundary.Flux(units.HeatFlux{})
		if exposed := p.Body.Exposed(); exposed&(shape.Front|shape.Back) == shape.Front|shape.Back || exposed&(shape.Outside|shape.Inside) == shape.Outside|shape.Inside ||
			!body.Solid && exposed == shape.Ends {
			opposite = p.Surface
		}
	}
	if w.outer, err = p.newFace("surface condition", p.Surface, w); err != nil {
		return nil, body, err
	}
	if body.Solid {
		opposite = boundary.Flux(units.HeatFlux{})
	}
	if w.inner, err = p.newFace("condition of the opposite face", opposite, w); err != nil {
		return nil, body, err
	}
	if w.flipped {
		w.inner, w.outer = w.outer, w.inner
	}
	w.outer.area = p.Body.Volume().SI() / length / body.Volume(1)
	w.inner.area = w.outer.area * body.Inside()
	return w, body, nil
}

// The radius of the inner face over the wall that the modes are good for.
const (
	leastInner = 1e-7
	mostInner  = 1e7
)

// bodyOf returns the body of the modes.
func bodyOf(b shape.Body) (wallmodes.Body, error) {
	m := 1
	switch b.Family() {
	case shape.Planar:
		return wallmodes.Plate(), nil
	case shape.Cylindrical:
		return wallmodes.Solid(1), nil
	case shape.Spherical:
		return wallmodes.Solid(2), nil
	case shape.HollowSpherical:
		m = 2
	}
	inner := b.InnerDiameter().SI() / 2 / b.Thickness().SI()
	if !(inner >= leastInner && inner <= mostInner) {
		return wallmodes.Body{}, &units.ArgumentError{Field: "inner radius over the thickness of the wall", Value: inner, Accepted: "1e-7 to 1e7"}
	}
	return wallmodes.Hollow(m, inner), nil
}

// newFace states a face.
func (p *Problem) newFace(name string, c boundary.Condition, w *wall) (face, error) {
	f := face{condition: c}
	if err := c.Check(); err != nil {
		return f, err
	}
	h, ambient, convective := c.Constants()
	surface, prescribed := c.SurfaceTemperature()
	q, flux := c.ConstantFlux()
	switch {
	case prescribed:
		f.biot, f.excess = math.Inf(1), surface.SI()-w.reference
	case convective:
		f.biot = h.SI() / w.gradient
		if !(f.biot < 1e300) || f.biot < 1e-290 && h.SI() != 0 {
			return f, outOfRange("Biot number h L/k", f.biot)
		}
		if f.biot > 0 {
			f.excess = ambient.SI() - w.reference
		}
	case flux:
		f.flux = q.SI() / w.gradient
		if math.IsInf(f.flux, 0) || (f.flux == 0) != (q.SI() == 0) {
			return f, outOfRange("q L/k in K", f.flux)
		}
	default:
		return f, &units.ArgumentError{Field: name, Value: c.String(), Accepted: "boundary.Constant(h, ambient), boundary.Temperature(T) or boundary.Flux(q); a course is followed in a solid body under no other condition"}
	}
	return f, nil
}

// y returns where a place is: the fraction of the way from the inner face to the outer one.
func (w *wall) y(place shape.Place, body shape.Body) (float64, error) {
	depth, err := place.Depth(body)
	if err != nil {
		return 0, err
	}
	return w.across(depth.SI()), nil
}

// across returns the same for a depth in m.
func (w *wall) across(depth float64) float64 {
	if w.flipped {
		return math.Min(1, depth/w.length)
	}
	return math.Max(0, 1-depth/w.length)
}

// probe returns what to ask the modes for.
func (w *wall) probe(place shape.Place, body shape.Body) (wallmodes.Probe, error) {
	if place.IsMean() {
		return wallmodes.Probe{Quantity: wallmodes.Mean}, nil
	}
	y, err := w.y(place, body)
	return wallmodes.Probe{Y: y}, err
}

// held returns the temperature of a place that is prescribed.
func (w *wall) held(p wallmodes.Probe) (units.Temperature, bool) {
	switch {
	case p.Quantity != wallmodes.Value:
	case p.Y == 1:
		return w.outer.prescribed()
	case p.Y == 0:
		return w.inner.prescribed()
	}
	return units.Temperature{}, false
}

// acceptable is the share of the temperature differences up to which an error of the modes is.
const acceptable = 1e-4

// resolves returns a [*units.ConvergenceError] where the modes do not.
func (w *wall) resolves(fo float64) error {
	if bound, span := w.solution.Bound(fo), w.solution.Span(fo); bound > acceptable*span {
		return &units.ConvergenceError{
			Method: "series of modes", Time: units.Second.Of(fo * w.scale),
			Reason: "with the modes that are kept the error is up to " + units.KelvinDifference.Of(bound).String() + "; ask for a later time, or use a numerical model",
		}
	}
	return nil
}

// fourier returns the Fourier number of a time with the whole way L, and refuses a time that cannot be.
func (w *wall) fourier(t units.Duration) (float64, error) {
	if err := units.CheckNotNegative("time", t); err != nil {
		return 0, err
	}
	if t.SI() > w.horizon {
		return 0, &units.ArgumentError{Field: "time", Value: t, Accepted: "0 s to " + units.Second.Of(w.horizon).String() + ", where the log of the source ends"}
	}
	fo := t.SI() / w.scale
	if fo > math.MaxFloat64 {
		fo = math.MaxFloat64
	}
	return fo, nil
}

// at returns the temperature of a place.
func (w *wall) at(place shape.Place, body shape.Body, t units.Duration) (units.Temperature, error) {
	fo, err := w.fourier(t)
	if err != nil {
		return units.Temperature{}, err
	}
	probe, err := w.probe(place, body)
	if err != nil {
		return units.Temperature{}, err
	}
	if T, ok := w.held(probe); ok {
		return T, nil
	}
	if fo == 0 && w.start != nil && !place.IsMean() {
		depth, _ := place.Depth(body)
		return startAt(w.start, depth)
	}
	if err := w.resolves(fo); err != nil {
		return units.Temperature{}, err
	}
	T := units.Kelvin.Of(w.reference + w.solution.Ask(probe, fo))
	return T, units.CheckTemperature("temperature that fluxes and sources lead to", T)
}

// through returns a quantity of a face, Surface or Opposite, and the face.
func (w *wall) through(place shape.Place, body shape.Body, t units.Duration, atOuter, atInner wallmodes.Quantity) (float64, *face, error) {
	fo, err := w.fourier(t)
	if err != nil {
		return 0, nil, err
	}
	if place != shape.Surface() && place != shape.Opposite() {
		return 0, nil, &units.ArgumentError{Field: "face", Value: place.String(), Accepted: "shape.Surface or shape.Opposite"}
	}
	y, err := w.y(place, body)
	if err != nil {
		return 0, nil, err
	}
	if err := w.resolves(fo); err != nil {
		return 0, nil, err
	}
	if y == 1 {
		return w.solution.Ask(wallmodes.Probe{Quantity: atOuter}, fo), &w.outer, nil
	}
	return w.solution.Ask(wallmodes.Probe{Quantity: atInner}, fo), &w.inner, nil
}

// flux returns the heat flux out of a face.
func (w *wall) flux(place shape.Place, body shape.Body, t units.Duration) (units.HeatFlux, error) {
	q, f, err := w.through(place, body, t, wallmodes.OuterFlux, wallmodes.InnerFlux)
	if err != nil {
		return units.HeatFlux{}, err
	}
	if _, ok := f.prescribed(); ok && t.SI() == 0 {
		return units.HeatFlux{}, &units.ArgumentError{Field: "time", Value: t, Accepted: "above 0 s: the flux through a face that is put to another temperature is infinite at first"}
	}
	flux := units.WattPerSquareMetre.Of(w.gradient * q)
	return flux, units.CheckFinite("heat flux", flux)
}

// heat returns the heat that has left through a face.
func (w *wall) heat(place shape.Place, body shape.Body, t units.Duration) (units.Energy, error) {
	q, f, err := w.through(place, body, t, wallmodes.OuterHeat, wallmodes.InnerHeat)
	if err != nil {
		return units.Energy{}, err
	}
	heat := units.Joule.Of(w.content * f.area * q)
	return heat, units.CheckFinite("heat that has left", heat)
}

// released returns the heat that has left through both faces.
func (w *wall) released(t units.Duration) (units.Energy, error) {
	fo, err := w.fourier(t)
	if err != nil {
		return units.Energy{}, err
	}
	if err := w.resolves(fo); err != nil {
		return units.Energy{}, err
	}
	total := w.outer.area * w.solution.Ask(wallmodes.Probe{Quantity: wallmodes.OuterHeat}, fo)
	if w.inner.area > 0 {
		total += w.inner.area * w.solution.Ask(wallmodes.Probe{Quantity: wallmodes.InnerHeat}, fo)
	}
	heat := units.Joule.Of(w.content * total)
	return heat, units.CheckFinite("heat that has left", heat)
}

// truncation bounds what is left out of a temperature.
func (w *wall) truncation(t units.Duration) (units.TemperatureDifference, error) {
	fo, err := w.fourier(t)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	bound := units.KelvinDifference.Of(w.solution.LeftOut(fo))
	return bound, units.CheckFinite("bound of the error", bound)
}

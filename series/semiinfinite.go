package series

import (
	"context"
	"math"
	"math/cmplx"
	"slices"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
)

// A SemiInfinite is a body of one start temperature behind a plane face, so thick that its other side does not
// matter: ground, a thick wall, or any body for a short time. At time 0 its face is exposed. Every field but Sources
// and Notes must be set.
type SemiInfinite struct {
	Conductivity units.Conductivity // above 0
	Density      units.Density      // above 0
	SpecificHeat units.SpecificHeat // above 0
	Initial      units.Temperature  // of the whole body at time 0
	Surface      boundary.Condition // of boundary.Constant, Temperature or Flux
	Sources      []string           // where the data come from; the derivation repeats them
	Notes        []string           // remarks that the derivation repeats
}

// A SemiInfiniteSolution is the exact solution of a [SemiInfinite] problem. It does not change and may be used
// from many goroutines. Make one with [SemiInfinite.Solve]; the zero one is refused by every method.
type SemiInfiniteSolution struct {
	problem     SemiInfinite
	kind        surfaceKind
	diffusivity float64 // m²/s
	conduct     float64 // k, W/(m·K)
	coefficient float64 // h, +Inf for a prescribed temperature
	ambient     float64 // or the temperature of the surface, K
	excess      float64 // T0 − T∞, K
	flux        float64 // W/m², outwards
}

type surfaceKind uint8

const (
	unsolved surfaceKind = iota
	towardsAmbient
	givenFlux
)

// Solve prepares the solution. It returns an [*units.ArgumentError] for a field that cannot be used or whose
// diffusivity no float64 holds, and the error of ctx if that is done.
func (p SemiInfinite) Solve(ctx context.Context) (*SemiInfiniteSolution, error) {
	if err := checkSolid(ctx, p.Conductivity, p.Density, p.SpecificHeat); err != nil {
		return nil, err
	}
	if err := units.CheckTemperature("initial temperature", p.Initial); err != nil {
		return nil, err
	}
	if err := p.Surface.Check(); err != nil {
		return nil, err
	}
	p.Sources, p.Notes = slices.Clone(p.Sources), slices.Clone(p.Notes)
	s := &SemiInfiniteSolution{
		problem:     p,
		kind:        towardsAmbient,
		diffusivity: p.Conductivity.SI() / (p.Density.SI() * p.SpecificHeat.SI()),
		conduct:     p.Conductivity.SI(),
	}
	if !(s.diffusivity > 0) || math.IsInf(s.diffusivity, 0) {
		return nil, outOfRange("diffusivity k/(rho c) in m²/s", s.diffusivity)
	}
	h, ambient, convective := p.Surface.Constants()
	surface, prescribed := p.Surface.SurfaceTemperature()
	q, flux := p.Surface.ConstantFlux()
	switch {
	case convective:
		s.coefficient, s.ambient = h.SI(), ambient.SI()
	case prescribed:
		s.coefficient, s.ambient = math.Inf(1), surface.SI()
	case flux:
		s.kind, s.flux = givenFlux, q.SI()
	default:
		return nil, &units.ArgumentError{Field: "surface condition", Value: p.Surface.String(), Accepted: "boundary.Constant(h, ambient), boundary.Temperature(T) or boundary.Flux(q)"}
	}
	if s.kind == towardsAmbient {
		s.excess = p.Initial.SI() - s.ambient
	}
	return s, nil
}

// check refuses the zero solution, and a depth and a time that cannot be.
func (s *SemiInfiniteSolution) check(depth units.Length, t units.Duration) error {
	if s == nil || s.kind == unsolved {
		return &units.ArgumentError{Field: "solution", Accepted: "a solution made by SemiInfinite.Solve"}
	}
	if err := units.CheckNotNegative("depth", depth); err != nil {
		return err
	}
	return units.CheckNotNegative("time", t)
}

// groups returns √(α t), a = x/(2√(α t)) and b = h√(α t)/k.
func (s *SemiInfiniteSolution) groups(x, t float64) (spread, a, b float64) {
	spread = math.Sqrt(s.diffusivity) * math.Sqrt(t)
	a = x / 2 / spread
	if x == 0 {
		a = 0
	} else if spread == 0 {
		a = math.Inf(1)
	}
	switch {
	case math.IsInf(s.coefficient, 1):
		b = s.coefficient
	case s.coefficient > 0:
		b = math.Min(s.coefficient/s.conduct*spread, math.MaxFloat64)
	}
	return spread, a, b
}

// fall returns by how much the place has fallen below the start, in K: negative where it has risen.
func (s *SemiInfiniteSolution) fall(x, t float64) float64 {
	spread, a, b := s.groups(x, t)
	if s.kind == givenFlux {
		if s.flux == 0 {
			return 0
		}
		return 2 * s.flux / s.conduct * spread * eigen.HalfFlux(a)
	}
	return s.excess * eigen.HalfLoss(a, b)
}

// At returns the temperature at a depth of 0 or more at time t ≥ 0. It returns an [*units.ArgumentError] for
// another depth or time, and where a constant flux would lead to 0 K or below.
func (s *SemiInfiniteSolution) At(depth units.Length, t units.Duration) (units.Temperature, error) {
	if err := s.check(depth, t); err != nil {
		return units.Temperature{}, err
	}
	if s.kind == towardsAmbient && depth.SI() == 0 {
		if _, _, b := s.groups(0, t.SI()); b > 1 { // keeps the digits of a small rest
			return units.Kelvin.Of(s.ambient + s.excess*eigen.HalfSurface(b)), nil
		}
	}
	T := units.Kelvin.Of(s.problem.Initial.SI() - s.fall(depth.SI(), t.SI()))
	if err := units.CheckTemperature("temperature that the flux leads to", T); err != nil {
		return units.Temperature{}, err
	}
	return T, nil
}

// Flux returns the heat flux that leaves through the face at time t, positive outwards. At time 0 a prescribed
// temperature makes it infinite, which is an [*units.ArgumentError], as are a time that cannot be and a flux
// that no float64 holds.
func (s *SemiInfiniteSolution) Flux(t units.Duration) (units.HeatFlux, error) {
	if err := s.check(units.Length{}, t); err != nil {
		return units.HeatFlux{}, err
	}
	q := s.flux
	if s.kind == towardsAmbient {
		spread, _, b := s.groups(0, t.SI())
		switch {
		case s.excess == 0:
			q = 0
		case math.IsInf(b, 1):
			q = s.conduct * s.excess / math.Sqrt(math.Pi) / spread
		default:
			q = s.coefficient * s.excess * eigen.HalfSurface(b)
		}
	}
	flux := units.WattPerSquareMetre.Of(q)
	if !flux.IsFinite() {
		return units.HeatFlux{}, &units.ArgumentError{Field: "time", Value: t, Accepted: "one with a finite flux"}
	}
	return flux, nil
}

// HeatReleased returns the heat that has left by time t through the given area of the face; it is negative for
// a body that is heated. It returns an [*units.ArgumentError] for an area or a time that cannot be, and for a
// heat that no float64 holds.
func (s *SemiInfiniteSolution) HeatReleased(face units.Area, t units.Duration) (units.Energy, error) {
	if err := s.check(units.Length{}, t); err != nil {
		return units.Energy{}, err
	}
	if err := units.CheckNotNegative("area of the face", face); err != nil {
		return units.Energy{}, err
	}
	heat := s.flux * t.SI()
	if s.kind == towardsAmbient {
		spread, _, b := s.groups(0, t.SI())
		heat = s.conduct / s.diffusivity * spread * s.excess * eigen.HalfHeat(b)
	}
	q := units.Joule.Of(heat * face.SI())
	return q, units.CheckFinite("heat that has left", q)
}

// limit returns what every depth tends to, and whether there is such a temperature.
func (s *SemiInfiniteSolution) limit() (units.Temperature, bool) {
	switch {
	case s.kind == givenFlux && s.flux == 0, s.coefficient == 0 && s.kind == towardsAmbient:
		return s.problem.Initial, true
	case s.kind == givenFlux:
		return units.Temperature{}, false
	}
	return units.Kelvin.Of(s.ambient), true
}

// TimeTo returns when a depth reaches the target: 0 if it is met at the start or lies on the far side of the
// start. It returns a [*units.NeverError] if the depth does not come to the target however long one waits, a
// [*units.ConvergenceError] if no float64 holds the time, and an [*units.ArgumentError] for a depth or a target
// that cannot be.
func (s *SemiInfiniteSolution) TimeTo(depth units.Length, target units.Temperature) (units.Duration, error) {
	if err := s.check(depth, units.Duration{}); err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	wanted := s.problem.Initial.SI() - target.SI() // fall that is asked for
	place := "place " + depth.String() + " below the surface"
	limit, limited := s.limit()
	switch direction := s.flux + s.excess; {
	case wanted == 0:
		return units.Duration{}, nil
	case limited && limit == s.problem.Initial:
		return units.Duration{}, &units.NeverError{Place: place, Target: target, Limit: limit}
	case (wanted > 0) != (direction > 0):
		return units.Duration{}, nil
	case limited && math.Abs(wanted) >= math.Abs(s.excess):
		return units.Duration{}, &units.NeverError{Place: place, Target: target, Limit: limit}
	}
	t, ok := s.timeOf(depth.SI(), math.Abs(wanted))
	if !ok {
		return units.Duration{}, &units.ConvergenceError{
			Method: "time to a temperature", Place: place,
			Reason: "the target " + target.String() + " is reached at a time beyond the range of float64",
		}
	}
	return units.Second.Of(t), nil
}

// timeOf returns when a depth has changed by wanted, above 0, towards the limit.
func (s *SemiInfiniteSolution) timeOf(x, wanted float64) (float64, bool) {
	if s.kind == towardsAmbient && math.IsInf(s.coefficient, 1) {
		if x == 0 {
			return 0, true
		}
		// erf of the smaller of both parts keeps its digits
		part, a := wanted/math.Abs(s.excess), 0.0
		if part < 0.5 {
			a = math.Erfcinv(part)
		} else {
			a = math.Erfinv(1 - part)
		}
		root := x / 2 / a
		t := root / s.diffusivity * root
		return t, t < math.Inf(1) && t > 0
	}
	// from the time that heat takes to come in and the coefficient to be felt
	u := 0.0
	if x > 0 {
		u = 2*math.Log(x) - math.Log(s.diffusivity)
	}
	if s.kind == towardsAmbient {
		u = math.Max(u, 2*math.Log(s.conduct/s.coefficient)-math.Log(s.diffusivity))
	}
	return rising(func(t float64) float64 { return math.Abs(s.fall(x, t)) / wanted }, u)
}

// Depth returns the depth at which the target is reached at time t: heat has come so far. It returns an
// [*units.ArgumentError] if the surface has not reached the target by then, for a target that is the start or
// on its far side, and for a time that cannot be.
func (s *SemiInfiniteSolution) Depth(target units.Temperature, t units.Duration) (units.Length, error) {
	if err := s.check(units.Length{}, t); err != nil {
		return units.Length{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Length{}, err
	}
	surface := s.problem.Initial.SI() - s.fall(0, t.SI())
	wanted, all := s.problem.Initial.SI()-target.SI(), s.fall(0, t.SI())
	part := wanted / all
	if !(part > 0 && part <= 1) {
		return units.Length{}, &units.ArgumentError{Field: "target", Value: target, Accepted: "between the start of " + s.problem.Initial.String() + " and the surface, at " + units.Kelvin.Of(surface).String() + " then"}
	}
	if part == 1 {
		return units.Length{}, nil
	}
	spread, _, _ := s.groups(0, t.SI())
	a, ok := root.Find(func(a float64) float64 {
		return math.Log(math.Abs(s.fall(2*a*spread, t.SI())/all)) - math.Log(part)
	}, 0, s.reach(spread, t.SI(), all, part), 0)
	depth := units.Metre.Of(2 * a * spread)
	if !ok || !depth.IsFinite() {
		return units.Length{}, &units.ConvergenceError{Method: "depth of a temperature", Time: t, Reason: "the depth is beyond the range of float64"}
	}
	return depth, nil
}

// reach returns a where less than part of the fall at the surface has come.
func (s *SemiInfiniteSolution) reach(spread, t, all, part float64) float64 {
	a := 1.0
	for a < 26 && math.Abs(s.fall(2*a*spread, t)/all) > part {
		a *= 1.5
	}
	return a
}

// Oscillation returns how a depth follows an ambient, or a prescribed surface temperature, that oscillates with
// the given period, once the start is forgotten. With q = √(iω/α) the amplitude is e^{−q x}/(1 + k q/h) of
// that. It returns an [*units.ArgumentError] for a depth or a period that cannot be, and for a constant flux,
// which does not oscillate.
func (s *SemiInfiniteSolution) Oscillation(depth units.Length, period units.Duration) (Oscillation, error) {
	if err := s.check(depth, units.Duration{}); err != nil {
		return Oscillation{}, err
	}
	if err := units.CheckPositive("period", period); err != nil {
		return Oscillation{}, err
	}
	if s.kind == givenFlux {
		return Oscillation{}, &units.ArgumentError{Field: "surface condition", Value: s.problem.Surface.String(), Accepted: "boundary.Constant(h, ambient) or boundary.Temperature(T)"}
	}
	if s.coefficient == 0 {
		return Oscillation{Period: period}, nil
	}
	wave := math.Sqrt(math.Pi / s.diffusivity / period.SI()) // √(ω/2α)
	film := s.conduct / s.coefficient * wave
	damping, late := wave*depth.SI(), wave*depth.SI()
	if math.IsInf(damping, 0) || math.IsNaN(damping) || math.IsInf(film, 0) {
		return Oscillation{}, outOfRange("depth over the penetration depth of the oscillation", damping)
	}
	surface := 1 / complex(1+film, film)
	late -= cmplx.Phase(surface)
	return Oscillation{Period: period, Ratio: cmplx.Abs(surface) * math.Exp(-damping), Lag: period.Scale(late / (2 * math.Pi))}, nil
}

// PenetrationDepth returns √(α period/π), the depth over which an oscillation falls by the factor e. It returns an
// [*units.ArgumentError] for a period that is not above zero.
func (s *SemiInfiniteSolution) PenetrationDepth(period units.Duration) (units.Length, error) {
	if err := s.check(units.Length{}, units.Duration{}); err != nil {
		return units.Length{}, err
	}
	if err := units.CheckPositive("period", period); err != nil {
		return units.Length{}, err
	}
	return units.Metre.Of(math.Sqrt(s.diffusivity/math.Pi) * math.Sqrt(period.SI())), nil
}

// Derivation returns every number that the solution rests on, with the formulas. That of the zero solution is empty.
func (s *SemiInfiniteSolution) Derivation() derivation.Record {
	var r derivation.Record
	if s == nil || s.kind == unsolved {
		return r
	}
	p := s.problem
	r.Title = "Exact conduction in a semi-infinite body of constant properties"
	r.Add("k", "thermal conductivity", p.Conductivity, "given")
	r.Add("rho", "density", p.Density, "given")
	r.Add("c", "specific heat", p.SpecificHeat, "given")
	r.Add("alpha", "thermal diffusivity", units.SquareMetrePerSecond.Of(s.diffusivity), "k / (rho c)")
	r.Add("T0", "start temperature", p.Initial, "given")
	switch {
	case s.kind == givenFlux:
		r.Add("q", "heat flux outwards", units.WattPerSquareMetre.Of(s.flux), "given")
		r.Note("T = T0 − (2 q √(alpha t) / k) ierfc(a), a = x / (2 √(alpha t)), ierfc(a) = exp(−a²)/√π − a erfc(a).")
	case math.IsInf(s.coefficient, 1):
		r.Add("Ts", "surface temperature", units.Kelvin.Of(s.ambient), "given")
		r.Note("T = Ts + (T0 − Ts) erf(a), a = x / (2 √(alpha t)); flux k (T0 − Ts) / √(π alpha t).")
	default:
		r.Add("h", "heat transfer coefficient", units.WattPerSquareMetreKelvin.Of(s.coefficient), "given")
		r.Add("Tinf", "ambient temperature", units.Kelvin.Of(s.ambient), "given")
		r.Note("T = T0 − (T0 − Tinf) [erfc(a) − exp(h x/k + b²) erfc(a + b)], a = x / (2 √(alpha t)), b = h √(alpha t) / k; flux h (T0 − Tinf) exp(b²) erfc(b).")
	}
	r.Note("Uniform start, constant properties, and a body so thick that its other side has not been reached are assumed.")
	for _, text := range p.Notes {
		r.Note(text)
	}
	r.Source("H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford University Press 1959: sections 2.4, 2.6, 2.7 and 2.9 (from memory)")
	for _, text := range p.Sources {
		r.Source(text)
	}
	return r
}

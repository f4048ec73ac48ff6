package lumped

import (
	"context"
	"math"
	"slices"

	"example.com/coolward/internal/ode"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A Problem is a body at one temperature that exchanges heat over its whole surface.
type Problem struct {
	Body     shape.Body
	Material Material
	Initial  units.Temperature // above 0 K
	Surface  boundary.Condition

	// Horizon is how long to solve for. It is needed unless the closed form applies (a Constant
	// surface and a specific heat that does not vary between Initial and the ambient), which holds
	// for all time and ignores it.
	Horizon units.Duration

	// Until lets the integration end, before Horizon, with the step in which the body passes it. Zero
	// means none. The closed form ignores it.
	Until units.Temperature

	// Tolerance is the temperature error that a step of the integration may make; zero means 1 mK.
	// The error of the whole is usually smaller: see [Solution.IntegrationError].
	Tolerance units.TemperatureDifference

	Sources, Notes []string // repeated unread in the derivation
}

// defaultTolerance is 1 mK.
const defaultTolerance = 1e-3

// Solve solves the problem: in closed form where it applies, else by integration, for which it calls
// the exchange function from this goroutine only.
//
// It returns an [*units.ArgumentError] for a field that cannot be used, and the error of the material
// if Initial or Until is outside its range. If the integration has to end early (the exchange
// function or the material returns an error, ctx ends, too many steps) the error is an
// [*units.ConvergenceError] with that cause, and the solution holds what was computed until then; it
// is nil if that is nothing.
func (p Problem) Solve(ctx context.Context) (*Solution, error) {
	s, err := p.prepare(ctx)
	if err != nil {
		return nil, err
	}
	if err := ctx.Err(); err != nil {
		return nil, &units.ConvergenceError{Method: "lumped analysis", Reason: "the context has ended", Cause: err}
	}
	if s.solveClosed() {
		if err := s.groups(); err != nil {
			return nil, err
		}
		return s, nil
	}
	return s.integrate(ctx)
}

// prepare checks the problem and fills what both ways of solving need.
func (p Problem) prepare(ctx context.Context) (*Solution, error) {
	if ctx == nil {
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if err := p.Body.Check(); err != nil {
		return nil, err
	}
	if p.Material == nil {
		return nil, &units.ArgumentError{Field: "material", Accepted: "a material, such as one of package props"}
	}
	if err := units.CheckPositive("material: density", p.Material.Density()); err != nil {
		return nil, err
	}
	if err := units.CheckTemperature("initial temperature", p.Initial); err != nil {
		return nil, err
	}
	if err := p.Surface.CheckExchange(); err != nil {
		return nil, err
	}
	if err := units.CheckNotNegative("horizon", p.Horizon); err != nil {
		return nil, err
	}
	if p.Until != (units.Temperature{}) {
		if err := units.CheckTemperature("until", p.Until); err != nil {
			return nil, err
		}
	}
	if err := units.CheckNotNegative("tolerance", p.Tolerance); err != nil {
		return nil, err
	}
	if p.Tolerance.SI() == 0 {
		p.Tolerance = units.KelvinDifference.Of(defaultTolerance)
	}
	c, err := p.Material.SpecificHeat(p.Initial)
	if err != nil {
		return nil, err
	}
	if err := units.CheckPositive("material: specific heat at the initial temperature", c); err != nil {
		return nil, err
	}
	p.Sources, p.Notes = slices.Clone(p.Sources), slices.Clone(p.Notes)
	s := &Solution{problem: p, solved: true, start: p.Initial.SI(), specificHeat: c.SI()}
	s.length = p.Body.VolumeToArea().SI()
	s.capacity = p.Material.Density().SI() * p.Body.Volume().SI() * c.SI()
	if err := units.CheckPositive("heat capacity of the body", units.JoulePerKelvin.Of(s.capacity)); err != nil {
		return nil, err
	}
	return s, nil
}

// solveClosed prepares the closed form T∞ + (T0−T∞) exp(−t/τ), τ = ρ c (V/A)/h, and reports whether
// it applies. Without exchange (h = 0) the body stays at T0.
func (s *Solution) solveClosed() bool {
	h, ambient, ok := s.problem.Surface.Constants()
	if !ok || !constantBetween(s.problem.Material, s.start, ambient.SI()) {
		return false
	}
	s.closed, s.end, s.limitKnown = true, math.MaxFloat64, true
	s.limit = constantLimit(s.start, h.SI(), ambient.SI())
	s.excess = s.start - s.limit
	s.rate = -h.SI() / (s.problem.Material.Density().SI() * s.specificHeat * s.length)
	return true
}

// integrate follows the enthalpy of the body, written as y = T0 + (h(T) − h(T0))/c with a fixed c, so
// that heat is kept exactly and neither a kink nor a latent heat is a jump of the derivative. y is
// the temperature where the specific heat is constant.
func (s *Solution) integrate(ctx context.Context) (*Solution, error) {
	p := &s.problem
	if p.Horizon.SI() == 0 {
		return nil, &units.ArgumentError{Field: "horizon", Accepted: "above 0 s; the closed form needs a Constant surface and a constant specific heat over the range of temperature"}
	}
	if err := s.prepareState(); err != nil {
		return nil, err
	}
	equation := ode.Problem{
		F:         s.derivative,
		Start:     s.start,
		End:       p.Horizon.SI(),
		Tolerance: p.Tolerance.SI(),
	}
	if u := p.Until; u != (units.Temperature{}) && u != p.Initial {
		level, err := s.state(u)
		if err != nil {
			return nil, err
		}
		equation.Stop, equation.Level = true, level
	}
	path, failure := ode.Integrate(ctx, equation)
	if path == nil || failure != nil && path.End() == 0 {
		return nil, s.givenUp(0, failure)
	}
	s.path, s.end = path, path.End()
	last, err := s.temperature(path.Last())
	if err != nil {
		return nil, err
	}
	s.last = last
	s.findLimit()
	if err := s.groups(); err != nil {
		return nil, err
	}
	if failure != nil {
		return s, s.givenUp(s.end, failure)
	}
	return s, nil
}

func (s *Solution) givenUp(t float64, cause error) error {
	reason := "the exchange function or the material cannot go on"
	switch cause {
	case ode.ErrMaxSteps:
		reason = "too many steps; use a shorter horizon, an Until temperature or a larger tolerance"
	case ode.ErrStepSize:
		reason = "the steps become too short; the exchange function jumps or the tolerance is too small"
	case context.Canceled, context.DeadlineExceeded:
		reason = "the context has ended"
	}
	return &units.ConvergenceError{Method: "lumped analysis", Time: units.Second.Of(t), Reason: reason, Cause: cause}
}

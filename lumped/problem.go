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

// A Problem is a body at one temperature that exchanges heat over its exposed surface.
type Problem struct {
	// Body gives volume and exposed surface; shape.Measured takes them as found.
	Body shape.Body

	// Material fills the body. Its mass is the density times the volume, unless Mass states it.
	Material Material
	Mass     units.Mass

	// Parts state several materials at one temperature, in place of Material and Mass: a bottle and what
	// is in it. The body is then what they look like from outside.
	Parts []Part

	Initial units.Temperature // above 0 K
	Surface boundary.Condition

	// Opposite is what happens at the face opposite to the surface: the back of a plate, the inside of a
	// hollow body. Zero means what happens at Surface if that face is exposed, else nothing.
	Opposite boundary.Condition

	// Source is the heat made inside, over the volume of Body; see units.HeatSourceOf for that of a
	// power. It may be negative.
	Source units.HeatSource

	// FirstOrder counts the resistance inside the body, to first order in the Biot number: the state is
	// then the mean temperature, and surface and centre differ from it; see the package comment.
	FirstOrder bool

	// Horizon is how long to solve for. It is needed unless a closed form applies that is straight on its way to a
	// limit, which holds for all time and ignores it; see the package comment.
	Horizon units.Duration

	// Until lets the integration end, before Horizon, with the step in which the body passes it. Zero
	// means none. Closed forms ignore it.
	Until units.Temperature

	// Tolerance is the temperature error that a step of the integration may make; zero means 1 mK.
	// The error of the whole is usually smaller: see [Solution.IntegrationError].
	Tolerance units.TemperatureDifference

	Sources, Notes []string // repeated unread in the derivation
}

// defaultTolerance is 1 mK.
const defaultTolerance = 1e-3

// Solve solves the problem: in closed form where one applies, else by integration, for which it calls
// an exchange function from this goroutine only.
//
// It returns an [*units.ArgumentError] for a field that cannot be used, and the error of the material
// if Initial or Until is outside its range. If the integration has to end early (the exchange
// function or the material returns an error, ctx ends, too many steps) the error is an
// [*units.ConvergenceError] with that cause, and the solution holds what was computed until then; it
// is nil if that is nothing.
func (p Problem) Solve(ctx context.Context) (*Solution, error) { return p.solve(ctx, asGiven) }

func (p Problem) solve(ctx context.Context, v variant) (*Solution, error) {
	s, err := p.prepare(ctx, v)
	if err != nil {
		return nil, err
	}
	if err := ctx.Err(); err != nil {
		return nil, &units.ConvergenceError{Method: "lumped analysis", Reason: "the context has ended", Cause: err}
	}
	closed, err := s.solveClosed()
	if err != nil {
		return nil, err
	}
	if closed {
		if err := s.groups(); err != nil {
			return nil, err
		}
		return s, nil
	}
	return s.integrate(ctx)
}

// prepare checks the problem and fills what all ways of solving need.
func (p Problem) prepare(ctx context.Context, v variant) (*Solution, error) {
	if ctx == nil {
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if err := p.check(); err != nil {
		return nil, err
	}
	if p.Tolerance.SI() == 0 {
		p.Tolerance = units.KelvinDifference.Of(defaultTolerance)
	}
	p.Sources, p.Notes, p.Parts = slices.Clone(p.Sources), slices.Clone(p.Notes), slices.Clone(p.Parts)
	s := &Solution{problem: p, solved: true, start: p.Initial.SI()}
	if err := s.content.fill(&p); err != nil {
		return nil, err
	}
	if err := s.exchange.open(&p, v); err != nil {
		return nil, err
	}
	s.length = p.Body.Volume().SI() / s.exchange.area
	if p.FirstOrder {
		return s, s.countInside()
	}
	return s, nil
}

func (p *Problem) check() error {
	if err := p.Body.Check(); err != nil {
		return err
	}
	if err := units.CheckTemperature("initial temperature", p.Initial); err != nil {
		return err
	}
	if err := p.Surface.CheckExchange(); err != nil {
		return err
	}
	if !p.Opposite.IsZero() {
		if err := p.Opposite.CheckExchange(); err != nil {
			return err
		}
	}
	if err := units.CheckFinite("source", p.Source); err != nil {
		return err
	}
	if err := units.CheckNotNegative("horizon", p.Horizon); err != nil {
		return err
	}
	if p.Until != (units.Temperature{}) {
		if err := units.CheckTemperature("until", p.Until); err != nil {
			return err
		}
	}
	return units.CheckNotNegative("tolerance", p.Tolerance)
}

// integrate follows the heat in the body with adaptive steps.
func (s *Solution) integrate(ctx context.Context) (*Solution, error) {
	p := &s.problem
	if p.Horizon.SI() == 0 {
		return nil, &units.ArgumentError{Field: "horizon", Accepted: "above 0 s; only closed forms that go straight to a limit hold for all time"}
	}
	if err := s.content.prepare(); err != nil {
		return nil, err
	}
	equation := ode.Problem{
		F:         s.derivative,
		Start:     s.start,
		End:       p.Horizon.SI(),
		Tolerance: p.Tolerance.SI(),
		Breaks:    s.exchange.breaks(),
	}
	if u := p.Until; u != (units.Temperature{}) && u != p.Initial {
		level, err := s.content.state(u.SI())
		if err != nil {
			return nil, err
		}
		equation.Stop, equation.Level = true, level
	}
	solution, failure := ode.Integrate(ctx, equation)
	if solution == nil || failure != nil && solution.End() == 0 {
		return nil, s.givenUp(0, failure)
	}
	s.path, s.end = solution, solution.End()
	s.integrated = integrated{solution, s.start}
	s.trajectory = &s.integrated
	last, err := s.content.temperature(solution.Last())
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

// derivative returns dy/dt.
func (s *Solution) derivative(t, y float64) (float64, error) {
	kelvin, err := s.content.temperature(y)
	if err != nil {
		return 0, err
	}
	out, err := s.exchange.out(t, kelvin)
	if err != nil {
		return 0, err
	}
	return (s.exchange.source - out) / s.content.capacity, nil
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

func isFinite(x float64) bool { return math.Abs(x) <= math.MaxFloat64 }

package fdm

import (
	"strconv"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
)

// A Scheme is how time is stepped.
type Scheme uint8

// The adaptive method, and the schemes of textbooks for those who must compare with them, with steps of one
// length (S. V. Patankar, Numerical Heat Transfer and Fluid Flow, 1980, section 4.3; J. Crank and P.
// Nicolson, Proc. Camb. Phil. Soc. 43, 1947; from memory).
const (
	Adaptive      Scheme = iota // an L-stable method of order 4 that keeps the tolerance
	Explicit                    // order 1; unstable beyond [StepLimits]
	Implicit                    // order 1; always stable
	CrankNicolson               // order 2; always stable, but may oscillate beyond [StepLimits]
)

// String names the scheme.
func (s Scheme) String() string {
	switch s {
	case Adaptive:
		return "adaptive"
	case Explicit:
		return "explicit"
	case Implicit:
		return "implicit"
	case CrankNicolson:
		return "Crank–Nicolson"
	}
	return "no scheme"
}

func (s Scheme) implicitness() float64 {
	switch s {
	case Implicit:
		return 1
	case CrankNicolson:
		return 0.5
	}
	return 0
}

// mostFixedSteps is how many steps of one length a solution may have.
const mostFixedSteps = 1_000_000

// mostSteps returns the greatest number of steps; 0 stays 0.
func (p Problem) mostSteps(steps int) int {
	if steps == 0 {
		return 0
	}
	return 2*mostFixedSteps + 2
}

func (p Problem) checkScheme() error {
	switch {
	case p.Scheme > CrankNicolson:
		return &units.ArgumentError{Field: "scheme", Value: int(p.Scheme), Accepted: "fdm.Adaptive, Explicit, Implicit or CrankNicolson"}
	case p.Scheme == Adaptive && p.TimeStep != units.Duration{}:
		return &units.ArgumentError{Field: "time step", Value: p.TimeStep, Accepted: "none with the adaptive scheme"}
	case p.Scheme == Adaptive:
		return nil
	}
	if err := units.CheckPositive("time step", p.TimeStep); err != nil {
		return err
	}
	if p.Horizon.SI()/p.TimeStep.SI() > mostFixedSteps {
		return &units.ArgumentError{Field: "time step", Value: p.TimeStep, Accepted: "one that gives up to " + strconv.Itoa(mostFixedSteps) + " steps"}
	}
	return nil
}

// StepLimits are the limits of the textbook schemes for the time step, at the temperatures of the start.
type StepLimits struct {
	// Explicit is the longest step with which the explicit scheme keeps every new temperature a mean of old
	// ones, so that it is stable: Fo ≤ 1/2 inside and Fo (1 + Bi) ≤ 1/2 at a convective face of uniform
	// cells in a plate, and on any grid the least 1/|a| over the diagonal entries a of the equations, by the
	// discs of Gershgorin.
	Explicit units.Duration
	// CrankNicolson is the longest step with which the Crank–Nicolson scheme does so, twice that of the explicit
	// one. It stays stable beyond, but a sudden change then oscillates.
	CrankNicolson units.Duration
}

// StepLimits returns the limits of the textbook schemes for the problem. Its errors are those of
// [Problem.Solve] for a field that cannot be.
func (p Problem) StepLimits() (StepLimits, error) {
	s, err := p.prepare()
	if err != nil {
		return StepLimits{}, err
	}
	system, err := s.system(0)
	if err != nil {
		return StepLimits{}, s.atStart(err)
	}
	return s.stepLimits(system)
}

func (s *Solution) stepLimits(system *fv.System) (StepLimits, error) {
	fastest, err := system.Fastest()
	if err != nil {
		return StepLimits{}, s.atStart(err)
	}
	return StepLimits{units.Second.Of(1 / fastest), units.Second.Of(2 / fastest)}, nil
}

// checkStep refuses an explicit scheme that is not stable, and keeps a warning for one that may oscillate.
func (s *Solution) checkStep(system *fv.System) error {
	p := s.problem
	if p.Scheme != Explicit && p.Scheme != CrankNicolson {
		return nil
	}
	limits, err := s.stepLimits(system)
	if err != nil {
		return err
	}
	const rounding = 1 + 1e-9
	step := p.TimeStep.SI()
	if p.Scheme == Explicit && step > limits.Explicit.SI()*rounding {
		return &units.ArgumentError{
			Field: "time step", Value: p.TimeStep,
			Accepted: "up to " + limits.Explicit.String() + ", the limit of the explicit scheme on this grid, which is Fo (1 + Bi) ≤ 1/2 for uniform cells in a plate",
		}
	}
	if step > limits.CrankNicolson.SI()*rounding {
		s.warnings = append(s.warnings, "the time step is longer than "+limits.CrankNicolson.String()+", so that the Crank–Nicolson scheme may oscillate after a sudden change")
	}
	return nil
}

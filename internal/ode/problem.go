package ode

import (
	"errors"
	"fmt"
	"math"
	"slices"
)

// A Problem is an initial value problem that starts at t = 0.
type Problem struct {
	// F gives dy/dt. An error, or a number that is not finite, makes the step shorter; where no
	// shorter step helps, the integration ends.
	F func(t, y float64) (float64, error)

	Start     float64 // y at t = 0
	End       float64 // where the integration ends, above 0
	Tolerance float64 // absolute local error of a step, above 0
	MaxSteps  int     // steps tried, accepted or not; 0 stands for 100 000

	// Breaks are times, rising, at which F may jump or bend: steps end there. F counts from such a time
	// on, and for what comes before it is asked for a time just below.
	Breaks []float64

	Stop  bool    // end with the step in which y passes Level
	Level float64 // not used unless Stop is set
}

const defaultMaxSteps = 100_000

// Errors that end an integration. Errors of Problem.F and of the context are returned as they are.
var (
	ErrNotFinite = errors.New("the derivative is not finite")
	ErrMaxSteps  = errors.New("more steps than allowed")
	ErrStepSize  = errors.New("the step has become too short to advance")
)

func (p *Problem) check() error {
	switch {
	case p.F == nil:
		return errors.New("ode: no function")
	case !isFinite(p.Start):
		return fmt.Errorf("ode: start %g is not finite", p.Start)
	case !(p.End > 0) || !isFinite(p.End):
		return fmt.Errorf("ode: end %g is not finite and above 0", p.End)
	case !(p.Tolerance > 0) || !isFinite(p.Tolerance):
		return fmt.Errorf("ode: tolerance %g is not finite and above 0", p.Tolerance)
	case p.MaxSteps < 0:
		return fmt.Errorf("ode: at most %d steps", p.MaxSteps)
	case !slices.IsSorted(p.Breaks):
		return errors.New("ode: the breaks do not rise")
	case p.Stop && !isFinite(p.Level):
		return fmt.Errorf("ode: level %g is not finite", p.Level)
	}
	return nil
}

func isFinite(x float64) bool { return math.Abs(x) <= math.MaxFloat64 }

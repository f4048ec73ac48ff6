package lumped

import (
	"context"
	"errors"
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/mat"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/internal/fit"
	"example.com/coolward/units"
)

// A Fit asks for the exponential T = T∞ + (T0 − T∞) exp(−t/τ) that a logged curve follows, with t from the
// first time of the log. The time constant is always found; ambient and initial temperature are found
// unless they are stated. Two readings and an ambient are enough for the exact curve through them.
type Fit struct {
	Log     Log
	Ambient units.Temperature // zero: to be found
	Initial units.Temperature // what is known of the temperature at the first time of the log; zero: to be found

	// Capacity and Area, if set, turn the time constant into a heat transfer coefficient, h = C/(A τ).
	Capacity units.HeatCapacity
	Area     units.Area

	// Noise is the standard uncertainty of a reading, if it is known. Zero: it follows from how far the readings
	// are from the curve. It cannot be stated with a loss other than LeastSquares.
	Noise units.TemperatureDifference

	// Loss says how much readings that lie off count.
	Loss Loss

	Coverage float64 // probability of the intervals, 0.5 to 0.9999; zero means 0.95

	Sources, Notes []string // repeated unread in the derivation
}

// A Loss says how much readings that lie off the curve count.
type Loss int

const (
	// LeastSquares counts all readings alike: the best where the errors are normal.
	LeastSquares Loss = iota
	// Huber takes readings far off less (P. J. Huber, Robust Statistics, Wiley 1981, from memory).
	Huber
	// Tukey leaves out readings that are very far off (A. E. Beaton, J. W. Tukey, Technometrics 16 (1974)
	// 147–185, from memory).
	Tukey
)

// String names the loss.
func (l Loss) String() string {
	switch l {
	case LeastSquares:
		return "least squares"
	case Huber:
		return "Huber"
	case Tukey:
		return "Tukey's biweight"
	}
	return fmt.Sprintf("Loss(%d)", int(l))
}

// leastDeviation is what a reading is off at the least for the intervals, K: rounding.
const leastDeviation = 1e-9

// Solve finds the curve. It returns an [*units.ArgumentError] for what cannot be used: a log that is not in order, too
// few readings, readings that are all the same. It returns a [*units.ConvergenceError] where no
// exponential fits better than a straight line or a sudden step.
//
// A curve is found too where one exponential does not describe the readings: ask [Fitted.OneExponential].
func (f Fit) Solve(ctx context.Context) (*Fitted, error) {
	if ctx == nil {
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if err := f.check(); err != nil {
		return nil, err
	}
	if err := ctx.Err(); err != nil {
		return nil, &units.ConvergenceError{Method: "fit", Reason: "the context has ended", Cause: err}
	}
	f.Log, f.Sources, f.Notes = f.Log.copy(), slices.Clone(f.Sources), slices.Clone(f.Notes)
	if f.Coverage == 0 {
		f.Coverage = 0.95
	}
	s := &Fitted{fit: f, problem: f.problem()}
	s.seconds, s.kelvin, s.place = f.Log.present()
	if free := s.problem.Free(); len(s.seconds) < free {
		return nil, &units.ArgumentError{Field: "log: readings", Value: fmt.Sprintf("%d that are not missing", len(s.seconds)), Accepted: fmt.Sprintf("%d or more for %d constants", free, free)}
	}
	if err := f.checkChange(s.kelvin); err != nil {
		return nil, err
	}
	s.reference = s.kelvin[0]
	s.problem.Start -= s.reference
	s.problem.Ambient -= s.reference
	for i, t := range s.seconds {
		s.problem.T = append(s.problem.T, t)
		s.problem.Y = append(s.problem.Y, s.kelvin[i]-s.reference)
		s.problem.W = append(s.problem.W, 1)
	}
	curve, deviation, err := s.problem.Robust(fit.Loss(f.Loss))
	if err != nil {
		return nil, noExponential(err)
	}
	s.curve = curve
	s.measure(deviation)
	return s, s.checkCurve()
}

func (f Fit) check() error {
	if err := f.Log.Check(); err != nil {
		return err
	}
	for _, known := range []struct {
		name string
		T    units.Temperature
	}{{"ambient temperature", f.Ambient}, {"initial temperature", f.Initial}} {
		if known.T != (units.Temperature{}) {
			if err := units.CheckTemperature(known.name, known.T); err != nil {
				return err
			}
		}
	}
	for _, err := range []error{
		units.CheckNotNegative("heat capacity", f.Capacity),
		units.CheckNotNegative("area", f.Area),
		units.CheckNotNegative("noise", f.Noise),
	} {
		if err != nil {
			return err
		}
	}
	switch {
	case f.Loss < LeastSquares || f.Loss > Tukey:
		return &units.ArgumentError{Field: "loss", Value: f.Loss, Accepted: "LeastSquares, Huber or Tukey"}
	case f.Loss != LeastSquares && f.Noise.SI() > 0:
		return &units.ArgumentError{Field: "noise", Value: f.Noise, Accepted: "none with a loss other than LeastSquares, which finds its own"}
	}
	return checkCoverage(f.Coverage)
}

func checkCoverage(coverage float64) error {
	if coverage == 0 {
		return nil
	}
	return units.CheckNumber("coverage", coverage, 0.5, 0.9999)
}

// checkChange returns an error for readings in which nothing happens.
func (f Fit) checkChange(kelvin []float64) error {
	first := kelvin[0]
	if f.Initial != (units.Temperature{}) {
		first = f.Initial.SI()
	}
	if f.Initial != (units.Temperature{}) && f.Initial == f.Ambient {
		return &units.ArgumentError{Field: "initial temperature", Value: f.Initial, Accepted: "another temperature than the ambient"}
	}
	for _, T := range kelvin {
		if T != first {
			return nil
		}
	}
	return &units.ArgumentError{Field: "log: readings", Value: "all at " + units.Kelvin.Of(first).String(), Accepted: "readings that change"}
}

// problem returns the problem of the kernel, without readings.
func (f Fit) problem() *fit.Exponential {
	p := &fit.Exponential{Start: math.NaN(), Ambient: math.NaN()}
	if f.Ambient != (units.Temperature{}) {
		p.Ambient = f.Ambient.SI()
	}
	if f.Initial != (units.Temperature{}) {
		p.Start = f.Initial.SI()
	}
	return p
}

func noExponential(cause error) error {
	reason := "no exponential fits"
	switch {
	case errors.Is(cause, fit.ErrStraight):
		reason = "no exponential fits better than a straight line; log for longer, or state the ambient"
	case errors.Is(cause, fit.ErrSudden):
		reason = "no exponential fits better than a step at the start; take readings closer together, or check the ambient"
	}
	return &units.ConvergenceError{Method: "fit of one exponential", Reason: reason, Cause: cause}
}

// measure finds what the readings say about how sure the curve is.
func (s *Fitted) measure(robust float64) {
	n, free := len(s.seconds), s.problem.Free()
	freedom := float64(n - free)
	columns := s.problem.Columns(s.curve)
	covariance, ok := fit.Covariance(columns)
	alpha := (1 - s.fit.Coverage) / 2
	switch {
	case s.fit.Noise.SI() > 0:
		s.deviation, s.factor = s.fit.Noise.SI(), distuv.UnitNormal.Quantile(1-alpha)
	case freedom > 0:
		s.deviation, s.factor = math.Sqrt(s.curve.Squares/freedom), distuv.StudentsT{Sigma: 1, Nu: freedom}.Quantile(1-alpha)
		if robust > 0 {
			s.deviation = robust
		}
	default:
		ok = false
	}
	s.freedom = n - free
	s.deviation = max(s.deviation, leastDeviation)
	if s.sure = ok; ok {
		s.covariance = covariance
		s.covariance.ScaleSym(s.deviation*s.deviation, covariance)
	}
	if s.freedom > 0 {
		s.test = s.examine(columns)
	}
}

// A Fitted is the exponential that was fitted to a log. It does not change, and is safe for many goroutines.
// [Fit.Solve] makes one; the zero Fitted answers with an [*units.ArgumentError].
type Fitted struct {
	fit     Fit
	problem *fit.Exponential

	seconds, kelvin []float64 // of the readings that are not missing
	place           []int     // in the log
	reference       float64   // what the temperatures of the problem are counted from, K

	curve      fit.Curve
	sure       bool          // there is a covariance
	covariance *mat.SymDense // of ln τ, initial and ambient, as far as they were found
	deviation  float64       // standard deviation of a reading, K
	factor     float64       // of the intervals, of Student's t or the normal distribution
	freedom    int
	test       ResidualTest
}

// checkCurve returns an error for a curve that no body has.
func (s *Fitted) checkCurve() error {
	for _, T := range []float64{s.curve.Start, s.curve.Ambient} {
		if !isFinite(T) {
			return noExponential(fit.ErrStraight)
		}
	}
	return units.CheckPositive("time constant", units.Second.Of(s.curve.Tau))
}

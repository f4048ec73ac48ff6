package rosenbrock

import (
	"errors"
	"math"
)

// Options of [Integrate]; all have to be set.
type Options struct {
	End      float64 // where to stop; the start is 0
	MaxStep  float64 // longest step
	MaxSteps int     // most steps, rejected ones included
	// Accepted is called after every step with its end, the state there and the size of its error.
	// It stops the integration with true or with an error, after the step has been stored.
	Accepted func(t float64, y []float64, size float64) (stop bool, err error)
}

// Statistics counts what an integration took.
type Statistics struct {
	Steps, Rejected int
	Evaluations     int // of f
}

// ErrSteps reports that the greatest number of steps was used up, ErrShort that the tolerance could
// not be met with any step that time resolves.
var (
	ErrSteps = errors.New("number of steps used up")
	ErrShort = errors.New("step too short")
)

// Constants of the step control: a proportional-integral controller for an estimate of order 4 in
// the step (K. Gustafsson, ACM Trans. Math. Softw. 20, 1994, as in Hairer and Wanner, section IV.2).
const (
	safety       = 0.9
	proportional = 0.7 / 4
	integral     = 0.4 / 4
	most, least  = 6.0, 0.1 // growth in one step
	afterFailure = 0.2      // growth after a step that could not be evaluated
	resolution   = 1e-14    // shortest step over time
)

// Integrate solves y' = f(t, y), y(0) = y0. The history is never nil and holds every step that was
// accepted, whatever error ended the integration: that of the system, of Accepted,
// [ErrSteps] or [ErrShort].
func Integrate(sys System, y0 []float64, o Options) (*History, Statistics, error) {
	var st Statistics
	hist := newHistory(y0)
	s := newStepper(sys, y0)
	t := 0.0
	if err := sys.Linearise(0, o.End*1e-6, s.y, s.f, s.ft); err != nil {
		return hist, st, err
	}
	st.Evaluations++
	h, err := s.first(o.End)
	st.Evaluations++
	if err != nil {
		return hist, st, err
	}
	shortest := 1e-6 * h
	last, rejected := 1.0, false
	for {
		if st.Steps+st.Rejected >= o.MaxSteps {
			return hist, st, ErrSteps
		}
		h = min(h, o.MaxStep)
		end := t + h
		if left := o.End - t; h >= left*(1-1e-9) {
			h, end = left, o.End
		} else if 2*h > left {
			h = left / 2
			end = t + h
		}
		size, err := s.try(t, h)
		st.Evaluations += stages - 1
		if err == nil && size <= 1 {
			err = sys.Check(s.next)
		}
		if err != nil {
			st.Rejected++
			rejected = true
			h *= afterFailure
			if h < max(resolution*t, shortest) {
				return hist, st, err
			}
			continue
		}
		if !(size <= 1) { // NaN included
			st.Rejected++
			rejected = true
			f := safety * math.Pow(size, -0.25)
			if !(f > least) {
				f = least
			}
			h *= f
			if h < max(resolution*t, shortest*1e-6) {
				return hist, st, ErrShort
			}
			continue
		}
		d2, d3, y := hist.grow(end)
		s.dense(d2, d3)
		copy(y, s.next)
		s.y, s.next = s.next, s.y
		t = end
		st.Steps++
		stop, err := o.Accepted(t, y, size)
		if err != nil || stop || t >= o.End {
			return hist, st, err
		}
		size = max(size, 1e-10)
		f := safety * math.Pow(size, -proportional) * math.Pow(last, integral)
		f = min(max(f, least), most)
		if rejected {
			f = min(f, 1)
		}
		h *= f
		last, rejected = max(size, 1e-2), false
		if err := sys.Linearise(t, min(h, o.End-t), s.y, s.f, s.ft); err != nil {
			return hist, st, err
		}
		st.Evaluations++
	}
}

// first returns the length of a first step: with y” from a difference of f, the step in which
// h⁴ y”” / 24 would reach the tolerance if every derivative grew as the second over the first
// (after Hairer, Nørsett and Wanner, Solving Ordinary Differential Equations I, 2nd ed., section II.4).
func (s *stepper) first(end float64) (float64, error) {
	rate := s.sys.Norm(s.f)
	if !(rate > 0) {
		return 1e-3 * end, nil
	}
	h := min(1e-3/rate, 1e-6*end)
	combine(s.next, s.y, h, []float64{1}, &[stages][]float64{s.f})
	if err := s.sys.Rate(h, s.next, s.rate); err != nil {
		return 0, err
	}
	combine(s.rhs, s.rate, -1, []float64{1}, &[stages][]float64{s.f})
	scale := rate * h / max(s.sys.Norm(s.rhs), 1e-10*rate) // time in which f changes by itself
	size := rate * scale                                   // change of y in that time, in tolerances
	return min(scale*math.Pow(max(size, 1), -0.25), 1e-2*end), nil
}

package rosenbrock

import (
	"errors"
	"math"

	"gonum.org/v1/gonum/floats"
)

// Options of [Integrate]; all have to be set.
type Options struct {
	End      float64 // where to stop; the start is 0
	MaxStep  float64 // longest step
	MaxSteps int     // most steps, rejected ones included
	// Times are the ends of the steps, which are then taken as they are, whatever their errors; nil: the steps are
	// chosen. A step that cannot be taken ends the integration, with ErrShort if it gives no number.
	Times []float64
	// Work is storage that the integration uses; nil: of its own.
	Work *Workspace
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

// Integrate solves y' = f(t, y), y(0) = y0. The history is never nil and holds every step that was
// accepted, whatever error ended the integration: that of the system, of Accepted,
// [ErrSteps] or [ErrShort].
func Integrate(sys System, y0 []float64, o Options) (*History, Statistics, error) {
	var st Statistics
	hist := newHistory(y0, len(o.Times))
	s := newStepper(sys, y0, o.Work)
	if err := s.linearise(0, o.End*1e-6); err != nil {
		return hist, st, err
	}
	st.Evaluations++
	c, err := s.controller(o, 4)
	if err != nil {
		return hist, st, err
	}
	if o.Times == nil {
		st.Evaluations++
	}
	for {
		if st.Steps+st.Rejected >= o.MaxSteps {
			return hist, st, ErrSteps
		}
		h, end := c.next()
		size, err := s.try(c.t, h)
		st.Evaluations += stages - 1
		if err == nil && size <= c.most {
			err = sys.Check(s.next)
		}
		if err != nil || !(size <= c.most) { // NaN included
			st.Rejected++
			if err := c.reject(size, err); err != nil {
				return hist, st, err
			}
			continue
		}
		d2, d3, y := hist.grow(end)
		s.dense(d2, d3)
		copy(y, s.next)
		s.y, s.next = s.next, s.y
		st.Steps++
		c.accept(end, size)
		if stop, err := o.Accepted(end, y, size); err != nil || stop || end >= c.o.End {
			return hist, st, err
		}
		if err := s.linearise(end, c.coming()); err != nil {
			return hist, st, err
		}
		st.Evaluations++
	}
}

// controller returns what chooses the steps, from a linearised start on.
func (s *stepper) controller(o Options, order float64) (*controller, error) {
	if o.Times != nil {
		o.End = o.Times[len(o.Times)-1]
		return &controller{o: o, most: math.MaxFloat64}, nil
	}
	h, err := s.first(o.End, order)
	return newController(o, h, order), err
}

// first returns the length of a first step: with y” from a difference of f, the step in which
// h⁴ y”” / 24 would reach the tolerance if every derivative grew as the second over the first
// (after Hairer, Nørsett and Wanner, Solving Ordinary Differential Equations I, 2nd ed., section II.4). If the change until
// then is far below the tolerance, it is the step in which the change would reach the tolerance. The order is that of
// the estimate.
func (s *stepper) first(end, order float64) (float64, error) {
	rate := s.sys.Norm(s.f)
	if !(rate > 0) {
		return 1e-3 * end, nil
	}
	h := min(1e-3/rate, 1e-6*end)
	floats.AddScaledTo(s.next, s.y, h, s.f)
	if err := s.sys.Rate(h, s.next, s.rate); err != nil {
		return 0, err
	}
	floats.SubTo(s.u[0], s.rate, s.f)
	scale := rate * h / max(s.sys.Norm(s.u[0]), 1e-10*rate) // time in which f changes by itself
	size := rate * scale                                    // change of y in that time, in tolerances
	if size > 1 {
		scale *= math.Pow(size, -1/order)
	} else {
		scale *= 4 / size // with a square root of time, as after a sudden change, the error of such a step is far below 1
	}
	return min(scale, 1e-2*end), nil
}

package rosenbrock

import "math"

// Constants of the step control. A new step is chosen from the estimate and half of what the trend of the last two steps
// predicts: the geometric mean of the elementary controller and the predictive one of K. Gustafsson (ACM Trans. Math.
// Softw. 20, 1994, as in Hairer and Wanner, section IV.8). After a sudden change the step grows tenfold again and
// again, where a controller without prediction lags behind.
const (
	safety       = 0.9
	most, least  = 10.0, 0.1 // growth in one step
	trend        = 10.0      // largest change that is predicted, and its inverse
	afterFailure = 0.2       // growth after a step that could not be evaluated
	resolution   = 1e-14     // shortest step over time
	shortest     = 1e-6      // shortest step that is tried again after a failure, over the first one
)

// A controller chooses the steps.
type controller struct {
	o            Options
	t, h         float64 // the next step begins at t and has the length h
	before, last float64 // length and size of the error of the last step
	first        float64
	rejected     bool
	order        float64 // of the estimate in the step
	most         float64 // largest size of an error that is accepted
	taken        int     // steps, where their ends are given
}

func newController(o Options, h, order float64) *controller {
	return &controller{o: o, h: h, first: h, order: order, most: 1}
}

// next returns length and end of the next step.
func (c *controller) next() (h, end float64) {
	if c.o.Times != nil {
		end = c.o.Times[c.taken]
		return end - c.t, end
	}
	c.h = min(c.h, c.o.MaxStep)
	switch left := c.o.End - c.t; {
	case c.h >= left*(1-1e-9):
		c.h = left
		return c.h, c.o.End
	case 2*c.h > left:
		c.h = left / 2
	}
	return c.h, c.t + c.h
}

// coming returns about how long the next step is.
func (c *controller) coming() float64 {
	if c.o.Times != nil {
		return c.o.Times[c.taken] - c.t
	}
	return min(c.h, c.o.End-c.t)
}

// accept goes on after a step of the given size of error.
func (c *controller) accept(end, size float64) {
	if c.o.Times != nil {
		c.t = end
		c.taken++
		return
	}
	size = max(size, 1e-10)
	f := safety * math.Pow(size, -1/c.order)
	if c.before > 0 {
		f *= math.Sqrt(min(max(c.h/c.before*math.Pow(c.last/size, 1/c.order), 1/trend), trend))
	}
	f = min(max(f, least), most)
	if c.rejected {
		f = min(f, 1)
	}
	c.t, c.before, c.last, c.rejected = end, c.h, size, false
	c.h *= f
}

// reject shortens a step whose error was too large, or that failed. It returns the failure, or ErrShort, if no shorter
// one helps.
func (c *controller) reject(size float64, failure error) error {
	if c.o.Times != nil {
		if failure == nil {
			failure = ErrShort
		}
		return failure
	}
	c.rejected = true
	if failure != nil {
		c.h *= afterFailure
		if c.h < max(resolution*c.t, shortest*c.first) {
			return failure
		}
		return nil
	}
	f := safety * math.Pow(size, -1/c.order)
	if !(f > least) { // NaN included
		f = least
	}
	c.h *= f
	if c.h < max(resolution*c.t, shortest*shortest*c.first) {
		return ErrShort
	}
	return nil
}

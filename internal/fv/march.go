package fv

import (
	"errors"
	"math"
	"sort"
)

// A Scheme steps time by one length: y1 = y0 + h ((1−θ) f(y0) + θ f(y1)).
type Scheme struct {
	Implicitness float64 // θ: 0 explicit, 1 implicit, ½ Crank–Nicolson
	Step, End    float64
	MostSteps    int
	// Accepted is called after every step with its end and the state there. It stops the march with true
	// or with an error.
	Accepted func(t float64, y []float64, size float64) (stop bool, err error)
}

// ErrSteps reports that the greatest number of steps was used up, ErrNewton that the equations of an
// implicit step did not settle.
var (
	ErrSteps  = errors.New("number of steps used up")
	ErrNewton = errors.New("equations of a step do not settle")
)

const (
	mostIterations = 30
	settled        = 1e-10 // K, the last change of Newton's iteration
)

// March steps to the end. The record is never nil and holds every step that was made.
func (y *System) March(o Scheme) (r *Record, steps, evaluations int, err error) {
	state := y.Start()
	r = NewRecord(state)
	n := len(state)
	f, g, ft, change := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
	next := make([]float64, n)
	t := 0.0
	if o.Implicitness == 0 {
		for k := range y.ports { // hold takes the place of the coefficient
			y.ports[k].stiff = 0
		}
	}
	for t < o.End {
		if steps >= o.MostSteps {
			return r, steps, evaluations, ErrSteps
		}
		end := float64(steps+1) * o.Step
		if end >= o.End*(1-1e-12) {
			end = o.End
		}
		h := end - t
		evaluations++
		if o.Implicitness == 0 {
			if err := y.Rate(t, state, f); err != nil {
				return r, steps, evaluations, err
			}
			for i := range next {
				next[i] = state[i] + h*f[i]
			}
			if err := y.hold(end, next); err != nil {
				return r, steps, evaluations, err
			}
		} else {
			if err := y.Rate(t, state, f); err != nil {
				return r, steps, evaluations, err
			}
			copy(next, state)
			for i := 0; ; i++ {
				if err := y.Linearise(end, h, next, g, ft); err != nil {
					return r, steps, evaluations, err
				}
				evaluations++
				d := 1 / (h * o.Implicitness)
				y.Factor(d)
				for k := range change {
					change[k] = d*(state[k]-next[k]) + (1-o.Implicitness)/o.Implicitness*f[k] + g[k]
				}
				y.Solve(change)
				for k := range change {
					next[k] += change[k]
				}
				if size := y.Norm(change) * y.tolerance; size <= settled {
					break
				} else if i >= mostIterations || math.IsNaN(size) {
					return r, steps, evaluations, ErrNewton
				}
			}
		}
		if err := y.Check(next); err != nil {
			return r, steps, evaluations, err
		}
		t = end
		steps++
		r.grow(t, next)
		state, next = next, state
		if stop, err := o.Accepted(t, state, 0); stop || err != nil {
			return r, steps, evaluations, err
		}
	}
	return r, steps, evaluations, nil
}

// hold sets the elements whose temperature is prescribed.
func (y *System) hold(t float64, state []float64) error {
	for k := range y.ports {
		p := &y.ports[k]
		if p.Prescribed == nil {
			continue
		}
		T, _, err := p.Prescribed(t)
		if err != nil {
			return &FunctionError{What: p.what, Time: t, Temperature: T, Cause: err}
		}
		if err := y.set(state, p.at-y.first, T); err != nil {
			return err
		}
	}
	return nil
}

// Fastest returns the largest diagonal entry of −∂f/∂y at the start, in 1/s, but for elements whose temperature
// is prescribed. With a step of its inverse the explicit scheme is stable (Gershgorin's discs).
func (y *System) Fastest() (float64, error) {
	state := y.Start()
	f, ft := make([]float64, len(state)), make([]float64, len(state))
	if err := y.Linearise(0, 1, state, f, ft); err != nil {
		return 0, err
	}
	held := make([]bool, y.chain)
	for k := range y.ports {
		if p := &y.ports[k]; p.Prescribed != nil {
			held[p.at] = true
		}
	}
	fastest := 0.0
	for i, d := range y.extra {
		if i > 0 {
			d -= y.upper[i-1]
		}
		if i < y.chain-1 {
			d -= y.lower[i+1]
		}
		if !held[i] {
			fastest = max(fastest, d)
		}
	}
	return fastest, nil
}

// A Record is a march that was made: the states at the ends of the steps, and straight lines between them.
type Record struct {
	times  []float64
	states [][]float64
}

// NewRecord returns the record of a march that has not begun.
func NewRecord(start []float64) *Record {
	return &Record{[]float64{0}, [][]float64{append([]float64(nil), start...)}}
}

func (r *Record) grow(t float64, y []float64) {
	r.times = append(r.times, t)
	r.states = append(r.states, append([]float64(nil), y...))
}

// Steps returns the number of steps.
func (r *Record) Steps() int { return len(r.times) - 1 }

// Time returns the time at which step k begins; Time(Steps()) is the end.
func (r *Record) Time(k int) float64 { return r.times[k] }

// State returns the state at Time(k). It must not be changed.
func (r *Record) State(k int) []float64 { return r.states[k] }

// Find returns the step that holds t and the fraction of it that has passed. A time outside the
// solution is taken to its nearest end.
func (r *Record) Find(t float64) (k int, s float64) {
	if r.Steps() == 0 || !(t > 0) {
		return 0, 0
	}
	k = min(sort.SearchFloat64s(r.times, t), r.Steps()) - 1
	return k, min((t-r.times[k])/(r.times[k+1]-r.times[k]), 1)
}

// Value returns component i in step k after the fraction s of it.
func (r *Record) Value(k int, s float64, i int) float64 {
	a := r.states[k][i]
	if s <= 0 || r.Steps() == 0 {
		return a
	}
	b := r.states[k+1][i]
	if s >= 1 {
		return b
	}
	return a + s*(b-a)
}

// Cubic returns the coefficients of component i in step k as a polynomial in the fraction s.
func (r *Record) Cubic(k, i int) [4]float64 {
	a := r.states[k][i]
	if r.Steps() == 0 {
		return [4]float64{a}
	}
	return [4]float64{a, r.states[k+1][i] - a}
}

package rosenbrock

import (
	"errors"
	"math"

	"gonum.org/v1/gonum/floats"
)

// ErrNewton reports that the equations of an implicit step were not solved.
var ErrNewton = errors.New("equations of a step not solved")

// Coefficients of the implicit method: a trapezoidal step of the part 2γ and a backward difference over the whole, of
// order 2, with the embedded formula of order 3 (R. E. Bank et al., IEEE Trans. Electron Devices 32, 1985; M. E. Hosea
// and L. F. Shampine, Appl. Numer. Math. 20, 1996; from memory, order conditions recomputed in a test).
const (
	trGamma = 1 - math.Sqrt2/2
	trPart  = 2 * trGamma // where the first stage ends
	trW     = math.Sqrt2 / 4

	// embedded less own weights
	trErr0 = (1-trW)/3 - trW
	trErr1 = (3*trW+1)/3 - trW
	trErr2 = trGamma/3 - trGamma
)

// Constants of Newton's iteration.
const (
	settled        = 0.1 // last change, in tolerances
	mostIterations = 12
)

// IntegrateImplicit is [Integrate] by a method of order 2 that solves the equations of every step by Newton's
// iteration, L-stable and stiffly accurate: for systems whose ∂f/∂y jumps, as where a phase changes. There a linearly
// implicit step is as short as the way to the next jump, whatever its order, and this one passes many.
// Steps that are not solved are halved; if that does not help the error is [ErrNewton].
func IntegrateImplicit(sys System, y0 []float64, o Options) (*History, Statistics, error) {
	var st Statistics
	hist := newHistory(y0, len(o.Times))
	s := newImplicit(sys, y0, o.Work)
	if err := s.linearise(0, o.End*1e-6); err != nil {
		return hist, st, err
	}
	st.Evaluations++
	c, err := s.controller(o, 3)
	if err != nil {
		return hist, st, err
	}
	if o.Times == nil {
		st.Evaluations++
	}
	copy(s.k0, s.f)
	for {
		if st.Steps+st.Rejected >= o.MaxSteps {
			return hist, st, ErrSteps
		}
		h, end := c.next()
		size, n, err := s.tryImplicit(c.t, h)
		st.Evaluations += n
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
		d2, _, y := hist.grow(end)
		for i := range d2 {
			d2[i] = ((s.middle[i] - s.y[i]) - trPart*(s.next[i]-s.y[i])) / (trPart * (1 - trPart))
		}
		copy(y, s.next)
		s.y, s.next = s.next, s.y
		s.k0, s.k2 = s.k2, s.k0
		st.Steps++
		c.accept(end, size)
		if stop, err := o.Accepted(end, y, size); err != nil || stop || end >= c.o.End {
			return hist, st, err
		}
	}
}

// An implicit makes single steps of the implicit method.
type implicit struct {
	stepper
	middle, k0, k1, k2, base, change []float64
}

func newImplicit(sys System, y0 []float64, w *Workspace) *implicit {
	s := &implicit{stepper: *newStepper(sys, y0, w)}
	s.middle, s.k0, s.k1, s.k2, s.base, s.change = s.u[0], s.u[1], s.u[2], s.u[3], s.u[4], s.u[5]
	return s
}

// tryImplicit makes a step into s.next and returns the size of its error, and how many evaluations it took.
func (s *implicit) tryImplicit(t, h float64) (size float64, n int, err error) {
	g := trGamma * h
	floats.AddScaledTo(s.base, s.y, g, s.k0)
	copy(s.middle, s.y)
	if n, err = s.newton(t+trPart*h, g, s.middle, s.k1); err != nil {
		return 0, n, err
	}
	floats.AddScaledTo(s.base, s.y, trW*h, s.k0)
	floats.AddScaled(s.base, trW*h, s.k1)
	// Begins where the first stage points to.
	for i := range s.next {
		s.next[i] = s.y[i] + (s.middle[i]-s.y[i])/trPart
	}
	m, err := s.newton(t+h, g, s.next, s.k2)
	if err != nil {
		return 0, n + m, err
	}
	// The estimate is filtered by the matrix of the last iteration, which keeps it bounded for stiff components.
	e := s.change
	for i := range e {
		e[i] = (trErr0*s.k0[i] + trErr1*s.k1[i] + trErr2*s.k2[i]) / trGamma
	}
	s.sys.Solve(e)
	return s.sys.Norm(e), n + m, nil
}

// newton solves y = base + g f(t, y) and sets k = f there.
func (s *implicit) newton(t, g float64, y, k []float64) (n int, err error) {
	for n < mostIterations {
		if err := s.sys.Linearise(t, g, y, s.f, s.ft); err != nil {
			return n, err
		}
		n++
		for i := range s.change {
			s.change[i] = (s.base[i]-y[i])/g + s.f[i]
		}
		s.sys.Factor(1 / g)
		s.sys.Solve(s.change)
		floats.Add(y, s.change)
		size := s.sys.Norm(s.change)
		if math.IsNaN(size) {
			break
		}
		if size <= settled {
			for i := range k {
				k[i] = (y[i] - s.base[i]) / g
			}
			return n, nil
		}
	}
	return n, ErrNewton
}

package rosenbrock

import "gonum.org/v1/gonum/floats"

const stages = 6

// A System is what is integrated. Slices handed to it are valid during the call only.
type System interface {
	// Rate sets f = f(t, y).
	Rate(t float64, y, f []float64) error
	// Linearise sets f = f(t, y) and ft = ∂f/∂t, and keeps ∂f/∂y. Differences in time stay
	// within [t, t+h].
	Linearise(t, h float64, y, f, ft []float64) error
	// Factor prepares the matrix d − ∂f/∂y.
	Factor(d float64)
	// Solve replaces b by the solution of that matrix.
	Solve(b []float64)
	// Norm returns the size of the error e of the state that was linearised; 1 is the tolerance.
	Norm(e []float64) float64
	// Check returns an error if a step may not end in the state y.
	Check(y []float64) error
}

// A stepper makes single steps.
type stepper struct {
	sys         System
	u           [stages][]float64
	f, ft, rate []float64
	y, next     []float64
	forced      []int // components of ft that are not 0
}

// A Workspace is storage for one integration after the other, not for two at once.
type Workspace struct {
	block  []float64
	forced []int
}

func newStepper(sys System, y0 []float64, w *Workspace) *stepper {
	n := len(y0)
	if w == nil {
		w = &Workspace{}
	}
	if len(w.block) < (stages+5)*n {
		w.block, w.forced = make([]float64, (stages+5)*n), make([]int, 0, n)
	}
	block := w.block
	cut := func() []float64 {
		s := block[:n:n]
		block = block[n:]
		return s
	}
	s := &stepper{sys: sys, f: cut(), ft: cut(), rate: cut(), y: cut(), next: cut(), forced: w.forced[:0]}
	for i := range s.u {
		s.u[i] = cut()
	}
	copy(s.y, y0)
	return s
}

// linearise prepares steps from the state at t.
func (s *stepper) linearise(t, h float64) error {
	if err := s.sys.Linearise(t, h, s.y, s.f, s.ft); err != nil {
		return err
	}
	s.forced = s.forced[:0]
	for i, g := range s.ft {
		if g != 0 { // NaN included
			s.forced = append(s.forced, i)
		}
	}
	return nil
}

// try makes a step of length h from the linearised state at t into s.next and returns the size of its error.
func (s *stepper) try(t, h float64) (float64, error) {
	s.sys.Factor(1 / (Gamma * h))
	u := &s.u
	copy(u[0], s.f)
	s.force(u[0], gamma[0]*h)
	s.sys.Solve(u[0])
	combine(s.next, s.y, 1, a2[:], u)
	if err := s.stage(1, t, h, c2[:]); err != nil {
		return 0, err
	}
	combine(s.next, s.y, 1, a3[:], u)
	if err := s.stage(2, t, h, c3[:]); err != nil {
		return 0, err
	}
	combine(s.next, s.y, 1, a4[:], u)
	if err := s.stage(3, t, h, c4[:]); err != nil {
		return 0, err
	}
	combine(s.next, s.y, 1, a5[:], u)
	if err := s.stage(4, t, h, c5[:]); err != nil {
		return 0, err
	}
	floats.Add(s.next, u[4])
	if err := s.stage(5, t, h, c6[:]); err != nil {
		return 0, err
	}
	floats.Add(s.next, u[5])
	return s.sys.Norm(u[5]), nil
}

// stage sets u[i] from the argument in s.next and the earlier ones.
func (s *stepper) stage(i int, t, h float64, c []float64) error {
	if err := s.sys.Rate(t+alpha[i]*h, s.next, s.rate); err != nil {
		return err
	}
	combine(s.u[i], s.rate, 1/h, c, &s.u)
	if gamma[i] != 0 {
		s.force(s.u[i], gamma[i]*h)
	}
	s.sys.Solve(s.u[i])
	return nil
}

// force adds g ∂f/∂t to b.
func (s *stepper) force(b []float64, g float64) {
	for _, i := range s.forced {
		b[i] += g * s.ft[i]
	}
}

// dense writes the two vectors of the continuous extension of the last step.
func (s *stepper) dense(d2, d3 []float64) {
	n := len(d2)
	d3 = d3[:n]
	u0, u1, u2, u3, u4 := s.u[0][:n], s.u[1][:n], s.u[2][:n], s.u[3][:n], s.u[4][:n]
	for i := range d2 {
		v0, v1, v2, v3 := u0[i], u1[i], u2[i], u3[i]
		d2[i] = (dense2[0]*v0 + dense2[1]*v1) + (dense2[2]*v2 + dense2[3]*v3)
		d3[i] = (dense3[0]*v0 + dense3[1]*v1) + (dense3[2]*v2 + dense3[3]*v3) + dense3[4]*u4[i]
	}
}

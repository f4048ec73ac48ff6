package rosenbrock

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
	rhs         []float64
}

func newStepper(sys System, y0 []float64) *stepper {
	n := len(y0)
	block := make([]float64, (stages+6)*n)
	cut := func() []float64 {
		s := block[:n:n]
		block = block[n:]
		return s
	}
	s := &stepper{sys: sys, f: cut(), ft: cut(), rate: cut(), y: cut(), next: cut(), rhs: cut()}
	for i := range s.u {
		s.u[i] = cut()
	}
	copy(s.y, y0)
	return s
}

// try makes a step of length h from the linearised state at t into s.next and returns the size of its error.
func (s *stepper) try(t, h float64) (float64, error) {
	s.sys.Factor(1 / (Gamma * h))
	u := &s.u
	stage := func(i int, c []float64) error {
		if err := s.sys.Rate(t+alpha[i]*h, s.next, s.rate); err != nil {
			return err
		}
		combine(u[i], s.rate, 1/h, c, u)
		s.forced(u[i], gamma[i]*h)
		s.sys.Solve(u[i])
		return nil
	}
	copy(u[0], s.f)
	s.forced(u[0], gamma[0]*h)
	s.sys.Solve(u[0])
	combine(s.next, s.y, 1, a2[:], u)
	if err := stage(1, c2[:]); err != nil {
		return 0, err
	}
	combine(s.next, s.y, 1, a3[:], u)
	if err := stage(2, c3[:]); err != nil {
		return 0, err
	}
	combine(s.next, s.y, 1, a4[:], u)
	if err := stage(3, c4[:]); err != nil {
		return 0, err
	}
	combine(s.next, s.y, 1, a5[:], u)
	if err := stage(4, c5[:]); err != nil {
		return 0, err
	}
	add(s.next, u[4])
	if err := stage(5, c6[:]); err != nil {
		return 0, err
	}
	add(s.next, u[5])
	return s.sys.Norm(u[5]), nil
}

// forced adds g ∂f/∂t to b.
func (s *stepper) forced(b []float64, g float64) {
	if g == 0 {
		return
	}
	ft := s.ft[:len(b)]
	for i := range b {
		b[i] += g * ft[i]
	}
}

func add(dst, src []float64) {
	src = src[:len(dst)]
	for i := range dst {
		dst[i] += src[i]
	}
}

// dense writes the two vectors of the continuous extension of the last step.
func (s *stepper) dense(d2, d3 []float64) {
	clear(s.rhs)
	combine(d2, s.rhs, 1, dense2[:], &s.u)
	combine(d3, s.rhs, 1, dense3[:], &s.u)
}

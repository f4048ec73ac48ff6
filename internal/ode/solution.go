package ode

// A step is one accepted step with the coefficients of its continuous extension
// y + θ(change + (1−θ)(r3 + θ(r4 + (1−θ) r5))), θ from 0 to 1.
type step struct {
	t, h               float64 // start and length
	y                  float64 // value at the start
	change, r3, r4, r5 float64
	rate               float64 // derivative at the start
}

func (s *step) at(theta float64) float64 {
	u := 1 - theta
	return s.y + theta*(s.change+u*(s.r3+theta*(s.r4+u*s.r5)))
}

func (s *step) rateAt(theta float64) float64 {
	u := 1 - theta
	return (s.change + s.r3*(u-theta) + theta*u*(2*s.r4+2*s.r5*u) - theta*theta*(s.r4+2*u*s.r5)) / s.h
}

// Statistics tell what a solution took.
type Statistics struct {
	Steps, Rejected, Evaluations int

	// Error is the largest accumulated error over the steps: the sum of the local error estimates,
	// each carried on with the estimated ∂f/∂y. It is usually several times too large.
	Error float64
}

// A Solution is y from 0 to End. It does not change once returned, and is safe for many goroutines.
type Solution struct {
	steps    []step
	few      [8]step // room for the steps of a short run
	end      float64
	last     float64
	lastRate float64
	error    float64 // accumulated until the end
	slope    float64 // the last estimate of ∂f/∂y
	stats    Statistics
}

// End returns where the solution ends.
func (s *Solution) End() float64 { return s.end }

// Last returns y at the end.
func (s *Solution) Last() float64 { return s.last }

// Statistics returns what the solution took.
func (s *Solution) Statistics() Statistics { return s.stats }

// Nodes calls visit with t, y and dy/dt at the start of each step and at the end of the last, until
// visit returns false.
func (s *Solution) Nodes(visit func(t, y, rate float64) bool) {
	for i := range s.steps {
		if st := &s.steps[i]; !visit(st.t, st.y, st.rate) {
			return
		}
	}
	if len(s.steps) > 0 {
		visit(s.end, s.last, s.lastRate)
	}
}

// At returns y at t, and whether t is within the solution.
func (s *Solution) At(t float64) (y float64, ok bool) {
	if !(t >= 0 && t <= s.end) {
		return 0, false
	}
	if t == s.end {
		return s.last, true
	}
	st := &s.steps[s.find(t)]
	return st.at((t - st.t) / st.h), true
}

// Rate returns dy/dt of the continuous extension at t, and whether t is within the solution. It is one order
// less exact than y.
func (s *Solution) Rate(t float64) (rate float64, ok bool) {
	if !(t >= 0 && t <= s.end) {
		return 0, false
	}
	if t == s.end {
		return s.lastRate, true
	}
	st := &s.steps[s.find(t)]
	return st.rateAt((t - st.t) / st.h), true
}

// find returns the last step that does not start after t.
func (s *Solution) find(t float64) int {
	low, high := 0, len(s.steps)
	for high-low > 1 {
		if mid := (low + high) / 2; s.steps[mid].t <= t {
			low = mid
		} else {
			high = mid
		}
	}
	return low
}

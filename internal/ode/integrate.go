package ode

import (
	"context"
	"math"
)

// Step control: a proportional-integral controller on the local error (Hairer, Nørsett and Wanner,
// Solving Ordinary Differential Equations II, 2nd ed., sec. IV.2, from memory). The exponents are
// those of an error of order 5.
const (
	safety    = 0.9
	integral  = 0.04
	exponent  = 0.2 - 0.75*integral
	shrink    = 0.2  // least factor from one step to the next
	grow      = 10   // largest
	retry     = 0.25 // factor after an evaluation that failed
	maxFailed = 24   // failed evaluations in a row before giving up
)

// Integrate solves p. It checks ctx once per step. If the integration ends before p.End for another
// reason than p.Stop, the error says why and the solution holds the steps until then; the solution is
// nil only if p itself cannot be used.
func Integrate(ctx context.Context, p Problem) (*Solution, error) {
	if err := p.check(); err != nil {
		return nil, err
	}
	if p.MaxSteps == 0 {
		p.MaxSteps = defaultMaxSteps
	}
	s := &Solution{steps: make([]step, 0, 16), end: 0, last: p.Start}
	if err := ctx.Err(); err != nil {
		return s, err
	}
	k1, err := s.eval(&p, 0, p.Start)
	if err != nil {
		return s, err
	}
	h := s.initialStep(&p, k1)
	above := p.Start > p.Level
	t, y, previous, failed := 0.0, p.Start, 1e-4, 0
	for tries := 0; t < p.End; tries++ {
		if err := ctx.Err(); err != nil {
			return s, err
		}
		if tries == p.MaxSteps {
			return s, ErrMaxSteps
		}
		end := t + h
		if t+1.01*h >= p.End { // no sliver is left for a last step
			h, end = p.End-t, p.End
		}
		if !(end > t) {
			return s, ErrStepSize
		}
		st, estimate, slope, k7, err := s.try(&p, t, y, h, end, k1)
		if err != nil {
			if failed++; failed > maxFailed {
				return s, err
			}
			s.stats.Rejected++
			h *= retry
			continue
		}
		ratio := max(estimate/p.Tolerance, 1e-10)
		factor := safety * math.Pow(ratio, -exponent)
		if !(ratio <= 1) {
			s.stats.Rejected++
			h *= max(shrink, factor)
			continue
		}
		y += st.change
		s.accept(st, estimate, slope, end, y, k7)
		t, k1 = end, k7
		if p.Stop && (y > p.Level) != above {
			return s, nil
		}
		factor *= math.Pow(previous, integral)
		if failed > 0 { // do not jump back at once to where it failed
			factor = min(factor, 1)
		}
		h *= min(grow, max(shrink, factor))
		previous, failed = max(ratio, 1e-4), 0
	}
	return s, nil
}

// try makes one step. It returns the step with its continuous extension, the estimate of its local
// error, an estimate of ∂f/∂y, and the derivative at its end.
func (s *Solution) try(p *Problem, t, y, h, end, k1 float64) (st step, estimate, slope, k7 float64, err error) {
	k2, err := s.eval(p, t+c2*h, y+h*(a21*k1))
	if err != nil {
		return
	}
	k3, err := s.eval(p, t+c3*h, y+h*(a31*k1+a32*k2))
	if err != nil {
		return
	}
	k4, err := s.eval(p, t+c4*h, y+h*(a41*k1+a42*k2+a43*k3))
	if err != nil {
		return
	}
	k5, err := s.eval(p, t+c5*h, y+h*(a51*k1+a52*k2+a53*k3+a54*k4))
	if err != nil {
		return
	}
	change6 := h * (a61*k1 + a62*k2 + a63*k3 + a64*k4 + a65*k5)
	k6, err := s.eval(p, end, y+change6)
	if err != nil {
		return
	}
	change := h * (b1*k1 + b3*k3 + b4*k4 + b5*k5 + b6*k6)
	k7, err = s.eval(p, end, y+change)
	if err != nil {
		return
	}
	estimate = math.Abs(h * (e1*k1 + e3*k3 + e4*k4 + e5*k5 + e6*k6 + e7*k7))
	// Two stages lie at the end of the step: their difference is a slope of f for nothing, unless it
	// is rounding only.
	slope = s.slope
	if d := change - change6; math.Abs(d) > 1e-10*math.Abs(y) {
		slope = (k7 - k6) / d
	}
	r3 := h*k1 - change
	st = step{
		t: t, h: h, y: y, change: change, r3: r3, r4: change - h*k7 - r3,
		r5:   h * (d1*k1 + d3*k3 + d4*k4 + d5*k5 + d6*k6 + d7*k7),
		rate: k1,
	}
	return
}

// accept appends a step. The error until now decays or grows as a small difference between two
// solutions does, exp(h ∂f/∂y), and that of the step is added.
func (s *Solution) accept(st step, estimate, slope, end, y, rate float64) {
	if isFinite(slope) {
		s.slope = slope
	}
	s.error = s.error*math.Exp(min(s.slope*st.h, 10)) + estimate
	s.stats.Error = max(s.stats.Error, s.error)
	s.stats.Steps++
	s.steps = append(s.steps, st)
	s.end, s.last, s.lastRate = end, y, rate
}

// initialStep estimates a first step from the size of the derivative and of its change over a
// small step (Hairer, Nørsett and Wanner I, sec. II.4, from memory; their small step is a fraction of
// y, here it moves y by a hundred tolerances, because the zero of a temperature scale says nothing).
func (s *Solution) initialStep(p *Problem, k1 float64) float64 {
	small := p.End / 1000
	if k1 != 0 {
		small = min(small, 100*p.Tolerance/math.Abs(k1))
	}
	d1, d2 := math.Abs(k1)/p.Tolerance, 0.0
	if k, err := s.eval(p, small, p.Start+small*k1); err == nil && small > 0 {
		d2 = math.Abs(k-k1) / small / p.Tolerance
	}
	// The local error is about h⁵ y⁽⁵⁾/5! with y⁽⁵⁾ unknown: take that of an exponential, whose rate
	// is d2/d1.
	h := p.End / 100
	if d2 > 0 && d1 > 0 {
		rate := d2 / d1
		h = math.Pow(0.01/(d1/rate), 0.2) / rate
	}
	return min(h, p.End)
}

// eval calls the function and counts.
func (s *Solution) eval(p *Problem, t, y float64) (float64, error) {
	s.stats.Evaluations++
	k, err := p.F(t, y)
	if err == nil && !isFinite(k) {
		err = ErrNotFinite
	}
	return k, err
}

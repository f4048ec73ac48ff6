package ode

import (
	"context"
	"math"
)

// Step control: the next step is that for an error of order 5 whose constant goes on as it went over the last two steps
// (K. Gustafsson, ACM Trans. Math. Softw. 20 (1994) 496–517, and Hairer, Nørsett and Wanner, Solving Ordinary
// Differential Equations II, 2nd ed., sec. IV.8; both from memory). On what slows down, as all that cools does,
// a control by the last error alone stays far below the tolerance.
const (
	safety   = 0.9
	exponent = 0.2
	shrink   = 0.2 // least factor from one step to the next
	grow     = 10  // largest

	leastRatio = 1e-10 // of an error to the tolerance, that counts
	retry      = 0.25  // factor after an evaluation that failed
	maxFailed  = 24    // failed evaluations in a row before giving up
	resolve    = 1e-6  // or a failed step that is shorter than this part of the time so far
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
	s := &Solution{last: p.Start}
	s.steps = s.few[:0]
	if err := ctx.Err(); err != nil {
		return s, err
	}
	k1, err := s.eval(&p, 0, p.Start)
	if err != nil {
		return s, err
	}
	h := s.initialStep(&p, k1)
	above := p.Start > p.Level
	t, y, failed := 0.0, p.Start, 0
	var last struct{ h, ratio float64 } // the step before; none at a break
	breaks := p.Breaks
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
		for len(breaks) > 0 && breaks[0] <= t {
			breaks = breaks[1:]
		}
		planned, before := h, end // before is where f is asked for at the end of the step
		atBreak := len(breaks) > 0 && t+1.01*h >= breaks[0]
		if atBreak {
			h, end = breaks[0]-t, breaks[0]
			before = math.Nextafter(end, 0) // this side of a jump
		}
		if !(end > t) {
			return s, ErrStepSize
		}
		a, err := s.try(&p, t, y, h, before, k1)
		if err != nil {
			if failed++; failed > maxFailed || h <= resolve*end {
				return s, err
			}
			s.stats.Rejected++
			h *= retry
			continue
		}
		ratio := max(a.error/p.Tolerance, leastRatio)
		factor := safety * math.Pow(ratio, -exponent)
		if !(ratio <= 1) {
			s.stats.Rejected++
			h *= max(shrink, factor)
			continue
		}
		s.accept(&a, end)
		t, y, k1 = end, s.last, a.rate
		if p.Stop && (y > p.Level) != above {
			return s, nil
		}
		if atBreak && t < p.End {
			if k1, err = s.eval(&p, t, y); err != nil {
				return s, err
			}
			s.lastRate = k1
			h = max(h, planned/grow)
			last.h = 0
		} else if last.h > 0 {
			factor *= h / last.h * math.Pow(last.ratio/ratio, exponent)
		}
		last.h, last.ratio = h, ratio
		if failed > 0 { // do not jump back at once to where it failed
			factor = min(factor, 1)
		}
		h *= min(grow, max(shrink, factor))
		failed = 0
	}
	return s, nil
}

// An attempt is one step before it is accepted or rejected.
type attempt struct {
	step
	error float64 // estimate of the local error
	slope float64 // estimate of ∂f/∂y, NaN where there is none
	rate  float64 // derivative at the end
}

// try makes one step from y, where the derivative is k1. The error is the larger of two estimates: the
// difference of the formulas of order 5 and 4, and, unless that is above p.Tolerance already, h times
// the defect p′ − f(t, p) of the continuous extension p in the middle of the step. Both are of order
// 5. The second costs an evaluation but sees errors between the nodes; on equations such as
// y′ = −y⁴ with long steps the first alone is several times too small (the tests show it).
func (s *Solution) try(p *Problem, t, y, h, end, k1 float64) (a attempt, err error) {
	k2, err := s.eval(p, t+c2*h, y+h*(a21*k1))
	if err != nil {
		return a, err
	}
	k3, err := s.eval(p, t+c3*h, y+h*(a31*k1+a32*k2))
	if err != nil {
		return a, err
	}
	k4, err := s.eval(p, t+c4*h, y+h*(a41*k1+a42*k2+a43*k3))
	if err != nil {
		return a, err
	}
	k5, err := s.eval(p, t+c5*h, y+h*(a51*k1+a52*k2+a53*k3+a54*k4))
	if err != nil {
		return a, err
	}
	change6 := h * (a61*k1 + a62*k2 + a63*k3 + a64*k4 + a65*k5)
	k6, err := s.eval(p, end, y+change6)
	if err != nil {
		return a, err
	}
	change := h * (b1*k1 + b3*k3 + b4*k4 + b5*k5 + b6*k6)
	k7, err := s.eval(p, end, y+change)
	if err != nil {
		return a, err
	}
	r3 := h*k1 - change
	a = attempt{
		step: step{
			t: t, h: h, y: y, rate: k1, change: change, r3: r3, r4: change - h*k7 - r3,
			r5: h * (d1*k1 + d3*k3 + d4*k4 + d5*k5 + d6*k6 + d7*k7),
		},
		error: math.Abs(h * (e1*k1 + e3*k3 + e4*k4 + e5*k5 + e6*k6 + e7*k7)),
		slope: math.NaN(),
		rate:  k7,
	}
	// Two stages lie at the end of the step: their difference is a slope of f for nothing, unless it
	// is rounding only.
	if d := change - change6; math.Abs(d) > 1e-10*math.Abs(y) {
		a.slope = (k7 - k6) / d
	}
	if a.error <= p.Tolerance {
		k, err := s.eval(p, t+h/2, a.at(0.5))
		if err != nil {
			return a, err
		}
		// At θ = 1/2 the derivatives of θ(1−θ) and of θ²(1−θ)² vanish, and that of θ²(1−θ) is 1/4.
		a.error = max(a.error, math.Abs(change+a.r4/4-h*k))
	}
	return a, nil
}

// accept appends a step. The error until now decays or grows as a small difference between two
// solutions does, exp(h ∂f/∂y), and that of the step is added.
func (s *Solution) accept(a *attempt, end float64) {
	if isFinite(a.slope) {
		s.slope = a.slope
	}
	s.error = s.error*math.Exp(min(s.slope*a.h, 10)) + a.error
	s.stats.Error = max(s.stats.Error, s.error)
	s.stats.Steps++
	s.steps = append(s.steps, a.step)
	s.end, s.last, s.lastRate = end, a.y+a.change, a.rate
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
	// The fifth derivative is not known: take that of an exponential, whose rate is d2/d1. The error
	// estimate of the pair is then near 0.006 (h rate)⁵ of its amplitude; aim at a third of the
	// tolerance.
	h := p.End / 100
	if d2 > 0 && d1 > 0 {
		rate := d2 / d1
		h = math.Pow(50*rate/d1, 0.2) / rate
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

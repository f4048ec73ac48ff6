package ode

import (
	"context"
	"errors"
	"math"
	"testing"
)

// exact cases: the equation and its solution.
var cases = []struct {
	name  string
	f     func(t, y float64) float64
	y     func(t float64) float64
	start float64
	end   float64

	growth float64 // largest factor by which a small difference grows
}{
	{"exponential decay", func(_, y float64) float64 { return -y }, func(t float64) float64 { return math.Exp(-t) }, 1, 5, 1},
	{"growth", func(_, y float64) float64 { return y }, math.Exp, 1, 3, 20},
	{
		"radiation to 0 K, y' = −y⁴", func(_, y float64) float64 { return -y * y * y * y },
		func(t float64) float64 { return math.Pow(1+3*t, -1.0/3) }, 1, 20, 1,
	},
	{
		"still air, y' = −y^(5/4)", func(_, y float64) float64 { return -math.Pow(math.Max(y, 0), 1.25) },
		func(t float64) float64 { return math.Pow(1+t/4, -4) }, 1, 10, 1,
	},
	{"logistic", func(_, y float64) float64 { return y * (1 - y) }, func(t float64) float64 { return 1 / (1 + 9*math.Exp(-t)) }, 0.1, 10, 2.8},
	{
		"lag behind a sine, y' = sin t − y", func(t, y float64) float64 { return math.Sin(t) - y },
		func(t float64) float64 { return (math.Sin(t)-math.Cos(t)+math.Exp(-t))/2 + math.Exp(-t) }, 1, 20, 1,
	},
	{"y' = 2t (quadrature)", func(t, _ float64) float64 { return 2 * t }, func(t float64) float64 { return t * t }, 0, 3, 1},
	{"at rest", func(_, _ float64) float64 { return 0 }, func(float64) float64 { return 7 }, 7, 10, 1},
}

func integrate(t *testing.T, f func(t, y float64) float64, start, end, tolerance float64) *Solution {
	t.Helper()
	s, err := Integrate(context.Background(), Problem{
		F:     func(t, y float64) (float64, error) { return f(t, y), nil },
		Start: start, End: end, Tolerance: tolerance,
	})
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// worst returns the largest error on a grid of times.
func worst(s *Solution, exact func(t float64) float64) float64 {
	largest := 0.0
	for i := range 2001 {
		t := s.End() * float64(i) / 2000
		y, ok := s.At(t)
		if !ok {
			return math.Inf(1)
		}
		largest = max(largest, math.Abs(y-exact(t)))
	}
	return largest
}

// The error stays within two local tolerances, times the growth of small differences, and within the
// accumulated estimate where that is not rounding.
func TestExactSolutions(t *testing.T) {
	for _, c := range cases {
		for _, tolerance := range []float64{1e-3, 1e-5, 1e-7, 1e-9} {
			s := integrate(t, c.f, c.start, c.end, tolerance)
			allowed := 2 * c.growth * tolerance
			got := worst(s, c.y)
			if got > allowed {
				t.Errorf("%s, tolerance %g: error %g, want at most %g", c.name, tolerance, got, allowed)
			}
			if e := s.Statistics().Error; got > e+1e-13 {
				t.Errorf("%s, tolerance %g: error %g, estimated %g", c.name, tolerance, got, e)
			}
			if s.End() != c.end {
				t.Errorf("%s: ends at %g, want exactly %g", c.name, s.End(), c.end)
			}
		}
	}
}

// Where f damps, old errors fade: the estimate does not pile up over a long time. Where it lets
// differences grow, so does the estimate.
func TestAccumulatedErrorFollowsTheEquation(t *testing.T) {
	lag := cases[5]
	for _, end := range []float64{20, 500} {
		s := integrate(t, lag.f, lag.start, end, 1e-6)
		if e := s.Statistics().Error; e > 5e-6 {
			t.Errorf("to t = %g: estimate %g, want a few tolerances of 1e-6", end, e)
		}
	}
	s := integrate(t, cases[1].f, 1, 20, 1e-6) // y′ = y: an early error has grown by e²⁰ = 4.9e8
	if got, e := math.Abs(s.Last()-math.Exp(20)), s.Statistics().Error; got > e || e < 1 {
		t.Errorf("growth: error %g, estimate %g", got, e)
	}
}

// fixed integrates with n equal steps.
func fixed(t *testing.T, f func(t, y float64) float64, start, end float64, n int) *Solution {
	t.Helper()
	p := Problem{F: func(t, y float64) (float64, error) { return f(t, y), nil }}
	s := &Solution{}
	h, y, k := end/float64(n), start, f(0, start)
	for i := range n {
		next := end * float64(i+1) / float64(n)
		a, err := s.try(&p, end*float64(i)/float64(n), y, h, next, k)
		if err != nil {
			t.Fatal(err)
		}
		s.accept(&a, next)
		y, k = s.last, a.rate
	}
	return s
}

// Halving the step divides the error at the nodes by 2⁵ and that of the continuous extension by 2⁴
// at the least: the nodes by the order of the formula, the extension by that of its error over a
// finite time, which is one below the order of its error in a step.
func TestObservedOrder(t *testing.T) {
	for _, c := range cases[:6] {
		coarse, fine := fixed(t, c.f, c.start, 2, 32), fixed(t, c.f, c.start, 2, 64)
		order := math.Log2(math.Abs(coarse.Last()-c.y(2)) / math.Abs(fine.Last()-c.y(2)))
		if order < 4.7 {
			t.Errorf("%s: order %.2f at the nodes, want 5 or, where error terms cancel, more", c.name, order)
		}
		dense := math.Log2(worst(coarse, c.y) / worst(fine, c.y))
		if dense < 3.9 || dense > 5.5 {
			t.Errorf("%s: order %.2f between the nodes, want 4 to 5", c.name, dense)
		}
	}
	// Inside the first step, where no error of the nodes hides it, the extension has a local error of order 5.
	f, y := cases[2].f, cases[2].y
	inside := func(h float64) float64 {
		s := fixed(t, f, 1, h, 1)
		v, _ := s.At(0.4 * h)
		return math.Abs(v - y(0.4*h))
	}
	if order := math.Log2(inside(0.02) / inside(0.01)); math.Abs(order-5) > 0.2 {
		t.Errorf("order %.2f of the local error between the nodes, want 5", order)
	}
}

func TestFailures(t *testing.T) {
	boom := errors.New("boom")
	decay := func(_, y float64) (float64, error) { return -y, nil }
	good := Problem{F: decay, Start: 1, End: 10, Tolerance: 1e-6}
	ended, cancel := context.WithCancel(context.Background())
	cancel()
	for _, c := range []struct {
		name   string
		change func(*Problem)
		ctx    context.Context
		want   error
		until  float64 // where the solution ends at the least
		before float64 // and at the most
	}{
		{"error from the start", func(p *Problem) { p.F = func(_, _ float64) (float64, error) { return 0, boom } }, nil, boom, 0, 0},
		{"error from t = 4", func(p *Problem) {
			p.F = func(t, y float64) (float64, error) {
				if t >= 4 {
					return 0, boom
				}
				return -y, nil
			}
		}, nil, boom, 3.999, 4},
		{"NaN below y = 0.5", func(p *Problem) {
			p.F = func(_, y float64) (float64, error) {
				if y < 0.5 {
					return math.NaN(), nil
				}
				return -y, nil
			}
		}, nil, ErrNotFinite, 0.69, math.Ln2 + 2e-6}, // where y is right to the tolerance
		{"infinite derivative", func(p *Problem) { p.F = func(_, _ float64) (float64, error) { return math.Inf(1), nil } }, nil, ErrNotFinite, 0, 0},
		{"step limit", func(p *Problem) { p.MaxSteps = 3 }, nil, ErrMaxSteps, 0.01, 9},
		{"blow-up at t = 1", func(p *Problem) { p.F = func(_, y float64) (float64, error) { return y * y, nil } }, nil, nil, 0.9, 1.0001},
		{"context", func(*Problem) {}, ended, context.Canceled, 0, 0},
	} {
		p, ctx := good, c.ctx
		c.change(&p)
		if ctx == nil {
			ctx = context.Background()
		}
		s, err := Integrate(ctx, p)
		if err == nil || c.want != nil && !errors.Is(err, c.want) {
			t.Errorf("%s: error %v, want %v", c.name, err, c.want)
		}
		if s == nil || s.End() < c.until || s.End() > c.before {
			t.Errorf("%s: solution %+v, want one that ends from %g to %g", c.name, s, c.until, c.before)
			continue
		}
		if y, ok := s.At(s.End()); s.End() > 0 && (!ok || y != s.Last()) {
			t.Errorf("%s: At(End) = %g, %v, want %g", c.name, y, ok, s.Last())
		}
	}
}

func TestContextEndsARun(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	calls := 0
	s, err := Integrate(ctx, Problem{
		F: func(_, y float64) (float64, error) {
			if calls++; calls == 20 {
				cancel()
			}
			return -y, nil
		},
		Start: 1, End: 10, Tolerance: 1e-9,
	})
	if !errors.Is(err, context.Canceled) || s.Statistics().Steps == 0 || calls > 27 {
		t.Errorf("error %v after %d calls and %d steps, want the context's within a step", err, calls, s.Statistics().Steps)
	}
}

func TestProblemsThatCannotBe(t *testing.T) {
	f := func(_, y float64) (float64, error) { return -y, nil }
	for i, p := range []Problem{
		{Start: 1, End: 1, Tolerance: 1},
		{F: f, Start: math.NaN(), End: 1, Tolerance: 1},
		{F: f, End: 0, Tolerance: 1},
		{F: f, End: math.Inf(1), Tolerance: 1},
		{F: f, End: 1, Tolerance: 0},
		{F: f, End: 1, Tolerance: math.NaN()},
		{F: f, End: 1, Tolerance: 1, MaxSteps: -1},
		{F: f, End: 1, Tolerance: 1, Stop: true, Level: math.Inf(1)},
	} {
		if s, err := Integrate(context.Background(), p); err == nil || s != nil {
			t.Errorf("problem %d: %v, %v, want an error", i, s, err)
		}
	}
}

func TestReading(t *testing.T) {
	s := integrate(t, cases[0].f, 1, 5, 1e-6)
	n, last := 0, math.Inf(-1)
	s.Nodes(func(x, y, rate float64) bool {
		at, ok := s.At(x)
		if !ok || math.Abs(at-y) > 1e-15 || math.Abs(rate+y) > 1e-15 || x <= last {
			t.Errorf("node %d: y(%g) = %g with rate %g, read %g, %v", n, x, y, rate, at, ok)
		}
		n, last = n+1, x
		return true
	})
	if n != s.Statistics().Steps+1 || last != 5 {
		t.Errorf("%d nodes to %g for %d steps to 5", n, last, s.Statistics().Steps)
	}
	n = 0
	s.Nodes(func(_, _, _ float64) bool { n++; return false })
	if n != 1 {
		t.Errorf("%d nodes after the first was enough", n)
	}
	for _, x := range []float64{-1, 5.001, math.NaN(), math.Inf(1)} {
		if y, ok := s.At(x); ok || y != 0 {
			t.Errorf("At(%g) = %g, %v, want none", x, y, ok)
		}
	}
}

func TestStop(t *testing.T) {
	s, err := Integrate(context.Background(), Problem{
		F:     func(_, y float64) (float64, error) { return -y, nil },
		Start: 1, End: 1e4, Tolerance: 1e-8, Stop: true, Level: 0.25,
	})
	if err != nil || s.Last() >= 0.25 || s.Last() < 0.15 {
		t.Fatalf("ends at y = %g with %v, want one step past 0.25", s.Last(), err)
	}
	if got, ok := s.Crossing(0.25); !ok || math.Abs(got-math.Log(4)) > 1e-7 {
		t.Errorf("passes 0.25 at %g, want ln 4", got)
	}
}

// A step allocates nothing: only the list of steps grows.
func TestAllocations(t *testing.T) {
	f := func(_, y float64) (float64, error) { return -y, nil }
	run := func(tolerance float64) float64 {
		return testing.AllocsPerRun(20, func() {
			if _, err := Integrate(context.Background(), Problem{F: f, Start: 1, End: 5, Tolerance: tolerance}); err != nil {
				t.Fatal(err)
			}
		})
	}
	if n := run(1e-3); n > 1 {
		t.Errorf("a short run allocates %v times, want 1: the solution with room for its steps", n)
	}
	if n := run(1e-12); n > 8 {
		t.Errorf("a long run allocates %v times, want at most 8", n)
	}
	s := integrate(t, cases[0].f, 1, 5, 1e-8)
	if n := testing.AllocsPerRun(100, func() { s.At(1.5); s.Crossing(0.3) }); n != 0 {
		t.Errorf("reading allocates %v times", n)
	}
}

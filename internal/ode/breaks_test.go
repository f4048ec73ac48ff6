package ode

import (
	"context"
	"errors"
	"math"
	"testing"
)

// A derivative that jumps and bends at known times: y is exact to the tolerance, and no step is lost at the jump.
func TestBreaks(t *testing.T) {
	f := func(t, y float64) (float64, error) {
		switch {
		case t < 1:
			return -y, nil
		case t < 2:
			return 5 - y, nil
		}
		return (t - 2) - y, nil
	}
	exact := func(t float64) float64 {
		switch {
		case t < 1:
			return math.Exp(-t)
		case t < 2:
			return 5 + (math.Exp(-1)-5)*math.Exp(1-t)
		}
		at2 := 5 + (math.Exp(-1)-5)*math.Exp(-1)
		return (t - 2) - 1 + (at2+1)*math.Exp(2-t)
	}
	p := Problem{F: f, Start: 1, End: 5, Tolerance: 1e-8, Breaks: []float64{0, 1, 2, 9}}
	s, err := Integrate(context.Background(), p)
	if err != nil {
		t.Fatal(err)
	}
	if w := worst(s, exact); w > 1e-8 || w > s.Statistics().Error {
		t.Errorf("error %g, estimate %g", w, s.Statistics().Error)
	}
	if n := s.Statistics().Rejected; n > 2 {
		t.Errorf("%d steps rejected, though the jumps are known", n)
	}
	p.Breaks = nil
	blind, err := Integrate(context.Background(), p)
	if err != nil {
		t.Fatal(err)
	}
	if blind.Statistics().Evaluations < s.Statistics().Evaluations {
		t.Errorf("%d evaluations with the jumps known, %d without", s.Statistics().Evaluations, blind.Statistics().Evaluations)
	}
	for _, at := range []float64{1, 2} { // the derivative behind a break is that of the new piece
		got, ok := s.Rate(at)
		want, _ := f(at, exact(at))
		if !ok || math.Abs(got-want) > 1e-6 {
			t.Errorf("rate at %g: %g, %v, want %g", at, got, ok, want)
		}
	}
	p.Breaks = []float64{2, 1}
	if _, err := Integrate(context.Background(), p); err == nil {
		t.Error("breaks that do not rise: no error")
	}
	boom := errors.New("no more")
	p.Breaks = []float64{1}
	p.F = func(t, y float64) (float64, error) {
		if t >= 1 {
			return 0, boom
		}
		return -y, nil
	}
	if s, err := Integrate(context.Background(), p); !errors.Is(err, boom) || s.End() != 1 {
		t.Errorf("a function that ends at a break: %v, end %g", err, s.End())
	}
}

// The rate of the extension is the derivative of its value, and f at the nodes.
func TestRate(t *testing.T) {
	for _, c := range cases {
		s := integrate(t, c.f, c.start, c.end, 1e-8)
		s.Nodes(func(x, y, rate float64) bool {
			if got, ok := s.Rate(x); !ok || math.Abs(got-rate) > 1e-9*(1+math.Abs(rate)) {
				t.Errorf("%s: rate %g, %v at %g, want %g", c.name, got, ok, x, rate)
			}
			return true
		})
		for i := 1; i < 50; i++ {
			x, d := c.end*float64(i)/50, c.end*1e-5
			low, _ := s.At(x - d)
			high, _ := s.At(x + d)
			if got, ok := s.Rate(x); !ok || math.Abs(got-(high-low)/(2*d)) > 1e-4*(1+math.Abs(got)) {
				t.Errorf("%s: rate %g, %v at %g, the difference gives %g", c.name, got, ok, x, (high-low)/(2*d))
			}
		}
		if _, ok := s.Rate(c.end * 1.01); ok {
			t.Errorf("%s: a rate beyond the end", c.name)
		}
	}
}

// All crossings, against the zeros of sin: y' = cos t.
func TestAllCrossings(t *testing.T) {
	s := integrate(t, func(t, _ float64) float64 { return math.Cos(t) }, 0, 20, 1e-10)
	var got []float64
	s.Crossings(0, func(t float64) bool { got = append(got, t); return true })
	if len(got) != 7 {
		t.Fatal(got)
	}
	for i, x := range got {
		if math.Abs(x-math.Pi*float64(i)) > 1e-8 {
			t.Errorf("crossing %d at %g, want %g", i, x, math.Pi*float64(i))
		}
	}
	n := 0
	s.Crossings(0.5, func(float64) bool { n++; return n < 3 })
	if n != 3 {
		t.Errorf("%d crossings after visit said to stop at 3", n)
	}
	rest := integrate(t, func(_, _ float64) float64 { return 0 }, 7, 10, 1e-6)
	n = 0
	rest.Crossings(7, func(float64) bool { n++; return true })
	if n == 0 || n > rest.Statistics().Steps+1 {
		t.Errorf("%d crossings of a level that is kept, in %d steps", n, rest.Statistics().Steps)
	}
	// Two in one long step: y = t − t²/2 is 0.375 at 0.5 and at 1.5.
	got = nil
	integrate(t, func(t, _ float64) float64 { return 1 - t }, 0, 3, 1e-6).Crossings(0.375, func(t float64) bool { got = append(got, t); return true })
	if len(got) != 2 || math.Abs(got[0]-0.5) > 1e-12 || math.Abs(got[1]-1.5) > 1e-12 {
		t.Errorf("hump crossed at %v, want 0.5 and 1.5", got)
	}
}

// Three crossings in one long step: y = (t − 1)(t − 2)(t − 3).
func TestThreeCrossingsInOneStep(t *testing.T) {
	s := integrate(t, func(t, _ float64) float64 { return 3*t*t - 12*t + 11 }, -6, 4, 100)
	if n := s.Statistics().Steps; n > 2 {
		t.Fatalf("%d steps", n)
	}
	var got []float64
	s.Crossings(0, func(t float64) bool { got = append(got, t); return true })
	if len(got) != 3 {
		t.Fatal(got)
	}
	for i, x := range got {
		if math.Abs(x-float64(i+1)) > 1e-12 {
			t.Errorf("crossing %d at %.15g, want %d", i, x, i+1)
		}
	}
}

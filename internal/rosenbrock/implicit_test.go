package rosenbrock

import (
	"errors"
	"math"
	"testing"
)

// Order conditions of a Runge-Kutta method (Hairer, Nørsett and Wanner, Solving Ordinary Differential Equations I, 2nd
// ed., section II.2, from memory): to order 2 for the method, to order 3 for the embedded formula; and R(∞) = 0, which is
// L-stability for a method that is stiffly accurate with one diagonal coefficient.
func TestImplicitConditions(t *testing.T) {
	c := [3]float64{0, trPart, 1}
	a := [3][3]float64{{}, {trGamma, trGamma}, {trW, trW, trGamma}}
	own := a[2]
	embedded := [3]float64{own[0] + trErr0, own[1] + trErr1, own[2] + trErr2}
	for i, row := range a {
		if got := row[0] + row[1] + row[2]; math.Abs(got-c[i]) > 1e-15 {
			t.Errorf("row %d adds up to %g, want %g", i, got, c[i])
		}
	}
	sum := func(w [3]float64, f func(i int) float64) (s float64) {
		for i := range w {
			s += w[i] * f(i)
		}
		return s
	}
	for _, o := range []struct {
		order int
		term  func(i int) float64
		want  float64
	}{
		{1, func(int) float64 { return 1 }, 1},
		{2, func(i int) float64 { return c[i] }, 1.0 / 2},
		{3, func(i int) float64 { return c[i] * c[i] }, 1.0 / 3},
		{3, func(i int) float64 { return sum(a[i], func(j int) float64 { return c[j] }) }, 1.0 / 6},
	} {
		if got := sum(own, o.term); o.order <= 2 && math.Abs(got-o.want) > 1e-15 {
			t.Errorf("order %d: %g, want %g", o.order, got, o.want)
		}
		if got := sum(embedded, o.term); math.Abs(got-o.want) > 1e-15 {
			t.Errorf("embedded, order %d: %g, want %g", o.order, got, o.want)
		}
	}
	// For y' = z y with z to −∞: the first stage gives −1, and γ y1 + w (1 − 1) = 0.
	middle := -a[1][0] / a[1][1]
	if got := -(own[0] + own[1]*middle) / own[2]; math.Abs(got) > 1e-15 {
		t.Errorf("R(∞) = %g, want 0", got)
	}
}

func TestImplicitOrder(t *testing.T) {
	errorsAt := func(h float64) (end, between float64) {
		hist, st, err := IntegrateImplicit(&riccati{tolerance: 1e-3}, []float64{1},
			Options{End: 2, MaxStep: h, MaxSteps: 1e6, Accepted: goOn})
		if err != nil || st.Rejected > 0 {
			t.Fatal(err, st)
		}
		for k := range hist.Steps() {
			for s := 0.0; s <= 1; s += 0.125 {
				at := hist.Time(k) + s*(hist.Time(k+1)-hist.Time(k))
				e := math.Abs(hist.Value(k, s, 0) - 1/(1+at*at))
				between = max(between, e)
				if s == 1 {
					end = max(end, e)
				}
			}
		}
		return end, between
	}
	end1, between1 := errorsAt(0.02)
	end2, between2 := errorsAt(0.01)
	if p := math.Log2(end1 / end2); math.Abs(p-2) > 0.2 {
		t.Errorf("order %.2f from errors %g and %g, want 2 ± 0.2", p, end1, end2)
	}
	if p := math.Log2(between1 / between2); math.Abs(p-2) > 0.2 {
		t.Errorf("order %.2f between steps from errors %g and %g, want 2 ± 0.2", p, between1, between2)
	}
}

func TestImplicitAdaptive(t *testing.T) {
	for _, tol := range []float64{1e-3, 1e-4, 1e-5} {
		hist, st, err := IntegrateImplicit(&riccati{tolerance: tol}, []float64{1}, Options{End: 5, MaxStep: 5, MaxSteps: 1e5, Accepted: goOn})
		if err != nil {
			t.Fatal(err)
		}
		if hist.End() != 5 || hist.Steps() != st.Steps || st.Evaluations < 2*st.Steps {
			t.Errorf("end %g, %d steps in the history, %+v", hist.End(), hist.Steps(), st)
		}
		if got, want := hist.State(st.Steps)[0], 1.0/26; math.Abs(got-want) > 10*tol {
			t.Errorf("tolerance %g: %.12g, want %.12g to 10 tolerances", tol, got, want)
		}
	}
}

func TestImplicitEarlyEnds(t *testing.T) {
	own := errors.New("own")
	for _, c := range []struct {
		name     string
		system   riccati
		steps    int
		accepted func(float64, []float64, float64) (bool, error)
		want     error
		end      float64 // of the solution, at least
	}{
		{"stopped", riccati{tolerance: 1e-6}, 1e4, func(t float64, _ []float64, _ float64) (bool, error) { return t > 0.5, nil }, nil, 0.5},
		{"refused", riccati{tolerance: 1e-6}, 1e4, func(float64, []float64, float64) (bool, error) { return false, own }, own, 1e-9},
		{"steps", riccati{tolerance: 1e-6}, 3, goOn, ErrSteps, 1e-9},
		{"from a time", riccati{tolerance: 1e-6, fails: func(t, _ float64) error {
			if t > 0.75 {
				return own
			}
			return nil
		}}, 1e4, goOn, own, 0.75 * (1 - 1e-6)},
		{"noise", riccati{tolerance: 1e-300}, 1e4, goOn, ErrNewton, 0},
	} {
		hist, _, err := IntegrateImplicit(&c.system, []float64{1}, Options{End: 1, MaxStep: 1, MaxSteps: c.steps, Accepted: c.accepted})
		if !errors.Is(err, c.want) {
			t.Errorf("%s: error %v, want %v", c.name, err, c.want)
		}
		if end := hist.End(); !(end >= c.end && end < 1) {
			t.Errorf("%s: ended at %g, want from %g to below 1", c.name, end, c.end)
		}
	}
}

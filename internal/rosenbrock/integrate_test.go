package rosenbrock

import (
	"errors"
	"math"
	"testing"
)

// riccati is y' = −2 t y², y(0) = 1 with y = 1/(1 + t²): not linear, not autonomous.
type riccati struct {
	tolerance float64
	slope, d  float64
	fails     func(t, y float64) error
}

func (r *riccati) Rate(t float64, y, f []float64) error {
	f[0] = -2 * t * y[0] * y[0]
	if r.fails != nil {
		return r.fails(t, y[0])
	}
	return nil
}

func (r *riccati) Linearise(t, _ float64, y, f, ft []float64) error {
	r.slope, ft[0] = -4*t*y[0], -2*y[0]*y[0]
	return r.Rate(t, y, f)
}
func (r *riccati) Factor(d float64)         { r.d = d - r.slope }
func (r *riccati) Solve(b []float64)        { b[0] /= r.d }
func (r *riccati) Norm(e []float64) float64 { return math.Abs(e[0]) / r.tolerance }
func (r *riccati) Check([]float64) error    { return nil }

func goOn(float64, []float64, float64) (bool, error) { return false, nil }

// The error of steps of one length against the exact solution: of order 4 at the ends of the steps,
// and between them of order 4 too as far as a cubic can, which is asked to be above 3.
func TestObservedOrder(t *testing.T) {
	errorsAt := func(h float64) (end, between float64) {
		hist, st, err := Integrate(&riccati{tolerance: 1e9}, []float64{1},
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
	if p := math.Log2(end1 / end2); math.Abs(p-4) > 0.2 {
		t.Errorf("order %.2f from errors %g and %g, want 4 ± 0.2", p, end1, end2)
	}
	if p := math.Log2(between1 / between2); p < 3.2 {
		t.Errorf("order %.2f between steps from errors %g and %g, want above 3.2", p, between1, between2)
	}
}

func TestAdaptive(t *testing.T) {
	for _, tol := range []float64{1e-4, 1e-6, 1e-8} {
		hist, st, err := Integrate(&riccati{tolerance: tol}, []float64{1}, Options{End: 5, MaxStep: 5, MaxSteps: 1e4, Accepted: goOn})
		if err != nil {
			t.Fatal(err)
		}
		if hist.End() != 5 || hist.Steps() != st.Steps || st.Evaluations < 6*st.Steps {
			t.Errorf("end %g, %d steps in the history, %+v", hist.End(), hist.Steps(), st)
		}
		if got, want := hist.State(st.Steps)[0], 1.0/26; math.Abs(got-want) > 10*tol {
			t.Errorf("tolerance %g: %.12g, want %.12g to 10 tolerances", tol, got, want)
		}
	}
}

func TestHistoryEnds(t *testing.T) {
	hist, _, err := Integrate(&riccati{tolerance: 1e-6}, []float64{1}, Options{End: 1, MaxStep: 1, MaxSteps: 1e4, Accepted: goOn})
	if err != nil {
		t.Fatal(err)
	}
	for _, c := range []struct{ t, want float64 }{{-1, 1}, {0, 1}, {1, hist.State(hist.Steps())[0]}, {7, hist.State(hist.Steps())[0]}} {
		k, s := hist.Find(c.t)
		if got := hist.Value(k, s, 0); got != c.want {
			t.Errorf("value at %g: %g, want that of the nearest end, %g", c.t, got, c.want)
		}
	}
	for k := range hist.Steps() {
		p := hist.Cubic(k, 0)
		for _, s := range []float64{0, 0.3, 0.8, 1} {
			got, want := p[0]+s*(p[1]+s*(p[2]+s*p[3])), hist.Value(k, s, 0)
			if math.Abs(got-want) > 1e-14 {
				t.Errorf("step %d at %g: polynomial %g, want the value %g", k, s, got, want)
			}
		}
	}
}

func TestEarlyEnds(t *testing.T) {
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
		{"refused", riccati{tolerance: 1e-6}, 1e4, func(t float64, _ []float64, _ float64) (bool, error) { return false, own }, own, 1e-9},
		{"steps", riccati{tolerance: 1e-6}, 3, goOn, ErrSteps, 1e-9},
		{"at once", riccati{tolerance: 1e-6, fails: func(float64, float64) error { return own }}, 1e4, goOn, own, 0},
		{"from a time", riccati{tolerance: 1e-6, fails: func(t, _ float64) error {
			if t > 0.75 {
				return own
			}
			return nil
		}}, 1e4, goOn, own, 0.75 * (1 - 1e-6)},
		{"noise", riccati{tolerance: 1e-300}, 1e4, goOn, ErrShort, 0},
	} {
		hist, _, err := Integrate(&c.system, []float64{1}, Options{End: 1, MaxStep: 1, MaxSteps: c.steps, Accepted: c.accepted})
		if !errors.Is(err, c.want) {
			t.Errorf("%s: error %v, want %v", c.name, err, c.want)
		}
		if end := hist.End(); !(end >= c.end && end < 1) {
			t.Errorf("%s: ended at %g, want from %g to below 1", c.name, end, c.end)
		}
	}
}

func TestNoAllocationPerStep(t *testing.T) {
	allocations := func(h float64) float64 {
		return testing.AllocsPerRun(5, func() {
			_, _, err := Integrate(&riccati{tolerance: 1e9}, []float64{1}, Options{End: 2, MaxStep: h, MaxSteps: 1e6, Accepted: goOn})
			if err != nil {
				t.Fatal(err)
			}
		})
	}
	// 200 steps and 800: beside two blocks of storage and the growth of two lists nothing is added.
	few, many := allocations(0.01), allocations(0.0025)
	if many-few > 8 {
		t.Errorf("%g allocations for 200 steps and %g for 800, want at most 8 more", few, many)
	}
}

package rosenbrock

import (
	"errors"
	"math"
	"testing"
)

// Steps at given ends make the states of the run that chose them; steps of half the length make the error a sixteenth of
// what it was, by the order 4, and a quarter by the order 2 of the implicit method, against the exact solution.
func TestGivenSteps(t *testing.T) {
	var work Workspace
	for name, c := range map[string]struct {
		integrate func(System, []float64, Options) (*History, Statistics, error)
		ratio     float64
	}{"linearly implicit": {Integrate, 16}, "implicit": {IntegrateImplicit, 4}} {
		o := options(10)
		o.Work = &work
		chosen, st, err := c.integrate(&decay{}, []float64{1}, o)
		if err != nil {
			t.Fatal(err)
		}
		var same, half []float64
		for k := 1; k <= chosen.Steps(); k++ {
			same = append(same, chosen.Time(k))
			half = append(half, (chosen.Time(k-1)+chosen.Time(k))/2, chosen.Time(k))
		}
		o.Times = same
		again, st2, err := c.integrate(&decay{}, []float64{1}, o)
		if err != nil || again.Steps() != chosen.Steps() || st2.Evaluations >= st.Evaluations {
			t.Fatalf("%s: %d steps of %d (%v)", name, again.Steps(), chosen.Steps(), err)
		}
		for k := range same {
			if a, b := again.State(k)[0], chosen.State(k)[0]; again.Time(k) != chosen.Time(k) || math.Abs(a-b) > 1e-14 {
				t.Errorf("%s, step %d: %g, want %g", name, k, a, b)
			}
		}
		o.Times = half
		finer, _, err := c.integrate(&decay{}, []float64{1}, o)
		if err != nil {
			t.Fatal(err)
		}
		e1, e2 := math.Abs(again.State(again.Steps())[0]-math.Exp(-10)), math.Abs(finer.State(finer.Steps())[0]-math.Exp(-10))
		if r := e1 / e2; !(r > c.ratio/2 && r < c.ratio*2) {
			t.Errorf("%s: errors %g and %g, ratio %g, want about %g", name, e1, e2, r, c.ratio)
		}
	}
	o := options(10)
	o.Times = []float64{1, 10}
	if h, _, err := Integrate(&decay{broken: 1}, []float64{1}, o); !errors.Is(err, ErrShort) || h.Steps() != 1 {
		t.Errorf("a step without a number: %d steps, %v", h.Steps(), err)
	}
}

func options(end float64) Options {
	return Options{End: end, MaxStep: end, MaxSteps: 1000, Accepted: func(float64, []float64, float64) (bool, error) { return false, nil }}
}

// decay is y' = −y, with a tolerance of 1e-4.
type decay struct {
	d      float64
	broken float64 // time beyond which there is no rate; 0: none
}

func (s *decay) Rate(t float64, y, f []float64) error {
	f[0] = -y[0]
	if s.broken > 0 && t > s.broken {
		f[0] = math.NaN()
	}
	return nil
}

func (s *decay) Linearise(t, _ float64, y, f, ft []float64) error {
	ft[0] = 0
	return s.Rate(t, y, f)
}
func (s *decay) Factor(d float64)         { s.d = d + 1 }
func (s *decay) Solve(b []float64)        { b[0] /= s.d }
func (s *decay) Norm(e []float64) float64 { return math.Abs(e[0]) / 1e-4 }
func (s *decay) Check([]float64) error    { return nil }

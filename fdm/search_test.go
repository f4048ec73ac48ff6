package fdm_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// The reference problems, but for that which melts, to the accuracy that is asked for, at their places and times.
func TestAccuracy(t *testing.T) {
	for _, name := range []string{"P1", "P2", "P4"} {
		for _, accuracy := range []float64{1, 0.1, 0.01, 1e-3} {
			p := steelSphere(0)
			if name != "P2" {
				p = referenceProblems(0)[name]
			}
			p.Accuracy = units.KelvinDifference.Of(accuracy)
			s := solve(t, p)
			if e, err := s.LargestError(); err != nil || !(e.SI() <= accuracy) {
				t.Errorf("%s to %g K: largest error %v (%v)", name, accuracy, e, err)
			}
			for place, over := range referenceValues(t, name) {
				for time, want := range over {
					if got := at(t, s, place, time); !near(got, want, accuracy) {
						t.Errorf("%s to %g K: %v at %g s: %.7f K, want %.7f K", name, accuracy, place, time, got, want)
					}
				}
			}
			t.Logf("%s to %g K: %+v", name, accuracy, s.Statistics())
		}
	}
}

// Without an accuracy a solution of a body that melts is given with a warning where 10 mK is out of reach; an accuracy that
// was asked for and is not met is an error beside a solution that can be read.
func TestAccuracyOutOfReach(t *testing.T) {
	s := solve(t, referenceProblems(0)["P3"])
	if e, err := s.LargestError(); err != nil || e.SI() < 0.01 || len(s.Derivation().Warnings) == 0 {
		t.Errorf("freezing: largest error %v (%v), warnings %v", e, err, s.Derivation().Warnings)
	}
	p := scaled(10, 0)
	p.Horizon, p.Accuracy = seconds(1e-7), units.KelvinDifference.Of(1e-5) // heat comes a millionth of the radius far
	s = solve(t, p)
	exact := 300 + 100*(1-2*10*math.Sqrt(1e-11/math.Pi)) // of a semi-infinite body, H. S. Carslaw and J. C. Jaeger, 2nd ed., section 2.7 (from memory), to Bi² Fo = 1e-9
	if got := at(t, s, shape.Surface(), 1e-7); !near(got, exact, 1e-5) {
		t.Errorf("in the first moment: %.9f K, want %.9f K", got, exact)
	}
	p.Uniform = true
	s, err := p.Solve(t.Context())
	var e *units.ConvergenceError
	if !errors.As(err, &e) || s == nil || !near(at(t, s, shape.Centre(), 1e-7), 400, 1e-9) {
		t.Fatalf("a boundary layer below any cell: %v", err)
	}
	var none *fdm.Solution
	var a *units.ArgumentError
	if _, err := none.LargestError(); !errors.As(err, &a) {
		t.Errorf("no solution: %v", err)
	}
	for name, change := range map[string]func(p *fdm.Problem){
		"cells":     func(p *fdm.Problem) { p.Cells = 20 },
		"tolerance": func(p *fdm.Problem) { p.Tolerance = units.KelvinDifference.Of(1e-3) },
		"smallest":  func(p *fdm.Problem) { p.Smallest = metres(1e-3) },
		"scheme":    func(p *fdm.Problem) { p.Scheme, p.TimeStep = fdm.Implicit, seconds(100) },
		"too small": func(p *fdm.Problem) { p.Accuracy = units.KelvinDifference.Of(1e-7) },
		"too large": func(p *fdm.Problem) { p.Accuracy = units.KelvinDifference.Of(11) },
		"negative":  func(p *fdm.Problem) { p.Accuracy = units.KelvinDifference.Of(-1) },
		"no number": func(p *fdm.Problem) { p.Accuracy = units.KelvinDifference.Of(math.NaN()) },
	} {
		p := scaled(1, 0)
		p.Accuracy = units.KelvinDifference.Of(0.1)
		change(&p)
		if _, err := p.Solve(t.Context()); !errors.As(err, &a) || a.Field != "accuracy" {
			t.Errorf("%s beside an accuracy: %v", name, err)
		}
	}
}

// What is extrapolated is consistent: the end of a solution by an event, the time to a temperature, the heat against the mean.
func TestExtrapolationIsConsistent(t *testing.T) {
	p := scaled(3, 16) // a grid that shows
	p.Stop = []fdm.Event{fdm.Reaches(shape.Centre(), kelvin(350))}
	s := solve(t, p)
	if T := at(t, s, shape.Centre(), s.Horizon().SI()); !near(T, 350, 1e-8) {
		t.Errorf("ended by 350 K at %.10g K", T)
	}
	for _, place := range []shape.Place{shape.Centre(), shape.Surface(), below(0.63), shape.Mean()} {
		time, err := s.TimeTo(place, kelvin(360))
		if err != nil || !near(at(t, s, place, time.SI()), 360, 1e-8) {
			t.Errorf("%v at 360 K after %v (%v)", place, time, err)
		}
	}
	depths, err := s.Front(kelvin(360), seconds(1500))
	if err != nil || len(depths) != 1 || !near(at(t, s, shape.Below(depths[0]), 1500), 360, 1e-8) {
		t.Errorf("360 K at depths %v (%v)", depths, err)
	}
	q, err := s.Flux(shape.Surface(), seconds(1000))
	if want := 30 * (at(t, s, shape.Surface(), 1000) - 300); err != nil || !near(q.SI(), want, 1e-6*want) {
		t.Errorf("flux %v (%v), want %g W/m²", q, err, want)
	}
	capacity := 1e6 * p.Body.Volume().SI()
	if got, want := heat(t, s, 1000), capacity*(400-at(t, s, shape.Mean(), 1000)); !near(got, want, 1e-9*want) {
		t.Errorf("heat %g J, by the mean %g J", got, want)
	}
	wall := referenceProblems(24)["P4"]
	s = solve(t, wall)
	perArea := 7850*600*0.01 + 300*1000*0.05 + 2300*900*0.1
	if got, want := heat(t, s, 5000), perArea*(293.15-at(t, s, shape.Mean(), 5000))*wall.Body.Volume().SI()/0.16; !near(got, want, -1e-9*want) {
		t.Errorf("heat of the wall %g J, by its mean %g J", got, want)
	}
}

package fdm_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// An isotherm is where At says that temperature is; from both faces of a plate there are two, at like depths.
func TestIsotherms(t *testing.T) {
	p := scaled(5, 41)
	p.Body, p.Opposite = sheet(0.2), constant(50, 300)
	s := solve(t, p)
	for _, time := range []float64{300, 500, 2000} {
		fronts, err := s.Front(kelvin(350), seconds(time))
		if err != nil || len(fronts) != 2 {
			t.Fatalf("fronts %v after %g s (%v), want two", fronts, time, err)
		}
		if sum := fronts[0].SI() + fronts[1].SI(); !near(sum, 0.2, 1e-4) {
			t.Errorf("after %g s: fronts %v, want them at like depths", time, fronts)
		}
		for _, front := range fronts {
			if T := at(t, s, shape.Below(front), time); !near(T, 350, 1e-6) {
				t.Errorf("%g K at the front %v after %g s", T, front, time)
			}
		}
	}
	for _, T := range []float64{299, 401} {
		if fronts, err := s.Front(kelvin(T), seconds(500)); err != nil || len(fronts) != 0 {
			t.Errorf("fronts of %g K: %v (%v), want none", T, fronts, err)
		}
	}
	var a *units.ArgumentError
	if _, err := s.Front(kelvin(-1), seconds(500)); !errors.As(err, &a) {
		t.Errorf("%v, want an ArgumentError", err)
	}
	if _, err := s.Front(kelvin(350), seconds(-1)); !errors.As(err, &a) {
		t.Errorf("%v, want an ArgumentError", err)
	}
	if _, err := s.FrontHistory(kelvin(math.NaN())); !errors.As(err, &a) {
		t.Errorf("%v, want an ArgumentError", err)
	}
}

// In a transition that spreads over many cells the front is the isotherm.
func TestFrontOfAWideTransition(t *testing.T) {
	p := referenceProblems(100)["P3"]
	s := solve(t, p)
	for _, T := range []float64{271.7, 272, 272.4} {
		for _, time := range []float64{6000, 9000} {
			fronts, err := s.Front(kelvin(T), seconds(time))
			if err != nil || len(fronts) != 1 {
				t.Errorf("fronts of %g K after %g s: %v (%v), want one", T, time, fronts, err)
			} else if got := at(t, s, shape.Below(fronts[0]), time); !near(got, T, 1e-6) {
				t.Errorf("%g K at the front of %g K after %g s, %v", got, T, time, fronts[0])
			}
		}
	}
}

// A temperature that neither side of a contact has lies where the layers meet.
func TestFrontInContact(t *testing.T) {
	p := fdm.Problem{
		Body: sheet(0.02), Initial: kelvin(300), Surface: boundary.Temperature(kelvin(500)), Opposite: boundary.Temperature(kelvin(300)), Horizon: units.Day.Of(1),
		Layers: []fdm.Layer{
			{Material: plain{1000, 1000, 10}, Thickness: metres(0.005), Contact: units.SquareMetreKelvinPerWatt.Of(0.1)}, {Material: plain{1000, 1000, 10}, Thickness: metres(0.015)},
		},
	}
	fronts, err := solve(t, p).Front(kelvin(400), p.Horizon)
	if err != nil || len(fronts) != 1 || !near(fronts[0].SI(), 0.005, 1e-12) {
		t.Errorf("front at %v (%v), want 5 mm", fronts, err)
	}
}

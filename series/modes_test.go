package series_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// Printed tables of first roots and coefficients, to half a unit of the last digit.
func TestModesPublished(t *testing.T) {
	const cengel = "Y. A. Çengel, Heat and Mass Transfer, 6th ed., table 4-2"
	for _, c := range []struct {
		family  shape.Family
		bi      float64
		zeta, c float64
		source  string
	}{
		{shape.Planar, 0.01, 0.0998, 1.0017, cengel},
		{shape.Planar, 10, 1.4289, 1.2620, cengel},
		{shape.Cylindrical, 0.01, 0.1412, 1.0025, cengel},
		{shape.Spherical, 1, 1.5708, 1.2732, cengel},
		{shape.Spherical, 0.1, 0.5423, 1.0298, cengel},
	} {
		m, err := series.NewModes(c.family, c.bi)
		if err != nil {
			t.Fatal(err)
		}
		got := m.Term(1)
		if !(math.Abs(got.Root-c.zeta) <= 5e-5 && math.Abs(got.Coefficient-c.c) <= 5e-5) {
			t.Errorf("family %v, Bi %v: %v and %v, want %v and %v (%s)", c.family, c.bi, got.Root, got.Coefficient, c.zeta, c.c, c.source)
		}
	}
}

// The coefficients of the start add up to 1 for the mean, and the functions agree with the temperatures of a body.
func TestModes(t *testing.T) {
	for _, stone := range singles() {
		s := solve(t, stone.problem)
		m, err := series.NewModes(stone.problem.Body.Family(), s.Biot())
		if err != nil {
			t.Fatal(err)
		}
		if m.Biot() != s.Biot() {
			t.Errorf("Biot number %v, want %v", m.Biot(), s.Biot())
		}
		total := 0.0
		for n := 1; n <= 4000; n++ {
			total += m.Term(n).Mean
		}
		if !(math.Abs(total-1) <= 2e-4) { // the terms left out come to 6/(π² 4000) at most
			t.Errorf("%s, Bi %v: the coefficients of the mean add up to %v", stone.name, s.Biot(), total)
		}
		for _, seconds := range []float64{0.3, 5, 100} {
			fo := s.Fourier(units.Second.Of(seconds))
			for x, place := range map[float64]shape.Place{0: shape.Centre(), 0.625: shape.Below(units.Millimetre.Of(3)), 1: shape.Surface()} {
				theta := m.Theta(x, fo)
				if got, want := 293.15+70*theta, kelvins(t, s, place, seconds); !(math.Abs(got-want) <= rounded) {
					t.Errorf("%s, Bi %v, x %v, Fo %v: %v K, want %v", stone.name, s.Biot(), x, fo, got, want)
				}
				if theta > 1e-9 && theta < 1-1e-9 {
					if got := m.Theta(x, m.Fourier(x, theta)); !(math.Abs(got-theta) <= 1e-12) {
						t.Errorf("%s, Bi %v, x %v: θ %v comes back as %v", stone.name, s.Biot(), x, theta, got)
					}
				}
			}
			if got, want := 293.15+70*m.Mean(fo), kelvins(t, s, shape.Mean(), seconds); !(math.Abs(got-want) <= rounded) || !(math.Abs(m.Mean(fo)+m.Loss(fo)-1) <= 1e-14) {
				t.Errorf("%s, Bi %v, Fo %v: mean %v K, want %v; loss %v", stone.name, s.Biot(), fo, got, want, m.Loss(fo))
			}
		}
		first := m.Term(1)
		theta, mean := m.OneTerm(1, 0.5)
		if decay := math.Exp(-first.Root * first.Root / 2); !(math.Abs(theta-first.Surface*decay) <= 1e-15 && math.Abs(mean-first.Mean*decay) <= 1e-15) {
			t.Errorf("%s, Bi %v: first term %v and %v, want %v and %v", stone.name, s.Biot(), theta, mean, first.Surface*decay, first.Mean*decay)
		}
		if b := m.ErrorBound(0.1); !(b > 0 && b <= 1e-14) {
			t.Errorf("%s, Bi %v: error bound %v", stone.name, s.Biot(), b)
		}
	}
}

func TestModesBadInput(t *testing.T) {
	var argument *units.ArgumentError
	for _, family := range []shape.Family{shape.Unknown, shape.HollowSpherical, shape.HollowCylindrical, shape.Compact, 99} {
		if _, err := series.NewModes(family, 1); !errors.As(err, &argument) {
			t.Errorf("family %v: %v, want an ArgumentError", family, err)
		}
	}
	for _, bi := range []float64{-1, math.NaN(), math.Inf(-1)} {
		if _, err := series.NewModes(shape.Planar, bi); !errors.As(err, &argument) {
			t.Errorf("Bi %v: %v, want an ArgumentError", bi, err)
		}
	}
	m, err := series.NewModes(shape.Planar, 1)
	if err != nil {
		t.Fatal(err)
	}
	var none series.Modes
	one, _ := m.OneTerm(-1, 1)
	for i, got := range []float64{
		none.Biot(), none.Theta(0, 1), none.Mean(1), none.Loss(1), none.Fourier(0, 0.5), none.ErrorBound(1), none.Term(1).Root,
		m.Theta(-0.1, 1), m.Theta(1.1, 1), m.Theta(math.NaN(), 1), m.Theta(0, -1), m.Theta(0, math.NaN()), m.Mean(-1), m.Loss(-1),
		m.Fourier(0, 0), m.Fourier(0, 1), m.Fourier(2, 0.5), m.ErrorBound(-1), m.Term(0).Root, m.Term(-5).Mean, m.Term(1e6 + 1).Coefficient, one,
	} {
		if !math.IsNaN(got) {
			t.Errorf("row %d: %v, want NaN", i, got)
		}
	}
}

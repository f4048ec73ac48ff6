package lumped

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/internal/physics"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// hump warms from 300 K by 0.1 K/s − t·2e-4 K/s² for 2000 s: T = 300 + 0.1 t − 1e-4 t², at its top, 325 K, after 500 s.
func hump() Problem {
	return Problem{
		Body: sphere(0.006), Material: constantStuff(2000, 1000, 30), Initial: kelvin(300), Horizon: seconds(2000),
		Surface: flux(func(t, _ float64) float64 { return -200 + 0.4*t }),
	}
}

// A course that comes back crosses twice, and is in a band twice: by hand.
func TestCrossingsOfAHump(t *testing.T) {
	s := solve(t, hump())
	root := func(d float64) float64 { return 500 * math.Sqrt(1-d/25) } // T = 300 + d at 500 ± that
	all, err := s.Crossings(shape.Centre(), kelvin(316))
	if err != nil || len(all) != 2 || !all[0].Rising || all[1].Rising {
		t.Fatal(all, err)
	}
	within(t, "up", all[0].Time.SI(), 500-root(16), 1e-9)
	within(t, "down", all[1].Time.SI(), 500+root(16), 1e-9)
	stays, err := s.Within(shape.Centre(), kelvin(305), kelvin(316))
	if err != nil || len(stays) != 2 {
		t.Fatal(stays, err)
	}
	for i, want := range []float64{500 - root(5), 500 - root(16), 500 + root(16), 500 + root(5)} {
		got := stays[i/2].From
		if i%2 == 1 {
			got = stays[i/2].To
		}
		within(t, "end of a stay", got.SI(), want, 1e-9)
	}
	rates, err := s.RateCrossings(units.KelvinPerSecond.Of(0.02))
	if err != nil || len(rates) != 1 || rates[0].Rising {
		t.Fatal(rates, err)
	}
	within(t, "rate", rates[0].Time.SI(), 400, 1e-9)
	rate, err := s.Rate(seconds(1500))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "rate", rate.SI(), -0.2, 1e-12)
	if none, err := s.Crossings(shape.Centre(), kelvin(330)); err != nil || len(none) != 0 {
		t.Errorf("above the top: %v, %v", none, err)
	}
	if none, err := s.Crossings(shape.Centre(), kelvin(1e6)); err != nil || len(none) != 0 {
		t.Errorf("beyond the material: %v, %v", none, err)
	}
	if whole, err := s.Within(shape.Centre(), kelvin(1), kelvin(1000)); err != nil || len(whole) != 1 || whole[0].To != seconds(2000) {
		t.Errorf("always in the band: %v, %v", whole, err)
	}
	if none, err := s.Within(shape.Centre(), kelvin(400), kelvin(500)); err != nil || len(none) != 0 {
		t.Errorf("never in the band: %v, %v", none, err)
	}
}

// A closed form holds for all time, and so does its stay in a band about its limit.
func TestStaysOfAClosedForm(t *testing.T) {
	s := solve(t, closedCases()["constant h"]) // 400 K to 300 K with τ = 200 s
	stays, err := s.Within(shape.Centre(), kelvin(290), kelvin(310))
	if err != nil || len(stays) != 1 || stays[0].To.SI() != math.MaxFloat64 {
		t.Fatal(stays, err)
	}
	within(t, "enters", stays[0].From.SI(), 200*math.Log(10), 1e-9)
	rates, err := s.RateCrossings(units.KelvinPerSecond.Of(-0.1)) // 0.5 K/s at the start
	if err != nil || len(rates) != 1 || !rates[0].Rising {
		t.Fatal(rates, err)
	}
	within(t, "slower than 0.1 K/s", rates[0].Time.SI(), 200*math.Log(5), 1e-9)
	if all, err := s.Crossings(shape.Centre(), kelvin(300)); err != nil || len(all) != 0 {
		t.Errorf("the limit is crossed: %v, %v", all, err)
	}
}

// The time constant: ρ c (V/A)/h where h is constant; for a power law that of the slope, (1 + n) h; for radiation that of 4 ε σ T³.
func TestTimeConstant(t *testing.T) {
	cases := closedCases()
	for _, c := range []struct {
		name string
		want func(kelvin float64) float64
	}{
		{"constant h", func(float64) float64 { return 200 }},
		{"all that move", func(float64) float64 { return 2000.0 / 12 }},
		{"natural convection", func(T float64) float64 { return 2000 / (1.25 * 8 * math.Pow((T-300)/50, 0.25)) }},
		{"radiation, cooling", func(T float64) float64 { return 2000 / (4 * 0.8 * physics.StefanBoltzmann * T * T * T) }},
		{"first order in the Biot number", func(float64) float64 { return 2000 * (1.0/50 + 0.003/5/0.5) }},
	} {
		s := solve(t, cases[c.name])
		general := solve(t, notClosed(cases[c.name], 1e-6))
		for _, x := range []float64{0, 100, 1000} {
			at, _ := s.Mean(seconds(x))
			tau, err := s.TimeConstant(seconds(x))
			if err != nil {
				t.Fatal(c.name, err)
			}
			within(t, c.name, tau.SI(), c.want(at.SI()), 1e-9*c.want(at.SI()))
			tau, err = general.TimeConstant(seconds(x))
			if err != nil {
				t.Fatal(c.name, err)
			}
			within(t, c.name+", by difference", tau.SI(), c.want(at.SI()), 1e-4*c.want(at.SI()))
		}
	}
	var convergence *units.ConvergenceError
	if _, err := solve(t, hump()).TimeConstant(seconds(1)); !errors.As(err, &convergence) {
		t.Errorf("an exchange that does not depend on the temperature: %v", err)
	}
}

// Questions that cannot be asked, of every kind of solution.
func TestNewQuestionsThatCannotBe(t *testing.T) {
	cases := closedCases()
	for name, s := range map[string]*Solution{
		"law": solve(t, cases["constant h"]), "moving": solve(t, cases["log"]), "integrated": solve(t, hump()),
		"first order": solve(t, cases["first order in the Biot number"]), "zero": {}, "nil": nil,
	} {
		refused := func(what string, err error) {
			t.Helper()
			var argument *units.ArgumentError
			if !errors.As(err, &argument) {
				t.Errorf("%s, %s: %v, want an argument error", name, what, err)
			}
		}
		for _, bad := range []float64{-1, math.NaN(), math.Inf(1)} {
			_, err := s.Rate(seconds(bad))
			refused("Rate", err)
			_, err = s.TimeConstant(seconds(bad))
			refused("TimeConstant", err)
			_, err = s.InternalDifference(seconds(bad))
			refused("InternalDifference", err)
		}
		_, err := s.RateCrossings(units.KelvinPerSecond.Of(math.NaN()))
		refused("RateCrossings", err)
		for _, place := range []shape.Place{{}, shape.Below(units.Metre.Of(1)), shape.Opposite()} {
			_, err = s.Crossings(place, kelvin(320))
			refused("Crossings", err)
			_, err = s.Within(place, kelvin(320), kelvin(330))
			refused("Within", err)
		}
		_, err = s.Crossings(shape.Centre(), kelvin(math.NaN()))
		refused("Crossings", err)
		_, err = s.Within(shape.Centre(), kelvin(330), kelvin(320))
		refused("Within", err)
		_, err = s.Within(shape.Centre(), kelvin(math.NaN()), kelvin(320))
		refused("Within", err)
		_, err = s.At(shape.Slowest(), seconds(1))
		refused("At the slowest place", err)
		s.LumpingErrorIsBound()
	}
	moving := solve(t, cases["log"])
	var argument *units.ArgumentError
	if _, err := moving.LumpingErrorInTime(shape.Centre(), kelvin(350)); !errors.As(err, &argument) {
		t.Errorf("lumping error in time under an ambient that moves: %v", err)
	}
	s := solve(t, Problem{
		Body: shape.Capsule(units.Metre.Of(0.02), units.Metre.Of(0.05)), Material: constantStuff(1000, 1000, 1), Initial: kelvin(400),
		Surface: constant(10, 300), FirstOrder: true,
	})
	if _, err := s.At(shape.Below(units.Metre.Of(0.001)), seconds(1)); !errors.As(err, &argument) {
		t.Errorf("a depth in a capsule to first order: %v", err)
	}
	if s.LumpingErrorIsBound() {
		t.Error("a bound for a capsule")
	}
	if e, err := s.LumpingError(shape.Centre()); err != nil || !(e.SI() > 0) {
		t.Errorf("capsule: %v, %v", e, err)
	}
}

// Faces that differ: a plate with T∞ = 300 K and h = 10 in front, 360 K and 30 behind, comes to the mean by the coefficients.
func TestFacesThatDiffer(t *testing.T) {
	p := Problem{
		Body: shape.Plate(units.Millimetre.Of(4), units.SquareMetre.Of(0.1)), Material: constantStuff(2000, 1000, 30), Initial: kelvin(320),
		Surface: constant(10, 300), Opposite: constant(30, 360),
	}
	s := solve(t, p)
	within(t, "limit", s.limit, 345, 1e-9)
	tau, err := s.TimeConstant(seconds(0))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "τ", tau.SI(), 2000*1000*0.004/40, 1e-9)
	within(t, "Biot number of the whole wall at the larger h", s.Biot().Conduction, 30*0.004/30, 1e-12)
	if s.LumpingErrorIsBound() {
		t.Error("a bound for faces that differ")
	}
	p.Body = shape.Tube(units.Millimetre.Of(30), units.Millimetre.Of(20), units.Metre.Of(1)) // areas as 3 to 2
	within(t, "limit of a tube", solve(t, p).limit, (30*300+60*360)/90.0, 1e-9)
	p.Body = p.Body.Exposing(shape.Inside) // the surface is then the inside
	within(t, "limit of a tube from inside", solve(t, p).limit, (20*300+90*360)/110.0, 1e-9)
	p.Body = shape.Cylinder(units.Millimetre.Of(30), units.Millimetre.Of(5)).Exposing(shape.Ends)
	within(t, "limit of a disc", solve(t, p).limit, 345, 1e-9)
	p.Surface, p.Opposite = boundary.Radiation(0.5, kelvin(300)), boundary.Radiation(1, kelvin(400))
	within(t, "limit of two radiators", solve(t, p).limit, math.Pow((0.5*math.Pow(300, 4)+math.Pow(400, 4))/1.5, 0.25), 1e-9)
}

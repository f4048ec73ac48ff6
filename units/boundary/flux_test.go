package boundary_test

import (
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// The slope is the derivative of the flux, by Richardson-extrapolated central differences, and the flux
// falls to zero where the condition says that it rests.
func TestSlopeIsTheDerivative(t *testing.T) {
	f := func(a, b, c, d, e float64) bool {
		part := func(x float64) float64 { return 0.5 + 0.5*math.Sin(x) } // 0 to 1
		h, ambient := units.WattPerSquareMetreKelvin.Of(1+100*part(a)), units.Kelvin.Of(250+400*part(b))
		wall := 300 + 900*part(c)
		if math.Abs(wall-ambient.SI()) < 40 { // where the power law bends too sharply for differences
			wall += 80
		}
		law := boundary.Power(h, units.KelvinDifference.Of(1+99*part(d)), 2*part(e), ambient)
		radiation := boundary.Radiation(part(d), ambient)
		for _, condition := range []boundary.Condition{
			boundary.Constant(h, ambient), law, radiation, boundary.Flux(units.WattPerSquareMetre.Of(1e4 * part(a))),
			boundary.Following(h, boundary.Ramp(ambient, units.KelvinPerSecond.Of(0.1))),
			boundary.Sum(law, boundary.Sum(radiation, boundary.Constant(h, ambient))),
		} {
			q := func(T float64) float64 {
				q, err := condition.Flux(units.Second.Of(7), units.Kelvin.Of(T))
				if err != nil {
					t.Errorf("%v: %v", condition, err)
				}
				return q.SI()
			}
			const step = 0.25
			coarse, fine := (q(wall+step)-q(wall-step))/(2*step), (q(wall+step/2)-q(wall-step/2))/step
			want := (4*fine - coarse) / 3
			slope, ok := condition.Slope(units.Kelvin.Of(wall))
			if !ok || !condition.ByConstants() || math.Abs(slope.SI()-want) > 1e-7*math.Abs(want)+1e-10*math.Abs(q(wall)) {
				t.Logf("%v at %g K: slope %v, %t; want %g", condition, wall, slope, ok, want)
				return false
			}
			if rest, ok := condition.Rest(); ok && q(rest.SI()) != 0 {
				t.Logf("%v: flux %g W/m² at rest, want 0", condition, q(rest.SI()))
				return false
			}
		}
		return true
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
	own := boundary.Function(func(units.Duration, units.Temperature) (units.HeatFlux, error) { return units.HeatFlux{}, nil })
	if _, ok := own.Slope(units.Celsius.Of(20)); ok || own.ByConstants() || boundary.Sum(own).ByConstants() {
		t.Error("a function has a slope that nobody stated")
	}
	if _, ok := (boundary.Condition{}).Slope(units.Celsius.Of(20)); ok || (boundary.Condition{}).ByConstants() || boundary.Sum().ByConstants() {
		t.Error("no condition has a slope")
	}
}

// Fluxes by hand: the power law at its own difference and at 16 times that, radiation of a black body
// (σ of CODATA 2018 · 500⁴), and a sum.
func TestFluxByHand(t *testing.T) {
	h, at := units.WattPerSquareMetreKelvin.Of(5), units.KelvinDifference.Of(20)
	cold := units.Kelvin.Of(1e-9)
	for _, c := range []struct {
		name      string
		condition boundary.Condition
		wall      float64 // K
		want      float64 // W/m²
	}{
		{"power law at its difference", boundary.Power(h, at, 0.25, units.Kelvin.Of(280)), 300, 100},
		{"power law, 16 times", boundary.Power(h, at, 0.25, units.Kelvin.Of(280)), 600, 5 * 2 * 320},
		{"power law, heating", boundary.Power(h, at, 0.25, units.Kelvin.Of(600)), 280, -5 * 2 * 320},
		{"black body", boundary.Radiation(1, cold), 500, 5.670374419e-8 * 6.25e10},
		{"sum", boundary.Sum(boundary.Power(h, at, 0.25, units.Kelvin.Of(280)), boundary.Flux(units.WattPerSquareMetre.Of(-30))), 300, 70},
		{"ramp", boundary.Following(h, boundary.Ramp(units.Kelvin.Of(280), units.KelvinPerSecond.Of(2))), 310, 5 * (310 - 300)},
	} {
		q, err := c.condition.Flux(units.Second.Of(10), units.Kelvin.Of(c.wall))
		if err != nil || math.Abs(q.SI()-c.want) > 1e-12*(1+math.Abs(c.want)) {
			t.Errorf("%s: %v, %v; want %g W/m² to 1e-12", c.name, q, err, c.want)
		}
	}
}

func TestAccessors(t *testing.T) {
	h, T := units.WattPerSquareMetreKelvin.Of(5), units.Celsius.Of(20)
	course := boundary.Ramp(T, units.KelvinPerSecond.Of(1))
	if got, ambient, ok := boundary.Following(h, course).Following(); !ok || got != h || ambient.String() != course.String() {
		t.Errorf("following comes back as %v, %v, %t", got, ambient, ok)
	}
	if got, at, n, ambient, ok := boundary.Power(h, units.KelvinDifference.Of(3), 0.3, T).Power(); !ok || got != h || at.SI() != 3 || n != 0.3 || ambient != T {
		t.Errorf("power law comes back as %v, %v, %g, %v, %t", got, at, n, ambient, ok)
	}
	if e, around, ok := boundary.Radiation(0.7, T).Radiation(); !ok || e != 0.7 || around != T {
		t.Errorf("radiation comes back as %g, %v, %t", e, around, ok)
	}
	for _, c := range []boundary.Condition{boundary.Temperature(T), boundary.TemperatureFollowing(boundary.Steady(T))} {
		surface, ok := c.SurfaceCourse()
		if got, err := surface.At(units.Hour.Of(1)); !ok || err != nil || got != T {
			t.Errorf("%v: surface course %v, %t, %v", c, got, ok, err)
		}
	}
	wind := boundary.Constant(h, T)
	wave := boundary.Oscillation(T, units.KelvinDifference.Of(1), units.Hour.Of(1), units.Duration{})
	for _, c := range []struct {
		condition boundary.Condition
		courses   int
		moves     bool
	}{
		{wind, 0, false},
		{boundary.Temperature(T), 0, false},
		{boundary.Following(h, boundary.Steady(T)), 1, false},
		{boundary.Following(h, wave), 1, true},
		{boundary.TemperatureFollowing(wave), 1, true},
		{boundary.Sum(wind, boundary.Following(h, boundary.Steady(T)), boundary.Following(h, wave)), 2, true},
		{boundary.Condition{}, 0, false},
	} {
		if n := len(c.condition.Courses()); n != c.courses || c.condition.Moves() != c.moves {
			t.Errorf("%v: %d courses, moves %t; want %d, %t", c.condition, n, c.condition.Moves(), c.courses, c.moves)
		}
	}
	if _, ok := wind.SurfaceCourse(); ok {
		t.Error("a coefficient states no surface temperature")
	}
	if parts := boundary.Sum(wind, boundary.Sum(wind, wind)).Parts(); len(parts) != 3 {
		t.Errorf("a sum of three has %d parts", len(parts))
	}
	if parts := wind.Parts(); len(parts) != 1 {
		t.Errorf("one condition has %d parts", len(parts))
	}
	for _, c := range []boundary.Condition{boundary.Constant(units.HeatTransferCoefficient{}, T), boundary.Radiation(0, T), boundary.Flux(units.HeatFlux{}), {}} {
		if at, ok := c.Rest(); ok {
			t.Errorf("%v: rests at %v, want nowhere", c, at)
		}
	}
}

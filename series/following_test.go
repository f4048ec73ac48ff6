package series_test

import (
	"errors"
	"math"
	"math/rand"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

func followed(t testing.TB, s *series.Solution, place shape.Place, course boundary.Course, seconds float64) float64 {
	t.Helper()
	T, err := s.Following(place, course, units.Second.Of(seconds))
	if err != nil {
		t.Fatal(err)
	}
	return T.SI()
}

// exposures are the conditions of the tests of varying ambients.
var exposures = []boundary.Condition{
	boundary.Constant(units.WattPerSquareMetreKelvin.Of(0), units.Celsius.Of(20)),
	boundary.Constant(units.WattPerSquareMetreKelvin.Of(20), units.Celsius.Of(20)),
	boundary.Constant(units.WattPerSquareMetreKelvin.Of(3000), units.Celsius.Of(20)),
	boundary.Temperature(units.Celsius.Of(20)),
}

// An ambient that stays is the problem itself; a ramp, alone or as a log, of a body of one coordinate is its closed form.
func TestFollowingAgreesWithTheClosedForms(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	ramp := boundary.Ramp(celsius(20), units.KelvinPerSecond.Of(0.3))
	log := boundary.Log([]units.Duration{second(-10), second(0), second(100), second(400)}, []units.Temperature{celsius(17), celsius(20), celsius(50), celsius(140)})
	for _, stone := range stones() {
		for _, surface := range exposures {
			p := stone.problem
			p.Surface = surface
			s := solve(t, p)
			for _, place := range places {
				for _, seconds := range []float64{0, 1e-3, 0.5, 2.9, 3.3, 40, 390} {
					if got, want := followed(t, s, place, boundary.Steady(celsius(20)), seconds), kelvins(t, s, place, seconds); !(math.Abs(got-want) <= 1e-11) {
						t.Errorf("%s, %v, %s after %v s: %.13g K, want %.13g", stone.name, surface, place, seconds, got, want)
					}
					a, b := followed(t, s, place, ramp, seconds), followed(t, s, place, log, seconds)
					if !(math.Abs(a-b) <= 1e-10) {
						t.Errorf("%s, %v, %s after %v s: ramp %.13g K, log %.13g", stone.name, surface, place, seconds, a, b)
					}
					if stone.problem.Body.Family() == shape.Compact {
						continue
					}
					want, err := s.Ramp(place, units.KelvinPerSecond.Of(0.3), second(seconds))
					if err != nil || !(math.Abs(a-want.SI()) <= 1e-10) {
						t.Errorf("%s, %v, %s after %v s: ramp %.13g K, closed form %.13g, %v", stone.name, surface, place, seconds, a, want.SI(), err)
					}
				}
			}
		}
	}
}

// Duhamel's integral by quadrature of the temperatures after a step, for a sine and for a log with a step in it.
func TestFollowingIsDuhamelsIntegral(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	const mean, amplitude, period, lag = 310, 25.0, 13.0, 4.0
	sine := boundary.Oscillation(units.Kelvin.Of(mean), units.KelvinDifference.Of(amplitude), second(period), second(lag))
	log := boundary.Log([]units.Duration{second(0), second(2), second(2), second(30)}, []units.Temperature{celsius(20), celsius(26), celsius(60), celsius(60)})
	omega := 2 * math.Pi / period
	for _, stone := range stones() {
		for _, surface := range exposures[1:] {
			p := stone.problem
			p.Surface = surface
			s := solve(t, p)
			for _, place := range places {
				theta := func(age float64) float64 { return (kelvins(t, s, place, math.Max(0, age)) - 293.15) / 70 }
				for _, seconds := range []float64{0.2, 2.5, 30} {
					// of the rate of the ambient, over the root of the age
					integral := func(rate func(at float64) float64, from, to float64) float64 {
						total, hi := 0.0, math.Sqrt(seconds-from)
						for lo := math.Sqrt(seconds - to); hi > lo && hi > 1e-8; {
							next := math.Max(lo, hi/2)
							total += quad.Fixed(func(u float64) float64 { return 2 * u * rate(seconds-u*u) * theta(u*u) }, next, hi, 16, quad.Legendre{}, 0)
							hi = next
						}
						return total
					}
					start := mean + amplitude*math.Sin(-omega*lag)
					want := mean + amplitude*math.Sin(omega*(seconds-lag)) + (363.15-start)*theta(seconds) -
						integral(func(at float64) float64 { return amplitude * omega * math.Cos(omega*(at-lag)) }, 0, seconds)
					if got := followed(t, s, place, sine, seconds); !(math.Abs(got-want) <= 1e-9) {
						t.Errorf("%s, %v, %s after %v s: sine %.13g K, by Duhamel's integral %.13g", stone.name, surface, place, seconds, got, want)
					}
					want = 293.15 + 3*seconds + 70*theta(seconds) - 3*integral(func(float64) float64 { return 1 }, 0, math.Min(2, seconds))
					if seconds > 2 {
						want += 40 - 3*seconds - 34*theta(seconds-2)
					}
					if got := followed(t, s, place, log, seconds); !(math.Abs(got-want) <= 1e-9) {
						t.Errorf("%s, %v, %s after %v s: log %.13g K, by Duhamel's integral %.13g", stone.name, surface, place, seconds, got, want)
					}
				}
			}
		}
	}
}

// Once the start is forgotten, a sine leads to the oscillation of the closed form, and in a product to one that
// repeats itself and has the mean of the ambient.
func TestFollowingSettles(t *testing.T) {
	r := rand.New(rand.NewSource(51))
	for _, stone := range stones() {
		s := solve(t, stone.problem)
		for _, place := range places {
			period := math.Pow(10, 3*r.Float64()-1)
			course := boundary.Oscillation(units.Celsius.Of(30), units.KelvinDifference.Of(8), units.Second.Of(period), units.Duration{})
			late := 5000 + period*r.Float64()
			got := followed(t, s, place, course, late)
			if stone.problem.Body.Family() != shape.Compact {
				o, err := s.Oscillation(place, units.Second.Of(period))
				want := o.At(units.Celsius.Of(30), units.KelvinDifference.Of(8), units.Second.Of(late)).SI()
				if err != nil || !(math.Abs(got-want) <= 1e-9) {
					t.Errorf("%s, %s, period %v s: %.12g K, closed form %.12g, %v", stone.name, place, period, got, want, err)
				}
			}
			again, half := followed(t, s, place, course, late+period), followed(t, s, place, course, late+period/2)
			if !(math.Abs(again-got) <= 1e-9) || !(math.Abs(half+got-2*303.15) <= 1e-9) {
				t.Errorf("%s, %s, period %v s: %.12g K, a half later %.12g, a whole later %.12g", stone.name, place, period, got, half, again)
			}
		}
	}
}

// A log is followed as a Track follows it.
func TestFollowingAgreesWithTheTrack(t *testing.T) {
	r := rand.New(rand.NewSource(52))
	for _, stone := range singles() {
		s := solve(t, stone.problem)
		for _, place := range places {
			track := follow(t, s, place)
			times, temperatures := []units.Duration{{}}, []units.Temperature{units.Celsius.Of(20)}
			for range 12 {
				times = append(times, times[len(times)-1].Add(units.Second.Of(math.Pow(10, 3*r.Float64()-1))))
				temperatures = append(temperatures, units.Celsius.Of(60*r.Float64()))
			}
			log := boundary.Log(times, temperatures)
			for i := 1; i < len(times); i++ {
				want := add(t, track, times[i].SI(), temperatures[i].SI())
				if got := followed(t, s, place, log, times[i].SI()); !(math.Abs(got-want) <= 2e-4) { // a millionth of each change, by a Track
					t.Errorf("%s, Bi %v, %s after %v: %.10g K, track %.10g", stone.name, s.Biot(), place, times[i], got, want)
				}
			}
		}
	}
}

func TestFollowingBadInput(t *testing.T) {
	var argument *units.ArgumentError
	check := func(name string, err error) {
		t.Helper()
		argument = nil
		if !errors.As(err, &argument) || argument.Accepted == "" {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
	second, celsius := units.Second.Of, units.Celsius.Of
	steady := boundary.Steady(celsius(20))
	s := solve(t, marble())
	flux := marble()
	flux.Surface = boundary.Flux(units.WattPerSquareMetre.Of(10))
	for name, s := range map[string]*series.Solution{"nil": nil, "zero solution": {}, "flux": solve(t, flux)} {
		_, err := s.Following(shape.Centre(), steady, second(1))
		check(name, err)
	}
	_, err := s.Following(shape.Place{}, steady, second(1))
	check("no place", err)
	_, err = s.Following(shape.Slowest(), steady, second(1))
	check("slowest place", err)
	_, err = s.Following(shape.Centre(), boundary.Course{}, second(1))
	check("no course", err)
	_, err = s.Following(shape.Centre(), steady, second(-1))
	check("negative time", err)
	_, err = s.Following(shape.Centre(), boundary.Ramp(celsius(20), units.KelvinPerSecond.Of(-1)), second(1000))
	check("ambient below 0 K", err)
	_, err = s.Following(shape.Centre(), boundary.Oscillation(celsius(20), units.KelvinDifference.Of(1), second(1e-6), units.Duration{}), second(1))
	check("too fast an oscillation", err)
	var outside *units.RangeError
	if _, err = s.Following(shape.Centre(), boundary.Log([]units.Duration{{}, second(1)}, []units.Temperature{celsius(20), celsius(30)}), second(2)); !errors.As(err, &outside) {
		t.Errorf("past the end of a log: %v, want a RangeError", err)
	}
}

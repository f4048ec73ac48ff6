package series_test

import (
	"context"
	"errors"
	"math"
	"math/rand"
	"slices"
	"strings"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// following solves a problem with an ambient, or a prescribed surface temperature, that goes with time in place of its own.
func following(t testing.TB, p series.Problem, course boundary.Course) *series.Solution {
	t.Helper()
	if h, _, ok := p.Surface.Constants(); ok {
		p.Surface = boundary.Following(h, course)
	} else {
		p.Surface = boundary.TemperatureFollowing(course)
	}
	return solve(t, p)
}

// exposures are the conditions of the tests of varying ambients.
var exposures = []boundary.Condition{
	boundary.Constant(units.WattPerSquareMetreKelvin.Of(0), units.Celsius.Of(20)),
	boundary.Constant(units.WattPerSquareMetreKelvin.Of(20), units.Celsius.Of(20)),
	boundary.Constant(units.WattPerSquareMetreKelvin.Of(3000), units.Celsius.Of(20)),
	boundary.Temperature(units.Celsius.Of(20)),
}

// An ambient that stays is the problem with a constant one, stated as such or as a log of several readings; a ramp is a log.
func TestFollowingStays(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	ramp := boundary.Ramp(celsius(20), units.KelvinPerSecond.Of(0.3))
	log := boundary.Log([]units.Duration{second(-10), second(0), second(100), second(400)}, []units.Temperature{celsius(17), celsius(20), celsius(50), celsius(140)})
	stays := boundary.Log([]units.Duration{second(0), second(3)}, []units.Temperature{celsius(20), celsius(20)}).Holding()
	for _, stone := range stones() {
		for _, surface := range exposures {
			p := stone.problem
			p.Surface = surface
			s, steady, held := solve(t, p), following(t, p, boundary.Steady(celsius(20))), following(t, p, stays)
			rising, read := following(t, p, ramp), following(t, p, log)
			for _, place := range places {
				for _, seconds := range []float64{0, 1e-3, 0.5, 2.9, 3.3, 40, 390} {
					want := kelvins(t, s, place, seconds)
					for _, other := range []*series.Solution{steady, held} {
						if got := kelvins(t, other, place, seconds); !(math.Abs(got-want) <= 1e-11) {
							t.Errorf("%s, %v, %s after %v s: %.13g K, want %.13g", stone.name, surface, place, seconds, got, want)
						}
					}
					a, b := kelvins(t, rising, place, seconds), kelvins(t, read, place, seconds)
					if !(math.Abs(a-b) <= 1e-10) {
						t.Errorf("%s, %v, %s after %v s: ramp %.13g K, log %.13g", stone.name, surface, place, seconds, a, b)
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
			s, swinging, read := solve(t, p), following(t, p, sine), following(t, p, log)
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
					if got := kelvins(t, swinging, place, seconds); !(math.Abs(got-want) <= 1e-9) {
						t.Errorf("%s, %v, %s after %v s: sine %.13g K, by Duhamel's integral %.13g", stone.name, surface, place, seconds, got, want)
					}
					want = 293.15 + 3*seconds + 70*theta(seconds) - 3*integral(func(float64) float64 { return 1 }, 0, math.Min(2, seconds))
					if seconds > 2 {
						want += 40 - 3*seconds - 34*theta(seconds-2)
					}
					if got := kelvins(t, read, place, seconds); !(math.Abs(got-want) <= 1e-9) {
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
			swinging := following(t, stone.problem, course)
			got := kelvins(t, swinging, place, late)
			if stone.problem.Body.Family() != shape.Compact {
				o, err := s.Oscillation(place, units.Second.Of(period))
				want := o.At(units.Celsius.Of(30), units.KelvinDifference.Of(8), units.Second.Of(late)).SI()
				if err != nil || !(math.Abs(got-want) <= 1e-9) {
					t.Errorf("%s, %s, period %v s: %.12g K, closed form %.12g, %v", stone.name, place, period, got, want, err)
				}
			}
			again, half := kelvins(t, swinging, place, late+period), kelvins(t, swinging, place, late+period/2)
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
			read := following(t, stone.problem, boundary.Log(times, temperatures))
			for i := 1; i < len(times); i++ {
				want := add(t, track, times[i].SI(), temperatures[i].SI())
				if got := kelvins(t, read, place, times[i].SI()); !(math.Abs(got-want) <= 2e-4) { // a millionth of each change, by a Track
					t.Errorf("%s, Bi %v, %s after %v: %.10g K, track %.10g", stone.name, s.Biot(), place, times[i], got, want)
				}
			}
		}
	}
}

// A log with one step is the step.
func TestFollowingAStep(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	for _, stone := range stones() {
		for _, surface := range exposures {
			p := stone.problem
			p.Surface, p.Initial = surface, celsius(20)
			log := following(t, p, boundary.Log([]units.Duration{second(-1), second(7), second(7)}, []units.Temperature{celsius(20), celsius(20), celsius(90)}).Holding())
			q := p
			if h, _, ok := surface.Constants(); ok {
				q.Surface = boundary.Constant(h, celsius(90))
			} else {
				q.Surface = boundary.Temperature(celsius(90))
			}
			step := solve(t, q)
			for _, place := range places {
				for _, seconds := range []float64{0, 6.9, 7, 7.001, 8, 30, 500} {
					want := 293.15
					if seconds >= 7 {
						want = kelvins(t, step, place, seconds-7)
					}
					if got := kelvins(t, log, place, seconds); !(math.Abs(got-want) <= 1e-11) {
						t.Errorf("%s, %v, %s after %v s: %.13g K, by the step %.13g", stone.name, surface, place, seconds, got, want)
					}
				}
				for _, target := range []units.Temperature{celsius(30), celsius(80)} {
					got, err := log.TimeTo(place, target)
					want, never := step.TimeTo(place, target)
					if (err == nil) != (never == nil) || err == nil && !(math.Abs(got.SI()-7-want.SI()) <= 1e-9*(7+want.SI())) {
						t.Errorf("%s, %v, %s at %v: %v, %v, by the step 7 s and %v, %v", stone.name, surface, place, target, got, err, want, never)
					}
				}
			}
		}
	}
}

// What two courses do adds up.
func TestFollowingSuperposes(t *testing.T) {
	r := rand.New(rand.NewSource(53))
	for _, stone := range stones() {
		var times []units.Duration
		var one, other, both []units.Temperature
		for i := range 6 {
			a, b := 20*r.Float64(), 20*r.Float64()
			times = append(times, units.Second.Of(float64(i*i)))
			one, other, both = append(one, units.Kelvin.Of(300+a)), append(other, units.Kelvin.Of(300+b)), append(both, units.Kelvin.Of(300+a+b))
		}
		p := stone.problem
		p.Initial = units.Kelvin.Of(300)
		first, second, sum := following(t, p, boundary.Log(times, one)), following(t, p, boundary.Log(times, other)), following(t, p, boundary.Log(times, both))
		for _, place := range places {
			for _, seconds := range []float64{0.5, 5, 20} {
				a, b, c := kelvins(t, first, place, seconds), kelvins(t, second, place, seconds), kelvins(t, sum, place, seconds)
				if !(math.Abs(a+b-300-c) <= 1e-10) {
					t.Errorf("%s, %s after %v s: %.13g and %.13g K, together %.13g", stone.name, place, seconds, a, b, c)
				}
			}
		}
	}
}

// courses are ambients that draw a body both ways.
func courses(r *rand.Rand) map[string]boundary.Course {
	second, celsius := units.Second.Of, units.Celsius.Of
	var times []units.Duration
	var temperatures []units.Temperature
	at := 0.0
	for range 20 {
		times, temperatures = append(times, second(at)), append(temperatures, celsius(100*r.Float64()))
		if r.Float64() < 0.7 {
			at += math.Pow(10, 3*r.Float64()-1)
		}
	}
	return map[string]boundary.Course{
		"log":         boundary.Log(times, temperatures).Holding(),
		"ended log":   boundary.Log(times, temperatures),
		"ramp up":     boundary.Ramp(celsius(100*r.Float64()), units.KelvinPerSecond.Of(math.Pow(10, 3*r.Float64()-3))),
		"ramp down":   boundary.Ramp(celsius(100*r.Float64()), units.KelvinPerSecond.Of(-math.Pow(10, 3*r.Float64()-3))),
		"oscillation": boundary.Oscillation(celsius(100*r.Float64()), units.KelvinDifference.Of(40*r.Float64()), second(math.Pow(10, 3*r.Float64()-1)), second(10*r.Float64())),
	}
}

// The place is at the target when TimeTo says so, and on the side of the start at every time before; where it says that it
// never is, or not before the end, no time is found at which it is.
func TestFollowingTimeTo(t *testing.T) {
	r := rand.New(rand.NewSource(54))
	found, not := 0, 0
	for _, stone := range stones() {
		for _, surface := range exposures[1:] {
			p := stone.problem
			p.Surface, p.Initial = surface, units.Celsius.Of(100*r.Float64())
			for name, course := range courses(r) {
				s := following(t, p, course)
				place := places[r.Intn(len(places))]
				target := units.Celsius.Of(120 * r.Float64())
				when, err := s.TimeTo(place, target)
				var never *units.NeverError
				var horizon *units.HorizonError
				until := when.SI()
				switch {
				case err == nil && until > 0:
					found++
					jumped := math.IsInf(s.Biot(), 1) && place == shape.Surface() // with a step of the log
					if got := kelvins(t, s, place, until); !(math.Abs(got-target.SI()) <= 1e-9) && !jumped {
						t.Errorf("%s, %v, %s at %v after %v, where it is at %.12g K", stone.name, p.Surface, place, target, when, got)
					}
				case errors.As(err, &horizon):
					until = horizon.Horizon.SI()
				case err == nil || errors.As(err, &never):
					until = 3000
					if name == "ended log" || name == "ramp down" {
						continue
					}
				default:
					t.Fatalf("%s, %v, %s at %v: %v", stone.name, p.Surface, place, target, err)
				}
				if err != nil {
					not++
				}
				side := math.Copysign(1, target.SI()-p.Initial.SI())
				for range 40 {
					seconds := until * math.Pow(r.Float64(), 3)
					if now := kelvins(t, s, place, seconds); (err != nil || until == when.SI()) && side*(now-target.SI()) > 1e-6 {
						t.Errorf("%s, %s, %v, start %v, %s at %v: %v, %v, but at %.9g K after %v s", stone.name, name, p.Surface, p.Initial, place, target, when, err, now, seconds)
						break
					}
				}
			}
		}
	}
	if found < 30 || not < 30 {
		t.Errorf("%d times found, %d not: too few of one kind", found, not)
	}
}

// What TimeTo says where the answer is known.
func TestFollowingTimeToKinds(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	p := marble() // of 90 °C
	var never *units.NeverError
	var horizon *units.HorizonError
	is := func(course boundary.Course, target units.Temperature, want any, what string) units.Duration {
		t.Helper()
		when, err := following(t, p, course).TimeTo(shape.Centre(), target)
		if want == nil && err != nil || want != nil && !errors.As(err, want) {
			t.Errorf("%s: %v, %v", what, when, err)
		}
		return when
	}
	up, down := boundary.Ramp(celsius(20), units.KelvinPerMinute.Of(1)), boundary.Ramp(celsius(20), units.KelvinPerSecond.Of(-1))
	if when := is(up, celsius(200), nil, "ramp that comes to anything"); !(when.SI() > 180*60) {
		t.Errorf("on a ramp of 1 K/min from 20 °C at 200 °C after %v", when)
	}
	is(up, celsius(15), &never, "ramp away from the target after a fall")
	if T := never.Limit.In(units.Celsius); !(T > 15 && T < 90) {
		t.Errorf("ramp away from the target after a fall: bound %v", never.Limit)
	}
	is(up, celsius(30), nil, "fall before a ramp")
	is(down, celsius(-270), &horizon, "ramp to 0 K")
	if when := is(down, celsius(95), nil, "far side of a ramp"); when.SI() != 0 {
		t.Errorf("far side of a ramp: %v, want 0 s", when)
	}
	wave := boundary.Oscillation(celsius(20), units.KelvinDifference.Of(10), second(600), units.Duration{})
	is(wave, celsius(11), nil, "within the band of an oscillation")
	is(wave, celsius(9.9), &never, "out of the band of an oscillation")
	if T := never.Limit.In(units.Celsius); math.Abs(T-20) > 1e-9 || never.Condition == "" {
		t.Errorf("out of the band of an oscillation: %v, %q", never.Limit, never.Condition)
	}
	log := boundary.Log([]units.Duration{{}, second(10), second(30)}, []units.Temperature{celsius(20), celsius(40), celsius(25)})
	is(log, celsius(30), &horizon, "past a log")
	if horizon.Horizon != second(30) || horizon.Limit != celsius(25) {
		t.Errorf("past a log: horizon %v, limit %v", horizon.Horizon, horizon.Limit)
	}
	is(log.Holding(), celsius(30), nil, "log that is held")
	is(log.Holding(), celsius(25), &never, "limit of a log")
	if never.Limit != celsius(25) {
		t.Errorf("limit of a log: %v, want 25 °C", never.Limit)
	}
	is(boundary.Log([]units.Duration{{}}, []units.Temperature{celsius(20)}), celsius(30), &horizon, "log of one reading")
	p.Surface = boundary.Constant(units.HeatTransferCoefficient{}, celsius(20))
	is(up, celsius(95), &never, "insulated")
	if when := is(up, celsius(90), nil, "start"); when.SI() != 0 {
		t.Errorf("start: %v, want 0 s", when)
	}
}

// The derivation states the course and what it starts from.
func TestFollowingDerivation(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	for _, course := range []boundary.Course{
		boundary.Ramp(celsius(25), units.KelvinPerMinute.Of(1)),
		boundary.Oscillation(celsius(25), units.KelvinDifference.Of(10), second(600), units.Duration{}),
		boundary.Log([]units.Duration{{}, second(10)}, []units.Temperature{celsius(25), celsius(40)}),
	} {
		for _, stone := range stones() {
			r := following(t, stone.problem, course).Derivation()
			stated := slices.ContainsFunc(r.Notes, func(note string) bool { return strings.Contains(note, course.String()) })
			ambient, ok := r.Value("Tinf_0")
			if want := celsius(25).Dynamic(); !stated || !ok || ambient.String() != want.String() {
				t.Errorf("%s, %v: ambient %v at time 0, stated %v", stone.name, course, ambient, stated)
			}
		}
	}
}

// The bound of what is left out goes with the changes of the ambient until then.
func TestFollowingTruncationError(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	s := following(t, marble(), boundary.Log([]units.Duration{{}, second(10), second(20)}, []units.Temperature{celsius(20), celsius(1020), celsius(20)}).Holding())
	for _, c := range []struct{ seconds, changes float64 }{{5, 1070}, {15, 2070}, {1000, 2070}} {
		bound, err := s.TruncationError(second(c.seconds))
		if err != nil || !(bound.SI() >= 1e-15*c.changes && bound.SI() <= 2e-14*c.changes) {
			t.Errorf("after %v s: bound %v, %v; the changes are %v K", c.seconds, bound, err, c.changes)
		}
	}
}

// The centre is last and the corner first where the surroundings draw one way; else the question is refused.
func TestFollowingExtremes(t *testing.T) {
	second, celsius := units.Second.Of, units.Celsius.Of
	falling := boundary.Log([]units.Duration{{}, second(20), second(50)}, []units.Temperature{celsius(60), celsius(30), celsius(10)}).Holding()
	for _, stone := range stones() {
		s := following(t, stone.problem, falling)
		last, err := s.TimeTo(shape.Slowest(), celsius(40))
		centre, err2 := s.TimeTo(shape.Centre(), celsius(40))
		first, err3 := s.TimeTo(shape.Fastest(), celsius(40))
		surface, err4 := s.TimeTo(shape.Surface(), celsius(40))
		if err != nil || err2 != nil || err3 != nil || err4 != nil || last != centre || first.Compare(surface) > 0 {
			t.Errorf("%s: slowest %v, centre %v, fastest %v, surface %v, %v", stone.name, last, centre, first, surface, errors.Join(err, err2, err3, err4))
		}
		var argument *units.ArgumentError
		if _, err = following(t, stone.problem, boundary.Ramp(celsius(20), units.KelvinPerSecond.Of(1))).TimeTo(shape.Slowest(), celsius(95)); !errors.As(err, &argument) {
			t.Errorf("%s: slowest place after a fall on a ramp: %v, want an ArgumentError", stone.name, err)
		}
	}
}

// The heat that has left is what passed the surface, h A (T − Tinf) over time.
func TestFollowingHeat(t *testing.T) {
	r := rand.New(rand.NewSource(55))
	for _, stone := range singles() {
		h, _, convective := stone.problem.Surface.Constants()
		if !convective || h.SI() > 1000 {
			continue // the flux at first is not for this quadrature
		}
		for name, course := range courses(r) {
			s := following(t, stone.problem, course)
			passed, previous := 0.0, 0.0
			ends := []float64{1e-4, 1e-3, 0.01, 0.1}
			for _, bend := range course.Bends() {
				if bend.SI() > 0.1 && bend.SI() < 9 {
					ends = append(ends, bend.SI())
				}
			}
			for at := 0.11; at < 9; at += 0.5 {
				ends = append(ends, at)
			}
			slices.Sort(ends)
			for _, end := range ends {
				if _, err := s.At(shape.Surface(), units.Second.Of(end)); err != nil {
					break
				}
				passed += quad.Fixed(func(u float64) float64 {
					v := (end - previous) * u * u // bends bring roots of time
					T, err := course.At(units.Second.Of(previous + v))
					if err != nil {
						t.Fatal(err)
					}
					return 2 * u * (end - previous) * h.SI() * stone.problem.Body.Area().SI() * (kelvins(t, s, shape.Surface(), previous+v) - T.SI())
				}, 0, 1, 10, quad.Legendre{}, 0)
				previous = end
			}
			q, err := s.HeatReleased(units.Second.Of(previous))
			if scale := 1000 + math.Abs(passed); err != nil || !(math.Abs(q.SI()-passed) <= 1e-6*scale) {
				t.Errorf("%s, %s, %v: %.10g J have left after %v s, %.10g passed, %v", stone.name, name, stone.problem.Surface, q.SI(), previous, passed, err)
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
	p := marble()
	kelvin := units.KelvinDifference.Of
	for name, course := range map[string]boundary.Course{
		"no course":               {},
		"too fast an oscillation": boundary.Oscillation(celsius(20), kelvin(1), second(1e-6), units.Duration{}),
		"oscillation to 0 K":      boundary.Oscillation(celsius(20), kelvin(300), second(100), units.Duration{}),
		"ramp of NaN":             boundary.Ramp(celsius(20), units.KelvinPerSecond.Of(math.NaN())),
		"log that begins late":    boundary.Log([]units.Duration{second(1)}, []units.Temperature{celsius(20)}),
		"log that has ended":      boundary.Log([]units.Duration{second(-1)}, []units.Temperature{celsius(20)}),
	} {
		p.Surface = boundary.Following(units.WattPerSquareMetreKelvin.Of(300), course)
		if s, err := p.Solve(context.Background()); s != nil || err == nil {
			t.Errorf("%s: no error", name)
		} else if name != "log that has ended" {
			check(name, err)
		}
	}
	ramp := boundary.Ramp(celsius(20), units.KelvinPerSecond.Of(-1))
	p.Surface = boundary.Following(units.WattPerSquareMetreKelvin.Of(300), ramp)
	s := solve(t, p)
	log := following(t, marble(), boundary.Log([]units.Duration{{}, second(1)}, []units.Temperature{celsius(20), celsius(30)}))
	questions := func(s *series.Solution, place shape.Place, at units.Duration) map[string]error {
		_, err1 := s.At(place, at)
		_, err2 := s.Mean(at)
		_, err3 := s.HeatReleased(at)
		_, err4 := s.TruncationError(at)
		return map[string]error{"At": err1, "Mean": err2, "HeatReleased": err3, "TruncationError": err4}
	}
	for name, err := range questions(s, shape.Centre(), second(-1)) {
		check("negative time, "+name, err)
	}
	for name, err := range questions(s, shape.Centre(), second(1000)) {
		check("ambient below 0 K, "+name, err)
	}
	for name, err := range questions(log, shape.Centre(), second(2)) {
		check("past the end of a log, "+name, err)
	}
	_, err := s.At(shape.Place{}, second(1))
	check("no place", err)
	_, err = s.At(shape.Slowest(), second(1))
	check("slowest place", err)
	_, err = s.TimeTo(shape.Place{}, celsius(30))
	check("time to of no place", err)
	_, _, err = s.OneTerm(shape.Centre(), second(1))
	check("first term", err)
	_, err = s.Sensitivity(shape.Centre(), second(1))
	check("sensitivity", err)
	_, err = s.TimeSensitivity(shape.Centre(), celsius(30))
	check("sensitivity of the time", err)
	_, err = s.Flux(shape.Surface(), second(1))
	check("flux", err)
	_, err = s.HeatThrough(shape.Surface(), second(1))
	check("heat through a face", err)
	_, err = p.FitCoefficient(context.Background(), series.Reading{Place: shape.Centre(), Time: second(10), Temperature: celsius(60)})
	check("fit", err)

	wall := p
	wall.Body = shape.Tube(units.Millimetre.Of(16), units.Millimetre.Of(8), units.Metre.Of(1))
	_, err = wall.Solve(context.Background())
	check("tube", err)
	wall = marble()
	wall.Body, wall.Opposite = shape.Plate(units.Millimetre.Of(16), units.SquareMetre.Of(1)), p.Surface
	_, err = wall.Solve(context.Background())
	check("opposite face", err)
	wall = p
	wall.Source = units.WattPerCubicMetre.Of(1)
	_, err = wall.Solve(context.Background())
	check("source", err)
	_, err = series.SemiInfinite{Conductivity: p.Conductivity, Density: p.Density, SpecificHeat: p.SpecificHeat, Initial: p.Initial, Surface: p.Surface}.Solve(context.Background())
	check("body without another side", err)
	_, err = series.Product{
		Directions:   []series.Direction{{Body: shape.Plate(units.Millimetre.Of(16), units.SquareMetre.Of(1)), Surface: p.Surface}},
		Conductivity: p.Conductivity, Density: p.Density, SpecificHeat: p.SpecificHeat, Initial: p.Initial,
	}.Solve(context.Background())
	check("product", err)
}

func BenchmarkFollowing(b *testing.B) {
	r := rand.New(rand.NewSource(56))
	var times []units.Duration
	var temperatures []units.Temperature
	for i := range 1441 {
		times, temperatures = append(times, units.Minute.Of(float64(i))), append(temperatures, units.Celsius.Of(5+r.Float64()-10*float64(i)/1440))
	}
	carton := marble()
	carton.Body, carton.Conductivity = shape.Plate(units.Centimetre.Of(30), units.SquareMetre.Of(1)), units.WattPerMetreKelvin.Of(0.5)
	brick := carton
	brick.Body = shape.Brick(units.Centimetre.Of(30), units.Centimetre.Of(40), units.Centimetre.Of(60))
	for _, c := range []struct {
		name    string
		problem series.Problem
		course  boundary.Course
	}{
		{"plate, log of a day", carton, boundary.Log(times, temperatures).Holding()},
		{"brick, log of a day", brick, boundary.Log(times, temperatures).Holding()},
		{"plate, ramp", carton, boundary.Ramp(units.Celsius.Of(20), units.KelvinPerHour.Of(-1))},
		{"plate, oscillation", carton, boundary.Oscillation(units.Celsius.Of(0), units.KelvinDifference.Of(10), units.Hour.Of(24), units.Duration{})},
		{"brick, oscillation", brick, boundary.Oscillation(units.Celsius.Of(0), units.KelvinDifference.Of(10), units.Hour.Of(24), units.Duration{})},
	} {
		s := following(b, c.problem, c.course)
		b.Run(c.name+", at", func(b *testing.B) {
			for b.Loop() {
				T, err := s.At(shape.Centre(), units.Hour.Of(20))
				if err != nil {
					b.Fatal(err)
				}
				sink = T.SI()
			}
		})
		b.Run(c.name+", time to", func(b *testing.B) {
			for b.Loop() {
				t, err := s.TimeTo(shape.Centre(), units.Celsius.Of(4))
				if err != nil {
					b.Fatal(err)
				}
				sink = t.SI()
			}
		})
	}
}

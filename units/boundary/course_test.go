package boundary_test

import (
	"errors"
	"fmt"
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

func seconds(ts ...float64) (all []units.Duration) {
	for _, t := range ts {
		all = append(all, units.Second.Of(t))
	}
	return all
}

func kelvins(values ...float64) (all []units.Temperature) {
	for _, T := range values {
		all = append(all, units.Kelvin.Of(T))
	}
	return all
}

// A cold room whose door was opened after ten minutes.
func ExampleLog() {
	room := boundary.Log(
		[]units.Duration{{}, units.Minute.Of(10), units.Minute.Of(10), units.Minute.Of(30)},
		[]units.Temperature{units.Celsius.Of(4), units.Celsius.Of(4), units.Celsius.Of(9), units.Celsius.Of(5)},
	)
	for _, minutes := range []float64{0, 10, 20} {
		fmt.Println(room.At(units.Minute.Of(minutes)))
	}
	_, err := room.At(units.Minute.Of(31))
	fmt.Println(err)
	fmt.Println(room.Holding().At(units.Hour.Of(2)))
	// Output:
	// 4 °C <nil>
	// 9 °C <nil>
	// 7 °C <nil>
	// log: time 31 min outside its range, 0 s to 30 min (last reading)
	// 5 °C <nil>
}

// The rate is the derivative of the temperature, by central differences, and every course has its value
// by definition.
func TestCourseRate(t *testing.T) {
	mean, amplitude := units.Kelvin.Of(290), units.KelvinDifference.Of(12)
	for _, c := range []struct {
		course boundary.Course
		want   func(t float64) float64
	}{
		{boundary.Steady(mean), func(float64) float64 { return 290 }},
		{boundary.Ramp(mean, units.KelvinPerSecond.Of(-0.5)), func(t float64) float64 { return 290 - t/2 }},
		{boundary.Oscillation(mean, amplitude, units.Second.Of(60), units.Second.Of(15)), func(t float64) float64 { return 290 - 12*math.Cos(2*math.Pi*t/60) }},
		{boundary.Log(seconds(-10, 20, 100), kelvins(270, 300, 220)), func(t float64) float64 {
			if t < 20 {
				return 280 + t
			}
			return 320 - t
		}},
	} {
		f := func(x float64) bool {
			at := 1 + 98*math.Abs(math.Sin(x))
			if math.Abs(at-20) < 0.01 {
				return true
			}
			T := func(t float64) float64 {
				T, err := c.course.At(units.Second.Of(t))
				if err != nil {
					return math.NaN()
				}
				return T.SI()
			}
			rate, err := c.course.Rate(units.Second.Of(at))
			want := (T(at+1e-4) - T(at-1e-4)) / 2e-4
			if err != nil || !(math.Abs(rate.SI()-want) < 1e-7) || !(math.Abs(T(at)-c.want(at)) < 1e-10) {
				t.Logf("%v at %g s: %g K, want %g; %g K/s, want %g; %v", c.course, at, T(at), c.want(at), rate.SI(), want, err)
				return false
			}
			return true
		}
		if err := quick.Check(f, nil); err != nil {
			t.Error(err)
		}
	}
}

// A log never leaves the band of its two neighbours.
func TestLogBetweenNeighbours(t *testing.T) {
	if err := quick.Check(func(a, b, c, where uint16) bool {
		low, high := min(a, b, c), max(a, b, c)
		log := boundary.Log(seconds(0, 1, 3), kelvins(1+float64(a), 1+float64(b), 1+float64(c)))
		T, err := log.At(units.Second.Of(3 * float64(where) / math.MaxUint16))
		return err == nil && T.SI() >= 1+float64(low)-1e-9 && T.SI() <= 1+float64(high)+1e-9
	}, nil); err != nil {
		t.Error(err)
	}
}

func TestCourseRefusals(t *testing.T) {
	T := units.Celsius.Of(20)
	at := func(c boundary.Course, s float64) error { _, err := c.At(units.Second.Of(s)); return err }
	nan := math.NaN()
	for _, c := range []struct {
		name string
		err  error
	}{
		{"zero course", boundary.Course{}.Check()},
		{"zero course asked", at(boundary.Course{}, 1)},
		{"before time 0", at(boundary.Steady(T), -1)},
		{"no time", at(boundary.Steady(T), nan)},
		{"at no time", at(boundary.Steady(T), math.Inf(1))},
		{"forgotten temperature", boundary.Steady(units.Temperature{}).Check()},
		{"forgotten temperature asked", at(boundary.Steady(units.Temperature{}), 0)},
		{"ramp below 0 K", at(boundary.Ramp(T, units.KelvinPerSecond.Of(-1)), 1000)},
		{"endless ramp", boundary.Ramp(T, units.KelvinPerSecond.Of(math.Inf(1))).Check()},
		{"no period", boundary.Oscillation(T, units.KelvinDifference.Of(1), units.Duration{}, units.Duration{}).Check()},
		{"no period asked", at(boundary.Oscillation(T, units.KelvinDifference.Of(1), units.Duration{}, units.Duration{}), 3)},
		{"oscillation below 0 K", at(boundary.Oscillation(T, units.KelvinDifference.Of(400), units.Second.Of(4), units.Duration{}), 3)},
		{"log of nothing", boundary.Log(nil, nil).Check()},
		{"log of nothing asked", at(boundary.Log(nil, nil), 0)},
		{"log of nothing, held", at(boundary.Log(nil, nil).Holding(), 0)},
		{"more times than temperatures", boundary.Log(seconds(0, 1), kelvins(300)).Check()},
		{"times that fall", boundary.Log(seconds(0, 2, 1), kelvins(300, 300, 300)).Check()},
		{"NaN in times", boundary.Log(seconds(0, nan), kelvins(300, 300)).Check()},
		{"NaN in temperatures", boundary.Log(seconds(0, 1), kelvins(300, nan)).Check()},
		{"late first reading", boundary.Log(seconds(1, 2), kelvins(300, 300)).Check()},
	} {
		var refused *units.ArgumentError
		if !errors.As(c.err, &refused) || refused.Accepted == "" {
			t.Errorf("%s: %v; want an *units.ArgumentError", c.name, c.err)
		}
	}
	short := boundary.Log(seconds(0, 10), kelvins(300, 310))
	var outside *units.RangeError
	if err := at(short, 10.1); !errors.As(err, &outside) {
		t.Errorf("past the last reading: %v; want a *units.RangeError", err)
	}
	if err := at(short, 10); err != nil {
		t.Errorf("at the last reading: %v", err)
	}
}

func TestCourseAccessors(t *testing.T) {
	times, temperatures := seconds(-5, 0, 0, 7, 7, 9), kelvins(300, 301, 302, 303, 304, 305)
	log := boundary.Log(times, temperatures)
	gotTimes, gotTemperatures, ok := log.Readings()
	if !ok || len(gotTimes) != 6 || gotTimes[3] != times[3] || gotTemperatures[5] != temperatures[5] {
		t.Errorf("readings come back as %v, %v, %t", gotTimes, gotTemperatures, ok)
	}
	times[3], gotTimes[3] = units.Second.Of(100), units.Second.Of(200)
	if again, _, _ := log.Readings(); again[3].SI() != 7 {
		t.Error("a log changed from outside")
	}
	if bends := log.Bends(); len(bends) != 2 || bends[0].SI() != 7 || bends[1].SI() != 9 {
		t.Errorf("bends %v, want 7 s and 9 s", bends)
	}
	T, rate := units.Celsius.Of(20), units.KelvinPerSecond.Of(3)
	if got, ok := boundary.Steady(T).Steady(); !ok || got != T {
		t.Errorf("steady comes back as %v, %t", got, ok)
	}
	if start, r, ok := boundary.Ramp(T, rate).Ramp(); !ok || start != T || r != rate {
		t.Errorf("ramp comes back as %v, %v, %t", start, r, ok)
	}
	wave := boundary.Oscillation(T, units.KelvinDifference.Of(4), units.Day.Of(1), units.Hour.Of(15))
	if mean, amplitude, period, lag, ok := wave.Oscillation(); !ok || mean != T || amplitude.SI() != 4 || period != units.Day.Of(1) || lag != units.Hour.Of(15) {
		t.Errorf("oscillation comes back as %v, %v, %v, %v, %t", mean, amplitude, period, lag, ok)
	}
	if _, ok := wave.Steady(); ok {
		t.Error("an oscillation is not steady")
	}
	if _, _, ok := wave.Ramp(); ok {
		t.Error("an oscillation is no ramp")
	}
	if _, _, ok := wave.Readings(); ok || wave.Bends() != nil {
		t.Error("an oscillation has no readings")
	}
}

package boundary

import (
	"fmt"
	"math"
	"slices"
	"sort"

	"example.com/coolward/units"
)

// A Course is a temperature that goes with time from 0 on, stated by constants. Make one with [Steady],
// [Ramp], [Oscillation] or [Log]; the zero Course is refused wherever one is needed. It does not change.
type Course struct {
	kind      courseKind
	start     units.Temperature // of a ramp; the mean of an oscillation
	rate      units.TemperatureRate
	amplitude units.TemperatureDifference
	period    units.Duration
	lag       units.Duration
	samples   *samples
}

type courseKind uint8

const (
	noCourse courseKind = iota
	steady
	ramp
	oscillation
	logged
)

// samples are those of a log, in SI units.
type samples struct {
	times, temperatures []float64
	wrong               error // why they are refused
	hold                bool
}

// Steady returns the course that stays at T.
func Steady(T units.Temperature) Course { return Course{kind: steady, start: T} }

// Ramp returns the course start + rate · t.
func Ramp(start units.Temperature, rate units.TemperatureRate) Course {
	return Course{kind: ramp, start: start, rate: rate}
}

// Oscillation returns the course mean + amplitude · sin(2π (t − lag)/period). The period must be above 0.
func Oscillation(mean units.Temperature, amplitude units.TemperatureDifference, period, lag units.Duration) Course {
	return Course{kind: oscillation, start: mean, amplitude: amplitude, period: period, lag: lag}
}

// Log returns the course of readings, straight from one to the next. It copies them. Two readings at the
// same time are a step, at which the second counts. There must be as many temperatures as times, at least
// one, the first at 0 or before; times must not fall, and every temperature must be above 0 K.
// Past the last reading it gives a [*units.RangeError]; see [Course.Holding].
func Log(times []units.Duration, temperatures []units.Temperature) Course {
	s := &samples{}
	for _, t := range times {
		s.times = append(s.times, t.SI())
	}
	for _, T := range temperatures {
		s.temperatures = append(s.temperatures, T.SI())
	}
	s.wrong = checkSamples(times, temperatures)
	return Course{kind: logged, samples: s}
}

// Holding returns the log c with its last reading held from then on, and any other course as it is.
func (c Course) Holding() Course {
	if c.kind == logged {
		held := *c.samples
		held.hold = true
		c.samples = &held
	}
	return c
}

func checkSamples(times []units.Duration, temperatures []units.Temperature) error {
	if len(times) == 0 || len(times) != len(temperatures) {
		return &units.ArgumentError{
			Field: "log: readings", Value: fmt.Sprintf("%d times and %d temperatures", len(times), len(temperatures)),
			Accepted: "as many temperatures as times, at least one",
		}
	}
	for i, t := range times {
		name := fmt.Sprintf("log: reading %d", i+1)
		if err := units.CheckFinite(name+": time", t); err != nil {
			return err
		}
		if i > 0 && t.SI() < times[i-1].SI() {
			return &units.ArgumentError{Field: name + ": time", Value: t, Accepted: "not before the reading above, " + times[i-1].String()}
		}
		if err := units.CheckTemperature(name+": temperature", temperatures[i]); err != nil {
			return err
		}
	}
	if times[0].SI() > 0 {
		return &units.ArgumentError{Field: "log: reading 1: time", Value: times[0], Accepted: "0 s or before, since a course begins at 0"}
	}
	return nil
}

// Check returns an [*units.ArgumentError] if c is the zero Course or one of its constants cannot be. A
// ramp or an oscillation that comes to 0 K is found by [Course.At].
func (c Course) Check() error {
	switch c.kind {
	case steady:
		return units.CheckTemperature("course: temperature", c.start)
	case ramp:
		if err := units.CheckTemperature("course: start", c.start); err != nil {
			return err
		}
		return units.CheckFinite("course: rate", c.rate)
	case oscillation:
		for _, err := range []error{
			units.CheckTemperature("course: mean", c.start),
			units.CheckFinite("course: amplitude", c.amplitude),
			units.CheckPositive("course: period", c.period),
			units.CheckFinite("course: lag", c.lag),
		} {
			if err != nil {
				return err
			}
		}
		return nil
	case logged:
		return c.samples.wrong
	}
	return &units.ArgumentError{Field: "course", Accepted: "boundary.Steady(T), Ramp(start, rate), Oscillation(mean, amplitude, period, lag) or Log(times, temperatures)"}
}

// At returns the temperature at time t ≥ 0. It returns an [*units.ArgumentError] for another time and
// where the course would be at 0 K or below, a [*units.RangeError] past the end of a log, and the error of
// [Course.Check].
func (c Course) At(t units.Duration) (units.Temperature, error) {
	T, _, err := c.at(t)
	return T, err
}

// Rate returns how fast the temperature changes at time t ≥ 0, at a bend or a step of a log right after it. Its errors
// are those of [Course.At].
func (c Course) Rate(t units.Duration) (units.TemperatureRate, error) {
	_, rate, err := c.at(t)
	return rate, err
}

func (c Course) at(t units.Duration) (units.Temperature, units.TemperatureRate, error) {
	seconds := t.SI()
	if !(seconds >= 0 && seconds <= math.MaxFloat64) {
		return units.Temperature{}, units.TemperatureRate{}, &units.ArgumentError{Field: "time", Value: t, Accepted: "0 s or above, and finite"}
	}
	var T, rate float64
	switch c.kind {
	case steady:
		T = c.start.SI()
	case ramp:
		rate = c.rate.SI()
		T = c.start.SI() + rate*seconds
	case oscillation:
		omega := 2 * math.Pi / c.period.SI()
		sin, cos := math.Sincos(omega * (seconds - c.lag.SI()))
		T, rate = c.start.SI()+c.amplitude.SI()*sin, c.amplitude.SI()*omega*cos
	case logged:
		if c.samples.wrong != nil {
			return units.Temperature{}, units.TemperatureRate{}, c.samples.wrong
		}
		if last := units.Second.Of(c.samples.times[len(c.samples.times)-1]); seconds > last.SI() && !c.samples.hold {
			return units.Temperature{}, units.TemperatureRate{}, &units.RangeError{
				Model: "log", Quantity: "time", Value: t.Dynamic(), Min: units.Duration{}.Dynamic(), Max: last.Dynamic(), Source: "last reading",
			}
		}
		T, rate = c.samples.at(seconds)
	}
	if !(T > 0 && T <= math.MaxFloat64) || math.IsNaN(rate) || math.IsInf(rate, 0) {
		if err := c.Check(); err != nil {
			return units.Temperature{}, units.TemperatureRate{}, err
		}
		return units.Temperature{}, units.TemperatureRate{}, &units.ArgumentError{Field: "time", Value: t, Accepted: "a time at which the course, " + c.String() + ", is a temperature above 0 K"}
	}
	return units.Kelvin.Of(T), units.KelvinPerSecond.Of(rate), nil
}

// at returns the temperature and its slope from the first reading on. The interpolations of gonum know no steps.
func (s *samples) at(t float64) (T, slope float64) {
	next := sort.Search(len(s.times), func(i int) bool { return s.times[i] > t })
	if next == len(s.times) {
		return s.temperatures[next-1], 0
	}
	t0, T0 := s.times[next-1], s.temperatures[next-1]
	slope = (s.temperatures[next] - T0) / (s.times[next] - t0)
	return T0 + slope*(t-t0), slope
}

// Steady returns the temperature of a steady course, and whether c is one.
func (c Course) Steady() (T units.Temperature, ok bool) { return c.start, c.kind == steady }

// Ramp returns the constants of a ramp, and whether c is one.
func (c Course) Ramp() (start units.Temperature, rate units.TemperatureRate, ok bool) {
	return c.start, c.rate, c.kind == ramp
}

// Oscillation returns the constants of an oscillation, and whether c is one.
func (c Course) Oscillation() (mean units.Temperature, amplitude units.TemperatureDifference, period, lag units.Duration, ok bool) {
	return c.start, c.amplitude, c.period, c.lag, c.kind == oscillation
}

// Readings returns copies of the readings of a log, in seconds and kelvin as quantities, and whether c is one.
func (c Course) Readings() (times []units.Duration, temperatures []units.Temperature, ok bool) {
	if c.kind != logged {
		return nil, nil, false
	}
	for i, t := range c.samples.times {
		if i < len(c.samples.temperatures) {
			times = append(times, units.Second.Of(t))
			temperatures = append(temperatures, units.Kelvin.Of(c.samples.temperatures[i]))
		}
	}
	return times, temperatures, true
}

// Bends returns the times above 0 at which the course has a step or a bend, rising, each once. A solver
// ends a step there.
func (c Course) Bends() []units.Duration {
	if c.kind != logged {
		return nil
	}
	var bends []units.Duration
	for _, t := range slices.Compact(slices.Clone(c.samples.times)) {
		if t > 0 {
			bends = append(bends, units.Second.Of(t))
		}
	}
	return bends
}

// String says what the course is, such as "from 20 °C at 2 K/min".
func (c Course) String() string {
	switch c.kind {
	case steady:
		return c.start.String()
	case ramp:
		return "from " + c.start.String() + " at " + c.rate.String()
	case oscillation:
		text := c.start.String() + " ± " + c.amplitude.String() + " with a period of " + c.period.String()
		if c.lag != (units.Duration{}) {
			text += ", late by " + c.lag.String()
		}
		return text
	case logged:
		return fmt.Sprintf("log of %d readings", len(c.samples.times))
	}
	return "no course"
}

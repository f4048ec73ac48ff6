package lumped

import (
	"fmt"
	"math"
	"slices"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// A Log is readings of a temperature over time, as a logger writes them. Times rise from reading to reading, from
// any zero; steps of time may differ. A reading that is missing is NaN kelvin, or left out with its time.
type Log struct {
	Times        []units.Duration
	Temperatures []units.Temperature
}

// Check returns an [*units.ArgumentError] for a log that cannot be used: as many temperatures as times, at least one that is
// not missing, times that rise, temperatures above 0 K.
func (l Log) Check() error {
	if len(l.Times) == 0 || len(l.Times) != len(l.Temperatures) {
		return &units.ArgumentError{
			Field: "log: readings", Value: fmt.Sprintf("%d times and %d temperatures", len(l.Times), len(l.Temperatures)),
			Accepted: "as many temperatures as times, at least one",
		}
	}
	there := 0
	for i, t := range l.Times {
		name := fmt.Sprintf("log: reading %d: ", i+1)
		if err := units.CheckFinite(name+"time", t); err != nil {
			return err
		}
		if i > 0 && t.SI() <= l.Times[i-1].SI() {
			return &units.ArgumentError{Field: name + "time", Value: t, Accepted: "after the reading before it, " + l.Times[i-1].String()}
		}
		if math.IsNaN(l.Temperatures[i].SI()) {
			continue
		}
		there++
		if err := units.CheckTemperature(name+"temperature", l.Temperatures[i]); err != nil {
			return err
		}
	}
	if there == 0 {
		return &units.ArgumentError{Field: "log: readings", Value: "none that is not missing", Accepted: "one or more"}
	}
	if span := l.Times[len(l.Times)-1].Sub(l.Times[0]); !span.IsFinite() {
		return &units.ArgumentError{Field: "log: time from first to last reading", Value: span, Accepted: "finite"}
	}
	return nil
}

// copy returns a log of its own memory.
func (l Log) copy() Log {
	return Log{Times: slices.Clone(l.Times), Temperatures: slices.Clone(l.Temperatures)}
}

// present returns what is not missing: seconds from the first time of the log, kelvin, and the place in the log.
func (l Log) present() (seconds, kelvin []float64, place []int) {
	for i, T := range l.Temperatures {
		if !math.IsNaN(T.SI()) {
			seconds = append(seconds, l.Times[i].Sub(l.Times[0]).SI())
			kelvin = append(kelvin, T.SI())
			place = append(place, i)
		}
	}
	return seconds, kelvin, place
}

// Course returns the log as a temperature that goes with time, straight from reading to reading and held after the last,
// such as the ambient of a body. It begins with the first reading, at time 0. An error of [Log.Check] is that of the
// course: the zero Course, which is refused wherever one is needed.
func (l Log) Course() boundary.Course {
	if l.Check() != nil {
		return boundary.Course{}
	}
	seconds, kelvin, _ := l.present()
	times, temperatures := make([]units.Duration, len(seconds)), make([]units.Temperature, len(seconds))
	for i, t := range seconds {
		times[i], temperatures[i] = units.Second.Of(t-seconds[0]), units.Kelvin.Of(kelvin[i])
	}
	return boundary.Log(times, temperatures).Holding()
}

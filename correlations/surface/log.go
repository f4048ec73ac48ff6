package surface

import (
	"fmt"

	"gonum.org/v1/gonum/interp"

	"example.com/coolward/units"
)

// Ends says what a log answers before its first and after its last sample.
type Ends uint8

// The ends.
const (
	Refuse Ends = iota // a [*units.RangeError]
	Hold               // the first sample, and the last
)

// String returns refuse or hold.
func (e Ends) String() string {
	switch e {
	case Refuse:
		return "refuse"
	case Hold:
		return "hold"
	}
	return "unknown ends"
}

// FluxLog returns the course of a heat flux between samples, straight from one to the next. It copies
// them. It returns an [*units.ArgumentError] unless there are as many fluxes as times, at least two, the
// times are 0 or later and rise, and every flux is finite.
func FluxLog(times []units.Duration, fluxes []units.HeatFlux, ends Ends) (FluxCourse, error) {
	for i, q := range fluxes {
		if err := units.CheckFinite(sample(i)+": heat flux", q); err != nil {
			return nil, err
		}
	}
	at, err := between(times, fluxes, ends)
	if err != nil {
		return nil, err
	}
	return func(t units.Duration) (units.HeatFlux, error) {
		x, err := at(t)
		if err != nil {
			return units.HeatFlux{}, err
		}
		return finite("log: heat flux", x)
	}, nil
}

func sample(i int) string { return fmt.Sprintf("log: sample %d", i+1) }

// between returns the function that joins the samples.
func between(times []units.Duration, values []units.HeatFlux, ends Ends) (func(units.Duration) (float64, error), error) {
	if ends > Hold {
		return nil, &units.ArgumentError{Field: "log: ends", Value: ends, Accepted: "surface.Refuse or surface.Hold"}
	}
	if len(times) < 2 || len(times) != len(values) {
		return nil, &units.ArgumentError{
			Field: "log: samples", Value: fmt.Sprintf("%d times and %d values", len(times), len(values)),
			Accepted: "as many values as times, at least two",
		}
	}
	x, y := make([]float64, len(times)), make([]float64, len(times))
	for i, t := range times {
		if err := units.CheckNotNegative(sample(i)+": time", t); err != nil {
			return nil, err
		}
		if i > 0 && !(t.SI() > times[i-1].SI()) {
			return nil, &units.ArgumentError{Field: sample(i) + ": time", Value: t, Accepted: "later than the sample before, " + times[i-1].String()}
		}
		x[i], y[i] = t.SI(), values[i].SI()
	}
	var line interp.PiecewiseLinear
	if err := line.Fit(x, y); err != nil {
		return nil, &units.ArgumentError{Field: "log: samples", Value: err, Accepted: "times that rise"}
	}
	first, last := times[0], times[len(times)-1]
	return func(t units.Duration) (float64, error) {
		if err := units.CheckFinite("log: time", t); err != nil {
			return 0, err
		}
		if ends == Refuse && (t.SI() < first.SI() || t.SI() > last.SI()) {
			return 0, &units.RangeError{Model: "log", Quantity: "time", Value: t.Dynamic(), Min: first.Dynamic(), Max: last.Dynamic(), Source: "first and last sample"}
		}
		return line.Predict(t.SI()), nil // holds outside
	}, nil
}

package lumped

import (
	"context"
	"math"

	"example.com/coolward/units"
)

// At returns the fitted curve at a time on the clock of the log, with the confidence interval of the curve: a
// band for the rest of it. It returns an [*units.ArgumentError] for a time before the first of the log, and
// where the curve would be below 0 K.
func (s *Fitted) At(t units.Duration) (Estimate[units.Temperature, units.TemperatureDifference], error) {
	after, err := s.after(t)
	if err != nil {
		return Estimate[units.Temperature, units.TemperatureDifference]{OpenLow: true, OpenHigh: true}, err
	}
	e, err := s.value(after)
	if err == nil {
		err = units.CheckTemperature("temperature of the fitted curve", e.Value)
	}
	return e, err
}

// Reading is [Fitted.At] for one more reading: the prediction interval, which holds the error of that
// reading too.
func (s *Fitted) Reading(t units.Duration) (Estimate[units.Temperature, units.TemperatureDifference], error) {
	e, err := s.At(t)
	if err != nil || !s.sure {
		return e, err
	}
	e.StandardError = units.KelvinDifference.Of(math.Hypot(e.StandardError.SI(), s.deviation))
	wider := func(end units.Temperature) units.TemperatureDifference {
		return units.KelvinDifference.Of(math.Hypot(end.Sub(e.Value).SI(), s.factor*s.deviation))
	}
	if !e.OpenLow {
		e.Low = e.Value.Add(wider(e.Low).Neg())
	}
	if !e.OpenHigh {
		e.High = e.Value.Add(wider(e.High))
	}
	return e, nil
}

// TimeTo returns when the curve is at the target, on the clock of the log, with the interval in which that is so. The high
// side is open if the readings allow that the target is never reached. A target that is met at the start is
// reached at the first time of the log, before which no interval goes.
//
// It returns a [*units.NeverError] if the curve tends to an ambient that does not pass the target; whether the readings
// tell that ambient is in its condition. An [*units.ArgumentError] reports a target that cannot be.
func (s *Fitted) TimeTo(target units.Temperature) (Estimate[units.Duration, units.Duration], error) {
	e := Estimate[units.Duration, units.Duration]{OpenLow: true, OpenHigh: true}
	if err := s.check(); err != nil {
		return e, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return e, err
	}
	zero := s.fit.Log.Times[0]
	y, c := target.SI()-s.reference, s.curve
	part := (y - c.Ambient) / (c.Start - c.Ambient)
	if part >= 1 {
		return Estimate[units.Duration, units.Duration]{Value: zero, Low: zero, High: zero}, nil
	}
	t := -c.Tau * math.Log(part)
	if !(part > 0) || !isFinite(t) {
		condition := "by the readings so far"
		if !s.AmbientIdentified() {
			condition += ", which do not tell the ambient"
		}
		return e, &units.NeverError{Place: "fitted curve", Target: target, Limit: s.temperature(c.Ambient), Condition: condition}
	}
	e.Value = zero.Add(units.Second.Of(t))
	if !s.sure {
		return e, nil
	}
	slope := math.Abs(y-c.Ambient) / c.Tau
	e.StandardError = units.Second.Of(s.errorAt(t) / slope)
	if err := units.CheckFinite("standard error of the time", e.StandardError); err != nil {
		return e, err
	}
	i := s.profile().Time(t, y, e.StandardError.SI())
	e.OpenLow, e.OpenHigh = i.OpenLow, i.OpenHigh
	if !i.OpenLow {
		e.Low = zero.Add(units.Second.Of(i.Low))
	}
	if !i.OpenHigh {
		e.High = zero.Add(units.Second.Of(i.High))
	}
	return e, nil
}

// Add returns the fit with one more reading, after those of the log. Its errors are those of [Fit.Solve].
func (s *Fitted) Add(ctx context.Context, t units.Duration, reading units.Temperature) (*Fitted, error) {
	if err := s.check(); err != nil {
		return nil, err
	}
	f := s.fit
	f.Log = f.Log.copy()
	f.Log.Times = append(f.Log.Times, t)
	f.Log.Temperatures = append(f.Log.Temperatures, reading)
	return f.Solve(ctx)
}

// after returns the time since the first of the log.
func (s *Fitted) after(t units.Duration) (float64, error) {
	if err := s.check(); err != nil {
		return 0, err
	}
	after := t.Sub(s.fit.Log.Times[0]).SI()
	if !(after >= 0 && isFinite(after)) {
		return 0, &units.ArgumentError{Field: "time", Value: t, Accepted: s.fit.Log.Times[0].String() + " or later, finite"}
	}
	return after, nil
}

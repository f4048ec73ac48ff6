package series

import (
	"math"

	wallmodes "example.com/coolward/internal/wall"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// timeTo returns the first time at which a place is at the target. If it never is, a target on the far side of the
// start counts as met.
func (w *wall) timeTo(place shape.Place, body shape.Body, target units.Temperature) (units.Duration, error) {
	if place.IsSlowest() || place.IsFastest() {
		return w.extreme(place, target)
	}
	probe, err := w.probe(place, body)
	if err != nil {
		return units.Duration{}, err
	}
	fo, err := w.first(probe, place.String(), target)
	if err != nil {
		return units.Duration{}, err
	}
	t := units.Second.Of(fo * w.scale)
	if !t.IsFinite() {
		return units.Duration{}, &units.ConvergenceError{
			Method: "time to a temperature", Place: place.String(),
			Reason: "the target " + target.String() + " is reached at a time beyond the range of float64",
		}
	}
	return t, nil
}

// first returns the Fourier number of the first time.
func (w *wall) first(p wallmodes.Probe, place string, target units.Temperature) (float64, error) {
	wanted := target.SI() - w.reference
	start := w.solution.Ask(p, 0)
	held, prescribed := w.held(p)
	if wanted == start {
		return 0, nil
	}
	end := w.horizon / w.scale
	if prescribed {
		return w.met(start, wanted, held.SI()-w.reference, place, target)
	}
	from := w.resolvedFrom()
	if from > 0 {
		if now := w.solution.Ask(p, from) - wanted; (now > 0) != (start > wanted) {
			return 0, &units.ConvergenceError{
				Method: "time to a temperature", Time: units.Second.Of(from * w.scale), Place: place,
				Reason: "the target " + target.String() + " is reached before the time from which the modes resolve the temperature",
			}
		}
	}
	fo, ok := w.solution.First(p, wanted, from, end)
	switch {
	case ok:
		return fo, nil
	case math.IsNaN(fo):
		return 0, &units.ConvergenceError{
			Method: "time to a temperature", Place: place,
			Reason: "the temperature stays so close to the target " + target.String() + " that no first time is told",
		}
	}
	if !math.IsInf(end, 1) {
		now := units.Kelvin.Of(w.reference + w.solution.Ask(p, end))
		return 0, &units.HorizonError{Place: place, Target: target, Horizon: units.Second.Of(w.horizon), Reached: now, Limit: now}
	}
	if w.solution.Steady.Rise != 0 { // it goes without end, and the target is behind it
		return 0, nil
	}
	return w.met(start, wanted, w.solution.Ask(p, math.MaxFloat64), place, target)
}

// met decides about a target that is not crossed on the way from the start to the limit.
func (w *wall) met(start, wanted, limit float64, place string, target units.Temperature) (float64, error) {
	if wanted != limit && limit != start && (wanted > limit) == (start > limit) {
		return 0, nil
	}
	return 0, &units.NeverError{Place: place, Target: target, Limit: units.Kelvin.Of(w.reference + limit)}
}

// resolvedFrom returns the Fourier number from which the modes resolve temperatures, 0 if they do throughout.
func (w *wall) resolvedFrom() float64 {
	fo := w.solution.Join
	if w.resolves(fo) != nil || w.resolves(fo*1e-18) == nil {
		return 0
	}
	for range 60 {
		if w.resolves(fo/2) != nil {
			return fo
		}
		fo /= 2
	}
	return 0
}

// Places that the slowest and the fastest one are sought at first, and how often the interval around it is narrowed.
const (
	scanned  = 48
	narrowed = 40
)

// extreme returns when the last or the first of all places is at the target for the first time.
func (w *wall) extreme(place shape.Place, target units.Temperature) (units.Duration, error) {
	sign := 1.0
	if place.IsSlowest() {
		sign = -1
	}
	var failure error
	when := func(y float64) float64 { // to be the least
		fo, err := w.first(wallmodes.Probe{Y: y}, place.String(), target)
		if err != nil {
			failure = err
			return math.Inf(1)
		}
		return sign * fo
	}
	best, least := 0.0, math.Inf(1)
	for i := 0; i <= scanned; i++ {
		y := float64(i) / scanned
		t := when(y)
		if failure != nil && place.IsSlowest() {
			return units.Duration{}, failure
		}
		if t < least {
			best, least = y, t
		}
	}
	if math.IsInf(least, 1) {
		return units.Duration{}, failure
	}
	// golden section around the best
	const golden = 0.6180339887498949
	lo, hi := math.Max(0, best-1.0/scanned), math.Min(1, best+1.0/scanned)
	a, b := hi-golden*(hi-lo), lo+golden*(hi-lo)
	ta, tb := when(a), when(b)
	for range narrowed {
		if ta < tb {
			hi, b, tb = b, a, ta
			a = hi - golden*(hi-lo)
			ta = when(a)
		} else {
			lo, a, ta = a, b, tb
			b = lo + golden*(hi-lo)
			tb = when(b)
		}
	}
	if place.IsSlowest() && failure != nil {
		return units.Duration{}, failure
	}
	return units.Second.Of(math.Abs(math.Min(least, math.Min(ta, tb))) * w.scale), nil
}

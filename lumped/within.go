package lumped

import (
	"math"
	"slices"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// An Interval is a span of time.
type Interval struct{ From, To units.Duration }

// Within returns the intervals in which a place is between two temperatures, in their order: when it enters the band and
// when it leaves. The last ends with the solution if the place is within the band then; for a closed form that holds for
// all time its end is the largest number. Errors are those of Crossings.
func (s *Solution) Within(place shape.Place, low, high units.Temperature) ([]Interval, error) {
	if err := s.checkAsked(&place); err != nil {
		return nil, err
	}
	if high.Compare(low) < 0 {
		return nil, &units.ArgumentError{Field: "band: upper temperature", Value: high, Accepted: "not below the lower one, " + low.String()}
	}
	times := []float64{0, s.end}
	for _, target := range []units.Temperature{low, high} {
		all, err := s.Crossings(place, target)
		if err != nil {
			return nil, err
		}
		for _, c := range all {
			times = append(times, c.Time.SI())
		}
	}
	return s.joined(place, low, high, times)
}

// joined returns the intervals between the given times in the middle of which the place is in the band.
func (s *Solution) joined(place shape.Place, low, high units.Temperature, times []float64) ([]Interval, error) {
	slices.Sort(times)
	var all []Interval
	for i := 1; i < len(times); i++ {
		from, to := times[i-1], times[i]
		if from == to {
			continue
		}
		mid := from + (to-from)/2
		if to == math.MaxFloat64 {
			mid = max(1, 2*from)
		}
		at, err := s.place(place, mid)
		if err != nil {
			return nil, err
		}
		if at.Compare(low) < 0 || at.Compare(high) > 0 {
			continue
		}
		if n := len(all); n > 0 && all[n-1].To.SI() == from {
			all[n-1].To = units.Second.Of(to)
			continue
		}
		all = append(all, Interval{units.Second.Of(from), units.Second.Of(to)})
	}
	return all, nil
}

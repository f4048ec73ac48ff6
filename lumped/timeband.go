package lumped

import (
	"context"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A TimeBand is the time to a temperature with the coefficient as given, and at the ends of its scatter.
type TimeBand struct {
	Likely   units.Duration
	Shortest units.Duration // with the coefficient at the end of its scatter that is sooner at the target
	Longest  units.Duration
}

// TimeBand returns the time at which the place is at the target, with every heat transfer coefficient and exchange
// function as it is, and 1 + scatter and 1 − scatter times that; radiation and given fluxes stay. The band is not
// symmetric. It says what the scatter of a correlation, such as 0.25, does to the time; package uncertain takes
// every input with its own uncertainty.
//
// It returns the errors of Solve and [Solution.TimeTo] for any of the three, and an [*units.ArgumentError] for a
// scatter that is not 0 or above and below 1.
func (p Problem) TimeBand(ctx context.Context, place shape.Place, target units.Temperature, scatter float64) (TimeBand, error) {
	if !(scatter >= 0 && scatter < 1) {
		return TimeBand{}, &units.ArgumentError{Field: "scatter", Value: scatter, Accepted: "0 or above and below 1"}
	}
	var times [3]units.Duration
	for i, factor := range []float64{1, 1 + scatter, 1 - scatter} {
		s, err := p.solve(ctx, variant{factor: factor})
		if err != nil {
			return TimeBand{}, err
		}
		if times[i], err = s.TimeTo(place, target); err != nil {
			return TimeBand{}, err
		}
	}
	b := TimeBand{Likely: times[0], Shortest: times[1], Longest: times[2]}
	if b.Shortest.Compare(b.Longest) > 0 { // a source warms it, and the exchange holds that back
		b.Shortest, b.Longest = b.Longest, b.Shortest
	}
	return b, nil
}

package units

import (
	"math"
	"time"
)

// FromTime returns d as a [Duration].
func FromTime(d time.Duration) Duration { return Duration{si: d.Seconds()} }

// ToTime returns d rounded to the nanosecond. It returns an [*ArgumentError] if d does not fit in a
// [time.Duration], which ends at about 292 years.
func ToTime(d Duration) (time.Duration, error) {
	ns := math.Round(d.si * 1e9)
	if !(math.Abs(ns) < 1<<63) {
		return 0, &ArgumentError{"duration as time.Duration", d, "within ±292 years"}
	}
	return time.Duration(ns), nil
}

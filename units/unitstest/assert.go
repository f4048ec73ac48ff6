package unitstest

import (
	"fmt"
	"math"

	"example.com/coolward/units"
)

// A TB is what the assertions need of a [*testing.T], [*testing.B] or [*testing.F].
type TB interface {
	Helper()
	Errorf(format string, args ...any)
}

// Within fails the test unless got lies within the tolerance of want, ends included, and returns
// whether it does. A value or a tolerance that is NaN fails. The arguments behind the tolerance are a
// format with its arguments that says which case it was.
func Within[D units.Dimension](t TB, want, got, tolerance units.Quantity[D], message ...any) bool {
	t.Helper()
	difference := got.Sub(want)
	if math.Abs(difference.SI()) <= tolerance.SI() || got == want {
		return true
	}
	t.Errorf("%sgot  %v\nwant %v\nthe difference is %+v, allowed are ±%v", say(message), got, want, difference, tolerance)
	return false
}

// WithinRelative fails the test unless |got − want| ≤ relative·|want|, and returns whether it is so.
func WithinRelative[D units.Dimension](t TB, want, got units.Quantity[D], relative float64, message ...any) bool {
	t.Helper()
	difference := got.Sub(want)
	if math.Abs(difference.SI()) <= relative*math.Abs(want.SI()) || got == want {
		return true
	}
	t.Errorf("%sgot  %v\nwant %v\nthe difference is %+v or %+.3g %%, allowed are ±%.3g %%", say(message), got, want, difference, 100*difference.Ratio(want.Abs()), 100*relative)
	return false
}

// TemperatureWithin is [Within] for points on a temperature scale.
func TemperatureWithin(t TB, want, got units.Temperature, tolerance units.TemperatureDifference, message ...any) bool {
	t.Helper()
	difference := got.Sub(want)
	if math.Abs(difference.SI()) <= tolerance.SI() || got == want {
		return true
	}
	t.Errorf("%sgot  %v\nwant %v\nthe difference is %+v, allowed are ±%v", say(message), got, want, difference, tolerance)
	return false
}

// say writes the message of the caller on a line of its own.
func say(message []any) string {
	if len(message) == 0 {
		return ""
	}
	if format, ok := message[0].(string); ok {
		return fmt.Sprintf(format, message[1:]...) + "\n"
	}
	return fmt.Sprint(message...) + "\n"
}

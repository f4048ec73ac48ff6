package property

import (
	"math"
	"testing"
)

// near reports a failure unless got is within tolerance of want.
func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s: got %.12g, want %.12g ± %.3g", what, got, want, tolerance)
	}
}

package correlations_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

// What cools a long hot wire is measured as U (cos²yaw + k² sin²yaw)^(1/2) with k 0.20 at 200 diameters, falling to 0 at 600 (F. H.
// Champagne, C. A. Sleicher and O. H. Wehrmann, J. Fluid Mech. 28 (1967) 153-175, from memory). The Nusselt numbers of both lie within
// half of the scatter of the correlation.
func TestYawedRe(t *testing.T) {
	c := correlations.ChurchillBernsteinCylinder()
	for _, tt := range []struct{ yaw, cos float64 }{{0, 1}, {30, math.Sqrt(3) / 2}, {45, math.Sqrt2 / 2}, {60, 0.5}} {
		re, err := correlations.YawedRe(1000, units.Degree.Of(tt.yaw))
		if err != nil || math.Abs(re-1000*tt.cos) > 1e-9 {
			t.Errorf("yaw of %g°: %v, %v, want %g", tt.yaw, re, err, 1000*tt.cos)
		}
		wire := 1000 * math.Sqrt(tt.cos*tt.cos+0.2*0.2*(1-tt.cos*tt.cos))
		if got, want := nu(t, c, groups{Re: re, Pr: 0.7}), nu(t, c, groups{Re: wire, Pr: 0.7}); math.Abs(got/want-1) > c.Scatter().Relative/2 {
			t.Errorf("yaw of %g°: Nu %.4g, by the speed that cools a wire %.4g", tt.yaw, got, want)
		}
	}
	var bad *units.ArgumentError
	for _, re := range []float64{-1, math.NaN(), math.Inf(1)} {
		if x, err := correlations.YawedRe(re, units.Angle{}); !errors.As(err, &bad) || x != 0 {
			t.Errorf("Re %v: %v, %v", re, x, err)
		}
	}
	var out *units.RangeError
	for _, yaw := range []float64{-1, 61, math.NaN(), math.Inf(1)} {
		if x, err := correlations.YawedRe(1, units.Degree.Of(yaw)); !errors.As(err, &out) || x != 0 {
			t.Errorf("yaw of %v°: %v, %v", yaw, x, err)
		}
	}
}

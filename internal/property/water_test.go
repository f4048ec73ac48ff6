package property

import (
	"fmt"
	"testing"
)

// IAPWS R7-97(2012), table 35, from memory, and table 36 read backwards. Nine digits.
func TestWaterSaturation(t *testing.T) {
	for _, c := range []struct{ temp, p, relative float64 }{
		{300, 0.353658941e4, 5e-9},
		{500, 0.263889776e7, 5e-9},
		{600, 0.123443146e8, 5e-9},
		// Half of the last digit of T, times d ln p/d ln T.
		{372.755919, 1e5, 5e-7 / 372.755919 * 13.3},
		{453.035632, 1e6, 5e-7 / 453.035632 * 10.4},
	} {
		near(t, fmt.Sprintf("saturation pressure at %g K", c.temp), WaterSaturation(c.temp), c.p, c.relative*c.p)
	}
}

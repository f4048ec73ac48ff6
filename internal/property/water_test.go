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
		{372.755919, 1e5, 4e-9 + 5e-10*13.3}, // half of the last digit of T; dlnp/dlnT = 13.3 there
		{453.035632, 1e6, 4e-9 + 1.2e-9*10.4},
	} {
		near(t, fmt.Sprintf("saturation pressure at %g K", c.temp), WaterSaturation(c.temp), c.p, c.relative*c.p)
	}
}

package wall

import (
	"math"
	"testing"

	"example.com/coolward/internal/table"
)

// body returns the wall of a row of the tables.
func body(m int, ra float64) Body {
	if m == 0 {
		return Plate()
	}
	return Hollow(m, ra)
}

// The reference has 22 digits. A root is to be good to the last digits of a float64, the coefficients to what the
// functions of Bessel of a float64 leave.
func TestModes(t *testing.T) {
	const rootTolerance, tolerance = 8e-15, 1e-13
	worst := [3]float64{}
	for _, row := range table.Named(t, "testdata/modes.csv") {
		number := func(column string) float64 { return table.Number(t, row[column]) }
		n, m, ra, ha, hb := int(number("n")), int(number("m")), number("ra"), number("ha"), number("hb")
		s := New(body(m, ra), ha, hb, n)
		mode := &s.All[n-1]
		got := [3]float64{mode.Zeta, mode.Integral / mode.Norm * mode.Integral / s.Body.Volume(1), mode.Integral / mode.Norm * s.At(mode, 0.375)}
		want := [3]float64{number("zeta"), number("mean"), number("inside")}
		off := [3]float64{math.Abs(got[0]/want[0] - 1), math.Abs(got[1] - want[1]), math.Abs(got[2] - want[2])}
		for i, limit := range [3]float64{rootTolerance, tolerance, tolerance} {
			worst[i] = math.Max(worst[i], off[i])
			if !(off[i] <= limit) {
				t.Errorf("m %d, Ra %v, H %v and %v, n %d: %s %.17g, want %.17g, off by %.2g, tolerance %.2g",
					m, ra, ha, hb, n, [3]string{"root", "mean", "inside"}[i], got[i], want[i], off[i], limit)
			}
		}
	}
	t.Logf("worst: root %.2g relative, mean %.2g, inside %.2g absolute", worst[0], worst[1], worst[2])
}

package lumped

import (
	"fmt"
	"math"
	"testing"

	"example.com/coolward/internal/eigen"
)

// largestError returns the largest |θ_exact − exp(−m Bi Fo)| over Fo: the best of a scan, refined by halving
// the grid around it.
func largestError(theta func(fo float64) float64, m, bi float64) float64 {
	f := func(logFo float64) float64 {
		fo := math.Exp(logFo)
		return math.Abs(theta(fo) - math.Exp(-m*bi*fo))
	}
	low, high := math.Log(1e-6*min(1, 1/(bi*bi))), math.Log(40*max(1/(m*bi), 0.1))
	best, at, step := 0.0, low, 0.05
	for x := low; x < high; x += step {
		if y := f(x); y > best {
			best, at = y, x
		}
	}
	for ; step > 1e-6; step /= 2 {
		for _, x := range []float64{at - step, at + step} {
			if y := f(x); y > best {
				best, at = y, x
			}
		}
	}
	return best
}

func modesOfTable(body int, bi float64) eigen.Solution {
	return []func(float64) eigen.Solution{plateModes, cylinderModes, sphereModes}[body](bi)
}

func placeOfTable(modes eigen.Solution, place int) func(fo float64) float64 {
	return []func(float64) float64{modes.Centre, modes.Surface, modes.Mean}[place]
}

// The table is what the exact series give.
func TestTableIsCurrent(t *testing.T) {
	for body := range bodiesOfTable {
		for place := range placesOfTable {
			for i := range tableLength {
				bi := biotOfTable(i)
				e := largestError(placeOfTable(modesOfTable(body, bi), place), float64(body+1), bi) * (1 + bi) / bi
				within(t, fmt.Sprintf("body %d, place %d, Bi %g", body, place, bi), lumpingErrors[body][place][i], e, 1e-6)
			}
		}
	}
}

// Between the points of the table the bound holds, and is at most 3 % above the largest error.
func TestTableBetweenItsPoints(t *testing.T) {
	for body := range bodiesOfTable {
		for place := range placesOfTable {
			for bi := 2e-4; bi < 2e3; bi *= 1.37 {
				e := largestError(placeOfTable(modesOfTable(body, bi), place), float64(body+1), bi)
				bound := tabulatedBound(body, place, bi)
				if bound < e || bound > 1.03*e && bi <= tableLast {
					t.Errorf("body %d, place %d, Bi %g: bound %g, largest error %g", body, place, bi, bound, e)
				}
			}
		}
	}
}

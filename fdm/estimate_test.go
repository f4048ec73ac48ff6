package fdm_test

import (
	"math"
	"testing"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units/shape"
)

// The estimate of the error against the exact series for a sphere of constant properties, Bi 0.01 to 1000, with 200
// cells and the default tolerance: from Fo = 1e-4 on the error stays within it, and it is not far more
// than the error, the largest at times up to a half more or less, since an error that changes its sign is none on the way. It
// is at most three times that from Fo = 0.01 on, and thirty times before. An error below 1e-6 of the range is not
// looked at. On the grid that is chosen for 10 mK, of which a quarter may be 8 cells, it is at most ten times that.
func TestEstimateAgainstSeries(t *testing.T) {
	for _, cells := range []int{200, 0} {
		closely := 3.0
		if cells == 0 {
			closely = 10
		}
		for _, bi := range []float64{0.01, 0.1, 1, 10, 100, 1000} {
			p := scaled(bi, cells)
			p.Horizon = seconds(5e4 / math.Min(1, bi))
			s, exact := solve(t, p), eigen.NewSphere(bi)
			largest, err := s.LargestError()
			if err != nil {
				t.Fatal(err)
			}
			truth := 0.0
			for i := range len(fractions) + 1 {
				place, series := shape.Mean(), exact.Mean
				if i < len(fractions) {
					place = below(fractions[i])
					series = func(fo float64) float64 { return exact.At(fractions[i], fo) }
				}
				var fos, errors, estimates []float64
				for fo := 1e-4; fo < p.Horizon.SI()*1e-4; fo *= 1.05 {
					fos = append(fos, fo)
					errors = append(errors, math.Abs(at(t, s, place, fo*1e4)-300-100*series(fo)))
					estimates = append(estimates, estimate(t, s, place, fo*1e4))
				}
				most, lately := 0.0, 0.0
				for j, fo := range fos {
					if errors[j] > estimates[j]+1e-10 {
						t.Errorf("%d cells, Bi %g, Fo %.4g, %v: off by %.3g K, estimate %.3g K", cells, bi, fo, place, errors[j], estimates[j])
					}
					around := 0.0
					for k := range fos {
						if fos[k] > fo/2.01 && fos[k] < fo*2.01 {
							around = math.Max(around, errors[k])
						}
					}
					if i == 0 || i >= 3 {
						truth = math.Max(truth, errors[j])
					}
					if around < 1e-4 {
						continue
					}
					ratio := estimates[j] / around
					if fo >= 0.01 {
						lately = math.Max(lately, ratio)
					} else {
						most = math.Max(most, ratio)
					}
				}
				if lately > closely || most > 30 {
					t.Errorf("%d cells, Bi %g, %v: estimate %.2f times the error from Fo 0.01 on, %.2f before", cells, bi, place, lately, most)
				}
			}
			if truth > largest.SI() {
				t.Errorf("%d cells, Bi %g: largest error %.3g K, estimate %v", cells, bi, truth, largest)
			}
			t.Logf("%d cells, Bi %g: largest error %.3g K, estimate %v, %+v", cells, bi, truth, largest, s.Statistics())
		}
	}
}

package eigen

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"
)

// The integral of θ by quadrature of θ itself, over u = √Fo and in pieces; and its limit, the mean time that
// heat takes, 1/(m Bi) + (1 − x²)/(2m), and for the mean 1/(m Bi) + 1/(m (m + 2)).
func TestIntegral(t *testing.T) {
	for _, b := range bodies {
		worst := 0.0
		for _, bi := range []float64{1e-3, 0.3, 0.5, 1, 2, 30, 1e4, math.Inf(1)} {
			s := b.new(bi)
			for _, x := range []float64{-1, 0, 1e-5, 0.05, 0.3, 0.8, 0.99, 1} {
				theta, got := func(fo float64) float64 { return s.At(x, fo) }, func(fo float64) float64 { return Integral(s, x, fo) }
				limit := 1/(b.dimension*bi) + (1-x*x)/(2*b.dimension)
				if x < 0 { // the mean
					theta, got = s.Mean, func(fo float64) float64 { return IntegralOfMean(s, fo) }
					limit = 1/(b.dimension*bi) + 1/(b.dimension*(b.dimension+2))
				}
				want, from := 0.0, 0.0
				for _, fo := range []float64{1e-6, 1e-5, 1e-4, 1e-3, 0.005, 0.012, 0.024, 0.05, 0.2, 1} {
					const pieces = 4
					a, z := math.Sqrt(from), math.Sqrt(fo)
					for k := range pieces {
						u, v := a+(z-a)*float64(k)/pieces, a+(z-a)*float64(k+1)/pieces
						want += quad.Fixed(func(u float64) float64 { return theta(u*u) * 2 * u }, u, v, 24, quad.Legendre{}, 0)
					}
					from = fo
					worst = math.Max(worst, math.Abs(got(fo)-want))
					if !(math.Abs(got(fo)-want) <= 1e-12) {
						t.Errorf("%s, Bi %v, x %v, Fo %v: integral %.15g, by quadrature %.15g", b.name, bi, x, fo, got(fo), want)
					}
				}
				if got := got(1e9); !(math.Abs(got-limit) <= 1e-12*(1+limit)) {
					t.Errorf("%s, Bi %v, x %v: integral to infinity %.15g, want %.15g", b.name, bi, x, got, limit)
				}
			}
		}
		t.Logf("%s: worst %.2g", b.name, worst)
	}
}

package eigen

import (
	"math"
	"math/rand"
	"testing"
)

// The bound covers what is left out and is not more than a hundred times that and 1e-15, over random places, times and
// Biot numbers from 1e-12 to 1e12. From the join on that is the rest of the series, whose terms are added here. Before
// it, the bound is checked as part of the whole error in TestAgainstBig.
func TestTruncation(t *testing.T) {
	for _, b := range bodies {
		r := rand.New(rand.NewSource(7))
		worst, most := 0.0, 0
		for range 1500 {
			bi := randomBiot(r)
			x, fo := r.Float64(), b.join*math.Pow(10, 3.5*r.Float64())
			s := b.new(bi)
			taken, left := 0, 0.0
			first := s.Decay()
			for n := 1; n <= b.terms+30; n++ {
				zeta, c, _, _ := AnyTerm(s, n)
				if zeta*zeta <= first+negligible/fo && n <= b.terms {
					taken++
					continue
				}
				f := map[float64]func(float64) float64{1: math.Cos, 2: math.J0, 3: sinc}[b.dimension](zeta * x)
				left += c * math.Exp(-zeta*zeta*fo) * f
			}
			most = max(most, taken)
			left = math.Abs(left)
			bound := s.Truncation(fo)
			if bound > 0 {
				worst = math.Max(worst, left/bound)
			}
			if !(left <= bound && bound <= 100*left+1e-15) || taken > 50 {
				t.Errorf("%s, Bi %v, Fo %v, x %v: %d terms leave out %.3g, bound %.3g", b.name, bi, fo, x, taken, left, bound)
			}
		}
		t.Logf("%s: at most %.2g of the bound, %d terms", b.name, worst, most)
	}
}

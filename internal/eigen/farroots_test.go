package eigen

import (
	"math"
	"math/rand"
	"testing"
)

// Far roots, by the step of Newton's method that the equation itself, with the functions of package math, asks for: they
// are good to 1e-16 at any argument, which is 2e-16 √ζ of a root of a cylinder, far less than its rounding.
func TestFarRoots(t *testing.T) {
	for _, b := range bodies {
		r := rand.New(rand.NewSource(31))
		worst := 0.0
		for range 5000 {
			n, bi := 20+int(math.Pow(10, 5*r.Float64())), math.Pow(10, 24*r.Float64()-12)
			if r.Intn(3) == 0 {
				bi = float64(n) * 10 * r.Float64()
			}
			zeta := b.root(n, bi)
			one, h := 1/math.Max(1, bi), bi/math.Max(1, bi)
			sin, cos := math.Sincos(zeta)
			f, slope := one*zeta*sin-h*cos, one*(sin+zeta*cos)+h*sin
			switch b.dimension {
			case 2:
				j0, j1 := math.J0(zeta), math.J1(zeta)
				f, slope = one*zeta*j1-h*j0, one*zeta*j0+h*j1
			case 3:
				f, slope = one*zeta*cos+(h-one)*sin, one*(cos-zeta*sin)+(h-one)*cos
			}
			d := math.Abs(f/slope) / (math.Nextafter(zeta, math.Inf(1)) - zeta)
			worst = math.Max(worst, d)
			if want := math.Pi * (float64(n) - map[float64]float64{1: 0.75, 2: 0.5, 3: 0.25}[b.dimension]); !(d <= 2 && math.Abs(zeta-want) <= 0.81) {
				t.Errorf("%s, Bi %v, n %d: root %.17g is off by %.1f ULP; wanted near %.5g", b.name, bi, n, zeta, d, want)
			}
		}
		t.Logf("%s: worst %.2f ULP", b.name, worst)
	}
}

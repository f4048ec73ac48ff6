package eigen

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"
)

// By the balance: the mean is m Fo, also by integration over the volume; the two forms meet at the join; the
// equation of conduction holds, and the slope at the surface is 1.
func TestFlux(t *testing.T) {
	for _, b := range bodies {
		f := map[string]func() Flux{"plate": NewPlateFlux, "cylinder": NewCylinderFlux, "sphere": NewSphereFlux}[b.name]()
		for _, fo := range []float64{1e-4, 0.003, 0.02, 0.03, 0.2, 1, 7} {
			mean := 0.0
			for k := range 8 {
				mean += quad.Fixed(func(x float64) float64 { return b.dimension * math.Pow(x, b.dimension-1) * f.At(x, fo) }, float64(k)/8, float64(k+1)/8, 24, quad.Legendre{}, 0)
			}
			if want := f.Mean(fo); !(math.Abs(mean-want) <= 1e-11) || want != b.dimension*fo {
				t.Errorf("%s, Fo %v: mean %.15g, want %.15g", b.name, fo, mean, want)
			}
			const e = 1e-4
			if slope := (3*f.At(1, fo) - 4*f.At(1-e, fo) + f.At(1-2*e, fo)) / (2 * e); !(math.Abs(slope-1) <= 1e-3) {
				t.Errorf("%s, Fo %v: slope %v at the surface, want 1", b.name, fo, slope)
			}
			for _, x := range []float64{0.3, 0.8} {
				rate := (f.At(x, fo*(1+e)) - f.At(x, fo*(1-e))) / (2 * e * fo)
				in, here, out := f.At(x-e, fo), f.At(x, fo), f.At(x+e, fo)
				spread := (out-2*here+in)/(e*e) + (b.dimension-1)*(out-in)/(2*e*x)
				if !(math.Abs(rate-spread) <= 1e-4*math.Max(1, rate)) {
					t.Errorf("%s, Fo %v, x %v: %v by time, %v by conduction", b.name, fo, x, rate, spread)
				}
			}
		}
		for _, x := range []float64{0, 1e-6, 0.05, 0.3, 0.7, 0.99, 1} {
			before, after := f.At(x, math.Nextafter(b.join, 0)), f.At(x, b.join)
			if !(math.Abs(before-after) <= 1e-14) {
				t.Errorf("%s, x %v: %.17g before the join, %.17g behind", b.name, x, before, after)
			}
			if got := f.At(x, 0); got != 0 {
				t.Errorf("%s, x %v: %v at the start, want 0", b.name, x, got)
			}
		}
		// the classical end: centre m Fo − m/(2(m+2)), surface 1/(m+2) above the mean
		if got, want := f.At(1, 50)-f.Mean(50), 1/(b.dimension+2); !(math.Abs(got-want) <= 1e-13) {
			t.Errorf("%s: surface %v above the mean at last, want %v", b.name, got, want)
		}
		if zeta, c := f.Term(2); !(zeta > 3 && c < 0) {
			t.Errorf("%s: term 2 is %v, %v", b.name, zeta, c)
		}
	}
}

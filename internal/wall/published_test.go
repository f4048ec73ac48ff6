package wall

import (
	"math"
	"testing"
)

// Roots of J0(x) Y0(kx) − J0(kx) Y0(x) = 0: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford
// University Press 1959, appendix IV, and M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions, table 9.7 (from
// memory). It is the tube with both faces held at a temperature, with x over the inner radius.
func TestPublishedRoots(t *testing.T) {
	for _, row := range []struct {
		k     float64
		roots []float64
	}{
		{1.2, []float64{15.7014, 31.4126, 47.1217, 62.8302, 78.5385}},
		{1.5, []float64{6.2702, 12.5598, 18.8451, 25.1294, 31.4133}},
		{2, []float64{3.1230, 6.2734, 9.4182, 12.5614, 15.7040}},
		{3, []float64{1.5485, 3.1291, 4.7038, 6.2767, 7.8487}},
		{4, []float64{1.0244, 2.0809, 3.1322, 4.1816, 5.2301}},
	} {
		m := New(Hollow(1, 1/(row.k-1)), math.Inf(1), math.Inf(1), len(row.roots))
		for i, want := range row.roots {
			if got := m.All[i].Zeta / (row.k - 1); !(math.Abs(got-want) <= 0.51e-4) {
				t.Errorf("k %v, root %d: %.7g, want %v to its digits", row.k, i+1, got, want)
			}
		}
	}
}

// Eigenfunctions are orthogonal, with the weight and to the norms that are kept, and mode n has n − 1 zeros: none is missed.
func TestOrthogonality(t *testing.T) {
	for _, b := range []Body{Plate(), Hollow(1, 0.05), Hollow(1, 2), Hollow(1, 200), Hollow(2, 0.05), Hollow(2, 30), Solid(1), Solid(2)} {
		for _, h := range [][2]float64{{0, 1e-6}, {0.3, 40}, {math.Inf(1), 2}, {1e-3, 1e-3}, {7, math.Inf(1)}, {0, 0}} {
			m := New(b, h[0], h[1], 5)
			for i := range m.All {
				for j := range i + 1 {
					got := b.Integrate(func(y float64) float64 { return m.At(&m.All[i], y) * m.At(&m.All[j], y) })
					want := 0.0
					if i == j {
						want = m.All[i].Norm
					}
					if size := math.Sqrt(m.All[i].Norm * m.All[j].Norm); !(math.Abs(got-want) <= 2e-10*size) {
						t.Errorf("m %d, Ra %v, solid %v, H %v, modes %d and %d: %.3g of their norms, want %.3g", b.Dimension, b.Ra, b.Solid, h, i+1, j+1, got/size, want/size)
					}
				}
				zeros := 0
				for k := range 2000 {
					if m.At(&m.All[i], (float64(k)+0.5)/2001) > 0 != (m.At(&m.All[i], (float64(k)+1.5)/2001) > 0) {
						zeros++
					}
				}
				if zeros != i {
					t.Errorf("m %d, Ra %v, solid %v, H %v: mode %d has %d zeros, want %d", b.Dimension, b.Ra, b.Solid, h, i+1, zeros, i)
				}
			}
		}
	}
}

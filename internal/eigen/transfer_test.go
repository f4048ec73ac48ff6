package eigen

import (
	"math"
	"math/cmplx"
	"testing"
)

// The modes give the same: Σ c_n λ_n/(λ_n + iω), with the terms left out settled, which is iω times the transform of
// the integral; here by 2000 terms of the mean and the surface, all positive, to the size of the first left out.
func TestTransferAgainstModes(t *testing.T) {
	for _, b := range bodies {
		for _, bi := range []float64{1e-6, 0.2, 1, 5, 300, math.Inf(1)} {
			s := b.new(bi)
			for _, omega := range []float64{1e-9, 1e-3, 0.3, 0.99, 1.01, 2, 30, 500, 600, 1e3} {
				mean, surface, meanRest := complex(0, 0), complex(1, 0), 1.0
				for n := 1; n <= 2000; n++ {
					zeta := b.root(n, bi)
					_, cs, cm := b.coefficients(bi, zeta)
					rate := zeta * zeta
					mean += complex(cm, 0) * complex(rate, 0) / complex(rate, omega)
					meanRest -= cm
					surface -= complex(cs, 0) * complex(0, omega) / complex(rate, omega) // 1 − Σ c iω/(λ + iω)
				}
				mean += complex(meanRest, 0)
				if got := TransferOfMean(s, omega); !(cmplx.Abs(got-mean) <= 1e-7*(1+omega)*1e-3+1e-11) {
					t.Errorf("%s, Bi %v, ω %v: mean %v, by modes %v", b.name, bi, omega, got, mean)
				}
				// the tail of Σ c/λ is below 2 Bi Σ 1/ζ⁴
				if got := Transfer(s, 1, omega); !math.IsInf(bi, 1) && !(cmplx.Abs(got-surface) <= 1e-11*(1+omega*bi)) {
					t.Errorf("%s, Bi %v, ω %v: surface %v, by modes %v", b.name, bi, omega, got, surface)
				}
			}
		}
	}
}

// The equation of conduction, G” + (m − 1)/x G' = iω G, by differences, inside and for every branch.
func TestTransferEquation(t *testing.T) {
	const e = 1e-4
	for _, b := range bodies {
		s := b.new(3)
		for _, omega := range []float64{0.1, 1, 20, 300, 2000} {
			for _, x := range []float64{0.03, 0.2, 0.6, 0.9} {
				in, here, out := Transfer(s, x-e, omega), Transfer(s, x, omega), Transfer(s, x+e, omega)
				got := (out-2*here+in)/complex(e*e, 0) + complex((b.dimension-1)/(2*e*x), 0)*(out-in)
				if want := complex(0, omega) * here; !(cmplx.Abs(got-want) <= 1e-4*cmplx.Abs(want)+1e-6) {
					t.Errorf("%s, ω %v, x %v: %v, want %v", b.name, omega, x, got, want)
				}
			}
		}
	}
}

// From one branch to the next, within rounding in their condition.
func TestTransferBranches(t *testing.T) {
	for _, b := range bodies {
		s := b.new(3)
		for _, size := range []float64{1, 24} {
			below, above := math.Nextafter(size*size, 0), math.Nextafter(size*size, 1e9)
			for _, x := range []float64{0, 0.5, 1} {
				if u, v := Transfer(s, x, below*(1-1e-14)), Transfer(s, x, above*(1+1e-14)); !(cmplx.Abs(u-v) <= 2e-12*cmplx.Abs(u)) {
					t.Errorf("%s, ω %v, x %v: %v just below, %v just above", b.name, size*size, x, u, v)
				}
			}
		}
		if got := Transfer(s, 0.5, 1e300); cmplx.IsNaN(got) || cmplx.Abs(got) > 1e-300 {
			t.Errorf("%s, very fast: %v, want 0", b.name, got)
		}
	}
}

// The table against the integral itself.
func TestResponseTable(t *testing.T) {
	for _, b := range bodies {
		worst := 0.0
		for _, bi := range []float64{0.01, 1, 50, 8190, math.Inf(1)} {
			s := b.new(bi)
			for _, x := range []float64{-1, 0, 0.4, 0.95, 0.99993, 1} {
				r := NewResponse(s, x)
				if x < 0 {
					r = NewResponseOfMean(s)
				}
				for v := 0.0013; v < 1.1; v += 0.0131 {
					fo := b.join * v * v
					missing, theta := r.MissingIntegral(fo)
					got := missing + settled(s, r.place, fo)
					if want := r.Missing(fo); v > 0.1 && !(math.Abs(theta-want) <= 1e-6) {
						t.Errorf("%s, Bi %v, x %v, Fo %v: missing θ %.12g from the table, want %.12g", b.name, bi, x, fo, theta, want)
					}
					want := integral(s, r.place, fo)
					worst = math.Max(worst, math.Abs(got-want))
					if !(math.Abs(got-want) <= 2e-11) {
						t.Errorf("%s, Bi %v, x %v, Fo %v: integral %.12g from the table, want %.12g", b.name, bi, x, fo, got, want)
					}
				}
			}
		}
		t.Logf("%s: worst %.2g", b.name, worst)
	}
}

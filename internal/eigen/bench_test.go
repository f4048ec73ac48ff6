package eigen

import (
	"fmt"
	"math"
	"testing"
)

var sink float64

// The plain formula that the others are to be seen beside: one term by hand.
func BenchmarkOneTermByHand(b *testing.B) {
	fo := 0.4
	for b.Loop() {
		sink = 1.1191 * math.Exp(-0.740174*fo)
	}
}

func BenchmarkFirstRoot(b *testing.B) {
	for _, body := range bodies {
		b.Run(body.name, func(b *testing.B) {
			bi := 0.01
			for b.Loop() {
				sink = body.root(1, bi)
				if bi *= 1.1; bi > 100 {
					bi = 0.01
				}
			}
		})
	}
}

func BenchmarkRoots(b *testing.B) { // each
	for _, body := range bodies {
		b.Run(body.name, func(b *testing.B) {
			bi, n := 0.01, 1
			for b.Loop() {
				sink = body.root(n, bi)
				if bi *= 1.1; bi > 100 {
					bi = 0.01
				}
				n = n%14 + 1
			}
		})
	}
}

func BenchmarkFarRoots(b *testing.B) { // each
	for _, body := range bodies {
		b.Run(body.name, func(b *testing.B) {
			bi, n := 0.01, 20
			for b.Loop() {
				sink = body.root(n, bi)
				if bi *= 1.1; bi > 1000 {
					bi = 0.01
				}
				if n += 3; n > 2000 {
					n = 15
				}
			}
		})
	}
}

func BenchmarkTheta(b *testing.B) {
	for _, body := range bodies {
		s := body.new(2)
		for _, c := range []struct {
			name  string
			theta func() float64
		}{
			{"centre at Fo 0.2", func() float64 { return s.Centre(0.2) }},
			{"inside at Fo 0.2", func() float64 { return s.At(0.6, 0.2) }},
			{"inside at the join", func() float64 { return s.At(0.6, body.join) }},
			{"centre before the join", func() float64 { return s.Centre(0.9 * body.join) }},
			{"inside before the join", func() float64 { return s.At(0.8, 0.9*body.join) }},
			{"surface before the join", func() float64 { return s.Surface(0.9 * body.join) }},
			{"mean before the join", func() float64 { return s.Mean(0.9 * body.join) }},
		} {
			b.Run(body.name+" "+c.name, func(b *testing.B) {
				for b.Loop() {
					sink = c.theta()
				}
			})
		}
	}
}

// At any time from the earliest on.
func BenchmarkThetaOverTime(b *testing.B) {
	for _, body := range bodies {
		for _, bi := range []float64{0.01, 2, math.Inf(1)} {
			s := body.new(bi)
			for _, fo := range []float64{1e-8, 1e-5, 1e-3, 0.99 * body.join, body.join, 0.02, 0.0249, 0.05, 0.2} {
				b.Run(fmt.Sprintf("%s, Bi %v, Fo %.4g", body.name, bi, fo), func(b *testing.B) {
					x := 1 - math.Min(0.5, math.Sqrt(fo))
					for b.Loop() {
						sink = s.At(x, fo)
					}
				})
			}
		}
	}
}

func BenchmarkNew(b *testing.B) {
	for _, body := range bodies {
		b.Run(body.name, func(b *testing.B) {
			for b.Loop() {
				sink = body.new(2).Biot()
			}
		})
	}
}

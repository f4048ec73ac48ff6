package rosenbrock

import (
	"fmt"
	"testing"
)

// The sums of a step over 202 components, beside which stand its solutions and evaluations.
func BenchmarkCombine(b *testing.B) {
	s := newStepper(&riccati{}, make([]float64, 202), nil)
	for _, w := range [][]float64{c2[:], c3[:], c4[:], c5[:], c6[:]} {
		b.Run(fmt.Sprint(len(w)), func(b *testing.B) {
			for b.Loop() {
				combine(s.next, s.rate, 0.3, w, &s.u)
			}
		})
	}
	b.Run("dense", func(b *testing.B) {
		for b.Loop() {
			s.dense(s.next, s.rate)
		}
	})
}

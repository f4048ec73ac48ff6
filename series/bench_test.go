package series_test

import (
	"context"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// oneTerm is the temperature at the centre as one would write it by hand, with the first term alone.
func oneTerm(zeta, c, excess, ambient, diffusivity, radius, t float64) float64 {
	return ambient + excess*c*math.Exp(-zeta*zeta*diffusivity*t/(radius*radius))
}

var sink float64

func BenchmarkOneTermByHand(b *testing.B) {
	b.ReportAllocs()
	t := 25.6
	for b.Loop() {
		sink = oneTerm(2.148341475, 1.54330041, 70, 293.15, 5e-7, 0.008, t)
		t += 1e-9
	}
}

func benchmarkAt(b *testing.B, place shape.Place, fo float64) {
	b.ReportAllocs()
	s := solve(b, marble())
	t := units.Second.Of(fo / s.Fourier(units.Second.Of(1)))
	for b.Loop() {
		T, err := s.At(place, t)
		if err != nil {
			b.Fatal(err)
		}
		sink = T.SI()
	}
}

func BenchmarkCentreAtFo02(b *testing.B)  { benchmarkAt(b, shape.Centre(), 0.2) }
func BenchmarkInsideAtFo02(b *testing.B)  { benchmarkAt(b, shape.Below(units.Millimetre.Of(3)), 0.2) }
func BenchmarkCentreAtFo001(b *testing.B) { benchmarkAt(b, shape.Centre(), 0.01) }
func BenchmarkInsideAtFo001(b *testing.B) { benchmarkAt(b, shape.Below(units.Millimetre.Of(3)), 0.01) }

func BenchmarkTimeTo(b *testing.B) {
	b.ReportAllocs()
	s := solve(b, marble())
	for b.Loop() {
		t, err := s.TimeTo(shape.Centre(), units.Celsius.Of(40))
		if err != nil {
			b.Fatal(err)
		}
		sink = t.SI()
	}
}

func BenchmarkSolve(b *testing.B) {
	b.ReportAllocs()
	p := marble()
	for b.Loop() {
		s, err := p.Solve(context.Background())
		if err != nil {
			b.Fatal(err)
		}
		sink = s.Biot()
	}
}

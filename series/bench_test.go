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

// brick is the core temperature of a brick by hand, with the first term of each plate.
func brickByHand(fo float64) float64 {
	theta := 1.0
	for _, f := range [...]struct{ zeta, c, ratio float64 }{{1.1422, 1.2102, 1}, {1.1925, 1.2250, 0.64}, {1.2646, 1.2403, 0.284}} {
		theta *= f.c * math.Exp(-f.zeta*f.zeta*f.ratio*fo)
	}
	return 293.15 + 70*theta
}

func BenchmarkBrickByHand(b *testing.B) {
	fo := 0.5
	for b.Loop() {
		sink = brickByHand(fo)
		fo += 1e-12
	}
}

func BenchmarkBodies(b *testing.B) {
	for _, stone := range stones() {
		s := solve(b, stone.problem)
		for _, fo := range []float64{0.003, 0.2} {
			t := units.Second.Of(fo / s.Fourier(units.Second.Of(1)))
			for _, place := range []shape.Place{shape.Centre(), shape.Below(units.Millimetre.Of(1))} {
				b.Run(stone.name+" "+place.String()+" at Fo "+units.Number(fo).String(), func(b *testing.B) {
					b.ReportAllocs()
					for b.Loop() {
						T, _ := s.At(place, t)
						sink = T.SI()
					}
				})
			}
		}
		for _, place := range []shape.Place{shape.Centre(), shape.Below(units.Millimetre.Of(1)), shape.Surface(), shape.Mean()} {
			for _, target := range []float64{40, 80} { // of 20 to 90 °C
				b.Run(stone.name+" "+place.String()+" time to "+units.Number(target).String(), func(b *testing.B) {
					b.ReportAllocs()
					for b.Loop() {
						t, _ := s.TimeTo(place, units.Celsius.Of(target))
						sink = t.SI()
					}
				})
			}
		}
	}
}

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

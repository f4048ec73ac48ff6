package lumped

import (
	"context"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

var sink float64

func BenchmarkAtPlain(b *testing.B) {
	limit, excess, rate, x := 298.15, 75.0, -1.0/1667, 0.0
	for b.Loop() {
		sink = limit + excess*math.Exp(rate*x)
		x++
	}
}

func BenchmarkAt(b *testing.B) {
	s := solve(b, Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)})
	centre, x := shape.Centre(), 0.0
	b.ReportAllocs()
	for b.Loop() {
		t, err := s.At(centre, seconds(x))
		if err != nil {
			b.Fatal(err)
		}
		sink = t.SI()
		x++
	}
}

func BenchmarkTimeTo(b *testing.B) {
	s := solve(b, Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)})
	for b.Loop() {
		t, err := s.TimeTo(shape.Centre(), kelvin(320))
		if err != nil {
			b.Fatal(err)
		}
		sink = t.SI()
	}
}

func BenchmarkSolveClosed(b *testing.B) {
	p := Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)}
	b.ReportAllocs()
	for b.Loop() {
		sink = solve(b, p).rate
	}
}

// The ball of the tests from 100 to 45 °C, with everything: solve, then ask for the time.
func BenchmarkCoolingBall(b *testing.B) {
	for _, c := range []struct {
		name string
		m    Material
	}{
		{"constant", constantStuff(1000, 2000, 15)},
		{"varying", stuff{rho: 1000, c0: 1500, c1: 1.5, k0: 15, low: 200, high: 900}},
	} {
		b.Run(c.name, func(b *testing.B) {
			p, calls := ball(), 0
			p.Material = c.m
			p.Surface = flux(func(t, wall float64) float64 { calls++; return stillRoom(t, wall) })
			b.ReportAllocs()
			for b.Loop() {
				s, err := p.Solve(context.Background())
				if err != nil {
					b.Fatal(err)
				}
				t, err := s.TimeTo(shape.Mean(), units.Celsius.Of(45))
				if err != nil {
					b.Fatal(err)
				}
				sink = t.SI()
			}
			b.ReportMetric(float64(calls)/float64(b.N), "calls/op")
		})
	}
}

func BenchmarkExchangeAlone(b *testing.B) {
	f := flux(stillRoom)
	for b.Loop() {
		q, _ := f.Flux(seconds(0), kelvin(340))
		sink = q.SI()
	}
}

func BenchmarkIntegratedAt(b *testing.B) {
	s := solve(b, ball())
	for b.Loop() {
		t, _ := s.At(shape.Centre(), seconds(900))
		sink = t.SI()
	}
}

func BenchmarkLumpingError(b *testing.B) {
	s := solve(b, Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)})
	for b.Loop() {
		e, _ := s.LumpingError(shape.Centre())
		sink = e.SI()
	}
}

// What a choice between models asks for on each solve: the error at three places.
func BenchmarkLumpingErrors(b *testing.B) {
	s := solve(b, Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)})
	for b.Loop() {
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
			e, _ := s.LumpingError(place)
			sink = e.SI()
		}
	}
}

// The closed forms at one time each.
func BenchmarkClosedForms(b *testing.B) {
	for _, name := range []string{"constant h", "radiation, cooling", "natural convection", "all that move"} {
		s := solve(b, closedCases()[name])
		b.Run(name, func(b *testing.B) {
			x := 0.0
			for b.Loop() {
				t, _ := s.Mean(seconds(x))
				if sink, x = t.SI(), x+1; x > 1500 {
					x = 0
				}
			}
		})
	}
}

// The same as BenchmarkCoolingBall on all processors: compare -cpu 1,2.
func BenchmarkCoolingBalls(b *testing.B) {
	b.RunParallel(func(pb *testing.PB) {
		p := ball()
		for pb.Next() {
			s, err := p.Solve(context.Background())
			if err != nil {
				b.Error(err)
				return
			}
			if _, err := s.TimeTo(shape.Mean(), units.Celsius.Of(45)); err != nil {
				b.Error(err)
				return
			}
		}
	})
}

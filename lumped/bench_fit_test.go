package lumped

import (
	"context"
	"math"
	"math/rand"
	"testing"
)

// hourLog is a log of fifty readings of a body with a time constant of a quarter of an hour.
func hourLog() Log {
	r := rand.New(rand.NewSource(9))
	return logOf(every(72, 50), func(x float64) float64 { return 280 + 80*math.Exp(-x/900) + 0.2*r.NormFloat64() })
}

func BenchmarkFitOfFiftyReadings(b *testing.B) {
	f := Fit{Log: hourLog()}
	b.ReportAllocs()
	for b.Loop() {
		if _, err := f.Solve(context.Background()); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkForecastOfFiftyReadings(b *testing.B) {
	s := solveFit(b, Fit{Log: hourLog()})
	b.ReportAllocs()
	for b.Loop() {
		if _, err := s.TimeTo(kelvin(285)); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkNetworkOfTwo(b *testing.B) {
	n := cup(1000, 300, 5, 0.5, 363, 293, 293)
	s := solveNetwork(b, n)
	for name, f := range map[string]func() error{
		"solve":  func() error { return second(n.Solve(context.Background())) },
		"at":     func() error { return second(s.At("cup", seconds(50))) },
		"timeTo": func() error { return second(s.TimeTo("tea", kelvin(310))) },
	} {
		b.Run(name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if err := f(); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

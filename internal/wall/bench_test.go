package wall

import (
	"math"
	"testing"
)

var sink float64

// Each line beside those of internal/eigen, which need one Bessel function of one argument.
func BenchmarkRoots(b *testing.B) {
	for _, c := range []struct {
		name  string
		body  Body
		count int
	}{{"plate", Plate(), 32}, {"tube, thick", Hollow(1, 0.5), 32}, {"tube, thin", Hollow(1, 50), 32}, {"tube, many", Hollow(1, 0.5), 512}, {"hollow sphere", Hollow(2, 0.5), 32}} {
		b.Run(c.name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				sink = New(c.body, 2, 5, c.count).All[1].Zeta
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N*c.count), "ns/root")
		})
	}
}

func BenchmarkAsk(b *testing.B) {
	for _, c := range []struct {
		name string
		body Body
	}{{"plate", Plate()}, {"tube, thick", Hollow(1, 0.5)}, {"tube, thin", Hollow(1, 50)}, {"hollow sphere", Hollow(2, 0.5)}} {
		s := Solve(Problem{Body: c.body, Ha: 2, Hb: math.Inf(1), Drive: Drive{Ua: 1, Ub: -2, G: 1}})
		for _, fo := range []float64{1e-6, 0.05, 0.2, 1} {
			b.Run(c.name+" "+map[float64]string{1e-6: "at 1e-6", 0.05: "at 0.05", 0.2: "at 0.2", 1: "at 1"}[fo], func(b *testing.B) {
				b.ReportAllocs()
				for b.Loop() {
					sink = s.Ask(Probe{Y: 0.9}, fo)
				}
			})
		}
		b.Run(c.name+" first", func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				sink, _ = s.First(Probe{Y: 0.6}, -0.5, 0, math.Inf(1))
			}
		})
	}
	b.Run("solve plate", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			sink = Solve(Problem{Body: Plate(), Ha: 2, Hb: 5, Drive: Drive{Ua: 1, Ub: -2}}).Join
		}
	})
	b.Run("solve tube with a start", func(b *testing.B) {
		for b.Loop() {
			sink = Solve(Problem{Body: Hollow(1, 0.5), Ha: 2, Hb: 5, Drive: Drive{Ua: 1, Ub: -2}, Start: func(y float64) float64 { return y * y }}).Join
		}
	})
}

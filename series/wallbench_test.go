package series_test

import (
	"context"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// Beside BenchmarkOneTermByHand, and for a solution by hand of what a wall comes to in the end.
func BenchmarkWall(b *testing.B) {
	for _, c := range []struct {
		name string
		body shape.Body
	}{
		{"plate", slab},
		{"tube", shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7))},
		{"hollow sphere", shape.HollowSphere(millimetres(160), millimetres(100))},
	} {
		p := kiln(c.body)
		s := solve(b, p)
		scale := 0.03 * 0.03 / 1.2 * 2000 * 900
		for _, fo := range []float64{1e-3, 0.2, 1} {
			t := units.Second.Of(fo * scale)
			b.Run(c.name+" at Fo "+units.Number(fo).String(), func(b *testing.B) {
				b.ReportAllocs()
				for b.Loop() {
					T, err := s.At(shape.Below(millimetres(7)), t)
					if err != nil {
						b.Fatal(err)
					}
					sink = T.SI()
				}
			})
		}
		b.Run(c.name+" time to", func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				t, err := s.TimeTo(shape.Surface(), units.Celsius.Of(150))
				if err != nil {
					b.Fatal(err)
				}
				sink = t.SI()
			}
		})
		b.Run(c.name+" solve", func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				s, err := p.Solve(context.Background())
				if err != nil {
					b.Fatal(err)
				}
				sink = s.Biot()
			}
		})
	}
	p := kiln(slab)
	p.Surface, p.Opposite = wind(80, 20), boundary.Condition{}
	p.Initial, p.Profile = units.Temperature{}, func(d units.Length) (units.Temperature, error) { return units.Celsius.Of(20 + 1e4*d.SI()), nil }
	b.Run("plate with a profile, solve", func(b *testing.B) {
		for b.Loop() {
			s, err := p.Solve(context.Background())
			if err != nil {
				b.Fatal(err)
			}
			sink = s.Biot()
		}
	})
}

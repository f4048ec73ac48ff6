package props_test

import (
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func BenchmarkFluids(b *testing.B) {
	for f := range props.Fluids() {
		b.Run(f.Name(), func(b *testing.B) {
			b.ReportAllocs()
			T, p := common(b, f, 360)
			_, high := f.Range()
			for i := 0; b.Loop(); i++ {
				if _, err := f.At(units.Kelvin.Of(min(T.SI()+float64(i&7), high.SI())), p); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkSolids(b *testing.B) {
	for _, name := range []string{"carbon steel", "copper", "glass", "PVC", "concrete, upper limit, 1.5 % moisture", "timber, EN 1995-1-2", "platinum", "ice", "apple", "salmon"} {
		s, err := props.FindSolid(name)
		if err != nil {
			b.Fatal(err)
		}
		low, high := s.Range()
		T := func(i int) units.Temperature {
			return units.Kelvin.Of(low.SI() + (high.SI()-low.SI())*float64(i&63)/64)
		}
		b.Run(s.Name()+"/conductivity", func(b *testing.B) {
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				if _, err := s.Conductivity(T(i)); err != nil {
					b.Fatal(err)
				}
			}
		})
		b.Run(s.Name()+"/specific heat", func(b *testing.B) {
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				if _, err := s.SpecificHeat(T(i)); err != nil {
					b.Fatal(err)
				}
			}
		})
		b.Run(s.Name()+"/temperature", func(b *testing.B) {
			b.ReportAllocs()
			var h [64]units.SpecificEnergy
			for i := range h {
				var err error
				if h[i], err = s.Enthalpy(T(i)); err != nil {
					b.Fatal(err)
				}
			}
			for i := 0; b.Loop(); i++ {
				if _, err := s.Temperature(h[i&63]); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkFindSolid(b *testing.B) {
	for b.Loop() {
		if _, err := props.FindSolid("cornea"); err != nil {
			b.Fatal(err)
		}
	}
}

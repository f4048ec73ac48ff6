package units

import "testing"

// The loops stand in functions of their own: inside a benchmark loop the accumulator would be kept in
// memory, for every type.

//go:noinline
func sumFloats(x []float64) (s float64) {
	for _, v := range x {
		s += v
	}
	return s
}

//go:noinline
func sumLengths(x []Length) (s Length) {
	for _, v := range x {
		s = s.Add(v)
	}
	return s
}

//go:noinline
func scaleFloats(y, x []float64, f float64) {
	y = y[:len(x)]
	for i, v := range x {
		y[i] = f * v
	}
}

//go:noinline
func scaleLengths(y, x []Length, f float64) {
	y = y[:len(x)]
	for i, v := range x {
		y[i] = v.Scale(f)
	}
}

//go:noinline
func productFloats(z, x, y []float64) {
	y, z = y[:len(x)], z[:len(x)]
	for i, v := range x {
		z[i] = v * y[i]
	}
}

//go:noinline
func productLengths(z []Area, x, y []Length) {
	y, z = y[:len(x)], z[:len(x)]
	for i, v := range x {
		z[i] = AreaOf(v, y[i])
	}
}

func BenchmarkArithmetic(b *testing.B) {
	const n = 1024
	floats, floats2, floats3 := make([]float64, n), make([]float64, n), make([]float64, n)
	lengths, lengths2, areas := make([]Length, n), make([]Length, n), make([]Area, n)
	for i := range n {
		floats[i] = float64(i)
		lengths[i] = Metre.Of(float64(i))
	}
	for _, bb := range []struct {
		name string
		run  func()
	}{
		{"add/float64", func() { sumFloats(floats) }},
		{"add/Length", func() { sumLengths(lengths) }},
		{"scale/float64", func() { scaleFloats(floats2, floats, 1.5) }},
		{"scale/Length", func() { scaleLengths(lengths2, lengths, 1.5) }},
		{"product/float64", func() { productFloats(floats3, floats, floats2) }},
		{"product/Length", func() { productLengths(areas, lengths, lengths2) }},
	} {
		b.Run(bb.name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				bb.run()
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/n, "ns/element")
		})
	}
}

func BenchmarkParse(b *testing.B) {
	for _, text := range []string{"60 mm", "12 W/(m^2 K)", "12 W/m2K", "12 W m^-2 K^-1", "1.8 Btu/(h ft^2 degF)", "12 W/m^2/degC"} {
		b.Run(text, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if text == "60 mm" {
					_, _ = Parse[Length](text)
				} else {
					_, _ = Parse[HeatTransferCoefficient](text)
				}
			}
		})
	}
}

func BenchmarkFormat(b *testing.B) {
	h := WattPerSquareMetreKelvin.Of(12.3456789)
	b.Run("String", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			_ = h.String()
		}
	})
	b.Run("MarshalText", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			_, _ = h.MarshalText()
		}
	})
}

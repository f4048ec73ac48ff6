package eigen

import (
	"math"
	"math/rand"
	"testing"
)

// The short forms against package math, whose functions are good to a unit in the last place.
func TestShortForms(t *testing.T) {
	r := rand.New(rand.NewSource(12))
	table := bessel()
	var worst [5]float64
	for range 200000 {
		a, z := 40*r.Float64(), 130*r.Float64()
		if r.Intn(4) == 0 {
			a, z = math.Exp(30*r.Float64()-24), math.Exp(9*r.Float64()-4)
		}
		j0, j1 := bessel01(z)
		for i, c := range []struct {
			name                 string
			at, got, want, bound float64
		}{
			{"decay", a, decay(a), math.Exp(-a), 4.5e-16 * math.Exp(-a)},
			{"cosine", z, cosine(z), math.Cos(z), 2.5e-16},
			{"sine", z, sine(z), math.Sin(z), 4.5e-16 * math.Min(1, z)},
			{"J0", z, bessel0(table, z), math.J0(z), 5e-16},
			{"J1", z, j1, math.J1(z), 5e-16},
		} {
			d := math.Abs(c.got - c.want)
			worst[i] = math.Max(worst[i], d)
			if !(d <= c.bound) && !(c.want < 1e-300 && d < 1e-315) {
				t.Errorf("%s(%v) = %.17g, want %.17g within %.2g", c.name, c.at, c.got, c.want, c.bound)
			}
		}
		if !(math.Abs(j0-bessel0(table, z)) <= 1e-16) {
			t.Errorf("J0(%v) is %v and %v", z, j0, bessel0(table, z))
		}
	}
	t.Logf("worst differences %.2g", worst)
	for _, f := range []func(float64) float64{decay, cosine, sine, func(z float64) float64 { return bessel0(table, z) }} {
		if got := f(math.NaN()); !math.IsNaN(got) {
			t.Errorf("of NaN: %v", got)
		}
	}
	if decay(0) != 1 || decay(math.Inf(1)) != 0 || cosine(0) != 1 || sine(0) != 0 || bessel0(table, 0) != 1 {
		t.Error("ends are not exact")
	}
}

func BenchmarkFunctions(b *testing.B) {
	table := bessel()
	for _, f := range []struct {
		name string
		f    func(float64) float64
	}{
		{"exp of math", func(z float64) float64 { return math.Exp(-z) }},
		{"decay", decay},
		{"cos of math", math.Cos},
		{"cosine", cosine},
		{"J0 of math", math.J0},
		{"J0", func(z float64) float64 { return bessel0(table, z) }},
		{"J0 and J1", func(z float64) float64 { j0, j1 := bessel01(z); return j0 + j1 }},
		{"erfcx", erfcx},
	} {
		b.Run(f.name, func(b *testing.B) {
			z := 0.1
			for b.Loop() {
				sink = f.f(z)
				if z += 0.377; z > 20 {
					z = 0.1
				}
			}
		})
	}
}

package pow

import (
	"math"
	"math/rand/v2"
	"testing"
)

// The functions of the standard library, which err by less than one unit in the last place, are the truth here.
func TestAgainstStandardLibrary(t *testing.T) {
	random := rand.New(rand.NewPCG(1, 2))
	for range 200000 {
		x := math.Exp(random.NormFloat64() * 20)
		p := random.Float64()*5 - 2.5
		if got, want := Log2(x), math.Log2(x); !(math.Abs(got-want) <= 2.5e-16*(1+math.Abs(want))) {
			t.Fatalf("Log2(%v): got %v, want %v", x, got, want)
		}
		y := random.Float64()*1990 - 995
		if got, want := Exp2(y), math.Exp2(y); !(math.Abs(got/want-1) <= 4.5e-16) { // two units at most
			t.Fatalf("Exp2(%v): got %v, want %v, ratio %v", y, got, want, got/want-1)
		}
		if got, want := Of(x, p), math.Pow(x, p); !(math.Abs(got/want-1) <= 4.5e-16*(1+math.Abs(p*math.Log2(x)))) {
			t.Fatalf("%v^%v: got %v, want %v", x, p, got, want)
		}
	}
}

// Between the places of the tables, where the last terms of the polynomials are largest: the mean of the errors has no trend, as it would
// have by an omitted term.
func TestNoTrendBetweenTheTables(t *testing.T) {
	const n = 4000
	exp, log := 0.0, 0.0
	for i := range n {
		y := (float64(i%parts) + 0.4999) / parts
		exp += Exp2(y)/math.Exp2(y) - 1
		x := 1 + (float64(i%parts)+0.99)/parts
		log += Log2(x) - math.Log2(x)
	}
	if math.Abs(exp/n) > 8e-17 || math.Abs(log/n) > 5e-17 {
		t.Errorf("mean error of Exp2 %g, of Log2 %g", exp/n, log/n)
	}
}

// The ends of what a float64 holds, and what is no power.
func TestEnds(t *testing.T) {
	same := func(a, b float64) bool { return a == b || math.IsNaN(a) && math.IsNaN(b) || math.Abs(a/b-1) < 1e-12 }
	for _, x := range []float64{
		0, math.Copysign(0, -1), 5e-324, 1e-310, 0x1p-1022, math.Nextafter(0x1p-1022, 0), 1e-300, math.Nextafter(1, 0), 1, math.Nextafter(1, 2),
		1e300, math.MaxFloat64, math.Inf(1), math.NaN(), -1, math.Inf(-1), -5e-324,
	} {
		if got, want := Log2(x), math.Log2(x); !same(got, want) && math.Abs(got-want) > 2e-16 {
			t.Errorf("Log2(%v): got %v, want %v", x, got, want)
		}
		for _, p := range []float64{0.8, 1.0 / 3, 2, -0.5} {
			if got, want := Of(x, p), math.Exp2(p*math.Log2(x)); !same(got, want) && x > 0 { // math.Pow errs below 2^-1022
				t.Errorf("%v^%v: got %v, want %v", x, p, got, want)
			}
		}
	}
	if Of(0, 0.8) != 0 || !math.IsNaN(Of(-1, 0.8)) || !math.IsInf(Of(0, -1), 1) {
		t.Errorf("0^0.8 = %v, (-1)^0.8 = %v, 0^-1 = %v", Of(0, 0.8), Of(-1, 0.8), Of(0, -1))
	}
	for _, y := range []float64{-1100, -1074, -1050, -1022.5, -1000, -999.9, 0, 1e-300, 999.9, 1000, 1023.9, 1024, 5000, math.Inf(1), math.Inf(-1), math.NaN()} {
		if got, want := Exp2(y), math.Exp2(y); !same(got, want) {
			t.Errorf("Exp2(%v): got %v, want %v", y, got, want)
		}
	}
}

func BenchmarkPow(b *testing.B) {
	x := [...]float64{0.7, 1.3, 2.7, 300}
	for name, f := range map[string]func(float64) float64{
		"math.Pow":        func(x float64) float64 { return math.Pow(x, 0.42) },
		"math.Exp of Log": func(x float64) float64 { return math.Exp(0.42 * math.Log(x)) },
		"Of":              func(x float64) float64 { return Of(x, 0.42) },
		"math.Cbrt":       math.Cbrt,
		"Of, 1/3":         func(x float64) float64 { return Of(x, 1.0/3) },
		"Log2":            Log2,
		"Exp2":            Exp2,
	} {
		b.Run(name, func(b *testing.B) {
			y := 0.0
			for i := 0; b.Loop(); i++ {
				y = f(x[i%4] + 1e-300*y)
			}
		})
	}
}

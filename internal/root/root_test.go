package root

import (
	"math"
	"testing"
	"testing/quick"
)

// The zeros are known exactly or to more digits than float64 has.
func TestFind(t *testing.T) {
	for _, c := range []struct {
		name   string
		f      func(float64) float64
		lo, hi float64
		want   float64
		within float64
	}{
		{"cos x, π/2", math.Cos, 1, 2, math.Pi / 2, 4e-16},
		{"cos x, interval the other way round", math.Cos, 2, 1, math.Pi / 2, 4e-16},
		{"exp x − 1", math.Expm1, -700, 700, 0, 1e-15},
		{"cos x − x, Dottie's number, OEIS A003957 (from memory)", func(x float64) float64 { return math.Cos(x) - x }, 0, 1, 0.7390851332151607, 4e-16},
		{"x⁹, flat at the zero", func(x float64) float64 { return math.Pow(x, 9) }, -1, 1.3, 0, 1e-15},
		{"a step at 1/3", func(x float64) float64 { return math.Copysign(1, x-1.0/3) }, 0, 1, 1.0 / 3, 4e-16},
		{"a wall: 1e-300 below, 1e300 above", func(x float64) float64 {
			if x < 0.7 {
				return -1e-300
			}
			return 1e300
		}, 0, 1, 0.7, 4e-16},
		{"zero at the left end", func(x float64) float64 { return x }, 0, 1, 0, 0},
		{"zero at the right end", func(x float64) float64 { return x - 1 }, 0, 1, 1, 0},
		{"all of float64", func(x float64) float64 { return math.Copysign(1, x-5) }, -math.MaxFloat64, math.MaxFloat64, 5, 1e-14},
		{"a zero among the least numbers", func(x float64) float64 { return x - 1e-310 }, 0, 1, 1e-310, 1e-322},
		{"infinite at one end", func(x float64) float64 { return -1/x + 2 }, 0, 1, 0.5, 4e-16},
	} {
		calls := 0
		got, ok := Find(func(x float64) float64 { calls++; return c.f(x) }, c.lo, c.hi, 0)
		if !ok || !(math.Abs(got-c.want) <= c.within) {
			t.Errorf("%s: %.17g (%v), want %.17g within %g", c.name, got, ok, c.want, c.within)
		}
		if calls > 5000 {
			t.Errorf("%s: %d evaluations", c.name, calls)
		}
	}
}

func TestFindRefuses(t *testing.T) {
	for _, c := range []struct {
		name              string
		f                 func(float64) float64
		lo, hi, tolerance float64
	}{
		{"no change of sign", func(x float64) float64 { return x*x + 1 }, -1, 1, 0},
		{"NaN at an end", math.Log, -1, 2, 0},
		{"NaN inside", func(x float64) float64 {
			if math.Abs(x) < 0.9 {
				return math.NaN()
			}
			return x
		}, -1, 1, 0},
		{"NaN as an end", func(x float64) float64 { return x }, math.NaN(), 1, 0},
		{"infinite end", func(x float64) float64 { return x - 3 }, 0, math.Inf(1), 0},
		{"negative tolerance", func(x float64) float64 { return x }, -1, 2, -1},
		{"NaN as tolerance", func(x float64) float64 { return x }, -1, 2, math.NaN()},
	} {
		if x, ok := Find(c.f, c.lo, c.hi, c.tolerance); ok {
			t.Errorf("%s: found %v, want none", c.name, x)
		}
	}
}

// A monotone function of any steepness has its zero where it was put, within the tolerance asked for.
func TestFindMonotone(t *testing.T) {
	if err := quick.Check(func(a, b, c, d float64, e uint8) bool {
		zero, span, power := math.Mod(a, 1e6), 1+math.Mod(math.Abs(b), 1e3), float64(1+2*(e%4))
		tolerance := math.Mod(math.Abs(d), 1)
		f := func(x float64) float64 { return math.Copysign(math.Pow(math.Abs(x-zero), power), x-zero) }
		lo, hi := zero-span, zero+span*(1+math.Mod(math.Abs(c), 1e3))
		got, ok := Find(f, lo, hi, tolerance)
		return ok && math.Abs(got-zero) <= tolerance+1e-15*math.Abs(zero)
	}, nil); err != nil {
		t.Error(err)
	}
}

// A smooth function takes few evaluations: the method is of order 1.6 near the zero.
func TestFindIsQuick(t *testing.T) {
	calls := 0
	if _, ok := Find(func(x float64) float64 { calls++; return math.Exp(-x) - 0.3 }, 0, 4, 0); !ok || calls > 15 {
		t.Errorf("%d evaluations (%v), want at most 15", calls, ok)
	}
}

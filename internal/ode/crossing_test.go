package ode

import (
	"math"
	"math/rand"
	"testing"
)

// Both forms of the extension are the same polynomial.
func TestBernsteinIsTheExtension(t *testing.T) {
	r := rand.New(rand.NewSource(1))
	for range 1000 {
		st := step{y: r.NormFloat64(), change: r.NormFloat64(), r3: r.NormFloat64(), r4: r.NormFloat64(), r5: r.NormFloat64()}
		b, x := st.bernstein(0.3), r.Float64()
		if got, want := bernsteinAt(&b, x), st.at(x)-0.3; math.Abs(got-want) > 1e-14 {
			t.Fatalf("%+v at %g: %g, want %g", st, x, got, want)
		}
	}
}

// The first zero of a random quartic, against a scan of the polynomial on a fine grid.
func TestFirstRootAgainstScan(t *testing.T) {
	r := rand.New(rand.NewSource(2))
	found, none, several := 0, 0, 0
	for range 20000 {
		var b [5]float64
		for i := range b {
			b[i] = r.NormFloat64()
		}
		scan, crossings := math.NaN(), 0
		previous := b[0]
		for i := 1; i <= 400; i++ {
			f := bernsteinAt(&b, float64(i)/400)
			if (f > 0) != (previous > 0) {
				if crossings++; crossings == 1 {
					scan = float64(i) / 400
				}
			}
			previous = f
		}
		x, ok := firstRoot(b, 0, 1, 0)
		switch {
		case !ok && crossings > 0:
			t.Fatalf("%v: no root, the scan has one before %g", b, scan)
		case !ok:
			none++
			continue
		case crossings > 1:
			several++
		}
		found++
		if f := bernsteinAt(&b, x); math.Abs(f) > 1e-13 {
			t.Fatalf("%v: %g at the root %g", b, f, x)
		}
		if crossings > 0 && x > scan {
			t.Fatalf("%v: root %g, the scan has one before %g", b, x, scan)
		}
	}
	if found < 1000 || none < 1000 || several < 100 {
		t.Errorf("the cases are one-sided: %d roots, %d several, %d none", found, several, none)
	}
}

func TestFirstRootEdges(t *testing.T) {
	for _, c := range []struct {
		name string
		b    [5]float64
		want float64
		ok   bool
	}{
		{"zero at the start", [5]float64{0, 1, 1, 1, 1}, 0, true},
		{"zero at the end", [5]float64{1, 1, 1, 1, 0}, 1, true},
		{"all zero", [5]float64{}, 0, true},
		{"double zero in the middle, 3(2x−1)²", [5]float64{3, 0, -1, 0, 3}, 0.5, true},
		{"touches not, (2x−1)² + 0.01", [5]float64{1.01, 0.01, -1.0/3 + 0.01, 0.01, 1.01}, 0, false},
	} {
		if x, ok := firstRoot(c.b, 0, 1, 0); ok != c.ok || ok && math.Abs(x-c.want) > 1e-7 {
			t.Errorf("%s: %g, %v, want %g, %v", c.name, x, ok, c.want, c.ok)
		}
	}
}

// The time to y inverts y(t); a body that first warms and then cools passes a level twice.
func TestCrossing(t *testing.T) {
	for _, c := range cases[:5] {
		s := integrate(t, c.f, c.start, c.end, 1e-6)
		for i := 1; i < 50; i++ {
			want := c.end * float64(i) / 50
			y, _ := s.At(want)
			got, ok := s.Crossing(y)
			back, _ := s.At(got)
			if !ok || math.Abs(back-y) > 1e-15*math.Abs(y)+1e-16 || math.Abs(got-want) > 1e-9*c.end {
				t.Errorf("%s: y(%g) = %g crossed at %g, %v, where y = %g", c.name, want, y, got, ok, back)
			}
		}
		if got, ok := s.Crossing(s.Last()); !ok || math.Abs(got-s.End()) > 1e-9*s.End() {
			t.Errorf("%s: the last value at %g, %v, want %g", c.name, got, ok, s.End())
		}
		if _, ok := s.Crossing(1e3); ok {
			t.Errorf("%s: a level far off is crossed", c.name)
		}
	}
	hump := integrate(t, func(t, _ float64) float64 { return 1 - t }, 0, 3, 1e-6) // y = t − t²/2, one long step
	if got, ok := hump.Crossing(0.375); !ok || math.Abs(got-0.5) > 1e-12 {
		t.Errorf("first crossing of a hump at %g, %v, want 0.5", got, ok)
	}
}

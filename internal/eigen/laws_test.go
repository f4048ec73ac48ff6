package eigen

import (
	"math"
	"math/rand"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"
)

// randomBiot returns a Biot number between 1e-12 and 1e12, one in three of them close to 1, where
// H = Bi − 1 vanishes.
func randomBiot(r *rand.Rand) float64 {
	if r.Intn(3) == 0 {
		return 1 + math.Copysign(math.Pow(10, -12*r.Float64()), r.Float64()-0.5)
	}
	return math.Pow(10, 24*r.Float64()-12)
}

// The two forms have nothing in common but the problem. The bound is that of both.
func TestJoin(t *testing.T) {
	for _, b := range bodies {
		r := rand.New(rand.NewSource(1))
		worst := 0.0
		check := func(bi, x float64, what string, early, late float64) {
			t.Helper()
			worst = math.Max(worst, math.Abs(early-late))
			if !(math.Abs(early-late) <= 2*rounding) {
				t.Errorf("%s, Bi %v, x %v: %s %.17g from short times, %.17g from the series, want within %g", b.name, bi, x, what, early, late, 2*rounding)
			}
		}
		for range 4000 {
			bi := randomBiot(r)
			s := b.new(bi)
			x := r.Float64()
			if r.Intn(2) == 0 {
				x = math.Pow(10, -9*r.Float64())
			}
			if r.Intn(2) == 0 {
				x = 1 - x
			}
			check(bi, x, "θ", 1-b.early(bi, x, b.join), s.At(x, b.join))
			check(bi, 0, "θ", 1-b.early(bi, 0, b.join), s.Centre(b.join))
			check(bi, 1, "θ", b.earlySurface(bi, b.join), s.Surface(b.join))
			check(bi, 1, "mean θ", 1-b.earlyLoss(bi, b.join), s.Mean(b.join))
			check(bi, 1, "1 − mean θ", s.Loss(b.join), 1-s.Mean(b.join))
		}
		t.Logf("%s: worst difference %.2g", b.name, worst)
	}
}

// What the short-time form leaves out grows with Fo. Later than it is used, the series shows it, and the
// bound that ErrorBound states must hold there too.
func TestImagesLeftOut(t *testing.T) {
	for _, b := range bodies {
		r := rand.New(rand.NewSource(4))
		worst := 0.0
		for range 2000 {
			bi := randomBiot(r)
			if r.Intn(3) == 0 {
				bi = 10 * r.Float64()
			}
			s := b.new(bi)
			x := r.Float64()
			fo := 0.04 + 0.3*r.Float64()
			bound := 2*math.Exp(-1/fo) + 2*rounding
			if b.name == "cylinder" { // asymptotic: only where its terms still fall
				fo = b.join * (1 + 0.2*r.Float64())
				bound = 2 * rounding
			}
			for what, left := range map[string]float64{
				"inside":  1 - b.early(bi, x, fo) - s.At(x, fo),
				"centre":  1 - b.early(bi, 0, fo) - s.Centre(fo),
				"surface": b.earlySurface(bi, fo) - s.Surface(fo),
				"mean":    1 - b.earlyLoss(bi, fo) - s.Mean(fo),
			} {
				worst = math.Max(worst, math.Abs(left)/bound)
				if !(math.Abs(left) <= bound) {
					t.Errorf("%s, Bi %v, Fo %v, x %v, %s: %.3g is left out, bound %.3g", b.name, bi, fo, x, what, left, bound)
				}
			}
		}
		t.Logf("%s: at most %.2f of the bound", b.name, worst)
	}
}

// The short-time form of a cylinder against a thousand terms of its series, which have no part in it.
func TestCylinderEarlyAgainstManyTerms(t *testing.T) {
	worst := 0.0
	for _, bi := range []float64{1e-6, 0.01, 0.49, 0.5, 0.51, 1, 7, 60, 1e3, 1e6, math.Inf(1)} {
		zeta, centre, mean := make([]float64, 1000), make([]float64, 1000), make([]float64, 1000)
		sign := 1.0
		for n := range zeta {
			zeta[n] = cylinderRoot(n+1, bi)
			c, _, m := cylinderCoefficients(bi, zeta[n])
			centre[n], mean[n] = sign*c, m
			sign = -sign
		}
		series := func(fo float64, c func(n int) float64) float64 {
			total := 0.0
			for n := len(zeta) - 1; n >= 0; n-- {
				total += c(n) * math.Exp(-zeta[n]*zeta[n]*fo)
			}
			return total
		}
		for _, fo := range []float64{1e-5, 3e-5, 1e-4, 1e-3, 0.003, 0.0054} {
			for _, x := range []float64{0, 0.05, 0.0999, 0.1001, 0.15, 0.3, 0.6, 0.8, 0.9, 0.97, 0.99, 0.999, 1} {
				got := NewCylinder(bi).At(x, fo)
				want := series(fo, func(n int) float64 { return centre[n] * math.J0(zeta[n]*x) })
				worst = math.Max(worst, math.Abs(got-want))
				if !(math.Abs(got-want) <= 1e-13) { // a thousand roundings of the terms
					t.Errorf("Bi %v, Fo %v, x %v: θ %.17g, by a thousand terms %.17g, want within 1e-13", bi, fo, x, got, want)
				}
			}
			got, want := NewCylinder(bi).Mean(fo), series(fo, func(n int) float64 { return mean[n] })
			if bi > 1e3 && fo < 3e-4 {
				continue // the mean has more terms than a thousand
			}
			if !(math.Abs(got-want) <= 1e-13) {
				t.Errorf("Bi %v, Fo %v: mean %.17g, by a thousand terms %.17g, want within 1e-13", bi, fo, got, want)
			}
		}
	}
	t.Logf("worst %.2g", worst)
}

// The bound holds against the series with a thousand terms, added without loss, over random places, times and Biot
// numbers, and is no more than what the rounding of θ makes it.
func TestErrorBound(t *testing.T) {
	r := rand.New(rand.NewSource(9))
	for _, b := range bodies {
		worst := 0.0
		for range 50 {
			bi := randomBiot(r)
			s := b.new(bi)
			var zeta, c [1000]float64
			for n := range zeta {
				zeta[n] = b.root(n+1, bi)
				c[n], _, _ = b.coefficients(bi, zeta[n])
				if n%2 == 1 {
					c[n] = -c[n]
				}
			}
			for range 10 {
				x, fo := r.Float64(), math.Pow(10, 4*r.Float64()-4.3)
				sum, lost := 0.0, 0.0
				for n, z := range zeta {
					f := map[float64]func(float64) float64{1: math.Cos, 2: math.J0, 3: sinc}[b.dimension](z * x)
					term := c[n]*math.Exp(-z*z*fo)*f - lost
					next := sum + term
					sum, lost = next, (next-sum)-term
				}
				d, bound := math.Abs(s.At(x, fo)-sum), s.ErrorBound(fo)
				worst = math.Max(worst, d)
				// the coefficients and functions of the sum are themselves rounded, by 1e-16 of each of some
				// 1/√Fo terms
				if slack := 2e-16 / math.Sqrt(fo); !(d <= bound+slack && bound <= 1e-14) {
					t.Errorf("%s, Bi %v, Fo %v, x %v: off by %.2g, bound %.2g", b.name, bi, fo, x, d, bound)
				}
			}
		}
		t.Logf("%s: worst %.2g", b.name, worst)
	}
}

// Within a form, the branches for small and large b = H√Fo and for x near the centre must meet.
func TestSphereBranches(t *testing.T) {
	for _, fo := range []float64{1e-8, 1e-5, 1e-3, 0.01, 0.0249} {
		for _, at := range []float64{-0.1, 0.1, 0.5} {
			below, above := 1+math.Nextafter(at, -1)/math.Sqrt(fo), 1+math.Nextafter(at, 1)/math.Sqrt(fo)
			if below < 0 {
				continue
			}
			for _, f := range []func(bi float64) float64{
				func(bi float64) float64 { return value1(sphereEarlySurface)(bi, fo) },
				func(bi float64) float64 { return sphereEarlyLoss(bi, fo) },
				func(bi float64) float64 { return value2(sphereEarly)(bi, 0.9, fo) },
			} {
				if a, b := f(below), f(above); !(math.Abs(a-b) <= rounding) {
					t.Errorf("Fo %v: %.17g at b just below %v and %.17g just above, want within %g", fo, a, at, b, rounding)
				}
			}
		}
		for _, bi := range []float64{1e-6, 0.5, 1, 3, 100, 1e6, 1e12, math.Inf(1)} {
			a, b := value2(sphereEarly)(bi, math.Nextafter(nearCentre, 0), fo), value2(sphereEarly)(bi, nearCentre, fo)
			if !(math.Abs(a-b) <= rounding) {
				t.Errorf("Bi %v, Fo %v: 1 − θ is %.17g just inside the bound of the centre and %.17g at it, want within %g", bi, fo, a, b, rounding)
			}
		}
	}
}

// Maximum principle: θ stays between 0 and 1, falls with time everywhere and from the centre outwards,
// and the mean lies between centre and surface. Rounding may hide a difference, never exceed the bound.
func TestMaximumPrinciple(t *testing.T) {
	for _, b := range bodies {
		r := rand.New(rand.NewSource(2))
		for range 2000 {
			bi := randomBiot(r)
			s := b.new(bi)
			fo := math.Pow(10, 8*r.Float64()-6)
			later := fo * (1 + 0.2*r.Float64())
			x := r.Float64()
			outer := x + (1-x)*r.Float64()
			for _, c := range []struct {
				law  string
				a, b float64 // a ≥ b
			}{
				{"θ ≤ 1 at the centre", 1, s.Centre(fo)},
				{"θ ≥ 0 at the surface", s.Surface(fo), 0},
				{"centre ≥ inside", s.Centre(fo), s.At(x, fo)},
				{"inside ≥ farther out", s.At(x, fo), s.At(outer, fo)},
				{"farther out ≥ surface", s.At(outer, fo), s.Surface(fo)},
				{"centre ≥ mean", s.Centre(fo), s.Mean(fo)},
				{"mean ≥ surface", s.Mean(fo), s.Surface(fo)},
				{"the centre cools", s.Centre(fo), s.Centre(later)},
				{"the inside cools", s.At(x, fo), s.At(x, later)},
				{"the surface cools", s.Surface(fo), s.Surface(later)},
				{"the mean cools", s.Mean(fo), s.Mean(later)},
				{"more is lost later", s.Loss(later), s.Loss(fo)},
			} {
				if !(c.a >= c.b-rounding) {
					t.Errorf("%s, Bi %v, Fo %v and %v, x %v and %v: %s is broken: %.17g < %.17g", b.name, bi, fo, later, x, outer, c.law, c.a, c.b)
				}
			}
		}
	}
}

// The mean falls by what leaves through the surface: 1 − mean = m Bi ∫ θ_surface dFo, m = 1, 2, 3. The integral is
// taken over u = √Fo, in which the surface temperature is smooth, by Gauss-Legendre quadrature; 64 points
// are far more than the digits asked for need.
func TestBalance(t *testing.T) {
	for _, b := range bodies {
		for _, bi := range []float64{1e-9, 1e-3, 0.1, 0.999999, 1, 1.001, 3, 10, 300} {
			s := b.new(bi)
			for _, span := range [][2]float64{{0, 1e-3}, {1e-3, b.join}, {b.join, 0.1}, {0, 0.2}, {0.1, 1}} {
				flux := func(u float64) float64 { return b.dimension * bi * s.Surface(u*u) * 2 * u }
				a, z := math.Sqrt(span[0]), math.Sqrt(span[1])
				mid := math.Min(z, math.Max(a, math.Sqrt(b.join)))
				left := quad.Fixed(flux, a, mid, 64, quad.Legendre{}, 0)
				if mid < z {
					left += quad.Fixed(flux, mid, z, 64, quad.Legendre{}, 0)
				}
				if got := s.Loss(span[1]) - s.Loss(span[0]); !(math.Abs(got-left) <= 1e-13*left) {
					t.Errorf("%s, Bi %v, Fo %v to %v: the mean falls by %.15g, through the surface leave %.15g, want within 1e-13 relative", b.name, bi, span[0], span[1], got, left)
				}
			}
		}
	}
}

// The solution obeys the equation of conduction, θ_Fo = θ_xx + (m − 1) θ_x/x, and the condition at the
// surface, −θ_x = Bi θ. Central differences of step e are good to e² times the fourth derivative and
// to the rounding over e².
func TestEquation(t *testing.T) {
	for _, b := range bodies {
		const e = 1e-4
		for _, bi := range []float64{0.01, 0.5, 1, 4, 50} {
			s := b.new(bi)
			for _, fo := range []float64{0.005, 0.02, 0.03, 0.2, 1} {
				for _, x := range []float64{0.1, 0.4, 0.7, 0.95} {
					rate := (s.At(x, fo*(1+e)) - s.At(x, fo*(1-e))) / (2 * e * fo)
					in, here, out := s.At(x-e, fo), s.At(x, fo), s.At(x+e, fo)
					spread := (out-2*here+in)/(e*e) + (b.dimension-1)*(out-in)/(2*e*x)
					if !(math.Abs(rate-spread) <= 1e-4*math.Max(0.1, math.Abs(rate))) {
						t.Errorf("%s, Bi %v, Fo %v, x %v: dθ/dFo %.8g, conduction %.8g, want within 1e-4", b.name, bi, fo, x, rate, spread)
					}
				}
				slope := (3*s.Surface(fo) - 4*s.At(1-e, fo) + s.At(1-2*e, fo)) / (2 * e)
				if want := -bi * s.Surface(fo); !(math.Abs(slope-want) <= 1e-4*math.Max(0.01, -want)) {
					t.Errorf("%s, Bi %v, Fo %v: slope at the surface %.8g, want %.8g within 1e-4", b.name, bi, fo, slope, want)
				}
			}
		}
	}
}

// For Bi → 0 the body is lumped: θ = exp(−m Bi Fo), with a relative error of the exponent of Bi/5 and of
// the value of order Bi.
func TestLumpedLimit(t *testing.T) {
	for _, b := range bodies {
		for _, bi := range []float64{1e-4, 1e-6, 1e-9, 1e-12, 1e-300} {
			s := b.new(bi)
			for _, tau := range []float64{1e-3, 0.1, 1, 5} {
				fo := tau / (b.dimension * bi)
				want := math.Exp(-tau)
				for what, got := range map[string]float64{"centre": s.Centre(fo), "surface": s.Surface(fo), "mean": s.Mean(fo), "inside": s.At(0.5, fo)} {
					if !(math.Abs(got-want) <= bi+rounding) {
						t.Errorf("%s, Bi %v, %s after %v time constants: %.17g, want %.17g within Bi", b.name, bi, what, tau, got, want)
					}
				}
				if got := s.Loss(fo); !(math.Abs(got+math.Expm1(-tau)) <= bi+1e-14*tau) {
					t.Errorf("%s, Bi %v, loss after %v time constants: %.17g, want %.17g within Bi", b.name, bi, tau, got, -math.Expm1(-tau))
				}
			}
		}
	}
}

// For Bi → ∞ the solution is that of a prescribed surface temperature, off by terms of order 1/Bi.
func TestHighBiotLimit(t *testing.T) {
	for _, b := range bodies {
		limit := b.new(math.Inf(1))
		for _, bi := range []float64{1e6, 1e9, 1e12, 1e300, math.MaxFloat64} {
			s := b.new(bi)
			for _, fo := range []float64{1e-6, 1e-3, 0.02, 0.03, 0.3, 3} {
				tolerance := 2/(bi*math.Sqrt(math.Min(fo, 1))) + rounding
				for _, x := range []float64{0, 1e-5, 0.3, 0.9, 1} {
					if got, want := s.At(x, fo), limit.At(x, fo); !(math.Abs(got-want) <= tolerance) {
						t.Errorf("%s, Bi %v, Fo %v, x %v: θ %.17g, want %.17g within %.3g", b.name, bi, fo, x, got, want, tolerance)
					}
				}
				if got, want := s.Mean(fo), limit.Mean(fo); !(math.Abs(got-want) <= 3*tolerance) {
					t.Errorf("%s, Bi %v, Fo %v: mean %.17g, want %.17g within %.3g", b.name, bi, fo, got, want, 3*tolerance)
				}
			}
		}
	}
}

// Ends of the range: start, no exchange, times that a float64 ends at.
func TestEnds(t *testing.T) {
	for _, b := range bodies {
		for _, c := range []struct {
			what      string
			got, want float64
		}{
			{"centre at the start", b.new(5).Centre(0), 1},
			{"inside at the start", b.new(5).At(0.5, 0), 1},
			{"just off the centre at the start", b.new(5).At(1e-9, 0), 1},
			{"surface at the start", b.new(5).Surface(0), 1},
			{"mean at the start", b.new(5).Mean(0), 1},
			{"loss at the start", b.new(5).Loss(0), 0},
			{"surface at the start, Bi 1e300", b.new(1e300).Surface(0), 1},
			{"inside, after the least time", b.new(1e300).At(0.5, 5e-324), 1},
			{"inside, Bi 1, after the least time", b.new(1).At(0.5, 5e-324), 1},
			{"centre, no exchange, late", b.new(0).Centre(1e300), 1},
			{"inside, no exchange, after infinite time", b.new(0).At(0.3, math.Inf(1)), 1},
			{"mean, no exchange, after infinite time", b.new(0).Mean(math.Inf(1)), 1},
			{"loss, no exchange, after infinite time", b.new(0).Loss(math.Inf(1)), 0},
			{"surface, no exchange, early", b.new(0).Surface(0.01), 1},
			{"centre after infinite time", b.new(1e-300).Centre(math.Inf(1)), 0},
			{"inside after infinite time", b.new(2).At(0.3, math.Inf(1)), 0},
			{"the least distance from the centre, least exchange", b.new(5e-324).At(5e-324, 1), 1},
			{"the least distance from the centre", b.new(2).At(5e-324, 0.5), b.new(2).Centre(0.5)},
			{"loss after infinite time", b.new(2).Loss(math.Inf(1)), 1},
			{"loss after infinite time, Bi 1e-300", b.new(1e-300).Loss(math.Inf(1)), 1},
			{"surface, prescribed, at the start", b.new(math.Inf(1)).Surface(0), 0},
			{"loss, prescribed, at the start", b.new(math.Inf(1)).Loss(0), 0},
		} {
			if !(math.Abs(c.got-c.want) <= 5e-16) { // the sum of the series, rounded term by term
				t.Errorf("%s, %s: %v, want %v", b.name, c.what, c.got, c.want)
			}
		}
		for _, bi := range []float64{-1, math.NaN(), math.Inf(-1)} {
			s := b.new(bi)
			for _, got := range []float64{s.Centre(1), s.Surface(0.01), s.Mean(0.5), s.At(0.5, 0.01), s.At(0.5, 0.5), s.Loss(1)} {
				if !math.IsNaN(got) {
					t.Errorf("%s, Bi %v: %v, want NaN", b.name, bi, got)
				}
			}
		}
	}
}

// Putting the Fourier number back must give θ again, to the rounding of θ in its condition there.
func TestInverse(t *testing.T) {
	for _, b := range bodies {
		r := rand.New(rand.NewSource(3))
		for range 1000 {
			bi := randomBiot(r)
			s := b.new(bi)
			theta := r.Float64()
			switch r.Intn(4) {
			case 0:
				theta = math.Pow(10, -14*r.Float64())
			case 1:
				theta = 1 - math.Pow(10, -12*r.Float64())
			}
			if !(theta > 0 && theta < 1) {
				continue
			}
			x := r.Float64()
			if r.Intn(3) == 0 {
				x = math.Round(x)
			}
			fo, ok := s.TimeAt(x, theta)
			if got := s.At(x, fo); !ok || !(math.Abs(got-theta) <= 1e-12*theta) {
				t.Errorf("%s, Bi %v, x %v: θ %v is reached at Fo %v (%v), where it is %.17g, off by %.3g relative", b.name, bi, x, theta, fo, ok, got, got/theta-1)
			}
			fo, ok = s.TimeOfMean(theta)
			if got := s.Mean(fo); !ok || !(math.Abs(got-theta) <= 1e-12*theta) {
				t.Errorf("%s, Bi %v: mean θ %v is reached at Fo %v (%v), where it is %.17g, off by %.3g relative", b.name, bi, theta, fo, ok, got, got/theta-1)
			}
		}
		for _, theta := range []float64{0, 1, -1, 2, math.NaN()} {
			if fo, ok := b.new(1).TimeAt(0, theta); ok {
				t.Errorf("%s, θ %v: reached at Fo %v, want none", b.name, theta, fo)
			}
		}
		if fo, ok := b.new(0).TimeOfMean(0.5); ok {
			t.Errorf("%s, no exchange: reached at Fo %v, want none", b.name, fo)
		}
		if fo, ok := b.new(1e-320).TimeOfMean(1e-300); ok {
			t.Errorf("%s, Bi 1e-320: reached at Fo %v, want none that a float64 holds", b.name, fo)
		}
		if fo, ok := b.new(math.Inf(1)).TimeAt(1, 0.5); !ok || fo != 0 {
			t.Errorf("%s, prescribed surface temperature: surface reached at Fo %v (%v), want 0", b.name, fo, ok)
		}
	}
}

func TestAllocates(t *testing.T) {
	for _, b := range bodies {
		s := b.new(2)
		if n := testing.AllocsPerRun(100, func() {
			s.Centre(0.2)
			s.At(0.3, 0.01)
			s.Surface(0.01)
			s.Mean(1)
			s.Loss(1)
			s.TimeAt(0.3, 0.5)
			s.TimeOfMean(0.9)
		}); n != 0 {
			t.Errorf("%s: %v allocations, want 0", b.name, n)
		}
	}
}

package eigen

import (
	"math"
	"math/big"
	"math/rand"
	"testing"
)

// The truth of this file is arithmetic with 400 bits, by the power series of the functions, whose terms up to e^z
// leave more than 200 bits to their sums for z up to 120.
const bits = 400

func bigOf(x float64) *big.Float                  { return new(big.Float).SetPrec(bits).SetFloat64(x) }
func bigAdd(x, y *big.Float) *big.Float           { return new(big.Float).SetPrec(bits).Add(x, y) }
func bigSub(x, y *big.Float) *big.Float           { return new(big.Float).SetPrec(bits).Sub(x, y) }
func bigMul(x, y *big.Float) *big.Float           { return new(big.Float).SetPrec(bits).Mul(x, y) }
func bigQuo(x, y *big.Float) *big.Float           { return new(big.Float).SetPrec(bits).Quo(x, y) }
func bigScale(x *big.Float, k float64) *big.Float { return bigMul(x, bigOf(k)) }

// powers returns Σ t_k with t_0 = first and t_k = −t_{k−1} y/step(k), up to terms that no longer show.
func powers(first, y *big.Float, step func(k float64) float64) *big.Float {
	total, term := bigOf(0), first
	for k := 1.0; term.Sign() != 0 && (k < 3 || term.MantExp(nil) > -bits/2-100); k++ {
		total = bigAdd(total, term)
		term = bigQuo(bigMul(term, y), bigOf(-step(k)))
	}
	return total
}

func bigSin(z *big.Float) *big.Float {
	return powers(z, bigMul(z, z), func(k float64) float64 { return 2 * k * (2*k + 1) })
}

func bigCos(z *big.Float) *big.Float {
	return powers(bigOf(1), bigMul(z, z), func(k float64) float64 { return 2 * k * (2*k - 1) })
}

func bigJ0(z *big.Float) *big.Float {
	return powers(bigOf(1), bigScale(bigMul(z, z), 0.25), func(k float64) float64 { return k * k })
}

func bigJ1(z *big.Float) *big.Float {
	return powers(bigScale(z, 0.5), bigScale(bigMul(z, z), 0.25), func(k float64) float64 { return k * (k + 1) })
}

// bigDecay returns e^{−a}.
func bigDecay(a *big.Float) *big.Float {
	const halvings = 12
	e := powers(bigOf(1), bigScale(a, 1.0/(1<<halvings)), func(k float64) float64 { return k })
	for range halvings {
		e = bigMul(e, e)
	}
	return e
}

// bigMode returns ζ_n by Newton's method from the float64 root, and C_n f(ζ_n x), by the textbook forms.
func bigMode(dimension float64, n int, bi, start, x float64) (zeta, c *big.Float) {
	zeta, h := bigOf(start), bigOf(bi)
	at := func() (f, slope, c *big.Float) {
		if dimension == 2 {
			j0, j1 := bigJ0(zeta), bigJ1(zeta)
			square := bigAdd(bigMul(j0, j0), bigMul(j1, j1))
			return bigSub(bigMul(zeta, j1), bigMul(h, j0)), bigAdd(bigMul(zeta, j0), bigMul(h, j1)),
				bigQuo(bigScale(j1, 2), bigMul(zeta, square))
		}
		s, c := bigSin(zeta), bigCos(zeta)
		double := bigScale(bigMul(s, c), 2)
		if dimension == 1 {
			return bigSub(bigMul(zeta, s), bigMul(h, c)), bigAdd(bigAdd(s, bigMul(zeta, c)), bigMul(h, s)),
				bigQuo(bigScale(s, 4), bigAdd(bigScale(zeta, 2), double))
		}
		g := bigSub(h, bigOf(1))
		return bigAdd(bigMul(zeta, c), bigMul(g, s)), bigAdd(bigSub(c, bigMul(zeta, s)), bigMul(g, c)),
			bigQuo(bigScale(bigSub(s, bigMul(zeta, c)), 4), bigSub(bigScale(zeta, 2), double))
	}
	for range 3 {
		f, slope, _ := at()
		zeta = bigSub(zeta, bigQuo(f, slope))
	}
	_, _, c = at()
	z := bigScale(zeta, x)
	switch {
	case dimension == 1:
		c = bigMul(c, bigCos(z))
	case dimension == 2:
		c = bigMul(c, bigJ0(z))
	case x > 0:
		c = bigMul(c, bigQuo(bigSin(z), z))
	}
	return zeta, c
}

// Roots to 2 units in the last place and θ to a few roundings at random Biot numbers from 1e-12 to 1e12, places, and
// times on both sides of the join.
func TestAgainstBig(t *testing.T) {
	const rounded = 2e-15
	for _, b := range bodies {
		r := rand.New(rand.NewSource(21))
		worst, worstRoot := 0.0, 0.0
		for range 12 {
			bi, x := math.Pow(10, 24*r.Float64()-12), r.Float64()
			fo := math.Pow(10, 3.3*r.Float64()-2.8)
			s := b.new(bi)
			truth := bigOf(0)
			for n := 1; ; n++ {
				start := b.root(n, bi)
				if start*start*fo > 60 {
					break
				}
				zeta, c := bigMode(b.dimension, n, bi, start, x)
				want, _ := zeta.Float64()
				worstRoot = math.Max(worstRoot, ulps(start, want))
				if d := ulps(start, want); !(d <= 2) {
					t.Errorf("%s, Bi %v, n %d: root %.17g, want %.17g within 2 ULP", b.name, bi, n, start, want)
				}
				truth = bigAdd(truth, bigMul(c, bigDecay(bigScale(bigMul(zeta, zeta), fo))))
			}
			off, _ := bigSub(bigOf(s.At(x, fo)), truth).Float64()
			worst = math.Max(worst, math.Abs(off))
			bound := s.Truncation(fo)
			if !(math.Abs(off) <= bound+rounded && bound <= 1e-15 && math.Abs(off) <= s.ErrorBound(fo)) {
				t.Errorf("%s, Bi %v, Fo %v, x %v: θ off by %.2g; bound %.2g of what is left out, %.2g with rounding", b.name, bi, fo, x, off, bound, s.ErrorBound(fo))
			}
		}
		t.Logf("%s: worst root %.1f ULP, θ %.2g", b.name, worstRoot, worst)
	}
}

package eigen

import (
	"math"
	"sync"
)

// cylinderFirst gives ζ_1² of a cylinder to 4e-7, by interpolation of the exact roots at the nodes of Chebyshev.
var cylinderFirst = [12]float64{
	6.398586438, -0.1045317642, -0.6043519795, -0.01111962534, 0.1205696131, 0.01084279992,
	-0.02768015224, -0.004592319936, 0.004471009421, 0.000994485089,
}

// cylinderRoot returns ζ_n, the n-th root of ζ J1(ζ) = Bi J0(ζ), for Bi ≥ 0: between zeros of J1 and J0.
func cylinderRoot(n int, bi float64) float64 {
	switch {
	case n == 1 && bi < 1e-8:
		return math.Sqrt(2 * bi * (1 - bi/4)) // the next term of the square is Bi³/12
	case n == 1:
		return besselRoot(math.Sqrt(fitted(&cylinderFirst, bi, 3)), bi)
	}
	part := float64(n) - 0.75
	high := part * math.Pi
	if n < phaseStart {
		v := 1.0
		if bi < most {
			v = (bi - high) / (bi + high)
		}
		return besselRoot(polynomial(&cylinderFits()[n], v), bi)
	}
	return phaseRoot(bi, high, part*piLow+math.FMA(part, math.Pi, -high))
}

// cylinderFits holds, for n from 2 on, the polynomials in (Bi − a)/(Bi + a), a = (n − 3/4)π, that give ζ_n to 1e-5 by
// interpolation at the nodes of Chebyshev. It is made when it is first asked for.
var cylinderFits = sync.OnceValue(func() *[phaseStart][12]float64 {
	const nodes = 10
	table := new([phaseStart][12]float64)
	for n := 2; n < phaseStart; n++ {
		a := (float64(n) - 0.75) * math.Pi
		before, here := [nodes + 1]float64{}, [nodes + 1]float64{1} // the polynomials T_{j−1} and T_j of Chebyshev
		var zeta [nodes]float64
		for k := range zeta {
			v := math.Cos(math.Pi * (float64(k) + 0.5) / nodes)
			bi := a * (1 + v) / (1 - v)
			zeta[k] = phaseGuess(guess(bi-0.5, a), bi, a)
			for range 3 {
				zeta[k] = besselRoot(zeta[k], bi)
			}
		}
		for j := range nodes {
			c := 0.0
			for k, z := range zeta {
				c += z * math.Cos(math.Pi*(float64(k)+0.5)/nodes*float64(j))
			}
			c *= 2.0 / nodes
			factor := 2.0
			if j == 0 {
				c, factor = c/2, 1
			}
			var next [nodes + 1]float64
			for i := range nodes {
				table[n][i] += c * here[i]
				next[i+1] += factor * here[i]
				next[i] -= before[i]
			}
			before, here = here, next
		}
	}
	return table
})

// besselRoot takes one step to the zero of f = ζ J1 − Bi J0, or of that over Bi, whose derivatives
// follow from J0' = −J1 and (ζ J1)' = ζ J0, by Householder's method of fourth order.
func besselRoot(zeta, bi float64) float64 {
	j0, j1 := bessel01(zeta)
	one := 1.0
	if bi > 1 {
		one, bi = 1/bi, 1
	}
	ratio := j1 / zeta
	f := one*zeta*j1 - bi*j0
	slope := one*zeta*j0 + bi*j1
	bend := one*(j0-zeta*j1) + bi*(j0-ratio)
	twist := bi*((2*ratio-j0)/zeta-j1) - one*(j1+zeta*j0)
	square := slope * slope
	return zeta - f*(square-0.5*f*bend)/(slope*(square-f*bend)+f*f*twist*(1.0/6))
}

// phaseStart is the first term for which the expansions of phaseRoot are exact to the rounding, from ζ = 128 on.
const phaseStart = 42

// phaseTerms is how many terms of the expansions are taken.
const phaseTerms = 4

// phase, turn and drift hold the factors of w^k, w = 1/ζ², in the expansions about infinity of the phase
// θ = ζ − π/4 + ζ^−1 Σ phase_k w^k of H0 = J0 + iY0 = M e^{iθ}, of θ' = Σ turn_k w^k, and of
// κ = 1/2 + ζ θ”/(2θ') = 1/2 + Σ drift_k w^k. They follow from
// M² πζ/2 = 1/θ' = Σ [(2k−1)!!/(2k)!!] Π_{j≤k} (−(2j−1)²) (w/4)^k (Abramowitz and Stegun, Handbook of Mathematical
// Functions, 9.2.21 and 9.2.28, from memory).
var phase, turn, drift = func() (a, g, k [phaseTerms]float64) {
	var modulus [phaseTerms]float64
	modulus[0] = 1
	for j := 1; j < phaseTerms; j++ {
		odd := float64(2*j - 1)
		modulus[j] = -modulus[j-1] * odd / float64(2*j) * odd * odd / 4
	}
	for n := range phaseTerms { // g = 1/modulus
		if n == 0 {
			g[0] = 1
			continue
		}
		for j := 1; j <= n; j++ {
			g[n] -= modulus[j] * g[n-j]
		}
		// the integral of g
		a[n-1] = -g[n] / float64(2*n-1)
	}
	for n := 1; n < phaseTerms; n++ { // κ = 1/2 − w g_w/g = 1/2 + w m_w/m
		k[n] = float64(n) * modulus[n]
		for j := 1; j < n; j++ {
			k[n] -= modulus[j] * k[n-j]
		}
	}
	return a, g, k
}()

// phaseGuess is phaseRoot to some 1e-5, by Newton's method with two terms of each expansion and, with atan(s/g) put as
// π/4 + atan((s − g)/(s + g)), a polynomial (Abramowitz and Stegun, 4.4.47, good to 1e-5, from memory).
func phaseGuess(zeta, bi, high float64) float64 {
	inverse := 1 / zeta
	w := inverse * inverse
	g := 1 + w*turn[1]
	s := math.Min((bi-0.5-w*drift[1])*inverse, most)
	angle := s - s*s*s*(1.0/3)
	if s > 0 {
		x := (s - g) / (s + g)
		square := x * x
		angle = math.Pi/4 + x*((0.9998660-0.3302995*square)+square*square*((0.1801410-0.0851330*square)+0.0208351*square*square))
	}
	pull := s / (1 + s*s) * inverse
	return zeta - ((zeta-high)+inverse*(phase[0]+w*phase[1])-angle)*(1-pull+pull*pull)
}

// phaseRoot returns the root of θ(ζ) = (n−1)π + atan((Bi − κ)/(ζ θ')), which is the equation of the roots
// with −ζ J0' = Bi J0 and J0 = M cos θ, M² θ' = 2/(πζ), put in. The first of two steps of Newton's method leaves small
// terms out; the arctangent of the second follows from that of the first, as in rootOf. At the root the derivative of the difference
// of both sides is (ζ² + Bi²)/(ζ² θ' + (Bi − κ)²/θ').
func phaseRoot(bi, high, low float64) float64 {
	h := min(bi-0.5, most)
	first := guess(h, high)
	inverse := 1 / first
	before := h * inverse
	angle := math.Atan(before)
	pull := before / (1 + before*before) * inverse
	zeta := first - ((first-high)-0.125*inverse-angle)*(1-pull)

	inverse = 1 / zeta
	w := inverse * inverse
	a := phase[0] + w*(phase[1]+w*phase[2])
	g := 1 + w*(turn[1]+w*(turn[2]+w*turn[3]))
	k := 0.5 + w*(drift[1]+w*(drift[2]+w*drift[3]))
	r, s := min(bi*inverse, most), min((bi-k)*inverse, most)
	t := (s - before*g) / (g + before*s)
	angle += t - t*t*t*(1.0/3)
	return zeta - ((zeta-high)-low+inverse*a-angle)*(g*g+s*s)/((1+r*r)*g)
}

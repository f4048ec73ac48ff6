package eigen

import "math"

// sphereFirst gives ζ_1² of a sphere to 6e-7, by interpolation of the exact roots at the nodes of Chebyshev.
var sphereFirst = [12]float64{
	12.06037356, -1.357934545, -1.399407994, 0.4012335333, 0.3620876446, -0.1504348525,
	-0.1182198193, 0.05255407693, 0.03691140834, -0.01061936439, -0.006944563228,
}

// sphereRoot returns ζ_n, the n-th root of ζ cot ζ = 1 − Bi in ((n−1)π, nπ), and its square, for Bi ≥ 0.
func sphereRoot(n int, bi float64) (zeta, square float64) {
	if n == 1 && bi < 0.5 {
		square = firstSphereRate(bi)
		return math.Sqrt(square), square
	}
	if math.IsInf(bi, 1) {
		zeta = float64(n) * math.Pi
		return zeta, zeta * zeta
	}
	half := float64(n) - 0.5
	high, h := half*math.Pi, bi-1
	low := half*piLow + math.FMA(half, math.Pi, -high)
	if n == 1 {
		zeta = towards(math.Sqrt(fitted(&sphereFirst, bi, 4)), h, high, low)
	} else {
		zeta = rootOf(h, high, low)
	}
	return zeta, zeta * zeta
}

// firstSphereRate returns y = ζ_1² for Bi below 1/2 from F(y) = 1 − √y cot √y = Bi. With
// 3B = 3 sin √y/√y and A = (sin √y − √y cos √y)/√y³ it is y A = Bi B, and no digit is lost as Bi goes to 0. Since
// F = y/3 + y²/45 + 2y³/945 + …, the second derivative that Halley's method takes needs two terms only.
func firstSphereRate(bi float64) float64 {
	y := fitted(&sphereFirst, bi, 4)
	if y == 0 {
		return 3 * bi
	}
	a, b := polynomial(&spherePower, y), polynomial(&sincPower, y)
	ratio := a / b
	value := y * ratio
	slope := (1 - (1-value)*ratio) / 2
	return y - halley((y*a-bi*b)/b, slope, 2.0/45+y*(4.0/315+y*(4.0/1575)))
}

// sincPower and spherePower hold the factors of y^k in sin √y/√y, (−1)^k/(2k+1)!, and in
// (sin √y − √y cos √y)/√y³, (−1)^k (2k+2)/(2k+3)!.
var sincPower, spherePower = func() (s, a [12]float64) {
	factorial := 1.0 // of 2k+1
	for k := range s {
		s[k] = 1 / factorial
		next := float64(2*k+2) * float64(2*k+3)
		a[k] = float64(2*k+2) / (factorial * next)
		if k%2 == 1 {
			s[k], a[k] = -s[k], -a[k]
		}
		factorial *= next
	}
	return s, a
}()

package wall

import "math"

// ends are the phases that the conditions at the faces ask for: a mode is √(S Rb^m/r^m) cos β, with β from −inner to
// (n − 1)π + outer.
type ends struct {
	a, b         wave
	inner, outer float64 // atan of the g below
	ga, gb       float64 // Ha S/ζ + p and Hb S/ζ − p
	excess       float64 // F: what β rises by between the faces less both ends, (n − 1)π at a root
	slope        float64 // dF/dζ, twice the norm of the mode
}

// over returns H S/ζ, and what it makes of an infinite H.
func over(h, size, zeta float64) float64 { return h / zeta * size }

// ends returns the phases at ζ.
//
// With a wave M cos(Θ + γ) the condition at the inner face is tan β = −ga, that at the outer one tan β = gb, and the
// derivatives follow from Θ' = 1/S, S' = S/x − 2p. In a sphere and a plate p is 1/x and 0.
func (b *Body) ends(zeta, ha, hb float64) ends {
	e := ends{a: b.at(zeta, b.Ra), b: b.at(zeta, b.Rb)}
	e.ga = over(ha, e.a.size, zeta) + e.a.lean
	e.gb = over(hb, e.b.size, zeta) - e.b.lean
	e.inner, e.outer = math.Atan(e.ga), math.Atan(e.gb)
	rise := zeta
	var da, db float64 // of ga and gb
	switch b.Dimension {
	case 1:
		if e.a.far {
			rise += e.b.extra - e.a.extra
			e.slope = 1 - b.Rb*e.b.rest/e.b.size + b.Ra*e.a.rest/e.a.size
		} else {
			rise = e.b.phase - e.a.phase
			e.slope = b.Rb/e.b.size - b.Ra/e.a.size
		}
		da = b.Ra * (e.a.bend - 2*(ha/zeta)*e.a.lean)
		db = -b.Rb * (e.b.bend + 2*(hb/zeta)*e.b.lean)
	default:
		e.slope = 1
		da, db = -e.ga/zeta, -e.gb/zeta
	}
	e.excess = rise - e.inner - e.outer
	if !math.IsInf(ha, 1) {
		e.slope -= turn(da, e.ga)
	}
	if !math.IsInf(hb, 1) {
		e.slope -= turn(db, e.gb)
	}
	return e
}

// turn returns d/(1 + g²) where a square may overflow.
func turn(d, g float64) float64 {
	if math.Abs(g) > 1e100 {
		return d / g / g
	}
	return d / (1 + g*g)
}

// root returns ζ_n between (n − 1)π and nπ, where F − (n − 1)π goes from below 0 to above: by Newton's method within
// a bracket that halves where a step leaves it.
func (b *Body) root(n int, ha, hb float64) (float64, ends) {
	multiple := float64(n-1) * math.Pi
	lo, hi := multiple, float64(n)*math.Pi
	middle := multiple + math.Pi/2
	zeta := multiple + (math.Atan((ha+b.curve(b.Ra))/middle)+math.Atan((hb-b.curve(b.Rb))/middle))*0.95
	if n == 1 && b.Dimension == 0 { // two terms of the expansion at small coefficients, bounded at large ones
		zeta = math.Min(math.Sqrt(ha+hb+ha*hb)/math.Sqrt(1+(ha+hb)/2), 3)
	}
	if !(zeta > lo && zeta < hi) {
		zeta = middle
	}
	for range 80 {
		e := b.ends(zeta, ha, hb)
		f := e.excess - multiple
		if f > 0 {
			hi = zeta
		} else {
			lo = zeta
		}
		next := zeta - f/e.slope
		if !(next >= lo && next <= hi) || !(e.slope > 0) {
			next = lo + (hi-lo)/2
		} else if math.Abs(next-zeta) <= 1e-9*zeta {
			return next, b.ends(next, ha, hb)
		}
		zeta = next
	}
	return zeta, b.ends(zeta, ha, hb)
}

// curve returns m/(2r), by which √w changes.
func (b *Body) curve(r float64) float64 {
	if b.Dimension == 0 {
		return 0
	}
	return float64(b.Dimension) / (2 * r)
}

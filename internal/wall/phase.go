package wall

import "math"

// A wave is what the conditions at a face need of the oscillating solutions at one place, for the argument
// x = ζ r. They are M cos(Θ + γ) with the modulus M and the phase Θ of J0 + i Y0 in a cylinder (M. Abramowitz and
// I. A. Stegun, Handbook of Mathematical Functions, section 9.2, from memory), and e^{ix}/x in a sphere.
type wave struct {
	size  float64 // S: (π x/2) M², 1 in a plate and a sphere
	rest  float64 // S − 1 where it is from the expansion for large x
	lean  float64 // p: −d log M/dx · S, what the curvature adds to a coefficient
	bend  float64 // dp/dx, of a cylinder
	phase float64 // Θ
	extra float64 // Θ + π/4 − x, likewise
	far   bool    // they are
}

// farFrom is the argument from which the expansions for large x are used: there the first term left out is below 1e-16.
const farFrom = 25

// expansion holds the coefficients of S in powers of 1/x², and of 1/S, whose integral is the phase.
var expansion = func() (e struct{ size, rate [14]float64 }) {
	e.size[0], e.rate[0] = 1, 1
	for k := 1; k < len(e.size); k++ {
		odd := float64(2*k - 1)
		e.size[k] = -e.size[k-1] * odd / float64(2*k) * odd * odd / 4
		for j := 1; j <= k; j++ {
			e.rate[k] -= e.size[j] * e.rate[k-j]
		}
	}
	return e
}()

// farWave returns the wave of a cylinder for large x.
func farWave(x float64) wave {
	r := 1 / x
	z := r * r
	w := wave{far: true}
	for k := len(expansion.size) - 1; k >= 0; k-- {
		n := float64(2*k + 1)
		s := expansion.size[k]
		w.lean = w.lean*z + s*n/2
		w.bend = w.bend*z - s*n*n/2
		if k > 0 {
			w.rest = w.rest*z + s
			w.extra = w.extra*z + expansion.rate[k]/(1-2*float64(k))
		}
	}
	w.rest *= z
	w.size = 1 + w.rest
	w.lean *= r
	w.bend *= z
	w.extra *= r
	w.phase = x - math.Pi/4 + w.extra
	return w
}

// cylinderWave returns the wave of a cylinder.
func cylinderWave(x float64) wave {
	if x >= farFrom {
		return farWave(x)
	}
	j0, y0 := math.J0(x), math.Y0(x)
	half := math.Pi / 2 * x
	w := wave{size: half * (j0*j0 + y0*y0), lean: half * (j0*math.J1(x) + y0*math.Y1(x))}
	w.bend = w.size - (1+w.lean*w.lean)/w.size // of the Wronskian
	// the phase rises from −π/2, and stays within 0.3 of its expansion
	near := math.Max(-math.Pi/2, x-math.Pi/4-0.125/x)
	w.phase = math.Atan2(y0, j0)
	w.phase += 2 * math.Pi * math.Round((near-w.phase)/(2*math.Pi))
	return w
}

// at returns the wave at the radius r.
func (b *Body) at(zeta, r float64) wave {
	switch b.Dimension {
	case 1:
		return cylinderWave(zeta * r)
	case 2:
		return wave{size: 1, lean: 1 / (zeta * r)}
	}
	return wave{size: 1}
}

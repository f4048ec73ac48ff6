package fit

import (
	"math"
	"slices"
)

// A Loss says how much a reading that lies off counts.
type Loss int

// Squares counts all readings alike. Huber takes those far off less (P. J. Huber, Robust Statistics, Wiley
// 1981), with the constant 1.345; Tukey's biweight leaves out those very far off (A. E. Beaton, J. W. Tukey,
// Technometrics 16 (1974) 147–185), with 4.685. With these constants the variance for normal errors is 1/0.95
// of that of least squares (all from memory).
const (
	Squares Loss = iota
	Huber
	Tukey
)

const (
	huberConstant = 1.345
	tukeyConstant = 4.685
)

// weight returns ψ(x)/x and ψ'(x).
func (l Loss) weight(x float64) (weight, slope float64) {
	switch x = math.Abs(x); l {
	case Huber:
		if x > huberConstant {
			return huberConstant / x, 0
		}
	case Tukey:
		z := x / tukeyConstant
		if z >= 1 {
			return 0, 0
		}
		s := (1 - z) * (1 + z)
		return s * s, s * (1 - 5*z*z)
	}
	return 1, 1
}

// Scale returns the standard deviation of normal errors with the median of |r|, of which the smallest, as
// many as there are constants, are left out because the fit made them small.
func Scale(r []float64, constants int) float64 {
	size := make([]float64, len(r))
	for i, x := range r {
		size[i] = math.Abs(x)
	}
	slices.Sort(size)
	size = size[min(constants-1, len(size)-1):]
	n := len(size)
	return (size[(n-1)/2] + size[n/2]) / 2 / 0.6744897501960817
}

// Residuals returns what is left of the readings, without weights.
func (p *Exponential) Residuals(c Curve) []float64 {
	r := make([]float64, len(p.T))
	for i, t := range p.T {
		r[i] = p.Y[i] - c.At(t)
	}
	return r
}

// Robust fits with a loss, by weights that follow from what the fit before left. It changes the weights of p, and
// returns the standard deviation with which (JᵀWJ)⁻¹ is the covariance of the constants (Huber 1981, sec. 7.6, with
// his correction K; from memory); 0 for least squares, and where at least half of the readings lie on a
// curve to the last digit.
func (p *Exponential) Robust(loss Loss) (c Curve, deviation float64, err error) {
	if c, err = p.Fit(); err != nil || loss == Squares {
		return c, 0, err
	}
	scale := 0.0
	for _, l := range []Loss{Huber, loss} { // Tukey's has more than one minimum: begin near the right one
		for range 50 {
			r := p.Residuals(c)
			if scale = Scale(r, p.Free()); !(scale > 0) {
				return c, 0, nil
			}
			for i, x := range r {
				p.W[i], _ = l.weight(x / scale)
			}
			last := c
			if c, err = p.Fit(); err != nil {
				return c, 0, err
			}
			if math.Abs(c.Tau/last.Tau-1)+math.Abs(c.Start-last.Start)/scale+math.Abs(c.Ambient-last.Ambient)/scale < 1e-7 {
				break
			}
		}
	}
	n, free := float64(len(p.T)), float64(p.Free())
	var squares, slope, slope2, weight float64
	for i, x := range p.Residuals(c) {
		w, d := loss.weight(x / scale)
		squares += w * x * w * x
		slope += d / n
		slope2 += d * d / n
		weight += p.W[i] / n
	}
	if !(slope > 0) || n <= free {
		return c, scale, nil
	}
	k := 1 + free/n*(slope2-slope*slope)/(slope*slope)
	return c, k / slope * math.Sqrt(squares/(n-free)*weight), nil
}

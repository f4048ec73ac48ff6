package fit

import (
	"math"

	"gonum.org/v1/gonum/mat"
)

// Columns returns the derivatives of the curve at the readings to the free constants, in the order ln τ,
// start, ambient, each times the root of the weight.
func (p *Exponential) Columns(c Curve) *mat.Dense {
	m := mat.NewDense(len(p.T), p.Free(), nil)
	for i, t := range p.T {
		w := math.Sqrt(p.W[i])
		for j, d := range p.row(c, t) {
			m.Set(i, j, w*d)
		}
	}
	return m
}

func (p *Exponential) row(c Curve, t float64) []float64 {
	tau, start, ambient := c.Slope(t)
	row := []float64{tau}
	if math.IsNaN(p.Start) {
		row = append(row, start)
	}
	if math.IsNaN(p.Ambient) {
		row = append(row, ambient)
	}
	return row
}

// Covariance returns the inverse of JᵀWJ, and whether there is one: the covariance of the free constants
// for readings of variance 1.
func Covariance(columns *mat.Dense) (*mat.SymDense, bool) {
	n, p := columns.Dims()
	if n < p {
		return nil, false
	}
	scale := make([]float64, p)
	scaled := mat.DenseCopyOf(columns)
	for j := range p {
		scale[j] = mat.Norm(columns.ColView(j), 2)
		if !(scale[j] > 0) || !isFinite(scale[j]) {
			return nil, false
		}
		for i := range n {
			scaled.Set(i, j, columns.At(i, j)/scale[j])
		}
	}
	var qr mat.QR
	qr.Factorize(scaled)
	var r mat.Dense
	qr.RTo(&r)
	square := r.Slice(0, p, 0, p)
	var inverse mat.Dense
	if err := inverse.Inverse(square); err != nil {
		if _, ill := err.(mat.Condition); !ill || math.IsInf(float64(err.(mat.Condition)), 1) {
			return nil, false
		}
	}
	c := mat.NewSymDense(p, nil)
	for i := range p {
		for j := i; j < p; j++ {
			sum := 0.0
			for k := range p {
				sum += inverse.At(i, k) * inverse.At(j, k)
			}
			c.SetSym(i, j, sum/scale[i]/scale[j])
		}
	}
	return c, true
}

// Variance returns the variance of the curve at time t for a covariance of the constants.
func (p *Exponential) Variance(c Curve, covariance *mat.SymDense, t float64) float64 {
	row := mat.NewVecDense(p.Free(), p.row(c, t))
	return mat.Inner(row, covariance, row)
}

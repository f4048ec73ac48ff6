package fit

import (
	"errors"
	"math"

	"gonum.org/v1/gonum/mat"
)

// ErrStuck reports that no further step makes the sum of squares less.
var ErrStuck = errors.New("the sum of squares has no least value near")

// LeastSquares changes the constants x until the sum of the squares of r(x) is least, and returns the
// residuals there with their derivatives, one column for each constant. The derivatives are by difference, with
// the given steps. The method is that of Levenberg and Marquardt (D. W. Marquardt, J. Soc. Indust. Appl. Math. 11
// (1963) 431–441, from memory).
func LeastSquares(residuals func(x []float64) ([]float64, error), x, steps []float64) ([]float64, *mat.Dense, error) {
	r, err := residuals(x)
	if err != nil {
		return nil, nil, err
	}
	squares, damping := sumOfSquares(r), 1e-3
	moved, trial := make([]float64, len(x)), make([]float64, len(x))
	for range 100 {
		j := mat.NewDense(len(r), len(x), nil)
		for k := range x {
			copy(moved, x)
			moved[k] += steps[k]
			rp, err := residuals(moved)
			if err != nil {
				return nil, nil, err
			}
			moved[k] = x[k] - steps[k]
			rm, err := residuals(moved)
			if err != nil {
				return nil, nil, err
			}
			for i := range r {
				j.Set(i, k, (rp[i]-rm[i])/(2*steps[k]))
			}
		}
		var a mat.SymDense
		a.SymOuterK(1, j.T())
		var g mat.VecDense
		g.MulVec(j.T(), mat.NewVecDense(len(r), r))
		better, small := false, false
		for range 30 {
			damped := mat.NewSymDense(len(x), nil)
			damped.CopySym(&a)
			for k := range x {
				damped.SetSym(k, k, a.At(k, k)*(1+damping))
			}
			var c mat.Cholesky
			if !c.Factorize(damped) {
				damping *= 10
				continue
			}
			var step mat.VecDense
			if err := c.SolveVecTo(&step, &g); err != nil {
				damping *= 10
				continue
			}
			small = true
			for k := range x {
				trial[k] = x[k] - step.AtVec(k)
				small = small && math.Abs(step.AtVec(k)) <= 1e-6*steps[k]
			}
			rt, err := residuals(trial)
			if err == nil && sumOfSquares(rt) <= squares {
				copy(x, trial)
				r, squares, damping, better = rt, sumOfSquares(rt), max(damping/10, 1e-12), true
				break
			}
			if small {
				break
			}
			damping *= 10
		}
		if small {
			return r, j, nil
		}
		if !better {
			return r, j, ErrStuck
		}
	}
	return nil, nil, ErrStuck
}

func sumOfSquares(r []float64) float64 {
	sum := 0.0
	for _, x := range r {
		sum += x * x
	}
	return sum
}

package property

import (
	"math"

	"gonum.org/v1/gonum/interp"
)

// Liquid is a liquid given by rows, interpolated by the monotone piecewise cubics of F. N. Fritsch and J. Butland, SIAM J.
// Sci. Stat. Comput. 5 (1984) 300–304: density, specific heat, conductivity and the logarithm of the viscosity
// over the temperature. The expansion coefficient is that of the interpolated density.
type Liquid struct {
	rho, c, k, lnMu interp.FritschButland
}

// NewLiquid returns the table of at least two rows, with t strictly increasing, which the caller has checked.
func NewLiquid(t, rho, c, k, mu []float64) (*Liquid, error) {
	lnMu := make([]float64, len(mu))
	for i, x := range mu {
		lnMu[i] = math.Log(x)
	}
	l := new(Liquid)
	for _, f := range []struct {
		curve *interp.FritschButland
		y     []float64
	}{{&l.rho, rho}, {&l.c, c}, {&l.k, k}, {&l.lnMu, lnMu}} {
		if err := f.curve.Fit(t, f.y); err != nil {
			return nil, err
		}
	}
	return l, nil
}

// At returns density, specific heat, thermal conductivity, viscosity and isobaric expansion coefficient.
func (l *Liquid) At(t float64) (rho, c, k, mu, beta float64) {
	rho = l.rho.Predict(t)
	return rho, l.c.Predict(t), l.k.Predict(t), math.Exp(l.lnMu.Predict(t)), -l.rho.PredictDerivative(t) / rho
}

// SaturationLine is a pressure of saturation given by rows: its logarithm is interpolated over 1/T.
type SaturationLine struct{ lnP interp.FritschButland }

// NewSaturationLine returns the line of at least two rows, with t strictly increasing.
func NewSaturationLine(t, p []float64) (*SaturationLine, error) {
	n := len(t)
	x, y := make([]float64, n), make([]float64, n)
	for i := range t {
		x[n-1-i], y[n-1-i] = 1/t[i], math.Log(p[i])
	}
	s := new(SaturationLine)
	return s, s.lnP.Fit(x, y)
}

// At returns the pressure of saturation at the temperature t.
func (s *SaturationLine) At(t float64) float64 { return math.Exp(s.lnP.Predict(1 / t)) }

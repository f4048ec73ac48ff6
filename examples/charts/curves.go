package main

import (
	"math"
	"strconv"

	"gonum.org/v1/plot/plotter"

	"example.com/coolward/series"
)

// biots are the Biot numbers of the curves.
var biots = []float64{0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10, math.Inf(1)}

// heatBiots are those of the heat; for a prescribed surface temperature Bi² Fo has no meaning.
var heatBiots = []float64{0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50}

// number writes a Biot number.
func number(bi float64) string {
	if math.IsInf(bi, 1) {
		return "∞"
	}
	return strconv.FormatFloat(bi, 'g', -1, 64)
}

// The ends of the axes.
const (
	leastTheta            = 0.001
	firstFo, lastFo       = 0.05, 1000.0
	firstBiot, lastBiot   = 0.01, 100.0
	firstGroup, lastGroup = 1e-4, 1e4
)

// between returns n + 1 numbers with the same ratio from one to the next, ends included.
func between(from, to float64, n int) []float64 {
	all := make([]float64, n+1)
	for i := range all {
		all[i] = from * math.Pow(to/from, float64(i)/float64(n))
	}
	all[n] = to
	return all
}

const points = 300

// centreCurve returns log θ in the middle over the logarithm of the Fourier number, down to the lower edge of the chart.
func centreCurve(f form, bi float64) (plotter.XYs, error) {
	modes, err := series.NewModes(f.family, bi)
	if err != nil {
		return nil, err
	}
	last := math.Min(lastFo, modes.Fourier(0, leastTheta))
	var curve plotter.XYs
	for _, fo := range between(firstFo, last, points) {
		curve = append(curve, plotter.XY{X: math.Log10(fo), Y: math.Log10(math.Max(leastTheta, modes.Theta(0, fo)))})
	}
	return curve, nil
}

// settled is a Fourier number at which the first term is all that is left at every Biot number.
const settled = 10

// positionCurve returns θ at x over that in the middle, of the first term alone, over the logarithm of the
// Biot number.
func positionCurve(f form, x float64) (plotter.XYs, error) {
	var curve plotter.XYs
	for _, bi := range between(firstBiot, lastBiot, points) {
		modes, err := series.NewModes(f.family, bi)
		if err != nil {
			return nil, err
		}
		here, _ := modes.OneTerm(x, settled)
		middle, _ := modes.OneTerm(0, settled)
		curve = append(curve, plotter.XY{X: math.Log10(bi), Y: here / middle})
	}
	return curve, nil
}

// allOfIt is the part of the heat behind which a curve would follow the edge of the chart.
const allOfIt = 0.9995

// heatCurve returns the part of the heat that has left over the logarithm of Bi² Fo.
func heatCurve(f form, bi float64) (plotter.XYs, error) {
	modes, err := series.NewModes(f.family, bi)
	if err != nil {
		return nil, err
	}
	var curve plotter.XYs
	for _, group := range between(firstGroup, lastGroup, 2*points) {
		curve = append(curve, plotter.XY{X: math.Log10(group), Y: modes.Loss(group / (bi * bi))})
		if curve[len(curve)-1].Y > allOfIt {
			break
		}
	}
	return curve, nil
}

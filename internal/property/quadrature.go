package property

import (
	"errors"
	"math"
	"sort"

	"gonum.org/v1/gonum/integrate/quad"
)

// Functions is a solid given by two functions. The enthalpy is the integral of C from low, by composite
// Gauss quadrature on panels that end at the kinks.
type Functions struct {
	K, C func(t float64) float64
	t    []float64 // ends of the panels
	h    []float64 // enthalpy there
}

// ErrRough is returned for a specific heat that varies too much between the kinks to be integrated.
var ErrRough = errors.New("too rough to integrate")

const maxPanels = 4096

// NewFunctions returns the solid between the first and the last of ends, which are strictly increasing and
// hold the kinks between them. It returns [ErrRough] if the integral does not settle.
func NewFunctions(k, c func(t float64) float64, ends []float64) (*Functions, error) {
	f := &Functions{K: k, C: c, t: []float64{ends[0]}, h: []float64{0}}
	whole := 0.0
	for i := 1; i < len(ends); i++ {
		whole += math.Abs(f.gauss(ends[i-1], ends[i]))
	}
	for i := 1; i < len(ends); i++ {
		if !f.refine(ends[i-1], ends[i], f.gauss(ends[i-1], ends[i]), 1e-13*whole, 50) {
			return nil, ErrRough
		}
	}
	return f, nil
}

// refine adds panels from a to b, halving until the two halves agree with the whole to within tolerance.
func (f *Functions) refine(a, b, whole, tolerance float64, depth int) bool {
	mid := a + (b-a)/2
	left, right := f.gauss(a, mid), f.gauss(mid, b)
	if math.Abs(left+right-whole) <= tolerance || !(mid > a && mid < b) {
		f.t = append(f.t, mid, b)
		n := len(f.h) - 1
		f.h = append(f.h, f.h[n]+left, f.h[n]+left+right)
		return len(f.t) <= maxPanels
	}
	if depth == 0 {
		return false
	}
	return f.refine(a, mid, left, tolerance, depth-1) && f.refine(mid, b, right, tolerance, depth-1)
}

// Conductivity calls the function.
func (f *Functions) Conductivity(t float64) float64 { return f.K(t) }

// SpecificHeat calls the function.
func (f *Functions) SpecificHeat(t float64) float64 { return f.C(t) }

// Enthalpy returns the integral of the specific heat from the low end.
func (f *Functions) Enthalpy(t float64) float64 {
	i := sort.SearchFloat64s(f.t, t)
	if i < len(f.t) && f.t[i] == t {
		return f.h[i]
	}
	if i == 0 {
		return math.NaN()
	}
	return f.h[i-1] + f.gauss(f.t[i-1], t)
}

// gauss integrates C from a to b with the eight points of Gauss and Legendre.
func (f *Functions) gauss(a, b float64) float64 {
	half := (b - a) / 2
	mid := a + half
	sum := 0.0
	for i, x := range gaussPoints {
		sum += gaussWeights[i] * f.C(mid+half*x)
	}
	return half * sum
}

var gaussPoints, gaussWeights = legendre()

func legendre() (x, w [8]float64) {
	quad.Legendre{}.FixedLocations(x[:], w[:], -1, 1)
	return x, w
}

package ode

import (
	"math"
	"testing"
)

// The coefficients as vectors, for the conditions below.
var (
	nodes  = []float64{0, c2, c3, c4, c5, 1, 1}
	stages = [][]float64{
		{},
		{a21},
		{a31, a32},
		{a41, a42, a43},
		{a51, a52, a53, a54},
		{a61, a62, a63, a64, a65},
		{b1, 0, b3, b4, b5, b6},
	}
	weights   = []float64{b1, 0, b3, b4, b5, b6, 0}
	estimator = []float64{e1, 0, e3, e4, e5, e6, e7}
)

// A tree is a rooted tree, the branches of its root; the conditions of order of a Runge-Kutta method
// are one for each (J. C. Butcher; Hairer, Nørsett and Wanner, Solving Ordinary Differential Equations
// I, sec. II.2).
type tree []tree

func (t tree) order() int {
	n := 1
	for _, branch := range t {
		n += branch.order()
	}
	return n
}

// density returns γ(t), the product of the orders of all subtrees.
func (t tree) density() float64 {
	g := float64(t.order())
	for _, branch := range t {
		g *= branch.density()
	}
	return g
}

// stagesOf returns the elementary weights of the stages.
func (t tree) stagesOf() []float64 {
	phi := make([]float64, len(nodes))
	for i := range phi {
		phi[i] = 1
		for _, branch := range t {
			inner, sum := branch.stagesOf(), 0.0
			for j, a := range stages[i] {
				sum += a * inner[j]
			}
			phi[i] *= sum
		}
	}
	return phi
}

// trees returns every rooted tree of the order: branches in any order count once.
func trees(order int) []tree {
	var out []tree
	var add func(left, size, index int, branches tree)
	add = func(left, size, index int, branches tree) {
		if left == 0 {
			out = append(out, append(tree{}, branches...))
			return
		}
		for n := min(size, left); n >= 1; n-- {
			kinds := trees(n)
			first := len(kinds) - 1
			if n == size {
				first = min(index, first)
			}
			for i := first; i >= 0; i-- {
				add(left-n, n, i, append(branches, kinds[i]))
			}
		}
	}
	add(order-1, order-1, math.MaxInt, nil)
	return out
}

func apply(w []float64, t tree) float64 {
	sum := 0.0
	for i, phi := range t.stagesOf() {
		sum += w[i] * phi
	}
	return sum
}

// The numbers of rooted trees of order 1 to 5 are 1, 1, 2, 4, 9 (Hairer, Nørsett and Wanner I, table 2.1).
func TestTreesAreAll(t *testing.T) {
	for i, want := range []int{1, 1, 2, 4, 9} {
		if got := len(trees(i + 1)); got != want {
			t.Errorf("%d trees of order %d, want %d", got, i+1, want)
		}
	}
}

func TestOrderConditions(t *testing.T) {
	const rounding = 1e-14
	for i, c := range nodes {
		sum := 0.0
		for _, a := range stages[i] {
			sum += a
		}
		if math.Abs(sum-c) > rounding {
			t.Errorf("stage %d: Σa = %.17g, want c = %.17g", i+1, sum, c)
		}
	}
	for order := 1; order <= 5; order++ {
		for _, tree := range trees(order) {
			if got, want := apply(weights, tree), 1/tree.density(); math.Abs(got-want) > rounding {
				t.Errorf("order %d, tree %v: Σ b Φ = %.17g, want %.17g", order, tree, got, want)
			}
			got := apply(estimator, tree)
			if order <= 4 && math.Abs(got) > rounding {
				t.Errorf("order %d, tree %v: the estimate is %g, want 0", order, tree, got)
			}
		}
	}
	// The estimate sees the error term of order 5 of the lower formula.
	if got := apply(estimator, trees(5)[0]); math.Abs(got) < 1e-6 {
		t.Errorf("the estimate misses order 5: %g", got)
	}
}

// The continuous extension meets the conditions of order 4 at every θ: Σ b_i(θ) Φ_i = θ^n/γ.
func TestContinuousOrderConditions(t *testing.T) {
	top := []float64{d1, 0, d3, d4, d5, d6, d7}
	for _, theta := range []float64{0.1, 0.35, 0.5, 0.8, 1} {
		w := make([]float64, len(nodes))
		for i := range w {
			k := make([]float64, len(nodes))
			k[i] = 1
			r3 := k[0] - weights[i]
			st := step{change: weights[i], r3: r3, r4: weights[i] - k[6] - r3, r5: top[i]}
			w[i] = st.at(theta)
		}
		for order := 1; order <= 4; order++ {
			for _, tree := range trees(order) {
				got, want := apply(w, tree), math.Pow(theta, float64(order))/tree.density()
				if math.Abs(got-want) > 1e-13 {
					t.Errorf("θ = %g, order %d, tree %v: Σ b(θ) Φ = %.15g, want %.15g", theta, order, tree, got, want)
				}
			}
		}
	}
}

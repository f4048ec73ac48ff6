package fv

import (
	"math"

	"example.com/coolward/internal/root"
)

// A Grading says towards which ends of a part the nodes lie closer. The maps are smooth, which keeps the
// order 2 of uniform nodes, and grids of which one has twice the cells of the other have every second node
// in common.
type Grading struct {
	Low, High bool
	// Ratio is the distance of the nodes at these ends relative to that of uniform nodes, above 0 to 1; 0
	// stands for 0.2.
	Ratio float64
}

// defaultRatio is what a ratio of 0 stands for. Up to it a polynomial serves.
const defaultRatio = 0.2

// at returns the place of a node, 0 to 1, from its number relative to that of the last one, s, and 1−s.
func (g Grading) at(s, rest float64) float64 {
	ratio := g.Ratio
	if ratio == 0 {
		ratio = defaultRatio
	}
	switch {
	case g.Low && g.High:
		return both(s, ratio)
	case g.High:
		return 1 - one(rest, ratio)
	case g.Low:
		return one(s, ratio)
	}
	return s
}

// one is graded towards s = 0: a s + (1−a) s², or for a below a fifth M. Vinokur's sinh βs / sinh β (J.
// Comput. Phys. 50, 1983, from memory).
func one(s, ratio float64) float64 {
	if ratio >= defaultRatio {
		return s * (ratio + (1-ratio)*s)
	}
	beta := stretching(ratio)
	return math.Sinh(beta*s) / math.Sinh(beta)
}

// both is graded towards 0 and 1: a s + (1−a) (3s² − 2s³), or for a below a fifth Vinokur's hyperbolic
// tangent.
func both(s, ratio float64) float64 {
	if ratio >= defaultRatio {
		return s * (ratio + (1-ratio)*s*(3-2*s))
	}
	beta := stretching(ratio)
	return (1 + math.Tanh(beta*(s-0.5))/math.Tanh(beta/2)) / 2
}

// stretching returns β with β / sinh β = ratio, for ratios down to 1e-12.
func stretching(ratio float64) float64 {
	beta, _ := root.Find(func(b float64) float64 { return math.Log(b/math.Sinh(b)) - math.Log(ratio) }, 0.1, 40, 1e-12)
	return beta
}

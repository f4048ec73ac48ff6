package fit

import (
	"errors"
	"math"

	"example.com/coolward/internal/root"
)

// Errors of [Exponential.Fit].
var (
	ErrStraight = errors.New("the readings bend the wrong way or not at all")
	ErrSudden   = errors.New("the readings change between the first two only")
)

// An Exponential is readings y at times t, rising from 0, with weights, to which y = a + (s − a) exp(−t/τ) is fitted. What is
// known of start s and ambient a is NaN where it is to be found.
type Exponential struct {
	T, Y, W        []float64
	Start, Ambient float64
}

// A Curve is one exponential; Squares is the weighted sum of the squares of what is left.
type Curve struct{ Tau, Start, Ambient, Squares float64 }

// At returns the curve at time t, which may be infinite.
func (c Curve) At(t float64) float64 {
	return c.Start - (c.Ambient-c.Start)*math.Expm1(-t/c.Tau)
}

// Slope returns the derivatives to ln τ, start and ambient at time t.
func (c Curve) Slope(t float64) (tau, start, ambient float64) {
	x := t / c.Tau
	e := math.Exp(-x)
	if e > 0 {
		tau = (c.Start - c.Ambient) * x * e
	}
	return tau, e, -math.Expm1(-x)
}

// Free returns how many constants are fitted.
func (p *Exponential) Free() int {
	n := 1
	if math.IsNaN(p.Start) {
		n++
	}
	if math.IsNaN(p.Ambient) {
		n++
	}
	return n
}

// stack is how many readings a curve is found for without a slice on the heap.
const stack = 128

// fallen appends 1 − exp(−t/τ) at the readings.
func (p *Exponential) fallen(tau float64, g []float64) []float64 {
	for _, t := range p.T {
		g = append(g, -math.Expm1(-t/tau))
	}
	return g
}

// Conditional returns the best curve for a given ln τ.
func (p *Exponential) Conditional(u float64) Curve {
	var space [stack]float64
	tau := math.Exp(u)
	g := p.fallen(tau, space[:0])
	return p.conditional(tau, g)
}

func (p *Exponential) conditional(tau float64, g []float64) Curve {
	s, a := p.Start, p.Ambient
	switch freeStart, freeAmbient := math.IsNaN(s), math.IsNaN(a); {
	case freeStart && freeAmbient:
		var sw, sg, sy float64
		for i, w := range p.W {
			sw += w
			sg += w * g[i]
			sy += w * p.Y[i]
		}
		sg, sy = sg/sw, sy/sw
		d := p.slope(g, sg, sy)
		s = sy - d*sg
		a = s + d
	case freeStart: // y − a falls with 1 − g
		s = a - p.slope(g, 1, a)
	case freeAmbient:
		a = s + p.slope(g, 0, s)
	}
	return p.measure(Curve{Tau: tau, Start: s, Ambient: a}, g)
}

// Through returns the best curve for a given ln τ that passes y at time t, which may be infinite. Not
// both start and ambient may be known.
func (p *Exponential) Through(u, t, y float64) Curve {
	var space [stack]float64
	tau := math.Exp(u)
	g := p.fallen(tau, space[:0])
	there := -math.Expm1(-t / tau)
	s, a := p.Start, p.Ambient
	switch {
	case !math.IsNaN(s): // a is free
		a = s + (y-s)/there
	case !math.IsNaN(a):
		s = a + (y-a)/math.Exp(-t/tau)
	default:
		d := p.slope(g, there, y)
		s = y - d*there
		a = s + d
	}
	return p.measure(Curve{Tau: tau, Start: s, Ambient: a}, g)
}

// slope returns the slope of the best straight line of y over g that passes a point.
func (p *Exponential) slope(g []float64, g0, y0 float64) float64 {
	var xy, xx float64
	for i, w := range p.W {
		x := g[i] - g0
		xy += w * x * (p.Y[i] - y0)
		xx += w * x * x
	}
	if xx == 0 {
		return 0
	}
	return xy / xx
}

// measure fills the sum of squares, infinite where the curve is not finite.
func (p *Exponential) measure(c Curve, g []float64) Curve {
	if !isFinite(c.Start) || !isFinite(c.Ambient) {
		c.Squares = math.Inf(1)
		return c
	}
	for i, w := range p.W {
		r := p.Y[i] - (c.Start + (c.Ambient-c.Start)*g[i])
		c.Squares += w * r * r
	}
	return c
}

// The scan over ln τ: from where all but the first reading are at the ambient to where an exponential cannot
// be told from a straight line.
const (
	scanFirst = 1.0 / 30 // of the time to the first reading after the start
	scanLast  = 1e4      // of the whole time
	perFold   = 2        // points for a factor e
)

// Fit returns the curve with the least sum of squares. It needs as many readings as there are free
// constants. [ErrStraight] and [ErrSudden] say that there is none within the range of time constants
// that readings can tell.
func (p *Exponential) Fit() (Curve, error) {
	first := 0
	for first < len(p.T) && p.T[first] <= 0 {
		first++
	}
	if first == len(p.T) {
		return Curve{}, ErrSudden
	}
	low, high := math.Log(p.T[first]*scanFirst), math.Log(p.T[len(p.T)-1]*scanLast)
	n := int(perFold*(high-low)) + 2
	step := (high - low) / float64(n)
	best, squares := 0, math.Inf(1)
	for i := range n + 1 {
		if c := p.Conditional(low + float64(i)*step); c.Squares < squares {
			best, squares = i, c.Squares
		}
	}
	switch best {
	case 0:
		return Curve{}, ErrSudden
	case n:
		return Curve{}, ErrStraight
	}
	from, to := low+float64(best-1)*step, low+float64(best+1)*step
	u, ok := root.Find(p.gradient, from, to, 0)
	if !ok {
		u = minimum(func(u float64) float64 { return p.Conditional(u).Squares }, from, low+float64(best)*step, to)
	}
	c := p.Conditional(u)
	if !(c.Squares <= squares) { // another turning point of the sum
		u = minimum(func(u float64) float64 { return p.Conditional(u).Squares }, from, low+float64(best)*step, to)
		c = p.Conditional(u)
	}
	if math.Log(c.Tau) > high-2 {
		return Curve{}, ErrStraight
	}
	return c, nil
}

// gradient returns half the derivative of the sum of squares to ln τ; the linear constants are at their best, so
// only the direct part counts.
func (p *Exponential) gradient(u float64) float64 {
	var space [stack]float64
	tau := math.Exp(u)
	g := p.fallen(tau, space[:0])
	c := p.conditional(tau, g)
	sum := 0.0
	for i, w := range p.W {
		if left := 1 - g[i]; left > 0 {
			sum -= w * (p.Y[i] - (c.Start + (c.Ambient-c.Start)*g[i])) * (c.Start - c.Ambient) * (p.T[i] / tau) * left
		}
	}
	return sum
}

func isFinite(x float64) bool { return math.Abs(x) <= math.MaxFloat64 }

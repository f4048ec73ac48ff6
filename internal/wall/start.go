package wall

import "math"

// begin adds a start to the coefficients.
func (s *Solution) begin(start func(y float64) float64) {
	m := s.Modes
	b := &m.Body
	points := b.sample(start, s.size)
	rest := make([]float64, len(points)) // what the modes so far leave out
	phi := make([]float64, len(points))
	for i := range points {
		q := &points[i]
		rest[i] = q.value - s.Steady.At(q.y)
		s.highest = math.Max(s.highest, math.Abs(q.value))
	}
	s.size = math.Max(s.size, s.highest)
	for n := range m.All {
		mode := &m.All[n]
		sum := 0.0
		for i := range points {
			phi[i] = m.At(mode, points[i].y)
			sum += points[i].weight * points[i].value * phi[i]
		}
		s.all.c[n] += sum / mode.Norm
		for i := range rest {
			rest[i] -= s.all.c[n] * phi[i]
		}
	}
	left := 0.0
	for i := range rest {
		left += points[i].weight * rest[i] * rest[i]
	}
	// the heat of the start, as in settle
	inside, beyond := 0.0, 0.0
	chiA, chiB := Steady{body: b}, Steady{body: b}
	if m.Ha > 0 && !b.Solid {
		chiA = m.Steady(Drive{Ua: 1})
	}
	if m.Hb > 0 {
		chiB = m.Steady(Drive{Ub: 1})
	}
	for i := range points {
		q := &points[i]
		inside += q.weight * q.value * chiA.At(q.y)
		beyond += q.weight * q.value * chiB.At(q.y)
	}
	s.all.beyond += beyond
	if w := b.Inside(); w > 0 {
		s.all.inside += inside / w
	}
	s.unresolved = math.Sqrt(left)
	s.spread = 2.2
	if b.Solid { // 1/N, which rises with ζ
		last := m.All[len(m.All)-1].Zeta
		s.spread = 2.2 * math.Pow(4*last, float64(b.Dimension))
	} else if b.Dimension > 0 {
		s.spread *= math.Pow(b.Rb/b.Ra, float64(b.Dimension))
	}
}

// A point is one of a quadrature, its weight with w.
type point struct{ y, weight, value float64 }

// Panels of a start are halved until the last terms of its expansion in the polynomials of Legendre are small, or
// no further.
const (
	widestPanel   = 1.0 / 32
	narrowestHalf = 36 // halvings of the widest
	mostPanels    = 600
	resolved      = 1e-11
)

// sample evaluates a start where quadratures need it.
func (b *Body) sample(start func(y float64) float64, size float64) []point {
	type panel struct {
		lo, hi float64
		depth  int
	}
	var todo []panel
	for lo := 0.0; lo < 1; {
		hi := lo + widestPanel
		if b.Dimension > 0 && !b.Solid {
			hi = math.Min(hi, b.Ra+2*lo)
		}
		if hi > 1-widestPanel/2 {
			hi = 1
		}
		todo = append(todo, panel{lo, hi, 0})
		lo = hi
	}
	var points []point
	count := len(todo)
	for len(todo) > 0 {
		p := todo[len(todo)-1]
		todo = todo[:len(todo)-1]
		var f [gaussPoints]float64
		for i, x := range gauss.x {
			f[i] = start(p.lo + (p.hi-p.lo)*x)
			size = math.Max(size, math.Abs(f[i]))
		}
		if p.depth < narrowestHalf && count < mostPanels && rough(&f) > resolved*size {
			mid := p.lo + (p.hi-p.lo)/2
			todo = append(todo, panel{p.lo, mid, p.depth + 1}, panel{mid, p.hi, p.depth + 1})
			count++
			continue
		}
		for i, x := range gauss.x {
			y := p.lo + (p.hi-p.lo)*x
			points = append(points, point{y, (p.hi - p.lo) * gauss.weight[i] * b.Weight(y), f[i]})
		}
	}
	return points
}

// rough returns the size of the last terms of the expansion.
func rough(f *[gaussPoints]float64) float64 {
	var last [3]float64
	for i, x := range gauss.x {
		z := 2*x - 1
		before, here := 1.0, z
		for k := 1; k < gaussPoints-1; k++ {
			n := float64(k)
			before, here = here, ((2*n+1)*z*here-n*before)/(n+1)
			if j := k + 1 - (gaussPoints - 3); j >= 0 {
				last[j] += gauss.weight[i] * f[i] * here * (2*n + 3)
			}
		}
	}
	return math.Max(math.Abs(last[0]), math.Max(math.Abs(last[1]), math.Abs(last[2])))
}

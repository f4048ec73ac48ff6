package fdm

import (
	"math"

	"example.com/coolward/internal/fv"
	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// Front returns the depths below the surface at which the body is at a temperature at time t, from the
// surface inwards: an isotherm, or the front of freezing or melting. None is no error. In a plate with like
// halves they are those of the half at the surface. Where a material melts within less than the difference
// between two cells, it is the place up to which the heat of melting has gone; where two layers in imperfect contact lie on both sides of the
// temperature, it is the place where they meet. It returns an [*units.ArgumentError] for a time outside the
// solution and a temperature that cannot be.
func (s *Solution) Front(T units.Temperature, t units.Duration) ([]units.Length, error) {
	if err := s.checkTime(t); err != nil {
		return nil, err
	}
	if err := units.CheckTemperature("front: temperature", T); err != nil {
		return nil, err
	}
	return s.front(T.SI(), t.SI()), nil
}

// A FrontPoint is where an isotherm is at one time.
type FrontPoint struct {
	Time   units.Duration
	Depths []units.Length // from the surface inwards
}

// FrontHistory returns [Solution.Front] at the end of each step, from the start on.
func (s *Solution) FrontHistory(T units.Temperature) ([]FrontPoint, error) {
	if err := s.check(); err != nil {
		return nil, err
	}
	if err := units.CheckTemperature("front: temperature", T); err != nil {
		return nil, err
	}
	var points []FrontPoint
	h := s.fine.history
	for k := range h.Steps() + 1 {
		t := min(h.Time(k), s.fine.end)
		points = append(points, FrontPoint{units.Second.Of(t), s.front(T.SI(), t)})
	}
	return points, nil
}

func (s *Solution) front(T, t float64) []units.Length {
	tr := s.fine
	h, y := tr.history, tr.system
	k, f := h.Find(t)
	g := y.Grid
	get := func(i int) float64 { return h.Value(k, f, i) }
	var fronts []units.Length
	add := func(x float64) {
		depth := units.Metre.Of(max(g.Length-x, 0))
		if n := len(fronts); n == 0 || fronts[n-1] != depth {
			fronts = append(fronts, depth)
		}
	}
	outside := math.NaN() // temperature of the layer before, where it ends
	for part := len(g.First) - 2; part >= 0; part-- {
		from, to := g.First[part], g.First[part+1]-1
		top := y.NodeTemperature(to, k, get(y.Index(to)))
		if (outside-T)*(top-T) < 0 {
			add(g.Nodes[to])
		}
		sharp := false
		if low, high := y.Transition(part, T); low < high {
			var at []float64
			if at, sharp = meltFronts(y, part, low, high, get); sharp {
				for _, x := range at {
					add(x)
				}
			}
		}
		if !sharp {
			s.isotherms(from, to, k, f, T, add)
		}
		outside = y.NodeTemperature(from, k, get(y.Index(from)))
	}
	return fronts
}

// isotherms adds where the temperature between the nodes of a layer is T after the fraction f of step k, from the
// surface inwards.
func (s *Solution) isotherms(from, to, k int, f, T float64, add func(float64)) {
	y := s.fine.system
	r := y.Grid.Nodes
	node := func(i int) float64 {
		g := s.nodeGauge(i)
		return s.temperature(&g, k, f) - T
	}
	last := node(to)
	if last == 0 {
		add(r[to])
	}
	for i := to - 1; i >= from; i-- {
		now := node(i)
		switch {
		case now == 0:
			if last != 0 {
				add(r[i])
			}
		case now*last < 0:
			left := now
			right := last
			x, ok := root.Find(func(x float64) float64 {
				switch x {
				case r[i]:
					return left
				case r[i+1]:
					return right
				}
				g, _ := s.gaugeBy(func(tr *track) (probe, error) { return tr.probeAt(x), nil })
				return s.temperature(&g, k, f) - T
			}, r[i], r[i+1], 1e-12*y.Grid.Length)
			if !ok {
				x = r[i] + (r[i+1]-r[i])*now/(now-last)
			}
			add(x)
		}
		last = now
	}
}

// meltFronts returns where the heat of a transition between two enthalpies per volume has gone to, from the
// surface inwards. It is false where the transition spreads over several cells, so that an isotherm is as good.
func meltFronts(y *fv.System, part int, low, high float64, get func(int) float64) (fronts []float64, sharp bool) {
	g := y.Grid
	from, to := g.First[part], g.First[part+1]-1
	molten := func(i int) float64 {
		return min(max((get(y.Index(i))/g.Volumes[i]-low)/(high-low), 0), 1)
	}
	before := math.NaN() // 0 or 1: the phase before the nodes in transition
	for i := to; i >= from; {
		if f := molten(i); f == 0 || f == 1 {
			if before == 1-f { // from node to node
				fronts = append(fronts, (g.Nodes[i]+g.Nodes[i+1])/2)
			}
			before = f
			i--
			continue
		}
		j, volume := i, 0.0
		for ; j >= from && molten(j) > 0 && molten(j) < 1; j-- {
			volume += g.Volumes[j] * molten(j)
		}
		if i-j > 2 {
			return nil, false
		}
		after := 1 - before
		if j >= from {
			after = molten(j)
		}
		if math.IsNaN(before) {
			before = 1 - after
		}
		if after == 1-before { // or the phase at both sides is the same, with no front that shows
			top, bottom := g.Nodes[to], g.Nodes[from]
			if i < to {
				top = (g.Nodes[i] + g.Nodes[i+1]) / 2
			}
			if j >= from {
				bottom = (g.Nodes[j] + g.Nodes[j+1]) / 2
			}
			below := g.Geometry.Between(bottom, top) - volume // of the solid
			if after == 1 {
				below = volume
			}
			x, ok := root.Find(func(x float64) float64 { return g.Geometry.Between(bottom, x) - below }, bottom, top, 0)
			if !ok {
				x = bottom
			}
			fronts = append(fronts, x)
		}
		i, before = j, after
		if j >= from {
			i = j - 1
		}
	}
	return fronts, true
}

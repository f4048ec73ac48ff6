package fdm

import "example.com/coolward/units/shape"

// A gauge reads one temperature from all runs of a solution.
type gauge struct {
	start                  float64 // temperature
	fine, coarse, coarsest probe
	twins                  bool    // each node of the coarse grid is one of the fine grid too
	own, twin              int     // the node of the coarse grid next to the place, and that of the fine grid
	share                  float64 // of the next node in what the place lies between
}

// gauge returns the gauge of a place.
func (s *Solution) gauge(place shape.Place) (g gauge, err error) {
	return s.gaugeBy(func(tr *track) (probe, error) { return tr.probe(place, s.problem.Body) })
}

// lumpGauge returns the gauge of the lump at a face.
func (s *Solution) lumpGauge(face shape.Place) (gauge, error) {
	return s.gaugeBy(func(tr *track) (probe, error) { return tr.lumpProbe(face) })
}

func (s *Solution) gaugeBy(of func(tr *track) (probe, error)) (g gauge, err error) {
	if g.fine, err = of(s.fine); err != nil {
		return g, err
	}
	if s.coarse != nil {
		if g.coarse, err = of(s.coarse); err != nil {
			return g, err
		}
	}
	if s.coarsest != nil {
		g.coarsest, err = of(s.coarsest)
	}
	s.pair(&g)
	g.start = s.fine.at(&g.fine, 0)
	return g, err
}

// pair finds the nodes of the fine grid that are those of the coarse probe.
func (s *Solution) pair(g *gauge) {
	if s.coarse == nil || g.fine.kind != ofPlace {
		return
	}
	fine, coarse := s.fine.system.Grid.First, s.coarse.system.Grid.First
	part := 0
	for g.coarse.first >= coarse[part+1] {
		part++
	}
	g.twins = fine[part+1]-fine[part]-1 == 2*(coarse[part+1]-coarse[part]-1)
	g.own = g.coarse.first
	if g.coarse.count > 1 {
		g.own += g.coarse.left
		r := s.coarse.system.Grid.Nodes
		g.share = (g.coarse.at - r[g.own]) / (r[g.own+1] - r[g.own])
	}
	g.twin = fine[part] + 2*(g.own-coarse[part])
}

// nodeGauge returns the gauge of a node of the fine grid.
func (s *Solution) nodeGauge(node int) gauge {
	g := gauge{fine: probe{first: node, count: 1}}
	if s.coarse != nil {
		g.coarse = s.coarse.probeOf(node, s.fine)
	}
	if s.coarsest != nil {
		g.coarsest = s.coarsest.probeOf(node, s.fine)
	}
	s.pair(&g)
	g.start = s.fine.at(&g.fine, 0)
	return g
}

// probeOf returns the probe at a node of another run.
func (tr *track) probeOf(node int, other *track) probe {
	g, own := other.system.Grid, tr.system.Grid
	part := 0
	for node >= g.First[part+1] {
		part++
	}
	switch node {
	case g.First[part]:
		return probe{first: own.First[part], count: 1}
	case g.First[part+1] - 1:
		return probe{first: own.First[part+1] - 1, count: 1}
	}
	return tr.probeAt(g.Nodes[node])
}

// temperature returns the temperature at a gauge in step k of the fine grid after the fraction f of it: what that grid
// gives, and a third of what it differs by from the grid with half the cells, by the order 2 of both (L. F.
// Richardson, Phil. Trans. A 210, 1911, from memory). Of a mean it is the enthalpy that is extrapolated, which is as
// conservative as that of each grid.
func (s *Solution) temperature(g *gauge, k int, f float64) float64 {
	if s.weight == 0 {
		return s.fine.temperature(&g.fine, k, f)
	}
	h := s.fine.history
	t := h.Time(k)
	if h.Steps() > 0 {
		t += f * (h.Time(k+1) - t)
	}
	j, e := k, f // to the last bit
	if c := s.coarse.history; k >= c.Steps() || c.Time(k) != h.Time(k) {
		j, e = c.Find(t)
	}
	if g.fine.kind != ofPlace {
		a, b := s.fine.content(&g.fine, k, f), s.coarse.content(&g.coarse, j, e)
		return s.fine.fromContent(&g.fine, k, a+s.weight*(a-b))
	}
	T := s.fine.temperature(&g.fine, k, f)
	if !g.twins {
		return s.bounds.hold(T+limited(s.weight*(T-s.coarse.temperature(&g.coarse, j, e)), T-g.start), T)
	}
	// The difference at places between is that of the nodes which both grids have.
	d := s.fine.node(g.twin, k, f) - s.coarse.node(g.own, j, e)
	if g.share > 0 {
		d += g.share * (s.fine.node(g.twin+2, k, f) - s.coarse.node(g.own+1, j, e) - d)
	}
	return s.bounds.hold(T+limited(s.weight*d, T-g.start), T)
}

// limited returns as much of a correction as does not take a temperature back beyond that of the start: where it has hardly
// changed both grids say little about it. Elsewhere that takes away what is of a higher order.
func limited(correction, change float64) float64 {
	c := abs(change)
	if correction == 0 {
		return 0
	}
	return correction * c / (c + abs(correction))
}

// node returns the temperature of a node in step k after the fraction f of it.
func (tr *track) node(i, k int, f float64) float64 {
	y := tr.system
	return y.NodeTemperature(i, k, tr.history.Value(k, f, y.Index(i)))
}

// at returns the temperature at a gauge at a time.
func (s *Solution) at(g *gauge, t float64) float64 {
	k, f := s.fine.history.Find(t)
	return s.temperature(g, k, f)
}

package fdm

import (
	"sort"

	"example.com/coolward/units/shape"
)

// A probe reads the temperature of one place from a track: from the states around it.
type probe struct {
	mean  bool
	first int        // first of the nodes around the place
	count int        // how many: 1 on a node
	w     [4]float64 // weights of their temperatures
	left  int        // within them, the node next to the place on the side of the centre
}

// probe returns the probe of a place.
func (tr *track) probe(place shape.Place, body shape.Body) (probe, error) {
	if place.IsMean() {
		return probe{mean: true, first: len(tr.system.Grid.Nodes), count: 1}, nil
	}
	x, err := place.Position(body)
	if err != nil {
		return probe{}, err
	}
	r := tr.system.Grid.Nodes
	last := len(r) - 1
	at := x * r[last]
	if x >= 1 {
		at = r[last]
	}
	i := sort.SearchFloat64s(r, at)
	if i > last || r[i] == at {
		return probe{first: min(i, last), count: 1}, nil
	}
	left := i - 1
	p := probe{first: min(max(left-1, 0), last-3), count: 4}
	p.left = left - p.first
	points := r[p.first : p.first+p.count]
	for j, a := range points {
		p.w[j] = 1
		for k, b := range points {
			if k != j {
				p.w[j] *= (at - b) / (a - b)
			}
		}
	}
	return p, nil
}

// temperature returns the temperature at the probe in step k after the fraction s of it. Between nodes it
// is the cubic through the nearest four, held between the two on either side so that it never overshoots.
func (tr *track) temperature(p probe, k int, s float64) float64 {
	if p.mean {
		return tr.system.MeanTemperature(tr.history.Value(k, s, p.first))
	}
	if p.count == 1 {
		return tr.system.NodeTemperature(p.first, tr.history.Value(k, s, p.first))
	}
	var T [4]float64
	sum := 0.0
	for j := range p.count {
		T[j] = tr.system.NodeTemperature(p.first+j, tr.history.Value(k, s, p.first+j))
	}
	// Relative to a neighbour, so that equal temperatures give that temperature to the last bit.
	base := T[p.left]
	for j := range p.count {
		sum += p.w[j] * (T[j] - base)
	}
	a, b := base, T[p.left+1]
	return min(max(base+sum, min(a, b)), max(a, b))
}

// at returns the temperature at the probe at a time.
func (tr *track) at(p probe, t float64) float64 {
	k, s := tr.history.Find(t)
	return tr.temperature(p, k, s)
}

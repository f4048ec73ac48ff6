package fdm

import (
	"sort"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A probe reads one temperature from a track: of a place from the states around it, of the mean from the
// enthalpy of the body, of a lump from its own.
type probe struct {
	kind    probeKind
	content fv.Sum     // the enthalpy of the body, or of the lump
	initial float64    // of the lump, K
	perHeat float64    // of the lump, K/J
	first   int        // first of the nodes around the place
	count   int        // how many: 1 on a node
	w       [4]float64 // weights of their temperatures
	left    int        // within them, the node next to the place on the side of the inner end
	at      float64    // the place, where it lies between nodes, m
}

type probeKind uint8

const (
	ofPlace probeKind = iota
	ofMean
	ofLump
)

// probe returns the probe of a place.
func (tr *track) probe(place shape.Place, body shape.Body) (probe, error) {
	if place.IsMean() {
		return probe{kind: ofMean, content: tr.system.Content()}, nil
	}
	depth, err := place.Depth(body)
	if err != nil {
		return probe{}, err
	}
	return tr.probeAt(tr.wall.distance(depth.SI())), nil
}

// probeAt returns the probe at a distance from the inner end; of two layers that meet there, in the one
// nearer to the surface.
func (tr *track) probeAt(at float64) probe {
	g := tr.system.Grid
	r := g.Nodes
	last := len(r) - 1
	same := 1e-12 * g.Length
	i := sort.SearchFloat64s(r, at-same)
	if i > last {
		return probe{first: last, count: 1}
	}
	if r[i] <= at+same {
		if i < last && r[i+1] == r[i] {
			i++
		}
		return probe{first: i, count: 1}
	}
	// Nodes of one layer only.
	part := sort.SearchInts(g.First, i+1) - 1
	low, high := g.First[part], g.First[part+1]-1
	p := probe{count: min(4, high-low+1), at: at}
	left := i - 1
	p.first = min(max(left-1, low), high+1-p.count)
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
	return p
}

// lumpProbe returns the probe of the lump at a face.
func (tr *track) lumpProbe(place shape.Place) (probe, error) {
	face, err := faceOf(place)
	if err != nil {
		return probe{}, err
	}
	index, initial, capacity, ok := tr.system.Lump(face)
	if !ok {
		return probe{}, &units.ArgumentError{Field: "face", Value: place.String(), Accepted: "one at which the problem has a lump"}
	}
	return probe{kind: ofLump, content: fv.Sum{Terms: []fv.Term{{Index: index, Weight: 1}}}, initial: initial, perHeat: 1 / capacity}, nil
}

// faceOf returns the name of a face in the equations.
func faceOf(place shape.Place) (string, error) {
	switch place {
	case shape.Surface():
		return fv.Surface, nil
	case shape.Opposite():
		return fv.Opposite, nil
	}
	return "", &units.ArgumentError{Field: "face", Value: place.String(), Accepted: "shape.Surface or shape.Opposite"}
}

// read returns the temperature at the probe from the components of a state in a step. Between nodes it is the cubic
// through the nearest four, held between the two on either side so that it never overshoots.
func (tr *track) read(p *probe, step int, get func(i int) float64) float64 {
	if p.kind != ofPlace {
		return tr.fromContent(p, step, of(&p.content, get))
	}
	y := tr.system
	if p.count == 1 {
		return y.NodeTemperature(p.first, step, get(y.Index(p.first)))
	}
	var T [4]float64
	sum := 0.0
	for j := range p.count {
		T[j] = y.NodeTemperature(p.first+j, step, get(y.Index(p.first+j)))
	}
	// Relative to a neighbour, so that equal temperatures give that temperature to the last bit.
	base := T[p.left]
	for j := range p.count {
		sum += p.w[j] * (T[j] - base)
	}
	a, b := base, T[p.left+1]
	return min(max(base+sum, min(a, b)), max(a, b))
}

// of returns a sum of the components of a state.
func of(sum *fv.Sum, get func(i int) float64) float64 {
	total := sum.Constant
	for _, t := range sum.Terms {
		total += t.Weight * get(t.Index)
	}
	return total
}

// content returns the enthalpy of a mean or a lump in step k after the fraction s of it.
func (tr *track) content(p *probe, k int, s float64) float64 {
	h := tr.history
	return of(&p.content, func(i int) float64 { return h.Value(k, s, i) })
}

// fromContent returns the temperature of a mean or a lump.
func (tr *track) fromContent(p *probe, step int, content float64) float64 {
	if p.kind == ofLump {
		return p.initial + content*p.perHeat
	}
	return tr.system.MeanTemperature(step, content)
}

// temperature returns the temperature at the probe in step k after the fraction s of it.
func (tr *track) temperature(p *probe, k int, s float64) float64 {
	h := tr.history
	if p.kind == ofPlace && p.count == 1 {
		return tr.node(p.first, k, s)
	}
	return tr.read(p, k, func(i int) float64 { return h.Value(k, s, i) })
}

// at returns the temperature at the probe at a time.
func (tr *track) at(p *probe, t float64) float64 {
	k, s := tr.history.Find(t)
	return tr.temperature(p, k, s)
}

// cubic returns a sum of components of the state in step k as a polynomial.
func (tr *track) cubic(sum fv.Sum, k int) (c [4]float64) {
	c[0] = sum.Constant
	for _, t := range sum.Terms {
		part := tr.history.Cubic(k, t.Index)
		for i := range c {
			c[i] += t.Weight * part[i]
		}
	}
	return c
}

// value returns a sum of components of the state at a time.
func (tr *track) value(sum fv.Sum, t float64) float64 {
	h := tr.history
	k, s := h.Find(t)
	return of(&sum, func(i int) float64 { return h.Value(k, s, i) })
}

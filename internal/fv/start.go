package fv

import "example.com/coolward/internal/root"

// Start returns the state at the start.
func (y *System) Start() []float64 { return append([]float64(nil), y.start...) }

// begin sets the state at the start: that of the profile, with the faces whose temperature is prescribed
// at that already. The heat which that takes has left.
func (y *System) begin(m Model) error {
	n := y.chain + len(y.ports)
	if y.source != nil {
		n++
	}
	y.start = make([]float64, n)
	if m.Profile != nil {
		for i, x := range y.Grid.Nodes {
			T, err := m.Profile(x)
			if err != nil {
				return err
			}
			if err := y.set(y.start, i, T); err != nil {
				return err
			}
		}
	}
	for _, e := range y.start[:y.chain] {
		y.total += e
	}
	for k := range y.ports {
		p := &y.ports[k]
		if p.Prescribed == nil {
			continue
		}
		y.start[y.chain+k] = y.start[p.at]
		if err := y.prescribe(p, 0, y.start); err != nil {
			return err
		}
	}
	return nil
}

// Hold sets the elements whose temperature is prescribed to what it is from a time on at which it may have stepped.
func (y *System) Hold(t float64, state []float64) error {
	for k := range y.ports {
		if p := &y.ports[k]; p.Prescribed != nil {
			if err := y.prescribe(p, t, state); err != nil {
				return err
			}
		}
	}
	return nil
}

// prescribe sets the element of a face to what its temperature is once the flow towards it is steady.
func (y *System) prescribe(p *port, time float64, state []float64) error {
	T, rate, err := p.Prescribed(time)
	if err != nil {
		return &FunctionError{What: p.what, Time: time, Temperature: T, Cause: err}
	}
	node, next := p.at-y.first, p.at-y.first+1
	if node > 0 {
		next = node - 1
	}
	if err := y.set(state, node, T); err != nil {
		return err
	}
	t, shift := y.nodeIn(node, Latest)
	v, u := y.Grid.Volumes[node], (state[p.at]-shift)/y.Grid.Volumes[node]
	_, dT := t.Slope(u)
	nextT := y.element(y.first+next, state[y.first+next])
	in := y.Grid.Conductance[min(node, next)] * (t.potential(t.Enthalpy(nextT)) - t.potential(u))
	if dT > 0 {
		in -= rate * v / dT
	}
	return y.set(state, node, T+in/(p.stiff*p.area))
}

// set sets the temperature of a node.
func (y *System) set(state []float64, node int, T float64) error {
	t, shift := y.nodeIn(node, Latest)
	if !(T >= t.Low-y.tolerance && T <= t.High+y.tolerance) {
		return &RangeError{node, T}
	}
	state[y.first+node] = y.Grid.Volumes[node]*t.Enthalpy(T) + shift
	return nil
}

// Enthalpy returns u at a temperature; of a whole range of u at one temperature, it returns a value within.
// Beyond the range it goes on along the tangents.
func (t *Table) Enthalpy(T float64) float64 {
	low, high := t.lowU, t.highU
	if T0, slope := t.Slope(low); T <= T0 {
		return low + (T-T0)/slope
	}
	if T1, slope := t.Slope(high); T >= T1 {
		return high + (T-T1)/slope
	}
	// Piece by piece, since the pieces differ in width by orders of magnitude.
	for i := range t.pieces {
		if p := &t.pieces[i]; i == len(t.pieces)-1 || T < t.Temperature(p.to) {
			low, high = p.from, p.to
			break
		}
	}
	if u, ok := root.Find(func(u float64) float64 { return t.Temperature(u) - T }, low, high, 0); ok {
		return u
	}
	return low // T is at an end, to rounding
}

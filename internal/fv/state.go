package fv

import (
	"math"

	"example.com/coolward/internal/root"
)

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

// Index returns the component of the state that is the enthalpy of node i.
func (y *System) Index(i int) int { return y.first + i }

// NodeTemperature returns the temperature of node i with the enthalpy e in a step, or in the [Latest].
func (y *System) NodeTemperature(i, step int, e float64) float64 {
	t, shift := y.nodeIn(i, step)
	return t.Temperature((e - shift) * y.perVolume[y.first+i])
}

// NodeSlope returns the derivative of the temperature of node i to its enthalpy e in a step.
func (y *System) NodeSlope(i, step int, e float64) float64 {
	v := y.perVolume[y.first+i]
	t, shift := y.nodeIn(i, step)
	_, slope := t.Slope((e - shift) * v)
	return slope * v
}

// nodeIn returns the table of a node in a step, and the shift of its enthalpy.
func (y *System) nodeIn(node, step int) (*Table, float64) {
	i := y.first + node
	for k := range y.parts {
		if p := &y.parts[k]; i < p.to {
			return y.in(p, i, step)
		}
	}
	return y.in(&y.parts[len(y.parts)-1], i, step)
}

// A Sum is a weighted sum of components of a state.
type Sum struct {
	Constant float64
	Terms    []Term
}

// A Term is a component of a state with its weight.
type Term struct {
	Index  int
	Weight float64
}

// In returns the sum for a state.
func (s Sum) In(state []float64) float64 {
	sum := s.Constant
	for _, t := range s.Terms {
		sum += t.Weight * state[t.Index]
	}
	return sum
}

// Released returns the heat that has left through a face, [Surface] or [Opposite]: by exchange and into the
// lump.
func (y *System) Released(face string) Sum {
	var s Sum
	for k := range y.ports {
		if y.ports[k].what == face {
			s.Terms = append(s.Terms, y.left(k)...)
		}
	}
	for _, l := range y.lumps {
		if l.face != face {
			continue
		}
		s.Terms = append(s.Terms, Term{l.at, 1})
		if l.port >= 0 {
			s.Terms = append(s.Terms, Term{y.chain + l.port, 1})
		}
	}
	return s
}

// left returns the heat that has left through a port.
func (y *System) left(k int) []Term {
	if p := &y.ports[k]; p.Prescribed != nil {
		return []Term{{y.chain + k, 1}, {p.at, -1}}
	}
	return []Term{{y.chain + k, 1}}
}

// Generated returns the heat that the source has given.
func (y *System) Generated() Sum {
	if y.heat < 0 {
		return Sum{}
	}
	return Sum{Terms: []Term{{y.heat, 1}}}
}

// Content returns the enthalpy of the body, from what was there at the start, has left and was given.
func (y *System) Content() Sum {
	s := Sum{Constant: y.total}
	for _, face := range []string{Surface, Opposite} {
		for _, t := range y.Released(face).Terms {
			s.Terms = append(s.Terms, Term{t.Index, -t.Weight})
		}
	}
	s.Terms = append(s.Terms, y.Generated().Terms...)
	return s
}

// Lump returns the component of the state that is the enthalpy of the lump at a face, its temperature at
// enthalpy 0 and its heat capacity. It is false if there is none.
func (y *System) Lump(face string) (index int, initial, capacity float64, ok bool) {
	for _, l := range y.lumps {
		if l.face == face {
			return l.at, l.initial, 1 / y.perVolume[l.at], true
		}
	}
	return 0, 0, 0, false
}

// MeanTemperature returns the temperature at which the whole body has the given enthalpy in a step.
func (y *System) MeanTemperature(step int, content float64) float64 {
	if len(y.parts) == 1 && y.changes == nil {
		return y.parts[0].table.Temperature(content / y.Grid.Volume)
	}
	low, high := math.Inf(-1), math.Inf(1)
	for k := range y.parts {
		low, high = max(low, y.parts[k].table.Low), min(high, y.parts[k].table.High)
	}
	T, ok := root.Find(func(T float64) float64 { return y.contentAt(step, T) - content }, low, high, 1e-12)
	if ok {
		return T
	}
	if content <= y.contentAt(step, low) {
		return low
	}
	return high
}

// contentAt returns the enthalpy of the body at one temperature in a step.
func (y *System) contentAt(step int, T float64) float64 {
	sum := 0.0
	for k := range y.parts {
		p := &y.parts[k]
		volume, changed := 0.0, 0.0
		for i := p.from; i < p.to; i++ {
			if t, shift := y.in(p, i, step); t != p.table {
				changed += 1 / y.perVolume[i]
				sum += shift
			} else {
				volume += 1 / y.perVolume[i]
			}
		}
		sum += volume * p.table.Enthalpy(T)
		if changed > 0 {
			sum += changed * p.after.Table.Enthalpy(T)
		}
	}
	return sum
}

// Balance returns what is missing in the sum of the enthalpies of a state, the heat that has left and that
// which was given, in joule.
func (y *System) Balance(state []float64) float64 {
	sum := -y.total
	for _, e := range state[:y.chain+len(y.ports)] {
		sum += e
	}
	for k := range y.ports {
		if p := &y.ports[k]; p.Prescribed != nil { // of which it holds the enthalpy too
			sum -= state[p.at]
		}
	}
	if y.heat >= 0 {
		sum -= state[y.heat]
	}
	return sum
}

// Exchanged returns the heat that went through ports and lumps and came from the source, each counted
// positive, in joule.
func (y *System) Exchanged(state []float64) float64 {
	sum := 0.0
	for k := range y.ports {
		e := state[y.chain+k]
		if p := &y.ports[k]; p.Prescribed != nil {
			e -= state[p.at]
		}
		sum += math.Abs(e)
	}
	for _, l := range y.lumps {
		sum += math.Abs(state[l.at])
	}
	if y.heat >= 0 {
		sum += math.Abs(state[y.heat])
	}
	return sum
}

// Flux returns the heat flux that leaves through a face at a time in a step, or false where it follows from a
// prescribed temperature. The state is that of the chain.
func (y *System) Flux(face string, step int, t float64, state func(i int) float64) (q float64, ok bool, err error) {
	ok = true
	at, coupled, area := y.first, y.first-1, y.Grid.Inner
	if face == Surface {
		at = y.first + len(y.Grid.Nodes) - 1
		coupled, area = at, y.Grid.Area
	}
	for k := range y.ports {
		p := &y.ports[k]
		if p.what != face {
			continue
		}
		if p.Prescribed != nil {
			return 0, false, nil
		}
		more, err := p.flux(t, y.elementIn(at, step, state(at)))
		if err != nil {
			return 0, false, err
		}
		q += more
	}
	for k := range y.links {
		l := &y.links[k]
		if l.node >= 0 || l.at != coupled {
			continue
		}
		flow, err := l.flow(t, y.elementIn(l.at, step, state(l.at)), y.elementIn(l.at+1, step, state(l.at+1)))
		if err != nil {
			return 0, false, err
		}
		if face == Opposite {
			flow = -flow
		}
		q += flow / area
	}
	return q, ok, nil
}

// Transition returns the enthalpies per volume between which a part takes up the heat of a transition at or
// around a temperature. They are equal where there is none, or where parts of the part have changed.
func (y *System) Transition(part int, T float64) (low, high float64) {
	if y.changes != nil && y.changes.any {
		return 0, 0
	}
	t := y.parts[part].table
	for i := range t.pieces {
		p := &t.pieces[i]
		if T >= t.cubics[p.first].t0*(1-flat) && T <= t.cubics[p.last].end()*(1+flat) && t.transition(i) {
			return p.from, p.to
		}
	}
	return 0, 0
}

// Melts reports whether a part has a transition that takes up heat, and none changes for good.
func (y *System) Melts() bool {
	for k := range y.parts {
		if y.changes == nil && y.parts[k].table.Melts() {
			return true
		}
	}
	return false
}

// Melts reports whether the table has a transition that takes up heat.
func (t *Table) Melts() bool {
	for i := range t.pieces {
		if t.transition(i) {
			return true
		}
	}
	return false
}

// transition reports whether a piece is the heat of a transition: its heat capacity is many times that on both
// sides.
func (t *Table) transition(i int) bool {
	if i == 0 || i == len(t.pieces)-1 {
		return false
	}
	capacity := func(i int) float64 {
		p := &t.pieces[i]
		return (p.to - p.from) / max(t.cubics[p.last].end()-t.cubics[p.first].t0, 1e-12)
	}
	return capacity(i) > manyTimes*capacity(i-1) && capacity(i) > manyTimes*capacity(i+1)
}

// manyTimes is how much larger the heat capacity is in a transition, at least.
const manyTimes = 5

// end returns the temperature at the end of an interval.
func (c *cubic) end() float64 { return c.t0 + c.t1 + c.t2 + c.t3 }

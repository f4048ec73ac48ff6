package fv

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/floats"

	"example.com/coolward/internal/tridiagonal"
)

// A Model is what a [System] is made of.
type Model struct {
	Grid      *Grid
	Tables    []*Table  // one for each part of the grid, all counted from one temperature
	Changes   []Change  // of each part; nil: none
	Contacts  []Contact // between each part and the next; nil: all perfect
	Surface   Face
	Opposite  Face                                   // at the inner end
	Source    func(x, t, T float64) (float64, error) // heat per volume at a distance from the inner end; nil: none
	Profile   func(x float64) (float64, error)       // temperature at the start; nil: that from which the tables count
	Tolerance float64                                // K
	Duration  float64                                // of the solution, s
	Scratch   *Scratch                               // storage for what is linearised; nil: of its own
}

// A RangeError reports that a node left the range of its table.
type RangeError struct {
	Node        int
	Temperature float64
}

func (e *RangeError) Error() string {
	return fmt.Sprintf("node %d at %g K left the range of the material", e.Node, e.Temperature)
}

// A System is the set of equations of a body; it is what package rosenbrock integrates. Its state is a chain
// of enthalpies, of the lump at the inner end if there is one, of all nodes, and of the lump at the surface;
// behind them stand the heat that has left through each port, and that which the source has given. For a port
// with a prescribed temperature it is the enthalpy of its element and the heat that has left together, whose rate
// knows nothing of the large coefficient that holds the temperature, so that no heat is lost by rounding.
type System struct {
	Grid *Grid

	parts     []part
	changes   *changes // nil if no part may change
	links     []link
	fixed     int // number of links that are there from the start on
	ports     []port
	source    func(x, t, T float64) (float64, error)
	first     int // index of node 0 in the chain
	chain     int // length of the chain
	heat      int // index of the heat of the source, or -1
	lumps     []lump
	tolerance float64 // K
	conduct   []float64
	perVolume []float64
	volumes   []float64 // of each part
	weights   []float64 // of the elements in the norm of an error
	phi       []float64
	start     []float64
	total     float64 // of the invariant
	// at the state that was linearised
	dphi, dT      []float64 // to the enthalpy of each element
	extra         []float64 // of ports and source, on the diagonal
	given         []float64 // of the source: what it gives, to the enthalpy of each element
	lower, sums   []float64
	upper         []float64
	diagonalShift float64
	solver        *tridiagonal.Solver
	storage       *Scratch // of all these
	straight      bool     // all properties are constant, and so are the derivatives
}

// A part is a stretch of the chain with one table.
type part struct {
	table    *Table
	from, to int // in the chain
	after    Change
}

// A lump is an element of the chain that is no node.
type lump struct {
	at      int
	initial float64
	port    int // of its exchange, or -1
	face    string
}

// NewSystem returns the equations of a body. An error is that of a function which is asked for the start.
func NewSystem(m Model) (*System, error) {
	g := m.Grid
	n := len(g.Nodes)
	y := &System{Grid: g, source: m.Source, tolerance: m.Tolerance, chain: n, heat: -1}
	if m.Opposite.Lump != nil {
		y.first = 1
		y.chain++
	}
	if m.Surface.Lump != nil {
		y.chain++
	}
	own := make([]float64, 3*y.chain)
	y.perVolume, own = own[:y.chain:y.chain], own[y.chain:]
	y.weights, own = own[:y.chain:y.chain], own[y.chain:]
	y.conduct = own[:y.chain-1]
	y.scratch(m.Scratch)
	copy(y.conduct[y.first:], g.Conductance)
	for i, v := range g.Volumes {
		y.perVolume[y.first+i], y.weights[y.first+i] = 1/v, v/g.Volume
	}
	y.straight = true
	for j, t := range m.Tables {
		y.straight = y.straight && t.straight && (m.Changes == nil || m.Changes[j].Table == nil)
		p := part{table: t, from: y.first + g.First[j], to: y.first + g.First[j+1]}
		y.volumes = append(y.volumes, floats.Sum(g.Volumes[g.First[j]:g.First[j+1]]))
		if m.Changes != nil && m.Changes[j].Table != nil {
			p.after = m.Changes[j]
			if y.changes == nil {
				y.changes = newChanges(y.chain)
			}
		}
		y.parts = append(y.parts, p)
	}
	y.join(m)
	y.face(m.Opposite, Opposite, OppositeLump, y.first, y.first-1, g.Inner)
	y.face(m.Surface, Surface, SurfaceLump, y.first+n-1, y.first+n, g.Area)
	if y.source != nil {
		y.heat = y.chain + len(y.ports)
	}
	y.fixed = len(y.links)
	if err := y.begin(m); err != nil {
		return y, err
	}
	y.Switch(0, y.start)
	return y, nil
}

// A Scratch is storage for the systems of one run after the other, not for two at once.
type Scratch struct {
	block []float64
	owner *System // whose derivatives it holds
}

// scratch cuts what is linearised from storage.
func (y *System) scratch(s *Scratch) {
	n := y.chain
	if s == nil {
		s = &Scratch{}
	}
	const vectors = 8
	if len(s.block) < (vectors+3)*n {
		s.block = make([]float64, (vectors+3)*n)
	}
	y.storage = s
	block := s.block[:(vectors+3)*n]
	for _, p := range [vectors]*[]float64{&y.phi, &y.dphi, &y.dT, &y.lower, &y.sums, &y.upper, &y.extra, &y.given} {
		*p, block = block[:n:n], block[n:]
	}
	y.solver = tridiagonal.Over(block)
}

// join makes the contacts between the parts.
func (y *System) join(m Model) {
	g := y.Grid
	for j := 1; j < len(m.Tables); j++ {
		i := g.First[j]
		l := link{at: y.first + i - 1, node: i - 1, area: g.Geometry.Area(g.Nodes[i])}
		l.least = perfect * min(y.resistance(i-2), y.resistance(i))
		if m.Contacts != nil {
			l.constant, l.function = m.Contacts[j-1].Resistance, m.Contacts[j-1].Function
		}
		y.links = append(y.links, l)
	}
}

// resistance returns that of the cell between a node and the next at the start, in m² K/W.
func (y *System) resistance(node int) float64 {
	return (y.Grid.Nodes[node+1] - y.Grid.Nodes[node]) / y.table(node).conductivity()
}

// conductivity returns that at the temperature from which the table counts, or, where that stays while the
// enthalpy rises, that of the coldest material.
func (t *Table) conductivity() float64 {
	if k := t.conductivityAt(0); k > 0 {
		return k
	}
	return t.conductivityAt(t.lowU)
}

// conductivityAt returns the conductivity at u; it is not a number where the temperature stays.
func (t *Table) conductivityAt(u float64) float64 {
	c, s, _ := t.at(u)
	return (c.p1 + s*(2*c.p2+s*3*c.p3)) / (c.t1 + s*(2*c.t2+s*3*c.t3))
}

// table returns the table of a node.
func (y *System) table(node int) *Table {
	for k := range y.parts {
		if y.first+node < y.parts[k].to {
			return y.parts[k].table
		}
	}
	return y.parts[len(y.parts)-1].table
}

// face makes the ports at the element of a face and at its lump.
func (y *System) face(f Face, what, ofLump string, at, lumpAt int, area float64) {
	if !f.Exchange.none() {
		p := port{Exchange: f.Exchange, what: what, at: at, area: area}
		if p.Prescribed != nil {
			node := at - y.first
			p.stiff = 1 / (perfect * y.resistance(max(node-1, 0)))
		}
		y.ports = append(y.ports, p)
	}
	if f.Lump == nil {
		return
	}
	y.links = append(y.links, link{at: min(at, lumpAt), node: -1, area: area, constant: 1 / f.Lump.Coefficient})
	y.perVolume[lumpAt], y.weights[lumpAt] = 1/f.Lump.Capacity, 1
	l := lump{at: lumpAt, initial: f.Lump.Initial, port: -1, face: what}
	if !f.Lump.Exchange.none() {
		l.port = len(y.ports)
		y.ports = append(y.ports, port{Exchange: f.Lump.Exchange, what: ofLump, at: lumpAt, area: f.Lump.Area})
	}
	y.lumps = append(y.lumps, l)
}

// Rate implements rosenbrock.System.
func (y *System) Rate(t float64, state, f []float64) error {
	if y.straight && y.storage.owner == y {
		y.conductionOf(state, f)
	} else {
		for k := range y.parts {
			y.look(&y.parts[k], state, false)
		}
		y.conduction(f)
	}
	for k := range y.links {
		l := &y.links[k]
		flow, err := l.flow(t, y.element(l.at, state[l.at]), y.element(l.at+1, state[l.at+1]))
		if err != nil {
			return err
		}
		f[l.at] -= flow
		f[l.at+1] += flow
	}
	if y.source != nil {
		if err := y.generation(t, state, f); err != nil {
			return err
		}
	}
	for k := range y.ports {
		p := &y.ports[k]
		q, err := p.flux(t, y.element(p.at, state[p.at]))
		if err != nil {
			return err
		}
		f[y.chain+k] = q * p.area
		if p.Prescribed != nil {
			f[y.chain+k] = f[p.at]
		}
		f[p.at] -= q * p.area
	}
	return nil
}

// conduction sets the rates of the chain from the potentials.
func (y *System) conduction(f []float64) {
	g := y.conduct
	phi := y.phi[1 : len(g)+1]
	f0 := f[:len(g)]
	last, in := y.phi[0], 0.0
	for i := range g {
		through := g[i] * (last - phi[i])
		f0[i] = in - through
		in, last = through, phi[i]
	}
	f[len(g)] = in
}

// generation adds what the source gives.
func (y *System) generation(t float64, state, f []float64) error {
	sum := 0.0
	for i, v := range y.Grid.Volumes {
		k := y.first + i
		s, err := y.given1(i, t, y.element(k, state[k]))
		if err != nil {
			return err
		}
		f[k] += v * s
		sum += v * s
	}
	f[y.heat] = sum
	return nil
}

// given1 asks the source at one node.
func (y *System) given1(node int, t, T float64) (float64, error) {
	s, err := y.source(y.Grid.Nodes[node], t, T)
	if err == nil && (math.IsNaN(s) || math.IsInf(s, 0)) {
		err = fmt.Errorf("heat per volume is %g", s)
	}
	if err != nil {
		return 0, &FunctionError{What: Source, Node: node, Time: t, Temperature: T, Cause: err}
	}
	return s, nil
}

// element returns the temperature of an element of the chain with the enthalpy e, now.
func (y *System) element(i int, e float64) float64 { return y.elementIn(i, Latest, e) }

// elementIn returns the temperature of an element of the chain with the enthalpy e in a step.
func (y *System) elementIn(i, step int, e float64) float64 {
	for k := range y.parts {
		if p := &y.parts[k]; i >= p.from && i < p.to {
			t, shift := y.in(p, i, step)
			return t.Temperature((e - shift) * y.perVolume[i])
		}
	}
	for k := range y.lumps {
		if y.lumps[k].at == i {
			return y.lumps[k].initial + e*y.perVolume[i]
		}
	}
	return math.NaN()
}

// Check implements rosenbrock.System. A node may lie beyond the range by the tolerance of one step,
// since a temperature that tends to an end of the range overshoots by that.
func (y *System) Check(state []float64) error {
	for k := range y.parts {
		p := &y.parts[k]
		low, high := p.table.lowU, p.table.highU
		perVolume := y.perVolume[p.from:p.to]
		e := state[p.from:p.to]
		for i, v := range perVolume {
			u := e[i] * v
			if u >= low && u <= high && p.after.Table == nil {
				continue
			}
			t, shift := y.in(p, p.from+i, Latest)
			T := t.Temperature(u - shift*v)
			if !(T >= t.Low-y.tolerance && T <= t.High+y.tolerance) {
				return &RangeError{p.from + i - y.first, T}
			}
		}
	}
	return nil
}

// LocalError is how many times larger than the norm of an error it may be at one place.
const LocalError = 3

// Norm implements rosenbrock.System: the root mean square of the error in temperature over the volume, to which an error in
// a thin layer comes down as conduction evens it out, but at least a third of the largest error.
func (y *System) Norm(e []float64) float64 {
	worst, sum := 0.0, 0.0
	dT := y.dT
	e, weights := e[:len(dT)], y.weights[:len(dT)]
	for i := range dT {
		x := e[i] * dT[i]
		x *= x
		sum += x * weights[i]
		if x > worst {
			worst = x
		}
	}
	if math.IsNaN(sum) { // of which a comparison knows nothing
		return sum
	}
	return math.Sqrt(max(sum, worst/(LocalError*LocalError))) / y.tolerance
}

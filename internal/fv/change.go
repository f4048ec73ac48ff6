package fv

import "math"

// A Change is what becomes of a part for good, node by node, once it has been as hot as a temperature.
type Change struct {
	Table *Table // from then on; nil: nothing changes
	At    float64
}

// changes are the nodes that have changed.
type changes struct {
	from  []int     // of each element, the first step in which it is changed
	shift []float64 // J; what the enthalpy is above that of the table of the change
	own   []float64 // enthalpies without that, while they are looked up
	any   bool
}

// Latest stands for the step that comes next.
const Latest = math.MaxInt - 1

const unchanged = math.MaxInt

func newChanges(n int) *changes {
	c := &changes{from: make([]int, n), shift: make([]float64, n), own: make([]float64, n)}
	for i := range c.from {
		c.from[i] = unchanged
	}
	return c
}

// in returns the table of an element of a part in a step, and the shift of its enthalpy.
func (y *System) in(p *part, i, step int) (*Table, float64) {
	if p.after.Table == nil || !y.changes.any || y.changes.from[i] > step {
		return p.table, 0
	}
	return p.after.Table, y.changes.shift[i]
}

// run returns the end of the stretch of elements from i on that are all changed or all not.
func (y *System) run(p *part, i int) (to int, changed bool) {
	c := y.changes
	changed = c.from[i] != unchanged
	for to = i + 1; to < p.to && (c.from[to] != unchanged) == changed; to++ {
	}
	return to, changed
}

// look sets the potentials of a part, and with all their derivatives too.
func (y *System) look(p *part, state []float64, all bool) {
	if p.after.Table == nil || !y.changes.any {
		y.lookUp(p.table, state, p.from, p.to, all)
		return
	}
	for i := p.from; i < p.to; {
		to, changed := y.run(p, i)
		if !changed {
			y.lookUp(p.table, state, i, to, all)
			i = to
			continue
		}
		own := y.changes.own
		for k := i; k < to; k++ {
			own[k] = state[k] - y.changes.shift[k]
		}
		y.lookUp(p.after.Table, own, i, to, all)
		i = to
	}
}

func (y *System) lookUp(t *Table, state []float64, from, to int, all bool) {
	if all {
		t.slopes(state[from:to], y.perVolume[from:to], y.phi[from:to], y.dphi[from:to], y.dT[from:to])
		return
	}
	t.potentials(state[from:to], y.perVolume[from:to], y.phi[from:to])
}

// Switch changes the nodes that have come to the temperature of their change at the end of a step, so that
// their temperature and their enthalpy stay, and reports whether there were any. Steps counts those until then.
func (y *System) Switch(steps int, state []float64) bool {
	if y.changes == nil {
		return false
	}
	c, found := y.changes, false
	for k := range y.parts {
		p := &y.parts[k]
		if p.after.Table == nil {
			continue
		}
		for i := p.from; i < p.to; i++ {
			if c.from[i] != unchanged {
				continue
			}
			if T := p.table.Temperature(state[i] * y.perVolume[i]); T >= p.after.At {
				c.from[i] = steps
				c.shift[i] = state[i] - p.after.Table.Enthalpy(T)/y.perVolume[i]
				found = true
			}
		}
	}
	if found {
		c.any = true
		y.relink()
	}
	return found
}

// relink makes the links between neighbours of which one has changed, whose potentials do not compare.
func (y *System) relink() {
	y.links = y.links[:y.fixed]
	for k := range y.parts {
		p := &y.parts[k]
		if p.after.Table == nil {
			continue
		}
		for i := p.from; i < p.to-1; i++ {
			node := i - y.first
			y.conduct[i] = y.Grid.Conductance[node]
			if (y.changes.from[i] == unchanged) == (y.changes.from[i+1] == unchanged) {
				continue
			}
			y.conduct[i] = 0
			one, _ := y.in(p, i, Latest)
			other, _ := y.in(p, i+1, Latest)
			y.links = append(y.links, link{
				at: i, node: node, area: y.Grid.Conductance[node],
				function: func(a, b float64) (float64, error) { // half the way in each, per area over distance
					return (1/one.conductivityAt(one.Enthalpy(a)) + 1/other.conductivityAt(other.Enthalpy(b))) / 2, nil
				},
			})
		}
	}
}

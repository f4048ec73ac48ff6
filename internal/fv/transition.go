package fv

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

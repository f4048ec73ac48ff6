package fv

import "math"

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

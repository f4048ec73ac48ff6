package fv

import (
	"fmt"
	"math"
)

// A link is a resistance between two elements of the chain that is not conduction in one material: the
// contact of two parts, or a face and its lump.
type link struct {
	at       int // the element on the side of the inner end; the other is the next
	node     int // its node, or -1 for a lump
	area     float64
	least    float64 // m² K/W, that of perfect contact
	constant float64
	function func(inner, outer float64) (float64, error)
}

// perfect is the resistance of perfect contact relative to that of the cells on either side. It is far
// below what anybody sees, and far above rounding.
const perfect = 1e-7

// flow returns the heat flow from a at the inner side to b.
func (l *link) flow(t, a, b float64) (float64, error) {
	r := l.constant
	if l.function != nil {
		var err error
		if r, err = l.function(a, b); err != nil {
			return 0, &FunctionError{What: Between, Node: l.node, Time: t, Temperature: a, Cause: err}
		}
		if !(r >= 0 && r <= math.MaxFloat64) {
			return 0, &FunctionError{What: Between, Node: l.node, Time: t, Temperature: a, Cause: fmt.Errorf("resistance is %g m² K/W", r)}
		}
	}
	return l.area * (a - b) / max(r, l.least), nil
}

// linearise returns the flow and its derivatives to both temperatures.
func (l *link) linearise(t, a, b float64) (flow, toA, toB float64, err error) {
	if flow, err = l.flow(t, a, b); err != nil {
		return 0, 0, 0, err
	}
	toA = l.area / max(l.constant, l.least)
	toB = -toA
	if l.function == nil {
		return flow, toA, toB, nil
	}
	up, err := l.flow(t, a+wallStep, b)
	if err != nil {
		return 0, 0, 0, err
	}
	side, err := l.flow(t, a, b+wallStep)
	if err != nil {
		return 0, 0, 0, err
	}
	return flow, (up - flow) / wallStep, (side - flow) / wallStep, nil
}

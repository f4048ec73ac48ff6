package fv

import (
	"math"

	"example.com/coolward/internal/root"
)

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

// MeanTemperature returns the temperature at which the whole body has the given enthalpy in a step.
func (y *System) MeanTemperature(step int, content float64) float64 {
	if len(y.parts) == 1 && y.changes == nil {
		return y.parts[0].table.Temperature(content / y.Grid.Volume)
	}
	if T, ok := y.meanOfStraight(content); ok {
		return T
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

// meanOfStraight returns the temperature at which the body has the given enthalpy, if all its properties are constant.
func (y *System) meanOfStraight(content float64) (T float64, ok bool) {
	if y.changes != nil {
		return 0, false
	}
	sum := 0.0
	for k := range y.parts {
		if p := &y.parts[k]; p.table.straight {
			sum += y.volumes[k] / p.table.slope
		} else {
			return 0, false
		}
	}
	return y.parts[0].table.start + content/sum, true
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

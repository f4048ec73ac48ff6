package unitstest

import (
	"math"

	"github.com/google/go-cmp/cmp"

	"example.com/coolward/units"
)

// Absolute returns an option for go-cmp that takes quantities of the kind of the tolerance as equal
// if they differ by no more than that. NaN equals nothing.
func Absolute[D units.Dimension](tolerance units.Quantity[D]) cmp.Option {
	return cmp.Comparer(func(a, b units.Quantity[D]) bool {
		return a == b || math.Abs(a.SI()-b.SI()) <= tolerance.SI()
	})
}

// Relative returns an option for go-cmp that takes quantities of the kind of the unit as equal if they
// differ by no more than the given part of the larger one.
func Relative[D units.Dimension](_ units.Unit[D], part float64) cmp.Option {
	return cmp.Comparer(func(a, b units.Quantity[D]) bool {
		return a == b || math.Abs(a.SI()-b.SI()) <= part*max(math.Abs(a.SI()), math.Abs(b.SI()))
	})
}

// ULP returns an option for go-cmp that takes quantities of the kind of the unit as equal if no more
// than n float64 numbers lie from one to the other, counted in the coherent SI unit.
func ULP[D units.Dimension](_ units.Unit[D], n uint64) cmp.Option {
	return cmp.Comparer(func(a, b units.Quantity[D]) bool { return apart(a.SI(), b.SI()) <= n })
}

// Temperatures returns an option for go-cmp that takes temperatures as equal if they differ by no
// more than the tolerance.
func Temperatures(tolerance units.TemperatureDifference) cmp.Option {
	return cmp.Comparer(func(a, b units.Temperature) bool {
		return a == b || math.Abs(a.Sub(b).SI()) <= tolerance.SI()
	})
}

// apart counts the steps from a to b over the float64 numbers; NaN is infinitely far from everything.
func apart(a, b float64) uint64 {
	if math.IsNaN(a) || math.IsNaN(b) {
		return math.MaxUint64
	}
	x, y := place(a), place(b)
	if x < y {
		x, y = y, x
	}
	return uint64(x) - uint64(y)
}

// place numbers the float64 numbers in their order.
func place(x float64) int64 {
	bits := int64(math.Float64bits(x))
	if bits < 0 {
		return math.MinInt64 - bits
	}
	return bits
}

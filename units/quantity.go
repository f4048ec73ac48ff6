package units

import (
	"cmp"
	"math"
)

// A Quantity is a number with a dimension, kept in the coherent SI unit. Use it by the names of its
// kinds: [Length], [Duration], [Conductivity] and so on.
//
// The zero value is zero of its kind. Quantities compare with == and are ordered by [Quantity.Compare].
// Arithmetic follows IEEE 754: an overflow gives an infinity, and zero divided by zero gives NaN.
type Quantity[D Dimension] struct {
	_  [0]D // keeps Length(aDuration) from compiling
	si float64
}

// A Unit is the size of one unit of D in the coherent SI unit. Units are constants, so no importer
// can change one; a further unit is a constant of the caller, as in
//
//	const Furlong = 660 * units.Foot
type Unit[D Dimension] float64

// Of returns v of the unit.
func (u Unit[D]) Of(v float64) Quantity[D] { return Quantity[D]{si: v * float64(u)} }

// SI returns the number in the coherent SI unit of the kind.
func (q Quantity[D]) SI() float64 { return q.si }

// In returns the number in unit u. u.Of(q.In(u)) is q to within rounding.
func (q Quantity[D]) In(u Unit[D]) float64 { return q.si / float64(u) }

// Add returns q + r.
func (q Quantity[D]) Add(r Quantity[D]) Quantity[D] { return Quantity[D]{si: q.si + r.si} }

// Sub returns q − r.
func (q Quantity[D]) Sub(r Quantity[D]) Quantity[D] { return Quantity[D]{si: q.si - r.si} }

// Neg returns −q.
func (q Quantity[D]) Neg() Quantity[D] { return Quantity[D]{si: -q.si} }

// Abs returns the magnitude of q.
func (q Quantity[D]) Abs() Quantity[D] { return Quantity[D]{si: math.Abs(q.si)} }

// Scale returns f q.
func (q Quantity[D]) Scale(f float64) Quantity[D] { return Quantity[D]{si: f * q.si} }

// Ratio returns q / r, a number without dimension.
func (q Quantity[D]) Ratio(r Quantity[D]) float64 { return q.si / r.si }

// Compare returns -1, 0 or +1 as q is below, equal to or above r. A NaN is below every number.
func (q Quantity[D]) Compare(r Quantity[D]) int { return cmp.Compare(q.si, r.si) }

// Equal reports whether q and r are the same number. It is ==, in the form that go-cmp looks for.
func (q Quantity[D]) Equal(r Quantity[D]) bool { return q.si == r.si }

// IsFinite reports whether q is neither infinite nor NaN.
func (q Quantity[D]) IsFinite() bool { return isFinite(q.si) }

func isFinite(x float64) bool { return math.Abs(x) <= math.MaxFloat64 }

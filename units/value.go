package units

import "math"

// A Value is a number whose kind is known only while the program runs: read from a file, printed
// in a table, carried in an error. It knows its dimension in rational powers of the SI base units,
// whether it is a point on a temperature scale or a difference, and the unit to print it in.
//
// The zero value is the number 0. [From] turns a Value into a quantity, with a check.
type Value struct {
	si    float64
	dim   dimension
	point bool
	unit  string // symbol to print with; empty for the SI base units
	size  float64
	zero  float64 // SI number where the printed scale has its 0
}

// Number returns the number x, of dimension 1.
func Number(x float64) Value { return Value{si: x} }

// Dynamic returns q as a [Value] that prints in the unit chosen by magnitude.
func (q Quantity[D]) Dynamic() Value {
	k := kindOf[D]()
	row := k.autoUnit(q.si)
	return Value{si: q.si, dim: k.dim, unit: row.symbol, size: row.factor}
}

// Dynamic returns t as a [Value] that prints in degrees Celsius.
func (t Temperature) Dynamic() Value { return t.dynamicOn(Celsius) }

func (t Temperature) dynamicOn(s Scale) Value {
	size := 1.0
	if s == Fahrenheit || s == Rankine {
		size = 5.0 / 9
	}
	return Value{si: t.kelvin, dim: kelvinDimension, point: true, unit: s.String(), size: size, zero: s.Of(0).kelvin}
}

var kelvinDimension = dimension{baseK: {1, 1}}

// SI returns the number in coherent SI base units: kelvin for a temperature point.
func (v Value) SI() float64 { return v.si }

// Number returns the number in the unit in which v prints.
func (v Value) Number() float64 {
	if v.size == 0 {
		return v.si
	}
	return (v.si - v.zero) / v.size
}

// Unit returns the symbol of the unit in which v prints. It is empty for a number of dimension 1.
func (v Value) Unit() string {
	if v.size == 0 && !v.dim.isOne() {
		return v.dim.String()
	}
	return v.unit
}

// Dimension returns the dimension of v in the SI base units, such as "kg·s⁻³·K⁻¹", and "1" for a number.
func (v Value) Dimension() string { return v.dim.String() }

// IsPoint reports whether v is a point on a temperature scale.
func (v Value) IsPoint() bool { return v.point }

// IsFinite reports whether v is neither infinite nor NaN.
func (v Value) IsFinite() bool { return isFinite(v.si) }

// Mul returns v·w in SI base units. A [*DimensionError] is returned if an exponent overflows or if
// one of them is a point on a temperature scale: take its difference from a zero first.
func (v Value) Mul(w Value) (Value, error) { return v.product("multiply", w, v.si*w.si, 1) }

// Div returns v/w in SI base units, with the errors of [Value.Mul].
func (v Value) Div(w Value) (Value, error) { return v.product("divide", w, v.si/w.si, -1) }

func (v Value) product(op string, w Value, si float64, sign int64) (Value, error) {
	for _, x := range []Value{v, w} {
		if x.point {
			return Value{}, &DimensionError{op, x.describe(), "no point on a temperature scale; use its difference from a zero"}
		}
	}
	dim, ok := v.dim.times(w.dim, sign)
	if !ok {
		return Value{}, &DimensionError{op, v.describe() + " and " + w.describe(), "exponents within ±32767"}
	}
	return finite(op, Value{si: si, dim: dim})
}

// Pow returns v^(num/den) in SI base units. A [*DimensionError] is returned if an exponent
// overflows, for den = 0, for a temperature point, and where the result is no real number.
func (v Value) Pow(num, den int) (Value, error) {
	if v.point {
		return Value{}, &DimensionError{"raise to a power", v.describe(), "no point on a temperature scale; use its difference from a zero"}
	}
	if den < 0 && den != math.MinInt {
		num, den = -num, -den
	}
	if den <= 0 || abs(num) > math.MaxInt16 || den > math.MaxInt16 {
		return Value{}, &DimensionError{"raise to a power", v.describe(), "exponents within ±32767, with a denominator that is not 0"}
	}
	dim, ok := v.dim.power(int64(num), int64(den))
	if !ok {
		return Value{}, &DimensionError{"raise to a power", v.describe(), "exponents within ±32767"}
	}
	si := math.Pow(v.si, float64(num)/float64(den))
	if e, _ := newExponent(int64(num), int64(den)); v.si < 0 && e.denominator()%2 == 1 {
		si = math.Pow(-v.si, float64(num)/float64(den))
		if e.num%2 != 0 {
			si = -si
		}
	}
	return finite("raise to a power", Value{si: si, dim: dim})
}

func abs(n int) int {
	if n < 0 {
		return -n
	}
	return n
}

// Sqrt returns the square root of v, with the errors of [Value.Pow].
func (v Value) Sqrt() (Value, error) { return v.Pow(1, 2) }

// Log returns the natural logarithm of v. A [*DimensionError] is returned if v has a dimension or
// is not positive.
func (v Value) Log() (Value, error) { return v.transcendental("take the logarithm of", math.Log) }

// Exp returns e^v. A [*DimensionError] is returned if v has a dimension or if the result overflows.
func (v Value) Exp() (Value, error) { return v.transcendental("take the exponential of", math.Exp) }

func (v Value) transcendental(op string, f func(float64) float64) (Value, error) {
	if !v.dim.isOne() {
		return Value{}, &DimensionError{op, v.describe(), "a number of dimension 1"}
	}
	return finite(op, Number(f(v.si)))
}

func finite(op string, v Value) (Value, error) {
	if !v.IsFinite() {
		return Value{}, &DimensionError{op, v.describe(), "operands that give a finite number"}
	}
	return v, nil
}

// describe writes v with its dimension, for errors.
func (v Value) describe() string {
	s := v.String()
	if d := v.dim.String(); d != "1" {
		s += " (dimension " + d + ")"
	}
	return s
}

// From returns v as a quantity of kind Q, as in
//
//	d, err := units.From[units.Length](v)
//
// It returns a [*DimensionError] if the dimensions differ, and if one is a point on a temperature
// scale and the other a difference.
func From[Q any, P interface {
	*Q
	fromValue(v Value) error
}](v Value) (Q, error) {
	var q Q
	err := P(&q).fromValue(v)
	return q, err
}

func (q *Quantity[D]) fromValue(v Value) error {
	k := kindOf[D]()
	if v.point || v.dim != k.dim {
		return &DimensionError{"read as " + k.name, v.describe(), "dimension " + k.dim.String() + pointHint(v.point, false)}
	}
	q.si = v.si
	return nil
}

func (t *Temperature) fromValue(v Value) error {
	if !v.point {
		return &DimensionError{"read as temperature", v.describe(), "a point on a temperature scale" + pointHint(v.point, v.dim == kelvinDimension)}
	}
	t.kelvin = v.si
	return nil
}

func pointHint(point, difference bool) string {
	switch {
	case point:
		return ", and no point on a temperature scale"
	case difference:
		return ", and no temperature difference"
	}
	return ""
}

package units

import (
	"errors"
	"math"
	"testing"
	"testing/quick"
)

// randomValue makes a finite value of a small dimension from fuzz input.
func randomValue(x float64, exponents [bases]int8) Value {
	v := Value{si: math.Mod(math.Abs(x), 1e3) + 0.5}
	for i, e := range exponents {
		v.dim[i], _ = newExponent(int64(e%5), 1+int64(e&1))
	}
	return v
}

// Exponents add under Mul and subtract under Div; a power and its root undo each other.
func TestDimensionAlgebra(t *testing.T) {
	f := func(x, y float64, a, b [bases]int8) bool {
		v, w := randomValue(x, a), randomValue(y, b)
		vw, err1 := v.Mul(w)
		back, err2 := vw.Div(w)
		swapped, err3 := w.Mul(v)
		square, err4 := v.Mul(v)
		root, err5 := square.Sqrt()
		if err := errors.Join(err1, err2, err3, err4, err5); err != nil {
			t.Log(err)
			return false
		}
		for i := range v.dim {
			if math.Abs(vw.dim[i].float()-v.dim[i].float()-w.dim[i].float()) > 1e-12 {
				return false
			}
		}
		return back.dim == v.dim && swapped == vw && root.dim == v.dim &&
			math.Abs(back.si/v.si-1) < 1e-15 && math.Abs(root.si/v.si-1) < 1e-15
	}
	if err := quick.Check(f, &quick.Config{MaxCount: 5000}); err != nil {
		t.Error(err)
	}
}

// A value converts to a kind only if the dimension is that of the kind, and Log and Exp take numbers only.
func TestDimensionChecks(t *testing.T) {
	f := func(x float64, a [bases]int8) bool {
		v := randomValue(x, a)
		_, errLength := From[Length](v)
		_, errFlux := From[HeatFlux](v)
		_, errPoint := From[Temperature](v)
		_, errLog := v.Log()
		_, errExp := Value{si: v.si / 100, dim: v.dim}.Exp()
		return (errLength == nil) == (v.dim == kinds[lengthKind].dim) &&
			(errFlux == nil) == (v.dim == kinds[heatFluxKind].dim) && errPoint != nil &&
			(errLog == nil) == v.dim.isOne() && (errExp == nil) == v.dim.isOne()
	}
	if err := quick.Check(f, &quick.Config{MaxCount: 5000}); err != nil {
		t.Error(err)
	}
	if _, err := Number(2).Log(); err != nil {
		t.Error(err)
	}
}

func TestValueErrors(t *testing.T) {
	huge, err := Metre.Of(1).Dynamic().Pow(20000, 1)
	if err != nil {
		t.Fatal(err)
	}
	must := func(_ Value, err error) error { return err }
	from := func(_ any, err error) error { return err }
	point, difference := Celsius.Of(20).Dynamic(), KelvinDifference.Of(20).Dynamic()
	length, errLength := From[Length](difference)
	for _, tt := range []struct {
		name string
		err  error
	}{
		{"exponent overflow", must(huge.Mul(huge))},
		{"point times number", must(point.Mul(Number(2)))},
		{"number over point", must(Number(2).Div(point))},
		{"power of a point", must(point.Pow(2, 1))},
		{"zeroth root", must(Number(2).Pow(1, 0))},
		{"root of a negative", must(Number(-2).Sqrt())},
		{"log of a length", must(Metre.Of(1).Dynamic().Log())},
		{"log of zero", must(Number(0).Log())},
		{"exp too large", must(Number(1e6).Exp())},
		{"zero over zero", must(Number(0).Div(Number(0)))},
		{"huge exponent", must(Number(2).Pow(math.MinInt, math.MinInt))},
		{"point to difference", from(From[TemperatureDifference](point))},
		{"difference to point", from(From[Temperature](difference))},
		{"difference to length", errLength},
	} {
		var d *DimensionError
		if !errors.As(tt.err, &d) || d.Accepted == "" {
			t.Errorf("%s: %v; want a dimension error", tt.name, tt.err)
		}
	}
	if length != (Length{}) {
		t.Errorf("a refused conversion left %v", length)
	}
	if v, err := Number(-8).Pow(1, 3); err != nil || math.Abs(v.SI()+2) > 1e-15 {
		t.Errorf("cube root of -8 is %v, %v; want -2", v, err)
	}
	if T, err := From[Temperature](point); err != nil || T != Celsius.Of(20) {
		t.Errorf("20 °C comes back as %v, %v", T, err)
	}
}

package uncertain_test

import (
	"encoding/json"
	"errors"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/uncertain"
)

// sound fails the test unless an error is a typed one, or else every number of the result is finite and in order.
func sound(t *testing.T, r result, err error) {
	t.Helper()
	var argument *units.ArgumentError
	var given *units.ConvergenceError
	var none *uncertain.NoAnswerError
	if err != nil {
		if !errors.As(err, &argument) && !errors.As(err, &given) && !errors.As(err, &none) {
			t.Fatalf("%T: %v", err, err)
		}
		if err.Error() == "" {
			t.Fatal("an error without a text")
		}
		return
	}
	if !(r.Low <= r.Likely && r.Likely <= r.High && r.ShortestLow <= r.ShortestHigh && r.StandardUncertainty >= 0) {
		t.Fatalf("out of order: %+v", r)
	}
	for _, x := range []number{r.Low, r.High, r.Mean, r.StandardUncertainty, r.Tolerance, r.Errors.Low, r.Errors.Likely, r.Errors.High, r.Errors.Shortest, r.Errors.Mean, r.Errors.StandardUncertainty} {
		if math.IsNaN(float64(x)) || math.IsInf(float64(x), 0) {
			t.Fatalf("not finite: %+v", r)
		}
	}
	if _, err := json.Marshal(r); err != nil {
		t.Fatal(err)
	}
	if r.Report() == "" || r.String() == "no result" {
		t.Fatalf("no text: %+v", r)
	}
}

// Any statement of an input gives a sound result or a typed error.
func FuzzInput(f *testing.F) {
	f.Add(60.0, 0.5, 0.95, uint8(0))
	f.Add(1.0, 1.3, 0.68, uint8(7))
	f.Add(-1e300, 1e308, 0.5, uint8(3))
	f.Add(5.0, 1e-320, 0.999, uint8(5))
	f.Add(0.0, 2.0000001, 3.0, uint8(9))
	f.Add(math.Inf(1), math.NaN(), -1.0, uint8(4))
	f.Fuzz(func(t *testing.T, a, b, p float64, shape uint8) {
		limits := []uncertain.Limits[number]{
			uncertain.PlusMinus(number(a), number(b)), uncertain.Between(number(a), number(b)),
			uncertain.PerCent(number(a), b), uncertain.WithinFactor(number(a), b),
		}[shape%4]
		var d uncertain.Distribution[number]
		switch shape / 4 % 10 {
		case 0:
			d = limits.Rectangular()
		case 1:
			d = limits.Triangular()
		case 2:
			d = limits.TriangularAt(number(p))
		case 3:
			d = limits.Trapezoidal(p)
		case 4:
			d = limits.ArcSine()
		case 5:
			d = limits.Normal(p)
		case 6:
			d = limits.LogNormal(p)
		case 7:
			d = uncertain.StudentT(number(a), number(b), p)
		case 8:
			d = uncertain.Readings(number(a), number(b), number(p), number(a+b))
		default:
			d = uncertain.Sampled(number(a), number(b), number(p))
		}
		s := uncertain.Study{Trials: 800, Workers: 1}
		in := uncertain.Add(&s, "x", d, example)
		model := func(x uncertain.Draw) (number, error) { return in.In(x), nil }
		r, err := uncertain.Propagate(t.Context(), &s, model)
		sound(t, r, err)
		l, err := uncertain.Linearise(&s, model)
		if err == nil && (math.IsNaN(float64(l.Low)) || math.IsInf(float64(l.High), 0)) {
			t.Fatalf("not finite: %+v", l)
		}
	})
}

// Any coefficients of three inputs fit together or are refused, and so does any pattern of cases without an answer.
func FuzzCorrelation(f *testing.F) {
	f.Add(0.9, 0.9, -0.9, 0.1, uint8(0))
	f.Add(1.0, -1.0, -1.0, 0.0, uint8(1))
	f.Add(0.5, 0.2, 0.0, 3.0, uint8(2))
	f.Add(math.NaN(), 2.0, 0.0, -5.0, uint8(7))
	f.Fuzz(func(t *testing.T, ab, bc, ac, limit float64, ranks uint8) {
		s := uncertain.Study{Trials: 800, Workers: 1}
		a := normal(&s, "a", 0, 1)
		b := rectangular(&s, "b", 0, 1)
		c := uncertain.Add(&s, "c", uncertain.WithinFactor(number(1), 2).LogNormal(0.95), example)
		for i, pair := range []struct {
			x, y uncertain.Handle
			r    float64
		}{{a, b, ab}, {b, c, bc}, {a, c, ac}} {
			if ranks>>i&1 == 1 {
				s.CorrelateRanks(pair.x, pair.y, pair.r)
			} else {
				s.Correlate(pair.x, pair.y, pair.r)
			}
		}
		r, err := uncertain.Propagate(t.Context(), &s, func(x uncertain.Draw) (number, error) {
			if float64(a.In(x)) > limit {
				return 0, &units.NeverError{Place: "centre"}
			}
			return a.In(x) + b.In(x)*c.In(x), nil
		})
		sound(t, r, err)
	})
}

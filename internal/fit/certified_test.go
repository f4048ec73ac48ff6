package fit

import (
	"math"
	"testing"

	"example.com/coolward/internal/table"
)

// near checks a relative tolerance.
func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance*math.Abs(want)) {
		t.Errorf("%s: got %.12g, want %.12g ± %g of it", what, got, want, tolerance)
	}
}

// problemOf returns the readings of a problem, with the start 0.
func problemOf(t *testing.T, name string) *Exponential {
	p := &Exponential{Start: 0, Ambient: math.NaN()}
	for _, row := range table.Named(t, "testdata/exponentials.csv") {
		if row["problem"] == name {
			p.T = append(p.T, table.Number(t, row["x"]))
			p.Y = append(p.Y, table.Number(t, row["y"]))
			p.W = append(p.W, 1)
		}
	}
	return p
}

// The certified values have eleven digits; constants are compared to nine, which is what a sum of squares and
// its derivative leave in float64 here.
func TestCertifiedLeastSquares(t *testing.T) {
	for _, c := range []struct {
		name                            string
		b1, b1Error, b2, b2Error        float64
		squares, deviation, first, step float64
	}{
		{"Misra1a", 2.3894212918e+02, 2.7070075241e+00, 5.5015643181e-04, 7.2668688436e-06, 1.2455138894e-01, 1.0187876330e-01, 5e-4, 1e-8},
		{"BoxBOD", 2.1380940889e+02, 1.2354515176e+01, 5.4723748542e-01, 1.0455993237e-01, 1.1680088766e+03, 1.7088072423e+01, 0.75, 1e-5},
	} {
		p := problemOf(t, c.name)
		curve, err := p.Fit()
		if err != nil {
			t.Fatal(c.name, err)
		}
		n := float64(len(p.T))
		near(t, c.name+": b1", curve.Ambient, c.b1, 1e-9)
		near(t, c.name+": b2", 1/curve.Tau, c.b2, 1e-9)
		near(t, c.name+": sum of squares", curve.Squares, c.squares, 1e-9)
		near(t, c.name+": deviation", math.Sqrt(curve.Squares/(n-2)), c.deviation, 1e-9)
		v, ok := Covariance(p.Columns(curve))
		if !ok {
			t.Fatal(c.name, "no covariance")
		}
		near(t, c.name+": error of b2", math.Sqrt(v.At(0, 0))*c.deviation*c.b2, c.b2Error, 1e-8)
		near(t, c.name+": error of b1", math.Sqrt(v.At(1, 1))*c.deviation, c.b1Error, 1e-8)

		x := []float64{200, c.first}
		r, columns, err := LeastSquares(func(b []float64) ([]float64, error) {
			r := make([]float64, len(p.T))
			for i, t := range p.T {
				r[i] = -b[0]*math.Expm1(-b[1]*t) - p.Y[i]
			}
			return r, nil
		}, x, []float64{1e-2, c.step})
		if err != nil {
			t.Fatal(c.name, err)
		}
		near(t, c.name+", iterated: b1", x[0], c.b1, 1e-7)
		near(t, c.name+", iterated: b2", x[1], c.b2, 1e-7)
		near(t, c.name+", iterated: sum of squares", sumOfSquares(r), c.squares, 1e-9)
		v, _ = Covariance(columns)
		near(t, c.name+", iterated: error of b1", math.Sqrt(v.At(0, 0))*c.deviation, c.b1Error, 1e-6)
	}
}

// The interval of ln τ is where the sum of squares is at the level, found here by a scan.
func TestProfileAgainstScan(t *testing.T) {
	p := problemOf(t, "BoxBOD")
	curve, err := p.Fit()
	if err != nil {
		t.Fatal(err)
	}
	v, _ := Covariance(p.Columns(curve))
	const factor = 2.776445105 // Student's t, 97.5 %, 4 degrees of freedom (standard tables)
	deviation := math.Sqrt(curve.Squares / 4)
	level := curve.Squares + factor*factor*deviation*deviation
	profile := &Profile{Problem: p, Best: curve, Level: level, Spread: math.Sqrt(v.At(0, 0)) * deviation}
	got := profile.Tau()
	// Every a and τ on a grid: the extremes of those not above the level.
	tauLow, tauHigh, aLow, aHigh := math.Inf(1), 0.0, math.Inf(1), 0.0
	const fine = 1000
	for i := range fine {
		u := math.Log(0.2) + float64(i)/fine*math.Log(100)
		tau := math.Exp(u)
		g := p.fallen(tau, nil)
		for j := range fine {
			a := 150 + 200*float64(j)/fine
			if c := p.measure(Curve{Tau: tau, Start: 0, Ambient: a}, g); c.Squares <= level {
				tauLow, tauHigh = min(tauLow, tau), max(tauHigh, tau)
				aLow, aHigh = min(aLow, a), max(aHigh, a)
			}
		}
	}
	near(t, "τ low", math.Exp(got.Low), tauLow, 0.01)
	near(t, "τ high", math.Exp(got.High), tauHigh, 0.01)
	ambient := profile.Value(math.Inf(1), math.Sqrt(v.At(1, 1))*deviation)
	near(t, "a low", ambient.Low, aLow, 0.002)
	near(t, "a high", ambient.High, aHigh, 0.002)
	if got.OpenLow || got.OpenHigh || ambient.OpenLow || ambient.OpenHigh {
		t.Errorf("open: %+v, %+v", got, ambient)
	}
	// When the curve is at y, by the same contour.
	const y = 180
	at := -curve.Tau * math.Log(1-y/curve.Ambient)
	slope := (curve.Ambient - y) / curve.Tau
	when := profile.Time(at, y, math.Sqrt(p.Variance(curve, v, at))*deviation/slope)
	low, high := math.Inf(1), 0.0
	for i := range fine {
		u := math.Log(0.2) + float64(i)/fine*math.Log(100)
		g := p.fallen(math.Exp(u), nil)
		for j := range fine {
			c := p.measure(Curve{Tau: math.Exp(u), Start: 0, Ambient: 150 + 200*float64(j)/fine}, g)
			if c.Squares <= level && c.Ambient > y {
				t := -c.Tau * math.Log(1-y/c.Ambient)
				low, high = min(low, t), max(high, t)
			}
		}
	}
	near(t, "time low", when.Low, low, 0.01)
	near(t, "time high", when.High, high, 0.01)
}

package fit

import (
	"errors"
	"math"
	"math/rand"
	"testing"

	"gonum.org/v1/gonum/mat"
)

func readings(times []float64, y func(t float64) float64) *Exponential {
	p := &Exponential{Start: math.NaN(), Ambient: math.NaN()}
	for _, t := range times {
		p.T, p.W = append(p.T, t), append(p.W, 1)
		p.Y = append(p.Y, y(t))
	}
	return p
}

func steps(n int, step float64) []float64 {
	t := make([]float64, n)
	for i := range t {
		t[i] = step * float64(i)
	}
	return t
}

// Readings on a curve give the curve back, whatever is known.
func TestExactReadings(t *testing.T) {
	r := rand.New(rand.NewSource(1))
	for range 300 {
		want := Curve{Tau: math.Pow(10, 4*r.Float64()), Start: 100 * r.NormFloat64(), Ambient: 100 * r.NormFloat64()}
		times := []float64{0}
		for range 3 + r.Intn(20) {
			times = append(times, times[len(times)-1]+want.Tau*(0.05+r.Float64()))
		}
		for known := range 4 {
			p := readings(times, want.At)
			if known&1 != 0 {
				p.Start = want.Start
			}
			if known&2 != 0 {
				p.Ambient = want.Ambient
			}
			got, err := p.Fit()
			if err != nil {
				t.Fatalf("%+v, known %d: %v", want, known, err)
			}
			size := math.Abs(want.Start-want.Ambient) + 1e-3*math.Abs(want.Start)
			if math.Abs(got.Tau/want.Tau-1) > 1e-8 || math.Abs(got.Start-want.Start) > 1e-8*size || math.Abs(got.Ambient-want.Ambient) > 1e-8*size {
				t.Errorf("known %d: got %+v, want %+v", known, got, want)
			}
		}
	}
}

// Without an exponential in the readings there is an error, not a number.
func TestNoExponential(t *testing.T) {
	times := steps(20, 1)
	for _, c := range []struct {
		name string
		y    func(t float64) float64
		want error
	}{
		{"straight", func(t float64) float64 { return 3 - 2*t }, ErrStraight},
		{"bends the wrong way", func(t float64) float64 { return -t * t }, ErrStraight},
		{"a step at the start", func(t float64) float64 { return max(0, 1-t) }, ErrSudden},
	} {
		if got, err := readings(times, c.y).Fit(); !errors.Is(err, c.want) {
			t.Errorf("%s: %+v, %v, want %v", c.name, got, err, c.want)
		}
	}
	p := readings([]float64{0}, func(float64) float64 { return 1 })
	p.Start, p.Ambient = 1, 0
	if _, err := p.Fit(); !errors.Is(err, ErrSudden) {
		t.Errorf("only a reading at the start: %v", err)
	}
}

// The 5 % point of d lies between the bounds of Durbin and Watson for any straight line: d_L and d_U for n readings and
// one regressor (J. Durbin, G. S. Watson, Biometrika 38 (1951) 159–178, table 4; from memory, two decimals).
func TestDurbinWatsonBounds(t *testing.T) {
	r := rand.New(rand.NewSource(2))
	for _, c := range []struct {
		n          int
		low, upper float64
	}{{15, 1.08, 1.36}, {20, 1.20, 1.41}, {30, 1.35, 1.49}, {50, 1.50, 1.59}, {100, 1.65, 1.69}} {
		columns := mat.NewDense(c.n, 2, nil)
		for i := range c.n {
			columns.SetRow(i, []float64{1, float64(i)})
		}
		// Residuals with a given d: mix a smooth and a rough vector of the residual space.
		probability := func(want float64) float64 {
			q, _ := basis(columns)
			low, high := 0.0, 1.0
			smooth, rough := project(q, c.n, func(i int) float64 { return math.Cos(float64(i) * 2 * math.Pi / float64(c.n)) }), project(q, c.n, func(i int) float64 { return float64(i%2) + 1e-3*r.NormFloat64() })
			var p float64
			for range 60 {
				mix := (low + high) / 2
				v := make([]float64, c.n)
				for i := range v {
					v[i] = (1-mix)*smooth[i] + mix*rough[i]
				}
				var d float64
				d, p, _ = DurbinWatson(v, columns)
				if d < want {
					low = mix
				} else {
					high = mix
				}
			}
			return p
		}
		// A bound printed to two decimals is known to half of the last.
		if p := probability(c.low - 0.005); p > 0.05 {
			t.Errorf("n = %d: probability %g at d_L %g, want at most 0.05", c.n, p, c.low)
		}
		if p := probability(c.upper + 0.005); p < 0.05 {
			t.Errorf("n = %d: probability %g at d_U %g, want at least 0.05", c.n, p, c.upper)
		}
	}
}

func project(q *mat.Dense, n int, f func(i int) float64) []float64 {
	v := make([]float64, n)
	for i := range v {
		v[i] = f(i)
	}
	_, p := q.Dims()
	for j := range p {
		along := 0.0
		for i := range v {
			along += q.At(i, j) * v[i]
		}
		for i := range v {
			v[i] -= along * q.At(i, j)
		}
	}
	norm := math.Sqrt(sumOfSquares(v))
	for i := range v {
		v[i] /= norm
	}
	return v
}

// For errors that are independent, normal and alike every probability comes as often as it says: as many of
// 4000 below p as 4000 p ± 4 √(4000 p (1−p)).
func TestProbabilitiesAreUniform(t *testing.T) {
	r := rand.New(rand.NewSource(3))
	const trials = 4000
	n := 15
	columns := mat.NewDense(n, 3, nil)
	term := make([]float64, n)
	for i := range n {
		x := float64(i) / 5
		columns.SetRow(i, []float64{math.Exp(-x), 1, x * math.Exp(-x)})
		term[i] = x * x * math.Exp(-x)
	}
	q, _ := basis(columns)
	below := map[string]map[float64]int{"neighbours": {}, "second": {}}
	levels := []float64{0.01, 0.05, 0.5, 0.9}
	for range trials {
		e := project(q, n, func(int) float64 { return r.NormFloat64() })
		_, p1, _ := DurbinWatson(e, columns)
		p2, _ := Extra(e, columns, term)
		for _, level := range levels {
			if p1 < level {
				below["neighbours"][level]++
			}
			if p2 < level {
				below["second"][level]++
			}
		}
	}
	for name, counts := range below {
		for _, level := range levels {
			want := trials * level
			if spread := 4 * math.Sqrt(want*(1-level)); math.Abs(float64(counts[level])-want) > spread {
				t.Errorf("%s: %d of %d below %g, want %g ± %.0f", name, counts[level], trials, level, want, spread)
			}
		}
	}
}

// Tests that can not be made say so.
func TestTestsThatCannotBeMade(t *testing.T) {
	columns := mat.NewDense(3, 1, []float64{1, 1, 1})
	if _, _, ok := DurbinWatson([]float64{1, -2, 1}, columns); ok {
		t.Error("neighbours with two degrees of freedom")
	}
	if _, ok := Extra([]float64{1, -2, 1}, columns, []float64{2, 2, 2}); ok {
		t.Error("a term that is there already")
	}
	if _, ok := Extra([]float64{0, 0, 0}, columns, []float64{1, 2, 3}); ok {
		t.Error("no residuals")
	}
}

// Minimum and descend against functions whose least value is known.
func TestMinimum(t *testing.T) {
	for _, c := range []struct {
		name string
		f    func(x float64) float64
		want float64
	}{
		{"parabola", func(x float64) float64 { return (x - 1.25) * (x - 1.25) }, 1.25},
		{"sharp", func(x float64) float64 { return math.Abs(x + 0.5) }, -0.5},
		{"flat", func(x float64) float64 { return math.Pow(x-2, 4) }, 2},
		{"leaning", func(x float64) float64 { return math.Exp(x) - 3*x }, math.Log(3)},
	} {
		tolerance := 1e-7
		if c.name == "flat" {
			tolerance = 2e-3
		}
		for _, from := range []float64{-3, 0, 4} {
			if got := descend(c.f, from, 0.1, -10, 10); math.Abs(got-c.want) > tolerance {
				t.Errorf("%s from %g: got %.10g, want %.10g", c.name, from, got, c.want)
			}
		}
	}
	if got := descend(func(x float64) float64 { return x }, 0, 0.5, -3, 3); got > -2 {
		t.Errorf("downhill to the limit: stopped at %g", got)
	}
}

// The constants of the two losses: 95 % of the efficiency of least squares for normal errors. Relative variance of a
// location by E ψ²/(E ψ')² (Huber 1981, from memory), by the trapezoidal rule.
func TestLossEfficiency(t *testing.T) {
	for _, loss := range []Loss{Huber, Tukey} {
		var square, slope float64
		const h = 1e-3
		for x := -10.0; x < 10; x += h {
			density := math.Exp(-x*x/2) / math.Sqrt(2*math.Pi) * h
			w, d := loss.weight(x)
			square += w * x * w * x * density
			slope += d * density
		}
		if got := slope * slope / square; math.Abs(got-0.95) > 0.0005 {
			t.Errorf("loss %d: efficiency %.5f, want 0.95 ± 0.0005", loss, got)
		}
	}
}

// The scale of normal readings is their standard deviation.
func TestScale(t *testing.T) {
	r := rand.New(rand.NewSource(4))
	e := make([]float64, 100_000)
	for i := range e {
		e[i] = 3 * r.NormFloat64()
	}
	near(t, "scale", Scale(e, 1), 3, 0.01)
}

func TestLeastSquaresThatCannotBe(t *testing.T) {
	broken := errors.New("broken")
	if _, _, err := LeastSquares(func([]float64) ([]float64, error) { return nil, broken }, []float64{1}, []float64{1}); !errors.Is(err, broken) {
		t.Errorf("error of the function: %v", err)
	}
	// A function that does not depend on its constant.
	if _, _, err := LeastSquares(func([]float64) ([]float64, error) { return []float64{1, 2}, nil }, []float64{1}, []float64{1}); !errors.Is(err, ErrStuck) {
		t.Errorf("nothing to find: %v", err)
	}
}

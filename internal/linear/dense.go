package linear

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/mat"

	"example.com/coolward/internal/root"
	"example.com/coolward/internal/rosenbrock"
)

// A Dense is a small system y' = F(t, y) for package rosenbrock, with its derivatives by difference.
type Dense struct {
	F         func(t float64, y, f []float64) error
	Tolerance float64 // of a step, the same for each component
	Valid     func(y []float64) error

	jacobian   *mat.Dense
	lu         mat.LU
	moved, fpl []float64
}

// difference is by how much a component is moved, in kelvin: rounding of 300 K is 5e-10 of it.
const difference = 1e-4

// Rate sets f = F(t, y).
func (d *Dense) Rate(t float64, y, f []float64) error { return d.F(t, y, f) }

// Linearise sets f and ∂f/∂t and keeps ∂f/∂y.
func (d *Dense) Linearise(t, h float64, y, f, ft []float64) error {
	n := len(y)
	if d.jacobian == nil {
		d.jacobian, d.moved, d.fpl = mat.NewDense(n, n, nil), make([]float64, n), make([]float64, n)
	}
	if err := d.F(t, y, f); err != nil {
		return err
	}
	later := 1e-3 * h
	if err := d.F(t+later, y, d.fpl); err != nil {
		return err
	}
	for i := range ft {
		ft[i] = (d.fpl[i] - f[i]) / later
	}
	for j := range y {
		copy(d.moved, y)
		d.moved[j] += difference
		if err := d.F(t, d.moved, d.fpl); err != nil {
			return err
		}
		step := d.moved[j] - y[j]
		for i := range f {
			d.jacobian.Set(i, j, (d.fpl[i]-f[i])/step)
		}
	}
	return nil
}

// Factor prepares s − ∂f/∂y.
func (d *Dense) Factor(s float64) {
	n, _ := d.jacobian.Dims()
	a := mat.NewDense(n, n, nil)
	a.Scale(-1, d.jacobian)
	for i := range n {
		a.Set(i, i, a.At(i, i)+s)
	}
	d.lu.Factorize(a)
}

// Solve replaces b by the solution; a singular matrix gives NaN, which no step survives.
func (d *Dense) Solve(b []float64) {
	v := mat.NewVecDense(len(b), b)
	err := d.lu.SolveVecTo(v, false, v)
	if ill, ok := err.(mat.Condition); err != nil && (!ok || math.IsInf(float64(ill), 1)) {
		for i := range b {
			b[i] = math.NaN()
		}
	}
}

// Norm returns the largest error over the tolerance.
func (d *Dense) Norm(e []float64) float64 {
	size := 0.0
	for _, x := range e {
		if math.IsNaN(x) {
			return math.NaN()
		}
		size = max(size, math.Abs(x)/d.Tolerance)
	}
	return size
}

// Check returns an error for a state that cannot be.
func (d *Dense) Check(y []float64) error { return d.Valid(y) }

// Crossing returns the first time at which component i of a history is at the level, exact for its
// continuous extension.
func Crossing(h *rosenbrock.History, i int, level float64) (float64, bool) {
	for k := range h.Steps() {
		c := h.Cubic(k, i)
		ends := append(turns(c), 1)
		at := func(s float64) float64 { return h.Value(k, s, i) - level }
		from, first := 0.0, at(0)
		for _, to := range ends {
			last := at(to)
			if first == 0 {
				return h.Time(k) + from*(h.Time(k+1)-h.Time(k)), true
			}
			if last == 0 || (first > 0) != (last > 0) {
				s, ok := root.Find(at, from, to, 0)
				if !ok {
					s = to
				}
				return min(h.Time(k)+s*(h.Time(k+1)-h.Time(k)), h.Time(k+1)), true
			}
			from, first = to, last
		}
	}
	return 0, false
}

// turns returns the fractions of a step between which a cubic rises or falls throughout, rising.
func turns(c [4]float64) []float64 {
	d := c[2]*c[2] - 3*c[3]*c[1]
	if !(d > 0) {
		return nil
	}
	q := -(c[2] + math.Copysign(math.Sqrt(d), c[2]))
	var ends []float64
	for _, s := range [2]float64{q / (3 * c[3]), c[1] / q} {
		if s > 0 && s < 1 {
			ends = append(ends, s)
		}
	}
	slices.Sort(ends)
	return ends
}

package fv

import (
	"math"
	"math/rand/v2"
	"testing"

	"example.com/coolward/internal/rosenbrock"
)

func TestSphereGrid(t *testing.T) {
	const radius = 0.03
	for _, cells := range []int{4, 7, 50, 301} {
		g := Sphere(radius, cells)
		sum := 0.0
		for _, v := range g.Volumes {
			sum += v
		}
		if want := 4 * math.Pi / 3 * radius * radius * radius; math.Abs(sum/want-1) > 1e-13 || math.Abs(g.Volume/want-1) > 1e-15 {
			t.Errorf("%d cells: volumes add up to %g and whole %g, want %g", cells, sum, g.Volume, want)
		}
		if want := 4 * math.Pi * radius * radius; math.Abs(g.Area/want-1) > 1e-15 {
			t.Errorf("%d cells: area %g, want %g", cells, g.Area, want)
		}
		double := Sphere(radius, 2*cells)
		for i, r := range g.Nodes {
			if d := double.Nodes[2*i]; math.Abs(r-d) > 1e-16 {
				t.Errorf("%d cells: node %d at %g, in the finer grid at %g", cells, i, r, d)
			}
			if i > 0 && r <= g.Nodes[i-1] {
				t.Errorf("%d cells: node %d does not lie outside the one before", cells, i)
			}
		}
	}
}

// A body that loses heat evenly, T = a − b r², is met exactly on any grid: each volume loses 6 k b per
// volume (H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., section 9.2, from memory).
func TestParabolaIsExact(t *testing.T) {
	const radius, k, b = 0.03, 12.0, 5e4
	tb, err := NewTable(constant(1000, 500, k), 400, 200, 600, nil, 1e-6)
	if err != nil {
		t.Fatal(err)
	}
	g := Sphere(radius, 13)
	sys := newSystem(t, g, tb, func(float64, float64) float64 { return 2 * k * b * radius }, 1)
	state, f := sys.Start(), sys.Start()
	for i, r := range g.Nodes {
		state[i] = g.Volumes[i] * 1000 * 500 * -b * r * r
	}
	if err := sys.Rate(0, state, f); err != nil {
		t.Fatal(err)
	}
	for i, v := range g.Volumes {
		if want := -6 * k * b; math.Abs(f[i]/v/want-1) > 1e-9 {
			t.Errorf("node %d: %g W/m³, want %g", i, f[i]/v, want)
		}
	}
}

// newSystem returns the equations of a body of one material with an exchange at its surface.
func newSystem(t *testing.T, g *Grid, table *Table, exchange func(t, T float64) float64, tolerance float64) *System {
	t.Helper()
	sys, err := NewSystem(Model{
		Grid: g, Tables: []*Table{table}, Tolerance: tolerance,
		Surface: Face{Exchange: Exchange{Function: func(t, T float64) (float64, error) { return exchange(t, T), nil }}},
	})
	if err != nil {
		t.Fatal(err)
	}
	return sys
}

// system returns a body with everything that varies, and a random state of it.
func system(t *testing.T, cells int) (*System, []float64) {
	m := linear{density: 7850, c0: 400, b: 1e-3, k0: 60, a: -4e-4}
	tb, err := NewTable(m.material(), 900, 280, 1200, nil, 1e-9)
	if err != nil {
		t.Fatal(err)
	}
	sys := newSystem(t, Sphere(0.03, cells), tb, func(t, T float64) float64 {
		return 5e-8*(T*T*T*T-1e10) + 1e4*math.Sin(t)
	}, 1e-3)
	rng := rand.New(rand.NewPCG(3, 4))
	state := sys.Start()
	for i, v := range sys.Grid.Volumes {
		state[i] = v * m.density * (m.enthalpy(300+800*rng.Float64()) - m.enthalpy(900))
	}
	return sys, state
}

// Solve is the inverse of d − ∂f/∂y, with the derivative by central differences of Rate.
func TestJacobian(t *testing.T) {
	sys, y := system(t, 9)
	n := len(y)
	f, ft := make([]float64, n), make([]float64, n)
	const at, h, d = 0.7, 2.0, 3.0
	if err := sys.Linearise(at, h, y, f, ft); err != nil {
		t.Fatal(err)
	}
	sys.Factor(d)
	rng := rand.New(rand.NewPCG(5, 6))
	x, up, down, fu, fd, b := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
	scale := 0.0
	for i := range x {
		x[i] = (rng.Float64() - 0.5) * 1e-2
		up[i], down[i] = y[i]+x[i], y[i]-x[i]
		scale = max(scale, math.Abs(x[i]))
	}
	if err := sys.Rate(at, up, fu); err != nil {
		t.Fatal(err)
	}
	if err := sys.Rate(at, down, fd); err != nil {
		t.Fatal(err)
	}
	for i := range b {
		b[i] = d*x[i] - (fu[i]-fd[i])/2
	}
	sys.Solve(b)
	for i := range b {
		if math.Abs(b[i]-x[i]) > 1e-5*scale {
			t.Errorf("component %d: %g, want %g to 1e-5 of %g", i, b[i], x[i], scale)
		}
	}
	if want := 1e4 * math.Cos(at) * sys.Grid.Area; math.Abs(ft[n-1]-want) > 1e-6*want || ft[n-2] != -ft[n-1] {
		t.Errorf("∂f/∂t = %g and %g, want ±%g", ft[n-2], ft[n-1], want)
	}
	// Same rates from both; nothing is lost between volumes.
	if err := sys.Rate(at, y, fu); err != nil {
		t.Fatal(err)
	}
	for i := range f {
		if f[i] != fu[i] {
			t.Errorf("component %d: rate %g of Linearise, %g of Rate", i, f[i], fu[i])
		}
	}
	if sum, size := sys.Balance(f), math.Abs(f[n-1]); math.Abs(sum) > 1e-10*size {
		t.Errorf("rates add up to %g, want 0 to 1e-10 of %g", sum, size)
	}
}

// Order 4 in time for the discretised body, with k(T), c(T), radiation and an exchange that starts
// smoothly: errors of steps of one length against those of a sixteenth of it.
func TestOrderInTime(t *testing.T) {
	m := linear{density: 7850, c0: 400, b: 1e-3, k0: 60, a: -4e-4}
	tb, err := NewTable(m.material(), 900, 280, 1200, nil, 1e-10)
	if err != nil {
		t.Fatal(err)
	}
	const end = 600.0
	solve := func(steps float64) []float64 {
		sys := newSystem(t, Sphere(0.03, 20), tb, func(t, T float64) float64 {
			s := math.Sin(8 * math.Pi * t / end)
			return s * s * s * s * 2e-7 * (T*T*T*T - 1e10)
		}, 1e6)
		hist, st, err := rosenbrock.Integrate(sys, sys.Start(), rosenbrock.Options{
			End: end, MaxStep: end / steps, MaxSteps: 1e5,
			Accepted: func(float64, []float64, float64) (bool, error) { return false, nil },
		})
		if err != nil || st.Rejected > 0 {
			t.Fatal(err, st)
		}
		T := make([]float64, len(sys.Grid.Nodes))
		for i := range T {
			T[i] = sys.NodeTemperature(i, Latest, hist.State(hist.Steps())[i])
		}
		return T
	}
	distance := func(a, b []float64) float64 {
		worst := 0.0
		for i := range a {
			worst = max(worst, math.Abs(a[i]-b[i]))
		}
		return worst
	}
	best := solve(3200)
	one, two := distance(solve(100), best), distance(solve(200), best)
	if p := math.Log2(one / two); math.Abs(p-4) > 0.2 {
		t.Errorf("order %.3f from errors %g and %g K, want 4 ± 0.2", p, one, two)
	}
}

func TestNoAllocationInSystem(t *testing.T) {
	sys, y := system(t, 50)
	f, ft := sys.Start(), sys.Start()
	if got := testing.AllocsPerRun(10, func() {
		if sys.Linearise(0, 1, y, f, ft) != nil || sys.Rate(0, y, f) != nil || sys.Check(y) != nil {
			t.Fatal("failed")
		}
		sys.Factor(2)
		sys.Solve(f)
		sys.Norm(f)
	}); got != 0 {
		t.Errorf("%g allocations for the work of a step, want 0", got)
	}
}

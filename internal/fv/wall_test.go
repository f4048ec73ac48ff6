package fv

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"

	"example.com/coolward/internal/tridiagonal"
)

// The elimination solves what gonum's solver with pivoting solves, and with couplings of 1e12 still loses none of what
// the columns sum up to.
func TestElimination(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	for _, n := range []int{2, 3, 4, 5, 20, 101} {
		for _, tight := range []float64{1, 1e6, 1e12} {
			lower, upper, sums, b := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
			dense := mat.NewDense(n, n, nil)
			whole := 0.0
			for i := range n {
				sums[i] = 0.1 + rng.Float64()
				b[i] = rng.Float64() - 0.5
				whole += b[i]
				if i > 0 {
					scale := 1.0
					if i%3 == 1 {
						scale = tight
					}
					upper[i-1], lower[i] = -scale*rng.Float64(), -scale*rng.Float64()
				}
			}
			for i := range n {
				d := sums[i]
				if i > 0 {
					d -= upper[i-1]
					dense.Set(i-1, i, upper[i-1])
				}
				if i < n-1 {
					d -= lower[i+1]
					dense.Set(i+1, i, lower[i+1])
				}
				dense.Set(i, i, d)
			}
			e := tridiagonal.New(n)
			e.Factor(lower, sums, upper)
			got := append([]float64(nil), b...)
			e.Solve(got)
			var want mat.VecDense
			if err := want.SolveVec(dense, mat.NewVecDense(n, b)); err != nil && tight < 1e12 {
				t.Fatal(err)
			}
			sum, size := 0.0, 0.0
			for i, x := range got {
				sum += sums[i] * x
				size += math.Abs(sums[i] * x)
				if tol := 1e-14 * tight * float64(n); tight < 1e12 && math.Abs(x-want.AtVec(i)) > tol {
					t.Errorf("%d rows, coupling %g: component %d is %g, want %g to %g", n, tight, i, x, want.AtVec(i), tol)
				}
			}
			if math.Abs(sum-whole) > 1e-14*size*float64(n) {
				t.Errorf("%d rows, coupling %g: columns give %.17g, want %.17g", n, tight, sum, whole)
			}
		}
	}
}

// Grids of both kinds of map: the volumes fill the body, nodes of half the cells are every second one, and the cells
// at the graded ends have about the ratio that is asked for.
func TestGradedParts(t *testing.T) {
	for _, g := range []Geometry{
		{Factor: 2},
		{Exponent: 1, Factor: 2 * math.Pi * 0.7, Radius: 0.1},
		{Exponent: 2, Factor: 4 * math.Pi, Radius: 0.5, Inwards: true},
	} {
		for _, ratio := range []float64{1, 0.5, 0.2, 0.05, 1e-3, 1e-6} {
			for _, ends := range [][2]bool{{false, true}, {true, false}, {true, true}} {
				grading := Grading{Low: ends[0], High: ends[1], Ratio: ratio}
				parts := []Part{{0.1, 40, grading}, {0.3, 20, Grading{}}}
				grid := NewGrid(g, parts)
				parts[0].Cells, parts[1].Cells = 20, 10
				half := NewGrid(g, parts)
				sum := 0.0
				for _, v := range grid.Volumes {
					if !(v > 0) {
						t.Errorf("%+v: volume %g", grading, v)
					}
					sum += v
				}
				if want := g.Between(0, 0.4); math.Abs(sum-want) > 1e-13*want {
					t.Errorf("%+v: volumes add up to %g, want %g", grading, sum, want)
				}
				for i := range 21 {
					if a, b := grid.Nodes[2*i], half.Nodes[i]; math.Abs(a-b) > 1e-15 {
						t.Errorf("%+v: node %d at %g, of half the cells at %g", grading, 2*i, a, b)
					}
				}
				for _, c := range []struct {
					graded bool
					width  float64
				}{{ends[0], grid.Nodes[1] - grid.Nodes[0]}, {ends[1], grid.Nodes[40] - grid.Nodes[39]}} {
					// The first cell is wider than the slope of the map says by (1−a)/n or 3(1−a)/n of the mean, and less of
					// itself with the hyperbolic maps.
					want, more := 0.1/40*ratio, 0.1/40*(1-ratio)*3/40
					if ratio < 0.2 {
						more = 0.8 * want
					}
					if c.graded && !(c.width > 0.99*want && c.width < want+more+1e-12*want) {
						t.Errorf("%+v: cell of %g m, want about %g m", grading, c.width, want)
					}
				}
				if grid.First[1] != 41 || grid.Conductance[40] != 0 || grid.Nodes[40] != grid.Nodes[41] {
					t.Errorf("%+v: parts meet at %v", grading, grid.First)
				}
			}
		}
	}
}

// everything is a wall with all that a wall can have, and a random state of it.
func everything(t *testing.T, prescribed bool) (*System, []float64) {
	t.Helper()
	table := func(k float64, low float64) *Table {
		m := linear{density: 2000, c0: 400, b: 1e-3, k0: k, a: -4e-4}
		tb, err := NewTable(m.material(), 600, low, 1200, nil, 1e-9)
		if err != nil {
			t.Fatal(err)
		}
		return tb
	}
	a, b, changed := table(3, 280), table(0.2, 280), table(1, 280)
	surface := Exchange{
		Coefficient: 20, Ambient: 500, Function: func(t, T float64) (float64, error) { return 5e-8*T*T*T*T + 1e3*math.Sin(t), nil },
	}
	if prescribed {
		surface = Exchange{Prescribed: func(t float64) (float64, float64, error) { return 600 + 50*math.Sin(t), 50 * math.Cos(t), nil }}
	}
	sys, err := NewSystem(Model{
		Grid:   NewGrid(Geometry{Exponent: 1, Factor: 3, Radius: 0.05}, []Part{{0.02, 8, Grading{Low: true, High: true}}, {0.03, 7, Grading{Low: true}}}),
		Tables: []*Table{a, b}, Tolerance: 1e-3, Duration: 1,
		Changes:  []Change{{changed, 700}, {}},
		Contacts: []Contact{{Function: func(inner, outer float64) (float64, error) { return 1 / (0.1 * (inner + outer)), nil }}},
		Surface:  Face{Exchange: surface, Lump: &Lump{Capacity: 300, Coefficient: 40, Initial: 450}},
		Opposite: Face{
			Exchange: Exchange{Coefficient: 5, Ambient: 300},
			Lump:     &Lump{Capacity: 500, Coefficient: 90, Initial: 700, Area: 0.3, Exchange: Exchange{Function: func(t, T float64) (float64, error) { return T*T/100 - 2000, nil }}},
		},
		Source: func(x, t, T float64) (float64, error) { return 1e6*x*math.Cos(t) + 300*T, nil },
	})
	if err != nil {
		t.Fatal(err)
	}
	rng := rand.New(rand.NewPCG(3, 4))
	state := sys.Start()
	for i := range sys.Grid.Nodes {
		if err := sys.set(state, i, 400+500*rng.Float64()); err != nil {
			t.Fatal(err)
		}
	}
	state[0], state[sys.chain-1] = 1e4, -2e4
	sys.Switch(1, state) // some nodes change
	if !sys.changes.any || len(sys.links) < 4 {
		t.Fatalf("%d links", len(sys.links))
	}
	return sys, state
}

// Solve is the inverse of d − ∂f/∂y with all that a wall can have, the derivative by central differences of Rate; the
// rates of Linearise are those of Rate, and nothing is lost in them.
func TestJacobianOfWalls(t *testing.T) {
	for _, prescribed := range []bool{false, true} {
		sys, y := everything(t, prescribed)
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
		rate := func(t0 float64, y, f []float64) {
			if err := sys.Rate(t0, y, f); err != nil {
				t.Fatal(err)
			}
		}
		rate(at, up, fu)
		rate(at, down, fd)
		for i := range b {
			b[i] = d*x[i] - (fu[i]-fd[i])/2
		}
		sys.Solve(b)
		for i := range b {
			if math.Abs(b[i]-x[i]) > 2e-5*scale {
				t.Errorf("prescribed %v, component %d: %g, want %g to 2e-5 of %g", prescribed, i, b[i], x[i], scale)
			}
		}
		const step = 1e-5
		rate(at+step, y, fu)
		rate(at-step, y, fd)
		for i := range ft {
			if want := (fu[i] - fd[i]) / (2 * step); math.Abs(ft[i]-want) > 1e-6*(math.Abs(want)+math.Abs(fu[i])) {
				t.Errorf("prescribed %v, component %d: ∂f/∂t %g, want %g", prescribed, i, ft[i], want)
			}
		}
		rate(at, y, fu)
		size := 0.0
		for i := range f {
			if math.Abs(f[i]-fu[i]) > 1e-12*math.Abs(f[i]) {
				t.Errorf("prescribed %v, component %d: rate %g of Linearise, %g of Rate", prescribed, i, f[i], fu[i])
			}
			size += math.Abs(f[i])
		}
		if sum := sys.Balance(f) + sys.total; math.Abs(sum) > 1e-13*size {
			t.Errorf("prescribed %v: rates add up to %g of %g", prescribed, sum, size)
		}
	}
}

// What changes keeps its temperature and its enthalpy.
func TestSwitchKeepsTemperatures(t *testing.T) {
	sys, y := everything(t, false)
	for i := range sys.Grid.Nodes {
		e := y[sys.Index(i)]
		before, after := sys.NodeTemperature(i, 0, e), sys.NodeTemperature(i, Latest, e)
		if math.Abs(before-after) > 1e-9 {
			t.Errorf("node %d from %.12g K to %.12g K", i, before, after)
		}
		changed := sys.changes.from[sys.Index(i)] != unchanged
		if want := i < sys.Grid.First[1] && before >= 700; changed != want {
			t.Errorf("node %d at %g K changed: %v", i, before, changed)
		}
	}
}

func TestNoAllocationInWalls(t *testing.T) {
	sys, y := everything(t, true)
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

package linear

import (
	"errors"
	"math"
	"math/rand"
	"strings"
	"testing"

	"gonum.org/v1/gonum/mat"

	"example.com/coolward/internal/rosenbrock"
)

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s: got %.15g, want %.15g ± %g", what, got, want, tolerance)
	}
}

func modes(t testing.TB, n *Network) *Modes {
	t.Helper()
	m, ok := n.Modes()
	if !ok {
		t.Fatal("no modes")
	}
	return m
}

// Two capacities in a row, the second joined to what is at 0: the rates are the roots of
// λ² − (G/C1 + (G+H)/C2) λ + G H/(C1 C2), written without cancellation. Over ratios up to 1e12 the slow
// rate keeps its digits.
func TestTwoNodesAgainstQuadratic(t *testing.T) {
	for _, c := range []struct{ c1, c2, g, h float64 }{
		{1, 1, 1, 1},
		{4000, 900, 3, 0.5},
		{1e-6, 1e3, 1, 1e-3},
		{1e3, 1e-6, 1e-3, 1},
		{1e-3, 1e3, 1e3, 1e-3},
	} {
		n := &Network{Capacity: []float64{c.c1, c.c2}, Links: []Link{{0, 1, c.g}}, Leaks: []Leak{{1, c.h}}}
		m := modes(t, n)
		sum := c.g/c.c1 + (c.g+c.h)/c.c2
		product := c.g / c.c1 * c.h / c.c2
		fast := (sum + math.Sqrt(sum*sum-4*product)) / 2
		slow := product / fast
		near(t, "slow rate", m.Rate[0]/slow, 1, 1e-13)
		near(t, "fast rate", m.Rate[1]/fast, 1, 1e-13)
		// T2 from (1, 0): the only combination of both exponentials with T2(0) = 0, T2'(0) = G/C2.
		curves := m.Run(m.Sizes(n, []float64{1, 0}), make([]Drive, 2))
		for _, at := range []float64{0.1 / fast, 1 / fast, 0.3 / slow, 2 / slow} {
			want := c.g / c.c2 / (fast - slow) * (math.Exp(-slow*at) - math.Exp(-fast*at))
			near(t, "T2", curves[1].At(at), want, 1e-13)
		}
	}
}

// random returns a network of n nodes with leaks, and a drive for each node.
func random(r *rand.Rand, n int, leaks bool) (*Network, []Drive) {
	net := &Network{}
	drives := make([]Drive, n)
	spread := func(decades float64) float64 { return math.Pow(10, decades*(r.Float64()-0.5)) }
	for i := range n {
		net.Capacity = append(net.Capacity, spread(3))
		if i > 0 {
			net.Links = append(net.Links, Link{r.Intn(i), i, spread(3)})
		}
		drives[i].Constant = r.NormFloat64()
		if leaks {
			net.Leaks = append(net.Leaks, Leak{i, spread(2)})
			drives[i].Slope = 0.1 * r.NormFloat64()
			drives[i].Waves = []Wave{{0.7, r.NormFloat64(), r.NormFloat64()}}
		}
	}
	return net, drives
}

// matrix returns the network with its drives as one autonomous linear system in T, 1, t, cos ωt, sin ωt.
func matrix(n *Network, drives []Drive) *mat.Dense {
	k := len(n.Capacity)
	a := mat.NewDense(k+4, k+4, nil)
	add := func(i, j int, x float64) { a.Set(i, j, a.At(i, j)+x) }
	for _, l := range n.Links {
		add(l.A, l.A, -l.Conductance/n.Capacity[l.A])
		add(l.A, l.B, l.Conductance/n.Capacity[l.A])
		add(l.B, l.B, -l.Conductance/n.Capacity[l.B])
		add(l.B, l.A, l.Conductance/n.Capacity[l.B])
	}
	for _, l := range n.Leaks {
		add(l.Node, l.Node, -l.Conductance/n.Capacity[l.Node])
	}
	omega := 0.0
	for i, d := range drives {
		add(i, k, d.Constant/n.Capacity[i])
		add(i, k+1, d.Slope/n.Capacity[i])
		for _, w := range d.Waves {
			omega = w.Omega
			add(i, k+2, w.Cos/n.Capacity[i])
			add(i, k+3, w.Sin/n.Capacity[i])
		}
	}
	a.Set(k+1, k, 1)
	a.Set(k+2, k+3, -omega)
	a.Set(k+3, k+2, omega)
	return a
}

// Random networks against the exponential of the whole matrix (gonum, by Padé approximation).
func TestAgainstMatrixExponential(t *testing.T) {
	r := rand.New(rand.NewSource(1))
	for trial := range 200 {
		n := 1 + r.Intn(6)
		net, drives := random(r, n, trial%4 != 0)
		m := modes(t, net)
		start := make([]float64, n)
		state := mat.NewVecDense(n+4, nil)
		for i := range start {
			start[i] = 10 * r.NormFloat64()
			state.SetVec(i, start[i])
		}
		state.SetVec(n, 1)
		state.SetVec(n+2, 1)
		curves := m.Run(m.Sizes(net, start), drives)
		at := 5 * r.Float64()
		a := matrix(net, drives)
		a.Scale(at, a)
		var e mat.Dense
		e.Exp(a)
		var want mat.VecDense
		want.MulVec(&e, state)
		for i := range n {
			near(t, "temperature", curves[i].At(at), want.AtVec(i), 1e-9*(1+math.Abs(want.AtVec(i))))
			near(t, "start", curves[i].At(0), start[i], 1e-11*(1+math.Abs(start[i])))
			slope := (curves[i].At(1e-6) - curves[i].At(0)) / 1e-6
			near(t, "slope at the start", curves[i].Slope0(), slope, 1e-2*(1+math.Abs(slope)))
			if curves[i].Largest(at) < math.Abs(curves[i].At(at)) {
				t.Error("the bound is no bound")
			}
		}
		// From half way on with the drives there.
		later := make([]Drive, n)
		for i, d := range drives {
			later[i] = Drive{Constant: d.Constant + d.Slope*at/2, Slope: d.Slope}
			for _, w := range d.Waves {
				sin, cos := math.Sincos(w.Omega * at / 2)
				later[i].Waves = append(later[i].Waves, Wave{w.Omega, w.Cos*cos + w.Sin*sin, w.Sin*cos - w.Cos*sin})
			}
		}
		second := m.Run(m.ModeAt(m.Sizes(net, start), drives, at/2), later)
		for i := range n {
			near(t, "in two stretches", second[i].At(at/2), curves[i].At(at), 1e-9*(1+math.Abs(want.AtVec(i))))
		}
	}
}

// From a bead to a building: the far ends of the fast modes are below rounding, which does no harm. After the bead and its sheath
// have settled, the building cools with the sum of what it holds over its conductance.
func TestCapacitiesFarApart(t *testing.T) {
	n := &Network{
		Capacity: []float64{1e-3, 1, 1e6, 1e9},
		Links:    []Link{{0, 1, 1e-2}, {1, 2, 1}, {2, 3, 1e5}},
		Leaks:    []Leak{{3, 1e-3}},
	}
	m := modes(t, n)
	curves := m.Run(m.Sizes(n, []float64{0, 0, 1, 1}), make([]Drive, 4))
	near(t, "bead", curves[0].At(100), 1, 1e-8)
	near(t, "building", curves[3].At(1e12), math.Exp(-1e12*1e-3/1.001001001e9), 1e-5)
}

// Without leaks the heat stays, whatever the capacities, and all nodes come to one temperature.
func TestHeatStays(t *testing.T) {
	r := rand.New(rand.NewSource(2))
	for range 100 {
		n := 2 + r.Intn(5)
		net, _ := random(r, n, false)
		start := make([]float64, n)
		heat, total := 0.0, 0.0
		for i := range start {
			start[i] = 300 + 100*r.Float64()
			heat += net.Capacity[i] * start[i]
			total += net.Capacity[i]
		}
		m := modes(t, net)
		curves := m.Run(m.Sizes(net, start), make([]Drive, n))
		for _, at := range []float64{0, 1e-3, 1, 1e3, 1e9, 1e300} {
			now := 0.0
			for i := range curves {
				now += net.Capacity[i] * curves[i].At(at)
			}
			near(t, "heat over what it was", now/heat, 1, 1e-14)
		}
		for i := range curves {
			near(t, "in the end", curves[i].At(1e12), heat/total, 1e-12*heat/total)
		}
		rest, rise := m.Rest(m.Sizes(net, start), make([]float64, n))
		near(t, "rest", rest[0], heat/total, 1e-12*heat/total)
		near(t, "rise", rise[0], 0, 0)
	}
}

// Parts of a network that nothing joins do not know of each other.
func TestParts(t *testing.T) {
	n := &Network{
		Capacity: []float64{1, 2, 3, 4},
		Links:    []Link{{0, 2, 1}, {1, 3, 1}, {0, 1, 0}},
		Leaks:    []Leak{{2, 0.5}, {1, 0}},
	}
	m := modes(t, n)
	if m.Part[0] != m.Part[2] || m.Part[1] != m.Part[3] || m.Part[0] == m.Part[1] || !m.Open[m.Part[0]] || m.Open[m.Part[1]] {
		t.Errorf("parts %v, open %v", m.Part, m.Open)
	}
	curves := m.Run(m.Sizes(n, []float64{10, 0, 10, 6}), make([]Drive, 4))
	near(t, "the closed part", curves[1].At(1e4), 4, 1e-13)
	near(t, "the open part", curves[0].At(1e4), 0, 1e-13)
}

// A curve that has come to rest at the level to rounding ends the search, whichever way it is taken.
func TestRestAtTheLevel(t *testing.T) {
	c := Curve{Constant: 300, Slope: 1e-30, Decays: []Decay{{1e-3, 50}, {1, -20}}, Waves: []Wave{{1e-3, 1e-20, 0}}}
	if got, ok := c.Crossing(300, 1e12); ok && math.Abs(c.At(got)-300) > 1e-9 {
		t.Errorf("crossing at %g", got)
	}
}

func TestNoModes(t *testing.T) {
	n := &Network{Capacity: []float64{1e-300, 1}, Links: []Link{{0, 1, 1e300}}}
	if _, ok := n.Modes(); ok {
		t.Error("modes of a matrix that is not finite")
	}
	n = &Network{Capacity: []float64{1e-300, 2.5e299}, Links: []Link{{0, 1, 1e-5}}, Leaks: []Leak{{1, 1e5}}}
	if m, ok := n.Modes(); ok {
		t.Errorf("modes that are lost in rounding: %v", m)
	}
}

// The first crossing against a scan on a fine grid.
func TestCrossingAgainstScan(t *testing.T) {
	r := rand.New(rand.NewSource(3))
	found, later, none := 0, 0, 0
	for range 1000 {
		c := Curve{Constant: r.NormFloat64()}
		for range 1 + r.Intn(4) {
			c.Decays = append(c.Decays, Decay{math.Pow(10, 2*r.Float64()-1), 2 * r.NormFloat64()})
		}
		if r.Intn(2) == 0 {
			c.Slope = r.NormFloat64()
		}
		if r.Intn(2) == 0 {
			c.Waves = []Wave{{5 * r.Float64(), r.NormFloat64(), r.NormFloat64()}}
		}
		level, end := 2*r.NormFloat64(), 4.0
		scan, changes := math.NaN(), 0
		last := c.At(0) - level
		const points = 2000
		for i := 1; i <= points; i++ {
			now := c.At(end*float64(i)/points) - level
			if (now > 0) != (last > 0) {
				if changes++; changes == 1 {
					scan = end * float64(i) / points
				}
			}
			last = now
		}
		got, ok := c.Crossing(level, end)
		switch {
		case !ok && changes > 0:
			t.Fatalf("%+v at %g: none, the scan has one before %g", c, level, scan)
		case !ok:
			none++
			continue
		case changes > 1:
			later++
		}
		found++
		if d := c.At(got) - level; math.Abs(d) > 1e-12 {
			t.Fatalf("%+v at %g: off by %g at %g", c, level, d, got)
		}
		if changes > 0 && !(got <= scan && got >= 0) {
			t.Fatalf("%+v at %g: %g, the scan has one before %g", c, level, got, scan)
		}
	}
	if found < 200 || none < 200 || later < 30 {
		t.Errorf("one-sided cases: %d found, %d with several, %d none", found, later, none)
	}
}

func TestCrossingForAllTime(t *testing.T) {
	for _, c := range []struct {
		name  string
		curve Curve
		level float64
		want  float64
		ok    bool
	}{
		{"one exponential", Curve{Decays: []Decay{{1e-6, 1}}}, 1e-9, math.Log(1e9) * 1e6, true},
		{"the limit itself", Curve{Decays: []Decay{{1, 1}}}, 0, 0, false},
		{"beyond the limit", Curve{Constant: 5, Decays: []Decay{{1, 1}}}, 4, 0, false},
		{"beyond the start", Curve{Constant: 5, Decays: []Decay{{1, 1}}}, 7, 0, false},
		{"up and down: e^(−t) − e^(−2t), half of its peak", Curve{Decays: []Decay{{1, 1}, {2, -1}}}, 0.125, math.Log(2 / (0.5 * (1 + math.Sqrt(0.5)) * 2) * 1), true},
		{"touches its peak 1/4 at ln 2", Curve{Decays: []Decay{{1, 1}, {2, -1}}}, 0.25, math.Ln2, true},
		{"touches its peak but for rounding", Curve{Decays: []Decay{{1, 1}, {2, -1}}}, math.Nextafter(0.25, 1), math.Ln2, true},
		{"above its peak", Curve{Decays: []Decay{{1, 1}, {2, -1}}}, 0.2501, 0, false},
		{"crosses the limit once on the way", Curve{Decays: []Decay{{1, -1}, {10, 2}}}, 0, math.Ln2 / 9, true},
		{"straight", Curve{Slope: 2}, 10, 5, true},
		{"straight, away", Curve{Slope: 2}, -10, 0, false},
		{"the limit, which all but a trace of the slow decay has", Curve{Decays: []Decay{{1e-3, 1e-14}, {1, 1}}}, 0, 0, false},
		{"the limit, and a decay that is not there", Curve{Decays: []Decay{{1e-3, 0}, {1, 1}}}, 0, 0, false},
		{"nothing happens", Curve{Constant: 1}, 2, 0, false},
		{"nothing happens, there", Curve{Constant: 1}, 1, 0, true},
	} {
		got, ok := c.curve.Crossing(c.level, math.Inf(1))
		// e^(−t) = x: x − x² = 1/8 gives x = (1 + √½)/2 first.
		tolerance := 1e-10 * c.want
		if strings.HasPrefix(c.name, "touches") { // a double zero has half of the digits
			tolerance = 1e-6 * c.want
		}
		if ok != c.ok || ok && math.Abs(got-c.want) > tolerance {
			t.Errorf("%s: %.12g, %v, want %.12g, %v", c.name, got, ok, c.want, c.ok)
		}
	}
}

// A dense system integrated against the closed form, for constants and with time.
func TestDenseAgainstModes(t *testing.T) {
	r := rand.New(rand.NewSource(4))
	for range 20 {
		n := 2 + r.Intn(3)
		net, drives := random(r, n, true)
		start := make([]float64, n)
		for i := range start {
			start[i] = 10 * r.NormFloat64()
		}
		m := modes(t, net)
		curves := m.Run(m.Sizes(net, start), drives)
		d := &Dense{Tolerance: 1e-5, Valid: func([]float64) error { return nil }, F: func(at float64, y, f []float64) error {
			for i, d := range drives {
				f[i] = d.Constant + d.Slope*at
				for _, w := range d.Waves {
					f[i] += w.Cos*math.Cos(w.Omega*at) + w.Sin*math.Sin(w.Omega*at)
				}
			}
			for _, l := range net.Links {
				p := l.Conductance * (y[l.A] - y[l.B])
				f[l.A] -= p
				f[l.B] += p
			}
			for _, l := range net.Leaks {
				f[l.Node] -= l.Conductance * y[l.Node]
			}
			for i := range f {
				f[i] /= net.Capacity[i]
			}
			return nil
		}}
		h, _, err := rosenbrock.Integrate(d, start, rosenbrock.Options{
			End: 5, MaxStep: 5, MaxSteps: 1e5, Accepted: func(float64, []float64, float64) (bool, error) { return false, nil },
		})
		if err != nil {
			t.Fatal(err)
		}
		for i := range n {
			for _, at := range []float64{0.3, 1.7, 5} {
				k, s := h.Find(at)
				near(t, "integrated", h.Value(k, s, i), curves[i].At(at), 1e-3)
			}
			level := curves[i].At(2.5)
			want, ok1 := curves[i].Crossing(level, 5)
			got, ok2 := Crossing(h, i, level)
			if !ok1 || !ok2 || math.Abs(curves[i].At(got)-level) > 1e-3 || math.Abs(got-want) > 0.2 {
				t.Errorf("crossing at %g, %v, want %g, %v", got, ok2, want, ok1)
			}
		}
	}
}

// Derivatives by difference, against those of y0' = −2 y0 + y1 + 3 t, y1' = y0 y1 by hand.
func TestDenseDerivatives(t *testing.T) {
	d := &Dense{Tolerance: 1, F: func(at float64, y, f []float64) error {
		f[0], f[1] = -2*y[0]+y[1]+3*at, y[0]*y[1]
		return nil
	}}
	y, f, ft := []float64{5, 7}, make([]float64, 2), make([]float64, 2)
	if err := d.Linearise(2, 0.5, y, f, ft); err != nil {
		t.Fatal(err)
	}
	near(t, "f", f[0], 3, 1e-12)
	near(t, "f", f[1], 35, 1e-12)
	near(t, "∂f/∂t", ft[0], 3, 1e-9)
	near(t, "∂f/∂t", ft[1], 0, 1e-9)
	// (10 − J) (1, 1) = (10 + 2 − 1, 10 − 7 − 5)
	b := []float64{11, -2}
	d.Factor(10)
	d.Solve(b)
	near(t, "solution", b[0], 1, 1e-9)
	near(t, "solution", b[1], 1, 1e-9)
}

// The errors of the function, and a matrix that cannot be solved with.
func TestDenseErrors(t *testing.T) {
	broken := errors.New("broken")
	d := &Dense{Tolerance: 1, Valid: func([]float64) error { return nil }, F: func(float64, []float64, []float64) error { return broken }}
	if err := d.Linearise(0, 1, []float64{1}, []float64{0}, []float64{0}); !errors.Is(err, broken) {
		t.Error(err)
	}
	d = &Dense{Tolerance: 1, F: func(_ float64, y, f []float64) error { f[0], f[1] = y[0], y[0]; return nil }}
	if err := d.Linearise(0, 1, []float64{1, 1}, make([]float64, 2), make([]float64, 2)); err != nil {
		t.Fatal(err)
	}
	d.Factor(0)
	b := []float64{1, 2}
	if d.Solve(b); !math.IsNaN(d.Norm(b)) {
		t.Errorf("a singular matrix gave %v", b)
	}
}

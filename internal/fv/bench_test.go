package fv

import (
	"fmt"
	"math"
	"testing"

	"example.com/coolward/internal/rosenbrock"
)

// A benchmark is a reference problem of our own with 200 cells. What is reported beside the time is the error in time at the
// ends of the body, at ten equal times, against a solution with a tolerance of 1 µK.
type benchmark struct {
	name              string
	start, low, high  float64
	kinks             []float64
	end               float64
	materials         []Material
	grid              *Grid
	surface, opposite Exchange
	implicit          bool
}

const stefanBoltzmann = 5.670374419e-8 // W/(m² K⁴), CODATA 2018

// polynomial has k = Σ k_i x^i and c = Σ c_i x^i with x in °C.
func polynomial(density float64, k, c []float64) Material {
	value := func(a []float64, x float64) (y float64) {
		for i := len(a) - 1; i >= 0; i-- {
			y = y*x + a[i]
		}
		return y
	}
	integral := func(x float64) (y float64) {
		for i := len(c) - 1; i >= 0; i-- {
			y = (y + c[i]/float64(i+1)) * x
		}
		return y
	}
	return Material{
		Density:      density,
		Conductivity: func(T float64) (float64, error) { return value(k, T-273.15), nil },
		SpecificHeat: func(T float64) (float64, error) { return value(c, T-273.15), nil },
		Enthalpy:     func(T float64) (float64, error) { return integral(T - 273.15), nil },
		Temperature: func(h float64) (float64, error) {
			x := 300.0
			for range 20 {
				x -= (integral(x) - h) / value(c, x)
			}
			return x + 273.15, nil
		},
	}
}

func benchmarks() []benchmark {
	fire := func(t float64) float64 { return 293.15 + 345*math.Log10(8*t/60+1) }
	plain := func(k, density, c float64) Material { return polynomial(density, []float64{k}, []float64{c}) }
	return []benchmark{
		{
			name: "linear slab", start: 900, low: 290, high: 910, end: 600, materials: []Material{plain(40, 7850, 480)},
			grid: Slab(0.05, 1, 200), surface: Exchange{Coefficient: 500, Ambient: 300},
		},
		{
			name: "steel sphere", start: 1073.15, low: 280, high: 1200, end: 3600,
			materials: []Material{polynomial(7850, []float64{54, -0.0333}, []float64{425, 0.773, -1.69e-3, 2.22e-6})},
			grid:      Sphere(0.025, 200), surface: Exchange{Steady: true, Function: func(_, T float64) (float64, error) {
				d := T - 293.15
				return 1.3*math.Sqrt(math.Sqrt(math.Abs(d)/0.05))*d + 0.8*stefanBoltzmann*(T*T*T*T-math.Pow(293.15, 4)), nil
			}},
		},
		{
			name: "freezing slab", start: 283.15, low: 242, high: 285, end: 18000, kinks: []float64{water.at}, implicit: true,
			materials: []Material{water.material()}, grid: Slab(0.025, 1, 200), surface: Exchange{Coefficient: 30, Ambient: 243.15},
		},
		{
			name: "layered wall in a fire", start: 293.15, low: 280, high: 1500, end: 7200,
			materials: []Material{plain(45, 7850, 600), plain(0.15, 300, 1000), plain(1.4, 2300, 900)},
			grid: NewGrid(Geometry{Factor: 1}, []Part{
				{Length: 0.01, Cells: 40},
				{Length: 0.05, Cells: 80},
				{Length: 0.1, Cells: 80},
			}),
			surface: Exchange{Coefficient: 9, Ambient: 293.15},
			opposite: Exchange{Function: func(t, T float64) (float64, error) {
				g := fire(t)
				return 25*(T-g) + 0.7*stefanBoltzmann*(T*T*T*T-g*g*g*g), nil
			}},
		},
	}
}

func (p *benchmark) tables(b *testing.B) (tables []*Table) {
	for _, m := range p.materials {
		t, err := NewTable(m, p.start, p.low, p.high, p.kinks, 1e-5)
		if err != nil {
			b.Fatal(err)
		}
		tables = append(tables, t)
	}
	return tables
}

func (p *benchmark) solve(b *testing.B, tables []*Table, tolerance float64) (T [10][2]float64, st rosenbrock.Statistics) {
	sys, err := NewSystem(Model{
		Grid: p.grid, Tables: tables, Surface: Face{Exchange: p.surface}, Opposite: Face{Exchange: p.opposite}, Tolerance: tolerance,
	})
	if err != nil {
		b.Fatal(err)
	}
	integrate := rosenbrock.Integrate
	if p.implicit {
		integrate = rosenbrock.IntegrateImplicit
	}
	h, st, err := integrate(sys, sys.Start(), rosenbrock.Options{
		End: p.end, MaxStep: p.end, MaxSteps: 100000,
		Accepted: func(float64, []float64, float64) (bool, error) { return false, nil },
	})
	if err != nil {
		b.Fatal(err)
	}
	for i := range T {
		k, s := h.Find(p.end * float64(i+1) / 10)
		for j, node := range [2]int{0, len(p.grid.Nodes) - 1} {
			T[i][j] = sys.NodeTemperature(node, Latest, h.Value(k, s, sys.Index(node)))
		}
	}
	return T, st
}

func BenchmarkProblems(b *testing.B) {
	for _, p := range benchmarks() {
		tables := p.tables(b)
		tight := 1e-6
		if p.implicit {
			tight = 1e-3
		}
		exact, _ := p.solve(b, tables, tight)
		for _, tolerance := range []float64{1, 0.1, 0.01} {
			b.Run(fmt.Sprintf("%s/%g K", p.name, tolerance), func(b *testing.B) {
				b.ReportAllocs()
				var got [10][2]float64
				var st rosenbrock.Statistics
				for b.Loop() {
					got, st = p.solve(b, tables, tolerance)
				}
				worst := 0.0
				for i := range got {
					for j := range got[i] {
						worst = max(worst, math.Abs(got[i][j]-exact[i][j]))
					}
				}
				b.ReportMetric(1e3*worst, "mK-error")
				b.ReportMetric(float64(st.Steps), "steps")
				b.ReportMetric(float64(st.Evaluations), "evaluations")
			})
		}
	}
}

func BenchmarkTable(b *testing.B) {
	for _, p := range benchmarks() {
		b.Run(p.name, func(b *testing.B) {
			for b.Loop() {
				p.tables(b)
			}
			b.ReportMetric(float64(p.tables(b)[0].Size()), "intervals")
		})
	}
}

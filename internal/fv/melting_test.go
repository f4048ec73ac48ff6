package fv

import (
	"math"
	"testing"

	"example.com/coolward/internal/rosenbrock"
)

// melting has constant properties on both sides of a melting point, at which the enthalpy jumps. There it is that of
// the solid, and its inverse is the melting point over the whole jump.
type melting struct{ density, at, latent, cs, cl, ks, kl float64 }

func (m melting) material() Material {
	pick := func(T, solid, liquid float64) float64 {
		if T <= m.at {
			return solid
		}
		return liquid
	}
	return Material{
		Density:      m.density,
		Conductivity: func(T float64) (float64, error) { return pick(T, m.ks, m.kl), nil },
		SpecificHeat: func(T float64) (float64, error) { return pick(T, m.cs, m.cl), nil },
		Enthalpy: func(T float64) (float64, error) {
			return m.cs*min(T-m.at, 0) + m.cl*max(T-m.at, 0) + pick(T, 0, m.latent), nil
		},
		Temperature: func(h float64) (float64, error) {
			return m.at + min(h, 0)/m.cs + max(h-m.latent, 0)/m.cl, nil
		},
	}
}

var water = melting{density: 1000, at: 273.15, latent: 334e3, cs: 2000, cl: 4200, ks: 2.2, kl: 0.6}

// Temperature and potential stand still over the range of enthalpy at the melting point, and so do their derivatives;
// on both sides they are the straight lines of the constants. The start may be the melting point itself.
func TestMeltingPoint(t *testing.T) {
	m := water
	for _, start := range []float64{260, 273.15, 280} {
		tb, err := NewTable(m.material(), start, 250, 290, []float64{m.at}, 1e-6)
		if err != nil {
			t.Fatal(err)
		}
		zero, _ := m.material().Enthalpy(start)
		melt := -m.density * zero // u of the solid at the melting point
		if tb.Constant() {
			t.Errorf("start %g K: recognised as constant", start)
		}
		if got := tb.Temperature(0); got != start {
			t.Errorf("start %g K: T(0) = %.17g", start, got)
		}
		origin := tb.phiAt(melt)
		for _, c := range []struct{ u, T, phi, slope, rise float64 }{
			{melt - 2e7, m.at - 10, -m.ks * 10, 1 / (m.density * m.cs), m.ks / (m.density * m.cs)},
			{melt - 1, m.at - 5e-7, -m.ks * 5e-7, 1 / (m.density * m.cs), m.ks / (m.density * m.cs)},
			{melt + 1, m.at, 0, 0, 0},
			{melt + 1e8, m.at, 0, 0, 0},
			{melt + 3.34e8 - 1, m.at, 0, 0, 0},
			{melt + 3.34e8 + 4.2e6, m.at + 1, m.kl, 1 / (m.density * m.cl), m.kl / (m.density * m.cl)},
		} {
			if got := tb.Temperature(c.u); math.Abs(got-c.T) > 1e-9 {
				t.Errorf("start %g K: T(%g) = %.12g, want %.12g to 1e-9", start, c.u, got, c.T)
			}
			if got := tb.phiAt(c.u) - origin; math.Abs(got-c.phi) > 1e-8 {
				t.Errorf("start %g K: Φ(%g) = %.12g, want %.12g to 1e-8", start, c.u, got, c.phi)
			}
			var phi, dphi, dT [1]float64
			tb.slopes([]float64{c.u}, []float64{1}, phi[:], dphi[:], dT[:])
			if math.Abs(dT[0]-c.slope) > 1e-15 || math.Abs(dphi[0]-c.rise) > 1e-15 {
				t.Errorf("start %g K at %g: dT/du = %g and dΦ/du = %g, want %g and %g", start, c.u, dT[0], dphi[0], c.slope, c.rise)
			}
		}
	}
}

// neumann is the solution of F. Neumann for freezing from a surface held at a temperature: the front is at 2 λ √(αs t), and
// the heat that has left per area is 2 ks (Tm − T0) √t / (erf λ √(π αs)) (H. S. Carslaw and J. C. Jaeger, Conduction of
// Heat in Solids, 2nd ed., section 11.2, equations (12) to (15), from memory).
func (m melting) neumann(surface, start float64) (lambda, heat float64) {
	as, al := m.ks/(m.density*m.cs), m.kl/(m.density*m.cl)
	r := math.Sqrt(as / al)
	low, high := 1e-6, 5.0
	for range 200 {
		l := (low + high) / 2
		f := math.Exp(-l*l)/math.Erf(l) -
			m.kl/m.ks*r*(start-m.at)/(m.at-surface)*math.Exp(-l*l*r*r)/math.Erfc(l*r) -
			l*m.latent*math.Sqrt(math.Pi)/(m.cs*(m.at-surface))
		if f > 0 {
			low = l
		} else {
			high = l
		}
	}
	lambda = (low + high) / 2
	return lambda, 2 * m.ks * (m.at - surface) / (math.Erf(lambda) * math.Sqrt(math.Pi*as))
}

// Freezing of water at 280 K from a surface at 258 K (a coefficient so large that it adds 2e-7 m of ice), in a slab so deep
// that its far end does not matter, against Neumann's solution: the heat to 0.1 %, and the temperature in the ice.
func TestNeumannProblem(t *testing.T) {
	const surface, start, end, depth = 258.0, 280.0, 3600.0, 0.15
	tb, err := NewTable(water.material(), start, 250, 290, []float64{water.at}, 1e-6)
	if err != nil {
		t.Fatal(err)
	}
	lambda, heat := water.neumann(surface, start)
	as := water.ks / (water.density * water.cs)
	for _, tolerance := range []float64{1, 0.1} {
		sys, err := NewSystem(Model{
			Grid: Slab(depth, 1, 300), Tables: []*Table{tb},
			Surface: Face{Exchange: Exchange{Coefficient: 1e7, Ambient: surface}}, Tolerance: tolerance,
		})
		if err != nil {
			t.Fatal(err)
		}
		hist, st, err := rosenbrock.IntegrateImplicit(sys, sys.Start(), rosenbrock.Options{
			End: end, MaxStep: end, MaxSteps: 10000,
			Accepted: func(float64, []float64, float64) (bool, error) { return false, nil },
		})
		if err != nil {
			t.Fatal(err)
		}
		n := len(sys.Grid.Nodes)
		y := hist.State(hist.Steps())
		if got, want := y[n], heat*math.Sqrt(end); math.Abs(got/want-1) > 1e-3 {
			t.Errorf("tolerance %g K: heat %.6g J, want %.6g J to 0.1 %%", tolerance, got, want)
		}
		for i, x := range sys.Grid.Nodes {
			z := (depth - x) / (2 * math.Sqrt(as*end))
			if z < 0.9*lambda {
				want := surface + (water.at-surface)*math.Erf(z)/math.Erf(lambda)
				if got := sys.NodeTemperature(i, Latest, y[i]); math.Abs(got-want) > 0.1 {
					t.Errorf("tolerance %g K, %g m deep: %.6g K, want %.6g K to 0.1 K", tolerance, depth-x, got, want)
				}
			}
		}
		if lost := math.Abs(sys.Balance(y)); lost > 1e-10*y[n] {
			t.Errorf("tolerance %g K: %g J are missing of %g J", tolerance, lost, y[n])
		}
		t.Logf("tolerance %g K: heat off by %.2g, %+v", tolerance, y[n]/(heat*math.Sqrt(end))-1, st)
	}
}

package fdm_test

import (
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A mode of a wall between two faces, which dies away as e^(−λ² α t) and keeps its form: φ(r) over the radius, with
// its slope (H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., sections 3.9, 7.10 and 9.4, from
// memory). Coefficients at both faces follow from it.
type mode struct {
	body    shape.Body
	a, b    float64 // radii of the inner and outer face
	lambda  float64
	phi     func(r float64) float64
	slope   func(r float64) float64
	inwards bool // the surface is the inner face
}

func modes() map[string]mode {
	const a, b, lambda, c = 0.05, 0.1, 30.0, 0.08
	wide := 30.0
	cylinder := func(r float64) float64 {
		return math.J0(lambda*r)*math.Y1(lambda*c) - math.J1(lambda*c)*math.Y0(lambda*r)
	}
	cylinderSlope := func(r float64) float64 {
		return lambda * (-math.J1(lambda*r)*math.Y1(lambda*c) + math.J1(lambda*c)*math.Y1(lambda*r))
	}
	sphere := func(r float64) float64 { return math.Cos(wide*(r-0.09)) / r }
	sphereSlope := func(r float64) float64 {
		return -wide*math.Sin(wide*(r-0.09))/r - math.Cos(wide*(r-0.09))/(r*r)
	}
	tube := shape.Tube(metres(2*b), metres(2*a), metres(1))
	shell := shape.HollowSphere(metres(2*b), metres(2*a))
	return map[string]mode{
		"plate": {
			body: sheet(b - a), a: a, b: b, lambda: lambda,
			phi:   func(r float64) float64 { return math.Cos(lambda * (r - c)) },
			slope: func(r float64) float64 { return -lambda * math.Sin(lambda*(r-c)) },
		},
		"tube":                          {body: tube.Exposing(shape.Inside | shape.Outside), a: a, b: b, lambda: lambda, phi: cylinder, slope: cylinderSlope},
		"tube from inside":              {body: tube.Exposing(shape.Inside), a: a, b: b, lambda: lambda, phi: cylinder, slope: cylinderSlope, inwards: true},
		"hollow sphere":                 {body: shell, a: a, b: b, lambda: wide, phi: sphere, slope: sphereSlope},
		"hollow sphere from the inside": {body: shell.Exposing(shape.Inside), a: a, b: b, lambda: wide, phi: sphere, slope: sphereSlope, inwards: true},
	}
}

// Order 4 in space, of what is extrapolated from order 2, with both faces exposed to different coefficients, for walls of all forms, from both sides.
func TestOrderOfWalls(t *testing.T) {
	for name, m := range modes() {
		const k, alpha, time = 1.0, 1e-6, 800.0
		outer, inner := -k*m.slope(m.b)/m.phi(m.b), k*m.slope(m.a)/m.phi(m.a)
		if !(outer > 0 && inner > 0) {
			t.Fatalf("%s: coefficients %g and %g", name, outer, inner)
		}
		surface, opposite := outer, inner
		radius := func(depth float64) float64 { return m.b - depth }
		if m.inwards {
			surface, opposite = inner, outer
			radius = func(depth float64) float64 { return m.a + depth }
		}
		scale := 100 / m.phi(0.08)
		exact := func(depth, t float64) float64 {
			return 300 + scale*m.phi(radius(depth))*math.Exp(-m.lambda*m.lambda*alpha*t)
		}
		places := []float64{0, 0.0125, 0.025, 0.05}
		errors := func(cells int) (e [4]float64) {
			p := fdm.Problem{
				Body: m.body, Material: plain{1000, 1000, k}, Surface: constant(surface, 300), Opposite: constant(opposite, 300),
				Horizon: seconds(time), Cells: cells, Uniform: true, Tolerance: units.KelvinDifference.Of(1e-8),
				Profile: func(depth units.Length) (units.Temperature, error) { return kelvin(exact(depth.SI(), 0)), nil },
			}
			s := solve(t, p)
			balanced(t, name, s)
			for i, depth := range places {
				got := at(t, s, shape.Below(metres(depth)), time)
				e[i] = got - exact(depth, time)
				// The values at the start are those at nodes, so that the estimate holds at nodes.
				if tol := estimate(t, s, shape.Below(metres(depth)), time); !near(e[i], 0, 1.2*tol) {
					t.Errorf("%s, %d cells, depth %g m: off by %g K, estimate %g K", name, cells, depth, e[i], tol)
				}
			}
			return e
		}
		e1, e2, e3 := errors(20), errors(40), errors(80)
		for i, depth := range places {
			for j, p := range []float64{math.Log2(e1[i] / e2[i]), math.Log2(e2[i] / e3[i])} {
				if i == 1 && j == 0 {
					continue // no node of the coarsest grid
				}
				if !(p > 3.8) {
					t.Errorf("%s, depth %g m: order %.3f from errors %g, %g, %g K, want 3.8 or more", name, depth, p, e1[i], e2[i], e3[i])
				}
			}
		}
	}
}

// Order 4, of what is extrapolated from order 2, on graded cells, less towards the centre of a cylinder or a sphere, with a conductivity that rises with temperature and a source that makes the solution
// T = 400 K + 100 K (1 − r²/2R²) (1 + sin(t/τ))/2 true, for plate, cylinder and sphere.
func TestManufactured(t *testing.T) {
	const R, tau, k0, beta, capacity = 0.1, 3000.0, 1.0, 2e-3, 1e6
	m := polynomial{1000, []float64{k0 * (1 - beta*(400-273.15)), k0 * beta}, []float64{1000}, 250, 800}
	swing := func(t float64) (f, rate float64) {
		return (1 + math.Sin(t/tau)) / 2, math.Cos(t/tau) / (2 * tau)
	}
	exact := func(r, t float64) float64 {
		f, _ := swing(t)
		return 400 + 100*(1-r*r/(2*R*R))*f
	}
	for n, body := range []shape.Body{bodies["plate"][1], bodies["cylinder"][0], shape.Sphere(metres(2 * R))} {
		errors := func(cells int) (e [3]float64) {
			p := fdm.Problem{
				Body: body, Material: m, Horizon: seconds(8000), Cells: cells, Tolerance: units.KelvinDifference.Of(1e-7),
				Profile: func(depth units.Length) (units.Temperature, error) { return kelvin(exact(R-depth.SI(), 0)), nil },
				Source: func(depth units.Length, time units.Duration, _ units.Temperature) (units.HeatSource, error) {
					r := R - depth.SI()
					f, rate := swing(time.SI())
					k := k0 * (1 + beta*(exact(r, time.SI())-400))
					slope, bend := -100*r/(R*R)*f, -100/(R*R)*f
					conduction := k*bend*float64(n+1) + k0*beta*slope*slope
					return units.WattPerCubicMetre.Of(capacity*100*(1-r*r/(2*R*R))*rate - conduction), nil
				},
				Surface: exchange(func(time, _ float64) float64 {
					f, _ := swing(time)
					return k0 * (1 + beta*(exact(R, time)-400)) * 100 / R * f
				}),
			}
			s := solve(t, p)
			balanced(t, body.String(), s)
			for i, x := range []float64{0, 0.64, 1} { // nodes of all grids
				e[i] = at(t, s, below(x), 8000) - exact(R*x, 8000)
			}
			return e
		}
		e1, e2, e3 := errors(20), errors(40), errors(80)
		for i := range e1 {
			if i == 1 {
				continue // between nodes: the error of the interpolation adds, of a higher order
			}
			for _, p := range []float64{math.Log2(e1[i] / e2[i]), math.Log2(e2[i] / e3[i])} {
				if !(p > 2.8) {
					t.Errorf("%v: order %.3f from errors %g, %g, %g K, want 2.8 or more", body, p, e1[i], e2[i], e3[i])
				}
			}
		}
	}
}

// A small cell at the surface meets the first moments: a sudden change at Fo = 1e-6 to 1e-3 against that of a half
// space, T = T∞ + ΔT e^(z²) erfc(z), z = h √(αt)/k (Carslaw and Jaeger, section 2.7, from memory).
func TestSmallestCell(t *testing.T) {
	p := scaled(10, 0)
	p.Body, p.Smallest, p.Horizon = bodies["plate"][0], metres(1e-5), seconds(10)
	s := solve(t, p)
	for _, time := range []float64{0.01, 0.1, 1, 10} {
		z := 100 * math.Sqrt(1e-6*time)
		want := 300 + 100*math.Exp(z*z)*math.Erfc(z)
		if got := at(t, s, shape.Surface(), time); !near(got, want, 0.02) {
			t.Errorf("surface after %g s: %.5f K, want %.5f K", time, got, want)
		}
	}
	if cells := s.Statistics().Cells; cells < 100 || cells > 400 {
		t.Errorf("%d cells", cells)
	}
}

// Random walls: layers, contacts, faces, lumps and steps of the surroundings. No temperature lies beyond those that the
// wall starts from or touches (the maximum principle), and the heat is accounted for.
func TestLawsOfWalls(t *testing.T) {
	law := func(seed [12]uint16) bool {
		u := func(i int) float64 { return float64(seed[i]) / math.MaxUint16 }
		between := func(i int, low, high float64) float64 { return low * math.Pow(high/low, u(i)) }
		T := func(i int) float64 { return 250 + 500*u(i) }
		d1, d2 := between(0, 1e-3, 0.1), between(1, 1e-3, 0.1)
		whole := metres(d1 + d2)
		inner := metres(between(2, 1e-3, 1))
		outer := units.Metre.Of(inner.SI() + 2*whole.SI())
		body := []shape.Body{
			shape.Plate(whole, units.SquareMetre.Of(1)),
			shape.Tube(outer, inner, metres(1)).Exposing(shape.Inside | shape.Outside),
			shape.HollowSphere(outer, inner).Exposing(shape.Inside),
		}[seed[3]%3]
		whole = body.Thickness()
		material := func(i int) plain { return plain{between(i, 10, 8000), 1000, between(i+1, 0.03, 400)} }
		p := fdm.Problem{
			Body: body, Initial: kelvin(T(4)), Cells: 4 + int(seed[5]%40), Horizon: seconds(between(6, 1, 1e6)),
			Layers: []fdm.Layer{
				{Material: material(7), Thickness: metres(d1), Contact: units.SquareMetreKelvinPerWatt.Of(float64(seed[9]%2) * between(9, 1e-6, 1))},
				{Material: material(8), Thickness: units.Metre.Of(whole.SI() - d1)},
			},
		}
		hot := T(10)
		switch seed[10] % 3 {
		case 0:
			p.Surface = constant(between(11, 1, 1e5), hot)
		case 1:
			p.Surface = boundary.Temperature(kelvin(hot))
		case 2:
			p.Surface = boundary.Sum(boundary.Radiation(0.9, kelvin(hot)), constant(between(11, 0.1, 100), hot))
		}
		p.Opposite = constant(between(2, 1, 1e4), T(11))
		low, high := min(T(4), hot, T(11)), max(T(4), hot, T(11))
		if seed[11]%2 == 0 {
			p.OppositeLump = &fdm.Lump{
				HeatCapacity: units.JoulePerKelvin.Of(between(0, 1, 1e6)), Coefficient: units.WattPerSquareMetreKelvin.Of(between(1, 1, 1e4)), Initial: kelvin(T(7)),
			}
			low, high = min(low, T(7)), max(high, T(7))
		}
		s, err := p.Solve(t.Context())
		if err != nil {
			t.Logf("%v: %+v", err, p)
			return false
		}
		ok := s.EnergyBalance() <= 1e-11
		const tol = 5e-3 // five times the tolerance of a step
		for i := range 21 {
			time := s.Horizon().SI() * math.Pow(float64(i)/20, 3)
			for _, x := range []float64{0, 0.1, 0.5, 0.9, 1} {
				T := at(t, s, shape.Below(whole.Scale(x)), time)
				ok = ok && T >= low-tol && T <= high+tol
			}
		}
		if !ok {
			t.Logf("balance %g, range %g to %g K: %+v", s.EnergyBalance(), low, high, p)
		}
		return ok
	}
	if err := quick.Check(law, &quick.Config{MaxCount: 60}); err != nil {
		t.Error(err)
	}
}

package lumped

import (
	"math"
	"testing"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

func closeTo(r derivation.Record, symbol string, want float64) bool {
	v, ok := r.Value(symbol)
	if !ok {
		return false
	}
	return math.Abs(v.SI()-want) <= 1e-9*math.Abs(want)
}

// The resistance inside, mean to surface, in lengths: L/3, R/4 and R/5 for the three solid bodies (the first order of the
// eigenvalue, ζ² = m Bi (1 − Bi/(m + 2)) with m = 1, 2, 3, from the series of ζ tan ζ = Bi, ζ J1/J0 = Bi and 1 − ζ cot ζ =
// Bi; the tests of hollow bodies check the others against finite volumes).
func TestResistanceInside(t *testing.T) {
	for _, body := range exactBodies {
		m := body.ratio
		p := newProfile(body.body)
		within(t, body.name, p.resistance, 0.01/(m+2), 1e-15)
		within(t, body.name+": centre above surface", p.centre-p.surface, 0.01/2, 1e-15)
		bi := 1e-4
		within(t, body.name+": decay", body.modes(bi).Decay(), m*bi*(1-bi*100*p.resistance), 2*m*bi*bi*bi)
	}
	// Product of plates: along each edge the profile of a plate, and all flow through a mean of the faces.
	l := 0.01
	cube := newProfile(shape.Brick(units.Metre.Of(2*l), units.Metre.Of(2*l), units.Metre.Of(2*l)))
	within(t, "cube", cube.resistance, l/3, 1e-15)
	within(t, "cube, centre above mean", cube.centre, l/2, 1e-15)
	within(t, "middle of a face of a cube above mean", cube.surface, 0, 1e-15)
	unknown := newProfile(shape.Measured(units.CubicMetre.Of(8*l*l*l), units.SquareMetre.Of(24*l*l)))
	within(t, "as a cube", unknown.resistance, cube.resistance, 1e-15)
}

// To first order in the Biot number: against the exact series the mean is off by Bi²-terms, and the centre by a fifth of what
// the lumped one is off, up to a Biot number of 1.
func TestFirstOrder(t *testing.T) {
	for _, body := range exactBodies {
		for _, bi := range []float64{0.001, 0.01, 0.1, 0.3, 1} {
			lumped := withBiot(t, body.body, bi)
			p := lumped.problem
			p.FirstOrder = true
			s, exact := solve(t, p), body.modes(bi)
			var worst, plain [3]float64
			for e := -4.0; e < 5; e += 0.02 {
				fo := math.Pow(10, e)
				for i, c := range []struct {
					place shape.Place
					theta func(fo float64) float64
				}{{shape.Centre(), exact.Centre}, {shape.Surface(), exact.Surface}, {shape.Mean(), exact.Mean}} {
					got, err := s.At(c.place, seconds(100*fo))
					if err != nil {
						t.Fatal(err)
					}
					simple, _ := lumped.At(c.place, seconds(100*fo))
					worst[i] = max(worst[i], math.Abs(got.SI()-300-c.theta(fo)))
					plain[i] = max(plain[i], math.Abs(simple.SI()-300-c.theta(fo)))
				}
			}
			for i, part := range []float64{0.22, 0.75, 0.25 * bi} {
				if worst[i] > part*plain[i]+1e-13 {
					t.Errorf("%s, Bi %g, place %d: off by %g, lumped by %g", body.name, bi, i, worst[i], plain[i])
				}
			}
			for i, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
				e, err := s.LumpingError(place)
				if err != nil || e.SI() < worst[i]-1e-12 || e.SI() > 1.1*worst[i]+1e-12 {
					t.Errorf("%s, Bi %g, %v: bound %v, %v, error %g", body.name, bi, place, e, err, worst[i])
				}
			}
			if !s.LumpingErrorIsBound() {
				t.Error("no bound")
			}
			// The time, and its error, for the centre to lose half.
			got, err := s.TimeTo(shape.Slowest(), kelvin(300.5))
			if err != nil {
				t.Fatal(err)
			}
			at, _ := s.At(shape.Centre(), got)
			within(t, body.name+": at the time", at.SI(), 300.5, 1e-10)
			late, err := s.LumpingErrorInTime(shape.Centre(), kelvin(300.5))
			if err != nil {
				t.Fatal(err)
			}
			within(t, body.name+": exact at the time corrected", exact.Centre(got.Add(late).SI()/100), 0.5, 1e-9)
			if p := exact.Centre(got.SI() / 100); math.Abs(p-0.5) > 0.06*bi {
				t.Errorf("%s, Bi %g: θ = %g where half is left to first order", body.name, bi, p)
			}
		}
	}
}

// With an exchange that is no straight line the surface is where the exchange and the resistance inside agree.
func TestFirstOrderWithRadiation(t *testing.T) {
	p := Problem{
		Body: sphere(0.04), Material: constantStuff(2000, 1000, 0.8), Initial: kelvin(900), Horizon: seconds(2000), FirstOrder: true,
		Surface: boundary.Radiation(0.9, kelvin(300)),
	}
	s := solve(t, p)
	for _, at := range []float64{300, 800, 2000} {
		mean, err1 := s.Mean(seconds(at))
		wall, err2 := s.At(shape.Surface(), seconds(at))
		centre, err3 := s.At(shape.Centre(), seconds(at))
		q, err4 := p.Surface.Flux(seconds(at), wall)
		if err1 != nil || err2 != nil || err3 != nil || err4 != nil {
			t.Fatal(err1, err2, err3, err4)
		}
		set := -math.Expm1(-s.inside.rate * at) // until it is 1 the exchange goes by a surface that is colder
		allowed := 0.4*(1-set)*q.SI()*0.02/2/0.8 + 1e-9
		within(t, "q R/5k", mean.Sub(wall).SI(), set*q.SI()*0.02/5/0.8, allowed)
		within(t, "q R/2k", centre.Sub(wall).SI(), set*q.SI()*0.02/2/0.8, allowed)
		d, err := s.InternalDifference(seconds(at))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "internal difference", d.SI(), q.SI()*0.02/2/0.8, allowed)
	}
	for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Below(units.Millimetre.Of(5))} {
		target := kelvin(600)
		got, err := s.TimeTo(place, target)
		at, _ := s.At(place, got)
		if err != nil || math.Abs(at.SI()-600) > 1e-9 {
			t.Errorf("%v: %v, %v, where it is at %v", place, got, err, at)
		}
	}
}

// The internal difference against the exact series at a late time and a small Biot number.
func TestInternalDifference(t *testing.T) {
	const bi = 0.02
	for _, body := range exactBodies {
		s, exact := withBiot(t, body.body, bi), body.modes(bi)
		at := seconds(100 * 1.0) // Fo = 1
		d, err := s.InternalDifference(at)
		if err != nil {
			t.Fatal(err)
		}
		want := exact.Centre(1) - exact.Surface(1)
		within(t, body.name, d.SI(), want, 0.01*want)
	}
}

// In products of bodies the bound holds, and is at most 5 % above the largest error.
func TestLumpingErrorOfProducts(t *testing.T) {
	mm := units.Millimetre.Of
	for _, c := range []struct {
		name string
		body shape.Body
	}{
		{"cube", shape.Brick(mm(20), mm(20), mm(20))},
		{"brick", shape.Brick(mm(20), mm(50), mm(30))},
		{"short cylinder", shape.Cylinder(mm(20), mm(25))},
		{"disc", shape.Cylinder(mm(60), mm(20))},
	} {
		for _, bi := range []float64{0.001, 0.02, 0.2, 2, 10} { // with 10 mm
			s := withBiot(t, c.body, bi)
			if !s.LumpingErrorIsBound() {
				t.Errorf("%s: no bound", c.name)
			}
			var modes []eigen.Solution
			var ratios []float64
			for _, f := range c.body.Factors() {
				r := f.ConductionLength().SI() / 0.01
				ratios = append(ratios, 1/r/r)
				if f.Family() == shape.Cylindrical {
					modes = append(modes, eigen.NewCylinder(bi*r))
				} else {
					modes = append(modes, eigen.NewPlate(bi*r))
				}
			}
			for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
				bound, err := s.LumpingError(place)
				if err != nil {
					t.Fatal(err)
				}
				worst := 0.0
				for e := -9.0; e < 5; e += 0.01 {
					fo := math.Pow(10, e)
					theta := 1.0
					for i, m := range modes {
						x := 0.0
						if i == 0 && place == shape.Surface() {
							x = 1
						}
						if place.IsMean() {
							theta *= m.Mean(fo * ratios[i])
						} else {
							theta *= m.At(x, fo*ratios[i])
						}
					}
					at, _ := s.At(place, seconds(100*fo))
					worst = max(worst, math.Abs(theta-(at.SI()-300)))
				}
				if bound.SI() < worst-1e-12 || bound.SI() > 1.05*worst {
					t.Errorf("%s, Bi %g, %v: bound %v, largest error %g", c.name, bi, place, bound, worst)
				}
			}
		}
	}
}

// With heat inside and with an ambient that drifts the bound holds: against the exact answers to both, which are integrals of θ over
// the Fourier number (Duhamel's theorem).
func TestLumpingErrorWithSourceAndDrift(t *testing.T) {
	for _, body := range exactBodies {
		for i, bi := range []float64{0.01, 0.01, 0.3, 0.3, 3, 3} {
			source, slope := 4000.0, 0.0 // W/m³, K/s, with ρ c = 2e6 J/(m³ K)
			if i%2 == 1 {
				source, slope = 0, -0.002
			}
			start := 300 + 1e-3*bi
			p := Problem{
				Body: body.body, Material: constantStuff(2000, 1000, 2), Initial: kelvin(start), Horizon: seconds(1e5),
				Surface: boundary.Following(units.WattPerSquareMetreKelvin.Of(bi*2/0.01), boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(slope))),
				Source:  units.WattPerCubicMetre.Of(source),
			}
			s, exact := solve(t, p), body.modes(bi)
			if !s.LumpingErrorIsBound() {
				t.Error(body.name, "no bound")
			}
			for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
				bound, err := s.LumpingError(place)
				if err != nil {
					t.Fatal(err)
				}
				worst := 0.0
				for e := -3.0; e < 3; e += 0.05 {
					fo := math.Pow(10, e)
					x, theta, integral := 0.0, exact.Centre(fo), 0.0
					switch place {
					case shape.Surface():
						x, theta = 1, exact.Surface(fo)
					case shape.Mean():
						theta = exact.Mean(fo)
					}
					if integral = eigen.Integral(exact, x, fo); place.IsMean() {
						integral = eigen.IntegralOfMean(exact, fo)
					}
					seconds100 := 100 * fo // R²/α = 100 s
					want := 300 + (start-300)*theta + slope*(seconds100-100*integral) + source/2e6*100*integral
					at, err := s.At(place, seconds(seconds100))
					if err != nil {
						t.Fatal(err)
					}
					worst = max(worst, math.Abs(at.SI()-want))
				}
				if bound.SI() < worst || bound.SI() > 20*worst {
					t.Errorf("%s, Bi %g, %v: bound %v, largest error %g", body.name, bi, place, bound, worst)
				}
			}
		}
	}
}

// A step of the ambient counts like one at the start: against the exact answer to it.
func TestLumpingErrorOfAStep(t *testing.T) {
	for _, body := range exactBodies {
		const bi = 0.2
		h, exact := units.WattPerSquareMetreKelvin.Of(bi*2/0.01), body.modes(bi)
		room := boundary.Log([]units.Duration{seconds(0), seconds(500), seconds(500)}, []units.Temperature{kelvin(301), kelvin(301), kelvin(300)}).Holding()
		s := solve(t, Problem{
			Body: body.body, Material: constantStuff(2000, 1000, 2), Initial: kelvin(301), Horizon: seconds(1e4), Surface: boundary.Following(h, room),
		})
		bound, err := s.LumpingError(shape.Centre())
		if err != nil {
			t.Fatal(err)
		}
		worst := 0.0
		for fo := 0.01; fo < 90; fo *= 1.02 { // after the step, R²/α = 100 s
			at, err := s.At(shape.Centre(), seconds(500+100*fo))
			if err != nil {
				t.Fatal(err)
			}
			worst = max(worst, math.Abs(at.SI()-300-exact.Centre(fo)))
		}
		if bound.SI() < worst || bound.SI() > 1.05*worst {
			t.Errorf("%s: bound %v, largest error %g", body.name, bound, worst)
		}
	}
}

// The limit of a body whose specific heat varies, by the balance of what comes and goes: T∞ + (P (1/(h A) + r/(k A)) − q/h), where the
// resistance inside holds back what is made but not the surface.
func TestLimitToFirstOrder(t *testing.T) {
	body := sphere(0.04)
	p := Problem{
		Body: body, Material: stuff{rho: 2000, c0: 500, c1: 1, k0: 0.8, low: 200, high: 900}, Initial: kelvin(400), Horizon: seconds(100), FirstOrder: true,
		Surface: boundary.Sum(constant(20, 300), boundary.Flux(units.WattPerSquareMetre.Of(150))), Source: units.WattPerCubicMetre.Of(5e4),
	}
	s := solve(t, p)
	perArea := 5e4 * 0.04 / 6
	within(t, "limit", s.limit, 300+perArea*(1.0/20+0.02/5/0.8)-150.0/20, 1e-9)
}

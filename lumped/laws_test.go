package lumped

import (
	"context"
	"errors"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
	"gonum.org/v1/gonum/integrate/quad"
)

func coefficient(h float64) units.HeatTransferCoefficient {
	return units.WattPerSquareMetreKelvin.Of(h)
}
func difference(d float64) units.TemperatureDifference { return units.KelvinDifference.Of(d) }
func streaming(q float64) units.HeatFlux               { return units.WattPerSquareMetre.Of(q) }
func heating(q float64) units.HeatSource               { return units.WattPerCubicMetre.Of(q) }

// log is a course of readings with a step at 300 s and a bend at 100 s and 500 s.
func log() boundary.Course {
	times, temperatures := []units.Duration{}, []units.Temperature{}
	for _, r := range [][2]float64{{-50, 300}, {100, 330}, {300, 310}, {300, 360}, {500, 340}, {2000, 345}} {
		times, temperatures = append(times, seconds(r[0])), append(temperatures, kelvin(r[1]))
	}
	return boundary.Log(times, temperatures)
}

// closedCases are problems with a closed form, for a body with ρ c V/A = 2000 J/(m² K) and an area of 1.131 cm².
func closedCases() map[string]Problem {
	body := Problem{Body: sphere(0.006), Material: constantStuff(2000, 1000, 30), Initial: kelvin(400), Horizon: seconds(1500)}
	with := func(change func(p *Problem)) Problem {
		p := body
		change(&p)
		return p
	}
	sine := boundary.Oscillation(kelvin(320), difference(15), seconds(400), seconds(30))
	return map[string]Problem{
		"constant h": with(func(p *Problem) { p.Surface = constant(10, 300) }),
		"constant h, heat inside": with(func(p *Problem) {
			p.Surface, p.Source = constant(10, 300), heating(2e5)
		}),
		"two ambients and a flux": with(func(p *Problem) {
			p.Surface = boundary.Sum(constant(10, 300), constant(4, 350), boundary.Flux(streaming(-200)))
		}),
		"radiation, cooling":    with(func(p *Problem) { p.Surface = boundary.Radiation(0.8, kelvin(300)) }),
		"radiation, warming":    with(func(p *Problem) { p.Surface = boundary.Radiation(0.8, kelvin(900)) }),
		"radiation to the cold": with(func(p *Problem) { p.Surface = boundary.Radiation(0.8, kelvin(3)) }),
		"radiation, hot to far": with(func(p *Problem) {
			p.Initial, p.Surface = kelvin(1500), boundary.Radiation(0.8, kelvin(300))
		}),
		"two radiators and heat inside": with(func(p *Problem) {
			p.Surface, p.Source = boundary.Sum(boundary.Radiation(0.3, kelvin(300)), boundary.Radiation(0.5, kelvin(500))), heating(1e5)
		}),
		"natural convection": with(func(p *Problem) {
			p.Surface = boundary.Power(coefficient(8), difference(50), 0.25, kelvin(300))
		}),
		"natural convection, warming": with(func(p *Problem) {
			p.Surface = boundary.Power(coefficient(8), difference(50), 1.0/3, kelvin(500))
		}),
		"two powers": with(func(p *Problem) {
			p.Surface = boundary.Sum(boundary.Power(coefficient(8), difference(50), 0.25, kelvin(300)), boundary.Power(coefficient(3), difference(10), 0.25, kelvin(300)))
		}),
		"constant flux": with(func(p *Problem) { p.Surface = boundary.Flux(streaming(150)) }),
		"ramp": with(func(p *Problem) {
			p.Surface = boundary.Following(coefficient(10), boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(0.05)))
		}),
		"oscillation": with(func(p *Problem) { p.Surface = boundary.Following(coefficient(10), sine) }),
		"log":         with(func(p *Problem) { p.Surface = boundary.Following(coefficient(10), log()) }),
		"all that move": with(func(p *Problem) {
			p.Surface = boundary.Sum(boundary.Following(coefficient(6), log()), boundary.Following(coefficient(3), sine), constant(2, 310), boundary.Flux(streaming(-50)),
				boundary.Following(coefficient(1), boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(-0.01))))
			p.Source = heating(3e4)
		}),
		"plate with two faces that differ": with(func(p *Problem) {
			p.Body = shape.Plate(units.Millimetre.Of(2), units.SquareMetre.Of(0.01))
			p.Surface, p.Opposite = boundary.Following(coefficient(10), sine), constant(30, 350)
		}),
		"tube with two faces that differ": with(func(p *Problem) {
			p.Body = shape.Tube(units.Millimetre.Of(20), units.Millimetre.Of(16), units.Metre.Of(1))
			p.Surface, p.Opposite = constant(10, 300), boundary.Flux(streaming(-40))
		}),
		"first order in the Biot number": with(func(p *Problem) {
			p.Material, p.FirstOrder = constantStuff(2000, 1000, 0.5), true
			p.Surface = boundary.Sum(constant(50, 300), boundary.Flux(streaming(-100)))
			p.Source = heating(1e5)
		}),
	}
}

// Each closed form agrees with the integration of its exchange to 1e-9 K.
func TestClosedFormsAgainstIntegration(t *testing.T) {
	for name, p := range closedCases() {
		closed := solve(t, p)
		if closed.path != nil {
			t.Errorf("%s: integrated, want a closed form", name)
			continue
		}
		general := solve(t, notClosed(p, 1e-11))
		if general.path == nil {
			t.Fatal(name, "is not integrated")
		}
		for i := range 301 {
			at := p.Horizon.Scale(float64(i) / 300)
			want, err1 := general.At(shape.Centre(), at)
			got, err2 := closed.At(shape.Centre(), at)
			if err1 != nil || err2 != nil {
				t.Fatal(name, err1, err2)
			}
			within(t, name+" at "+at.String(), got.SI(), want.SI(), 1e-9)
			a, _ := closed.HeatReleased(at)
			b, _ := general.HeatReleased(at)
			within(t, name+": heat at "+at.String(), a.SI(), b.SI(), 1e-8*math.Abs(b.SI())+1e-6)
		}
		if general.IntegrationError().SI() > 2e-9 {
			t.Errorf("%s: integration error %v", name, general.IntegrationError())
		}
		within(t, name+": limit", closed.limit, general.limit, 1e-5)
	}
}

// Heat that leaves, as the integral of the exchange at the temperatures of the solution by other quadrature, is what the
// enthalpy loses and what is made inside.
func TestHeatOfClosedForms(t *testing.T) {
	for name, p := range closedCases() {
		s := solve(t, p)
		edges := []float64{0}
		for _, at := range s.exchange.breaks() {
			if at < p.Horizon.SI() {
				edges = append(edges, at)
			}
		}
		edges = append(edges, p.Horizon.SI())
		left := 0.0
		for i := 1; i < len(edges); i++ {
			left += quad.Fixed(func(x float64) float64 {
				at, err := s.Mean(seconds(x))
				if err != nil {
					t.Fatal(err)
				}
				out, err := s.exchange.out(x, at.SI())
				if err != nil {
					t.Fatal(err)
				}
				return out
			}, edges[i-1], edges[i], 200, nil, 0)
		}
		heat, err := s.HeatReleased(p.Horizon)
		if err != nil {
			t.Fatal(err)
		}
		first, last := p.Initial.SI(), 0.0
		if at, err := s.Mean(p.Horizon); err == nil {
			last = at.SI()
		}
		scale := s.content.capacity * 100
		within(t, name+": exchange", heat.SI(), left, 1e-11*scale)
		within(t, name+": enthalpy", heat.SI(), s.content.capacity*(first-last)+s.exchange.source*p.Horizon.SI(), 1e-11*scale)
	}
}

// TimeTo inverts the temperature to 1e-12 of the time, or to what a rounding of the temperature moves it by; for a course that
// comes back, the first time is not after the one asked for.
func TestTimesInvertTemperatures(t *testing.T) {
	r := rand.New(rand.NewSource(3))
	cases := closedCases()
	varying := ball()
	varying.Until = units.Temperature{}
	cases["natural convection and radiation"] = varying
	for name, p := range cases {
		s := solve(t, p)
		for range 200 {
			want := p.Horizon.SI() * math.Pow(r.Float64(), 3)
			at, err := s.At(shape.Centre(), seconds(want))
			if err != nil {
				t.Fatal(err)
			}
			if s.inside != nil { // the place overshoots its start; asked for below
				continue
			}
			got, err := s.TimeTo(shape.Centre(), at)
			rate, _ := s.Rate(got)
			rounding := 4e-16 * at.SI() / math.Abs(rate.SI())
			back, _ := s.At(shape.Centre(), got)
			switch {
			case err != nil && math.Abs(at.SI()-s.limit) < 1e-2: // the limit itself, to rounding
			case err != nil || got.SI() > want*(1+1e-12)+2*rounding:
				t.Errorf("%s: %v at %g s, reached at %v, %v", name, at, want, got, err)
			case got.SI() != 0 && math.Abs(back.SI()-at.SI()) > 1e-12*at.SI():
				t.Errorf("%s: %v reached at %v, where it is at %v", name, at, got, back)
			case s.moving == nil && math.Abs(got.SI()-want) > 1e-12*want+2*rounding:
				t.Errorf("%s: %v at %g s, back at %v, rounding %g", name, at, want, got, rounding)
			}
		}
	}
}

// The limits of the closed forms and what TimeTo says of them.
func TestNeverOfClosedForms(t *testing.T) {
	cases := closedCases()
	for _, c := range []struct {
		name   string
		target float64
		limit  float64 // 0 for not known
	}{
		{"constant h, heat inside", 315, 320}, // 2e5 W/m³ · 1 mm / 10 W/(m² K) above 300 K
		{"two ambients and a flux", 320, (3000 + 1400 + 200) / 14.0},
		{"radiation, warming", 900, 900},
		{"natural convection", 299, 300},
		{"constant flux", 0.5, 0},
	} {
		s := solve(t, cases[c.name])
		_, err := s.TimeTo(shape.Mean(), kelvin(c.target))
		var never *units.NeverError
		if !errors.As(err, &never) {
			t.Errorf("%s: %v, want never", c.name, err)
			continue
		}
		if c.limit != 0 {
			within(t, c.name+": limit", never.Limit.SI(), c.limit, 1e-10)
		}
	}
	s := solve(t, cases["constant flux"])
	// 150 W/m² over 2000 J/(m² K): 0.075 K/s.
	for target, want := range map[float64]float64{385: 200, 100: 4000, 420: 0} {
		got, err := s.TimeTo(shape.Mean(), kelvin(target))
		if err != nil {
			t.Error(target, err)
		}
		within(t, "constant flux", got.SI(), want, 1e-10)
	}
	if _, err := s.Mean(seconds(5320 + 1)); err == nil { // 1 K, where the material ends, after 399 K/0.075 K/s
		t.Error("below the range of the material: no error")
	}
}

// Under the constants of random problems, a solution stays between the temperatures that drive it, and warms while it is
// below, cools while above them.
func TestCoursesStayWithinTheirAmbients(t *testing.T) {
	r := rand.New(rand.NewSource(4))
	for range 300 {
		p := Problem{Body: sphere(0.006), Material: constantStuff(2000, 1000, 30), Initial: kelvin(280 + 100*r.Float64()), Horizon: seconds(2000)}
		p.Surface = boundary.Following(coefficient(math.Exp(6*r.Float64())), []boundary.Course{
			boundary.Oscillation(kelvin(330), difference(20), seconds(20+500*r.Float64()), seconds(100*r.Float64())),
			log(),
			boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(0.02*r.Float64())),
		}[r.Intn(3)])
		s := solve(t, p)
		low, high := min(p.Initial.SI(), 300), max(p.Initial.SI(), 360)
		for i := range 101 {
			at, err := s.Mean(seconds(20 * float64(i)))
			if err != nil || at.SI() < low-1e-9 || at.SI() > high+1e-9 {
				t.Fatalf("%v: %v, %v at %d s", p.Surface, at, err, 20*i)
			}
		}
	}
}

// Every crossing is found: against a scan on a fine grid.
func TestCrossingsAgainstScan(t *testing.T) {
	cases := closedCases()
	for _, name := range []string{"oscillation", "log", "all that move", "constant h", "plate with two faces that differ"} {
		p := cases[name]
		s, general := solve(t, p), solve(t, notClosed(p, 1e-6))
		for target := 290.5; target < 400; target += 3.7 {
			for _, s := range []*Solution{s, general} {
				got, err := s.Crossings(shape.Centre(), kelvin(target))
				if err != nil {
					t.Fatal(err)
				}
				var want []Crossing
				before, _ := s.Mean(seconds(0))
				for i := 1; i <= 30000; i++ {
					x := seconds(p.Horizon.SI() * float64(i) / 30000)
					at, _ := s.Mean(x)
					if (at.SI() > target) != (before.SI() > target) {
						want = append(want, Crossing{x, at.SI() > target})
					}
					before = at
				}
				if len(got) != len(want) {
					t.Errorf("%s, %g K: %v, the scan has %v", name, target, got, want)
					continue
				}
				for i := range got {
					if d := want[i].Time.Sub(got[i].Time).SI(); d < -1e-9 || d > 0.06 || got[i].Rising != want[i].Rising {
						t.Errorf("%s, %g K: %v, the scan has %v", name, target, got[i], want[i])
					}
				}
				if first, err := s.TimeTo(shape.Slowest(), kelvin(target)); len(got) > 0 && (err != nil || first != got[0].Time) {
					t.Errorf("%s, %g K: first %v, %v, crossings %v", name, target, first, err, got)
				}
			}
		}
	}
}

// notClosed is the problem with an exchange function of nothing added, so that it is integrated.
func notClosed(p Problem, tolerance float64) Problem {
	p.Surface = boundary.Sum(p.Surface, boundary.Function(func(units.Duration, units.Temperature) (units.HeatFlux, error) { return streaming(0), nil }))
	p.Tolerance = difference(tolerance)
	return p
}

// A log that ends before the horizon cannot be asked beyond; held, it can.
func TestLogThatEnds(t *testing.T) {
	p := closedCases()["log"]
	p.Horizon = seconds(3000)
	var outside *units.RangeError
	if _, err := p.Solve(context.Background()); !errors.As(err, &outside) {
		t.Errorf("beyond the log: %v", err)
	}
	p.Surface = boundary.Following(coefficient(10), log().Holding())
	s := solve(t, p)
	within(t, "limit", s.limit, 345, 1e-12)
	p.Horizon = units.Duration{}
	var argument *units.ArgumentError
	if _, err := p.Solve(context.Background()); !errors.As(err, &argument) || argument.Field != "horizon" {
		t.Errorf("no horizon: %v", err)
	}
}

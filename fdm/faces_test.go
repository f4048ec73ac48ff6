package fdm_test

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// balanced checks that the heat balance closes to 1e-11.
func balanced(t *testing.T, name string, s *fdm.Solution) {
	t.Helper()
	if b := s.EnergyBalance(); !(b <= 1e-11) {
		t.Errorf("%s: energy balance %g, want at most 1e-11", name, b)
	}
}

// A surface at a given temperature is the limit of a large coefficient: the exact series of plate, cylinder and
// sphere at a Biot number of infinity (H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed.,
// sections 3.3, 7.6 and 9.3, from memory).
func TestPrescribedTemperature(t *testing.T) {
	for name, body := range map[string]shape.Body{
		"plate": bodies["plate"][0], "cylinder": bodies["cylinder"][0], "sphere": shape.Sphere(metres(0.2)),
	} {
		p := scaled(1, 200)
		p.Body, p.Surface = body, boundary.Temperature(kelvin(300))
		s := solve(t, p)
		balanced(t, name, s)
		exact := map[string]interface {
			At(x, fo float64) float64
			Mean(fo float64) float64
		}{"plate": eigen.NewPlate(math.Inf(1)), "cylinder": eigen.NewCylinder(math.Inf(1)), "sphere": eigen.NewSphere(math.Inf(1))}[name]
		for _, fo := range []float64{0.01, 0.05, 0.2, 1} {
			for _, x := range []float64{0, 0.5, 0.9, 1} {
				if got, want := at(t, s, below(x), fo*1e4), 300+100*exact.At(x, fo); !near(got, want, 0.01) || !near(got, want, estimate(t, s, below(x), fo*1e4)) {
					t.Errorf("%s, Fo %g, x %g: %.6f K, want %.6f K", name, fo, x, got, want)
				}
			}
			if got, want := at(t, s, shape.Mean(), fo*1e4), 300+100*exact.Mean(fo); !near(got, want, 0.01) {
				t.Errorf("%s, Fo %g, mean: %.6f K, want %.6f K", name, fo, got, want)
			}
		}
		if T := at(t, s, shape.Surface(), 0); !near(T, 300, 1e-2) {
			t.Errorf("%s: surface at %g K at once, want 300 K", name, T)
		}
	}
}

// A slab that is heated at a constant rate at its surface lags behind evenly: T = Ts − (b/2α) (L² − x²) in the
// end (Carslaw and Jaeger, section 3.5, from memory), to the precision of the steps.
func TestRamp(t *testing.T) {
	p := scaled(1, 50)
	rate := 0.002
	p.Body, p.Surface = bodies["plate"][1], boundary.TemperatureFollowing(boundary.Ramp(kelvin(400), units.KelvinPerSecond.Of(rate)))
	s := solve(t, p)
	balanced(t, "ramp", s)
	for _, time := range []float64{4e4, 5e4} {
		for _, x := range []float64{0, 0.4, 1} {
			want := 400 + rate*time - rate/2e-6*0.01*(1-x*x)
			if got := at(t, s, below(x), time); !near(got, want, 2e-3) {
				t.Errorf("x %g at %g s: %.6f K, want %.6f K", x, time, got, want)
			}
		}
		q, err := s.Flux(shape.Surface(), seconds(time))
		if want := -rate * 1e6 * 0.1; err != nil || !near(q.SI(), want, 1e-4*-want) {
			t.Errorf("flux at %g s: %v (%v), want %g W/m²", time, q, err, want)
		}
	}
}

// The wave in a thick slab under a surface that swings: amplitude e^(−x/d) and lag x/d of its phase, d = √(2α/ω)
// (Carslaw and Jaeger, section 2.6, from memory). The start is forgotten after the time of some periods.
func TestWave(t *testing.T) {
	const period, amplitude = 86400.0, 10.0
	alpha := 1.8 / (2400 * 1000)
	d := math.Sqrt(alpha * period / math.Pi)
	p := fdm.Problem{
		Body: sheet(12 * d), Material: plain{2400, 1000, 1.8}, Initial: kelvin(290), Horizon: units.Day.Of(40), Cells: 300,
		Surface: boundary.TemperatureFollowing(boundary.Oscillation(kelvin(290), units.KelvinDifference.Of(amplitude), seconds(period), units.Duration{})),
	}
	s := solve(t, p)
	balanced(t, "wave", s)
	for _, x := range []float64{0, 0.1, 0.2, 0.5} {
		for i := range 8 {
			time := period * (39 + float64(i)/8)
			want := 290 + amplitude*math.Exp(-x/d)*math.Sin(2*math.Pi*time/period-x/d)
			if got := at(t, s, shape.Below(metres(x)), time); !near(got, want, 0.005*amplitude) {
				t.Errorf("%g m below at %g s: %.5f K, want %.5f K", x, time, got, want)
			}
		}
	}
}

// A constant flux into a slab with an insulated back: T = T0 + q t/(ρ c L) + (q L/k) ((3x²−1)/6) after the first
// moments (Carslaw and Jaeger, section 3.8, from memory); the series of the rest is below 1e-8 at Fo = 2.
func TestConstantFlux(t *testing.T) {
	p := scaled(1, 100)
	const q = 50.0
	p.Body, p.Surface = bodies["plate"][1], boundary.Flux(units.WattPerSquareMetre.Of(-q))
	p.Horizon = seconds(3e4)
	s := solve(t, p)
	balanced(t, "flux", s)
	for _, time := range []float64{2e4, 3e4} {
		for _, x := range []float64{0, 0.5, 1} {
			want := 400 + q*time/(1e6*0.1) + q*0.1*(3*x*x-1)/6
			if got := at(t, s, below(x), time); !near(got, want, 1e-3) {
				t.Errorf("x %g at %g s: %.6f K, want %.6f K", x, time, got, want)
			}
		}
		if got, want := heat(t, s, time), -q*time*0.5; !near(got, want, 1e-9*-want) {
			t.Errorf("heat at %g s: %.12g J, want %.12g J", time, got, want)
		}
	}
}

// Two stirred liquids with a thin plate of great conductivity between them even out with the time constant of
// their heat capacities in series over the resistances in series.
func TestTwoLumps(t *testing.T) {
	const c1, c2, h1, h2 = 5e4, 2e4, 400.0, 100.0
	p := fdm.Problem{
		Body: sheet(1e-3), Material: plain{10, 10, 400}, Initial: kelvin(330), Horizon: seconds(2000), Cells: 8, Tolerance: units.KelvinDifference.Of(1e-5),
		SurfaceLump: &fdm.Lump{
			HeatCapacity: units.JoulePerKelvin.Of(c1), Coefficient: units.WattPerSquareMetreKelvin.Of(h1), Initial: kelvin(360),
		},
		OppositeLump: &fdm.Lump{
			HeatCapacity: units.JoulePerKelvin.Of(c2), Coefficient: units.WattPerSquareMetreKelvin.Of(h2), Initial: kelvin(300),
		},
	}
	s := solve(t, p)
	balanced(t, "two lumps", s)
	g := 1 / (1/h1 + 1e-3/400 + 1/h2)
	tau := 1 / (g * (1/c1 + 1/c2))
	mean := (360*c1 + 300*c2) / (c1 + c2)
	for _, time := range []float64{100, 400, 2000} {
		fall := math.Exp(-time/tau) * 60
		for place, want := range map[shape.Place]float64{shape.Surface(): mean + fall*c2/(c1+c2), shape.Opposite(): mean - fall*c1/(c1+c2)} {
			got, err := s.LumpAt(place, seconds(time))
			// The plate itself holds 0.1 J/K, of which 2e-6 of the difference may come.
			if err != nil || !near(got.SI(), want, 1e-3) {
				t.Errorf("lump at the %v after %g s: %v (%v), want %.5f K", place, time, got, err, want)
			}
		}
	}
	when, err := s.LumpTimeTo(shape.Opposite(), kelvin(320))
	if want := tau * math.Log(60*c1/(c1+c2)/(mean-320)); err != nil || !near(when.SI(), want, 0.05) {
		t.Errorf("the colder liquid at 320 K after %v (%v), want %g s", when, err, want)
	}
	if _, err := s.LumpTimeTo(shape.Opposite(), kelvin(mean+1)); err == nil {
		t.Error("a liquid above the mean")
	}
}

// A heater of constant power behind a wall ends where the wall carries the power: P = A (T − T∞) / Σ R.
func TestHeater(t *testing.T) {
	const power, h, ambient = 200.0, 10.0, 290.0
	p := fdm.Problem{
		Body: sheet(0.02), Material: plain{2000, 800, 0.8}, Initial: kelvin(290), Surface: constant(h, ambient), Horizon: units.Day.Of(2), Cells: 30,
		OppositeLump: &fdm.Lump{
			HeatCapacity: units.JoulePerKelvin.Of(3000), Coefficient: units.WattPerSquareMetreKelvin.Of(250), Initial: kelvin(290),
			Exchange: boundary.Flux(units.WattPerSquareMetre.Of(-power / 0.1)), Area: units.SquareMetre.Of(0.1),
		},
	}
	s := solve(t, p)
	balanced(t, "heater", s)
	end := p.Horizon
	want := ambient + power*(1/h+0.02/0.8+1/250.0)
	if got, err := s.LumpAt(shape.Opposite(), end); err != nil || !near(got.SI(), want, 1e-3) {
		t.Errorf("heater at %v (%v), want %g K", got, err, want)
	}
	given := power * end.SI()
	inside, err := s.HeatThrough(shape.Opposite(), end)
	stored := 3000 * (want - 290)
	if err != nil || !near(-inside.SI(), given-stored, 1e-4*given) {
		t.Errorf("heat into the wall %v (%v), want %g J", inside, err, given-stored)
	}
	var tooHot error
	if _, tooHot = s.LumpTimeTo(shape.Opposite(), kelvin(want+1)); tooHot == nil {
		t.Error("the heater comes above its limit")
	}
}

// Even heat inside a body whose surface is at a temperature: T = Ts + (q/2nk)(R² − r²) with n = 1, 2, 3 for plate,
// cylinder and sphere (Carslaw and Jaeger, sections 3.14, 7.9 and 9.8, from memory), which the grid meets exactly.
func TestSourceSteady(t *testing.T) {
	const q = 2000.0
	source := func(units.Length, units.Duration, units.Temperature) (units.HeatSource, error) {
		return units.WattPerCubicMetre.Of(q), nil
	}
	for n, body := range []shape.Body{1: bodies["plate"][1], 2: bodies["cylinder"][0], 3: shape.Sphere(metres(0.2))} {
		if n == 0 {
			continue
		}
		p := scaled(1, 24)
		p.Body, p.Surface, p.Source, p.Horizon, p.Initial = body, boundary.Temperature(kelvin(300)), source, seconds(2e5), kelvin(300)
		p.Tolerance = units.KelvinDifference.Of(1e-5)
		s := solve(t, p)
		balanced(t, body.String(), s)
		for _, x := range []float64{0, 0.5, 1} {
			want := 300 + q/(2*float64(n))*0.01*(1-x*x)
			if got := at(t, s, below(x), 2e5); !near(got, want, 2e-4) {
				t.Errorf("%v, x %g: %.7f K, want %.7f K", body, x, got, want)
			}
		}
		given, err := s.HeatGenerated(p.Horizon)
		if want := q * body.Volume().SI() * 2e5; err != nil || !near(given.SI(), want, 1e-9*want) {
			t.Errorf("%v: heat given %v (%v), want %g J", body, given, err, want)
		}
		if _, err := s.TimeTo(shape.Centre(), kelvin(300+q/(2*float64(n))*0.01+1)); err == nil {
			t.Errorf("%v: hotter than in the end", body)
		}
	}
}

// Even heat beside a lump at either face: what is given is q V t, and the balance closes, on every grid of the solution.
func TestSourceBesideALump(t *testing.T) {
	for i, name := range []string{"surface", "opposite face"} {
		p := scaled(1, 0)
		p.Body, p.Opposite, p.Horizon = sheet(0.1), constant(5, 350), seconds(3600)
		p.Source = func(units.Length, units.Duration, units.Temperature) (units.HeatSource, error) {
			return units.WattPerCubicMetre.Of(2000), nil
		}
		lump := &fdm.Lump{HeatCapacity: units.JoulePerKelvin.Of(500), Coefficient: units.WattPerSquareMetreKelvin.Of(8), Initial: kelvin(390)}
		if i == 0 {
			p.SurfaceLump = lump
		} else {
			p.OppositeLump = lump
		}
		s := solve(t, p)
		balanced(t, name, s)
		given, err := s.HeatGenerated(s.Horizon())
		if want := 2000 * p.Body.Volume().SI() * 3600; err != nil || !near(given.SI(), want, 1e-11*want) {
			t.Errorf("lump at the %s: heat given %v (%v), want %g J", name, given, err, want)
		}
	}
}

// A source that rises with temperature, q = β (T − T0), in an insulated body: T − T0 grows as e^(β t/ρc).
func TestSourceGrows(t *testing.T) {
	p := scaled(1, 16)
	p.Surface, p.Horizon, p.Initial = constant(0, 300), seconds(4000), kelvin(301)
	p.Source = func(_ units.Length, _ units.Duration, T units.Temperature) (units.HeatSource, error) {
		return units.WattPerCubicMetre.Of(1000 * (T.SI() - 300)), nil
	}
	s := solve(t, p)
	balanced(t, "growth", s)
	for _, time := range []float64{1000, 4000} {
		want := 300 + math.Exp(time/1000)
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
			if got := at(t, s, place, time); !near(got, want, 0.02) {
				t.Errorf("%v at %g s: %.5f K, want %.5f K", place, time, got, want)
			}
		}
	}
}

// A contact that lets heat through by radiation across a gap: in the steady state the flux that the jump of the
// temperature makes is that through the layers.
func TestContactFunction(t *testing.T) {
	const gap = 0.4 * sigma
	resistance := func(a, b float64) float64 { return 1 / (gap * (a*a + b*b) * (a + b)) }
	p := fdm.Problem{
		Body: sheet(0.03), Initial: kelvin(300), Surface: boundary.Temperature(kelvin(1000)), Opposite: boundary.Temperature(kelvin(300)), Horizon: units.Day.Of(10), Cells: 32,
		Layers: []fdm.Layer{
			{Material: plain{7850, 500, 40}, Thickness: metres(0.01), ContactAt: func(outer, inner units.Temperature) (units.ThermalInsulance, error) {
				return units.SquareMetreKelvinPerWatt.Of(resistance(outer.SI(), inner.SI())), nil
			}},
			{Material: plain{500, 800, 0.2}, Thickness: metres(0.02)},
		},
	}
	s := solve(t, p)
	balanced(t, "contact", s)
	end := p.Horizon.SI()
	hot := at(t, s, shape.Below(metres(0.01)), end)
	q := (1000 - hot) / (0.01 / 40)
	cold := 300 + q*0.02/0.2
	if got := gap * (math.Pow(hot, 4) - math.Pow(cold, 4)); !near(got, q, 1e-4*q) {
		t.Errorf("flux through the layers %g W/m², across the gap %g W/m²", q, got)
	}
}

// Two bodies of one material at 400 K and 300 K in contact over an area: the profile at the start, then an
// interface at the mean, T = Tm ± ½ΔT erf(x/2√(αt)) while the ends do not feel it (Carslaw and Jaeger, section 2.4,
// from memory).
func TestProfile(t *testing.T) {
	p := scaled(1, 400)
	p.Body, p.Surface, p.Initial = sheet(0.2), constant(0, 300), units.Temperature{}
	p.Profile = func(depth units.Length) (units.Temperature, error) {
		d := depth.SI() - 0.1
		return kelvin(350 - 50*math.Tanh(d/1e-3)), nil
	}
	p.Horizon = seconds(500)
	s := solve(t, p)
	balanced(t, "profile", s)
	for _, x := range []float64{-0.03, -0.01, 0, 0.02} {
		// The start convolved with the kernel of the heat equation.
		width := math.Sqrt(4e-6 * 500)
		want := quad.Fixed(func(u float64) float64 {
			return math.Exp(-u*u) / math.Sqrt(math.Pi) * (350 - 50*math.Tanh((x-width*u)/1e-3))
		}, -6, 6, 2000, nil, 0)
		if got := at(t, s, shape.Below(metres(0.1+x)), 500); !near(got, want, 0.01) {
			t.Errorf("%g m from the middle: %.5f K, want %.5f K", x, got, want)
		}
	}
	if T := at(t, s, shape.Surface(), 0); T != 400 {
		t.Errorf("surface at %g K at the start, want 400 K", T)
	}
	// In the end all is at the mean.
	p.Horizon = units.Day.Of(3)
	s = solve(t, p)
	if T := at(t, s, shape.Opposite(), p.Horizon.SI()); !near(T, 350, 2e-3) {
		t.Errorf("end at %g K, want 350 K", T)
	}
	if _, err := s.TimeTo(shape.Surface(), kelvin(349)); err == nil {
		t.Error("the surface comes below the mean")
	}
}

// A ball of great conductivity that radiates: the closed form of the handbook for a lumped body (A. Bejan and A. D. Kraus
// (eds.), Heat Transfer Handbook, section 3.8; the formula was read there, 199.607349623 s is our evaluation of it by
// two ways), from 1200 K to 600 K.
func TestRadiatingBall(t *testing.T) {
	p := fdm.Problem{
		Body: shape.Sphere(metres(0.01)), Material: plain{7800, 500, 1e6}, Initial: kelvin(1200), Surface: boundary.Radiation(0.8, kelvin(300)), Horizon: seconds(400),
		Cells: 8, Tolerance: units.KelvinDifference.Of(1e-6),
	}
	got, err := solve(t, p).TimeTo(shape.Mean(), kelvin(600))
	// The Biot number is below 5e-7.
	if err != nil || !near(got.SI(), 199.607349623, 1e-6*200) {
		t.Errorf("at 600 K after %v (%v), want 199.60735 s", got, err)
	}
}

// Two air streams at one face, and the radiation of a third: the body tends to where their fluxes cancel.
func TestSumOfExchanges(t *testing.T) {
	p := scaled(1, 12)
	p.Surface = boundary.Sum(constant(10, 300), constant(30, 500), boundary.Flux(units.WattPerSquareMetre.Of(200)))
	p.Horizon = seconds(2e5)
	s := solve(t, p)
	want := (10*300 + 30*500 - 200) / 40.0
	if T := at(t, s, shape.Centre(), 2e5); !near(T, want, 2e-3) {
		t.Errorf("tends to %g K, want %g K", T, want)
	}
	if _, err := s.TimeTo(shape.Centre(), kelvin(want+0.1)); err == nil {
		t.Errorf("hotter than %g K", want)
	}
}

// A body that is exposed on both faces has the condition of its surface at the opposite one too, unless another is given: a
// plate of two like layers is that of one, and a tube loses heat through its inside.
func TestOppositeIsTheSurface(t *testing.T) {
	p := scaled(1, 40)
	p.Body = shape.Plate(metres(0.2), units.SquareMetre.Of(1))
	one := solve(t, p)
	p.Material, p.Cells = nil, 80
	p.Layers = []fdm.Layer{{Material: plain{1000, 1000, 1}, Thickness: metres(0.1)}, {Material: plain{1000, 1000, 1}, Thickness: metres(0.1)}}
	two := solve(t, p)
	for _, depth := range []float64{0, 0.03, 0.1, 0.2} {
		place := shape.Below(metres(depth))
		a, b := at(t, one, place, 5000), at(t, two, place, 5000)
		if tol := estimate(t, one, place, 5000) + estimate(t, two, place, 5000); !near(a, b, tol) {
			t.Errorf("%v: %.6f K of one layer, %.6f K of two", place, a, b)
		}
	}
	tube := scaled(1, 40)
	tube.Body = shape.Tube(metres(0.4), metres(0.2), metres(1)).Exposing(shape.Inside | shape.Outside)
	s := solve(t, tube)
	inside, e1 := s.HeatThrough(shape.Opposite(), tube.Horizon)
	outside, e2 := s.HeatThrough(shape.Surface(), tube.Horizon)
	if e1 != nil || e2 != nil || !(inside.SI() > 0.2*outside.SI()) {
		t.Errorf("heat through the inside %v, through the outside %v (%v, %v)", inside, outside, e1, e2)
	}
}

// A surface that steps from the temperature of the start to another after 1000 s: the exact series from then on. The
// steps end where it steps, so that nothing is smeared.
func TestStepOfTheSurface(t *testing.T) {
	course := boundary.Log([]units.Duration{{}, seconds(1000), seconds(1000), seconds(1e5)}, []units.Temperature{kelvin(400), kelvin(400), kelvin(300), kelvin(300)})
	exact := map[string]*eigen.Sphere{"held": eigen.NewSphere(math.Inf(1)), "followed": eigen.NewSphere(1)}
	for name, surface := range map[string]boundary.Condition{
		"held": boundary.TemperatureFollowing(course), "followed": boundary.Following(units.WattPerSquareMetreKelvin.Of(10), course),
	} {
		p := scaled(1, 200)
		p.Surface = surface
		s := solve(t, p)
		balanced(t, name, s)
		for _, time := range []float64{100, 300, 2000, 1e4} {
			for _, x := range []float64{0, 0.7, 1} {
				want := 300 + 100*exact[name].At(x, time*1e-4)
				if got := at(t, s, below(x), 1000+time); !near(got, want, 0.01) {
					t.Errorf("%s, x %g, %g s after the step: %.5f K, want %.5f K", name, x, time, got, want)
				}
			}
		}
		for _, time := range []float64{500, 1000} {
			if got := at(t, s, shape.Surface(), time); !near(got, 400, 1e-9) {
				t.Errorf("%s: surface at %g K after %g s, before the step", name, got, time)
			}
		}
		if got := at(t, s, shape.Surface(), 1000*(1+1e-12)); name == "held" && !near(got, 300, 0.01) {
			t.Errorf("%s: surface at %g K right after the step", name, got)
		}
	}
}

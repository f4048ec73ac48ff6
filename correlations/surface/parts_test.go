package surface_test

import (
	"errors"
	"math"
	"strings"
	"testing"
	"testing/quick"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

var (
	_ surface.Part     = surface.GivenFlux{}
	_ surface.Part     = surface.GivenCoefficient{}
	_ surface.Part     = surface.Solar{}
	_ surface.Part     = surface.Scaled{}
	_ surface.Part     = surface.Shade{}
	_ surface.Part     = surface.Group{}
	_ surface.Part     = surface.Schedule{}
	_ surface.Part     = surface.Following{}
	_ surface.Follower = surface.Convection{}
	_ surface.Follower = surface.Radiation{}
	_ surface.Follower = surface.GivenCoefficient{}
)

func watts(q float64) units.HeatFlux   { return units.WattPerSquareMetre.Of(q) }
func seconds(t float64) units.Duration { return units.Second.Of(t) }
func coefficient(h float64) units.HeatTransferCoefficient {
	return units.WattPerSquareMetreKelvin.Of(h)
}

// known is a given coefficient with a band of ±20 %.
func known(h float64, ambient units.Temperature) surface.GivenCoefficient {
	return surface.GivenCoefficient{
		Coefficient: coefficient(h), CoefficientLow: coefficient(0.8 * h), CoefficientHigh: coefficient(1.2 * h), Ambient: ambient,
	}
}

func q(t *testing.T, p surface.Part, at, wall float64) float64 {
	t.Helper()
	flux, err := p.Flux(seconds(at), celsius(wall))
	if err != nil {
		t.Fatalf("%s at %g s, %g °C: %v", p.Name(), at, wall, err)
	}
	return flux.SI()
}

func room(t units.Duration) (units.Temperature, error) { return celsius(20 + t.SI()/60), nil }

func dark(t units.Duration) (units.HeatFlux, error) { return watts(100 * t.SI()), nil }

// Every kind of part at its middle and at both ends of its band, by arithmetic.
func TestPartsByHand(t *testing.T) {
	h := known(10, celsius(20))
	for _, tt := range []struct {
		name            string
		part            surface.Part
		at, wall        float64
		want, low, high float64
	}{
		{"given coefficient", h, 0, 50, 300, 240, 360},
		{"given coefficient without a band", surface.GivenCoefficient{Coefficient: coefficient(3), Ambient: celsius(20)}, 0, 10, -30, -30, -30},
		{"given flux", surface.GivenFlux{Value: watts(-50), ValueLow: watts(-60), ValueHigh: watts(-45)}, 0, 50, -50, -60, -45},
		{"nothing", surface.GivenFlux{}, 0, 50, 0, 0, 0},
		{"course of a flux", surface.GivenFlux{Course: dark}, 3, 50, 300, 300, 300},
		{"sunlight", surface.Solar{Absorptivity: 0.5, AbsorptivityLow: 0.4, AbsorptivityHigh: 0.6, Irradiance: watts(200)}, 0, 50, -100, -120, -80},
		{"course of sunlight", surface.Solar{Absorptivity: 0.5, Course: dark}, 3, 50, -150, -150, -150},
		{"scaled", surface.Scaled{Part: h, Factor: 2}, 0, 50, 600, 480, 720},
		{"scaled with a band", surface.Scaled{Part: h, Factor: 1, FactorLow: 0.5, FactorHigh: 2}, 0, 50, 300, 120, 720},
		{"shade", surface.Shade{Share: 0.25, Covered: h, Open: surface.GivenFlux{Value: watts(40)}}, 0, 50, 105, 90, 120},
		{"covered only", surface.Shade{Share: 0.25, Covered: h}, 0, 50, 75, 60, 90},
		{"open only", surface.Shade{Share: 0.25, Open: h}, 0, 50, 225, 180, 270},
		{"group", surface.Group{Title: "bench", Parts: surface.Sum{h, surface.GivenFlux{Value: watts(1)}}}, 0, 50, 301, 241, 361},
		{"schedule, first", surface.Schedule{{Part: surface.GivenFlux{}}, {From: seconds(60), Part: h}}, 59.9, 50, 0, 0, 0},
		{"schedule, second", surface.Schedule{{Part: surface.GivenFlux{}}, {From: seconds(60), Part: h}}, 60, 50, 300, 240, 360},
		{"following", surface.Following{Part: known(10, units.Temperature{}), Ambient: room}, 600, 50, 200, 160, 240},
	} {
		near(t, tt.name, q(t, tt.part, tt.at, tt.wall), tt.want, 1e-9, "by hand")
		near(t, tt.name+", low", q(t, tt.part.Low(), tt.at, tt.wall), tt.low, 1e-9, "by hand")
		near(t, tt.name+", high", q(t, tt.part.High(), tt.at, tt.wall), tt.high, 1e-9, "by hand")
		if err := tt.part.Check(); err != nil {
			t.Errorf("%s: %v", tt.name, err)
		}
		if tt.part.Name() == "" {
			t.Errorf("%s: no name", tt.name)
		}
	}
}

// A convection and a radiation that follow give what the same parts give in that ambient temperature.
func TestFollowing(t *testing.T) {
	air := surface.Convection{Body: ball(50), Fluid: props.Air(), Speed: speed(1)}
	walls := surface.Radiation{Emissivity: 0.9, EmissivityLow: 0.8, EmissivityHigh: 0.95}
	for _, p := range []surface.Follower{air, walls, known(10, units.Temperature{})} {
		moving := surface.Following{Part: p, Ambient: room}
		still := p.In(celsius(30))
		near(t, p.Name(), q(t, moving, 600, 80), q(t, still, 600, 80), 0, "the same part")
		near(t, p.Name()+", low", q(t, moving.Low(), 600, 80), q(t, still.Low(), 600, 80), 0, "the same part")
		near(t, p.Name()+", high", q(t, moving.High(), 600, 80), q(t, still.High(), 600, 80), 0, "the same part")
		if q(t, moving.Low(), 600, 80) >= q(t, moving.High(), 600, 80) {
			t.Errorf("%s: no band", p.Name())
		}
	}
	late := surface.Following{Part: air, Ambient: func(units.Duration) (units.Temperature, error) { return units.Temperature{}, errors.New("no answer") }}
	if err := late.Check(); err != nil {
		t.Errorf("a course that has no answer yet: %v", err)
	}
	if err := flux(late.Flux); err == nil {
		t.Error("the error of a course is lost")
	}
	for _, p := range []surface.Part{surface.Following{Part: air, Ambient: room}, surface.Following{Part: walls, Ambient: room}} {
		if n := testing.AllocsPerRun(100, func() { _, _ = p.Flux(seconds(1), celsius(60)) }); n != 0 {
			t.Errorf("%s that follows allocates %v times", p.Name(), n)
		}
	}
}

// What cannot be is refused by Check, by Flux and at both ends.
func TestBadParts(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(1)
	h := known(10, celsius(20))
	zero := boundary.Log([]units.Duration{seconds(0), seconds(1)}, []units.Temperature{celsius(0), celsius(1)}).At
	for _, tt := range []struct {
		field string
		part  surface.Part
	}{
		{"flux", surface.GivenFlux{Value: watts(nan)}},
		{"flux", surface.GivenFlux{Value: watts(-inf)}},
		{"flux", surface.GivenFlux{Value: watts(1), Course: dark}},
		{"lower flux", surface.GivenFlux{Value: watts(1), ValueLow: watts(2), ValueHigh: watts(3)}},
		{"lower flux", surface.GivenFlux{Value: watts(1), ValueLow: watts(-inf), ValueHigh: watts(3)}},
		{"upper flux", surface.GivenFlux{Value: watts(1), ValueLow: watts(0), ValueHigh: watts(0.5)}},
		{"upper flux", surface.GivenFlux{Value: watts(1), ValueLow: watts(0.5), ValueHigh: watts(nan)}},
		{"ambient", surface.GivenCoefficient{}},
		{"coefficient", known(-1, celsius(20))},
		{"coefficient", known(nan, celsius(20))},
		{"lower coefficient", surface.GivenCoefficient{Coefficient: coefficient(1), CoefficientLow: coefficient(2), CoefficientHigh: coefficient(2), Ambient: celsius(2)}},
		{"upper coefficient", surface.GivenCoefficient{Coefficient: coefficient(1), CoefficientLow: coefficient(0.5), Ambient: celsius(2)}},
		{"absorptivity", surface.Solar{}},
		{"absorptivity", surface.Solar{Absorptivity: 1.1}},
		{"absorptivity", surface.Solar{Absorptivity: nan}},
		{"lower absorptivity", surface.Solar{Absorptivity: 0.5, AbsorptivityLow: 0.6, AbsorptivityHigh: 0.7}},
		{"upper absorptivity", surface.Solar{Absorptivity: 0.5, AbsorptivityLow: 0.3, AbsorptivityHigh: 0.4}},
		{"irradiance", surface.Solar{Absorptivity: 0.5, Irradiance: watts(-1)}},
		{"irradiance", surface.Solar{Absorptivity: 0.5, Irradiance: watts(inf)}},
		{"irradiance", surface.Solar{Absorptivity: 0.5, Irradiance: watts(1), Course: dark}},
		{"part", surface.Scaled{Factor: 1}},
		{"factor", surface.Scaled{Part: h}},
		{"factor", surface.Scaled{Part: h, Factor: -1}},
		{"factor", surface.Scaled{Part: h, Factor: inf}},
		{"lower factor", surface.Scaled{Part: h, Factor: 1, FactorLow: 2, FactorHigh: 3}},
		{"upper factor", surface.Scaled{Part: h, Factor: 1, FactorLow: 0.5, FactorHigh: 0.7}},
		{"upper factor", surface.Scaled{Part: h, Factor: 1, FactorLow: 0.5, FactorHigh: inf}},
		{"absorptivity", surface.Scaled{Part: surface.Solar{}, Factor: 1}},
		{"parts", surface.Shade{Share: 0.5}},
		{"share", surface.Shade{Share: -0.5, Covered: h}},
		{"share", surface.Shade{Share: 1.5, Covered: h}},
		{"share", surface.Shade{Share: nan, Open: h}},
		{"absorptivity", surface.Shade{Share: 0.5, Covered: surface.Solar{}}},
		{"absorptivity", surface.Shade{Share: 0.5, Open: surface.Solar{}}},
		{"sum", surface.Group{}},
		{"part 1", surface.Group{Parts: surface.Sum{nil}}},
		{"absorptivity", surface.Group{Parts: surface.Sum{surface.Solar{}}}},
		{"stages", surface.Schedule{}},
		{"stage 1: part", surface.Schedule{{}}},
		{"stage 1: from", surface.Schedule{{From: seconds(1), Part: h}}},
		{"stage 1: from", surface.Schedule{{From: seconds(nan), Part: h}}},
		{"stage 2: part", surface.Schedule{{Part: h}, {From: seconds(1)}}},
		{"stage 2: from", surface.Schedule{{Part: h}, {Part: h}}},
		{"stage 2: from", surface.Schedule{{Part: h}, {From: seconds(nan), Part: h}}},
		{"stage 3: from", surface.Schedule{{Part: h}, {From: seconds(2), Part: h}, {From: seconds(1), Part: h}}},
		{"absorptivity", surface.Schedule{{Part: surface.Solar{}}}},
		{"following: part", surface.Following{Ambient: room}},
		{"following: ambient", surface.Following{Part: h}},
		{"coefficient", surface.Following{Part: known(-1, celsius(20)), Ambient: room}},
		{"emissivity", surface.Following{Part: surface.Radiation{}, Ambient: room}},
		{"fluid", surface.Following{Part: surface.Convection{Body: ball(20)}, Ambient: zero}},
	} {
		for what, err := range map[string]error{
			"Check":    tt.part.Check(),
			"Flux":     flux(tt.part.Flux),
			"Low":      flux(tt.part.Low().Flux),
			"High":     flux(tt.part.High().Flux),
			"Sum.Flux": flux(surface.Sum{tt.part}.Flux),
			"Low.High": flux(tt.part.Low().High().Flux),
		} {
			var bad *units.ArgumentError
			if !errors.As(err, &bad) || !strings.Contains(bad.Field, tt.field) || bad.Accepted == "" {
				t.Errorf("%s of %T %+v: %v, want an argument error for %q", what, tt.part, tt.part, err, tt.field)
			}
		}
		for _, p := range []surface.Part{tt.part, tt.part.Low(), tt.part.High()} {
			p.Name()
			p.Sources()
			p.Notes()
			p.Warnings()
		}
	}
	for _, tt := range []struct {
		name string
		part surface.Part
		at   units.Duration
	}{
		{"schedule before the beginning", surface.Schedule{{Part: h}}, seconds(-1)},
		{"schedule at no time", surface.Schedule{{Part: h}}, seconds(nan)},
		{"sunlight below 0", surface.Solar{Absorptivity: 1, Course: dark}, seconds(-1)},
		{"infinite course", surface.GivenFlux{Course: dark}, seconds(inf)},
	} {
		var bad *units.ArgumentError
		if _, err := tt.part.Flux(tt.at, celsius(20)); !errors.As(err, &bad) {
			t.Errorf("%s: %v", tt.name, err)
		}
	}
	for _, wall := range []units.Temperature{{}, kelvin(nan), kelvin(-1)} {
		var bad *units.ArgumentError
		if _, err := h.Flux(seconds(0), wall); !errors.As(err, &bad) {
			t.Errorf("given coefficient at %v: %v", wall, err)
		}
	}
}

// A log is straight between its samples, gives them back, and does not answer outside unless it is
// told to hold.
func TestLog(t *testing.T) {
	times := []units.Duration{seconds(10), seconds(20), seconds(40)}
	values := []units.HeatFlux{watts(1), watts(-1), watts(5)}
	hold, err := surface.FluxLog(times, values, surface.Hold)
	if err != nil {
		t.Fatal(err)
	}
	fluxes, err := surface.FluxLog(times, values, surface.Refuse)
	if err != nil {
		t.Fatal(err)
	}
	values[0], times[0] = watts(1000), seconds(0) // they are copied
	for _, tt := range []struct{ at, want float64 }{{10, 1}, {15, 0}, {20, -1}, {25, 0.5}, {40, 5}} {
		q, err := fluxes(seconds(tt.at))
		held, errHold := hold(seconds(tt.at))
		if err != nil || errHold != nil {
			t.Fatal(err, errHold)
		}
		near(t, "log", q.SI(), tt.want, 1e-12, "by hand")
		near(t, "log that holds", held.SI(), tt.want, 1e-12, "by hand")
	}
	for _, tt := range []struct{ at, want float64 }{{-1, 1}, {9.99, 1}, {40.01, 5}, {1e9, 5}} {
		var out *units.RangeError
		if _, err := fluxes(seconds(tt.at)); !errors.As(err, &out) || out.Min.SI() != 10 || out.Max.SI() != 40 {
			t.Errorf("log at %g s: %v", tt.at, err)
		}
		if q, err := hold(seconds(tt.at)); err != nil || math.Abs(q.SI()-tt.want) > 1e-9 {
			t.Errorf("log that holds at %g s: %v, %v", tt.at, q, err)
		}
	}
	for _, at := range []float64{math.NaN(), math.Inf(1), math.Inf(-1)} {
		var bad *units.ArgumentError
		if _, err := hold(seconds(at)); !errors.As(err, &bad) {
			t.Errorf("log at %g s: %v", at, err)
		}
	}
	bad := func(times []float64, values []float64, ends surface.Ends) {
		t.Helper()
		var x []units.Duration
		var q []units.HeatFlux
		for _, t := range times {
			x = append(x, seconds(t))
		}
		for _, v := range values {
			q = append(q, watts(v))
		}
		var wrong *units.ArgumentError
		if _, err := surface.FluxLog(x, q, ends); !errors.As(err, &wrong) {
			t.Errorf("log of fluxes %v at %v: %v", values, times, err)
		}
	}
	bad(nil, nil, surface.Hold)
	bad([]float64{0}, []float64{1}, surface.Hold)
	bad([]float64{0, 1}, []float64{1}, surface.Hold)
	bad([]float64{0, 0}, []float64{1, 1}, surface.Hold)
	bad([]float64{1, 0}, []float64{1, 1}, surface.Hold)
	bad([]float64{-1, 0}, []float64{1, 1}, surface.Hold)
	bad([]float64{0, math.NaN()}, []float64{1, 1}, surface.Hold)
	bad([]float64{0, math.Inf(1)}, []float64{1, 1}, surface.Hold)
	bad([]float64{0, 1}, []float64{1, math.NaN()}, surface.Hold)
	bad([]float64{0, 1}, []float64{1, math.Inf(1)}, surface.Hold)
	bad([]float64{0, 1}, []float64{1, 1}, 7)
	if surface.Refuse.String() != "refuse" || surface.Hold.String() != "hold" || surface.Ends(7).String() != "unknown ends" {
		t.Error("the ends do not name themselves")
	}
}

// The tangent against derivatives by hand: a coefficient is its own; radiation has 4 ε σ T³; natural
// convection by Churchill without property variation has h + ΔT dh/dT.
func TestTangent(t *testing.T) {
	for _, tt := range []struct {
		name string
		part surface.Part
		wall float64 // K
		want float64
		tol  float64
	}{
		{"coefficient", known(12, celsius(20)), 350, 12, 1e-7},
		{"flux", surface.GivenFlux{Value: watts(100)}, 350, 0, 1e-9},
		{"radiation", surface.Radiation{Emissivity: 0.8, Surroundings: kelvin(280)}, 400, 4 * 0.8 * 5.670374419e-8 * 400 * 400 * 400, 1e-7},
		{"conduction", surface.Convection{
			Body: ball(50), Fluid: fromGroups(0.026, 1.57e-5, 0.707, 1e-30), Ambient: kelvin(300),
		}, 350, 2 * 0.026 / 0.05, 1e-6},
		// One side only: the air of the library ends at 2000 K.
		{"coefficient at the end of a fluid", surface.Group{Parts: surface.Sum{known(12, celsius(20)), ending{}}}, 1000, 12, 1e-6},
	} {
		x, err := surface.Sum{tt.part}.Tangent(seconds(0), kelvin(tt.wall))
		if err != nil {
			t.Errorf("%s: %v", tt.name, err)
			continue
		}
		near(t, tt.name, x.Coefficient.SI(), tt.want, tt.tol*(1+tt.want), "derivative by hand")
	}
	steady := surface.Convection{Body: ball(50), Fluid: fromGroups(0.026, 1.57e-5, 0.707, 1/300.0), Ambient: kelvin(300)}
	f := film(t, steady, kelvin(350))
	x, err := surface.Sum{steady}.Tangent(seconds(0), kelvin(350))
	if err != nil {
		t.Fatal(err)
	}
	natural := f.NaturalShare * f.Coefficient.SI()
	near(t, "natural convection", x.Coefficient.SI(), f.Coefficient.SI()+natural/4, 1e-7*f.Coefficient.SI(), "Nu − 2 as ΔT^(1/4)")

	near(t, "flux", x.Flux.SI(), f.Coefficient.SI()*50, 1e-9, "definition")
	ambient, err := x.Ambient()
	if err != nil {
		t.Fatal(err)
	}
	near(t, "ambient", x.Coefficient.SI()*(350-ambient.SI()), x.Flux.SI(), 1e-9, "definition")
	for _, s := range []surface.Sum{{surface.GivenFlux{Value: watts(1)}}, {known(0, celsius(20)), surface.GivenFlux{Value: watts(-1)}}} {
		x, err := s.Tangent(seconds(0), kelvin(300))
		if err != nil {
			t.Fatal(err)
		}
		var bad *units.ArgumentError
		if T, err := x.Ambient(); !errors.As(err, &bad) {
			t.Errorf("ambient of a flux: %v, %v", T, err)
		}
	}
	if _, err := (surface.Sum{}).Tangent(seconds(0), kelvin(300)); err == nil {
		t.Error("an empty sum has a tangent")
	}
	if _, err := (surface.Sum{point{}}).Tangent(seconds(0), kelvin(300)); err == nil {
		t.Error("a flux at one temperature alone has a tangent")
	}
	if T, err := (surface.Tangent{Wall: kelvin(300)}).Ambient(); err != nil || T != kelvin(300) {
		t.Errorf("nothing flows: %v, %v", T, err)
	}
}

// ending is a part that has no flux above 1000 K, and point one that has none but at 300 K.
type (
	ending struct{ stream }
	point  struct{ stream }
)

func (ending) Flux(_ units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if wall.SI() > 1000 {
		return units.HeatFlux{}, errors.New("too hot")
	}
	return units.HeatFlux{}, nil
}

func (point) Flux(_ units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if wall.SI() != 300 {
		return units.HeatFlux{}, errors.New("not 300 K")
	}
	return units.HeatFlux{}, nil
}

// The heat of a body that cools by a constant coefficient, q = h ΔT0 e^(-t/τ), in closed form; beside it a
// heater, and a part that is switched on within the run.
func TestHeat(t *testing.T) {
	const h, tau, end = 10.0, 300.0, 900.0
	wall := func(t units.Duration) (units.Temperature, error) { return celsius(20 + 60*math.Exp(-t.SI()/tau)), nil }
	s := surface.Sum{
		known(h, celsius(20)),
		surface.GivenFlux{Value: watts(-50)},
		surface.Schedule{{Part: surface.GivenFlux{}}, {From: seconds(432.1), Part: surface.GivenFlux{Value: watts(25)}}},
	}
	area := units.SquareCentimetre.Of(40)
	heat, err := s.Heat(area, wall, seconds(end))
	if err != nil {
		t.Fatal(err)
	}
	want := []float64{h * 60 * tau * (1 - math.Exp(-end/tau)), -50 * end, 25 * (end - 432.1)}
	all := 0.0
	for _, q := range want {
		all += math.Abs(q)
	}
	for i, c := range heat {
		near(t, c.Name, c.Energy.SI(), want[i]*area.SI(), 1e-6*all*area.SI(), "closed form")
		near(t, c.Name+", share", c.Share, want[i]/all, 1e-6, "closed form")
	}
	// A wall that begins with an infinite slope, as after a sudden change.
	root := func(t units.Duration) (units.Temperature, error) { return celsius(20 + math.Sqrt(t.SI())), nil }
	heat, err = surface.Sum{known(h, celsius(20))}.Heat(area, root, seconds(end))
	if err != nil {
		t.Fatal(err)
	}
	near(t, "root of time", heat[0].Energy.SI(), h*2/3*math.Pow(end, 1.5)*area.SI(), 1e-6*heat[0].Energy.SI(), "closed form")

	for name, f := range map[string]func() error{
		"empty sum": func() error { _, err := surface.Sum{}.Heat(area, wall, seconds(1)); return err },
		"no area":   func() error { _, err := s.Heat(units.Area{}, wall, seconds(1)); return err },
		"no end":    func() error { _, err := s.Heat(area, wall, seconds(0)); return err },
		"no wall":   func() error { _, err := s.Heat(area, nil, seconds(1)); return err },
		"wall at 0": func() error {
			_, err := s.Heat(area, func(units.Duration) (units.Temperature, error) { return units.Temperature{}, nil }, seconds(1))
			return err
		},
		"infinite": func() error {
			_, err := surface.Sum{known(1e300, celsius(20))}.Heat(units.SquareMetre.Of(1e300), wall, seconds(1))
			return err
		},
	} {
		var bad *units.ArgumentError
		if err := f(); !errors.As(err, &bad) {
			t.Errorf("%s: %v", name, err)
		}
	}
	noise := func(t units.Duration) (units.Temperature, error) { return kelvin(300 + 100*math.Sin(1e12*t.SI())), nil }
	var failed *units.ConvergenceError
	if _, err := s.Heat(area, noise, seconds(1)); !errors.As(err, &failed) {
		t.Errorf("noise: %v", err)
	}
	lost := errors.New("lost")
	if _, err := s.Heat(area, func(units.Duration) (units.Temperature, error) { return units.Temperature{}, lost }, seconds(1)); !errors.Is(err, lost) {
		t.Errorf("the error of the wall is lost: %v", err)
	}
}

// The ends of a sum of any parts enclose it, and the heat flow of a group is that of its parts.
func TestEndsEnclose(t *testing.T) {
	if err := quick.Check(func(h, factor, share uint8, wall int8) bool {
		inner := known(1+float64(h), celsius(20))
		parts := surface.Sum{
			surface.Scaled{Part: inner, Factor: 1, FactorLow: 1 / (1 + float64(factor)), FactorHigh: 1 + float64(factor)},
			surface.Shade{Share: float64(share) / 255, Covered: inner, Open: surface.Solar{Absorptivity: 0.5, AbsorptivityLow: 0.2, AbsorptivityHigh: 0.9, Irradiance: watts(1)}},
		}
		T := celsius(20 + math.Abs(float64(wall)))
		low, errLow := parts.Low().Flux(seconds(0), T)
		mid, errMid := surface.Group{Parts: parts}.Flux(seconds(0), T)
		high, errHigh := parts.High().Flux(seconds(0), T)
		return errLow == nil && errMid == nil && errHigh == nil && low.SI() <= mid.SI() && mid.SI() <= high.SI()
	}, nil); err != nil {
		t.Error(err)
	}
}

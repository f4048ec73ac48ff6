package lumped

import (
	"context"
	"errors"
	"math"
	"strings"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// What TimeTo answers: reached, met already, never, not within the horizon.
func TestTimeToAnswers(t *testing.T) {
	closed := Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)}
	warming := closed
	warming.Initial, warming.Surface = kelvin(280), constant(10, 298.15)
	function := ball()
	function.Until, function.Horizon = units.Temperature{}, units.Minute.Of(30)
	heated := function // by 200 W/m² on top of the room: it balances at 17.29 K above it, 98 W/m² of convection and 102 W/m² of radiation
	heated.Initial = kelvin(298.15)
	heated.Surface = flux(func(t, wall float64) float64 { return stillRoom(t, wall) - 200 })
	hump := Problem{ // warms by 25 K in 500 s, then cools to far below the start
		Body: sphere(0.006), Material: constantStuff(2000, 1000, 30), Initial: kelvin(300), Horizon: seconds(2000),
		Surface: flux(func(t, wall float64) float64 { return -200 + 0.4*t + 0.01*(wall-300) }),
	}
	melted := function // the flux never ceases within the range of the material
	melted.Surface = flux(func(_, _ float64) float64 { return -1000 })
	const (
		reached = iota
		met
		never
		horizon
	)
	for _, c := range []struct {
		name   string
		p      Problem
		target float64
		want   int
		limit  float64
		within float64
	}{
		{"cooling, between", closed, 320, reached, 0, 0},
		{"cooling, the start", closed, 373.15, met, 0, 0},
		{"cooling, above the start", closed, 400, met, 0, 0},
		{"cooling, the ambient", closed, 298.15, never, 298.15, 0},
		{"cooling, below the ambient", closed, 280, never, 298.15, 0},
		{"warming, between", warming, 290, reached, 0, 0},
		{"warming, below the start", warming, 270, met, 0, 0},
		{"warming, the ambient", warming, 298.15, never, 298.15, 0},
		{"function, between", function, 350, reached, 0, 0},
		{"function, above the start", function, 400, met, 0, 0},
		{"function, not yet", function, 305, horizon, 298.15, 1e-5},
		{"function, below the room", function, 290, never, 298.15, 1e-5},
		{"heater, reached", heated, 301, reached, 0, 0},
		{"heater, below the start", heated, 290, met, 0, 0},
		{"heater, beyond its balance", heated, 350, never, 315.44, 0.01},
		{"hump, on the way up", hump, 310, reached, 0, 0},
		{"hump, on the way down", hump, 290, reached, 0, 0},
		{"hump, above it", hump, 400, never, math.NaN(), 0},
		{"no balance within the range", melted, 4000, horizon, 5000, 0},
	} {
		s := solve(t, c.p)
		got, err := s.TimeTo(shape.Centre(), kelvin(c.target))
		var n *units.NeverError
		var h *units.HorizonError
		switch c.want {
		case reached:
			at, atErr := s.Mean(got)
			if err != nil || atErr != nil || got.SI() <= 0 || math.Abs(at.SI()-c.target) > 1e-9 {
				t.Errorf("%s: %v, %v, where it is at %v", c.name, got, err, at)
			}
		case met:
			if err != nil || got.SI() != 0 {
				t.Errorf("%s: %v, %v, want 0", c.name, got, err)
			}
		case never:
			if !errors.As(err, &n) {
				t.Errorf("%s: %v, %v, want never", c.name, got, err)
				continue
			}
			if !math.IsNaN(c.limit) {
				within(t, c.name+": limit", n.Limit.SI(), c.limit, c.within)
			}
			if _, _, ok := c.p.Surface.Constants(); ok != (n.Condition == "") {
				t.Errorf("%s: condition %q", c.name, n.Condition)
			}
		case horizon:
			if !errors.As(err, &h) {
				t.Errorf("%s: %v, %v, want not within the horizon", c.name, got, err)
				continue
			}
			within(t, c.name+": limit", h.Limit.SI(), c.limit, c.within)
			last, _ := s.Mean(h.Horizon)
			if h.Reached != last || h.Horizon != c.p.Horizon {
				t.Errorf("%s: %v, want at %v", c.name, h, last)
			}
		}
	}
}

// The balance of the heater above, by the exchange itself: 200 W/m² at the limit.
func TestLimitIsABalance(t *testing.T) {
	p := ball()
	p.Until = units.Temperature{}
	p.Surface = flux(func(t, wall float64) float64 { return stillRoom(t, wall) - 200 })
	s := solve(t, p)
	within(t, "flux at the limit", stillRoom(0, s.limit), 200, 1e-4)
	// The zero nearest in the direction of flow.
	for _, c := range []struct{ a, b, c, start, want float64 }{
		{300, 350, 400, 310, 300},
		{300, 350, 400, 345, 300},
		{300, 350, 400, 355, 400},
		{300, 350, 400, 395, 400},
		{300, 350, 400, 450, 400},
		{380, 390, 400, 450, 400},
		{380, 390, 400, 300, 380},
	} {
		p.Surface = flux(func(_, wall float64) float64 { return (wall - c.a) * (wall - c.b) * (wall - c.c) / 1000 })
		p.Horizon, p.Initial = seconds(10), kelvin(c.start)
		within(t, "nearest zero from "+p.Initial.String(), solve(t, p).limit, c.want, 1e-5)
	}
	p.Initial = kelvin(300) // two zeros, and the same sign before and behind them
	p.Surface = flux(func(_, wall float64) float64 { return (wall - 315) * (340 - wall) })
	within(t, "nearest of two zeros", solve(t, p).limit, 315, 1e-5)
}

func TestArgumentsThatCannotBe(t *testing.T) {
	good := Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)}
	for _, c := range []struct {
		name   string
		change func(*Problem)
		field  string
	}{
		{"no body", func(p *Problem) { p.Body = shape.Body{} }, "body"},
		{"no size", func(p *Problem) { p.Body = sphere(0) }, "diameter"},
		{"infinite size", func(p *Problem) { p.Body = sphere(math.Inf(1)) }, "diameter"},
		{"size whose volume underflows", func(p *Problem) { p.Body = sphere(1e-200) }, "volume"},
		{"no material", func(p *Problem) { p.Material = nil }, "material"},
		{"no density", func(p *Problem) { p.Material = constantStuff(0, 2000, 15) }, "density"},
		{"negative specific heat", func(p *Problem) { p.Material = constantStuff(1000, -1, 15) }, "specific heat"},
		{"no conductivity", func(p *Problem) { p.Material = constantStuff(1000, 2000, 0) }, "conductivity"},
		{"no initial temperature", func(p *Problem) { p.Initial = units.Temperature{} }, "initial"},
		{"NaN initial temperature", func(p *Problem) { p.Initial = kelvin(math.NaN()) }, "initial"},
		{"no surface", func(p *Problem) { p.Surface = boundary.Condition{} }, "surface"},
		{"nil function", func(p *Problem) { p.Surface = boundary.Function(nil) }, "surface"},
		{"surface temperature", func(p *Problem) { p.Surface = boundary.Temperature(kelvin(300)) }, "surface condition"},
		{"negative coefficient", func(p *Problem) { p.Surface = constant(-1, 300) }, "heat transfer coefficient"},
		{"coefficient that makes the time constant zero", func(p *Problem) {
			p.Material, p.Surface = constantStuff(1e-3, 1, 15), constant(math.MaxFloat64, 300)
		}, "heat transfer coefficient"},
		{"ambient at 0 K", func(p *Problem) { p.Surface = constant(1, 0) }, "ambient"},
		{"negative horizon", func(p *Problem) { p.Horizon = seconds(-1) }, "horizon"},
		{"NaN horizon", func(p *Problem) { p.Horizon = seconds(math.NaN()) }, "horizon"},
		{"function without a horizon", func(p *Problem) { p.Surface = flux(stillRoom) }, "horizon"},
		{"negative until", func(p *Problem) { p.Until = kelvin(-3) }, "until"},
		{"negative tolerance", func(p *Problem) { p.Tolerance = units.KelvinDifference.Of(-1) }, "tolerance"},
		{"infinite tolerance", func(p *Problem) { p.Tolerance = units.KelvinDifference.Of(math.Inf(1)) }, "tolerance"},
	} {
		p := good
		c.change(&p)
		s, err := p.Solve(context.Background())
		var argument *units.ArgumentError
		if s != nil || !errors.As(err, &argument) || !strings.Contains(argument.Field, c.field) {
			t.Errorf("%s: %v, %v, want an argument error of %q", c.name, s, err, c.field)
		}
	}
	var none context.Context
	if _, err := good.Solve(none); err == nil {
		t.Error("nil context: no error")
	}
	var outside *units.RangeError
	good.Initial = kelvin(6000)
	if _, err := good.Solve(context.Background()); !errors.As(err, &outside) {
		t.Errorf("start outside the range of the material: %v", err)
	}
	p := ball()
	p.Until = kelvin(6000)
	if _, err := p.Solve(context.Background()); !errors.As(err, &outside) {
		t.Errorf("until outside the range of the material: %v", err)
	}
}

func TestQuestionsThatCannotBe(t *testing.T) {
	for name, s := range map[string]*Solution{
		"closed":     solve(t, Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)}),
		"integrated": solve(t, ball()),
		"zero":       {},
		"nil":        nil,
	} {
		refused := func(what string, err error) {
			t.Helper()
			var argument *units.ArgumentError
			if !errors.As(err, &argument) {
				t.Errorf("%s, %s: %v, want an argument error", name, what, err)
			}
		}
		for _, bad := range []float64{-1, math.NaN(), math.Inf(1), math.Inf(-1)} {
			_, err := s.At(shape.Centre(), seconds(bad))
			refused("At", err)
			_, err = s.Mean(seconds(bad))
			refused("Mean", err)
			_, err = s.HeatReleased(seconds(bad))
			refused("HeatReleased", err)
			_, err = s.TimeTo(shape.Centre(), kelvin(bad))
			if !math.IsInf(bad, 1) || err != nil {
				refused("TimeTo", err)
			}
		}
		for _, place := range []shape.Place{{}, shape.Below(units.Metre.Of(1)), shape.Below(units.Metre.Of(-1))} {
			_, err := s.At(place, seconds(0))
			refused("At a place", err)
			_, err = s.TimeTo(place, kelvin(320))
			refused("TimeTo of a place", err)
			_, err = s.LumpingError(place)
			refused("LumpingError of a place", err)
			_, err = s.LumpingErrorInTime(place, kelvin(320))
			refused("LumpingErrorInTime of a place", err)
		}
		s.Biot()
		s.IntegrationError()
		if got := s.Derivation(); s != nil && s.solved != (len(got.Lines) > 0) {
			t.Errorf("%s: derivation %v", name, got)
		}
	}
	s := solve(t, ball())
	_, err := s.Mean(seconds(s.end * 1.0001))
	if err == nil || !strings.Contains(err.Error(), "0 s to ") {
		t.Errorf("beyond the end: %v", err)
	}
}

// Whatever ends an integration is its cause, and what was computed stays readable.
func TestIntegrationThatEndsEarly(t *testing.T) {
	boom := errors.New("probe failed")
	failing := func(from float64, q float64, err error) boundary.Condition {
		return boundary.Function(func(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
			if t.SI() >= from {
				return units.WattPerSquareMetre.Of(q), err
			}
			return units.WattPerSquareMetre.Of(stillRoom(0, wall.SI())), nil
		})
	}
	ended, cancel := context.WithCancel(context.Background())
	cancel()
	var argument *units.ArgumentError
	var outside *units.RangeError
	for _, c := range []struct {
		name    string
		ctx     context.Context
		surface boundary.Condition
		is      error
		as      any
		until   float64 // s, 0 for no solution
	}{
		{"error at once", context.Background(), failing(0, 0, boom), boom, nil, 0},
		{"error at 600 s", context.Background(), failing(600, 0, boom), boom, nil, 599.9},
		{"NaN at 600 s", context.Background(), failing(600, math.NaN(), nil), nil, &argument, 599.9},
		{"infinite flux at 600 s", context.Background(), failing(600, math.Inf(1), nil), nil, &argument, 599.9},
		{"range of the material left", context.Background(), flux(func(_, _ float64) float64 { return 1e5 }), nil, &outside, 60},
		{"context", ended, flux(stillRoom), context.Canceled, nil, 0},
	} {
		p := ball()
		p.Until = units.Temperature{}
		p.Surface = c.surface
		s, err := p.Solve(c.ctx)
		var convergence *units.ConvergenceError
		if !errors.As(err, &convergence) || c.is != nil && !errors.Is(err, c.is) || c.as != nil && !errors.As(err, c.as) {
			t.Errorf("%s: %v", c.name, err)
		}
		if (s != nil) != (c.until > 0) {
			t.Errorf("%s: solution %v", c.name, s)
		}
		if s == nil {
			continue
		}
		if s.end < c.until || convergence.Time != seconds(s.end) {
			t.Errorf("%s: ends at %g s, reported %v, want %g s at the least", c.name, s.end, convergence.Time, c.until)
		}
		if _, err := s.Mean(seconds(s.end)); err != nil {
			t.Errorf("%s: the end cannot be read: %v", c.name, err)
		}
		_, err = s.TimeTo(shape.Mean(), kelvin(0.5))
		if err == nil {
			t.Errorf("%s: 0.5 K is reached", c.name)
		}
	}
	closed := Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)}
	if _, err := closed.Solve(ended); !errors.Is(err, context.Canceled) {
		t.Errorf("closed form with a context that has ended: %v", err)
	}
}

// Where the exchange function cannot say what happens beyond the solution, neither does TimeTo.
func TestLimitThatCannotBeFound(t *testing.T) {
	cold := errors.New("below the range of the correlation")
	p := ball()
	p.Until, p.Horizon = units.Temperature{}, units.Minute.Of(20)
	p.Surface = boundary.Function(func(_ units.Duration, wall units.Temperature) (units.HeatFlux, error) {
		if wall.SI() < 320 {
			return units.HeatFlux{}, cold
		}
		return units.WattPerSquareMetre.Of(stillRoom(0, wall.SI())), nil
	})
	s := solve(t, p)
	var convergence *units.ConvergenceError
	if _, err := s.TimeTo(shape.Mean(), kelvin(310)); !errors.As(err, &convergence) || !errors.Is(err, cold) {
		t.Errorf("beyond what the function knows: %v", err)
	}
	if got, err := s.TimeTo(shape.Mean(), kelvin(340)); err != nil || got.SI() <= 0 {
		t.Errorf("within the solution: %v, %v", got, err)
	}
	if r := s.Derivation(); len(r.Warnings) != 2 || !strings.Contains(r.Warnings[0], cold.Error()) {
		t.Errorf("warnings %q", r.Warnings)
	}
	if b := s.Biot(); !(b.Conduction > 0) {
		t.Errorf("Biot number %v", b)
	}
}

func TestFunctionWithoutExchange(t *testing.T) {
	p := ball()
	p.Surface = flux(func(_, _ float64) float64 { return 0 })
	s := solve(t, p)
	var never *units.NeverError
	if _, err := s.TimeTo(shape.Mean(), kelvin(300)); !errors.As(err, &never) || never.Limit != p.Initial {
		t.Errorf("a body at rest: %v", err)
	}
	if e, err := s.LumpingError(shape.Centre()); err != nil || e.SI() != 0 {
		t.Errorf("lumping error %v, %v", e, err)
	}
}

// A flux that jumps back and forth at each call cannot be integrated; the error says so within bounded
// work.
func TestFunctionThatCannotBeIntegrated(t *testing.T) {
	sign := 1.0
	p := ball()
	p.Surface = flux(func(_, wall float64) float64 { sign = -sign; return sign * 1e6 })
	_, err := p.Solve(context.Background())
	var convergence *units.ConvergenceError
	if !errors.As(err, &convergence) || convergence.Reason == "" {
		t.Errorf("%v, want that it was given up", err)
	}
}

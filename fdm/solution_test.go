package fdm_test

import (
	"context"
	"errors"
	"math"
	"strings"
	"sync"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// Answers to "when": reached, met at the start, never, or not within the horizon.
func TestTimeTo(t *testing.T) {
	cooling := scaled(1, 0)
	cooling.Horizon = seconds(5000)
	heating := cooling
	heating.Surface = constant(10, 500)
	function := cooling
	function.Surface = exchange(func(_, T float64) float64 { return 10 * (T - 300) })
	noFlow := cooling
	noFlow.Surface = constant(0, 300)
	balance := cooling
	balance.Surface = constant(10, 400)
	// 40 minutes in a furnace, then cold air.
	both := cooling
	both.Horizon = seconds(9000)
	both.Surface = exchange(func(time, T float64) float64 {
		fade := 0.5 * (1 + math.Tanh((time-2400)/60))
		return 20 * (T - (900 - 620*fade))
	})
	heater := cooling // gives off 1000 W/m² whatever the temperature: the end of the range is the end
	heater.Surface = exchange(func(_, _ float64) float64 { return -100 })
	hidden := cooling // fails below 340 K, which the surface does not reach
	hidden.Horizon = seconds(300)
	hidden.Surface = boundary.Function(func(_ units.Duration, T units.Temperature) (units.HeatFlux, error) {
		if T.SI() < 340 {
			return units.HeatFlux{}, errOwn
		}
		return units.WattPerSquareMetre.Of(10 * (T.SI() - 300)), nil
	})
	const reached, met, never, horizon, failed = "reached", "met at the start", "never", "beyond the horizon", "limit unknown"
	for _, c := range []struct {
		name    string
		p       fdm.Problem
		target  float64
		want    string
		limit   float64
		between [2]float64 // time, if reached
	}{
		{"cooling", cooling, 390, reached, 0, [2]float64{500, 3000}},
		{"cooling, far", cooling, 305, horizon, 300, [2]float64{}},
		{"cooling, start", cooling, 400, met, 0, [2]float64{}},
		{"cooling, above", cooling, 500, met, 0, [2]float64{}},
		{"cooling, ambient", cooling, 300, never, 300, [2]float64{}},
		{"cooling, below", cooling, 250, never, 300, [2]float64{}},
		{"heating", heating, 410, reached, 0, [2]float64{500, 3000}},
		{"heating, far", heating, 499, horizon, 500, [2]float64{}},
		{"heating, ambient", heating, 500, never, 500, [2]float64{}},
		{"heating, below", heating, 300, met, 0, [2]float64{}},
		{"function", function, 390, reached, 0, [2]float64{500, 3000}},
		{"function, far", function, 305, horizon, 300, [2]float64{}},
		{"function, limit", function, 299.999, never, 300, [2]float64{}},
		{"function, above", function, 450, met, 0, [2]float64{}},
		{"no exchange", noFlow, 390, never, 400, [2]float64{}},
		{"no exchange, start", noFlow, 400, met, 400, [2]float64{}},
		{"in balance", balance, 390, never, 400, [2]float64{}},
		{"heated then cooled", both, 450, reached, 0, [2]float64{600, 2400}},
		{"heated then cooled, above", both, 2000, never, 280, [2]float64{}},
		{"heated then cooled, below", both, 285, horizon, 280, [2]float64{}},
		{"heated then cooled, never", both, 270, never, 280, [2]float64{}},
		{"heater", heater, 4000, horizon, 5000, [2]float64{}},
		{"heater, beyond the range", heater, 6000, horizon, 5000, [2]float64{}},
		{"heater, below", heater, 399, met, 0, [2]float64{}},
		{"limit fails", hidden, 320, failed, 0, [2]float64{}},
	} {
		s := solve(t, c.p)
		got, err := s.TimeTo(shape.Centre(), kelvin(c.target))
		var n *units.NeverError
		var h *units.HorizonError
		var g *units.ConvergenceError
		what, limit := reached, 0.0
		switch {
		case err == nil && got.SI() == 0:
			what = met
		case errors.As(err, &n):
			what, limit = never, n.Limit.SI()
			if _, _, constant := c.p.Surface.Constants(); constant != (n.Condition == "") || n.Place != "centre" || n.Target.SI() != c.target {
				t.Errorf("%s: %+v", c.name, n)
			}
		case errors.As(err, &h):
			what, limit = horizon, h.Limit.SI()
			if T := at(t, s, shape.Centre(), c.p.Horizon.SI()); h.Reached.SI() != T || h.Horizon != c.p.Horizon {
				t.Errorf("%s: %+v, want %g K reached", c.name, h, T)
			}
		case errors.As(err, &g) && errors.Is(err, errOwn):
			what = failed
		case err != nil:
			t.Errorf("%s: %v", c.name, err)
			continue
		}
		if what != c.want || (limit != 0 && !near(limit, c.limit, 1e-6)) {
			t.Errorf("%s: %s at %v, limit %g K; want %s, limit %g K", c.name, what, got, limit, c.want, c.limit)
		}
		if c.want == reached && !(got.SI() > c.between[0] && got.SI() < c.between[1]) {
			t.Errorf("%s: reached at %v, want between %g and %g s", c.name, got, c.between[0], c.between[1])
		}
	}
}

// A body that has settled at the limit is never there, however rounding falls; one that passes through
// the limit by more than the tolerance is.
func TestLimitIsNeverReached(t *testing.T) {
	for name, surface := range map[string]boundary.Condition{
		"constant": constant(50, 300), "function": exchange(func(_, T float64) float64 { return 50 * (T - 300) }),
		"root": exchange(func(_, T float64) float64 { return 5 * (T - 300) * math.Sqrt(math.Abs(T-300)) }),
	} {
		p := scaled(1, 20)
		p.Surface, p.Horizon = surface, units.Day.Of(30)
		s := solve(t, p)
		for _, target := range []float64{300, 300 - 1e-9, 300 + 1e-7, 299.9} {
			got, err := s.TimeTo(shape.Surface(), kelvin(target))
			var never *units.NeverError
			if target > 300 && err == nil {
				continue // on this side it may be there
			}
			if !errors.As(err, &never) {
				t.Errorf("%s: %.10g K at %v, %v, want never", name, target, got, err)
			}
		}
	}
	p := scaled(1, 20)
	p.Surface = exchange(func(time, T float64) float64 { return 50 * (T - 300 - 200*math.Sin(time/2000)) })
	p.Horizon = seconds(4000 * math.Pi)
	s := solve(t, p)
	got, err := s.TimeTo(shape.Surface(), kelvin(300))
	if err != nil || !near(at(t, s, shape.Surface(), got.SI()), 300, 1e-9) {
		t.Errorf("through the limit: %v, %v, want a time", got, err)
	}
}

// The time is that of the solution to 1e-12: just before it the place is not there, and never was.
func TestTimeToIsFirst(t *testing.T) {
	p := scaled(2, 40)
	p.Surface = exchange(func(time, T float64) float64 { return 50 * (T - 350 - 100*math.Sin(time/700)) })
	p.Horizon = seconds(2e4)
	s := solve(t, p)
	for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean(), below(0.63)} {
		for _, target := range []float64{401, 399, 380, 352, 345} {
			got, err := s.TimeTo(place, kelvin(target))
			if err != nil {
				continue
			}
			if T := at(t, s, place, got.SI()); !near(T, target, 1e-9) {
				t.Errorf("%v: %.12g K at the time of %g K", place, T, target)
			}
			sign := math.Copysign(1, target-400)
			for i := range 2000 {
				time := got.SI() * (1 - 1e-11) * float64(i) / 2000
				if T := at(t, s, place, time); sign*(T-target) > 1e-9 {
					t.Errorf("%v: beyond %g K at %g s, before %v", place, target, time, got)
					break
				}
			}
		}
	}
}

// A turn between the ends of a step is seen: temperatures just short of the extremes that a fine scan finds
// are reached.
func TestTurnsWithinSteps(t *testing.T) {
	p := scaled(2, 20)
	p.Surface = exchange(func(time, T float64) float64 { return 50 * (T - 400 - 100*math.Sin(time/700)) })
	p.Horizon, p.Tolerance = seconds(6000), units.KelvinDifference.Of(0.1) // large steps
	s := solve(t, p)
	for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean(), below(0.63)} {
		high, low := 0.0, math.Inf(1)
		for time := 0.0; time <= 6000; time += 0.5 {
			T := at(t, s, place, time)
			high, low = max(high, T), min(low, T)
		}
		for _, target := range []float64{high - 1e-4, low + 1e-4} {
			if got, err := s.TimeTo(place, kelvin(target)); err != nil || !near(at(t, s, place, got.SI()), target, 1e-9) {
				t.Errorf("%v: %g K at %v, %v, with extremes of %g and %g K", place, target, got, err, low, high)
			}
		}
	}
}

func TestPlacesAndTimes(t *testing.T) {
	s := solve(t, scaled(1, 20))
	var a *units.ArgumentError
	for _, time := range []float64{-1, math.NaN(), math.Inf(1), 5e4 * (1 + 1e-15)} {
		_, e1 := s.At(shape.Centre(), seconds(time))
		_, e2 := s.Mean(seconds(time))
		_, e3 := s.HeatReleased(seconds(time))
		_, e4 := s.StepError(shape.Surface(), seconds(time))
		_, e5 := s.ErrorEstimate(shape.Centre(), seconds(time))
		for _, err := range []error{e1, e2, e3, e4, e5} {
			if !errors.As(err, &a) || a.Field != "time" {
				t.Errorf("time %g: %v, want an ArgumentError of the time", time, err)
			}
		}
	}
	for _, place := range []shape.Place{{}, shape.Below(units.Metre.Of(0.11)), shape.Below(units.Metre.Of(-1)), shape.Below(units.Metre.Of(math.NaN()))} {
		_, e1 := s.At(place, seconds(1))
		_, e2 := s.TimeTo(place, kelvin(350))
		_, e3 := s.GridError(place, seconds(1))
		for _, err := range []error{e1, e2, e3} {
			if !errors.As(err, &a) {
				t.Errorf("place %v: %v, want an ArgumentError", place, err)
			}
		}
	}
	for _, target := range []float64{0, -1, math.NaN(), math.Inf(1)} {
		if _, err := s.TimeTo(shape.Centre(), kelvin(target)); !errors.As(err, &a) {
			t.Errorf("target %g K: %v, want an ArgumentError", target, err)
		}
	}
	if got, err := s.Mean(seconds(700)); err != nil || got.SI() != at(t, s, shape.Mean(), 700) {
		t.Errorf("Mean %v (%v), want that of At", got, err)
	}
	// No solution at all.
	for _, none := range []*fdm.Solution{nil, {}} {
		_, e1 := none.At(shape.Centre(), seconds(0))
		_, e2 := none.TimeTo(shape.Centre(), kelvin(300))
		_, e3 := none.HeatReleased(seconds(0))
		_, e4 := none.GridError(shape.Centre(), seconds(0))
		for _, err := range []error{e1, e2, e3, e4} {
			if !errors.As(err, &a) {
				t.Errorf("no solution: %v, want an ArgumentError", err)
			}
		}
		none.Derivation()
		none.Statistics()
		none.Horizon()
		none.EnergyBalance()
	}
}

// Between nodes: falling, but for a millionth of the range and the estimate of the error, and continuous across each node.
func TestBetweenNodes(t *testing.T) {
	p := scaled(100, 12) // a steep profile on a coarse grid
	s := solve(t, p)
	for _, time := range []float64{0.01, 1, 30, 500} {
		last := math.Inf(1)
		for x := 0.0; x <= 1; x += 1e-4 {
			T := at(t, s, below(min(x, 1)), time)
			tol := 1e-4 + estimate(t, s, below(min(x, 1)), time)
			if T > last+tol || T < 300-2e-3-tol || T > 400+2e-3+tol {
				t.Errorf("%g s: %g K at x = %g, next to %g K", time, T, x, last)
				break
			}
			if !math.IsInf(last, 1) && last-T > 1 {
				t.Errorf("%g s: a jump from %g to %g K at x = %g", time, last, T, x)
				break
			}
			last = T
		}
	}
}

func TestManyGoroutines(t *testing.T) {
	s := solve(t, steelSphere(20))
	want, err := s.TimeTo(shape.Centre(), kelvin(500))
	if err != nil {
		t.Fatal(err)
	}
	var wait sync.WaitGroup
	for range 8 {
		wait.Go(func() {
			for i := range 50 {
				if got, err := s.TimeTo(shape.Centre(), kelvin(500)); err != nil || got != want {
					t.Errorf("%v, %v, want %v", got, err, want)
				}
				s.At(shape.Below(units.Millimetre.Of(float64(i)/2)), seconds(float64(i)*72))
				s.GridError(shape.Mean(), seconds(float64(i)*72))
				_ = s.Derivation().String()
			}
		})
	}
	wait.Wait()
}

// A run with ten times the steps allocates storage for them only: three vectors a step in blocks, and the
// lists of times and errors.
func TestAllocationsPerStep(t *testing.T) {
	measure := func(tolerance float64) (allocations, steps float64) {
		p := steelSphere(10)
		p.Material = plain{7850, 600, 40}
		p.Tolerance = units.KelvinDifference.Of(tolerance)
		allocations = testing.AllocsPerRun(3, func() {
			s, err := p.Solve(context.Background())
			if err != nil {
				t.Fatal(err)
			}
			steps = float64(s.Statistics().Steps)
		})
		return allocations, steps
	}
	a1, n1 := measure(0.1)
	a2, n2 := measure(1e-7)
	if n2 < 5*n1 {
		t.Fatalf("%g and %g steps", n1, n2)
	}
	// Two runs, a block per 32 steps; each list doubles a few times.
	if most := a1 + 2*(n2-n1)/32 + 60; a2 > most {
		t.Errorf("%g allocations for %g steps and %g for %g, want at most %g", a1, n1, a2, n2, most)
	}
}

// A wall between two faces has a limit for each place: never beyond it, however long one waits, and not within the
// horizon short of it.
func TestLimitsOfAWall(t *testing.T) {
	p := scaled(1, 40)
	p.Body, p.Initial, p.Horizon = sheet(0.1), kelvin(300), seconds(2000)
	p.Surface, p.Opposite = boundary.Temperature(kelvin(500)), constant(10, 300) // the opposite face tends to 400 K
	s := solve(t, p)
	middle := shape.Below(metres(0.05))
	for _, c := range []struct {
		place  shape.Place
		target float64
		want   string
		limit  float64
	}{
		{shape.Opposite(), 390, "horizon", 400},
		{shape.Opposite(), 400, "never", 400},
		{shape.Opposite(), 450, "never", 400},
		{shape.Opposite(), 290, "met", 0},
		{middle, 445, "horizon", 450},
		{middle, 455, "never", 450},
		{shape.Mean(), 445, "horizon", 450},
		{shape.Mean(), 455, "never", 450},
		{shape.Surface(), 501, "never", 500},
		{shape.Below(metres(0.01)), 450, "reached", 0},
	} {
		got, err := s.TimeTo(c.place, kelvin(c.target))
		var n *units.NeverError
		var h *units.HorizonError
		what, limit := "reached", 0.0
		switch {
		case errors.As(err, &n):
			what, limit = "never", n.Limit.SI()
			if n.Condition != "" {
				t.Errorf("%v: condition %q of a limit by constants", c.place, n.Condition)
			}
		case errors.As(err, &h):
			what, limit = "horizon", h.Limit.SI()
		case err == nil && got.SI() == 0:
			what = "met"
		}
		if what != c.want || !near(limit, c.limit, 1e-3) {
			t.Errorf("%v at %g K: %s at %v, limit %g K, want %s, limit %g K", c.place, c.target, what, got, limit, c.want, c.limit)
		}
	}
	for _, place := range []shape.Place{shape.Centre(), shape.Mean(), {}} {
		if _, err := s.Flux(place, seconds(1)); err == nil {
			t.Errorf("a flux at the %v", place)
		}
		if _, err := s.HeatThrough(place, seconds(1)); err == nil {
			t.Errorf("heat through the %v", place)
		}
		if _, err := s.LumpAt(place, seconds(1)); err == nil {
			t.Errorf("a lump at the %v", place)
		}
	}
	if _, err := s.LumpAt(shape.Surface(), seconds(1)); err == nil {
		t.Error("a lump where none is")
	}
	ball := solve(t, scaled(1, 10))
	if _, err := ball.Flux(shape.Opposite(), seconds(1)); err == nil {
		t.Error("an opposite face of a sphere")
	}
	text := s.Derivation().String()
	for _, want := range []string{"T,o", "T,c,lim", "opposite face: heat transfer coefficient"} {
		if !strings.Contains(text, want) {
			t.Errorf("derivation without %q:\n%s", want, text)
		}
	}
}

// Heat by the fluxes at both faces, with a quadrature of its own, against the heat of the solution and what the source
// gave, within the estimate of the surface temperature times the coefficient.
func TestHeatOfFacesByQuadrature(t *testing.T) {
	p := scaled(1, 60)
	p.Body, p.Opposite = sheet(0.1), constant(25, 450)
	p.Horizon = seconds(2e4)
	p.Source = func(depth units.Length, time units.Duration, T units.Temperature) (units.HeatSource, error) {
		return units.WattPerCubicMetre.Of(3000 * depth.SI() / 0.1 * (1 + math.Sin(time.SI()/2000))), nil
	}
	s := solve(t, p)
	for place, h := range map[shape.Place]float64{shape.Surface(): 10, shape.Opposite(): 25} {
		sum, from := 0.0, 0.0
		for to := 1e-4; from < 2e4; to = min(to*1.4, 2e4) {
			sum += quad.Fixed(func(time float64) float64 {
				q, err := s.Flux(place, seconds(time))
				if err != nil {
					t.Fatal(err)
				}
				return q.SI()
			}, from, to, 8, nil, 0)
			from = to
		}
		largest, err := s.LargestError()
		if err != nil {
			t.Fatal(err)
		}
		got, err := s.HeatThrough(place, s.Horizon())
		if allowed := h * 2e4 * largest.SI(); err != nil || !near(got.SI(), sum, allowed) {
			t.Errorf("heat through the %v %v (%v), by quadrature %g J, want to %g J", place, got, err, sum, allowed)
		}
	}
	given, err := s.HeatGenerated(s.Horizon())
	if want := 3000 * 0.05 * (2e4 + 2000*(1-math.Cos(10))); err != nil || !near(given.SI(), want, 1e-4*want) {
		t.Errorf("heat given %v (%v), want %g J", given, err, want)
	}
}

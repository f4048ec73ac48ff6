package fdm_test

import (
	"context"
	"errors"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// broken is a material with one thing wrong.
type broken struct {
	plain
	density                    float64
	conductivity, specificHeat float64
	low, high                  float64
	err                        error
}

func (m broken) Density() units.Density { return units.KilogramPerCubicMetre.Of(m.density) }
func (m broken) Conductivity(units.Temperature) (units.Conductivity, error) {
	return units.WattPerMetreKelvin.Of(m.conductivity), m.err
}

func (m broken) SpecificHeat(units.Temperature) (units.SpecificHeat, error) {
	return units.JoulePerKilogramKelvin.Of(m.specificHeat), m.err
}
func (m broken) Range() (low, high units.Temperature) { return kelvin(m.low), kelvin(m.high) }

var errOwn = errors.New("own")

func TestBadInput(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(1)
	whole := broken{plain{1000, 1000, 1}, 1000, 1, 1000, 1, 5000, nil}
	material := func(change func(m *broken)) func(p *fdm.Problem) {
		return func(p *fdm.Problem) {
			m := whole
			change(&m)
			p.Material = m
		}
	}
	layers := func(all ...fdm.Layer) func(p *fdm.Problem) {
		return func(p *fdm.Problem) { p.Material, p.Layers = nil, all }
	}
	for _, c := range []struct {
		name   string
		change func(p *fdm.Problem)
		field  string
	}{
		{"no body", func(p *fdm.Problem) { p.Body = shape.Body{} }, "body"},
		{"negative diameter", func(p *fdm.Problem) { p.Body = shape.Sphere(units.Metre.Of(-1)) }, "sphere: diameter"},
		{"NaN diameter", func(p *fdm.Problem) { p.Body = shape.Sphere(units.Metre.Of(nan)) }, "sphere: diameter"},
		{"tiny diameter", func(p *fdm.Problem) { p.Body = shape.Sphere(units.Metre.Of(1e-20)) }, "body: conduction length"},
		{"overflow of the Biot number", func(p *fdm.Problem) { p.Surface = constant(1e308, 300); p.Material = plain{1000, 1000, 1e-3} }, "1 + Biot number"},
		{"no material", func(p *fdm.Problem) { p.Material = nil }, "material"},
		{"no density", material(func(m *broken) { m.density = 0 }), "material: density"},
		{"range upside down", material(func(m *broken) { m.low, m.high = 500, 300 }), "material: range from"},
		{"NaN range", material(func(m *broken) { m.low = nan }), "material: range from"},
		{"no conductivity", material(func(m *broken) { m.conductivity = 0 }), "material: conductivity at"},
		{"infinite conductivity", material(func(m *broken) { m.conductivity = inf }), "material: conductivity at"},
		{"negative specific heat", material(func(m *broken) { m.specificHeat = -5 }), "material: specific heat at"},
		{"specific heat at odds with enthalpy", material(func(m *broken) { m.specificHeat = 1100 }), "material: specific heat at"},
		{"no start", func(p *fdm.Problem) { p.Initial = units.Temperature{} }, "initial temperature"},
		{"NaN start", func(p *fdm.Problem) { p.Initial = kelvin(nan) }, "initial temperature"},
		{"no surface", func(p *fdm.Problem) { p.Surface = boundary.Condition{} }, "surface condition"},
		{"nil function", func(p *fdm.Problem) { p.Surface = boundary.Function(nil) }, "surface condition"},
		{"NaN surface temperature", func(p *fdm.Problem) { p.Surface = boundary.Temperature(kelvin(nan)) }, "surface condition: temperature"},
		{"NaN flux", func(p *fdm.Problem) { p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(nan)) }, "surface condition: heat flux"},
		{"negative coefficient", func(p *fdm.Problem) { p.Surface = constant(-1, 300) }, "surface condition: heat transfer coefficient"},
		{"NaN ambient", func(p *fdm.Problem) { p.Surface = constant(1, nan) }, "surface condition: ambient"},
		{"no horizon", func(p *fdm.Problem) { p.Horizon = units.Duration{} }, "horizon"},
		{"infinite horizon", func(p *fdm.Problem) { p.Horizon = seconds(inf) }, "horizon"},
		{"negative until", func(p *fdm.Problem) { p.Until = kelvin(-1) }, "until"},
		{"few cells", func(p *fdm.Problem) { p.Cells = 3 }, "cells"},
		{"negative cells", func(p *fdm.Problem) { p.Cells = -100 }, "cells"},
		{"many cells", func(p *fdm.Problem) { p.Cells = math.MaxInt32 }, "cells"},
		{"layer of zero thickness", layers(fdm.Layer{Material: whole, Thickness: metres(0.1)}, fdm.Layer{Material: whole}), "layer 2: thickness"},
		{"layer of negative thickness", layers(fdm.Layer{Material: whole, Thickness: metres(0.2)}, fdm.Layer{Material: whole, Thickness: metres(-0.1)}), "layer 2: thickness"},
		{"NaN thickness of a layer", layers(fdm.Layer{Material: whole, Thickness: metres(nan)}), "layer 1: thickness"},
		{"layer without a material", layers(fdm.Layer{Thickness: metres(0.1)}), "layer 1: material"},
		{"layers thicker than the body", layers(fdm.Layer{Material: whole, Thickness: metres(0.11)}), "layers: thickness together"},
		{"NaN contact", layers(
			fdm.Layer{Material: whole, Thickness: metres(0.05), Contact: units.SquareMetreKelvinPerWatt.Of(nan)}, fdm.Layer{Material: whole, Thickness: metres(0.05)},
		), "layer 1: contact"},
		{"contact below the innermost layer", layers(fdm.Layer{Material: whole, Thickness: metres(0.1), Contact: units.SquareMetreKelvinPerWatt.Of(1)}), "layer 1: contact"},
		{"lump without heat capacity", func(p *fdm.Problem) {
			p.SurfaceLump = &fdm.Lump{Coefficient: units.WattPerSquareMetreKelvin.Of(1), Initial: kelvin(300)}
		}, "surface lump: heat capacity"},
		{"NaN coefficient at the opposite face", func(p *fdm.Problem) { p.Body, p.Opposite = sheet(0.1), constant(nan, 300) }, "opposite face: surface condition"},
		{"lump that is held", func(p *fdm.Problem) {
			p.SurfaceLump = &fdm.Lump{
				HeatCapacity: units.JoulePerKelvin.Of(1), Coefficient: units.WattPerSquareMetreKelvin.Of(1), Initial: kelvin(300), Exchange: boundary.Temperature(kelvin(300)),
			}
		}, "surface lump: surface condition"},
		{"NaN start of a lump", func(p *fdm.Problem) {
			p.SurfaceLump = &fdm.Lump{HeatCapacity: units.JoulePerKelvin.Of(1), Coefficient: units.WattPerSquareMetreKelvin.Of(1), Initial: kelvin(nan)}
		}, "surface lump: initial temperature"},
		{"NaN profile", func(p *fdm.Problem) {
			p.Initial, p.Profile = units.Temperature{}, func(units.Length) (units.Temperature, error) { return kelvin(nan), nil }
		}, "profile: temperature"},
		{"NaN accuracy", func(p *fdm.Problem) { p.Cells, p.Accuracy = 0, units.KelvinDifference.Of(nan) }, "accuracy"},
		{"accuracy beside cells", func(p *fdm.Problem) { p.Accuracy = units.KelvinDifference.Of(1) }, "accuracy"},
		{"smallest cell as wide as the body", func(p *fdm.Problem) { p.Smallest = metres(0.1) }, "smallest cell"},
		{"NaN smallest cell", func(p *fdm.Problem) { p.Smallest = metres(nan) }, "smallest cell"},
		{"negative tolerance", func(p *fdm.Problem) { p.Tolerance = units.KelvinDifference.Of(-1e-3) }, "tolerance"},
		{"NaN tolerance", func(p *fdm.Problem) { p.Tolerance = units.KelvinDifference.Of(nan) }, "tolerance"},
	} {
		p := scaled(1, 10)
		c.change(&p)
		s, err := p.Solve(context.Background())
		var a *units.ArgumentError
		if !errors.As(err, &a) || len(a.Field) < len(c.field) || a.Field[:len(c.field)] != c.field || a.Accepted == "" {
			t.Errorf("%s: %v, want an ArgumentError of %q", c.name, err, c.field)
		}
		if s != nil {
			t.Errorf("%s: a solution beside the error", c.name)
		}
	}
	var none context.Context
	if _, err := scaled(1, 10).Solve(none); err == nil {
		t.Error("nil context: no error")
	}
	p := scaled(1, 10)
	material(func(m *broken) { m.err = errOwn })(&p)
	if _, err := p.Solve(context.Background()); !errors.Is(err, errOwn) {
		t.Errorf("failing material: %v, want its error", err)
	}
}

// coarse has an inverse of the enthalpy that is rounded to half a kelvin.
type coarse struct{ plain }

func (m coarse) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	return kelvin(math.Round(2*h.SI()/m.specificHeat) / 2), nil
}

func TestCoarseInverse(t *testing.T) {
	p := scaled(1, 10)
	p.Material, p.Surface = coarse{plain{1000, 1000, 1}}, constant(10, 367.3)
	var a *units.ArgumentError
	if _, err := p.Solve(context.Background()); !errors.As(err, &a) {
		t.Errorf("%v, want an ArgumentError of the material", err)
	}
}

// leaping has a conductivity that jumps where no kink is declared.
type leaping struct{ plain }

func (m leaping) Conductivity(T units.Temperature) (units.Conductivity, error) {
	if T.SI() > 341.7 {
		return units.WattPerMetreKelvin.Of(20 * m.conductivity), nil
	}
	return units.WattPerMetreKelvin.Of(m.conductivity), nil
}

// declared has the same conductivity, and says so.
type declared struct{ leaping }

func (declared) Kinks() []units.Temperature { return []units.Temperature{kelvin(341.7)} }

// The table is refused, or what follows from it is what follows with the jump declared.
func TestJumpWithoutKink(t *testing.T) {
	p := scaled(1, 10)
	p.Surface = exchange(func(_, T float64) float64 { return 10 * (T - 300) }) // a table of the whole range
	p.Material = declared{leaping{plain{1000, 1000, 1}}}
	want := solve(t, p)
	p.Material = leaping{plain{1000, 1000, 1}}
	got, err := p.Solve(context.Background())
	var a *units.ArgumentError
	if err != nil {
		if !errors.As(err, &a) || a.Field != "material: table of its properties, off by" {
			t.Errorf("%v, want an ArgumentError of the table", err)
		}
		return
	}
	for _, time := range []float64{1000, 5000, 2e4} {
		if a, b := at(t, got, shape.Centre(), time), at(t, want, shape.Centre(), time); !near(a, b, 0.01) {
			t.Errorf("at %g s: %.6f K, with the jump declared %.6f K", time, a, b)
		}
	}
}

// An exchange function may accept temperatures up to the start only.
func TestExchangeUpToTheStart(t *testing.T) {
	p := scaled(1, 10)
	p.Surface = boundary.Function(func(_ units.Duration, T units.Temperature) (units.HeatFlux, error) {
		if T.SI() > 400 {
			return units.HeatFlux{}, errOwn
		}
		return units.WattPerSquareMetre.Of(10 * (T.SI() - 300)), nil
	})
	if _, err := p.Solve(context.Background()); err != nil {
		t.Error(err)
	}
}

// A burst of heat in a tenth of the time, out of a balance in which steps would grow, is not passed
// over wherever it falls.
func TestBurst(t *testing.T) {
	for from := 500.0; from < 9000; from += 700 {
		p := scaled(1, 10)
		p.Horizon = seconds(1e4)
		p.Surface = exchange(func(time, _ float64) float64 {
			if time > from && time < from+1000 {
				return -100
			}
			return 0
		})
		s := solve(t, p)
		want := -100 * 1000 * p.Body.Area().SI()
		if got := heat(t, s, 1e4); !near(got, want, 0.001*-want) {
			t.Errorf("from %g s: heat %g J, want %g J to 0.1 %%", from, got, want)
		}
	}
}

func TestStartOutsideRange(t *testing.T) {
	p := scaled(1, 10)
	p.Initial = kelvin(6000)
	var r *units.RangeError
	if _, err := p.Solve(context.Background()); !errors.As(err, &r) || r.Max.SI() != 5000 {
		t.Errorf("%v, want a RangeError up to 5000 K", err)
	}
	p.Material, p.Initial = steel, kelvin(1300)
	if _, err := p.Solve(context.Background()); !errors.As(err, &r) || r.Source != "test" {
		t.Errorf("%v, want the RangeError of the material", err)
	}
}

// What ends a run is told with time and place, and the solution stays readable until then.
func TestEarlyEnd(t *testing.T) {
	failing := func(from float64) boundary.Condition {
		return boundary.Function(func(time units.Duration, T units.Temperature) (units.HeatFlux, error) {
			if time.SI() > from {
				return units.HeatFlux{}, errOwn
			}
			return units.WattPerSquareMetre.Of(10 * (T.SI() - 300)), nil
		})
	}
	nan := exchange(func(time, T float64) float64 {
		if T < 370 {
			return math.NaN()
		}
		return 10 * (T - 300)
	})
	var argument *units.ArgumentError
	var outside *units.RangeError
	for _, c := range []struct {
		name     string
		change   func(p *fdm.Problem)
		from, to float64 // time of the end
		place    string
		cause    func(err error) bool
	}{
		{"exchange fails after 500 s", func(p *fdm.Problem) { p.Surface = failing(500) }, 499.9, 500, "surface", func(err error) bool { return errors.Is(err, errOwn) }},
		{"exchange fails at once", func(p *fdm.Problem) { p.Surface = failing(-1) }, 0, 0, "surface", func(err error) bool { return errors.Is(err, errOwn) }},
		{"exchange is NaN below 370 K", func(p *fdm.Problem) { p.Surface = nan }, 10, 2000, "surface", func(err error) bool { return errors.As(err, &argument) }},
		{
			"heated beyond the range", func(p *fdm.Problem) { p.Material, p.Surface = steel, constant(2000, 2000) }, 1, 5e4, "surface",
			func(err error) bool { return errors.As(err, &outside) && outside.Max.SI() == 1200 },
		},
		{"heated beyond the range by a function", func(p *fdm.Problem) {
			p.Material, p.Surface = steel, exchange(func(_, _ float64) float64 { return -3e5 })
		}, 1, 5e4, "surface", func(err error) bool { return errors.As(err, &outside) && outside.Max.SI() == 1200 }},
		{"a surface that is led beyond the range", func(p *fdm.Problem) {
			p.Material, p.Surface = steel, boundary.TemperatureFollowing(boundary.Ramp(kelvin(400), units.KelvinPerSecond.Of(0.1)))
		}, 7900, 8100, "surface", func(err error) bool { return errors.As(err, &outside) && outside.Max.SI() == 1200 }},
		{"a surface that jumps beyond the range", func(p *fdm.Problem) {
			p.Material, p.Surface = steel, boundary.TemperatureFollowing(boundary.Log(
				[]units.Duration{{}, seconds(1000), seconds(1000), seconds(1e5)}, []units.Temperature{kelvin(400), kelvin(400), kelvin(1300), kelvin(1300)},
			))
		}, 1000, 1100, "surface", func(err error) bool { return errors.As(err, &outside) && outside.Max.SI() == 1200 }},
		{"heat from inside that leads beyond the range", func(p *fdm.Problem) {
			p.Material = steel
			p.Source = func(units.Length, units.Duration, units.Temperature) (units.HeatSource, error) {
				return units.WattPerCubicMetre.Of(1e7), nil
			}
		}, 100, 5e3, "centre", func(err error) bool { return errors.As(err, &outside) && outside.Max.SI() == 1200 }},
	} {
		p := scaled(1, 20)
		c.change(&p)
		s, err := p.Solve(context.Background())
		var e *units.ConvergenceError
		if !errors.As(err, &e) || e.Place != c.place || e.Reason == "" || !c.cause(err) {
			t.Errorf("%s: %v, want a ConvergenceError at the %s with its cause", c.name, err, c.place)
			continue
		}
		if end := e.Time.SI(); !(end >= c.from && end <= c.to) || s.Horizon() != e.Time {
			t.Errorf("%s: ended at %g s (error) and %v (solution), want %g to %g s", c.name, end, s.Horizon(), c.from, c.to)
		}
		for _, time := range []float64{0, e.Time.SI() / 2, e.Time.SI()} {
			if T := at(t, s, shape.Surface(), time); !(T > 250 && T < 1201) {
				t.Errorf("%s: %g K at %g s", c.name, T, time)
			}
		}
		if _, err := s.At(shape.Centre(), seconds(e.Time.SI()+1)); !errors.As(err, &argument) {
			t.Errorf("%s: %v beyond the end, want an ArgumentError", c.name, err)
		}
		if _, err := s.GridError(shape.Centre(), e.Time); err == nil {
			t.Errorf("%s: an estimate of the grid error without the second run", c.name)
		}
		if r := s.Derivation(); len(r.Warnings) == 0 {
			t.Errorf("%s: no warning in the derivation", c.name)
		}
	}
}

// The run with a constant ambient at the very end of the range must not fail by an overshoot.
func TestAmbientAtEndOfRange(t *testing.T) {
	for _, ambient := range []float64{steel.low, steel.high} {
		for _, surface := range []boundary.Condition{constant(5000, ambient), exchange(func(_, T float64) float64 { return 5000 * (T - ambient) })} {
			p := fdm.Problem{Body: shape.Sphere(units.Millimetre.Of(20)), Material: steel, Initial: kelvin(700), Surface: surface, Horizon: units.Hour.Of(1)}
			s := solve(t, p)
			if T := at(t, s, shape.Centre(), 3600); !near(T, ambient, 1e-3) {
				t.Errorf("end at %g K, want %g K", T, ambient)
			}
		}
	}
}

// A start that rounding sets beside the end of a range is one at the end.
func TestStartBesideEndOfRange(t *testing.T) {
	for _, start := range []float64{math.Nextafter(steel.low, 500), math.Nextafter(steel.high, 500)} {
		p := fdm.Problem{Body: shape.Sphere(units.Millimetre.Of(20)), Material: steel, Initial: kelvin(start), Surface: constant(50, 600), Horizon: units.Hour.Of(1)}
		if T := at(t, solve(t, p), shape.Centre(), 0); !near(T, start, 1e-8) {
			t.Errorf("start at %.12g K, want %.12g K", T, start)
		}
	}
}

// A thermostat that switches at a temperature holds it, or the error says that the steps do not get on.
func TestJumpInExchange(t *testing.T) {
	p := scaled(1, 10)
	p.Surface = exchange(func(_, T float64) float64 {
		if T > 350 {
			return 2000
		}
		return -2000
	})
	s, err := p.Solve(context.Background())
	var e *units.ConvergenceError
	if err != nil && !(errors.As(err, &e) && e.Reason != "") {
		t.Fatalf("%v, want none or a ConvergenceError", err)
	}
	if T := at(t, s, shape.Surface(), s.Horizon().SI()); !near(T, 350, 0.1) {
		t.Errorf("surface held at %g K, want 350 K", T)
	}
}

func TestCancellation(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	s, err := scaled(1, 0).Solve(ctx)
	var e *units.ConvergenceError
	if !errors.Is(err, context.Canceled) || !errors.As(err, &e) || s == nil || s.Horizon().SI() != 0 || at(t, s, shape.Centre(), 0) != 400 {
		t.Errorf("cancelled before: %v with %v, want the cancellation and a solution of the start", err, s)
	}
	for _, when := range []float64{0.1, 0.4} { // in the first run, and in one for the estimate of its error
		ctx, cancel := context.WithCancel(context.Background())
		p := scaled(1, 0)
		p.Progress = func(done float64) {
			if done > when {
				cancel()
			}
		}
		s, err := p.Solve(ctx)
		if !errors.Is(err, context.Canceled) || s == nil || !(s.Horizon().SI() > 0) {
			t.Errorf("cancelled at %g: %v, want the cancellation and a solution until then", when, err)
		}
	}
}

func TestProgress(t *testing.T) {
	last, calls := 0.0, 0
	p := scaled(1, 0)
	p.Progress = func(done float64) {
		if !(done >= last && done <= 1) {
			t.Errorf("progress %g after %g", done, last)
		}
		last, calls = done, calls+1
	}
	s := solve(t, p)
	if last != 1 || calls <= s.Statistics().Steps {
		t.Errorf("progress ended at %g after %d calls", last, calls)
	}
}

func TestUntil(t *testing.T) {
	for _, c := range []struct{ until, ambient float64 }{{350, 300}, {450, 500}} {
		p := scaled(1, 0)
		p.Surface = constant(10, c.ambient)
		whole := solve(t, p)
		p.Until = kelvin(c.until)
		s := solve(t, p)
		want, err := whole.TimeTo(shape.Centre(), p.Until) // the centre is the last
		if err != nil {
			t.Fatal(err)
		}
		got, err := s.TimeTo(shape.Centre(), p.Until)
		if err != nil || !near(got.SI(), want.SI(), 1e-9*want.SI()) {
			t.Errorf("until %g K: reached at %v (%v), in the whole run at %v", c.until, got, err, want)
		}
		if end := s.Horizon().SI(); end < got.SI() || end >= p.Horizon.SI() {
			t.Errorf("until %g K: ends at %g s, want after %g s and before the horizon", c.until, end, got.SI())
		}
		if _, err := s.GridError(shape.Mean(), s.Horizon()); err != nil {
			t.Error(err)
		}
	}
	p := scaled(1, 0)
	for _, until := range []float64{400, 290, 500} { // the start, or never passed
		p.Until = kelvin(until)
		if s := solve(t, p); s.Horizon() != p.Horizon {
			t.Errorf("until %g K: ends at %v, want the horizon", until, s.Horizon())
		}
	}
}

func FuzzSolve(f *testing.F) {
	f.Add(0.05, 1100.0, 25.0, 293.0, 3600.0, 40.0, 480.0, 7850.0, 20, 1e-3, 400.0, 0.3)
	f.Add(1e-6, 300.0, 1e6, 5.0, 1e9, 1e-3, 1e6, 1.0, 0, 1.0, 200.0, 1.0)
	f.Add(100.0, 2.0, 1e-9, 4000.0, 1e-9, 1e5, 1e-3, 1e5, 9, 1e-9, 3.0, 0.0)
	f.Add(math.NaN(), -1.0, math.Inf(1), 0.0, -1.0, 0.0, 0.0, 0.0, -1, -1.0, math.NaN(), 2.0)
	f.Add(0.01, 300.0, 1e300, 400.0, 10.0, 1e-300, 1e-300, 1e300, 8, 10.0, 350.0, 0.5)
	f.Add(37.01, 300.0, 1e300, 3600.0, 10.0, 25.0, 498.0, 1e300, 101, 10.0, 350.0, 0.5)
	f.Fuzz(func(t *testing.T, d, start, h, ambient, horizon, k, c, density float64, cells int, tolerance, target, part float64) {
		if cells > 200 || tolerance > 0 && tolerance < 1e-6 {
			return // too long for a fuzz target
		}
		p := fdm.Problem{
			Body: shape.Sphere(units.Metre.Of(d)), Material: plain{density, c, k}, Initial: kelvin(start), Surface: constant(h, ambient),
			Horizon: seconds(horizon), Cells: cells, Tolerance: units.KelvinDifference.Of(tolerance),
		}
		s, err := p.Solve(context.Background())
		if s == nil {
			if err == nil {
				t.Fatal("neither solution nor error")
			}
			return
		}
		finite := func(name string, x float64, err error) {
			if err == nil && (math.IsNaN(x) || math.IsInf(x, 0)) {
				t.Errorf("%s is %g without an error: %+v", name, x, p)
			}
		}
		time := seconds(horizon * part)
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean(), shape.Below(units.Metre.Of(d * part / 2)), {}} {
			T, err := s.At(place, time)
			finite("temperature", T.SI(), err)
			when, err := s.TimeTo(place, kelvin(target))
			finite("time", when.SI(), err)
			e, err := s.ErrorEstimate(place, time)
			finite("estimate", e.SI(), err)
		}
		q, err := s.HeatReleased(time)
		finite("heat", q.SI(), err)
		finite("balance", s.EnergyBalance(), nil)
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Errorf("derivation: %v: %+v", err, p)
		}
	})
}

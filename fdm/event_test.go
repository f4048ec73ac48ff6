package fdm_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// An event ends the solution at the time that TimeTo gives without it, and at the first of several.
func TestEventsEndTheSolution(t *testing.T) {
	p := scaled(1, 40)
	whole := solve(t, p)
	target := kelvin(350)
	want, err := whole.TimeTo(shape.Centre(), target)
	if err != nil {
		t.Fatal(err)
	}
	later := fdm.Reaches(shape.Centre(), kelvin(340))
	for name, event := range map[string]fdm.Event{
		"reaches": fdm.Reaches(shape.Centre(), target),
		"when": fdm.When("centre at 350 K", func(m fdm.Moment) (float64, error) {
			T, err := m.At(shape.Centre())
			return 350 - T.SI(), err
		}),
	} {
		p.Stop = []fdm.Event{later, event}
		s := solve(t, p)
		text, at1, ok := s.Stopped()
		// Steps differ, since a watched solution takes no longer ones than a sixteenth of the horizon.
		if !ok || text == "" || !near(at1.SI(), want.SI(), 0.5) || at1 != s.Horizon() || !near(at(t, s, shape.Centre(), at1.SI()), 350, 1e-9) {
			t.Errorf("%s: stopped by %q at %v (%v), want %v", name, text, at1, ok, want)
		}
		if got, err := s.TimeTo(shape.Centre(), target); err != nil || !near(got.SI(), at1.SI(), 1e-9*at1.SI()) {
			t.Errorf("%s: reached at %v (%v), stopped at %v", name, got, err, at1)
		}
		var beyond *units.HorizonError
		if _, err := s.TimeTo(shape.Centre(), kelvin(345)); !errors.As(err, &beyond) {
			t.Errorf("%s: 345 K after the end: %v", name, err)
		}
		if _, err := s.At(shape.Centre(), seconds(at1.SI()+1)); err == nil {
			t.Errorf("%s: a temperature after the end", name)
		}
		if _, err := s.GridError(shape.Centre(), at1); err != nil {
			t.Errorf("%s: %v", name, err)
		}
	}
	p.Stop = []fdm.Event{fdm.Reaches(shape.Centre(), kelvin(290))}
	if _, _, ok := solve(t, p).Stopped(); ok {
		t.Error("stopped by what does not happen")
	}
}

// The greatest difference between surface and centre of a plate, and when, against the exact series; heating gives the
// same with the other sign.
func TestGreatestDifference(t *testing.T) {
	for _, bi := range []float64{0.1, 1, 10} {
		exact := eigen.NewSphere(bi)
		best, when := 0.0, 0.0
		for fo := 1e-3; fo < 2; fo *= 1.0005 {
			if d := 100 * (exact.Surface(fo) - exact.Centre(fo)); math.Abs(d) > math.Abs(best) {
				best, when = d, fo
			}
		}
		for ambient, sign := range map[float64]float64{300: 1, 500: -1} {
			p := scaled(bi, 200)
			p.Surface = constant(10*bi, ambient)
			d, at, err := solve(t, p).GreatestDifference(shape.Surface(), shape.Centre())
			if err != nil || !near(d.SI(), sign*best, 5e-3) || !near(at.SI()*1e-4, when, 0.01*when) {
				t.Errorf("Bi %g, ambient %g K: %v at %v (%v), want %g K at Fo %g", bi, ambient, d, at, err, sign*best, when)
			}
		}
	}
	s := solve(t, scaled(1, 20))
	if _, _, err := s.GreatestDifference(shape.Slowest(), shape.Centre()); err == nil {
		t.Error("a difference to the slowest place")
	}
}

// A body that may not differ by more than a limit stops where it does, and its greatest difference until then is the limit.
func TestDiffers(t *testing.T) {
	p := scaled(10, 100)
	p.Stop = []fdm.Event{fdm.Differs(shape.Surface(), shape.Centre(), units.KelvinDifference.Of(40))}
	s := solve(t, p)
	_, when, ok := s.Stopped()
	d, at, err := s.GreatestDifference(shape.Surface(), shape.Centre())
	if !ok || err != nil || !near(d.SI(), -40, 1e-6) || !near(at.SI(), when.SI(), 1e-3*when.SI()) {
		t.Errorf("stopped at %v (%v), greatest difference %v at %v (%v)", when, ok, d, at, err)
	}
}

// What a function of the caller does wrong ends the solution with an error that says where and when; what was
// computed stays readable.
func TestFailingFunctions(t *testing.T) {
	nan := math.NaN()
	late := func(time, good float64) float64 {
		if time > 400 {
			return nan
		}
		return good
	}
	for name, c := range map[string]struct {
		change func(p *fdm.Problem)
		place  string
	}{
		"event fails": {func(p *fdm.Problem) {
			p.Stop = []fdm.Event{fdm.When("own", func(m fdm.Moment) (float64, error) {
				if m.Time().SI() > 400 {
					return 0, errOwn
				}
				return 1, nil
			})}
		}, ""},
		"event is NaN": {func(p *fdm.Problem) {
			p.Stop = []fdm.Event{fdm.When("own", func(m fdm.Moment) (float64, error) { return late(m.Time().SI(), 1), nil })}
		}, ""},
		"source is NaN": {func(p *fdm.Problem) {
			p.Source = func(depth units.Length, time units.Duration, _ units.Temperature) (units.HeatSource, error) {
				if depth.SI() < 0.02 {
					return units.HeatSource{}, nil
				}
				return units.WattPerCubicMetre.Of(late(time.SI(), 10)), nil
			}
		}, "opposite face"},
		"source fails": {func(p *fdm.Problem) {
			p.Source = func(depth units.Length, time units.Duration, _ units.Temperature) (units.HeatSource, error) {
				if depth.SI() < 1e-9 && time.SI() > 400 {
					return units.HeatSource{}, errOwn
				}
				return units.HeatSource{}, nil
			}
		}, "surface"},
		"opposite exchange is NaN": {func(p *fdm.Problem) {
			p.Opposite = exchange(func(time, T float64) float64 { return late(time, T-300) })
		}, "opposite face"},
		"lump": {func(p *fdm.Problem) {
			p.OppositeLump = &fdm.Lump{
				HeatCapacity: units.JoulePerKelvin.Of(100), Coefficient: units.WattPerSquareMetreKelvin.Of(5), Initial: kelvin(350),
				Exchange: exchange(func(time, T float64) float64 { return late(time, T-300) }),
			}
		}, "lump at the opposite face"},
		"contact is negative": {func(p *fdm.Problem) {
			p.Material = nil
			calls := 0
			p.Layers = []fdm.Layer{{
				Material: plain{1000, 1000, 1}, Thickness: metres(0.04), ContactAt: func(_, _ units.Temperature) (units.ThermalInsulance, error) {
					if calls++; calls > 100 {
						return units.SquareMetreKelvinPerWatt.Of(-1), nil
					}
					return units.SquareMetreKelvinPerWatt.Of(0.01), nil
				},
			}, {Material: plain{1000, 1000, 1}, Thickness: metres(0.06)}}
		}, "place 40 mm below the surface"},
		"log ends": {func(p *fdm.Problem) {
			p.Surface = boundary.TemperatureFollowing(boundary.Log([]units.Duration{{}, seconds(400)}, []units.Temperature{kelvin(400), kelvin(390)}))
		}, "surface"},
	} {
		p := scaled(1, 20)
		p.Body, p.Horizon = sheet(0.1), seconds(2000)
		c.change(&p)
		s, err := p.Solve(t.Context())
		var e *units.ConvergenceError
		if !errors.As(err, &e) || e.Place != c.place || e.Cause == nil || s == nil {
			t.Errorf("%s: %v, want a ConvergenceError at %q", name, err, c.place)
			continue
		}
		// A function of time is asked in every step, of which a sixteenth of 2000 s is the longest.
		if end := s.Horizon().SI(); end != e.Time.SI() || name != "contact is negative" && !near(end, 400, 125) {
			t.Errorf("%s: ended at %g s (solution) and %v (error), want 400 s to a step", name, end, e.Time)
		} else {
			if T := at(t, s, shape.Centre(), end); !(T > 250 && T < 450) {
				t.Errorf("%s: %g K at %g s", name, T, end)
			}
		}
		_ = s.Derivation().String()
	}
}

// Hard input ends in a solution that balances, or in an error with a type.
func TestHardInput(t *testing.T) {
	hard := map[string]func(p *fdm.Problem){
		"1e9 W/m²": func(p *fdm.Problem) { p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(-1e9)) },
		"1 nm cells": func(p *fdm.Problem) {
			p.Smallest, p.Surface, p.Horizon = metres(1e-9), boundary.Temperature(kelvin(300)), seconds(1)
		},
		"tiny body":   func(p *fdm.Problem) { p.Body, p.Horizon = sheet(1e-9), seconds(1e-9) },
		"great body":  func(p *fdm.Problem) { p.Body = sheet(1e6) },
		"thin hollow": func(p *fdm.Problem) { p.Body = shape.HollowSphere(metres(1), metres(1-1e-6)) },
		"thick hollow": func(p *fdm.Problem) {
			p.Body = shape.Tube(metres(1), metres(1e-5), metres(1)).Exposing(shape.Inside | shape.Outside)
		},
		"layers beside a material": func(p *fdm.Problem) {
			p.Layers = []fdm.Layer{{Material: plain{1, 1, 1}, Thickness: metres(0.1)}}
		},
		"a film of 1 nm": func(p *fdm.Problem) {
			p.Material, p.Layers = nil, []fdm.Layer{{Material: plain{8000, 500, 50}, Thickness: metres(1e-9)}, {Material: plain{1000, 1000, 1}, Thickness: metres(0.1 - 1e-9)}}
		},
		"profile out of range": func(p *fdm.Problem) {
			p.Initial = units.Temperature{}
			p.Profile = func(d units.Length) (units.Temperature, error) { return kelvin(400 + 1e6*d.SI()), nil }
		},
		"profile beside initial": func(p *fdm.Problem) {
			p.Profile = func(units.Length) (units.Temperature, error) { return kelvin(300), nil }
		},
		"opposite of a sphere": func(p *fdm.Problem) { p.Body, p.Opposite = shape.Sphere(metres(0.2)), constant(1, 300) },
		"no event":             func(p *fdm.Problem) { p.Stop = []fdm.Event{{}} },
		"event at no place":    func(p *fdm.Problem) { p.Stop = []fdm.Event{fdm.Reaches(shape.Slowest(), kelvin(350))} },
		"runaway": func(p *fdm.Problem) {
			p.Source = func(_ units.Length, _ units.Duration, T units.Temperature) (units.HeatSource, error) {
				return units.WattPerCubicMetre.Of(math.Exp(T.SI() / 20)), nil
			}
		},
		"a step of the wall": func(p *fdm.Problem) {
			p.Surface = boundary.TemperatureFollowing(boundary.Log([]units.Duration{{}, seconds(100), seconds(100), seconds(1e6)}, []units.Temperature{kelvin(400), kelvin(400), kelvin(900), kelvin(900)}))
		},
		"held out of range": func(p *fdm.Problem) { p.Material, p.Surface = steel, boundary.Temperature(kelvin(2000)) },
	}
	for name, change := range hard {
		p := scaled(1, 20)
		p.Body, p.Horizon = sheet(0.1), seconds(2000)
		change(&p)
		s, err := p.Solve(t.Context())
		var a *units.ArgumentError
		var r *units.RangeError
		var c *units.ConvergenceError
		if err != nil && !errors.As(err, &a) && !errors.As(err, &r) && !errors.As(err, &c) {
			t.Errorf("%s: %v has no type", name, err)
		}
		t.Logf("%s: %v", name, err)
		if s == nil {
			if err == nil {
				t.Errorf("%s: neither solution nor error", name)
			}
			continue
		}
		balanced(t, name, s)
		end := s.Horizon().SI()
		for _, place := range []shape.Place{shape.Surface(), shape.Centre(), shape.Mean()} {
			if T := at(t, s, place, end); math.IsNaN(T) || math.IsInf(T, 0) {
				t.Errorf("%s: %v at %g K", name, place, T)
			}
		}
		_ = s.Derivation().String()
		_, _ = s.TimeTo(shape.Surface(), kelvin(350))
	}
}

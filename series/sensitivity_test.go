package series_test

import (
	"errors"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// byDifference differentiates f at 1 over the logarithm by central differences of eighth order, whose step leaves out
// some 1e-11 of f and whose weights raise its rounding tenfold.
func byDifference(f func(scale float64) float64) float64 {
	const step = 0.01
	total := 0.0
	for i, w := range []float64{4. / 5, -1. / 5, 4. / 105, -1. / 280} {
		d := step * float64(i+1)
		total += w * (f(math.Exp(d)) - f(math.Exp(-d)))
	}
	return total / step
}

// problemOf is a problem whose inputs are those of p times a number each.
func scaled(p series.Problem, by map[string]float64) series.Problem {
	of := func(name string) float64 {
		if x, ok := by[name]; ok {
			return x
		}
		return 1
	}
	h, ambient, convective := p.Surface.Constants()
	if convective {
		p.Surface = boundary.Constant(h.Scale(of("h")), ambient)
	}
	p.Conductivity = p.Conductivity.Scale(of("k"))
	p.Density = p.Density.Scale(of("rho"))
	p.SpecificHeat = p.SpecificHeat.Scale(of("c"))
	return p
}

// Each sensitivity against differences of the temperatures, for all bodies, places, Biot numbers and times, before
// and after the join of the two forms.
func TestSensitivity(t *testing.T) {
	mm := units.Millimetre.Of
	sized := map[string]func(r float64) shape.Body{
		"plate":         func(r float64) shape.Body { return shape.Plate(mm(16*r), units.SquareMetre.Of(0.01)) },
		"long cylinder": func(r float64) shape.Body { return shape.Cylinder(mm(16*r), mm(300)).Exposing(shape.Outside) },
		"sphere":        func(r float64) shape.Body { return shape.Sphere(mm(16 * r)) },
		"flat cylinder": func(r float64) shape.Body { return shape.Cylinder(mm(20*r), mm(16*r)) },
		"brick":         func(r float64) shape.Body { return shape.Brick(mm(30*r), mm(16*r), mm(20*r)) },
	}
	const depth = 3.0 // mm
	worst := 0.0
	for name, body := range sized {
		for _, h := range []float64{0, 1, 100, 2000, 1e6, math.Inf(1)} {
			p := marble()
			p.Body = body(1)
			p.Surface = boundary.Temperature(units.Celsius.Of(20))
			if !math.IsInf(h, 1) {
				p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Celsius.Of(20))
			}
			for _, seconds := range []float64{0.01, 0.3, 0.69, 0.72, 3.19, 3.21, 10, 60, 300} {
				for _, place := range places {
					s := solve(t, p)
					got, err := s.Sensitivity(place, units.Second.Of(seconds))
					if err != nil {
						t.Fatal(err)
					}
					input := func(what string) float64 {
						return byDifference(func(x float64) float64 {
							return kelvins(t, solve(t, scaled(p, map[string]float64{what: x})), place, seconds)
						})
					}
					size := byDifference(func(x float64) float64 {
						q, where := p, place
						q.Body = body(x)
						if place == places[1] {
							where = shape.Below(mm(depth * x))
						}
						return kelvins(t, solve(t, q), where, seconds)
					})
					deeper := 0.0
					if place == places[1] {
						deeper = byDifference(func(x float64) float64 { return kelvins(t, s, shape.Below(mm(depth*x)), seconds) })
					}
					later := byDifference(func(x float64) float64 { return kelvins(t, s, place, seconds*x) })
					theta := (kelvins(t, s, place, seconds) - 293.15) / 70
					for _, c := range []struct {
						what      string
						got, want float64
					}{
						{"h", got.Coefficient.SI(), input("h")},
						{"k", got.Conductivity.SI(), input("k")},
						{"rho", got.Density.SI(), input("rho")},
						{"c", got.SpecificHeat.SI(), input("c")},
						{"size", got.Size.SI(), size},
						{"depth", got.Depth.SI(), deeper},
						{"time", got.Time.SI(), later},
						{"start", got.Initial, theta},
						{"ambient", got.Ambient, 1 - theta},
					} {
						worst = math.Max(worst, math.Abs(c.got-c.want))
						// of 70 K
						if !(math.Abs(c.got-c.want) <= 1e-9) {
							t.Errorf("%s, h %v, %s after %v s: ∂T/∂%s %.12g K, by differences %.12g", name, h, place, seconds, c.what, c.got, c.want)
						}
					}
				}
			}
		}
	}
	t.Logf("worst difference %.2g K of 70 K", worst)
}

// Right below the surface, where the slope is taken from one side, the temperature changes with the depth as the
// coefficient tells, k ∂T/∂d = h (T − T∞), before the join as after.
func TestSensitivityBelowTheSurface(t *testing.T) {
	for _, stone := range stones() {
		s := solve(t, stone.problem) // h = 300 W/(m²·K), k = 1 W/(m·K)
		for _, seconds := range []float64{0.3, 3, 20} {
			for _, depth := range []float64{1e-9, 1e-7, 2e-6} {
				got, err := s.Sensitivity(shape.Below(units.Metre.Of(depth)), units.Second.Of(seconds))
				want := depth * 300 * (kelvins(t, s, shape.Surface(), seconds) - 293.15)
				if err != nil || !(math.Abs(got.Depth.SI()/want-1) <= 1e-6+2*depth/1e-4) {
					t.Errorf("%s, %v m deep after %v s: ∂T/∂depth %v K, %v, by the coefficient %v", stone.name, depth, seconds, got.Depth.SI(), err, want)
				}
			}
		}
	}
}

// The time to a temperature against differences of itself.
func TestTimeSensitivity(t *testing.T) {
	target := units.Celsius.Of(48)
	for _, stone := range stones() {
		p := stone.problem
		for _, place := range append([]shape.Place{shape.Slowest(), shape.Fastest()}, places...) {
			until := func(p series.Problem, place shape.Place, target units.Temperature) float64 {
				d, err := solve(t, p).TimeTo(place, target)
				if err != nil {
					t.Fatal(err)
				}
				return d.SI()
			}
			got, err := solve(t, p).TimeSensitivity(place, target)
			if err != nil {
				t.Fatal(err)
			}
			input := func(what string) float64 {
				return byDifference(func(x float64) float64 { return until(scaled(p, map[string]float64{what: x}), place, target) })
			}
			kelvin := func(change func(p *series.Problem, target *units.Temperature, d units.TemperatureDifference)) float64 {
				// a kelvin to a change of 1 in the logarithm
				return byDifference(func(x float64) float64 {
					q, to := p, target
					change(&q, &to, units.KelvinDifference.Of(math.Log(x)))
					return until(q, place, to)
				})
			}
			for _, c := range []struct {
				what      string
				got, want float64
			}{
				{"itself", got.Time.SI(), until(p, place, target)},
				{"h", got.Coefficient.SI(), input("h")},
				{"k", got.Conductivity.SI(), input("k")},
				{"rho", got.Density.SI(), input("rho")},
				{"c", got.SpecificHeat.SI(), input("c")},
				{"target", got.Target.SI(), kelvin(func(_ *series.Problem, to *units.Temperature, d units.TemperatureDifference) { *to = to.Add(d) })},
				{"start", got.Initial.SI(), kelvin(func(p *series.Problem, _ *units.Temperature, d units.TemperatureDifference) {
					p.Initial = p.Initial.Add(d)
				})},
				{"ambient", got.Ambient.SI(), kelvin(func(p *series.Problem, _ *units.Temperature, d units.TemperatureDifference) {
					h, ambient, _ := p.Surface.Constants()
					p.Surface = boundary.Constant(h, ambient.Add(d))
				})},
			} {
				if !(math.Abs(c.got-c.want) <= 1e-9*got.Time.SI()) {
					t.Errorf("%s, %s: time by %s %.12g s, by differences %.12g", stone.name, place, c.what, c.got, c.want)
				}
			}
		}
	}
}

// At a small Biot number a body is at one temperature, θ = exp(−t/τ): a coefficient that is 1 % higher moves the
// temperature by 1 % of −t/τ θ, and the time by −1 %, whatever the conductivity is.
func TestSensitivityOfALump(t *testing.T) {
	for _, stone := range stones() {
		p := stone.problem
		p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(1e-6), units.Celsius.Of(20))
		s := solve(t, p)
		tau := 2500 * 800 * p.Body.Volume().SI() / (1e-6 * p.Body.Area().SI())
		for _, place := range places {
			got, err1 := s.Sensitivity(place, units.Second.Of(tau))
			later, err2 := s.TimeSensitivity(place, units.Kelvin.Of(293.15+70/math.E))
			if err := errors.Join(err1, err2); err != nil {
				t.Fatal(err)
			}
			want := -70 / math.E
			if !(math.Abs(got.Coefficient.SI()-want) <= 1e-5) || !(math.Abs(got.Conductivity.SI()) <= 1e-5) || !(math.Abs(got.Density.SI()+want) <= 1e-5) || !(math.Abs(got.Size.SI()+want) <= 1e-5) {
				t.Errorf("%s, %s: %+v, want %v K for the coefficient and as much for the rest", stone.name, place, got, want)
			}
			if !(math.Abs(later.Coefficient.SI()/tau+1) <= 1e-5) || !(math.Abs(later.Conductivity.SI()/tau) <= 1e-5) || !(math.Abs(later.Size.SI()/tau-1) <= 1e-5) {
				t.Errorf("%s, %s: %+v, want -%v s for the coefficient", stone.name, place, later, tau)
			}
		}
	}
}

// At any Biot and Fourier number the slopes are finite, and of the sign that the maximum principle gives: more h, a
// later time and a smaller body bring every place nearer to the ambient.
func TestSensitivitySigns(t *testing.T) {
	r := rand.New(rand.NewSource(12))
	for range 100 {
		for _, stone := range stones() {
			p := stone.problem
			p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(math.Pow(10, 24*r.Float64()-12)), units.Celsius.Of(20))
			s := solve(t, p)
			d := units.Second.Of(math.Pow(10, 12*r.Float64()-8))
			for _, place := range places {
				got, err := s.Sensitivity(place, d)
				if err != nil {
					t.Fatal(err)
				}
				const tiny = 1e-9 // K
				if !(got.Coefficient.SI() <= tiny && got.Time.SI() <= tiny && got.Density.SI() >= -tiny && got.Depth.SI() >= -tiny) {
					t.Errorf("%s, Bi %v, %s after %v: %+v", stone.name, s.Biot(), place, d, got)
				}
				if !(got.Size.IsFinite() && got.Conductivity.IsFinite() && got.Initial+got.Ambient == 1) {
					t.Errorf("%s, Bi %v, %s after %v: %+v", stone.name, s.Biot(), place, d, got)
				}
			}
		}
	}
}

func TestSensitivityBadInput(t *testing.T) {
	var argument *units.ArgumentError
	check := func(name string, err error) {
		t.Helper()
		argument = nil
		if !errors.As(err, &argument) || argument.Accepted == "" {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
	s := solve(t, marble())
	flux := marble()
	flux.Surface = boundary.Flux(units.WattPerSquareMetre.Of(100))
	second, celsius := units.Second.Of, units.Celsius.Of
	for name, s := range map[string]*series.Solution{"nil": nil, "zero solution": {}, "flux": solve(t, flux)} {
		_, err := s.Sensitivity(shape.Centre(), second(1))
		check(name, err)
		_, err = s.TimeSensitivity(shape.Centre(), celsius(30))
		check(name, err)
	}
	_, err := s.Sensitivity(shape.Place{}, second(1))
	check("no place", err)
	_, err = s.Sensitivity(shape.Slowest(), second(1))
	check("slowest place", err)
	_, err = s.Sensitivity(shape.Mean(), second(-1))
	check("negative time", err)
	_, err = s.Sensitivity(shape.Mean(), second(math.NaN()))
	check("NaN time", err)
	_, err = s.TimeSensitivity(shape.Place{}, celsius(30))
	check("no place", err)
	_, err = s.TimeSensitivity(shape.Centre(), celsius(95))
	check("met at the start", err)
	var never *units.NeverError
	if _, err = s.TimeSensitivity(shape.Centre(), celsius(20)); !errors.As(err, &never) {
		t.Errorf("ambient as the target: %v, want a NeverError", err)
	}
	var failed *units.ConvergenceError
	if _, err = s.TimeSensitivity(shape.Centre(), units.Kelvin.Of(363.15-1e-11)); !errors.As(err, &failed) {
		t.Errorf("target beside the start: %v, want a ConvergenceError", err)
	}
}

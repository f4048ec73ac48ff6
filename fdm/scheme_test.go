package fdm_test

import (
	"errors"
	"math"
	"strings"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/eigen"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// fuelElement is the problem of testdata/fuel_element.csv: half of a plate with heat inside that doubles at once.
func fuelElement() fdm.Problem {
	return fdm.Problem{
		Body: sheet(0.01), Material: plain{6000, 1000, 30}, Surface: constant(1100, 523.15), Cells: 5, Uniform: true,
		Profile: func(depth units.Length) (units.Temperature, error) {
			x := 0.01 - depth.SI()
			return kelvin(523.15 + 1e7*0.01/1100 + 1e7/60*(1e-4-x*x)), nil
		},
		Source: func(units.Length, units.Duration, units.Temperature) (units.HeatSource, error) {
			return units.WattPerCubicMetre.Of(2e7), nil
		},
		Scheme: fdm.Explicit, TimeStep: seconds(0.3), Horizon: seconds(1.5),
	}
}

// The published temperatures to half a unit of the last digit that they were computed with, 0.01 K, since the book
// rounds each step; the recomputation to its twelve digits.
func TestFuelElement(t *testing.T) {
	p := fuelElement()
	steps := solve(t, p)
	p.Horizon, p.Scheme, p.TimeStep = seconds(3000), fdm.Adaptive, units.Duration{}
	steady := solve(t, p)
	checked := 0
	for _, row := range table.Named(t, "testdata/fuel_element.csv") {
		place := shape.Below(metres(0.002 * (5 - table.Number(t, row["node"]))))
		got, tol := 0.0, 2e-9
		switch row["when"] {
		case "initial":
			got = at(t, steps, place, 0)
		case "step":
			got = at(t, steps, place, 1.5)
		case "steady":
			got, tol = at(t, steady, place, 3000), 2e-3 // the tolerance of a step
		}
		if want := table.Number(t, row["own_K"]); !near(got, want, tol) {
			t.Errorf("%s, node %s: %.10g K, want %.12g K to %g K", row["when"], row["node"], got, want, tol)
		}
		if want := table.Number(t, row["published_degC"]) + 273.15; !near(got, want, 0.01) {
			t.Errorf("%s, node %s: %.6g K, published %.6g K", row["when"], row["node"], got, want)
		}
		checked++
	}
	if checked != 18 {
		t.Errorf("%d values", checked)
	}
	balanced(t, "fuel element", steps)
}

// The limits of the textbooks: Fo (1 + Bi) ≤ 1/2 at a convective face, Fo ≤ 1/2 inside, for uniform cells in a plate;
// the same for the half cell of the face.
func TestStepLimits(t *testing.T) {
	for _, h := range []float64{0, 1, 1100, 1e5} {
		p := fuelElement()
		p.Surface = constant(h, 523.15)
		got, err := p.StepLimits()
		if err != nil {
			t.Fatal(err)
		}
		bi := h * 0.002 / 30
		if want := 0.5 / (1 + bi) * 0.002 * 0.002 / 5e-6; !near(got.Explicit.SI(), want, 1e-9*want) || !near(got.CrankNicolson.SI(), 2*want, 2e-9*want) {
			t.Errorf("h = %g: limits %v, want %g s and twice", h, got, want)
		}
		p.TimeStep = got.Explicit.Scale(1.01)
		var a *units.ArgumentError
		if _, err := p.Solve(t.Context()); !errors.As(err, &a) || a.Field != "time step" || !strings.Contains(a.Accepted, "Fo (1 + Bi)") {
			t.Errorf("h = %g, a step beyond the limit: %v", h, err)
		}
		p.TimeStep = got.Explicit
		if _, err := p.Solve(t.Context()); err != nil {
			t.Errorf("h = %g, a step at the limit: %v", h, err)
		}
	}
}

// A held surface has no limit of its own: that of the cells inside is left, Fo ≤ 1/2.
func TestStepLimitOfHeldSurface(t *testing.T) {
	p := fuelElement()
	p.Surface = boundary.Temperature(kelvin(523.15))
	got, err := p.StepLimits()
	if want := 0.5 * 0.002 * 0.002 / 5e-6; err != nil || !near(got.Explicit.SI(), want, 1e-9*want) {
		t.Errorf("limit %v (%v), want %g s", got.Explicit, err, want)
	}
}

// Within its limit the explicit scheme and Crank–Nicolson obey the maximum principle on a graded grid; the implicit
// one does at any step.
func TestSchemesObeyTheMaximumPrinciple(t *testing.T) {
	for _, scheme := range []fdm.Scheme{fdm.Explicit, fdm.Implicit, fdm.CrankNicolson} {
		for _, surface := range []boundary.Condition{constant(5000, 300), boundary.Temperature(kelvin(300))} {
			p := scaled(1, 12)
			p.Surface, p.Scheme = surface, scheme
			p.TimeStep = seconds(100)
			q := p
			q.Scheme, q.TimeStep = fdm.Adaptive, units.Duration{}
			limits, err := q.StepLimits()
			if err != nil {
				t.Fatal(err)
			}
			switch scheme {
			case fdm.Explicit:
				p.TimeStep = limits.Explicit
			case fdm.CrankNicolson:
				p.TimeStep = limits.CrankNicolson
			}
			p.Horizon = p.TimeStep.Scale(60)
			s := solve(t, p)
			balanced(t, scheme.String(), s)
			for k := range 61 {
				time := p.TimeStep.Scale(float64(k)).SI()
				last := math.Inf(1)
				for _, x := range []float64{0, 0.3, 0.6, 0.9, 1} {
					T := at(t, s, below(x), min(time, s.Horizon().SI()))
					if T < 300-1e-6 || T > 400+1e-6 || T > last+1e-6 {
						t.Errorf("%v: %g K at x = %g in step %d", scheme, T, x, k)
					}
					last = T
				}
			}
		}
	}
}

// Orders in time: 1, 1 and 2, from the errors against the exact solution of the same cells, taken from the adaptive
// method; and the estimate of the step error within a tenth of that error.
func TestSchemeOrders(t *testing.T) {
	for scheme, order := range map[fdm.Scheme]float64{fdm.Explicit: 1, fdm.Implicit: 1, fdm.CrankNicolson: 2} {
		p := scaled(1, 6)
		p.Uniform, p.Horizon = true, seconds(3200)
		p.Scheme = scheme
		var got [3]float64
		var estimates [3]float64
		for i, step := range []float64{40, 20, 10} {
			p.TimeStep = seconds(step)
			s := solve(t, p)
			got[i] = at(t, s, shape.Centre(), 3200)
			e, err := s.StepError(shape.Centre(), seconds(3200))
			if err != nil {
				t.Fatal(err)
			}
			estimates[i] = e.SI()
		}
		exact := got[2] + (got[2]-got[1])/(math.Pow(2, order)-1)
		for i, T := range got {
			if e := math.Abs(T - exact); !(estimates[i] > 0.9*e && estimates[i] < 8*e) {
				t.Errorf("%v, step %g s: error %g K, estimate %g K", scheme, 40/math.Pow(2, float64(i)), e, estimates[i])
			}
		}
		e1, e2 := got[0]-got[1], got[1]-got[2]
		if got := math.Log2(e1 / e2); !near(got, order, 0.1) {
			t.Errorf("%v: order %.3f from errors %g and %g K, want %g", scheme, got, e1, e2, order)
		}
	}
}

// A long step of Crank–Nicolson is told before it oscillates.
func TestCrankNicolsonWarns(t *testing.T) {
	p := scaled(100, 20)
	p.Scheme, p.TimeStep, p.Horizon = fdm.CrankNicolson, seconds(200), seconds(2000)
	s := solve(t, p)
	if text := strings.Join(s.Derivation().Warnings, "\n"); !strings.Contains(text, "oscillate") {
		t.Errorf("warnings %q", text)
	}
	if got, want := at(t, s, shape.Centre(), 2000), 300+100*eigen.NewSphere(100).Centre(0.2); !near(got, want, 5) {
		t.Errorf("centre at %g K, want about %g K", got, want)
	}
}

func TestBadSchemes(t *testing.T) {
	for name, change := range map[string]func(p *fdm.Problem){
		"no step":           func(p *fdm.Problem) { p.Scheme = fdm.Implicit },
		"step of adaptive":  func(p *fdm.Problem) { p.TimeStep = seconds(1) },
		"unknown":           func(p *fdm.Problem) { p.Scheme = 9 },
		"negative step":     func(p *fdm.Problem) { p.Scheme, p.TimeStep = fdm.Implicit, seconds(-1) },
		"NaN step":          func(p *fdm.Problem) { p.Scheme, p.TimeStep = fdm.Implicit, seconds(math.NaN()) },
		"too many steps":    func(p *fdm.Problem) { p.Scheme, p.TimeStep = fdm.Implicit, seconds(1e-9) },
		"smallest, uniform": func(p *fdm.Problem) { p.Smallest, p.Uniform = metres(1e-4), true },
		"smallest too wide": func(p *fdm.Problem) { p.Smallest = metres(0.09) },
	} {
		p := scaled(1, 10)
		change(&p)
		var a *units.ArgumentError
		if s, err := p.Solve(t.Context()); !errors.As(err, &a) || s != nil {
			t.Errorf("%s: %v", name, err)
		}
	}
}

package series_test

import (
	"context"
	"errors"
	"math"
	"math/rand"
	"sync"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
	"gonum.org/v1/gonum/integrate/quad"
)

func marble() series.Problem {
	return series.Problem{
		Body:         shape.Sphere(units.Millimetre.Of(16)),
		Conductivity: units.WattPerMetreKelvin.Of(1),
		Density:      units.KilogramPerCubicMetre.Of(2500),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(800),
		Initial:      units.Celsius.Of(90),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(300), units.Celsius.Of(20)),
	}
}

func solve(t testing.TB, p series.Problem) *series.Solution {
	t.Helper()
	s, err := p.Solve(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// A stone is a marble of another shape.
type stone struct {
	name    string
	problem series.Problem
}

// stones have a way out of 8 mm each.
func stones() []stone {
	mm := units.Millimetre.Of
	var all []stone
	for _, c := range []struct {
		name string
		body shape.Body
	}{
		{"plate", shape.Plate(mm(16), units.SquareMetre.Of(0.01))},
		{"plate, one face", shape.Plate(mm(8), units.SquareMetre.Of(0.01)).Exposing(shape.Front)},
		{"long cylinder", shape.Cylinder(mm(16), mm(300)).Exposing(shape.Outside)},
		{"cylinder with its ends", shape.Cylinder(mm(50), mm(16)).Exposing(shape.Ends)},
		{"sphere", shape.Sphere(mm(16))},
		{"flat cylinder", shape.Cylinder(mm(20), mm(16))},
		{"short cylinder", shape.Cylinder(mm(16), mm(16))},
		{"brick", shape.Brick(mm(30), mm(16), mm(20))},
		{"cube", shape.Brick(mm(16), mm(16), mm(16))},
	} {
		p := marble()
		p.Body = c.body
		all = append(all, stone{c.name, p})
	}
	return all
}

var places = []shape.Place{shape.Centre(), shape.Below(units.Millimetre.Of(3)), shape.Surface(), shape.Mean()}

func TestBadInput(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(1)
	still := boundary.Function(func(units.Duration, units.Temperature) (units.HeatFlux, error) { return units.HeatFlux{}, nil })
	water := units.WattPerSquareMetreKelvin
	for _, c := range []struct {
		name   string
		change func(*series.Problem)
		field  string
	}{
		{"no body", func(p *series.Problem) { p.Body = shape.Body{} }, "body"},
		{"diameter 0", func(p *series.Problem) { p.Body = shape.Sphere(units.Length{}) }, "sphere: diameter"},
		{"diameter infinite", func(p *series.Problem) { p.Body = shape.Sphere(units.Metre.Of(inf)) }, "sphere: diameter"},
		{"ring", func(p *series.Problem) {
			p.Body = shape.Ring(units.Metre.Of(1), units.Metre.Of(0.5), units.Metre.Of(1))
		}, "body"},
		{"cone", func(p *series.Problem) { p.Body = shape.Cone(units.Metre.Of(1), units.Metre.Of(0.5)) }, "body"},
		{"body of any shape", func(p *series.Problem) { p.Body = shape.Measured(units.CubicMetre.Of(1), units.SquareMetre.Of(9)) }, "body"},
		{"plate without faces", func(p *series.Problem) { p.Body = shape.Plate(units.Metre.Of(1), units.SquareMetre.Of(1)).Exposing(0) }, "plate: exposed faces"},
		{"no conductivity", func(p *series.Problem) { p.Conductivity = units.Conductivity{} }, "conductivity"},
		{"negative conductivity", func(p *series.Problem) { p.Conductivity = units.WattPerMetreKelvin.Of(-1) }, "conductivity"},
		{"no density", func(p *series.Problem) { p.Density = units.Density{} }, "density"},
		{"NaN density", func(p *series.Problem) { p.Density = units.KilogramPerCubicMetre.Of(nan) }, "density"},
		{"no specific heat", func(p *series.Problem) { p.SpecificHeat = units.SpecificHeat{} }, "specific heat"},
		{"no start", func(p *series.Problem) { p.Initial = units.Temperature{} }, "initial temperature"},
		{"NaN start", func(p *series.Problem) { p.Initial = units.Celsius.Of(nan) }, "initial temperature"},
		{"no surface", func(p *series.Problem) { p.Surface = boundary.Condition{} }, "surface condition"},
		{"negative coefficient", func(p *series.Problem) { p.Surface = boundary.Constant(water.Of(-1), units.Celsius.Of(20)) }, "surface condition: heat transfer coefficient"},
		{"infinite coefficient", func(p *series.Problem) { p.Surface = boundary.Constant(water.Of(inf), units.Celsius.Of(20)) }, "surface condition: heat transfer coefficient"},
		{"ambient below 0 K", func(p *series.Problem) { p.Surface = boundary.Constant(water.Of(1), units.Celsius.Of(-300)) }, "surface condition: ambient"},
		{"surface by a function", func(p *series.Problem) { p.Surface = still }, "surface condition"},
		{"surface at 0 K", func(p *series.Problem) { p.Surface = boundary.Temperature(units.Kelvin.Of(0)) }, "surface condition: temperature"},
		{"NaN flux", func(p *series.Problem) { p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(nan)) }, "surface condition: heat flux"},
		{"Biot number of the longest edge too large", func(p *series.Problem) {
			p.Body = shape.Brick(units.Metre.Of(1), units.Metre.Of(1), units.Metre.Of(1e10))
			p.Conductivity, p.Density = units.WattPerMetreKelvin.Of(1e-300), units.KilogramPerCubicMetre.Of(1e-300)
		}, "Biot number h R/k"},
		{"Biot number too large", func(p *series.Problem) {
			p.Conductivity, p.Density = units.WattPerMetreKelvin.Of(1e-310), units.KilogramPerCubicMetre.Of(1e-300)
		}, "Biot number h R/k"},
		{"Biot number too small", func(p *series.Problem) {
			p.Surface = boundary.Constant(water.Of(1e-310), units.Celsius.Of(20))
			p.Conductivity = units.WattPerMetreKelvin.Of(1e100)
		}, "Biot number h R/k"},
		{"diffusivity too small", func(p *series.Problem) {
			p.Density, p.SpecificHeat = units.KilogramPerCubicMetre.Of(1e200), units.JoulePerKilogramKelvin.Of(1e200)
		}, "diffusivity k/(rho c) in m²/s"},
		{"time scale too small", func(p *series.Problem) {
			p.Body, p.Conductivity = shape.Sphere(units.Metre.Of(1e-100)), units.WattPerMetreKelvin.Of(1e150)
		}, "time scale R²/alpha in s"},
		{"heat content too large", func(p *series.Problem) {
			p.Body, p.Density = shape.Sphere(units.Metre.Of(1e100)), units.KilogramPerCubicMetre.Of(1e6)
		}, "heat content rho c V (T0 − Tinf) in J"},
	} {
		p := marble()
		c.change(&p)
		s, err := p.Solve(context.Background())
		var argument *units.ArgumentError
		if s != nil || !errors.As(err, &argument) || argument.Field != c.field || argument.Accepted == "" {
			t.Errorf("%s: %v, want an ArgumentError for %q", c.name, err, c.field)
		}
	}
}

func TestContext(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	if _, err := marble().Solve(ctx); !errors.Is(err, context.Canceled) {
		t.Errorf("cancelled context: %v, want context.Canceled", err)
	}
	var none context.Context
	var argument *units.ArgumentError
	if _, err := marble().Solve(none); !errors.As(err, &argument) {
		t.Errorf("no context: %v, want an ArgumentError", err)
	}
}

func TestBadQuestions(t *testing.T) {
	s := solve(t, marble())
	second := units.Second.Of(1)
	var argument *units.ArgumentError
	check := func(name, field string, err error) {
		t.Helper()
		argument = nil
		if !errors.As(err, &argument) || argument.Field != field {
			t.Errorf("%s: %v, want an ArgumentError for %q", name, err, field)
		}
	}
	for _, x := range []float64{-1, math.NaN(), math.Inf(1), -math.SmallestNonzeroFloat64} {
		bad := units.Second.Of(x)
		_, err := s.At(shape.Centre(), bad)
		check("At", "time", err)
		_, err = s.At(shape.Mean(), bad)
		check("At mean", "time", err)
		_, err = s.Mean(bad)
		check("Mean", "time", err)
		_, err = s.HeatReleased(bad)
		check("HeatReleased", "time", err)
		_, err = s.TruncationError(bad)
		check("TruncationError", "time", err)
	}
	for _, T := range []units.Temperature{{}, units.Kelvin.Of(-1), units.Kelvin.Of(math.NaN()), units.Kelvin.Of(math.Inf(1))} {
		_, err := s.TimeTo(shape.Centre(), T)
		check("TimeTo", "target", err)
	}
	for field, place := range map[string]shape.Place{"place": {}, "place: depth": shape.Below(units.Millimetre.Of(9))} {
		_, err := s.At(place, second)
		check("At", field, err)
		_, err = s.TimeTo(place, units.Celsius.Of(50))
		check("TimeTo", field, err)
	}
	for _, none := range []*series.Solution{nil, {}} {
		_, err := none.At(shape.Centre(), second)
		check("zero Solution, At", "solution", err)
		_, err = none.Mean(second)
		check("zero Solution, Mean", "solution", err)
		_, err = none.TimeTo(shape.Centre(), units.Celsius.Of(50))
		check("zero Solution, TimeTo", "solution", err)
		_, err = none.HeatReleased(second)
		check("zero Solution, HeatReleased", "solution", err)
		_, err = none.TruncationError(second)
		check("zero Solution, TruncationError", "solution", err)
		if !math.IsNaN(none.Biot()) || !math.IsNaN(none.Fourier(second)) {
			t.Errorf("zero Solution: Bi %v, Fo %v, want NaN", none.Biot(), none.Fourier(second))
		}
	}
}

// The answers of TimeTo that are no search.
func TestTimeToKinds(t *testing.T) {
	celsius := units.Celsius.Of
	with := func(h float64, start, ambient units.Temperature) *series.Solution {
		p := marble()
		p.Initial, p.Surface = start, boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), ambient)
		return solve(t, p)
	}
	cooled, heated := with(300, celsius(90), celsius(20)), with(300, celsius(5), celsius(20))
	equal, insulated := with(300, celsius(20), celsius(20)), with(0, celsius(90), celsius(20))
	for _, c := range []struct {
		name   string
		s      *series.Solution
		target units.Temperature
		never  units.Temperature // the limit; the zero Temperature where the answer is 0
	}{
		{"cooled, the start", cooled, celsius(90), units.Temperature{}},
		{"cooled, above the start", cooled, celsius(91), units.Temperature{}},
		{"cooled, the ambient", cooled, celsius(20), celsius(20)},
		{"cooled, beyond the ambient", cooled, celsius(19), celsius(20)},
		{"heated, the start", heated, celsius(5), units.Temperature{}},
		{"heated, below the start", heated, celsius(-40), units.Temperature{}},
		{"heated, the ambient", heated, celsius(20), celsius(20)},
		{"heated, beyond the ambient", heated, celsius(21), celsius(20)},
		{"start equal to ambient, itself", equal, celsius(20), units.Temperature{}},
		{"start equal to ambient, above", equal, celsius(21), celsius(20)},
		{"start equal to ambient, below", equal, celsius(19), celsius(20)},
		{"insulated, the start", insulated, celsius(90), units.Temperature{}},
		{"insulated, towards the ambient", insulated, celsius(50), celsius(90)},
		{"insulated, away from the ambient", insulated, celsius(95), celsius(90)},
	} {
		for _, place := range places {
			got, err := c.s.TimeTo(place, c.target)
			var never *units.NeverError
			switch {
			case c.never == units.Temperature{}:
				if err != nil || got.SI() != 0 {
					t.Errorf("%s, %s: %v, %v, want 0 s", c.name, place, got, err)
				}
			case !errors.As(err, &never) || never.Limit != c.never || never.Place != place.String() || never.Target != c.target:
				t.Errorf("%s, %s: %v, %v, want a NeverError with limit %v", c.name, place, got, err, c.never)
			}
		}
	}
	for _, s := range []*series.Solution{equal, insulated} {
		start, _ := s.At(shape.Centre(), units.Duration{})
		for _, place := range places {
			for _, seconds := range []float64{0, 0.1, 100, 1e300} {
				if T, err := s.At(place, units.Second.Of(seconds)); err != nil || T != start {
					t.Errorf("no exchange, %s after %v s: %v, %v, want %v", place, seconds, T, err, start)
				}
			}
		}
	}
	// a heat transfer coefficient so small that the time constant leaves the range of float64
	var given *units.ConvergenceError
	if d, err := with(1e-318, celsius(90), celsius(20)).TimeTo(shape.Mean(), celsius(21)); !errors.As(err, &given) {
		t.Errorf("coefficient 1e-318: %v, %v, want a ConvergenceError", d, err)
	}
}

// TimeTo and At are inverse to each other: the temperature comes back to within its own rounding, which
// is 1e-16 of its number of kelvins, and 1e-12 of what was left to the ambient.
func TestTimeToInverts(t *testing.T) {
	r := rand.New(rand.NewSource(1))
	for _, stone := range stones() {
		name, p := stone.name, stone.problem
		for range 150 {
			ambient := units.Celsius.Of(20)
			p.Initial = units.Celsius.Of(-200 + 1500*r.Float64())
			p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(math.Pow(10, 24*r.Float64()-10)), ambient)
			s := solve(t, p)
			target := ambient.Add(p.Initial.Sub(ambient).Scale(r.Float64()))
			for _, place := range places {
				d, err := s.TimeTo(place, target)
				if err != nil {
					t.Errorf("%s, Bi %v, %s, %v: %v", name, s.Biot(), place, target, err)
					continue
				}
				T, err := s.At(place, d)
				tolerance := 1e-12*target.Sub(ambient).Abs().SI() + 4e-16*math.Max(p.Initial.SI(), ambient.SI())
				if err != nil || !(math.Abs(T.Sub(target).SI()) <= tolerance) {
					t.Errorf("%s, Bi %v, %s: %v reached after %v, where it is off by %.3g K (%v), want within %.3g", name, s.Biot(), place, target, d, T.Sub(target).SI(), err, tolerance)
				}
			}
		}
	}
}

// Maximum principle for any Biot number, cooled and heated: never outside start and ambient, towards the
// ambient all the time, the centre behind the surface.
func TestMaximumPrinciple(t *testing.T) {
	r := rand.New(rand.NewSource(2))
	for _, stone := range stones() {
		name, p := stone.name, stone.problem
		for range 150 {
			ambient := units.Kelvin.Of(100 + 900*r.Float64())
			p.Initial = units.Kelvin.Of(100 + 900*r.Float64())
			p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(math.Pow(10, 24*r.Float64()-10)), ambient)
			s := solve(t, p)
			t1 := units.Second.Of(math.Pow(10, 12*r.Float64()-6))
			t2 := t1.Scale(1 + r.Float64())
			bound, err := s.TruncationError(t1)
			if err != nil {
				t.Fatal(err)
			}
			// with the rounding of θ and of a temperature
			slack := bound.SI() + 5e-15*math.Abs(p.Initial.Sub(ambient).SI()) + 5e-16*math.Max(p.Initial.SI(), ambient.SI())
			left := func(T units.Temperature) float64 { // excess over the ambient, positive towards the start
				return math.Copysign(1, p.Initial.Sub(ambient).SI()) * T.Sub(ambient).SI()
			}
			var ahead []float64
			for _, place := range places {
				a, errA := s.At(place, t1)
				b, errB := s.At(place, t2)
				if errA != nil || errB != nil {
					t.Fatal(errA, errB)
				}
				if left(a) < 0 || left(a) > left(p.Initial) || left(b) > left(a)+slack {
					t.Errorf("%s, Bi %v, %s: %v at first, %v after %v, %v after %v, ambient %v", name, s.Biot(), place, p.Initial, a, t1, b, t2, ambient)
				}
				ahead = append(ahead, left(a))
			}
			if ahead[0] < ahead[1]-slack || ahead[1] < ahead[2]-slack || ahead[3] > ahead[0]+slack || (p.Body.Family() != shape.Compact && ahead[3] < ahead[2]-slack) {
				t.Errorf("%s, Bi %v after %v: left at centre, inside, surface, mean %v: out of order", name, s.Biot(), t1, ahead)
			}
		}
	}
}

// First law: what has left is what has passed the surface, A h ∫ (T_surface − T∞) dt, and what the
// mean says. The integral is taken over √t, by Gauss-Legendre quadrature.
func TestHeatBalance(t *testing.T) {
	for _, stone := range stones() {
		name, p := stone.name, stone.problem
		if p.Body.Family() == shape.Compact {
			continue // its surface is not at one temperature
		}
		for _, h := range []float64{1e-3, 5, 125, 300, 4000} {
			ambient := units.Celsius.Of(20)
			p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), ambient)
			s := solve(t, p)
			join := 0.025
			if p.Body.Family() == shape.Cylindrical {
				join = 0.0055
			}
			join /= s.Fourier(units.Second.Of(1))
			for _, seconds := range []float64{0.1, 3, 20, 100} {
				power := func(u float64) float64 {
					T, err := s.At(shape.Surface(), units.Second.Of(u*u))
					if err != nil {
						t.Fatal(err)
					}
					return p.Body.Area().SI() * h * T.Sub(ambient).SI() * 2 * u
				}
				mid, end := math.Sqrt(math.Min(join, seconds)), math.Sqrt(seconds)
				passed := quad.Fixed(power, 0, mid, 64, quad.Legendre{}, 0)
				if mid < end {
					passed += quad.Fixed(power, mid, end, 64, quad.Legendre{}, 0)
				}
				q, err := s.HeatReleased(units.Second.Of(seconds))
				if err != nil || !(math.Abs(q.SI()-passed) <= 1e-12*passed) {
					t.Errorf("%s, h %v, %v s: released %.15g J (%v), through the surface %.15g, want within 1e-12", name, h, seconds, q.SI(), err, passed)
				}
				mean, _ := s.Mean(units.Second.Of(seconds))
				stored := 2500 * 800 * p.Body.Volume().SI() * p.Initial.Sub(mean).SI()
				if rounding := 2500 * 800 * p.Body.Volume().SI() * 2e-13; !(math.Abs(q.SI()-stored) <= rounding) {
					t.Errorf("%s, h %v, %v s: released %.15g J, by the mean %.15g, want within %.2g", name, h, seconds, q.SI(), stored, rounding)
				}
			}
		}
	}
	p := marble()
	p.Initial = units.Celsius.Of(5)
	if q, err := solve(t, p).HeatReleased(units.Second.Of(10)); err != nil || q.SI() >= 0 {
		t.Errorf("heated body: released %v (%v), want a negative heat", q, err)
	}
}

// The bound must cover the step at the time where one form takes over from the other, for any Biot number, but for
// the rounding of θ and of a temperature of 10000 K, and be below 1e-15 of the excess.
func TestTruncationErrorCoversTheJoin(t *testing.T) {
	r := rand.New(rand.NewSource(3))
	for range 2000 {
		p := marble()
		p.Initial = units.Kelvin.Of(10000)
		p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(math.Pow(10, 8*r.Float64()-2)), units.Kelvin.Of(1))
		s := solve(t, p)
		join := units.Second.Of(0.025 / s.Fourier(units.Second.Of(1)))
		before, after := join.Scale(1-1e-15), join.Scale(1+1e-15)
		bound, err := s.TruncationError(join)
		if err != nil {
			t.Fatal(err)
		}
		if !(bound.SI() > 0 && bound.SI() <= 1e-11) {
			t.Errorf("Bi %v: bound %v at the join, want below 1e-11 K for 10000 K of excess", s.Biot(), bound)
		}
		for _, place := range places {
			a, _ := s.At(place, before)
			b, _ := s.At(place, after)
			if step := math.Abs(a.Sub(b).SI()); !(step <= bound.SI()+2e-11) {
				t.Errorf("Bi %v, %s: step of %.3g K, want at most the bound %v and 2e-11 K of rounding", s.Biot(), place, step, bound)
			}
		}
	}
}

func TestManyGoroutines(t *testing.T) {
	s := solve(t, marble())
	want, err := s.At(shape.Centre(), units.Second.Of(10))
	if err != nil {
		t.Fatal(err)
	}
	var group sync.WaitGroup
	for range 8 {
		group.Go(func() {
			for range 50 {
				if got, err := s.At(shape.Centre(), units.Second.Of(10)); err != nil || got != want {
					t.Errorf("%v, %v, want %v", got, err, want)
				}
				if _, err := s.TimeTo(shape.Mean(), units.Celsius.Of(40)); err != nil {
					t.Error(err)
				}
				_ = s.Derivation().String()
			}
		})
	}
	group.Wait()
}

func TestAtAllocates(t *testing.T) {
	for _, stone := range stones() {
		name, p := stone.name, stone.problem
		s := solve(t, p)
		for _, place := range places {
			for _, seconds := range []float64{0.5, 30} {
				d := units.Second.Of(seconds)
				if n := testing.AllocsPerRun(100, func() { _, _ = s.At(place, d) }); n != 0 {
					t.Errorf("%s, %s after %v: %v allocations, want 0", name, place, d, n)
				}
			}
		}
	}
}

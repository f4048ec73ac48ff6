package series_test

import (
	"context"
	"errors"
	"math"
	"math/rand"
	"strings"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

func product(t testing.TB, p series.Product) *series.ProductSolution {
	t.Helper()
	s, err := p.Solve(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// block is the marble as a brick of 30 × 16 × 20 mm with three coefficients.
func block(t testing.TB, h ...float64) series.Product {
	t.Helper()
	mm := units.Millimetre.Of
	m := marble()
	var surfaces []boundary.Condition
	for _, x := range h {
		surfaces = append(surfaces, convection(x, 293.15))
	}
	directions, err := series.DirectionsOf(shape.Brick(mm(30), mm(16), mm(20)), surfaces...)
	if err != nil {
		t.Fatal(err)
	}
	return series.Product{Directions: directions, Conductivity: m.Conductivity, Density: m.Density, SpecificHeat: m.SpecificHeat, Initial: m.Initial}
}

// With one coefficient a product is what a Problem solves.
func TestProductOfOneCoefficient(t *testing.T) {
	for _, stone := range stones() {
		p := stone.problem
		whole := solve(t, p)
		var surfaces []boundary.Condition
		for range p.Body.Factors() {
			surfaces = append(surfaces, p.Surface)
		}
		directions, err := series.DirectionsOf(p.Body, surfaces...)
		if err != nil {
			t.Fatal(err)
		}
		s := product(t, series.Product{Directions: directions, Conductivity: p.Conductivity, Density: p.Density, SpecificHeat: p.SpecificHeat, Initial: p.Initial})
		everywhere := func(first, other shape.Place) []shape.Place {
			all := []shape.Place{first}
			for len(all) < len(directions) {
				all = append(all, other)
			}
			return all
		}
		for _, seconds := range []float64{0, 0.02, 1, 15, 200} {
			d := units.Second.Of(seconds)
			for _, place := range places {
				other := shape.Centre()
				if place.IsMean() {
					other = place
				}
				got, err := s.At(d, everywhere(place, other)...)
				if want := kelvins(t, whole, place, seconds); err != nil || !(math.Abs(got.SI()-want) <= rounded) {
					t.Errorf("%s, %s after %v: %v K, %v, want %v", stone.name, place, d, got.SI(), err, want)
				}
			}
			released, _ := whole.HeatReleased(d)
			part, err := s.HeatFraction(d)
			if want := released.SI() / (2500 * 800 * p.Body.Volume().SI() * 70); err != nil || !(math.Abs(part-want) <= 1e-13) {
				t.Errorf("%s after %v: %v of the heat, %v, want %v", stone.name, d, part, err, want)
			}
		}
		for _, target := range []float64{89.9, 60, 20.01} {
			want, _ := whole.TimeTo(shape.Centre(), units.Celsius.Of(target))
			got, err := s.TimeTo(units.Celsius.Of(target), everywhere(shape.Centre(), shape.Centre())...)
			if err != nil || !(math.Abs(got.Ratio(want)-1) <= 1e-10) {
				t.Errorf("%s at %v °C: %v, %v, want %v", stone.name, target, got, err, want)
			}
		}
	}
}

// The heat that has left is what has passed through each pair of faces, each by its own coefficient.
func TestProductHeatPassesTheFaces(t *testing.T) {
	h := []float64{900, 30, 150}
	p := block(t, h...)
	s := product(t, p)
	thick := []float64{0.016, 0.020, 0.030}
	faces := [][]shape.Place{{shape.Surface(), shape.Mean(), shape.Mean()}, {shape.Mean(), shape.Surface(), shape.Mean()}, {shape.Mean(), shape.Mean(), shape.Surface()}}
	for _, seconds := range []float64{0.1, 5, 60} {
		// over the root of time, in which the surface begins smoothly
		passed := quad.Fixed(func(u float64) float64 {
			total := 0.0
			for i, face := range faces {
				T, err := s.At(units.Second.Of(u*u), face...)
				if err != nil {
					t.Fatal(err)
				}
				total += 2 * u * h[i] * 2 / thick[i] * (T.SI() - 293.15) / (2500 * 800 * 70)
			}
			return total
		}, 0, math.Sqrt(seconds), 80, quad.Legendre{}, 0)
		if got, err := s.HeatFraction(units.Second.Of(seconds)); err != nil || !(math.Abs(got-passed) <= 1e-10) {
			t.Errorf("after %v s: %.13g of the heat, %v, through the faces %.13g", seconds, got, err, passed)
		}
	}
}

// Conduction holds inside, and each face exchanges by its own coefficient, by central and one-sided differences.
func TestProductEquation(t *testing.T) {
	h := []float64{900, 30, 150}
	s := product(t, block(t, h...))
	half := []float64{0.008, 0.010, 0.015}
	at := func(seconds float64, depths ...float64) float64 {
		var where []shape.Place
		for _, d := range depths {
			where = append(where, shape.Below(units.Metre.Of(d)))
		}
		T, err := s.At(units.Second.Of(seconds), where...)
		if err != nil {
			t.Fatal(err)
		}
		return T.SI()
	}
	const e, seconds = 2e-5, 30.0
	inside := []float64{0.003, 0.004, 0.006}
	rate := (at(seconds*(1+1e-4), inside...) - at(seconds*(1-1e-4), inside...)) / (2e-4 * seconds)
	bend := 0.0
	for i := range inside {
		up, down := append([]float64(nil), inside...), append([]float64(nil), inside...)
		up[i] += e
		down[i] -= e
		bend += (at(seconds, up...) + at(seconds, down...) - 2*at(seconds, inside...)) / (e * e)
	}
	if got := 5e-7 * bend; !(math.Abs(got-rate) <= 1e-5*math.Abs(rate)) {
		t.Errorf("%v K/s by time, %v K/s by conduction", rate, got)
	}
	for i := range inside {
		face, near, far := append([]float64(nil), inside...), append([]float64(nil), inside...), append([]float64(nil), inside...)
		face[i], near[i], far[i] = 0, e, 2*e
		outwards := (-3*at(seconds, face...) + 4*at(seconds, near...) - at(seconds, far...)) / (2 * e) // k = 1 W/(m K)
		if want := h[i] * (at(seconds, face...) - 293.15); !(math.Abs(outwards-want) <= 1e-4*want) {
			t.Errorf("face %d: %v W/m² by conduction, %v by its coefficient", i+1, outwards, want)
		}
	}
	for i := range half {
		far := []float64{half[0], half[1], half[2]}
		far[i] = 0
		if T := at(seconds, far...); !(T > 293.15 && T < 363.15) {
			t.Errorf("middle of face %d: %v K", i+1, T)
		}
	}
}

// Far from the other faces a corner is a wall, and far from its end a bar is a bar; before heat comes through from the
// other side, a brick is the corner of a body without end.
func TestProductLimits(t *testing.T) {
	ctx := context.Background()
	m := marble()
	surface := convection(300, 293.15)
	open := series.Direction{Surface: surface}
	base := series.Product{Conductivity: m.Conductivity, Density: m.Density, SpecificHeat: m.SpecificHeat, Initial: m.Initial}
	with := func(directions ...series.Direction) *series.ProductSolution {
		p := base
		p.Directions = directions
		return product(t, p)
	}
	put := boundary.Temperature(units.Kelvin.Of(293.15))
	shell, err := series.SemiInfinite{Conductivity: m.Conductivity, Density: m.Density, SpecificHeat: m.SpecificHeat, Initial: m.Initial, Surface: put}.Solve(ctx)
	if err != nil {
		t.Fatal(err)
	}
	cold := with(series.Direction{Surface: put}, open)
	wall, err := series.SemiInfinite{Conductivity: m.Conductivity, Density: m.Density, SpecificHeat: m.SpecificHeat, Initial: m.Initial, Surface: surface}.Solve(ctx)
	if err != nil {
		t.Fatal(err)
	}
	deep := shape.Below(units.Metre.Of(2))
	edge, corner := with(open, open), with(open, open, open)
	mm := units.Millimetre.Of
	rod := m
	rod.Body = shape.Cylinder(mm(16), mm(300)).Exposing(shape.Outside)
	long := solve(t, rod)
	end := with(series.Direction{Body: rod.Body, Surface: surface}, open)
	cube := with(series.Direction{Body: shape.Plate(mm(40), units.SquareMetre.Of(1)), Surface: surface}, series.Direction{Body: shape.Plate(mm(40), units.SquareMetre.Of(1)), Surface: surface}, series.Direction{Body: shape.Plate(mm(40), units.SquareMetre.Of(1)), Surface: surface})
	for _, seconds := range []float64{0, 0.1, 4, 30} {
		d := units.Second.Of(seconds)
		for _, depth := range []float64{0, 0.4, 3} {
			here := shape.Below(mm(depth))
			want, _ := wall.At(mm(depth), d)
			for name, got := range map[string]func() (units.Temperature, error){
				"edge":       func() (units.Temperature, error) { return edge.At(d, here, deep) },
				"other edge": func() (units.Temperature, error) { return edge.At(d, deep, here) },
				"corner":     func() (units.Temperature, error) { return corner.At(d, deep, deep, here) },
			} {
				if T, err := got(); err != nil || !(math.Abs(T.Sub(want).SI()) <= rounded) {
					t.Errorf("%s, %v mm deep after %v: %v, %v, in a wall %v", name, depth, d, T, err, want)
				}
			}
			want, _ = shell.At(mm(depth), d)
			if T, err := cold.At(d, here, deep); err != nil || !(math.Abs(T.Sub(want).SI()) <= rounded) {
				t.Errorf("face of a given temperature, %v mm deep after %v: %v, %v, in a wall %v", depth, d, T, err, want)
			}
			want, _ = long.At(here, d)
			if T, err := end.At(d, here, deep); err != nil || !(math.Abs(T.Sub(want).SI()) <= rounded) {
				t.Errorf("bar, %v mm deep after %v: %v, %v, without end %v", depth, d, T, err, want)
			}
			a, err1 := cube.At(d, here, here, here)
			b, err2 := corner.At(d, here, here, here)
			if seconds < 10 && (errors.Join(err1, err2) != nil || !(math.Abs(a.Sub(b).SI()) <= 1e-9)) {
				t.Errorf("corner of a cube, %v mm deep after %v: %v, of an endless body %v", depth, d, a, b)
			}
		}
	}
}

// A long aluminium cylinder in water, 15 cm from its end (Çengel, Heat and Mass Transfer, example 4-9, from memory): 151 °C
// with tables of three digits, 0.762 and 0.963; recomputed with 200 terms in arbitrary precision 422.892396202 K.
func TestProductPublished(t *testing.T) {
	k, alpha := 237.0, 9.71e-5
	water := convection(120, 288.15)
	s := product(t, series.Product{
		Directions: []series.Direction{
			{Body: shape.Cylinder(units.Centimetre.Of(20), units.Metre.Of(1)).Exposing(shape.Outside), Surface: water},
			{Surface: water},
		},
		Conductivity: units.WattPerMetreKelvin.Of(k),
		Density:      units.KilogramPerCubicMetre.Of(k / (alpha * 1000)),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(1000),
		Initial:      units.Kelvin.Of(473.15),
	})
	T, err := s.At(units.Minute.Of(5), shape.Centre(), shape.Below(units.Centimetre.Of(15)))
	if err != nil || !(math.Abs(T.SI()-422.892396202) <= 1e-8) || !(math.Abs(T.In(units.Celsius)-151) <= 1.5) {
		t.Errorf("%v, %v, want 422.892396202 K", T.SI(), err)
	}
	if !strings.Contains(s.Derivation().String(), "Newman") {
		t.Error("the derivation does not name its source")
	}
}

// The time to a temperature is when it is there, in bodies with and without another side.
func TestProductTimeTo(t *testing.T) {
	r := rand.New(rand.NewSource(31))
	m := marble()
	mm := units.Millimetre.Of
	for range 100 {
		some := func() series.Direction {
			d := series.Direction{Surface: convection(math.Pow(10, 5*r.Float64()), 293.15)}
			if r.Intn(4) == 0 {
				d.Surface = boundary.Temperature(units.Celsius.Of(20))
			}
			if r.Intn(2) == 0 {
				d.Body = shape.Plate(mm(2+30*r.Float64()), units.SquareMetre.Of(1))
			}
			return d
		}
		p := series.Product{Directions: []series.Direction{some(), some(), some()}, Conductivity: m.Conductivity, Density: m.Density, SpecificHeat: m.SpecificHeat, Initial: m.Initial}
		s := product(t, p)
		where := []shape.Place{shape.Below(mm(0.9)), shape.Below(mm(r.Float64())), shape.Below(mm(r.Float64()))}
		target := units.Celsius.Of(20.5 + 69*r.Float64())
		d, err := s.TimeTo(target, where...)
		if err != nil {
			t.Fatal(err)
		}
		T, err := s.At(d, where...)
		if err != nil || !(math.Abs(T.Sub(target).SI()) <= 1e-9) {
			t.Errorf("at %v after %v: %v, %v", target, d, T, err)
		}
		bound, err := s.TruncationError(d)
		if err != nil || !(bound.SI() >= 0 && bound.SI() < 1e-12) {
			t.Errorf("bound of the error %v, %v", bound, err)
		}
	}
}

func TestProductAnswers(t *testing.T) {
	centre := []shape.Place{shape.Centre(), shape.Centre(), shape.Centre()}
	s := product(t, block(t, 10, 20, 30))
	var never *units.NeverError
	if _, err := s.TimeTo(units.Celsius.Of(20), centre...); !errors.As(err, &never) || never.Limit != units.Celsius.Of(20) {
		t.Errorf("ambient as the target: %v, want a NeverError", err)
	}
	for _, target := range []float64{90, 95} {
		if d, err := s.TimeTo(units.Celsius.Of(target), centre...); err != nil || d.SI() != 0 {
			t.Errorf("%v °C: %v, %v, want 0 s", target, d, err)
		}
	}
	still := product(t, block(t, 0, 0, 0))
	if _, err := still.TimeTo(units.Celsius.Of(50), centre...); !errors.As(err, &never) || never.Limit != units.Celsius.Of(90) {
		t.Errorf("no exchange: %v, want a NeverError", err)
	}
	if T, err := still.At(units.Hour.Of(100), centre...); err != nil || T != units.Celsius.Of(90) {
		t.Errorf("no exchange: %v, %v", T, err)
	}
	one := product(t, block(t, 0, 300, 0))
	plate := marble()
	plate.Body = shape.Plate(units.Millimetre.Of(20), units.SquareMetre.Of(1))
	if T, err := one.At(units.Second.Of(20), centre...); err != nil || math.Abs(T.SI()-kelvins(t, solve(t, plate), shape.Centre(), 20)) > rounded {
		t.Errorf("two pairs of faces insulated: %v, %v, want that of a plate", T, err)
	}
}

func TestProductBadInput(t *testing.T) {
	ctx := context.Background()
	var argument *units.ArgumentError
	check := func(name string, err error) {
		t.Helper()
		argument = nil
		if !errors.As(err, &argument) || argument.Accepted == "" {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
	mm := units.Millimetre.Of
	rod := shape.Cylinder(mm(10), mm(100)).Exposing(shape.Outside)
	surface := convection(10, 293.15)
	for name, change := range map[string]func(p *series.Product){
		"no directions":           func(p *series.Product) { p.Directions = nil },
		"four directions":         func(p *series.Product) { p.Directions = append(p.Directions, series.Direction{Surface: surface}) },
		"two cylinders":           func(p *series.Product) { p.Directions = []series.Direction{{rod, surface}, {rod, surface}} },
		"sphere and plate":        func(p *series.Product) { p.Directions[0].Body = shape.Sphere(mm(3)) },
		"cone":                    func(p *series.Product) { p.Directions[0].Body = shape.Cone(mm(3), mm(3)) },
		"short cylinder":          func(p *series.Product) { p.Directions[0].Body = shape.Cylinder(mm(3), mm(3)) },
		"plate of no thickness":   func(p *series.Product) { p.Directions[0].Body = shape.Plate(mm(0), units.SquareMetre.Of(1)) },
		"two ambients":            func(p *series.Product) { p.Directions[2].Surface = convection(10, 280) },
		"two ambients, one fixed": func(p *series.Product) { p.Directions[0].Surface = boundary.Temperature(units.Celsius.Of(10)) },
		"flux":                    func(p *series.Product) { p.Directions[1].Surface = boundary.Flux(units.WattPerSquareMetre.Of(1)) },
		"no surface":              func(p *series.Product) { p.Directions[1].Surface = boundary.Condition{} },
		"no conductivity":         func(p *series.Product) { p.Conductivity = units.Conductivity{} },
		"no density":              func(p *series.Product) { p.Density = units.Density{} },
		"no specific heat":        func(p *series.Product) { p.SpecificHeat = units.SpecificHeat{} },
		"no start":                func(p *series.Product) { p.Initial = units.Temperature{} },
		"diffusivity too small": func(p *series.Product) {
			p.Density, p.SpecificHeat = units.KilogramPerCubicMetre.Of(1e200), units.JoulePerKilogramKelvin.Of(1e200)
		},
		"Biot number too large": func(p *series.Product) {
			p.Conductivity, p.Density = units.WattPerMetreKelvin.Of(1e-310), units.KilogramPerCubicMetre.Of(1e-305)
		},
	} {
		p := block(t, 10, 20, 30)
		change(&p)
		_, err := p.Solve(ctx)
		check(name, err)
	}
	p := block(t, 10, 20, 30)
	var none context.Context
	_, err := p.Solve(none)
	check("no context", err)
	done, cancel := context.WithCancel(ctx)
	cancel()
	if _, err := p.Solve(done); !errors.Is(err, context.Canceled) {
		t.Errorf("after the end of the context: %v", err)
	}
	s := product(t, p)
	c := shape.Centre()
	second := units.Second.Of
	_, err = s.At(second(1), c, c)
	check("two places", err)
	_, err = s.At(second(1), c, c, shape.Below(mm(16)))
	check("beside the body", err)
	_, err = s.At(second(1), c, c, shape.Slowest())
	check("slowest place", err)
	_, err = s.At(second(-1), c, c, c)
	check("negative time", err)
	_, err = s.TimeTo(units.Celsius.Of(math.NaN()), c, c, c)
	check("NaN target", err)
	_, err = s.TimeTo(units.Celsius.Of(30), c)
	check("one place", err)
	_, err = s.HeatFraction(second(math.NaN()))
	check("NaN time", err)
	_, err = s.TruncationError(second(-1))
	check("negative time", err)
	p.Directions[2].Body = shape.Body{}
	open := product(t, p)
	_, err = open.HeatFraction(second(1))
	check("heat of a body without end", err)
	for _, place := range []shape.Place{shape.Centre(), shape.Mean(), shape.Opposite(), shape.Below(mm(-1)), {}} {
		_, err = open.At(second(1), c, c, place)
		check(place.String()+" of a body without end", err)
	}
	for _, none := range []*series.ProductSolution{nil, {}} {
		_, err = none.At(second(1))
		check("zero solution", err)
		_, err = none.TimeTo(units.Celsius.Of(30))
		check("zero solution", err)
		_, err = none.HeatFraction(second(1))
		check("zero solution", err)
		if r := none.Derivation(); r.Title != "" {
			t.Errorf("derivation of the zero solution: %v", r)
		}
	}
	_, err = series.DirectionsOf(shape.Sphere(mm(3)), surface, surface)
	check("two conditions for a sphere", err)
	_, err = series.DirectionsOf(shape.Cone(mm(3), mm(3)), surface)
	check("directions of a cone", err)
}

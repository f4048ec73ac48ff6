package series_test

import (
	"context"
	"errors"
	"fmt"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

func wind(h, celsius float64) boundary.Condition {
	return boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Celsius.Of(celsius))
}

// kiln is a brick lining, 30 mm thick, at 20 °C, with hot gas on one side.
func kiln(body shape.Body) series.Problem {
	return series.Problem{
		Body:         body,
		Conductivity: units.WattPerMetreKelvin.Of(1.2),
		Density:      units.KilogramPerCubicMetre.Of(2000),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(900),
		Initial:      units.Celsius.Of(20),
		Surface:      wind(15, 20),
		Opposite:     wind(80, 600),
	}
}

var (
	millimetres = units.Millimetre.Of
	slab        = shape.Plate(millimetres(30), units.SquareMetre.Of(2))
)

// times from a hundredth of a second to days.
var times = []float64{0.01, 1, 20, 100, 400, 2000, 1e4, 1e6}

func compare(t *testing.T, name string, a, b *series.Solution, places []shape.Place, tolerance float64) {
	t.Helper()
	for _, seconds := range times {
		when := units.Second.Of(seconds)
		for _, place := range places {
			x, err := a.At(place, when)
			if err != nil {
				t.Fatal(name, err)
			}
			y, err := b.At(place, when)
			if err != nil {
				t.Fatal(name, err)
			}
			if d := math.Abs(x.Sub(y).SI()); !(d <= tolerance) {
				t.Errorf("%s, %s after %v: %.12g K and %.12g K, off by %.2g, tolerance %.2g", name, place, when, x.SI(), y.SI(), d, tolerance)
			}
		}
		p, err := a.HeatReleased(when)
		if err != nil {
			t.Fatal(name, err)
		}
		q, err := b.HeatReleased(when)
		if err != nil {
			t.Fatal(name, err)
		}
		if d := math.Abs(p.SI() - q.SI()); !(d <= tolerance/500*(math.Abs(q.SI())+1)) {
			t.Errorf("%s, heat after %v: %.12g J and %.12g J, tolerance %.2g relative", name, when, p.SI(), q.SI(), tolerance/500)
		}
	}
}

// A body that the solution with one condition knows too is the same as a wall: the roots, the terms and the forms for
// short times have nothing in common.
func TestWallIsTheBodyOfOneCondition(t *testing.T) {
	for _, c := range []struct {
		name      string
		condition boundary.Condition
	}{{"convection", wind(80, 600)}, {"prescribed", boundary.Temperature(units.Celsius.Of(400))}, {"flux", boundary.Flux(units.WattPerSquareMetre.Of(-300))}, {"weak", wind(1e-6, 600)}, {"strong", wind(1e9, 600)}} {
		symmetric := kiln(slab)
		symmetric.Surface, symmetric.Opposite = c.condition, boundary.Condition{}
		wall := symmetric
		wall.Opposite = c.condition
		compare(t, "plate, "+c.name, solve(t, wall), solve(t, symmetric), []shape.Place{shape.Centre(), shape.Surface(), shape.Below(millimetres(4)), shape.Mean()}, 2e-10)

		half := symmetric
		half.Body = slab.Exposing(shape.Front)
		wall = half
		wall.Opposite = boundary.Flux(units.HeatFlux{})
		places := []shape.Place{shape.Opposite(), shape.Surface(), shape.Below(millimetres(4)), shape.Mean()}
		compare(t, "plate, insulated, "+c.name, solve(t, wall), solve(t, half), places, 2e-10)

		for _, body := range []shape.Body{slab, shape.Sphere(millimetres(60)), shape.Cylinder(millimetres(60), units.Metre.Of(1)).Exposing(shape.Outside)} {
			one := symmetric
			one.Body = body
			wall = one
			wall.Initial, wall.Profile = units.Temperature{}, func(units.Length) (units.Temperature, error) { return units.Celsius.Of(20), nil }
			a, b := solve(t, wall), solve(t, one)
			for _, seconds := range []float64{400, 3000, 1e5} {
				for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Below(millimetres(4)), shape.Mean()} {
					x, errX := a.At(place, units.Second.Of(seconds))
					y, errY := b.At(place, units.Second.Of(seconds))
					if d := math.Abs(x.Sub(y).SI()); errX != nil || errY != nil || !(d <= 1e-9) {
						t.Errorf("%v, %s, profile, %s after %v s: %.12g K and %.12g K, tolerance 1e-9, %v, %v", body, c.name, place, seconds, x.SI(), y.SI(), errX, errY)
					}
				}
			}
		}
	}
}

// The end is what resistances in series give, each written down by hand.
func TestSteadyWall(t *testing.T) {
	long := units.Second.Of(1e9)
	k, L, outer, inner := 1.2, 0.03, 0.08, 0.05
	for _, c := range []struct {
		name               string
		body               shape.Body
		outside, within, r float64 // areas and resistance of the material
	}{
		{"plate", slab, 2, 2, L / k / 2},
		{"tube", shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7)), 2 * math.Pi * outer * 0.7, 2 * math.Pi * inner * 0.7, math.Log(outer/inner) / (2 * math.Pi * k * 0.7)},
		{"hollow sphere", shape.HollowSphere(millimetres(160), millimetres(100)), 4 * math.Pi * outer * outer, 4 * math.Pi * inner * inner, (1/inner - 1/outer) / (4 * math.Pi * k)},
	} {
		s := solve(t, kiln(c.body))
		power := 580 / (1/(80*c.within) + c.r + 1/(15*c.outside))
		for _, want := range []struct {
			what string
			got  func() (float64, error)
			want float64
		}{
			{"surface", func() (float64, error) { T, err := s.At(shape.Surface(), long); return T.In(units.Celsius), err }, 20 + power/(15*c.outside)},
			{"opposite", func() (float64, error) { T, err := s.At(shape.Opposite(), long); return T.In(units.Celsius), err }, 600 - power/(80*c.within)},
			{"flux out", func() (float64, error) { q, err := s.Flux(shape.Surface(), long); return q.SI() * c.outside, err }, power},
			{"flux in", func() (float64, error) { q, err := s.Flux(shape.Opposite(), long); return q.SI() * c.within, err }, -power},
		} {
			got, err := want.got()
			if err != nil || !(math.Abs(got-want.want) <= 1e-11*math.Abs(want.want)) {
				t.Errorf("%s, %s: %.14g, want %.14g within 1e-11, %v", c.name, want.what, got, want.want, err)
			}
		}
	}
}

// With a source the steady temperature of a symmetric body is that of the textbooks: g L²/(8k) + g L/(2h) above the
// ambient in the middle of a plate, and g R²/(4k) + g R/(2h), g R²/(6k) + g R/(3h) in a cylinder and a sphere.
func TestSteadySource(t *testing.T) {
	g, k, h, d := 5e4, 1.2, 80.0, 0.06
	for _, c := range []struct {
		body shape.Body
		rise float64
	}{
		{shape.Plate(millimetres(60), units.SquareMetre.Of(1)), g*d*d/(8*k) + g*d/(2*h)},
		{shape.Cylinder(millimetres(60), units.Metre.Of(1)).Exposing(shape.Outside), g*d*d/(16*k) + g*d/(4*h)},
		{shape.Sphere(millimetres(60)), g*d*d/(24*k) + g*d/(6*h)},
	} {
		p := kiln(c.body)
		p.Surface, p.Opposite, p.Source = wind(h, 20), boundary.Condition{}, units.WattPerCubicMetre.Of(g)
		s := solve(t, p)
		T, err := s.At(shape.Centre(), units.Second.Of(1e9))
		if rise := T.In(units.Celsius) - 20; err != nil || !(math.Abs(rise-c.rise) <= 1e-11*c.rise) {
			t.Errorf("%v: rise %.14g K, want %.14g K within 1e-11, %v", c.body, rise, c.rise, err)
		}
	}
}

// A tube whose hole shrinks becomes a cylinder, with an error that goes with the area of the hole; a thin one becomes a
// plate, with an error that goes with the curvature.
func TestHollowLimits(t *testing.T) {
	at := func(body shape.Body, seconds float64) float64 {
		p := kiln(body)
		p.Surface, p.Opposite = wind(80, 600), boundary.Condition{}
		T, err := solve(t, p).At(shape.Below(millimetres(20)), units.Second.Of(seconds))
		if err != nil {
			t.Fatal(err)
		}
		return T.SI()
	}
	for _, seconds := range []float64{60, 600, 3000} {
		cylinder := at(shape.Cylinder(millimetres(60), units.Metre.Of(1)).Exposing(shape.Outside), seconds)
		sphere := at(shape.Sphere(millimetres(60)), seconds)
		plate := at(slab.Exposing(shape.Front), seconds)
		for _, c := range []struct {
			name  string
			want  float64
			hole  func(e float64) shape.Body
			order float64
		}{
			{"tube with a small hole", cylinder, func(e float64) shape.Body {
				return shape.Tube(millimetres(60), millimetres(60*e), units.Metre.Of(1))
			}, 2},
			{"hollow sphere with a small hole", sphere, func(e float64) shape.Body { return shape.HollowSphere(millimetres(60), millimetres(60*e)) }, 3},
			{"thin tube", plate, func(e float64) shape.Body {
				return shape.Tube(millimetres(60/e+60), millimetres(60/e), units.Metre.Of(1))
			}, 1},
			{"thin hollow sphere", plate, func(e float64) shape.Body { return shape.HollowSphere(millimetres(60/e+60), millimetres(60/e)) }, 1},
		} {
			coarse, fine := math.Abs(at(c.hole(0.02), seconds)-c.want), math.Abs(at(c.hole(0.01), seconds)-c.want)
			if order := math.Log2(coarse / fine); coarse > 1e-7 && math.Abs(order-c.order) > 0.25 {
				t.Errorf("%s after %v s: %.3g K and %.3g K off with half of it, order %.2f, want %v", c.name, seconds, coarse, fine, order, c.order)
			}
			if d := math.Abs(at(c.hole(1e-6), seconds) - c.want); !(d <= 2e-3) {
				t.Errorf("%s after %v s: %.3g K off with a ratio of 1e-6", c.name, seconds, d)
			}
		}
	}
}

// What two causes give together is the sum of what each gives alone.
func TestSuperposition(t *testing.T) {
	for _, body := range []shape.Body{slab, shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7)), shape.HollowSphere(millimetres(160), millimetres(100)).Exposing(shape.Inside)} {
		both, first, second := kiln(body), kiln(body), kiln(body)
		cold := wind(80, 20)
		both.Source = units.WattPerCubicMetre.Of(3e5)
		first.Source, first.Opposite = both.Source, cold
		if body.Exposed() == shape.Inside {
			both.Surface, both.Opposite, second.Surface, second.Opposite = both.Opposite, both.Surface, second.Opposite, second.Surface
			first.Surface, first.Opposite = cold, first.Surface
		}
		a, b, c := solve(t, both), solve(t, first), solve(t, second)
		for _, seconds := range times {
			for _, place := range []shape.Place{shape.Surface(), shape.Opposite(), shape.Below(millimetres(11)), shape.Mean()} {
				var T [3]units.Temperature
				for i, s := range []*series.Solution{a, b, c} {
					var err error
					if T[i], err = s.At(place, units.Second.Of(seconds)); err != nil {
						t.Fatal(err)
					}
				}
				if d := T[0].SI() + units.Celsius.Of(20).SI() - T[1].SI() - T[2].SI(); !(math.Abs(d) <= 1e-9) {
					t.Errorf("%v, %s after %v s: off by %.2g K, tolerance 1e-9", body, place, seconds, d)
				}
			}
		}
	}
}

// A source that is switched is the sum of constant ones that begin later, and a ramp of the source is the integral of
// that; a log says both.
func TestSourceLog(t *testing.T) {
	second, watt := units.Second.Of, units.WattPerCubicMetre.Of
	for _, body := range []shape.Body{slab, shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7)), shape.Sphere(millimetres(60))} {
		p := kiln(body)
		p.Surface, p.Opposite = wind(80, 20), boundary.Condition{}
		constant := p
		constant.Source = watt(2e5)
		unit := solve(t, constant)
		rise := func(place shape.Place, seconds float64) float64 {
			if seconds <= 0 {
				return 0
			}
			T, err := unit.At(place, second(seconds))
			if err != nil {
				t.Fatal(err)
			}
			return T.In(units.Celsius) - 20
		}
		logged := p
		logged.SourceLog = []series.SourceReading{{second(0), watt(2e5)}, {second(100), watt(2e5)}, {second(100), watt(6e5)}, {second(300), watt(6e5)}, {second(300), watt(0)}, {second(700), watt(0)}, {second(1100), watt(4e5)}, {second(5000), watt(4e5)}}
		s := solve(t, logged)
		for _, seconds := range []float64{0.5, 50, 100, 100.001, 101, 150, 299, 300.5, 320, 400, 700} {
			for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
				T, err := s.At(place, second(seconds))
				if err != nil {
					t.Fatal(err)
				}
				want := rise(place, seconds) + 2*rise(place, seconds-100) - 3*rise(place, seconds-300)
				bound, _ := s.TruncationError(second(seconds))
				if got := T.In(units.Celsius) - 20; !(math.Abs(got-want) <= bound.SI()+1e-9) {
					t.Errorf("%v, %s after %v s: rise %.12g K, want %.12g K within %.2g K", body, place, seconds, got, want, bound.SI())
				}
			}
		}
		// the ramp from 700 s to 1100 s, by Simpson's rule over 400 constant sources
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
			T, err := s.At(place, second(2000))
			if err != nil {
				t.Fatal(err)
			}
			want := rise(place, 2000) + 2*rise(place, 1900) - 3*rise(place, 1700)
			for i := 0; i <= 400; i++ {
				weight := 2.0
				switch {
				case i == 0 || i == 400:
					weight = 1
				case i%2 == 1:
					weight = 4
				}
				want += 2 * weight / 1200 * rise(place, 2000-700-float64(i))
			}
			if got := T.In(units.Celsius) - 20; !(math.Abs(got-want) <= 1e-7) {
				t.Errorf("%v, %s after a ramp: rise %.12g K, want %.12g K within 1e-7", body, place, got, want)
			}
		}
		if _, err := s.At(shape.Centre(), second(5001)); !errors.As(err, new(*units.ArgumentError)) {
			t.Errorf("beyond the log: %v, want an ArgumentError", err)
		}
		if _, err := s.TimeTo(shape.Centre(), units.Celsius.Of(5000)); !errors.As(err, new(*units.HorizonError)) {
			t.Errorf("not within the log: %v, want a HorizonError", err)
		}
	}
}

// An eigenfunction as a start decays as exp(−ζ² Fo) and keeps its form: cos(πy) between insulated faces, sin(πy)
// between cold ones, and sin(πr/R)/(πr/R) in a sphere with a cold surface.
func TestProfiles(t *testing.T) {
	L := 0.03
	alpha := 1.2 / (2000 * 900)
	for _, c := range []struct {
		name      string
		body      shape.Body
		condition boundary.Condition
		form      func(depth float64) float64
	}{
		{"insulated", slab, boundary.Flux(units.HeatFlux{}), func(x float64) float64 { return math.Cos(math.Pi * x / L) }},
		{"cold faces", slab, boundary.Temperature(units.Celsius.Of(100)), func(x float64) float64 { return math.Sin(math.Pi * x / L) }},
		{"cold sphere", shape.Sphere(millimetres(60)), boundary.Temperature(units.Celsius.Of(100)), func(x float64) float64 {
			z := math.Pi * (1 - x/L)
			if z < 1e-9 {
				return 1
			}
			return math.Sin(z) / z
		}},
	} {
		p := kiln(c.body)
		p.Surface, p.Opposite, p.Initial = c.condition, boundary.Condition{}, units.Temperature{}
		p.Profile = func(depth units.Length) (units.Temperature, error) {
			return units.Celsius.Of(100 + 60*c.form(depth.SI())), nil
		}
		s := solve(t, p)
		for _, seconds := range []float64{0, 1e-3, 0.1, 5, 100, 1000} {
			for _, depth := range []float64{0.001, 0.01, 0.0251} {
				T, err := s.At(shape.Below(units.Metre.Of(depth)), units.Second.Of(seconds))
				want := 100 + 60*c.form(depth)*math.Exp(-math.Pi*math.Pi*alpha*seconds/(L*L))
				if got := T.In(units.Celsius); err != nil || !(math.Abs(got-want) <= 1e-9) {
					t.Errorf("%s, %v m after %v s: %.12g °C, want %.12g °C within 1e-9, %v", c.name, depth, seconds, got, want, err)
				}
			}
		}
	}
}

// A step in the start of an insulated plate is the textbook's cosine series, and a table gives what the function does.
func TestStepProfile(t *testing.T) {
	p := kiln(slab)
	p.Surface, p.Opposite, p.Initial = boundary.Flux(units.HeatFlux{}), boundary.Condition{}, units.Temperature{}
	p.Profile = func(depth units.Length) (units.Temperature, error) {
		if depth.SI() < 0.01 {
			return units.Celsius.Of(200), nil
		}
		return units.Celsius.Of(50), nil
	}
	s := solve(t, p)
	alpha, L := 1.2/(2000*900), 0.03
	for _, seconds := range []float64{1, 30, 300} {
		for _, depth := range []float64{0, 0.004, 0.0099, 0.02, 0.03} {
			want := 100.0
			for n := 1.0; n < 200; n++ {
				want += 150 * 2 / (n * math.Pi) * math.Sin(n*math.Pi/3) * math.Cos(n*math.Pi*depth/L) * math.Exp(-n*n*math.Pi*math.Pi*alpha*seconds/(L*L))
			}
			T, err := s.At(shape.Below(units.Metre.Of(depth)), units.Second.Of(seconds))
			if got := T.In(units.Celsius); err != nil || !(math.Abs(got-want) <= 1e-6) {
				t.Errorf("%v m after %v s: %.12g °C, want %.12g °C within 1e-6, %v", depth, seconds, got, want, err)
			}
		}
	}
	// shortly after the start the modes do not resolve the step, and say so
	_, err := s.At(shape.Below(millimetres(10)), units.Second.Of(1e-6))
	if !errors.As(err, new(*units.ConvergenceError)) {
		t.Errorf("after 1 µs: %v, want a ConvergenceError", err)
	}
	table, err := shape.TabulatedProfile([]units.Length{millimetres(0), millimetres(12), millimetres(30)}, []units.Temperature{units.Celsius.Of(20), units.Celsius.Of(90), units.Celsius.Of(40)})
	if err != nil {
		t.Fatal(err)
	}
	p.Profile = table
	a := solve(t, p)
	T, err := a.Mean(units.Second.Of(10))
	if want := (12*(20+90)/2.0 + 18*(90+40)/2.0) / 30; err != nil || !(math.Abs(T.In(units.Celsius)-want) <= 1e-8) {
		t.Errorf("mean of a table: %v, want %v °C, %v", T, want, err)
	}
}

// Temperatures stay between the coldest and the hottest of the start and the surroundings, for walls of any radii and
// coefficients.
func TestWallStaysBetween(t *testing.T) {
	r := rand.New(rand.NewSource(5))
	span := func() float64 { return math.Exp(r.NormFloat64() * 6) }
	for range 400 {
		inner := units.Metre.Of(2 * math.Exp((r.Float64()*2-1)*math.Log(1e6)))
		wall := units.Metre.Of(1)
		outer := inner.Add(wall.Scale(2))
		p := kiln([]shape.Body{shape.Plate(wall, units.SquareMetre.Of(1)), shape.Tube(outer, inner, wall), shape.HollowSphere(outer, inner)}[r.Intn(3)])
		p.Surface, p.Opposite = wind(span(), 300), wind(span(), -100)
		if r.Intn(4) == 0 {
			p.Opposite = boundary.Temperature(units.Celsius.Of(-50))
		}
		s := solve(t, p)
		for range 20 {
			when := units.Second.Of(1.5e6 * span())
			place := shape.Below(wall.Scale(r.Float64()))
			T, err := s.At(place, when)
			if errors.As(err, new(*units.ConvergenceError)) {
				continue
			}
			bound, _ := s.TruncationError(when)
			if err != nil || !(T.In(units.Celsius) <= 300+bound.SI()+1e-9 && T.In(units.Celsius) >= -100-bound.SI()-1e-9) {
				t.Errorf("%v, %v and %v, %s after %v: %v, bound %v, %v", p.Body, p.Surface, p.Opposite, place, when, T, bound, err)
			}
		}
	}
}

// The first crossing is found although the temperature comes back: a cold start between a hot and a cold face, with a
// profile and a source on top. The times are checked on a fine grid.
func TestFirstCrossing(t *testing.T) {
	r := rand.New(rand.NewSource(6))
	for i := range 40 {
		p := kiln([]shape.Body{slab, shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7)), shape.HollowSphere(millimetres(160), millimetres(100)), shape.Sphere(millimetres(60))}[i%4])
		p.Surface, p.Opposite = wind(200*r.Float64(), 400*r.Float64()), wind(2000*r.Float64(), 400*r.Float64())
		if i%4 == 3 {
			p.Opposite = boundary.Condition{}
		}
		if i%3 == 1 {
			p.Source = units.WattPerCubicMetre.Of(2e5 * r.NormFloat64())
		}
		if i%3 == 2 {
			a, b := 300*r.Float64(), 9*r.Float64()
			p.Initial, p.Profile = units.Temperature{}, func(d units.Length) (units.Temperature, error) {
				return units.Celsius.Of(200 + a*math.Cos(100*b*d.SI())), nil
			}
		}
		if i%5 == 4 {
			p.SourceLog = []series.SourceReading{{units.Second.Of(0), units.WattPerCubicMetre.Of(1e5)}, {units.Second.Of(50), units.WattPerCubicMetre.Of(-4e5)}, {units.Second.Of(50), units.WattPerCubicMetre.Of(8e5)}, {units.Second.Of(3000), units.HeatSource{}}}
		}
		s := solve(t, p)
		for range 3 {
			place := []shape.Place{shape.Surface(), shape.Mean(), shape.Below(millimetres(30 * r.Float64()))}[r.Intn(3)]
			target := units.Celsius.Of(400 * r.Float64())
			when, err := s.TimeTo(place, target)
			start, errStart := s.At(place, units.Second.Of(0))
			if errStart != nil {
				t.Fatal(errStart)
			}
			side := start.SI() > target.SI()
			from, last := 0.5, when.SI()*(1-1e-6)
			if err != nil || when.SI() == 0 {
				last = 2990
			}
			for u := 0; u <= 600; u++ {
				at := from * math.Pow(last/from, float64(u)/600)
				if at > last || last < from {
					break
				}
				T, errAt := s.At(place, units.Second.Of(at))
				if errAt != nil {
					continue
				}
				if T.SI() > target.SI() != side && math.Abs(T.SI()-target.SI()) > 1e-9 {
					t.Errorf("case %d, %s at %v: %v, %v, but it is at %v after %v s", i, place, target, when, err, T, at)
					break
				}
			}
			if err == nil && when.SI() > 0 {
				if T, err := s.At(place, when); err != nil || !(math.Abs(T.SI()-target.SI()) <= 1e-7) {
					t.Errorf("case %d, %s at %v after %v, where it is at %v, %v", i, place, target, when, T, err)
				}
			}
		}
	}
}

// The slowest and the fastest place are no later and no earlier than any other one.
func TestExtremesOfWalls(t *testing.T) {
	for _, body := range []shape.Body{slab, shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7)), shape.HollowSphere(millimetres(160), millimetres(100))} {
		p := kiln(body)
		p.Surface = wind(300, 500)
		s := solve(t, p)
		target := units.Celsius.Of(400)
		slowest, err := s.TimeTo(shape.Slowest(), target)
		fastest, errFastest := s.TimeTo(shape.Fastest(), target)
		if err != nil || errFastest != nil {
			t.Fatal(err, errFastest)
		}
		last, first := 0.0, math.Inf(1)
		for i := range 301 {
			when, err := s.TimeTo(shape.Below(millimetres(math.Min(30, float64(i)/10))), target)
			if err != nil {
				t.Fatal(err)
			}
			last, first = math.Max(last, when.SI()), math.Min(first, when.SI())
		}
		if !(slowest.SI() >= last && slowest.SI() <= last*(1+1e-4)) || !(fastest.SI() <= first && fastest.SI() >= first*(1-1e-4)) {
			t.Errorf("%v: slowest %v, fastest %v; on a grid %v s and %v s", body, slowest, fastest, last, first)
		}
	}
}

// A tube that is exposed inside alone counts depths from there; it is the same tube seen from the other face.
func TestInsideOut(t *testing.T) {
	tube := shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7))
	out := kiln(tube)
	out.Initial, out.Profile = units.Temperature{}, func(d units.Length) (units.Temperature, error) { return units.Celsius.Of(20 + 1e4*d.SI()), nil }
	in := out
	in.Body = tube.Exposing(shape.Inside)
	in.Surface, in.Opposite = out.Opposite, out.Surface
	in.Profile = func(d units.Length) (units.Temperature, error) { return units.Celsius.Of(20 + 1e4*(0.03-d.SI())), nil }
	a, b := solve(t, out), solve(t, in)
	for _, seconds := range []float64{0, 5, 300, 1e5} {
		when := units.Second.Of(seconds)
		for _, depth := range []float64{0, 4, 19, 30} {
			x, errX := a.At(shape.Below(millimetres(depth)), when)
			y, errY := b.At(shape.Below(millimetres(30-depth)), when)
			if errX != nil || errY != nil || !(math.Abs(x.Sub(y).SI()) <= 1e-9) {
				t.Errorf("%v mm after %v s: %v from outside and %v from inside, %v, %v", depth, seconds, x, y, errX, errY)
			}
		}
		x, errX := a.Flux(shape.Opposite(), when)
		y, errY := b.Flux(shape.Surface(), when)
		if errX != nil || errY != nil || !(math.Abs(x.Sub(y).SI()) <= 1e-7) {
			t.Errorf("flux inside after %v s: %v and %v, %v, %v", seconds, x, y, errX, errY)
		}
	}
}

// Flux and heat of each face, and what they have to do with each other: a flux is h times the excess of the face, the
// heats add up, and those of a body of one condition are what the other solution says.
func TestFaces(t *testing.T) {
	s := solve(t, kiln(slab))
	ball := kiln(shape.Sphere(millimetres(60)))
	ball.Opposite = boundary.Condition{}
	one := solve(t, ball)
	for _, seconds := range times {
		when := units.Second.Of(seconds)
		q, err := s.Flux(shape.Opposite(), when)
		T, errT := s.At(shape.Opposite(), when)
		if want := 80 * (T.In(units.Celsius) - 600); err != nil || errT != nil || !(math.Abs(q.SI()-want) <= 1e-9*math.Abs(want)) {
			t.Errorf("flux after %v: %v, want %v W/m² by the temperature of the face, %v, %v", when, q, want, err, errT)
		}
		front, errFront := s.HeatThrough(shape.Surface(), when)
		back, errBack := s.HeatThrough(shape.Opposite(), when)
		both, errBoth := s.HeatReleased(when)
		if errFront != nil || errBack != nil || errBoth != nil || !(math.Abs(front.SI()+back.SI()-both.SI()) <= 1e-12*math.Abs(both.SI())) {
			t.Errorf("heat after %v: %v and %v, want %v together", when, front, back, both)
		}
		heat, errHeat := one.HeatThrough(shape.Surface(), when)
		want, errWant := one.HeatReleased(when)
		if errHeat != nil || errWant != nil || !(math.Abs(heat.SI()-want.SI()) <= 1e-11*math.Abs(want.SI())+1e-9) {
			t.Errorf("heat of a ball after %v: %v, want %v, %v, %v", when, heat, want, errHeat, errWant)
		}
		out, errOut := one.Flux(shape.Surface(), when)
		T, errT = one.At(shape.Surface(), when)
		if want := 15 * (T.In(units.Celsius) - 20); errOut != nil || errT != nil || !(math.Abs(out.SI()-want) <= 1e-9*math.Abs(want)+1e-9) {
			t.Errorf("flux of a ball after %v: %v, want %v W/m², %v, %v", when, out, want, errOut, errT)
		}
	}
}

// The mean of a body that is heated from both sides goes to the target and never beyond the end; a face that is held at
// a temperature is there at once.
func TestWallNever(t *testing.T) {
	p := kiln(slab)
	p.Opposite = boundary.Temperature(units.Celsius.Of(300))
	s := solve(t, p)
	var never *units.NeverError
	if _, err := s.TimeTo(shape.Mean(), units.Celsius.Of(290)); !errors.As(err, &never) || !(never.Limit.In(units.Celsius) > 200 && never.Limit.In(units.Celsius) < 290) {
		t.Errorf("mean at 290 °C: %v, want a NeverError with a limit between the ambients", err)
	}
	for _, c := range []struct{ place, target, want string }{
		{"opposite", "200", "0 s"}, {"opposite", "20", "0 s"}, {"opposite", "10", "0 s"}, {"mean", "20", "0 s"}, {"mean", "10", "0 s"},
	} {
		place := map[string]shape.Place{"opposite": shape.Opposite(), "mean": shape.Mean()}[c.place]
		target := map[string]float64{"200": 200, "20": 20, "10": 10}[c.target]
		if when, err := s.TimeTo(place, units.Celsius.Of(target)); err != nil || when.SI() != 0 {
			t.Errorf("%s at %s °C: %v, %v, want %s", c.place, c.target, when, err, c.want)
		}
	}
	if _, err := s.TimeTo(shape.Opposite(), units.Celsius.Of(310)); !errors.As(err, &never) {
		t.Errorf("beyond the prescribed temperature: %v, want a NeverError", err)
	}
}

// With a flux into one face and none out of the other the plate warms without end, at the rate of the balance, and the
// profile is the parabola of the textbooks: q L/k (1/2 − 1/6) between the face and the mean.
func TestWallWithoutExchange(t *testing.T) {
	p := kiln(slab)
	p.Surface, p.Opposite = boundary.Flux(units.WattPerSquareMetre.Of(-1000)), boundary.Flux(units.HeatFlux{})
	s := solve(t, p)
	when := units.Second.Of(1e4)
	mean, errMean := s.Mean(when)
	surface, errSurface := s.At(shape.Surface(), when)
	if want := 20 + 1000*1e4/(2000*900*0.03); errMean != nil || !(math.Abs(mean.In(units.Celsius)-want) <= 1e-9) {
		t.Errorf("mean %v, want %v °C, %v", mean, want, errMean)
	}
	if want := 1000 * 0.03 / 1.2 / 3; errSurface != nil || !(math.Abs(surface.Sub(mean).SI()-want) <= 1e-9) {
		t.Errorf("surface above the mean by %v, want %v K, %v", surface.Sub(mean), want, errSurface)
	}
	if q, err := s.HeatReleased(when); err != nil || !(math.Abs(q.SI()+1000*2*1e4) <= 1e-6) {
		t.Errorf("heat %v, want −20 MJ, %v", q, err)
	}
	if when, err := s.TimeTo(shape.Mean(), units.Celsius.Of(20+1000*1e3/(2000*900*0.03))); err != nil || !(math.Abs(when.SI()-1e3) <= 1e-6) {
		t.Errorf("time %v, want 1000 s, %v", when, err)
	}
}

// A body that hardly exchanges heat warms by what is set free in it, and comes to an end far away: g L/(2h) above the
// ambient.
func TestWallThatHardlyExchanges(t *testing.T) {
	p := kiln(slab)
	p.Surface, p.Opposite, p.Source = wind(1e-8, 20), wind(1e-8, 20), units.WattPerCubicMetre.Of(1)
	s := solve(t, p)
	when, err := s.TimeTo(shape.Mean(), units.Celsius.Of(21))
	if want := 2000.0 * 900; err != nil || !(math.Abs(when.SI()-want) <= 1e-6*want) {
		t.Errorf("one kelvin after %v, want %v s, %v", when, want, err)
	}
	var never *units.NeverError
	_, err = s.TimeTo(shape.Mean(), units.Celsius.Of(1e7))
	if want := 20 + 0.03/2e-8; !errors.As(err, &never) || !(math.Abs(never.Limit.In(units.Celsius)-want) <= 1e-6*want) {
		t.Errorf("beyond the end: %v, want a NeverError with a limit of %v °C", err, want)
	}
}

// A temperature at a face follows from the lines of the derivation.
func TestWallDerivation(t *testing.T) {
	p := kiln(shape.Tube(millimetres(160), millimetres(100), units.Metre.Of(0.7)))
	p.Sources, p.Notes = []string{"a data sheet"}, []string{"a remark"}
	s := solve(t, p)
	r := s.Derivation()
	value := func(symbol string) float64 {
		v, ok := r.Value(symbol)
		if !ok {
			t.Fatal("no line", symbol)
		}
		return v.SI()
	}
	when := 300.0
	for mark, place := range map[string]shape.Place{"s": shape.Surface(), "o": shape.Opposite(), "m": shape.Mean()} {
		want := value("Ts_" + mark)
		for n := 1; n <= 12; n++ {
			zeta := value(fmt.Sprintf("zeta_%d", n))
			want += value(fmt.Sprintf("A_%s_%d", mark, n)) * math.Exp(-zeta*zeta*when/value("tF"))
		}
		T, err := s.At(place, units.Second.Of(when))
		if err != nil || !(math.Abs(T.SI()-want) <= 1e-9) {
			t.Errorf("%s: %v K by the derivation, %v K, %v", place, want, T.SI(), err)
		}
	}
	if _, err := r.MarshalJSON(); err != nil {
		t.Error(err)
	}
}

func TestWallBadInput(t *testing.T) {
	nan := math.NaN()
	second, watt := units.Second.Of, units.WattPerCubicMetre.Of
	for _, c := range []struct {
		name   string
		change func(*series.Problem)
		field  string
	}{
		{"opposite of a sphere", func(p *series.Problem) { p.Body = shape.Sphere(millimetres(60)) }, "condition of the opposite face"},
		{"brick", func(p *series.Problem) { p.Body = shape.Brick(millimetres(1), millimetres(2), millimetres(3)) }, "body with an opposite condition, an initial profile or a source"},
		{"opposite by a function", func(p *series.Problem) {
			p.Opposite = boundary.Function(func(units.Duration, units.Temperature) (units.HeatFlux, error) { return units.HeatFlux{}, nil })
		}, "condition of the opposite face"},
		{"negative coefficient", func(p *series.Problem) { p.Opposite = wind(-1, 20) }, "surface condition: heat transfer coefficient"},
		{"hole too small", func(p *series.Problem) {
			p.Body = shape.Tube(units.Metre.Of(1), units.Metre.Of(1e-9), units.Metre.Of(1))
		}, "inner radius over the thickness of the wall"},
		{"wall too thin", func(p *series.Problem) {
			p.Body = shape.HollowSphere(units.Metre.Of(1), units.Metre.Of(1-1e-9))
		}, "inner radius over the thickness of the wall"},
		{"two starts", func(p *series.Problem) {
			p.Profile = func(units.Length) (units.Temperature, error) { return units.Celsius.Of(1), nil }
		}, "initial temperature"},
		{"profile of NaN", func(p *series.Problem) {
			p.Initial, p.Profile = units.Temperature{}, func(units.Length) (units.Temperature, error) { return units.Kelvin.Of(nan), nil }
		}, "initial profile at 15 mm"},
		{"NaN source", func(p *series.Problem) { p.Source = watt(nan) }, "source"},
		{"log from later on", func(p *series.Problem) { p.SourceLog = []series.SourceReading{{second(1), watt(1)}} }, "source log: first time"},
		{"log of a moment", func(p *series.Problem) { p.SourceLog = []series.SourceReading{{second(0), watt(1)}} }, "source log: last time"},
		{"log that goes back", func(p *series.Problem) {
			p.SourceLog = []series.SourceReading{{second(0), watt(1)}, {second(2), watt(1)}, {second(1), watt(1)}}
		}, "source log: time"},
		{"NaN in the log", func(p *series.Problem) { p.SourceLog = []series.SourceReading{{second(0), watt(nan)}} }, "source log: source"},
	} {
		p := kiln(slab)
		c.change(&p)
		s, err := p.Solve(context.Background())
		var argument *units.ArgumentError
		if s != nil || !errors.As(err, &argument) || argument.Field != c.field {
			t.Errorf("%s: %v, want an ArgumentError for %q", c.name, err, c.field)
		}
	}
	p := kiln(slab)
	p.Surface = boundary.Temperature(units.Celsius.Of(90))
	s := solve(t, p)
	for name, err := range map[string]error{
		"infinite flux":    errorOf(s.Flux(shape.Surface(), second(0))),
		"flux inside":      errorOf(s.Flux(shape.Centre(), second(1))),
		"heat of the mean": errorOf(s.HeatThrough(shape.Mean(), second(1))),
		"negative time":    errorOf(s.At(shape.Centre(), second(-1))),
		"depth":            errorOf(s.At(shape.Below(millimetres(31)), second(1))),
		"slowest at":       errorOf(s.At(shape.Slowest(), second(1))),
		"mean of nothing":  errorOf((&series.Solution{}).Mean(second(1))),
		"target":           errorOf(s.TimeTo(shape.Centre(), units.Kelvin.Of(-1))),
	} {
		if !errors.As(err, new(*units.ArgumentError)) {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
	if _, _, err := s.OneTerm(shape.Centre(), second(1)); !errors.As(err, new(*units.ArgumentError)) {
		t.Errorf("first term of a wall: %v, want an ArgumentError", err)
	}
	var none *series.Solution
	if _, err := none.Flux(shape.Surface(), second(1)); !errors.As(err, new(*units.ArgumentError)) {
		t.Errorf("zero solution: %v", err)
	}
}

func errorOf[T any](_ T, err error) error { return err }

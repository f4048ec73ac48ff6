package series_test

import (
	"context"
	"errors"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

func bracket(t testing.TB, p series.Problem, e series.Envelope) *series.Bracket {
	t.Helper()
	b, err := p.Bracket(context.Background(), e)
	if err != nil {
		t.Fatal(err)
	}
	return b
}

// The exact solution of bricks and of cylinders with their ends lies in their bracket, for any measures, at any Biot
// number and time.
func TestBracketHoldsTheExactSolution(t *testing.T) {
	r := rand.New(rand.NewSource(41))
	length := func() units.Length { return units.Millimetre.Of(math.Pow(10, 1+1.5*r.Float64())) }
	worstShort, worstLong := 1.0, 1.0
	for i := range 700 {
		p := marble()
		p.Body = shape.Brick(length(), length(), length())
		if i%2 == 0 {
			p.Body = shape.Cylinder(length(), length())
		}
		bi := math.Pow(10, 8*r.Float64()-4)
		h := bi * p.Conductivity.SI() / p.Body.ConductionLength().SI()
		p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Celsius.Of(20))
		if i%10 == 0 {
			p.Surface = boundary.Temperature(units.Celsius.Of(20))
		}
		s, b := solve(t, p), bracket(t, p, series.Envelope{})
		target := units.Celsius.Of(20 + 70*math.Pow(10, -3*r.Float64()))
		want, err := s.TimeTo(shape.Slowest(), target)
		if err != nil {
			t.Fatal(err)
		}
		got, err := b.TimeTo(target)
		if err != nil || !(got.Fast.SI() <= want.SI()*(1+1e-9) && want.SI() <= got.Slow.SI()*(1+1e-9) && got.Fast.SI() <= got.Likely.SI() && got.Likely.SI() <= got.Slow.SI()) {
			t.Errorf("%v, Bi %v, at %v: %v, %v, exact %v", p.Body, bi, target, got, err, want)
		}
		ratio := got.Likely.Ratio(want)
		worstShort, worstLong = math.Min(worstShort, ratio), math.Max(worstLong, ratio)
		for _, part := range []float64{0.01, 0.2, 1, 3} {
			d := want.Scale(part)
			exact := kelvins(t, s, shape.Centre(), d.SI())
			T, err := b.At(d)
			if err != nil || !(T.Fast.SI() <= exact+1e-9 && exact <= T.Slow.SI()+1e-9) {
				t.Errorf("%v, Bi %v, after %v: %v, %v, exact %v", p.Body, bi, d, T, err, exact)
			}
		}
	}
	// as the documentation of Bracket.At says
	if !(worstShort > 0.73 && worstLong < 1.1) {
		t.Errorf("likely over exact time: %.3f to %.3f", worstShort, worstLong)
	}
}

// Bodies that have no exact solution: the ends are in order, and the bracket narrows to one of a known body.
func TestBracketOfIrregularBodies(t *testing.T) {
	mm := units.Millimetre.Of
	r := rand.New(rand.NewSource(42))
	stone := shape.Measured(units.CubicCentimetre.Of(200), units.SquareCentimetre.Of(190))
	for _, c := range []struct {
		body     shape.Body
		envelope series.Envelope
	}{
		{shape.Cone(mm(60), mm(90)), series.Envelope{}},
		{shape.Cone(mm(60), mm(10)), series.Envelope{}},
		{shape.Capsule(mm(30), mm(200)), series.Envelope{Inside: []shape.Body{shape.Cylinder(mm(30), mm(170))}}},
		{shape.Capsule(mm(30), mm(30)), series.Envelope{}},
		{shape.Ring(mm(100), mm(60), mm(30)), series.Envelope{}},
		{stone, series.Envelope{Outside: []shape.Body{shape.Sphere(mm(90))}}},
		{stone, series.Envelope{Outside: []shape.Body{shape.Sphere(mm(120)), shape.Plate(mm(70), units.SquareMetre.Of(1))}, Inside: []shape.Body{shape.Sphere(mm(60)), shape.Brick(mm(40), mm(40), mm(60))}}},
		{shape.Measured(units.CubicCentimetre.Of(200), units.SquareCentimetre.Of(400)), series.Envelope{Outside: []shape.Body{shape.Cylinder(mm(40), mm(1)).Exposing(shape.Outside)}}},
	} {
		p := marble()
		p.Body = c.body
		for range 40 {
			p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(math.Pow(10, 6*r.Float64())), units.Celsius.Of(120))
			b := bracket(t, p, c.envelope)
			target := units.Celsius.Of(90 + 29.9*r.Float64())
			d, err := b.TimeTo(target)
			if err != nil || !(0 < d.Fast.SI() && d.Fast.SI() <= d.Likely.SI() && d.Likely.SI() <= d.Slow.SI()) {
				t.Fatalf("%v at %v: %+v, %v", c.body, target, d, err)
			}
			T, err := b.At(d.Likely)
			if err != nil || !(T.Slow.SI() <= T.Likely.SI() && T.Likely.SI() <= T.Fast.SI()) { // heated
				t.Errorf("%v after %v: %+v, %v", c.body, d.Likely, T, err)
			}
			if within := d.Fast.SI()*1.000001 < d.Likely.SI() && d.Likely.SI()*1.000001 < d.Slow.SI(); within && !(math.Abs(T.Likely.Sub(target).SI()) <= 1e-8) {
				t.Errorf("%v at %v: likely at %v then", c.body, target, T.Likely)
			}
		}
	}
	ball := marble()
	ball.Body = shape.Capsule(mm(30), mm(30)) // a sphere
	sphere := marble()
	sphere.Body = shape.Sphere(mm(30))
	d, err := bracket(t, ball, series.Envelope{}).TimeTo(units.Celsius.Of(50))
	want, _ := solve(t, sphere).TimeTo(shape.Centre(), units.Celsius.Of(50))
	for _, got := range []units.Duration{d.Fast, d.Likely, d.Slow} {
		if err != nil || !(math.Abs(got.Ratio(want)-1) <= 1e-9) {
			t.Errorf("a capsule that is a sphere: %+v, %v, want %v", d, err, want)
		}
	}
	long := marble()
	long.Body = shape.Capsule(mm(30), mm(1500))
	rod := marble()
	rod.Body = shape.Cylinder(mm(30), mm(1500)).Exposing(shape.Outside)
	d, err = bracket(t, long, series.Envelope{Inside: []shape.Body{shape.Cylinder(mm(30), mm(1470))}}).TimeTo(units.Celsius.Of(50))
	want, _ = solve(t, rod).TimeTo(shape.Centre(), units.Celsius.Of(50))
	for _, got := range []units.Duration{d.Fast, d.Likely, d.Slow} {
		if err != nil || !(math.Abs(got.Ratio(want)-1) <= 1e-6) {
			t.Errorf("a long capsule: %+v, %v, want %v", d, err, want)
		}
	}
	if e := bracket(t, long, series.Envelope{}).Bodies(); len(e.Inside) != 1 || len(e.Outside) != 2 {
		t.Errorf("bodies %v", e)
	}
}

func TestBracketAnswers(t *testing.T) {
	p := marble()
	p.Body = shape.Cone(units.Millimetre.Of(30), units.Millimetre.Of(30))
	b := bracket(t, p, series.Envelope{})
	var never *units.NeverError
	if _, err := b.TimeTo(units.Celsius.Of(20)); !errors.As(err, &never) {
		t.Errorf("ambient as the target: %v, want a NeverError", err)
	}
	if d, err := b.TimeTo(units.Celsius.Of(90)); err != nil || d != (series.TimeBracket{}) {
		t.Errorf("the start as the target: %v, %v", d, err)
	}
	if T, err := b.At(units.Duration{}); err != nil || T.Fast != p.Initial || T.Slow != p.Initial || T.Likely != p.Initial {
		t.Errorf("at the start: %v, %v", T, err)
	}
}

func TestBracketBadInput(t *testing.T) {
	ctx := context.Background()
	mm := units.Millimetre.Of
	var argument *units.ArgumentError
	stone := shape.Measured(units.CubicCentimetre.Of(200), units.SquareCentimetre.Of(190))
	for name, c := range map[string]struct {
		change   func(p *series.Problem)
		envelope series.Envelope
	}{
		"no body":                    {func(p *series.Problem) { p.Body = shape.Body{} }, series.Envelope{}},
		"sphere":                     {func(p *series.Problem) { p.Body = shape.Sphere(mm(3)) }, series.Envelope{}},
		"cone on an insulated base":  {func(p *series.Problem) { p.Body = p.Body.Exposing(shape.Outside) }, series.Envelope{}},
		"no conductivity":            {func(p *series.Problem) { p.Conductivity = units.Conductivity{} }, series.Envelope{}},
		"no surface":                 {func(p *series.Problem) { p.Surface = boundary.Condition{} }, series.Envelope{}},
		"flux":                       {func(p *series.Problem) { p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(1)) }, series.Envelope{}},
		"nothing around":             {func(p *series.Problem) { p.Body = stone }, series.Envelope{}},
		"plate inside":               {nil, series.Envelope{Inside: []shape.Body{shape.Plate(mm(1), units.SquareMetre.Of(1))}}},
		"cone inside":                {nil, series.Envelope{Inside: []shape.Body{shape.Cone(mm(1), mm(1))}}},
		"too large inside":           {nil, series.Envelope{Inside: []shape.Body{shape.Sphere(mm(80))}}},
		"zero body inside":           {nil, series.Envelope{Inside: []shape.Body{{}}}},
		"brick outside":              {nil, series.Envelope{Outside: []shape.Body{shape.Brick(mm(100), mm(100), mm(100))}}},
		"plate with one face around": {nil, series.Envelope{Outside: []shape.Body{shape.Plate(mm(100), units.SquareMetre.Of(1)).Exposing(shape.Front)}}},
		"too small outside":          {nil, series.Envelope{Outside: []shape.Body{shape.Sphere(mm(8))}}},
		"zero body outside":          {nil, series.Envelope{Outside: []shape.Body{{}}}},
	} {
		p := marble()
		p.Body = shape.Cone(mm(30), mm(30))
		if c.change != nil {
			c.change(&p)
		}
		if _, err := p.Bracket(ctx, c.envelope); !errors.As(err, &argument) {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
	p := marble()
	p.Body = shape.Cone(mm(30), mm(30))
	done, cancel := context.WithCancel(ctx)
	cancel()
	if _, err := p.Bracket(done, series.Envelope{}); !errors.Is(err, context.Canceled) {
		t.Errorf("after the end of the context: %v", err)
	}
	b := bracket(t, p, series.Envelope{})
	for name, err := range map[string]error{
		"negative time": second(b.At(units.Second.Of(-1))),
		"NaN target":    second(b.TimeTo(units.Celsius.Of(math.NaN()))),
		"zero bracket":  second((&series.Bracket{}).At(units.Second.Of(1))),
		"nil":           second((*series.Bracket)(nil).TimeTo(units.Celsius.Of(40))),
	} {
		if !errors.As(err, &argument) {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
}

// second drops the first of two results.
func second[T any](_ T, err error) error { return err }

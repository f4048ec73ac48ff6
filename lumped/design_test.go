package lumped

import (
	"context"
	"errors"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// blank is what the tests of design vary: τ = ρ c d/(6 h), which is 1000 s for 60 mm and 10 W/(m² K).
func blank(d units.Length, h float64, ambient units.Temperature) Problem {
	return Problem{
		Body: shape.Sphere(d), Material: constantStuff(1000, 1000, 15), Initial: kelvin(400),
		Surface: boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), ambient),
	}
}

// The size, the coefficient and the ambient with which 350 K is just met after 1000 s, from 400 K: by hand.
func TestJustMeeting(t *testing.T) {
	ctx := context.Background()
	target, after := kelvin(350), seconds(1000)
	d, err := JustMeeting(ctx, units.Millimetre.Of(5), units.Millimetre.Of(500), shape.Slowest(), target, after, func(d units.Length) Problem {
		return blank(d, 10, kelvin(300))
	})
	if err != nil {
		t.Fatal(err)
	}
	within(t, "size", d.SI(), 1000*6*10/1e6/math.Ln2, 1e-12) // τ ln 2 = 1000 s
	h, err := JustMeeting(ctx, units.WattPerSquareMetreKelvin.Of(0.1), units.WattPerSquareMetreKelvin.Of(100), shape.Centre(), target, after, func(h units.HeatTransferCoefficient) Problem {
		return blank(units.Millimetre.Of(60), h.SI(), kelvin(300))
	})
	if err != nil {
		t.Fatal(err)
	}
	within(t, "coefficient", h.SI(), 10*math.Ln2, 1e-11)
	ambient, err := JustMeeting(ctx, units.Celsius.Of(-50), units.Celsius.Of(76), shape.Centre(), target, after, func(at units.Temperature) Problem {
		return blank(units.Millimetre.Of(60), 10, at)
	})
	if err != nil {
		t.Fatal(err)
	}
	within(t, "ambient", ambient.SI(), 400-50/(1-1/math.E), 1e-10)
	// With an exchange function of its own for each size.
	d, err = JustMeeting(ctx, units.Millimetre.Of(20), units.Millimetre.Of(200), shape.Mean(), kelvin(330), after, func(d units.Length) Problem {
		p := ball()
		p.Body = shape.Sphere(d)
		return p
	})
	if err != nil {
		t.Fatal(err)
	}
	p := ball()
	p.Body = shape.Sphere(d)
	got, err := solve(t, p).TimeTo(shape.Mean(), kelvin(330))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "time of the size that just meets", got.SI(), 1000, 0.05)

	boom := errors.New("no such size")
	failing := func(units.Length) Problem {
		p := ball()
		p.Surface = boundary.Function(func(units.Duration, units.Temperature) (units.HeatFlux, error) { return units.HeatFlux{}, boom })
		return p
	}
	if _, err := JustMeeting(ctx, units.Millimetre.Of(20), units.Millimetre.Of(200), shape.Mean(), target, after, failing); !errors.Is(err, boom) {
		t.Errorf("%v, want the error of the exchange", err)
	}
	var argument *units.ArgumentError
	for name, err := range map[string]error{
		"both too small": errorOf(JustMeeting(ctx, units.Millimetre.Of(1), units.Millimetre.Of(2), shape.Mean(), target, after, func(d units.Length) Problem { return blank(d, 10, kelvin(300)) })),
		"no problem":     errorOf(JustMeeting[units.Length](ctx, units.Millimetre.Of(1), units.Millimetre.Of(2), shape.Mean(), target, after, nil)),
		"no target":      errorOf(JustMeeting(ctx, units.Millimetre.Of(1), units.Millimetre.Of(2), shape.Mean(), kelvin(0), after, func(d units.Length) Problem { return blank(d, 10, kelvin(300)) })),
		"no time":        errorOf(JustMeeting(ctx, units.Millimetre.Of(1), units.Millimetre.Of(2), shape.Mean(), target, seconds(0), func(d units.Length) Problem { return blank(d, 10, kelvin(300)) })),
		"no size":        errorOf(JustMeeting(ctx, units.Millimetre.Of(0), units.Millimetre.Of(2), shape.Mean(), target, after, func(d units.Length) Problem { return blank(d, 10, kelvin(300)) })),
	} {
		if !errors.As(err, &argument) {
			t.Errorf("%s: %v", name, err)
		}
	}
}

func errorOf[A, B any](_ A, b B) B { return b }

// The band of a time that goes with 1/h: h ∓25 % moves it by +33 % and −20 %. Radiation does not scatter with h.
func TestTimeBand(t *testing.T) {
	p := blank(units.Millimetre.Of(60), 10, kelvin(300))
	b, err := p.TimeBand(context.Background(), shape.Centre(), kelvin(350), 0.25)
	if err != nil {
		t.Fatal(err)
	}
	within(t, "likely", b.Likely.SI(), 1000*math.Ln2, 1e-9)
	within(t, "shortest", b.Shortest.SI(), 1000*math.Ln2/1.25, 1e-9)
	within(t, "longest", b.Longest.SI(), 1000*math.Ln2/0.75, 1e-9)
	p = ball()
	b, err = p.TimeBand(context.Background(), shape.Centre(), units.Celsius.Of(50), 0.2)
	if err != nil {
		t.Fatal(err)
	}
	within(t, "function, shortest", b.Shortest.SI(), b.Likely.SI()/1.2, 0.05)
	within(t, "function, longest", b.Longest.SI(), b.Likely.SI()/0.8, 0.05)
	p.Surface = boundary.Radiation(0.9, kelvin(298.15))
	b, err = p.TimeBand(context.Background(), shape.Centre(), units.Celsius.Of(50), 0.2)
	if err != nil || b.Shortest != b.Longest {
		t.Errorf("radiation alone: %v, %v", b, err)
	}
	// Heat from inside: the stronger the exchange, the later.
	p = blank(units.Millimetre.Of(60), 10, kelvin(400))
	p.Source = units.WattPerCubicMetre.Of(1e5)
	b, err = p.TimeBand(context.Background(), shape.Centre(), kelvin(450), 0.2)
	if err != nil || b.Shortest.Compare(b.Likely) >= 0 || b.Longest.Compare(b.Likely) <= 0 {
		t.Errorf("heat inside: %v, %v", b, err)
	}
	var never *units.NeverError
	if _, err = p.TimeBand(context.Background(), shape.Centre(), kelvin(490), 0.2); !errors.As(err, &never) {
		t.Errorf("one end of the scatter never gets there: %v", err)
	}
	for _, scatter := range []float64{-0.1, 1, math.NaN()} {
		var argument *units.ArgumentError
		if _, err := p.TimeBand(context.Background(), shape.Centre(), kelvin(410), scatter); !errors.As(err, &argument) {
			t.Errorf("scatter %g: %v", scatter, err)
		}
	}
}

// The latest start: before the deadline by the time it takes; and where a cold room closes at a time, early enough before it.
func TestLatestStart(t *testing.T) {
	ctx := context.Background()
	p := blank(units.Millimetre.Of(60), 10, kelvin(300))
	got, err := p.LatestStart(ctx, shape.Centre(), kelvin(350), seconds(5000))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "steady", got.SI(), 5000-1000*math.Ln2, 1e-9)
	room := boundary.Log( // cold until 3000 s, then as warm as the target
		[]units.Duration{seconds(0), seconds(3000), seconds(3000), seconds(9000)},
		[]units.Temperature{kelvin(300), kelvin(300), kelvin(350), kelvin(350)},
	)
	p.Surface = boundary.Following(units.WattPerSquareMetreKelvin.Of(10), room)
	got, err = p.LatestStart(ctx, shape.Centre(), kelvin(350), seconds(5000))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "a room that closes", got.SI(), 3000-1000*math.Ln2, 1e-5)
	p.Surface = boundary.Sum(p.Surface, boundary.Function(func(units.Duration, units.Temperature) (units.HeatFlux, error) { return units.HeatFlux{}, nil }))
	p.Tolerance = units.KelvinDifference.Of(1e-5)
	got, err = p.LatestStart(ctx, shape.Centre(), kelvin(350), seconds(5000))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "integrated", got.SI(), 3000-1000*math.Ln2, 1e-2)

	p = blank(units.Millimetre.Of(60), 10, kelvin(300))
	var horizon *units.HorizonError
	if _, err := p.LatestStart(ctx, shape.Slowest(), kelvin(350), seconds(500)); !errors.As(err, &horizon) || horizon.Horizon != seconds(500) || horizon.Limit != kelvin(300) {
		t.Errorf("too short: %v", err)
	}
	p.Surface = boundary.Following(units.WattPerSquareMetreKelvin.Of(10), room)
	if _, err := p.LatestStart(ctx, shape.Centre(), kelvin(350), seconds(500)); !errors.As(err, &horizon) || horizon.Horizon != seconds(500) {
		t.Errorf("too short, with a room that closes: %v", err)
	}
	var never *units.NeverError
	if _, err := p.LatestStart(ctx, shape.Centre(), kelvin(290), seconds(5000)); !errors.As(err, &never) {
		t.Errorf("colder than the room: %v", err)
	}
	var argument *units.ArgumentError
	if _, err := p.LatestStart(ctx, shape.Centre(), kelvin(290), seconds(-1)); !errors.As(err, &argument) {
		t.Errorf("negative deadline: %v", err)
	}
}

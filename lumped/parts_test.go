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

// can is a bottle of 0.5 L of water in glass; the figures are chosen.
func can() Problem {
	return Problem{
		Body: shape.Cylinder(units.Millimetre.Of(66), units.Millimetre.Of(180)),
		Parts: []Part{
			{Name: "water", Material: constantStuff(998, 4180, 0.6), Volume: units.Litre.Of(0.5)},
			{Name: "glass", Material: constantStuff(2500, 840, 1), Mass: units.Kilogram.Of(0.25)},
		},
		Initial: units.Celsius.Of(25), Surface: constant(8, 278.15),
	}
}

// Several materials at one temperature: τ = Σ m c/(h A), and the energy is that of all.
func TestParts(t *testing.T) {
	p := can()
	s := solve(t, p)
	capacity := 0.5*0.998*4180 + 0.25*840
	tau, err := s.TimeConstant(seconds(0))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "τ", tau.SI(), capacity/(8*p.Body.Area().SI()), 1e-9)
	got, err := s.TimeTo(shape.Mean(), units.Celsius.Of(8))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "time", got.SI(), capacity/(8*p.Body.Area().SI())*math.Log(20.0/3), 1e-8)
	heat, err := s.HeatReleased(got)
	if err != nil {
		t.Fatal(err)
	}
	within(t, "heat", heat.SI(), capacity*17, 1e-8)
	if k := s.Biot().Conductivity.SI(); k != 0.6 {
		t.Errorf("conductivity %g, want the least of the parts", k)
	}
	r := s.Derivation()
	for _, symbol := range []string{"m1", "c2", "C"} {
		if _, ok := r.Value(symbol); !ok {
			t.Errorf("no %s in the derivation\n%v", symbol, r)
		}
	}
	// One part by its mass alone is the body with that mass.
	p.Parts = p.Parts[1:]
	q := p
	q.Parts, q.Material, q.Mass = nil, p.Parts[0].Material, p.Parts[0].Mass
	a, _ := solve(t, p).Mean(seconds(500))
	b, _ := solve(t, q).Mean(seconds(500))
	if a != b {
		t.Errorf("%v as a part, %v as a mass", a, b)
	}
}

// Parts of which one melts: heated by a constant power, the enthalpy of all rises in proportion to time, and stands in the
// melting range as long as the heat of melting takes.
func TestPartsThatMelt(t *testing.T) {
	wax := latent{constantStuff(900, 2000, 0.2), 330, 2, 2e5}
	shell := stuff{rho: 2700, c0: 700, c1: 0.5, k0: 200, low: 200, high: 900}
	p := Problem{
		Body:    shape.Sphere(units.Millimetre.Of(60)),
		Parts:   []Part{{Material: wax, Mass: units.Kilogram.Of(0.1)}, {Material: shell, Mass: units.Kilogram.Of(0.05)}},
		Initial: kelvin(300), Horizon: seconds(4000), Tolerance: units.KelvinDifference.Of(1e-6),
		Surface: boundary.Flux(units.WattPerSquareMetre.Of(-10 / (math.Pi * 0.06 * 0.06))), // 10 W
	}
	s := solve(t, p)
	enthalpy := func(kelvin float64) float64 {
		part := math.Max(0, math.Min(1, (kelvin-330)/2))
		return 0.1*(2000*(kelvin-300)+2e5*part) + 0.05*(700*(kelvin-300)+0.25*(kelvin*kelvin-300*300))
	}
	for _, target := range []float64{310, 330, 331, 332, 350} {
		got, err := s.TimeTo(shape.Mean(), kelvin(target))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "time to "+kelvin(target).String(), got.SI(), enthalpy(target)/10, 1e-8*enthalpy(target))
	}
	for _, at := range []float64{100, 900, 1500, 3000} {
		T, err := s.Mean(seconds(at))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "enthalpy at the temperature", enthalpy(T.SI()), 10*at, 1e-6)
	}
	rate, err := s.Rate(seconds(900)) // while it melts: 10 W over 0.1 kg · 1e5 J/(kg K) and what is sensible
	if err != nil {
		t.Fatal(err)
	}
	before, err := s.Rate(seconds(enthalpy(329.9) / 10)) // short of melting by 0.1 K
	if err != nil {
		t.Fatal(err)
	}
	within(t, "rate before it melts", before.SI(), 10/(0.1*2000+0.05*(700+0.5*329.9)), 1e-9)
	at, _ := s.Mean(seconds(900))
	within(t, "rate while melting", rate.SI(), 10/(0.1*(2000+1e5)+0.05*(700+0.5*at.SI())), 1e-9)
	stays, err := s.Within(shape.Mean(), kelvin(330), kelvin(332))
	if err != nil || len(stays) != 1 {
		t.Fatal(stays, err)
	}
	within(t, "time in the melting range", stays[0].To.Sub(stays[0].From).SI(), (enthalpy(332)-enthalpy(330))/10, 1e-4)
}

// A cell with a constant power inside: rise P/(h A), and the time to a limit by the exponential (first law, by hand).
func TestHeatInside(t *testing.T) {
	body := shape.Cylinder(units.Millimetre.Of(18), units.Millimetre.Of(65))
	h, watts := 12.0, 0.6
	p := Problem{
		Body: body, Material: constantStuff(2700, 1000, 1), Initial: units.Celsius.Of(25), Surface: constant(h, 298.15),
		Source: units.HeatSourceOf(units.Watt.Of(watts), body.Volume()),
	}
	s := solve(t, p)
	rise := watts / (h * body.Area().SI())
	within(t, "limit", s.limit, 298.15+rise, 1e-9)
	tau := 2700 * 1000 * body.Volume().SI() / (h * body.Area().SI())
	got, err := s.TimeTo(shape.Mean(), kelvin(298.15+0.9*rise))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "time to nine tenths", got.SI(), tau*math.Log(10), 1e-8)
	heat, _ := s.HeatReleased(got)
	within(t, "heat released", heat.SI(), watts*got.SI()-0.9*watts*tau, 1e-8)
	if r := s.Derivation(); !closeTo(r, "P", watts) || !closeTo(r, "T_limit", s.limit) {
		t.Errorf("the source is not in the derivation:\n%v", r)
	}
	p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(watts / body.Area().SI())) // as much leaves as is made
	if at, err := solve(t, p).Mean(units.Hour.Of(5)); err != nil || math.Abs(at.SI()-298.15) > 1e-6 {
		t.Errorf("in balance: %v, %v", at, err)
	}
}

func TestPartsThatCannotBe(t *testing.T) {
	for name, change := range map[string]func(p *Problem){
		"material besides parts": func(p *Problem) { p.Material = constantStuff(1, 1, 1) },
		"mass besides parts":     func(p *Problem) { p.Mass = units.Kilogram.Of(1) },
		"mass and volume":        func(p *Problem) { p.Parts[0].Mass = units.Kilogram.Of(1) },
		"neither":                func(p *Problem) { p.Parts[0].Volume = units.Litre.Of(0) },
		"negative volume":        func(p *Problem) { p.Parts[0].Volume = units.Litre.Of(-1) },
		"negative mass":          func(p *Problem) { p.Parts[1].Mass = units.Kilogram.Of(-1) },
		"no material":            func(p *Problem) { p.Parts[1].Material = nil },
		"no density":             func(p *Problem) { p.Parts[1].Material = constantStuff(0, 1, 1) },
		"negative body mass":     func(p *Problem) { p.Parts, p.Material, p.Mass = nil, constantStuff(1, 1, 1), units.Kilogram.Of(-1) },
		"infinite source":        func(p *Problem) { p.Source = units.WattPerCubicMetre.Of(math.Inf(1)) },
		"opposite face of a can": func(p *Problem) { p.Opposite = constant(1, 300) },
		"opposite face without a flux": func(p *Problem) {
			p.Body, p.Opposite = shape.Plate(units.Metre.Of(0.1), units.SquareMetre.Of(1)), boundary.Temperature(kelvin(300))
		},
	} {
		p := can()
		change(&p)
		s, err := p.Solve(context.Background())
		var argument *units.ArgumentError
		if s != nil || !errors.As(err, &argument) {
			t.Errorf("%s: %v, want an argument error", name, err)
		}
	}
	for i := range 2 {
		p := can()
		p.Parts[i].Material = stuff{rho: 2500, c0: 840, k0: 1, low: 290, high: 400}
		p.Horizon = units.Hour.Of(24)
		var outside *units.RangeError
		if s, err := p.Solve(context.Background()); !errors.As(err, &outside) || s == nil || math.Abs(s.last-290) > 0.1 {
			t.Errorf("below the range of one part: %v", err)
		}
	}
}

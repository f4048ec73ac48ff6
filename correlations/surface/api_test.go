package surface_test

import (
	"errors"
	"math"
	"strings"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

var (
	_ surface.Part      = surface.Convection{}
	_ surface.Part      = surface.Radiation{}
	_ boundary.Exchange = surface.Convection{}.Flux
	_ boundary.Exchange = surface.Radiation{}.Flux
	_ boundary.Exchange = surface.Sum{}.Flux
)

// Bad input gives an argument error that names the field, from Check and from every evaluation.
func TestBadInput(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(1)
	good := surface.Convection{Body: ball(50), Fluid: props.Air(), Ambient: celsius(25)}
	change := func(f func(*surface.Convection)) surface.Convection {
		c := good
		f(&c)
		return c
	}
	parts := []struct {
		field string
		part  surface.Part
	}{
		{"body", surface.Convection{}},
		{"body", change(func(c *surface.Convection) { c.Body = shape.Body{} })},
		{"diameter", change(func(c *surface.Convection) { c.Body = ball(0) })},
		{"diameter", change(func(c *surface.Convection) { c.Body = ball(-1) })},
		{"diameter", change(func(c *surface.Convection) { c.Body = ball(nan) })},
		{"diameter", change(func(c *surface.Convection) { c.Body = ball(inf) })},
		{"fluid", change(func(c *surface.Convection) { c.Fluid = nil })},
		{"ambient", change(func(c *surface.Convection) { c.Ambient = units.Temperature{} })},
		{"ambient", change(func(c *surface.Convection) { c.Ambient = kelvin(nan) })},
		{"ambient", change(func(c *surface.Convection) { c.Ambient = kelvin(-3) })},
		{"speed", change(func(c *surface.Convection) { c.Speed = speed(-1) })},
		{"speed", change(func(c *surface.Convection) { c.Speed = speed(nan) })},
		{"speed", change(func(c *surface.Convection) { c.Speed = speed(inf) })},
		{"pressure", change(func(c *surface.Convection) { c.Pressure = units.Pascal.Of(-1) })},
		{"pressure", change(func(c *surface.Convection) { c.Pressure = units.Pascal.Of(nan) })},
		{"gravity", change(func(c *surface.Convection) { c.Gravity = units.MetrePerSecondSquared.Of(-9.8) })},
		{"gravity", change(func(c *surface.Convection) { c.Gravity = units.MetrePerSecondSquared.Of(inf) })},
		{"emissivity", surface.Radiation{}},
		{"emissivity", surface.Radiation{Emissivity: 0, Surroundings: celsius(20)}},
		{"emissivity", surface.Radiation{Emissivity: -0.1, Surroundings: celsius(20)}},
		{"emissivity", surface.Radiation{Emissivity: 1.01, Surroundings: celsius(20)}},
		{"emissivity", surface.Radiation{Emissivity: nan, Surroundings: celsius(20)}},
		{"lower emissivity", surface.Radiation{Emissivity: 0.9, EmissivityLow: 0.92, EmissivityHigh: 0.95, Surroundings: celsius(20)}},
		{"lower emissivity", surface.Radiation{Emissivity: 0.9, EmissivityHigh: 0.95, Surroundings: celsius(20)}},
		{"lower emissivity", surface.Radiation{Emissivity: 0.9, EmissivityLow: nan, EmissivityHigh: 0.95, Surroundings: celsius(20)}},
		{"upper emissivity", surface.Radiation{Emissivity: 0.9, EmissivityLow: 0.8, EmissivityHigh: 0.85, Surroundings: celsius(20)}},
		{"upper emissivity", surface.Radiation{Emissivity: 0.9, EmissivityLow: 0.8, EmissivityHigh: 1.2, Surroundings: celsius(20)}},
		{"surroundings", surface.Radiation{Emissivity: 0.9}},
		{"surroundings", surface.Radiation{Emissivity: 0.9, Surroundings: kelvin(inf)}},
	}
	for _, tt := range parts {
		sum := surface.Sum{tt.part}
		_, errParts := sum.Parts(units.Duration{}, celsius(50))
		for what, err := range map[string]error{
			"Check":     tt.part.Check(),
			"Flux":      flux(tt.part.Flux),
			"Low":       flux(tt.part.Low().Flux),
			"High":      flux(tt.part.High().Flux),
			"Sum.Check": sum.Check(),
			"Sum.Flux":  flux(sum.Flux),
			"Sum.Parts": errParts,
			"Sum.Low":   flux(sum.Low().Flux),
		} {
			var bad *units.ArgumentError
			if !errors.As(err, &bad) || !strings.Contains(bad.Field, tt.field) || bad.Accepted == "" {
				t.Errorf("%s of %+v: %v, want an argument error for %q", what, tt.part, err, tt.field)
			}
		}
		// Texts never fail.
		tt.part.Sources()
		tt.part.Notes()
		tt.part.Warnings()
	}
}

func flux(f boundary.Exchange) error {
	_, err := f(units.Duration{}, celsius(50))
	return err
}

func TestBadWall(t *testing.T) {
	for _, wall := range []units.Temperature{{}, kelvin(-1), kelvin(math.NaN()), kelvin(math.Inf(1))} {
		for _, p := range []surface.Part{
			surface.Convection{Body: ball(50), Fluid: props.Air(), Ambient: celsius(25)},
			surface.Radiation{Emissivity: 0.9, Surroundings: celsius(25)},
		} {
			var bad *units.ArgumentError
			if q, err := p.Flux(units.Duration{}, wall); !errors.As(err, &bad) || !strings.Contains(bad.Field, "wall") || q.SI() != 0 {
				t.Errorf("%s at %v: %v, %v", p.Name(), wall, q, err)
			}
		}
	}
	if _, err := (surface.Radiation{Emissivity: 1, Surroundings: kelvin(1)}).Flux(units.Duration{}, kelvin(1e200)); err == nil {
		t.Error("a flux that overflows passes")
	}
	if h, err := (surface.Radiation{Emissivity: 1, Surroundings: kelvin(1)}).Coefficient(kelvin(1e200)); err == nil {
		t.Errorf("a coefficient that overflows passes as %v", h)
	}
}

// A fluid of the user that gives what cannot be is refused, not calculated with.
func TestBadFluid(t *testing.T) {
	for name, f := range map[string]constant{
		"no density":        {c: 1000, k: 0.03, mu: 2e-5, beta: 1e-3},
		"no conductivity":   {rho: 1, c: 1000, mu: 2e-5, beta: 1e-3},
		"viscosity NaN":     {rho: 1, c: 1000, k: 0.03, mu: math.NaN(), beta: 1e-3},
		"expansion ∞":       {rho: 1, c: 1000, k: 0.03, mu: 2e-5, beta: math.Inf(1)},
		"negative heat":     {rho: 1, c: -1000, k: 0.03, mu: 2e-5, beta: 1e-3},
		"all negative":      {rho: -1, c: -1000, k: 0.03, mu: -2e-5, beta: 1e-3},
		"huge conductivity": {rho: 1, c: 1000, k: math.Inf(1), mu: 2e-5, beta: 1e-3},
	} {
		c := surface.Convection{Body: ball(50), Fluid: f, Ambient: celsius(25), Speed: speed(1)}
		var bad *units.ArgumentError
		if _, err := c.Film(celsius(50)); !errors.As(err, &bad) || !strings.Contains(bad.Field, "constant fluid") {
			t.Errorf("%s: %v", name, err)
		}
	}
}

func TestEmptySum(t *testing.T) {
	var bad *units.ArgumentError
	for _, s := range []surface.Sum{nil, {}, {nil}, {stream{1, celsius(20)}, nil}, surface.Sum{nil}.Low()} {
		_, err := s.Parts(units.Duration{}, celsius(20))
		if !errors.As(s.Check(), &bad) || !errors.As(flux(s.Flux), &bad) || !errors.As(err, &bad) {
			t.Errorf("%v: %v, %v", s, s.Check(), err)
		}
		s.Sources()
	}
	huge := surface.Sum{stream{1e308, kelvin(1)}, stream{1e308, kelvin(1)}}
	if _, err := huge.Parts(units.Duration{}, celsius(20)); !errors.As(err, &bad) {
		t.Errorf("fluxes that overflow: %v", err)
	}
}

// The texts for a derivation name what was used and the end of the band that is taken.
func TestTexts(t *testing.T) {
	c := surface.Convection{Body: ball(50), Fluid: props.Air(), Ambient: celsius(25)}
	r := surface.Radiation{Emissivity: 0.9, Surroundings: celsius(25)}
	moving := c
	moving.Speed = speed(1)
	insisted := moving
	insisted.Insist = correlations.WhitakerSphere()
	stretched := c
	stretched.Extrapolate = true
	for _, tt := range []struct {
		name  string
		texts []string
		want  []string
	}{
		{"still sources", c.Sources(), []string{"air: ", "Churchill sphere"}},
		{"moving sources", moving.Sources(), []string{"air: ", "Whitaker sphere", "Clift, Grace and Weber sphere", "Churchill sphere", "mixed convection: "}},
		{"insisted sources", insisted.Sources(), []string{"air: ", "Whitaker sphere"}},
		{"radiation sources", r.Sources(), []string{"CODATA"}},
		{"sum sources", surface.Sum{c, r, c}.Sources(), []string{"air: ", "Churchill sphere", "CODATA"}},
		{"still notes", c.Notes(), []string{"smooth body"}},
		{"low notes", c.Low().Notes(), []string{"smooth body", "lower limit"}},
		{"high notes", c.High().Notes(), []string{"smooth body", "upper limit"}},
		{"insisted notes", insisted.Notes(), []string{"smooth body", "alone"}},
		{"sum notes", surface.Sum{c, r}.Notes(), []string{"smooth body", "grey"}},
		{"still warnings", c.Warnings(), []string{"cool enough"}},
		{"moving warnings", moving.Warnings(), []string{"cool enough", "against the buoyant flow"}},
		{"insisted warnings", insisted.Warnings(), []string{"cool enough"}},
		{"stretched warnings", surface.Sum{stretched, r}.Warnings(), []string{"cool enough", "outside the published ranges"}},
	} {
		if len(tt.texts) != len(tt.want) {
			t.Errorf("%s: %q, want %d of them", tt.name, tt.texts, len(tt.want))
			continue
		}
		for i, part := range tt.want {
			if !strings.Contains(tt.texts[i], part) {
				t.Errorf("%s: %q does not contain %q", tt.name, tt.texts[i], part)
			}
		}
	}
}

func benchmarked() map[string]surface.Convection {
	still := surface.Convection{Body: ball(50), Fluid: props.Air(), Ambient: celsius(25)}
	moving, liquid, band := still, still, still
	moving.Speed = speed(1)
	band.Body, band.Speed = ball(1), speed(0.08)
	liquid.Fluid, liquid.Speed = props.Water(), speed(0.2)
	return map[string]surface.Convection{"still air": still, "moving air": moving, "hand-over in air": band, "moving water": liquid}
}

func TestFilmDoesNotAllocate(t *testing.T) {
	for name, c := range benchmarked() {
		for what, f := range map[string]func(){
			"Film": func() { _, _ = c.Film(celsius(60)) },
			"Flux": func() { _, _ = c.Flux(units.Duration{}, celsius(60)) },
		} {
			if n := testing.AllocsPerRun(100, f); n != 0 {
				t.Errorf("%s in %s allocates %v times", what, name, n)
			}
		}
	}
	sum := surface.Sum{benchmarked()["moving air"], surface.Radiation{Emissivity: 0.9, Surroundings: celsius(25)}}
	if n := testing.AllocsPerRun(100, func() { _, _ = sum.Flux(units.Duration{}, celsius(60)) }); n != 0 {
		t.Errorf("Flux of a sum allocates %v times", n)
	}
}

func FuzzFlux(f *testing.F) {
	f.Add(0.05, 298.15, 1.0, 333.15, 101325.0, 9.80665, 0.9, false, false)
	f.Add(1e-4, 274.0, 0.0, 280.0, 0.0, 0.0, 1.0, true, true)
	f.Add(1e300, 1e-300, 1e300, 1e300, 1e300, 1e300, 0.5, true, false)
	f.Add(math.NaN(), math.Inf(1), -1.0, -300.0, -1.0, math.Inf(-1), math.NaN(), false, true)
	f.Fuzz(func(t *testing.T, d, ambient, v, wall, p, g, emissivity float64, extrapolate, liquid bool) {
		c := surface.Convection{
			Body: shape.Sphere(units.Metre.Of(d)), Fluid: props.Air(), Ambient: kelvin(ambient), Speed: speed(v),
			Pressure: units.Pascal.Of(p), Gravity: units.MetrePerSecondSquared.Of(g), Extrapolate: extrapolate,
		}
		steady := c
		steady.Fluid = fromGroups(0.026, 1.57e-5, 0.707, 1/300.0)
		if liquid {
			c.Fluid = props.Water()
		}
		r := surface.Radiation{Emissivity: emissivity, Surroundings: kelvin(ambient)}
		for _, part := range []surface.Part{c, steady, r, c.Low(), c.High(), r.Low()} {
			q, err := part.Flux(units.Duration{}, kelvin(wall))
			var bad *units.ArgumentError
			var out *units.RangeError
			switch {
			case err == nil && !(q.IsFinite() && q.SI()*(wall-ambient) >= 0):
				t.Errorf("%s %+v at %v K: %v without an error", part.Name(), part, wall, q)
			case err != nil && !errors.As(err, &bad) && !errors.As(err, &out):
				t.Errorf("%s %+v at %v K: error of type %T: %v", part.Name(), part, wall, err, err)
			}
		}
	})
}

func BenchmarkFilm(b *testing.B) {
	for name, c := range benchmarked() {
		b.Run(name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				_, _ = c.Film(celsius(60))
			}
		})
	}
}

// BenchmarkFluid is what the properties take of it: once in still air, twice in moving air, three
// times in water.
func BenchmarkFluid(b *testing.B) {
	for _, fluid := range fluids {
		b.Run(fluid.Name(), func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				_, _ = fluid.At(celsius(42), units.Pascal.Of(101325))
			}
		})
	}
}

func BenchmarkSum(b *testing.B) {
	sum := surface.Sum{benchmarked()["still air"], surface.Radiation{Emissivity: 0.9, Surroundings: celsius(25)}}
	b.ReportAllocs()
	for b.Loop() {
		_, _ = sum.Flux(units.Duration{}, celsius(60))
	}
}

package surface_test

import (
	"errors"
	"fmt"
	"math"
	"strings"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
)

// The forms that a stream can run up or down along.
var opposable = []string{"ball", "level rod", "upright plate", "inclined plate", "brick"}

// A stream against the buoyant flow is S. W. Churchill, AIChE J. 23 (1977) 10-16, with the minus sign and the exponent 3 (from memory), on
// what exceeds rest: here with one conductivity, and with what each correlation gives alone.
func TestOpposedBlend(t *testing.T) {
	steady := fromGroups(0.026, 1.57e-5, 0.707, 1/300.0)
	for _, v := range []float64{0.05, 0.1, 0.2, 0.4, 1} {
		c := surface.Convection{Body: ball(50), Fluid: steady, Ambient: kelvin(300), Speed: speed(v)}
		c.Insist = correlations.WhitakerSphere()
		forced := film(t, c, kelvin(340)).Nu - 2
		c.Insist = correlations.ChurchillSphere()
		natural := film(t, c, kelvin(340)).Nu - 2
		c.Insist = correlations.Correlation{}
		c.Stream = surface.Downward
		f := film(t, c, kelvin(340))
		alike := forced > natural/2 && forced < 2*natural
		if !f.Opposed || f.Alike != alike {
			t.Errorf("%g m/s, forced %g, natural %g: opposed %v, alike %v", v, forced, natural, f.Opposed, f.Alike)
		}
		published, err := correlations.Blend{Exponent: correlations.MixExponent, Rest: 2, Opposed: true}.Mix(
			correlations.Result{Nu: 2 + forced}, correlations.Result{Nu: 2 + natural})
		if err != nil {
			t.Fatal(err)
		}
		fp, np := math.Pow(forced, 3), math.Pow(natural, 3)
		want := 2 + math.Pow((fp-np)*(fp-np)+fp*np/16, 1.0/6)
		near(t, fmt.Sprintf("Nu at %g m/s", v), f.Nu, want, 1e-9*want, "definition")
		if !alike {
			near(t, fmt.Sprintf("Nu at %g m/s", v), f.Nu, published.Nu, 0.002*want, "published")
		} else if f.Nu < published.Nu || f.Nu*(1+f.Scatter) < 2+max(forced, natural) {
			t.Errorf("%g m/s: Nu %g ± %g, published %g, alone %g and %g", v, f.Nu, f.Scatter, published.Nu, forced, natural)
		}
		near(t, "scatter", f.Scatter, (0.30*fp+0.15*np)/(fp+np)+(2+max(forced, natural)-f.Nu)/f.Nu, 1e-9, "of the two, and up to the larger")
	}
	// Exactly where both are equal 63 % of one is left.
	c := surface.Convection{Body: ball(50), Fluid: steady, Ambient: kelvin(300), Stream: surface.Downward}
	c.Speed = speed(0.1)
	low, high := 1e-3, 100.0
	for range 60 {
		c.Gravity = units.MetrePerSecondSquared.Of(math.Sqrt(low * high))
		if f := film(t, c, kelvin(340)); f.ForcedShare < f.NaturalShare {
			high = math.Sqrt(low * high)
		} else {
			low = math.Sqrt(low * high)
		}
	}
	c.Stream = surface.Upward
	together := film(t, c, kelvin(340)).Nu - 2
	c.Stream = surface.Downward
	near(t, "equal", (film(t, c, kelvin(340)).Nu-2)/(together/math.Cbrt(2)), math.Pow(0.25, 1.0/3), 1e-6, "definition")
}

// Down past a hot wall is up past a cold one, and what is not against the buoyant flow is as if nothing were said.
func TestOpposedWays(t *testing.T) {
	for _, name := range opposable {
		c := forms()[name]
		c.Fluid, c.Ambient, c.Speed = fromGroups(0.026, 1.57e-5, 0.707, 1/300.0), kelvin(300), speed(0.1)
		h := func(s surface.Stream, wall float64) surface.Film {
			c.Stream = s
			return film(t, c, kelvin(wall))
		}
		tol := 1e-12 * h(surface.AnyStream, 340).Coefficient.SI()
		near(t, name+": up past cold", h(surface.Upward, 260).Coefficient.SI(), h(surface.Downward, 340).Coefficient.SI(), tol, "symmetry")
		if h(surface.Upward, 340) != h(surface.AnyStream, 340) || h(surface.Downward, 260) != h(surface.AnyStream, 260) || h(surface.Upward, 340).Opposed {
			t.Errorf("%s: a stream with the buoyant flow is not the usual one", name)
		}
		if against, along := h(surface.Downward, 340).Coefficient.SI(), h(surface.Upward, 340).Coefficient.SI(); !(against < along) {
			t.Errorf("%s: %g against the buoyant flow, %g along it", name, against, along)
		}
	}
	// Water below 4 °C sinks where it is heated.
	water := surface.Convection{Body: ball(50), Fluid: props.Water(), Ambient: celsius(0.5), Speed: speed(0.01), Stream: surface.Upward}
	if f := film(t, water, celsius(2.5)); !f.Opposed {
		t.Error("up past a warmer ball in water below 4 °C is not against the buoyant flow")
	}
}

// Each mode alone where the other vanishes, never less than at rest, and at most what the stream and buoyancy give together.
func TestOpposedReducesToEachMode(t *testing.T) {
	for _, name := range opposable {
		c := forms()[name]
		c.Stream = surface.Downward
		wall := celsius(60)
		still := c
		still.Speed, still.Stream = units.Velocity{}, surface.AnyStream
		natural := film(t, still, wall).Coefficient.SI()
		slow := c
		slow.Extrapolate = true // a long cylinder begins at a Péclet number of 0.2
		slow.Speed = speed(1e-7)
		near(t, name+": almost at rest", film(t, slow, wall).Coefficient.SI(), natural, 1e-6*natural, "limit")
		light, free := c, c
		light.Speed, light.Gravity = speed(1), units.MetrePerSecondSquared.Of(1e-12)
		free.Speed, free.Gravity, free.Stream = light.Speed, light.Gravity, surface.AnyStream
		forced := film(t, free, wall).Coefficient.SI()
		near(t, name+": without gravity", film(t, light, wall).Coefficient.SI(), forced, 1e-6*forced, "limit")
		near(t, name+": no difference", film(t, light, celsius(25)).Coefficient.SI(), film(t, free, celsius(25)).Coefficient.SI(), 1e-12*forced, "nothing opposes")

		rest := film(t, still, celsius(25)).Coefficient.SI()
		var seen [2]bool
		for v := 0.01; v < 3; v *= 1.1 {
			c.Speed = speed(v)
			f := film(t, c, wall)
			together := c
			together.Stream = surface.Upward
			if h := f.Coefficient.SI(); !(h > rest*0.9 && h < film(t, together, wall).Coefficient.SI()) || !f.Opposed {
				t.Errorf("%s at %g m/s: h %g, at rest %g, %+v", name, v, h, rest, f)
			}
			if !(f.Scatter >= 0.1 && f.Scatter < 0.95) || math.Abs(f.ConductionShare+f.ForcedShare+f.NaturalShare-1) > 1e-12 {
				t.Errorf("%s at %g m/s: scatter %g, shares %g, %g, %g", name, v, f.Scatter, f.ConductionShare, f.ForcedShare, f.NaturalShare)
			}
			if f.Alike {
				seen[1] = true
			} else {
				seen[0] = true
			}
			for end, part := range map[float64]surface.Part{-1: c.Low(), +1: c.High()} {
				want := f.Coefficient.SI() * (1 + end*f.Scatter) * 35
				near(t, name+": end of the band", q(t, part, 0, 60), want, 1e-9*want, "h (1 ± scatter)")
			}
		}
		if seen != [2]bool{true, true} {
			t.Errorf("%s: alike and not alike were seen %v", name, seen)
		}
	}
}

// The coefficient is continuous through the place where both are equal, and where the wall crosses the ambient temperature: halving the
// step goes on lowering the largest ratio of neighbours.
func TestOpposedIsContinuous(t *testing.T) {
	for _, name := range opposable {
		base := forms()[name]
		base.Stream = surface.Downward
		slowest := 1e-5
		if name == "level rod" {
			slowest = 0.02
		}
		checkPath(t, name+", speed", path{at: func(s float64) (surface.Convection, units.Temperature) {
			c := base
			c.Speed = speed(logBetween(s, slowest, 5))
			return c, celsius(60)
		}})
		for v, width := range map[float64]float64{0.05: 10, 0.1: 50, 0.3: 50} { // as wide as 64 steps resolve
			checkPath(t, fmt.Sprintf("%s, wall, %g m/s", name, v), path{crosses: true, at: func(s float64) (surface.Convection, units.Temperature) {
				c := base
				c.Speed = speed(v)
				return c, celsius(between(s, 25-width, 25+width))
			}})
		}
	}
}

func TestStreamRefused(t *testing.T) {
	for _, name := range []string{"upright rod", "level plate", "level front", "ball"} {
		c := forms()[name]
		c.Stream = surface.Upward
		if name == "ball" {
			c.Stream = 7
		}
		var bad *units.ArgumentError
		if _, err := c.Film(celsius(60)); !errors.As(err, &bad) || bad.Field != "convection: stream" || c.Check() == nil {
			t.Errorf("%s: %v", name, err)
		}
	}
	for s, want := range map[surface.Stream]string{surface.AnyStream: "any stream", surface.Upward: "upward", surface.Downward: "downward", 9: "unknown stream"} {
		if s.String() != want {
			t.Errorf("stream %q, want %q", s, want)
		}
	}
	c := surface.Convection{Body: ball(50), Fluid: props.Air(), Ambient: celsius(25), Speed: speed(1)}
	for s, want := range map[surface.Stream]string{surface.AnyStream: "field Stream", surface.Downward: "63 %"} {
		c.Stream = s
		if text := strings.Join(c.Warnings(), "\n"); !strings.Contains(text, want) {
			t.Errorf("%v: warnings %q", s, text)
		}
	}
}

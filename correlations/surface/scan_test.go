package surface_test

import (
	"errors"
	"fmt"
	"math"
	"testing"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
)

var fluids = []props.Fluid{props.Air(), props.Water()}

// Every combination of size, speed and temperatures gives a finite positive coefficient and shares that
// add up, or a typed error; with Extrapolate only the fluid may still refuse.
func TestScan(t *testing.T) {
	answers, refusals := 0, 0
	for _, fluid := range fluids {
		for d := 0.1; d <= 10e3; d *= math.Sqrt(10) { // mm
			for _, v := range []float64{0, 1e-6, 1e-4, 1e-2, 0.1, 1, 10, 60} {
				for _, ambient := range []float64{-40, 0.5, 3, 25, 80, 300} {
					for _, wall := range []float64{-50, 0.2, 4, 5, 24.999, 25, 25.001, 79, 99, 104, 600} {
						c := surface.Convection{Body: ball(d), Fluid: fluid, Ambient: celsius(ambient), Speed: speed(v)}
						f, err := c.Film(celsius(wall))
						where := fmt.Sprintf("%s, %v, %g m/s, %g °C in %g °C", fluid.Name(), c.Body, v, wall, ambient)
						c.Extrapolate = true
						g, errG := c.Film(celsius(wall))
						if err != nil {
							refusals++
							checkTyped(t, where, err)
							if errG != nil {
								checkTyped(t, where, errG)
							} else if !g.Extrapolated {
								t.Errorf("%s: %v, but the extrapolated film does not say so", where, err)
							}
							continue
						}
						answers++
						if f != g {
							t.Errorf("%s: Extrapolate changes a film in range: %+v, %+v", where, f, g)
						}
						h := f.Coefficient.SI()
						sum := f.ConductionShare + f.ForcedShare + f.NaturalShare
						if !(h > 0 && h < 1e9 && f.Nu >= 2*(1-1e-12) && f.Scatter > 0.1 && f.Scatter < 0.5) || math.Abs(sum-1) > 1e-12 || f.Extrapolated {
							t.Errorf("%s: %+v", where, f)
						}
						q, err := c.Flux(units.Duration{}, celsius(wall))
						if want := h * (wall - ambient); err != nil || math.Abs(q.SI()-want) > 1e-9*h*(1+math.Abs(want)) {
							t.Errorf("%s: flux %v, %v, want %g", where, q, err, want)
						}
					}
				}
			}
		}
	}
	t.Logf("%d films, %d refusals", answers, refusals)
	if answers < 1000 || refusals < 100 {
		t.Errorf("%d answers and %d refusals: the scan misses one of them", answers, refusals)
	}
}

func checkTyped(t *testing.T, where string, err error) {
	t.Helper()
	var bad *units.ArgumentError
	var out *units.RangeError
	if !errors.As(err, &bad) && !errors.As(err, &out) {
		t.Errorf("%s: error of type %T: %v", where, err, err)
	}
}

// A path through the conditions, from s = 0 to 1.
type path struct {
	name string
	at   func(s float64) (surface.Convection, units.Temperature)

	// crosses is true if the wall passes the ambient temperature, at a point of every scan. There the
	// natural part runs as |ΔT|^(1/4), with an infinite slope: ln(1 + a |ΔT|^(1/4)) falls by a few
	// per cent only when the step is halved. A jump would not fall at all.
	crosses bool
}

func between(s, lo, hi float64) float64    { return lo + s*(hi-lo) }
func logBetween(s, lo, hi float64) float64 { return lo * math.Pow(hi/lo, s) }

func paths() []path {
	var list []path
	add := func(name string, at func(s float64) (surface.Convection, units.Temperature)) {
		list = append(list, path{name: name, at: at})
	}
	air := surface.Convection{Body: ball(50), Fluid: props.Air(), Ambient: celsius(25)}
	water := surface.Convection{Body: ball(50), Fluid: props.Water(), Ambient: celsius(25)}
	for _, v := range []float64{0, 0.002, 0.01, 0.1, 0.5} {
		add(fmt.Sprintf("wall in air at %g m/s", v), func(s float64) (surface.Convection, units.Temperature) {
			c := air
			c.Speed = speed(v)
			return c, celsius(between(s, 26, 200))
		})
		list = append(list, path{
			name:    fmt.Sprintf("wall in air at %g m/s, through the ambient temperature", v),
			crosses: true,
			at: func(s float64) (surface.Convection, units.Temperature) {
				c := air
				c.Speed = speed(v)
				return c, celsius(between(s, -25, 75))
			},
		})
		add(fmt.Sprintf("wall in water at %g m/s", v), func(s float64) (surface.Convection, units.Temperature) {
			c := water
			c.Speed = speed(v)
			return c, celsius(between(s, 26, 95))
		})
		add(fmt.Sprintf("ambient in water at %g m/s", v), func(s float64) (surface.Convection, units.Temperature) {
			c := water
			c.Speed, c.Ambient = speed(v), celsius(between(s, 6, 60))
			return c, celsius(61)
		})
		add(fmt.Sprintf("size in air at %g m/s", v), func(s float64) (surface.Convection, units.Temperature) {
			c := air
			c.Body, c.Speed = ball(logBetween(s, 2, 1000)), speed(v)
			return c, celsius(60)
		})
		add(fmt.Sprintf("size of a small ball in air at %g m/s", v), func(s float64) (surface.Convection, units.Temperature) {
			c := air
			c.Body, c.Speed = ball(logBetween(s, 0.1, 200)), speed(v)
			return c, celsius(26)
		})
		add(fmt.Sprintf("pressure of air at %g m/s", v), func(s float64) (surface.Convection, units.Temperature) {
			c := air
			c.Pressure, c.Speed = units.Kilopascal.Of(between(s, 20, 200)), speed(v)
			return c, celsius(60)
		})
	}
	// From 0.1 mm to 10 m, in range or not.
	for _, v := range []float64{0, 0.01, 1} {
		for _, fluid := range fluids {
			add(fmt.Sprintf("size from 0.1 mm to 10 m in %s at %g m/s", fluid.Name(), v), func(s float64) (surface.Convection, units.Temperature) {
				c := surface.Convection{Body: ball(logBetween(s, 0.1, 10e3)), Fluid: fluid, Ambient: celsius(25), Speed: speed(v), Extrapolate: true}
				return c, celsius(60)
			})
		}
	}
	for _, wall := range []float64{25, 25.01, 26, 60} {
		add(fmt.Sprintf("speed in air, wall at %g °C", wall), func(s float64) (surface.Convection, units.Temperature) {
			c := air
			c.Speed = speed(logBetween(s, 1e-6, 20))
			return c, celsius(wall)
		})
		add(fmt.Sprintf("speed in air from rest, wall at %g °C", wall), func(s float64) (surface.Convection, units.Temperature) {
			c := air
			c.Speed = speed(between(s, 0, 0.05))
			return c, celsius(wall)
		})
		add(fmt.Sprintf("speed in water, wall at %g °C", wall), func(s float64) (surface.Convection, units.Temperature) {
			c := water
			c.Speed = speed(logBetween(s, 1e-6, 1))
			return c, celsius(wall)
		})
		add(fmt.Sprintf("hand-over in air, wall at %g °C", wall), func(s float64) (surface.Convection, units.Temperature) {
			c := air
			c.Body, c.Speed = ball(1), speed(between(s, 0.03, 0.13)) // Re 2 to 8
			return c, celsius(wall)
		})
	}
	return list
}

// largestStep returns the largest |ln| of the ratio of neighbouring coefficients where both exist.
func largestStep(p path, steps int) (largest float64, answers int) {
	last := math.NaN()
	for i := range steps + 1 {
		c, wall := p.at(float64(i) / float64(steps))
		f, err := c.Film(wall)
		if err != nil {
			last = math.NaN()
			continue
		}
		answers++
		h := math.Log(f.Coefficient.SI())
		if step := math.Abs(h - last); step > largest {
			largest = step
		}
		last = h
	}
	return largest, answers
}

// There is no hidden jump: halving the step of a scan goes on lowering the largest ratio between
// neighbours. A jump would keep it.
func TestNoHiddenJump(t *testing.T) {
	for _, p := range paths() {
		fall := 0.85
		if p.crosses {
			fall = 0.98
		}
		last, answers := largestStep(p, 128)
		if answers < 20 {
			t.Errorf("%s: only %d films", p.name, answers)
		}
		for steps := 256; steps <= 1024; steps *= 2 {
			next, _ := largestStep(p, steps)
			if !(next <= fall*last) && next > 1e-9 {
				t.Errorf("%s: largest ratio of neighbours %.3g with %d steps, %.3g with half as many", p.name, next, steps, last)
			}
			last = next
		}
	}
}

// The test above finds a jump if there is one: switching between two correlations at a threshold.
func TestJumpWouldBeFound(t *testing.T) {
	p := path{name: "switch", at: func(s float64) (surface.Convection, units.Temperature) {
		c := surface.Convection{Body: ball(1), Fluid: props.Air(), Ambient: celsius(25), Speed: speed(between(s, 0.03, 0.13))}
		if s > 0.5 {
			c.Gravity = units.MetrePerSecondSquared.Of(50)
		}
		return c, celsius(60)
	}}
	coarse, _ := largestStep(p, 250)
	fine, _ := largestStep(p, 1000)
	if fine < 0.8*coarse {
		t.Errorf("a jump of %g passes as %g", coarse, fine)
	}
}

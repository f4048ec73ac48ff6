package wall

import (
	"math"
	"testing"
)

// On both sides of the coefficients from which the first mode counts as slow, the answers go over into each other, and
// far below them a body is insulated but for what the faces let through: the mean rises by the balance of heat.
func TestSlowModes(t *testing.T) {
	for _, b := range []Body{Plate(), Hollow(1, 0.7), Hollow(1, 40), Hollow(2, 1.3), Solid(1), Solid(2)} {
		for _, start := range []func(float64) float64{nil, func(y float64) float64 { return math.Cos(3 * y) }} {
			problem := func(h float64) *Solution {
				p := Problem{Body: b, Ha: h, Hb: 2 * h, Drive: Drive{Ua: 2e3, Ub: -7e3, G: 1}, Start: start}
				if b.Solid {
					p.Ha, p.Drive.Ua = 0, 0
				}
				return Solve(p)
			}
			// by halving, where the first mode ceases to be slow
			slow := func(h float64) bool {
				if b.Solid {
					return New(b, 0, 2*h, 1).slow()
				}
				return New(b, h, 2*h, 1).slow()
			}
			h, hi := 1e-10, 1e-6
			for hi/h > 1.0001 {
				if mid := math.Sqrt(h * hi); slow(mid) {
					h = mid
				} else {
					hi = mid
				}
			}
			below, above := problem(h), problem(h*1.001)
			for _, fo := range []float64{1e-4, 0.01, 0.2, 3, 1e3, 1e7, 1e9} {
				for _, probe := range quantities {
					if b.Solid && (probe.Quantity == InnerFlux || probe.Quantity == InnerHeat) {
						continue
					}
					x, y := below.Ask(probe, fo), above.Ask(probe, fo)
					// as far as the coefficients are apart, and what either way may lose
					if math.Abs(x-y) > 2e-3*math.Abs(x)+1e-7 {
						t.Errorf("m %d, Ra %v, solid %v, start %v, h %.4g, Fo %v, %+v: %.12g and %.12g", b.Dimension, b.Ra, b.Solid, start != nil, h, fo, probe, x, y)
					}
				}
			}
			// what leaves is the coefficient times the excess of the face
			p := problem(1e-9).problem
			p.Drive.Ua, p.Drive.Ub = 0, 0
			if !b.Solid {
				p.Ha, p.Drive.Qa = 0, -3
			}
			s := Solve(p)
			for _, fo := range []float64{0.01, 0.3, 20} {
				got, want := s.Ask(Probe{Quantity: OuterFlux}, fo), p.Hb*s.Ask(Probe{Y: 1}, fo)
				if math.Abs(got-want) > 1e-6*math.Abs(want) {
					t.Errorf("m %d, Ra %v, solid %v, Fo %v: flux %.12g, want %.12g by the temperature", b.Dimension, b.Ra, b.Solid, fo, got, want)
				}
			}
			tiny := problem(1e-200)
			mean := tiny.Ask(Probe{Quantity: Mean}, 0)
			if start != nil {
				mean = b.Integrate(start) / b.Volume(1)
			}
			if got, want := tiny.Ask(Probe{Quantity: Mean}, 2), mean+2; math.Abs(got-want) > 1e-11 {
				t.Errorf("m %d, Ra %v, solid %v: mean %.12g with a coefficient of 1e-200, want %.12g", b.Dimension, b.Ra, b.Solid, got, want)
			}
		}
	}
}

package lumped

import (
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// Against finite volumes, faces with coefficients that differ: the estimate of the lumping error is above the largest error at
// both faces and of the mean, and for Bi of 0.2 and below at most 2.5 times that. An exchange function gives the same as
// constants do.
func TestFacesThatDifferAgainstFiniteVolumes(t *testing.T) {
	for _, c := range []struct {
		name string
		body shape.Body
		m, a float64 // inner radius; the outer one is 20 mm more
	}{
		{"plate", shape.Plate(units.Millimetre.Of(20), units.SquareMetre.Of(1)), 1, 0},
		{"tube", shape.Tube(units.Millimetre.Of(80), units.Millimetre.Of(40), units.Metre.Of(1)), 2, 0.02},
		{"hollow sphere", shape.HollowSphere(units.Millimetre.Of(100), units.Millimetre.Of(60)), 3, 0.03},
	} {
		for _, bi := range [][2]float64{{0.02, 0.01}, {0.01, 0.2}, {0.2, 0.2}, {0.001, 0.1}, {0.05, 2}} { // h L/k outside and inside
			outside, inside := bi[0]/0.02, bi[1]/0.02 // k = 1
			p := Problem{
				Body: c.body, Material: constantStuff(1000, 1e-3, 1), Initial: kelvin(301), Surface: constant(outside, 300),
				Opposite: constant(inside, 300),
			}
			s := solve(t, p)
			tau := s.content.capacity / s.exchange.conductance(300)
			p.Horizon = seconds(4 * tau)
			p.Opposite = boundary.Function(p.Opposite.Flux)
			general := solve(t, p)
			fine := newShells(c.m, c.a, c.a+0.02, inside, outside)
			half := 0.02 / 300
			var surface, opposite, mean float64
			now, dt := 0.0, 1e-5*0.02*0.02
			for i := 0; now < 4*tau; i++ {
				w := 0.5
				if i < 8 {
					w = 1
				}
				fine.step(dt, w)
				now += dt
				lumped := math.Exp(-now / tau)
				surface = max(surface, math.Abs(fine.theta[len(fine.theta)-1]/(1+outside*half)-lumped))
				opposite = max(opposite, math.Abs(fine.theta[0]/(1+inside*half)-lumped))
				mean = max(mean, math.Abs(fine.mean()-lumped))
				dt = min(dt*1.05, tau/150, 0.01*0.02*0.02)
			}
			for place, worst := range map[shape.Place]float64{shape.Surface(): surface, shape.Opposite(): opposite, shape.Mean(): mean} {
				for _, s := range []*Solution{s, general} {
					e, err := s.LumpingError(place)
					if err != nil {
						t.Fatal(err)
					}
					if e.SI() < worst || e.SI() > 2.5*worst && max(bi[0], bi[1]) <= 0.2 {
						t.Errorf("%s, Bi %v, %v: estimate %g, error %g", c.name, bi, place, e.SI(), worst)
					}
				}
			}
		}
	}
}

// A fast swing of the ambient passes a body by: the error is no more than what surface and body swing, not the steepest slope of the
// ambient times the delay inside, which is thousands of kelvin. A body of 2 s in an ambient of ±10 K and 0.1 s swings by 0.08 K.
func TestFastSwing(t *testing.T) {
	s := solve(t, Problem{
		Body: sphere(0.006), Material: constantStuff(2000, 1000, 0.3), Initial: kelvin(300), Horizon: seconds(20),
		Surface: boundary.Following(coefficient(1000), boundary.Oscillation(kelvin(300), difference(10), seconds(0.1), units.Duration{})),
	})
	e, err := s.LumpingError(shape.Centre())
	if err != nil || e.SI() < 0.08 || e.SI() > 10 {
		t.Errorf("%v, %v, want a part of the swing of 10 K", e, err)
	}
}

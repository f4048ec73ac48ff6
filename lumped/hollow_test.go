package lumped

import (
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// shells is a finite-volume model in the coordinate r of m dimensions from a to b, of its own for these tests: unit conductivity
// and diffusivity, coefficients at both faces, implicit in time (trapezoidal after a few Euler steps).
type shells struct {
	volume, conductance, theta []float64
	out                        [2]float64 // conductance to the ambient inside and outside
}

func newShells(m, a, b, inside, outside float64) *shells {
	const n = 150
	s := &shells{conductance: make([]float64, n+1)}
	area := func(r float64) float64 { return math.Pow(r, m-1) }
	step := (b - a) / n
	for i := range n {
		low, high := a+step*float64(i), a+step*float64(i+1)
		s.volume = append(s.volume, (math.Pow(high, m)-math.Pow(low, m))/m)
		s.conductance[i] = area(low) / step
		s.theta = append(s.theta, 1)
	}
	s.conductance[0] = 0
	series := func(h, area float64) float64 { return area / (1/h + step/2) }
	if inside > 0 {
		s.out[0] = series(inside, area(a))
	}
	if outside > 0 {
		s.out[1] = series(outside, area(b))
	}
	return s
}

// step goes on by dt, with the part w of the rate taken at the end (W. H. Press et al., Numerical Recipes, 3rd ed., sec.
// 2.4 and 20.2, from memory).
func (s *shells) step(dt, w float64) {
	n := len(s.theta)
	low, mid, high, right := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range n {
		left, next := s.conductance[i], s.conductance[i+1]
		loss := 0.0
		if i == 0 {
			loss += s.out[0]
		}
		if i == n-1 {
			next, loss = 0, loss+s.out[1]
		}
		rate := -loss * s.theta[i]
		if i > 0 {
			rate += left * (s.theta[i-1] - s.theta[i])
		}
		if i < n-1 {
			rate += next * (s.theta[i+1] - s.theta[i])
		}
		low[i], high[i] = -w*left*dt, -w*next*dt
		mid[i] = s.volume[i] + w*dt*(left+next+loss)
		right[i] = s.volume[i]*s.theta[i] + (1-w)*dt*rate
	}
	for i := 1; i < n; i++ {
		f := low[i] / mid[i-1]
		mid[i] -= f * high[i-1]
		right[i] -= f * right[i-1]
	}
	s.theta[n-1] = right[n-1] / mid[n-1]
	for i := n - 2; i >= 0; i-- {
		s.theta[i] = (right[i] - high[i]*s.theta[i+1]) / mid[i]
	}
}

// mean is the mean over the volume.
func (s *shells) mean() float64 {
	heat, volume := 0.0, 0.0
	for i, v := range s.volume {
		heat += v * s.theta[i]
		volume += v
	}
	return heat / volume
}

// hollowCases are bodies in which heat flows along one coordinate, with h at the faces that are exposed.
var hollowCases = []struct {
	name  string
	body  shape.Body
	m     float64
	a, b  float64 // m
	faces [2]bool
}{
	{"tube, outside", shape.Tube(units.Millimetre.Of(40), units.Millimetre.Of(20), units.Metre.Of(1)), 2, 0.01, 0.02, [2]bool{false, true}},
	{"tube, inside", shape.Tube(units.Millimetre.Of(40), units.Millimetre.Of(20), units.Metre.Of(1)).Exposing(shape.Inside), 2, 0.01, 0.02, [2]bool{true, false}},
	{"thick tube, outside", shape.Tube(units.Millimetre.Of(40), units.Millimetre.Of(4), units.Metre.Of(1)), 2, 0.002, 0.02, [2]bool{false, true}},
	{"thin tube, both", shape.Tube(units.Millimetre.Of(40), units.Millimetre.Of(36), units.Metre.Of(1)).Exposing(shape.Inside | shape.Outside), 2, 0.018, 0.02, [2]bool{true, true}},
	{"hollow sphere, outside", shape.HollowSphere(units.Millimetre.Of(40), units.Millimetre.Of(20)), 3, 0.01, 0.02, [2]bool{false, true}},
	{"hollow sphere, inside", shape.HollowSphere(units.Millimetre.Of(40), units.Millimetre.Of(30)).Exposing(shape.Inside), 3, 0.015, 0.02, [2]bool{true, false}},
	{"plate", shape.Plate(units.Millimetre.Of(20), units.SquareMetre.Of(1)), 1, 0, 0.02, [2]bool{true, true}},
	{"plate, one face", shape.Plate(units.Millimetre.Of(20), units.SquareMetre.Of(1)).Exposing(shape.Front), 1, 0, 0.02, [2]bool{false, true}},
	{"cylinder", shape.Cylinder(units.Millimetre.Of(40), units.Metre.Of(1)).Exposing(shape.Outside), 2, 0, 0.02, [2]bool{false, true}},
	{"sphere", sphere(0.04), 3, 0, 0.02, [2]bool{false, true}},
}

// Against finite volumes that know nothing of the series: the estimate of the lumping error of hollow bodies is at most 10 %
// below and 30 % above the largest error at small and moderate Biot numbers, at the place farthest from the surface, at the surface, and of the
// mean; and counting the resistance inside takes most of the error away, so that the profile and the resistance are those
// of these bodies.
func TestHollowBodiesAgainstFiniteVolumes(t *testing.T) {
	for _, c := range hollowCases {
		for _, biot := range []float64{0.02, 0.2} { // h (V/A)/k
			length := c.body.VolumeToArea().SI()
			h := biot / length // k = 1
			p := Problem{
				Body: c.body, Material: constantStuff(1000, 1e-3, 1), Initial: kelvin(301), Surface: constant(h, 300),
			}
			lumped := solve(t, p)
			p.FirstOrder = true
			better := solve(t, p)
			var faces [2]float64
			for i, exposed := range c.faces {
				if exposed {
					faces[i] = h
				}
			}
			fine := newShells(c.m, c.a, c.b, faces[0], faces[1])
			tau := length / h
			var worst, worstBetter [3]float64 // centre, surface, mean
			deep := 0
			switch {
			case c.faces[0] && c.faces[1]:
				deep = len(fine.theta) / 2
			case c.faces[0]:
				deep = len(fine.theta) - 1
			}
			now, dt := 0.0, 1e-5*length*length
			for i := 0; now < 4*tau; i++ {
				w := 0.5
				if i < 8 {
					w = 1
				}
				fine.step(dt, w)
				now += dt
				outer := fine.theta[len(fine.theta)-1] * (1 - fine.out[1]/math.Pow(c.b, c.m-1)*(c.b-c.a)/300)
				if !c.faces[1] {
					outer = fine.theta[0] * (1 - fine.out[0]/math.Pow(c.a, c.m-1)*(c.b-c.a)/300)
				}
				if now > 0.02*length*length {
					dt = min(dt*1.1, tau/150)
				}
				exact := [3]float64{fine.theta[deep], outer, fine.mean()}
				for j, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
					a, err1 := lumped.At(place, seconds(now))
					b, err2 := better.At(place, seconds(now))
					if err1 != nil || err2 != nil {
						t.Fatal(err1, err2)
					}
					worst[j] = max(worst[j], math.Abs(a.SI()-300-exact[j]))
					if way := c.body.ConductionLength().SI(); now > way*way { // when the profile has set in
						worstBetter[j] = max(worstBetter[j], math.Abs(b.SI()-300-exact[j]))
					}
				}
			}
			for j, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
				e, err := lumped.LumpingError(place)
				if err != nil {
					t.Fatal(err)
				}
				if r := e.SI() / worst[j]; r < 0.9 || r > 1.3 {
					t.Errorf("%s, Bi(V/A) %g, %v: estimate %g, error %g", c.name, biot, place, e.SI(), worst[j])
				}
				if worstBetter[j] > 1.2*biot*worst[j]+2e-5 {
					t.Errorf("%s, Bi(V/A) %g, %v: to first order %g, lumped %g", c.name, biot, place, worstBetter[j], worst[j])
				}
			}
		}
	}
}

package lumped

import (
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A body that is circumscribed about a sphere of radius r, V = A r/3, has at late times and small Biot numbers the profile
// −ρ²/(2 r) about its middle: ∇² of it is −3/r = −A/V, and its slope at a face, which touches the sphere, is −1. With the
// mean square M of ρ over the surface the middle lies 3 M/(10 r) above the mean and the surface M/(5 r) below it, times q/k, so
// that the lumped solution is off by that. M follows by hand: of a cone from its base and mantle, of a tetrahedron from r² and a²/12 for
// its edge a = √24 r.
func TestIrregularBodiesAtSmallBiot(t *testing.T) {
	cone := func(ratio float64) float64 { // M/r² for a height of so many diameters
		h := 2 * ratio
		l := math.Hypot(1, h)
		r, touch := h/(1+l), l-1 // touch: of the mantle, from the tip
		base, mantle := r*r+0.5, r*r+l*l/2-4*l/3*touch+touch*touch
		return (base + l*mantle) / (1 + l) / (r * r)
	}
	coneBody := func(ratio float64) shape.Body {
		return shape.Cone(units.Millimetre.Of(20), units.Millimetre.Of(20*ratio))
	}
	const bi = 1e-5 // h (V/A)/k
	for _, c := range []struct {
		name string
		body shape.Body
		m    float64
	}{
		{"cone, half a diameter high", coneBody(0.5), cone(0.5)},
		{"cone, one diameter high", coneBody(1), cone(1)},
		{"cone, 2.5 diameters high", coneBody(2.5), cone(2.5)},
		{"regular tetrahedron", shape.Measured(units.CubicMetre.Of(math.Pow(24, 1.5)/6/math.Sqrt2*1e-6), units.SquareMetre.Of(math.Sqrt(3)*24*1e-4)), 3},
	} {
		length := c.body.VolumeToArea().SI()
		s := solve(t, Problem{Body: c.body, Material: constantStuff(2000, 1000, 2), Initial: kelvin(301), Surface: constant(bi*2/length, 300)})
		for place, part := range map[shape.Place]float64{shape.Centre(): 0.9, shape.Surface(): 0.6} {
			estimate, err := s.LumpingError(place)
			if err != nil {
				t.Fatal(err)
			}
			if off := bi * part * c.m; estimate.SI() < off || estimate.SI() > 3.5*off {
				t.Errorf("%s, %v: estimate %g, error %g", c.name, place, estimate.SI(), off)
			}
		}
	}
}

// A lathe is a finite-volume model of a body of revolution with k = ρ c = 1, of its own for this test: square cells of
// side d whose middle lies within the radius of the body, the surface of each slab at its outermost cell, explicit in time.
type lathe struct {
	d           float64
	wide, high  int
	volume, out []float64 // per 2π; out is the surface
	theta, next []float64
}

func newLathe(d, widest, height float64, radius func(z float64) float64) *lathe {
	l := &lathe{d: d, wide: int(math.Ceil(widest / d)), high: int(math.Round(height / d))}
	n := l.wide * l.high
	l.volume, l.out, l.theta, l.next = make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
	for j := range l.high {
		z := d * float64(j)
		outermost := -1
		for i := range l.wide {
			r, k := d*(float64(i)+0.5), j*l.wide+i
			if r >= radius(z+d/2) {
				break
			}
			l.volume[k], l.theta[k], outermost = r*d*d, 1, k
			if j == 0 { // the flat base
				l.out[k] += r * d
			}
		}
		if outermost >= 0 {
			low, high := radius(z), radius(z+d)
			l.out[outermost] += (low + high) / 2 * math.Hypot(high-low, d)
		}
	}
	return l
}

// step goes on by dt with the coefficient h.
func (l *lathe) step(h, dt float64) {
	film := 1 / (1/h + l.d/2)
	for j := range l.high {
		for i := range l.wide {
			k := j*l.wide + i
			if l.volume[k] == 0 {
				break
			}
			r, in := float64(i)+0.5, -film*l.out[k]*l.theta[k]
			pass := func(to int, conductance float64) {
				if l.volume[to] > 0 {
					in += conductance * l.d * (l.theta[to] - l.theta[k])
				}
			}
			if i > 0 {
				pass(k-1, float64(i))
			}
			if i+1 < l.wide {
				pass(k+1, float64(i+1))
			}
			if j > 0 {
				pass(k-l.wide, r)
			}
			if j+1 < l.high {
				pass(k+l.wide, r)
			}
			l.next[k] = l.theta[k] + dt*in/l.volume[k]
		}
	}
	l.theta, l.next = l.next, l.theta
}

func (l *lathe) total(weights []float64) (sum, weighted float64) {
	for k, w := range weights {
		sum += w
		weighted += w * l.theta[k]
	}
	return sum, weighted
}

// The estimate is above the largest error of the hottest place, of the mean, and of the surface on average, in bodies in which heat
// flows along coordinates that do not part.
func TestIrregularBodiesAgainstFiniteVolumes(t *testing.T) {
	for _, c := range []struct {
		name   string
		height float64 // of a radius of 1
		radius func(z float64) float64
	}{
		{"cone", 2, func(z float64) float64 { return 1 - z/2 }},
		{"flat cone", 1, func(z float64) float64 { return 1 - z }},
		{"hemisphere", 1, func(z float64) float64 { return math.Sqrt(max(1-z*z, 0)) }},
		{"bullet", 3, func(z float64) float64 { return math.Sqrt(max(1-max(z-2, 0)*max(z-2, 0), 0)) }},
		{"egg", 2.6, func(z float64) float64 { return math.Sqrt(max(1-math.Pow(z/1.3-1, 2), 0)) }},
	} {
		for _, bi := range []float64{0.03, 0.2, 1} { // h (V/A)/k
			l := newLathe(1.0/16, 1, c.height, c.radius)
			volume, _ := l.total(l.volume)
			area, _ := l.total(l.out)
			length := volume / area
			h, tau := bi/length, length*length/bi
			s := solve(t, Problem{
				Body:     shape.Measured(units.CubicMetre.Of(2*math.Pi*volume), units.SquareMetre.Of(2*math.Pi*area)),
				Material: constantStuff(1000, 1e-3, 1), Initial: kelvin(301), Surface: constant(h, 300),
			})
			var hottest, mean, surface float64
			dt := 0.2 * l.d * l.d
			for now := dt; now < 2*tau; now += dt {
				l.step(h, dt)
				lumped := math.Exp(-now / tau)
				_, heat := l.total(l.volume)
				_, faces := l.total(l.out)
				for _, theta := range l.theta {
					hottest = max(hottest, theta-lumped)
				}
				mean = max(mean, math.Abs(heat/volume-lumped))
				surface = max(surface, math.Abs(faces/area/(1+h*l.d/2)-lumped))
			}
			for _, place := range []struct {
				shape.Place
				off float64
			}{{shape.Centre(), hottest}, {shape.Mean(), mean}, {shape.Surface(), surface}} {
				e, err := s.LumpingError(place.Place)
				if err != nil {
					t.Fatal(err)
				}
				if e.SI() < place.off {
					t.Errorf("%s, Bi(V/A) %g, %v: estimate %g, error %g", c.name, bi, place.Place, e.SI(), place.off)
				}
			}
		}
	}
}

package lumped

import (
	"math"

	"example.com/coolward/units/shape"
)

// A profile is how far the places of a body lie above its mean temperature while it cools slowly, for a unit of q/k with
// the flux q that leaves each exposed face: the solution of ∇²u = −A/V that has the slope −1 at those faces. All
// lengths are in m. Its values at the two ends give the resistance inside: L/3 for a plate, R/4 for a long cylinder, R/5
// for a sphere.
type profile struct {
	resistance float64 // mean less the surface on average, over q/k
	centre     float64 // centre less mean, over q/k
	surface    float64 // surface less mean, over q/k; below 0
	known      bool    // it is the solution; else that of a cube of the same V/A stands for it

	walls []wall // along the coordinates that heat takes, the one with the nearest face first
}

// newProfile returns the profile of a body.
func newProfile(b shape.Body) profile {
	var p profile
	factors := b.Factors()
	if len(factors) == 0 { // heat flows along several coordinates that do not part
		length := b.VolumeToArea().SI()
		return profile{resistance: length, centre: 2.5*length - length, surface: -length}
	}
	total := 0.0
	for _, f := range factors {
		w := newWall(f)
		share := 1 / f.VolumeToArea().SI()
		p.resistance += share * w.resistance
		total += share
		p.walls = append(p.walls, w)
	}
	p.resistance /= total
	p.centre, p.surface = p.above(b.ConductionLength().SI()), p.above(0)
	p.known = true
	return p
}

// above returns how far the place at a depth below the nearest face is above the mean, in the middle along the other
// coordinates.
func (p *profile) above(depth float64) float64 {
	total := p.walls[0].above(depth)
	for i := 1; i < len(p.walls); i++ {
		total += p.walls[i].above(p.walls[i].length)
	}
	return total
}

// A wall is the profile along one coordinate r from a to b in m dimensions: with r^(m−1) T′ = −S r^m/m + C it is
// T = −S (r² − a²)/(2 m) + C ∫ r^(1−m) dr, where S = A/V and C follows from the slope at a.
type wall struct {
	m          float64
	a, b       float64
	fromInside bool // the surface is at a
	s, c       float64
	mean       float64
	resistance float64
	length     float64 // longest way to the surface
}

func newWall(body shape.Body) wall {
	thickness := body.Thickness().SI()
	w := wall{m: 1, b: thickness, length: body.ConductionLength().SI()}
	outside, inside := true, body.ConductionLength().SI() < 0.75*thickness // exposed
	switch body.Family() {
	case shape.Cylindrical, shape.HollowCylindrical:
		w.m = 2
	case shape.Spherical, shape.HollowSpherical:
		w.m = 3
	}
	if w.m > 1 {
		w.b = body.Diameter().SI() / 2
		w.a = body.InnerDiameter().SI() / 2
		inside = body.Exposed()&shape.Inside != 0
		outside = body.Exposed()&shape.Outside != 0
		w.fromInside = !outside
	}
	pow := func(r, n float64) float64 { return math.Pow(r, n) }
	volume := (pow(w.b, w.m) - pow(w.a, w.m)) / w.m
	areaIn, areaOut := pow(w.a, w.m-1), pow(w.b, w.m-1)
	if !inside {
		areaIn = 0
	}
	if !outside {
		areaOut = 0
	}
	w.s = (areaIn + areaOut) / volume
	w.c = areaIn + w.s*pow(w.a, w.m)/w.m
	w.mean = w.meanOf()
	w.resistance = w.mean - (areaIn*w.at(w.a)+areaOut*w.at(w.b))/(areaIn+areaOut)
	return w
}

func (w *wall) at(r float64) float64 {
	u := -w.s * (r*r - w.a*w.a) / (2 * w.m)
	switch {
	case w.c == 0:
	case w.m == 1:
		u += w.c * (r - w.a)
	case w.m == 2:
		u += w.c * math.Log(r/w.a)
	default:
		u += w.c * (1/w.a - 1/r)
	}
	return u
}

// meanOf returns the mean of at over the volume.
func (w *wall) meanOf() float64 {
	a, b, m := w.a, w.b, w.m
	volume := math.Pow(b, m) - math.Pow(a, m)
	u := -w.s / (2 * m) * (m/(m+2)*(math.Pow(b, m+2)-math.Pow(a, m+2))/volume - a*a)
	switch {
	case w.c == 0:
	case m == 1:
		u += w.c * (b - a) / 2
	case m == 2:
		u += w.c * (b*b*math.Log(b/a)/volume - 0.5)
	default:
		u += w.c * (1/a - 1.5*(b*b-a*a)/volume)
	}
	return u
}

// above returns how far the place at a depth below the surface is above the mean.
func (w *wall) above(depth float64) float64 {
	r := w.b - depth
	if w.fromInside {
		r = w.a + depth
	}
	return w.at(r) - w.mean
}

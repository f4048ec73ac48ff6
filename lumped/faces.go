package lumped

import (
	"math"

	"example.com/coolward/units/shape"
)

// A twoFaced estimate of the lumping error is for a wall whose faces differ. Each flux alone keeps up a profile, and the profiles
// add up; that the faces are off the mean changes what they exchange, and moves the mean. Both are followed over time, to first
// order in the Biot number.
type twoFaced struct {
	surface, opposite profile // of each face alone
	areas             [2]float64
	thickness, k      float64
	volume            float64
	moments           []moment
}

// A moment is the two fluxes, W/m², and by how much the mean is off, K.
type moment struct{ surface, opposite, mean float64 }

// twoFacedMargin is on top of the estimate for what is not in it: the order above, and how a profile sets in. Against finite
// volumes it is enough for all Biot numbers.
const twoFacedMargin = 1.25

// followFaces fills the estimate for two faces that differ.
func (s *Solution) followFaces(k float64) {
	body := s.problem.Body
	one, other := facesOf(body)
	areas := [2]float64{body.Exposing(one).Area().SI(), body.Exposing(other).Area().SI()}
	f := &twoFaced{
		surface: newProfile(body.Exposing(one)), opposite: newProfile(body.Exposing(other)),
		areas: areas, thickness: body.Thickness().SI(), k: k, volume: body.Volume().SI(),
	}
	faces := [2]exchange{{factor: s.exchange.factor, shift: s.exchange.shift}, {factor: s.exchange.factor, shift: s.exchange.shift}}
	faces[0].add(s.problem.Surface, areas[0])
	faces[1].add(s.problem.Opposite, areas[1])
	const apart = 0.1 // K, for a slope
	last, off := 0.0, 0.0
	follow := func(t float64) {
		kelvin, err := s.mean(t)
		if err != nil {
			return
		}
		var flux, slope [2]float64
		for i := range faces {
			low, err1 := faces[i].bare(t, kelvin-apart/2)
			high, err2 := faces[i].bare(t, kelvin+apart/2)
			if err1 != nil || err2 != nil {
				return
			}
			flux[i], slope[i] = (low+high)/2/areas[i], (high-low)/apart
		}
		g := slope[0] + slope[1]
		at, back := f.beside(shape.Surface(), body, flux), f.beside(shape.Opposite(), body, flux)
		if perState, err := s.perState(t); err == nil && g > 0 {
			left := math.Exp(-g * perState * (t - last) / s.content.capacity)
			off = off*left - (slope[0]*at+slope[1]*back)/g*(1-left)
		}
		last = t
		f.moments = append(f.moments, moment{flux[0], flux[1], off})
	}
	nodes := s.nodes()
	for i, t := range nodes {
		const parts = 4
		for j := 1; i > 0 && j < parts; j++ {
			follow(nodes[i-1] + (t-nodes[i-1])*float64(j)/parts)
		}
		follow(t)
	}
	s.faces = f
}

// beside returns how far a place is above the mean with the given fluxes from both faces.
func (f *twoFaced) beside(place shape.Place, body shape.Body, flux [2]float64) float64 {
	if place.IsMean() {
		return 0
	}
	depth, err := place.Depth(body)
	if err != nil {
		return 0
	}
	d := min(depth.SI(), f.thickness)
	return (flux[0]*f.surface.above(d) + flux[1]*f.opposite.above(f.thickness-d)) / f.k
}

// early returns how far a place is above the mean at the Fourier number α t/L², before the fluxes from both faces have met: each
// as in a body without another side (H. S. Carslaw, J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., sec. 2.9, from
// memory), for a thin wall.
func (f *twoFaced) early(place shape.Place, body shape.Body, m moment, fo float64) float64 {
	depth, err := place.Depth(body)
	if err != nil || place.IsMean() {
		return 0
	}
	root, x := math.Sqrt(fo), min(depth.SI()/f.thickness, 1)
	fall := func(way float64) float64 { // 2 √Fo ierfc(x/(2 √Fo))
		z := way / (2 * root)
		return 2 * root * (math.Exp(-z*z)/math.Sqrt(math.Pi) - z*math.Erfc(z))
	}
	mean := (m.surface*f.areas[0] + m.opposite*f.areas[1]) / f.volume * f.thickness * fo
	return f.thickness / f.k * (mean - m.surface*fall(x) - m.opposite*fall(1-x))
}

// largest returns the estimate for a place, K.
func (f *twoFaced) largest(place shape.Place, body shape.Body) float64 {
	largest := 0.0
	for fo := 0.002; fo < 0.2 && len(f.moments) > 0; fo *= 1.5 {
		largest = max(largest, math.Abs(f.early(place, body, f.moments[0], fo)))
	}
	for _, m := range f.moments {
		largest = max(largest, math.Abs(m.mean+f.beside(place, body, [2]float64{m.surface, m.opposite})))
	}
	largest *= twoFacedMargin
	if place.IsMean() { // before the profile has set in it may be off where later the faces balance
		largest = max(largest, 0.1*f.largest(shape.Surface(), body))
	}
	return largest
}

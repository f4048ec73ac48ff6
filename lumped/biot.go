package lumped

import (
	"math"

	"example.com/coolward/units"
)

// A Biot holds the Biot number with either length, and what it is made of. Its zero value belongs to
// a body without exchange.
type Biot struct {
	Conduction float64 // h R / k with the conduction length R: the radius of a sphere
	Volume     float64 // h (V/A) / k, the usual measure of lumped analysis

	Coefficient  units.HeatTransferCoefficient // h
	Conductivity units.Conductivity            // k, the least over the run
}

// Biot returns the Biot number of the run, with the conductivity where it is least; of several materials the least
// of all. For an exchange without constant coefficients, the coefficient is the largest q/(T − T_limit) over the
// run, while |T − T_limit| is above a hundredth of its largest value; where no limit is known it is the largest |q|
// over the span of temperature that the body has passed.
func (s *Solution) Biot() Biot {
	if s == nil {
		return Biot{}
	}
	return s.biot
}

// groups fills the Biot number and the span of temperature that goes with it.
func (s *Solution) groups() error {
	h, low, high := s.coefficient()
	k := math.Inf(1)
	for i := range s.content.portions {
		ki, at, err := leastConductivity(s.content.portions[i].material, low, high)
		if err != nil {
			return err
		}
		if ki < k {
			k, s.leastAt = ki, at
		}
	}
	s.biot = Biot{
		Conduction:   h * s.wayOut() / k,
		Volume:       h * s.length / k,
		Coefficient:  units.WattPerSquareMetreKelvin.Of(h),
		Conductivity: units.WattPerMetreKelvin.Of(k),
	}
	if !s.problem.Opposite.IsZero() {
		s.followFaces(k)
	}
	return units.CheckNumber("Biot number", s.biot.Conduction, 0, math.MaxFloat64)
}

// wayOut returns the conduction length in m: the whole wall, where its faces differ.
func (s *Solution) wayOut() float64 {
	if !s.problem.Opposite.IsZero() {
		return s.problem.Body.Thickness().SI()
	}
	return s.problem.Body.ConductionLength().SI()
}

// coefficient returns the heat transfer coefficient of the run, and the lowest and highest temperature
// of the run in kelvin.
func (s *Solution) coefficient() (h, low, high float64) {
	e := &s.exchange
	low, high = min(s.start, s.last), max(s.start, s.last)
	switch {
	case e.linear():
		h = e.conductance(s.start) / e.area
		if !s.problem.Opposite.IsZero() {
			h = max(h, s.largestFace())
		}
		s.span = math.Abs(s.start - s.limit)
		switch {
		case s.moving != nil:
			low, high = s.moving.span()
		case s.path != nil:
			low, high, _, _ = s.passed()
		}
		return h, low, high
	case s.path == nil: // a law that is steepest where it is farthest from its limit
		s.span = math.Abs(s.start - s.limit)
		for _, kelvin := range []float64{s.start, s.limit + 0.01*(s.start-s.limit)} {
			if out, err := e.bare(0, kelvin); err == nil && kelvin != s.limit {
				h = max(h, (out-e.source)/(kelvin-s.limit)/e.area)
			}
		}
		return h, low, high
	}
	low, high, far, largest := s.passed()
	if !s.limitKnown {
		if s.span = high - low; s.span > 0 {
			h = largest / s.span / e.area
		}
		return h, low, high
	}
	s.span = far
	s.path.Nodes(func(_, y, rate float64) bool {
		kelvin, err := s.content.temperature(y)
		if d := kelvin - s.limit; err == nil && math.Abs(d) > 0.01*far {
			h = max(h, -rate*s.content.capacity/d/e.area)
		}
		return true
	})
	return h, low, high
}

// largestFace returns the larger coefficient of two faces that differ.
func (s *Solution) largestFace() float64 {
	front, back, _ := faceAreas(s.problem.Body)
	of := func(c exchange, area float64) float64 { return c.conductance(s.start) / area }
	one, other := exchange{factor: s.exchange.factor}, exchange{factor: s.exchange.factor}
	one.add(s.problem.Surface, front)
	other.add(s.problem.Opposite, back)
	return max(of(one, front), of(other, back))
}

// passed returns the lowest and highest temperature of the path, the largest distance from the limit, and
// the largest power that came or went.
func (s *Solution) passed() (low, high, far, largest float64) {
	low, high = math.Inf(1), math.Inf(-1)
	s.path.Nodes(func(_, y, rate float64) bool {
		kelvin, err := s.content.temperature(y)
		if err != nil {
			return true
		}
		low, high = min(low, kelvin), max(high, kelvin)
		far = max(far, math.Abs(kelvin-s.limit))
		largest = max(largest, math.Abs(rate)*s.content.capacity)
		return true
	})
	return low, high, far, largest
}

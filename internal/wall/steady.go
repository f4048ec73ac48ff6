package wall

import "math"

// Drive is what acts on a body: the excess of the surroundings over a reference at a face that exchanges heat, what
// leaves through one that does not (over k/L), and a uniform source G = g L²/k.
type Drive struct {
	Ua, Ub float64
	Qa, Qb float64 // only where H is 0
	G      float64
}

// A Steady is what a body comes to: T = Ta − J u + (G − rise) p, and, if no face exchanges heat, a rise of all with Fo.
type Steady struct {
	body *Body
	ta   float64 // at the inner face or the centre
	flow float64 // J, through the inner face outwards, per area of the outer one
	g    float64 // G less the rise
	Rise float64 // dT/dFo
	Mean float64
	out  float64 // through the outer face
}

// Steady returns the steady state, whose mean is 0 if no face exchanges heat.
func (m *Modes) Steady(d Drive) Steady {
	b := &m.Body
	inside, volume := b.Inside(), b.Volume(1)
	s := Steady{body: b, g: d.G}
	resistance, bulge := 0.0, b.Bulge(1)
	if !b.Solid {
		resistance = b.Resistance(1)
	}
	ra, rb := 1/(inside*m.Ha), 1/m.Hb
	switch {
	case m.Ha > 0 && m.Hb > 0:
		s.flow = (d.Ua - d.Ub + d.G*(bulge-volume*rb)) / (ra + resistance + rb)
		if ra < rb { // from the nearer end
			s.ta = d.Ua - s.flow*ra
		} else {
			s.ta = d.Ub + (s.flow+d.G*volume)*rb + s.flow*resistance - d.G*bulge
		}
	case m.Hb > 0:
		s.flow = -inside * d.Qa
		s.ta = d.Ub + (s.flow+d.G*volume)*rb + s.flow*resistance - d.G*bulge
	case m.Ha > 0:
		s.flow = d.Qb - d.G*volume
		s.ta = d.Ua - s.flow*ra
	default:
		s.flow = -inside * d.Qa
		s.Rise = d.G - (d.Qb+inside*d.Qa)/volume
		s.g -= s.Rise
		s.ta = -b.Integrate(s.At) / volume
	}
	s.out = s.flow + s.g*volume
	if m.Hb == 0 {
		s.out = d.Qb
	}
	if m.Ha > 0 || m.Hb > 0 {
		s.Mean = b.Integrate(s.At) / volume
	}
	return s
}

// At returns the temperature at y, less the rise.
func (s *Steady) At(y float64) float64 {
	t := s.ta
	if s.g != 0 {
		t += s.g * s.body.Bulge(y)
	}
	if s.flow != 0 {
		t -= s.flow * s.body.Resistance(y)
	}
	return t
}

// Inside returns what leaves through the inner face, per its area.
func (s *Steady) Inside() float64 {
	if w := s.body.Inside(); w > 0 {
		return -s.flow / w
	}
	return 0
}

// Outside returns what leaves through the outer face, per its area.
func (s *Steady) Outside() float64 { return s.out }

// Size returns about the largest |T|.
func (s *Steady) Size() float64 {
	return math.Max(math.Abs(s.At(0)), math.Max(math.Abs(s.At(1)), math.Abs(s.Mean)))
}

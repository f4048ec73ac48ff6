package lumped

import (
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units/shape"
)

// A comparison sets the exact solution over Fo = α t/R² beside the lumped one, at a place.
type comparison struct {
	factors []compared
	mean    bool
	decay   float64 // of the lumped θ over Fo
	delayed float64 // amplitude of the place above the mean to first order
	rate    float64 // at which that sets in, over Fo
	bi      float64
}

// A compared factor is a body of one coordinate.
type compared struct {
	modes eigen.Solution
	ratio float64 // its Fourier number over that of the first
	x     float64
}

// comparison returns what the error is found from. Body and place are those of the solution, or what stands for them.
func (s *Solution) comparison(place shape.Place) (*comparison, error) {
	m := &comparison{mean: place.IsMean(), bi: s.biot.Conduction}
	r := s.wayOut()
	factors := s.problem.Body.Factors()
	x, position := 0.0, error(nil)
	if !m.mean {
		x, position = place.Position(s.problem.Body)
	}
	k := s.biot.Conductivity.SI()
	kind, bi, one := s.tabulated()
	switch {
	case one && position != nil:
		return nil, position
	case one: // with the Biot number of the plate that stands for a hollow body
		m.factors = []compared{{[]func(float64) eigen.Solution{plateModes, cylinderModes, sphereModes}[kind](bi), 1, x}}
		m.bi = bi
		m.decay = bi * float64(1+kind)
	case factors != nil:
		if position != nil {
			return nil, position
		}
		for i, f := range factors {
			length := f.ConductionLength().SI()
			h := s.biot.Coefficient.SI()
			modes := plateModes
			if f.Family() == shape.Cylindrical {
				modes = cylinderModes
			}
			c := compared{modes(h * length / k), r * r / length / length, 0}
			if i == 0 {
				c.x = x
			}
			m.factors = append(m.factors, c)
		}
		m.decay = s.biot.Conduction * r / s.length
	default: // a cube of the same V/A
		edge := 3 * s.length
		c := compared{plateModes(s.biot.Coefficient.SI() * edge / k), 1, 0}
		m.factors = []compared{c, c, c}
		if position == nil {
			m.factors[0].x = x
		}
		r = edge
		m.bi = s.biot.Coefficient.SI() * edge / k
		m.decay = 3 * m.bi
	}
	if s.inside != nil && s.inside.known {
		above, centre, length, err := s.standIn(place, kind, one, x)
		if err != nil {
			return nil, err
		}
		damping := s.exchange.damping()
		m.delayed = m.bi * damping * above / r
		m.decay *= damping
		m.rate = r * r / (length * centre)
	}
	return m, nil
}

// standIn returns the profile at a place and at the centre, and V/A, of the body that the exact solution is for.
func (s *Solution) standIn(place shape.Place, kind int, one bool, x float64) (above, centre, length float64, err error) {
	if !one {
		above, err = s.inside.of(place, s.problem.Body)
		return above, s.inside.centre, s.length, err
	}
	r, dimensions := s.wayOut(), float64(1+kind)
	mean := 1 / (2 + dimensions) // of the half of 1 − x²
	if !place.IsMean() {
		above = r * ((1-x*x)/2 - mean)
	}
	return above, r * (0.5 - mean), r / dimensions, nil
}

func plateModes(bi float64) eigen.Solution    { return eigen.NewPlate(bi) }
func cylinderModes(bi float64) eigen.Solution { return eigen.NewCylinder(bi) }
func sphereModes(bi float64) eigen.Solution   { return eigen.NewSphere(bi) }

// exact returns the exact θ.
func (m *comparison) exact(fo float64) float64 {
	theta := 1.0
	for i := range m.factors {
		f := &m.factors[i]
		if m.mean {
			theta *= f.modes.Mean(fo * f.ratio)
		} else {
			theta *= f.modes.At(f.x, fo*f.ratio)
		}
	}
	return theta
}

// lumped returns θ of the lumped solution.
func (m *comparison) lumped(fo float64) float64 {
	theta := math.Exp(-m.decay * fo)
	if m.delayed != 0 {
		theta *= 1 - m.delayed*math.Expm1(-m.rate*fo)
	}
	return theta
}

// timeTo returns the Fourier number at which the exact solution has fallen to theta.
func (m *comparison) timeTo(theta float64) (float64, bool) {
	if len(m.factors) == 1 {
		if m.mean {
			return m.factors[0].modes.TimeOfMean(theta)
		}
		return m.factors[0].modes.TimeAt(m.factors[0].x, theta)
	}
	coefficient, rate := 1.0, 0.0
	for i := range m.factors {
		f := &m.factors[i]
		c, mean := f.modes.OneTerm(f.x, 0)
		if m.mean {
			c = mean
		}
		coefficient *= c
		rate += f.ratio * f.modes.Decay()
	}
	return eigen.Fall(m.exact, coefficient, rate, theta)
}

const (
	pointsPerDecade = 32
	boundMargin     = 1.02  // more than what a maximum between two points can add
	boundRounding   = 1e-14 // rounding of the series
)

// largest returns a bound on |θ_exact − θ_lumped| over all Fo.
//
// The difference rises while heat from the inside is on its way and falls with the slower of both
// exponentials; over ln Fo it is smooth on the scale of 1. At the surface the first thing that happens
// is a fall by 2 Bi √(Fo/π), so the scan starts where that is a hundredth of its later size.
func (m *comparison) largest() float64 {
	if m.bi == 0 {
		return 0
	}
	first := 1e-4 * min(1, 1/(m.bi*m.bi))
	last := 30 * max(1/m.decay, 0.1)
	n := int(pointsPerDecade*math.Log10(last/first)) + 1
	largest := 0.0
	for i := range n + 1 {
		fo := first * math.Pow(last/first, float64(i)/float64(n))
		largest = max(largest, math.Abs(m.exact(fo)-m.lumped(fo)))
	}
	return min(1, boundMargin*largest+boundRounding)
}

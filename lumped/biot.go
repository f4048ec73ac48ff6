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

// Biot returns the Biot number of the run, with the conductivity where it is least. For an exchange
// function the coefficient is the largest q/(T − T_limit) over the run, while |T − T_limit| is above
// a hundredth of its largest value; where no limit is known it is the largest |q| over the span of
// temperature that the body has passed.
func (s *Solution) Biot() Biot {
	if s == nil {
		return Biot{}
	}
	return s.biot
}

// groups fills the Biot number and the span of temperature that goes with it.
func (s *Solution) groups() error {
	if !isFinite(s.rate) {
		return &units.ArgumentError{Field: "surface condition: heat transfer coefficient", Value: s.coefficientGiven(), Accepted: "one with a time constant ρ c (V/A)/h above 0 s"}
	}
	h, low, high := s.coefficient()
	k, at, err := leastConductivity(s.problem.Material, low, high)
	if err != nil {
		return err
	}
	s.leastAt = at
	s.biot = Biot{
		Conduction:   h * s.problem.Body.ConductionLength().SI() / k,
		Volume:       h * s.length / k,
		Coefficient:  units.WattPerSquareMetreKelvin.Of(h),
		Conductivity: units.WattPerMetreKelvin.Of(k),
	}
	return units.CheckNumber("Biot number", s.biot.Conduction, 0, math.MaxFloat64)
}

// coefficientGiven returns the constant h of the problem.
func (s *Solution) coefficientGiven() units.HeatTransferCoefficient {
	h, _, _ := s.problem.Surface.Constants()
	return h
}

// coefficient returns the heat transfer coefficient of the run, and the lowest and highest temperature
// of the run in kelvin.
func (s *Solution) coefficient() (h, low, high float64) {
	_, _, ok := s.problem.Surface.Constants()
	if s.closed {
		s.span = math.Abs(s.excess)
		return s.coefficientGiven().SI(), min(s.start, s.limit), max(s.start, s.limit)
	}
	low, high = math.Inf(1), math.Inf(-1)
	reference, farthest, largest := s.limit, 0.0, 0.0
	s.path.Nodes(func(_, y, rate float64) bool {
		kelvin, err := s.temperature(y)
		if err != nil {
			return true
		}
		low, high = min(low, kelvin), max(high, kelvin)
		farthest = max(farthest, math.Abs(kelvin-reference))
		largest = max(largest, math.Abs(rate)*s.perFlux())
		return true
	})
	switch {
	case ok:
		s.span = math.Abs(s.start - s.limit)
		return s.coefficientGiven().SI(), low, high
	case !s.limitKnown:
		if s.span = high - low; s.span > 0 {
			h = largest / s.span
		}
		return h, low, high
	}
	s.span = farthest
	s.path.Nodes(func(_, y, rate float64) bool {
		kelvin, err := s.temperature(y)
		if d := kelvin - reference; err == nil && math.Abs(d) > 0.01*farthest {
			h = max(h, -rate*s.perFlux()/d)
		}
		return true
	})
	return h, low, high
}

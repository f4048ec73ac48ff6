package surface

import (
	"fmt"

	"example.com/coolward/units"
)

// Scaled is another part times a factor: one measured on the very body, one for roughness, or the 1 of
// a part whose band is wider than that of its source.
type Scaled struct {
	Part   Part
	Factor float64 // above 0

	// FactorLow and FactorHigh enclose what the factor may be, for Low and High. Both 0 means that no
	// band is stated. They widen the band of the part itself, which Low and High take as well.
	FactorLow, FactorHigh float64
}

// Name returns the name of the part.
func (s Scaled) Name() string {
	if s.Part == nil {
		return "scaled"
	}
	return s.Part.Name()
}

// Check returns the error of the part, and an [*units.ArgumentError] if there is none, for a factor that
// is not finite and above 0, and for a band that does not enclose it.
func (s Scaled) Check() error {
	if err := s.check(); err != nil {
		return err
	}
	return s.Part.Check()
}

func (s *Scaled) check() error {
	if s.Part == nil {
		return &units.ArgumentError{Field: "scaled: part", Accepted: "a part to scale, such as surface.Convection"}
	}
	if !positive(s.Factor) {
		return &units.ArgumentError{Field: "scaled: factor", Value: s.Factor, Accepted: "finite and above 0"}
	}
	if s.FactorLow == 0 && s.FactorHigh == 0 {
		return nil
	}
	if !(s.FactorLow > 0 && s.FactorLow <= s.Factor) {
		return &units.ArgumentError{Field: "scaled: lower factor", Value: s.FactorLow, Accepted: "above 0, to the factor"}
	}
	if !(s.FactorHigh >= s.Factor && positive(s.FactorHigh)) {
		return &units.ArgumentError{Field: "scaled: upper factor", Value: s.FactorHigh, Accepted: "finite, from the factor up"}
	}
	return nil
}

// Flux returns the flux of the part times the factor. Its errors are those of [Scaled.Check] and of the
// part.
func (s Scaled) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := s.check(); err != nil {
		return units.HeatFlux{}, err
	}
	q, err := s.Part.Flux(t, wall)
	if err != nil {
		return units.HeatFlux{}, err
	}
	return finite("scaled: flux", s.Factor*q.SI())
}

// Low returns the part at its lower end times the lower factor.
func (s Scaled) Low() Part { return s.at(s.FactorLow, Part.Low) }

// High returns the part at its upper end times the upper factor.
func (s Scaled) High() Part { return s.at(s.FactorHigh, Part.High) }

// at fixes part and factor. One that fails its check stays as it is, so that it goes on failing.
func (s Scaled) at(factor float64, end func(Part) Part) Part {
	if s.check() != nil {
		return s
	}
	if factor == 0 {
		factor = s.Factor
	}
	return Scaled{Part: end(s.Part), Factor: factor}
}

// Sources returns those of the part.
func (s Scaled) Sources() []string { return Sum{s.Part}.Sources() }

// Notes returns those of the part, and the factor.
func (s Scaled) Notes() []string {
	return append(Sum{s.Part}.Notes(), fmt.Sprintf("%s: times %.4g, as the caller states", s.Name(), s.Factor))
}

// Warnings returns those of the part.
func (s Scaled) Warnings() []string { return Sum{s.Part}.Warnings() }

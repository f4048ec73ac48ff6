package surface

import "example.com/coolward/units"

// Solar is what a surface absorbs of the light of the sun, or of any other lamp that is far hotter than
// the surface: absorptivity times irradiance. It is a heat flux into the body, so that its flux is
// negative.
//
// The irradiance is the mean over the surface of the body: a sphere in a beam catches a quarter of that on a
// plane across the beam, for it casts a shadow of a quarter of its surface. Absorptivity is not emissivity:
// white paint absorbs a quarter of the sunlight and emits nine tenths (common values, from memory).
type Solar struct {
	Absorptivity float64 // for sunlight, above 0, to 1

	// AbsorptivityLow and AbsorptivityHigh enclose what the absorptivity may be. Both 0 means that no
	// band is stated.
	AbsorptivityLow, AbsorptivityHigh float64

	Irradiance units.HeatFlux // mean over the surface, 0 or above

	// Course gives the irradiance as it goes with time, in place of Irradiance, which is 0 then.
	Course FluxCourse
}

// Name returns "sunlight".
func (s Solar) Name() string { return "sunlight" }

// Check returns an [*units.ArgumentError] for an absorptivity that is not above 0 and at most 1, for a
// band that does not enclose it, for an irradiance below 0, and for both an irradiance and a course.
func (s Solar) Check() error {
	if !(s.Absorptivity > 0 && s.Absorptivity <= 1) {
		return &units.ArgumentError{Field: "sunlight: absorptivity", Value: s.Absorptivity, Accepted: "above 0, to 1"}
	}
	if s.hasBand() {
		if !(s.AbsorptivityLow > 0 && s.AbsorptivityLow <= s.Absorptivity) {
			return &units.ArgumentError{Field: "sunlight: lower absorptivity", Value: s.AbsorptivityLow, Accepted: "above 0, to the absorptivity"}
		}
		if !(s.AbsorptivityHigh >= s.Absorptivity && s.AbsorptivityHigh <= 1) {
			return &units.ArgumentError{Field: "sunlight: upper absorptivity", Value: s.AbsorptivityHigh, Accepted: "from the absorptivity to 1"}
		}
	}
	if s.Course != nil && s.Irradiance.SI() != 0 {
		return &units.ArgumentError{Field: "sunlight: irradiance", Value: s.Irradiance, Accepted: "0 where there is a course"}
	}
	return units.CheckNotNegative("sunlight: irradiance", s.Irradiance)
}

func (s Solar) hasBand() bool { return s.AbsorptivityLow != 0 || s.AbsorptivityHigh != 0 }

// Flux returns −absorptivity × irradiance, whatever the temperature of the wall. Its errors are those of
// [Solar.Check] and of the course, and an [*units.ArgumentError] for a course that gives less than 0.
func (s Solar) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := s.Check(); err != nil {
		return units.HeatFlux{}, err
	}
	g := s.Irradiance
	if s.Course != nil {
		var err error
		if g, err = s.Course(t); err != nil {
			return units.HeatFlux{}, err
		}
		if err = units.CheckNotNegative("sunlight: irradiance of the course", g); err != nil {
			return units.HeatFlux{}, err
		}
	}
	return finite("sunlight: flux", 0-s.Absorptivity*g.SI())
}

// Low returns the same light with the upper absorptivity, the one that takes less heat out of the body.
func (s Solar) Low() Part { return s.at(s.AbsorptivityHigh) }

// High returns the same light with the lower absorptivity.
func (s Solar) High() Part { return s.at(s.AbsorptivityLow) }

// at fixes the absorptivity. One that fails its check stays as it is, so that it goes on failing.
func (s Solar) at(absorptivity float64) Part {
	if s.hasBand() && s.Check() == nil {
		s.Absorptivity, s.AbsorptivityLow, s.AbsorptivityHigh = absorptivity, 0, 0
	}
	return s
}

// Sources returns nothing: the caller knows where the figures are from.
func (s Solar) Sources() []string { return nil }

// Notes returns the assumptions.
func (s Solar) Notes() []string {
	return []string{"sunlight: absorptivity times the irradiance, mean over the surface"}
}

// Warnings returns nothing.
func (s Solar) Warnings() []string { return nil }

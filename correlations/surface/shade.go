package surface

import (
	"fmt"

	"example.com/coolward/units"
)

// Shade is a surface of one temperature of which a share is covered and the rest is open: the side away
// from the sun, the face that stands on a bench, the part that is wet. Either part may be nil, and no heat
// passes there.
type Shade struct {
	Share   float64 // of the surface that is covered, from 0 to 1
	Covered Part
	Open    Part
}

// Name returns the names of both parts.
func (s Shade) Name() string {
	switch {
	case s.Covered == nil && s.Open == nil:
		return "shade"
	case s.Covered == nil:
		return s.Open.Name()
	case s.Open == nil || s.Open.Name() == s.Covered.Name():
		return s.Covered.Name()
	}
	return s.Covered.Name() + " and " + s.Open.Name()
}

// Check returns the error of a part, and an [*units.ArgumentError] if there is no part at all or the
// share is not from 0 to 1.
func (s Shade) Check() error {
	if err := s.check(); err != nil {
		return err
	}
	for _, p := range [...]Part{s.Covered, s.Open} {
		if p != nil {
			if err := p.Check(); err != nil {
				return err
			}
		}
	}
	return nil
}

func (s *Shade) check() error {
	if s.Covered == nil && s.Open == nil {
		return &units.ArgumentError{Field: "shade: parts", Accepted: "a covered or an open part, such as surface.Radiation"}
	}
	return units.CheckNumber("shade: share", s.Share, 0, 1)
}

// Flux returns the mean flux over the surface. Its errors are those of [Shade.Check] and of the parts.
func (s Shade) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := s.check(); err != nil {
		return units.HeatFlux{}, err
	}
	total := 0.0
	if s.Covered != nil {
		q, err := s.Covered.Flux(t, wall)
		if err != nil {
			return units.HeatFlux{}, err
		}
		total = s.Share * q.SI()
	}
	if s.Open != nil {
		q, err := s.Open.Flux(t, wall)
		if err != nil {
			return units.HeatFlux{}, err
		}
		total += (1 - s.Share) * q.SI()
	}
	return finite("shade: flux", total)
}

// Low returns the same shade with both parts at their lower ends.
func (s Shade) Low() Part { return s.each(Part.Low) }

// High returns the same shade with both parts at their upper ends.
func (s Shade) High() Part { return s.each(Part.High) }

func (s Shade) each(end func(Part) Part) Part {
	if s.Covered != nil {
		s.Covered = end(s.Covered)
	}
	if s.Open != nil {
		s.Open = end(s.Open)
	}
	return s
}

// Sources returns those of both parts.
func (s Shade) Sources() []string { return Sum{s.Covered, s.Open}.Sources() }

// Notes returns those of both parts, and the share.
func (s Shade) Notes() []string {
	return append(Sum{s.Covered, s.Open}.Notes(),
		fmt.Sprintf("%s: %.3g %% of the surface is covered, and all of it has one temperature", s.Name(), 100*s.Share))
}

// Warnings returns those of both parts.
func (s Shade) Warnings() []string { return Sum{s.Covered, s.Open}.Warnings() }

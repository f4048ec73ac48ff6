package lumped

import (
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// An inside is what a solution to first order knows of the inside of the body.
type inside struct {
	profile
	conductivity float64
	rate         float64 // at which the profile sets in, 1/s
}

// countInside takes the resistance inside into account: the surface is below the mean temperature by q r/k, which lowers the
// exchange, and the other places are where the profile has them. The profile sets in as 1 − exp(−t/t1), with t1 such that
// the centre starts without a slope.
func (s *Solution) countInside() error {
	k, err := s.initialConductivity()
	if err != nil {
		return err
	}
	in := &inside{profile: newProfile(s.problem.Body), conductivity: k}
	in.rate = k * s.exchange.area / (s.content.capacity * in.centre)
	s.exchange.insulate = in.resistance / (k * s.exchange.area)
	if !(in.rate > 0) || !isFinite(in.rate) || !isFinite(s.exchange.insulate) {
		return &units.ArgumentError{Field: "material: conductivity", Value: units.WattPerMetreKelvin.Of(k), Accepted: "one that gives a finite resistance inside the body"}
	}
	s.inside = in
	return nil
}

// initialConductivity returns the least conductivity of the materials at the start.
func (s *Solution) initialConductivity() (float64, error) {
	least := math.Inf(1)
	for i := range s.content.portions {
		k, err := s.content.portions[i].material.Conductivity(s.problem.Initial)
		if err != nil {
			return 0, err
		}
		if err := units.CheckPositive("material: conductivity", k); err != nil {
			return 0, err
		}
		least = min(least, k.SI())
	}
	return least, nil
}

// above returns how far a place is above the mean, which is given in kelvin.
func (s *Solution) above(place shape.Place, seconds, mean float64) (float64, error) {
	out, err := s.exchange.out(seconds, mean)
	if err != nil {
		return 0, err
	}
	u, err := s.inside.of(place, s.problem.Body)
	return out / s.exchange.area / s.inside.conductivity * u * -math.Expm1(-s.inside.rate*seconds), err
}

// of returns the profile at a place.
func (in *inside) of(place shape.Place, body shape.Body) (float64, error) {
	switch place {
	case shape.Mean():
		return 0, nil
	case shape.Centre():
		return in.centre, nil
	case shape.Surface():
		return in.surface, nil
	}
	if !in.known {
		return 0, &units.ArgumentError{Field: "place", Value: place.String(), Accepted: "in " + body.String() + ": centre, surface or mean"}
	}
	if len(in.walls) == 1 {
		depth, err := place.Depth(body)
		return in.profile.above(depth.SI()), err
	}
	x, err := place.Position(body)
	return in.profile.above((1 - x) * body.ConductionLength().SI()), err
}

// InternalDifference returns how far the centre is above the surface at time t, to first order in the Biot number: by the profile that
// the flux of that time keeps up in steady cooling. It is positive while the body gives off heat. It is
// exact at late times for small Biot numbers, too large before the profile has set in, and for bodies in which heat
// flows along coordinates that do not part it is that of a cube of the same V/A. Errors are those of Mean, of the
// exchange and of the material.
func (s *Solution) InternalDifference(t units.Duration) (units.TemperatureDifference, error) {
	if err := s.usable(); err != nil {
		return units.TemperatureDifference{}, err
	}
	kelvin, err := s.mean(t.SI())
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	out, err := s.exchange.out(t.SI(), kelvin)
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	k, err := s.initialConductivity()
	if err != nil {
		return units.TemperatureDifference{}, err
	}
	p := newProfile(s.problem.Body)
	d := units.KelvinDifference.Of(out / s.exchange.area * (p.centre - p.surface) / k)
	return d, units.CheckFinite("internal difference", d)
}

// timeInside returns when a place that differs from the mean is at the target.
func (s *Solution) timeInside(place shape.Place, target units.Temperature) (units.Duration, error) {
	all, err := s.Crossings(place, target)
	if err != nil {
		return units.Duration{}, err
	}
	if len(all) > 0 {
		return all[0].Time, nil
	}
	if s.path == nil && s.moving == nil {
		return s.lawTimeTo(place, target)
	}
	return units.Duration{}, s.notReached(place, target)
}

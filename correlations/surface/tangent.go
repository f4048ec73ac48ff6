package surface

import (
	"gonum.org/v1/gonum/diff/fd"

	"example.com/coolward/units"
)

// A Tangent is an exchange made linear at one wall temperature, q ≈ flux + coefficient (T − wall). A model
// that needs a constant coefficient takes Coefficient and Ambient from it; they hold near that wall
// temperature only.
type Tangent struct {
	Wall units.Temperature
	Flux units.HeatFlux // at Wall

	// Coefficient is dq/dT. It is not the flux over a difference of temperatures; for natural convection
	// it is a quarter larger. Where a flux falls as the wall gets hotter, as between the greatest and the
	// least flux of boiling, it is negative.
	Coefficient units.HeatTransferCoefficient
}

// Tangent returns the sum made linear at time t and temperature wall, by differences of wall 2e-5
// around it, and on one side only where the sum has no flux on the other. Its errors are those of [Sum.Flux].
func (s Sum) Tangent(t units.Duration, wall units.Temperature) (Tangent, error) {
	q, err := s.Flux(t, wall)
	if err != nil {
		return Tangent{}, err
	}
	step := 1e-5 * wall.SI()
	var slope float64
	for _, way := range [...]fd.Formula{fd.Central, fd.Forward, fd.Backward} {
		err = nil
		slope = fd.Derivative(func(T float64) float64 {
			side, e := s.Flux(t, units.Kelvin.Of(T))
			if e != nil {
				err = e
			}
			return side.SI()
		}, wall.SI(), &fd.Settings{Formula: way, Step: step, OriginKnown: true, OriginValue: q.SI()})
		if err == nil {
			break
		}
	}
	if err != nil {
		return Tangent{}, err
	}
	x := Tangent{Wall: wall, Flux: q, Coefficient: units.WattPerSquareMetreKelvin.Of(slope)}
	return x, units.CheckFinite("tangent: coefficient", x.Coefficient)
}

// Ambient returns the temperature at which the tangent has no flux, wall − flux/coefficient. It returns an
// [*units.ArgumentError] if there is none above 0 K, such as for a flux that does not depend on the wall.
func (x Tangent) Ambient() (units.Temperature, error) {
	T := units.Kelvin.Of(x.Wall.SI() - x.Flux.SI()/x.Coefficient.SI())
	if x.Flux.SI() == 0 {
		T = x.Wall
	}
	if err := units.CheckTemperature("tangent: ambient", T); err != nil {
		return units.Temperature{}, err
	}
	return T, nil
}

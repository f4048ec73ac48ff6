package surface

import (
	"math"

	"example.com/coolward/internal/physics"
	"example.com/coolward/units"
)

// Radiation is the heat that a small grey convex body gives to large surroundings of one temperature,
//
//	q = ε σ (T⁴ − Tsur⁴)
//
// A body is small if its surface is a few per cent of that of the enclosure or less; the emissivity of
// the enclosure is then of no account. The surroundings are not the air: a window, a hot neighbour or
// the night sky may be far from its temperature.
type Radiation struct {
	Emissivity float64 // total hemispherical emissivity of the surface, above 0, to 1

	// EmissivityLow and EmissivityHigh enclose what the emissivity may be, for Low and High. Both 0
	// means that no band is stated.
	EmissivityLow, EmissivityHigh float64

	Surroundings units.Temperature
}

// Name returns "radiation".
func (r Radiation) Name() string { return "radiation" }

// Check returns an [*units.ArgumentError] for an emissivity that is not above 0 and at most 1, for a
// band that does not enclose it, and for surroundings that are not above 0 K.
func (r Radiation) Check() error {
	if !(r.Emissivity > 0 && r.Emissivity <= 1) {
		return &units.ArgumentError{Field: "radiation: emissivity", Value: r.Emissivity, Accepted: "above 0, to 1"}
	}
	if r.hasBand() {
		if !(r.EmissivityLow > 0 && r.EmissivityLow <= r.Emissivity) {
			return &units.ArgumentError{Field: "radiation: lower emissivity", Value: r.EmissivityLow, Accepted: "above 0, to the emissivity"}
		}
		if !(r.EmissivityHigh >= r.Emissivity && r.EmissivityHigh <= 1) {
			return &units.ArgumentError{Field: "radiation: upper emissivity", Value: r.EmissivityHigh, Accepted: "from the emissivity to 1"}
		}
	}
	return units.CheckTemperature("radiation: surroundings", r.Surroundings)
}

func (r Radiation) hasBand() bool { return r.EmissivityLow != 0 || r.EmissivityHigh != 0 }

// Flux returns the net flux that leaves the surface, negative where the surroundings are hotter. It
// does not depend on t. It returns the errors of [Radiation.Check], and an [*units.ArgumentError] for
// a wall that is not above 0 K.
func (r Radiation) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	h, err := r.Coefficient(wall)
	if err != nil {
		return units.HeatFlux{}, err
	}
	return finite("radiation: flux", h.SI()*(wall.SI()-r.Surroundings.SI()))
}

// Coefficient returns the coefficient that gives the same flux with the difference of wall and
// surroundings, q / (T − Tsur) = ε σ (T² + Tsur²) (T + Tsur). Its errors are those of Flux.
func (r Radiation) Coefficient(wall units.Temperature) (units.HeatTransferCoefficient, error) {
	if err := r.Check(); err != nil {
		return units.HeatTransferCoefficient{}, err
	}
	if err := units.CheckTemperature("radiation: wall", wall); err != nil {
		return units.HeatTransferCoefficient{}, err
	}
	T, S := wall.SI(), r.Surroundings.SI()
	h := r.Emissivity * physics.StefanBoltzmann * (T*T + S*S) * (T + S)
	if !(h <= math.MaxFloat64) {
		return units.HeatTransferCoefficient{}, &units.ArgumentError{Field: "radiation: wall", Value: wall, Accepted: "a temperature that gives a finite coefficient"}
	}
	return units.WattPerSquareMetreKelvin.Of(h), nil
}

// In returns the same radiation in surroundings of another temperature.
func (r Radiation) In(surroundings units.Temperature) Part {
	r.Surroundings = surroundings
	return r
}

// Low returns the same radiation at the lower emissivity.
func (r Radiation) Low() Part { return r.at(r.EmissivityLow) }

// High returns the same radiation at the upper emissivity.
func (r Radiation) High() Part { return r.at(r.EmissivityHigh) }

// at fixes the emissivity. A radiation that fails its check stays as it is, so that it goes on failing.
func (r Radiation) at(emissivity float64) Radiation {
	if r.hasBand() && r.Check() == nil {
		r.Emissivity, r.EmissivityLow, r.EmissivityHigh = emissivity, 0, 0
	}
	return r
}

// Sources returns where the law comes from.
func (r Radiation) Sources() []string {
	return []string{"radiation: Stefan–Boltzmann law with the constant of CODATA 2018, 5.670374419e-8 W/(m² K⁴)"}
}

// Notes returns the assumptions.
func (r Radiation) Notes() []string {
	return []string{"radiation: small grey convex body in large surroundings of one temperature, through a gas that does not take part"}
}

// Warnings returns what a reader must know before using a number from this radiation.
func (r Radiation) Warnings() []string { return nil }

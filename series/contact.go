package series

import (
	"example.com/coolward/units"
)

// A Side is a thick body that is brought into contact with another one.
type Side struct {
	Effusivity  units.Effusivity // √(k ρ c), above 0; see units.EffusivityOf
	Temperature units.Temperature
}

// Contact returns the temperature at which the faces of two thick bodies meet when they touch without a
// resistance in between, the mean weighted with the effusivities. It stays so for as long as both are thick;
// each body is a [SemiInfinite] with boundary.Temperature of it meanwhile (H. S. Carslaw and J. C. Jaeger,
// Conduction of Heat in Solids, 2nd ed., section 2.15, from memory). It returns an [*units.ArgumentError] for a
// side that cannot be.
func Contact(first, second Side) (units.Temperature, error) {
	for _, err := range []error{
		units.CheckPositive("effusivity of the first body", first.Effusivity),
		units.CheckPositive("effusivity of the second body", second.Effusivity),
		units.CheckTemperature("temperature of the first body", first.Temperature),
		units.CheckTemperature("temperature of the second body", second.Temperature),
	} {
		if err != nil {
			return units.Temperature{}, err
		}
	}
	share := 1 / (1 + first.Effusivity.Ratio(second.Effusivity)) // of the second
	a, b := first.Temperature.SI(), second.Temperature.SI()
	return units.Kelvin.Of(a + (b-a)*share), nil
}

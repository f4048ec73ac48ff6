package lumped

import (
	"math"

	"example.com/coolward/units"
)

// A Material is what the body is made of. It must be safe for many goroutines.
//
// A material may also have a method IsConstant() bool; true says that neither the conductivity nor the
// specific heat depends on temperature.
type Material interface {
	Density() units.Density
	Conductivity(units.Temperature) (units.Conductivity, error)
	SpecificHeat(units.Temperature) (units.SpecificHeat, error)
	Enthalpy(units.Temperature) (units.SpecificEnergy, error)    // integral of SpecificHeat, from any zero
	Temperature(units.SpecificEnergy) (units.Temperature, error) // its inverse
	Range() (low, high units.Temperature)
	Kinks() []units.Temperature // where a derivative jumps
}

// between is the number of equal parts into which a span of temperature is divided to look at a
// property; the kinks of the material are looked at besides.
const between = 8

// sample calls visit at temperatures over the closed span from a to b, in no order.
func sample(m Material, a, b float64, visit func(kelvin float64) error) error {
	for i := range between + 1 {
		kelvin := a + (b-a)*float64(i)/between
		if i == between {
			kelvin = b
		}
		if err := visit(kelvin); err != nil {
			return err
		}
		if a == b {
			break
		}
	}
	low, high := min(a, b), max(a, b)
	for _, kink := range m.Kinks() {
		if k := kink.SI(); k > low && k < high {
			if err := visit(k); err != nil {
				return err
			}
		}
	}
	return nil
}

// constantBetween reports whether enthalpy is linear in temperature from a to b, which the closed
// form needs: the material says so, or its specific heat is the same number and its enthalpy on one
// line (so that no latent heat lies between) wherever it is sampled. An error of the material means
// no.
func constantBetween(m Material, a, b float64) bool {
	if says, ok := m.(interface{ IsConstant() bool }); ok && says.IsConstant() {
		_, err := m.SpecificHeat(units.Kelvin.Of(b))
		return err == nil
	}
	c, err := m.SpecificHeat(units.Kelvin.Of(a))
	if err != nil {
		return false
	}
	h, err := m.Enthalpy(units.Kelvin.Of(a))
	if err != nil {
		return false
	}
	same := true
	err = sample(m, a, b, func(kelvin float64) error {
		ci, err := m.SpecificHeat(units.Kelvin.Of(kelvin))
		if err != nil {
			return err
		}
		hi, err := m.Enthalpy(units.Kelvin.Of(kelvin))
		if err != nil {
			return err
		}
		rise := c.SI() * (kelvin - a)
		same = same && ci == c && math.Abs(hi.SI()-h.SI()-rise) <= 1e-9*math.Abs(rise)+1e-14*math.Abs(h.SI())
		return nil
	})
	return err == nil && same
}

// leastConductivity returns the least conductivity sampled from a to b, and where.
func leastConductivity(m Material, a, b float64) (k, kelvin float64, err error) {
	k = math.Inf(1)
	visit := func(at float64) error {
		ki, err := m.Conductivity(units.Kelvin.Of(at))
		if err != nil {
			return err
		}
		if err := units.CheckPositive("material: conductivity", ki); err != nil {
			return err
		}
		if ki.SI() < k {
			k, kelvin = ki.SI(), at
		}
		return nil
	}
	if says, ok := m.(interface{ IsConstant() bool }); ok && says.IsConstant() {
		err = visit(a)
		return k, kelvin, err
	}
	err = sample(m, a, b, visit)
	return k, kelvin, err
}

package surface

import (
	"math"

	"example.com/coolward/units"
)

// ContactSource is where the conductance of a [Contact] comes from.
const ContactSource = "M. G. Cooper, B. B. Mikic and M. M. Yovanovich, Thermal contact conductance, Int. J. Heat Mass Transfer 12 (1969) 279-300, with the constants of M. M. Yovanovich (1982): " +
	"form and exponent read in a handbook, the constant 1.25 and the gap from memory"

// contactScatter is how far experiments lie from the formula, from memory.
const contactScatter = 0.20

// Contact is the heat that a body gives to a solid that is pressed against it and held at one temperature. The
// conductance of the joint is that of two flat rough surfaces that meet at their peaks, and of the gas
// between them, after [ContactSource],
//
//	h = 1.25 k m/σ (p/H)^0.95 + kg / (1.53 σ (p/H)^(−0.097) + M)
//
// with the harmonic mean k = 2 k1 k2/(k1 + k2). It is for surfaces that fit, without oxide, oil or waviness: a
// real joint can be several times worse. For a conductance that is known there is [GivenCoefficient].
//
// The body touches on all of its surface; where it does on a share of it only, see [Shade].
type Contact struct {
	Body, Solid units.Conductivity // of the two, above 0
	Roughness   units.Length       // σ: root of the sum of the squares of both rms roughnesses
	Slope       float64            // m: root of the sum of the squares of both mean absolute slopes of the profiles
	Pressure    units.Pressure     // p, that presses them together
	Hardness    units.Pressure     // H: contact microhardness of the softer one

	// Gas is the conductivity of the gas between the peaks; 0 is vacuum. Rarefaction is M of that
	// gas, 0.37 µm for air at 1 atm (from memory); it may be 0.
	Gas         units.Conductivity
	Rarefaction units.Length

	Temperature units.Temperature // of the solid

	limit limit
}

// Name returns "contact".
func (c Contact) Name() string { return "contact" }

// Check returns an [*units.ArgumentError] for a field that cannot be, and a [*units.RangeError] for a pressure over
// hardness outside 1e-6 to 2.3e-2.
func (c Contact) Check() error {
	_, err := c.Conductance()
	return err
}

// Conductance returns the conductance of the joint, ±20 % for surfaces as the formula takes them (from memory). Its errors are those of [Contact.Check].
func (c Contact) Conductance() (units.HeatTransferCoefficient, error) {
	for _, err := range [...]error{
		units.CheckPositive("contact: conductivity of the body", c.Body),
		units.CheckPositive("contact: conductivity of the solid", c.Solid),
		units.CheckPositive("contact: roughness", c.Roughness),
		units.CheckPositive("contact: pressure", c.Pressure),
		units.CheckPositive("contact: hardness", c.Hardness),
		units.CheckNotNegative("contact: conductivity of the gas", c.Gas),
		units.CheckNotNegative("contact: rarefaction", c.Rarefaction),
		units.CheckTemperature("contact: temperature", c.Temperature),
	} {
		if err != nil {
			return units.HeatTransferCoefficient{}, err
		}
	}
	if !positive(c.Slope) {
		return units.HeatTransferCoefficient{}, &units.ArgumentError{Field: "contact: slope", Value: c.Slope, Accepted: "finite and above 0"}
	}
	ratio := c.Pressure.SI() / c.Hardness.SI()
	if !(ratio >= 1e-6 && ratio <= 2.3e-2) {
		return units.HeatTransferCoefficient{}, &units.RangeError{
			Model: "contact conductance", Quantity: "pressure over hardness", Value: units.Number(ratio),
			Min: units.Number(1e-6), Max: units.Number(2.3e-2), Source: ContactSource,
		}
	}
	h := 1.25 * 2 / (1/c.Body.SI() + 1/c.Solid.SI()) * c.Slope / c.Roughness.SI() * math.Pow(ratio, 0.95)
	h += c.Gas.SI() / (1.53*c.Roughness.SI()*math.Pow(ratio, -0.097) + c.Rarefaction.SI())
	conductance := units.WattPerSquareMetreKelvin.Of(h * (1 + float64(c.limit)*contactScatter))
	return conductance, units.CheckPositive("contact: conductance", conductance)
}

// Flux returns the conductance times (wall − temperature of the solid). It does not depend on t. Its errors are those
// of [Contact.Check], and an [*units.ArgumentError] for a wall that is not above 0 K.
func (c Contact) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	h, err := c.Conductance()
	if err != nil {
		return units.HeatFlux{}, err
	}
	if err = units.CheckTemperature("contact: wall", wall); err != nil {
		return units.HeatFlux{}, err
	}
	return finite("contact: flux", h.SI()*(wall.SI()-c.Temperature.SI()))
}

// In returns the same contact with a solid of another temperature.
func (c Contact) In(solid units.Temperature) Part {
	c.Temperature = solid
	return c
}

// Low returns the same contact at the lower limit of the scatter.
func (c Contact) Low() Part {
	c.limit = -1
	return c
}

// High returns the same contact at the upper limit of the scatter.
func (c Contact) High() Part {
	c.limit = +1
	return c
}

// Sources returns the source of the conductance.
func (c Contact) Sources() []string { return []string{"contact: " + ContactSource} }

// Notes returns the assumptions.
func (c Contact) Notes() []string {
	return append([]string{"contact: flat rough surfaces that yield at their peaks, on the whole surface of the body"}, c.limit.notes("contact")...)
}

// Warnings returns what a reader must know before using a number from this contact.
func (c Contact) Warnings() []string {
	return []string{"contact: oxide, oil, waviness or an uneven load can lower the conductance severalfold"}
}

// Package props gives the properties of materials that a calculation of heating and cooling needs, each with its source,
// its range and its uncertainty.
//
// # Fluids
//
// A [Fluid] gives a [FluidState] for a temperature and a pressure: density, specific heat, conductivity, viscosity,
// expansion, and from them the Prandtl number and the diffusivities.
//
//	air, err := props.Air().At(units.Celsius.Of(20), units.StandardAtmosphere.Of(1))
//
//	fluid      temperature           pressure                     uncertainty of ρ, c, k, µ
//	air        200 K to 1200 K       10 kPa to 200 kPa            0.5 %, 1 %, 2.5 %, 1.5 %
//	water      273.15 K to 383.15 K  where it boils to 0.3 MPa    0.02 %, 0.2 %, 1.5 %, 1 %
//
// # Solids
//
// A [Solid] has a constant density, and conductivity, specific heat and enthalpy as functions of the temperature. The enthalpy is
// the integral of the specific heat to rounding, and [Solid.Temperature] is its inverse.
//
//	solid            temperature         source                              uncertainty of ρ, c, k
//	carbon steel     0 °C to 1200 °C     EN 1993-1-2                         1 %, 10 %, 22 %
//	stainless steel  200 K to 1500 K     Incropera et al., AISI 304          2 %, 13 %, 10 %
//	copper           200 K to 1200 K     Incropera et al., pure              1 %, 3 %, 5 %
//	aluminium        200 K to 800 K      Incropera et al., pure              1 %, 3 %, 8 %
//	glass            0 °C to 200 °C      CIBSE Guide A; Sharp and Ginther    2 %, 7 %, 20 %
//	concrete         20 °C to 1200 °C    EN 1992-1-2, dry                    12 %, 12 %, 20 %
//	PVC              0 °C to 60 °C       Crawford                            5 %, 20 %, 15 %
//	softwood         0 °C to 60 °C       EN ISO 10456                        20 %, 20 %, 25 %
//
// The uncertainties are relative, at about 95 %, most of them our own estimate from the scatter between handbooks; the methods
// whose names end in Uncertainty carry them, and UncertaintySource says what they cover.
//
// One's own solid is made from constants by [Constant], from a table by [Tabulated], and from functions by
// [Function]. [Solids] and [Fluids] iterate over those of the package, and [FindSolid] and [FindFluid] look them up by name.
//
// # Ranges
//
// At the end of a range there is still a value; beyond it a [*units.RangeError] that names the property, the substance,
// the value, the limits and the source. Nothing is extrapolated in silence. Where a range is wider than that of its source,
// as for carbon steel below 20 °C, Source says so and gives the reason.
//
// # Sources
//
// Source says of each number whether it was read on a page or stands from memory. Coefficients from memory are used
// because they reproduce the check values of their publication, or agree with an independent formulation.
//
// # Caution
//
// A value from this package is a typical value of a material of that name, not of the piece at hand. Where a result decides about
// safety, such as the fire resistance of a structure or the cooling of food, the local code and a
// person who is licensed to apply it decide, with properties that were measured or that the code prescribes.
package props

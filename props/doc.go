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
//	fluid           temperature           pressure                     uncertainty of ρ, c, k, µ
//	air             200 K to 1500 K       10 kPa to 200 kPa            0.5 %, 1 %, 2.5 %, 1.5 %
//	water           273.15 K to 383.15 K  where it boils to 0.3 MPa    0.02 %, 0.2 %, 1.5 %, 1 %
//	compressed air  100 K to 2000 K       10 kPa to 1 MPa              0.1 %, 1 %, 4 %, 2 %
//	nitrogen        200 K to 1500 K       10 kPa to 200 kPa            0.5 %, 1 %, 2 %, 2 %
//	oxygen          200 K to 1500 K       10 kPa to 200 kPa            0.65 %, 1.1 %, 3 %, 2 %
//	argon           200 K to 2000 K       10 kPa to 200 kPa            0.65 %, 1.4 %, 2 %, 2 %
//	carbon dioxide  250 K to 1500 K       10 kPa to 200 kPa            2 %, 4 %, 4 %, 4 %
//	hydrogen        200 K to 1500 K       10 kPa to 200 kPa            0.3 %, 1 %, 4 %, 3 %
//	helium          200 K to 2000 K       10 kPa to 200 kPa            0.3 %, 0.2 %, 4 %, 4 %
//	engine oil      273 K to 430 K        10 kPa to 1 MPa              1 %, 3 %, 5 %, 10 %
//	glycerin        273 K to 320 K        10 kPa to 1 MPa              0.5 %, 3 %, 5 %, 16 %
//	mercury         273 K to 600 K        60 kPa to 1 MPa              0.2 %, 1 %, 5 %, 3 %
//	sodium          371 K to 1300 K       where it boils to 1 MPa      0.5 %, 3 %, 6 %, 5 %
//	ammonia         210 K to 350 K        where it boils to 5 MPa      1 %, 3 %, 5 %, 5 %
//
// [PressurisedWater] and [Steam] reach further, by the industrial formulation of IAPWS:
//
//	pressurised water  273.15 K to 623.15 K   where it boils to 100 MPa        0.2 %, 1 %, 4 %, 3 %
//	steam              273.15 K to 1073.15 K  1 Pa to where it condenses       0.3 %, 3 %, 5 %, 3 %
//
// [SaturationPressure] and [SaturationTemperature] say where water boils, [EvaporationHeat] and [SurfaceTension] belong to that line,
// [FusionHeat] and [SublimationPressure] to ice. [MoistAir] is air with vapour, from relative humidity, dew point, wet bulb or
// humidity ratio; it is a fluid as well.
//
// [CombustionGas] mixes gases by their mole fractions, [EthyleneGlycol] and [PropyleneGlycol] are solutions by mass fraction, and
// [TabulatedLiquid] makes one's own liquid from a data sheet.
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
//	ice              −100 °C to 0 °C     IAPWS R10-06; Yen                   1.3 %, 2 %, 8 %
//
// [Solids] iterates over these and some 290 more, which [FindSolid] knows by name and [Search] by a part of it:
//
//	metals and alloys          with tables from 100 K, 200 K or 300 K to at most 1500 K; technical alloys 0 °C to 100 °C
//	materials in a fire        Eurocodes: concrete by limit and moisture ([FireConcrete]), stainless steel, aluminium, timber
//	building materials, stone, glass, plastics, rubber, wood, soil, snow    design values near room temperature
//	insulation, ceramics       with the temperatures of their tables
//	foods                      −40 °C to 150 °C, from their composition ([Recipes])
//	human tissue               20 °C to 45 °C
//
// DEVIATIONS.md beside the package has the largest deviation of each solid and fluid from other sources, and lists of those for which there is none.
// [Emissivities] has the emissivity of common surfaces, and [WriteTable] prints properties in any units.
//
// The uncertainties are relative, at about 95 %, most of them our own estimate from the scatter between handbooks; the methods
// whose names end in Uncertainty carry them, and UncertaintySource says what they cover.
//
// One's own solid is made from constants by [Constant], from a table by [Tabulated], from functions by
// [Function], from parts by [Composite], with moisture by [Moist], from the composition of a food by [Food], and with the enthalpy of melting by
// [Melting]. [Fluids] iterates over the fluids, and [FindFluid] looks them up by name.
//
// Latent heat is in the enthalpy: where a pure substance melts the enthalpy jumps, and [Solid.Temperature] stays at the melting point for every
// enthalpy between; where an alloy melts or a food freezes it is spread over temperatures.
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
// safety, such as the fire resistance of a structure, the heating or cooling of food, or the heat that a person bears, the local code and a
// person who is licensed to apply it decide, with properties that were measured or that the code prescribes. [Solid.Caution] says so for the
// solids concerned, and a printed table repeats it.
package props

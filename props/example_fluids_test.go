package props_test

import (
	"errors"
	"fmt"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// How much air a compressor's tank of 500 litres holds at 10 bar.
func ExampleCompressedAir() {
	air, err := props.CompressedAir().At(units.Celsius.Of(25), units.Bar.Of(10))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println("density", air.Density.Text(units.KilogramPerCubicMetre, 4))
	fmt.Printf("mass    %.2f kg\n", air.Density.SI()*units.Litre.Of(500).SI())
	// Output:
	// density 11.72 kg/m³
	// mass    5.86 kg
}

// The moist gas of a burner at 900 °C. Its data begin above 100 °C, because those of steam do.
func ExampleCombustionGas() {
	gas, err := props.CombustionGas("burner gas", props.GasComposition{Nitrogen: 0.71, Oxygen: 0.03, Argon: 0.01, CarbonDioxide: 0.09, Steam: 0.16})
	if err != nil {
		fmt.Println(err)
		return
	}
	p := units.StandardAtmosphere.Of(1)
	hot, err := gas.At(units.Celsius.Of(900), p)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println("specific heat", hot.SpecificHeat.Text(units.KilojoulePerKilogramKelvin, 3))
	fmt.Println("conductivity ", hot.Conductivity.Text(units.MilliwattPerMetreKelvin, 2))
	fmt.Printf("Prandtl       %.2f\n", hot.Prandtl())

	_, err = gas.At(units.Celsius.Of(60), p)
	var r *units.RangeError
	if errors.As(err, &r) {
		fmt.Printf("%s: from %.1f K\n", r.Model, r.Min.SI())
	}
	// Output:
	// specific heat 1.32 kJ/(kg·K)
	// conductivity  81 mW/(m·K)
	// Prandtl       0.76
	// properties of burner gas: from 373.2 K
}

// The brine of a heat pump at −10 °C, and one that is too weak for it.
func ExampleEthyleneGlycol() {
	T, p := units.Celsius.Of(-10), units.Bar.Of(2)
	for _, concentration := range []float64{0.30, 0.20} {
		brine, err := props.EthyleneGlycol(concentration)
		if err != nil {
			fmt.Println(err)
			return
		}
		s, err := brine.At(T, p)
		if err != nil {
			low, _ := brine.Range()
			fmt.Printf("%s begins to freeze at %.1f °C\n", brine.Name(), low.In(units.Celsius))
			continue
		}
		fmt.Println(brine.Name(), "has a viscosity of", s.Viscosity.Text(units.MillipascalSecond, 2))
	}
	// Output:
	// ethylene glycol 30 % has a viscosity of 7.2 mPa·s
	// ethylene glycol 20 % begins to freeze at -7.6 °C
}

// A quench oil from its data sheet.
func ExampleTabulatedLiquid() {
	row := func(t, rho, c, k, nu float64) props.LiquidRow {
		density := units.KilogramPerCubicMetre.Of(rho)
		return props.LiquidRow{
			Temperature:  units.Celsius.Of(t),
			Density:      density,
			SpecificHeat: units.JoulePerKilogramKelvin.Of(c),
			Conductivity: units.WattPerMetreKelvin.Of(k),
			Viscosity:    units.PascalSecond.Of(nu * 1e-6 * density.SI()), // the sheet gives ν in mm²/s
		}
	}
	oil, err := props.TabulatedLiquid("our quench oil", []props.LiquidRow{
		row(20, 871, 1880, 0.133, 38),
		row(40, 858, 1950, 0.132, 16),
		row(70, 838, 2060, 0.130, 6.9),
		row(100, 818, 2170, 0.127, 3.9),
	}, units.Kilopascal.Of(80), units.Kilopascal.Of(300), "data sheet of the oil")
	if err != nil {
		fmt.Println(err)
		return
	}
	s, err := oil.At(units.Celsius.Of(55), units.StandardAtmosphere.Of(1))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(s.Viscosity.Text(units.MillipascalSecond, 2))

	_, err = oil.At(units.Celsius.Of(180), units.StandardAtmosphere.Of(1))
	fmt.Println(err)
	// Output:
	// 8.5 mPa·s
	// properties of our quench oil: temperature 180 °C outside its range, 20 °C to 100 °C (data sheet of the oil)
}

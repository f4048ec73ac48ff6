package props_test

import (
	"fmt"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// Water of a heating main at 16 bar and 140 °C, where [props.Water] has ended.
func ExamplePressurisedWater() {
	water, err := props.PressurisedWater().At(units.Celsius.Of(140), units.Bar.Of(16))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println("density      ", water.Density.Text(units.KilogramPerCubicMetre, 4))
	fmt.Println("specific heat", water.SpecificHeat.Text(units.KilojoulePerKilogramKelvin, 4))
	fmt.Printf("Prandtl number %.2f\n", water.Prandtl())
	// Output:
	// density       926.8 kg/m³
	// specific heat 4.282 kJ/(kg·K)
	// Prandtl number 1.23
}

// Saturated steam in an autoclave at 134 °C.
func ExampleSteam() {
	T := units.Celsius.Of(134)
	p, err := props.SaturationPressure(T)
	if err != nil {
		fmt.Println(err)
		return
	}
	steam, err := props.Steam().At(T, p)
	if err != nil {
		fmt.Println(err)
		return
	}
	heat, err := props.EvaporationHeat(T)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println("pressure", p.Text(units.Kilopascal, 4))
	fmt.Println("density ", steam.Density.Text(units.KilogramPerCubicMetre, 3))
	fmt.Println("heat    ", heat.Text(units.KilojoulePerKilogram, 4))
	// Output:
	// pressure 304.2 kPa
	// density  1.67 kg/m³
	// heat     2162 kJ/kg
}

// Water boils earlier on a mountain at 70 kPa.
func ExampleSaturationTemperature() {
	T, err := props.SaturationTemperature(units.Kilopascal.Of(70))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%.1f °C\n", T.In(units.Celsius))
	// Output:
	// 89.9 °C
}

// The heat to make water at 0 °C of two kilograms of ice from a freezer at −24 °C.
func ExampleIce() {
	ice := props.Ice()
	cold, err := ice.Enthalpy(units.Celsius.Of(-24))
	if err != nil {
		fmt.Println(err)
		return
	}
	warm, err := ice.Enthalpy(units.Celsius.Of(0))
	if err != nil {
		fmt.Println(err)
		return
	}
	each := warm.Sub(cold).Add(props.FusionHeat())
	fmt.Println("each kilogram", each.Text(units.KilojoulePerKilogram, 4))
	// Output:
	// each kilogram 381.6 kJ/kg
}

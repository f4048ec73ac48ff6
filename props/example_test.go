package props_test

import (
	"errors"
	"fmt"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// The properties of air in a room.
func ExampleAir() {
	air, err := props.Air().At(units.Celsius.Of(20), units.StandardAtmosphere.Of(1))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println("density      ", air.Density.Text(units.KilogramPerCubicMetre, 4))
	fmt.Println("conductivity ", air.Conductivity.Text(units.MilliwattPerMetreKelvin, 3))
	fmt.Println("viscosity    ", air.Viscosity.Text(units.MicropascalSecond, 4))
	fmt.Printf("Prandtl number %.3f\n", air.Prandtl())
	// Output:
	// density       1.204 kg/m³
	// conductivity  25.9 mW/(m·K)
	// viscosity     18.21 µPa·s
	// Prandtl number 0.707
}

// Water at 1 atm is no liquid above 99.97 °C.
func ExampleWater() {
	_, err := props.Water().At(units.Celsius.Of(105), units.StandardAtmosphere.Of(1))
	var r *units.RangeError
	if errors.As(err, &r) {
		fmt.Printf("%s: the lowest %s is %.0f kPa\n", r.Model, r.Quantity, r.Min.Number())
	}
	// Output:
	// properties of water at 105 °C: the lowest pressure is 121 kPa
}

// The heat that a kilogram of steel takes up from 20 °C to 800 °C, through the peak of its specific heat.
func ExampleSolid_Enthalpy() {
	steel := props.CarbonSteel()
	cold, err := steel.Enthalpy(units.Celsius.Of(20))
	if err != nil {
		fmt.Println(err)
		return
	}
	hot, err := steel.Enthalpy(units.Celsius.Of(800))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(hot.Sub(cold).Text(units.KilojoulePerKilogram, 3))
	// Output:
	// 562 kJ/kg
}

// A solid of one's own, from a table.
func ExampleTabulated() {
	row := func(t, k, c float64) props.Row {
		return props.Row{
			Temperature:  units.Celsius.Of(t),
			Conductivity: units.WattPerMetreKelvin.Of(k),
			SpecificHeat: units.JoulePerKilogramKelvin.Of(c),
		}
	}
	brick, err := props.Tabulated("our brick", units.KilogramPerCubicMetre.Of(2050), []props.Row{
		row(20, 1.00, 840),
		row(400, 1.20, 1000),
		row(1000, 1.60, 1150),
	}, "laboratory report of the kiln")
	if err != nil {
		fmt.Println(err)
		return
	}
	c, err := brick.SpecificHeat(units.Celsius.Of(400))
	fmt.Println(c, err)

	_, err = brick.SpecificHeat(units.Celsius.Of(1100))
	fmt.Println(err)
	// Output:
	// 1000 J/(kg·K) <nil>
	// specific heat of our brick: temperature 1100 °C outside its range, 20 °C to 1000 °C (laboratory report of the kiln)
}

// A name from a command line.
func ExampleFindSolid() {
	glass, err := props.FindSolid("glass")
	fmt.Println(glass.Name(), glass.Density(), err)

	_, err = props.FindSolid("cheese")
	fmt.Println(err)
	// Output:
	// glass 2500 kg/m³ <nil>
	// props.FindSolid: name: "cheese" not accepted; accepted: carbon steel, stainless steel, copper, aluminium, glass, concrete, PVC, softwood
}

// Every solid, with what is known about its conductivity.
func ExampleSolids() {
	for s := range props.Solids() {
		low, high := s.Range()
		fmt.Printf("%-16s %3.0f °C to %4.0f °C, k ± %.0f %%\n", s.Name(), low.In(units.Celsius), high.In(units.Celsius), 100*s.ConductivityUncertainty())
	}
	// Output:
	// carbon steel       0 °C to 1200 °C, k ± 22 %
	// stainless steel  -73 °C to 1227 °C, k ± 10 %
	// copper           -73 °C to  927 °C, k ± 5 %
	// aluminium        -73 °C to  527 °C, k ± 8 %
	// glass              0 °C to  200 °C, k ± 20 %
	// concrete          20 °C to 1200 °C, k ± 20 %
	// PVC                0 °C to   60 °C, k ± 15 %
	// softwood           0 °C to   60 °C, k ± 25 %
}

package props_test

import (
	"errors"
	"fmt"
	"os"

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

	_, err = props.FindSolid("blue glass")
	fmt.Println(err)
	// Output:
	// glass 2500 kg/m³ <nil>
	// props.FindSolid: name: "blue glass" not accepted; accepted: glass, glass-ceramic, polyamide 66, 33 % glass fibre, quartz glass, glass mosaic, PMMA, polyamide 66, 25 % glass fibre, polypropylene, 25 % glass fibre, glass wool, cellular glass, glass foam
}

// The first solids of the list, with what is known about their conductivity.
func ExampleSolids() {
	n := 0
	for s := range props.Solids() {
		low, high := s.Range()
		fmt.Printf("%-16s %3.0f °C to %4.0f °C, k ± %.0f %%\n", s.Name(), low.In(units.Celsius), high.In(units.Celsius), 100*s.ConductivityUncertainty())
		if n++; n == 5 {
			break
		}
	}
	// Output:
	// carbon steel       0 °C to 1200 °C, k ± 22 %
	// stainless steel  -73 °C to 1227 °C, k ± 10 %
	// copper           -73 °C to  927 °C, k ± 5 %
	// aluminium        -73 °C to  527 °C, k ± 8 %
	// glass              0 °C to  200 °C, k ± 20 %
}

// What has brass in its name.
func ExampleSearch() {
	for s := range props.Search("brass") {
		low, high := s.Range()
		fmt.Printf("%s, %v to %v\n", s.Name(), low, high)
	}
	// Output:
	// cartridge brass 70Cu-30Zn, -73.15 °C to 326.85 °C
	// brass, 0 °C to 100 °C
}

// The emissivity of copper.
func ExampleEmissivities() {
	for e := range props.Emissivities("copper") {
		fmt.Printf("%s: %g to %g\n", e.Surface, e.Least, e.Most)
	}
	// Output:
	// copper polished: 0.02 to 0.03
	// copper commercial burnished: 0.07 to 0.07
	// copper oxidised: 0.6 to 0.7
	// copper oxidised black: 0.78 to 0.88
}

// A table of a food for a report, in British units.
func ExampleWriteTable() {
	temperatures := []units.Temperature{units.Fahrenheit.Of(-20), units.Fahrenheit.Of(20), units.Fahrenheit.Of(50)}
	salmon, err := props.FindSolid("salmon")
	if err != nil {
		fmt.Println(err)
		return
	}
	err = props.WriteTable(os.Stdout, salmon, units.Fahrenheit, temperatures,
		props.ColumnOf("c", props.Solid.SpecificHeat, units.BtuPerPoundFahrenheit, 3),
		props.ColumnOf("k", props.Solid.Conductivity, units.BtuPerHourFootFahrenheit, 3),
	)
	if err != nil {
		fmt.Println(err)
	}
	// Output:
	// salmon
	//    T, °F  c, Btu/(lb·°F)  k, Btu/(h·ft·°F)
	//   -20.00           0.664             0.838
	//    20.00            3.19             0.598
	//    50.00           0.869             0.284
	// Source: composition: ASHRAE Handbook Refrigeration, chapter Thermal properties of foods, table 3, from memory; equations: Y. Choi, M. R. Okos, in: M. Le Maguer, P. Jelen (eds.), Food Engineering and Process Applications, vol. 1 (1986), read on copies that quote it
	// Uncertainty: 5 % to 10 % for mixtures above the freezing point (Choi and Okos, from memory); the conductivity, the density with its change by freezing and by small pores, and all below the freezing point: our own estimate; within 5 K below the freezing point only the heat across it means something; the composition of the piece is not included
	// Caution: Whether a food is safe, and how it must be heated or cooled, is decided by the food law and a person responsible under it, with measured temperatures, not by this number.
}

// The heat to cool a kilogram of mashed potato to store it frozen, and its ice.
func ExampleFood() {
	mash := props.Recipe{
		Name:        "mashed potato",
		Composition: props.Composition{Water: 0.78, Protein: 0.02, Fat: 0.04, Carbohydrate: 0.13, Fibre: 0.02, Ash: 0.01},
		Freezing:    units.Celsius.Of(-0.8),
	}
	food, err := props.Food(mash)
	if err != nil {
		fmt.Println(err)
		return
	}
	hot, err := food.Enthalpy(units.Celsius.Of(70))
	if err != nil {
		fmt.Println(err)
		return
	}
	cold, err := food.Enthalpy(units.Celsius.Of(-18))
	if err != nil {
		fmt.Println(err)
		return
	}
	ice, err := mash.Ice(units.Celsius.Of(-18))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%s, %.0f %% ice\n", hot.Sub(cold).Text(units.KilojoulePerKilogram, 3), 100*ice)
	fmt.Println(food.Caution())
	// Output:
	// 538 kJ/kg, 74 % ice
	// Whether a food is safe, and how it must be heated or cooled, is decided by the food law and a person responsible under it, with measured temperatures, not by this number.
}

// A paraffin that stores heat between 40 °C and 60 °C.
func ExampleMelting() {
	constant := func(name string, c, k float64) props.Solid {
		s, err := props.Constant(name, units.KilogramPerCubicMetre.Of(880), units.JoulePerKilogramKelvin.Of(c), units.WattPerMetreKelvin.Of(k))
		if err != nil {
			panic(err)
		}
		return s
	}
	wax, err := props.Melting(props.Melt{
		Name:       "our wax",
		Solid:      constant("solid wax", 2100, 0.24),
		Liquid:     constant("liquid wax", 2300, 0.15),
		LatentHeat: units.KilojoulePerKilogram.Of(190),
		Solidus:    units.Celsius.Of(52),
		Liquidus:   units.Celsius.Of(55),
		Source:     "data sheet",
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	cold, err := wax.Enthalpy(units.Celsius.Of(40))
	if err != nil {
		fmt.Println(err)
		return
	}
	hot, err := wax.Enthalpy(units.Celsius.Of(60))
	if err != nil {
		fmt.Println(err)
		return
	}
	half, err := wax.Temperature(cold.Add(hot.Sub(cold).Scale(0.5)))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(hot.Sub(cold).Text(units.KilojoulePerKilogram, 3), "and half of it at", half.Text(units.Celsius, 1))
	// Output:
	// 233 kJ/kg and half of it at 53.4 °C
}

// Brick with a fifth of its volume in pores of still air.
func ExampleComposite() {
	air, err := props.Constant("still air", units.KilogramPerCubicMetre.Of(1.2), units.JoulePerKilogramKelvin.Of(1006), units.WattPerMetreKelvin.Of(0.026))
	if err != nil {
		fmt.Println(err)
		return
	}
	brick, err := props.FindSolid("brick")
	if err != nil {
		fmt.Println(err)
		return
	}
	light, err := props.Composite("porous brick", props.Dispersed, props.Part{Solid: brick, Volume: 0.8}, props.Part{Solid: air, Volume: 0.2})
	if err != nil {
		fmt.Println(err)
		return
	}
	k, err := light.Conductivity(units.Celsius.Of(20))
	fmt.Println(light.Density().Text(units.KilogramPerCubicMetre, 4), k.Text(units.WattPerMetreKelvin, 3), err)
	// Output:
	// 1536 kg/m³ 0.533 W/(m·K) <nil>
}

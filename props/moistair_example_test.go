package props_test

import (
	"fmt"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// The exhaust of a laundry dryer: what a kilogram of dry air carries away, against the air of the room that it was.
func ExampleMoistAir() {
	p := units.Kilopascal.Of(98)
	room, err := props.MoistAirFromRelativeHumidity(units.Celsius.Of(21), p, 0.45)
	if err != nil {
		fmt.Println(err)
		return
	}
	exhaust, err := props.MoistAirFromWetBulb(units.Celsius.Of(58), p, units.Celsius.Of(41))
	if err != nil {
		fmt.Println(err)
		return
	}
	gas, err := exhaust.State()
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("water     %.1f g/kg\n", 1000*(exhaust.HumidityRatio()-room.HumidityRatio()))
	fmt.Println("heat     ", exhaust.Enthalpy().Sub(room.Enthalpy()).Text(units.KilojoulePerKilogram, 3))
	fmt.Printf("humidity  %.0f %%\n", 100*exhaust.RelativeHumidity())
	fmt.Println("density  ", gas.Density.Text(units.KilogramPerCubicMetre, 4))
	// Output:
	// water     38.8 g/kg
	// heat      139 kJ/kg
	// humidity  37 %
	// density   1.004 kg/m³
}

// Does a cold-water pipe sweat in a cellar?
func ExampleMoistAir_DewPoint() {
	cellar, err := props.MoistAirFromRelativeHumidity(units.Celsius.Of(18), units.Kilopascal.Of(100), 0.7)
	if err != nil {
		fmt.Println(err)
		return
	}
	dew, err := cellar.DewPoint()
	if err != nil {
		fmt.Println(err)
		return
	}
	pipe := units.Celsius.Of(9)
	fmt.Printf("dew point %.1f °C\n", dew.In(units.Celsius))
	if pipe.Compare(dew) < 0 {
		fmt.Printf("the pipe sweats: it is %.1f K colder\n", dew.Sub(pipe).SI())
	}
	// Output:
	// dew point 12.5 °C
	// the pipe sweats: it is 3.5 K colder
}

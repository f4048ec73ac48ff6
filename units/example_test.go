package units_test

import (
	"errors"
	"fmt"

	"example.com/coolward/units"
)

// The mean density of a casting from its weight and its measured volume.
func Example() {
	mass := units.Pound.Of(11)
	volume := units.Litre.Of(0.65)
	density := units.KilogramPerCubicMetre.Of(mass.In(units.Kilogram) / volume.In(units.CubicMetre))
	fmt.Printf("%.4v\n", density)
	// Output: 7676 kg/m³
}

// A temperature is a point on a scale; the difference of two is another type.
func ExampleTemperature() {
	oven := units.Fahrenheit.Of(356)
	room := units.Celsius.Of(20)
	fmt.Println(oven, "is", oven.Sub(room), "above", room)
	fmt.Println(room.Add(units.RankineDifference.Of(18)).Text(units.Fahrenheit, 0))
	// Output:
	// 180 °C is 160 K above 20 °C
	// 86 °F
}

func ExampleParse() {
	h, err := units.Parse[units.HeatTransferCoefficient]("1.8 Btu/(h ft2 F)")
	fmt.Println(h, err)

	_, err = units.Parse[units.TemperatureDifference]("10 °C")
	var syntax *units.SyntaxError
	fmt.Println(errors.As(err, &syntax), syntax.Reason)
	// Output:
	// 10.2209 W/(m²·K) <nil>
	// true °C alone is a point on a scale, not a difference; write a difference in K, as in 10 K, or in °R, as in 18 °R
}

// A column of a file whose unit is known only when it is read.
func ExampleParseValue() {
	flow, err := units.ParseValue("12 L/min")
	if err != nil {
		fmt.Println(err)
		return
	}
	seconds := units.Minute.Of(5).Dynamic()
	filled, err := flow.Mul(seconds)
	if err != nil {
		fmt.Println(err)
		return
	}
	volume, err := units.From[units.Volume](filled)
	fmt.Println(volume, err)
	_, err = units.From[units.Mass](filled)
	fmt.Println(err)
	// Output:
	// 60 L <nil>
	// cannot read as mass 0.06 m³ (dimension m³); accepted: dimension kg
}

func ExampleQuantity_Text() {
	flux := units.WattPerSquareMetre.Of(1234.5)
	fmt.Println(flux, "or", flux.Text(units.BtuPerHourSquareFoot, 3))
	// Output: 1.2345 kW/m² or 391 Btu/(h·ft²)
}

package lumped_test

import (
	"fmt"
	"log"

	"example.com/coolward/lumped"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A bare bead in a stream of gas: how late it is.
func ExampleBareSensor() {
	bead, err := lumped.BareSensor(
		shape.Sphere(units.Millimetre.Of(1.5)),
		units.KilogramPerCubicMetre.Of(8700), units.JoulePerKilogramKelvin.Of(450),
		units.WattPerSquareMetreKelvin.Of(180),
	)
	if err != nil {
		log.Fatal(err)
	}
	ninety, err := bead.ResponseTime(0.9)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("90 %% of a step after %.1f s\n", ninety.In(units.Second))

	// An oven that rises by 12 K/min.
	shown, err := bead.Follow(boundary.Ramp(units.Celsius.Of(25), units.KelvinPerMinute.Of(12)), units.Celsius.Of(25), units.Hour.Of(1))
	if err != nil {
		log.Fatal(err)
	}
	T, err := shown.At(lumped.Element, units.Minute.Of(10))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("after 10 min it shows %.2f °C, the oven is at 145 °C\n", T.In(units.Celsius))
	// Output:
	// 90 % of a step after 12.5 s
	// after 10 min it shows 143.91 °C, the oven is at 145 °C
}

// A probe in a sheath is carried from a room into a bath; the bath is read from its log by undoing the lag.
func ExampleSensor_Corrected() {
	probe, err := lumped.SheathedSensor(
		units.JoulePerKelvin.Of(0.9), units.WattPerKelvin.Of(0.3),
		units.JoulePerKelvin.Of(2.4), units.WattPerKelvin.Of(0.25),
	)
	if err != nil {
		log.Fatal(err)
	}
	follow, err := probe.Follow(boundary.Steady(units.Celsius.Of(72)), units.Celsius.Of(20), units.Duration{})
	if err != nil {
		log.Fatal(err)
	}
	var shown lumped.Log
	for second := 0.0; second <= 40; second += 2 {
		T, err := follow.At(lumped.Element, units.Second.Of(second))
		if err != nil {
			log.Fatal(err)
		}
		shown.Times = append(shown.Times, units.Second.Of(second))
		shown.Temperatures = append(shown.Temperatures, T)
	}
	corrected, err := probe.Corrected(shown, units.Second.Of(6))
	if err != nil {
		log.Fatal(err)
	}
	for _, i := range []int{5, 10, 15} {
		fmt.Printf("%v: shows %.1f °C, corrected %.1f °C, noise × %.0f\n",
			shown.Times[i], shown.Temperatures[i].In(units.Celsius), corrected.Log.Temperatures[i].In(units.Celsius), corrected.NoiseGain[i])
	}
	// Output:
	// 10 s: shows 42.1 °C, corrected 72.1 °C, noise × 18
	// 20 s: shows 57.2 °C, corrected 72.1 °C, noise × 18
	// 30 s: shows 64.7 °C, corrected 72.0 °C, noise × 18
}

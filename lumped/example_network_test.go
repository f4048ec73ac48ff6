package lumped_test

import (
	"context"
	"errors"
	"fmt"
	"log"

	"example.com/coolward/lumped"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// Tea in a cold cup: the cup first warms, then both cool.
func ExampleNetwork() {
	kitchen := units.Celsius.Of(21)
	solution, err := lumped.Network{
		Nodes: []lumped.Node{
			{Name: "tea", Capacity: units.JoulePerKelvin.Of(1050), Initial: units.Celsius.Of(94)},
			{Name: "cup", Capacity: units.JoulePerKelvin.Of(270), Initial: kitchen},
		},
		Surroundings: []lumped.Surroundings{{Name: "kitchen", Temperature: boundary.Steady(kitchen)}},
		Links: []lumped.Link{
			{From: "tea", To: "cup", Conductance: units.WattPerKelvin.Of(6)},
			{From: "cup", To: "kitchen", Conductance: units.WattPerKelvin.Of(0.4)},
			{From: "tea", To: "kitchen", Conductance: units.WattPerKelvin.Of(0.25)},
		},
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	for _, tau := range solution.TimeConstants() {
		fmt.Printf("time constant %.1f min\n", tau.In(units.Minute))
	}
	touch, err := solution.TimeTo("cup", units.Celsius.Of(60))
	if err != nil {
		log.Fatal(err)
	}
	drink, err := solution.TimeTo("tea", units.Celsius.Of(60))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("cup at 60 °C after %.0f s, tea after %.1f min\n", touch.In(units.Second), drink.In(units.Minute))
	var never *units.NeverError
	if _, err = solution.TimeTo("cup", units.Celsius.Of(90)); errors.As(err, &never) {
		fmt.Println(err)
	}
	// Output:
	// time constant 34.5 min
	// time constant 0.6 min
	// cup at 60 °C after 42 s, tea after 14.3 min
	// the cup never reaches 90 °C, it tends to 21 °C
}

// A switch cabinet with heat inside, in a hall that swings over the day.
func ExampleNetwork_Solve_changingSurroundings() {
	day := boundary.Oscillation(units.Celsius.Of(28), units.KelvinDifference.Of(7), units.Hour.Of(24), units.Hour.Of(9))
	solution, err := lumped.Network{
		Nodes: []lumped.Node{
			{Name: "drive", Capacity: units.KilojoulePerKelvin.Of(9), Initial: units.Celsius.Of(28), Power: units.Watt.Of(120)},
			{Name: "cabinet", Capacity: units.KilojoulePerKelvin.Of(60), Initial: units.Celsius.Of(28)},
		},
		Surroundings: []lumped.Surroundings{{Name: "hall", Temperature: day}},
		Links: []lumped.Link{
			{From: "drive", To: "cabinet", Conductance: units.WattPerKelvin.Of(6)},
			{From: "cabinet", To: "hall", Conductance: units.WattPerKelvin.Of(9)},
		},
		Horizon: units.Hour.Of(48),
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	for _, hour := range []float64{6, 15, 24} {
		T, err := solution.At("drive", units.Hour.Of(hour))
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("%.0f h: drive at %.1f °C\n", hour, T.In(units.Celsius))
	}
	t, err := solution.TimeTo("drive", units.Celsius.Of(65))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("65 °C after %.1f h\n", t.In(units.Hour))
	// Output:
	// 6 h: drive at 54.2 °C
	// 15 h: drive at 66.3 °C
	// 24 h: drive at 60.3 °C
	// 65 °C after 13.9 h
}

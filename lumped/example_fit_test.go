package lumped_test

import (
	"context"
	"fmt"
	"log"
	"math"

	"example.com/coolward/lumped"
	"example.com/coolward/units"
)

// readings is a log of a tray in a chiller, every three minutes, with one reading missing.
func readings() lumped.Log {
	var l lumped.Log
	for i, celsius := range []float64{63.9, 60.7, 57.8, 55.1, math.NaN(), 49.9, 47.6, 45.4, 43.2, 41.2, 39.2} {
		l.Times = append(l.Times, units.Minute.Of(3*float64(i)))
		l.Temperatures = append(l.Temperatures, units.Celsius.Of(celsius))
	}
	return l
}

// The coefficient at the surface of a tray, from its log. The chiller is known to be at 3 °C.
func ExampleFit() {
	fitted, err := lumped.Fit{
		Log:      readings(),
		Ambient:  units.Celsius.Of(3),
		Capacity: units.KilojoulePerKelvin.Of(7.4),
		Area:     units.SquareMetre.Of(0.21),
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	h, err := fitted.Coefficient()
	if err != nil {
		log.Fatal(err)
	}
	deviation, freedom, _ := fitted.Deviation()
	fmt.Printf("h %.2f W/(m²·K), %.2f to %.2f at 95 %%\n", h.Value.In(units.WattPerSquareMetreKelvin),
		h.Low.In(units.WattPerSquareMetreKelvin), h.High.In(units.WattPerSquareMetreKelvin))
	fmt.Printf("readings off by %.2f K, %d degrees of freedom\n", deviation.In(units.KelvinDifference), freedom)
	fmt.Println("one exponential:", fitted.OneExponential())
	// Output:
	// h 10.14 W/(m²·K), 10.09 to 10.18 at 95 %
	// readings off by 0.05 K, 8 degrees of freedom
	// one exponential: true
}

// After the first half hour: when will the tray be at 21 °C?
func ExampleFitted_TimeTo() {
	fitted, err := lumped.Fit{Log: readings(), Ambient: units.Celsius.Of(3)}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	t, err := fitted.TimeTo(units.Celsius.Of(21))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("21 °C after %.1f min, %.1f to %.1f min at 95 %%\n", t.Value.In(units.Minute), t.Low.In(units.Minute), t.High.In(units.Minute))

	// One more reading makes it surer.
	fitted, err = fitted.Add(context.Background(), units.Minute.Of(60), units.Celsius.Of(24.4))
	if err != nil {
		log.Fatal(err)
	}
	if t, err = fitted.TimeTo(units.Celsius.Of(21)); err != nil {
		log.Fatal(err)
	}
	fmt.Printf("21 °C after %.1f min, %.1f to %.1f min at 95 %%\n", t.Value.In(units.Minute), t.Low.In(units.Minute), t.High.In(units.Minute))

	// Without the ambient the same readings tell less.
	open, err := lumped.Fit{Log: readings()}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("ambient identified:", open.AmbientIdentified())
	// Output:
	// 21 °C after 70.6 min, 70.3 to 70.8 min at 95 %
	// 21 °C after 70.3 min, 70.0 to 70.6 min at 95 %
	// ambient identified: true
}

// Two readings and the temperature of the room give the whole curve.
func ExampleFit_twoReadings() {
	fitted, err := lumped.Fit{
		Log: lumped.Log{
			Times:        []units.Duration{units.Hour.Of(9), units.Hour.Of(10)},
			Temperatures: []units.Temperature{units.Celsius.Of(80), units.Celsius.Of(50)},
		},
		Ambient: units.Celsius.Of(20),
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	t, err := fitted.TimeTo(units.Celsius.Of(35))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("35 °C at %.2f h\n", t.Value.In(units.Hour)) // the excess halves every hour
	// Output:
	// 35 °C at 11.00 h
}

// The emissivity of a steel plate that cools in a hall, with the coefficient of convection known.
func ExampleSurfaceFit() {
	var l lumped.Log
	for i, celsius := range []float64{599, 549, 508, 472, 441, 414, 389, 368} {
		l.Times = append(l.Times, units.Minute.Of(float64(i)))
		l.Temperatures = append(l.Temperatures, units.Celsius.Of(celsius))
	}
	fitted, err := lumped.SurfaceFit{
		Log:         l,
		Capacity:    units.KilojoulePerKelvin.Of(2.4),
		Area:        units.SquareMetre.Of(0.085),
		Ambient:     units.Celsius.Of(20),
		Coefficient: units.WattPerSquareMetreKelvin.Of(9),
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	e, err := fitted.Emissivity()
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("emissivity %.2f, %.2f to %.2f at 95 %%\n", e.Value, e.Low, e.High)
	// Output:
	// emissivity 0.67, 0.66 to 0.68 at 95 %
}

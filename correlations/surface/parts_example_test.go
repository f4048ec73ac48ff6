package surface_test

import (
	"fmt"
	"math"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A loaf tin, a curtain rod and a shelf in the same kitchen: what still air takes from each at 60 °C.
func ExampleConvection_forms() {
	air := surface.Convection{Fluid: props.Air(), Ambient: units.Celsius.Of(20)}
	tin, rod, shelf := air, air, air
	tin.Body, tin.Position = shape.Brick(units.Centimetre.Of(30), units.Centimetre.Of(11), units.Centimetre.Of(8)), surface.Level // 8 cm high
	rod.Body = shape.Cylinder(units.Millimetre.Of(20), units.Metre.Of(2)).Exposing(shape.Outside)
	rod.Position = surface.Level
	shelf.Body = shape.Plate(units.Millimetre.Of(20), units.SquareMetre.Of(0.24))
	shelf.Position, shelf.Length = surface.Level, units.Centimetre.Of(80)
	for _, c := range []surface.Convection{tin, rod, shelf} {
		f, err := c.Film(units.Celsius.Of(60))
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("%.1f W/(m²·K) ± %.0f %%\n", f.Coefficient.In(units.WattPerSquareMetreKelvin), 100*f.Scatter)
	}
	// Output:
	// 6.4 W/(m²·K) ± 30 %
	// 7.4 W/(m²·K) ± 20 %
	// 4.4 W/(m²·K) ± 25 %
}

// A cake comes out of the oven, stands for a quarter of an hour, and is then put before a fan.
func ExampleSchedule() {
	still := surface.Convection{
		Body:   shape.Cylinder(units.Centimetre.Of(24), units.Centimetre.Of(12)),
		Length: units.Centimetre.Of(12), Fluid: props.Air(), Ambient: units.Celsius.Of(22),
	}
	fan := still
	fan.Speed = units.MetrePerSecond.Of(2)
	kitchen := surface.Schedule{
		{Part: still},
		{From: units.Minute.Of(15), Part: fan},
	}
	for _, t := range []float64{0, 14, 15, 30} {
		q, err := kitchen.Flux(units.Minute.Of(t), units.Celsius.Of(90))
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("%2g min: %.0f W/m²\n", t, q.In(units.WattPerSquareMetre))
	}
	// Output:
	// 0 min: 458 W/m²
	// 14 min: 458 W/m²
	// 15 min: 847 W/m²
	// 30 min: 847 W/m²
}

// A rain barrel in the yard, where somebody has written down the temperature of the air.
func ExampleFollowing() {
	air := boundary.Log(
		[]units.Duration{units.Hour.Of(0), units.Hour.Of(6), units.Hour.Of(10)},
		[]units.Temperature{units.Celsius.Of(14), units.Celsius.Of(8), units.Celsius.Of(16)})
	barrel := surface.Following{
		Part: surface.Convection{
			Body:     shape.Cylinder(units.Centimetre.Of(60), units.Centimetre.Of(90)).Exposing(shape.Outside),
			Position: surface.Upright, Fluid: props.Air(), Speed: units.MetrePerSecond.Of(1),
		},
		Ambient: air.At,
	}
	for _, t := range []float64{0, 6, 8, 11} {
		q, err := barrel.Flux(units.Hour.Of(t), units.Celsius.Of(15))
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("%g h: %.0f W/m²\n", t, q.In(units.WattPerSquareMetre))
	}
	// Output:
	// 0 h: 5 W/m²
	// 6 h: 38 W/m²
	// 8 h: 16 W/m²
	// log: time 11 h outside its range, 0 s to 10 h (last reading)
}

// A wet terracotta cooler on a dry afternoon: the temperature at which the air gives as much heat as the water takes.
func ExampleEvaporation() {
	afternoon := units.Celsius.Of(33)
	air, err := props.MoistAirFromRelativeHumidity(afternoon, units.StandardAtmosphere.Of(1), 0.25)
	if err != nil {
		fmt.Println(err)
		return
	}
	dry := surface.Convection{
		Body:     shape.Cylinder(units.Centimetre.Of(20), units.Centimetre.Of(30)).Exposing(shape.Outside),
		Position: surface.Upright, Fluid: props.Air(), Ambient: afternoon, Speed: units.MetrePerSecond.Of(1.5),
	}
	cooler := surface.Sum{
		dry,
		surface.Evaporation{Convection: dry, VapourPressure: air.VapourPressure},
		surface.Radiation{Emissivity: 0.9, Surroundings: afternoon},
	}
	low, high := 0.0, 33.0 // °C
	for high-low > 0.01 {
		mid := (low + high) / 2
		q, err := cooler.Flux(units.Duration{}, units.Celsius.Of(mid))
		if err != nil {
			fmt.Println(err)
			return
		}
		if q.SI() < 0 {
			low = mid
		} else {
			high = mid
		}
	}
	bulb, _ := air.WetBulb()
	fmt.Printf("the clay settles at %.1f °C, a wet bulb at %.1f °C\n", low, bulb.In(units.Celsius))
	// Output:
	// the clay settles at 20.4 °C, a wet bulb at 18.9 °C
}

// A glowing steel ball of 30 mm goes into a bucket of water: where the heat goes slowest, and where fastest.
func ExampleBoiling() {
	bucket, err := surface.Boiling{
		Body:       shape.Sphere(units.Millimetre.Of(30)),
		Water:      units.Celsius.Of(60),
		Emissivity: 0.8,
	}.Curve()
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, T := range []float64{700, 250, 160, 110, 80} {
		wall := units.Celsius.Of(T)
		q, err := bucket.Flux(units.Duration{}, wall)
		if err != nil {
			fmt.Println(err)
			return
		}
		region, _ := bucket.Region(wall)
		fmt.Printf("%3g °C: %4.0f kW/m², %s\n", T, q.In(units.KilowattPerSquareMetre), region)
	}
	peak := bucket.Peak()
	fmt.Printf("at most %.1f MW/m², at %.0f °C, give or take half\n", peak.Flux.In(units.MegawattPerSquareMetre), peak.Wall.In(units.Celsius))
	fmt.Println(bucket.Warnings()[1])
	// Output:
	// 700 °C:  178 kW/m², film
	// 250 °C:   77 kW/m², film
	// 160 °C:  132 kW/m², transition
	// 110 °C:  145 kW/m², nucleate
	//  80 °C:   19 kW/m², liquid
	// at most 2.7 MW/m², at 127 °C, give or take half
	// boiling: water spits and scalds when something hot goes in, and quench oils burn and, wet, explode; follow the local codes and leave quenching to people with the licence and the gear
}

// Which way did the heat of a cast bell leave, in the hour after it was lifted out at 300 °C?
func ExampleSum_Heat() {
	foundry := units.Celsius.Of(15)
	air := surface.Sum{
		surface.Convection{
			Body:   shape.Cone(units.Centimetre.Of(40), units.Centimetre.Of(35)),
			Length: units.Centimetre.Of(35), Fluid: props.Air(), Ambient: foundry,
		},
		surface.Radiation{Emissivity: 0.7, Surroundings: foundry},
	}
	// The surface as it was measured; that of a solution is solution.At(shape.Surface(), t).
	wall := func(t units.Duration) (units.Temperature, error) {
		return units.Celsius.Of(15 + 285*math.Exp(-t.In(units.Hour)/1.5)), nil
	}
	heat, err := air.Heat(units.SquareMetre.Of(0.379), wall, units.Hour.Of(1))
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, part := range heat {
		fmt.Printf("%s %.2f MJ, %.0f %%\n", part.Name, part.Energy.In(units.Megajoule), 100*part.Share)
	}
	// Output:
	// convection 2.13 MJ, 41 %
	// radiation 3.04 MJ, 59 %
}

// A tiled roof at noon and on a clear night: sun, sky and wind on one face of a plate.
func ExampleSolar() {
	air := units.Celsius.Of(24)
	sky, err := surface.SwinbankSky(air)
	if err != nil {
		fmt.Println(err)
		return
	}
	roof := surface.Sum{
		surface.Convection{
			Body:     shape.Plate(units.Centimetre.Of(2), units.SquareMetre.Of(12)).Exposing(shape.Front),
			Position: surface.Level, Length: units.Metre.Of(3),
			Fluid: props.Air(), Ambient: air, Speed: units.MetrePerSecond.Of(3),
		},
		surface.Radiation{Emissivity: 0.9, Surroundings: sky},
		surface.Solar{Absorptivity: 0.75, AbsorptivityLow: 0.65, AbsorptivityHigh: 0.85, Irradiance: units.WattPerSquareMetre.Of(800)},
	}
	parts, err := roof.Parts(units.Duration{}, units.Celsius.Of(45))
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, p := range parts {
		fmt.Printf("%-10s %+.0f W/m²\n", p.Name, p.Flux.In(units.WattPerSquareMetre))
	}
	tangent, err := roof.Tangent(units.Duration{}, units.Celsius.Of(45))
	if err != nil {
		fmt.Println(err)
		return
	}
	balance, err := tangent.Ambient()
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("near there %.1f W/(m²·K) towards %.0f °C\n", tangent.Coefficient.In(units.WattPerSquareMetreKelvin), balance.In(units.Celsius))
	// Output:
	// convection +124 W/m²
	// radiation  +197 W/m²
	// sunlight   -600 W/m²
	// near there 13.3 W/(m²·K) towards 66 °C
}

// Air that is blown down past a hot ball runs against the warm air that rises from it.
func ExampleStream() {
	ball := surface.Convection{
		Body: shape.Sphere(units.Millimetre.Of(50)), Fluid: props.Air(), Ambient: units.Celsius.Of(25), Speed: units.MetrePerSecond.Of(0.1),
	}
	for _, stream := range []surface.Stream{surface.Upward, surface.Downward} {
		ball.Stream = stream
		film, err := ball.Film(units.Celsius.Of(80))
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("%v: %.1f W/(m²·K) ± %.0f %%, against the buoyant flow: %v\n", stream, film.Coefficient.In(units.WattPerSquareMetreKelvin), 100*film.Scatter, film.Opposed)
	}
	// Output:
	// upward: 8.4 W/(m²·K) ± 19 %, against the buoyant flow: false
	// downward: 7.0 W/(m²·K) ± 29 %, against the buoyant flow: true
}

package surface_test

import (
	"errors"
	"fmt"

	"example.com/coolward/correlations"
	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A glazed ball of 80 mm stands on a wire in a workshop, at 90 °C after the kiln.
func Example() {
	workshop := units.Celsius.Of(18)
	air := surface.Sum{
		surface.Convection{Body: shape.Sphere(units.Millimetre.Of(80)), Fluid: props.Air(), Ambient: workshop},
		surface.Radiation{Emissivity: 0.9, EmissivityLow: 0.85, EmissivityHigh: 0.95, Surroundings: workshop},
	}
	var now units.Duration
	wall := units.Celsius.Of(90)

	parts, err := air.Parts(now, wall)
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, p := range parts {
		fmt.Printf("%-10s %.0f W/m², %2.0f %%\n", p.Name, p.Flux.In(units.WattPerSquareMetre), 100*p.Share)
	}
	low, _ := air.Low().Flux(now, wall)
	high, _ := air.High().Flux(now, wall)
	fmt.Printf("together between %.0f and %.0f W/m²\n", low.In(units.WattPerSquareMetre), high.In(units.WattPerSquareMetre))

	condition := boundary.Function(air.Flux) // for the problem of a solver
	fmt.Println(condition.Check())
	// Output:
	// convection 503 W/m², 49 %
	// radiation  521 W/m², 51 %
	// together between 919 and 1128 W/m²
	// <nil>
}

// A ripening-room fan blows past oranges: how strong must it be to matter?
func ExampleConvection_Film() {
	for _, v := range []float64{0, 0.02, 0.2, 2} {
		orange := surface.Convection{
			Body:    shape.Sphere(units.Millimetre.Of(75)),
			Fluid:   props.Air(),
			Ambient: units.Celsius.Of(5),
			Speed:   units.MetrePerSecond.Of(v),
		}
		f, err := orange.Film(units.Celsius.Of(20))
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("%g m/s: %.1f W/(m²·K) ± %.0f %%, %s\n", v, f.Coefficient.In(units.WattPerSquareMetreKelvin), 100*f.Scatter, f.Regime)
	}
	// Output:
	// 0 m/s: 5.2 W/(m²·K) ± 15 %, natural
	// 0.02 m/s: 5.2 W/(m²·K) ± 16 %, mixed
	// 0.2 m/s: 7.1 W/(m²·K) ± 25 %, mixed
	// 2 m/s: 21.2 W/(m²·K) ± 30 %, forced
}

// What a coefficient rests on, for the file.
func ExampleFilm_Used() {
	float := surface.Convection{
		Body:    shape.Sphere(units.Millimetre.Of(30)),
		Fluid:   props.Water(),
		Ambient: units.Celsius.Of(15),
		Speed:   units.MetrePerSecond.Of(0.1),
	}
	f, err := float.Film(units.Celsius.Of(40))
	if err != nil {
		fmt.Println(err)
		return
	}
	for u := range f.Used() {
		fmt.Printf("%s, Nu %.0f, properties at the %s\n", u.Correlation.Name(), u.Nu, u.Correlation.Reference())
	}
	fmt.Printf("together Nu %.0f\n", f.Nu)
	// Output:
	// Churchill sphere, natural, Nu 35, properties at the film temperature
	// Whitaker sphere, forced, Nu 87, properties at the free stream
	// together Nu 88
}

// A steel float of half a metre that hangs in a gale is outside what was measured, and the caller decides.
func ExampleConvection_Film_range() {
	float := surface.Convection{
		Body:    shape.Sphere(units.Millimetre.Of(500)),
		Fluid:   props.Air(),
		Ambient: units.Celsius.Of(20),
		Speed:   units.MetrePerSecond.Of(20),
	}
	_, err := float.Film(units.Celsius.Of(80))
	var out *units.RangeError
	if errors.As(err, &out) {
		fmt.Printf("%s: %s %.1e\n", out.Model, out.Quantity, out.Value.SI())
	}
	float.Extrapolate = true
	f, err := float.Film(units.Celsius.Of(80))
	fmt.Printf("Nu %.0f, extrapolated: %v, error: %v\n", f.Nu, f.Extrapolated, err)
	// Output:
	// Whitaker sphere, forced: Reynolds number 6.6e+05
	// Nu 682, extrapolated: true, error: <nil>
}

// A test rig was calibrated against one formula, and the report has to keep to it.
func ExampleConvection_insist() {
	bead := surface.Convection{
		Body:    shape.Sphere(units.Millimetre.Of(2)),
		Fluid:   props.Air(),
		Ambient: units.Celsius.Of(150),
		Speed:   units.MetrePerSecond.Of(1.5),
		Insist:  correlations.RanzMarshallSphere(),
	}
	f, err := bead.Film(units.Celsius.Of(120))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("Re %.0f, Nu %.1f, %s\n", f.Re, f.Nu, f.Regime)
	// Output:
	// Re 104, Nu 7.6, forced
}

// An oxidised steel ball of 120 °C faces the cold walls of a cellar.
func ExampleRadiation() {
	ball := surface.Radiation{Emissivity: 0.8, Surroundings: units.Celsius.Of(4)}
	q, err := ball.Flux(units.Duration{}, units.Celsius.Of(120))
	if err != nil {
		fmt.Println(err)
		return
	}
	h, _ := ball.Coefficient(units.Celsius.Of(120))
	fmt.Printf("%.0f W/m², as with %.1f W/(m²·K)\n", q.In(units.WattPerSquareMetre), h.In(units.WattPerSquareMetreKelvin))

	_, err = surface.Radiation{Emissivity: 80, Surroundings: units.Celsius.Of(4)}.Flux(units.Duration{}, units.Celsius.Of(120))
	fmt.Println(err)
	// Output:
	// 816 W/m², as with 7.0 W/(m²·K)
	// radiation: emissivity: 80 not accepted; accepted: above 0, to 1
}

package boundary_test

import (
	"errors"
	"fmt"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// A surface stated by constants, and one stated by the caller's own law.
func Example() {
	oil := boundary.Constant(units.WattPerSquareMetreKelvin.Of(400), units.Celsius.Of(60))
	q, err := oil.Flux(units.Duration{}, units.Celsius.Of(110))
	fmt.Println(q, err)

	lamp := boundary.Function(func(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
		return units.KilowattPerSquareMetre.Of(-5), nil // heat that enters
	})
	q, err = lamp.Flux(units.Duration{}, units.Celsius.Of(20))
	fmt.Println(q, err)

	oven := boundary.Ramp(units.Celsius.Of(20), units.KelvinPerMinute.Of(5))
	for _, c := range []boundary.Condition{
		oil, lamp, boundary.Temperature(units.Celsius.Of(100)), boundary.Flux(units.KilowattPerSquareMetre.Of(-5)),
		boundary.Sum(boundary.Following(units.WattPerSquareMetreKelvin.Of(12), oven), boundary.Radiation(0.9, units.Celsius.Of(180))),
		boundary.Power(units.WattPerSquareMetreKelvin.Of(6), units.KelvinDifference.Of(50), 0.25, units.Celsius.Of(20)),
	} {
		fmt.Println(c)
	}
	// Output:
	// 20 kW/m² <nil>
	// -5 kW/m² <nil>
	// heat transfer coefficient 400 W/(m²·K), ambient 60 °C
	// exchange function
	// surface temperature 100 °C
	// heat flux -5 kW/m²
	// heat transfer coefficient 12 W/(m²·K), ambient from 20 °C at 5 K/min; radiation, emissivity 0.9, surroundings 180 °C
	// heat transfer coefficient 6 W/(m²·K) at a difference of 50 K, with its power 0.25, ambient 20 °C
}

func TestConditionRefusals(t *testing.T) {
	T := units.Celsius.Of(20)
	flux := func(c boundary.Condition) error { _, err := c.Flux(units.Duration{}, T); return err }
	nan := func(units.Duration, units.Temperature) (units.HeatFlux, error) {
		return units.WattPerSquareMetre.Of(math.NaN()), nil
	}
	for _, tt := range []struct {
		name string
		err  error
	}{
		{"zero condition", boundary.Condition{}.Check()},
		{"flux of the zero condition", flux(boundary.Condition{})},
		{"nil function", boundary.Function(nil).Check()},
		{"negative coefficient", boundary.Constant(units.WattPerSquareMetreKelvin.Of(-1), T).Check()},
		{"NaN coefficient", boundary.Constant(units.WattPerSquareMetreKelvin.Of(math.NaN()), T).Check()},
		{"forgotten ambient", boundary.Constant(units.WattPerSquareMetreKelvin.Of(1), units.Temperature{}).Check()},
		{"no surface temperature", boundary.Temperature(units.Temperature{}).Check()},
		{"surface temperature below 0 K", boundary.Temperature(units.Celsius.Of(-300)).Check()},
		{"NaN flux", boundary.Flux(units.WattPerSquareMetre.Of(math.NaN())).Check()},
		{"infinite flux", boundary.Flux(units.WattPerSquareMetre.Of(math.Inf(-1))).Check()},
		{"flux of a surface temperature", flux(boundary.Temperature(T))},
		{"surface temperature as an exchange", boundary.Temperature(T).CheckExchange()},
		{"course as an exchange", boundary.TemperatureFollowing(boundary.Steady(T)).CheckExchange()},
		{"sum of nothing", boundary.Sum().Check()},
		{"flux of a sum of nothing", flux(boundary.Sum())},
		{"sum with a surface temperature", boundary.Sum(boundary.Flux(units.WattPerSquareMetre.Of(1)), boundary.Temperature(T)).Check()},
		{"sum with the zero condition", boundary.Sum(boundary.Condition{}).Check()},
		{"emissivity above 1", boundary.Radiation(1.1, T).Check()},
		{"emissivity below 0", flux(boundary.Radiation(-0.1, T))},
		{"forgotten surroundings", boundary.Radiation(0.5, units.Temperature{}).Check()},
		{"power law without a difference", boundary.Power(units.WattPerSquareMetreKelvin.Of(1), units.TemperatureDifference{}, 0.25, T).Check()},
		{"flux of a power law without a difference", flux(boundary.Power(units.WattPerSquareMetreKelvin.Of(1), units.TemperatureDifference{}, 0.25, units.Celsius.Of(10)))},
		{"negative exponent", boundary.Power(units.WattPerSquareMetreKelvin.Of(1), units.KelvinDifference.Of(1), -0.25, T).Check()},
		{"zero course", boundary.Following(units.WattPerSquareMetreKelvin.Of(1), boundary.Course{}).Check()},
		{"flux of the zero course", flux(boundary.Following(units.WattPerSquareMetreKelvin.Of(1), boundary.Course{}))},
		{"negative coefficient with a course", flux(boundary.Following(units.WattPerSquareMetreKelvin.Of(-1), boundary.Steady(T)))},
		{"zero condition as an exchange", boundary.Condition{}.CheckExchange()},
		{"NaN from the function", flux(boundary.Function(nan))},
	} {
		var a *units.ArgumentError
		if !errors.As(tt.err, &a) || a.Accepted == "" {
			t.Errorf("%s: %v; want an argument error", tt.name, tt.err)
		}
	}
	broken := errors.New("sensor gone")
	c := boundary.Function(func(units.Duration, units.Temperature) (units.HeatFlux, error) { return units.HeatFlux{}, broken })
	if err := flux(c); !errors.Is(err, broken) {
		t.Errorf("error of the function: got %v, want %v", err, broken)
	}
	if h, ambient, ok := boundary.Constant(units.WattPerSquareMetreKelvin.Of(7), T).Constants(); !ok || h.SI() != 7 || ambient != T {
		t.Errorf("constants come back as %v, %v, %t", h, ambient, ok)
	}
	if _, _, ok := c.Constants(); ok {
		t.Error("a function has no constants")
	}
	water := boundary.Constant(units.WattPerSquareMetreKelvin.Of(7), T)
	steam := boundary.Temperature(units.Celsius.Of(100))
	sun := boundary.Flux(units.WattPerSquareMetre.Of(-800))
	for _, tt := range []struct {
		name                          string
		c                             boundary.Condition
		constants, surface, flux, any bool
	}{
		{"constant", water, true, false, false, true},
		{"temperature", steam, false, true, false, false},
		{"flux", sun, false, false, true, true},
		{"function", c, false, false, false, true},
	} {
		_, _, constants := tt.c.Constants()
		_, surface := tt.c.SurfaceTemperature()
		_, given := tt.c.ConstantFlux()
		if constants != tt.constants || surface != tt.surface || given != tt.flux || (tt.c.CheckExchange() == nil) != tt.any || tt.c.Check() != nil {
			t.Errorf("%s: constants %t, surface temperature %t, flux %t, exchange %v, %v", tt.name, constants, surface, given, tt.c.CheckExchange(), tt.c.Check())
		}
	}
	if got, _ := steam.SurfaceTemperature(); got != units.Celsius.Of(100) {
		t.Errorf("surface temperature comes back as %v", got)
	}
	if got, err := sun.Flux(units.Second.Of(3), T); err != nil || got.SI() != -800 {
		t.Errorf("flux comes back as %v, %v", got, err)
	}
}

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
	// Output:
	// 20 kW/m² <nil>
	// -5 kW/m² <nil>
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
}

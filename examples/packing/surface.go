package main

import (
	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A finish is how the balls were treated.
type finish string

const (
	polished  finish = "polished"
	blackened finish = "blackened"
)

func finishNamed(name string) (finish, error) {
	switch f := finish(name); f {
	case polished, blackened:
		return f, nil
	}
	return "", &units.ArgumentError{Field: "finish", Value: name, Accepted: "polished or blackened"}
}

// shortName is what the trade calls the material of a ball, and the option takes.
func shortName(m props.Solid) string {
	if m == props.Glass() {
		return "glass"
	}
	return "steel"
}

func materialNamed(name string) (props.Solid, error) {
	switch name {
	case "steel":
		return props.CarbonSteel(), nil
	case "glass":
		return props.Glass(), nil
	}
	return props.Solid{}, &units.ArgumentError{Field: "material", Value: name, Accepted: "steel or glass"}
}

// An emissivity is a published value with the limits that are taken for it.
type emissivity struct {
	likely, low, high float64
	source            string
}

// emissivityOf returns the emissivity of a surface: figures for 20 to 100 °C of a handbook
// of total emissivities, with limits of −30 and +50 % for bare metal and ±0.05 for the others.
func emissivityOf(m props.Solid, f finish) emissivity {
	switch {
	case f == blackened:
		return emissivity{0.97, 0.92, 1, "matt black lacquer 0.96 to 0.98 (handbook value, from memory), limits ±0.05"}
	case m == props.Glass():
		return emissivity{0.90, 0.85, 0.95, "glass 0.85 to 0.95 at 20 to 100 °C (handbook value, from memory)"}
	}
	return emissivity{0.07, 0.05, 0.105, "steel, polished, 0.07 at 100 °C (table of an instrument manual, total spectrum), limits −30 and +50 %"}
}

// A ball is one of those that cool.
type ball struct {
	material props.Solid
	diameter units.Length
}

func (b ball) body() shape.Body { return shape.Sphere(b.diameter) }

// exchange is what happens at the surface of a ball: convection to the air, and radiation to the walls.
func (s scenario) exchange(b ball) surface.Sum {
	e := emissivityOf(b.material, s.finish)
	return surface.Sum{
		surface.Convection{Body: b.body(), Fluid: props.Air(), Ambient: s.ambient, Speed: s.speed},
		surface.Radiation{Emissivity: e.likely, EmissivityLow: e.low, EmissivityHigh: e.high, Surroundings: s.ambient},
	}
}

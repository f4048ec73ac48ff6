package surface_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A body whose measures and position say its height is the same film with and without the length.
func TestLengthOfTheBody(t *testing.T) {
	mm := millimetres
	brick, can := shape.Brick(mm(200), mm(60), mm(100)), shape.Cylinder(mm(66), mm(115))
	cube, cone, capsule := shape.Brick(mm(50), mm(50), mm(50)), shape.Cone(mm(40), mm(60)), shape.Capsule(mm(40), mm(90))
	tube := shape.Tube(mm(60), mm(20), mm(80)).Exposing(shape.Outside | shape.Ends)
	for _, tt := range []struct {
		body     shape.Body
		position surface.Position
		height   float64 // mm
	}{
		{brick, surface.Level, 60},
		{brick, surface.Upright, 200},
		{can, surface.Upright, 115},
		{can, surface.Level, 66},
		{tube, surface.Upright, 80},
		{tube, surface.Level, 60},
		{cone, surface.Upright, 60},
		{cone, surface.Level, 40},
		{capsule, surface.Upright, 90},
		{capsule, surface.Level, 40},
		{cube, surface.AnyPosition, 50},
		{cube, surface.Level, 50},
		{shape.Cylinder(mm(50), mm(50)), surface.AnyPosition, 50},
	} {
		for _, v := range []float64{0, 1} {
			for _, wall := range []float64{25, 26, 90} {
				c := surface.Convection{Body: tt.body, Position: tt.position, Fluid: props.Air(), Ambient: celsius(25), Speed: speed(v)}
				got := film(t, c, celsius(wall))
				c.Position, c.Length = surface.AnyPosition, mm(tt.height)
				if want := film(t, c, celsius(wall)); got != want {
					t.Errorf("%v, %v, at %g °C: %v, with its height %v", tt.body, tt.position, wall, got.Coefficient, want.Coefficient)
				}
				c.Length = mm(tt.height * 1.2)
				if wall > 25 && film(t, c, celsius(wall)) == got {
					t.Errorf("%v: another height that is given does not count", tt.body)
				}
			}
		}
	}
}

// A level disk and a level ring have their face over their perimeter, D/4 and (D − d)/4, whatever the length of the stream; both faces are
// the mean of each.
func TestLevelDisk(t *testing.T) {
	disk := shape.Cylinder(millimetres(200), millimetres(10)).Exposing(shape.Ends)
	ring := shape.Ring(millimetres(400), millimetres(200), millimetres(10)).Exposing(shape.Ends)
	for _, tt := range []struct {
		body shape.Body
		want float64
	}{{disk, 0.05}, {ring, 0.05}} {
		c := surface.Convection{Body: tt.body, Position: surface.Level, Fluid: props.Air(), Ambient: celsius(25)}
		f := film(t, c, celsius(90))
		near(t, "length", f.Length.SI(), tt.want, 1e-12, "face over perimeter")
		if f.Handover != "" {
			t.Fatalf("%+v", f)
		}
		up, down := 0.54, 0.52
		want := (up*math.Pow(f.Ra, 0.25) + down*math.Pow(f.Ra, 0.2)) / 2
		near(t, "Nu", f.Nu, want, 1e-9*want, "McAdams, and Radziemska and Lewandowski, one face each")
		c.Speed, c.Length = speed(1), millimetres(150)
		near(t, "length in a stream", film(t, c, celsius(90)).Length.SI(), tt.want, 1e-12, "face over perimeter")
	}
}

func TestLengthIsAskedFor(t *testing.T) {
	brick := shape.Brick(millimetres(200), millimetres(60), millimetres(100))
	disk := shape.Cylinder(millimetres(200), millimetres(10)).Exposing(shape.Ends)
	for name, c := range map[string]surface.Convection{
		"brick":                {Body: brick},
		"weighed":              {Body: shape.Measured(units.Litre.Of(1.1), squares(0.065)), Position: surface.Level},
		"upright plate":        {Body: plate(0.02), Position: surface.Upright},
		"level plate":          {Body: plate(0.02), Position: surface.Level},
		"upright disk":         {Body: disk, Position: surface.Upright},
		"level disk, stream":   {Body: disk, Position: surface.Level, Speed: speed(1)},
		"too tall for its box": {Body: shape.Brick(millimetres(1000), millimetres(20), millimetres(20)), Position: surface.Upright},
	} {
		c.Fluid, c.Ambient = props.Air(), celsius(25)
		var bad *units.ArgumentError
		if _, err := c.Film(celsius(60)); !errors.As(err, &bad) || bad.Field != "convection: length" {
			t.Errorf("%s: %v", name, err)
		}
	}
}

package main

import (
	"fmt"
	"math"

	"gonum.org/v1/plot/plotter"
)

// centreChart draws the temperature in the middle.
func centreChart(f form) (*chart, error) {
	c := newChart(
		f.title+": temperature in the middle",
		"Fo = α t / R²,  R is "+f.length,
		"θ = (T − ambient) / (start − ambient)",
	)
	p := c.plot
	p.X.Min, p.X.Max, p.Y.Min, p.Y.Max = math.Log10(firstFo), math.Log10(lastFo), math.Log10(leastTheta), 0
	p.Y.Tick.Marker = decades{}
	p.Add(grid{})
	for i, bi := range biots {
		curve, err := centreCurve(f, bi)
		if err != nil {
			return nil, err
		}
		name, at := number(bi), math.Log10(0.012)
		if i == 0 {
			name = "Bi = " + name
		}
		if i%2 == 1 {
			at = math.Log10(0.03)
		}
		if err := c.add(curve, shade(i, len(biots)), name, func(q plotter.XY) bool { return q.Y < at }); err != nil {
			return nil, err
		}
	}
	return c, nil
}

// places are the fractions of the way from the middle to the surface.
var places = []float64{0.2, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1}

// positionChart draws the temperature elsewhere over that in the middle.
func positionChart(f form) (*chart, error) {
	c := newChart(
		f.title+": temperature at the distance r from the middle, from Fo = 0.2 on",
		"Bi = h R / k,  R is "+f.length,
		"θ / θ in the middle",
	)
	p := c.plot
	p.X.Min, p.X.Max, p.Y.Min, p.Y.Max = math.Log10(firstBiot), math.Log10(lastBiot), 0, 1
	p.Y.Tick.Marker = tenths{}
	p.Add(grid{})
	for i, x := range places {
		curve, err := positionCurve(f, x)
		if err != nil {
			return nil, err
		}
		name := fmt.Sprintf("%.1f", x)
		switch x {
		case 1:
			name = "surface"
		case places[0]:
			name = "r/R = " + name
		}
		at := math.Log10(3)
		if i%2 == 1 {
			at = math.Log10(5)
		}
		if err := c.add(curve, shade(i, len(places)), name, func(q plotter.XY) bool { return q.X > at }); err != nil {
			return nil, err
		}
	}
	return c, nil
}

// heatChart draws the part of the heat that has left.
func heatChart(f form) (*chart, error) {
	c := newChart(
		f.title+": heat that has left",
		"Bi² Fo = h² α t / k²,  R in Bi is "+f.length,
		"heat that has left / ρ c V (start − ambient)",
	)
	p := c.plot
	p.X.Min, p.X.Max, p.Y.Min, p.Y.Max = math.Log10(firstGroup), math.Log10(lastGroup), 0, 1
	p.Y.Tick.Marker = tenths{}
	p.Add(grid{})
	for i, bi := range heatBiots {
		curve, err := heatCurve(f, bi)
		if err != nil {
			return nil, err
		}
		name := number(bi)
		if i == 0 {
			name = "Bi = " + name
		}
		at := 0.5
		if i%2 == 1 {
			at = 0.6
		}
		if err := c.add(curve, shade(i, len(heatBiots)), name, func(q plotter.XY) bool { return q.Y > at }); err != nil {
			return nil, err
		}
	}
	return c, nil
}

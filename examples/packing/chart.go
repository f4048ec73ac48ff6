package main

import (
	"context"
	"fmt"
	"image/color"
	"io"
	"path/filepath"
	"strings"

	"gonum.org/v1/plot"
	"gonum.org/v1/plot/plotter"
	"gonum.org/v1/plot/vg"
	"gonum.org/v1/plot/vg/draw"

	"example.com/coolward"
	"example.com/coolward/correlations/surface"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

var (
	centreColour  = color.RGBA{0x7a, 0x1f, 0x5c, 0xff}
	surfaceColour = color.RGBA{0x1f, 0x77, 0x6a, 0xff}
	bandColour    = color.RGBA{0xe6, 0xd3, 0xe0, 0xff}
	targetColour  = color.RGBA{0x44, 0x44, 0x44, 0xff}
)

// drawChart draws the surface and the centre of one ball over time, with the band of the centre.
func drawChart(ctx context.Context, out io.Writer, o options, b ball, p prediction) error {
	end := units.Hour.Of(6)
	if p.slow.none == "" && p.slow.time.SI() > 0 {
		end = p.slow.time.Scale(1.15)
	}
	follow := func(exchange surface.Sum) (*coolward.Solution, error) {
		return o.problem(b, exchange, end, units.Temperature{}).Solve(ctx)
	}
	likely, err := follow(p.exchange)
	if err != nil {
		return err
	}
	fast, err := follow(p.exchange.High())
	if err != nil {
		return err
	}
	slow, err := follow(p.exchange.Low())
	if err != nil {
		return err
	}
	unit, name := axisUnit(end)
	var curves [4]plotter.XYs
	for i, c := range []struct {
		solution *coolward.Solution
		place    shape.Place
	}{{slow, shape.Centre()}, {fast, shape.Centre()}, {likely, shape.Centre()}, {likely, shape.Surface()}} {
		if curves[i], err = sample(c.solution, c.place, end, unit); err != nil {
			return err
		}
	}
	chart, err := compose(o, b, curves, unit(end), name)
	if err != nil {
		return err
	}
	base := strings.TrimSuffix(o.chart, filepath.Ext(o.chart))
	for _, file := range []string{base + ".png", base + ".svg"} {
		if err := chart.Save(26*vg.Centimeter, 16*vg.Centimeter, file); err != nil {
			return fmt.Errorf("chart: %w", err)
		}
	}
	_, err = fmt.Fprintf(out, "\nChart of this ball: %s.png and %s.svg\n", base, base)
	return err
}

// axisUnit returns the unit of the time axis. Its result is a function, because a unit has a type of
// its own kind.
func axisUnit(end units.Duration) (in func(units.Duration) float64, name string) {
	switch {
	case end.Compare(units.Hour.Of(5)) > 0:
		return func(d units.Duration) float64 { return d.In(units.Hour) }, "h"
	case end.Compare(units.Minute.Of(5)) > 0:
		return func(d units.Duration) float64 { return d.In(units.Minute) }, "min"
	}
	return func(d units.Duration) float64 { return d.In(units.Second) }, "s"
}

// sample reads a place of a solution at equal steps.
func sample(s *coolward.Solution, place shape.Place, end units.Duration, in func(units.Duration) float64) (plotter.XYs, error) {
	const n = 240
	points := make(plotter.XYs, n+1)
	for i := range points {
		t := end.Scale(float64(i) / n)
		T, err := s.At(place, t)
		if err != nil {
			return nil, err
		}
		points[i].X, points[i].Y = in(t), T.In(units.Celsius)
	}
	return points, nil
}

// compose puts the curves of slow centre, fast centre, centre and surface into a chart.
func compose(o options, b ball, curves [4]plotter.XYs, end float64, unit string) (*plot.Plot, error) {
	chart := plot.New()
	chart.Title.Text = fmt.Sprintf("%s ball, %v, %s, in %s at %v", shortName(b.material), b.diameter, o.scenario.finish, air(o.speed), o.ambient)
	chart.X.Label.Text = "time in " + unit
	chart.Y.Label.Text = "temperature in °C"
	for _, style := range []*draw.TextStyle{&chart.Title.TextStyle, &chart.X.Label.TextStyle, &chart.Y.Label.TextStyle, &chart.Legend.TextStyle, &chart.X.Tick.Label, &chart.Y.Tick.Label} {
		style.Font.Size = vg.Points(18)
	}
	chart.Legend.Top = true
	chart.Legend.Padding = vg.Points(4)
	chart.Legend.ThumbnailWidth = vg.Points(36)
	chart.Add(plotter.NewGrid())

	outline := append(plotter.XYs{}, curves[0]...)
	for i := len(curves[1]) - 1; i >= 0; i-- {
		outline = append(outline, curves[1][i])
	}
	band, err := plotter.NewPolygon(outline)
	if err != nil {
		return nil, err
	}
	band.Color = bandColour
	band.LineStyle.Width = 0
	centre, err := line(curves[2], centreColour, nil)
	if err != nil {
		return nil, err
	}
	surface, err := line(curves[3], surfaceColour, []vg.Length{vg.Points(10), vg.Points(5)})
	if err != nil {
		return nil, err
	}
	limit := o.target.In(units.Celsius)
	target, err := line(plotter.XYs{{X: 0, Y: limit}, {X: end, Y: limit}}, targetColour, []vg.Length{vg.Points(2), vg.Points(4)})
	if err != nil {
		return nil, err
	}
	chart.Add(band, target, surface, centre)
	chart.Legend.Add("centre", centre)
	chart.Legend.Add("surface", surface)
	chart.Legend.Add("centre, scatter of h at its limits", band)
	chart.Legend.Add(fmt.Sprintf("%.4v, may be bagged", o.target), target)
	chart.X.Min, chart.X.Max = 0, end
	return chart, nil
}

func line(points plotter.XYs, c color.Color, dashes []vg.Length) (*plotter.Line, error) {
	l, err := plotter.NewLine(points)
	if err != nil {
		return nil, err
	}
	l.LineStyle = draw.LineStyle{Color: c, Width: vg.Points(2.5), Dashes: dashes}
	return l, nil
}

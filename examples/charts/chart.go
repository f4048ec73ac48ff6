package main

import (
	"errors"
	"fmt"
	"image/color"
	"io"
	"math"
	"os"
	"strconv"

	"gonum.org/v1/plot"
	"gonum.org/v1/plot/font"
	"gonum.org/v1/plot/plotter"
	"gonum.org/v1/plot/vg"
	"gonum.org/v1/plot/vg/draw"
	"gonum.org/v1/plot/vg/vgimg"
	"gonum.org/v1/plot/vg/vgsvg"
)

var (
	paper     = color.RGBA{0xfd, 0xfc, 0xf8, 0xff}
	ink       = color.RGBA{0x22, 0x2b, 0x35, 0xff}
	fineGrid  = color.RGBA{0xec, 0xe8, 0xdf, 0xff}
	boldGrid  = color.RGBA{0xcf, 0xc8, 0xba, 0xff}
	coolest   = [3]float64{0x1d, 0x3f, 0x72} // of the first curve
	middling  = [3]float64{0x2a, 0x8c, 0x82}
	hottest   = [3]float64{0xc2, 0x4d, 0x2c} // of the last curve
	lineWidth = vg.Points(2)
)

const (
	chartWidth  = 26 * vg.Centimeter
	chartHeight = 18 * vg.Centimeter
	margin      = 0.6 * vg.Centimeter
)

// A chart is drawn by save.
type chart struct{ plot *plot.Plot }

// shade returns the colour of curve i of n.
func shade(i, n int) color.Color {
	at := 2 * float64(i) / float64(n-1)
	from, to := coolest, middling
	if at > 1 {
		at, from, to = at-1, middling, hottest
	}
	mix := func(k int) uint8 { return uint8(from[k] + (to[k]-from[k])*at + 0.5) }
	return color.RGBA{mix(0), mix(1), mix(2), 0xff}
}

// sans returns the font of all text.
func sans(size float64) font.Font {
	return font.Font{Typeface: "Liberation", Variant: "Sans", Size: vg.Points(size)}
}

// newChart returns an empty chart, whose axis of x is one of logarithms to the base of ten.
func newChart(title, x, y string) *chart {
	p := plot.New()
	p.BackgroundColor = paper
	p.Title.Text = title
	p.Title.Padding = vg.Points(14)
	p.X.Label.Text, p.Y.Label.Text = x, y
	p.X.Label.Padding, p.Y.Label.Padding = vg.Points(8), vg.Points(8)
	p.X.Padding, p.Y.Padding = 0, 0
	for style, size := range map[*draw.TextStyle]float64{
		&p.Title.TextStyle: 17, &p.X.Label.TextStyle: 15, &p.Y.Label.TextStyle: 15, &p.X.Tick.Label: 14, &p.Y.Tick.Label: 14,
	} {
		style.Font, style.Color = sans(size), ink
	}
	for _, axis := range []*plot.Axis{&p.X, &p.Y} {
		axis.Color, axis.Tick.Color = ink, ink
		axis.LineStyle.Width = vg.Points(1.2)
	}
	p.X.Tick.Marker = decades{}
	return &chart{p}
}

// save writes the chart as base.png and base.svg.
func (c *chart) save(base string) error {
	image := vgimg.PngCanvas{Canvas: vgimg.NewWith(vgimg.UseWH(chartWidth, chartHeight), vgimg.UseDPI(144))}
	vectors := vgsvg.New(chartWidth, chartHeight)
	for _, f := range []struct {
		canvas interface {
			vg.CanvasSizer
			io.WriterTo
		}
		name string
	}{{image, base + ".png"}, {vectors, base + ".svg"}} {
		page := draw.New(f.canvas)
		page.SetColor(paper)
		page.Fill(page.Rectangle.Path())
		c.plot.Draw(draw.Crop(page, margin, -margin, margin, -margin))
		file, err := os.Create(f.name)
		if err != nil {
			return fmt.Errorf("chart: %w", err)
		}
		_, err = f.canvas.WriteTo(file)
		if err := errors.Join(err, file.Close()); err != nil {
			return fmt.Errorf("chart: %w", err)
		}
	}
	return nil
}

// add puts a curve and its name into the chart. The name stands on the curve at the point for which at gives true
// first, turned with it.
func (c *chart) add(curve plotter.XYs, colour color.Color, name string, at func(plotter.XY) bool) error {
	line, err := plotter.NewLine(curve)
	if err != nil {
		return err
	}
	line.LineStyle = draw.LineStyle{Color: colour, Width: lineWidth}
	c.plot.Add(line)
	for i := 1; i < len(curve); i++ {
		if at(curve[i]) {
			c.plot.Add(tag{curve[i-1], curve[i], name, colour})
			break
		}
	}
	return nil
}

// A tag is a name on a curve, on a patch of paper.
type tag struct {
	before, here plotter.XY
	name         string
	colour       color.Color
}

// Plot implements plot.Plotter.
func (t tag) Plot(c draw.Canvas, p *plot.Plot) {
	x, y := p.Transforms(&c)
	a, b := vg.Point{X: x(t.before.X), Y: y(t.before.Y)}, vg.Point{X: x(t.here.X), Y: y(t.here.Y)}
	style := draw.TextStyle{
		Color: t.colour, Font: sans(14), XAlign: draw.XCenter, YAlign: -0.42, Handler: p.TextHandler,
		Rotation: math.Atan2(float64(b.Y-a.Y), float64(b.X-a.X)),
	}
	width, height := style.Width(t.name)/2+vg.Points(3), vg.Points(8)
	sin, cos := math.Sincos(style.Rotation)
	corner := func(u, v vg.Length) vg.Point {
		return vg.Point{X: b.X + u*vg.Length(cos) - v*vg.Length(sin), Y: b.Y + u*vg.Length(sin) + v*vg.Length(cos)}
	}
	c.FillPolygon(paper, []vg.Point{corner(-width, -height), corner(width, -height), corner(width, height), corner(-width, height)})
	c.FillText(style, b, t.name)
}

// A grid draws fine lines at all ticks and bold ones at those with a label.
type grid struct{}

// Plot implements plot.Plotter.
func (grid) Plot(c draw.Canvas, p *plot.Plot) {
	x, y := p.Transforms(&c)
	for _, bold := range []bool{false, true} {
		style := draw.LineStyle{Color: fineGrid, Width: vg.Points(0.7)}
		if bold {
			style = draw.LineStyle{Color: boldGrid, Width: vg.Points(1)}
		}
		for _, tick := range p.X.Tick.Marker.Ticks(p.X.Min, p.X.Max) {
			if at := x(tick.Value); tick.IsMinor() != bold && at > c.Min.X && at < c.Max.X {
				c.StrokeLine2(style, at, c.Min.Y, at, c.Max.Y)
			}
		}
		for _, tick := range p.Y.Tick.Marker.Ticks(p.Y.Min, p.Y.Max) {
			if at := y(tick.Value); tick.IsMinor() != bold && at > c.Min.Y && at < c.Max.Y {
				c.StrokeLine2(style, c.Min.X, at, c.Max.X, at)
			}
		}
	}
}

// Decades are the ticks of an axis of logarithms to the base of ten, with labels at the powers of ten and, on an axis of
// a few decades, at twice and five times of them.
type decades struct{}

// Ticks implements plot.Ticker.
func (decades) Ticks(low, high float64) []plot.Tick {
	var ticks []plot.Tick
	for power := math.Floor(low); power <= math.Ceil(high); power++ {
		for k := 1; k < 10; k++ {
			tick := plot.Tick{Value: power + math.Log10(float64(k))}
			if tick.Value < low-1e-9 || tick.Value > high+1e-9 {
				continue
			}
			if k == 1 || high-low < 5 && (k == 2 || k == 5) {
				tick.Label = strconv.FormatFloat(float64(k)*math.Pow(10, power), 'f', max(0, -int(power)), 64)
			}
			ticks = append(ticks, tick)
		}
	}
	return ticks
}

// Tenths are the ticks of an axis from 0 to 1.
type tenths struct{}

// Ticks implements plot.Ticker.
func (tenths) Ticks(float64, float64) []plot.Tick {
	var ticks []plot.Tick
	for i := range 51 {
		tick := plot.Tick{Value: float64(i) / 50}
		if i%5 == 0 {
			tick.Label = strconv.FormatFloat(tick.Value, 'f', 1, 64)
		}
		ticks = append(ticks, tick)
	}
	return ticks
}

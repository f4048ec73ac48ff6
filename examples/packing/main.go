// Command packing tells when balls from a tempering oven may be bagged: steel balls for bearings and
// glass balls for mills leave the oven, cool on a rack in still air or before a fan, and may be
// bagged once their centre is below a limit.
//
// Without arguments it prints the times for both materials and for diameters from 10 to 100 mm, compares
// the models on one ball, and draws how that ball cools. Run it with -help for its options.
package main

import (
	"context"
	"errors"
	"flag"
	"fmt"
	"io"
	"os"
	"os/signal"
	"path/filepath"
	"strconv"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func main() {
	ctx, stop := signal.NotifyContext(context.Background(), os.Interrupt)
	err := run(ctx, os.Stdout, os.Args[1:])
	stop()
	if err != nil {
		fmt.Fprintln(os.Stderr, "packing:", err)
		os.Exit(2)
	}
}

// run is the whole program.
func run(ctx context.Context, out io.Writer, args []string) error {
	o, err := readOptions(args)
	if errors.Is(err, flag.ErrHelp) {
		_, err = io.WriteString(out, usage)
		return err
	}
	if err != nil {
		return err
	}
	if err := printTable(ctx, out, o); err != nil {
		return err
	}
	picked := ball{o.pickedMaterial, o.pickedDiameter}
	p, err := o.predict(ctx, picked)
	if err != nil {
		return err
	}
	if err := printModels(ctx, out, o, picked, p); err != nil {
		return err
	}
	if err := printSureness(ctx, out, o, picked, p); err != nil {
		return err
	}
	if err := drawChart(ctx, out, o, picked, p); err != nil {
		return err
	}
	_, err = io.WriteString(out, caution)
	return err
}

const caution = `
Caution: these are estimates from correlations. A ball that is computed to be cool may not be; metal at
60 °C burns skin within seconds. Measure the first lot, keep hot racks out of reach, and follow the local
rules of the workplace.
`

const usage = `packing: when may balls from a tempering oven be bagged?

  packing                                            both materials, 10 to 100 mm, still air
  packing -speed "2 m/s"                             the same before a fan
  packing -material glass -diameter "60 mm"          one ball
  packing -material steel -diameter "2 in" -start "400 °F" -target "120 °F" -finish blackened
  packing -material glass -diameter "60 mm" -derivation   with every intermediate value

Options, each number with its unit:
  -diameter LENGTH      of the balls (without it: 10, 20, 40, 60, 80 and 100 mm)
  -material NAME        steel or glass (without it: both)
  -finish NAME          polished or blackened (polished)
  -speed VELOCITY       of the air past the balls ("0 m/s", still air)
  -start TEMPERATURE    at which the balls leave the oven ("180 °C")
  -ambient TEMPERATURE  of the air and of the walls ("25 °C")
  -target TEMPERATURE   that the centre must reach ("50 °C")
  -accuracy DIFFERENCE  that the model may err ("0.5 K")
  -chart FILE           for the chart, written as PNG and as SVG (packing.png)
  -derivation           print every intermediate value, source and warning of one ball
`

// A scenario is what all balls have in common.
type scenario struct {
	start, ambient, target units.Temperature
	speed                  units.Velocity
	accuracy               units.TemperatureDifference
	finish                 finish
}

// options is what the command line says.
type options struct {
	scenario
	materials      []props.Solid
	diameters      []units.Length
	pickedMaterial props.Solid  // of the one ball that is compared and drawn
	pickedDiameter units.Length // of it
	chart          string
	derivation     bool
}

// readOptions reads the command line. Its errors fit on one line.
func readOptions(args []string) (options, error) {
	var o options
	var diameter units.Length
	var material, finish string
	flags := flag.NewFlagSet("packing", flag.ContinueOnError)
	flags.SetOutput(io.Discard)
	flags.TextVar(&diameter, "diameter", units.Millimetre.Of(60), "")
	flags.StringVar(&material, "material", "", "")
	flags.StringVar(&finish, "finish", "polished", "")
	flags.TextVar(&o.speed, "speed", units.MetrePerSecond.Of(0), "")
	flags.TextVar(&o.start, "start", units.Celsius.Of(180), "")
	flags.TextVar(&o.ambient, "ambient", units.Celsius.Of(25), "")
	flags.TextVar(&o.target, "target", units.Celsius.Of(50), "")
	flags.TextVar(&o.accuracy, "accuracy", units.KelvinDifference.Of(0.5), "")
	flags.StringVar(&o.chart, "chart", "packing.png", "")
	flags.BoolVar(&o.derivation, "derivation", false, "")
	if err := flags.Parse(args); err != nil {
		return o, err
	}
	if flags.NArg() > 0 {
		return o, fmt.Errorf("unexpected argument %q; -help lists the options", flags.Arg(0))
	}
	given := map[string]bool{}
	flags.Visit(func(f *flag.Flag) { given[f.Name] = true })

	for _, d := range []float64{10, 20, 40, 60, 80, 100} {
		o.diameters = append(o.diameters, units.Millimetre.Of(d))
	}
	o.pickedDiameter = diameter
	if given["diameter"] {
		o.diameters = []units.Length{diameter}
	}
	o.materials = []props.Solid{props.CarbonSteel(), props.Glass()}
	o.pickedMaterial = props.Glass()
	if given["material"] {
		m, err := materialNamed(material)
		if err != nil {
			return o, err
		}
		o.materials, o.pickedMaterial = []props.Solid{m}, m
	}
	for _, err := range []error{
		units.CheckPositive("diameter", diameter),
		units.CheckPositive("accuracy", o.accuracy),
		units.CheckNotNegative("speed", o.speed),
		units.CheckTemperature("start", o.start),
		units.CheckTemperature("ambient", o.ambient),
		units.CheckTemperature("target", o.target),
	} {
		if err != nil {
			return o, err
		}
	}
	if ext := filepath.Ext(o.chart); o.chart == "" || ext != "" && ext != ".png" && ext != ".svg" {
		return o, &units.ArgumentError{Field: "chart", Value: strconv.Quote(o.chart), Accepted: "a file name that ends in .png or .svg, or in neither"}
	}
	var err error
	o.scenario.finish, err = finishNamed(finish)
	return o, err
}

package main

import (
	"cmp"
	"context"
	"fmt"
	"io"
	"slices"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
	"example.com/coolward/units/uncertain"
)

// printSureness prints how sure the time of one ball is when everything is uncertain that is in
// practice: the inputs are independent, and none is at its limit for certain.
func printSureness(ctx context.Context, out io.Writer, o options, b ball, p prediction) error {
	if p.likely.none != "" || p.likely.time.SI() == 0 {
		return nil
	}
	film, err := surface.Convection{Body: b.body(), Fluid: props.Air(), Ambient: o.ambient, Speed: o.speed}.Film(units.MeanTemperature(o.start, o.target))
	if err != nil {
		return err
	}
	e := emissivityOf(b.material, o.scenario.finish)
	kelvins := units.KelvinDifference.Of

	var study uncertain.Study
	convection := uncertain.Add(&study, "convection coefficient", uncertain.PerCent(uncertain.Number(1), 100*film.Scatter).Normal(0.95), uncertain.Model("scatter of the correlations"))
	emissivity := uncertain.Add(&study, "emissivity", uncertain.Between(uncertain.Number(e.low), uncertain.Number(e.high)).Rectangular(), uncertain.Source(e.source))
	heat := uncertain.Add(&study, "heat content", uncertain.PerCent(uncertain.Number(1), 100*(b.material.SpecificHeatUncertainty()+b.material.DensityUncertainty())).Normal(0.95), uncertain.Source(b.material.UncertaintySource()))
	diameter := uncertain.Add(&study, "diameter", uncertain.PerCent(b.diameter, 1).Rectangular(), uncertain.Assumed("tolerance of the balls"))
	start := uncertain.Add(&study, "start", uncertain.PlusMinus(o.start, kelvins(3)).Rectangular(), uncertain.Assumed("spread of the oven"))
	ambient := uncertain.Add(&study, "ambient", uncertain.PlusMinus(o.ambient, kelvins(2)).Rectangular(), uncertain.Assumed("the hall over a shift"))

	answer, err := uncertain.Linearise(&study, func(x uncertain.Draw) (units.Duration, error) {
		s, b := o.scenario, ball{b.material, diameter.In(x)}
		s.start, s.ambient = start.In(x), ambient.In(x)
		exchange := surface.Sum{
			surface.Scaled{Part: surface.Convection{Body: b.body(), Fluid: props.Air(), Ambient: s.ambient, Speed: s.speed}, Factor: float64(convection.In(x))},
			surface.Radiation{Emissivity: float64(emissivity.In(x)), Surroundings: s.ambient},
		}
		solution, err := s.problem(b, exchange, horizon, s.target).Solve(ctx)
		if err != nil {
			return units.Duration{}, err
		}
		t, err := solution.TimeTo(shape.Centre(), s.target)
		return t.Scale(float64(heat.In(x))), err // all times grow with the heat that is to leave
	})
	if err != nil {
		fmt.Fprintf(out, "\nHow sure: no band can be given, because a value within the uncertainties has no answer: %v\n", err)
		return nil
	}
	fmt.Fprintf(out, "\nHow sure is the time of this ball, with everything uncertain that is in practice? %v\n", answer)
	fmt.Fprintln(out, "Each input by itself, at one standard uncertainty, changes the time by")
	contributions := slices.Clone(answer.Contributions)
	slices.SortFunc(contributions, func(a, b uncertain.Contribution[units.Duration]) int {
		return cmp.Compare(b.Change.Abs().SI(), a.Change.Abs().SI())
	})
	for _, c := range contributions {
		fmt.Fprintf(out, "  %-24s %6.1f min\n", c.Input, c.Change.Abs().In(units.Minute))
	}
	fmt.Fprintln(out, "Diameter ±1 %, start ±3 K and ambient ±2 K are assumed.")
	return nil
}

package main

import (
	"context"
	"errors"
	"fmt"
	"math"

	"example.com/coolward"
	"example.com/coolward/correlations/surface"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// horizon is how long a ball is followed at most.
var horizon = units.Day.Of(7)

// A prediction is the answer for one ball.
type prediction struct {
	likely, fast, slow answer
	solution           *coolward.Solution
	exchange           surface.Sum
}

// An answer is a time, or the reason that there is none.
type answer struct {
	time units.Duration
	none string
}

// predict asks when the centre of a ball reaches the target: for the correlations and the emissivity
// as published, and with both at the limits of their scatter.
func (s scenario) predict(ctx context.Context, b ball) (prediction, error) {
	p := prediction{exchange: s.exchange(b)}
	var err error
	if p.solution, p.likely, err = s.solve(ctx, b, p.exchange); err != nil {
		return p, err
	}
	if _, p.fast, err = s.solve(ctx, b, p.exchange.High()); err != nil {
		return p, err
	}
	_, p.slow, err = s.solve(ctx, b, p.exchange.Low())
	return p, err
}

func (s scenario) solve(ctx context.Context, b ball, exchange surface.Sum) (*coolward.Solution, answer, error) {
	solution, err := s.problem(b, exchange, horizon, s.target).Solve(ctx)
	if err != nil {
		return nil, answer{}, err
	}
	a, err := answerOf(solution.TimeTo(shape.Centre(), s.target))
	return solution, a, err
}

func (s scenario) problem(b ball, exchange surface.Sum, horizon units.Duration, until units.Temperature) coolward.Problem {
	return coolward.Problem{
		Body:     b.body(),
		Material: b.material,
		Initial:  s.start,
		Surface:  boundary.Function(exchange.Flux),
		Accuracy: s.accuracy,
		Horizon:  horizon,
		Until:    until,
		Sources:  append(exchange.Sources(), "emissivity: "+emissivityOf(b.material, s.finish).source),
		Notes:    exchange.Notes(),
		Warnings: exchange.Warnings(),
	}
}

// answerOf turns "never" and "not within the horizon" into words; they are answers, not failures.
func answerOf(t units.Duration, err error) (answer, error) {
	var never *units.NeverError
	var late *units.HorizonError
	switch {
	case errors.As(err, &never):
		return answer{none: "never, tends to " + never.Limit.Text(units.Celsius, 1)}, nil
	case errors.As(err, &late):
		return answer{none: "not within " + late.Horizon.String()}, nil
	}
	return answer{time: t}, err
}

// answers writes the three answers of a prediction in one unit, rounded to what the band between them
// leaves known, the ends outwards.
func (p prediction) answers() (likely, fast, slow string) {
	unit, name := units.Second, "s"
	switch t := p.likely.time; {
	case t.Compare(units.Hour.Of(3)) >= 0:
		unit, name = units.Hour, "h"
	case t.Compare(units.Minute.Of(3)) >= 0:
		unit, name = units.Minute, "min"
	}
	half := max(p.slow.time.Sub(p.fast.time).In(unit)/2, 0.01*p.likely.time.In(unit), 1e-9)
	step := math.Pow(10, math.Floor(math.Log10(half/4)))
	decimals := max(0, -int(math.Floor(math.Log10(step))))
	write := func(a answer, round func(float64) float64) string {
		switch {
		case a.none != "":
			return a.none
		case a.time.SI() == 0:
			return "at the start"
		}
		return fmt.Sprintf("%.*f %s", decimals, round(a.time.In(unit)/step)*step, name)
	}
	return write(p.likely, math.Round), write(p.fast, math.Floor), write(p.slow, math.Ceil)
}

// coefficient is the total coefficient at a surface temperature with the share of radiation.
func coefficient(exchange surface.Sum, wall, ambient units.Temperature) (total units.HeatTransferCoefficient, radiation float64, err error) {
	parts, err := exchange.Parts(units.Duration{}, wall)
	if err != nil {
		return total, 0, err
	}
	var flux units.HeatFlux
	for _, p := range parts {
		flux = flux.Add(p.Flux)
	}
	total = units.WattPerSquareMetreKelvin.Of(flux.SI() / wall.Sub(ambient).SI())
	return total, math.Abs(parts[1].Share), nil // negative where the body is heated
}

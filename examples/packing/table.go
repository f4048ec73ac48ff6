package main

import (
	"context"
	"errors"
	"fmt"
	"io"
	"strings"
	"text/tabwriter"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// printTable prints a row for each ball.
func printTable(ctx context.Context, out io.Writer, o options) error {
	failed := 0
	var first error
	fmt.Fprintf(out, "Balls leave the oven at %v into %s at %v, %s. When is the centre at %v?\n\n",
		o.start, air(o.speed), o.ambient, o.scenario.finish, o.target)
	w := tabwriter.NewWriter(out, 0, 0, 2, ' ', 0)
	fmt.Fprintln(w, "ball\tlikely\tfast end\tslow end\th R/k\th (V/A)/k\th at start\th at target\tmodel\twhy")
	for _, m := range o.materials {
		for _, d := range o.diameters {
			b := ball{m, d}
			p, err := o.predict(ctx, b)
			var outside *units.RangeError
			if errors.As(err, &outside) {
				failed++
				if first == nil {
					first = fmt.Errorf("%v ball of %s: %w", d, shortName(m), outside)
				}
				fmt.Fprintf(w, "%s %v\tno answer: %v\n", shortName(m), d, outside)
				continue
			}
			if err != nil {
				return fmt.Errorf("%v ball of %s: %w", d, shortName(m), err)
			}
			end, err := hAtTarget(o.scenario, p)
			if err != nil {
				return err
			}
			likely, fast, slow := p.answers()
			bi := p.solution.Biot()
			fmt.Fprintf(w, "%s %v\t%s\t%s\t%s\t%.3g\t%.3g\t%s\t%s\t%v\t%s\n", shortName(m), d, likely, fast, slow,
				bi.Conduction, bi.Volume, hText(p.exchange, o.start, o.ambient), end, p.solution.Model(), p.solution.Reason())
		}
	}
	if failed == len(o.materials)*len(o.diameters) {
		return first // nothing to print
	}
	if err := w.Flush(); err != nil {
		return err
	}
	fmt.Fprint(out, `
Coefficients h in W/(m²·K), in brackets the shares of convection and of radiation. Both Biot numbers, with the
radius R and with V/A, at the largest h of the run.
Fast and slow end: the scatter of the correlations and the limits of the emissivity, all of them at their limits
at once. The properties of the balls, their size and the air temperature are taken as exact; in practice they
widen the band. Sources:
`)
	for _, m := range o.materials {
		e := emissivityOf(m, o.scenario.finish)
		fmt.Fprint(out, wrap(fmt.Sprintf("%s: %s", shortName(m), m.Source())),
			wrap(fmt.Sprintf("%s, emissivity %.3g (%.3g to %.3g): %s", shortName(m), e.likely, e.low, e.high, e.source)))
	}
	for _, s := range (ball{o.materials[0], o.diameters[0]}).sources(o.scenario) {
		fmt.Fprint(out, wrap(s))
	}
	return nil
}

// wrap breaks a source into lines that fit beside each other, the first marked.
func wrap(text string) string {
	const width = 110
	var b strings.Builder
	line := "-"
	for _, word := range strings.Fields(text) {
		if len(line)+1+len(word) > width {
			b.WriteString(line + "\n")
			line = " "
		}
		line += " " + word
	}
	return b.String() + line + "\n"
}

func (b ball) sources(s scenario) []string { return s.exchange(b).Sources() }

func air(speed units.Velocity) string {
	if speed.SI() == 0 {
		return "still air"
	}
	return "air of " + speed.String()
}

// hAtTarget is the coefficient when the centre is at the target.
func hAtTarget(s scenario, p prediction) (string, error) {
	if p.likely.none != "" {
		return "–", nil
	}
	wall, err := p.solution.At(shape.Surface(), p.likely.time)
	if err != nil {
		return "", err
	}
	return hText(p.exchange, wall, s.ambient), nil
}

// hText writes a coefficient with its shares; there is none without a difference of temperature.
func hText(exchange surface.Sum, wall, ambient units.Temperature) string {
	h, radiation, err := coefficient(exchange, wall, ambient)
	if err != nil || !h.IsFinite() {
		return "–"
	}
	return fmt.Sprintf("%.3g (%.0f + %.0f %%)", h.In(units.WattPerSquareMetreKelvin), 100*(1-radiation), 100*radiation)
}

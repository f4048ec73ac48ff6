package main

import (
	"context"
	"errors"
	"fmt"
	"io"
	"math"
	"slices"
	"text/tabwriter"

	"gonum.org/v1/gonum/integrate"

	"example.com/coolward"
	"example.com/coolward/fdm"
	"example.com/coolward/lumped"
	"example.com/coolward/props"
	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// printModels compares the three models on one ball with one constant coefficient, and puts the
// exchange as it is beside them.
func printModels(ctx context.Context, out io.Writer, o options, b ball, p prediction) error {
	fmt.Fprintf(out, "\nOne ball, %s, %v: the three models on one constant h\n\n", shortName(b.material), b.diameter)
	if p.likely.none != "" || p.likely.time.SI() == 0 {
		fmt.Fprintf(out, "No comparison. The centre at %v: %s.\n", o.target, sayAnswer(p.likely))
		return printDerivation(out, o, p.solution)
	}
	h, err := meanCoefficient(o.scenario, p)
	if err != nil {
		return err
	}
	middle := units.MeanTemperature(o.start, o.target)
	constant, err := constantSolid(b.material, middle)
	if err != nil {
		return err
	}
	w := tabwriter.NewWriter(out, 0, 0, 2, ' ', 0)
	fmt.Fprintln(w, "model\tcentre at target\tsurface at target\tsurface then\tmodel error, about")
	conditions := boundary.Constant(h, o.ambient)
	lump, err1 := lumped.Problem{Body: b.body(), Material: constant, Initial: o.start, Surface: conditions}.Solve(ctx)
	exact, err2 := seriesProblem(b, constant, middle, o.start, conditions).Solve(ctx)
	fine, err3 := fdm.Problem{Body: b.body(), Material: constant, Initial: o.start, Surface: conditions, Horizon: p.likely.time.Scale(3)}.Solve(ctx)
	if err := errors.Join(err1, err2, err3); err != nil {
		return err
	}
	lumping, err := lump.LumpingError(shape.Centre())
	if err != nil {
		return err
	}
	truncation, err1 := exact.TruncationError(p.likely.time)
	numerical, err2 := fine.ErrorEstimate(shape.Centre(), p.likely.time)
	if err := errors.Join(err1, err2); err != nil {
		return err
	}
	for _, row := range []struct {
		name     string
		solution solution
		bound    units.TemperatureDifference
	}{
		{"one temperature (lumped)", lump, lumping},
		{"exact series", exact, truncation},
		{"finite volumes", fine, numerical},
		{"real exchange (" + p.solution.Model().String() + ")", p.solution, p.solution.ModelError()},
	} {
		if err := printModel(w, row.name, row.solution, row.bound, o.target); err != nil {
			return err
		}
	}
	if err := w.Flush(); err != nil {
		return err
	}
	k, _ := constant.Conductivity(middle)
	c, _ := constant.SpecificHeat(middle)
	fmt.Fprintf(out, `
The first three take h = %.4v, the mean over the run weighted by heat, and the properties
at %v: k = %.4v, c = %.4v, ρ = %v.
The last takes h and the properties as they change.
Times have more digits than are known, so that the models can be told apart.
`, h, middle, k, c, constant.Density())
	return printDerivation(out, o, p.solution)
}

// A solution is what this program asks of every model.
type solution interface {
	At(place shape.Place, t units.Duration) (units.Temperature, error)
	TimeTo(place shape.Place, target units.Temperature) (units.Duration, error)
}

// errorText writes a model error; below a microkelvin it is rounding.
func errorText(d units.TemperatureDifference) string {
	if d.SI() < 1e-6 {
		return "< 1 µK"
	}
	return d.Text(units.KelvinDifference, 2)
}

func printModel(w io.Writer, name string, s solution, bound units.TemperatureDifference, target units.Temperature) error {
	centre, err := s.TimeTo(shape.Centre(), target)
	if err != nil {
		return err
	}
	surface, err := s.TimeTo(shape.Surface(), target)
	if err != nil {
		return err
	}
	then, err := s.At(shape.Surface(), centre)
	if err != nil {
		return err
	}
	fmt.Fprintf(w, "%s\t%.4v\t%.4v\t%s\t%s\n", name, centre, surface, then.Text(units.Celsius, 2), errorText(bound))
	return nil
}

// meanCoefficient returns the coefficient of the run up to the target, weighted by heat: ∫ h dQ / Q.
func meanCoefficient(s scenario, p prediction) (units.HeatTransferCoefficient, error) {
	const n = 200
	heat, weighted := make([]float64, n+1), make([]float64, n+1)
	for i := range heat {
		t := p.likely.time.Scale(float64(i) / n)
		q, err := p.solution.HeatReleased(t)
		if err != nil {
			return units.HeatTransferCoefficient{}, err
		}
		wall, err := p.solution.At(shape.Surface(), t)
		if err != nil {
			return units.HeatTransferCoefficient{}, err
		}
		h, _, err := coefficient(p.exchange, wall, s.ambient)
		if err != nil {
			return units.HeatTransferCoefficient{}, err
		}
		heat[i], weighted[i] = math.Abs(q.SI()), h.SI() // heat goes in one direction
	}
	if !slices.IsSorted(heat) {
		return units.HeatTransferCoefficient{}, errors.New("the heat of the ball does not go in one direction")
	}
	mean := integrate.Trapezoidal(heat, weighted) / (heat[n] - heat[0])
	return units.WattPerSquareMetreKelvin.Of(mean), nil
}

// constantSolid freezes the properties of a solid at a temperature.
func constantSolid(m props.Solid, at units.Temperature) (props.Solid, error) {
	k, err1 := m.Conductivity(at)
	c, err2 := m.SpecificHeat(at)
	if err := errors.Join(err1, err2); err != nil {
		return m, err
	}
	return props.Constant(m.Name()+" at "+at.String(), m.Density(), c, k)
}

func seriesProblem(b ball, m props.Solid, at, start units.Temperature, surface boundary.Condition) series.Problem {
	k, _ := m.Conductivity(at) // of a constant solid
	c, _ := m.SpecificHeat(at)
	return series.Problem{Body: b.body(), Conductivity: k, Density: m.Density(), SpecificHeat: c, Initial: start, Surface: surface}
}

func sayAnswer(a answer) string {
	if a.none != "" {
		return a.none
	}
	return "from the start"
}

// printDerivation prints how the answer for the one ball was obtained, if that was asked for.
func printDerivation(out io.Writer, o options, s *coolward.Solution) error {
	if !o.derivation {
		return nil
	}
	_, err := fmt.Fprintf(out, "\nHow the answer with the real exchange was obtained\n\n%v", s.Derivation())
	return err
}

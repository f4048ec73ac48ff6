package uncertain_test

import (
	"context"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/uncertain"
)

var sink float64

// Five inputs and a model of a few nanoseconds: what a sample costs beyond the prediction.
func BenchmarkSample(b *testing.B) {
	for _, bb := range []struct {
		name string
		omit bool
	}{{"distribution", true}, {"with shares", false}} {
		b.Run(bb.name, func(b *testing.B) {
			s, model := store()
			s.OmitShares, s.Workers, s.Trials = bb.omit, 1, 10240
			evaluations := 0
			b.ReportAllocs()
			for b.Loop() {
				r, err := uncertain.Propagate(context.Background(), s, model)
				if err != nil {
					b.Fatal(err)
				}
				evaluations += r.Evaluations
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(evaluations), "ns/evaluation")
		})
	}
}

// The model of BenchmarkSample alone, with constants.
func BenchmarkModelAlone(b *testing.B) {
	tau, ambient, start, target, f := 9000.0, 2.5, 60.0, 5.0, 1.0
	for b.Loop() {
		sink = f * tau * math.Log((start-ambient)/(target-ambient))
	}
}

// store is a study of a box that cools in a cold store: five independent inputs.
func store() (*uncertain.Study, func(uncertain.Draw) (units.Duration, error)) {
	s := new(uncertain.Study)
	said := uncertain.Source("label")
	tau := uncertain.Add(s, "time constant", uncertain.WithinFactor(units.Hour.Of(2.5), 1.2).LogNormal(0.95), said)
	ambient := uncertain.Add(s, "store", uncertain.PlusMinus(units.Celsius.Of(1), units.KelvinDifference.Of(1)).Rectangular(), said)
	start := uncertain.Add(s, "start", uncertain.Normal(units.Celsius.Of(60), units.KelvinDifference.Of(1.5)), said)
	target := uncertain.Add(s, "thermometer", uncertain.PlusMinus(units.Celsius.Of(5), units.KelvinDifference.Of(0.3)).Normal(0.95), said)
	model := uncertain.Add(s, "model", uncertain.PerCent(uncertain.Number(1), 10).Triangular(), uncertain.Model("compared with three logs"))
	return s, func(x uncertain.Draw) (units.Duration, error) {
		room := ambient.In(x)
		ratio := start.In(x).Sub(room).Ratio(target.In(x).Sub(room))
		return tau.In(x).Scale(math.Log(ratio) * float64(model.In(x))), nil
	}
}

func BenchmarkStudentInput(b *testing.B) {
	var s uncertain.Study
	in := uncertain.Add(&s, "length", uncertain.StudentT(units.Millimetre.Of(50), units.Micrometre.Of(2), 18), uncertain.Source("certificate"))
	s.OmitShares, s.Workers, s.Trials = true, 1, 10240
	for b.Loop() {
		r, err := uncertain.Propagate(context.Background(), &s, func(x uncertain.Draw) (units.Length, error) { return in.In(x), nil })
		if err != nil {
			b.Fatal(err)
		}
		sink = r.Mean.SI()
	}
}

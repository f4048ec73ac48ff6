package uncertain_test

import (
	"context"
	"encoding/json"
	"errors"
	"math"
	"strings"
	"sync/atomic"
	"testing"
	"time"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.com/coolward/units"
	"example.com/coolward/units/uncertain"
)

// The digits depend on the seed and on nothing else.
func TestSameDigitsOnAnyWorkers(t *testing.T) {
	s, model := store()
	s.Seed, s.Trials = 11, 25600
	run := func(workers int) string {
		s.Workers = workers
		r, err := uncertain.Propagate(t.Context(), s, model)
		require.NoError(t, err)
		text, err := json.Marshal(r)
		require.NoError(t, err)
		return string(text)
	}
	one := run(1)
	for _, workers := range []int{2, 3, 8} {
		assert.Equal(t, one, run(workers), "%d workers", workers)
	}
	s.Seed++
	assert.NotEqual(t, one, run(1))
}

// A study that has ended stops within one evaluation of each worker.
func TestCancel(t *testing.T) {
	s, model := store()
	s.Digits, s.Trials, s.Workers = 3, 1e7, 2
	ctx, cancel := context.WithCancel(t.Context())
	var after atomic.Int64
	calls := new(atomic.Int64)
	_, err := uncertain.Propagate(ctx, s, func(x uncertain.Draw) (units.Duration, error) {
		if calls.Add(1) == 5000 {
			cancel()
		}
		if ctx.Err() != nil {
			after.Add(1)
		}
		return model(x)
	})
	require.ErrorIs(t, err, context.Canceled)
	assert.LessOrEqual(t, after.Load(), int64(4), "evaluations after the end of the context")

	expired, cancel := context.WithTimeout(t.Context(), time.Nanosecond)
	defer cancel()
	<-expired.Done()
	_, err = uncertain.Propagate(expired, s, model)
	require.ErrorIs(t, err, context.DeadlineExceeded)
}

func TestProgress(t *testing.T) {
	s, model := store()
	last := 0
	s.Progress = func(done, planned int) {
		assert.GreaterOrEqual(t, done, last)
		assert.LessOrEqual(t, done, planned)
		last = done
	}
	r, err := uncertain.Propagate(t.Context(), s, model)
	require.NoError(t, err)
	assert.Equal(t, r.Evaluations, last)
	assert.Equal(t, 10240+5*5120+5*2560, last) // as the field OmitShares says
}

// Cases without an answer are counted by kind. The input is rectangular on 0 to 1, so that a hypercube hits each part
// of it to within a stratum or two of each block.
func TestMissing(t *testing.T) {
	var s uncertain.Study
	in := rectangular(&s, "x", 0, 1)
	temperature := units.Celsius.Of(5)
	other := errors.New("pump off")
	r, err := uncertain.Propagate(t.Context(), &s, func(x uncertain.Draw) (number, error) {
		switch v := in.In(x); {
		case v < 0.05:
			return 0, &units.NeverError{Place: "centre", Target: temperature, Limit: temperature}
		case v < 0.15:
			return 0, &units.HorizonError{Place: "centre", Target: temperature}
		case v < 0.20:
			return 0, &units.RangeError{Model: "table"}
		case v < 0.22:
			return 0, &units.ArgumentError{Field: "diameter"}
		case v < 0.23:
			return 0, &units.ConvergenceError{Method: "steps"}
		case v < 0.26:
			return number(math.Inf(1)), nil
		case v < 0.30:
			return 0, other
		default:
			return v, nil
		}
	})
	require.NoError(t, err)
	want := map[uncertain.Kind]float64{
		uncertain.Never: 0.05, uncertain.BeyondHorizon: 0.10, uncertain.OutOfRange: 0.05, uncertain.NotAccepted: 0.02,
		uncertain.NotConverged: 0.01, uncertain.NotFinite: 0.03, uncertain.Other: 0.04,
	}
	require.Len(t, r.Missing, len(want))
	total := r.Answered
	for _, m := range r.Missing {
		assert.InDelta(t, want[m.Kind], float64(m.Cases)/float64(r.Cases), 2*2/512.0, "%v", m.Kind)
		assert.Equal(t, m.First.Error(), m.Text)
		total += m.Cases
	}
	assert.Equal(t, r.Cases, total)
	within(t, "mean of those that have an answer", r.Mean, r.Errors.Mean, 0.65)
	within(t, "low", r.Low, r.Errors.Low, 0.3+0.7*0.025)
	assert.Contains(t, r.String(), "70 % of the cases have an answer (4 % fail, 5 % never reach it, 10 % do not reach it within the horizon")
	assert.Contains(t, r.Report(), "pump off")

	// Too few are an error that leads to the errors of the model.
	_, err = uncertain.Propagate(t.Context(), &s, func(x uncertain.Draw) (number, error) {
		if in.In(x) < 0.5 {
			return 0, &units.NeverError{Place: "centre", Target: temperature, Limit: temperature}
		}
		return 0, other
	})
	var none *uncertain.NoAnswerError
	require.ErrorAs(t, err, &none)
	assert.Equal(t, 0, none.Answered)
	var never *units.NeverError
	require.ErrorAs(t, err, &never)
	require.ErrorIs(t, err, other)
	assert.Contains(t, err.Error(), "0 of 10240 cases have an answer")
}

// Statements that cannot be used are refused with the name of the input and the field.
func TestRefused(t *testing.T) {
	length, nan := units.Millimetre.Of, math.NaN()
	kelvin, celsius := units.KelvinDifference.Of, units.Celsius.Of
	add := func(d uncertain.Distribution[units.Length]) func(*uncertain.Study) {
		return func(s *uncertain.Study) { uncertain.Add(s, "size", d, example) }
	}
	numbers := func(d uncertain.Distribution[number]) func(*uncertain.Study) {
		return func(s *uncertain.Study) { uncertain.Add(s, "size", d, example) }
	}
	two := func(s *uncertain.Study) (a, b uncertain.Input[number]) {
		return normal(s, "a", 0, 1), normal(s, "b", 0, 1)
	}
	for _, c := range []struct {
		name, field string
		state       func(s *uncertain.Study)
	}{
		{"no input", "study", func(*uncertain.Study) {}},
		{"negative half-width", `input "size": half-width`, add(uncertain.PlusMinus(length(5), length(-1)).Rectangular())},
		{"NaN half-width", `input "size": half-width`, add(uncertain.PlusMinus(length(5), length(nan)).Normal(0.95))},
		{"infinite estimate", `input "size": estimate`, add(uncertain.PlusMinus(length(math.Inf(1)), length(1)).Triangular())},
		{"limits upside down", `input "size": lower limit`, add(uncertain.Between(length(5), length(4)).Rectangular())},
		{"NaN limit", `input "size": upper limit`, add(uncertain.Between(length(5), length(nan)).ArcSine())},
		{"limits too wide", `input "size": limits`, numbers(uncertain.Between(number(-1.7e308), number(1.7e308)).Rectangular())},
		{"negative per cent", `input "size": per cent`, add(uncertain.PerCent(length(5), -3).Rectangular())},
		{"factor below 1", `input "size": factor`, add(uncertain.WithinFactor(length(5), 0.8).LogNormal(0.95))},
		{"factor of nothing", `input "size": estimate`, add(uncertain.WithinFactor(length(0), 2).LogNormal(0.95))},
		{"log-normal of a negative limit", `input "size": lower limit`, add(uncertain.Between(length(-1), length(4)).LogNormal(0.95))},
		{"log-normal without a deviation", `input "size": limits`, numbers(uncertain.WithinFactor(number(1), 1e300).LogNormal(0.001))},
		{"coverage of 1", `input "size": coverage probability`, add(uncertain.PlusMinus(length(5), length(1)).Normal(1))},
		{"top above 1", `input "size": top of the trapezoid`, add(uncertain.PlusMinus(length(5), length(1)).Trapezoidal(1.1))},
		{"likeliest outside", `input "size": likeliest value`, add(uncertain.Between(length(5), length(6)).TriangularAt(length(7)))},
		{"negative standard uncertainty", `input "size": standard uncertainty`, add(uncertain.Normal(length(5), length(-1)))},
		{"two degrees of freedom", `input "size": degrees of freedom`, add(uncertain.StudentT(length(5), length(1), 2))},
		{"three readings", `input "size": readings`, add(uncertain.Readings(length(5), length(6), length(5)))},
		{"NaN reading", `input "size": readings`, add(uncertain.Readings(length(5), length(6), length(5), length(nan)))},
		{"empty sample", `input "size": sample`, add(uncertain.Sampled[units.Length]())},
		{"zero distribution", `input "size": distribution`, add(uncertain.Distribution[units.Length]{})},
		{"zero limits", `input "size": limits`, add(uncertain.Limits[units.Length]{}.Rectangular())},
		{"zero limits, triangular", `input "size": limits`, add(uncertain.Limits[units.Length]{}.TriangularAt(length(1)))},
		{"no name", `input "": name`, func(s *uncertain.Study) {
			uncertain.Add(s, "", uncertain.Normal(celsius(5), kelvin(1)), example)
		}},
		{"no origin", `input "air": origin`, func(s *uncertain.Study) {
			uncertain.Add(s, "air", uncertain.Normal(celsius(5), kelvin(1)), uncertain.Origin{})
		}},
		{"a name twice", `input "a": name`, func(s *uncertain.Study) { normal(s, "a", 0, 1); normal(s, "a", 0, 1) }},
		{"coefficient above 1", `correlation of "a" and "b"`, func(s *uncertain.Study) { a, b := two(s); s.Correlate(a, b, 1.1) }},
		{"NaN coefficient", `correlation of "a" and "b"`, func(s *uncertain.Study) { a, b := two(s); s.CorrelateRanks(a, b, nan) }},
		{"with itself", `correlation of "a" and "a"`, func(s *uncertain.Study) { a, _ := two(s); s.Correlate(a, a, 0.5) }},
		{"a pair twice", `correlation of "b" and "a"`, func(s *uncertain.Study) { a, b := two(s); s.Correlate(a, b, 0.5); s.Correlate(b, a, 0.5) }},
		{"an input of another study", "correlated input", func(s *uncertain.Study) {
			a, _ := two(s)
			s.Correlate(a, normal(new(uncertain.Study), "c", 0, 1), 0.5)
		}},
		{"no input to correlate", "correlated input", func(s *uncertain.Study) { a, _ := two(s); s.Correlate(a, nil, 0.5) }},
		{"not positive semidefinite", `correlations of "a", "b", "c"`, func(s *uncertain.Study) {
			a, b := two(s)
			c := normal(s, "c", 0, 1)
			s.Correlate(a, b, 0.9)
			s.Correlate(b, c, 0.9)
			s.Correlate(a, c, -0.9)
		}},
		{"a coefficient that the distributions cannot have", `correlation of "a" and "c"`, func(s *uncertain.Study) {
			a, _ := two(s)
			c := uncertain.Add(s, "c", uncertain.WithinFactor(number(1), 10).LogNormal(0.95), example)
			s.Correlate(a, c, -0.99) // −0.732 at most: σ/sqrt(exp(σ²) − 1) with σ = ln 10/1.96
		}},
		{"coverage", "coverage probability", func(s *uncertain.Study) { two(s); s.Coverage = 95 }},
		{"digits", "digits", func(s *uncertain.Study) { two(s); s.Digits = 9 }},
		{"workers", "workers", func(s *uncertain.Study) { two(s); s.Workers = -1 }},
		{"trials", "trials", func(s *uncertain.Study) { two(s); s.Trials = 100 }},
		{"negative trials", "trials", func(s *uncertain.Study) { two(s); s.Trials = -100000 }},
	} {
		var s uncertain.Study
		c.state(&s)
		zero := func(uncertain.Draw) (number, error) { return 0, nil }
		_, err := uncertain.Propagate(t.Context(), &s, zero)
		_, linear := uncertain.Linearise(&s, zero)
		for _, err := range []error{err, linear} {
			var argument *units.ArgumentError
			if assert.ErrorAs(t, err, &argument, c.name) {
				assert.Equal(t, c.field, argument.Field, c.name)
				assert.NotEmpty(t, argument.Accepted, c.name)
			}
		}
	}
}

func TestMisuse(t *testing.T) {
	s, model := store()
	var argument *units.ArgumentError
	_, err := uncertain.Propagate[units.Duration](t.Context(), s, nil)
	require.ErrorAs(t, err, &argument)
	_, err = uncertain.Linearise[units.Duration](s, nil)
	require.ErrorAs(t, err, &argument)
	var missing context.Context
	_, err = uncertain.Propagate(missing, s, model)
	require.ErrorAs(t, err, &argument)
	_, err = uncertain.Propagate(t.Context(), nil, model)
	require.ErrorAs(t, err, &argument)

	// A handle of another study, and one of none.
	foreign := normal(new(uncertain.Study), "foreign", 0, 1)
	for _, in := range []uncertain.Input[number]{foreign, {}} {
		_, err = uncertain.Propagate(t.Context(), s, func(x uncertain.Draw) (number, error) { return in.In(x), nil })
		require.ErrorAs(t, err, &argument)
		assert.Equal(t, "input", argument.Field)
		_, err = uncertain.Linearise(s, func(x uncertain.Draw) (number, error) { return in.In(x), nil })
		require.ErrorAs(t, err, &argument)
	}
	assert.True(t, math.IsNaN(float64(foreign.In(uncertain.Draw{}))))

	// A model that panics.
	var given *units.ConvergenceError
	_, err = uncertain.Propagate(t.Context(), s, func(uncertain.Draw) (number, error) { panic("no table") })
	require.ErrorAs(t, err, &given)
	assert.Contains(t, err.Error(), "no table")
	_, err = uncertain.Linearise(s, func(uncertain.Draw) (number, error) { panic("no table") })
	require.ErrorAs(t, err, &given)

	// A model that fails at or beside the estimates.
	var never *units.NeverError
	_, err = uncertain.Linearise(s, func(uncertain.Draw) (number, error) { return 0, &units.NeverError{} })
	require.ErrorAs(t, err, &never)
	var one uncertain.Study
	x := normal(&one, "x", 0, 1)
	_, err = uncertain.Linearise(&one, func(d uncertain.Draw) (number, error) { return number(math.Sqrt(float64(x.In(d)))), nil })
	require.ErrorContains(t, err, `input "x" one standard uncertainty below its estimate`)

	// Results that cannot be compared.
	var empty uncertain.Result[number, number]
	_, err = uncertain.Validate(uncertain.Linear[number, number]{}, empty)
	require.ErrorAs(t, err, &argument)
	assert.Equal(t, "no result", empty.String())
	assert.Equal(t, "no result\n", empty.Report())
	assert.Equal(t, "no result", uncertain.Linear[number, number]{}.String())
}

// An answer that does not depend on the inputs is known exactly.
func TestConstantAnswer(t *testing.T) {
	s, _ := store()
	r, err := uncertain.Propagate(t.Context(), s, func(uncertain.Draw) (units.Temperature, error) { return units.Celsius.Of(20), nil })
	require.NoError(t, err)
	assert.True(t, r.Converged)
	assert.Equal(t, units.Celsius.Of(20), r.Low)
	assert.Equal(t, units.Celsius.Of(20), r.High)
	assert.Equal(t, units.TemperatureDifference{}, r.StandardUncertainty)
	assert.Equal(t, "about 20 °C, 20 to 20 °C at 95 %", r.String())
	text, err := json.Marshal(r)
	require.NoError(t, err)
	assert.Contains(t, string(text), `"standardUncertainty":"0 K"`)
	l, err := uncertain.Linearise(s, func(uncertain.Draw) (units.Temperature, error) { return units.Celsius.Of(20), nil })
	require.NoError(t, err)
	assert.Equal(t, units.Celsius.Of(20), l.Low)
}

// A result that has not converged says so.
func TestNotConverged(t *testing.T) {
	s, model := store()
	s.Digits, s.Trials = 3, 10240
	r, err := uncertain.Propagate(t.Context(), s, model)
	require.NoError(t, err)
	assert.False(t, r.Converged)
	assert.Positive(t, r.Errors.High.Compare(r.Tolerance))
	assert.Contains(t, r.String(), "the sampling has not converged")

	s.Digits, s.Trials = 2, 1e6
	more, err := uncertain.Propagate(t.Context(), s, model)
	require.NoError(t, err)
	assert.True(t, more.Converged)
	assert.Greater(t, more.Cases, r.Cases)
	for _, e := range []units.Duration{more.Errors.Mean, more.Errors.StandardUncertainty, more.Errors.Low, more.Errors.High} {
		assert.LessOrEqual(t, e.Compare(more.Tolerance), 0)
	}
}

// The text has the digits that are known, the JSON all of them.
func TestText(t *testing.T) {
	s, model := store()
	r, err := uncertain.Propagate(t.Context(), s, model)
	require.NoError(t, err)
	assert.Equal(t, "about 6.7 h, 5.4 to 8.4 h at 95 %", r.String())
	page := r.Report()
	for _, line := range []string{
		"standard uncertainty 0.8 h\n", "from time constant\n", "with store\n",
		"  store: rectangular, 1 °C ± 1 K (label)\n", "  thermometer: normal with 95 %, 5 °C ± 0.3 K (label)\n", "  model: triangular, 1 ± 10 % (model: compared with three logs)\n",
	} {
		assert.Contains(t, page, line)
	}
	text, err := json.Marshal(r)
	require.NoError(t, err)
	var read struct {
		Text, Low, High     string
		StandardUncertainty string
		Converged           bool
		Inputs              []struct{ Name, Distribution, Origin string }
	}
	require.NoError(t, json.Unmarshal(text, &read))
	assert.Equal(t, r.String(), read.Text)
	low, err := units.Parse[units.Duration](read.Low)
	require.NoError(t, err)
	assert.Equal(t, r.Low, low, "all digits")
	assert.Len(t, read.Inputs, 5)
	assert.NotContains(t, strings.ToLower(string(text)), "nan")

	l, err := uncertain.Linearise(s, model)
	require.NoError(t, err)
	assert.Equal(t, "6.8 ± 1.5 h at 95 %", l.String())
	text, err = json.Marshal(l)
	require.NoError(t, err)
	assert.Contains(t, string(text), `"degreesOfFreedom":"infinite"`)
}

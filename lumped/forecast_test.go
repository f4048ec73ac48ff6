package lumped

import (
	"context"
	"errors"
	"math"
	"math/rand"
	"slices"
	"testing"

	"example.com/coolward/units"
)

// Intervals of what is asked of the fitted curve: 95 % of them hold the truth, for an early forecast too. 300 logs make that
// 95 ± 1.3 %, so that 92 to 98.5 % is asked for.
func TestCoverageOfForecasts(t *testing.T) {
	for _, c := range []struct {
		name string
		f    Fit
	}{{"all to be found", Fit{}}, {"ambient known", Fit{Ambient: kelvin(280)}}} {
		got := coverage(t, 300, c.f, true)
		asked(t, c.name+", ambient", got.ambient, got.trials, 0.92, 1)
		asked(t, c.name+", initial", got.initial, got.trials, 0.92, 0.985)
		asked(t, c.name+", curve", got.curve, got.trials, 0.92, 0.985)
		asked(t, c.name+", reading", got.reading, got.trials, 0.92, 0.985)
		asked(t, c.name+", time", got.reach, got.trials, 0.92, 0.985)
	}
}

// A forecast becomes surer with every reading, and the curve is where it said.
func TestForecastNarrows(t *testing.T) {
	r := rand.New(rand.NewSource(3))
	truth := func(x float64) float64 { return 277 + 60*math.Exp(-x/3600) }
	times := every(120, 60)
	l := logOf(times, func(x float64) float64 { return truth(x) + 0.1*r.NormFloat64() })
	f := Fit{Log: Log{l.Times[:6], l.Temperatures[:6]}, Ambient: kelvin(277)}
	s := solveFit(t, f)
	first, err := s.TimeTo(kelvin(294))
	if err != nil {
		t.Fatal(err)
	}
	for i := 6; i < 60; i++ {
		if s, err = s.Add(context.Background(), l.Times[i], l.Temperatures[i]); err != nil {
			t.Fatal(err)
		}
	}
	last, err := s.TimeTo(kelvin(294))
	if err != nil {
		t.Fatal(err)
	}
	want := 3600 * math.Log(60/17.0)
	if width := last.High.Sub(last.Low); width.SI() > first.High.Sub(first.Low).SI()/10 || math.Abs(last.Value.SI()-want) > width.SI() {
		t.Errorf("from %v to %v, want %g s", first, last, want)
	}
	f.Log = l
	if all := solveFit(t, f); all.curve != s.curve {
		t.Errorf("one by one %+v, at once %+v", s.curve, all.curve)
	}
	if !slices.Contains(s.Derivation().Warnings, caution) {
		t.Error("a forecast without its caution")
	}
}

// Time is on the clock of the log, and what is met, never met or perhaps never met is told apart.
func TestForecastAnswers(t *testing.T) {
	r := rand.New(rand.NewSource(4))
	l := logOf(every(60, 30), func(x float64) float64 { return 290 + 60*math.Exp(-x/1200) + 0.2*r.NormFloat64() })
	for i := range l.Times {
		l.Times[i] = l.Times[i].Add(units.Hour.Of(10))
	}
	s := solveFit(t, Fit{Log: l})
	at, err := s.TimeTo(kelvin(310))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "time", at.Value.SI(), 36_000+1200*math.Log(3), 60)
	T, err := s.At(at.Value)
	if err != nil {
		t.Fatal(err)
	}
	within(t, "there", T.Value.SI(), 310, 1e-9)
	p, err := s.Reading(at.Value)
	if err != nil || p.Low.SI() >= T.Low.SI() || p.High.SI() <= T.High.SI() || p.StandardError.SI() <= T.StandardError.SI() {
		t.Errorf("a reading is surer than the curve: %v, %v, %v", p, T, err)
	}
	if met, err := s.TimeTo(kelvin(360)); err != nil || met.Value != units.Hour.Of(10) || met.StandardError.SI() != 0 {
		t.Errorf("met at the start: %v, %v", met, err)
	}
	var never *units.NeverError
	if _, err := s.TimeTo(kelvin(280)); !errors.As(err, &never) || math.Abs(never.Limit.SI()-290) > 3 {
		t.Errorf("beyond the ambient: %v", err)
	}
	ambient, err := s.Ambient()
	if err != nil {
		t.Fatal(err)
	}
	// Just above the ambient that was found, below the high end of its interval.
	near := ambient.Value.Add(units.KelvinDifference.Of(0.2 * ambient.High.Sub(ambient.Value).SI()))
	if e, err := s.TimeTo(near); err != nil || !e.OpenHigh || e.OpenLow {
		t.Errorf("perhaps never: %+v, %v", e, err)
	}
	// Well above that end.
	clear := ambient.High.Add(ambient.High.Sub(ambient.Value))
	if e, err := s.TimeTo(clear); err != nil || e.OpenHigh {
		t.Errorf("reached for sure: %+v, %v", e, err)
	}
	var a *units.ArgumentError
	for name, err := range map[string]error{
		"before the log": second(s.At(units.Hour.Of(9))),
		"no time":        second(s.Reading(seconds(math.NaN()))),
		"no target":      second(s.TimeTo(units.Temperature{})),
		"out of order":   second(s.Add(context.Background(), units.Hour.Of(10), kelvin(300))),
	} {
		if !errors.As(err, &a) {
			t.Errorf("%s: %v", name, err)
		}
	}
}

func TestEstimateText(t *testing.T) {
	e := Estimate[units.Duration, units.Duration]{Value: seconds(30), Low: seconds(20), High: seconds(50)}
	for _, c := range []struct {
		low, high bool
		want      string
	}{
		{false, false, "30 s, from 20 s to 50 s"},
		{true, false, "30 s, at most 50 s"},
		{false, true, "30 s, at least 20 s"},
		{true, true, "30 s, no bounds known"},
	} {
		e.OpenLow, e.OpenHigh = c.low, c.high
		if got := e.String(); got != c.want {
			t.Errorf("got %q, want %q", got, c.want)
		}
	}
}

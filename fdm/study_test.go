package fdm_test

import (
	"context"
	"errors"
	"testing"
	"time"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A study gives what its runs give one by one, in their order, to the tolerance of the tables that they share.
func TestStudy(t *testing.T) {
	base := scaled(1, 20)
	told := 0.0
	base.Progress = func(done float64) {
		if done < told {
			t.Errorf("progress %g after %g", done, told)
		}
		told = done
	}
	vary := func(i int, p *fdm.Problem) error {
		p.Surface = constant(5+float64(i), 300)
		switch i % 7 {
		case 3:
			p.Initial = kelvin(390)
		case 5:
			p.Material = plain{1000, 1200, 2}
		}
		return nil
	}
	target := kelvin(345)
	times, err := fdm.Study(t.Context(), base, 40, vary, func(_ int, s *fdm.Solution, err error) (units.Duration, error) {
		if err != nil {
			return units.Duration{}, err
		}
		return s.TimeTo(shape.Centre(), target)
	})
	if err != nil || len(times) != 40 || told != 1 {
		t.Fatalf("%d times, progress to %g, %v", len(times), told, err)
	}
	for i, got := range times {
		p := scaled(1, 20)
		if err := vary(i, &p); err != nil {
			t.Fatal(err)
		}
		want, err := solve(t, p).TimeTo(shape.Centre(), target)
		if err != nil || !near(got.SI(), want.SI(), 1e-5*want.SI()) {
			t.Errorf("run %d: %v in the study, %v alone (%v)", i, got, want, err)
		}
	}
}

// The error is that of the first run that fails, whatever fails first; an early end is an answer for the caller.
func TestStudyFails(t *testing.T) {
	for range 5 {
		_, err := fdm.Study(t.Context(), scaled(1, 8), 50, func(i int, p *fdm.Problem) error {
			if i >= 10 {
				p.Horizon = seconds(float64(-i))
			}
			return nil
		}, func(_ int, _ *fdm.Solution, err error) (int, error) { return 0, err })
		var a *units.ArgumentError
		if !errors.As(err, &a) || a.Value != seconds(-10) {
			t.Errorf("%v, want that of run 10", err)
		}
	}
	// Run 11 begins before run 10 fails, if there are two processors, and fails after it.
	begun, tenth := make(chan struct{}), make(chan struct{})
	_, err := fdm.Study(t.Context(), scaled(1, 8), 50, func(i int, p *fdm.Problem) error {
		switch i {
		case 10:
			select {
			case <-begun:
			case <-time.After(time.Second):
			}
		case 11:
			close(begun)
			<-tenth
		}
		if i >= 10 {
			p.Horizon = seconds(float64(-i))
		}
		return nil
	}, func(i int, _ *fdm.Solution, err error) (int, error) {
		if i == 10 {
			defer close(tenth)
		}
		return 0, err
	})
	var first *units.ArgumentError
	if !errors.As(err, &first) || first.Value != seconds(-10) {
		t.Errorf("%v, want that of run 10", err)
	}
	answers, err := fdm.Study(t.Context(), scaled(1, 8), 4, func(i int, p *fdm.Problem) error {
		if i == 2 {
			p.Surface = exchange(func(_, T float64) float64 { return -1e6 })
		}
		return nil
	}, func(_ int, s *fdm.Solution, err error) (bool, error) { return err == nil && s != nil, nil })
	if err != nil || len(answers) != 4 || answers[2] || !answers[3] {
		t.Errorf("%v, %v", answers, err)
	}
	cancelled, cancel := context.WithCancel(t.Context())
	cancel()
	keep := func(int, *fdm.Problem) error { return nil }
	read := func(int, *fdm.Solution, error) (int, error) { return 0, nil }
	if _, err := fdm.Study(cancelled, scaled(1, 8), 4, keep, read); !errors.Is(err, context.Canceled) {
		t.Errorf("%v, want the cancellation", err)
	}
	if got, err := fdm.Study(t.Context(), scaled(1, 8), 0, keep, read); err != nil || len(got) != 0 {
		t.Errorf("no runs: %v, %v", got, err)
	}
	var none context.Context
	for name, err := range map[string]error{
		"negative":   second(fdm.Study(t.Context(), scaled(1, 8), -1, keep, read)),
		"no vary":    second(fdm.Study(t.Context(), scaled(1, 8), 1, nil, read)),
		"no context": second(fdm.Study(none, scaled(1, 8), 1, keep, read)),
		"bad base":   second(fdm.Study(t.Context(), fdm.Problem{}, 1, keep, read)),
	} {
		var a *units.ArgumentError
		if !errors.As(err, &a) {
			t.Errorf("%s: %v", name, err)
		}
	}
}

func second[T any](_ T, err error) error { return err }

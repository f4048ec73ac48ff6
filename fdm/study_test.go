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

// Runs of a study use their storage one after the other: what a solution says does not change by the runs after it.
func TestStudyKeepsSolutions(t *testing.T) {
	type kept struct {
		s    *fdm.Solution
		then [3]float64
	}
	read := func(s *fdm.Solution) (v [3]float64) {
		q, err := s.Flux(shape.Surface(), seconds(1234))
		if err != nil {
			t.Error(err)
		}
		return [3]float64{at(t, s, below(0.4), 1234), heat(t, s, 20000), q.SI()}
	}
	all, err := fdm.Study(t.Context(), scaled(1, 0), 30, func(i int, p *fdm.Problem) error {
		p.Surface = constant(2+float64(i), 300)
		p.Cells = 8 * (i % 3) // two sizes, and the grid that is chosen
		return nil
	}, func(_ int, s *fdm.Solution, err error) (kept, error) {
		if err != nil {
			return kept{}, err
		}
		return kept{s, read(s)}, nil
	})
	if err != nil {
		t.Fatal(err)
	}
	for i, k := range all {
		if now := read(k.s); now != k.then {
			t.Errorf("run %d: %v at last, %v at once", i, now, k.then)
		}
	}
}

// A study against one solution after the other, on as many processors as there are: time for one run.
func BenchmarkStudy(b *testing.B) {
	vary := func(i int, p *fdm.Problem) error {
		p.Surface = constant(5+float64(i%100)/10, 300)
		return nil
	}
	b.Run("study", func(b *testing.B) {
		b.ReportAllocs()
		if _, err := fdm.Study(b.Context(), scaled(1, 40), b.N, vary, func(_ int, _ *fdm.Solution, err error) (int, error) { return 0, err }); err != nil {
			b.Fatal(err)
		}
	})
	b.Run("one by one", func(b *testing.B) {
		b.ReportAllocs()
		for i := range b.N {
			p := scaled(1, 40)
			if err := vary(i, &p); err != nil {
				b.Fatal(err)
			}
			solve(b, p)
		}
	})
}

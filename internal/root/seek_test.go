package root

import (
	"errors"
	"math"
	"testing"
	"testing/quick"
)

// The zero of a line is found wherever it lies before the stop, and not behind it; the error of a
// function comes back as it is.
func TestSeek(t *testing.T) {
	f := func(x, y, z float64) bool {
		from, zero, stop := 100*math.Sin(x), 100*math.Sin(y), 100*math.Sin(z)
		line := func(x float64) (float64, error) { return x - zero, nil }
		at, found, err := Seek(line, from, stop, 1, 1e-9)
		ahead := (zero-from)*(stop-zero) >= 0
		want := stop
		if ahead {
			want = zero
		}
		if err != nil || found != ahead || math.Abs(at-want) > 1e-9 {
			t.Logf("from %g towards %g: %g, %t, %v; want %g", from, stop, at, found, err, want)
			return false
		}
		return true
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
	broken := errors.New("broken")
	for _, good := range []float64{-1, 3} { // fails at once, and behind 3
		fails := func(x float64) (float64, error) {
			if x > good {
				return 0, broken
			}
			return 1, nil
		}
		if at, found, err := Seek(fails, 0, 10, 1, 0); found || !errors.Is(err, broken) || at > math.Max(good, 0) {
			t.Errorf("good until %g: %g, %t, %v", good, at, found, err)
		}
	}
	pole := func(x float64) (float64, error) {
		if x == 2.25 {
			return math.NaN(), nil
		}
		return math.Copysign(1, x-2.25), nil
	}
	if _, found, err := Seek(pole, 2, 3, 0.5, 0); found || !errors.Is(err, ErrNoZero) {
		t.Errorf("a pole: found %t, %v; want ErrNoZero", found, err)
	}
	if _, found, _ := Seek(func(float64) (float64, error) { return math.NaN(), nil }, 0, 10, 1, 0); found {
		t.Error("found a zero of NaN")
	}
}

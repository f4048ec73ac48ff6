package series_test

import (
	"errors"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// singles are the stones of one coordinate, with several Biot numbers.
func singles() []stone {
	var all []stone
	for _, s := range stones() {
		if s.problem.Body.Family() == shape.Compact {
			continue
		}
		for _, h := range []float64{2, 300, 50000} {
			s.problem.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Celsius.Of(20))
			all = append(all, s)
		}
		s.problem.Surface = boundary.Temperature(units.Celsius.Of(20))
		all = append(all, s)
	}
	return all
}

func follow(t testing.TB, s *series.Solution, place shape.Place) *series.Track {
	t.Helper()
	k, err := s.Track(place)
	if err != nil {
		t.Fatal(err)
	}
	return k
}

func add(t testing.TB, k *series.Track, seconds, ambient float64) float64 {
	t.Helper()
	T, err := k.Add(units.Second.Of(seconds), units.Kelvin.Of(ambient))
	if err != nil {
		t.Fatal(err)
	}
	return T.SI()
}

// A log that stays gives the solution of a step, at every time and however it is sampled.
func TestTrackOfAStep(t *testing.T) {
	for _, stone := range singles() {
		s := solve(t, stone.problem)
		for _, place := range places {
			k := follow(t, s, place)
			for _, seconds := range []float64{0, 1e-6, 0.01, 0.5, 0.5, 1, 3.9, 4.1, 20, 21, 300, 1e6} {
				if got, want := add(t, k, seconds, 293.15), kelvins(t, s, place, seconds); !(math.Abs(got-want) <= 1e-11) {
					t.Errorf("%s, Bi %v, %s after %v s: %.14g K, by the step %.14g", stone.name, s.Biot(), place, seconds, got, want)
				}
			}
		}
	}
}

// A straight log is a ramp, sampled densely or at one time only.
func TestTrackOfARamp(t *testing.T) {
	for _, stone := range singles() {
		s, rising := solve(t, stone.problem), following(t, stone.problem, boundary.Ramp(units.Celsius.Of(20), units.KelvinPerSecond.Of(0.3)))
		for _, place := range places {
			k := follow(t, s, place)
			for seconds := 0.05; seconds < 100; seconds *= 4 {
				want := kelvins(t, rising, place, seconds)
				ambient := 293.15 + 0.3*seconds
				// 1e-9 of a slope of 0.3 K/s · 128 s or less
				if got := add(t, k, seconds, ambient); !(math.Abs(got-want) <= 1e-7) {
					t.Errorf("%s, Bi %v, %s after %v s: %.12g K, by the ramp %.12g", stone.name, s.Biot(), place, seconds, got, want)
				}
				once := add(t, follow(t, s, place), seconds, ambient)
				if !(math.Abs(once-want) <= 1e-7) {
					t.Errorf("%s, Bi %v, %s after %v s: %.12g K by one sample, by the ramp %.12g", stone.name, s.Biot(), place, seconds, once, want)
				}
			}
		}
	}
}

// On a ramp a body is behind, once settled, by the rate times the mean time that heat takes,
// (R²/α)(1/(m Bi) + (1 − x²)/(2m)).
func TestRampSettles(t *testing.T) {
	for _, stone := range singles() {
		s := solve(t, stone.problem)
		m := map[shape.Family]float64{shape.Planar: 1, shape.Cylindrical: 2, shape.Spherical: 3}[stone.problem.Body.Family()]
		seconds := 5e4 / math.Min(1, s.Biot()*10)
		T := kelvins(t, following(t, stone.problem, boundary.Ramp(units.Celsius.Of(20), units.KelvinPerSecond.Of(0.01))), shape.Centre(), seconds)
		want := 293.15 + 0.01*(seconds-128*(1/(m*s.Biot())+1/(2*m)))
		if !(math.Abs(T-want) <= 1e-9) {
			t.Errorf("%s, Bi %v: %v K, want %v", stone.name, s.Biot(), T, want)
		}
	}
}

// Two steps are the sum of one and a later one.
func TestTrackSuperposes(t *testing.T) {
	for _, stone := range singles() {
		p := stone.problem
		p.Initial = units.Celsius.Of(20)
		rest := solve(t, p)
		s := solve(t, stone.problem)
		for _, place := range places {
			for _, gap := range []float64{0.02, 2, 40} {
				k := follow(t, rest, place) // in equilibrium until the first sample
				add(t, k, 10, 293.15)
				add(t, k, 10, 333.15)
				add(t, k, 10+gap, 333.15)
				add(t, k, 10+gap, 303.15)
				for _, later := range []float64{0.001, 0.5, 3, 60} {
					theta := func(seconds float64) float64 { return (kelvins(t, s, place, seconds) - 293.15) / 70 }
					want := 303.15 - 40*theta(gap+later) + 30*theta(later)
					if got := add(t, k, 10+gap+later, 303.15); !(math.Abs(got-want) <= 1e-10) {
						t.Errorf("%s, Bi %v, %s, %v s after the second step: %.14g K, by superposition %.14g", stone.name, s.Biot(), place, later, got, want)
					}
				}
			}
		}
	}
}

// A sine that is sampled finely comes to the closed form. Straight pieces of N to the period cut the sine by a
// relative (π/N)²/3 or less in amplitude, and by (π/N)²/2 between samples.
func TestTrackOfASine(t *testing.T) {
	const n, amplitude, period = 100, 10, 60.0
	for _, stone := range singles() {
		s := solve(t, stone.problem)
		if s.Biot() < 0.1 {
			continue // forgets the start only after hours
		}
		for _, place := range places {
			o, err := s.Oscillation(place, units.Second.Of(period))
			if err != nil {
				t.Fatal(err)
			}
			k := follow(t, s, place)
			cycles := 30
			for i := 1; i <= cycles*n; i++ {
				seconds := float64(i) * period / n
				got := add(t, k, seconds, 293.15+amplitude*math.Sin(2*math.Pi*seconds/period))
				if i <= (cycles-1)*n || i%17 != 0 {
					continue
				}
				want := o.At(units.Kelvin.Of(293.15), units.KelvinDifference.Of(amplitude), units.Second.Of(seconds)).SI()
				if tolerance := amplitude*math.Pow(math.Pi/n, 2) + 1e-6; !(math.Abs(got-want) <= tolerance) {
					t.Fatalf("%s, Bi %v, %s after %v s: %.10g K, by the closed form %.10g, want within %.2g", stone.name, s.Biot(), place, seconds, got, want, tolerance)
				}
			}
		}
	}
}

// A fast oscillation dies out inwards as in a body without end, by exp(−d √(ω/2α)) and as late.
func TestOscillationOfADeepPlace(t *testing.T) {
	p := marble()
	p.Body = shape.Plate(units.Metre.Of(8), units.SquareMetre.Of(1))
	p.Surface = boundary.Temperature(units.Celsius.Of(20))
	s := solve(t, p)
	period := units.Hour.Of(24)
	k := math.Sqrt(math.Pi / (1.0 / (2500 * 800) * 86400)) // √(ω/2α) in 1/m
	for _, depth := range []float64{0, 0.1, 0.5, 1.1, 1.5} {
		o, err := s.Oscillation(shape.Below(units.Metre.Of(depth)), period)
		if err != nil {
			t.Fatal(err)
		}
		if ratio, lag := math.Exp(-k*depth), k*depth/(2*math.Pi)*86400; !(math.Abs(o.Ratio-ratio) <= 1e-4*ratio) || !(math.Abs(o.Lag.SI()-lag) <= 1e-4*86400) {
			t.Errorf("%v m: ratio %v, lag %v s, want %v and %v", depth, o.Ratio, o.Lag.SI(), ratio, lag)
		}
	}
}

// Whatever the log, the place stays within what it and the start have spanned.
func TestTrackMaximumPrinciple(t *testing.T) {
	r := rand.New(rand.NewSource(5))
	for _, stone := range singles() {
		s := solve(t, stone.problem)
		for _, place := range places {
			k := follow(t, s, place)
			low, high, seconds := 293.15, 363.15, 0.0
			for range 300 {
				seconds += math.Pow(10, 4*r.Float64()-3)
				ambient := 250 + 200*r.Float64()
				low, high = math.Min(low, ambient), math.Max(high, ambient)
				if r.Intn(5) == 0 { // a step, or nearly one
					add(t, k, seconds, ambient)
					if r.Intn(2) == 0 {
						seconds = math.Nextafter(seconds, 1e9)
					}
					ambient = 250 + 200*r.Float64()
					low, high = math.Min(low, ambient), math.Max(high, ambient)
				}
				if got := add(t, k, seconds, ambient); !(got >= low-1e-4 && got <= high+1e-4) {
					t.Fatalf("%s, Bi %v, %s after %v s: %v K, beyond %v to %v", stone.name, s.Biot(), place, seconds, got, low, high)
				}
			}
		}
	}
}

// A log so dense that changes are merged gives what the same log gives sampled at its bends alone.
func TestTrackOfADenseLog(t *testing.T) {
	for _, stone := range singles() {
		s := solve(t, stone.problem)
		for _, place := range places {
			dense, sparse := follow(t, s, place), follow(t, s, place)
			const pieces, bends = 400, 2 // more than a Track keeps
			ambient, r := 293.15, rand.New(rand.NewSource(6))
			for b := range bends {
				next := 280 + 30*r.Float64()
				var got float64
				for i := 1; i <= pieces; i++ {
					at := float64(i) / pieces
					// small zigzags that come to nothing
					zigzag := 0.01 * float64(i%2)
					got = add(t, dense, 0.4*(float64(b)+at), ambient+(next-ambient)*at+zigzag)
				}
				ambient = next
				if want := add(t, sparse, 0.4*float64(b+1), next); !(math.Abs(got-want) <= 0.01) {
					t.Fatalf("%s, Bi %v, %s after %d bends: %.10g K dense, %.10g sparse", stone.name, s.Biot(), place, b+1, got, want)
				}
			}
		}
	}
}

func TestVaryingBadInput(t *testing.T) {
	var argument *units.ArgumentError
	check := func(name string, err error) {
		t.Helper()
		argument = nil
		if !errors.As(err, &argument) || argument.Accepted == "" {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
	brick := marble()
	brick.Body = shape.Brick(units.Metre.Of(1), units.Metre.Of(1), units.Metre.Of(1))
	product, s := solve(t, brick), solve(t, marble())
	second, K := units.Second.Of, units.Kelvin.Of
	for name, s := range map[string]*series.Solution{"brick": product, "zero solution": {}, "nil": nil} {
		_, err := s.Track(shape.Centre())
		check(name+", track", err)
		_, err = s.Oscillation(shape.Centre(), second(1))
		check(name+", oscillation", err)
	}
	_, err := s.Track(shape.Place{})
	check("track of no place", err)
	for _, period := range []float64{0, -1, math.NaN(), math.Inf(1), 1e-300, 5e-324} {
		_, err = s.Oscillation(shape.Mean(), second(period))
		check("period", err)
	}
	_, err = s.Oscillation(shape.Below(units.Metre.Of(1)), second(1))
	check("oscillation beside the body", err)
	for _, none := range []*series.Track{nil, {}} {
		_, err = none.Add(second(1), K(300))
		check("zero track", err)
	}
	k := follow(t, s, shape.Centre())
	want := add(t, follow(t, s, shape.Centre()), 20, 300)
	add(t, k, 10, 296.575)
	for _, bad := range []float64{9, -1, math.NaN(), math.Inf(1)} {
		_, err = k.Add(second(bad), K(300))
		check("sample in the past", err)
	}
	for _, bad := range []float64{0, -5, math.NaN(), math.Inf(1)} {
		_, err = k.Add(second(11), K(bad))
		check("sample that is no temperature", err)
	}
	if got := add(t, k, 20, 300); !(math.Abs(got-want) <= 1e-10) {
		t.Errorf("after refused samples: %v K, want %v", got, want)
	}
}

// An insulated body stays as it is, and a prescribed surface is where it is put.
func TestTrackEnds(t *testing.T) {
	p := marble()
	p.Surface = boundary.Constant(units.HeatTransferCoefficient{}, units.Celsius.Of(20))
	k := follow(t, solve(t, p), shape.Mean())
	for _, seconds := range []float64{1, 2, 1e9} {
		if got := add(t, k, seconds, 400); !(math.Abs(got-363.15) <= 1e-9) {
			t.Errorf("insulated: %v K after %v s, want 363.15", got, seconds)
		}
	}
	p.Surface = boundary.Temperature(units.Celsius.Of(20))
	k = follow(t, solve(t, p), shape.Surface())
	for _, seconds := range []float64{0.1, 2, 1e6} {
		if got := add(t, k, seconds, 400+seconds); !(math.Abs(got-400-seconds) <= 1e-9) {
			t.Errorf("prescribed: %v K after %v s, want %v", got, seconds, 400+seconds)
		}
	}
}

func TestTrackAllocates(t *testing.T) {
	k := follow(t, solve(t, marble()), shape.Centre())
	seconds := 0.0
	if n := testing.AllocsPerRun(1000, func() {
		seconds += 0.3
		_, _ = k.Add(units.Second.Of(seconds), units.Kelvin.Of(300+math.Sin(seconds)))
	}); n != 0 {
		t.Errorf("%v allocations for a sample, want 0", n)
	}
}

func BenchmarkTrack(b *testing.B) {
	for _, c := range []struct {
		name string
		step float64 // s; the terms are 14
	}{{"a sample each minute", 60}, {"a sample each second", 1}, {"a sample each 10 ms", 0.01}} {
		b.Run(c.name, func(b *testing.B) {
			b.ReportAllocs()
			k := follow(b, solve(b, marble()), shape.Centre())
			seconds := 0.0
			for b.Loop() {
				seconds += c.step
				sink = add(b, k, seconds, 300+math.Mod(seconds, 7))
			}
		})
	}
}

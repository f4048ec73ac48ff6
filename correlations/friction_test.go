package correlations_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

// The laws of friction agree where they hold, Colebrook's is solved, and laminar flow has 64/Re.
func TestFriction(t *testing.T) {
	for re := 1e4; re <= 1e8; re *= 1.7 {
		for _, e := range []float64{0, 1e-5, 1e-3, 0.05} {
			f, err := correlations.ColebrookFriction(re, e)
			root := 1 / math.Sqrt(f)
			if err != nil || math.Abs(root+2*math.Log10(e/3.7+2.51*root/re)) > 1e-12*root {
				t.Errorf("Colebrook at Re %g, roughness %g: %v, %v, does not solve its equation", re, e, f, err)
			}
			h, err := correlations.HaalandFriction(re, e)
			c, err2 := correlations.ChurchillFriction(re, e)
			// Haaland is within 2 % of Colebrook, Churchill within 4 % (from memory).
			if err != nil || err2 != nil || math.Abs(h/f-1) > 0.02 || math.Abs(c/f-1) > 0.04 {
				t.Errorf("Re %g, roughness %g: Haaland %v, Churchill %v, Colebrook %v, %v, %v", re, e, h, c, f, err, err2)
			}
		}
	}
	for re := 5e3; re < 1e5; re *= 1.3 {
		p, err := correlations.PetukhovFriction(re)
		b, err2 := correlations.BlasiusFriction(re)
		if err != nil || err2 != nil || math.Abs(p/b-1) > 0.04 {
			t.Errorf("Re %g: Petukhov %v, Blasius %v, %v, %v", re, p, b, err, err2)
		}
	}
	if f, err := correlations.ChurchillFriction(10, 0); err != nil || math.Abs(f-6.4) > 1e-12 {
		t.Errorf("laminar: %v, %v, want 6.4", f, err)
	}
}

func TestBadArgumentsOfFunctions(t *testing.T) {
	type one = func(float64) (float64, error)
	with := func(f func(a, b float64) (float64, error), b float64) one {
		return func(a float64) (float64, error) { return f(a, b) }
	}
	second := func(f func(a, b float64) (float64, error), a float64) one {
		return func(b float64) (float64, error) { return f(a, b) }
	}
	ranged := map[string]one{
		"Petukhov": correlations.PetukhovFriction, "Blasius": correlations.BlasiusFriction,
		"Haaland": with(correlations.HaalandFriction, 0), "Colebrook": with(correlations.ColebrookFriction, 0),
		"Churchill": with(correlations.ChurchillFriction, 0), "Haaland, roughness": second(correlations.HaalandFriction, 1e5),
		"Colebrook, roughness": second(correlations.ColebrookFriction, 1e5), "Churchill, roughness": second(correlations.ChurchillFriction, 1e5),
		"cylinder at rest": correlations.CylinderBodyNu,
	}
	for name, f := range ranged {
		for _, x := range []float64{-1, 1e12, math.Inf(1), math.Inf(-1)} {
			var out *units.RangeError
			if got, err := f(x); !errors.As(err, &out) || got != 0 {
				t.Errorf("%s of %v: %v, %v", name, x, got, err)
			}
		}
		var bad *units.ArgumentError
		if got, err := f(math.NaN()); !errors.As(err, &bad) || got != 0 {
			t.Errorf("%s of NaN: %v, %v", name, got, err)
		}
	}
	for name, f := range map[string]one{
		"plate": correlations.PlateGravity, "vertical cylinder": correlations.VerticalCylinderGravity,
		"horizontal cylinder": correlations.HorizontalCylinderGravity, "limit": correlations.SparrowGreggLimit,
	} {
		for _, x := range []float64{0, -1, math.Inf(1), math.NaN()} {
			var bad *units.ArgumentError
			if got, err := f(x); !errors.As(err, &bad) || got != 0 {
				t.Errorf("%s of %v: %v, %v", name, x, got, err)
			}
		}
		for _, x := range []float64{5e-324, 1e-300, 1, 1e300, math.MaxFloat64} {
			if got, err := f(x); err != nil || !(got > 0 && got <= math.MaxFloat64) {
				t.Errorf("%s of %v: %v, %v", name, x, got, err)
			}
		}
	}
	m := units.Metre.Of
	for name, f := range map[string]func(a, b units.Length) (units.Length, error){"annulus": correlations.AnnulusLength, "shell": correlations.ShellLength} {
		for _, r := range [][2]units.Length{{m(0), m(1)}, {m(-1), m(1)}, {m(1), m(1)}, {m(2), m(1)}, {m(1), m(math.Inf(1))}, {m(math.NaN()), m(1)}, {m(1), m(math.NaN())}} {
			var bad *units.ArgumentError
			if got, err := f(r[0], r[1]); !errors.As(err, &bad) || got != (units.Length{}) {
				t.Errorf("%s of %v: %v, %v", name, r, got, err)
			}
		}
		// A thin gap: the length is proportional to the gap to the power of 4/3, and to the size.
		a, _ := f(m(1), m(1+1e-6))
		b, _ := f(m(1), m(1+8e-6))
		c, _ := f(m(2), m(2+2e-6))
		if math.Abs(b.SI()/a.SI()-16) > 1e-3 || math.Abs(c.SI()/a.SI()-2) > 1e-6 {
			t.Errorf("%s: %v, %v, %v", name, a, b, c)
		}
	}
	some := correlations.Result{Nu: 5}
	for _, b := range []correlations.Blend{{}, {Exponent: 0.5}, {Exponent: math.NaN()}, {Exponent: math.Inf(1)}, {Exponent: 3, Rest: -1}, {Exponent: 3, Rest: math.NaN()}, {Exponent: 3, Rest: 6}} {
		var bad *units.ArgumentError
		if got, err := b.Mix(some, some); !errors.As(err, &bad) || got != (correlations.Mixture{}) {
			t.Errorf("%+v: %v, %v", b, got, err)
		}
	}
}

// A blend is either mode where the other vanishes, is symmetric, and lies below the larger one where the two
// are opposed.
func TestBlend(t *testing.T) {
	for _, n := range []float64{1, 3, 3.5, 4} {
		for _, opposed := range []bool{false, true} {
			b := correlations.Blend{Exponent: n, Rest: 2, Opposed: opposed}
			rest, some, more := correlations.Result{Nu: 2}, correlations.Result{Nu: 7, Scatter: 0.2}, correlations.Result{Nu: 9, Scatter: 0.3}
			for _, pair := range [][2]correlations.Result{{some, rest}, {rest, some}} {
				if m, err := b.Mix(pair[0], pair[1]); err != nil || math.Abs(m.Nu-7) > 1e-14 || m.Scatter != 0.2 {
					t.Errorf("%+v of %v: %+v, %v", b, pair, m, err)
				}
			}
			m, err := b.Mix(some, more)
			swapped, err2 := b.Mix(more, some)
			if err != nil || err2 != nil || m.Nu != swapped.Nu || opposed != (m.Nu < 9) || math.Abs(m.Forced+m.Natural-1) > 1e-15 {
				t.Errorf("%+v: %+v and %+v, %v, %v", b, m, swapped, err, err2)
			}
		}
	}
	// Opposed and equal: at rest, as the formula has it.
	equal := correlations.Result{Nu: 7}
	if m, err := (correlations.Blend{Exponent: 3, Rest: 2, Opposed: true}).Mix(equal, equal); err != nil || m.Nu != 2 {
		t.Errorf("equal and opposed: %+v, %v", m, err)
	}
}

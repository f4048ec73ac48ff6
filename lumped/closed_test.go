package lumped

import (
	"errors"
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// Published times of lumped bodies.
func TestPublishedTimes(t *testing.T) {
	const air = 0.024 // W/(m K)
	for _, c := range []struct {
		name                  string
		diameter, rho, cp     float64
		h, start, ambient, to float64
		want, tolerance       float64
		source                string
	}{
		{"5 cm ball, Nu = 2", 0.05, 1000, 2000, 2 * air / 0.05, 373.15, 298.15, 318.15, 22947, 0.5, "common practice, no source"},
		{"5 cm ball, Nu = 20", 0.05, 1000, 2000, 20 * air / 0.05, 373.15, 298.15, 318.15, 2294.7, 0.05, "common practice, no source"},
		// The book rounds the time constant, 1/(3.344e-4 1/s): its digits give 5818 ± 1.
		{
			"steel ball", 0.05, 7800, 460, 10, 723.15, 373.15, 423.15, 5819, 1.5,
			"J. P. Holman, Heat Transfer, 10th ed., Ex. 4-1 (answer seen in a companion to the book)",
		},
		// The book gives 10 s to the second.
		{
			"thermocouple bead to 99 %", 0.001, 8500, 320, 210, 373.15, 273.15, 274.15, 10, 0.5,
			"Y. A. Cengel, Heat Transfer, Ex. 4-1 (answer seen in a companion to the book)",
		},
		{
			"annealed balls", 0.012, 7800, 600, 20, 1150, 325, 400, 1122, 0.5,
			"F. P. Incropera, D. P. DeWitt, Fundamentals of Heat and Mass Transfer, Problem 5.6 (answer from memory)",
		},
		{
			"thermocouple, Btu units converted", 0.000635, 8409.693075, 418.68, 454.26104, 375, 300, 301, 3.54, 0.005,
			"W. S. Janna, Engineering Heat Transfer, Ex. 4.1 (answer seen in a companion to the book)",
		},
	} {
		s := solve(t, Problem{
			Body: sphere(c.diameter), Material: constantStuff(c.rho, c.cp, 35),
			Initial: kelvin(c.start), Surface: constant(c.h, c.ambient),
		})
		got, err := s.TimeTo(shape.Centre(), kelvin(c.to))
		if err != nil || math.Abs(got.SI()-c.want) > c.tolerance {
			t.Errorf("%s: got %v, %v, want %g s ± %g (%s)", c.name, got, err, c.want, c.tolerance, c.source)
		}
	}
}

// Properties of the exponential for random bodies: it starts at T0, after τ the excess is 1/e of it, and
// TimeTo inverts Mean.
func TestClosedFormProperties(t *testing.T) {
	property := func(a, b, c, d, e uint16) bool {
		u := func(x uint16) float64 { return float64(x) / math.MaxUint16 }
		diameter, h := math.Pow(10, -3+2*u(a)), math.Pow(10, 3*u(b))
		start, ambient := 250+500*u(c), 250+500*u(d)
		s := solve(t, Problem{
			Body: sphere(diameter), Material: constantStuff(2000, 900, 5), Initial: kelvin(start), Surface: constant(h, ambient),
		})
		tau := 2000 * 900 * diameter / 6 / h
		first, err1 := s.At(shape.Surface(), seconds(0))
		later, err2 := s.At(shape.Below(units.Metre.Of(diameter/4)), seconds(tau))
		if err1 != nil || err2 != nil || math.Abs(first.SI()-start) > 1e-12*start ||
			math.Abs(later.SI()-ambient-(start-ambient)/math.E) > 1e-12*start {
			return false
		}
		when := tau * 10 * u(e)
		at, _ := s.Mean(seconds(when))
		back, err := s.TimeTo(shape.Mean(), at)
		if math.Abs(at.SI()-ambient) < 1e-6 { // the temperature has no digits left
			return true
		}
		rounding := 4e-16 * start / math.Abs(at.SI()-ambient) * tau
		return err == nil && math.Abs(back.SI()-when) <= 1e-12*when+rounding
	}
	if err := quick.Check(property, nil); err != nil {
		t.Error(err)
	}
}

// Close to the start and close to the limit no digits are lost: to lose the part x of the excess takes
// τ(x + x²/2 + x³/3 + …), all but that part −τ ln x.
func TestTimeToKeepsDigits(t *testing.T) {
	s := solve(t, Problem{Body: sphere(0.06), Material: constantStuff(1000, 1000, 15), Initial: kelvin(768), Surface: constant(10, 300)})
	const tau, step, x = 1000, 1.0 / 4096, 1.0 / 4096 / 468 // exact in binary beside 300 and 768
	early, err1 := s.TimeTo(shape.Mean(), kelvin(768-step))
	late, err2 := s.TimeTo(shape.Mean(), kelvin(300+step))
	if err1 != nil || err2 != nil {
		t.Fatal(err1, err2)
	}
	within(t, "near the start", early.SI(), tau*(x+x*x/2+x*x*x/3), 4e-15*tau*x)
	within(t, "near the limit", late.SI(), tau*math.Log(468*4096), 4e-15*tau*20)
}

// The closed form is chosen by the enthalpy, not by a name.
func TestChoiceOfClosedForm(t *testing.T) {
	silent := constantStuff(1000, 2000, 15)
	silent.constant = false // must be seen from c and h
	varying := silent
	varying.c1 = 1e-6
	wander := silent
	wander.k1 = 0.01 // k may vary
	narrow := constantStuff(1000, 2000, 15)
	narrow.low = 320 // the ambient is outside
	for _, c := range []struct {
		name   string
		m      Material
		closed bool
	}{
		{"says constant", constantStuff(1000, 2000, 15), true},
		{"does not say, but is", silent, true},
		{"specific heat varies by 1e-9", varying, false},
		{"only conductivity varies", wander, true},
		{"ambient outside the range", narrow, false},
		{"latent heat between", latent{constantStuff(1000, 2000, 15), 340, 1, 1e5}, false},
	} {
		p := Problem{Body: sphere(0.05), Material: c.m, Initial: kelvin(373.15), Surface: constant(10, 298.15), Horizon: seconds(1000)}
		if s := solve(t, p); (s.path == nil) != c.closed {
			t.Errorf("%s: closed form %v, want %v", c.name, s.path == nil, c.closed)
		}
		p.Horizon = seconds(0)
		_, err := p.Solve(t.Context())
		var argument *units.ArgumentError
		if missing := errors.As(err, &argument) && argument.Field == "horizon"; missing == c.closed {
			t.Errorf("%s: without a horizon: %v", c.name, err)
		}
	}
}

// Without exchange, and from the ambient itself, nothing happens.
func TestNothingHappens(t *testing.T) {
	for _, c := range []struct{ h, ambient, limit float64 }{{0, 300, 350}, {10, 350, 350}} {
		s := solve(t, Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(350), Surface: constant(c.h, c.ambient)})
		if got, err := s.Mean(units.Hour.Of(1000)); err != nil || got != kelvin(350) {
			t.Errorf("h = %g: %v, %v after 1000 h, want the start", c.h, got, err)
		}
		if got, err := s.TimeTo(shape.Mean(), kelvin(350)); err != nil || got != seconds(0) {
			t.Errorf("h = %g: %v, %v to the start, want 0", c.h, got, err)
		}
		for _, target := range []float64{300, 340, 360} {
			var never *units.NeverError
			if _, err := s.TimeTo(shape.Mean(), kelvin(target)); !errors.As(err, &never) || never.Limit != kelvin(c.limit) {
				t.Errorf("h = %g, target %g: %v, want never with the limit %g", c.h, target, err, c.limit)
			}
		}
		if e, err := s.LumpingError(shape.Centre()); err != nil || e.SI() != 0 {
			t.Errorf("h = %g: lumping error %v, %v, want 0", c.h, e, err)
		}
	}
}

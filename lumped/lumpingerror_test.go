package lumped

import (
	"math"
	"strconv"
	"testing"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// exactBodies have a way out of 10 mm and an exact solution; θ of one temperature is exp(−ratio Bi Fo).
var exactBodies = []struct {
	name  string
	body  shape.Body
	ratio float64
	modes func(bi float64) eigen.Solution
}{
	{"plate", shape.Plate(units.Metre.Of(0.02), units.SquareMetre.Of(1)), 1, func(bi float64) eigen.Solution { return eigen.NewPlate(bi) }},
	{"plate, one face", shape.Plate(units.Metre.Of(0.01), units.SquareMetre.Of(1)).Exposing(shape.Front), 1, func(bi float64) eigen.Solution { return eigen.NewPlate(bi) }},
	{"cylinder", shape.Cylinder(units.Metre.Of(0.02), units.Metre.Of(0.5)).Exposing(shape.Outside), 2, func(bi float64) eigen.Solution { return eigen.NewCylinder(bi) }},
	{"sphere", sphere(0.02), 3, func(bi float64) eigen.Solution { return eigen.NewSphere(bi) }},
}

// withBiot returns a body of R = 10 mm with h R/k = bi that cools by one kelvin, so that an error
// in kelvin is one of θ.
func withBiot(t *testing.T, body shape.Body, bi float64) *Solution {
	return solve(t, Problem{
		Body: body, Material: constantStuff(2000, 1000, 2), Initial: kelvin(301), Surface: constant(bi*2/0.01, 300),
	})
}

func at(x float64) shape.Place { return shape.Below(units.Metre.Of(0.01 * (1 - x))) }

// The bound holds on a grid of times finer than its own, and is not far above the largest error there:
// twice at Bi 0.01 and 0.1, five times at 1 and 10.
func TestLumpingErrorIsABound(t *testing.T) {
	for _, c := range []struct{ bi, sharp float64 }{
		{1e-6, 2}, {0.001, 2}, {0.01, 2}, {0.1, 2}, {0.3, 2}, {1, 5}, {10, 5}, {1000, 5}, {1e6, 5},
	} {
		for _, body := range exactBodies {
			s, exact := withBiot(t, body.body, c.bi), body.modes(c.bi)
			for _, p := range []struct {
				place shape.Place
				theta func(fo float64) float64
			}{
				{shape.Centre(), exact.Centre},
				{shape.Surface(), exact.Surface},
				{shape.Mean(), exact.Mean},
				{at(0.3), func(fo float64) float64 { return exact.At(0.3, fo) }},
				{at(0.99), func(fo float64) float64 { return exact.At(0.99, fo) }},
			} {
				bound, err := s.LumpingError(p.place)
				if err != nil {
					t.Fatal(err)
				}
				largest := 0.0
				for e := -16.0; e < 9; e += 0.01 {
					fo := math.Pow(10, e)
					largest = max(largest, math.Abs(p.theta(fo)-math.Exp(-body.ratio*c.bi*fo)))
				}
				if bound.SI() < largest || bound.SI() > c.sharp*largest {
					t.Errorf("%s, Bi %g, %v: bound %g, largest error %g", body.name, c.bi, p.place, bound.SI(), largest)
				}
			}
		}
	}
}

// The bound against reference values that the series of the module had no part in.
func TestLumpingErrorAgainstReference(t *testing.T) {
	for _, body := range exactBodies {
		if body.name != "plate, one face" {
			againstReference(t, "testdata/"+body.name+"_theta.csv", body.body, body.ratio)
		}
	}
}

func againstReference(t *testing.T, name string, body shape.Body, ratio float64) {
	_, rows := table.Read(t, name)
	bounds := map[string]float64{}
	for _, row := range rows {
		bi, _ := strconv.ParseFloat(row[1], 64)
		fo, _ := strconv.ParseFloat(row[2], 64)
		theta, err := strconv.ParseFloat(row[4], 64)
		if err != nil {
			t.Fatal(err)
		}
		place := shape.Mean()
		if row[3] != "avg" {
			x, _ := strconv.ParseFloat(row[3], 64)
			place = at(x)
		}
		key := row[1] + " " + row[3]
		if _, ok := bounds[key]; !ok {
			e, err := withBiot(t, body, bi).LumpingError(place)
			if err != nil {
				t.Fatal(err)
			}
			bounds[key] = e.SI()
		}
		if d := math.Abs(theta - math.Exp(-ratio*bi*fo)); d > bounds[key] {
			t.Errorf("%s, Bi %s, Fo %s, x %s: error %g, bound %g", name, row[1], row[2], row[3], d, bounds[key])
		}
	}
}

// At h(V/A)/k = 0.1, where common practice (no source) lets lumping end, the lumped time for the centre to
// lose half its excess, and 90 % of it, is short of the exact time by these percentages (from the exact
// series, recomputed independently).
func TestLumpingErrorInTime(t *testing.T) {
	for i, percent := range [][2]float64{{5.4, 3.9}, {5.4, 3.9}, {10.9, 6.7}, {16.0, 9.1}} {
		body := exactBodies[i]
		bi := 0.1 * body.ratio
		s := withBiot(t, body.body, bi)
		for j, theta := range []float64{0.5, 0.1} {
			target := kelvin(300 + theta)
			lumped, err := s.TimeTo(shape.Centre(), target)
			if err != nil {
				t.Fatal(err)
			}
			late, err := s.LumpingErrorInTime(shape.Centre(), target)
			if err != nil {
				t.Fatal(err)
			}
			exact := lumped.Add(late)
			within(t, body.name+": short by, in %", 100*late.Ratio(exact), percent[j], 0.05)
			// α = 1e-6 m²/s and R = 10 mm: Fo = t/100 s.
			within(t, body.name+": θ at the exact time", body.modes(bi).Centre(exact.SI()/100), theta, 1e-12)
		}
	}
	s := withBiot(t, sphere(0.02), 0.3)
	if late, err := s.LumpingErrorInTime(shape.Surface(), kelvin(300.5)); err != nil || late.SI() >= 0 {
		t.Errorf("the surface is late by %v, %v, want it to be early", late, err)
	}
	if _, err := s.LumpingErrorInTime(shape.Centre(), kelvin(300)); err == nil {
		t.Error("a time to the limit")
	}
}

// At any Biot number the time corrected is that of the exact series: at the centre, at the surface and of the mean, when half of the
// excess and when 90 % of it is lost.
func TestLumpingErrorInTimeIsExact(t *testing.T) {
	for _, bi := range []float64{0.001, 0.01, 0.1, 0.2, 1, 3, 10} {
		for _, body := range exactBodies {
			s, exact := withBiot(t, body.body, bi), body.modes(bi)
			for place, theta := range map[shape.Place]func(fo float64) float64{
				shape.Centre(): exact.Centre, shape.Surface(): exact.Surface, shape.Mean(): exact.Mean,
			} {
				for _, left := range []float64{0.5, 0.1} {
					lumped, err1 := s.TimeTo(place, kelvin(300+left))
					late, err2 := s.LumpingErrorInTime(place, kelvin(300+left))
					if err1 != nil || err2 != nil {
						t.Fatal(body.name, bi, place, err1, err2)
					}
					within(t, body.name+", "+place.String()+": θ", theta(lumped.Add(late).SI()/100), left, 1e-12)
				}
			}
		}
	}
}

// For a function the largest secant coefficient counts: with q = h (T − T∞) it is h.
func TestBiotOfAFunction(t *testing.T) {
	p := ball()
	p.Surface = flux(func(_, wall float64) float64 { return 12 * (wall - 298.15) })
	b := solve(t, p).Biot()
	within(t, "h", b.Coefficient.SI(), 12, 1e-4)
	within(t, "h R/k", b.Conduction, 12*0.025/15, 1e-6)
	within(t, "h (V/A)/k", b.Volume, 12*0.05/6/15, 1e-6)
	p.Surface, p.Until = flux(func(_, _ float64) float64 { return -700 }), units.Temperature{} // no limit
	endless := solve(t, p)
	within(t, "flux over the span", endless.Biot().Coefficient.SI(), 700/(endless.last-endless.start), 1e-9)
	p = ball() // the largest coefficient is that of the start, and k the least of the run that of its end
	p.Material = stuff{rho: 1000, c0: 2000, k0: 1, k1: 0.05, low: 200, high: 900}
	s := solve(t, p)
	b = s.Biot()
	within(t, "h at the start", b.Coefficient.SI(), stillRoom(0, 373.15)/75, 1e-4)
	within(t, "k at the end", b.Conductivity.SI(), 1+0.05*s.last, 1e-9)
}

package fdm_test

import (
	"math"
	"testing"
	"testing/quick"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// random turns numbers of a random generator into a problem with a coarse grid: a sudden change of the
// surroundings, at Biot numbers from 1e-3 to 1e3 and times from the first moments to the end.
func random(a, b, c, d, e uint16) (fdm.Problem, float64, float64) {
	unit := func(x uint16) float64 { return float64(x) / math.MaxUint16 }
	start, ambient := 250+1000*unit(a), 250+1000*unit(b)
	bi := math.Pow(10, 6*unit(c)-3)
	p := scaled(bi, 8+int(d%40))
	p.Initial, p.Surface = kelvin(start), constant(10*bi, ambient)
	p.Horizon = seconds(math.Pow(10, 7*unit(e)-1))
	return p, start, ambient
}

// Laws that hold for every body in constant surroundings: no temperature beyond start and ambient (the
// maximum principle of the heat equation), each place on its way from one to the other, the outer
// ones ahead, and the heat accounted for.
func TestLaws(t *testing.T) {
	law := func(a, b, c, d, e uint16) bool {
		p, start, ambient := random(a, b, c, d, e)
		s := solve(t, p)
		const tol = 5e-3 // five times the tolerance of a step; and for what is monotone three times the estimate, on grids from 8 cells on
		low, high := min(start, ambient), max(start, ambient)
		sign := 1.0
		if ambient < start {
			sign = -1
		}
		ok := s.EnergyBalance() <= 1e-11
		end := s.Horizon().SI()
		var before [5]float64
		for i := range before {
			before[i] = start
		}
		for i := range 41 {
			time := end * math.Pow(float64(i)/40, 3)
			for j, x := range []float64{0, 0.31, 0.77, 0.95, 1} {
				T := at(t, s, below(x), time)
				ok = ok && T >= low-tol && T <= high+tol
				tol := tol + 3*estimate(t, s, below(x), time)
				ok = ok && sign*(T-before[j]) >= -tol
				ok = ok && (j == 0 || sign*(T-at(t, s, below([]float64{0, 0.31, 0.77, 0.95, 1}[j-1]), time)) >= -tol)
				before[j] = T
			}
			capacity := 1e6 * p.Body.Volume().SI()
			ok = ok && near(heat(t, s, time), capacity*(start-at(t, s, shape.Mean(), time)), 1e-9*capacity*math.Abs(start-ambient)+1e-9)
		}
		if !ok {
			t.Logf("start %g, ambient %g, %+v", start, ambient, p)
		}
		return ok
	}
	if err := quick.Check(law, &quick.Config{MaxCount: 60}); err != nil {
		t.Error(err)
	}
}

// Similarity: a sphere of twice the size with half the coefficient does the same in four times the
// time; surroundings that are hotter by as much as they were colder mirror the history.
func TestSimilarity(t *testing.T) {
	for _, bi := range []float64{0.2, 5} {
		p := scaled(bi, 30)
		s := solve(t, p)
		twice := p
		twice.Body, twice.Surface, twice.Horizon = shape.Sphere(units.Metre.Of(0.4)), constant(5*bi, 300), seconds(2e5)
		mirrored := p
		mirrored.Surface = constant(10*bi, 500)
		big, hot := solve(t, twice), solve(t, mirrored)
		for _, time := range []float64{3, 70, 900, 2e4} {
			want := at(t, s, shape.Centre(), time)
			if got := at(t, big, shape.Centre(), 4*time); !near(got, want, 1e-8) {
				t.Errorf("Bi %g: twice the size gives %.10g K at four times %g s, want %.10g K", bi, got, time, want)
			}
			if got := 800 - at(t, hot, shape.Centre(), time); !near(got, want, 1e-8) {
				t.Errorf("Bi %g: mirrored %.10g K at %g s, want %.10g K", bi, got, time, want)
			}
		}
	}
}

// Without exchange nothing happens, to the last bit.
func TestInsulated(t *testing.T) {
	for name, p := range map[string]fdm.Problem{
		"constant":   {Surface: constant(0, 300)},
		"in balance": {Surface: constant(50, 433.21)},
		"function":   {Surface: exchange(func(_, _ float64) float64 { return 0 })},
	} {
		p.Body, p.Material, p.Initial, p.Horizon = shape.Sphere(units.Millimetre.Of(60)), steel, kelvin(433.21), units.Hour.Of(10)
		s := solve(t, p)
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean(), shape.Below(units.Millimetre.Of(7))} {
			for _, time := range []float64{0, 1, 5000, 36000} {
				if got := at(t, s, place, time); got != 433.21 {
					t.Errorf("%s: %v at %g s is at %.17g K, want 433.21 K", name, place, time, got)
				}
			}
		}
		if q := heat(t, s, 36000); q != 0 || s.EnergyBalance() != 0 {
			t.Errorf("%s: heat %g J, balance %g, want 0", name, q, s.EnergyBalance())
		}
	}
}

// The end state is that of no exchange: natural convection and radiation in balance with absorbed radiation.
func TestSteadyEnd(t *testing.T) {
	p := steelSphere(20)
	absorbed := 700.0
	p.Surface = exchange(func(time, T float64) float64 { return convectionAndRadiation(time, T) - absorbed })
	p.Horizon = units.Day.Of(2)
	s := solve(t, p)
	T := at(t, s, shape.Centre(), p.Horizon.SI())
	if q := convectionAndRadiation(0, T); !near(q, absorbed, 0.05) { // 20 W/(m² K) × 2 mK
		t.Errorf("the end at %g K loses %g W/m², want %g", T, q, absorbed)
	}
	if T0 := at(t, s, shape.Surface(), p.Horizon.SI()); !near(T0, T, 1e-3) {
		t.Errorf("surface at %g K, centre at %g K, want no difference", T0, T)
	}
}

// Heat from the exchange at the reported surface temperatures, by a quadrature of its own, against the
// heat of the solution and against the enthalpy that the body lost. An error of the surface temperature
// changes the quadrature by (1.25 h + 4 ε σ T³) per kelvin, at most 100 W/(m² K) here.
func TestHeatByQuadrature(t *testing.T) {
	for _, cells := range []int{25, 100} {
		for _, tol := range []float64{1e-3, 1e-6} {
			p := steelSphere(cells)
			p.Tolerance = units.KelvinDifference.Of(tol)
			s := solve(t, p)
			sum, area := 0.0, p.Body.Area().SI()
			from := 0.0
			for to := 1e-6; from < 3600; to = min(to*1.5, 3600) {
				sum += quad.Fixed(func(time float64) float64 {
					return area * convectionAndRadiation(time, at(t, s, shape.Surface(), time))
				}, from, to, 8, nil, 0)
				from = to
			}
			largest, err := s.LargestError()
			if err != nil {
				t.Fatal(err)
			}
			got, allowed := heat(t, s, 3600), 100*area*3600*(largest.SI()+1e-9)
			if !near(got, sum, allowed) {
				t.Errorf("%d cells, tolerance %g K: heat %.9g J, by quadrature %.9g J, want to %g J", cells, tol, got, sum, allowed)
			}
			mean, err := s.Mean(s.Horizon())
			if err != nil {
				t.Fatal(err)
			}
			lost := steel.density * p.Body.Volume().SI() * (steel.enthalpy(800) - steel.enthalpy(mean.In(units.Celsius)))
			if !near(got, lost, 1e-8*lost) { // 10 µK of the table
				t.Errorf("%d cells, tolerance %g K: heat %.12g J, enthalpy lost %.12g J, want to 1e-8", cells, tol, got, lost)
			}
			if s.EnergyBalance() > 1e-11 {
				t.Errorf("%d cells, tolerance %g K: energy balance %g, want at most 1e-11", cells, tol, s.EnergyBalance())
			}
		}
	}
}

// The heat of a transition is not lost: the body gives off the enthalpy between its first and last
// temperature, and at a small Biot number the transition takes the time that its heat does, h A (T − T∞).
func TestTransition(t *testing.T) {
	for _, tol := range []float64{1e-4, 1e-3, 1e-2} {
		p := scaled(0.001, 20)
		p.Material, p.Horizon = jumping{plain{1000, 1000, 1}}, units.Day.Of(2000)
		p.Tolerance = units.KelvinDifference.Of(tol)
		s := solve(t, p)
		capacity := 1e6 * p.Body.Volume().SI()
		end := at(t, s, shape.Mean(), p.Horizon.SI())
		want := capacity * (400 - end + 29*(jumpTo-jumpFrom))
		if got := heat(t, s, p.Horizon.SI()); !near(got, want, 1e-8*want) || s.EnergyBalance() > 1e-11 {
			t.Errorf("tolerance %g K: heat %.10g J, want %.10g J; balance %g", tol, got, want, s.EnergyBalance())
		}
		from, err := s.TimeTo(shape.Mean(), kelvin(jumpTo))
		if err != nil {
			t.Fatal(err)
		}
		to, err := s.TimeTo(shape.Mean(), kelvin(jumpFrom))
		if err != nil {
			t.Fatal(err)
		}
		// d ln(T − T∞)/dt = −h A/(30 ρ c V), to the order of the Biot number of the transition
		tau := 30 * 1e6 * p.Body.VolumeToArea().SI() / 0.01
		if got, want := to.SI()-from.SI(), tau*math.Log((jumpTo-300)/(jumpFrom-300)); !near(got, want, 0.005*want) {
			t.Errorf("tolerance %g K: the transition takes %g s, want %g s to 0.5 %%", tol, got, want)
		}
	}
}

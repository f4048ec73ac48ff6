package props_test

import (
	"math"
	"math/rand/v2"
	"regexp"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func k(t *testing.T, s props.Solid, T float64) float64 {
	t.Helper()
	q, err := s.Conductivity(units.Kelvin.Of(T))
	if err != nil {
		t.Fatal(err)
	}
	return q.SI()
}

func c(t *testing.T, s props.Solid, T float64) float64 {
	t.Helper()
	q, err := s.SpecificHeat(units.Kelvin.Of(T))
	if err != nil {
		t.Fatal(err)
	}
	return q.SI()
}

func h(t *testing.T, s props.Solid, T float64) float64 {
	t.Helper()
	q, err := s.Enthalpy(units.Kelvin.Of(T))
	if err != nil {
		t.Fatal(err)
	}
	return q.SI()
}

// The specific heat of glass: the mean from 0 °C to 100 °C against 840 J/(kg K) of CIBSE Guide A (0.20 cal/(g °C), a mean
// of that interval by common practice, no source).
func TestGlass(t *testing.T) {
	mean := (h(t, props.Glass(), 373.15) - h(t, props.Glass(), 273.15)) / 100
	check(t, "mean specific heat of glass from 0 °C to 100 °C", mean, cell{840, 5}, props.Glass().SpecificHeatUncertainty(), otherSources["cibse"])
}

// The peak of steel: 666 + 13002/(738 − 735) and 545 + 17820/(735 − 731) are both 5000 J/(kg K), and the heat from 20 °C to 1200 °C
// is the sum of the pieces, integrated here by the midpoint rule in steps that shrink to the peak.
func TestSteelPeak(t *testing.T) {
	steel := props.CarbonSteel()
	check(t, "c at the peak", c(t, steel, units.Celsius.Of(735).SI()), cell{5000, 1e-8}, 0, "EN 1993-1-2, 3.4.1.2")
	sum := 0.0
	const step = 1.0 / 64
	for x := 20 + step/2; x < 1200; x += step {
		sum += step * c(t, steel, x+273.15)
	}
	got := h(t, steel, celsius(1200)) - h(t, steel, celsius(20))
	// The error of the midpoint rule is step²/24 times the jump of the slope of c, 1444 + 1114 J/(kg K²) at the peak, and less elsewhere.
	check(t, "heat from 20 °C to 1200 °C", got, cell{sum, step * step / 24 * 2 * 2600}, 1e-9, "midpoint rule")
}

func celsius(x float64) float64 { return units.Celsius.Of(x).SI() }

// Every solid of the package, and one of each kind of one's own.
func everySolid(t *testing.T) []props.Solid {
	t.Helper()
	all := ownSolids(t)
	for s := range props.Solids() {
		all = append(all, s)
	}
	return all
}

// What holds for any solid over its whole range.
func TestSolidsAreConsistent(t *testing.T) {
	random := rand.New(rand.NewPCG(1, 2))
	for _, s := range everySolid(t) {
		low, high := s.Range()
		lo, hi := max(low.SI(), 1), min(high.SI(), 3000)
		edges := []float64{lo}
		for _, kink := range s.Kinks() {
			edges = append(edges, kink.SI())
		}
		edges = append(edges, hi)
		last := math.Inf(-1)
		for i := 1; i < len(edges); i++ {
			a, b := edges[i-1], edges[i]
			for range 200 {
				T := a + (b-a)*random.Float64()
				if k(t, s, T) <= 0 || c(t, s, T) <= 0 {
					t.Errorf("%s at %g K: k %g, c %g", s.Name(), T, k(t, s, T), c(t, s, T))
				}
				// c = dh/dT, by Simpson's rule between two temperatures of a piece.
				u := min(T+0.01, b)
				simpson := (u - T) / 6 * (c(t, s, T) + 4*c(t, s, (T+u)/2) + c(t, s, math.Nextafter(u, T)))
				got := h(t, s, u) - h(t, s, T)
				if u-T > 0.001 && math.Abs(got-simpson) > 1e-6*simpson {
					t.Errorf("%s from %.9g K to %.9g K: Δh %.12g J/kg, integral of c %.12g", s.Name(), T, u, got, simpson)
				}
				back, err := s.Temperature(units.JoulePerKilogram.Of(h(t, s, T)))
				if err != nil || math.Abs(back.SI()-T) > 1e-12*T {
					t.Errorf("%s: T(h(%.15g K)) is %.15g K, %v", s.Name(), T, back.SI(), err)
				}
			}
			// No jump at a kink: what h gains across it is c times the step.
			if step := 1e-6; i > 1 {
				gain := h(t, s, a+step) - h(t, s, a-step)
				if latent := plateaus[s.Name()][a]; latent != 0 {
					gain -= latent
				}
				if most := 2 * step * max(c(t, s, a-step), c(t, s, a), c(t, s, a+step)); gain <= 0 || gain > 1.001*most+1e-14*h(t, s, a) {
					t.Errorf("%s: h jumps at the kink %g K, by %g J/kg in %g K", s.Name(), a, gain, 2*step)
				}
			}
			// Rising.
			for j := 0; j <= 1000; j++ {
				T := min(a+(b-a)*float64(j)/1000, b)
				now := h(t, s, T)
				if j > 0 && now <= last {
					t.Errorf("%s: h does not rise at %g K: %g after %g J/kg", s.Name(), T, now, last)
				}
				last = now
			}
		}
	}
}

// A kink is where the value or the slope of k or c jumps; and between kinks neither does.
func TestKinksAreWhereTheDataHasThem(t *testing.T) {
	for _, s := range everySolid(t) {
		// A jump of the value or slope that is seen by four points about x, scaled by the value.
		jump := func(f func(*testing.T, props.Solid, float64) float64, x float64) float64 {
			const d = 1e-3
			a, b, e, g := f(t, s, x-2*d), f(t, s, x-d), f(t, s, x+d), f(t, s, x+2*d)
			return (math.Abs((e-b)-((b-a)+(g-e))) + math.Abs((g-e)-(b-a))) / b
		}
		for _, kink := range s.Kinks() {
			if x := kink.SI(); jump(k, x) < 1e-7 && jump(c, x) < 1e-7 {
				t.Errorf("%s: nothing jumps at the kink %v", s.Name(), kink)
			}
		}
		low, high := s.Range()
		for x := max(low.SI(), 200) + 0.5; x < min(high.SI(), 1500)-0.5; x += 0.731 {
			near := false
			for _, kink := range s.Kinks() {
				near = near || math.Abs(kink.SI()-x) < 1
			}
			if !near && (jump(k, x) > 1e-4 || jump(c, x) > 1e-4) {
				t.Errorf("%s: k or c jumps at %g K, which is no kink: %g, %g", s.Name(), x, jump(k, x), jump(c, x))
			}
		}
	}
}

// The ranges of the sources, and where the Eurocodes change from one equation to the next (EN 1993-1-2, 3.4.1, and EN 1992-1-2, 3.3;
// carbon steel is continued from 20 °C to 0 °C).
func TestRangesAndKinks(t *testing.T) {
	for _, r := range []struct {
		s         props.Solid
		low, high units.Temperature
		kinks     []float64 // °C
	}{
		{props.CarbonSteel(), units.Celsius.Of(0), units.Celsius.Of(1200), []float64{600, 735, 800, 900}},
		{props.StainlessSteel(), units.Kelvin.Of(200), units.Kelvin.Of(1500), nil},
		{props.Copper(), units.Kelvin.Of(200), units.Kelvin.Of(1200), nil},
		{props.Aluminium(), units.Kelvin.Of(200), units.Kelvin.Of(800), nil},
		{props.Glass(), units.Celsius.Of(0), units.Celsius.Of(200), nil},
		{props.Concrete(), units.Celsius.Of(20), units.Celsius.Of(1200), []float64{100, 200, 400}},
		{props.PVC(), units.Celsius.Of(0), units.Celsius.Of(60), nil},
		{props.Softwood(), units.Celsius.Of(0), units.Celsius.Of(60), nil},
		{props.Ice(), units.Celsius.Of(-100), units.Celsius.Of(0), nil},
	} {
		if low, high := r.s.Range(); low != r.low || high != r.high {
			t.Errorf("%s: range %v to %v, want %v to %v", r.s.Name(), low, high, r.low, r.high)
		}
		kinks := r.s.Kinks()
		if len(kinks) != len(r.kinks) {
			t.Errorf("%s: kinks %v, want %v °C", r.s.Name(), kinks, r.kinks)
			continue
		}
		for i, x := range r.kinks {
			if kinks[i] != units.Celsius.Of(x) {
				t.Errorf("%s: kink at %v, want %g °C", r.s.Name(), kinks[i], x)
			}
		}
	}
	for _, r := range []struct {
		f                   props.Medium
		low, high, pressure float64 // K, Pa: where the pressure ends
		gas                 bool
	}{
		{props.Air(), 200, 1500, 200e3, true},
		{props.Water(), 273.15, 383.15, 300e3, false},
		{props.PressurisedWater(), 273.15, 623.15, 100e6, false},
	} {
		if low, high := r.f.Range(); low.SI() != r.low || high.SI() != r.high {
			t.Errorf("%s: range %v to %v, want %g K to %g K", r.f.Name(), low, high, r.low, r.high)
		}
		if _, high, err := r.f.PressureRange(units.Kelvin.Of(300)); err != nil || high.SI() != r.pressure {
			t.Errorf("%s: pressure to %v (%v), want %g Pa", r.f.Name(), high, err, r.pressure)
		}
		if s := state(t, r.f, 300, 1e5); s.Gas != r.gas || s.Temperature.SI() != 300 || s.Pressure.SI() != 1e5 {
			t.Errorf("%s: state of %v, %v, gas %v; want 300 K, 100 kPa, %v", r.f.Name(), s.Temperature, s.Pressure, s.Gas, r.gas)
		}
	}
}

var wellFormed = regexp.MustCompile(`^[A-Za-z][A-Za-z0-9 .,%/³()-]*[A-Za-z0-9³%)]$`)

// Data without a source is a rumour.
func TestSubstancesAreDocumented(t *testing.T) {
	seen := map[string]string{}
	names := func(name string, synonyms []string) {
		if !wellFormed.MatchString(name) {
			t.Errorf("name %q is malformed", name)
		}
		for _, n := range append(synonyms, name) {
			if strings.TrimSpace(n) != n || n == "" {
				t.Errorf("%s: synonym %q is malformed", name, n)
			}
			if other, ok := seen[strings.ToLower(n)]; ok {
				t.Errorf("%q names both %s and %s", n, other, name)
			}
			seen[strings.ToLower(n)] = name
		}
	}
	status := regexp.MustCompile(`\bread\b|from memory`)
	solids := 0
	for s := range props.Solids() {
		solids++
		names(s.Name(), s.Synonyms())
		if !status.MatchString(s.Source()) {
			t.Errorf("%s: the source %q does not say whether it was read or recalled", s.Name(), s.Source())
		}
		low, high := s.Range()
		if !(low.SI() > 0 && high.SI() > low.SI() && high.IsFinite()) {
			t.Errorf("%s: range %v to %v", s.Name(), low, high)
		}
		for what, u := range map[string]float64{
			"density": s.DensityUncertainty(), "specific heat": s.SpecificHeatUncertainty(), "conductivity": s.ConductivityUncertainty(),
		} {
			if !(u > 0 && u < 1) {
				t.Errorf("%s: uncertainty of the %s is %g", s.Name(), what, u)
			}
		}
		if s.UncertaintySource() == "" {
			t.Errorf("%s: nothing says where the uncertainties come from", s.Name())
		}
		if found, err := props.FindSolid(strings.ToUpper(s.Name())); err != nil || found != s {
			t.Errorf("FindSolid(%q): %v", s.Name(), err)
		}
	}
	if solids < 250 {
		t.Errorf("%d solids, want 250 at least", solids)
	}
	for f := range props.Fluids() {
		names(f.Name(), f.Synonyms())
		if !status.MatchString(f.Source()) {
			t.Errorf("%s: the source %q does not say whether it was read or recalled", f.Name(), f.Source())
		}
		low, high := f.Range()
		if !(low.SI() > 0 && high.SI() > low.SI() && high.IsFinite()) {
			t.Errorf("%s: range %v to %v", f.Name(), low, high)
		}
		for what, u := range map[string]float64{
			"density": f.DensityUncertainty(), "specific heat": f.SpecificHeatUncertainty(),
			"conductivity": f.ConductivityUncertainty(), "viscosity": f.ViscosityUncertainty(),
		} {
			if !(u > 0 && u < 0.2) {
				t.Errorf("%s: uncertainty of the %s is %g", f.Name(), what, u)
			}
		}
		if f.UncertaintySource() == "" {
			t.Errorf("%s: nothing says where the uncertainties come from", f.Name())
		}
		if found, err := props.FindFluid(strings.ToUpper(f.Name())); err != nil || found != f {
			t.Errorf("FindFluid(%q): %v", f.Name(), err)
		}
	}
}

package props_test

import (
	"errors"
	"math"
	"strings"
	"sync"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// calls asks a solid for each property at T.
func calls(s props.Solid, T units.Temperature) map[string]error {
	_, errK := s.Conductivity(T)
	_, errC := s.SpecificHeat(T)
	_, errH := s.Enthalpy(T)
	return map[string]error{"thermal conductivity": errK, "specific heat": errC, "specific enthalpy": errH}
}

// At the ends of the range there is a value, and one ULP beyond an error that names everything.
func TestSolidsEndWithTheirRange(t *testing.T) {
	for _, s := range everySolid(t) {
		low, high := s.Range()
		for _, end := range []struct{ inside, outside float64 }{
			{low.SI(), math.Nextafter(low.SI(), 0)},
			{high.SI(), math.Nextafter(high.SI(), math.Inf(1))},
		} {
			if end.inside == 0 || math.IsInf(end.inside, 0) {
				continue // a constant without a range
			}
			for property, err := range calls(s, units.Kelvin.Of(end.inside)) {
				if err != nil {
					t.Errorf("%s of %s at the end %g K: %v", property, s.Name(), end.inside, err)
				}
			}
			for property, err := range calls(s, units.Kelvin.Of(end.outside)) {
				var r *units.RangeError
				if !errors.As(err, &r) {
					t.Errorf("%s of %s beyond the end %g K: got %v, want a range error", property, s.Name(), end.inside, err)
					continue
				}
				if r.Model != property+" of "+s.Name() || r.Quantity != "temperature" || r.Value.SI() != end.outside ||
					r.Min.SI() != low.SI() || r.Max.SI() != high.SI() || r.Source != s.Source() {
					t.Errorf("incomplete range error: %v", r)
				}
			}
		}
	}
}

// The temperature of an enthalpy has the ends of the range too, and returns them as they are.
func TestTemperatureEndsWithTheRange(t *testing.T) {
	for _, s := range everySolid(t) {
		low, high := s.Range()
		for _, end := range []struct {
			T      units.Temperature
			beyond float64
		}{{low, -1}, {high, +1}} {
			hEnd, err := s.Enthalpy(end.T)
			if err != nil {
				continue // a constant without a range
			}
			if back, err := s.Temperature(hEnd); err != nil || back != end.T {
				t.Errorf("%s: T(h(%v)) = %v, %v", s.Name(), end.T, back, err)
			}
			outside := units.JoulePerKilogram.Of(math.Nextafter(hEnd.SI(), math.Inf(int(end.beyond))))
			var r *units.RangeError
			if _, err := s.Temperature(outside); !errors.As(err, &r) || r.Quantity != "specific enthalpy" || !strings.Contains(r.Model, s.Name()) {
				t.Errorf("%s: T of an enthalpy beyond that of %v: got %v, want a range error", s.Name(), end.T, err)
			}
		}
	}
}

func TestFluidsEndWithTheirRange(t *testing.T) {
	for f := range props.Fluids() {
		low, high := f.Range()
		for _, T := range []units.Temperature{low, high} {
			pLow, pHigh, err := f.PressureRange(T)
			if err != nil {
				t.Fatal(err)
			}
			for _, p := range []units.Pressure{pLow, pHigh} {
				if _, err := f.At(T, p); err != nil {
					t.Errorf("%s at %v and %v: %v", f.Name(), T, p, err)
				}
			}
			for _, p := range []float64{math.Nextafter(pLow.SI(), 0), math.Nextafter(pHigh.SI(), 1e9)} {
				var r *units.RangeError
				if _, err := f.At(T, units.Pascal.Of(p)); !errors.As(err, &r) || r.Quantity != "pressure" || r.Value.SI() != p ||
					r.Min.SI() != pLow.SI() || r.Max.SI() != pHigh.SI() || !strings.Contains(r.Model, f.Name()) || r.Source != f.Source() {
					t.Errorf("%s at %v and %g Pa: got %v, want a range error of the pressure", f.Name(), T, p, err)
				}
			}
		}
		for _, T := range []float64{math.Nextafter(low.SI(), 0), math.Nextafter(high.SI(), 1e9)} {
			var r *units.RangeError
			if _, err := f.At(units.Kelvin.Of(T), units.Pascal.Of(1e5)); !errors.As(err, &r) || r.Quantity != "temperature" || r.Value.SI() != T ||
				r.Min.SI() != low.SI() || r.Max.SI() != high.SI() || !strings.Contains(r.Model, f.Name()) || r.Source != f.Source() {
				t.Errorf("%s at %g K: got %v, want a range error of the temperature", f.Name(), T, err)
			}
		}
	}
}

// Values that are no temperature or no pressure, and zero values.
func TestImpossibleArguments(t *testing.T) {
	var e *units.ArgumentError
	for _, T := range []float64{0, -1, math.NaN(), math.Inf(1), math.Inf(-1)} {
		for _, s := range append(everySolid(t), props.Solid{}) {
			for property, err := range calls(s, units.Kelvin.Of(T)) {
				if !errors.As(err, &e) {
					t.Errorf("%s of %q at %g K: got %v, want an argument error", property, s.Name(), T, err)
				}
			}
		}
		for _, f := range []props.Medium{props.Air(), props.Water(), {}} {
			if _, err := f.At(units.Kelvin.Of(T), units.Pascal.Of(1e5)); !errors.As(err, &e) {
				t.Errorf("%q at %g K: got %v, want an argument error", f.Name(), T, err)
			}
		}
	}
	for _, p := range []float64{0, -1, math.NaN(), math.Inf(1)} {
		if _, err := props.Air().At(units.Kelvin.Of(300), units.Pascal.Of(p)); !errors.As(err, &e) {
			t.Errorf("air at %g Pa: got %v, want an argument error", p, err)
		}
	}
	for _, s := range append(everySolid(t), props.Solid{}) {
		if _, err := s.Temperature(units.JoulePerKilogram.Of(math.NaN())); !errors.As(err, &e) {
			t.Errorf("%q: temperature of an enthalpy NaN: got %v, want an argument error", s.Name(), err)
		}
	}
	var s props.Solid
	low, high := s.Range()
	if s.Name() != "" || s.Source() != "" || s.Synonyms() != nil || s.Kinks() != nil || low.SI() != 0 || high.SI() != 0 ||
		s.Density().SI() != 0 || s.ConductivityUncertainty() != 0 || s.UncertaintySource() != "" {
		t.Error("the zero Solid has data")
	}
	if _, err := s.Within(units.Kelvin.Of(300), units.Kelvin.Of(400)); !errors.As(err, &e) {
		t.Errorf("range of the zero Solid: got %v, want an argument error", err)
	}
	var f props.Medium
	low, high = f.Range()
	if f.Name() != "" || f.Source() != "" || f.Synonyms() != nil || low.SI() != 0 || high.SI() != 0 || f.ViscosityUncertainty() != 0 || f.UncertaintySource() != "" {
		t.Error("the zero Medium has data")
	}
	if _, _, err := f.PressureRange(units.Kelvin.Of(300)); !errors.As(err, &e) {
		t.Errorf("pressure range of the zero Medium: got %v, want an argument error", err)
	}
}

// A name that does not exist: the error lists those that have a word of it, or some that do exist.
func TestFindUnknown(t *testing.T) {
	var e *units.ArgumentError
	_, err := props.FindSolid("aluminium cheese")
	if !errors.As(err, &e) {
		t.Fatalf("got %v, want an argument error", err)
	}
	for _, name := range []string{"aluminium", "aluminium alloy 2024", "aluminium alloy 6061"} {
		if !strings.Contains(e.Accepted, name) {
			t.Errorf("%q does not list %s", e.Accepted, name)
		}
	}
	if strings.Contains(e.Accepted, "copper,") {
		t.Errorf("%q lists copper", e.Accepted)
	}
	for _, name := range []string{"cheese", "", "of"} {
		if _, err := props.FindSolid(name); !errors.As(err, &e) || !strings.Contains(e.Accepted, "such as carbon steel") {
			t.Errorf("%q: got %v, want an argument error with some names", name, err)
		}
	}
	if _, err := props.FindFluid(""); !errors.As(err, &e) || !strings.Contains(e.Accepted, "air, water") {
		t.Errorf("got %v, want an argument error that lists air and water", err)
	}
	if s, err := props.FindSolid(" Mild Steel "); err != nil || s != props.CarbonSteel() {
		t.Errorf("mild steel: got %q, %v", s.Name(), err)
	}
}

// What is handed out cannot change the substance.
func TestSolidsCannotBeChanged(t *testing.T) {
	props.CarbonSteel().Kinks()[0] = units.Kelvin.Of(1)
	props.CarbonSteel().Synonyms()[0] = "cheese"
	props.Air().Synonyms()[0] = "cheese"
	if props.CarbonSteel().Kinks()[0] != units.Celsius.Of(600) || props.CarbonSteel().Synonyms()[0] == "cheese" || props.Air().Synonyms()[0] == "cheese" {
		t.Error("changed through what it handed out")
	}
	kinks := []units.Temperature{units.Kelvin.Of(400)}
	l := law()
	l.Kinks = kinks
	s, err := props.Function(l)
	if err != nil {
		t.Fatal(err)
	}
	kinks[0] = units.Kelvin.Of(1)
	if s.Kinks()[0] != units.Kelvin.Of(400) {
		t.Error("a law changed after the solid was made changes the solid")
	}
}

// Many goroutines at once, for the race detector.
func TestManyGoroutines(t *testing.T) {
	all := everySolid(t)
	var wg sync.WaitGroup
	for range 8 {
		wg.Go(func() {
			for _, s := range all {
				for T := 300.0; T < 320; T++ {
					_ = calls(s, units.Kelvin.Of(T))
				}
			}
			for f := range props.Fluids() {
				_, _ = f.At(units.Kelvin.Of(300), units.Pascal.Of(1e5))
			}
		})
	}
	wg.Wait()
}

// A solver asks for properties in its inner loop.
func TestPropertiesDoNotAllocate(t *testing.T) {
	for _, s := range everySolid(t) {
		low, high := s.Range()
		T := units.Kelvin.Of(min(max(310, low.SI()), high.SI()))
		enthalpy, err := s.Enthalpy(T)
		if err != nil {
			t.Fatal(err)
		}
		if n := testing.AllocsPerRun(10, func() {
			_, _ = s.Conductivity(T)
			_, _ = s.SpecificHeat(T)
			_, _ = s.Enthalpy(T)
			_, _ = s.Temperature(enthalpy)
		}); n != 0 {
			t.Errorf("%s: %g allocations", s.Name(), n)
		}
	}
	for f := range props.Fluids() {
		T, p := common(t, f, 310)
		if n := testing.AllocsPerRun(10, func() { _, _ = f.At(T, p) }); n != 0 {
			t.Errorf("%s: %g allocations", f.Name(), n)
		}
	}
}

// common returns the state nearest to the given temperature and 1 bar that f accepts.
func common(t testing.TB, f props.Medium, kelvin float64) (units.Temperature, units.Pressure) {
	t.Helper()
	low, high := f.Range()
	T := units.Kelvin.Of(min(max(kelvin, low.SI()), high.SI()))
	least, most, err := f.PressureRange(T)
	if err != nil {
		t.Fatal(err)
	}
	return T, units.Pascal.Of(min(max(1e5, least.SI()), most.SI()))
}

package props_test

import (
	"errors"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// The textbook forms of the conductivities, by hand for 4 and 1 W/(m K) at 25 % of the second: parallel 3.25, series
// 1/(0.1875 + 0.25), geometric 4^0.75, Maxwell and Eucken 4 (8 + 1 − 0.5·3)/(8 + 1 + 0.25·3).
func TestCompositeByHand(t *testing.T) {
	a, b := constantOf(t, "a", 2000, 1000, 4), constantOf(t, "b", 1000, 500, 1)
	for _, r := range []struct {
		structure props.Structure
		k         float64
	}{
		{props.Parallel, 3.25},
		{props.Series, 1 / 0.4375},
		{props.Geometric, math.Pow(4, 0.75)},
		{props.Dispersed, 4 * 7.5 / 9.75},
	} {
		s, err := props.Composite("mixture", r.structure, props.Part{Solid: a, Volume: 0.75}, props.Part{Solid: b, Volume: 0.25})
		if err != nil {
			t.Fatal(err)
		}
		check(t, "k", k(t, s, 300), cell{r.k, 1e-12}, 0, "by hand")
		check(t, "density", s.Density().SI(), cell{1750, 1e-9}, 0, "by hand")
		check(t, "c", c(t, s, 300), cell{(1500*1000 + 250*500) / 1750.0, 1e-9}, 0, "mass-weighted")
		if !s.IsConstant() {
			t.Error("a mixture of constants is not constant")
		}
	}
}

// Whatever the parts: series ≤ geometric ≤ parallel, and spheres lie within the bounds of Z. Hashin and S. Shtrikman,
// J. Appl. Phys. 33 (1962) 3125, which for two phases are the equation of Maxwell and Eucken with either phase
// continuous, and hence between series and parallel.
func TestCompositeBounds(t *testing.T) {
	random := rand.New(rand.NewPCG(3, 4))
	for range 200 {
		a := constantOf(t, "a", 1000, 1000, math.Exp(6*random.Float64()-3))
		b := constantOf(t, "b", 1000, 1000, math.Exp(6*random.Float64()-3))
		f := random.Float64()
		of := func(structure props.Structure, x, y props.Solid, f float64) float64 {
			s, err := props.Composite("mixture", structure, props.Part{Solid: x, Volume: 1 - f}, props.Part{Solid: y, Volume: f})
			if err != nil {
				t.Fatal(err)
			}
			return k(t, s, 300)
		}
		series, mean, parallel := of(props.Series, a, b, f), of(props.Geometric, a, b, f), of(props.Parallel, a, b, f)
		one, two := of(props.Dispersed, a, b, f), of(props.Dispersed, b, a, 1-f)
		for _, pair := range [][2]float64{{series, mean}, {mean, parallel}, {series, min(one, two)}, {max(one, two), parallel}} {
			if !(pair[0] <= pair[1]*(1+1e-12)) {
				t.Errorf("k %g and %g, %g of the second: series %g, geometric %g, parallel %g, dispersed %g and %g", k(t, a, 300), k(t, b, 300), f, series, mean, parallel, one, two)
			}
		}
		if sameOrder := (k(t, a, 300) > k(t, b, 300)) == (one > two); !sameOrder && math.Abs(one-two) > 1e-9*one {
			t.Errorf("the phase that conducts better makes the better mixture when it is continuous: %g, %g", one, two)
		}
	}
}

// Moisture by EN ISO 10456: exp(f u), and the heat of water.
func TestMoist(t *testing.T) {
	dry := constantOf(t, "dry", 500, 1600, 0.13)
	s, err := props.Moist("damp timber", dry, 0.12, 4)
	if err != nil {
		t.Fatal(err)
	}
	check(t, "k", k(t, s, 300), cell{0.13 * math.Exp(0.48), 1e-12}, 0, "by hand")
	check(t, "c", c(t, s, 300), cell{(1600 + 0.12*4190) / 1.12, 1e-9}, 0, "by hand")
	check(t, "density", s.Density().SI(), cell{560, 1e-9}, 0, "by hand")
	if low, high := s.Range(); low != units.Celsius.Of(0) || high != units.Celsius.Of(100) {
		t.Errorf("range %v to %v, want liquid water", low, high)
	}
}

func TestMixturesAreChecked(t *testing.T) {
	a, b := constantOf(t, "a", 2000, 1000, 4), constantOf(t, "b", 1000, 500, 1)
	cold, err := b.Within(units.Kelvin.Of(100), units.Kelvin.Of(200))
	if err != nil {
		t.Fatal(err)
	}
	warm, err := a.Within(units.Kelvin.Of(200), units.Kelvin.Of(300))
	if err != nil {
		t.Fatal(err)
	}
	composite := func(name string, structure props.Structure, parts ...props.Part) error {
		_, err := props.Composite(name, structure, parts...)
		return err
	}
	moist := func(name string, s props.Solid, u, f float64) error {
		_, err := props.Moist(name, s, u, f)
		return err
	}
	food := func(change func(r *props.Recipe)) error {
		r := props.Recipe{Name: "x", Composition: props.Composition{Water: 0.8, Protein: 0.2}, Freezing: units.Celsius.Of(-1)}
		change(&r)
		_, err := props.Food(r)
		return err
	}
	for _, r := range []struct {
		what, field string
		err         error
	}{
		{"no name", "name", composite("", props.Parallel, props.Part{Solid: a, Volume: 0.5}, props.Part{Solid: b, Volume: 0.5})},
		{"one part", "parts", composite("x", props.Parallel, props.Part{Solid: a, Volume: 1})},
		{"empty part", "Solid", composite("x", props.Parallel, props.Part{Solid: a, Volume: 0.5}, props.Part{Volume: 0.5})},
		{"negative volume", "part 2: volume", composite("x", props.Parallel, props.Part{Solid: a, Volume: 0.5}, props.Part{Solid: b, Volume: -0.5})},
		{"volume NaN", "part 1: volume", composite("x", props.Parallel, props.Part{Solid: a, Volume: math.NaN()}, props.Part{Solid: b, Volume: 0.5})},
		{"sum", "sum", composite("x", props.Parallel, props.Part{Solid: a, Volume: 0.5}, props.Part{Solid: b, Volume: 0.4})},
		{"structure", "structure", composite("x", props.Structure(4), props.Part{Solid: a, Volume: 0.5}, props.Part{Solid: b, Volume: 0.5})},
		{"no common range", "ranges", composite("x", props.Series, props.Part{Solid: warm, Volume: 0.5}, props.Part{Solid: cold, Volume: 0.5})},
		{"moist without name", "name", moist(" ", a, 0.1, 4)},
		{"moist without solid", "Solid", moist("x", props.Solid{}, 0.1, 4)},
		{"moist content", "content", moist("x", a, -0.1, 4)},
		{"moist sensitivity", "sensitivity", moist("x", a, 0.1, math.NaN())},
		{"moist product", "times", moist("x", a, 1, 6)},
		{"moist frozen", "range", moist("x", cold, 0.1, 4)},
		{"food without name", "name", food(func(r *props.Recipe) { r.Name = "" })},
		{"food negative", "fat", food(func(r *props.Recipe) { r.Composition.Fat = -0.1 })},
		{"food sum", "sum", food(func(r *props.Recipe) { r.Composition.Fat = 0.1 })},
		{"food without composition", "sum", food(func(r *props.Recipe) { r.Composition = props.Composition{} })},
		{"food without freezing point", "freezing", food(func(r *props.Recipe) { r.Freezing = units.Temperature{} })},
		{"food freezing at 0 °C", "freezing", food(func(r *props.Recipe) { r.Freezing = units.Celsius.Of(0) })},
		{"food porosity", "porosity", food(func(r *props.Recipe) { r.Porosity = 1 })},
		{"food structure", "structure", food(func(r *props.Recipe) { r.Structure = 9 })},
	} {
		var e *units.ArgumentError
		if !errors.As(r.err, &e) || !strings.Contains(e.Field, r.field) || e.Accepted == "" {
			t.Errorf("%s: got %v, want an argument error of %q", r.what, r.err, r.field)
		}
	}
}

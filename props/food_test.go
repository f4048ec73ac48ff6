package props_test

import (
	"errors"
	"fmt"
	"math"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func food(t *testing.T, r props.Recipe) props.Solid {
	t.Helper()
	s, err := props.Food(r)
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// A food of one component is that component, in all digits of the table; below 0 °C water is checked as ice together
// with what is not frozen in TestFoodFreezes.
func TestFoodComponents(t *testing.T) {
	s := readSheet(t, "food_choi_okos_check.csv")
	for i := range s.rows {
		var x props.Composition
		component := s.text(t, i, "component")
		switch component {
		case "protein":
			x.Protein = 1
		case "fat":
			x.Fat = 1
		case "carbohydrate":
			x.Carbohydrate = 1
		case "fibre":
			x.Fibre = 1
		case "ash":
			x.Ash = 1
		case "water":
			x.Water = 1
		case "ice":
			continue
		default:
			t.Fatal(component)
		}
		celsius := s.cell(t, i, "t_degC").value
		T := units.Celsius.Of(celsius).SI()
		for structure := props.Dispersed; structure <= props.Geometric; structure++ {
			f := food(t, props.Recipe{Name: "x", Composition: x, Freezing: units.Celsius.Of(-0.1), Structure: structure})
			sixDigits := func(column string) cell {
				v := s.cell(t, i, column)
				v.half = 5.1e-6 * v.value
				return v
			}
			at := fmt.Sprintf(" of %s at %g °C", component, celsius)
			check(t, "k"+at, k(t, f, T), sixDigits("k_W_mK"), 0, s.name)
			check(t, "c"+at, c(t, f, T), sixDigits("cp_J_kgK"), 0, s.name)
			if celsius == 20 {
				check(t, "density"+at, f.Density().SI(), sixDigits("rho_kg_m3"), 0, s.name)
			}
		}
	}
}

// The mixture at 20 °C to the printed digits, and the columns of the handbook: the latent heat within the 2 % that the
// source gives its rule of 334 kJ/kg of water.
func TestFoodsAgainstTheHandbook(t *testing.T) {
	s := readSheet(t, "food_ashrae.csv")
	byWater := map[float64]props.Recipe{}
	for r := range props.Recipes() {
		byWater[math.Round(r.Composition.Water*1e4)] = r
	}
	if len(byWater) != len(s.rows) {
		t.Fatalf("%d foods, %d rows", len(byWater), len(s.rows))
	}
	T := units.Celsius.Of(20).SI()
	for i := range s.rows {
		name := s.text(t, i, "food")
		r := byWater[math.Round(s.cell(t, i, "water_pct").value*100)]
		sum := r.Composition.Water + r.Composition.Protein + r.Composition.Fat + r.Composition.Carbohydrate + r.Composition.Fibre + r.Composition.Ash
		// The script scales by volume alone; where the parts of the table do not add to 1 its c is low by what is missing.
		missing := math.Abs(sum-1) * 4000
		equal := func(what, column string, got, slack float64) {
			t.Helper()
			want := s.cell(t, i, column)
			want.half = want.half*1.1 + slack
			check(t, what+" of "+name, got, want, 0, s.name)
		}
		f := food(t, r)
		equal("c", "choi_okos_cp_20C", c(t, f, T), missing)
		equal("density", "choi_okos_rho_20C", f.Density().SI(), math.Abs(sum-1)*1100)
		for structure, column := range map[props.Structure]string{props.Parallel: "k_parallel_20C", props.Series: "k_series_20C", props.Geometric: "k_geometric_20C"} {
			r.Structure = structure
			equal("k", column, k(t, food(t, r), T), 0)
		}
		latent := s.cell(t, i, "latent_from_334x").value
		check(t, "latent heat of "+name, 334e3*r.Composition.Water, cell{latent, 500}, 0, s.name)
	}
}

// Enthalpy below the freezing point against the equation of C. S. Chen, J. Food Sci. 50 (1985) 1158 (as given by the
// ASHRAE Handbook Refrigeration, from memory), which has its own specific heats: H = (t − tr)(1.55 + 1.26 xs − (xw −
// xb) L0 tf/(tr t)) kJ/kg with tr = −40 °C. Chen takes 1.55 kJ/(kg K) for ice, which has 1.82 to 2.06, and leaves the
// specific heat of unfrozen water aside: 20 % is allowed.
func TestFoodEnthalpyAgainstChen(t *testing.T) {
	for r := range props.Recipes() {
		f := food(t, r)
		x := r.Composition
		tf := r.Freezing.In(units.Celsius)
		chen := func(celsius float64) float64 {
			return (celsius + 40) * (1550 + 1260*(1-x.Water) - (x.Water-0.4*x.Protein)*333.6e3*tf/(-40*celsius))
		}
		for _, celsius := range []float64{-30, -20, -10, -5, tf} {
			got := h(t, f, units.Celsius.Of(celsius).SI()) - h(t, f, units.Celsius.Of(-40).SI())
			check(t, fmt.Sprintf("enthalpy of %s from -40 °C to %g °C", r.Name, celsius), got, cell{chen(celsius), 2000}, 0.20, "Chen (1985)")
		}
	}
}

// From above the freezing point to deep frost pure water loses what the handbook values of water and ice say: 4.2
// kJ/(kg K) to the freezing point, 333.6 kJ/kg, and 2.0 kJ/(kg K) of ice. Nothing may depend on where the freezing
// point lies but by the difference of these.
func TestFoodFreezes(t *testing.T) {
	water := props.Recipe{Name: "water", Composition: props.Composition{Water: 1}, Freezing: units.Celsius.Of(-0.001)}
	f := food(t, water)
	got := h(t, f, celsius(10)) - h(t, f, celsius(-20))
	check(t, "heat of water from -20 °C to 10 °C", got, cell{41763 + 333600 + 20*(2062.3-10*6.0769), 60}, 0, "by hand from Choi and Okos")
	ice, err := water.Ice(units.Celsius.Of(-20))
	check(t, "ice of pure water", ice, cell{1 - 0.001/20, 1e-9}, 0, "1 − tf/t")
	if err != nil {
		t.Error(err)
	}
	s := readSheet(t, "food_choi_okos_check.csv")
	for i := range s.rows {
		if s.text(t, i, "component") == "ice" {
			T := units.Celsius.Of(s.cell(t, i, "t_degC").value).SI()
			check(t, "k of frozen water", k(t, f, T), s.cell(t, i, "k_W_mK"), 0.003, s.name)
		}
	}
	for r := range props.Recipes() {
		tf := r.Freezing.In(units.Celsius)
		for _, celsius := range []float64{tf, -5, -18, -40} {
			ice, err := r.Ice(units.Celsius.Of(celsius))
			want := (r.Composition.Water - 0.4*r.Composition.Protein) * (1 - tf/celsius)
			// The composition is scaled to 1.
			if err != nil || math.Abs(ice-want) > 0.02*want+1e-12 {
				t.Errorf("%s at %g °C: ice %g, %v; want %g", r.Name, celsius, ice, err, want)
			}
		}
		if ice, err := r.Ice(units.Celsius.Of(0)); ice != 0 || err != nil {
			t.Errorf("%s: ice %g at 0 °C, %v", r.Name, ice, err)
		}
	}
	var e *units.RangeError
	if _, err := water.Ice(units.Celsius.Of(-41)); !errors.As(err, &e) {
		t.Errorf("ice at -41 °C: %v", err)
	}
	var a *units.ArgumentError
	if _, err := (props.Recipe{}).Ice(units.Celsius.Of(-10)); !errors.As(err, &a) {
		t.Errorf("ice of no recipe: %v", err)
	}
}

// Dry food, food whose water is all bound, and porous food.
func TestUnusualFoods(t *testing.T) {
	oil := food(t, props.Recipe{Name: "oil", Composition: props.Composition{Fat: 1}})
	if oil.Kinks() != nil && len(oil.Kinks()) != 0 {
		t.Errorf("oil has kinks %v", oil.Kinks())
	}
	meal := props.Recipe{Name: "meal", Composition: props.Composition{Water: 0.08, Protein: 0.6, Carbohydrate: 0.32}}
	if kinks := food(t, meal).Kinks(); len(kinks) != 1 {
		t.Errorf("dry meal: kinks %v, want 0 °C alone, where the specific heat of its water changes", kinks)
	}
	if ice, err := meal.Ice(units.Celsius.Of(-30)); ice != 0 || err != nil {
		t.Errorf("ice in dry meal: %g, %v", ice, err)
	}
	bread := props.Recipe{Name: "bread", Composition: props.Composition{Water: 0.37, Protein: 0.08, Fat: 0.03, Carbohydrate: 0.48, Fibre: 0.03, Ash: 0.01}, Freezing: units.Celsius.Of(-6)}
	dense := food(t, bread)
	bread.Porosity = 0.75
	airy := food(t, bread)
	check(t, "density of porous bread", airy.Density().SI(), cell{0.25 * dense.Density().SI(), 1e-9}, 0, "by hand")
	if a, b := k(t, airy, 300), k(t, dense, 300); !(a > 0.25*b*0.5 && a < 0.25*b*1.2) {
		t.Errorf("porous bread conducts %g, dense %g W/(m K)", a, b)
	}
	if got := dense.Source(); !strings.Contains(got, "given by the caller") {
		t.Error(got)
	}
}

// Whatever a recipe or a melt holds: an error, or a solid without NaN.
func FuzzFood(f *testing.F) {
	f.Add(0.8, 0.1, 0.05, 0.03, 0.01, 0.01, 272.0, 0.0, 260.0)
	f.Add(0.0, 1.0, 0.0, 0.0, 0.0, 0.0, 0.0, 0.5, 233.15)
	f.Add(1.0, 1e-300, 0.0, 0.0, 0.0, 0.0, 273.1499999, 0.99, 273.15)
	f.Fuzz(func(t *testing.T, water, protein, fat, carbohydrate, fibre, ash, freezing, porosity, at float64) {
		for structure := props.Dispersed; structure <= props.Geometric; structure++ {
			s, err := props.Food(props.Recipe{
				Name: "x", Composition: props.Composition{Water: water, Protein: protein, Fat: fat, Carbohydrate: carbohydrate, Fibre: fibre, Ash: ash},
				Freezing: units.Kelvin.Of(freezing), Porosity: porosity, Structure: structure,
			})
			if err == nil {
				sound(t, s, at)
			}
		}
		low, high := constantOf(t, "solid", 1000, 2000, 2), constantOf(t, "liquid", 1000, 4000, 1)
		s, err := props.Melting(props.Melt{
			Name: "x", Solid: low, Liquid: high, LatentHeat: units.JoulePerKilogram.Of(water * 1e5),
			Solidus: units.Kelvin.Of(freezing), Liquidus: units.Kelvin.Of(at), SolidFraction: func(T units.Temperature) float64 { return fat - protein*T.SI() },
		})
		if err == nil {
			sound(t, s, at)
			sound(t, s, freezing)
		}
	})
}

// sound reports properties that cannot be.
func sound(t *testing.T, s props.Solid, kelvin float64) {
	t.Helper()
	T := units.Kelvin.Of(kelvin)
	if !(s.Density().SI() > 0 && s.Density().IsFinite()) {
		t.Errorf("density %v", s.Density())
	}
	if k, err := s.Conductivity(T); err == nil && !(k.SI() > 0 && k.IsFinite()) {
		t.Errorf("conductivity %g at %g K", k.SI(), kelvin)
	}
	if c, err := s.SpecificHeat(T); err == nil && !(c.SI() > 0 && c.IsFinite()) {
		t.Errorf("specific heat %g at %g K", c.SI(), kelvin)
	}
	h, err := s.Enthalpy(T)
	if err != nil {
		return
	}
	back, err := s.Temperature(h)
	if err != nil || math.Abs(back.SI()-kelvin) > 1e-6*kelvin {
		t.Errorf("T(h(%g K)) is %v, %v", kelvin, back, err)
	}
}

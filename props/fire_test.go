package props_test

import (
	"errors"
	"fmt"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// named returns a solid of the list.
func named(t *testing.T, name string) props.Solid {
	t.Helper()
	s, err := props.FindSolid(name)
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// The values of the equations of the Eurocodes, to all six printed digits. For concrete by itself the mean of the two
// limits of the conductivity. Stainless steel and aluminium by other sources are compared within their own
// uncertainty.
func TestEurocodes(t *testing.T) {
	s := readSheet(t, "eurocode_check.csv")
	for i := range s.rows {
		celsius := s.cell(t, i, "t_degC").value
		T := units.Celsius.Of(celsius).SI()
		equal := func(what, column string, got float64) {
			t.Helper()
			v := s.cell(t, i, column)
			v.half = 5.1e-6 * v.value
			check(t, fmt.Sprintf("%s at %g °C", what, celsius), got, v, 0, s.name)
		}
		near := func(what, column string, got, uncertainty float64) {
			t.Helper()
			check(t, fmt.Sprintf("%s at %g °C", what, celsius), got, s.cell(t, i, column), uncertainty, s.name)
		}
		equal("k of carbon steel", "steel_k", k(t, props.CarbonSteel(), T))
		equal("c of carbon steel", "steel_cp", c(t, props.CarbonSteel(), T))
		equal("c of concrete", "concrete_cp_u0", c(t, props.Concrete(), T))
		upper, lower := s.cell(t, i, "concrete_k_upper"), s.cell(t, i, "concrete_k_lower")
		check(t, fmt.Sprintf("k of concrete at %g °C", celsius), k(t, props.Concrete(), T), cell{(upper.value + lower.value) / 2, 5.1e-6 * upper.value}, 0, s.name)
		near("k of concrete, upper limit", "concrete_k_upper", k(t, props.Concrete(), T), props.Concrete().ConductivityUncertainty())
		near("k of concrete, lower limit", "concrete_k_lower", k(t, props.Concrete(), T), props.Concrete().ConductivityUncertainty())
		check(t, fmt.Sprintf("density of concrete at %g °C", celsius), 2300, cell{2300 * s.cell(t, i, "concrete_rho_ratio").value, 0}, props.Concrete().DensityUncertainty(), s.name)
		for _, r := range []struct{ u, c string }{{"", "concrete_cp_u0"}, {", 1.5 % moisture", "concrete_cp_u1.5"}, {", 3 % moisture", "concrete_cp_u3"}} {
			up, low := named(t, "concrete, upper limit"+r.u), named(t, "concrete, lower limit"+r.u)
			equal("c of "+up.Name(), r.c, c(t, up, T))
			equal("k of "+up.Name(), "concrete_k_upper", k(t, up, T))
			equal("c of "+low.Name(), r.c, c(t, low, T))
			equal("k of "+low.Name(), "concrete_k_lower", k(t, low, T))
		}
		near("k of stainless steel", "stainless_k", k(t, props.StainlessSteel(), T), props.StainlessSteel().ConductivityUncertainty())
		near("c of stainless steel", "stainless_cp", c(t, props.StainlessSteel(), T), props.StainlessSteel().SpecificHeatUncertainty())
		code := named(t, "stainless steel, EN 1993-1-2")
		equal("k of "+code.Name(), "stainless_k", k(t, code, T))
		equal("c of "+code.Name(), "stainless_cp", c(t, code, T))
		if celsius <= 500 {
			mild, hard := named(t, "aluminium alloy of series 3000 and 6000, EN 1999-1-2"), named(t, "aluminium alloy of series 5000 and 7000, EN 1999-1-2")
			equal("c of "+mild.Name(), "alu_cp", c(t, mild, T))
			equal("c of "+hard.Name(), "alu_cp", c(t, hard, T))
			equal("k of "+mild.Name(), "alu_k_3xxx_6xxx", k(t, mild, T))
			equal("k of "+hard.Name(), "alu_k_5xxx_7xxx", k(t, hard, T))
		}
	}
}

// The points of EN 1995-1-2:2004, Annex B, from memory, for 12 % of moisture: conductivity, and specific heat times
// the ratio of the density. Where the annex steps, the value above the step.
func TestTimber(t *testing.T) {
	timber := named(t, "timber, EN 1995-1-2")
	const source = "EN 1995-1-2:2004, Annex B, from memory"
	for _, r := range []struct{ celsius, c, ratio float64 }{
		{20, 1530, 1.12},
		{99, 13600, 1.12},
		{120, 2120, 1},
		{200, 2000, 1},
		{250, 1620, 0.93},
		{300, 710, 0.76},
		{350, 850, 0.52},
		{400, 1000, 0.38},
		{600, 1400, 0.28},
		{800, 1650, 0.26},
	} {
		want := r.c * r.ratio / 1.12
		check(t, fmt.Sprintf("c of timber at %g °C", r.celsius), c(t, timber, celsius(r.celsius)), cell{want, 1e-9 * want}, 0, source)
	}
	for _, r := range []struct{ celsius, k float64 }{{20, 0.12}, {200, 0.15}, {350, 0.07}, {500, 0.09}, {800, 0.35}} {
		check(t, fmt.Sprintf("k of timber at %g °C", r.celsius), k(t, timber, celsius(r.celsius)), cell{r.k, 1e-9}, 0, source)
	}
	// From 99 °C to 120 °C: Simpson's rule is exact for the product of two straight lines.
	want := 21.0 / 6 * (13600*1.12 + 4*13550*1.06 + 13500*1) / 1.12
	check(t, "heat of timber from 99 °C to 120 °C", h(t, timber, celsius(120))-h(t, timber, celsius(99)), cell{want, 1e-6 * want}, 0, source)
}

// The heat that the moisture of concrete takes, by hand from the corners of EN 1992-1-2, 3.3.2: 15 K at the peak and a
// straight line to 1000 J/(kg K) at 200 °C.
func TestMoistureOfConcreteIsInTheEnthalpy(t *testing.T) {
	for _, r := range []struct{ u, peak float64 }{{0.015, 1470}, {0.03, 2020}, {0.0075, 1185}, {0.02, 1470 + 550.0/3}} {
		s, err := props.FireConcrete(props.UpperLimit, r.u)
		if err != nil {
			t.Fatal(err)
		}
		want := 15*r.peak + 85*(r.peak+1000)/2
		check(t, fmt.Sprintf("heat of concrete with %g moisture from 100 °C to 200 °C", r.u), h(t, s, celsius(200))-h(t, s, celsius(100)), cell{want, 1e-6 * want}, 0, "EN 1992-1-2:2004, 3.3.2")
	}
}

// Where the equations change: EN 1992-1-2, 3.3.2, with moisture, and the tables of EN 1995-1-2; a food at its freezing
// point and at 0 °C.
func TestKinksOfCurves(t *testing.T) {
	for _, r := range []struct {
		name    string
		celsius []float64
	}{
		{"concrete, upper limit", []float64{100, 200, 400}},
		{"concrete, lower limit, 3 % moisture", []float64{100, 115, 200, 400}},
		{"stainless steel, EN 1993-1-2", nil},
		{"timber, EN 1995-1-2", []float64{99, 120, 200, 250, 300, 350, 400, 500, 600}},
		{"apple", []float64{-1.1, 0}},
		{"platinum", nil},
	} {
		kinks := named(t, r.name).Kinks()
		if len(kinks) != len(r.celsius) {
			t.Errorf("%s: kinks %v, want %v °C", r.name, kinks, r.celsius)
			continue
		}
		for i, x := range r.celsius {
			if kinks[i] != units.Celsius.Of(x) {
				t.Errorf("%s: kink at %v, want %g °C", r.name, kinks[i], x)
			}
		}
	}
}

func TestFireConcreteIsChecked(t *testing.T) {
	var e *units.ArgumentError
	if _, err := props.FireConcrete(props.ConcreteLimit(3), 0); !errors.As(err, &e) || !strings.Contains(e.Field, "limit") {
		t.Errorf("limit 3: %v", err)
	}
	for _, u := range []float64{-0.001, 0.031} {
		if _, err := props.FireConcrete(props.UpperLimit, u); !errors.As(err, &e) || !strings.Contains(e.Field, "moisture") {
			t.Errorf("moisture %g: %v", u, err)
		}
	}
	if s, err := props.FireConcrete(props.MeanOfLimits, 0); err != nil || s != props.Concrete() {
		t.Errorf("mean of limits, dry: %v, %v", s.Name(), err)
	}
	if got := props.ConcreteLimit(9).String(); got != "ConcreteLimit(9)" {
		t.Error(got)
	}
}

// What safety may hang on says so.
func TestCautions(t *testing.T) {
	for s := range props.Solids() {
		fire := strings.Contains(s.Source(), "EN 199")
		food := strings.Contains(s.Source(), "Choi")
		tissue := strings.Contains(s.Source(), "McIntosh")
		if want := fire || food || tissue; (s.Caution() != "") != want {
			t.Errorf("%s: caution %q, want one: %v", s.Name(), s.Caution(), want)
		}
		if c := s.Caution(); c != "" && !strings.Contains(c, "licensed") && !strings.Contains(c, "law") {
			t.Errorf("%s: the caution %q does not defer to code or practice", s.Name(), c)
		}
	}
	if c := (props.Solid{}).Caution(); c != "" {
		t.Errorf("the zero Solid has the caution %q", c)
	}
	apple, skin := named(t, "apple"), named(t, "human skin")
	both, err := props.Composite("both", props.Parallel, props.Part{Solid: apple, Volume: 0.5}, props.Part{Solid: skin, Volume: 0.5})
	if err != nil || !strings.Contains(both.Caution(), apple.Caution()) || !strings.Contains(both.Caution(), skin.Caution()) {
		t.Errorf("a composite of a food and tissue has the caution %q, %v", both.Caution(), err)
	}
}

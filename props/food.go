package props

import (
	"iter"
	"math"
	"sync"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// A Composition is that of a food in parts of the mass, from 0 to 1. Fibre is not part of Carbohydrate here, while many
// tables give the total of both.
type Composition struct {
	Water, Protein, Fat, Carbohydrate, Fibre, Ash float64
}

// A Structure tells how the parts of a mixture conduct together.
type Structure uint8

// The structures.
const (
	// Dispersed is spheres in a continuous part: A. Eucken, VDI Forschungsheft 353 (1932), after J. C. Maxwell, from memory. In a
	// [Composite] the first part is continuous. In a food ice is dispersed in water, and everything else in both.
	Dispersed Structure = iota
	Parallel            // layers along the flow of heat: the mean of the conductivities by volume, the upper bound
	Series              // layers across the flow of heat: the mean of the resistivities by volume, the lower bound
	Geometric           // the mean of the logarithms by volume, between the bounds
)

// A Recipe describes a food for [Food].
type Recipe struct {
	Name        string
	Composition Composition
	Freezing    units.Temperature // initial freezing point, from −20 °C to below 0 °C; needed if water can freeze
	Porosity    float64           // volume of air in the volume, from 0 to below 1; it lowers density and conductivity
	Structure   Structure         // the zero value is Dispersed
	Source      string            // of the composition; may be empty
}

const (
	foodCaution = "Whether a food is safe, and how it must be heated or cooled, is decided by the food law and a person responsible under it, with measured temperatures, not by this number."
	choiOkos    = "Y. Choi, M. R. Okos, in: M. Le Maguer, P. Jelen (eds.), Food Engineering and Process Applications, vol. 1 (1986), read on copies that quote it"
	foodHigh    = 150.0 // °C
)

// Food returns a food from its composition by the equations of Choi and Okos (1986), from −40 °C to 150 °C. Below the
// freezing point water freezes little by little: the ice is (w − b)(1 − tf/t) of the mass, with the water w, the bound
// water b = 0.4 protein, and tf, t in °C (ASHRAE Handbook Refrigeration, from memory). The latent heat is in the
// enthalpy, which is continuous, and in the specific heat, which is its derivative and peaks below the freezing point.
// Kinks lie at the freezing point and at 0 °C. Above 100 °C the water is under pressure, and nothing evaporates.
//
// The density is that at 20 °C, and the mass of the food does not change; frozen food is some 5 % lighter. The uncertainties
// are those of Choi and Okos for mixtures; that of the composition is not included.
//
// It returns a [*units.ArgumentError] for a part that is not between 0 and 1, for parts whose sum is not 1 to within
// 0.02 (they are scaled to 1), and for a freezing point that is missing or outside its limits.
func Food(r Recipe) (Solid, error) {
	const who = "props.Food"
	if err := checkName(who, r.Name); err != nil {
		return Solid{}, err
	}
	x, err := r.Composition.fractions(who + ": " + r.Name)
	if err != nil {
		return Solid{}, err
	}
	if err := units.CheckNumber(who+": porosity of "+r.Name, r.Porosity, 0, 0.99); err != nil {
		return Solid{}, err
	}
	if r.Structure > Geometric {
		return Solid{}, &units.ArgumentError{Field: who + ": structure of " + r.Name, Value: int(r.Structure), Accepted: "Dispersed, Parallel, Series or Geometric"}
	}
	kinks := []float64{celsius(0)}
	if x.Freezable() > 0 {
		if t := r.Freezing.SI(); !(t >= celsius(-20) && t < celsius(0)) {
			return Solid{}, &units.ArgumentError{Field: who + ": freezing point of " + r.Name, Value: r.Freezing, Accepted: "from -20 °C to below 0 °C, because water can freeze"}
		}
		kinks = []float64{r.Freezing.SI(), celsius(0)}
	} else if x.Water == 0 {
		kinks = nil
	}
	curve := property.NewFood(x, r.Freezing.SI(), r.Porosity, property.Structure(r.Structure))
	return newSolid(material{
		name: r.Name, source: "composition: " + sourceOr(r.Source) + "; equations: " + choiOkos, caution: foodCaution,
		density: curve.Density(celsius(20)), low: celsius(-40), high: celsius(foodHigh), kinks: kinks, curve: curve,
		uncertainty: solidUncertainty{
			density: 0.10, specificHeat: 0.15, conductivity: 0.20,
			source: "5 % to 10 % for mixtures above the freezing point (Choi and Okos, from memory); the conductivity, the density with its change by freezing and by small pores, and all below the freezing point: our own estimate; " +
				"within 5 K below the freezing point only the heat across it means something; the composition of the piece is not included",
		},
	}), nil
}

// fractions returns the composition, scaled to the sum 1.
func (c Composition) fractions(field string) (property.FoodFractions, error) {
	sum := 0.0
	for _, p := range []struct {
		name string
		x    float64
	}{{"water", c.Water}, {"protein", c.Protein}, {"fat", c.Fat}, {"carbohydrate", c.Carbohydrate}, {"fibre", c.Fibre}, {"ash", c.Ash}} {
		if err := units.CheckNumber(field+": "+p.name, p.x, 0, 1); err != nil {
			return property.FoodFractions{}, err
		}
		sum += p.x
	}
	if !(math.Abs(sum-1) <= 0.02+1e-12) {
		return property.FoodFractions{}, &units.ArgumentError{Field: field + ": sum of the composition", Value: sum, Accepted: "1 to within 0.02"}
	}
	return property.FoodFractions{
		Protein: c.Protein / sum, Fat: c.Fat / sum, Carbohydrate: c.Carbohydrate / sum,
		Fibre: c.Fibre / sum, Ash: c.Ash / sum, Water: c.Water / sum,
	}, nil
}

// Ice returns the mass of ice in the mass of the food at T, for T from −40 °C to 150 °C. It returns the
// errors of [Food], and a [*units.RangeError] outside these temperatures.
func (r Recipe) Ice(T units.Temperature) (float64, error) {
	s, err := Food(r)
	if err != nil {
		return 0, err
	}
	if !s.m.covers(T.SI()) {
		return 0, s.refuse("ice", T)
	}
	return s.m.curve.(*property.Food).Ice(T.SI()), nil
}

// foodRow is a composition in % by mass, with the total of carbohydrate and fibre, and the freezing point in °C, 0 if
// the source has none.
type foodRow struct {
	name                                          string
	water, protein, fat, carbohydrate, fibre, ash float64
	freezing                                      float64
	status                                        string
}

// Recipes iterates over the compositions of the foods of the package.
func Recipes() iter.Seq[Recipe] {
	return func(yield func(Recipe) bool) {
		for _, r := range foodRows() {
			if !yield(r.recipe()) {
				return
			}
		}
	}
}

func (r foodRow) recipe() Recipe {
	source := "ASHRAE Handbook Refrigeration, chapter Thermal properties of foods, table 3, " + r.status
	freezing := r.freezing
	if freezing == 0 {
		// The table has none for this cut; it is the lean beef of the row below it.
		freezing = -1.7
		source += "; freezing point that of lean sirloin"
	}
	return Recipe{
		Name: r.name,
		Composition: Composition{
			Water: r.water / 100, Protein: r.protein / 100, Fat: r.fat / 100,
			Carbohydrate: (r.carbohydrate - r.fibre) / 100, Fibre: r.fibre / 100, Ash: r.ash / 100,
		},
		Freezing: units.Celsius.Of(freezing),
		Source:   source,
	}
}

// foods returns the foods of the package.
var foods = sync.OnceValue(func() []Solid {
	var all []Solid
	for r := range Recipes() {
		s, err := Food(r)
		if err != nil {
			return nil // the tests of the package would find it
		}
		all = append(all, s)
	}
	return all
})

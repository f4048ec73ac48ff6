package props

import (
	"strconv"
	"sync"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

const fireCaution = "The resistance of a structure in a fire is decided by the local code and a person who is licensed to apply it, not by this number."

// A ConcreteLimit is a choice between the limits that EN 1992-1-2 sets to the conductivity of concrete; national
// annexes choose.
type ConcreteLimit uint8

// The limits. MeanOfLimits is our own choice, not one of the standard.
const (
	MeanOfLimits ConcreteLimit = iota
	UpperLimit
	LowerLimit
)

var limitNames = [...]string{"mean of limits", "upper limit", "lower limit"}

// String returns a name such as "upper limit".
func (l ConcreteLimit) String() string {
	if int(l) >= len(limitNames) {
		return "ConcreteLimit(" + strconv.Itoa(int(l)) + ")"
	}
	return limitNames[l]
}

var concrete = newSolid(concreteOf(MeanOfLimits, 0))

// Concrete returns dry normal-weight concrete: 20 °C to 1200 °C, density 2300 kg/m³. The conductivity is the mean of
// the upper and the lower limit of EN 1992-1-2. The kinks lie at 100 °C, 200 °C and 400 °C. [FireConcrete] has the
// limits and moisture.
func Concrete() Solid { return concrete }

// FireConcrete returns normal-weight concrete of EN 1992-1-2:2004, clause 3.3: 20 °C to 1200 °C, density 2300 kg/m³,
// with a limit of the conductivity and the moisture by mass, from 0 to 0.03 (3 %). With moisture the specific heat is
// raised between 100 °C and 200 °C: it has a plateau from 100 °C to 115 °C of 1470 J/(kg K) at 1.5 %, 2020 J/(kg K) at
// 3 %, and straight lines between. The heat that this takes is in the enthalpy, which no step can jump.
//
// It returns a [*units.ArgumentError] for another limit or moisture.
func FireConcrete(limit ConcreteLimit, moisture float64) (Solid, error) {
	const who = "props.FireConcrete"
	if limit > LowerLimit {
		return Solid{}, &units.ArgumentError{Field: who + ": limit", Value: limit, Accepted: "MeanOfLimits, UpperLimit or LowerLimit"}
	}
	if err := units.CheckNumber(who+": moisture", moisture, 0, 0.03); err != nil {
		return Solid{}, err
	}
	if limit == MeanOfLimits && moisture == 0 {
		return concrete, nil
	}
	return newSolid(concreteOf(limit, moisture)), nil
}

func concreteOf(limit ConcreteLimit, moisture float64) material {
	m := material{
		name:     "concrete",
		synonyms: []string{"normal-weight concrete"},
		caution:  fireCaution,
		density:  2300,
		low:      celsius(20), high: celsius(1200),
		kinks: []float64{celsius(100), celsius(200), celsius(400)},
		uncertainty: solidUncertainty{
			density: 0.12, specificHeat: 0.12, conductivity: 0.20,
			source: "conductivity: spans both limits of the clause; density: our own estimate, 5 % between mixes, and it includes the fall to 88 % that the clause gives for 1200 °C; " +
				"specific heat: our own estimate, it covers the design value 1000 J/(kg K) of air-dry concrete. The evaporation of moisture between 100 °C and 200 °C is not included",
		},
	}
	const clause = "EN 1992-1-2:2004, clause 3.3, from memory; "
	switch limit {
	case MeanOfLimits:
		m.curve = property.NewConcrete(0.5, moisture)
		m.source = clause + "the clause leaves the conductivity between an upper and a lower limit, and the mean of the two is taken; density at 20 °C 2300 kg/m³; "
	default:
		m.name += ", " + limit.String()
		m.synonyms = nil
		m.curve = property.NewConcrete(float64(LowerLimit-limit), moisture)
		m.source = clause + limit.String() + " of the conductivity; density at 20 °C 2300 kg/m³; "
		m.uncertainty.conductivity = 0.45
	}
	if moisture == 0 {
		m.source += "dry"
		return m
	}
	percent := strconv.FormatFloat(100*moisture, 'g', 4, 64) + " % moisture"
	m.name += ", " + percent
	m.synonyms = nil
	m.source += percent + " by mass"
	m.kinks = []float64{celsius(100), celsius(115), celsius(200), celsius(400)}
	m.uncertainty.source = "conductivity: to the other limit of the clause; density and specific heat: our own estimate; the moisture of a real structure is not known to better than a third, which is not included"
	return m
}

// fireMaterials returns the other materials of the Eurocodes.
var fireMaterials = sync.OnceValue(func() []Solid {
	const estimate = "our own estimate, from the scatter between grades; thermal expansion is not included"
	stainless := newSolid(material{
		name: "stainless steel, EN 1993-1-2", caution: fireCaution,
		source:  "EN 1993-1-2:2005, Annex C, 20 °C to 1200 °C, from memory; density that of AISI 304",
		density: 7900, low: celsius(20), high: celsius(1200), curve: property.StainlessSteel(),
		uncertainty: solidUncertainty{density: 0.02, specificHeat: 0.15, conductivity: 0.10, source: estimate},
	})
	alloy := func(series string, k0, slope float64) Solid {
		return newSolid(material{
			name: "aluminium alloy of series " + series + ", EN 1999-1-2", caution: fireCaution,
			source:  "EN 1999-1-2:2007, clause 3.3, 0 °C to 500 °C, from memory",
			density: 2700, low: celsius(0), high: celsius(500), curve: property.AluminiumAlloy(k0, slope),
			uncertainty: solidUncertainty{density: 0.04, specificHeat: 0.08, conductivity: 0.20, source: estimate},
		})
	}
	timber := newSolid(material{
		name: "timber, EN 1995-1-2", caution: fireCaution,
		source: "EN 1995-1-2:2004, Annex B, softwood under the standard fire, tables joined by straight lines, 12 % moisture, from memory; density 450 kg/m³ dry is our own choice; " +
			"the specific heat is per initial mass: that of the annex times its ratio of the density",
		density: 450 * 1.12, low: celsius(20), high: celsius(800), curve: property.Timber(0.12),
		kinks: []float64{
			celsius(99), celsius(120), celsius(200), celsius(250), celsius(300), celsius(350), celsius(400), celsius(500), celsius(600),
		},
		uncertainty: solidUncertainty{
			density: 0.20, specificHeat: 0.30, conductivity: 0.40,
			source: "our own estimate; above 300 °C the conductivity of the annex is an effective one that includes cracks in the char, for the standard fire alone",
		},
	})
	return []Solid{
		newSolid(concreteOf(UpperLimit, 0)), newSolid(concreteOf(LowerLimit, 0)),
		newSolid(concreteOf(UpperLimit, 0.015)), newSolid(concreteOf(LowerLimit, 0.015)),
		newSolid(concreteOf(UpperLimit, 0.03)), newSolid(concreteOf(LowerLimit, 0.03)),
		stainless, alloy("3000 and 6000", 190, 0.07), alloy("5000 and 7000", 140, 0.1), timber,
	}
})

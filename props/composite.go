package props

import (
	"math"
	"slices"
	"strconv"
	"strings"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// A Part is a constituent of a [Composite]: a solid, or a gas in pores as a [Constant], with its fraction of the volume.
type Part struct {
	Solid  Solid
	Volume float64
}

// Composite returns a solid mixed of parts, whose fractions by volume add to 1. The density adds by volume, the
// specific heat and the enthalpy by mass, and the conductivity by the structure. Its range is common to the parts, and
// its kinks are theirs.
//
// It returns a [*units.ArgumentError] for fewer than two parts, a part without properties, a fraction that is not
// between 0 and 1, fractions whose sum is not 1 to within 1e-6 (they are scaled to 1), an unknown structure, and for
// ranges that have nothing in common.
func Composite(name string, structure Structure, parts ...Part) (Solid, error) {
	const who = "props.Composite"
	if err := checkName(who, name); err != nil {
		return Solid{}, err
	}
	if structure > Geometric {
		return Solid{}, &units.ArgumentError{Field: who + ": structure of " + name, Value: int(structure), Accepted: "Dispersed, Parallel, Series or Geometric"}
	}
	if len(parts) < 2 {
		return Solid{}, &units.ArgumentError{Field: who + ": parts of " + name, Value: len(parts), Accepted: "at least 2 parts"}
	}
	sum, mass := 0.0, 0.0
	m := material{name: name, low: 0, high: math.Inf(1), constant: true}
	for i, p := range parts {
		field := who + ": " + name + ", part " + strconv.Itoa(i+1)
		if p.Solid.m == nil {
			return Solid{}, errNoSolid()
		}
		if err := units.CheckNumber(field+": volume", p.Volume, 0, 1); err != nil {
			return Solid{}, err
		}
		sum += p.Volume
		mass += p.Volume * p.Solid.m.density
		m.low, m.high = max(m.low, p.Solid.m.low), min(m.high, p.Solid.m.high)
		m.constant = m.constant && p.Solid.m.constant
		m.kinks = append(m.kinks, p.Solid.m.kinks...)
		if c := p.Solid.m.caution; !strings.Contains(m.caution, c) {
			m.caution = strings.TrimSpace(m.caution + " " + c)
		}
		if i > 0 {
			m.source += "; "
		}
		m.source += p.Solid.m.name + ": " + p.Solid.m.source
	}
	if !(math.Abs(sum-1) <= 1e-6) {
		return Solid{}, &units.ArgumentError{Field: who + ": sum of the volumes of " + name, Value: sum, Accepted: "1 to within 1e-6"}
	}
	m.density = mass / sum
	if err := units.CheckPositive(who+": density of "+name, units.KilogramPerCubicMetre.Of(m.density)); err != nil {
		return Solid{}, err
	}
	if !(m.low < m.high) {
		return Solid{}, &units.ArgumentError{
			Field: who + ": ranges of the parts of " + name, Value: units.Kelvin.Of(m.low),
			Accepted: "a common range; the lowest high end is " + units.Kelvin.Of(m.high).String(),
		}
	}
	mix := &property.Mix{Structure: property.Structure(structure)}
	for _, p := range parts {
		mix.Parts = append(mix.Parts, property.Part{Curve: p.Solid.m.curve, Volume: p.Volume / sum, Mass: p.Volume * p.Solid.m.density / mass})
	}
	m.curve = mix
	slices.Sort(m.kinks)
	m.kinks = slices.DeleteFunc(slices.Compact(m.kinks), func(t float64) bool { return t <= m.low || t >= m.high })
	return newSolid(m), nil
}

// Moist returns the solid with liquid water in its pores: content is the mass of water per mass of dry solid, and
// sensitivity the coefficient f by which the conductivity grows as exp(f content), EN ISO 10456:2007, table 4, from
// memory: for example 4 for timber and concrete by volume. The water adds its mass and a specific heat of 4190 J/(kg
// K); it neither freezes nor evaporates, so that the range is cut to 0 °C to 100 °C.
//
// It returns a [*units.ArgumentError] for an empty name, a content outside 0 to 10, a sensitivity outside 0 to 100, a
// product of the two above 5, and for a solid without a part of its range between 0 °C and 100 °C.
func Moist(name string, dry Solid, content, sensitivity float64) (Solid, error) {
	const who = "props.Moist"
	if err := checkName(who, name); err != nil {
		return Solid{}, err
	}
	if dry.m == nil {
		return Solid{}, errNoSolid()
	}
	if err := units.CheckNumber(who+": content of "+name, content, 0, 10); err != nil {
		return Solid{}, err
	}
	if err := units.CheckNumber(who+": sensitivity of "+name, sensitivity, 0, 100); err != nil {
		return Solid{}, err
	}
	if err := units.CheckNumber(who+": sensitivity times content of "+name, sensitivity*content, 0, 5); err != nil {
		return Solid{}, err
	}
	low, high := max(dry.m.low, celsius(0)), min(dry.m.high, celsius(100))
	if !(low < high) {
		return Solid{}, &units.ArgumentError{Field: who + ": range of " + dry.m.name, Value: units.Kelvin.Of(low), Accepted: "a range with a part between 0 °C and 100 °C"}
	}
	m := *dry.m
	m.name, m.synonyms = name, nil
	m.source = dry.m.name + ": " + dry.m.source + "; moisture: EN ISO 10456:2007, table 4, from memory"
	m.uncertainty = solidUncertainty{}
	m.density *= 1 + content
	m.low, m.high = low, high
	m.kinks = slices.DeleteFunc(slices.Clone(m.kinks), func(t float64) bool { return t <= low || t >= high })
	m.curve = &property.Moist{Dry: dry.m.curve, Factor: math.Exp(sensitivity * content), Content: content}
	if err := units.CheckPositive(who+": density of "+name, units.KilogramPerCubicMetre.Of(m.density)); err != nil {
		return Solid{}, err
	}
	return newSolid(m), nil
}

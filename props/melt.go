package props

import (
	"math"
	"slices"
	"strconv"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// A Melt describes a material that melts, for [Melting].
type Melt struct {
	Name              string
	Solid, Liquid     Solid                // properties up to the solidus and from the liquidus on; the density is that of Solid
	LatentHeat        units.SpecificEnergy // taken up from solidus to liquidus
	Solidus, Liquidus units.Temperature    // equal for a pure substance
	// SolidFraction is the part of the mass that is solid between solidus and liquidus, from 0 to 1, not rising with the
	// temperature. Nil is a straight line from 1 to 0. [LeverRule] and [Scheil] make two. It is not used if solidus and
	// liquidus are equal.
	SolidFraction func(units.Temperature) float64
	Source        string // may be empty
}

// meltNodes is the number of temperatures between solidus and liquidus at which the solid fraction is taken.
const meltNodes = 65

// Melting returns a material with the enthalpy of melting. Of a pure substance the enthalpy jumps at the melting point
// by the latent heat: [Solid.Temperature] is the melting point for all enthalpies between, and [Solid.Enthalpy] at the
// melting point itself is that of the solid. Of an alloy the latent heat is spread between solidus and liquidus by the
// solid fraction, and is part of the specific heat there. Where the fraction jumps at solidus or liquidus, as at a
// eutectic, the enthalpy jumps likewise. Conductivity and specific heat between are means by the fraction, which is
// interpolated from 65 equidistant temperatures.
//
// Solidus and liquidus are kinks. The mass of the body is that of the solid: the liquid neither flows nor changes its density.
//
// It returns a [*units.ArgumentError] for a field that cannot be used.
func Melting(melt Melt) (Solid, error) {
	const who = "props.Melting"
	if err := checkName(who, melt.Name); err != nil {
		return Solid{}, err
	}
	if melt.Solid.m == nil || melt.Liquid.m == nil {
		return Solid{}, errNoSolid()
	}
	if err := units.CheckPositive(who+": latent heat of "+melt.Name, melt.LatentHeat); err != nil {
		return Solid{}, err
	}
	s, l := melt.Solid.m, melt.Liquid.m
	solidus, liquidus := melt.Solidus.SI(), melt.Liquidus.SI()
	if !s.covers(solidus) || !(solidus > s.low) {
		low, high := melt.Solid.Range()
		return Solid{}, &units.ArgumentError{Field: who + ": solidus of " + melt.Name, Value: melt.Solidus, Accepted: "a temperature in the range of the solid, above " + low.String() + " to " + high.String()}
	}
	if !l.covers(liquidus) || !(liquidus < l.high && liquidus >= solidus) {
		low, high := melt.Liquid.Range()
		return Solid{}, &units.ArgumentError{
			Field: who + ": liquidus of " + melt.Name, Value: melt.Liquidus,
			Accepted: "a temperature from the solidus on in the range of the liquid, " + low.String() + " to below " + high.String(),
		}
	}
	// The latent heat must neither vanish in rounding beside the sensible heats, nor they beside it.
	for _, sensible := range []float64{s.curve.SpecificHeat(solidus) * solidus, l.curve.SpecificHeat(liquidus) * liquidus} {
		if x := melt.LatentHeat.SI() / sensible; !(x >= 1e-9 && x <= 1e6) {
			return Solid{}, &units.ArgumentError{Field: who + ": latent heat of " + melt.Name, Value: melt.LatentHeat, Accepted: "from 1e-9 to 1e6 times specific heat times temperature of solid and liquid"}
		}
	}
	fraction, err := melt.fractions(who)
	if err != nil {
		return Solid{}, err
	}
	curve, err := property.NewMelt(s.curve, l.curve, solidus, liquidus, melt.LatentHeat.SI(), fraction)
	if err != nil {
		return Solid{}, &units.ArgumentError{Field: who + ": solid fraction of " + melt.Name, Value: err.Error(), Accepted: "a fraction that can be interpolated"}
	}
	m := material{
		name: melt.Name, source: sourceOr(melt.Source), density: s.density, low: s.low, high: l.high, curve: curve,
		caution: s.caution,
	}
	for _, t := range slices.Concat(s.kinks, []float64{solidus, liquidus}, l.kinks) {
		if (t <= solidus || t >= liquidus) && (len(m.kinks) == 0 || t > m.kinks[len(m.kinks)-1]) {
			m.kinks = append(m.kinks, t)
		}
	}
	return newSolid(m), nil
}

// fractions returns the liquid fraction at the nodes, or nil for a pure substance.
func (melt Melt) fractions(who string) ([]float64, error) {
	solidus, liquidus := melt.Solidus.SI(), melt.Liquidus.SI()
	if solidus == liquidus {
		return nil, nil
	}
	if step := (liquidus - solidus) / (meltNodes - 1); !(solidus+step > solidus && liquidus-step < liquidus) || step < 1e-12*liquidus {
		return nil, &units.ArgumentError{Field: who + ": liquidus of " + melt.Name, Value: melt.Liquidus, Accepted: "the solidus itself, or a temperature well above it"}
	}
	liquid := make([]float64, meltNodes)
	last := 0.0
	for i := range liquid {
		f := float64(i) / (meltNodes - 1)
		if melt.SolidFraction != nil {
			T := units.Kelvin.Of(solidus + f*(liquidus-solidus))
			if i == meltNodes-1 {
				T = melt.Liquidus
			}
			solid := melt.SolidFraction(T)
			f = 1 - solid
			if !(f >= last && f <= 1) {
				return nil, &units.ArgumentError{
					Field: who + ": solid fraction of " + melt.Name + " at " + T.String(), Value: solid,
					Accepted: "from 0 to 1, at most " + strconv.FormatFloat(1-last, 'g', 6, 64) + ", that at the temperature before",
				}
			}
		}
		liquid[i], last = f, f
	}
	return liquid, nil
}

// LeverRule returns the solid fraction of a binary alloy with full diffusion, straight lines of liquidus and solidus
// in the phase diagram, and the partition coefficient k from 0 to below 1: f = (TL − T)/((1 − k)(TM − T)), where pure
// is the melting point TM of the pure metal and TL the liquidus. M. C. Flemings, Solidification Processing (1974),
// from memory. The fraction is cut to 0 and 1. It is NaN, which [Melting] refuses, if k or the temperatures do not
// allow it.
func LeverRule(pure, liquidus units.Temperature, k float64) func(units.Temperature) float64 {
	return func(T units.Temperature) float64 {
		if !(k >= 0 && k < 1) || !(liquidus.SI() < pure.SI()) {
			return math.NaN()
		}
		return min(1, max(0, (liquidus.SI()-T.SI())/((1-k)*(pure.SI()-T.SI()))))
	}
}

// Scheil returns the solid fraction of a binary alloy without diffusion in the solid: f = 1 − ((TM − T)/(TM −
// TL))^(1/(k−1)), E. Scheil, Z. Metallkd. 34 (1942) 70, from memory; the arguments are those of [LeverRule]. What is
// left at the solidus melts there at once, as a eutectic does.
func Scheil(pure, liquidus units.Temperature, k float64) func(units.Temperature) float64 {
	return func(T units.Temperature) float64 {
		if !(k >= 0 && k < 1) || !(liquidus.SI() < pure.SI()) {
			return math.NaN()
		}
		return min(1, max(0, 1-math.Pow((pure.SI()-T.SI())/(pure.SI()-liquidus.SI()), 1/(k-1))))
	}
}

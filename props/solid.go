package props

import (
	"math"
	"slices"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// A Solid is a solid with a constant density, and a conductivity and specific heat that may depend on the
// temperature. The solids of this package are functions such as [CarbonSteel]; [Constant], [Tabulated] and [Function]
// make one's own. A Solid is a small value that cannot be changed and that many goroutines may use at once.
//
// The zero Solid has no name and the density 0, which every solver refuses; its other properties return an error.
type Solid struct{ m *material }

// material is the data of a solid. It is not changed once it is made.
type material struct {
	name        string
	synonyms    []string
	source      string
	caution     string
	density     float64 // kg/m³
	low, high   float64 // K; 0 and infinity for constants without a range
	kinks       []float64
	constant    bool
	curve       property.Curve
	hLow, hHigh float64 // enthalpies of the ends
	uncertainty solidUncertainty
}

// solidUncertainty is relative, at about 95 %; 0 where it is not stated.
type solidUncertainty struct {
	density, specificHeat, conductivity float64
	source                              string
}

// newSolid completes the data.
func newSolid(m material) Solid {
	m.hLow, m.hHigh = m.curve.Enthalpy(m.low), m.curve.Enthalpy(m.high)
	return Solid{&m}
}

// Name returns the name, such as "carbon steel".
func (s Solid) Name() string {
	if s.m == nil {
		return ""
	}
	return s.m.name
}

// String returns the name.
func (s Solid) String() string {
	if s.m == nil {
		return "no solid"
	}
	return s.m.name
}

// Synonyms returns further names under which [FindSolid] knows the solid.
func (s Solid) Synonyms() []string {
	if s.m == nil {
		return nil
	}
	return slices.Clone(s.m.synonyms)
}

// Source says where the numbers come from, and whether they were read or recalled.
func (s Solid) Source() string {
	if s.m == nil {
		return ""
	}
	return s.m.source
}

// Caution says what the numbers must not be used for without further checks: that of foods, of materials in a fire, of
// the human body. It is empty for most solids, for which the caution of the package stands.
func (s Solid) Caution() string {
	if s.m == nil {
		return ""
	}
	return s.m.caution
}

// Range returns the lowest and the highest temperature of the source. Constants without a range have 0 K
// and infinity, and 0 K itself is not a temperature that they accept.
func (s Solid) Range() (low, high units.Temperature) {
	if s.m == nil {
		return
	}
	return units.Kelvin.Of(s.m.low), units.Kelvin.Of(s.m.high)
}

// Kinks returns the temperatures inside the range, rising, where the conductivity, the specific heat,
// the slope of one of them or, at a melting point, the enthalpy jumps. A step of an integration does well to end there.
func (s Solid) Kinks() []units.Temperature {
	if s.m == nil {
		return nil
	}
	kinks := make([]units.Temperature, len(s.m.kinks))
	for i, t := range s.m.kinks {
		kinks[i] = units.Kelvin.Of(t)
	}
	return kinks
}

// IsConstant reports whether conductivity and specific heat do not depend on the temperature.
func (s Solid) IsConstant() bool { return s.m != nil && s.m.constant }

// DensityUncertainty returns the relative uncertainty of the density, at about 95 %; 0 means not stated.
func (s Solid) DensityUncertainty() float64 { return s.uncertainty().density }

// SpecificHeatUncertainty returns the relative uncertainty of the specific heat, at about 95 %; 0 means not stated.
func (s Solid) SpecificHeatUncertainty() float64 { return s.uncertainty().specificHeat }

// ConductivityUncertainty returns the relative uncertainty of the conductivity, at about 95 %; 0 means not stated.
func (s Solid) ConductivityUncertainty() float64 { return s.uncertainty().conductivity }

// UncertaintySource says where the uncertainties come from and what they cover.
func (s Solid) UncertaintySource() string { return s.uncertainty().source }

func (s Solid) uncertainty() solidUncertainty {
	if s.m == nil {
		return solidUncertainty{}
	}
	return s.m.uncertainty
}

// Density returns the density. It does not depend on the temperature: the mass of a body is that of its cold
// dimensions.
func (s Solid) Density() units.Density {
	if s.m == nil {
		return units.Density{}
	}
	return units.KilogramPerCubicMetre.Of(s.m.density)
}

// Conductivity returns the thermal conductivity at T. It returns a [*units.RangeError] outside [Solid.Range].
func (s Solid) Conductivity(T units.Temperature) (units.Conductivity, error) {
	if !s.m.covers(T.SI()) {
		return units.Conductivity{}, s.refuse("thermal conductivity", T)
	}
	k := units.WattPerMetreKelvin.Of(s.m.curve.Conductivity(T.SI()))
	if !usable(k.SI()) {
		return units.Conductivity{}, units.CheckPositive("thermal conductivity of "+s.m.name+" at "+T.String(), k)
	}
	return k, nil
}

// SpecificHeat returns the specific heat at T. It returns a [*units.RangeError] outside [Solid.Range].
func (s Solid) SpecificHeat(T units.Temperature) (units.SpecificHeat, error) {
	if !s.m.covers(T.SI()) {
		return units.SpecificHeat{}, s.refuse("specific heat", T)
	}
	c := units.JoulePerKilogramKelvin.Of(s.m.curve.SpecificHeat(T.SI()))
	if !usable(c.SI()) {
		return units.SpecificHeat{}, units.CheckPositive("specific heat of "+s.m.name+" at "+T.String(), c)
	}
	return c, nil
}

// Enthalpy returns the integral of the specific heat up to T, from a zero that each solid has for itself: only
// differences mean something. At a melting point, where the enthalpy jumps by the latent heat, it is that of
// the solid before it melts. It returns a [*units.RangeError] outside [Solid.Range].
func (s Solid) Enthalpy(T units.Temperature) (units.SpecificEnergy, error) {
	if !s.m.covers(T.SI()) {
		return units.SpecificEnergy{}, s.refuse("specific enthalpy", T)
	}
	h := units.JoulePerKilogram.Of(s.m.curve.Enthalpy(T.SI()))
	if !h.IsFinite() {
		return units.SpecificEnergy{}, units.CheckFinite("specific enthalpy of "+s.m.name+" at "+T.String(), h)
	}
	return h, nil
}

// covers reports whether t is a temperature in the range of m, which may be nil.
func (m *material) covers(t float64) bool {
	return m != nil && t >= m.low && t <= m.high && usable(t)
}

// Temperature returns the temperature at which [Solid.Enthalpy] is h: the melting point for every h between solid
// and liquid there. It returns a [*units.RangeError] outside the
// enthalpies of [Solid.Range].
func (s Solid) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	m := s.m
	if m == nil {
		return units.Temperature{}, errNoSolid()
	}
	if h.IsFinite() && h.SI() >= m.hLow && h.SI() <= m.hHigh {
		if t := m.temperature(h.SI()); usable(t) {
			return units.Kelvin.Of(t), nil
		}
	}
	if !h.IsFinite() {
		return units.Temperature{}, units.CheckFinite(m.name+": specific enthalpy", h)
	}
	return units.Temperature{}, &units.RangeError{
		Model: "temperature of " + m.name, Quantity: "specific enthalpy", Value: h.Dynamic(),
		Min: units.JoulePerKilogram.Of(m.hLow).Dynamic(), Max: units.JoulePerKilogram.Of(m.hHigh).Dynamic(), Source: m.source,
	}
}

func (m *material) temperature(h float64) float64 {
	if m.constant {
		// The end of a range is returned as it stands, not as rounding makes it.
		switch h {
		case m.hLow:
			return m.low
		case m.hHigh:
			return m.high
		}
		return min(max(h/m.curve.SpecificHeat(m.low), m.low), m.high)
	}
	return property.Invert(m.curve, h, m.low, m.high)
}

// refuse returns the error for a property at a T that the solid does not cover.
func (s Solid) refuse(name string, T units.Temperature) error {
	m := s.m
	if m == nil {
		return errNoSolid()
	}
	if err := units.CheckTemperature(m.name+": temperature", T); err != nil {
		return err
	}
	low, high := s.Range()
	return &units.RangeError{
		Model: name + " of " + m.name, Quantity: "temperature", Value: T.Dynamic(),
		Min: low.Dynamic(), Max: high.Dynamic(), Source: m.source,
	}
}

func errNoSolid() error {
	return &units.ArgumentError{Field: "props.Solid", Accepted: "a solid such as props.CarbonSteel(), or one made by props.Constant, Tabulated or Function"}
}

// usable reports whether a property is finite and above 0.
func usable(x float64) bool { return x > 0 && x <= math.MaxFloat64 }

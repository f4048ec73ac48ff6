package surface

import (
	"fmt"
	"math"

	"example.com/coolward/units"
)

// Enclosure is the heat that a convex grey body radiates to a grey wall close around it, through shields in
// between if there are any,
//
//	q = σ (T⁴ − Twall⁴) / (1/ε + A/Awall (1/εwall − 1) + Σ A/As (2/εs − 1))
//
// with the surface A of the body. A/Awall is 1 between parallel plates, the ratio of the diameters between
// concentric cylinders, its square between concentric spheres, and 0 in large surroundings, where [Radiation] says
// the same.
type Enclosure struct {
	Emissivity float64 // of the body, above 0, to 1

	// EmissivityLow and EmissivityHigh enclose what the emissivity of the body may be. Both 0 means that no
	// band is stated.
	EmissivityLow, EmissivityHigh float64

	WallEmissivity float64 // above 0, to 1
	AreaRatio      float64 // surface of the body over that of the wall, from 0 to 1

	// Shields are thin sheets between the body and the wall, in any order.
	Shields []Shield

	Wall units.Temperature // of the wall around
}

// A Shield is a thin sheet around a body, with the same emissivity on both sides.
type Shield struct {
	Emissivity float64 // above 0, to 1
	AreaRatio  float64 // surface of the body over that of the shield, above 0, to 1
}

// Name returns "radiation".
func (e Enclosure) Name() string { return "radiation" }

// Check returns an [*units.ArgumentError] for an emissivity that is not above 0 and at most 1, for a band that does
// not enclose it, for ratios of areas that cannot be, and for a wall that is not above 0 K.
func (e Enclosure) Check() error { return e.check() }

func (e *Enclosure) check() error {
	if !(e.WallEmissivity > 0 && e.WallEmissivity <= 1) {
		return &units.ArgumentError{Field: "radiation: wall emissivity", Value: e.WallEmissivity, Accepted: "above 0, to 1"}
	}
	if err := units.CheckNumber("radiation: area ratio", e.AreaRatio, 0, 1); err != nil {
		return err
	}
	for i, s := range e.Shields {
		if !(s.Emissivity > 0 && s.Emissivity <= 1) {
			return &units.ArgumentError{Field: fmt.Sprintf("radiation: shield %d: emissivity", i+1), Value: s.Emissivity, Accepted: "above 0, to 1"}
		}
		if !(s.AreaRatio > 0 && s.AreaRatio <= 1 && s.AreaRatio >= e.AreaRatio) {
			return &units.ArgumentError{
				Field: fmt.Sprintf("radiation: shield %d: area ratio", i+1), Value: s.AreaRatio,
				Accepted: fmt.Sprintf("above 0, from the %g of the wall to 1", e.AreaRatio),
			}
		}
	}
	return Radiation{e.Emissivity, e.EmissivityLow, e.EmissivityHigh, e.Wall}.Check()
}

// EffectiveEmissivity returns what the emissivity of the body comes down to: the same heat would go to large surroundings at the
// temperature of the wall. Its errors are those of [Enclosure.Check].
func (e Enclosure) EffectiveEmissivity() (float64, error) {
	if err := e.check(); err != nil {
		return 0, err
	}
	return e.effective(), nil
}

func (e *Enclosure) effective() float64 {
	resistance := 1/e.Emissivity + e.AreaRatio*(1/e.WallEmissivity-1)
	for _, s := range e.Shields {
		resistance += s.AreaRatio * (2/s.Emissivity - 1)
	}
	return 1 / resistance
}

// Flux returns the net flux that leaves the body, negative where the wall around is hotter. It does not depend on
// t. It returns the errors of [Enclosure.Check], and an [*units.ArgumentError] for a surface that is not above 0 K.
func (e Enclosure) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := e.check(); err != nil {
		return units.HeatFlux{}, err
	}
	emissivity := e.effective()
	if emissivity == 0 { // below the least number
		emissivity = math.SmallestNonzeroFloat64
	}
	return Radiation{Emissivity: emissivity, Surroundings: e.Wall}.Flux(t, wall)
}

// In returns the same body with a wall of another temperature around it.
func (e Enclosure) In(wall units.Temperature) Part {
	e.Wall = wall
	return e
}

// Low returns the same exchange with the lower emissivity of the body.
func (e Enclosure) Low() Part { return e.at(e.EmissivityLow) }

// High returns the same exchange with the upper emissivity of the body.
func (e Enclosure) High() Part { return e.at(e.EmissivityHigh) }

// at fixes the emissivity. An enclosure that fails its check stays as it is, so that it goes on failing.
func (e Enclosure) at(emissivity float64) Part {
	if (e.EmissivityLow != 0 || e.EmissivityHigh != 0) && e.check() == nil {
		e.Emissivity, e.EmissivityLow, e.EmissivityHigh = emissivity, 0, 0
	}
	return e
}

// Sources returns where the law comes from.
func (e Enclosure) Sources() []string {
	return append(Radiation{}.Sources(), "radiation between two grey surfaces: radiosities of two diffuse surfaces, exact")
}

// Notes returns the assumptions.
func (e Enclosure) Notes() []string {
	list := []string{"radiation: grey diffuse surfaces, each of one temperature and evenly lit, through a gas that does not take part"}
	if len(e.Shields) > 0 {
		list = append(list, fmt.Sprintf("radiation: %d shields, each of one temperature and without heat capacity", len(e.Shields)))
	}
	return list
}

// Warnings returns nothing.
func (e Enclosure) Warnings() []string { return nil }

package fdm

import (
	"errors"
	"slices"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
)

// A Material is what the body is made of. Its properties must be continuous from kink to kink, its
// enthalpy the integral of its specific heat, and it must be safe for many goroutines.
type Material interface {
	Density() units.Density
	Conductivity(units.Temperature) (units.Conductivity, error)
	SpecificHeat(units.Temperature) (units.SpecificHeat, error)
	Enthalpy(units.Temperature) (units.SpecificEnergy, error)    // integral of SpecificHeat, from any zero
	Temperature(units.SpecificEnergy) (units.Temperature, error) // its inverse
	Range() (low, high units.Temperature)
	Kinks() []units.Temperature // where a derivative jumps
}

// inSI returns the properties as functions of plain numbers.
func inSI(m Material) fv.Material {
	return fv.Material{
		Density: m.Density().SI(),
		Conductivity: func(T float64) (float64, error) {
			k, err := m.Conductivity(units.Kelvin.Of(T))
			return k.SI(), err
		},
		SpecificHeat: func(T float64) (float64, error) {
			c, err := m.SpecificHeat(units.Kelvin.Of(T))
			return c.SI(), err
		},
		Enthalpy: func(T float64) (float64, error) {
			h, err := m.Enthalpy(units.Kelvin.Of(T))
			return h.SI(), err
		},
		Temperature: func(h float64) (float64, error) {
			T, err := m.Temperature(units.JoulePerKilogram.Of(h))
			return T.SI(), err
		},
	}
}

// Bounds of the table made from a material.
const (
	tableError  = 1e-5   // K; the aim, or a hundredth of the tolerance if that is less
	tableLimit  = 1e-3   // K; above it the properties contradict each other
	coldest     = 1.0    // K; where a range is open below
	hottest     = 10_000 // K; where a range is open above
	beyondRange = 0.02   // of the span between start and ambient that a table goes beyond them
	sameKink    = 1e-11  // of a temperature, what is no distance to a kink
)

// table makes the table of a material between the temperatures that a run may need: all that the
// material supports, or those that the body can come to.
func (p Problem) table(m Material, from units.Temperature) (*fv.Table, error) {
	start := from.SI()
	if err := inRange(m, from); err != nil {
		return nil, err
	}
	if p.shared != nil && p.shared.start == from && p.shared.tolerance == p.tolerance() {
		if t := p.shared.of(m); t != nil {
			return t, nil
		}
	}
	low, high := supported(m, from)
	if coldest, hottest, ok := p.reach(start); ok {
		margin := max(beyondRange*(hottest-coldest), 100*p.tolerance(), 1e-3*start)
		low = max(low, coldest-margin)
		high = min(high, hottest+margin)
		low = max(low, coldest/2) // where a range is open below
	}
	return p.tableBetween(m, from, low, high)
}

// tableBetween makes the table of a material between two temperatures.
func (p Problem) tableBetween(m Material, from units.Temperature, low, high float64) (*fv.Table, error) {
	if !(low < high) {
		return nil, &units.ArgumentError{Field: "material: range", Value: units.Kelvin.Of(low), Accepted: "a lower end below the upper one"}
	}
	var kinks []float64
	for _, kink := range m.Kinks() {
		if k := kink.SI(); k > low+sameKink*low && k < high-sameKink*high {
			kinks = append(kinks, k)
		}
	}
	slices.Sort(kinks)
	kinks = slices.Compact(kinks)
	t, err := fv.NewTable(inSI(m), atKink(m, from.SI(), append([]float64{low, high}, kinks...)), low, high, kinks, p.tableAim())
	if err != nil {
		return nil, materialError(err)
	}
	if !(t.Error <= tableLimit) {
		return nil, &units.ArgumentError{
			Field: "material: table of its properties, off by", Value: units.KelvinDifference.Of(t.Error),
			Accepted: "up to 1 mK, which properties reach that are smooth between the kinks declared",
		}
	}
	return t, nil
}

// tableAim returns the error of a table that is aimed at, in kelvin.
func (p Problem) tableAim() float64 {
	if p.choosesGrid() {
		return min(max(forTable*p.accuracy(), 1e-10), tableLimit/10)
	}
	return max(min(tableError, 1e-2*p.tolerance()), 1e-10)
}

// atKink returns the kink, or the end of the range, that a start is at but for rounding, as of 600 °C in another unit, since nothing can be told of
// what lies between both; else the start, as where the material melts between them.
func atKink(m Material, start float64, kinks []float64) float64 {
	for _, kink := range kinks {
		if abs(kink-start) > sameKink*start {
			continue
		}
		a, err1 := m.Enthalpy(units.Kelvin.Of(start))
		b, err2 := m.Enthalpy(units.Kelvin.Of(kink))
		c, err3 := m.SpecificHeat(units.Kelvin.Of(start))
		if err1 == nil && err2 == nil && err3 == nil && abs(a.SI()-b.SI()) <= 1e-6*c.SI() {
			return kink
		}
	}
	return start
}

// supported returns the range of the material, with open ends closed.
func supported(m Material, start units.Temperature) (low, high float64) {
	a, b := m.Range()
	return max(a.SI(), min(coldest, start.SI()/2)), min(b.SI(), max(hottest, 10*start.SI()))
}

// inRange returns the error of the material for a temperature that it does not support, or one of
// our own where it has none.
func inRange(m Material, T units.Temperature) error {
	low, high := m.Range()
	if T.SI() >= low.SI() && T.SI() <= high.SI() {
		return nil
	}
	var own *units.RangeError
	if _, err := m.Conductivity(T); errors.As(err, &own) {
		return err
	}
	return &units.RangeError{
		Model: "material", Quantity: "temperature",
		Value: T.Dynamic(), Min: low.Dynamic(), Max: high.Dynamic(),
	}
}

// materialError returns the error of a material, with quantities for the numbers of a table.
func materialError(err error) error {
	var p *fv.PropertyError
	if !errors.As(err, &p) {
		return err
	}
	at := " at " + units.Kelvin.Of(p.Temperature).String()
	a := &units.ArgumentError{Field: "material: " + p.Property + at, Accepted: p.Reason}
	switch p.Property {
	case "conductivity":
		a.Value = units.WattPerMetreKelvin.Of(p.Value)
	case "specific heat":
		a.Value = units.JoulePerKilogramKelvin.Of(p.Value)
	case "enthalpy":
		a.Value = units.JoulePerKilogram.Of(p.Value)
	default:
		a.Value = units.Kelvin.Of(p.Value)
	}
	return a
}

func abs(x float64) float64 { return max(x, -x) }

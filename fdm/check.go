package fdm

import (
	"errors"
	"math"
	"strconv"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// check returns an [*units.ArgumentError] for the first field that cannot be used.
func (p Problem) check() error {
	for _, check := range []func() error{p.checkBody, p.checkMaterials, p.checkStart, p.checkFaces, p.checkTimes, p.checkNumerics, p.checkEvents} {
		if err := check(); err != nil {
			return err
		}
	}
	return nil
}

func (p Problem) checkBody() error {
	if err := p.Body.Check(); err != nil {
		return err
	}
	if f := p.Body.Family(); f == shape.Compact || f == shape.Unknown {
		return &units.ArgumentError{Field: "body", Value: p.Body, Accepted: "one in which heat flows along one coordinate: a sphere, a plate, a hollow sphere, or a cylinder or a tube whose ends are not exposed"}
	}
	// Volumes and areas of the smallest cells must be ordinary numbers.
	if r := p.Body.ConductionLength().SI(); !(r >= 1e-9 && r <= 1e9) {
		return &units.ArgumentError{Field: "body: conduction length", Value: p.Body.ConductionLength(), Accepted: "1 nm to 1e9 m"}
	}
	if inner := p.Body.InnerDiameter().SI(); inner > 0 && inner < 1e-6*p.Body.Diameter().SI() {
		return &units.ArgumentError{Field: "body: inner diameter", Value: p.Body.InnerDiameter(), Accepted: "a millionth of the outer one or more; a solid body has none"}
	}
	return nil
}

// mostLayers keeps the least number of cells of a layer meaningful.
const mostLayers = 200

func (p Problem) checkMaterials() error {
	if len(p.Layers) == 0 {
		return checkMaterial("material", p.Material)
	}
	if p.Material != nil {
		return &units.ArgumentError{Field: "material", Value: "one beside layers", Accepted: "either a material or layers"}
	}
	if len(p.Layers) > mostLayers {
		return &units.ArgumentError{Field: "layers", Value: len(p.Layers), Accepted: "up to " + strconv.Itoa(mostLayers)}
	}
	sum := 0.0
	for i, l := range p.Layers {
		name := "layer " + strconv.Itoa(i+1)
		if err := checkMaterial(name+": material", l.Material); err != nil {
			return err
		}
		if err := units.CheckPositive(name+": thickness", l.Thickness); err != nil {
			return err
		}
		if err := units.CheckNotNegative(name+": contact", l.Contact); err != nil {
			return err
		}
		last := i == len(p.Layers)-1
		if last && (l.Contact.SI() != 0 || l.ContactAt != nil) {
			return &units.ArgumentError{Field: name + ": contact", Value: "one below the innermost layer", Accepted: "none there"}
		}
		if l.Contact.SI() != 0 && l.ContactAt != nil {
			return &units.ArgumentError{Field: name + ": contact", Value: l.Contact, Accepted: "0 beside ContactAt"}
		}
		sum += l.Thickness.SI()
	}
	if whole := p.Body.Thickness(); !(abs(sum-whole.SI()) <= 1e-9*whole.SI()) {
		return &units.ArgumentError{Field: "layers: thickness together", Value: units.Metre.Of(sum), Accepted: "that of the body, " + whole.String()}
	}
	return nil
}

func checkMaterial(field string, m Material) error {
	if m == nil {
		return &units.ArgumentError{Field: field, Accepted: "a material"}
	}
	if err := checkChange(field, m); err != nil {
		return err
	}
	if err := units.CheckPositive(field+": density", m.Density()); err != nil {
		return err
	}
	low, high := m.Range()
	if math.IsNaN(low.SI()) || math.IsNaN(high.SI()) || !(low.SI() < high.SI()) {
		return &units.ArgumentError{Field: field + ": range from", Value: low, Accepted: "a temperature below the upper end, " + high.String()}
	}
	return nil
}

func (p Problem) checkStart() error {
	if p.Profile == nil {
		return units.CheckTemperature("initial temperature", p.Initial)
	}
	if p.Initial != (units.Temperature{}) {
		return &units.ArgumentError{Field: "initial temperature", Value: p.Initial, Accepted: "none beside a profile"}
	}
	return nil
}

func (p Problem) checkFaces() error {
	if !p.Surface.IsZero() || p.SurfaceLump == nil {
		if err := p.Surface.Check(); err != nil {
			return err
		}
	}
	if !p.twoFaces() && (!p.Opposite.IsZero() || p.OppositeLump != nil) {
		return &units.ArgumentError{Field: "opposite face", Value: p.Opposite.String(), Accepted: "none, since " + p.Body.String() + " has no opposite face"}
	}
	if !p.Opposite.IsZero() {
		if err := p.Opposite.Check(); err != nil {
			return in("opposite face", err)
		}
	}
	for _, f := range []struct {
		name string
		lump *Lump
	}{{"surface lump", p.SurfaceLump}, {"opposite lump", p.OppositeLump}} {
		if f.lump == nil {
			continue
		}
		if err := f.lump.check(f.name); err != nil {
			return err
		}
	}
	return nil
}

func (l *Lump) check(name string) error {
	for _, err := range []error{
		units.CheckPositive(name+": heat capacity", l.HeatCapacity),
		units.CheckPositive(name+": coefficient", l.Coefficient),
		units.CheckTemperature(name+": initial temperature", l.Initial),
		units.CheckNotNegative(name+": area", l.Area),
	} {
		if err != nil {
			return err
		}
	}
	if l.Exchange.IsZero() {
		return nil
	}
	return in(name, l.Exchange.CheckExchange())
}

// in returns the error of a condition with what it belongs to before the field.
func in(name string, err error) error {
	var a *units.ArgumentError
	if !errors.As(err, &a) {
		return err
	}
	named := *a
	named.Field = name + ": " + a.Field
	return &named
}

func (p Problem) checkTimes() error {
	if err := units.CheckPositive("horizon", p.Horizon); err != nil {
		return err
	}
	if p.Until != (units.Temperature{}) {
		return units.CheckTemperature("until", p.Until)
	}
	return nil
}

func (p Problem) checkNumerics() error {
	if n := p.Cells; n != 0 && (n < leastCells || n > mostCells) {
		return &units.ArgumentError{Field: "cells", Value: n, Accepted: "0 for the default, or " + strconv.Itoa(leastCells) + " to " + strconv.Itoa(mostCells)}
	}
	if err := units.CheckNotNegative("smallest cell", p.Smallest); err != nil {
		return err
	}
	if d := p.Smallest.SI(); d > 0 {
		if p.Uniform {
			return &units.ArgumentError{Field: "smallest cell", Value: p.Smallest, Accepted: "none beside uniform cells"}
		}
		if !(d >= 1e-9*p.Body.Thickness().SI() && d <= p.Body.Thickness().SI()/leastCells) {
			return &units.ArgumentError{Field: "smallest cell", Value: p.Smallest, Accepted: "1e-9 to a quarter of the thickness of the body"}
		}
	}
	if err := p.checkAccuracy(); err != nil {
		return err
	}
	if t := p.tolerance(); !(t >= leastTolerance && t <= mostTolerance) {
		return &units.ArgumentError{Field: "tolerance", Value: p.Tolerance, Accepted: "0 for the default, or 1 nK to 10 K"}
	}
	return p.checkScheme()
}

// checkDerived refuses fields that are possible one by one but lead towards the ends of the range of float64.
func (p Problem) checkDerived(l Layer, start units.Temperature) error {
	k, err := l.Material.Conductivity(start)
	if err != nil {
		return err
	}
	c, err := l.Material.SpecificHeat(start)
	if err != nil {
		return err
	}
	radius, capacity := min(p.Body.ConductionLength().SI(), l.Thickness.SI()), l.Material.Density().SI()*c.SI()
	largest := 0.0
	for _, condition := range p.conditions() {
		if e := exchange(condition); e.Coefficient > largest {
			largest = e.Coefficient
		}
	}
	for _, lump := range []*Lump{p.SurfaceLump, p.OppositeLump} {
		if lump != nil {
			largest = max(largest, lump.Coefficient.SI())
		}
	}
	for _, d := range []struct {
		name string
		x    float64
	}{
		{"heat capacity ρ c V in J/K", capacity * p.Body.Volume().SI()},
		{"diffusivity k/(ρ c) in m²/s", k.SI() / capacity},
		{"time R²/α in s", radius * radius * capacity / k.SI()},
		{"1 + Biot number h R/k", 1 + largest*radius/k.SI()},
		{"horizon in s", p.Horizon.SI()},
	} {
		if !(d.x >= 1e-100 && d.x <= 1e100) {
			return &units.ArgumentError{Field: d.name, Value: d.x, Accepted: "fields that give 1e-100 to 1e100"}
		}
	}
	return nil
}

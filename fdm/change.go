package fdm

import (
	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
)

// A Changing material becomes another one for good where it has been at a temperature or above: what dries, cures,
// sinters or is first heated. What that takes belongs to the properties before. A node changes at the end of the step
// in which it comes there, with its temperature and its heat as they are, so that no heat is lost; the switch is of
// order 1 in time.
type Changing struct {
	Material                   // until then
	At       units.Temperature // in the range of both
	Into     Material          // from then on
}

// change returns what becomes of a material, in plain numbers; none of most.
func (p Problem) change(m Material, start units.Temperature) (fv.Change, error) {
	c, ok := m.(Changing)
	if !ok {
		return fv.Change{}, nil
	}
	low, high := supported(c.Into, c.At)
	t, err := p.tableBetween(c.Into, c.At, low, high)
	return fv.Change{Table: t, At: c.At.SI()}, err
}

// checkChange refuses a material that changes into none, or not within its range.
func checkChange(field string, m Material) error {
	c, ok := m.(Changing)
	if !ok {
		return nil
	}
	if c.Material == nil {
		return &units.ArgumentError{Field: field, Accepted: "a material before the change"}
	}
	if _, twice := c.Into.(Changing); twice {
		return &units.ArgumentError{Field: field + ": changed", Value: "one that changes again", Accepted: "a material that stays"}
	}
	if err := checkMaterial(field+": changed", c.Into); err != nil {
		return err
	}
	if err := units.CheckTemperature(field+": temperature of the change", c.At); err != nil {
		return err
	}
	for _, part := range []Material{c.Material, c.Into} {
		if err := inRange(part, c.At); err != nil {
			return err
		}
	}
	return nil
}

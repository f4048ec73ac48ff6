package lumped

import (
	"math"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// A Part is one of several materials that are at one temperature together, such as the bottle and what is in
// it. Its heat counts by its Mass, or by its Volume and its density; one of the two must be given.
type Part struct {
	Name     string // for the derivation; may be empty
	Material Material
	Mass     units.Mass
	Volume   units.Volume
}

// A content is the heat in a body over its temperature. The state y = T0 + (H(T) − H(T0))/C with a fixed C
// keeps heat exactly, and neither a kink nor a latent heat is a jump of its derivative. It is the
// temperature where the specific heat is constant.
type content struct {
	portions  []portion
	only      [1]portion // room for the usual single one
	start     float64    // K
	capacity  float64    // C, J/K
	enthalpy  float64    // H(T0), J
	linear    bool       // y is the temperature
	low, high float64    // range of all materials, K
	each      float64    // of one kind of material: specific heat of y, J/(kg K)
	zero      float64    // of one kind of material: h(T0), J/kg
}

// A portion is a mass of one material.
type portion struct {
	name     string
	material Material
	kg       float64
}

// fill puts in what is in the body of p at its start, with C = ρ c V at the start.
func (c *content) fill(p *Problem) error {
	c.start, c.low, c.high = p.Initial.SI(), math.Inf(-1), math.Inf(1)
	var err error
	if c.portions, err = p.portions(c.only[:0]); err != nil {
		return err
	}
	for i := range c.portions {
		m := c.portions[i].material
		heat, err := m.SpecificHeat(p.Initial)
		if err != nil {
			return err
		}
		if err := units.CheckPositive("material: specific heat at the initial temperature", heat); err != nil {
			return err
		}
		c.capacity += c.portions[i].kg * heat.SI()
		low, high := m.Range()
		c.low, c.high = max(c.low, low.SI()), min(c.high, high.SI())
	}
	return units.CheckPositive("heat capacity of the body", units.JoulePerKelvin.Of(c.capacity))
}

// portions appends the masses of the problem to a list.
func (p *Problem) portions(all []portion) ([]portion, error) {
	if len(p.Parts) == 0 {
		if err := checkMaterial("material", p.Material); err != nil {
			return nil, err
		}
		if err := units.CheckNotNegative("mass", p.Mass); err != nil {
			return nil, err
		}
		kg := p.Mass.SI()
		if kg == 0 {
			kg = p.Material.Density().SI() * p.Body.Volume().SI()
		}
		return append(all, portion{"", p.Material, kg}), nil
	}
	if p.Material != nil || p.Mass.SI() != 0 {
		return nil, &units.ArgumentError{Field: "parts", Value: len(p.Parts), Accepted: "instead of Material and Mass, not besides them"}
	}
	for _, part := range p.Parts {
		name := "part " + part.Name
		if err := checkMaterial(name+": material", part.Material); err != nil {
			return nil, err
		}
		kg := part.Mass.SI()
		switch {
		case part.Mass.SI() != 0 && part.Volume.SI() != 0:
			return nil, &units.ArgumentError{Field: name + ": volume", Value: part.Volume, Accepted: "none where a mass is given"}
		case part.Mass.SI() != 0:
			if err := units.CheckPositive(name+": mass", part.Mass); err != nil {
				return nil, err
			}
		default:
			if err := units.CheckPositive(name+": mass or volume", part.Volume); err != nil {
				return nil, err
			}
			kg = part.Material.Density().SI() * part.Volume.SI()
		}
		all = append(all, portion{part.Name, part.Material, kg})
	}
	return all, nil
}

func checkMaterial(field string, m Material) error {
	if m == nil {
		return &units.ArgumentError{Field: field, Accepted: "a material, such as one of package props"}
	}
	return units.CheckPositive("material: density", m.Density())
}

// constantBetween reports whether the heat is a straight line over the temperature from a to b.
func (c *content) constantBetween(a, b float64) bool {
	for i := range c.portions {
		if !constantBetween(c.portions[i].material, a, b) {
			return false
		}
	}
	return true
}

// prepare finds out whether the state is the temperature itself, and chooses its C: the least over the
// range, so that the error of y bounds that of the temperature, but not below a tenth of that at the start.
func (c *content) prepare() error {
	if c.linear = c.saysConstant(); c.linear {
		return nil
	}
	if isFinite(c.low) && isFinite(c.high) {
		if c.linear = c.constantBetween(c.low, c.high); c.linear {
			return nil
		}
		least := 0.0
		for i := range c.portions {
			p := &c.portions[i]
			of := math.Inf(1)
			err := sample(p.material, c.low, c.high, func(kelvin float64) error {
				if s, err := p.material.SpecificHeat(units.Kelvin.Of(kelvin)); err == nil {
					of = min(of, p.kg*s.SI())
				}
				return nil
			})
			if err != nil {
				return err
			}
			least += of
		}
		if least < c.capacity {
			c.capacity = max(least, c.capacity/10)
		}
	}
	var err error
	if c.enthalpy, err = c.heat(c.start); err != nil {
		return err
	}
	if len(c.portions) == 1 {
		c.each, c.zero = c.capacity/c.portions[0].kg, c.enthalpy/c.portions[0].kg
	}
	return nil
}

func (c *content) saysConstant() bool {
	for i := range c.portions {
		if says, ok := c.portions[i].material.(interface{ IsConstant() bool }); !ok || !says.IsConstant() {
			return false
		}
	}
	return true
}

// heat returns H at a temperature, J from any zero.
func (c *content) heat(kelvin float64) (float64, error) {
	total := 0.0
	for i := range c.portions {
		h, err := c.portions[i].material.Enthalpy(units.Kelvin.Of(kelvin))
		if err != nil {
			return 0, err
		}
		total += c.portions[i].kg * h.SI()
	}
	return total, nil
}

// state returns y at a temperature.
func (c *content) state(kelvin float64) (float64, error) {
	if c.linear {
		return kelvin, c.within(kelvin)
	}
	h, err := c.heat(kelvin)
	if err != nil {
		return 0, err
	}
	return c.start + (h-c.enthalpy)/c.capacity, nil
}

// temperature returns the temperature in kelvin at y.
func (c *content) temperature(y float64) (kelvin float64, err error) {
	kelvin = y
	switch {
	case c.linear:
		err = c.within(y)
	case len(c.portions) == 1:
		var t units.Temperature
		t, err = c.portions[0].material.Temperature(units.JoulePerKilogram.Of(c.zero + c.each*(y-c.start)))
		kelvin = t.SI()
	default:
		kelvin, err = c.invert(c.enthalpy + c.capacity*(y-c.start))
	}
	if err != nil {
		return 0, err
	}
	return kelvin, units.CheckTemperature("temperature of the body", units.Kelvin.Of(kelvin))
}

// within returns the error of the material for a temperature outside its range.
func (c *content) within(kelvin float64) error {
	if kelvin >= c.low && kelvin <= c.high {
		return nil
	}
	for i := range c.portions {
		if _, err := c.portions[i].material.SpecificHeat(units.Kelvin.Of(kelvin)); err != nil {
			return err
		}
	}
	return nil
}

// invert returns the temperature at which several materials hold the heat h together: each would have a
// temperature of its own at its share, and the common one is bracketed from the start outwards.
func (c *content) invert(h float64) (float64, error) {
	var failure error
	f := func(kelvin float64) float64 {
		got, err := c.heat(kelvin)
		if err != nil {
			failure, got = err, math.NaN()
		}
		return got - h
	}
	if h == c.enthalpy {
		return c.start, nil
	}
	away := 1.0
	if h < c.enthalpy {
		away = -1
	}
	near, step := c.start, 2*math.Abs(h-c.enthalpy)/c.capacity
	for {
		far := min(max(near+away*step, c.low), c.high)
		if g := f(far); failure != nil || g*away >= 0 {
			kelvin, _ := root.Find(f, near, far, 0)
			return kelvin, failure
		}
		if far == near || far == c.low || far == c.high {
			return 0, c.within(math.Nextafter(far, math.Inf(int(away))))
		}
		near, step = far, 2*step
	}
}

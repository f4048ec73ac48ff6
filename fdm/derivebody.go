package fdm

import (
	"strconv"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
)

// deriveBody adds the body, its materials at the start, and its faces.
func (s *Solution) deriveBody(r *derivation.Record) {
	body := s.problem.Body
	radius := body.ConductionLength()
	if d := body.Diameter(); d.SI() != 0 {
		r.Add("D", "diameter", d, "")
	}
	if d := body.InnerDiameter(); d.SI() != 0 {
		r.Add("D,i", "inner diameter", d, "")
	}
	r.Add("R", "conduction length", radius, "longest way of the heat to the exposed surface")
	r.Add("A", "exposed surface", body.Area(), "")
	r.Add("V", "volume", body.Volume(), "")
	if s.problem.Profile == nil {
		r.Add("T0", "temperature at the start", s.start, "")
	} else {
		r.Add("T0", "temperature of the surface at the start", s.start, "")
		r.Note("the start is a profile of temperatures")
	}
	constant := true
	for j, l := range s.wall.layers {
		constant = s.deriveMaterial(r, j, l) && constant
	}
	if !constant {
		r.Note("conductivity or specific heat depends on temperature")
	}
	s.deriveFaces(r, constant && len(s.wall.layers) == 1)
}

// deriveMaterial adds a layer, and reports whether its properties are constant. The material gave these values
// before, when its table was made.
func (s *Solution) deriveMaterial(r *derivation.Record, j int, l Layer) bool {
	of, in := "", ""
	if len(s.wall.layers) > 1 {
		of, in = ","+strconv.Itoa(j+1), " of layer "+strconv.Itoa(j+1)+" from the surface"
		r.Add("d"+of, "thickness"+in, l.Thickness, "")
	}
	m, radius := l.Material, s.problem.Body.ConductionLength().SI()
	k, _ := m.Conductivity(s.start)
	c, _ := m.SpecificHeat(s.start)
	r.Add("ρ"+of, "density"+in, m.Density(), "")
	r.Add("k0"+of, "conductivity at the start"+in, k, "")
	r.Add("c0"+of, "specific heat at the start"+in, c, "")
	if l.Contact.SI() != 0 {
		r.Add("R,c"+of, "contact resistance inwards"+in, l.Contact, "")
	}
	if l.ContactAt != nil {
		r.Note("the contact inwards" + in + " is a function of the temperatures on both sides")
	}
	if !s.tables[j].Constant() {
		return false
	}
	if len(s.wall.layers) == 1 {
		alpha := units.SquareMetrePerSecond.Of(k.SI() / (m.Density().SI() * c.SI()))
		r.Add("α", "thermal diffusivity", alpha, "k0 / (ρ c0)")
		r.Add("R²/α", "time of the Fourier number 1", units.Second.Of(radius*radius/alpha.SI()), "R² / α")
	}
	return true
}

// deriveFaces adds what happens at the faces, and the Biot number of a body of one constant material.
func (s *Solution) deriveFaces(r *derivation.Record, plain bool) {
	p := s.problem
	if !p.Surface.IsZero() {
		if h, ambient, ok := p.Surface.Constants(); ok {
			r.Add("h", "heat transfer coefficient", h, "")
			r.Add("T∞", "ambient temperature", ambient, "")
			if k, err := s.wall.layers[0].Material.Conductivity(s.start); plain && err == nil {
				r.AddNumber("Bi", "Biot number", h.SI()*p.Body.ConductionLength().SI()/k.SI(), "h R / k0")
			}
		} else if p.Surface.ByConstants() {
			r.Note("surface: " + p.Surface.String())
		} else {
			r.Note("the exchange at the surface is a function of time and surface temperature, of which the solver knows no more")
		}
	}
	if p.twoFaces() && !s.wall.half {
		switch opposite := p.opposite(); {
		case !opposite.IsZero():
			r.Note("opposite face: " + opposite.String())
		case p.OppositeLump == nil:
			r.Note("opposite face: insulated")
		}
	}
	for _, l := range []struct {
		of   string
		lump *Lump
	}{{"surface", p.SurfaceLump}, {"opposite face", p.OppositeLump}} {
		if l.lump != nil {
			r.Note("lump at the " + l.of + ": heat capacity " + l.lump.HeatCapacity.String() + ", coefficient " + l.lump.Coefficient.String() +
				", from " + l.lump.Initial.String() + "; " + l.lump.Exchange.String())
		}
	}
	if p.Source != nil {
		r.Note("the heat set free inside is a function of depth, time and temperature, of which the solver knows no more")
	}
}

package series

import (
	"fmt"
	"math"

	wallmodes "example.com/coolward/internal/wall"
	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// listed is how many modes a derivation lists.
const listed = 12

// wallDerivation returns every number that the solution rests on where the faces differ, the start is not uniform or
// heat is set free.
func (s *Solution) wallDerivation() derivation.Record {
	var r derivation.Record
	p, w := s.problem, s.wall
	r.Title = "Exact conduction across a wall of constant properties: " + p.Body.String()
	if d := p.Body.Diameter(); d.SI() > 0 {
		r.Add("D", "outer diameter", d, "given")
	}
	if d := p.Body.InnerDiameter(); d.SI() > 0 {
		r.Add("Di", "inner diameter", d, "given")
	}
	r.Add("L", "way between the faces, or from the centre", units.Metre.Of(w.length), "by the measures")
	r.Add("V", "volume", p.Body.Volume(), "by the measures")
	r.Add("k", "thermal conductivity", p.Conductivity, "given")
	r.Add("rho", "density", p.Density, "given")
	r.Add("c", "specific heat", p.SpecificHeat, "given")
	r.Add("alpha", "thermal diffusivity", units.DiffusivityOf(p.Conductivity, p.Density, p.SpecificHeat), "k / (rho c)")
	r.Add("tF", "time scale", units.Second.Of(w.scale), "L² / alpha")
	if p.Profile == nil {
		r.Add("T0", "start temperature", p.Initial, "given")
	} else {
		r.Note("The start temperature is a profile over the depth below the surface.")
	}
	surface, opposite := &w.outer, &w.inner
	if w.flipped {
		surface, opposite = opposite, surface
	}
	addFace(&r, surface, "s", "surface")
	if opposite.area > 0 {
		addFace(&r, opposite, "o", "opposite face")
	}
	if p.Source.SI() != 0 {
		r.Add("g", "source", p.Source, "given")
	}
	if len(p.SourceLog) > 0 {
		r.AddNumber("n_g", "readings of the log of the source", float64(len(p.SourceLog)), "given")
		r.Note("The log of the source is linear between its readings and is superposed by Duhamel's theorem.")
	}
	s.addSteady(&r)
	s.addModes(&r)
	r.Note("T = Ts + (dT/dFo) Fo + Σ A_n exp(−zeta_n² Fo), Fo = t / tF, with A_n of the place; for the log of the source its response is added.")
	if w.solution.Slow() {
		r.Note("The faces exchange so little heat that mode 1 and the steady state are put together: Ts is that of an insulated body, and mode 1 adds A_1 (exp(−zeta_1² Fo) − 1).")
	}
	r.Note(fmt.Sprintf("%d modes are kept. Before Fo = %.3g a uniform start is answered from each face as if there were no other one.", len(w.solution.Modes.All), w.solution.Join))
	r.Note("Constant properties and constant conditions, each the same all over its face, are assumed.")
	r = s.finish(r)
	r.Source("H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford University Press 1959: sections 3.9 to 3.11, 3.14, 7.10, 9.3 and 13.10 for walls, hollow cylinders and hollow spheres; M. N. Özışık, Heat Conduction, 2nd ed., Wiley 1993, chapters 2 to 4 (both from memory)")
	return r
}

func addFace(r *derivation.Record, f *face, mark, name string) {
	r.Add("A_"+mark, "area of the "+name, units.SquareMetre.Of(f.area), "by the measures")
	switch T, ok := f.condition.SurfaceTemperature(); {
	case ok:
		r.Add("T_"+mark, "temperature of the "+name, T, "given")
	case f.biot > 0:
		h, ambient, _ := f.condition.Constants()
		r.Add("h_"+mark, "heat transfer coefficient of the "+name, h, "given")
		r.Add("Tinf_"+mark, "ambient of the "+name, ambient, "given")
		r.AddNumber("Bi_"+mark, "Biot number of the "+name, f.biot, "h L / k")
	default:
		q, _ := f.condition.ConstantFlux()
		r.Add("q_"+mark, "heat flux out of the "+name, q, "given")
	}
}

// addSteady adds what the body comes to.
func (s *Solution) addSteady(r *derivation.Record) {
	w := s.wall
	steady := &w.solution.Steady
	name, symbol := "steady temperature", "Ts"
	if steady.Rise != 0 {
		r.Add("dT/dFo", "rise of all temperatures", units.KelvinDifference.Of(steady.Rise), "balance of heat, per unit of Fo")
		name = "temperature less the rise"
	}
	for _, at := range []struct {
		mark, name string
		y          float64
	}{{"_s", " of the surface", w.across(0)}, {"_o", " of the opposite face or the centre", w.across(w.length)}} {
		value := w.reference + steady.At(at.y)
		r.Add(symbol+at.mark, name+at.name, units.Kelvin.Of(value), "conduction with the resistances in series")
	}
	r.Add(symbol+"_m", name+" of the mean", units.Kelvin.Of(w.reference+steady.Mean), "conduction with the resistances in series")
}

// addModes adds the first modes with what they give at the faces and in the mean.
func (s *Solution) addModes(r *derivation.Record) {
	w := s.wall
	count := min(listed, len(w.solution.Modes.All))
	for n := range count {
		mode := &w.solution.Modes.All[n]
		mark := fmt.Sprintf("_%d", n+1)
		r.AddNumber("zeta"+mark, fmt.Sprintf("root %d", n+1), mode.Zeta, rootOf[s.problem.Body.Family()])
		for _, at := range []struct {
			mark, name string
			probe      wallmodes.Probe
		}{
			{"s", "surface", wallmodes.Probe{Y: w.across(0)}},
			{"o", "opposite face or centre", wallmodes.Probe{Y: w.across(w.length)}},
			{"m", "mean", wallmodes.Probe{Quantity: wallmodes.Mean}},
		} {
			r.Add("A_"+at.mark+mark, fmt.Sprintf("part of mode %d at the %s", n+1, at.name), units.KelvinDifference.Of(w.solution.Part(n, at.probe)), "phi ∫ w phi (T(0) − Ts) dy / ∫ w phi² dy")
		}
	}
	if math.IsInf(w.horizon, 1) {
		return
	}
	r.Add("t_end", "end of the log of the source", units.Second.Of(w.horizon), "given")
}

// rootOf says of what equation a root is one; y is the distance from the inner face, or the centre, over L.
var rootOf = map[shape.Family]string{
	shape.Planar:            "phi = cos(zeta y + b), phi' = Bi phi at y = 0, −phi' = Bi phi at y = 1",
	shape.Cylindrical:       "phi = J0(zeta y), −phi' = Bi phi at y = 1",
	shape.Spherical:         "phi = sin(zeta y)/(zeta y), −phi' = Bi phi at y = 1",
	shape.HollowCylindrical: "phi = a J0(zeta r) + b Y0(zeta r), phi' = Bi phi inside, −phi' = Bi phi outside, r over L",
	shape.HollowSpherical:   "phi = cos(zeta y + b)/r, phi' = Bi phi inside, −phi' = Bi phi outside, r over L",
}

package series

import (
	"fmt"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
)

// Derivation returns every number that the solution rests on, with the formulas by which a
// temperature follows from them. That of the zero Solution is empty.
func (s *Solution) Derivation() derivation.Record {
	var r derivation.Record
	if !s.made() {
		return r
	}
	p := s.problem
	r.Title = "Exact conduction in a body of constant properties: " + p.Body.String()
	r.Add("D", "diameter", p.Body.Diameter(), "given")
	r.Add("R", "radius", p.Body.ConductionLength(), "D / 2")
	r.Add("A", "surface area", p.Body.Area(), "π D²")
	r.Add("V", "volume", p.Body.Volume(), "π D³ / 6")
	r.Add("k", "thermal conductivity", p.Conductivity, "given")
	r.Add("rho", "density", p.Density, "given")
	r.Add("c", "specific heat", p.SpecificHeat, "given")
	r.Add("alpha", "thermal diffusivity", units.SquareMetrePerSecond.Of(s.diffusivity), "k / (rho c)")
	r.Add("h", "heat transfer coefficient", s.coefficient, "given")
	r.Add("T0", "start temperature", p.Initial, "given")
	r.Add("Tinf", "ambient temperature", s.ambient, "given")
	r.AddNumber("Bi", "Biot number", s.Biot(), "h R / k")
	r.Add("tF", "time scale", units.Second.Of(s.scale), "R² / alpha")
	r.Add("Q0", "heat that leaves until the end", units.Joule.Of(s.heat), "rho c V (T0 − Tinf)")
	s.addTerms(&r)
	for _, text := range formulas {
		r.Note(text)
	}
	r.Note("Uniform start, constant properties, and a constant coefficient over the whole surface are assumed.")
	r.Note("What the formulas leave out, and rounding, stay below 1e-14 of T0 − Tinf at every time.")
	for _, text := range p.Notes {
		r.Note(text)
	}
	r.Source("H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford University Press 1959: section 9.4 for the series, chapters XII and XIII with entry 14 of the table of transforms in appendix V for short times (from memory)")
	for _, text := range p.Sources {
		r.Source(text)
	}
	return r
}

func (s *Solution) addTerms(r *derivation.Record) {
	if s.Biot() == 0 {
		r.Note("The coefficient is 0: no heat is exchanged, and the body stays at T0.")
		return
	}
	formula := "(−1)^(n+1) 2 Bi √(zeta_n² + (Bi − 1)²) / (zeta_n² + Bi² − Bi)"
	for n := 1; n <= eigen.Terms; n++ {
		zeta, c, _ := s.modes.Term(n)
		r.AddNumber(fmt.Sprintf("zeta_%d", n), fmt.Sprintf("root %d", n), zeta,
			fmt.Sprintf("zeta cot(zeta) = 1 − Bi between %dπ and %dπ", n-1, n))
		r.AddNumber(fmt.Sprintf("C_%d", n), fmt.Sprintf("coefficient %d", n), c, formula)
		formula = "as C_1"
	}
}

// formulas say how a temperature follows from the numbers of a derivation.
var formulas = [...]string{
	"T = Tinf + (T0 − Tinf) theta, with Fo = t / tF and x = distance from the centre / R.",
	"Fo ≥ 0.025: theta = Σ C_n exp(−zeta_n² Fo) sin(zeta_n x) / (zeta_n x); at the centre Σ C_n exp(−zeta_n² Fo); at the surface Σ S_n exp(−zeta_n² Fo), S_n = 2 Bi / (zeta_n² + Bi² − Bi); for the mean Σ M_n exp(−zeta_n² Fo), M_n = 3 Bi S_n / zeta_n².",
	"Fo < 0.025: theta = 1 − Bi [F(1 − x) − F(1 + x)] / x, F(d) = [erfc(a) − exp(H d + H² Fo) erfc(a + b)] / H, a = d / (2 √Fo), b = H √Fo, H = Bi − 1; the limits for x = 0 and for H = 0 are taken.",
	"Fo < 0.025: mean theta = 1 − 3 Bi ∫ theta(x = 1) dFo from 0 to Fo.",
	"Heat that has left: Q0 (1 − mean theta).",
}

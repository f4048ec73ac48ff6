package series

import (
	"fmt"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// Derivation returns every number that the solution rests on, with the formulas by which a
// temperature follows from them. That of the zero Solution is empty.
func (s *Solution) Derivation() derivation.Record {
	var r derivation.Record
	if s.walled() {
		return s.wallDerivation()
	}
	if !s.made() {
		return r
	}
	p := s.problem
	r.Title = "Exact conduction in a body of constant properties: " + p.Body.String()
	if d := p.Body.Diameter(); d.SI() > 0 {
		r.Add("D", "diameter", d, "given")
	}
	r.Add("A", "exposed surface", p.Body.Area(), "by the measures")
	r.Add("V", "volume", p.Body.Volume(), "by the measures")
	r.Add("k", "thermal conductivity", p.Conductivity, "given")
	r.Add("rho", "density", p.Density, "given")
	r.Add("c", "specific heat", p.SpecificHeat, "given")
	r.Add("alpha", "thermal diffusivity", units.SquareMetrePerSecond.Of(s.diffusivity), "k / (rho c)")
	r.Add("T0", "start temperature", p.Initial, "given")
	if s.given != nil {
		s.addFlux(&r)
		return s.finish(r)
	}
	if s.following != nil {
		s.addFollowing(&r)
		for i := range s.count {
			s.addFactor(&r, &s.factors[i], s.mark(i))
		}
		s.addProduct(&r)
		r.Note("Heat that has left: rho c V (T0 − mean T).")
		r.Note("Uniform start, constant properties, and a constant coefficient over the whole exposed surface are assumed.")
		return s.finish(r)
	}
	if s.prescribed {
		r.Add("Tinf", "surface temperature", s.ambient, "given")
		r.Note("The surface is at Tinf from time 0 on: Bi is infinite, and the limits of the formulas are taken.")
	} else {
		r.Add("h", "heat transfer coefficient", s.coefficient, "given")
		r.Add("Tinf", "ambient temperature", s.ambient, "given")
	}
	r.Add("Q0", "heat that leaves until the end", units.Joule.Of(s.heat), "rho c V (T0 − Tinf)")
	r.Note("T = Tinf + (T0 − Tinf) theta, with Fo = t / tF and x = distance from the centre / R.")
	for i := range s.count {
		s.addFactor(&r, &s.factors[i], s.mark(i))
	}
	s.addProduct(&r)
	r.Note("Heat that has left: Q0 (1 − mean theta).")
	r.Note("Uniform start, constant properties, and a constant coefficient over the whole exposed surface are assumed.")
	r.Note("What the formulas leave out, and rounding, stay below 1e-14 of T0 − Tinf for each theta at every time.")
	return s.finish(r)
}

// mark returns what the symbols of a factor end with.
func (s *Solution) mark(i int) string {
	if s.count == 1 {
		return ""
	}
	return fmt.Sprintf("_%d", i+1)
}

// addProduct says how the factors make up the body.
func (s *Solution) addProduct(r *derivation.Record) {
	if s.count > 1 {
		r.Note(fmt.Sprintf("theta is the product of theta of the %d bodies 1, 2 …, each with its own R, Bi, tF and x; x is 0 in all but the first for the centre, the surface, which is the middle of the face nearest to the centre, and a depth below it. So is the mean.", s.count))
		r.Source("A. B. Newman, Industrial and Engineering Chemistry 28 (1936) 545–548, for the product of solutions; L. S. Langston, International Journal of Heat and Mass Transfer 25 (1982) 149–150, for its heat (both from memory)")
	}
}

// finish adds what every derivation ends with.
func (s *Solution) finish(r derivation.Record) derivation.Record {
	for _, text := range s.problem.Notes {
		r.Note(text)
	}
	r.Source("H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford University Press 1959: sections 3.8, 3.11, 7.7, 7.8, 9.4 and 9.7 for the series, chapters XII and XIII with entry 14 of the table of transforms in appendix V for short times (from memory)")
	for _, text := range s.problem.Sources {
		r.Source(text)
	}
	return r
}

// addFlux adds what belongs to a given flux.
func (s *Solution) addFlux(r *derivation.Record) {
	q, _ := s.problem.Surface.ConstantFlux()
	r.Add("q", "heat flux outwards", q, "given")
	r.Note("T = T0 − (q R / k) F(x, Fo), Fo = t / tF, x = distance from the centre / R; for a body of several lines marked 1, 2 … the sum of (q R / k) F over them.")
	for i := range s.count {
		f, mark := &s.factors[i], s.mark(i)
		how := formulasOf[f.body.Family()]
		r.Add("R"+mark, how.name+": way out", f.body.ConductionLength(), "by the measures")
		r.Add("tF"+mark, "time scale", units.Second.Of(s.scale/f.ratio), "R² / alpha")
		r.Add("dT"+mark, "scale of temperature", units.KelvinDifference.Of(s.given.fall[i]), "q R / k")
		for n := 2; ; n++ {
			zeta, c := s.given.modes[i].Term(n)
			if zeta == 0 {
				break
			}
			r.AddNumber(fmt.Sprintf("zeta%s_%d", mark, n), fmt.Sprintf("root %d", n), zeta, fmt.Sprintf("root %d of %s for Bi = 0", n, how.equation))
			r.AddNumber(fmt.Sprintf("D%s_%d", mark, n), fmt.Sprintf("coefficient %d", n), c, "limit of C_n / Bi for Bi = 0: "+how.coefficient)
		}
		r.Note(how.name + ": " + how.flux)
	}
	r.Note("Heat that has left: q A t.")
	r.Note("Uniform start, constant properties, and the same flux over the whole exposed surface are assumed.")
}

// addFactor adds what belongs to one body of one coordinate.
func (s *Solution) addFactor(r *derivation.Record, f *factor, mark string) {
	how := formulasOf[f.body.Family()]
	name, from := how.length, how.from
	if front, back := f.body.Exposed()&shape.Front != 0, f.body.Exposed()&shape.Back != 0; front != back {
		name, from = "thickness", "given"
	}
	length := f.body.ConductionLength()
	r.Add("R"+mark, name, length, from)
	if !s.prescribed {
		r.AddNumber("Bi"+mark, "Biot number", f.modes.Biot(), "h R / k")
	}
	r.Add("tF"+mark, "time scale", units.Second.Of(s.scale/f.ratio), "R² / alpha")
	if f.modes.Biot() == 0 {
		r.Note("The coefficient is 0: no heat is exchanged, and the body stays at T0.")
		return
	}
	equation, formula := how.equation, how.coefficient
	if s.prescribed {
		equation, formula = how.limit, how.limitCoefficient
	}
	for n := 1; ; n++ {
		zeta, c, _ := f.modes.Term(n)
		if zeta == 0 {
			break
		}
		r.AddNumber(fmt.Sprintf("zeta%s_%d", mark, n), fmt.Sprintf("root %d", n), zeta, fmt.Sprintf("root %d of %s", n, equation))
		r.AddNumber(fmt.Sprintf("C%s_%d", mark, n), fmt.Sprintf("coefficient %d", n), c, formula)
		formula = "as C_1"
	}
	for _, text := range how.theta {
		r.Note(how.name + ": " + text)
	}
}

// formulasOf say how a temperature follows from the numbers of a derivation.
var formulasOf = map[shape.Family]struct {
	name, length, from      string
	equation, coefficient   string
	limit, limitCoefficient string
	theta                   []string
	flux                    string
}{
	shape.Planar: {
		"plate", "half thickness", "thickness / 2",
		"zeta tan(zeta) = Bi", "(−1)^(n+1) 2 Bi √(zeta_n² + Bi²) / (zeta_n (zeta_n² + Bi² + Bi))",
		"cos(zeta) = 0", "(−1)^(n+1) 2 / zeta_n",
		[]string{
			"Fo ≥ 0.025: theta = Σ C_n exp(−zeta_n² Fo) cos(zeta_n x); at the surface Σ S_n exp(−zeta_n² Fo), S_n = 2 Bi / (zeta_n² + Bi² + Bi); for the mean Σ M_n exp(−zeta_n² Fo), M_n = Bi S_n / zeta_n².",
			"Fo < 0.025: theta = 1 − Bi [F(1 − x) + F(1 + x)], F(d) = [erfc(a) − exp(Bi d + Bi² Fo) erfc(a + b)] / Bi, a = d / (2 √Fo), b = Bi √Fo; at the surface exp(b²) erfc(b).",
			"Fo < 0.025: mean theta = 1 − Bi ∫ theta(x = 1) dFo from 0 to Fo.",
		},
		"F = Fo + x²/2 − 1/6 − Σ D_n exp(−zeta_n² Fo) cos(zeta_n x), n from 2; Fo < 0.025: 2 √Fo [ierfc((1 − x)/(2 √Fo)) + ierfc((1 + x)/(2 √Fo))]. Mean F = Fo.",
	},
	shape.Cylindrical: {
		"long cylinder", "radius", "D / 2",
		"zeta J1(zeta) = Bi J0(zeta)", "2 Bi / ((zeta_n² + Bi²) J0(zeta_n))",
		"J0(zeta) = 0", "2 / (zeta_n J1(zeta_n))",
		[]string{
			"Fo ≥ 0.0055: theta = Σ C_n exp(−zeta_n² Fo) J0(zeta_n x); at the surface Σ S_n exp(−zeta_n² Fo), S_n = 2 Bi / (zeta_n² + Bi²); for the mean Σ M_n exp(−zeta_n² Fo), M_n = 2 Bi S_n / zeta_n².",
			"Fo < 0.0055: 1 − theta is the inverse over Fo of the Laplace transform (Bi/s) I0(q x) / (q I1(q) + Bi I0(q)), q = √s, from the expansions of I0 and I1 for large q.",
			"Fo < 0.0055: mean theta = 1 − 2 Bi ∫ theta(x = 1) dFo from 0 to Fo.",
		},
		"F = 2 Fo + x²/2 − 1/4 − Σ D_n exp(−zeta_n² Fo) J0(zeta_n x), n from 2; Fo < 0.0055: the inverse Laplace transform of I0(q x) / (s q I1(q)), q = √s, from the expansions for large q. Mean F = 2 Fo.",
	},
	shape.Spherical: {
		"sphere", "radius", "D / 2",
		"zeta cot(zeta) = 1 − Bi", "(−1)^(n+1) 2 Bi √(zeta_n² + (Bi − 1)²) / (zeta_n² + Bi² − Bi)",
		"sin(zeta) = 0 above 0", "(−1)^(n+1) 2",
		[]string{
			"Fo ≥ 0.025: theta = Σ C_n exp(−zeta_n² Fo) sin(zeta_n x) / (zeta_n x); at the centre Σ C_n exp(−zeta_n² Fo); at the surface Σ S_n exp(−zeta_n² Fo), S_n = 2 Bi / (zeta_n² + Bi² − Bi); for the mean Σ M_n exp(−zeta_n² Fo), M_n = 3 Bi S_n / zeta_n².",
			"Fo < 0.025: theta = 1 − Bi [F(1 − x) − F(1 + x)] / x, F(d) = [erfc(a) − exp(H d + H² Fo) erfc(a + b)] / H, a = d / (2 √Fo), b = H √Fo, H = Bi − 1; the limits for x = 0 and for H = 0 are taken.",
			"Fo < 0.025: mean theta = 1 − 3 Bi ∫ theta(x = 1) dFo from 0 to Fo.",
		},
		"F = 3 Fo + x²/2 − 3/10 − Σ D_n exp(−zeta_n² Fo) sin(zeta_n x) / (zeta_n x), n from 2; Fo < 0.025: [G(1 − x) − G(1 + x)] / x, G(d) = exp(Fo − d) erfc(a − √Fo) − erfc(a), a = d / (2 √Fo). Mean F = 3 Fo.",
	},
}

package lumped

import (
	"fmt"
	"strconv"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// warnAbove is the part of T0 − T∞ above which the lumping error gets a warning.
const warnAbove = 0.05

// Derivation returns how the numbers were obtained: with a closed form, everything needed to
// recompute them by hand. It is the caller's own copy.
func (s *Solution) Derivation() derivation.Record {
	var r derivation.Record
	if s.usable() != nil {
		return r
	}
	p := &s.problem
	r.Title = "Lumped analysis, one temperature for the whole body: " + p.Body.String()
	r.Add("V", "volume", p.Body.Volume(), "")
	r.Add("A", "exposed surface", units.SquareMetre.Of(s.exchange.area), "")
	r.Add("V/A", "length of lumped analysis", units.Metre.Of(s.length), "V / A")
	r.Add("R", "conduction length", units.Metre.Of(s.wayOut()), s.whichLength())
	s.addContent(&r)
	r.Add("k", "conductivity", s.biot.Conductivity, "material, its least over the run, at "+units.Kelvin.Of(s.leastAt).String())
	r.Add("T0", "initial temperature", p.Initial, "given")
	s.addSurface(&r)
	r.AddNumber("Bi", "Biot number", s.biot.Conduction, "h R / k")
	r.AddNumber("Bi(V/A)", "Biot number of lumped analysis", s.biot.Volume, "h (V/A) / k")
	if s.path == nil {
		s.addClosed(&r)
	} else {
		s.addIntegration(&r)
	}
	s.addInside(&r)
	s.addLumping(&r)
	for _, text := range p.Sources {
		r.Source(text)
	}
	for _, text := range p.Notes {
		r.Note(text)
	}
	return r
}

// whichLength says what the conduction length is, and why.
func (s *Solution) whichLength() string {
	switch s.problem.Body.Family() {
	case shape.Spherical, shape.Cylindrical:
		return "radius, the longest way of the heat to the surface"
	case shape.Compact:
		return "longest way of the heat to the surface; the lumped solution itself takes V/A"
	}
	if !s.problem.Opposite.IsZero() {
		return "the whole wall, since its faces differ"
	}
	return "longest way of the heat to an exposed face"
}

// addContent records what holds the heat.
func (s *Solution) addContent(r *derivation.Record) {
	p := &s.problem
	if len(p.Parts) > 0 {
		for i := range s.content.portions {
			of := &s.content.portions[i]
			n := strconv.Itoa(i + 1)
			name := "of part " + n
			if of.name != "" {
				name = "of " + of.name
			}
			r.Add("m"+n, "mass "+name, units.Kilogram.Of(of.kg), "given, or density times its volume")
			if c, err := of.material.SpecificHeat(p.Initial); err == nil {
				r.Add("c"+n, "specific heat "+name, c, s.howSpecificHeat())
			}
		}
		r.Add("C", "heat capacity", units.JoulePerKelvin.Of(s.capacityAtStart()), "sum of m c over the parts, at T0")
		return
	}
	r.Add("ρ", "density", p.Material.Density(), "material")
	if p.Mass.SI() != 0 {
		r.Add("m", "mass", p.Mass, "given, in place of ρ V")
	}
	if c, err := p.Material.SpecificHeat(p.Initial); err == nil {
		r.Add("c", "specific heat", c, s.howSpecificHeat())
	}
}

func (s *Solution) howSpecificHeat() string {
	if s.content.linear {
		return "material, constant"
	}
	return "material, at T0"
}

// capacityAtStart returns C at T0 in J/K.
func (s *Solution) capacityAtStart() float64 {
	total := 0.0
	for i := range s.content.portions {
		if c, err := s.content.portions[i].material.SpecificHeat(s.problem.Initial); err == nil {
			total += s.content.portions[i].kg * c.SI()
		}
	}
	return total
}

// addSurface records what happens at the surface.
func (s *Solution) addSurface(r *derivation.Record) {
	p := &s.problem
	if !p.Opposite.IsZero() {
		r.Note("at the surface: " + p.Surface.String())
		r.Note("at the opposite face: " + p.Opposite.String())
	} else if _, _, ok := p.Surface.Constants(); !ok && p.Surface.ByConstants() {
		r.Note("at the surface: " + p.Surface.String())
	}
	if p.Source.SI() != 0 {
		r.Add("P", "heat made inside", units.Watt.Of(s.exchange.source), "source times V")
	}
	h, ambient, constant := p.Surface.Constants()
	if constant && p.Opposite.IsZero() {
		r.Add("T∞", "ambient temperature", ambient, "given")
		r.Add("h", "heat transfer coefficient", h, "given")
		if p.Source.SI() == 0 {
			return
		}
		if s.limitKnown {
			r.Add("T_limit", "limit temperature", units.Kelvin.Of(s.limit), "T∞ + P/(h A)")
			return
		}
	}
	s.addLimit(r)
}

func (s *Solution) addLimit(r *derivation.Record) {
	as := ", if conditions stay as at " + units.Second.Of(s.end).String()
	if s.exchange.steady() {
		as = ""
	}
	how := "largest q / (T − T_limit) over the run"
	if s.exchange.linear() {
		how = "sum of the coefficients"
	}
	switch {
	case s.limitKnown:
		r.Add("T_limit", "limit temperature", units.Kelvin.Of(s.limit), "nothing comes or goes"+as)
	case s.limitError != nil:
		r.Warn("no limit temperature: the exchange function fails beyond " + units.Kelvin.Of(s.limit).String() + " (" + s.limitError.Error() + ")")
	default:
		r.Note("no temperature without exchange before " + units.Kelvin.Of(s.limit).String() + ", where the search ends" + as)
	}
	if _, ok := r.Value("h"); ok {
		return
	}
	if !s.limitKnown {
		how = "largest |q| over the run / span of temperature of the run"
	}
	r.Add("h", "heat transfer coefficient", s.biot.Coefficient, how)
}

// addClosed records the closed form.
func (s *Solution) addClosed(r *derivation.Record) {
	if s.moving != nil {
		r.Add("τ", "time constant", units.Second.Of(s.moving.tau), "ρ c V / (h A)")
		r.Note("closed form, exact between two bends of the ambient: T follows T∞(t) with the time constant τ; dT/dt = −(T − T∞)/τ")
		r.Source("closed form: first-order lag behind ramps and oscillations, common practice, no source")
		return
	}
	switch l := s.straight.law.(type) {
	case exponential:
		if l.rate == 0 {
			r.Note("closed form: without exchange the body stays at T0")
			break
		}
		r.Add("τ", "time constant", units.Second.Of(-1/l.rate), "ρ c V / (h A)")
		r.Note("closed form: T = T_limit + (T0 − T_limit) exp(−t/τ), t = τ ln((T0 − T_limit)/(T − T_limit)), heat released ρ V c (T0 − T) + P t; without a source T_limit is T∞")
		r.Source("closed form: common practice, such as F. P. Incropera, D. P. DeWitt, Fundamentals of Heat and Mass Transfer, chapter on transient conduction (from memory)")
	case slackening:
		r.AddNumber("n", "exponent of the coefficient", l.n, "given")
		r.Add("τ", "time constant at the start", units.Second.Of(l.tau), "ρ c V / (h(T0) A)")
		r.Note("closed form: T = T∞ + (T0 − T∞) (1 + n t/τ)^(−1/n), heat released ρ V c (T0 − T)")
		r.Source("closed form: A. Bejan, A. D. Kraus (eds.), Heat Transfer Handbook, sec. 3.8, eq. 3.286")
	case glow:
		r.Add("τ", "time constant of small differences", units.Second.Of(l.tau), "ρ c V / (4 ε σ A Ts³)")
		r.Note("closed form: t = τ (F(T/Ts) − F(T0/Ts)), F(x) = ln|(x + 1)/(x − 1)| + 2 atan x, Ts = T_limit, heat released ρ V c (T0 − T) + P t")
		r.Source("closed form: A. Bejan, A. D. Kraus (eds.), Heat Transfer Handbook, sec. 3.8, eq. 3.283")
	case straight:
		r.Add("dT/dt", "rate", units.KelvinPerSecond.Of(l.slope), "(P − q A)/(ρ c V)")
		r.Note("closed form: T = T0 + t dT/dt, to the end of the range of the material")
	}
}

func (s *Solution) addIntegration(r *derivation.Record) {
	stats := s.path.Statistics()
	r.Add("t_end", "end of the solution", units.Second.Of(s.end), "")
	r.Add("T_end", "temperature at the end", units.Kelvin.Of(s.last), "")
	r.Add("tol", "tolerance", s.problem.Tolerance, "given, or 1 mK")
	r.AddNumber("steps", "steps", float64(stats.Steps), "")
	r.AddNumber("rejected", "steps rejected", float64(stats.Rejected), "")
	r.AddNumber("evaluations", "evaluations of the exchange", float64(stats.Evaluations), "")
	r.Add("ΔT_int", "integration error", s.IntegrationError(), "estimate, largest over the run")
	r.Note("integrated: ρ V dh/dt = P − A q(t, T) with the specific enthalpy h(T), heat released ρ V (h(T0) − h(T)) + P t")
	r.Source("integration: J. R. Dormand, P. J. Prince, J. Comput. Appl. Math. 6 (1980) 19-26, orders 5 and 4 with continuous extension (from memory)")
}

// addInside records the resistance inside.
func (s *Solution) addInside(r *derivation.Record) {
	if s.inside == nil {
		return
	}
	how := "profile of slow cooling: L/3 for a plate, R/4 for a long cylinder, R/5 for a sphere"
	if !s.inside.known {
		how = "that of a cube of the same V/A"
	}
	r.Add("r", "length of the resistance inside", units.Metre.Of(s.inside.resistance), how)
	r.Add("t_1", "time in which the profile sets in", units.Second.Of(1/s.inside.rate), "such that the centre starts without a slope")
	r.Note("to first order in Bi: the state is the mean, h acts as 1/(1/h + r/k), and surface and centre lie beside the mean by the profile of slow cooling times q/k")
}

func (s *Solution) addLumping(r *derivation.Record) {
	kind := "bound over all time, by the exact series"
	if !s.LumpingErrorIsBound() {
		kind = "estimate over all time, by the exact series at the largest Biot number"
		if s.standsCube() {
			kind += fmt.Sprintf(", %g times that of a cube of the same V/A", irregular)
		}
	}
	largest := units.TemperatureDifference{}
	for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
		e, err := s.LumpingError(place)
		if err != nil {
			r.Warn("no lumping error: " + err.Error())
			return
		}
		r.Add("ΔT_lump("+place.String()+")", "lumping error, "+place.String(), e, kind)
		if e.Compare(largest) > 0 {
			largest = e
		}
	}
	r.Source("lumping error: H. S. Carslaw, J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., sec. 9.4 (from memory)")
	r.Warn(caution)
	if part := largest.SI() / s.span; part > warnAbove {
		r.Warn(fmt.Sprintf("taking the body as one temperature costs up to %v, %.0f %% of the difference to the limit; use a model with conduction inside", largest, 100*part))
	}
}

// caution goes with every prediction. What a correlation scatters and how hot a surface is say others.
const caution = "a prediction decides neither a release nor a touch: a centre lags behind one temperature for the body; measure there, and keep to the code that applies"

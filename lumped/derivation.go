package lumped

import (
	"fmt"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// warnAbove is the part of T0 − T∞ above which the lumping error gets a warning.
const warnAbove = 0.05

// Derivation returns how the numbers were obtained: with the closed form, everything needed to
// recompute them by hand. It is the caller's own copy.
func (s *Solution) Derivation() derivation.Record {
	var r derivation.Record
	if s.usable() != nil {
		return r
	}
	p := &s.problem
	r.Title = "Lumped analysis, one temperature for the whole body: " + p.Body.String()
	r.Add("V", "volume", p.Body.Volume(), "")
	r.Add("A", "exposed surface", p.Body.Area(), "")
	r.Add("V/A", "length of lumped analysis", p.Body.VolumeToArea(), "V / A")
	r.Add("R", "conduction length", p.Body.ConductionLength(), "longest way of the heat to the surface")
	r.Add("ρ", "density", p.Material.Density(), "material")
	if c, err := p.Material.SpecificHeat(p.Initial); err == nil {
		how := "material, at T0"
		if s.closed || s.linear {
			how = "material, constant"
		}
		r.Add("c", "specific heat", c, how)
	}
	r.Add("k", "conductivity", s.biot.Conductivity, "material, its least over the run, at "+units.Kelvin.Of(s.leastAt).String())
	r.Add("T0", "initial temperature", p.Initial, "given")
	h, ambient, constant := p.Surface.Constants()
	if constant {
		r.Add("T∞", "ambient temperature", ambient, "given")
		r.Add("h", "heat transfer coefficient", h, "given")
	} else {
		s.addLimit(&r)
	}
	r.AddNumber("Bi", "Biot number", s.biot.Conduction, "h R / k")
	r.AddNumber("Bi(V/A)", "Biot number of lumped analysis", s.biot.Volume, "h (V/A) / k")
	if s.closed {
		s.addClosed(&r)
	} else {
		s.addIntegration(&r)
	}
	s.addLumping(&r)
	for _, text := range p.Sources {
		r.Source(text)
	}
	for _, text := range p.Notes {
		r.Note(text)
	}
	return r
}

func (s *Solution) addLimit(r *derivation.Record) {
	end := units.Second.Of(s.end).String()
	switch {
	case s.limitKnown:
		r.Add("T_limit", "limit temperature", units.Kelvin.Of(s.limit), "no exchange, if conditions stay as at "+end)
		r.Add("h", "heat transfer coefficient", s.biot.Coefficient, "largest q / (T − T_limit) over the run")
		return
	case s.limitError != nil:
		r.Warn("no limit temperature: the exchange function fails beyond " + units.Kelvin.Of(s.limit).String() + " (" + s.limitError.Error() + ")")
	default:
		r.Note("no temperature without exchange before " + units.Kelvin.Of(s.limit).String() + ", where the search ends, if conditions stay as at " + end)
	}
	r.Add("h", "heat transfer coefficient", s.biot.Coefficient, "largest |q| over the run / span of temperature of the run")
}

func (s *Solution) addClosed(r *derivation.Record) {
	if s.rate != 0 {
		r.Add("τ", "time constant", units.Second.Of(-1/s.rate), "ρ c (V/A) / h")
		r.Note("closed form: T = T∞ + (T0 − T∞) exp(−t/τ), t = τ ln((T0 − T∞)/(T − T∞)), heat released ρ V c (T0 − T)")
	} else {
		r.Note("closed form: without exchange (h = 0) the body stays at T0")
	}
	r.Source("closed form: common practice, such as F. P. Incropera, D. P. DeWitt, Fundamentals of Heat and Mass Transfer, chapter on transient conduction (from memory)")
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
	r.Note("integrated: ρ V dh/dt = −A q(t, T) with the specific enthalpy h(T), heat released ρ V (h(T0) − h(T))")
	r.Source("integration: J. R. Dormand, P. J. Prince, J. Comput. Appl. Math. 6 (1980) 19-26, orders 5 and 4 with continuous extension (from memory)")
}

func (s *Solution) addLumping(r *derivation.Record) {
	kind := "bound over all time, by the exact series"
	if !s.closed {
		kind = "estimate over all time, by the exact series at the largest Biot number"
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
	if part := largest.SI() / s.span; part > warnAbove {
		r.Warn(fmt.Sprintf("taking the body as one temperature costs up to %v, %.0f %% of the difference to the limit; use a model with conduction inside", largest, 100*part))
	}
}

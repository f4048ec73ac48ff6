package lumped

import (
	"fmt"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
)

// Derivation returns how the numbers were obtained, with a warning for what the readings do not tell. It is
// the caller's own copy.
func (s *Fitted) Derivation() derivation.Record {
	var r derivation.Record
	if s.check() != nil {
		return r
	}
	f := &s.fit
	r.Title = "One exponential fitted to a log, T = T∞ + (T0 − T∞) exp(−t/τ), t from the first time of the log"
	r.AddNumber("n", "readings", float64(len(s.seconds)), fmt.Sprintf("%d missing", len(f.Log.Times)-len(s.seconds)))
	r.Add("t_first", "first time of the log", f.Log.Times[0], "given")
	r.Add("t_last", "last reading", f.Log.Times[s.place[len(s.place)-1]], "given")
	how := func(stated units.Temperature) string {
		if stated != (units.Temperature{}) {
			return "given"
		}
		return "found"
	}
	if tau, err := s.TimeConstant(); err == nil {
		addEstimate(&r, "τ", "time constant", "found", tau, s.sure)
	}
	if T, err := s.Initial(); err == nil {
		addEstimate(&r, "T0", "initial temperature", how(f.Initial), T, s.sure && f.Initial == (units.Temperature{}))
	}
	if T, err := s.Ambient(); err == nil {
		addEstimate(&r, "T∞", "ambient temperature", how(f.Ambient), T, s.sure && f.Ambient == (units.Temperature{}))
	}
	if f.Capacity.SI() > 0 && f.Area.SI() > 0 {
		r.Add("C", "heat capacity", f.Capacity, "given")
		r.Add("A", "area", f.Area, "given")
		if h, err := s.Coefficient(); err == nil {
			addEstimate(&r, "h", "heat transfer coefficient", "C / (A τ)", h, s.sure)
		}
	}
	if deviation, freedom, ok := s.Deviation(); ok {
		from := "found, by " + f.Loss.String()
		if f.Noise.SI() > 0 {
			from = "given"
		}
		r.Add("s", "standard deviation of a reading", deviation, from)
		r.AddNumber("ν", "degrees of freedom", float64(freedom), "readings less constants")
	}
	s.addTests(&r)
	r.Note(fmt.Sprintf("intervals for a probability of %g, from the rise of the sum of squares with the quantity held", f.Coverage))
	r.Source("fit: G. H. Golub, V. Pereyra, SIAM J. Numer. Anal. 10 (1973) 413–432; intervals: D. M. Bates, D. G. Watts, Nonlinear Regression Analysis and Its Applications, Wiley 1988, ch. 6 (from memory)")
	for _, text := range f.Sources {
		r.Source(text)
	}
	for _, text := range f.Notes {
		r.Note(text)
	}
	return r
}

func (s *Fitted) addTests(r *derivation.Record) {
	t := s.Test()
	if t.Neighbours.Done {
		r.AddNumber("d", "Durbin-Watson statistic", t.DurbinWatson, "near 2 for independent errors")
		r.AddNumber("p_neighbours", "its probability", t.Neighbours.Probability, "if one exponential holds")
	}
	if t.Second.Done {
		r.AddNumber("p_second", "probability, test of a second time constant", t.Second.Probability, "if one exponential holds")
	}
	if t.Size.Done {
		r.AddNumber("p_size", "probability, size of the residuals", t.Size.Probability, "if one exponential holds")
	}
	if !s.OneExponential() {
		r.Warn("one exponential does not describe these readings; intervals and forecasts from it are not to be trusted")
	}
	if !t.Neighbours.Done {
		r.Warn("too few readings to test whether one exponential describes them")
	}
	if !s.sure {
		r.Warn("no more readings than constants: nothing is known of the error")
	} else if !s.AmbientIdentified() {
		r.Warn("the readings bend too little to tell the ambient: its interval is open or wider than the span of the readings; log for longer, or state the ambient")
	}
	for _, i := range s.Outliers() {
		r.Warn(fmt.Sprintf("reading %d of the log is off by more than %g standard deviations", i+1, far))
	}
	r.Warn(caution)
}

// addEstimate appends an estimate with its interval.
func addEstimate[Q, S derivation.Dynamic](r *derivation.Record, symbol, name, how string, e Estimate[Q, S], sure bool) {
	r.Add(symbol, name, e.Value, how)
	if !sure {
		return
	}
	r.Add("u("+symbol+")", "standard error, "+name, e.StandardError, "")
	if !e.OpenLow {
		r.Add(symbol+"_low", "low, "+name, e.Low, "")
	}
	if !e.OpenHigh {
		r.Add(symbol+"_high", "high, "+name, e.High, "")
	}
}

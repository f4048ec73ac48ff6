package fdm

import (
	"strconv"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// Derivation returns how the solution was obtained: the body, the grid, the table of the material, the
// steps, the estimates of error and the state at the end, with sources, notes and warnings: of an error above the
// accuracy that was asked for, or else above 0.1 % of the change of temperature, and of what no prediction decides where
// a face is heated above 200 °C or starts above 600 °C, a material melts, or an event is of two places. For constant
// properties and a constant coefficient it has the Biot number and the time at which the Fourier number
// is 1.
func (s *Solution) Derivation() derivation.Record {
	if !s.made() {
		return derivation.Record{}
	}
	r := derivation.Record{Title: "Finite volumes: " + s.problem.Body.String()}
	s.deriveBody(&r)
	s.deriveRun(&r)
	s.deriveEnd(&r)
	s.deriveErrors(&r)
	s.deriveCautions(&r)
	r.Source("finite volumes with enthalpy as the state: S. V. Patankar, Numerical Heat Transfer and Fluid Flow, 1980 (from memory)")
	if s.problem.Scheme != Adaptive {
		r.Source("steps in time: " + s.problem.Scheme.String() + " scheme, as in S. V. Patankar, section 4.3 (from memory)")
	} else {
		r.Source("steps in time: G. Steinebach, Preprint 1741, TH Darmstadt, 1995, as in E. Hairer and G. Wanner, " +
			"Solving Ordinary Differential Equations II, section IV.7 (coefficients from memory, order conditions recomputed)")
	}
	for _, source := range s.problem.Sources {
		r.Source(source)
	}
	for _, note := range s.problem.Notes {
		r.Note(note)
	}
	return r
}

// deriveRun adds the grid, the table and the steps.
func (s *Solution) deriveRun(r *derivation.Record) {
	st := s.Statistics()
	nodes := s.fine.system.Grid.Nodes
	n := len(nodes) - 1
	across := "cells between centre and surface"
	if s.problem.twoFaces() && !s.wall.half {
		across = "cells across the wall"
	}
	r.AddNumber("N", across, float64(st.Cells), "nodes at both ends and between")
	r.Add("Δr,c", "cell at the inner end", units.Metre.Of(nodes[1]-nodes[0]), "")
	r.Add("Δr,s", "cell at the surface", units.Metre.Of(nodes[n]-nodes[n-1]), "")
	size := 0
	for _, t := range s.tables {
		size += t.Size()
	}
	r.AddNumber("n,table", "intervals of the table of the material", float64(size), "temperature and ∫k dT over enthalpy, cubic")
	r.Add("δT,table", "error of the table", units.KelvinDifference.Of(s.tableError()), "with half the intervals, midway between nodes")
	if s.problem.Scheme != Adaptive {
		r.Add("Δt", "time step", s.problem.TimeStep, s.problem.Scheme.String()+" scheme")
		r.AddNumber("n", "steps", float64(st.Steps), "")
		r.AddNumber("n,f", "evaluations", float64(st.Evaluations), "")
		return
	}
	r.Add("tol", "tolerance of a step", units.KelvinDifference.Of(s.problem.tolerance()), "estimated error, root mean square over the volume, up to three times that at one place")
	r.AddNumber("n", "steps", float64(st.Steps), "")
	r.AddNumber("n,rejected", "steps repeated", float64(st.Rejected), "")
	r.AddNumber("n,f", "evaluations", float64(st.Evaluations), "")
}

// deriveEnd adds the state at the end.
func (s *Solution) deriveEnd(r *derivation.Record) {
	end := s.Horizon()
	read := func(place shape.Place) units.Temperature {
		T, _ := s.At(place, end)
		return T
	}
	mean := read(shape.Mean())
	r.Add("t,end", "end of the solution", end, "")
	if event, _, ok := s.Stopped(); ok {
		r.Note("ended by the event: " + event)
	}
	r.Add("T,c", "temperature of the centre then", read(shape.Centre()), "")
	r.Add("T,s", "temperature of the surface then", read(shape.Surface()), "")
	if s.problem.twoFaces() && !s.wall.half {
		r.Add("T,o", "temperature of the opposite face then", read(shape.Opposite()), "")
	}
	r.Add("T,m", "mean temperature then", mean, "at the mean enthalpy")
	how := ""
	if len(s.wall.layers) == 1 && s.problem.Profile == nil {
		m := s.wall.layers[0].Material
		before, err0 := m.Enthalpy(s.start)
		after, err1 := m.Enthalpy(mean)
		if err0 == nil && err1 == nil {
			r.Add("i0", "specific enthalpy at the start", before, "")
			r.Add("i,m", "specific enthalpy then", after, "at T,m")
			if s.problem.Source == nil {
				how = "ρ V (i0 − i,m)"
			}
		}
	}
	r.Add("Q", "heat released", units.Joule.Of(s.heat(end.SI())), how)
	if s.problem.Source != nil {
		q, _ := s.HeatGenerated(end)
		r.Add("Q,g", "heat from inside", q, "")
	}
	s.deriveLimit(r)
}

// deriveLimit adds what the body tends to.
func (s *Solution) deriveLimit(r *derivation.Record) {
	condition := "if conditions stay as at the end"
	if s.limit.fixed {
		condition = ""
	}
	switch {
	case s.limit.failure != nil:
		r.Note("what the body tends to is not known, since the exchange function fails on the way: " + s.limit.failure.Error())
	case s.limit.open:
		r.Note("no temperature without exchange was found within the range of the material at the end of the solution")
	case s.limit.state == nil:
		if condition != "" {
			condition = "no exchange, " + condition
		}
		r.Add("T,lim", "temperature that it tends to", units.Kelvin.Of(s.limit.temperature), condition)
	default:
		for _, l := range []struct {
			symbol, of string
			place      shape.Place
		}{{"T,c,lim", "centre", shape.Centre()}, {"T,s,lim", "surface", shape.Surface()}} {
			p, _ := s.fine.probe(l.place, s.problem.Body)
			r.Add(l.symbol, "temperature that the "+l.of+" tends to", units.Kelvin.Of(s.limit.at(s.fine, &p)), condition)
		}
	}
}

// Temperatures of a face from which a caution stands beside the numbers.
const (
	fire = 473.15 // K, of a face that is heated (common practice, no source)
	// hot is where steel has lost half of its strength or more, as EN 1993-1-2:2005, Table 3.1, has it (600 °C: 0.47, from
	// memory).
	hot = 873.15
)

// deriveCautions says what no prediction decides.
func (s *Solution) deriveCautions(r *derivation.Record) {
	melts := false
	for j, t := range s.tables {
		melts = melts || t.Melts()
		if s.changes[j].Table != nil {
			r.Note("a material changes for good once it has been at " + units.Kelvin.Of(s.changes[j].At).String())
		}
	}
	if melts {
		r.Warn("melting and freezing: what is safe to eat or to step on is decided by measured temperatures, not by a predicted front")
	}
	faces := []shape.Place{shape.Surface()}
	if s.problem.twoFaces() && !s.wall.half {
		faces = append(faces, shape.Opposite())
	}
	heated, quenched := false, false
	for _, face := range faces {
		first, _, high := s.extremes(face)
		heated = heated || high > max(fire, first+1)
		quenched = quenched || first > hot
	}
	const decides = ", and local codes and licensed practice decide"
	if heated {
		r.Warn("fire: a face is heated above " + units.Kelvin.Of(fire).Text(units.Celsius, 0) +
			"; this is conduction alone: spalling, moisture, joints that open and strength are not in it" + decides)
	}
	if quenched {
		r.Warn("quench: this is conduction alone; transformation, distortion and the strength of what is hot are not in it" + decides)
	}
	for _, e := range s.problem.Stop {
		if len(e.places) > 1 {
			r.Warn("cracks: a difference of temperatures is where stress comes from; whether a body cracks depends on its strength, its restraint and its flaws too")
			break
		}
	}
}

// extremes returns the temperature of a face in kelvin at the start, and the least and the greatest at the ends of steps.
func (s *Solution) extremes(face shape.Place) (first, low, high float64) {
	g, err := s.gauge(face)
	if err != nil {
		return 0, 0, 0
	}
	first = s.at(&g, 0)
	low, high = first, first
	for k := range s.fine.history.Steps() + 1 {
		T := s.at(&g, s.fine.history.Time(k))
		low, high = min(low, T), max(high, T)
	}
	return first, low, high
}

// deriveErrors adds the estimates, and warnings where they are large.
func (s *Solution) deriveErrors(r *derivation.Record) {
	for _, w := range s.warnings {
		r.Warn(w)
	}
	r.AddNumber("ε,Q", "residual of the heat balance", s.EnergyBalance(), "largest, of the heat exchanged")
	if s.coarseFailure != nil {
		r.Warn("no estimate of the errors: " + s.coarseFailure.Error())
		return
	}
	of := "largest over the run; difference to steps of half the length"
	if s.halved == nil {
		of = "sum over all steps"
	}
	r.Add("δT,step", "step error, estimate", units.KelvinDifference.Of(s.worst.steps), of)
	how := "largest over the run; difference to " + strconv.Itoa(s.wall.count(1)) + " cells"
	if s.weight != 0 {
		how = "largest over the run; what is extrapolated from " + strconv.Itoa(s.wall.count(0)) + " and " + strconv.Itoa(s.wall.count(1)) +
			" cells against one grid coarser"
	}
	r.Add("δT,c", "grid error of the centre, estimate", units.KelvinDifference.Of(s.worst.centre), how)
	r.Add("δT,s", "grid error of the surface, estimate", units.KelvinDifference.Of(s.worst.surface), how)
	r.Add("δT,m", "grid error of the mean, estimate", units.KelvinDifference.Of(s.worst.mean), how)
	if asked := s.problem.Accuracy; asked.SI() != 0 {
		if s.worst.all > asked.SI() {
			r.Warn("the estimated error, " + units.KelvinDifference.Of(s.worst.all).String() + ", exceeds the accuracy that was asked for, " + asked.String())
		}
		return
	}
	first, low, high := s.extremes(shape.Surface())
	span := max(first-low, high-first)
	if worst := max(s.worst.centre, s.worst.mean); worst > warnAt*span {
		r.Warn("the estimated grid error of centre or mean exceeds 0.1 % of the temperature change; take more cells")
	}
	if s.worst.steps > warnAt*span {
		r.Warn("the estimated error of the steps exceeds 0.1 % of the temperature change; take a smaller tolerance")
	}
}

// warnAt is the part of the temperature change of the surface above which an error is worth a warning where no accuracy was
// asked for.
const warnAt = 1e-3

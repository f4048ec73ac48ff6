package fdm

import (
	"strconv"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
)

// Derivation returns how the solution was obtained: the body, the grid, the table of the material, the
// steps, the estimates of error and the state at the end, with sources, notes and warnings. For constant
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
	r.Source("finite volumes with enthalpy as the state: S. V. Patankar, Numerical Heat Transfer and Fluid Flow, 1980 (from memory)")
	r.Source("steps in time: G. Steinebach, Preprint 1741, TH Darmstadt, 1995, as in E. Hairer and G. Wanner, " +
		"Solving Ordinary Differential Equations II, section IV.7 (coefficients from memory, order conditions recomputed)")
	for _, source := range s.problem.Sources {
		r.Source(source)
	}
	for _, note := range s.problem.Notes {
		r.Note(note)
	}
	return r
}

// deriveBody adds the body, its material at the start, and its surface.
func (s *Solution) deriveBody(r *derivation.Record) {
	body, m := s.problem.Body, s.problem.Material
	radius := body.ConductionLength()
	if d := body.Diameter(); d.SI() != 0 {
		r.Add("D", "diameter", d, "")
	}
	r.Add("R", "conduction length", radius, "longest way of the heat to the exposed surface")
	r.Add("A", "exposed surface", body.Area(), "")
	r.Add("V", "volume", body.Volume(), "")
	r.Add("ρ", "density", m.Density(), "")
	r.Add("T0", "temperature at the start", s.problem.Initial, "")
	// The material gave these values before, when its table was made.
	k, _ := m.Conductivity(s.problem.Initial)
	c, _ := m.SpecificHeat(s.problem.Initial)
	r.Add("k0", "conductivity at the start", k, "")
	r.Add("c0", "specific heat at the start", c, "")
	constant := s.table.Constant()
	if constant {
		alpha := units.SquareMetrePerSecond.Of(k.SI() / (m.Density().SI() * c.SI()))
		r.Add("α", "thermal diffusivity", alpha, "k0 / (ρ c0)")
		r.Add("R²/α", "time of the Fourier number 1", units.Second.Of(radius.SI()*radius.SI()/alpha.SI()), "R² / α")
	} else {
		r.Note("conductivity or specific heat depends on temperature")
	}
	h, ambient, ok := s.problem.Surface.Constants()
	if !ok {
		r.Note("the exchange at the surface is a function of time and surface temperature, of which the solver knows no more")
		return
	}
	r.Add("h", "heat transfer coefficient", h, "")
	r.Add("T∞", "ambient temperature", ambient, "")
	if constant {
		r.AddNumber("Bi", "Biot number", h.SI()*radius.SI()/k.SI(), "h R / k0")
	}
}

// deriveRun adds the grid, the table and the steps.
func (s *Solution) deriveRun(r *derivation.Record) {
	st := s.Statistics()
	nodes := s.fine.system.Grid.Nodes
	n := len(nodes) - 1
	r.AddNumber("N", "cells between centre and surface", float64(st.Cells), "nodes at both ends and between")
	r.Add("Δr,c", "largest cell, at the centre", units.Metre.Of(nodes[1]-nodes[0]), "")
	r.Add("Δr,s", "smallest cell, at the surface", units.Metre.Of(nodes[n]-nodes[n-1]), "")
	r.AddNumber("n,table", "intervals of the table of the material", float64(s.table.Size()), "temperature and ∫k dT over enthalpy, cubic")
	r.Add("δT,table", "error of the table", units.KelvinDifference.Of(s.table.Error), "with half the intervals, midway between nodes")
	r.Add("tol", "tolerance of a step", units.KelvinDifference.Of(s.problem.tolerance()), "estimated error, largest over the body")
	r.AddNumber("n", "steps", float64(st.Steps), "")
	r.AddNumber("n,rejected", "steps repeated", float64(st.Rejected), "")
	r.AddNumber("n,f", "evaluations", float64(st.Evaluations), "")
}

// deriveEnd adds the state at the end.
func (s *Solution) deriveEnd(r *derivation.Record) {
	end := s.Horizon()
	tr, m := s.fine, s.problem.Material
	last := len(tr.system.Grid.Nodes) - 1
	y := tr.history.State(tr.history.Steps())
	mean := units.Kelvin.Of(tr.system.MeanTemperature(y[last+1]))
	r.Add("t,end", "end of the solution", end, "")
	r.Add("T,c", "temperature of the centre then", units.Kelvin.Of(tr.system.NodeTemperature(0, y[0])), "")
	r.Add("T,s", "temperature of the surface then", units.Kelvin.Of(tr.system.NodeTemperature(last, y[last])), "")
	r.Add("T,m", "mean temperature then", mean, "at the mean enthalpy")
	before, err0 := m.Enthalpy(s.problem.Initial)
	after, err1 := m.Enthalpy(mean)
	how := ""
	if err0 == nil && err1 == nil {
		r.Add("i0", "specific enthalpy at the start", before, "")
		r.Add("i,m", "specific enthalpy then", after, "at T,m")
		how = "ρ V (i0 − i,m)"
	}
	r.Add("Q", "heat released", units.Joule.Of(y[last+1]), how)
	switch _, _, constant := s.problem.Surface.Constants(); {
	case s.limit.failure != nil:
		r.Note("what the body tends to is not known, since the exchange function fails on the way: " + s.limit.failure.Error())
	case s.limit.open:
		r.Note("no temperature without exchange was found within the range of the material at the end of the solution")
	case constant:
		r.Add("T,lim", "temperature that it tends to", units.Kelvin.Of(s.limit.temperature), "")
	default:
		r.Add("T,lim", "temperature that it tends to", units.Kelvin.Of(s.limit.temperature), "no exchange, if conditions stay as at the end")
	}
}

// deriveErrors adds the estimates, and warnings where they are large.
func (s *Solution) deriveErrors(r *derivation.Record) {
	end := s.Horizon().SI()
	r.AddNumber("ε,Q", "residual of the heat balance", s.EnergyBalance(), "largest, of the heat exchanged")
	r.Add("δT,step", "step error, estimate", units.KelvinDifference.Of(s.stepError(end)), "sum over all steps")
	if s.coarseFailure != nil {
		r.Warn("no estimate of the grid error: " + s.coarseFailure.Error())
		return
	}
	how := "largest over the run; difference to " + strconv.Itoa(s.problem.cells()/2) +
		" cells, over " + strconv.FormatFloat(s.refinement(), 'g', 4, 64)
	r.Add("δT,c", "grid error of the centre, estimate", units.KelvinDifference.Of(s.grid[0]), how)
	r.Add("δT,s", "grid error of the surface, estimate", units.KelvinDifference.Of(s.grid[1]), how)
	r.Add("δT,m", "grid error of the mean, estimate", units.KelvinDifference.Of(s.grid[2]), how)
	span := 0.0
	h := s.fine.history
	surface := len(s.fine.system.Grid.Nodes) - 1
	for k := range h.Steps() + 1 {
		T := s.fine.system.NodeTemperature(surface, h.State(k)[surface])
		span = max(span, abs(T-s.problem.Initial.SI()))
	}
	if worst := max(s.grid[0], s.grid[2]); worst > warnAt*span {
		r.Warn("the estimated grid error of centre or mean exceeds 0.1 % of the temperature change; take more cells")
	}
	if s.stepError(end) > 10*warnAt*span {
		r.Warn("the estimated step errors add up to more than 1 % of the temperature change; take a smaller tolerance")
	}
}

// warnAt is the part of the temperature change above which a grid error is worth a warning.
const warnAt = 1e-3

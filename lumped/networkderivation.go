package lumped

import (
	"fmt"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
)

// Derivation returns how the numbers were obtained: nodes, exchanges, time constants and limits. It is the
// caller's own copy.
func (s *NetworkSolution) Derivation() derivation.Record {
	var r derivation.Record
	if s.check(units.Duration{}) != nil {
		return r
	}
	n := &s.network
	r.Title = fmt.Sprintf("Network of %d bodies, one temperature for each", len(n.Nodes))
	for _, node := range n.Nodes {
		r.Add("C("+node.Name+")", "heat capacity, "+node.Name, node.Capacity, "given")
		r.Add("T0("+node.Name+")", "initial temperature, "+node.Name, node.Initial, "given")
		if node.Power.SI() != 0 {
			r.Add("P("+node.Name+")", "power, "+node.Name, node.Power, "given")
		}
	}
	for i, l := range s.wiring.system.Links {
		ends := n.Nodes[l.A].Name + ", " + n.Nodes[l.B].Name
		r.Add(fmt.Sprintf("G%d(%s)", i+1, ends), "conductance, "+ends, units.WattPerKelvin.Of(l.Conductance), "given")
	}
	for i, l := range s.wiring.system.Leaks {
		name := n.Nodes[l.Node].Name
		r.Add(fmt.Sprintf("G%d(%s)", len(s.wiring.system.Links)+i+1, name), "conductance, "+name+" to surroundings", units.WattPerKelvin.Of(l.Conductance), "surroundings "+s.wiring.leaks[i].String())
	}
	for i, tau := range s.TimeConstants() {
		r.Add(fmt.Sprintf("τ%d", i+1), "time constant", tau, "1 / eigenvalue")
	}
	for _, node := range n.Nodes {
		if limit, ok := s.Limit(node.Name); ok {
			how := "steady state"
			if !s.wiring.steady() {
				how += " if conditions stay as at " + units.Second.Of(s.end).String()
			}
			r.Add("T_limit("+node.Name+")", "limit, "+node.Name, limit, how)
		}
	}
	if s.modes != nil {
		r.Note("closed form: a sum of exponentials, from the eigenvalues of C^(−1/2) G C^(−1/2), with the exact response to the surroundings")
	} else {
		r.Add("t_end", "end of the solution", units.Second.Of(s.end), "")
		r.Add("tol", "tolerance of a step", n.Tolerance, "given, or 1 mK")
		r.AddNumber("steps", "steps", float64(s.steps), "")
		r.Note(fmt.Sprintf("integrated, with %d exchanges that are not linear", len(s.wiring.flows)+len(s.wiring.faces)))
		r.Source("integration: G. Steinebach, Order-reduction of ROW methods for DAEs and method of lines applications, Preprint 1741, TH Darmstadt, 1995 (coefficients from memory)")
	}
	r.Note("each node is at one temperature; what that costs inside a node is not in these numbers")
	r.Warn(caution)
	for _, text := range n.Sources {
		r.Source(text)
	}
	for _, text := range n.Notes {
		r.Note(text)
	}
	return r
}

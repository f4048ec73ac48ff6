package lumped

import (
	"fmt"
	"slices"

	"example.com/coolward/internal/linear"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// A wiring is a network that has been checked, with numbers for names.
type wiring struct {
	index  map[string]int
	system linear.Network
	start  []float64         // K
	power  []float64         // W into each node
	leaks  []boundary.Course // behind each leak of the system
	flows  []flow
	faces  []face
}

// A flow is a link that is not a conductance; to is −1 if it ends at a course.
type flow struct {
	name     string
	from, to int
	reversed bool // the link is stated from the surroundings to the node
	course   boundary.Course
	power    func(from, to units.Temperature) (units.Power, error)
}

// A face is an exposure that is not linear.
type face struct {
	node    int
	area    float64
	surface boundary.Condition
}

func (w *wiring) linear() bool { return len(w.flows) == 0 && len(w.faces) == 0 }

// steady reports whether the network is linear and nothing around it changes.
func (w *wiring) steady() bool {
	for _, c := range w.leaks {
		if _, ok := c.Steady(); !ok {
			return false
		}
	}
	return w.linear()
}

// wire checks the network.
func (n *Network) wire() (*wiring, error) {
	w := &wiring{index: map[string]int{}}
	for _, err := range []error{units.CheckNotNegative("horizon", n.Horizon), units.CheckNotNegative("tolerance", n.Tolerance)} {
		if err != nil {
			return nil, err
		}
	}
	if n.Tolerance.SI() == 0 {
		n.Tolerance = units.KelvinDifference.Of(defaultTolerance)
	}
	if len(n.Nodes) == 0 {
		return nil, &units.ArgumentError{Field: "network: nodes", Accepted: "one node or more"}
	}
	for _, node := range n.Nodes {
		if err := w.addNode(node); err != nil {
			return nil, err
		}
	}
	courses := map[string]boundary.Course{}
	for _, around := range n.Surroundings {
		_, isNode := w.index[around.Name]
		_, twice := courses[around.Name]
		if isNode || twice {
			return nil, sameName(around.Name)
		}
		if err := around.Temperature.Check(); err != nil {
			return nil, fmt.Errorf("surroundings %q: %w", around.Name, err)
		}
		courses[around.Name] = around.Temperature
	}
	for _, link := range n.Links {
		if err := w.addLink(link, courses); err != nil {
			return nil, err
		}
	}
	for _, exposure := range n.Exposures {
		if err := w.addExposure(exposure); err != nil {
			return nil, err
		}
	}
	return w, nil
}

func sameName(name string) error {
	return &units.ArgumentError{Field: "network: name", Value: fmt.Sprintf("%q twice", name), Accepted: "a name of its own for each node and for each of the surroundings"}
}

func (w *wiring) addNode(node Node) error {
	if _, twice := w.index[node.Name]; twice {
		return sameName(node.Name)
	}
	name := fmt.Sprintf("node %q: ", node.Name)
	for _, err := range []error{
		units.CheckPositive(name+"heat capacity", node.Capacity),
		units.CheckTemperature(name+"initial temperature", node.Initial),
		units.CheckFinite(name+"power", node.Power),
	} {
		if err != nil {
			return err
		}
	}
	w.index[node.Name] = len(w.start)
	w.start = append(w.start, node.Initial.SI())
	w.power = append(w.power, node.Power.SI())
	w.system.Capacity = append(w.system.Capacity, node.Capacity.SI())
	return nil
}

func (w *wiring) addLink(link Link, courses map[string]boundary.Course) error {
	name := fmt.Sprintf("link from %q to %q", link.From, link.To)
	from, fromNode := w.index[link.From]
	to, toNode := w.index[link.To]
	_, fromAround := courses[link.From]
	course, toAround := courses[link.To]
	switch {
	case !fromNode && !fromAround:
		return &units.ArgumentError{Field: name, Value: fmt.Sprintf("%q", link.From), Accepted: "the name of a node or of surroundings"}
	case !toNode && !toAround:
		return &units.ArgumentError{Field: name, Value: fmt.Sprintf("%q", link.To), Accepted: "the name of a node or of surroundings"}
	case !fromNode && !toNode:
		return &units.ArgumentError{Field: name, Value: "two surroundings", Accepted: "at least one node"}
	case fromNode && toNode && from == to:
		return &units.ArgumentError{Field: name, Value: "a node with itself", Accepted: "two ends"}
	case (link.Flow == nil) == (link.Conductance.SI() == 0):
		return &units.ArgumentError{Field: name, Value: link.Conductance, Accepted: "a conductance above 0 W/K or a flow, one of the two"}
	}
	if err := units.CheckNotNegative(name+": conductance", link.Conductance); err != nil {
		return err
	}
	reversed := !fromNode
	if reversed {
		from, to, course = to, from, courses[link.From]
	}
	between := fromNode && toNode
	switch g := link.Conductance.SI(); {
	case link.Flow != nil:
		if !between {
			to = -1
		}
		w.flows = append(w.flows, flow{name, from, to, reversed, course, link.Flow})
	case between:
		w.system.Links = append(w.system.Links, linear.Link{A: from, B: to, Conductance: g})
	default:
		w.addLeak(from, g, course)
	}
	return nil
}

func (w *wiring) addLeak(node int, conductance float64, course boundary.Course) {
	w.system.Leaks = append(w.system.Leaks, linear.Leak{Node: node, Conductance: conductance})
	w.leaks = append(w.leaks, course)
}

func (w *wiring) addExposure(e Exposure) error {
	node, ok := w.index[e.Node]
	if !ok {
		return &units.ArgumentError{Field: "exposure: node", Value: fmt.Sprintf("%q", e.Node), Accepted: "the name of a node"}
	}
	if err := units.CheckPositive(fmt.Sprintf("exposure of %q: area", e.Node), e.Area); err != nil {
		return err
	}
	if err := e.Surface.CheckExchange(); err != nil {
		return fmt.Errorf("exposure of %q: %w", e.Node, err)
	}
	area := e.Area.SI()
	for _, part := range e.Surface.Parts() {
		if h, ambient, ok := part.Constants(); ok {
			w.addLeak(node, h.SI()*area, boundary.Steady(ambient))
		} else if h, course, ok := part.Following(); ok {
			w.addLeak(node, h.SI()*area, course)
		} else if q, ok := part.ConstantFlux(); ok {
			w.power[node] -= q.SI() * area
		} else {
			w.faces = append(w.faces, face{node, area, part})
		}
	}
	return nil
}

// checkCourses returns an error for surroundings that have no temperature up to the horizon.
func (w *wiring) checkCourses(horizon units.Duration) error {
	for _, c := range w.courses() {
		if mean, amplitude, _, _, ok := c.Oscillation(); ok && mean.SI() <= amplitude.Abs().SI() {
			return &units.ArgumentError{Field: "surroundings", Value: c.String(), Accepted: "temperatures above 0 K"}
		}
		if _, err := c.At(horizon); err != nil {
			return err
		}
	}
	return nil
}

// courses returns every course of the network.
func (w *wiring) courses() []boundary.Course {
	courses := slices.Clone(w.leaks)
	for _, f := range w.flows {
		if f.to < 0 {
			courses = append(courses, f.course)
		}
	}
	for _, f := range w.faces {
		courses = append(courses, f.surface.Courses()...)
	}
	return courses
}

// pieces returns the times from 0 to the end between which every course is smooth.
func (w *wiring) pieces(end float64) []float64 {
	times := []float64{0}
	for _, c := range w.courses() {
		for _, bend := range c.Bends() {
			if bend.SI() < end {
				times = append(times, bend.SI())
			}
		}
	}
	slices.Sort(times)
	return slices.Compact(append(slices.Compact(times), end))
}

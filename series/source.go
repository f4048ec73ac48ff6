package series

import (
	"math"
	"slices"

	wallmodes "example.com/coolward/internal/wall"
	"example.com/coolward/units"
)

// A SourceReading is the heat that is set free in a body at one time. Between readings it is linear; two at the same time are
// a step.
type SourceReading struct {
	Time   units.Duration   // the first is 0, none is before the one before it
	Source units.HeatSource // one that takes up heat is negative
}

// sourceCourse checks a log and returns it for the modes; the log ends the solution.
func (p *Problem) sourceCourse(w *wall) (wallmodes.Course, error) {
	var c wallmodes.Course
	if len(p.SourceLog) == 0 {
		return c, nil
	}
	last := 0.0
	for i, r := range p.SourceLog {
		if err := units.CheckNotNegative("source log: time", r.Time); err != nil {
			return c, err
		}
		if err := units.CheckFinite("source log: source", r.Source); err != nil {
			return c, err
		}
		switch t := r.Time.SI(); {
		case i == 0 && t != 0:
			return c, &units.ArgumentError{Field: "source log: first time", Value: r.Time, Accepted: "0 s"}
		case t < last:
			return c, &units.ArgumentError{Field: "source log: time", Value: r.Time, Accepted: "not before the one before it, " + units.Second.Of(last).String()}
		default:
			last = t
		}
		fo, g := last/w.scale, r.Source.SI()*w.length/p.Conductivity.SI()*w.length
		if math.IsInf(fo, 0) || math.IsInf(g, 0) {
			return c, outOfRange("source log: g L²/k in K, or Fourier number", g)
		}
		c.Fo, c.G = append(c.Fo, fo), append(c.G, g)
	}
	if !(last > 0) {
		return c, &units.ArgumentError{Field: "source log: last time", Value: units.Second.Of(last), Accepted: "above 0 s"}
	}
	w.horizon = last
	return c, nil
}

// keep makes the problem independent of what its slices are changed to later.
func (p *Problem) keep() {
	p.Sources, p.Notes, p.SourceLog = slices.Clone(p.Sources), slices.Clone(p.Notes), slices.Clone(p.SourceLog)
}

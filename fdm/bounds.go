package fdm

import (
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// Bounds are temperatures beyond which no place of a body can come: by the maximum principle those of the
// start and of what the faces touch (M. H. Protter and H. F. Weinberger, Maximum Principles in Differential
// Equations, 1967, chapter 3, from memory). The run on each grid keeps them; what is extrapolated from two may
// pass them where heat has come through a few cells only, and is held there.
type bounds struct{ low, high float64 }

// unbounded are those of a problem that does not state them.
var unbounded = bounds{math.Inf(-1), math.Inf(1)}

// boundsOf returns the bounds of a problem without sources that starts at one temperature and whose faces are
// stated by constants.
func boundsOf(p *Problem) bounds {
	if p.Source != nil || p.Profile != nil {
		return unbounded
	}
	e := bounds{p.Initial.SI(), p.Initial.SI()}
	known := e.touch(p.Surface) && e.touch(p.Opposite)
	for _, lump := range []*Lump{p.SurfaceLump, p.OppositeLump} {
		if lump != nil {
			e.add(lump.Initial)
			known = known && e.touch(lump.Exchange)
		}
	}
	if !known {
		return unbounded
	}
	return e
}

func (e *bounds) add(T units.Temperature) {
	e.low, e.high = min(e.low, T.SI()), max(e.high, T.SI())
}

// touch adds what a condition draws a face to, and reports whether that is known.
func (e *bounds) touch(c boundary.Condition) bool {
	if c.IsZero() {
		return true
	}
	for _, part := range c.Parts() {
		rest, ok := part.Rest()
		if !ok {
			return false
		}
		e.add(rest)
	}
	return true
}

// hold returns a corrected temperature as far as the bounds allow, and never less far than the temperature itself is.
func (e *bounds) hold(corrected, T float64) float64 {
	return min(max(corrected, min(e.low, T)), max(e.high, T))
}

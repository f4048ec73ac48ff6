package fv

import (
	"fmt"
	"math"
)

// An Exchange is what leaves through an area, as heat flux: Coefficient (T − Ambient), and what Function
// adds.
type Exchange struct {
	Coefficient, Ambient float64
	Function             func(t, T float64) (float64, error) // nil: nothing
	// Slope gives ∂q/∂T of Function and whether it is known; nil or false: taken by difference.
	Slope func(T float64) (float64, bool)
	// Steady says that Function does not depend on time.
	Steady bool
	// Prescribed gives the temperature that holds instead of an exchange, and its rate; nil: none.
	Prescribed func(t float64) (T, rate float64, err error)
}

// none reports whether nothing is exchanged.
func (e *Exchange) none() bool {
	return e.Coefficient == 0 && e.Function == nil && e.Prescribed == nil
}

// A Lump is a body of one temperature at a face: liquid in a pot, a heater, a room, a thin shell.
type Lump struct {
	Capacity    float64  // J/K
	Coefficient float64  // between it and the face, over the area of the face
	Initial     float64  // K
	Exchange    Exchange // with the rest of the world
	Area        float64  // of that exchange
}

// A Face is an end of the body.
type Face struct {
	Exchange Exchange
	Lump     *Lump // nil: none
}

// A Contact is a resistance between two parts, in m² K/W: a constant, or what a function gives for the
// temperatures of the inner and the outer one.
type Contact struct {
	Resistance float64
	Function   func(inner, outer float64) (float64, error)
}

// What failed, of a [FunctionError].
const (
	Surface      = "exchange at the surface"
	Opposite     = "exchange at the opposite face"
	SurfaceLump  = "exchange of the lump at the surface"
	OppositeLump = "exchange of the lump at the opposite face"
	Source       = "source"
	Between      = "contact"
)

// A FunctionError reports that a function failed or gave a number that cannot be.
type FunctionError struct {
	What              string
	Node              int // where the source is asked for, and the inner node of a contact
	Time, Temperature float64
	Cause             error
}

func (e *FunctionError) Error() string {
	return fmt.Sprintf("%s at %g s and %g K: %v", e.What, e.Time, e.Temperature, e.Cause)
}

// Unwrap returns the cause.
func (e *FunctionError) Unwrap() error { return e.Cause }

// A port is an exchange of one element of the chain.
type port struct {
	Exchange
	what  string
	at    int // index in the chain
	area  float64
	slope float64 // at the state that was linearised: of the heat flow to the enthalpy of the element
	stiff float64 // coefficient that holds a prescribed temperature
}

// flux returns the heat flux.
func (p *port) flux(t, T float64) (float64, error) {
	q := p.Coefficient * (T - p.Ambient)
	if p.Function != nil {
		extra, err := p.Function(t, T)
		if err != nil {
			return 0, &FunctionError{What: p.what, Time: t, Temperature: T, Cause: err}
		}
		q += extra
	}
	if p.Prescribed != nil {
		wanted, _, err := p.Prescribed(t)
		if err != nil {
			return 0, &FunctionError{What: p.what, Time: t, Temperature: T, Cause: err}
		}
		q += p.stiff * (T - wanted)
	}
	if math.IsNaN(q) || math.IsInf(q, 0) {
		return 0, &FunctionError{What: p.what, Time: t, Temperature: T, Cause: fmt.Errorf("heat flux is %g", q)}
	}
	return q, nil
}

const (
	wallStep = 1e-3 // K, for the slope of the flux over the wall temperature
	timeStep = 1e-7 // of the step, for its slope over time
)

// linearise returns the flux and its derivatives to temperature and time.
func (p *port) linearise(t, h, T float64) (q, slope, inTime float64, err error) {
	if q, err = p.flux(t, T); err != nil {
		return 0, 0, 0, err
	}
	slope = p.Coefficient + p.stiff
	if p.Prescribed != nil {
		_, rate, err := p.Prescribed(t)
		if err != nil {
			return 0, 0, 0, &FunctionError{What: p.what, Time: t, Temperature: T, Cause: err}
		}
		return q, slope, -p.stiff * rate, nil
	}
	if p.Function == nil {
		return q, slope, 0, nil
	}
	known := false
	if p.Slope != nil {
		var s float64
		if s, known = p.Slope(T); known {
			slope += s
		}
	}
	if !known {
		d := wallStep
		q1, err := p.flux(t, T+d)
		if err != nil { // T may be at an end of what the function accepts
			d = -d
			if q1, err = p.flux(t, T+d); err != nil {
				return 0, 0, 0, err
			}
		}
		slope = (q1 - q) / d
	}
	if p.Steady {
		return q, slope, 0, nil
	}
	soon := t + timeStep*h
	if soon == t {
		return q, slope, 0, nil
	}
	q1, err := p.flux(soon, T)
	if err != nil {
		return 0, 0, 0, err
	}
	return q, slope, (q1 - q) / (soon - t), nil
}

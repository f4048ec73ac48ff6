package surface

import (
	"fmt"
	"math"

	"example.com/coolward/internal/pow"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Position says how a body lies to the vertical.
type Position uint8

// The positions.
const (
	AnyPosition Position = iota // of a ball, and of a compact body whose height is given or the same in all
	Upright                     // the axis of a cylinder or another round body is vertical, or the faces of a plate are, or the longest edge of a brick
	Level                       // the axis of a cylinder or another round body is horizontal, or the faces of a plate are, with the front up, or the longest edges of a brick
)

// String returns any position, upright or level.
func (p Position) String() string {
	switch p {
	case AnyPosition:
		return "any position"
	case Upright:
		return "upright"
	case Level:
		return "level"
	}
	return "unknown position"
}

// A Stream says how a stream runs to the vertical.
type Stream uint8

// The streams.
const (
	AnyStream Stream = iota // along or across the buoyant flow
	Upward                  // up past the body, along the slope of a plate: against the buoyant flow of a wall that is colder than the fluid
	Downward                // down past it: against the buoyant flow of a wall that is hotter
)

// String returns any stream, upward or downward.
func (s Stream) String() string {
	switch s {
	case AnyStream:
		return "any stream"
	case Upward:
		return "upward"
	case Downward:
		return "downward"
	}
	return "unknown stream"
}

// opposed reports whether the stream runs against the buoyant flow. A fluid below its greatest density sinks where it is heated.
func (c *Convection) opposed(s *surroundings) bool {
	return c.Speed.SI() > 0 && (c.Stream == Upward && s.lift < 0 || c.Stream == Downward && s.lift > 0)
}

// checkStream returns the error for a stream that the form cannot have.
func (c *Convection) checkStream(f form) error {
	switch {
	case c.Stream == AnyStream:
		return nil
	case f == uprightCylinder || f == levelPlate:
		return &units.ArgumentError{Field: "convection: stream", Value: c.Stream, Accepted: "surface.AnyStream: it runs across an upright cylinder, and along a level plate"}
	case c.Stream > Downward:
		return &units.ArgumentError{Field: "convection: stream", Value: c.Stream, Accepted: "surface.AnyStream, surface.Upward or surface.Downward"}
	}
	return nil
}

// A form is what the choice of correlations depends on.
type form uint8

const (
	noForm form = iota
	ballForm
	levelCylinder
	uprightCylinder
	uprightPlate
	levelPlate
	compactBody
)

// form returns the form of the body in its position; noForm if there are no correlations for it.
func (c *Convection) form() form {
	if c.Body.Exposed()&shape.Inside != 0 {
		return noForm
	}
	switch c.Body.Family() {
	case shape.Spherical, shape.HollowSpherical:
		return ballForm
	case shape.Cylindrical, shape.HollowCylindrical:
		switch c.Position {
		case Level:
			return levelCylinder
		case Upright:
			return uprightCylinder
		}
	case shape.Planar:
		switch c.Position {
		case Level:
			return levelPlate
		case Upright:
			return uprightPlate
		}
	case shape.Compact:
		return compactBody
	}
	return noForm
}

// checkForm returns the error for a body without correlations, and for measures that its form needs.
func (c *Convection) checkForm(f form) error {
	switch f {
	case noForm:
		if c.Body.Exposed()&shape.Inside == 0 {
			return &units.ArgumentError{Field: "convection: position", Value: c.Position, Accepted: "surface.Upright or surface.Level for this body"}
		}
		return &units.ArgumentError{Field: "convection: body", Value: c.Body.String(), Accepted: "a body whose outside alone is exposed"}
	case uprightPlate, levelPlate:
		if c.Length.SI() == 0 && f == levelPlate && c.Speed.SI() == 0 && c.Body.Diameter().SI() != 0 {
			break // a level disk at rest
		}
		if err := units.CheckPositive("convection: length", c.Length); err != nil {
			return err
		}
	case compactBody:
		height := c.height()
		if height.SI() == 0 {
			return &units.ArgumentError{
				Field: "convection: length", Value: c.Length,
				Accepted: "the height of the body, or a position that says which of its measures it is: surface.Upright or surface.Level for a brick or a round body",
			}
		}
		if err := units.CheckPositive("convection: length", height); err != nil {
			return err
		}
		// Inscribed radius × surface / volume: 3 in a ball or a cube, 2 in a long cylinder, 1 in a plate.
		area := c.Body.Area().SI()
		if flat := c.Body.ConductionLength().SI() * area / c.Body.Volume().SI(); flat < compactLeast {
			return &units.ArgumentError{Field: "convection: body", Value: c.Body.String(), Accepted: "a body that is not flat; shape.Plate for a flat one"}
		}
		root := math.Sqrt(area)
		if low, high := root/compactFlattest, root/compactTallest; !(height.SI() >= low && height.SI() <= high) {
			return &units.ArgumentError{
				Field: "convection: length", Value: height,
				Accepted: fmt.Sprintf("the height of a body of that surface, %v to %v", units.Metre.Of(low), units.Metre.Of(high)),
			}
		}
	default:
		if c.Length.SI() != 0 {
			return &units.ArgumentError{Field: "convection: length", Value: c.Length, Accepted: "0 for a ball and a long cylinder, whose measures say it"}
		}
	}
	if c.Inclination.SI() == 0 {
		return nil
	}
	if f != uprightPlate {
		return &units.ArgumentError{Field: "convection: inclination", Value: c.Inclination, Accepted: "0° but for an upright plate"}
	}
	if !(c.Inclination.SI() > 0 && c.Inclination.In(units.Degree) <= steepest) {
		return &units.ArgumentError{Field: "convection: inclination", Value: c.Inclination, Accepted: "0° to 60° from the vertical"}
	}
	return nil
}

// Our own constants of bodies that are neither balls nor long cylinders nor plates. Over the bodies that
// correlations.ConvexBodies lists, but the flattest, and cylinders to 20 diameters, the body gravity function lies within 10 % of
// 0.985 (A^(1/2)/(1.9 H))^(1/6) with the height H, and the Nusselt number at rest within 5 % of 3.45.
const (
	compactLeast    = 1.5
	compactRest     = 3.45
	compactGravity  = 0.985
	compactHeight   = 1.9
	compactTallest  = 0.35 // A^(1/2) over height, 0.40 of an upright cylinder of 20 diameters
	compactFlattest = 8.5  // 8.0 of a level one
	compactReach    = 1.70 // largest perimeter across the stream over A^(1/2): 1.77 of a ball, 1.63 of a cube
	compactScatter  = 0.05 // added to the scatter of the correlations

	// A level plate at rest is taken as a thin disk with both faces. The gravity functions of its faces lead to within 6 % of the correlations
	// of the faces at a Rayleigh number of 1e4; the second is that of the flattest body listed.
	plateRest     = 3.1915
	activeGravity = 1.385
	calmGravity   = 0.768

	steepest        = 60  // °
	usualTransition = 5e5 // Reynolds number at which the boundary layer of a plate turns turbulent
)

// lengths are what the groups of a body are on, in m, and what its correlations need besides.
type lengths struct {
	natural, stream, body float64
	rest, gravity         float64 // Nusselt number at rest and body gravity function, on body
	slenderness, height   float64 // height of a compact body, in m
}

func (c *Convection) lengths(l *lengths, f form) {
	switch f {
	case ballForm, levelCylinder:
		d := c.Body.Diameter().SI()
		l.natural, l.stream = d, d
	case uprightCylinder:
		d, area := c.Body.Diameter().SI(), c.Body.Area().SI()
		l.stream = d
		l.natural = area / (math.Pi * d)
		l.body = math.Sqrt(area)
		l.slenderness = l.natural / d
		l.rest = cylinderRest(l.slenderness)
		l.gravity = eighth(math.Pi / l.slenderness)
	case uprightPlate:
		l.natural, l.stream = c.Length.SI(), c.Length.SI()
	case levelPlate:
		area := c.face()
		l.stream = c.Length.SI()
		if d := c.Body.Diameter().SI(); d != 0 {
			l.natural = (d - c.Body.InnerDiameter().SI()) / 4
		} else {
			l.natural = area / (2 * (l.stream + area/l.stream))
		}
		l.body = math.Sqrt(2 * area)
		l.rest, l.gravity = plateRest, calmGravity
	case compactBody:
		l.body = math.Sqrt(c.Body.Area().SI())
		l.natural, l.stream = l.body, l.body
		l.rest = compactRest
		l.height = c.height().SI()
		l.gravity = compactGravity * pow.Of(l.body/(compactHeight*l.height), 1.0/6)
	}
}

// face returns the area of one face of a plate.
func (c *Convection) face() float64 {
	if front, back := c.faces(); front && back {
		return c.Body.Area().SI() / 2
	}
	return c.Body.Area().SI()
}

// faces reports which faces of a plate are exposed. The ends of a disk are both.
func (c *Convection) faces() (front, back bool) {
	exposed := c.Body.Exposed()
	return exposed&(shape.Front|shape.Ends) != 0, exposed&(shape.Back|shape.Ends) != 0
}

// height returns the height of a compact body: the length that is given, else that of the body in its position; 0 if that is open.
func (c *Convection) height() units.Length {
	if c.Length.SI() != 0 {
		return c.Length
	}
	low, high := c.Body.Diameter(), c.Body.Length()
	if high.SI() == 0 {
		a, b, d := c.Body.Edges()
		low = units.Metre.Of(min(a.SI(), b.SI(), d.SI()))
		high = units.Metre.Of(max(a.SI(), b.SI(), d.SI()))
	}
	switch {
	case c.Position == Upright || low == high:
		return high
	case c.Position == Level:
		return low
	}
	return units.Length{}
}

// cylinderRest returns the Nusselt number at rest of a cylinder on the square root of its side, by the formula of
// M. M. Yovanovich to 8 diameters (from memory, see correlations.CylinderBodyNu) and by the capacitance of a slender cylinder of length L,
// L/2 / (ln(2 L/D) − 1 + ln 2), beyond, after J. C. Maxwell (from memory); they are joined between 4 and 8, where they differ
// by less than 3 %. The ends, which are insulated here, are part of both.
func cylinderRest(slenderness float64) float64 {
	w := ramp(pow.Log2(slenderness) - 2)
	nu := 0.0
	if w < 1 {
		nu = (1 - w) * (3.1915 + 2.7726*pow.Of(slenderness, 0.76)) / math.Sqrt(1+2*slenderness)
	}
	if w > 0 {
		nu += w * 2 * math.Sqrt(math.Pi*slenderness) / (math.Log(2*slenderness) - 1 + math.Ln2)
	}
	return nu
}

func eighth(x float64) float64 { return math.Sqrt(math.Sqrt(math.Sqrt(x))) }

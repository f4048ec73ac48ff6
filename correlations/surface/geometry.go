package surface

import (
	"fmt"
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Position says how a body lies to the vertical.
type Position uint8

// The positions.
const (
	AnyPosition Position = iota // of a ball and of a compact body, for which it counts for little
	Upright                     // the axis of a cylinder is vertical, or the faces of a plate are
	Level                       // the axis of a cylinder is horizontal, or the faces of a plate are, with the front up
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
func (c *Convection) checkForm() error {
	f := c.form()
	switch f {
	case noForm:
		if c.Body.Exposed()&shape.Inside == 0 {
			return &units.ArgumentError{Field: "convection: position", Value: c.Position, Accepted: "surface.Upright or surface.Level for this body"}
		}
		return &units.ArgumentError{Field: "convection: body", Value: c.Body.String(), Accepted: "a body whose outside alone is exposed"}
	case uprightPlate, levelPlate:
		if err := units.CheckPositive("convection: length", c.Length); err != nil {
			return err
		}
	case compactBody:
		if err := units.CheckPositive("convection: length", c.Length); err != nil {
			return err
		}
		// Inscribed radius × surface / volume: 3 in a ball or a cube, 2 in a long cylinder, 1 in a plate.
		if flat := c.Body.ConductionLength().SI() / c.Body.VolumeToArea().SI(); flat < compactLeast {
			return &units.ArgumentError{Field: "convection: body", Value: c.Body.String(), Accepted: "a body that is not flat; shape.Plate for a flat one"}
		}
		root := math.Sqrt(c.Body.Area().SI())
		if low, high := root/compactFlattest, root/compactTallest; !(c.Length.SI() >= low && c.Length.SI() <= high) {
			return &units.ArgumentError{
				Field: "convection: length", Value: c.Length,
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

	// A level plate at rest is taken as a thin disk with both faces. The gravity functions of its faces lead to the correlations
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
	slenderness           float64
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
		l.natural = area / (2 * (l.stream + area/l.stream))
		l.body = math.Sqrt(2 * area)
		l.rest, l.gravity = plateRest, calmGravity
	case compactBody:
		l.body = math.Sqrt(c.Body.Area().SI())
		l.natural, l.stream = l.body, l.body
		l.rest = compactRest
		l.gravity = compactGravity * math.Sqrt(math.Cbrt(l.body/(compactHeight*c.Length.SI())))
	}
}

// face returns the area of one face of a plate.
func (c *Convection) face() float64 {
	if c.Body.Exposed() == shape.Front|shape.Back {
		return c.Body.Area().SI() / 2
	}
	return c.Body.Area().SI()
}

// cylinderRest returns the Nusselt number at rest of a cylinder on the square root of its side, by the formula of
// M. M. Yovanovich to 8 diameters (from memory, see correlations.CylinderBodyNu) and by the capacitance of a slender cylinder of length L,
// L/2 / (ln(2 L/D) − 1 + ln 2), beyond, after J. C. Maxwell (from memory); they are joined between 4 and 8, where they differ
// by less than 3 %. The ends, which are insulated here, are part of both.
func cylinderRest(slenderness float64) float64 {
	w := ramp(math.Log2(slenderness) - 2)
	nu := 0.0
	if w < 1 {
		nu = (1 - w) * (3.1915 + 2.7726*math.Pow(slenderness, 0.76)) / math.Sqrt(1+2*slenderness)
	}
	if w > 0 {
		nu += w * 2 * math.Sqrt(math.Pi*slenderness) / (math.Log(2*slenderness) - 1 + math.Ln2)
	}
	return nu
}

func eighth(x float64) float64 { return math.Sqrt(math.Sqrt(math.Sqrt(x))) }

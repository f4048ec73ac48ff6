package shape

import (
	"strings"

	"example.com/coolward/units"
)

// A Face is a part of the surface of a body, or several of them: Outside | Ends.
type Face uint8

// The faces of bodies.
const (
	Outside Face = 1 << iota // all round; the mantle of a cone; all faces of a brick
	Inside                   // of a hollow body
	Ends                     // of a cylinder, a tube or a ring; the base of a cone
	Front                    // of a plate
	Back                     // of a plate
)

// Exposing returns b with the given faces exposed and the others insulated. [Body.Check] refuses faces
// that the form does not have.
func (b Body) Exposing(faces Face) Body {
	b.faces = faces
	return b
}

// Exposed returns the faces of b that are exposed.
func (b Body) Exposed() Face { return b.faces }

var faceNames = []string{"outside", "inside", "ends", "front", "back"}

// String names the faces, such as "outside and ends".
func (f Face) String() string {
	var names []string
	for i, name := range faceNames {
		if f&(1<<i) != 0 {
			names = append(names, name)
		}
	}
	if len(names) == 0 {
		return "no face"
	}
	return strings.Join(names, " and ")
}

// possible returns the faces that the form has.
func (f form) possible() Face {
	switch f {
	case hollowSphere:
		return Outside | Inside
	case cylinder, cone:
		return Outside | Ends
	case tube:
		return Outside | Inside | Ends
	case plate:
		return Front | Back
	}
	return Outside
}

// Check returns an [*units.ArgumentError] if b is the zero Body, if a measure is not finite and above
// zero, if an inner measure is not below the outer one, if no face or a face that the form
// does not have is exposed, and if its area or volume is beyond what a float64 holds.
func (b Body) Check() error {
	if b.sound() {
		return nil
	}
	if b.form == noForm {
		return &units.ArgumentError{Field: "body", Accepted: "a body with its measures, such as shape.Sphere(diameter)"}
	}
	for _, m := range b.measures() {
		if err := m.check(b.name + ": " + m.name); err != nil {
			return err
		}
	}
	switch {
	case (b.form == hollowSphere || b.form == tube) && b.b.SI() >= b.a.SI():
		return &units.ArgumentError{Field: b.name + ": inner diameter", Value: b.b, Accepted: "below the outer diameter of " + b.a.String()}
	case b.form == capsule && b.b.SI() < b.a.SI():
		return &units.ArgumentError{Field: b.name + ": length", Value: b.b, Accepted: "over all, so not below the diameter of " + b.a.String()}
	case b.faces == 0 || b.faces&^b.form.possible() != 0:
		return &units.ArgumentError{Field: b.name + ": exposed faces", Value: b.faces.String(), Accepted: "one or more of: " + b.form.possible().String()}
	}
	if err := units.CheckPositive(b.name+": volume", b.Volume()); err != nil {
		return err
	}
	return units.CheckPositive(b.name+": exposed surface", b.Area())
}

// lengths is the number of lengths that a form has.
var lengths = [...]int{noForm: 0, sphere: 1, hollowSphere: 2, cylinder: 2, tube: 3, plate: 1, brick: 3, cone: 2, capsule: 2, measured: 0}

// sound reports whether Check finds nothing. It is apart from the search for what is wrong because
// an exchange is asked for millions of times, and checks its body each time.
func (b Body) sound() bool {
	if d := b.a.SI(); b.form == sphere && b.faces == Outside && d > 1e-100 && d < 1e100 {
		return true // the common case, with an area and a volume that a float64 surely holds
	}
	for i, l := range [...]units.Length{b.a, b.b, b.c} {
		if i < lengths[b.form] && !(l.SI() > 0 && l.IsFinite()) {
			return false
		}
	}
	a, v := b.Area(), b.Volume()
	return b.form != noForm && b.faces != 0 && b.faces&^b.form.possible() == 0 &&
		!((b.form == hollowSphere || b.form == tube) && b.b.SI() >= b.a.SI()) && !(b.form == capsule && b.b.SI() < b.a.SI()) &&
		a.SI() > 0 && a.IsFinite() && v.SI() > 0 && v.IsFinite() &&
		(b.form != plate || b.area.SI() > 0) && (b.form != measured || b.area.IsFinite())
}

// A measure is a length, an area or a volume of a body with its name.
type measure struct {
	name  string
	text  string
	check func(field string) error
}

func measureOf[D units.Dimension](name string, q units.Quantity[D]) measure {
	return measure{name, q.String(), func(field string) error { return units.CheckPositive(field, q) }}
}

func (b Body) measures() []measure {
	switch b.form {
	case sphere:
		return []measure{measureOf("diameter", b.a)}
	case hollowSphere:
		return []measure{measureOf("outer diameter", b.a), measureOf("inner diameter", b.b)}
	case cylinder, capsule:
		return []measure{measureOf("diameter", b.a), measureOf("length", b.b)}
	case tube:
		return []measure{measureOf("outer diameter", b.a), measureOf("inner diameter", b.b), measureOf("length", b.c)}
	case plate:
		return []measure{measureOf("thickness", b.a), measureOf("area of one face", b.area)}
	case brick:
		return []measure{measureOf("edge", b.a), measureOf("edge", b.b), measureOf("edge", b.c)}
	case cone:
		return []measure{measureOf("base diameter", b.a), measureOf("height", b.b)}
	case measured:
		return []measure{measureOf("volume", b.volume), measureOf("exposed surface", b.area)}
	}
	return nil
}

// String names the body, its measures and, where they are not all, its exposed faces, such as
// "cylinder, diameter 60 mm, length 90 mm, exposed outside".
func (b Body) String() string {
	if b.form == noForm {
		return "no body"
	}
	parts := []string{b.name}
	for _, m := range b.measures() {
		parts = append(parts, m.name+" "+m.text)
	}
	if b.faces != b.form.possible() {
		parts = append(parts, "exposed "+b.faces.String())
	}
	return strings.Join(parts, ", ")
}

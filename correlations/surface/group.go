package surface

import "example.com/coolward/units"

// Group is a [Sum] under one name, for the stages of a [Schedule], for a [Shade], and to account for
// several ways of heat as one.
type Group struct {
	Title string // such as "in the oven"; empty means "group"
	Parts Sum
}

// Name returns the title.
func (g Group) Name() string {
	if g.Title == "" {
		return "group"
	}
	return g.Title
}

// Check returns the error of [Sum.Check].
func (g Group) Check() error { return g.Parts.Check() }

// Flux returns the flux of the sum.
func (g Group) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	return g.Parts.Flux(t, wall)
}

// Low returns the group with every part at its lower end.
func (g Group) Low() Part { return Group{g.Title, g.Parts.Low()} }

// High returns the group with every part at its upper end.
func (g Group) High() Part { return Group{g.Title, g.Parts.High()} }

// Sources returns those of the parts.
func (g Group) Sources() []string { return g.Parts.Sources() }

// Notes returns those of the parts.
func (g Group) Notes() []string { return g.Parts.Notes() }

// Warnings returns those of the parts.
func (g Group) Warnings() []string { return g.Parts.Warnings() }

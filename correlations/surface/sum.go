package surface

import (
	"fmt"
	"math"

	"example.com/coolward/units"
)

// A Part is one way of heat at a surface: [Convection], [Radiation], or a type of the user.
type Part interface {
	// Name says which way of heat it is, such as "radiation".
	Name() string

	// Check returns an [*units.ArgumentError] if the part is not usable.
	Check() error

	// Flux returns the flux that leaves the body at time t when its surface is at temperature wall.
	Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error)

	// Low and High return the same part at the lower and at the upper end of what is known of it.
	Low() Part
	High() Part

	// Sources, Notes and Warnings go into the derivation of an answer.
	Sources() []string
	Notes() []string
	Warnings() []string
}

// A Sum is several ways of heat at one surface, which add. Its Flux is an exchange that
// boundary.Function takes. Whoever changes the elements of a Sum changes it for all who hold it.
type Sum []Part

// Check returns the error of the first part that is not usable, and an [*units.ArgumentError] if
// there is none at all.
func (s Sum) Check() error {
	if len(s) == 0 {
		return &units.ArgumentError{Field: "surface: sum", Accepted: "at least one part, such as surface.Convection or surface.Radiation"}
	}
	for i, p := range s {
		if p == nil {
			return missing(i)
		}
		if err := p.Check(); err != nil {
			return err
		}
	}
	return nil
}

func missing(i int) error {
	return &units.ArgumentError{Field: fmt.Sprintf("surface: part %d of the sum", i+1), Accepted: "such as surface.Convection or surface.Radiation"}
}

// Flux returns the sum of the fluxes of the parts, positive out of the body. It returns the first
// error of a part, and an [*units.ArgumentError] for an empty Sum.
func (s Sum) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if len(s) == 0 {
		return units.HeatFlux{}, s.Check()
	}
	total := 0.0
	for i, p := range s {
		if p == nil {
			return units.HeatFlux{}, missing(i)
		}
		q, err := p.Flux(t, wall)
		if err != nil {
			return units.HeatFlux{}, err
		}
		total += q.SI()
	}
	return finite("surface: sum of the fluxes", total)
}

// A Portion is what one part contributes to a [Sum].
type Portion struct {
	Name  string
	Flux  units.HeatFlux // positive out of the body
	Share float64        // of the sum of the magnitudes of all fluxes, with the sign of Flux; 0 if none flows
}

// Parts returns what each part contributes, in the order of s. Its errors are those of [Sum.Flux].
func (s Sum) Parts(t units.Duration, wall units.Temperature) ([]Portion, error) {
	if len(s) == 0 {
		return nil, s.Check()
	}
	portions := make([]Portion, len(s))
	total := 0.0
	for i, p := range s {
		if p == nil {
			return nil, missing(i)
		}
		q, err := p.Flux(t, wall)
		if err != nil {
			return nil, err
		}
		portions[i] = Portion{Name: p.Name(), Flux: q}
		total += math.Abs(q.SI())
	}
	if _, err := finite("surface: sum of the magnitudes of the fluxes", total); err != nil {
		return nil, err
	}
	for i := range portions {
		if total > 0 {
			portions[i].Share = portions[i].Flux.SI() / total
		}
	}
	return portions, nil
}

// Low returns the same sum with every part at its lower end: correlations at the lower limit of
// their scatter and emissivities at the lower end of their band, all of them at once. That is farther
// out than the scatter of independent parts would be.
func (s Sum) Low() Sum { return s.each(Part.Low) }

// High returns the same sum with every part at its upper end, all of them at once.
func (s Sum) High() Sum { return s.each(Part.High) }

func (s Sum) each(end func(Part) Part) Sum {
	ends := make(Sum, len(s))
	for i, p := range s {
		if p != nil {
			ends[i] = end(p)
		}
	}
	return ends
}

// Sources returns the sources of all parts, each once.
func (s Sum) Sources() []string { return s.texts(Part.Sources) }

// Notes returns the assumptions of all parts, each once.
func (s Sum) Notes() []string { return s.texts(Part.Notes) }

// Warnings returns the warnings of all parts, each once.
func (s Sum) Warnings() []string { return s.texts(Part.Warnings) }

func (s Sum) texts(of func(Part) []string) []string {
	var list []string
	seen := map[string]bool{}
	for _, p := range s {
		if p == nil {
			continue
		}
		for _, text := range of(p) {
			if !seen[text] {
				seen[text] = true
				list = append(list, text)
			}
		}
	}
	return list
}

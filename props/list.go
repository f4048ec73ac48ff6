package props

import (
	"iter"
	"slices"
	"strconv"
	"strings"

	"example.com/coolward/units"
)

// Solids iterates over the solids of the package.
func Solids() iter.Seq[Solid] {
	return slices.Values([]Solid{
		CarbonSteel(), StainlessSteel(), Copper(), Aluminium(), Glass(), Concrete(), PVC(), Softwood(),
	})
}

// Fluids iterates over the fluids of the package.
func Fluids() iter.Seq[Medium] {
	return slices.Values([]Medium{Air(), Water()})
}

// FindSolid returns the solid of the package with the name or synonym, in upper or lower case. It returns a
// [*units.ArgumentError] that lists the names if there is none.
func FindSolid(name string) (Solid, error) { return find("props.FindSolid", name, Solids()) }

// FindFluid returns the fluid of the package with the name or synonym, in upper or lower case. It returns a
// [*units.ArgumentError] that lists the names if there is none.
func FindFluid(name string) (Medium, error) { return find("props.FindFluid", name, Fluids()) }

// find returns the substance that is called name.
func find[S interface {
	Name() string
	Synonyms() []string
}](who, name string, all iter.Seq[S]) (S, error) {
	wanted := strings.TrimSpace(name)
	var known []string
	for s := range all {
		for _, n := range append(s.Synonyms(), s.Name()) {
			if strings.EqualFold(n, wanted) {
				return s, nil
			}
		}
		known = append(known, s.Name())
	}
	var none S
	return none, &units.ArgumentError{Field: who + ": name", Value: strconv.Quote(name), Accepted: strings.Join(known, ", ")}
}

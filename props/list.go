package props

import (
	"iter"
	"slices"
	"strconv"
	"strings"
	"sync"
	"unicode"

	"example.com/coolward/units"
)

// Solids iterates over the solids of the package. [Search] finds those whose name contains a text.
func Solids() iter.Seq[Solid] {
	return slices.Values(library())
}

// library holds the solids. Those with a function of their own come first; the tables are made when somebody first
// asks for them.
var library = sync.OnceValue(func() []Solid {
	return slices.Concat(
		[]Solid{CarbonSteel(), StainlessSteel(), Copper(), Aluminium(), Glass(), Concrete(), PVC(), Softwood(), Ice()},
		tabledMetals(), technicalAlloys(), fireMaterials(), ceramics(), plastics(), buildingMaterials(), insulation(), commonMaterials(), soils(), foods(), tissues(),
	)
})

// Fluids iterates over the fluids of the package.
func Fluids() iter.Seq[Medium] {
	return slices.Values([]Medium{
		Air(), Water(), PressurisedWater(), Steam(),
		CompressedAir(), Nitrogen(), Oxygen(), Argon(), CarbonDioxide(), Hydrogen(), Helium(),
		EngineOil(), Glycerin(), Mercury(), Sodium(), Ammonia(),
	})
}

// FindSolid returns the solid of the package with the name or synonym, in upper or lower case. It returns a
// [*units.ArgumentError] that names those with a word in common if there is none.
func FindSolid(name string) (Solid, error) {
	if s, ok := solidNames()[strings.ToLower(strings.TrimSpace(name))]; ok {
		return s, nil
	}
	return find("props.FindSolid", name, Solids())
}

// solidNames holds the solids by their names and synonyms in lower case.
var solidNames = sync.OnceValue(func() map[string]Solid {
	of := map[string]Solid{}
	for s := range Solids() {
		for _, n := range names(s) {
			of[strings.ToLower(n)] = s
		}
	}
	return of
})

// FindFluid returns the fluid of the package with the name or synonym, in upper or lower case. It returns a
// [*units.ArgumentError] that lists the names if there is none.
func FindFluid(name string) (Medium, error) { return find("props.FindFluid", name, Fluids()) }

// find returns the substance that is called name.
func find[S Substance](who, name string, all iter.Seq[S]) (S, error) {
	wanted := strings.TrimSpace(name)
	for s := range all {
		if slices.ContainsFunc(names(s), func(n string) bool { return strings.EqualFold(n, wanted) }) {
			return s, nil
		}
	}
	var none S
	return none, &units.ArgumentError{Field: who + ": name", Value: strconv.Quote(name), Accepted: accepted(wanted, all)}
}

// accepted lists the names, or those nearest to wanted if they are many.
func accepted[S Substance](wanted string, all iter.Seq[S]) string {
	const many = 40
	var known, near []string
	words := strings.FieldsFunc(strings.ToLower(wanted), func(r rune) bool { return !unicode.IsLetter(r) && !unicode.IsDigit(r) })
	for s := range all {
		known = append(known, s.Name())
		if slices.ContainsFunc(words, func(w string) bool { return len(w) > 2 && contains(s, w) }) {
			near = append(near, s.Name())
		}
	}
	switch {
	case len(known) <= many:
		return strings.Join(known, ", ")
	case len(near) == 0:
		return "one of the " + strconv.Itoa(len(known)) + " names and their synonyms, such as " + strings.Join(known[:8], ", ")
	case len(near) > many:
		near = append(near[:many], "…")
	}
	return strings.Join(near, ", ")
}

// A Substance is what solids and fluids have in common.
type Substance interface {
	Name() string
	Synonyms() []string
	Source() string
	Range() (low, high units.Temperature)
	UncertaintySource() string
}

var (
	_ Substance = Solid{}
	_ Substance = Medium{}
)

// Search iterates over the solids and fluids of the package whose name or a synonym of which contains the text, in
// upper or lower case. Every name contains the empty text.
func Search(text string) iter.Seq[Substance] {
	wanted := strings.ToLower(strings.TrimSpace(text))
	return func(yield func(Substance) bool) {
		for s := range Solids() {
			if contains(s, wanted) && !yield(s) {
				return
			}
		}
		for f := range Fluids() {
			if contains(f, wanted) && !yield(f) {
				return
			}
		}
	}
}

// contains reports whether a name of s contains the text, which is in lower case.
func contains(s Substance, text string) bool {
	return slices.ContainsFunc(names(s), func(n string) bool { return strings.Contains(strings.ToLower(n), text) })
}

func names(s Substance) []string { return append(s.Synonyms(), s.Name()) }

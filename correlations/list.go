package correlations

import (
	"iter"
	"strings"

	"example.com/coolward/units"
)

// All lists every correlation of the package, in the order of its body and regime.
func All() iter.Seq[Correlation] {
	return func(yield func(Correlation) bool) {
		for _, d := range [...]*record{&sphereConduction, &churchillSphere, &ranzMarshallSphere, &whitakerSphere} {
			if !yield(Correlation{d}) {
				return
			}
		}
	}
}

// Lookup returns the correlation of that name. It returns an [*units.ArgumentError] that lists the
// names if there is none.
func Lookup(name string) (Correlation, error) {
	var names []string
	for c := range All() {
		if c.Name() == name {
			return c, nil
		}
		names = append(names, `"`+c.Name()+`"`)
	}
	return Correlation{}, &units.ArgumentError{Field: "correlation", Value: name, Accepted: strings.Join(names, ", ")}
}

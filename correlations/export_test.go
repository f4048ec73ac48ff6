package correlations

import "math/rand/v2"

// For the tests from outside.
var (
	Middle = middle
	Set    = set
)

// Random returns groups that are in every range of c, and whether it found any.
func Random(c Correlation, random *rand.Rand) (Groups, bool) {
	for range 1000 {
		if g := draw(c, random, groupCount, 0); c.Admits(g) {
			return g, true
		}
	}
	return Groups{}, false
}

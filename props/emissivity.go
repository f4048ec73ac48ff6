package props

import (
	"iter"
	"math"
	"strings"

	"example.com/coolward/units"
)

// An Emissivity is the range of the total emissivity of a kind of surface, as found in tables. For a metal it depends
// on oxide, roughness and temperature, and a piece at hand may lie 30 % to 50 % outside; for other surfaces and paints
// 0.05 (our own estimate). Most of the values are for radiation along the normal: over all directions metals emit 1.1
// to 1.3 times as much, others 0.95 times (from memory).
type Emissivity struct {
	Surface     string
	Low, High   units.Temperature // where it was found; 0 K for both if the source does not say
	Least, Most float64
	Source      string
}

// Emissivities iterates over the surfaces whose name contains the text, in upper or lower case; the empty text is
// contained in all.
func Emissivities(text string) iter.Seq[Emissivity] {
	wanted := strings.ToLower(strings.TrimSpace(text))
	return func(yield func(Emissivity) bool) {
		for _, r := range surfaceRows() {
			if !strings.Contains(strings.ToLower(r.surface), wanted) {
				continue
			}
			e := Emissivity{Surface: r.surface, Least: r.least, Most: r.most, Source: r.source}
			if !math.IsNaN(r.from) {
				e.Low, e.High = units.Celsius.Of(r.from), units.Celsius.Of(r.to)
			}
			if !yield(e) {
				return
			}
		}
	}
}

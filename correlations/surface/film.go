package surface

import (
	"iter"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

// A Film is how convection stands at one wall temperature: the coefficient and everything that it
// was made from.
type Film struct {
	Coefficient units.HeatTransferCoefficient // mean over the surface, h = Nu k / L
	Scatter     float64                       // relative, h (1 ± Scatter); of the parts, weighted by their shares
	Regime      correlations.Regime           // names the parts that h would change by 1 % or more without

	Nu float64 // Nusselt number, on the conductivity at the reference temperature of its correlation; in a blend, on that weighted by the shares
	Re float64 // Reynolds number at the free stream; 0 at rest
	Pr float64 // Prandtl number at the film temperature
	Gr float64 // Grashof number at the film temperature, g |β ΔT| L³/ν²
	Ra float64 // Rayleigh number at the film temperature, Gr Pr

	Temperature units.Temperature // of the film, the mean of wall and ambient

	// The shares of h, which add up to 1: what conduction alone would give, what the stream adds and
	// what buoyancy adds.
	ConductionShare, ForcedShare, NaturalShare float64

	// Extrapolated is true if a correlation was used outside its published range, because the caller
	// asked for it. A part too small to matter does not count.
	Extrapolated bool

	// Handover names the band of Reynolds numbers in which one correlation hands over to another, if
	// the film lies in it. It is empty otherwise.
	Handover string

	used  [3]Use
	count int
}

// A Use is one correlation at work in a film.
type Use struct {
	Correlation correlations.Correlation
	Groups      correlations.Groups // at the reference temperature of the correlation
	Nu          float64             // what the correlation alone gives
	Weight      float64             // among the correlations of its regime: 1 unless one hands over to another

	// Negligible is true if the groups lie outside the published range, and h would change by less
	// than 1 % even if this part were three times as large.
	Negligible bool
}

// Used lists the correlations that made the film.
func (f Film) Used() iter.Seq[Use] {
	return func(yield func(Use) bool) {
		for _, u := range f.used[:f.count] {
			if !yield(u) {
				return
			}
		}
	}
}

// Film returns how the convection stands when the surface is at temperature wall. A wall at ambient
// temperature is the limit of a small difference: Nu = 2 in a fluid at rest.
//
// It returns the errors of [Convection.Check] and of the fluid, and a [*units.RangeError] if a part
// that matters lies outside the published range of its correlation: if h would change by 1 % or more
// were that part three times as large as the formula gives it there.
//
// In a liquid the wall must be within the range of the liquid too. A liquid whose density has a
// maximum between wall and ambient, such as water near 4 °C, is outside the range of natural
// convection.
func (c Convection) Film(wall units.Temperature) (Film, error) {
	var f Film
	if err := c.film(&f, wall); err != nil {
		return Film{}, err
	}
	return f, nil
}

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

	Length       units.Length // of Nu, Gr and Ra: diameter of a ball or a level cylinder, height of an upright cylinder or plate, face over perimeter of a level plate, square root of the surface of another body
	StreamLength units.Length // of Re: diameter of a ball or a cylinder, length of a plate, square root of the surface of another body

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

	// Opposed is true if the stream runs against the buoyant flow. Alike is true if then, besides, what one of the two gives beyond rest
	// is 0.5 to 2 times what the other does: there no formula is known to hold, and the scatter reaches up to the larger of the two.
	Opposed, Alike bool

	// Handover names the band of groups in which one correlation hands over to another, if the film lies in
	// one, or those of two. It is empty otherwise.
	Handover string

	shared correlations.Groups // of all uses; Re, Pr, Ra and Gravity are each one's own
	used   [5]use
	count  int
}

// A Use is one correlation at work in a film.
type Use struct {
	Correlation correlations.Correlation
	Length      units.Length        // that the groups and Nu are on
	Groups      correlations.Groups // at the reference temperature of the correlation
	Nu          float64             // what the correlation alone gives
	Weight      float64             // among the correlations of its regime: 1 unless one hands over to another

	// Negligible is true if the groups lie outside the published range, and h would change by less
	// than 1 % even if this part were three times as large.
	Negligible bool
}

// A use is a [Use] without what all uses of a film share.
type use struct {
	with                correlations.Correlation
	length              float64 // m
	re, pr, ra, gravity float64
	nu, weight          float64
	rest                float64 // what of nu is there at rest
	scale               float64 // of the correlation, 1 but where it is evaluated at another Rayleigh number
	negligible          bool
}

// groups returns the groups of a use.
func (f *Film) groups(u *use) correlations.Groups {
	g := f.shared
	g.Re, g.Pr, g.Ra, g.Gravity = u.re, u.pr, u.ra, u.gravity
	return g
}

// Used lists the correlations that made the film.
func (f Film) Used() iter.Seq[Use] {
	return func(yield func(Use) bool) {
		for i := range f.used[:f.count] {
			u := &f.used[i]
			if !yield(Use{
				Correlation: u.with, Length: units.Metre.Of(u.length), Groups: f.groups(u),
				Nu: u.nu, Weight: u.weight, Negligible: u.negligible,
			}) {
				return
			}
		}
	}
}

// Film returns how the convection stands when the surface is at temperature wall. A wall at ambient
// temperature is the limit of a small difference: Nu = 2 of a ball in a fluid at rest.
//
// It returns the errors of [Convection.Check] and of the fluid, and a [*units.RangeError] if a part
// that matters lies outside the published range of its correlation: if h would change by 1 % or more
// were that part three times as large as the formula gives it there.
//
// In a liquid the wall must be within the range of the liquid too. A liquid whose density has a
// maximum between wall and ambient, such as water near 4 °C, is outside the range of natural
// convection.
func (c Convection) Film(wall units.Temperature) (f Film, err error) {
	var s surroundings
	if err = c.film(&f, &s, wall); err != nil {
		return Film{}, err
	}
	return f, nil
}

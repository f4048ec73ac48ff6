package correlations

import (
	"fmt"
	"iter"
	"math"
	"slices"
	"strings"

	"example.com/coolward/units"
)

// A Correlation is a published formula for the Nusselt number with what belongs to it. Correlations
// compare with ==. The zero Correlation is none: it names itself "no correlation" and has no Nusselt
// number.
type Correlation struct{ *record }

// record is what a Correlation points to. It is never written after the package is initialised, and
// it is not reachable from outside.
type record struct {
	name, body string
	regime     Regime
	kind       Kind   // Mean where it is 0
	driver     driver // whose 0 gives the conduction limit
	formula    string
	length     string
	reference  Reference
	ranges     []Range
	scatter    Scatter
	citation   string
	status     Status
	evidence   string
	note       string
	nu         func(g Groups) float64
}

// A driver is the group that is 0 in a fluid at rest.
type driver uint8

const (
	noDriver   driver = iota // the formula has no conduction limit, and is refused at rest
	byReynolds               // a stream
	byRayleigh               // buoyancy by a difference of temperatures
	byFlux                   // buoyancy by a heat flux
)

// rests reports whether nothing moves the fluid.
func (d driver) rests(g *Groups) bool {
	return d == byReynolds && g.Re == 0 || d == byRayleigh && g.Ra == 0 || d == byFlux && g.FluxRa == 0
}

// A Regime is how heat gets from a surface into a fluid.
type Regime uint8

// The regimes.
const (
	Conduction Regime = iota + 1 // the fluid hardly moves
	Natural                      // buoyancy moves it
	Forced                       // something else moves it
	Mixed                        // both do
	Boiling                      // the fluid boils at the surface
	Condensing                   // vapour condenses on the surface
)

var regimeNames = [...]string{"no regime", "conduction", "natural", "forced", "mixed", "boiling", "condensing"}

// String returns the word: conduction, natural, forced, mixed, boiling or condensing.
func (r Regime) String() string { return word(regimeNames[:], int(r)) }

// A Reference is the temperature at which the properties in the groups are taken.
type Reference uint8

// The reference temperatures.
const (
	FilmTemperature Reference = iota + 1 // the mean of wall and free stream
	FreeStream                           // that of the fluid far from the wall
	Bulk                                 // the mean of the fluid's mean temperatures at entry and exit
	WallMean                             // the mean of the two walls that enclose the fluid
	QuarterToStream                      // the wall's, less a quarter of the difference to the free stream
	LiquidFilm                           // the mean of the wall and of saturation, for the liquid
	VapourFilm                           // the mean of the wall and of saturation, for the vapour
)

var referenceNames = [...]string{
	"no reference temperature", "film temperature", "free stream", "mean bulk temperature", "mean of the walls",
	"wall less a quarter of the difference", "liquid film", "vapour film",
}

// String returns the words, such as film temperature or free stream.
func (r Reference) String() string { return word(referenceNames[:], int(r)) }

// A Kind is what a correlation gives.
type Kind uint8

// The kinds.
const (
	Mean         Kind = iota + 1 // Nusselt number with the mean coefficient of the surface
	Local                        // Nusselt number at the place that the length reaches to
	MeanSherwood                 // Sherwood number with the mean mass-transfer coefficient; Pr is the Schmidt number
)

var kindNames = [...]string{"no number", "mean Nusselt number", "local Nusselt number", "mean Sherwood number"}

// String returns the words: mean Nusselt number, local Nusselt number or mean Sherwood number.
func (k Kind) String() string { return word(kindNames[:], int(k)) }

// A Status says how far a formula has been compared with print.
type Status uint8

// The states of a formula.
const (
	FromMemory Status = iota + 1 // recalled, not seen on a page that can be cited
	ReadOnPage                   // formula read on the page that Evidence names
)

var statusNames = [...]string{"no status", "from memory", "read on a page"}

// String returns the words: from memory or read on a page.
func (s Status) String() string { return word(statusNames[:], int(s)) }

func word(words []string, i int) string {
	if i < len(words) {
		return words[i]
	}
	return words[0]
}

// A Scatter is how far a measured Nusselt number may lie from the formula.
type Scatter struct {
	Relative float64 // 0.3 is ±30 %
	Origin   string  // where the figure comes from
}

var none = record{name: "no correlation"}

func (c Correlation) data() *record {
	if c.record == nil {
		return &none
	}
	return c.record
}

// Name returns the name, such as "Whitaker sphere, forced". It is unique.
func (c Correlation) Name() string { return c.data().name }

// Body returns the body that the correlation is for, such as "sphere".
func (c Correlation) Body() string { return c.data().body }

// Regime returns what moves the fluid.
func (c Correlation) Regime() Regime { return c.data().regime }

// Kind returns whether the number is a mean or a local one, and of heat or of mass transfer.
func (c Correlation) Kind() Kind {
	if c.record != nil && c.kind == 0 {
		return Mean
	}
	return c.data().kind
}

// Formula returns the formula as text.
func (c Correlation) Formula() string { return c.data().formula }

// Length returns which length the groups are on, such as "diameter".
func (c Correlation) Length() string { return c.data().length }

// Reference returns the temperature at which the properties in the groups are taken.
func (c Correlation) Reference() Reference { return c.data().reference }

// Ranges lists the published range of each group that the correlation uses.
func (c Correlation) Ranges() iter.Seq[Range] { return slices.Values(c.data().ranges) }

// Scatter returns how far a measured Nusselt number may lie from the formula.
func (c Correlation) Scatter() Scatter { return c.data().scatter }

// Citation returns the publication that the formula comes from.
func (c Correlation) Citation() string { return c.data().citation }

// Status returns how far formula and range have been compared with print.
func (c Correlation) Status() Status { return c.data().status }

// Evidence returns the page that was read, or what speaks for a formula that stands from memory.
func (c Correlation) Evidence() string { return c.data().evidence }

// Note returns what to know before use; it may be empty.
func (c Correlation) Note() string { return c.data().note }

// Source returns the citation and the status in one line, for the sources of a derivation.
func (c Correlation) Source() string {
	d := c.data()
	if d.citation == "" {
		return d.name
	}
	return fmt.Sprintf("%s: %s (%s)", d.name, d.citation, d.status)
}

// String writes the whole correlation on several lines for a person.
func (c Correlation) String() string {
	d := c.data()
	if d.nu == nil {
		return d.name
	}
	var b strings.Builder
	fmt.Fprintf(&b, "%s\n  %s\n", d.name, d.formula)
	if c.Kind() != Mean {
		fmt.Fprintf(&b, "  gives: %s\n", c.Kind())
	}
	fmt.Fprintf(&b, "  length: %s; properties at: %s\n", d.length, d.reference)
	for _, r := range d.ranges {
		fmt.Fprintf(&b, "  %s\n", r)
	}
	fmt.Fprintf(&b, "  scatter: ±%.3g %% (%s)\n", 100*d.scatter.Relative, d.scatter.Origin)
	fmt.Fprintf(&b, "  source: %s\n  status: %s: %s", d.citation, d.status, d.evidence)
	if d.note != "" {
		fmt.Fprintf(&b, "\n  note: %s", d.note)
	}
	return b.String()
}

// A Result is a Nusselt number and what to think of it.
type Result struct {
	Nu           float64 // Nusselt number, coefficient × length / conductivity
	Scatter      float64 // relative: a measured one lies within Nu (1 ± Scatter)
	Extrapolated bool    // a group lies outside the range of the source
}

// Nu returns the Nusselt number at g. It returns a [*units.RangeError] for a group outside its
// published range and an [*units.ArgumentError] for a group that is negative, infinite or no number,
// and for the zero Correlation.
func (c Correlation) Nu(g Groups) (Result, error) {
	if err := c.check(&g); err != nil {
		return Result{}, err
	}
	if r := c.record.outside(&g); r != nil {
		return Result{}, r.outside(c.name, c.citation, r.Group.of(&g))
	}
	return c.evaluate(&g, false)
}

// Extrapolate returns the Nusselt number at g, in the range of the source or not, and the result says
// which. Nothing is known about the scatter outside; the one in the result is that of the range. It
// returns an [*units.ArgumentError] for a group that is negative, infinite or no number, for the zero
// Correlation, and if the formula gives no number.
func (c Correlation) Extrapolate(g Groups) (Result, error) {
	if err := c.check(&g); err != nil {
		return Result{}, err
	}
	return c.evaluate(&g, c.record.outside(&g) != nil)
}

// Admits reports whether every group of g that c uses is in its published range. A group that is no
// number is not, and the zero Correlation admits nothing.
func (c Correlation) Admits(g Groups) bool {
	if c.record == nil || g.check() != nil {
		return false
	}
	return c.record.outside(&g) == nil
}

func (c Correlation) check(g *Groups) error {
	if c.record == nil {
		return &units.ArgumentError{Field: "correlation", Accepted: "one of those that correlations.All lists"}
	}
	return g.check()
}

// outside returns the first range that does not admit its group, nil if all do. The conduction limit is in range.
func (d *record) outside(g *Groups) *Range {
	if d.driver.rests(g) {
		return nil
	}
	for i := range d.ranges {
		r := &d.ranges[i]
		if r.Group == InclinedRayleigh && r.Min.low == 0 && g.Ra <= r.Max.high && g.Inclination.SI() <= math.Pi/2 {
			continue // in range without its cosine, which is from 0 to 1
		}
		if !r.Admits(r.Group.of(g)) {
			return r
		}
	}
	return nil
}

func (c Correlation) evaluate(g *Groups, extrapolated bool) (Result, error) {
	nu := c.record.nu(*g)
	if !(nu >= 0 && nu <= math.MaxFloat64) {
		return Result{}, &units.ArgumentError{Field: c.name + ": groups", Value: *g, Accepted: "groups that give a finite Nusselt number, 0 or above"}
	}
	return Result{Nu: nu, Scatter: c.scatter.Relative, Extrapolated: extrapolated}, nil
}

package correlations

import (
	"math"
	"strconv"
	"strings"

	"example.com/coolward/units"
)

// A Limit is one end of a published range, as precise as the digits that it is printed with: it
// admits half a unit in the last of them. The limit "0.7" stands for anything that rounds to 0.7,
// so a lower limit of 0.7 admits 0.65. A limit of 0 and an open end are exact.
type Limit struct {
	printed          string
	value, low, high float64
}

// String returns the limit as it is printed in its source, "∞" for an open end.
func (l Limit) String() string { return l.printed }

// Value returns the number that is printed, infinite for an open end.
func (l Limit) Value() float64 { return l.value }

// itself reports whether a range admits its limit.
func (l Limit) itself() bool { return l.low <= l.value && l.value <= l.high }

const open = "∞"

// limit reads a limit as printed, such as "0.71", "380" or "7.6e4". A text that is no such number
// gives a limit of NaN, which admits nothing.
func limit(printed string) Limit {
	if printed == open {
		return Limit{printed, math.Inf(1), math.Inf(1), math.Inf(1)}
	}
	mantissa, exponent, _ := strings.Cut(printed, "e")
	whole, fraction, _ := strings.Cut(mantissa, ".")
	power := 0
	if exponent != "" {
		power = int(number(exponent))
	}
	// All digits as one integer, times ten, so that half a unit in the last digit is 5: the ends
	// are then the doubles nearest to the decimal numbers.
	digits := 10 * int(number(whole+fraction))
	scale := "e" + strconv.Itoa(power-len(fraction)-1)
	l := Limit{printed: printed, value: number(printed)}
	l.low, l.high = l.value, l.value
	if l.value != 0 {
		l.low = number(strconv.Itoa(digits-5) + scale)
		l.high = number(strconv.Itoa(digits+5) + scale)
	}
	return l
}

func number(s string) float64 {
	x, err := strconv.ParseFloat(s, 64)
	if err != nil {
		return math.NaN()
	}
	return x
}

// A Range is the published range of one group of a correlation.
type Range struct {
	Group    Group
	Min, Max Limit
}

// Admits reports whether x lies in r, each end taken as precise as it is printed. An open end admits
// every finite number.
func (r Range) Admits(x float64) bool {
	return x >= r.Min.low && x <= r.Max.high && x <= math.MaxFloat64
}

// String writes r, such as "Reynolds number 3.5 to 7.6e4". An inclination is in degrees.
func (r Range) String() string {
	unit := ""
	if r.Group == Inclination {
		unit = "°"
	}
	s := r.Group.String() + " "
	switch {
	case r.Max.printed == open && r.Min == above0:
		return s + "above 0"
	case r.Max.printed == open:
		return s + "from " + r.Min.printed + unit + " up"
	case r.Min == above0:
		return s + "above 0, up to " + r.Max.printed + unit
	case !r.Max.itself():
		return s + r.Min.printed + " to below " + r.Max.printed + unit
	}
	return s + r.Min.printed + " to " + r.Max.printed + unit
}

func within(group Group, low, high string) Range { return Range{group, limit(low), limit(high)} }

// above0 is the lower limit of a range that 0 does not belong to.
var above0 = Limit{printed: "0", low: math.SmallestNonzeroFloat64}

// exact is a limit that admits nothing beyond itself.
func exact(x float64) Limit { return Limit{strconv.FormatFloat(x, 'g', -1, 64), x, x, x} }

// upTo is a range that starts above 0.
func upTo(group Group, high string) Range { return Range{group, above0, limit(high)} }

// below1 is a range from 0 that 1 does not belong to.
func below1(group Group) Range {
	last := math.Nextafter(1, 0)
	return Range{group, limit("0"), Limit{printed: "1", value: 1, low: last, high: last}}
}

// positive is the range of a group that a source does not limit, but that must be given.
func positive(group Group) Range { return Range{group, above0, limit(open)} }

// outside returns the error that x lies outside r.
func (r Range) outside(model, source string, x float64) error {
	e := &units.RangeError{
		Model:    model,
		Quantity: r.Group.String(),
		Value:    units.Number(x),
		Min:      units.Number(r.Min.value),
		Max:      units.Number(r.Max.value),
		Above:    !r.Min.itself(),
		Below:    !r.Max.itself() && r.Max.printed != open,
		Source:   source,
	}
	if r.Group == Inclination {
		e.Value, e.Min, e.Max = units.Degree.Of(x).Dynamic(), units.Degree.Of(r.Min.value).Dynamic(), units.Degree.Of(r.Max.value).Dynamic()
	}
	return e
}

package units

import (
	"errors"
	"strconv"
	"strings"
)

// A SyntaxError reports a text that is no quantity of the wanted kind.
type SyntaxError struct {
	Text     string // what was read
	Position int    // byte of Text at which it goes wrong
	Reason   string // why, with what is accepted
}

// Error names the text, the position and the reason.
func (e *SyntaxError) Error() string {
	text := e.Text
	if len(text) > maxText {
		text = text[:maxText] + "…"
	}
	return "reading " + strconv.Quote(text) + ": at byte " + strconv.Itoa(e.Position) + ": " + e.Reason
}

// maxText bounds the length of a text, so that hostile input costs no time.
const maxText = 160

// Parse reads a quantity of kind Q, or a temperature, as in
//
//	d, err := units.Parse[units.Length]("60 mm")
//	T, err := units.Parse[units.Temperature]("180 °C")
//
// The text is a number and a unit. The number has a decimal point and may have an exponent. The unit is
// a product of powers of unit symbols: factors stand side by side with a space, a dot (·) or a
// star between them; a solidus divides; powers are written m², m^2, m2, s⁻¹, s^-1, s-1 or s^(1/2).
// SI symbols take prefixes. Behind a solidus, factors that stand side by side are read in the way
// that gives the kind wanted: W/m2K, W/m² K and W/(m²·K) are the same heat transfer coefficient, and
// J/kg K is a specific heat. A whole symbol wins over a product written without a space, which is read only where
// it ends in a time, a degree or K: W/mK is a thermal conductivity where one is wanted.
//
// In a product, °C and K are both a difference of one kelvin. As a temperature difference by
// itself, 10 °C is refused: it is a point on a scale. Write 10 K, or 18 °R.
//
// It returns a [*SyntaxError].
func Parse[Q any, P interface {
	*Q
	parse(text string) error
}](text string) (Q, error) {
	var q Q
	err := P(&q).parse(text)
	return q, err
}

// UnmarshalText reads a quantity as [Parse] does.
func (q *Quantity[D]) UnmarshalText(text []byte) error { return q.parse(string(text)) }

func (q *Quantity[D]) parse(text string) error {
	number, unit, at, err := split(text)
	if err != nil {
		return err
	}
	size, err := unitOf(kindOf[D](), unit)
	if err != nil {
		return locate(err, text, at)
	}
	si := number * size
	if !isFinite(si) {
		return &SyntaxError{text, 0, "number too large"}
	}
	q.si = si
	return nil
}

// UnmarshalText reads a temperature, a point on a scale, as [Parse] does.
func (t *Temperature) UnmarshalText(text []byte) error { return t.parse(string(text)) }

func (t *Temperature) parse(text string) error {
	number, unit, at, err := split(text)
	if err != nil {
		return err
	}
	scale, ok := scales[unit]
	if !ok {
		return &SyntaxError{text, at, "no temperature scale " + strconv.Quote(unit) + "; write K, °C, °F or °R"}
	}
	point := scale.Of(number)
	if !point.IsFinite() {
		return &SyntaxError{text, 0, "number too large"}
	}
	*t = point
	return nil
}

// ParseValue reads a quantity of any kind, for text whose kind is not known beforehand. It returns a
// [*SyntaxError] where two readings are left, such as W/mK, and shows both; read such a text with the
// kind that is wanted. 180 °C is a point on a scale; K alone is refused as it may be a point or a
// difference. A number without a unit is a number.
func ParseValue(text string) (Value, error) {
	number, unit, at, err := split(text)
	if err != nil && !(errors.As(err, new(*SyntaxError)) && unit == "" && at == len(text)) {
		return Value{}, err
	}
	if unit == "" {
		return Number(number), nil
	}
	if scale, ok := scales[unit]; ok {
		if scale == Kelvin || scale == Rankine {
			return Value{}, &SyntaxError{text, at, unit + " may be a point on a scale or a difference; read it as a Temperature or as a TemperatureDifference"}
		}
		return scale.Of(number).dynamicOn(scale), nil
	}
	r, err := undirected(unit)
	if err != nil {
		return Value{}, locate(err, text, at)
	}
	v := Value{si: number * r.size, dim: r.dim, unit: unit, size: r.size}
	if !v.IsFinite() {
		return Value{}, &SyntaxError{text, 0, "number too large"}
	}
	return v, nil
}

// UnmarshalText reads a value as [ParseValue] does.
func (v *Value) UnmarshalText(text []byte) error {
	read, err := ParseValue(string(text))
	if err == nil {
		*v = read
	}
	return err
}

// locate puts the whole text and the place of the unit in it into an error about the unit.
func locate(err error, text string, at int) error {
	var s *SyntaxError
	if errors.As(err, &s) {
		return &SyntaxError{text, min(at+s.Position, len(text)), s.Reason}
	}
	return err
}

// split reads the number and returns the unit behind it, folded by spellingOf, and where it starts.
// The error of a number without a unit comes with an empty unit and at = len(text).
func split(text string) (number float64, unit string, at int, err error) {
	if len(text) > maxText {
		return 0, "", 0, &SyntaxError{text, maxText, "longer than " + strconv.Itoa(maxText) + " bytes"}
	}
	i := skipSpace(text, 0)
	start := i
	sign := ""
	for _, s := range []string{"+", "-", "−"} {
		if strings.HasPrefix(text[i:], s) {
			i += len(s)
			if s != "+" {
				sign = "-"
			}
			break
		}
	}
	body := i
	i = skipDigits(text, i)
	whole := i - body
	if i < len(text) && text[i] == '.' {
		i = skipDigits(text, i+1)
		whole += i - body - whole - 1
	}
	if whole == 0 {
		if strings.TrimSpace(text) == "" {
			return 0, "", start, &SyntaxError{text, start, "empty; write a number and a unit"}
		}
		return 0, "", start, &SyntaxError{text, start, "no number; write a number and a unit"}
	}
	if j := exponentEnd(text, i); j > i {
		i = j
	}
	if i < len(text) && text[i] == ',' {
		return 0, "", i, &SyntaxError{text, i, "a comma; the decimal sign is a point, and digits are not grouped"}
	}
	number, err = strconv.ParseFloat(sign+text[body:i], 64)
	if err != nil {
		return 0, "", start, &SyntaxError{text, start, "number too large"}
	}
	at = skipSpace(text, i)
	if at == len(text) {
		return number, "", at, &SyntaxError{text, at, "no unit behind the number"}
	}
	unit = strings.TrimRight(text[at:], " \t\u00a0\u2009\u202f\u2007")
	if !isPlain(unit) {
		unit = spellingOf.Replace(unit)
	}
	if unit[0] >= '0' && unit[0] <= '9' && !strings.HasPrefix(unit, "1/") {
		return 0, "", at, &SyntaxError{text, at, "a second number; digits are not grouped"}
	}
	return number, unit, at, nil
}

// isPlain reports whether spellingOf would leave the unit as it is: the usual spellings do not need it.
func isPlain(unit string) bool {
	for i := range len(unit) {
		if c := unit[i]; c >= 0x80 || c == '*' || c == '\t' {
			return false
		}
	}
	return true
}

func skipSpace(s string, i int) int {
	for i < len(s) {
		switch {
		case s[i] == ' ' || s[i] == '\t':
			i++
		case strings.HasPrefix(s[i:], "\u00a0"):
			i += 2
		case strings.HasPrefix(s[i:], "\u2009"), strings.HasPrefix(s[i:], "\u202f"), strings.HasPrefix(s[i:], "\u2007"):
			i += 3
		default:
			return i
		}
	}
	return i
}

func skipDigits(s string, i int) int {
	for i < len(s) && s[i] >= '0' && s[i] <= '9' {
		i++
	}
	return i
}

// exponentEnd returns the end of a decimal exponent at i, and i where there is none.
func exponentEnd(s string, i int) int {
	j := i
	if j >= len(s) || s[j] != 'e' && s[j] != 'E' {
		return i
	}
	j++
	if j < len(s) && (s[j] == '+' || s[j] == '-') {
		j++
	}
	if k := skipDigits(s, j); k > j {
		return k
	}
	return i
}

// unitOf returns the size of a unit of the wanted kind.
func unitOf(k *kind, unit string) (float64, error) {
	if size, ok := symbols().spelled[k.index][unit]; ok {
		return size, nil
	}
	if _, ok := degrees[unit]; ok && k.dim == kelvinDimension {
		return 0, &SyntaxError{unit, 0, unit + " alone is a point on a scale, not a difference; write a difference in K, as in 10 K, or in °R, as in 18 °R"}
	}
	var m meanings
	if err := readings(&m, unit); err != nil {
		return 0, err
	}
	var best, rival *reading
	for i := range m.list() {
		r := &m.all[i]
		switch {
		case r.dim != k.dim:
		case best == nil || r.splits < best.splits:
			best, rival = r, nil
		case r.splits == best.splits && r.size != best.size:
			rival = r
		}
	}
	switch {
	case best != nil && rival == nil:
		return best.size, nil
	case best == nil:
		if k.dim == kinds[durationKind].dim && strings.ContainsAny(unit, "0123456789") {
			return 0, &SyntaxError{unit, 0, strconv.Quote(unit) + " is more than one number with a unit; write one, as in 1.5 h or 90 min"}
		}
		return 0, &SyntaxError{unit, 0, strconv.Quote(unit) + " is no unit of " + k.name + " (dimension " + k.dim.String() + "), such as " + k.units[0].symbol + "; it has dimension " + m.all[0].dim.String()}
	}
	return 0, &SyntaxError{unit, 0, strconv.Quote(unit) + " can be read in two ways, as " + best.String() + " and as " + rival.String() + "; use brackets"}
}

// undirected returns the one reading of a unit that is of a known kind, or the only reading at all.
func undirected(unit string) (reading, error) {
	if a, ok := symbols().atoms[unit]; ok {
		return reading{dim: a.dim, size: a.size}, nil
	}
	var m meanings
	if err := readings(&m, unit); err != nil {
		return reading{}, err
	}
	var found []reading
	for _, r := range m.list() {
		if symbols().known[r.dim] {
			found = append(found, r)
		}
	}
	if len(found) == 0 {
		found = m.list()
	}
	for _, r := range found[1:] {
		if r.dim != found[0].dim || r.size != found[0].size {
			return reading{}, &SyntaxError{unit, 0, strconv.Quote(unit) + " can be read in two ways, as " + found[0].String() + " and as " + r.String() + "; use brackets, or read it as the kind wanted"}
		}
	}
	return found[0], nil
}

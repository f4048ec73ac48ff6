package units

import (
	"fmt"
	"log/slog"
	"math"
	"strconv"
	"strings"
)

// digits is the number of significant digits of a default text.
const digits = 6

// autoUnit returns the unit in which an SI number of the kind is best read: the largest automatic
// unit that is not above it.
func (k *kind) autoUnit(si float64) *unitRow {
	best, least := &k.units[0], -1
	size := math.Abs(si)
	if !(size > 0) || math.IsInf(size, 0) {
		return best
	}
	found := false
	for i := range k.units {
		u := &k.units[i]
		if !u.auto {
			continue
		}
		if least < 0 || u.factor < k.units[least].factor {
			least = i
		}
		if u.factor <= size*(1+1e-12) && (!found || u.factor > best.factor) {
			best, found = u, true
		}
	}
	if !found && least >= 0 {
		best = &k.units[least]
	}
	return best
}

// symbolOf returns the symbol of a unit of the given size, and whether the table has one.
func (k *kind) symbolOf(size float64) (string, bool) {
	for i := range k.units {
		if k.units[i].factor == size {
			return k.units[i].symbol, true
		}
	}
	return strconv.FormatFloat(size, 'g', -1, 64) + " " + k.units[0].symbol, false
}

// String writes q with six significant digits in the unit that suits its magnitude, such as "60 mm".
func (q Quantity[D]) String() string {
	u := kindOf[D]().autoUnit(q.si)
	return string(appendNumber(make([]byte, 0, 32), q.si/u.factor, 'g', digits, u.symbol))
}

// Text writes q in unit u with the given number of significant digits, trailing zeros left out;
// fewer than one digit means as many as are needed to read the same number back.
func (q Quantity[D]) Text(u Unit[D], digits int) string {
	symbol, named := kindOf[D]().symbolOf(float64(u))
	if !named {
		symbol = "× " + symbol
	}
	return string(appendNumber(make([]byte, 0, 32), q.In(u), 'g', digits, symbol))
}

// Text writes t on scale s with the given number of decimals, 0 to 20; what is beyond counts as the nearer end.
func (t Temperature) Text(s Scale, decimals int) string {
	return string(appendNumber(make([]byte, 0, 32), t.In(s), 'f', min(max(decimals, 0), 20), s.String()))
}

// String writes t in degrees Celsius with six significant digits, such as "179.5 °C".
func (t Temperature) String() string { return t.Dynamic().String() }

// String writes v with six significant digits and its unit.
func (v Value) String() string {
	return string(appendNumber(make([]byte, 0, 32), v.Number(), 'g', digits, v.Unit()))
}

// ASCII writes the text of a quantity with ASCII characters only, in a spelling that reads back: W/(m2 K) for
// W/(m²·K), degC for °C, um for µm.
func ASCII(text string) string { return toASCII.Replace(text) }

var toASCII = strings.NewReplacer(
	"·", " ", "°C", "degC", "°F", "degF", "°R", "degR", "°", "deg", "µ", "u", "Ω", "ohm", "ₙ", "n", "₂", "2", "×", "x", "−", "-", "±", "+-",
	"⁻", "-", "⁰", "0", "¹", "1", "²", "2", "³", "3", "⁴", "4", "⁵", "5", "⁶", "6", "⁷", "7", "⁸", "8", "⁹", "9",
)

// appendNumber writes a number and a symbol with a space between them.
func appendNumber(dst []byte, x float64, verb byte, precision int, symbol string) []byte {
	if precision < 1 && verb == 'g' {
		precision = -1
	}
	start := len(dst)
	dst = strconv.AppendFloat(dst, x, verb, precision, 64)
	if string(dst[start:]) == "-0" {
		dst = append(dst[:start], '0')
	}
	if symbol != "" {
		dst = append(dst, ' ')
		dst = append(dst, symbol...)
	}
	return dst
}

// Format implements [fmt.Formatter]. The verbs v and s write as String does; e, f and g write the
// number in the same unit, with the precision and width of the verb, and the unit behind it.
func (q Quantity[D]) Format(f fmt.State, verb rune) {
	u := kindOf[D]().autoUnit(q.si)
	format(f, verb, q.si/u.factor, u.symbol)
}

// Format implements [fmt.Formatter], as [Quantity.Format] does, in degrees Celsius.
func (t Temperature) Format(f fmt.State, verb rune) { t.Dynamic().Format(f, verb) }

// Format implements [fmt.Formatter], as [Quantity.Format] does, in the unit of v.
func (v Value) Format(f fmt.State, verb rune) { format(f, verb, v.Number(), v.Unit()) }

func format(f fmt.State, verb rune, x float64, symbol string) {
	precision, given := f.Precision()
	style := byte('g')
	switch verb {
	case 'v', 's':
		if !given {
			precision = digits
		}
	case 'e', 'f', 'g':
		style = byte(verb)
		if !given {
			precision = map[rune]int{'e': 6, 'f': 6, 'g': -1}[verb]
		}
	default:
		fmt.Fprintf(f, "%%!%c(%s)", verb, appendNumber(nil, x, 'g', digits, symbol))
		return
	}
	text := appendNumber(make([]byte, 0, 32), x, style, precision, symbol)
	if f.Flag('+') && x >= 0 {
		text = append([]byte{'+'}, text...)
	}
	width, _ := f.Width()
	pad := width - len([]rune(string(text)))
	for i := 0; i < pad && !f.Flag('-'); i++ {
		f.Write([]byte{' '})
	}
	f.Write(text)
	for i := 0; i < pad && f.Flag('-'); i++ {
		f.Write([]byte{' '})
	}
}

// MarshalText writes q with every digit in the coherent SI unit, so that reading it back gives the
// same number. It returns an [*ArgumentError] if q is not finite.
func (q Quantity[D]) MarshalText() ([]byte, error) {
	k := kindOf[D]()
	if !q.IsFinite() {
		return nil, &ArgumentError{k.name, q.si, "finite"}
	}
	return appendNumber(make([]byte, 0, 40), q.si, 'g', -1, k.units[0].symbol), nil
}

// MarshalText writes t with every digit in kelvin, so that reading it back gives the same number.
// It returns an [*ArgumentError] if t is not finite.
func (t Temperature) MarshalText() ([]byte, error) {
	if !t.IsFinite() {
		return nil, &ArgumentError{"temperature", t.kelvin, "finite"}
	}
	return appendNumber(make([]byte, 0, 40), t.kelvin, 'g', -1, "K"), nil
}

// MarshalText writes v with every digit: in SI base units, or in degrees Celsius if it is a point on a
// temperature scale. It returns an [*ArgumentError] if v is not finite.
func (v Value) MarshalText() ([]byte, error) {
	if !v.IsFinite() {
		return nil, &ArgumentError{"value", v.si, "finite"}
	}
	if v.point {
		return appendNumber(nil, Temperature{v.si}.In(Celsius), 'g', -1, "°C"), nil
	}
	symbol := ""
	if !v.dim.isOne() {
		symbol = v.dim.String()
	}
	return appendNumber(nil, v.si, 'g', -1, symbol), nil
}

// LogValue implements [slog.LogValuer].
func (q Quantity[D]) LogValue() slog.Value { return slog.StringValue(q.String()) }

// LogValue implements [slog.LogValuer].
func (t Temperature) LogValue() slog.Value { return slog.StringValue(t.String()) }

// LogValue implements [slog.LogValuer].
func (v Value) LogValue() slog.Value { return slog.StringValue(v.String()) }

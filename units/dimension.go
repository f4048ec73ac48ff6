package units

import (
	"math"
	"strconv"
	"strings"
)

// The SI base quantities that a dimension is written in.
const (
	baseM = iota
	baseKg
	baseS
	baseA
	baseK
	baseMol
	baseCd
	bases
)

var baseSymbols = [bases]string{"m", "kg", "s", "A", "K", "mol", "cd"}

// An exponent is a rational number in lowest terms. The zero value is 0.
type exponent struct {
	num int16
	den int16 // 0 stands for 1 where num is 0
}

// A dimension is a product of powers of the SI base units.
type dimension [bases]exponent

// newExponent returns num/den in lowest terms; ok is false where it does not fit.
func newExponent(num, den int64) (e exponent, ok bool) {
	if num == 0 {
		return exponent{}, den != 0
	}
	if den < 0 {
		num, den = -num, -den
	}
	a, b := num, den
	if a < 0 {
		a = -a
	}
	for b != 0 {
		a, b = b, a%b
	}
	if den == 0 || a == 0 {
		return exponent{}, false
	}
	num, den = num/a, den/a
	if num < -math.MaxInt16 || num > math.MaxInt16 || den > math.MaxInt16 {
		return exponent{}, false
	}
	return exponent{int16(num), int16(den)}, true
}

func (e exponent) denominator() int64 {
	if e.den == 0 {
		return 1
	}
	return int64(e.den)
}

func (e exponent) float() float64 { return float64(e.num) / float64(e.denominator()) }

// plus returns e + f·sign.
func (e exponent) plus(f exponent, sign int64) (exponent, bool) {
	if e.den <= 1 && f.den <= 1 { // whole numbers, nearly always
		sum := int64(e.num) + sign*int64(f.num)
		if sum == 0 {
			return exponent{}, true
		}
		return exponent{int16(sum), 1}, sum >= -math.MaxInt16 && sum <= math.MaxInt16
	}
	return newExponent(int64(e.num)*f.denominator()+sign*int64(f.num)*e.denominator(), e.denominator()*f.denominator())
}

// times returns the dimension d·e^sign.
func (d dimension) times(e dimension, sign int64) (dimension, bool) {
	for i := range d {
		if e[i].num == 0 {
			continue
		}
		if d[i].num == 0 && sign > 0 { // the usual case of a new base unit
			d[i] = e[i]
			continue
		}
		var ok bool
		if d[i], ok = d[i].plus(e[i], sign); !ok {
			return dimension{}, false
		}
	}
	return d, true
}

// power returns d^(num/den).
func (d dimension) power(num, den int64) (dimension, bool) {
	for i := range d {
		if d[i].num == 0 {
			continue
		}
		var ok bool
		if d[i], ok = newExponent(int64(d[i].num)*num, d[i].denominator()*den); !ok {
			return dimension{}, false
		}
	}
	return d, true
}

// outOf reports whether an exponent has a numerator or denominator beyond ±limit.
func (d dimension) outOf(limit int16) bool {
	for _, e := range d {
		if max(e.num, -e.num, e.den) > limit {
			return true
		}
	}
	return false
}

func (d dimension) isOne() bool { return d == dimension{} }

// String writes the dimension in the SI base units, such as "kg·s⁻³·K⁻¹"; "1" where there is none.
func (d dimension) String() string {
	var parts []string
	for i, e := range d {
		switch {
		case e.num == 0:
		case e.denominator() != 1:
			parts = append(parts, baseSymbols[i]+"^("+strconv.Itoa(int(e.num))+"/"+strconv.Itoa(int(e.den))+")")
		case e.num == 1:
			parts = append(parts, baseSymbols[i])
		default:
			parts = append(parts, baseSymbols[i]+superscript(strconv.Itoa(int(e.num))))
		}
	}
	if len(parts) == 0 {
		return "1"
	}
	return strings.Join(parts, "·")
}

var superscripts = strings.NewReplacer("-", "⁻", "0", "⁰", "1", "¹", "2", "²", "3", "³", "4", "⁴", "5", "⁵", "6", "⁶", "7", "⁷", "8", "⁸", "9", "⁹")

func superscript(s string) string { return superscripts.Replace(s) }

// raise returns x^(num/den); the common whole exponents by multiplication, so that they are exact.
func raise(x float64, num, den int64) float64 {
	if den != 1 || num > 4 || num < -4 {
		return math.Pow(x, float64(num)/float64(den))
	}
	y := 1.0
	for range max(num, -num) {
		y *= x
	}
	if num < 0 {
		return 1 / y
	}
	return y
}

package units

import (
	"strconv"
	"strings"
	"unicode/utf8"
)

// A reading is one meaning of a unit text.
type reading struct {
	dim    dimension
	size   float64
	splits int8 // how many runs of letters were taken apart
	below  bool // the last factor stands below the solidus
}

// String writes the reading in SI base units with the kind that it may be, for errors.
func (r reading) String() string {
	s := strconv.FormatFloat(r.size, 'g', 6, 64) + " " + r.dim.String()
	for i := range kinds {
		if kinds[i].dim == r.dim {
			return s + " (" + kinds[i].name + ")"
		}
	}
	return s
}

// maxReadings bounds the number of readings of one text.
const maxReadings = 8

// maxExponent bounds the exponents that are read, so that what was read can be printed and read again.
const maxExponent = 99

// A meanings holds the readings of a text. It has a fixed size so that reading needs no memory.
type meanings struct {
	n   int
	all [maxReadings]reading
}

func (m *meanings) list() []reading { return m.all[:m.n] }

// add appends a reading, and reports whether there was room.
func (m *meanings) add(r reading) bool {
	if m.n == maxReadings {
		return false
	}
	m.all[m.n] = r
	m.n++
	return true
}

// readings puts all meanings of a unit text into dst, at least one, whole symbols first.
func readings(dst *meanings, unit string) error {
	p := unitParser{text: unit}
	if err := p.product(dst, 0); err != nil {
		return err
	}
	if p.at < len(unit) {
		return p.fail("a closing bracket without an opening one")
	}
	for i := range dst.list() {
		if dst.all[i].dim.outOf(maxExponent) {
			return p.fail("exponent too large")
		}
	}
	return nil
}

// A unitParser walks over a unit text.
type unitParser struct {
	text string
	at   int
}

func (p *unitParser) fail(reason string) error { return &SyntaxError{p.text, p.at, reason} }

func (p *unitParser) rest() string { return p.text[p.at:] }

// product reads factors up to the end of the text or a closing bracket, and puts the readings of
// their product into dst.
func (p *unitParser) product(dst *meanings, depth int) error {
	if depth > 4 {
		return p.fail("brackets nested too deeply")
	}
	dst.n, dst.all[0] = 1, reading{size: 1}
	var factors meanings // outside the loop, so that it stays on the stack
	for first := true; ; first = false {
		over, explicit := p.operator()
		if p.rest() == "" || p.rest()[0] == ')' {
			if first || explicit {
				return p.fail("a unit symbol is missing")
			}
			return nil
		}
		factors.n = 0
		if err := p.factor(&factors, depth); err != nil {
			return err
		}
		if err := p.combine(dst, &factors, over); err != nil {
			return err
		}
	}
}

// operator reads what stands between two factors: over is true for a solidus, explicit for anything
// but space.
func (p *unitParser) operator() (over, explicit bool) {
	for {
		switch r := p.rest(); {
		case strings.HasPrefix(r, " "):
			p.at++
		case strings.HasPrefix(r, "·") && !explicit:
			p.at += len("·")
			explicit = true
		case strings.HasPrefix(r, ".") && !explicit:
			p.at++
			explicit = true
		case strings.HasPrefix(r, "/") && !explicit:
			p.at++
			over, explicit = true, true
		case strings.HasPrefix(r, "per ") && !explicit:
			p.at += len("per ")
			over, explicit = true, true
		default:
			return over, explicit
		}
	}
}

// combine multiplies each reading so far by each reading of the next factor. Behind a solidus, a
// factor that is not divided itself may stand below or above it.
func (p *unitParser) combine(sofar, factors *meanings, over bool) error {
	for i := range sofar.n {
		s := sofar.all[i]
		below := over || s.below
		for j := range factors.n {
			f := &factors.all[j]
			sign := int64(1)
			if below {
				sign = -1
			}
			r, ok := s.times(f, sign)
			if ok && j == 0 {
				sofar.all[i] = r
			} else if ok && !sofar.add(r) {
				return p.fail(tooMany)
			}
			if ok && s.below && !over {
				r, ok = s.times(f, 1)
				if ok && !sofar.add(r) {
					return p.fail(tooMany)
				}
			}
			if !ok {
				return p.fail("exponent or size too large")
			}
		}
	}
	return nil
}

const tooMany = "too many ways to read it; use brackets"

// times returns the reading r·f, or r/f below a solidus with sign −1.
func (r *reading) times(f *reading, sign int64) (reading, bool) {
	dim, ok := r.dim.times(f.dim, sign)
	size := r.size * f.size
	if sign < 0 {
		size = r.size / f.size
	}
	return reading{dim, size, r.splits + f.splits, sign < 0}, ok && size > 0 && isFinite(size)
}

// factor reads one symbol or bracket with its exponent and puts its readings into dst.
func (p *unitParser) factor(dst *meanings, depth int) error {
	if strings.HasPrefix(p.rest(), "(") {
		p.at++
		if err := p.product(dst, depth+1); err != nil {
			return err
		}
		if !strings.HasPrefix(p.rest(), ")") {
			return p.fail("a bracket is not closed")
		}
		p.at++
		for i := range dst.list() {
			dst.all[i].below = false
		}
		return p.raise(dst)
	}
	start := p.at
	run := p.run()
	switch {
	case run == "":
		_, n := utf8.DecodeRuneInString(p.rest())
		return p.fail("unexpected " + strconv.Quote(p.rest()[:n]))
	case run == "1":
		dst.add(reading{size: 1})
		return nil
	}
	symbolReadings(dst, run)
	if dst.n == 0 {
		p.at = start
		return p.fail("unknown unit " + strconv.Quote(run))
	}
	return p.raise(dst)
}

// run reads the letters of a symbol, or the number 1.
func (p *unitParser) run() string {
	rest := p.rest()
	if strings.HasPrefix(rest, "inH2O") {
		p.at += len("inH2O")
		return "inH2O"
	}
	if strings.HasPrefix(rest, "1") && (len(rest) == 1 || strings.ContainsRune("/ ·.)", firstRune(rest[1:]))) {
		p.at++
		return "1"
	}
	end := 0
	for end < len(rest) && !endsSymbol(rest[end:]) {
		_, n := utf8.DecodeRuneInString(rest[end:])
		end += n
	}
	p.at += end
	return rest[:end]
}

// endsSymbol reports whether a text begins with what cannot be part of a symbol: space, operator,
// bracket or exponent.
func endsSymbol(s string) bool {
	if c := s[0]; c < utf8.RuneSelf {
		return c == ' ' || c >= '(' && c <= '9' && c != ',' || c == '^'
	}
	return strings.ContainsRune("·⁺⁻⁰¹²³⁴⁵⁶⁷⁸⁹", firstRune(s))
}

func firstRune(s string) rune {
	r, _ := utf8.DecodeRuneInString(s)
	return r
}

// raise reads an exponent, if one follows, and applies it to the readings.
func (p *unitParser) raise(m *meanings) error {
	num, den, ok, err := p.exponent()
	if err != nil || !ok {
		return err
	}
	raised := 0
	for _, r := range m.list() {
		if r.splits > 0 {
			continue // in mK², the square would belong to one of the two
		}
		dim, fits := r.dim.power(num, den)
		size := raise(r.size, num, den)
		if !fits || !(size > 0) || !isFinite(size) {
			return p.fail("exponent too large")
		}
		m.all[raised] = reading{dim: dim, size: size}
		raised++
	}
	m.n = raised
	if raised == 0 {
		return p.fail("an exponent on a product without brackets")
	}
	return nil
}

// exponent reads ², ^2, 2, ^-1, -1, ^(1/2) or ^0.5.
func (p *unitParser) exponent() (num, den int64, ok bool, err error) {
	rest := p.rest()
	if rest == "" || rest[0] < utf8.RuneSelf && !strings.ContainsRune("^+-0123456789", rune(rest[0])) {
		return 0, 0, false, nil
	}
	if end := strings.IndexFunc(rest, func(r rune) bool { return !strings.ContainsRune("⁺⁻⁰¹²³⁴⁵⁶⁷⁸⁹", r) }); end != 0 {
		if end < 0 {
			end = len(rest)
		}
		p.at += end
		return p.ratio(subscripts.Replace(rest[:end]))
	}
	caret := strings.HasPrefix(rest, "^")
	if caret {
		p.at++
		rest = p.rest()
		if strings.HasPrefix(rest, "(") {
			end := strings.IndexByte(rest, ')')
			if end < 0 {
				return 0, 0, false, p.fail("a bracket is not closed")
			}
			p.at += end + 1
			return p.ratio(rest[1:end])
		}
	}
	i := 0
	if i < len(rest) && (rest[i] == '-' || rest[i] == '+') {
		i++
	}
	end := skipDigits(rest, i)
	if caret && end > i && end < len(rest) && rest[end] == '.' && skipDigits(rest, end+1) > end+1 {
		end = skipDigits(rest, end+1)
	}
	if end == i {
		if caret || i > 0 {
			return 0, 0, false, p.fail("an exponent is missing")
		}
		return 0, 0, false, nil
	}
	p.at += end
	return p.ratio(rest[:end])
}

var subscripts = strings.NewReplacer("⁺", "+", "⁻", "-", "⁰", "0", "¹", "1", "²", "2", "³", "3", "⁴", "4", "⁵", "5", "⁶", "6", "⁷", "7", "⁸", "8", "⁹", "9")

// ratio reads an exponent written as 2, -1, 1/2 or 0.5.
func (p *unitParser) ratio(s string) (num, den int64, ok bool, err error) {
	if len(s) == 1 && s[0] >= '1' && s[0] <= '9' { // nearly always
		return int64(s[0] - '0'), 1, true, nil
	}
	top, bottom, _ := strings.Cut(strings.TrimSpace(s), "/")
	if whole, decimals, decimal := strings.Cut(top, "."); decimal && len(decimals) <= 2 {
		top = whole + decimals
		bottom = "1" + strings.Repeat("0", len(decimals))
	}
	if bottom == "" {
		bottom = "1"
	}
	num, err1 := strconv.ParseInt(top, 10, 16)
	den, err2 := strconv.ParseInt(bottom, 10, 16)
	if err1 != nil || err2 != nil || den <= 0 || num == 0 || max(num, -num, den) > maxExponent {
		return 0, 0, false, p.fail("exponent " + strconv.Quote(s) + " not understood; write 2, -1 or (1/2)")
	}
	return num, den, true, nil
}

// tails are the symbols that people append to another one without a space: a degree or a time.
var tails = []string{"K", "s", "h", "F", "C", "R", "min"}

// symbolReadings adds the meanings of a run of letters: a symbol of the table, a symbol with a
// prefix, and two symbols written together where the second is one of tails, or as N m is.
func symbolReadings(dst *meanings, run string) {
	if a, ok := whole(run); ok {
		dst.add(reading{dim: a.dim, size: a.size})
	}
	if len(run) < 2 {
		return
	}
	for _, tail := range tails {
		if !strings.HasSuffix(run, tail) {
			continue
		}
		for _, mark := range []string{"°", "deg", ""} {
			head, degree := strings.CutSuffix(run[:len(run)-len(tail)], mark)
			if degree && head != "" && !strings.HasSuffix(head, "°") && !strings.HasSuffix(head, "deg") {
				addPair(dst, head, run[len(head):])
			}
		}
	}
	if run == "Nm" {
		addPair(dst, "N", "m")
	}
}

// addPair adds the product of two symbols, if both are known. There is room: each tail gives one pair.
func addPair(dst *meanings, first, second string) {
	a, ok1 := whole(first)
	if !ok1 {
		return
	}
	b, ok2 := whole(second)
	if dim, fits := a.dim.times(b.dim, 1); ok2 && fits {
		dst.add(reading{dim: dim, size: a.size * b.size, splits: 1})
	}
}

// whole finds a symbol of the table, with or without an SI prefix.
func whole(symbol string) (atom, bool) {
	if a, ok := symbols().atoms[symbol]; ok {
		return a, true
	}
	for _, p := range prefixes {
		if rest, cut := strings.CutPrefix(symbol, p.symbol); cut {
			if a, ok := symbols().atoms[rest]; ok && a.prefix {
				a.size *= p.size
				return a, true
			}
		}
	}
	return atom{}, false
}

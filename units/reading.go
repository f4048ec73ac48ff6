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
	splits int  // how many runs of letters were taken apart
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
const maxReadings = 64

// maxExponent bounds the exponents that are read, so that what was read can be printed and read again.
const maxExponent = 99

// readings returns all meanings of a unit text, at least one, whole symbols first.
func readings(unit string) ([]reading, error) {
	p := &unitParser{text: unit}
	all, err := p.product(0)
	if err != nil {
		return nil, err
	}
	if p.at < len(unit) {
		return nil, p.fail("a closing bracket without an opening one")
	}
	return all, nil
}

// A unitParser walks over a unit text.
type unitParser struct {
	text string
	at   int
}

func (p *unitParser) fail(reason string) error { return &SyntaxError{p.text, p.at, reason} }

func (p *unitParser) rest() string { return p.text[p.at:] }

// product reads factors up to the end of the text or a closing bracket.
func (p *unitParser) product(depth int) ([]reading, error) {
	if depth > 4 {
		return nil, p.fail("brackets nested too deeply")
	}
	sofar := []reading{{size: 1}}
	for first := true; ; first = false {
		over, explicit := p.operator()
		if p.rest() == "" || p.rest()[0] == ')' {
			if first || explicit {
				return nil, p.fail("a unit symbol is missing")
			}
			return sofar, nil
		}
		factors, err := p.factor(depth)
		if err != nil {
			return nil, err
		}
		if sofar, err = p.combine(sofar, factors, over); err != nil {
			return nil, err
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
func (p *unitParser) combine(sofar, factors []reading, over bool) ([]reading, error) {
	var all []reading
	for _, s := range sofar {
		signs := []int64{1}
		switch {
		case over:
			signs = []int64{-1}
		case s.below:
			signs = []int64{-1, 1}
		}
		for _, f := range factors {
			for _, sign := range signs {
				dim, ok := s.dim.times(f.dim, sign)
				size := s.size * f.size
				if sign < 0 {
					size = s.size / f.size
				}
				if !ok || dim.outOf(maxExponent) || !(size > 0) || !isFinite(size) {
					return nil, p.fail("exponent or size too large")
				}
				all = append(all, reading{dim, size, s.splits + f.splits, sign < 0})
			}
		}
	}
	if len(all) > maxReadings {
		return nil, p.fail("too many ways to read it; use brackets")
	}
	return all, nil
}

// factor reads one symbol or bracket with its exponent.
func (p *unitParser) factor(depth int) ([]reading, error) {
	if strings.HasPrefix(p.rest(), "(") {
		p.at++
		inner, err := p.product(depth + 1)
		if err != nil {
			return nil, err
		}
		if !strings.HasPrefix(p.rest(), ")") {
			return nil, p.fail("a bracket is not closed")
		}
		p.at++
		return p.raise(inner)
	}
	start := p.at
	run := p.run()
	switch {
	case run == "":
		_, n := utf8.DecodeRuneInString(p.rest())
		return nil, p.fail("unexpected " + strconv.Quote(p.rest()[:n]))
	case run == "1":
		return []reading{{size: 1}}, nil
	}
	all := symbolReadings(run)
	if len(all) == 0 {
		p.at = start
		return nil, p.fail("unknown unit " + strconv.Quote(run))
	}
	return p.raise(all)
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
	end := strings.IndexFunc(rest, func(r rune) bool {
		return strings.ContainsRune(" ·./()^+-0123456789⁺⁻⁰¹²³⁴⁵⁶⁷⁸⁹", r)
	})
	if end < 0 {
		end = len(rest)
	}
	p.at += end
	return rest[:end]
}

func firstRune(s string) rune {
	r, _ := utf8.DecodeRuneInString(s)
	return r
}

// raise reads an exponent, if one follows, and applies it to the readings.
func (p *unitParser) raise(all []reading) ([]reading, error) {
	num, den, ok, err := p.exponent()
	if err != nil || !ok {
		return all, err
	}
	var raised []reading
	for _, r := range all {
		if r.splits > 0 {
			continue // in mK², the square would belong to one of the two
		}
		dim, fits := r.dim.power(num, den)
		size := raise(r.size, num, den)
		if !fits || dim.outOf(maxExponent) || !(size > 0) || !isFinite(size) {
			return nil, p.fail("exponent too large")
		}
		raised = append(raised, reading{dim: dim, size: size})
	}
	if len(raised) == 0 {
		return nil, p.fail("an exponent on a product without brackets")
	}
	return raised, nil
}

// exponent reads ², ^2, 2, ^-1, -1, ^(1/2) or ^0.5.
func (p *unitParser) exponent() (num, den int64, ok bool, err error) {
	rest := p.rest()
	if end := strings.IndexFunc(rest, func(r rune) bool { return !strings.ContainsRune("⁺⁻⁰¹²³⁴⁵⁶⁷⁸⁹", r) }); end != 0 && rest != "" {
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

// symbolReadings returns the meanings of a run of letters: a symbol of the table, a symbol with a
// prefix, and two symbols written together where the second is one that people append: K, a degree, a time.
func symbolReadings(run string) []reading {
	var all []reading
	if a, ok := whole(run); ok {
		all = append(all, reading{dim: a.dim, size: a.size})
	}
	for _, tail := range []string{"K", "°C", "°F", "°R", "degC", "degF", "degR", "F", "C", "s", "h", "min", "Nm"} {
		head := strings.TrimSuffix(run, tail)
		if tail == "Nm" && run == "Nm" {
			head, tail = "N", "m"
		}
		if head == run || head == "" {
			continue
		}
		h, ok1 := whole(head)
		t, ok2 := whole(tail)
		if dim, fits := h.dim.times(t.dim, 1); ok1 && ok2 && fits {
			all = append(all, reading{dim: dim, size: h.size * t.size, splits: 1})
		}
	}
	return all
}

// whole finds a symbol of the table, with or without an SI prefix.
func whole(symbol string) (atom, bool) {
	if a, ok := atoms[symbol]; ok {
		return a, true
	}
	for _, p := range prefixes {
		if rest, cut := strings.CutPrefix(symbol, p.symbol); cut {
			if a, ok := atoms[rest]; ok && a.prefix {
				a.size *= p.size
				return a, true
			}
		}
	}
	return atom{}, false
}

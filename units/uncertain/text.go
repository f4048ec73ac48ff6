package uncertain

import (
	"cmp"
	"encoding/json"
	"fmt"
	"math"
	"slices"
	"strconv"
	"strings"

	"example.com/coolward/units"
)

// A printer writes numbers of one answer in one unit, down to one decimal place.
type printer struct {
	unit  string
	size  float64 // SI of one unit
	zero  float64 // SI number of the 0 of the scale
	place float64 // value of the last place in the unit, a power of ten
}

// newPrinter takes the unit in which v prints.
func newPrinter(v units.Value) printer {
	p := printer{unit: v.Unit(), size: 1, place: 1}
	switch n := v.Number(); {
	case v.IsPoint():
		p.zero = v.SI() - n // of degrees Celsius, which are as large as kelvins
	case n != 0 && v.SI() != 0:
		p.size = v.SI() / n
	}
	return p
}

// reach moves the last place to where a spread of x is known: to its first digit, and if that is 1 or 2
// to its second (common practice, no source), but not beyond what a Monte Carlo error of e allows: half
// a unit of the last place.
func (p *printer) reach(x, e float64) {
	x, e = x/p.size, e/p.size
	if !(x > 0) {
		p.place = 0
		return
	}
	p.place = lastPlace(x, 1)
	if first := math.Round(x / p.place); first < 3 {
		p.place = lastPlace(x, 2)
	}
	for e > p.place/2 {
		p.place *= 10
	}
}

// number writes an SI number without the unit.
func (p *printer) number(si float64) string {
	x := (si - p.zero) / p.size
	if p.place == 0 {
		return strconv.FormatFloat(x, 'g', 6, 64)
	}
	decimals := -int(math.Round(math.Log10(p.place)))
	if decimals > 12 || decimals < -12 {
		digits := 1 + int(math.Floor(math.Log10(max(math.Abs(x), p.place)))) + decimals
		return strconv.FormatFloat(x, 'g', min(max(digits, 1), 15), 64)
	}
	if decimals < 0 {
		x, decimals = math.Round(x/p.place)*p.place, 0
	}
	text := strconv.FormatFloat(x, 'f', decimals, 64)
	if strings.Trim(text, "-0.") == "" {
		return strings.TrimPrefix(text, "-")
	}
	return text
}

// with writes an SI number with the unit.
func (p *printer) with(si float64) string { return strings.TrimSuffix(p.number(si)+" "+p.unit, " ") }

// result is what the texts of a [Result] need, in SI numbers.
type result struct {
	printer
	low, likely, high, spread float64
}

func (r Result[Q, S]) numbers() (result, bool) {
	likely, ok := dynamicOf(r.Likely)
	if !ok || r.Cases == 0 {
		return result{}, false
	}
	low, _ := dynamicOf(r.Low)
	high, _ := dynamicOf(r.High)
	spread, _ := dynamicOf(r.StandardUncertainty)
	n := result{low: low.SI(), likely: likely.SI(), high: high.SI(), spread: spread.SI()}
	for _, v := range []units.Value{low, high} {
		if likely.SI() == 0 && v.SI() != 0 {
			likely = v
		}
	}
	n.printer = newPrinter(likely)
	e := 0.0
	for _, s := range []S{r.Errors.Low, r.Errors.Likely, r.Errors.High} {
		v, _ := dynamicOf(s)
		e = max(e, v.SI())
	}
	n.reach(n.spread, e)
	return n, true
}

func dynamicOf(q any) (units.Value, bool) {
	d, ok := q.(interface{ Dynamic() units.Value })
	if !ok {
		return units.Value{}, false
	}
	return d.Dynamic(), true
}

// String writes the answer with the digits that are known, such as "about 38 min, 31 to 48 min at 95 %", and says first
// how many cases have one.
func (r Result[Q, S]) String() string {
	n, ok := r.numbers()
	if !ok {
		return "no result"
	}
	text := fmt.Sprintf("about %s, %s to %s at %s", n.with(n.likely), n.number(n.low), n.with(n.high), percent(r.Coverage, 4))
	if r.Answered < r.Cases {
		text = fmt.Sprintf("%s of the cases have an answer (%s); of those %s", r.portion(r.Answered), r.reasons(), text)
	}
	if !r.Converged {
		text += "; the sampling has not converged"
	}
	return text
}

// portion writes how many of the cases, with the digits that their number allows.
func (r Result[Q, S]) portion(cases int) string {
	if cases == 0 || cases == r.Cases {
		return percent(float64(cases)/float64(r.Cases), 3)
	}
	share := float64(cases) / float64(r.Cases)
	p := printer{unit: "%", size: 1}
	deviation := 100 * math.Sqrt(share*(1-share)/float64(r.Cases))
	p.reach(deviation, deviation)
	p.place = max(p.place, 0.1)
	switch text := p.number(100 * share); {
	case strings.Trim(text, "0.") == "":
		return "under 0.1 %"
	case strings.HasPrefix(text, "100"):
		return "over 99.9 %"
	default:
		return text + " %"
	}
}

func (r Result[Q, S]) reasons() string {
	reasons := make([]string, 0, len(r.Missing))
	for _, m := range r.Missing {
		reasons = append(reasons, r.portion(m.Cases)+" "+m.Kind.String())
	}
	return strings.Join(reasons, ", ")
}

func percent(x float64, digits int) string {
	return strconv.FormatFloat(100*x, 'g', digits, 64) + " %"
}

// Report writes a page: the answer, where its spread comes from, what measuring better would bring, and the
// inputs with their sources.
func (r Result[Q, S]) Report() string {
	n, ok := r.numbers()
	if !ok {
		return "no result\n"
	}
	var b strings.Builder
	fmt.Fprintf(&b, "%v\n", r)
	spread, _ := dynamicOf(r.StandardUncertainty)
	writeSpread := func(v, e units.Value) string {
		p := newPrinter(spread)
		if n.zero == 0 {
			p.unit, p.size = n.unit, n.size
		}
		p.place = lastPlace(v.SI()/p.size, 2)
		for e.SI()/p.size > p.place/2 && p.place > 0 {
			p.place *= 10
		}
		return p.with(v.SI())
	}
	e, _ := dynamicOf(r.Errors.StandardUncertainty)
	fmt.Fprintf(&b, "standard uncertainty %s\n", writeSpread(spread, e))
	for i, s := range r.sorted() {
		if i == 0 {
			b.WriteString("\nshare of the variance, with interactions\n")
		}
		fmt.Fprintf(&b, "  %.0f ± %.0f %% from %s\n", math.Abs(math.Round(100*s.Total)), math.Ceil(100*s.TotalError), strings.Join(s.Inputs, " with "))
	}
	for i, h := range r.Halvings {
		if i == 0 {
			b.WriteString("\nstandard uncertainty if the spread of one input were half\n")
		}
		v, _ := dynamicOf(h.StandardUncertainty)
		e, _ := dynamicOf(h.Error)
		fmt.Fprintf(&b, "  %s with %s\n", writeSpread(v, e), h.Input)
	}
	b.WriteString("\ninputs\n")
	for _, in := range r.Inputs {
		fmt.Fprintf(&b, "  %s: %s (%v)\n", in.Name, in.Distribution, in.Origin)
	}
	for _, m := range r.Missing {
		fmt.Fprintf(&b, "\n%d of %d cases %v, the first: %s\n", m.Cases, r.Cases, m.Kind, m.Text)
	}
	return b.String()
}

// sorted returns the shares, the largest first.
func (r Result[Q, S]) sorted() []Share {
	shares := slices.Clone(r.Shares)
	slices.SortStableFunc(shares, func(a, b Share) int { return cmp.Compare(b.Total, a.Total) })
	return shares
}

// MarshalJSON writes every number whole, with its unit, and the text of String beside them.
func (r Result[Q, S]) MarshalJSON() ([]byte, error) {
	type plain Result[Q, S]
	return json.Marshal(struct {
		Text string `json:"text"`
		plain
	}{r.String(), plain(r)})
}

// String writes the estimate with its expanded uncertainty, such as "38.1 ± 8.4 min at 95 %".
func (l Linear[Q, S]) String() string {
	estimate, ok := dynamicOf(l.Estimate)
	if !ok || l.digits == 0 {
		return "no result"
	}
	high, _ := dynamicOf(l.High)
	p := newPrinter(estimate)
	expanded := high.SI() - estimate.SI()
	p.reach(expanded, 0)
	u := p
	u.zero = 0
	return fmt.Sprintf("%s ± %s at %s", p.number(estimate.SI()), u.with(expanded), percent(l.Coverage, 4))
}

package units

import (
	"strings"
	"sync"
)

// An atom is a unit symbol without operators, as it stands in a product.
type atom struct {
	dim    dimension
	size   float64
	prefix bool
}

// A symbolTable is what reading looks things up in.
type symbolTable struct {
	spelled [len(kinds)]map[string]float64 // units of a kind by a whole spelling, so that the usual texts need no grammar
	atoms   map[string]atom                // symbols for the grammar
	known   map[dimension]bool             // dimensions of all kinds: what an undirected reading may turn out to be
}

// symbols returns the table. It is made at first use, so that a program that reads no text does not pay for it,
// and only read from then on.
var symbols = sync.OnceValue(func() *symbolTable {
	t := &symbolTable{atoms: map[string]atom{}, known: map[dimension]bool{}}
	forms := []*strings.Replacer{
		strings.NewReplacer(),
		strings.NewReplacer("⁻", "-", "¹", "1", "²", "2", "³", "3", "·", " ", "µ", "u"),
		strings.NewReplacer("⁻¹", "^-1", "⁻²", "^-2", "⁻³", "^-3", "²", "^2", "³", "^3", "·", " ", "µ", "u"),
	}
	degree := []*strings.Replacer{strings.NewReplacer(), strings.NewReplacer("°F", "degF"), strings.NewReplacer("°F", "F")}
	tight := strings.NewReplacer("²", "2", "³", "3", "·", "", "(", "", ")", "")
	for i := range kinds {
		t.known[kinds[i].dim] = true
		t.spelled[i] = map[string]float64{}
		for _, u := range kinds[i].units {
			for _, s := range append([]string{u.symbol, withPowers(u.symbol)}, u.spellings...) {
				for _, form := range forms {
					for _, d := range degree {
						t.spelled[i][d.Replace(form.Replace(s))] = u.factor
					}
				}
				if !strings.ContainsAny(s, "·/²³^ ") {
					t.atoms[s] = atom{kinds[i].dim, u.factor, u.prefix}
				}
			}
			if u.factor == 1 { // W/m2K
				t.spelled[i][tight.Replace(u.symbol)] = u.factor
			}
		}
	}
	for s, size := range degrees {
		t.atoms[s] = atom{kelvinDimension, size, false}
	}
	return t
})

// withPowers writes a quotient with negative powers: W·m⁻²·K⁻¹ for W/(m²·K).
func withPowers(symbol string) string {
	over, under, quotient := strings.Cut(symbol, "/")
	if !quotient || strings.Contains(under, "^") {
		return symbol
	}
	for _, factor := range strings.Split(strings.Trim(under, "()"), "·") {
		switch base, square := strings.CutSuffix(factor, "²"); {
		case square:
			over += "·" + base + "⁻²"
		case strings.HasSuffix(factor, "³"):
			over += "·" + strings.TrimSuffix(factor, "³") + "⁻³"
		default:
			over += "·" + factor + "⁻¹"
		}
	}
	return strings.TrimPrefix(over, "1·")
}

// degrees are the symbols of temperature scales. Inside a product, as in W/(m² °C), one stands for a
// difference of one degree.
var degrees = map[string]float64{
	"°C": 1, "degC": 1, "C": 1, "Cel": 1, "deg C": 1, "celsius": 1,
	"°F": 5.0 / 9, "degF": 5.0 / 9, "F": 5.0 / 9, "deg F": 5.0 / 9, "fahrenheit": 5.0 / 9,
}

// scales are the spellings of a temperature scale where a point is read.
var scales = map[string]Scale{
	"K": Kelvin, "kelvin": Kelvin,
	"°C": Celsius, "degC": Celsius, "C": Celsius, "Cel": Celsius, "deg C": Celsius, "celsius": Celsius,
	"°F": Fahrenheit, "degF": Fahrenheit, "F": Fahrenheit, "deg F": Fahrenheit, "fahrenheit": Fahrenheit,
	"°R": Rankine, "degR": Rankine, "R": Rankine,
}

// prefixes are the SI prefixes that occur in the trade (SI Brochure, 9th ed., Table 7).
var prefixes = []struct {
	symbol string
	size   float64
}{
	{"da", 1e1},
	{"T", 1e12},
	{"G", 1e9},
	{"M", 1e6},
	{"k", 1e3},
	{"h", 1e2},
	{"d", 1e-1},
	{"c", 1e-2},
	{"m", 1e-3},
	{"µ", 1e-6},
	{"u", 1e-6},
	{"n", 1e-9},
	{"p", 1e-12},
}

// spellingOf folds the characters that look alike into one: spaces of all widths, micro signs, the
// characters for a whole symbol, and dashes for minus.
var spellingOf = strings.NewReplacer(
	"\u00a0", " ", "\u2009", " ", "\u202f", " ", "\u2007", " ", "\t", " ",
	"μ", "µ", "\u2126", "Ω", "\u212a", "K", "\u2103", "°C", "\u2109", "°F", "º", "°", "˚", "°",
	"⋅", "·", "•", "·", "∙", "·", "×", "·", "**", "^", "*", "·", "÷", "/", "∕", "/", "−", "-", "–", "-",
)

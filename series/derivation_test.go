package series_test

import (
	"fmt"
	"math"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// printedNumbers reads the lines of a printed derivation: symbol, number and unit.
func printedNumbers(t *testing.T, text string) map[string]float64 {
	t.Helper()
	toSI := map[string]func(float64) float64{
		"":          func(x float64) float64 { return x },
		"min":       func(x float64) float64 { return 60 * x },
		"mm":        func(x float64) float64 { return x / 1000 },
		"W/(m·K)":   func(x float64) float64 { return x },
		"W/(m²·K)":  func(x float64) float64 { return x },
		"kg/m³":     func(x float64) float64 { return x },
		"J/(kg·K)":  func(x float64) float64 { return x },
		"kJ/(kg·K)": func(x float64) float64 { return 1000 * x },
		"mm²/s":     func(x float64) float64 { return x / 1e6 },
		"cm²":       func(x float64) float64 { return x / 1e4 },
		"mL":        func(x float64) float64 { return x / 1e6 },
		"J":         func(x float64) float64 { return x },
		"°C":        func(x float64) float64 { return x + 273.15 },
	}
	line := regexp.MustCompile(`(\S+)\s+= (\S+) ?(\S*)  `)
	numbers := map[string]float64{}
	for _, l := range strings.Split(text, "\n") {
		m := line.FindStringSubmatch(l)
		if m == nil || strings.HasPrefix(l, "  note") || strings.HasPrefix(l, "  source") {
			continue
		}
		x, err := strconv.ParseFloat(m[2], 64)
		convert := toSI[m[3]]
		if err != nil || convert == nil {
			t.Fatalf("line %q: number %q, unit %q", l, m[2], m[3])
		}
		numbers[m[1]] = convert(x)
	}
	return numbers
}

// What is printed is enough to recompute every temperature by the formulas of the notes. Ten digits
// are printed, so ten kelvins of excess are met to some 1e-8.
func TestDerivationSuffices(t *testing.T) {
	s := sphere(t, 0.016, 1, 2500, 800, 300, 363.15, 293.15)
	n := printedNumbers(t, s.Derivation().String())
	within := func(what string, got, want, relative float64) {
		t.Helper()
		if !(math.Abs(got-want) <= relative*math.Abs(want)) {
			t.Errorf("%s: %.12g from the printed numbers, want %.12g within %g relative", what, got, want, relative)
		}
	}
	within("R", n["D"]/2, n["R"], 1e-9)
	within("A", math.Pi*n["D"]*n["D"], n["A"], 1e-9)
	within("V", math.Pi*n["D"]*n["D"]*n["D"]/6, n["V"], 1e-9)
	within("alpha", n["k"]/(n["rho"]*n["c"]), n["alpha"], 1e-9)
	within("Bi", n["h"]*n["R"]/n["k"], n["Bi"], 1e-9)
	within("tF", n["R"]*n["R"]/n["alpha"], n["tF"], 1e-9)
	within("Q0", n["rho"]*n["c"]*n["V"]*(n["T0"]-n["Tinf"]), n["Q0"], 1e-9)

	bi, h := n["Bi"], n["Bi"]-1
	root := func(i int) float64 { return n[fmt.Sprintf("zeta_%d", i)] }
	coefficient := func(i int) float64 { return n[fmt.Sprintf("C_%d", i)] }
	for i := 1; i <= 14; i++ {
		z := root(i)
		within(fmt.Sprintf("zeta cot(zeta) of root %d", i), z/math.Tan(z), 1-bi, 1e-6)
		want := 2 * bi * math.Sqrt(z*z+h*h) / (z*z + bi*bi - bi)
		if i%2 == 0 {
			want = -want
		}
		within(fmt.Sprintf("C_%d", i), want, coefficient(i), 1e-9)
	}
	series := func(fo float64, c func(i int) float64) float64 {
		sum := 0.0
		for i := 1; i <= 14; i++ {
			sum += c(i) * math.Exp(-root(i)*root(i)*fo)
		}
		return sum
	}
	surface := func(i int) float64 { return 2 * bi / (root(i)*root(i) + bi*bi - bi) }
	early := func(d, fo float64) float64 {
		a, b := d/(2*math.Sqrt(fo)), h*math.Sqrt(fo)
		return (math.Erfc(a) - math.Exp(h*d+h*h*fo)*math.Erfc(a+b)) / h
	}
	x := 0.25 // 6 mm below the surface
	for _, seconds := range []float64{0.5, 2, 3.3, 10, 60, 200} {
		fo := seconds / n["tF"]
		for place, theta := range map[shape.Place]float64{
			shape.Centre():  series(fo, coefficient),
			shape.Surface(): series(fo, surface),
			shape.Mean():    series(fo, func(i int) float64 { return 3 * bi * surface(i) / (root(i) * root(i)) }),
			shape.Below(units.Millimetre.Of(6)): series(fo, func(i int) float64 {
				return coefficient(i) * math.Sin(root(i)*x) / (root(i) * x)
			}),
		} {
			if fo < 0.025 {
				switch place {
				case shape.Surface():
					theta = 1 - bi*(early(0, fo)-early(2, fo))
				case shape.Below(units.Millimetre.Of(6)):
					theta = 1 - bi*(early(1-x, fo)-early(1+x, fo))/x
				default:
					continue // a limit and an integral of these two
				}
			}
			got := n["Tinf"] + (n["T0"]-n["Tinf"])*theta
			want, err := s.At(place, units.Second.Of(seconds))
			if err != nil {
				t.Fatal(err)
			}
			if !(math.Abs(got-want.SI()) <= 5e-8) {
				t.Errorf("%v after %v s: %.11g K from the printed numbers, want %.11g within 5e-8", place, seconds, got, want.SI())
			}
		}
	}
}

// The same for the other bodies and conditions behind the join: the sums of the notes give the temperatures.
func TestDerivationOfBodies(t *testing.T) {
	const terms = 26
	for _, stone := range stones() {
		for _, surface := range []boundary.Condition{stone.problem.Surface, boundary.Temperature(units.Celsius.Of(20)), boundary.Flux(units.WattPerSquareMetre.Of(-400))} {
			p := stone.problem
			p.Surface = surface
			s := solve(t, p)
			r := s.Derivation()
			value := func(symbol string) float64 {
				v, ok := r.Value(symbol)
				if !ok {
					t.Fatalf("%s, %v: no line %s", stone.name, surface, symbol)
				}
				return v.SI()
			}
			within := func(what string, got, want float64) {
				t.Helper()
				if !(math.Abs(got-want) <= 1e-8) {
					t.Errorf("%s, %v: %s %.12g from the derivation, want %.12g", stone.name, surface, what, got, want)
				}
			}
			const seconds = 20.0
			centre, mean, rise := 1.0, 1.0, 0.0
			for i, b := range p.Body.Factors() {
				mark := ""
				if len(p.Body.Factors()) > 1 {
					mark = fmt.Sprintf("_%d", i+1)
				}
				fo, m := seconds/value("tF"+mark), 1.0
				switch b.Family() {
				case shape.Cylindrical:
					m = 2
				case shape.Spherical:
					m = 3
				}
				if _, flux := surface.ConstantFlux(); flux {
					f := m*fo - m/(2*(m+2))
					for n := 2; n <= terms; n++ {
						z, ok := r.Value(fmt.Sprintf("zeta%s_%d", mark, n))
						if ok {
							f -= value(fmt.Sprintf("D%s_%d", mark, n)) * math.Exp(-z.SI()*z.SI()*fo)
						}
					}
					rise += value("dT"+mark) * f
					continue
				}
				bi := math.Inf(1)
				if _, ok := surface.SurfaceTemperature(); !ok {
					bi = value("Bi" + mark)
				}
				sum, total := 0.0, 0.0
				for n := 1; n <= terms; n++ {
					z, ok := r.Value(fmt.Sprintf("zeta%s_%d", mark, n))
					if !ok {
						continue
					}
					decay, square := math.Exp(-z.SI()*z.SI()*fo), z.SI()*z.SI()
					sum += value(fmt.Sprintf("C%s_%d", mark, n)) * decay
					switch { // M_n = m Bi S_n / zeta_n², S_n = 2 Bi / (zeta_n² + Bi² + (2 − m) Bi)
					case math.IsInf(bi, 1):
						total += 2 * m / square * decay
					default:
						total += m * bi / square * 2 * bi / (square + bi*bi + (2-m)*bi) * decay
					}
				}
				centre, mean = centre*sum, mean*total
			}
			if _, flux := surface.ConstantFlux(); flux {
				within("centre", value("T0")-rise, kelvins(t, s, shape.Centre(), seconds))
				continue
			}
			within("centre", value("Tinf")+(value("T0")-value("Tinf"))*centre, kelvins(t, s, shape.Centre(), seconds))
			within("mean", value("Tinf")+(value("T0")-value("Tinf"))*mean, kelvins(t, s, shape.Mean(), seconds))
			seen := map[string]bool{}
			for _, l := range r.Lines {
				if seen[l.Symbol] {
					t.Errorf("%s, %v: symbol %s stands twice", stone.name, surface, l.Symbol)
				}
				seen[l.Symbol] = true
			}
		}
	}
}

// Sources and notes of the problem are repeated, the record is the caller's own, and it marshals.
func TestDerivationRepeats(t *testing.T) {
	p := marble()
	p.Sources, p.Notes = []string{"data sheet 7"}, []string{"the tray is left out"}
	s := solve(t, p)
	p.Sources[0], p.Notes[0] = "changed", "changed"
	r := s.Derivation()
	text := r.String()
	for _, want := range []string{"source: data sheet 7", "note: the tray is left out", "Carslaw", "= 2.4 "} {
		if !strings.Contains(text, want) {
			t.Errorf("derivation lacks %q:\n%s", want, text)
		}
	}
	if strings.Contains(text, "changed") {
		t.Error("the derivation follows a change of the problem made after solving")
	}
	r.Lines[0].Name = "changed"
	if strings.Contains(s.Derivation().String(), "changed") {
		t.Error("a change of one record shows in the next")
	}
	if _, err := r.MarshalJSON(); err != nil {
		t.Error(err)
	}
	seen := map[string]bool{}
	for _, l := range r.Lines {
		if seen[l.Symbol] {
			t.Errorf("symbol %s stands twice", l.Symbol)
		}
		seen[l.Symbol] = true
	}
	var none series.Solution
	if got := none.Derivation().String(); got != "" {
		t.Errorf("derivation of the zero Solution %q, want none", got)
	}
}

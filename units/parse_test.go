package units

import (
	"encoding/json"
	"errors"
	"flag"
	"math"
	"math/rand/v2"
	"strings"
	"testing"
	"testing/quick"
	"time"

	"github.com/google/go-cmp/cmp"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
)

// Spellings: SI Brochure, 9th ed., ch. 5; ISO 80000-1; UCUM codes from memory; the others are what
// engineers type (common practice, no source).
func TestParseSpellings(t *testing.T) {
	type reader func(string) (Value, error)
	length, coefficient := reader(dynamic[Length]), reader(dynamic[HeatTransferCoefficient])
	conductivity, heat := reader(dynamic[Conductivity]), reader(dynamic[SpecificHeat])
	for _, tt := range []struct {
		text string
		read reader
		want float64
	}{
		{"60 mm", length, 0.06},
		{" 60\u00a0mm ", length, 0.06},
		{"60\u202fmm", length, 0.06},
		{"-2.5e-1 m", length, -0.25},
		{"−2.5 µm", length, -2.5e-6},
		{"2.5 μm", length, 2.5e-6},
		{"6 dm", length, 0.6},
		{"1 in", length, 0.0254},
		{".5 ft", length, 0.1524},
		{"12 W/m2K", coefficient, 12},
		{"12 W/m² K", coefficient, 12},
		{"12 W/(m^2 K)", coefficient, 12},
		{"12 W/(m²·K)", coefficient, 12},
		{"12 W m^-2 K^-1", coefficient, 12},
		{"12 W·m⁻²·K⁻¹", coefficient, 12},
		{"12 W.m-2.K-1", coefficient, 12},
		{"12 W/m^2/°C", coefficient, 12},
		{"12 W/(m2*degC)", coefficient, 12},
		{"0.012 kW/(m² K)", coefficient, 12},
		{"1 BTU/(h ft^2 degF)", coefficient, 5.6782633411134878},
		{"1 Btu/(h·ft²·°F)", coefficient, 5.6782633411134878},
		{"1 Btu/hr ft2 F", coefficient, 5.6782633411134878},
		{"2 W/mK", conductivity, 2},
		{"2 W/m K", conductivity, 2},
		{"2 W/m/K", conductivity, 2},
		{"2 W/m·K", conductivity, 2},
		{"2 mW/mK", conductivity, 0.002},
		{"1 Btu in/(h ft2 F)", conductivity, 0.14422788886428259},
		{"480 J/kg K", heat, 480},
		{"480 J/kgK", heat, 480},
		{"0.48 kJ/(kg·K)", heat, 480},
		{"0.48 J/(g °C)", heat, 480},
		{"1 Btu/lb F", heat, 4186.8},
		{"2 °C/min", dynamic[TemperatureRate], 2.0 / 60},
		{"1 Pa s", dynamic[Viscosity], 1},
		{"1 Pas", dynamic[Viscosity], 1},
		{"5 cP", dynamic[Viscosity], 0.005},
		{"5 kg/ms", dynamic[Viscosity], 5},
		{"3 kWh", dynamic[Energy], 1.08e7},
		{"1 Nm", dynamic[Energy], 1},
		{"90 min", dynamic[Duration], 5400},
		{"1.5 hr", dynamic[Duration], 5400},
		{"12 1/K", dynamic[ExpansionCoefficient], 12},
		{"12 K-1", dynamic[ExpansionCoefficient], 12},
		{"12 /K", dynamic[ExpansionCoefficient], 12},
		{"1 ft² °F h/Btu", dynamic[ThermalInsulance], 0.17611018368230584},
		{"7 W s^(1/2)/(m² K)", dynamic[Effusivity], 7},
		{"7 W·s^0.5/(m²·K)", dynamic[Effusivity], 7},
		{"10 K", dynamic[TemperatureDifference], 10},
		{"18 °R", dynamic[TemperatureDifference], 10},
		{"30 psi", dynamic[Pressure], 206842.71879505084},
		{"1 inH2O", dynamic[Pressure], 249.08891},
		{"250 kcal/h", dynamic[Power], 290.75},
		{"100 °C", dynamic[Temperature], 373.15},
		{"100 degC", dynamic[Temperature], 373.15},
		{"212 °F", dynamic[Temperature], 373.15},
		{"300 K", dynamic[Temperature], 300},
		{"540 °R", dynamic[Temperature], 300},
	} {
		got, err := tt.read(tt.text)
		if err != nil || math.Abs(got.SI()-tt.want) > 4e-16*math.Abs(tt.want) {
			t.Errorf("%q reads as %.17g, %v; want %.17g (tolerance 4e-16)", tt.text, got.SI(), err, tt.want)
		}
	}
}

// dynamic reads a text as kind Q.
func dynamic[Q interface{ Dynamic() Value }, P interface {
	*Q
	parse(string) error
}](text string) (Value, error) {
	q, err := Parse[Q, P](text)
	return q.Dynamic(), err
}

func TestParseRefuses(t *testing.T) {
	for _, tt := range []struct {
		text     string
		read     func(string) (Value, error)
		position int
		says     string
	}{
		{"", dynamic[Length], 0, "empty"},
		{"   ", dynamic[Length], 3, "empty"},
		{"mm", dynamic[Length], 0, "no number"},
		{"60", dynamic[Length], 2, "no unit"},
		{"60 mn", dynamic[Length], 3, `unknown unit "mn"`},
		{"60 s", dynamic[Length], 3, "no unit of length"},
		{"1,5 mm", dynamic[Length], 1, "comma"},
		{"1 000 mm", dynamic[Length], 2, "second number"},
		{"1e999 m", dynamic[Length], 0, "too large"},
		{"1e308 km", dynamic[Length], 0, "too large"},
		{"NaN m", dynamic[Length], 0, "no number"},
		{"Inf m", dynamic[Length], 0, "no number"},
		{"0x10 m", dynamic[Length], 1, "unknown unit"},
		{"5 m^", dynamic[Length], 4, "exponent is missing"},
		{"5 m^300", dynamic[Length], 7, "exponent"},
		{"5 (m", dynamic[Length], 4, "bracket is not closed"},
		{"5 m)", dynamic[Length], 3, "closing bracket"},
		{"5 m//s", dynamic[Velocity], 4, "unexpected"},
		{"5 m/", dynamic[Length], 4, "symbol is missing"},
		{"5 kkm", dynamic[Length], 2, "unknown unit"},
		{"1h30min", dynamic[Duration], 1, "1.5 h or 90 min"},
		{"10 °C", dynamic[TemperatureDifference], 3, "as in 10 K"},
		{"10 °F", dynamic[TemperatureDifference], 3, "18 °R"},
		{"10 W", dynamic[Temperature], 3, "no temperature scale"},
		{"5 min", dynamic[Area], 2, "no unit of area"},
		{"5 W/mm", dynamic[HeatFlux], 2, "no unit of heat flux"},
		{strings.Repeat("1", 200) + " m", dynamic[Length], 160, "longer than"},
		{"5 " + strings.Repeat("(", 20) + "m", dynamic[Length], 7, "nested"},
		{"2 W/mK", ParseValue, 2, "two ways"},
		{"20 K", ParseValue, 2, "point on a scale or a difference"},
	} {
		got, err := tt.read(tt.text)
		var syntax *SyntaxError
		if !errors.As(err, &syntax) {
			t.Errorf("%q reads as %v, %v; want a syntax error", tt.text, got, err)
			continue
		}
		// A folded character may shift the place by a byte or two.
		if !strings.Contains(err.Error(), tt.says) || syntax.Position < tt.position-2 || syntax.Position > tt.position+2 {
			t.Errorf("%q: %v; want position %d and %q", tt.text, err, tt.position, tt.says)
		}
	}
}

func TestParseValue(t *testing.T) {
	for _, tt := range []struct {
		text, prints, dimension string
		si                      float64
		point                   bool
	}{
		{"5 min", "5 min", "s", 300, false},
		{"12 W/m2K", "12 W/m2K", "kg·s⁻³·K⁻¹", 12, false},
		{"180 °C", "180 °C", "K", 453.15, true},
		{"356 °F", "356 °F", "K", 453.15, true},
		{"3", "3", "1", 3, false},
		{"25 mm", "25 mm", "m", 0.025, false},
	} {
		v, err := ParseValue(tt.text)
		if err != nil || math.Abs(v.SI()-tt.si) > 1e-13*tt.si || v.String() != tt.prints || v.Dimension() != tt.dimension || v.IsPoint() != tt.point {
			t.Errorf("%q reads as %v (%.17g, dimension %s, point %t), %v; want %v (%g, %s, %t)", tt.text, v, v.SI(), v.Dimension(), v.IsPoint(), err, tt.prints, tt.si, tt.dimension, tt.point)
		}
	}
}

// What MarshalText writes reads back as the same bits, for every finite number.
func TestTextRoundTrip(t *testing.T) {
	f := func(x float64) bool {
		if !isFinite(x) {
			return true
		}
		return exact(x, HeatTransferCoefficient{si: x}) && exact(x, Effusivity{si: x}) && exact(x, Length{si: x}) && exact(x, Temperature{x})
	}
	if err := quick.Check(f, &quick.Config{MaxCount: 5000}); err != nil {
		t.Error(err)
	}
}

func exact[Q interface {
	MarshalText() ([]byte, error)
	SI() float64
}, P interface {
	*Q
	parse(string) error
}](x float64, q Q) bool {
	text, err := q.MarshalText()
	back, err2 := Parse[Q, P](string(text))
	return err == nil && err2 == nil && back.SI() == x
}

func TestEncodings(t *testing.T) {
	type record struct {
		Size  Length      `json:"size"`
		Start Temperature `json:"start"`
	}
	in := record{Millimetre.Of(60), Celsius.Of(180)}
	b, err := json.Marshal(in)
	require.NoError(t, err)
	assert.JSONEq(t, `{"size":"0.06 m","start":"453.15 K"}`, string(b))
	var out record
	require.NoError(t, json.Unmarshal([]byte(`{"size":"60 mm","start":"180 °C"}`), &out))
	if diff := cmp.Diff(in, out); diff != "" {
		t.Error(diff)
	}
	_, err = json.Marshal(Length{si: math.NaN()})
	assert.Error(t, err, "NaN has no text")

	flags := flag.NewFlagSet("test", flag.ContinueOnError)
	var speed Velocity
	flags.TextVar(&speed, "speed", MetrePerSecond.Of(0), "air speed")
	require.NoError(t, flags.Parse([]string{"-speed", "36 km/h"}))
	assert.InDelta(t, 10, speed.SI(), 1e-14)

	var scanned Pressure
	require.NoError(t, scanned.Scan([]byte("1 atm")))
	assert.Equal(t, 101325.0, scanned.SI())
	var argument *ArgumentError
	require.ErrorAs(t, scanned.Scan(1.5), &argument)
	stored, err := scanned.Value()
	require.NoError(t, err)
	assert.Equal(t, "101325 Pa", stored)

	d, err := ToTime(Hour.Of(1.5))
	require.NoError(t, err)
	assert.Equal(t, 90*time.Minute, d)
	assert.Equal(t, Second.Of(90), FromTime(90*time.Second))
	_, err = ToTime(Day.Of(1e6))
	require.ErrorAs(t, err, &argument)
}

// Texts made from the pieces of real ones, right and wrong, never panic, and those accepted read back.
func TestRandomTexts(t *testing.T) {
	pieces := []string{
		"1", "60", "2.5", "-3", "1e3", ".", ",", " ", "\u00a0", "/", "·", "*", "(", ")", "^", "-1", "2", "²", "⁻¹", "(1/2)",
		"m", "mm", "kg", "s", "K", "W", "J", "°C", "degF", "°R", "Btu", "ft", "in", "lb", "h", "min", "Pa", "N", "mK", "kWh", "cal", "x", "µ", "Ω", "[ft_i]", "inH2O", "per ",
	}
	random := rand.New(rand.NewPCG(3, 5))
	const texts = 100_000
	var b []byte
	accepted := 0
	for range texts {
		b = b[:0]
		if random.IntN(4) > 0 {
			b = append(b, pieces[random.IntN(5)]...)
			b = append(b, ' ')
		}
		for range 1 + random.IntN(7) {
			b = append(b, pieces[random.IntN(len(pieces))]...)
		}
		text := string(b)
		v, err := ParseValue(text)
		located(t, text, err)
		q, err := Parse[HeatTransferCoefficient](text)
		located(t, text, err)
		if err == nil && !exact(q.si, q) {
			t.Fatalf("%q reads as %v, which does not read back", text, q)
		}
		if full, err := v.MarshalText(); err == nil && v.unit != "" {
			accepted++
			if back, err := ParseValue(string(full)); !v.point && v.dim != kelvinDimension && (err != nil || back.si != v.si || back.dim != v.dim) {
				t.Fatalf("%q prints as %q and reads back as %v, %v", text, full, back, err)
			}
		}
	}
	if accepted < texts/50 {
		t.Errorf("only %d of %d texts were accepted; the pieces do not fit", accepted, texts)
	}
}

// Whatever is accepted prints and reads back as the same quantity; whatever is refused says where.
func FuzzParse(f *testing.F) {
	for _, s := range []string{"60 mm", "12 W/(m^2 K)", "2 W/mK", "1h30min", "180 °C", "5 J/(m²·K·s^(1/2))", "1e5 /K", "3 ft² °F h/Btu", "1 (((m", "−1.5e-3 µW/cm²"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, text string) {
		v, err := ParseValue(text)
		located(t, text, err)
		if err == nil {
			full, err := v.MarshalText()
			if err != nil || !v.IsFinite() {
				t.Fatalf("%q reads as %v, which has no text: %v", text, v.SI(), err)
			}
			back, err := ParseValue(string(full))
			if v.IsPoint() {
				if err != nil || math.Abs(back.SI()-v.SI()) > 2*ulp(max(math.Abs(v.SI()), 256)) {
					t.Fatalf("%q prints as %q and reads back as %.17g, %v", text, full, back.SI(), err)
				}
			} else if v.Dimension() != "K" && (err != nil || back.SI() != v.SI() || back.Dimension() != v.Dimension()) {
				t.Fatalf("%q prints as %q and reads back as %v, %v", text, full, back, err)
			}
		}
		fuzzKind[HeatTransferCoefficient](t, text)
		fuzzKind[Conductivity](t, text)
		fuzzKind[Duration](t, text)
		fuzzKind[Temperature](t, text)
	})
}

func fuzzKind[Q interface {
	MarshalText() ([]byte, error)
	SI() float64
}, P interface {
	*Q
	parse(string) error
}](t *testing.T, text string) {
	q, err := Parse[Q, P](text)
	located(t, text, err)
	if err == nil && (!isFinite(q.SI()) || !exact[Q, P](q.SI(), q)) {
		t.Fatalf("%q reads as %v, which does not read back", text, q.SI())
	}
}

func located(t *testing.T, text string, err error) {
	if err == nil {
		return
	}
	var s *SyntaxError
	if !errors.As(err, &s) || s.Position < 0 || s.Position > len(text) || s.Reason == "" {
		t.Fatalf("%q: error without place and reason: %v", text, err)
	}
}

package units

import (
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/internal/table"
)

var scaleOf = map[string]Scale{"K": Kelvin, "C": Celsius, "F": Fahrenheit, "R": Rankine}

// The defining points of the scales, with exact rationals (NIST SP 811, B.8, and SI Brochure, 9th ed.,
// 2.3.1, both from memory; ITS-90 points from memory are inputs only).
func TestScales(t *testing.T) {
	number := func(s string) float64 { return table.Number(t, s) }
	for _, row := range table.Named(t, "testdata/scales.csv") {
		given := number(row["given_value"])
		if row["kind"] == "difference" {
			size := map[string]Unit[temperatureDifference]{"K": KelvinDifference, "C": KelvinDifference, "F": RankineDifference, "R": RankineDifference}
			d := size[row["given_unit"]].Of(given)
			for _, unit := range []string{"K", "C", "F", "R"} {
				if got, want := d.In(size[unit]), number(row[unit]); math.Abs(got-want) > 2e-16*math.Abs(want) {
					t.Errorf("%s: %.17g %s, want %.17g (tolerance 1 ULP)", row["label"], got, unit, want)
				}
			}
			continue
		}
		T := scaleOf[row["given_unit"]].Of(given)
		for unit, scale := range scaleOf {
			want := number(row[unit])
			// One rounding of the kelvin value, scaled, and one of the sum.
			tolerance := 2*ulp(T.SI())*1.8 + ulp(want) + ulp(459.67)
			if got := T.In(scale); math.Abs(got-want) > tolerance {
				t.Errorf("%s: %.17g on scale %v, want %.17g (tolerance %g)", row["label"], got, scale, want, tolerance)
			}
		}
	}
}

func ulp(x float64) float64 {
	x = math.Abs(x)
	return math.Nextafter(x, math.Inf(1)) - x
}

// Out of a scale and back is within one ULP of the kelvin value, or of the offset where that is larger.
func TestScaleRoundTrip(t *testing.T) {
	f := func(x float64) bool {
		T := Kelvin.Of(math.Mod(math.Abs(x), 5000))
		for _, s := range scaleOf {
			back := s.Of(T.In(s))
			if math.Abs(back.SI()-T.SI()) > ulp(max(T.SI(), 256)) {
				t.Logf("%.17g K is %.17g %v and comes back as %.17g K", T.SI(), T.In(s), s, back.SI())
				return false
			}
		}
		return true
	}
	if err := quick.Check(f, &quick.Config{MaxCount: 20000}); err != nil {
		t.Error(err)
	}
}

func TestAffine(t *testing.T) {
	hot, cold := Celsius.Of(90), Celsius.Of(20)
	if got := hot.Sub(cold); math.Abs(got.SI()-70) > 1e-13 {
		t.Errorf("90 °C − 20 °C = %v, want 70 K", got)
	}
	if got := cold.Add(hot.Sub(cold)); math.Abs(got.SI()-hot.SI()) > ulp(hot.SI()) {
		t.Errorf("20 °C + (90 °C − 20 °C) = %v, want 90 °C", got)
	}
	if got := MeanTemperature(hot, cold).In(Celsius); math.Abs(got-55) > 1e-13 {
		t.Errorf("mean of 90 and 20 °C = %v, want 55 °C", got)
	}
	if got := MeanTemperature(); got.IsFinite() {
		t.Errorf("mean of nothing = %v, want NaN", got)
	}
	if got := Scale(9).Of(1); got.IsFinite() {
		t.Errorf("a temperature on no scale = %v, want NaN", got)
	}
}

package units

import (
	"math"
	"math/big"
	"strconv"
	"strings"
	"testing"

	"example.com/coolward/internal/table"
)

// sp811 maps a row of the table to one of our unit. Rows without a unit here are units that the
// trade of this library does not use, or that have no exact value.
var sp811 = map[string]float64{
	"in": float64(Inch), "ft": float64(Foot), "yd": float64(Yard), "mi": float64(Mile), "mil": float64(Mil),
	"in2": float64(SquareInch), "ft2": float64(SquareFoot), "in3": float64(CubicInch), "ft3": float64(CubicFoot),
	"gal_us": float64(USGallon), "L": float64(Litre), "lb": float64(Pound), "oz": float64(Ounce), "slug": float64(Slug),
	"t": float64(Tonne), "lbf": float64(PoundForce), "kgf": float64(KilogramForce), "dyn": float64(Dyne),
	"psi": float64(PoundForcePerSquareInch), "psf": float64(PoundForcePerSquareFoot), "inHg_conv": float64(InchOfMercury),
	"inH2O_conv": float64(InchOfWater), "mmHg_conv": float64(MillimetreOfMercury), "torr": float64(Torr),
	"atm": float64(StandardAtmosphere), "at": float64(TechnicalAtmosphere), "bar": float64(Bar), "mbar": float64(Millibar),
	"Btu_IT": float64(Btu), "Btu_th": float64(BtuThermochemical), "cal_IT": float64(Calorie), "cal_th": float64(CalorieThermochemical),
	"kcal_IT": float64(Kilocalorie), "kcal_th": float64(KilocalorieThermochemical), "kWh": float64(KilowattHour), "Wh": float64(WattHour),
	"erg": float64(Erg), "ftlbf": float64(FootPoundForce), "hp": float64(Horsepower), "hp_metric": float64(MetricHorsepower),
	"hp_elec": float64(ElectricHorsepower), "tonref": float64(TonOfRefrigeration), "Btu_h": float64(BtuPerHour), "Btu_s": float64(BtuPerSecond),
	"kcal_h": float64(KilocaloriePerHour), "Btu_hft2": float64(BtuPerHourSquareFoot), "Btu_sft2": float64(BtuPerSecondSquareFoot),
	"W_cm2": float64(WattPerSquareCentimetre), "W_in2": float64(WattPerSquareInch), "kcal_hm2": float64(KilocaloriePerHourSquareMetre),
	"Btu_hft2F": float64(BtuPerHourSquareFootFahrenheit), "Btu_sft2F": float64(BtuPerSecondSquareFootFahrenheit),
	"kcal_hm2C": float64(KilocaloriePerHourSquareMetreKelvin), "cal_scm2C": float64(CaloriePerSecondSquareCentimetreKelvin),
	"Btu_hftF": float64(BtuPerHourFootFahrenheit), "Btuin_hft2F": float64(BtuInchPerHourSquareFootFahrenheit),
	"kcal_hmC": float64(KilocaloriePerHourMetreKelvin), "Btu_lbF": float64(BtuPerPoundFahrenheit), "cal_gC": float64(CaloriePerGramKelvin),
	"Btu_F": float64(BtuPerFahrenheit), "Btu_lb": float64(BtuPerPound), "cal_g": float64(CaloriePerGram), "Btu_hft3": float64(BtuPerHourCubicFoot),
	"Rvalue": float64(SquareFootFahrenheitHourPerBtu), "clo": float64(Clo), "Fh_Btu": float64(FahrenheitHourPerBtu),
	"P": float64(Poise), "cP": float64(Centipoise), "lb_fts": float64(PoundPerFootSecond), "lb_fth": float64(PoundPerFootHour),
	"lbfs_ft2": float64(PoundForceSecondPerSquareFoot), "St": float64(Stokes), "cSt": float64(Centistokes), "ft2_h": float64(SquareFootPerHour),
	"ft2_s": float64(SquareFootPerSecond), "lb_ft3": float64(PoundPerCubicFoot), "lb_gal": float64(PoundPerUSGallon),
	"lb_in3": float64(PoundPerCubicInch), "g_cm3": float64(GramPerCubicCentimetre), "slug_ft3": float64(SlugPerCubicFoot),
	"mph": float64(MilePerHour), "kn": float64(Knot), "ft_min": float64(FootPerMinute), "ft_s": float64(FootPerSecond), "km_h": float64(KilometrePerHour),
	"cfm": float64(CubicFootPerMinute), "cfs": float64(CubicFootPerSecond), "gpm": float64(USGallonPerMinute), "lb_h": float64(PoundPerHour),
	"lb_min": float64(PoundPerMinute), "lb_s": float64(PoundPerSecond), "dyn_cm": float64(DynePerCentimetre), "lbf_ft": float64(PoundForcePerFoot),
	"lbf_in": float64(PoundForcePerInch), "ft_s2": float64(FootPerSecondSquared), "gn": float64(StandardGravity), "dR": float64(RankineDifference),
	"h": float64(Hour), "day": float64(Day),
}

// NIST SP 811 (2008), Appendix B: our factor is the exact rational correctly rounded, and it rounds to
// the printed digits. The printed digits are from memory (the table says which were read elsewhere).
func TestFactorsAgainstSP811(t *testing.T) {
	checked := 0
	for _, row := range table.Named(t, "testdata/units_sp811.csv") {
		got, ours := sp811[row["id"]]
		if !ours {
			continue
		}
		checked++
		num, ok1 := new(big.Rat).SetString(row["exact_num"])
		den, ok2 := new(big.Rat).SetString(row["exact_den"])
		if !ok1 || !ok2 {
			t.Errorf("%s: no exact value in the table", row["id"])
			continue
		}
		want, _ := new(big.Rat).Quo(num, den).Float64()
		if got != want {
			t.Errorf("%s: factor %.17g, exact rational %.17g", row["id"], got, want)
		}
		printed := strings.ReplaceAll(row["sp811_printed"], " ", "")
		if printed == "" {
			continue
		}
		// Compare as decimals, because half a digit (735.49875 W) is no binary number.
		mantissa, power, _ := strings.Cut(printed, "E")
		exponent, err := strconv.Atoi(power)
		if err != nil {
			t.Fatalf("%s: printed %q", row["id"], printed)
		}
		scaled := new(big.Rat).Quo(num, den)
		ten := big.NewRat(10, 1)
		for range max(exponent, -exponent) {
			if exponent > 0 {
				scaled.Quo(scaled, ten)
			} else {
				scaled.Mul(scaled, ten)
			}
		}
		places := len(mantissa) - strings.IndexByte(mantissa, '.') - 1
		if text := scaled.FloatString(places); text != mantissa {
			t.Errorf("%s: factor rounds to %sE%s, printed %s", row["id"], text, power, printed)
		}
	}
	if checked != len(sp811) {
		t.Errorf("%d of %d units were found in the table", checked, len(sp811))
	}
}

// Every line of units.csv is a unit of its kind with a source, and its symbol reads back as itself.
func TestTableIsSound(t *testing.T) {
	names := map[string]bool{}
	for i := range kinds {
		k := &kinds[i]
		if k.units[0].factor != 1 {
			t.Errorf("%s: the first unit, %s, is not coherent", k.name, k.units[0].name)
		}
		for _, u := range k.units {
			if u.source == "" {
				t.Errorf("%s has no source", u.name)
			}
			if names[u.name] {
				t.Errorf("%s stands twice", u.name)
			}
			names[u.name] = true
			if !(u.factor > 0) || math.IsInf(u.factor, 0) {
				t.Errorf("%s: factor %g", u.name, u.factor)
			}
			for _, s := range append([]string{u.symbol, withPowers(u.symbol), ASCII(withPowers(u.symbol))}, u.spellings...) {
				size, err := unitOf(k, s)
				if err != nil || math.Abs(size/u.factor-1) > 4e-16 {
					t.Errorf("%s: %q reads as %g, %v; want %g", u.name, s, size, err, u.factor)
				}
			}
			if size, err := unitOf(k, ASCII(u.symbol)); err != nil || math.Abs(size/u.factor-1) > 4e-16 || !isASCII(ASCII(u.symbol)) {
				t.Errorf("%s: in ASCII %q reads as %g, %v; want %g", u.name, ASCII(u.symbol), size, err, u.factor)
			}
			// The grammar alone, without the table of whole spellings, must find the same size.
			if strings.ContainsAny(u.symbol, "·/²³") {
				for _, s := range []string{u.symbol, withPowers(u.symbol)} {
					var m meanings
					err := readings(&m, s)
					found := false
					for _, r := range m.list() {
						found = found || r.dim == k.dim && math.Abs(r.size/u.factor-1) < 2e-15
					}
					if err != nil || !found {
						t.Errorf("%s: the grammar reads %q as %v, %v; want %g", u.name, s, m.list(), err, u.factor)
					}
				}
			}
		}
	}
}

func isASCII(s string) bool { return strings.IndexFunc(s, func(r rune) bool { return r > 126 }) < 0 }

// Every unit that is said to be of SP 811 is compared with its table, or is a product of units that are.
func TestSP811IsComplete(t *testing.T) {
	sizes := map[float64]bool{}
	for _, size := range sp811 {
		sizes[size] = true
	}
	for i := range kinds {
		for _, u := range kinds[i].units {
			if u.source != "SP811" || sizes[u.factor] || u.factor == 1000*float64(PoundForcePerSquareInch) || strings.ContainsAny(u.symbol, "·/²³") {
				continue
			}
			t.Errorf("%s (%s) stands in no row of the table that was compared", u.name, u.symbol)
		}
	}
}

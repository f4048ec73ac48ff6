package units

import (
	"fmt"
	"math"
	"testing"
)

func TestPrinting(t *testing.T) {
	d := Millimetre.Of(60)
	for _, tt := range []struct{ got, want string }{
		{d.String(), "60 mm"},
		{Metre.Of(0).String(), "0 m"},
		{Metre.Of(math.Copysign(0, -1)).String(), "0 m"},
		{Metre.Of(-0.06).String(), "-60 mm"},
		{Metre.Of(math.NaN()).String(), "NaN m"},
		{Metre.Of(1e-12).String(), "0.001 nm"},
		{Second.Of(22947).String(), "6.37417 h"},
		{Second.Of(90).String(), "1.5 min"},
		{SquareMetre.Of(0.0113097).String(), "113.097 cm²"},
		{KilogramPerCubicMetre.Of(7850).String(), "7850 kg/m³"},
		{Celsius.Of(179.5).String(), "179.5 °C"},
		{d.Text(Inch, 4), "2.362 in"},
		{d.Text(2*Inch, 4), "1.181 × 0.0508 m"},
		{Celsius.Of(180).Text(Fahrenheit, 1), "356.0 °F"},
		{Metre.Of(0.1).Text(Millimetre, 0), "100 mm"},
		{fmt.Sprintf("%v|%s|%.2v|%.3f|%10v|%-10v|%+v", d, d, d, d, d, d, d), "60 mm|60 mm|60 mm|60.000 mm|     60 mm|60 mm     |+60 mm"},
		{fmt.Sprintf("%.1f", Celsius.Of(179.96)), "180.0 °C"},
		{fmt.Sprintf("%d", d), "%!d(60 mm)"},
		{ASCII(WattPerSquareMetreKelvin.Of(12).String()), "12 W/(m2 K)"},
		{ASCII(Celsius.Of(179.5).String()), "179.5 degC"},
		{ASCII(Micrometre.Of(3).Dynamic().String()), "3 um"},
		{Number(0.25).String(), "0.25"},
		{d.LogValue().String(), "60 mm"},
	} {
		if tt.got != tt.want {
			t.Errorf("got %q, want %q", tt.got, tt.want)
		}
	}
}

func TestErrorTexts(t *testing.T) {
	for _, tt := range []struct {
		err  error
		want string
	}{
		{CheckPositive("sphere: diameter", Millimetre.Of(0)), "sphere: diameter: 0 m not accepted; accepted: finite and above 0 m"},
		{CheckTemperature("ambient", Temperature{}), "ambient: 0 K not accepted; accepted: finite and above 0 K"},
		{CheckNumber("emissivity", 2, 0, 1), "emissivity: 2 not accepted; accepted: finite, from 0 to 1"},
		{&ArgumentError{Field: "exchange function", Accepted: "a function"}, "exchange function: missing; accepted: a function"},
		{&RangeError{Model: "Churchill", Quantity: "Ra", Value: Number(1e12), Min: Number(0), Max: Number(1e11), Source: "Churchill 1983"}, "Churchill: Ra 1e+12 outside its range, 0 to 1e+11 (Churchill 1983)"},
		{&RangeError{Model: "m", Quantity: "Pr", Value: Number(0), Min: Number(0), Max: Number(math.Inf(1)), Above: true}, "m: Pr 0 outside its range, above 0"},
		{&RangeError{Model: "m", Quantity: "Pr", Value: Number(0), Min: Number(0), Max: Number(5), Above: true}, "m: Pr 0 outside its range, above 0 and up to 5"},
		{&RangeError{Model: "m", Quantity: "share", Value: Number(1), Min: Number(0), Max: Number(1), Below: true}, "m: share 1 outside its range, 0 to below 1"},
		{&RangeError{Model: "m", Quantity: "share", Value: Number(1), Min: Number(0), Max: Number(1), Above: true, Below: true}, "m: share 1 outside its range, above 0 and below 1"},
		{&RangeError{Model: "m", Quantity: "share", Value: Number(1), Min: Number(math.Inf(-1)), Max: Number(1), Below: true}, "m: share 1 outside its range, below 1"},
		{&NeverError{"centre", Celsius.Of(20), Celsius.Of(25), ""}, "the centre never reaches 20 °C, it tends to 25 °C"},
	} {
		if tt.err == nil || tt.err.Error() != tt.want {
			t.Errorf("got  %v\nwant %s", tt.err, tt.want)
		}
	}
	for _, err := range []error{
		CheckPositive("x", Metre.Of(1)), CheckNotNegative("x", Metre.Of(0)), CheckFinite("x", Metre.Of(-1)),
		CheckTemperature("x", Kelvin.Of(1)), CheckNumber("x", 1, 0, 1),
	} {
		if err != nil {
			t.Error(err)
		}
	}
}

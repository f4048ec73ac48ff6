package props_test

import (
	"errors"
	"fmt"
	"math"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

func humid(t *testing.T, celsius, pascal, humidity float64) props.MoistAir {
	t.Helper()
	a, err := props.MoistAirFromRelativeHumidity(units.Celsius.Of(celsius), units.Pascal.Of(pascal), humidity)
	if err != nil {
		t.Fatal(err)
	}
	return a
}

// The arithmetic, against an independent evaluation of the same rules. It takes the air at zero density, with 28.965 g/mol, and cp of the vapour by
// other polynomials. At 10 % of the pressure, humidity ratio and all the rest but density and diffusivities are those of 1 atm, and
// what the density of the air does to viscosity and conductivity, 0.1 % at 1 atm, is 1e-4. The molar mass 28.9586 g/mol of
// our air makes humidity ratios 2.6e-4 higher and densities as much lower.
func TestMoistAirArithmetic(t *testing.T) {
	s := readSheet(t, "moist_air_computed.csv")
	for i := range s.rows {
		celsius, rh := s.cell(t, i, "t_degC").value, s.cell(t, i, "RH").value
		a := humid(t, celsius, atmosphere, rh)
		st, err := a.State()
		if err != nil {
			t.Fatal(err)
		}
		thin := humid(t, celsius, 0.1*atmosphere, 0.1*rh)
		dilute, err := thin.State()
		if err != nil {
			t.Fatal(err)
		}
		at := fmt.Sprintf("air at %g °C and %g of saturation, ", celsius, rh)
		sixDigits := func(column string) cell {
			v := s.cell(t, i, column)
			v.half = 5.1e-6 * v.value
			return v
		}
		check(t, at+"vapour pressure", a.VapourPressure.SI(), sixDigits("pv_Pa"), 0, s.name)
		check(t, at+"humidity ratio", a.HumidityRatio(), sixDigits("w_kg_kg"), 2.7e-4, s.name)
		check(t, at+"density", st.Density.SI(), sixDigits("rho_kg_m3"), 2.7e-4, s.name)
		check(t, at+"specific heat", st.SpecificHeat.SI(), sixDigits("cp_J_kgK_moist"), 5e-5, s.name)
		check(t, at+"viscosity", dilute.Viscosity.SI(), sixDigits("mu_Pa_s"), 1e-4, s.name)
		check(t, at+"conductivity", dilute.Conductivity.SI(), sixDigits("k_W_mK"), 2e-4, s.name)
		check(t, at+"viscosity at 1 atm", st.Viscosity.SI(), sixDigits("mu_Pa_s"), 1.1e-3, s.name)
		check(t, at+"conductivity at 1 atm", st.Conductivity.SI(), sixDigits("k_W_mK"), 1.6e-3, s.name)
		check(t, at+"kinematic viscosity", st.KinematicViscosity().SI(), sixDigits("nu_m2_s"), 1.5e-3, s.name)
		check(t, at+"thermal diffusivity", st.Diffusivity().SI(), sixDigits("alpha_m2_s"), 2e-3, s.name)
		check(t, at+"Prandtl number", st.Prandtl(), sixDigits("Pr"), 1.5e-3, s.name)
		if st.Expansion.SI() != 1/st.Temperature.SI() || !st.Gas {
			t.Errorf("%sβ %g, gas %v", at, st.Expansion.SI(), st.Gas)
		}
	}
}

// The ideal vapour against the real one of IAPWS R7-97 at its own pressure, as far as that is defined: what it leaves out of density and
// specific heat of the mixture is within the stated uncertainty, at half the pressure too.
func moistAirAgainstRealVapour(t *testing.T, record *fluidRecord) {
	for celsius := 5.0; celsius <= 295; celsius += 10 {
		for _, p := range []float64{50e3, atmosphere, 200e3} {
			sat, err := props.SaturationPressure(units.Celsius.Of(celsius))
			if err != nil {
				t.Fatal(err)
			}
			pv := min(sat.SI(), p/2)
			a := props.MoistAir{Temperature: units.Celsius.Of(celsius), Pressure: units.Pascal.Of(p), VapourPressure: units.Pascal.Of(pv)}
			m, err := a.State()
			if err != nil {
				t.Fatal(err)
			}
			vapour := state(t, props.Steam(), celsius+273.15, pv)
			dry := state(t, props.Air(), celsius+273.15, p-pv)
			rho := vapour.Density.SI() + dry.Density.SI()
			cp := (vapour.Density.SI()*vapour.SpecificHeat.SI() + dry.Density.SI()*dry.SpecificHeat.SI()) / rho
			with := record.witness(moistAirRow, a, "realVapour", nil)
			with.check(t, m, "density", cell{rho, 0}, a.DensityUncertainty())
			with.check(t, m, "specific heat", cell{cp, 0}, a.SpecificHeatUncertainty())
		}
	}
}

// Without vapour it is props.Air, within 0.1 %: what the real gas is off the ideal one.
func TestDryMoistAir(t *testing.T) {
	for celsius := 0.0; celsius <= 290; celsius += 29 {
		m, err := humid(t, celsius, atmosphere, 0).State()
		if err != nil {
			t.Fatal(err)
		}
		a := state(t, props.Air(), celsius+273.15, atmosphere)
		at := fmt.Sprintf("dry air at %g °C, ", celsius)
		check(t, at+"density", m.Density.SI(), cell{a.Density.SI(), 0}, 0.001, "props.Air")
		check(t, at+"specific heat", m.SpecificHeat.SI(), cell{a.SpecificHeat.SI(), 0}, 0.003, "props.Air")
		check(t, at+"conductivity", m.Conductivity.SI(), cell{a.Conductivity.SI(), 0}, 0.001, "props.Air")
		check(t, at+"viscosity", m.Viscosity.SI(), cell{a.Viscosity.SI(), 0}, 0.001, "props.Air")
	}
}

// Wet bulbs that were read from published tables. Where the bulb is wet, the tables rest on the equation of Ferrel for a whirled
// psychrometer, or on that of adiabatic saturation, and agree with the latter within 0.9 % of relative humidity, 0.5 % of which is their rounding.
// Where it is iced, the tables of the U.S. Weather Bureau take the coefficient of a wet bulb for ice too, 0.00066 instead of about 0.00058
// per kelvin; the air is then 1 % to 5 % more humid than they say, and it must not be less humid. The dew points of the NOAA tables lie at
// depressions where the vapour pressure is a small difference, so that it is compared: within 6 % of what the depression takes from it with a wet
// bulb (2.5 % to 4.5 % between the coefficients of Ferrel and of adiabatic saturation, and up to 2 % between Ferrel and those tables), 15 % with an
// iced one, and 1 °F of the dew point, 6 % of the vapour pressure.
func TestWetBulbAgainstTables(t *testing.T) {
	s := readSheet(t, "wet_bulb.csv")
	for i := range s.rows {
		degree := units.Celsius
		if s.text(t, i, "unit") == "F" {
			degree = units.Fahrenheit
		}
		dry, wet := degree.Of(s.cell(t, i, "t_dry").value), degree.Of(s.cell(t, i, "t_wet").value)
		p := units.Hectopascal.Of(s.cell(t, i, "pressure_hPa").value)
		a, err := props.MoistAirFromWetBulb(dry, p, wet)
		if err != nil {
			t.Fatal(err)
		}
		value := s.cell(t, i, "value").value
		what := fmt.Sprintf("%s, %v with a wet bulb of %v at %v", s.text(t, i, "table"), dry, wet, p)
		iced := s.text(t, i, "ice_bulb") == "yes"
		switch {
		case s.text(t, i, "quantity") == "dewpoint_F":
			b, err1 := props.MoistAirFromDewPoint(dry, p, units.Fahrenheit.Of(value))
			bulb, err2 := props.MoistAirFromRelativeHumidity(wet, p, 1)
			if err := errors.Join(err1, err2); err != nil {
				t.Fatal(err)
			}
			part := 0.06
			if iced {
				part = 0.15
			}
			got, want := a.VapourPressure.SI(), b.VapourPressure.SI()
			if math.Abs(got-want) > part*(bulb.VapourPressure.SI()-want)+0.06*want {
				t.Errorf("%s: vapour pressure %g Pa, want %g Pa", what, got, want)
			}
		case iced:
			if got := 100 * a.RelativeHumidity(); got < value-0.5 || got > value+5.5 {
				t.Errorf("%s: relative humidity %.2f %%, want 0 %% to 5 %% more than %g %%", what, got, value)
			}
		default:
			if got := 100 * a.RelativeHumidity(); math.Abs(got-value) > 1 {
				t.Errorf("%s: relative humidity %.2f %%, want %g %%", what, got, value)
			}
		}
		back, err := a.WetBulb()
		if err != nil || math.Abs(back.SI()-wet.SI()) > 2e-9 {
			t.Errorf("%s: wet bulb back %v, %v", what, back, err)
		}
	}
}

// With the equation of Ferrel, e = es − 0.000660 (1 + 0.00115 s) p (t − s) with s in °C, from memory, the Weather Bureau rows come out to
// the digit: this checks the saturation over ice and the relative humidity.
func TestRelativeHumidityOfWeatherBureau(t *testing.T) {
	s := readSheet(t, "wet_bulb.csv")
	n := 0
	const bureau = "U.S. Weather Bureau Bulletin 1071"
	for i := range s.rows {
		if s.text(t, i, "table") != bureau {
			continue
		}
		n++
		dry, wet := s.cell(t, i, "t_dry").value, s.cell(t, i, "t_wet").value
		p := units.Hectopascal.Of(s.cell(t, i, "pressure_hPa").value)
		es, err := props.SublimationPressure(units.Celsius.Of(wet))
		if err != nil {
			t.Fatal(err)
		}
		e := es.SI() - 0.000660*(1+0.00115*wet)*p.SI()*(dry-wet)
		a := props.MoistAir{Temperature: units.Celsius.Of(dry), Pressure: p, VapourPressure: units.Pascal.Of(e)}
		check(t, fmt.Sprintf("relative humidity in %% at %g °C with a wet bulb of %g °C", dry, wet), 100*a.RelativeHumidity(), s.cell(t, i, "value"), 0.003, bureau)
	}
	if n != 9 {
		t.Errorf("%d rows, want 9", n)
	}
}

// A worked state: 25 °C, 50 %, 101325 Pa, ASHRAE psychrometrics, from memory: humidity ratio 0.00988, enthalpy 50.3 kJ/kg, dew point 13.9 °C, wet
// bulb 17.9 °C, density of the vapour 11.5 g/m³ (0.0115 by 3169/2/(461.5 · 298.15)).
func TestMoistAirOfARoom(t *testing.T) {
	a := humid(t, 25, atmosphere, 0.5)
	dew, errD := a.DewPoint()
	wet, errW := a.WetBulb()
	if err := errors.Join(errD, errW); err != nil {
		t.Fatal(err)
	}
	const source = "ASHRAE, from memory"
	check(t, "humidity ratio", a.HumidityRatio(), cell{0.00988, 5e-6}, 3e-4, source)
	check(t, "enthalpy in kJ/kg", a.Enthalpy().In(units.KilojoulePerKilogram), cell{50.3, 0.1}, 0, source)
	check(t, "dew point in °C", dew.In(units.Celsius), cell{13.9, 0.05}, 0, source)
	check(t, "wet bulb in °C", wet.In(units.Celsius), cell{17.9, 0.05}, 0, source)
	check(t, "vapour density", a.VapourDensity().SI(), cell{0.01152, 5e-6}, 1e-4, source)
	if rh := a.RelativeHumidity(); math.Abs(rh-0.5) > 1e-15 {
		t.Errorf("relative humidity %g", rh)
	}
}

// Whatever the humidity is made of gives the same air.
func TestMoistAirRoundTrips(t *testing.T) {
	for _, celsius := range []float64{-40, -5, 0, 0.01, 5, 20, 35, 60, 80, 120, 250} {
		for _, p := range []float64{20e3, atmosphere, 200e3} {
			for _, part := range []float64{0.01, 0.3, 0.9, 1} {
				T, P := units.Celsius.Of(celsius), units.Pascal.Of(p)
				sat := 0.999 * p / 2
				if full, err := props.MoistAirFromRelativeHumidity(T, P, 1); err == nil {
					sat = full.VapourPressure.SI()
				}
				a := props.MoistAir{Temperature: T, Pressure: P, VapourPressure: units.Pascal.Of(part * sat)}
				dew, errD := a.DewPoint()
				wet, errW := a.WetBulb()
				if err := errors.Join(errD, errW); err != nil {
					t.Errorf("%v: %v", a, err)
					continue
				}
				if dew.SI() > wet.SI()+1e-9 || wet.SI() > T.SI() {
					t.Errorf("%v: dew point %v, wet bulb %v", a, dew, wet)
				}
				fromRH, err1 := props.MoistAirFromRelativeHumidity(T, P, min(1, a.RelativeHumidity()))
				fromDew, err2 := props.MoistAirFromDewPoint(T, P, dew)
				fromWet, err3 := props.MoistAirFromWetBulb(T, P, wet)
				fromRatio, err4 := props.MoistAirFromHumidityRatio(T, P, a.HumidityRatio()*(1-1e-15))
				for i, b := range []props.MoistAir{fromRH, fromDew, fromWet, fromRatio} {
					err := []error{err1, err2, err3, err4}[i]
					// A wet bulb to 1e-9 K, of which each changes the vapour pressure by at most 200 Pa per K and the slope of saturation.
					tolerance := 1e-9*a.VapourPressure.SI() + 2e-9*(p/500+0.05*p*0.5)
					if math.Abs(b.VapourPressure.SI()-a.VapourPressure.SI()) > tolerance || err != nil {
						t.Errorf("%v by way %d: %v, %v", a, i, b, err)
					}
				}
			}
		}
	}
}

// Heating at constant composition and pressure keeps humidity ratio and dew point.
func TestMoistAirAt(t *testing.T) {
	a := humid(t, 20, atmosphere, 0.6)
	own, err := a.State()
	if err != nil {
		t.Fatal(err)
	}
	if s, err := a.At(a.Temperature, a.Pressure); err != nil || s != own {
		t.Errorf("At its own state: %v, %v", s, err)
	}
	warm, err := a.At(units.Celsius.Of(60), a.Pressure)
	if err != nil {
		t.Fatal(err)
	}
	b, err := props.MoistAirFromHumidityRatio(units.Celsius.Of(60), a.Pressure, a.HumidityRatio())
	if err != nil {
		t.Fatal(err)
	}
	again, err := b.State()
	if err != nil {
		t.Fatal(err)
	}
	check(t, "density of the heated air", warm.Density.SI(), cell{again.Density.SI(), 0}, 1e-14, "the same humidity ratio")
	check(t, "specific heat of the heated air", warm.SpecificHeat.SI(), cell{again.SpecificHeat.SI(), 0}, 1e-14, "the same humidity ratio")
	var r *units.RangeError
	if _, err := a.At(units.Celsius.Of(12), a.Pressure); !errors.As(err, &r) || r.Quantity != "vapour pressure" || r.Max.SI() >= r.Value.SI() {
		t.Errorf("below the dew point of 12.0 °C: got %v, want a range error of the vapour pressure", err)
	}
	if _, err := a.At(units.Celsius.Of(12.1), a.Pressure); err != nil {
		t.Errorf("above the dew point: %v", err)
	}
	// Compression raises the vapour pressure with it: 60 % becomes 100 % at 1.67 times the pressure.
	if _, err := a.At(a.Temperature, units.Pascal.Of(1.66*atmosphere)); err != nil {
		t.Errorf("compressed to 1.66 atm: %v", err)
	}
	if _, err := a.At(a.Temperature, units.Pascal.Of(1.67*atmosphere)); !errors.As(err, &r) || r.Quantity != "vapour pressure" {
		t.Errorf("compressed to 1.67 atm: got %v, want a range error of the vapour pressure", err)
	}
}

func TestVapourDiffusivity(t *testing.T) {
	s := readSheet(t, "vapour_diffusivity.csv")
	for i := range s.rows {
		T := s.cell(t, i, "T_K").value
		d, err := props.VapourDiffusivity(units.Kelvin.Of(T), units.Pascal.Of(atmosphere))
		if err != nil {
			t.Fatal(err)
		}
		for column, tolerance := range map[string]float64{
			"massman1998_m2_s": 0, "marrero_mason1972_m2_s": props.VapourDiffusivityUncertainty, "fuller1966_m2_s": props.VapourDiffusivityUncertainty,
		} {
			if s.text(t, i, column) != "" {
				check(t, fmt.Sprintf("diffusivity at %g K, %s", T, column), d.SI(), s.cell(t, i, column), tolerance, s.name)
			}
		}
	}
	d, err := props.VapourDiffusivity(units.Kelvin.Of(298), units.Pascal.Of(atmosphere))
	if err != nil {
		t.Fatal(err)
	}
	check(t, "diffusivity at 298 K", d.SI(), cell{0.26e-4, 0.005e-4}, props.VapourDiffusivityUncertainty, "Incropera et al., table A.8, from memory")
	half, err := props.VapourDiffusivity(units.Kelvin.Of(298), units.Pascal.Of(atmosphere/2))
	if err != nil || math.Abs(half.SI()/d.SI()-2) > 1e-12 {
		t.Errorf("at half the pressure: %v, %v", half, err)
	}
	for _, c := range []struct{ T, p float64 }{
		{math.Nextafter(253.15, 0), 1e5}, {math.Nextafter(400, 1e3), 1e5}, {300, math.Nextafter(10e3, 0)}, {300, math.Nextafter(200e3, 1e9)},
	} {
		var r *units.RangeError
		if _, err := props.VapourDiffusivity(units.Kelvin.Of(c.T), units.Pascal.Of(c.p)); !errors.As(err, &r) || r.Source == "" {
			t.Errorf("diffusivity at %g K and %g Pa: got %v, want a range error", c.T, c.p, err)
		}
	}
}

// The ends of the range, one ULP beyond, and what cannot be.
func TestMoistAirEndsWithItsRange(t *testing.T) {
	make := func(T, p, pv float64) error {
		_, err := props.MoistAir{Temperature: units.Kelvin.Of(T), Pressure: units.Pascal.Of(p), VapourPressure: units.Pascal.Of(pv)}.State()
		return err
	}
	for _, T := range []float64{200, 573.15} {
		for _, p := range []float64{10e3, 200e3} {
			if err := make(T, p, 0); err != nil {
				t.Errorf("%g K, %g Pa: %v", T, p, err)
			}
		}
	}
	saturation := humid(t, 20, 1e5, 1).VapourPressure.SI()
	if err := errors.Join(make(celsius(20), 1e5, saturation), make(400, 1e5, 0.5e5)); err != nil {
		t.Error(err)
	}
	for _, c := range []struct {
		T, p, pv float64
		quantity string
	}{
		{math.Nextafter(200, 0), 1e5, 0, "temperature"},
		{math.Nextafter(573.15, 1e3), 1e5, 0, "temperature"},
		{300, math.Nextafter(10e3, 0), 0, "pressure"},
		{300, math.Nextafter(200e3, 1e9), 0, "pressure"},
		{celsius(20), 1e5, math.Nextafter(saturation, 1e9), "vapour pressure"},
		{400, 1e5, math.Nextafter(0.5e5, 1e9), "vapour pressure"},
	} {
		var r *units.RangeError
		if err := make(c.T, c.p, c.pv); !errors.As(err, &r) || r.Quantity != c.quantity || r.Source == "" {
			t.Errorf("%g K, %g Pa, %g Pa: got %v, want a range error of the %s", c.T, c.p, c.pv, err, c.quantity)
		}
	}
	for _, c := range [][3]float64{{0, 1e5, 0}, {math.NaN(), 1e5, 0}, {300, 0, 0}, {300, -1, 0}, {300, math.NaN(), 0}, {300, 1e5, -1}, {300, 1e5, math.NaN()}, {300, 1e5, math.Inf(1)}, {}} {
		var e *units.ArgumentError
		if err := make(c[0], c[1], c[2]); !errors.As(err, &e) {
			t.Errorf("%v: got %v, want an argument error", c, err)
		}
	}
	var none props.MoistAir
	if !math.IsNaN(none.RelativeHumidity()) || !math.IsNaN(none.HumidityRatio()) || !math.IsNaN(none.VapourDensity().SI()) || !math.IsNaN(none.Enthalpy().SI()) {
		t.Error("the zero MoistAir has a humidity")
	}
	_, errD := none.DewPoint()
	_, errW := none.WetBulb()
	_, errA := none.At(units.Kelvin.Of(300), units.Pascal.Of(1e5))
	for _, err := range []error{errD, errW, errA} {
		var e *units.ArgumentError
		if !errors.As(err, &e) {
			t.Errorf("zero MoistAir: got %v, want an argument error", err)
		}
	}
}

// What the constructors refuse.
func TestMoistAirRefuses(t *testing.T) {
	T, p := units.Celsius.Of(25), units.StandardAtmosphere.Of(1)
	_, dry := humid(t, 25, atmosphere, 0).DewPoint()
	_, rh := props.MoistAirFromRelativeHumidity(T, p, 1.01)
	_, rhNaN := props.MoistAirFromRelativeHumidity(T, p, math.NaN())
	_, ratio := props.MoistAirFromHumidityRatio(T, p, -0.01)
	_, dew := props.MoistAirFromDewPoint(T, p, units.Celsius.Of(25.01))
	_, wet := props.MoistAirFromWetBulb(T, p, units.Celsius.Of(26))
	_, low := props.MoistAirFromWetBulb(T, p, units.Celsius.Of(2))
	for i, err := range []error{dry, rh, rhNaN, ratio, dew, wet, low} {
		var e *units.ArgumentError
		if !errors.As(err, &e) || e.Accepted == "" {
			t.Errorf("case %d: got %v, want an argument error", i, err)
		}
	}
	lowest, err := humid(t, 25, atmosphere, 0).WetBulb()
	var e *units.ArgumentError
	if err != nil || !errors.As(low, &e) || !strings.Contains(e.Accepted, lowest.String()) {
		t.Errorf("wet bulb too low: %v does not name that of dry air, %v (%v)", low, lowest, err)
	}
	_, much := props.MoistAirFromHumidityRatio(T, p, 0.03)
	_, more := props.MoistAirFromRelativeHumidity(units.Celsius.Of(90), p, 1)
	_, boiling := props.MoistAirFromWetBulb(units.Celsius.Of(150), p, units.Celsius.Of(120))
	_, frost := props.MoistAirFromDewPoint(T, p, units.Kelvin.Of(129))
	for i, err := range []error{much, more, boiling, frost} {
		var r *units.RangeError
		if !errors.As(err, &r) {
			t.Errorf("case %d: got %v, want a range error", i, err)
		}
	}
}

// No number makes a panic or a NaN beside a nil error.
func FuzzMoistAir(f *testing.F) {
	for _, x := range []float64{0, 1e-9, 0.3, 0.999999, 1, 130, 200, 260, 273.15, 273.16, 290, 372, 1e308, math.Inf(1), math.NaN(), -1} {
		f.Add(293.15, 101325.0, x)
		f.Add(x, 20e3, 0.5)
		f.Add(450.0, x, 330.0)
	}
	f.Fuzz(func(t *testing.T, kelvin, pascal, x float64) {
		T, p := units.Kelvin.Of(kelvin), units.Pascal.Of(pascal)
		rh, err1 := props.MoistAirFromRelativeHumidity(T, p, x)
		ratio, err2 := props.MoistAirFromHumidityRatio(T, p, x)
		dew, err3 := props.MoistAirFromDewPoint(T, p, units.Kelvin.Of(x))
		wet, err4 := props.MoistAirFromWetBulb(T, p, units.Kelvin.Of(x))
		free := props.MoistAir{Temperature: T, Pressure: p, VapourPressure: units.Pascal.Of(x)}
		_, err5 := free.State()
		for i, a := range []props.MoistAir{rh, ratio, dew, wet, free} {
			if []error{err1, err2, err3, err4, err5}[i] != nil {
				continue
			}
			s, err := a.State()
			if err != nil || !(s.Density.SI() > 0 && s.SpecificHeat.SI() > 0 && s.Conductivity.SI() > 0 && s.Viscosity.SI() > 0 && s.Prandtl() > 0 && s.Prandtl() < 2) {
				t.Errorf("%v: state %v, %v", a, s, err)
			}
			if rh := a.RelativeHumidity(); !(rh >= 0 && rh <= 1) {
				t.Errorf("%v: relative humidity %g", a, rh)
			}
			if !(a.HumidityRatio() >= 0 && a.HumidityRatio() < 0.63) || !a.Enthalpy().IsFinite() || !(a.VapourDensity().SI() >= 0) {
				t.Errorf("%v: humidity ratio %g, enthalpy %v, vapour %v", a, a.HumidityRatio(), a.Enthalpy(), a.VapourDensity())
			}
			w, err := a.WetBulb()
			if err != nil || !(w.SI() > 100 && w.SI() <= kelvin) {
				t.Errorf("%v: wet bulb %v, %v", a, w, err)
			}
			if d, err := a.DewPoint(); err == nil && !(d.SI() >= 129.9 && d.SI() <= kelvin && d.SI() <= w.SI()+1e-9) {
				t.Errorf("%v: dew point %v, wet bulb %v", a, d, w)
			}
		}
	})
}

// Saturation properties, moist air and ice take no memory.
func TestMoistAirDoesNotAllocate(t *testing.T) {
	a := humid(t, 30, atmosphere, 0.4)
	warm := units.Celsius.Of(50)
	if n := testing.AllocsPerRun(20, func() {
		_, _ = a.State()
		_, _ = a.At(warm, a.Pressure)
		_, _ = a.WetBulb()
		_, _ = a.DewPoint()
		_ = a.Enthalpy()
		_, _ = props.MoistAirFromWetBulb(warm, a.Pressure, a.Temperature)
		_, _ = props.SaturationPressure(warm)
		_, _ = props.SaturationTemperature(a.Pressure)
		_, _ = props.EvaporationHeat(warm)
		_, _ = props.SurfaceTension(warm)
		_, _ = props.VapourDiffusivity(warm, a.Pressure)
		_ = props.FusionHeat()
	}); n != 0 {
		t.Errorf("%g allocations", n)
	}
}

// Moist air is written down completely.
func TestMoistAirIsDocumented(t *testing.T) {
	a := humid(t, 20, atmosphere, 0.5)
	if a.Name() != "moist air" || a.Source() == "" || a.UncertaintySource() == "" {
		t.Errorf("%q, %q, %q", a.Name(), a.Source(), a.UncertaintySource())
	}
	for what, u := range map[string]float64{
		"density": a.DensityUncertainty(), "specific heat": a.SpecificHeatUncertainty(), "conductivity": a.ConductivityUncertainty(),
		"viscosity": a.ViscosityUncertainty(), "humidity": a.HumidityUncertainty(),
	} {
		if !(u > 0 && u < 0.1) {
			t.Errorf("uncertainty of the %s is %g", what, u)
		}
	}
}

func BenchmarkMoistAir(b *testing.B) {
	a, err := props.MoistAirFromRelativeHumidity(units.Celsius.Of(30), units.StandardAtmosphere.Of(1), 0.4)
	if err != nil {
		b.Fatal(err)
	}
	b.Run("state", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			if _, err := a.State(); err != nil {
				b.Fatal(err)
			}
		}
	})
	b.Run("wet bulb", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			if _, err := a.WetBulb(); err != nil {
				b.Fatal(err)
			}
		}
	})
}

package surface_test

import (
	"errors"
	"math"
	"strconv"
	"testing"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/internal/table"
	"example.com/coolward/props"
	"example.com/coolward/units"
)

var _ surface.Follower = surface.Evaporation{}

// wet is a ball that is wet all over in moving air of that relative humidity, without radiation.
func wet(t *testing.T, ambient units.Temperature, p units.Pressure, humidity, mm, v float64) (surface.Sum, surface.Evaporation) {
	t.Helper()
	air, err := props.MoistAirFromRelativeHumidity(ambient, p, humidity)
	if err != nil {
		t.Fatal(err)
	}
	dry := surface.Convection{Body: ball(mm), Fluid: props.Air(), Ambient: ambient, Pressure: p, Speed: speed(v)}
	e := surface.Evaporation{Convection: dry, VapourPressure: air.VapourPressure}
	return surface.Sum{dry, e}, e
}

// settled returns the temperature in °C at which the sum gives no heat, between two.
func settled(t *testing.T, s surface.Sum, low, high float64) float64 {
	t.Helper()
	for high-low > 1e-9 {
		mid := (low + high) / 2
		flux, err := s.Flux(seconds(0), celsius(mid))
		if err != nil {
			t.Fatal(err)
		}
		if flux.SI() < 0 {
			low = mid
		} else {
			high = mid
		}
	}
	return low
}

// A wet ball in moving air, screened from radiation, settles at the wet-bulb temperature that tables of psychrometers list. The wet
// bulb of the tables is up to 0.30 K above ours, 0.14 K where the pressure is stated: a thermometer takes up some radiation and conducts along its stem,
// for which the coefficient of the tables is 10 % larger than that of the analogy. The rows of the Weather Bureau take the
// coefficient of a wet bulb, 6.60e-4/K, for an iced one too; their humidity is corrected to that of an iced one, 5.75e-4/K
// (WMO Guide No. 8, from memory).
func TestWetBulb(t *testing.T) {
	_, rows := table.Read(t, "testdata/wet_bulb.csv")
	for _, row := range rows {
		number := func(i int) float64 {
			x, err := strconv.ParseFloat(row[i], 64)
			if err != nil {
				t.Fatal(err)
			}
			return x
		}
		dry, bulb := celsius(number(2)), celsius(number(3))
		if row[1] == "F" {
			dry, bulb = units.Fahrenheit.Of(number(2)), units.Fahrenheit.Of(number(3))
		}
		humidity := number(8) / 100
		if row[6] == "yes" {
			ice, err := props.SublimationPressure(dry)
			if err != nil {
				t.Fatal(err)
			}
			humidity += (6.60e-4 - 5.75e-4) * 100 * number(4) * (dry.SI() - bulb.SI()) / ice.SI()
		}
		s, _ := wet(t, dry, units.Hectopascal.Of(number(4)), humidity, 5, 4)
		got := settled(t, s, -20+1e-9, dry.In(units.Celsius))
		// Half a per cent of relative humidity, the last digit of a table, is 0.1 K. Where the source does not state its
		// pressure, 10 hPa, as between two of its days, are 1 % of the depression.
		tol := 0.3
		if row[5] != "stated" {
			tol += 0.01 * (dry.SI() - bulb.SI())
		}
		near(t, row[0]+": wet bulb, °C", got, bulb.In(units.Celsius), tol, "table of the row")
	}
}

// The balance of a wet surface by hand: T − Tw = hfg/(ρ cp Le^(2/3)) (ρ wall − ρ air), whose coefficient has no Stefan flow.
// Evaporation at a small rate comes to the same: the checks of the formula by 40-digit arithmetic, with
// Le 0.85: 1048.17406625 for ρ cp Le^(2/3) at ρ 1.16 and cp 1007.
func TestEvaporationByHand(t *testing.T) {
	// h/cp Le^(−2/3) ln(1+B) with the constant fluid: k 0.026, Pr 0.7, cp from k Pr/(ρ ν).
	steady := fromGroups(0.026, 1.5e-5, 0.7, 1/300.0)
	dry := surface.Convection{Body: ball(20), Fluid: steady, Ambient: celsius(30), Speed: speed(2)}
	e := surface.Evaporation{Convection: dry, VapourPressure: units.Pascal.Of(1500)}
	m, err := e.MassFlux(celsius(40))
	if err != nil {
		t.Fatal(err)
	}
	h := film(t, dry, celsius(40)).Coefficient.SI()
	const saturation = 7384.9 // Pa at 40 °C, steam tables of IAPWS, five digits
	fraction := func(p float64) float64 { x := p / 101325; return 18.015 * x / (28.96*(1-x) + 18.015*x) }
	d := 0.2178e-4 * math.Pow(308.15/273.15, 1.81)
	lewis := 1.5e-5 / 0.7 / d
	b := (fraction(saturation) - fraction(1500)) / (1 - fraction(saturation))
	want := h / steady.c * math.Pow(lewis, -2.0/3) * math.Log(1+b)
	near(t, "mass flux", m.SI(), want, 1e-4*want, "by hand, five digits")

	x := want * 1880 / h
	latent := 2406.0e3 * want // at 40 °C, steam tables
	near(t, "flux", q(t, e, 0, 40), latent+(x/(math.Exp(x)-1)-1)*h*10, 3e-4*latent, "by hand, four digits")
}

// The film theory of Stefan flow against the exact solution of one dimension: through a layer of gas of thickness s with
// transport by diffusion and flow, m″ = ρ D/s ln(1+B), and the heat into the wall m″ cp ΔT/(e^(m″ cp s/k) − 1). Here the
// layer is that of a ball in air at rest with hardly any buoyancy, s = R, where both are exact too (Spalding; Le and
// cp,vapour/cp of the mixture are what the analogy puts in their place).
func TestStefanFlowExact(t *testing.T) {
	const k, nu, pr = 0.026, 1.5e-5, 0.7
	for _, wall := range []float64{10, 40, 70, 95} {
		still := fromGroups(k, nu, pr, 0)
		dry := surface.Convection{Body: ball(20), Fluid: still, Ambient: celsius(30)}
		e := surface.Evaporation{Convection: dry}
		m, err := e.MassFlux(celsius(wall))
		if err != nil {
			t.Fatal(err)
		}
		p, err := props.SaturationPressure(celsius(wall))
		if err != nil {
			t.Fatal(err)
		}
		x := p.SI() / 101325
		y := 0.62198 * x / (1 - x + 0.62198*x)
		d := 0.2178e-4 * math.Pow((303.15+273.15+wall)/2/273.15, 1.81)
		lewis := nu / pr / d
		exact := 1.2 * d / 0.01 * -math.Log(1-y) // ρ D/R ln(1+B), the ball in a stagnant gas
		near(t, "mass flux", m.SI()*math.Pow(lewis, -1.0/3), exact, 1e-3*exact, "ball in a stagnant gas, exact but for Le^(1/3)")
	}
}

// Saturated air at the temperature of the wall takes nothing; colder walls take up dew, hotter ones dry; the greatest dew brings
// no more than the whole heat of its vapour.
func TestDew(t *testing.T) {
	_, e := wet(t, celsius(25), units.Pascal.Of(101325), 1, 30, 2)
	near(t, "saturated", q(t, e, 0, 25), 0, 1e-6, "equilibrium")
	_, e = wet(t, celsius(25), units.Pascal.Of(101325), 0.6, 30, 2)
	air, err := props.MoistAirFromRelativeHumidity(celsius(25), units.Pascal.Of(101325), 0.6)
	if err != nil {
		t.Fatal(err)
	}
	dew, err := air.DewPoint()
	if err != nil {
		t.Fatal(err)
	}
	at := dew.In(units.Celsius)
	if m, err := e.MassFlux(dew); err != nil || math.Abs(m.SI()) > 1e-12 {
		t.Errorf("at the dew point: %v, %v", m, err)
	}
	if q(t, e, 0, at-5) >= 0 || q(t, e, 0, at+5) <= 0 {
		t.Error("dew settles on the hot side")
	}
	only := e
	only.CondensesOnly = true
	near(t, "dew only, cold", q(t, only, 0, at-5), q(t, e, 0, at-5), 0, "same")
	near(t, "dew only, hot", q(t, only, 0, at+5), 0, 0, "nothing evaporates")
	if len(only.Notes()) != len(e.Notes())+1 {
		t.Error("condensation only is not noted")
	}
}

// The latent heats that the flux shows, against the equation of Clausius and Clapeyron with the saturation of IAPWS:
// L = R T² d ln p/dT for an ideal vapour, whose volume is 0.1 % larger than the real one at 20 °C and 1.3 % at 95 °C.
func TestLatentHeat(t *testing.T) {
	still := fromGroups(0.026, 1.5e-5, 0.7, 0)
	for _, tt := range []struct{ wall, tol float64 }{{-19, 1e-3}, {-10, 1e-3}, {-1, 1e-3}, {1, 1e-3}, {20, 2e-3}, {60, 6e-3}, {95, 15e-3}} {
		e := surface.Evaporation{Convection: surface.Convection{Body: ball(20), Fluid: still, Ambient: celsius(tt.wall)}}
		m, err := e.MassFlux(celsius(tt.wall))
		if err != nil {
			t.Fatal(err)
		}
		saturation := props.SaturationPressure
		if tt.wall < 0 {
			saturation = props.SublimationPressure
		}
		low, errLow := saturation(celsius(tt.wall - 0.01))
		high, errHigh := saturation(celsius(tt.wall + 0.01))
		if errLow != nil || errHigh != nil {
			t.Fatal(errLow, errHigh)
		}
		T := 273.15 + tt.wall
		want := 461.526 * T * T * math.Log(high.SI()/low.SI()) / 0.02
		near(t, "latent heat", q(t, e, 0, tt.wall)/m.SI(), want, tt.tol*want, "Clausius and Clapeyron")
		if tt.wall > 0 {
			L, err := props.EvaporationHeat(celsius(tt.wall))
			if err != nil {
				t.Fatal(err)
			}
			near(t, "heat of evaporation", q(t, e, 0, tt.wall)/m.SI(), L.SI(), 5e-5*L.SI(), "IAPWS R7-97")
		}
	}
}

func TestEvaporationBand(t *testing.T) {
	_, e := wet(t, celsius(25), units.Pascal.Of(101325), 0.4, 30, 2)
	f := film(t, e.Convection, celsius(60))
	low, errLow := e.Low().(surface.Evaporation).MassFlux(celsius(60))
	mid, err := e.MassFlux(celsius(60))
	high, errHigh := e.High().(surface.Evaporation).MassFlux(celsius(60))
	if err != nil || errLow != nil || errHigh != nil {
		t.Fatal(err, errLow, errHigh)
	}
	near(t, "low", low.Ratio(mid), 0.9*(1-f.Scatter), 1e-12, "scatter of the convection and 10 %")
	near(t, "high", high.Ratio(mid), 1.1*(1+f.Scatter), 1e-12, "scatter of the convection and 10 %")
	if len(e.Low().Notes()) != len(e.Notes())+2 || len(e.Sources()) != len(e.Convection.Sources())+1 {
		t.Error("the texts of an evaporation are wrong")
	}
	near(t, "moved", q(t, e.In(celsius(30)), 0, 60), q(t, surface.Evaporation{
		Convection: e.Convection.In(celsius(30)).(surface.Convection), VapourPressure: e.VapourPressure,
	}, 0, 60), 0, "the same part")
}

func TestEvaporationRefuses(t *testing.T) {
	dry := surface.Convection{Body: ball(20), Fluid: props.Air(), Ambient: celsius(20)}
	for _, tt := range []struct {
		name     string
		e        surface.Evaporation
		wall     units.Temperature
		argument bool
	}{
		{"zero", surface.Evaporation{}, celsius(20), true},
		{"negative vapour", surface.Evaporation{Convection: dry, VapourPressure: units.Pascal.Of(-1)}, celsius(20), true},
		{"no number", surface.Evaporation{Convection: dry, VapourPressure: units.Pascal.Of(math.NaN())}, celsius(20), true},
		{"steam", surface.Evaporation{Convection: dry, VapourPressure: units.Pascal.Of(101325)}, celsius(20), true},
		{"wall at 0 K", surface.Evaporation{Convection: dry}, kelvin(0), true},
		{"wall without number", surface.Evaporation{Convection: dry}, kelvin(math.NaN()), true},
		{"in water", surface.Evaporation{Convection: surface.Convection{Body: ball(20), Fluid: props.Water(), Ambient: celsius(20)}}, celsius(30), true},
		{"boiling", surface.Evaporation{Convection: dry}, celsius(100), false},
		{"hot", surface.Evaporation{Convection: dry}, celsius(900), false},
		{"cold", surface.Evaporation{Convection: dry}, celsius(-20.1), false},
		{"hot film", surface.Evaporation{Convection: dry.In(celsius(300)).(surface.Convection)}, celsius(90), false},
	} {
		_, err := tt.e.Flux(seconds(0), tt.wall)
		_, errMass := tt.e.MassFlux(tt.wall)
		var bad *units.ArgumentError
		var out *units.RangeError
		if tt.argument != errors.As(err, &bad) || tt.argument == errors.As(err, &out) || (errMass == nil) != (err == nil) {
			t.Errorf("%s: %v, %v", tt.name, err, errMass)
		}
	}
}

func FuzzEvaporation(f *testing.F) {
	f.Add(0.05, 298.15, 1.0, 333.15, 101325.0, 1500.0)
	f.Add(1e-4, 274.0, 0.0, 373.0, 101325.0, 0.0)
	f.Add(1e300, 1e-300, 1e300, 1e300, 1e300, 1e300)
	f.Add(math.NaN(), math.Inf(1), -1.0, -300.0, -1.0, math.NaN())
	f.Fuzz(func(t *testing.T, d, ambient, v, wall, p, vapour float64) {
		e := surface.Evaporation{
			Convection: surface.Convection{
				Body: ball(1000 * d), Fluid: props.Air(), Ambient: kelvin(ambient), Speed: speed(v), Pressure: units.Pascal.Of(p), Extrapolate: true,
			},
			VapourPressure: units.Pascal.Of(vapour),
		}
		for _, part := range []surface.Part{e, e.Low(), e.High()} {
			flux, err := part.Flux(seconds(0), kelvin(wall))
			if err == nil && !flux.IsFinite() {
				t.Errorf("%+v at %v K: %v without an error", part, wall, flux)
			}
			if err != nil {
				checkTyped(t, "evaporation", err)
			}
		}
	})
}

// wholeExchange is mixed convection, evaporation and radiation.
func wholeExchange() surface.Sum {
	dry := benchmarked()["moving air"]
	dry.Speed = speed(0.1)
	return surface.Sum{dry, surface.Evaporation{Convection: dry, VapourPressure: units.Pascal.Of(1200)}, surface.Radiation{Emissivity: 0.9, Surroundings: celsius(25)}}
}

func TestWholeExchangeDoesNotAllocate(t *testing.T) {
	s := wholeExchange()
	if _, err := s.Flux(seconds(0), celsius(60)); err != nil {
		t.Fatal(err)
	}
	if n := testing.AllocsPerRun(100, func() { _, _ = s.Flux(seconds(0), celsius(60)) }); n != 0 {
		t.Errorf("allocates %v times", n)
	}
}

func BenchmarkWholeExchange(b *testing.B) {
	s := wholeExchange()
	b.ReportAllocs()
	for b.Loop() {
		_, _ = s.Flux(seconds(0), celsius(60))
	}
}

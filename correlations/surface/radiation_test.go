package surface_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/units"
)

var (
	_ surface.Follower = surface.Enclosure{}
	_ surface.Follower = surface.Contact{}
)

const exact40 = "recomputed with 40 digits from the formula as recalled"

// Grey surfaces: values of the exact form by 40-digit arithmetic, and textbook problems.
func TestEnclosure(t *testing.T) {
	for _, tt := range []struct {
		name      string
		e         surface.Enclosure
		wall      float64 // K
		want, tol float64
		source    string
	}{
		{"parallel plates", surface.Enclosure{Emissivity: 0.8, WallEmissivity: 0.5, AreaRatio: 1, Wall: kelvin(300)}, 400, 441.029121478, 1e-8, exact40},
		{"large surroundings", surface.Enclosure{Emissivity: 0.8, WallEmissivity: 0.5, Wall: kelvin(300)}, 400, 793.852418660, 1e-8, exact40},
		{"enclosed", surface.Enclosure{Emissivity: 0.3, WallEmissivity: 0.9, AreaRatio: 0.5, Wall: kelvin(300)}, 800, 6717.99933215, 1e-7, exact40},
		// A problem with two plates and one polished shield between them: 3625 W/m² and 806 W/m².
		{"plates 0.2 and 0.7 at 800 and 500 K", surface.Enclosure{Emissivity: 0.2, WallEmissivity: 0.7, AreaRatio: 1, Wall: kelvin(500)}, 800, 3625, 1, "Cengel, Heat Transfer, Ex. 12-7 and 12-11, from memory"},
		{"the same with a shield of 0.1", surface.Enclosure{
			Emissivity: 0.2, WallEmissivity: 0.7, AreaRatio: 1, Wall: kelvin(500), Shields: []surface.Shield{{0.1, 1}},
		}, 800, 806, 1, "Cengel, Heat Transfer, Ex. 12-11, from memory"},
		// Black surfaces and n black shields: 1/(n+1) of the heat, exact.
		{"black plates, three shields", surface.Enclosure{
			Emissivity: 1, WallEmissivity: 1, AreaRatio: 1, Wall: kelvin(300), Shields: []surface.Shield{{1, 1}, {1, 1}, {1, 1}},
		}, 600, 5.670374419e-8 * (math.Pow(600, 4) - math.Pow(300, 4)) / 4, 1e-7, "exact"},
	} {
		got, err := tt.e.Flux(seconds(0), kelvin(tt.wall))
		if err != nil {
			t.Errorf("%s: %v", tt.name, err)
			continue
		}
		near(t, tt.name, got.SI(), tt.want, tt.tol, tt.source)
		effective, err := tt.e.EffectiveEmissivity()
		if err != nil {
			t.Fatal(err)
		}
		near(t, tt.name+", effective", q(t, surface.Radiation{Emissivity: effective, Surroundings: tt.e.Wall}, 0, tt.wall-273.15), got.SI(), 1e-9*got.SI(), "definition")
	}
}

// What one surface loses the other gains: turned inside out the exchange is the same, A1 q1 = −A2 q2, exact for
// plates, for which both are convex.
func TestEnclosureBalances(t *testing.T) {
	shields := []surface.Shield{{0.3, 1}, {0.05, 1}}
	inside := surface.Enclosure{Emissivity: 0.8, WallEmissivity: 0.4, AreaRatio: 1, Shields: shields, Wall: celsius(20)}
	outside := surface.Enclosure{Emissivity: 0.4, WallEmissivity: 0.8, AreaRatio: 1, Shields: shields, Wall: celsius(90)}
	near(t, "sum", q(t, inside, 0, 90)+q(t, outside, 0, 20), 0, 1e-9, "conservation of energy")

	// A shield settles where it takes from the body what it gives to the wall: two concentric exchanges in series.
	body := surface.Enclosure{Emissivity: 0.8, WallEmissivity: 0.3, AreaRatio: 0.6}
	shield := surface.Enclosure{Emissivity: 0.3, WallEmissivity: 0.5, AreaRatio: 0.5, Wall: kelvin(300)}
	low, high := 300.0, 700.0
	for high-low > 1e-10 {
		mid := (low + high) / 2
		body.Wall = kelvin(mid)
		if 0.6*q(t, body, 0, 700-273.15) > q(t, shield, 0, mid-273.15) {
			low = mid
		} else {
			high = mid
		}
	}
	both := surface.Enclosure{Emissivity: 0.8, WallEmissivity: 0.5, AreaRatio: 0.3, Shields: []surface.Shield{{0.3, 0.6}}, Wall: kelvin(300)}
	near(t, "in series", q(t, both, 0, 700-273.15), q(t, body, 0, 700-273.15), 1e-6, "two exchanges in series")
}

func TestSky(t *testing.T) {
	for _, tt := range []struct {
		air, want, tol float64
		source         string
	}{
		{273.15, 249.195895623, 1e-8, exact40},
		{288.15, 270.002020182, 1e-8, exact40},
		{300, 286.827613733, 1e-8, exact40},
	} {
		T, err := surface.SwinbankSky(kelvin(tt.air))
		if err != nil {
			t.Fatal(err)
		}
		near(t, "Swinbank", T.SI(), tt.want, tt.tol, tt.source)
	}
	for _, tt := range []struct{ dew, want float64 }{{-10, 0.6623}, {0, 0.711}, {20, 0.8522}} {
		T, err := surface.BerdahlMartinSky(celsius(25), celsius(tt.dew))
		if err != nil {
			t.Fatal(err)
		}
		near(t, "Berdahl and Martin", math.Pow(T.SI()/298.15, 4), tt.want, 1e-12, exact40)
		// The two agree for usual humidity: within the 2 K of the second and the 3 K of the first for
		// a relative humidity near 50 % (own estimate).
		if tt.dew == 0 {
			S, err := surface.SwinbankSky(celsius(12))
			U, errU := surface.BerdahlMartinSky(celsius(12), celsius(2))
			if err != nil || errU != nil || math.Abs(S.SI()-U.SI()) > 5 {
				t.Errorf("%v against %v at 12 °C, dew point 2 °C", S, U)
			}
		}
	}
	var out *units.RangeError
	var bad *units.ArgumentError
	for _, T := range []float64{273.1, 303.2} {
		if _, err := surface.SwinbankSky(kelvin(T)); !errors.As(err, &out) {
			t.Errorf("sky over %g K: %v", T, err)
		}
	}
	for _, dew := range []float64{-20.1, 30.1} {
		if _, err := surface.BerdahlMartinSky(celsius(40), celsius(dew)); !errors.As(err, &out) {
			t.Errorf("sky over a dew point of %g °C: %v", dew, err)
		}
	}
	for _, T := range []float64{0, -1, math.NaN(), math.Inf(1)} {
		_, err := surface.SwinbankSky(kelvin(T))
		_, errAir := surface.BerdahlMartinSky(kelvin(T), celsius(5))
		_, errDew := surface.BerdahlMartinSky(celsius(20), kelvin(T))
		if !errors.As(err, &bad) || !errors.As(errAir, &bad) || !errors.As(errDew, &bad) {
			t.Errorf("%g K: %v, %v, %v", T, err, errAir, errDew)
		}
	}
	if _, err := surface.BerdahlMartinSky(celsius(5), celsius(6)); !errors.As(err, &bad) {
		t.Errorf("dew point above the air: %v", err)
	}
}

// Several black views give what the exchanges with each of them add up to.
func TestSurroundings(t *testing.T) {
	views := []surface.View{{0.5, celsius(-20)}, {0.3, celsius(15)}, {0.2, celsius(120)}}
	T, err := surface.Surroundings(views...)
	if err != nil {
		t.Fatal(err)
	}
	want := 0.0
	for _, v := range views {
		want += v.Factor * q(t, surface.Radiation{Emissivity: 0.7, Surroundings: v.Temperature}, 0, 40)
	}
	near(t, "views", q(t, surface.Radiation{Emissivity: 0.7, Surroundings: T}, 0, 40), want, 1e-9, "sum of the exchanges")

	for name, views := range map[string][]surface.View{
		"none":       nil,
		"too little": {{0.5, celsius(20)}},
		"too much":   {{0.5, celsius(20)}, {0.6, celsius(20)}},
		"negative":   {{1.5, celsius(20)}, {-0.5, celsius(20)}},
		"NaN":        {{math.NaN(), celsius(20)}},
		"0 K":        {{1, kelvin(0)}},
		"infinite":   {{1, kelvin(1e200)}},
	} {
		var bad *units.ArgumentError
		if _, err := surface.Surroundings(views...); !errors.As(err, &bad) {
			t.Errorf("%s: %v", name, err)
		}
	}
}

// joint is a contact with the harmonic mean 20 W/(m K).
func joint() surface.Contact {
	return surface.Contact{
		Body: units.WattPerMetreKelvin.Of(20), Solid: units.WattPerMetreKelvin.Of(20), Roughness: units.Micrometre.Of(1), Slope: 0.1,
		Pressure: units.Pascal.Of(1e5), Hardness: units.Gigapascal.Of(1), Temperature: celsius(20),
	}
}

func TestContact(t *testing.T) {
	c := joint()
	vacuum, err := c.Conductance()
	if err != nil {
		t.Fatal(err)
	}
	near(t, "vacuum", vacuum.SI(), 396.223298115, 1e-8, exact40)

	c.Pressure, c.Gas, c.Rarefaction = units.Pascal.Of(1e6), units.WattPerMetreKelvin.Of(0.026), units.Micrometre.Of(0.37)
	h, err := c.Conductance()
	if err != nil {
		t.Fatal(err)
	}
	near(t, "gas", h.SI(), 396.223298115*math.Pow(10, 0.95)+7737.77428780, 1e-6, exact40)
	near(t, "flux", q(t, c, 0, 30), 10*h.SI(), 1e-6, "definition")
	near(t, "low", q(t, c.Low(), 0, 30), 8*h.SI(), 1e-6, "scatter 20 %")
	near(t, "high", q(t, c.High(), 0, 30), 12*h.SI(), 1e-6, "scatter 20 %")

	different := c
	different.Body, different.Solid = units.WattPerMetreKelvin.Of(15), units.WattPerMetreKelvin.Of(30)
	near(t, "harmonic mean", q(t, different, 0, 30), q(t, c, 0, 30), 1e-6, "2·15·30/45 = 20")

	for ratio, inside := range map[float64]bool{0.9e-6: false, 1e-6: true, 2.3e-2: true, 2.4e-2: false} {
		c.Pressure = units.Pascal.Of(ratio * 1e9)
		var out *units.RangeError
		if err := c.Check(); inside != (err == nil) || !inside && !errors.As(err, &out) {
			t.Errorf("pressure over hardness %g: %v", ratio, err)
		}
	}
	if len(c.Low().Notes()) != 2 || len(c.Notes()) != 1 || len(c.Warnings()) != 1 {
		t.Error("the texts of a contact are wrong")
	}
}

func TestBadContactAndEnclosure(t *testing.T) {
	nan := math.NaN()
	contact := func(f func(*surface.Contact)) surface.Part {
		c := joint()
		f(&c)
		return c
	}
	enclosure := func(f func(*surface.Enclosure)) surface.Part {
		e := surface.Enclosure{Emissivity: 0.5, WallEmissivity: 0.5, AreaRatio: 0.5, Wall: celsius(20)}
		f(&e)
		return e
	}
	for field, p := range map[string]surface.Part{
		"contact: conductivity of the body":  contact(func(c *surface.Contact) { c.Body = units.Conductivity{} }),
		"contact: conductivity of the solid": contact(func(c *surface.Contact) { c.Solid = units.WattPerMetreKelvin.Of(nan) }),
		"contact: roughness":                 contact(func(c *surface.Contact) { c.Roughness = units.Metre.Of(-1) }),
		"contact: slope":                     contact(func(c *surface.Contact) { c.Slope = 0 }),
		"contact: pressure":                  contact(func(c *surface.Contact) { c.Pressure = units.Pascal.Of(0) }),
		"contact: hardness":                  contact(func(c *surface.Contact) { c.Hardness = units.Pascal.Of(nan) }),
		"contact: conductivity of the gas":   contact(func(c *surface.Contact) { c.Gas = units.WattPerMetreKelvin.Of(-1) }),
		"contact: rarefaction":               contact(func(c *surface.Contact) { c.Rarefaction = units.Metre.Of(-1) }),
		"contact: temperature":               contact(func(c *surface.Contact) { c.Temperature = units.Temperature{} }),
		"radiation: emissivity":              enclosure(func(e *surface.Enclosure) { e.Emissivity = 0 }),
		"radiation: lower emissivity":        enclosure(func(e *surface.Enclosure) { e.EmissivityLow = 0.6; e.EmissivityHigh = 0.7 }),
		"radiation: wall emissivity":         enclosure(func(e *surface.Enclosure) { e.WallEmissivity = 1.1 }),
		"radiation: area ratio":              enclosure(func(e *surface.Enclosure) { e.AreaRatio = 1.1 }),
		"radiation: surroundings":            enclosure(func(e *surface.Enclosure) { e.Wall = units.Temperature{} }),
		"radiation: shield 1: emissivity":    enclosure(func(e *surface.Enclosure) { e.Shields = []surface.Shield{{0, 1}} }),
		"radiation: shield 2: area ratio":    enclosure(func(e *surface.Enclosure) { e.Shields = []surface.Shield{{0.5, 1}, {0.5, 0.4}} }),
	} {
		for what, err := range map[string]error{
			"Check": p.Check(), "Flux": flux(p.Flux), "Low": flux(p.Low().Flux), "High": flux(p.High().Flux),
		} {
			var bad *units.ArgumentError
			if !errors.As(err, &bad) || bad.Field != field {
				t.Errorf("%s of %+v: %v, want an argument error for %q", what, p, err, field)
			}
		}
	}
	if _, err := (surface.Enclosure{}).EffectiveEmissivity(); err == nil {
		t.Error("the zero enclosure has an emissivity")
	}
	for _, p := range []surface.Part{joint(), surface.Enclosure{Emissivity: 0.5, WallEmissivity: 0.5, Wall: celsius(20), Shields: []surface.Shield{{1, 1}}}} {
		var bad *units.ArgumentError
		if _, err := p.Flux(seconds(0), kelvin(0)); !errors.As(err, &bad) {
			t.Errorf("%s at 0 K: %v", p.Name(), err)
		}
		p.Sources()
		p.Notes()
		p.Warnings()
	}
	e := surface.Enclosure{Emissivity: 0.5, EmissivityLow: 0.4, EmissivityHigh: 0.6, WallEmissivity: 1, Wall: celsius(20)}
	for _, tt := range []struct {
		p    surface.Part
		want float64
	}{{e.Low(), 0.4}, {e.High(), 0.6}, {e.In(celsius(20)), 0.5}} {
		near(t, "emissivity", q(t, tt.p, 0, 80), q(t, surface.Radiation{Emissivity: tt.want, Surroundings: celsius(20)}, 0, 80), 1e-9, "definition")
	}
}

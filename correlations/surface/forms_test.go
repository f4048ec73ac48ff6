package surface_test

import (
	"errors"
	"fmt"
	"math"
	"slices"
	"strings"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

func millimetres(x float64) units.Length { return units.Millimetre.Of(x) }
func squares(x float64) units.Area       { return units.SquareMetre.Of(x) }

// rod is a long cylinder, without its ends.
func rod(d, l float64) shape.Body {
	return shape.Cylinder(millimetres(d), millimetres(l)).Exposing(shape.Outside)
}

func plate(area float64) shape.Body { return shape.Plate(millimetres(5), squares(area)) }

// forms are a body of every form in air of 25 °C at rest, about 10 cm large.
func forms() map[string]surface.Convection {
	list := map[string]surface.Convection{
		"ball":           {Body: ball(50)},
		"shell":          {Body: shape.HollowSphere(millimetres(50), millimetres(40))},
		"level rod":      {Body: rod(20, 300), Position: surface.Level},
		"upright rod":    {Body: rod(20, 100), Position: surface.Upright},
		"level tube":     {Body: shape.Tube(millimetres(20), millimetres(16), millimetres(300)), Position: surface.Level},
		"upright plate":  {Body: plate(0.02), Position: surface.Upright, Length: millimetres(100)},
		"inclined plate": {Body: plate(0.02), Position: surface.Upright, Length: millimetres(100), Inclination: units.Degree.Of(30)},
		"level plate":    {Body: plate(0.02), Position: surface.Level, Length: millimetres(100)},
		"level front":    {Body: plate(0.02).Exposing(shape.Front), Position: surface.Level, Length: millimetres(100)},
		"level back":     {Body: plate(0.02).Exposing(shape.Back), Position: surface.Level, Length: millimetres(100)},
		"brick":          {Body: shape.Brick(millimetres(200), millimetres(100), millimetres(60)), Length: millimetres(60)},
		"can":            {Body: shape.Cylinder(millimetres(66), millimetres(115)), Length: millimetres(115)},
		"weighed":        {Body: shape.Measured(units.Litre.Of(1.1), squares(0.065)), Length: millimetres(120)},
		"capsule":        {Body: shape.Capsule(millimetres(40), millimetres(90)), Length: millimetres(40)},
		"cone":           {Body: shape.Cone(millimetres(40), millimetres(60)), Length: millimetres(60)},
	}
	for name, c := range list {
		c.Fluid, c.Ambient = props.Air(), celsius(25)
		list[name] = c
	}
	return list
}

// Worked examples of textbooks and pages, each with the properties of its source.
func TestWorkedExamplesOfForms(t *testing.T) {
	g := units.MetrePerSecondSquared.Of(9.8)
	for _, tt := range []struct {
		name    string
		c       surface.Convection
		wall    float64 // K
		nu, tol float64
		h, hTol float64
		source  string
	}{
		{
			"fire screen of 0.71 m", surface.Convection{
				Body: plate(0.71 * 1.02), Position: surface.Upright, Length: units.Metre.Of(0.71),
				Fluid: fromGroups(0.0338, 26.4e-6, 0.690, 0.0025), Ambient: kelvin(296), Gravity: g,
			}, 505, 147, 0.5, 7.0, 0.05, "Incropera and DeWitt, Ex. 9.2, from memory",
		},
		// The textbook's 23.3 recomputes to 23.09 from its own groups.
		{
			"steam pipe of 0.1 m", surface.Convection{
				Body: rod(100, 1000), Position: surface.Level, Fluid: fromGroups(0.0313, 22.8e-6, 0.697, 2.725e-3), Ambient: kelvin(296), Gravity: g,
			}, 438, 23.3, 0.01 * 23.3, 7.23, 0.05, "Incropera and DeWitt, Ex. 9.4, from memory",
		},
		{
			"cylinder of 12.7 mm across 10 m/s", surface.Convection{
				Body: rod(12.7, 94), Position: surface.Level, Fluid: fromGroups(0.030, 20.92e-6, 0.70, 1/350.0), Ambient: kelvin(299.35), Speed: speed(10), Gravity: units.MetrePerSecondSquared.Of(1e-9),
			}, 401.55, 40.6, 0.05, 96, 0.5, "Incropera and DeWitt, Ex. 7.4, from memory",
		},
		// The top of an air duct, face over perimeter 0.375 m as in the source for one that is long.
		{
			"top of a duct", surface.Convection{
				Body: plate(0.75 * 1e6).Exposing(shape.Front), Position: surface.Level, Length: units.Metre.Of(1e6),
				Fluid: fromGroups(0.0265, 16.2e-6, 0.7074, 0.0033), Ambient: kelvin(288), Gravity: g,
			}, 318, 77.4, 0.4, 5.47, 0.03, "Incropera and DeWitt, Ex. 9.3, from memory",
		},
		{
			"hot plate face up, Ra 8.61e9", surface.Convection{
				Body: plate(4).Exposing(shape.Front), Position: surface.Level, Length: units.Metre.Of(2),
				Fluid: fromGroups(0.03, 1e-5, 0.7, 8.61e9*1e-10/0.7/9.8/(0.125*100)), Ambient: kelvin(300), Gravity: g,
			}, 400, 307.44, 0.01, 307.44 * 0.03 / 0.5, 1e-3, "worked example, engineer's notes (page read), recomputed",
		},
	} {
		f := film(t, tt.c, kelvin(tt.wall))
		near(t, tt.name+": Nu", f.Nu, tt.nu, tt.tol, tt.source)
		near(t, tt.name+": h", f.Coefficient.SI(), tt.h, tt.hTol, tt.source)
	}
}

// The exact solutions of the laminar boundary layers, against which the defaults must agree within their scatter: on an upright
// plate Nu = (4/3) f(Pr) (Gr/4)^(1/4), f(0.72) = 0.5045 (S. Ostrach, NACA Report 1111, 1953, from memory); on a plate along the
// stream Nu = 0.664 Re^(1/2) Pr^(1/3), of which the exact factor at Pr 0.7 is 2 · 0.292680 (Blasius's equation, integrated).
func TestSimilaritySolutions(t *testing.T) {
	for _, length := range []float64{30, 100, 300} {
		c := surface.Convection{
			Body: plate(0.01), Position: surface.Upright, Length: millimetres(length), Fluid: fromGroups(0.026, 1.6e-5, 0.72, 1/300.0), Ambient: kelvin(300),
		}
		f := film(t, c, kelvin(340))
		want := 4.0 / 3 * 0.5045 * math.Pow(f.Gr/4, 0.25)
		near(t, fmt.Sprintf("upright plate of %g mm", length), f.Nu, want, f.Scatter*want, "Ostrach")

		c.Speed, c.Gravity, c.Fluid = speed(2), units.MetrePerSecondSquared.Of(1e-9), fromGroups(0.026, 1.6e-5, 0.7, 1/300.0)
		f = film(t, c, kelvin(340))
		want = 2 * 0.292680 * math.Sqrt(f.Re)
		near(t, fmt.Sprintf("plate of %g mm in a stream", length), f.Nu, want, f.Scatter*want, "Blasius")
	}
}

// Every default lies within the joint scatter of another published formula where both hold.
func TestSecondFormulas(t *testing.T) {
	still := func(c surface.Convection, lengths ...float64) []surface.Convection {
		var list []surface.Convection
		for _, l := range lengths {
			for _, beta := range []float64{1e-5, 1e-4, 1e-3, 1e-2} {
				x := c
				x.Fluid, x.Ambient = fromGroups(0.026, 1.6e-5, 0.71, beta), kelvin(300)
				switch {
				case x.Length.SI() != 0:
					x.Length = millimetres(l)
					if x.Position == surface.Level {
						x.Body = plate(l * l * 1e-6).Exposing(x.Body.Exposed())
					}
				case x.Position == surface.Upright:
					x.Body = rod(l/5, l)
				default:
					x.Body = rod(l, 10*l)
				}
				list = append(list, x)
			}
		}
		return list
	}
	moving := func(list []surface.Convection) []surface.Convection {
		var all []surface.Convection
		for _, c := range list {
			for _, v := range []float64{0.3, 1, 3, 10, 30} {
				c.Speed, c.Gravity = speed(v), units.MetrePerSecondSquared.Of(1e-9)
				all = append(all, c)
			}
		}
		return all
	}
	f := forms()
	sizes := []float64{10, 30, 100, 300}
	for _, tt := range []struct {
		name   string
		cases  []surface.Convection
		second correlations.Correlation
		least  int
	}{
		{"level rod", still(f["level rod"], sizes...), correlations.MorganCylinderNatural(), 12},
		{"level rod, laminar", still(f["level rod"], 10, 30), correlations.ChurchillChuCylinderLaminar(), 6},
		{"level rod in a stream", moving(still(f["level rod"], sizes...)), correlations.ZukauskasCylinder(), 40},
		{"level rod in a stream", moving(still(f["level rod"], sizes...)), correlations.HilpertCylinder(), 40},
		{"level rod in a stream", moving(still(f["level rod"], sizes...)), correlations.WhitakerCylinder(), 40},
		{"upright rod", still(f["upright rod"], sizes...), correlations.PopielCylinder(), 6},
		{"upright rod", still(f["upright rod"], sizes...), correlations.LeFevreEdeCylinder(), 6},
		{"upright rod in a stream", moving(still(f["upright rod"], sizes...)), correlations.SparrowCylinder(), 40},
		{"upright plate", still(f["upright plate"], sizes...), correlations.LeFevrePlate(), 6},
		{"upright plate", still(f["upright plate"], sizes...), correlations.McAdamsPlateVertical(), 6},
		{"inclined plate", still(f["inclined plate"], sizes...), correlations.ChurchillChuPlateInclined(), 6},
		{"plate in a stream", moving(still(f["upright plate"], sizes...)), correlations.PlateLaminar(), 20},
		{"plate in a stream", moving(still(f["level plate"], sizes...)), correlations.ChurchillOzoePlate(), 20},
		{"plate in a stream", moving(still(f["level plate"], 300, 1000, 3000)), correlations.WhitakerPlateMixed(), 10},
		{"level plate, calm face", still(f["level back"], sizes...), correlations.McAdamsPlateDown(), 3},
		{"level plate, active face", still(f["level front"], 10, 20, 30), correlations.GoldsteinPlateUp(), 4},
	} {
		compared := 0
		for _, c := range tt.cases {
			own := film(t, c, kelvin(340))
			c.Insist = tt.second
			other, err := c.Film(kelvin(340))
			var out *units.RangeError
			if errors.As(err, &out) {
				continue
			}
			if err != nil {
				t.Fatal(err)
			}
			compared++
			if difference := math.Abs(math.Log(own.Coefficient.Ratio(other.Coefficient))); difference > own.Scatter+other.Scatter {
				t.Errorf("%s, Ra %.3g, Re %.3g: h %.4g, by %s %.4g: apart by %.2f, joint scatter %.2f",
					tt.name, own.Ra, own.Re, own.Coefficient.SI(), tt.second.Name(), other.Coefficient.SI(), difference, own.Scatter+other.Scatter)
			}
		}
		if compared < tt.least {
			t.Errorf("%s: only %d films in the range of %s", tt.name, compared, tt.second.Name())
		}
	}
}

// A compact body against the bodies whose gravity function and Nusselt number at rest are listed, and a ball of the same surface: what
// our own constants add to the scatter covers them.
func TestCompactAgainstListedBodies(t *testing.T) {
	const a = 60.0 // mm
	gravity, count := 0.0, 0.0
	cube := shape.Brick(millimetres(a), millimetres(a), millimetres(a))
	cylinder := shape.Cylinder(millimetres(a), millimetres(a))
	for _, tt := range []struct {
		name   string
		body   shape.Body
		height float64
	}{
		{"sphere", shape.Measured(ball(a).Volume(), ball(a).Area()), a},
		{"cube, face up", cube, a},
		{"cube, edge up", cube, a * math.Sqrt2},
		{"cube, corner up", cube, a * math.Sqrt(3)},
		{"cylinder as long as wide, vertical", cylinder, a},
		{"cylinder as long as wide, horizontal", cylinder, a},
	} {
		for _, beta := range []float64{1e-8, 1e-5, 1e-3} {
			c := surface.Convection{Body: tt.body, Length: millimetres(tt.height), Fluid: fromGroups(0.026, 1.6e-5, 0.71, beta), Ambient: kelvin(300)}
			f := film(t, c, kelvin(340))
			found := false
			for listed := range correlations.ConvexBodies() {
				if listed.Name != tt.name {
					continue
				}
				found = true
				for u := range f.Used() {
					gravity += u.Groups.Gravity / listed.Gravity
					count++
				}
				want, err := correlations.YovanovichBody().Nu(correlations.Groups{Ra: f.Ra, Pr: 0.71, BodyNu: listed.BodyNu, Gravity: listed.Gravity})
				if err != nil {
					t.Fatal(err)
				}
				near(t, tt.name, f.Nu, want.Nu, 0.10*want.Nu, "Lee, Yovanovich and Jafarpur, from memory; our own constants to 10 %")
			}
			if !found {
				t.Errorf("no body %q", tt.name)
			}
		}
	}
	near(t, "gravity function", gravity/count, 1, 0.02, "the mean of the bodies, on which our own constant was set")
	// Cylinders of 20 diameters with their ends, which are 2 % of the surface, against the closed forms of their sides.
	long := shape.Cylinder(millimetres(5), millimetres(100))
	level, err := correlations.HorizontalCylinderGravity(20)
	if err != nil {
		t.Fatal(err)
	}
	upright, err := correlations.VerticalCylinderGravity(20)
	if err != nil {
		t.Fatal(err)
	}
	for height, gravity := range map[float64]float64{5: level, 100: upright} {
		f := film(t, surface.Convection{Body: long, Length: millimetres(height), Fluid: fromGroups(0.026, 1.6e-5, 0.71, 1e-2), Ambient: kelvin(300)}, kelvin(340))
		want, err := correlations.YovanovichBody().Nu(correlations.Groups{Ra: f.Ra, Pr: 0.71, BodyNu: 3.45, Gravity: gravity})
		if err != nil {
			t.Fatal(err)
		}
		near(t, fmt.Sprintf("cylinder of 20 diameters, %g mm high", height), f.Nu, want.Nu, 0.10*want.Nu, "body gravity function of the side")
	}
	// In a stream, against Whitaker's ball.
	for _, v := range []float64{0.3, 1, 3, 10} {
		weightless := units.MetrePerSecondSquared.Of(1e-9)
		compact := film(t, surface.Convection{
			Body: shape.Measured(ball(a).Volume(), ball(a).Area()), Length: millimetres(a), Fluid: props.Air(), Ambient: celsius(20), Speed: speed(v), Gravity: weightless,
		}, celsius(60))
		whitaker := film(t, surface.Convection{Body: ball(a), Fluid: props.Air(), Ambient: celsius(20), Speed: speed(v), Gravity: weightless}, celsius(60))
		if d := math.Abs(math.Log(compact.Coefficient.Ratio(whitaker.Coefficient))); d > compact.Scatter+whitaker.Scatter {
			t.Errorf("ball as a compact body at %g m/s: %v against %v", v, compact.Coefficient, whitaker.Coefficient)
		}
	}
}

// Near the ambient temperature every form comes to rest without an error, both ways, and the coefficient falls steadily.
func TestFormsComeToRest(t *testing.T) {
	for name, c := range forms() {
		for _, sign := range []float64{-1, 1} {
			last := math.Inf(1)
			for difference := 60.0; difference > 1e-12; difference /= 3 {
				f := film(t, c, celsius(25+sign*difference))
				if h := f.Coefficient.SI(); !(h > 0 && h <= last*1.001) {
					t.Errorf("%s: h %g at %g K, %g before", name, h, sign*difference, last)
				} else {
					last = h
				}
			}
			rest := film(t, c, celsius(25))
			if rest.Regime != correlations.Conduction || rest.ConductionShare != 1 {
				t.Errorf("%s at rest: %+v", name, rest)
			}
			near(t, name+": limit", last, rest.Coefficient.SI(), 0.25*rest.Coefficient.SI(), "Ra^(1/6) at 1e-12 K")
		}
	}
}

// Along an inclined plate acts the part of gravity that is along it: at 30° from the vertical 3^(1/2)/2.
func TestInclinedPlate(t *testing.T) {
	inclined, upright := forms()["inclined plate"], forms()["upright plate"]
	upright.Gravity = units.MetrePerSecondSquared.Of(9.80665 * math.Sqrt(3) / 2)
	got, want := film(t, inclined, celsius(60)), film(t, upright, celsius(60))
	near(t, "Ra", got.Ra, want.Ra, 1e-9*want.Ra, "gravity along the plate")
	near(t, "h", got.Coefficient.SI(), want.Coefficient.SI(), 1e-9*want.Coefficient.SI(), "gravity along the plate")
	near(t, "scatter", got.Scatter, want.Scatter+0.10, 1e-12, "our own choice")
}

// The faces of a level plate change their parts where hot turns to cold, and both faces together are their mean; without property
// variation the same heat flows either way.
func TestFacesOfALevelPlate(t *testing.T) {
	list := forms()
	for _, d := range []float64{0.01, 1, 10, 40} {
		h := map[string]float64{}
		for _, name := range []string{"level plate", "level front", "level back"} {
			c := list[name]
			c.Fluid, c.Ambient = fromGroups(0.026, 1.57e-5, 0.707, 1/300.0), kelvin(300)
			h[name+" hot"] = film(t, c, kelvin(300+d)).Coefficient.SI()
			h[name+" cold"] = film(t, c, kelvin(300-d)).Coefficient.SI()
		}
		near(t, "front and back", h["level front hot"], h["level back cold"], 1e-12*h["level front hot"], "symmetry")
		near(t, "back and front", h["level back hot"], h["level front cold"], 1e-12*h["level back hot"], "symmetry")
		near(t, "both", h["level plate hot"], h["level plate cold"], 1e-12*h["level plate hot"], "symmetry")
		near(t, "mean", h["level plate hot"], (h["level front hot"]+h["level back hot"])/2, 1e-12*h["level plate hot"], "mean over the surface")
		if h["level front hot"] <= h["level back hot"] {
			t.Errorf("at %g K the calm face gives more", d)
		}
	}
	// Water below 4 °C rises where it is cooled: a cold plate has its active face below.
	cold := list["level front"]
	cold.Fluid, cold.Ambient = props.Water(), celsius(0.5)
	front := film(t, cold, celsius(2.5)).Coefficient.SI()
	cold.Body = cold.Body.Exposing(shape.Back)
	if back := film(t, cold, celsius(2.5)).Coefficient.SI(); back <= front {
		t.Errorf("water below 4 °C: front %g, back %g", front, back)
	}
}

func TestFormsScatterAndTexts(t *testing.T) {
	for name, c := range forms() {
		for _, v := range []float64{0, 2} {
			c.Speed = speed(v)
			f := film(t, c, celsius(60))
			low := film(t, c.Low().(surface.Convection), celsius(60))
			high := film(t, c.High().(surface.Convection), celsius(60))
			near(t, name+", low", low.Coefficient.Ratio(f.Coefficient), 1-f.Scatter, 1e-12, "scatter")
			near(t, name+", high", high.Coefficient.Ratio(f.Coefficient), 1+f.Scatter, 1e-12, "scatter")
			if !(f.Scatter >= 0.10 && f.Scatter <= 0.45) || f.Length.SI() <= 0 || f.StreamLength.SI() <= 0 {
				t.Errorf("%s: scatter %g, lengths %v and %v", name, f.Scatter, f.Length, f.StreamLength)
			}
			sources := strings.Join(c.Sources(), "\n")
			for u := range f.Used() {
				if !strings.Contains(sources, u.Correlation.Name()) {
					t.Errorf("%s uses %s, which its sources do not name", name, u.Correlation.Name())
				}
				if u.Correlation.Kind() != correlations.Mean {
					t.Errorf("%s uses %s", name, u.Correlation.Kind())
				}
			}
		}
	}
}

// The plate that is hot above jumps by 6.4 % at 1e7; between its branches the film is half way there: by hand (30.366 + 32.317)/2, and
// a third of the way up the logarithms of the band, ramp 7/27, each branch with its own power.
func TestJumpOfTheLevelPlate(t *testing.T) {
	for _, tt := range []struct{ ra, want float64 }{
		{1e7, (30.366 + 32.317) / 2},
		{5e6 * math.Cbrt(4), 20.0/27*0.54*math.Pow(5e6*math.Cbrt(4), 0.25) + 7.0/27*0.15*math.Cbrt(5e6*math.Cbrt(4))},
	} {
		c := forms()["level front"]
		c.Body, c.Length = plate(4).Exposing(shape.Front), units.Metre.Of(2) // 0.5 m of face over perimeter
		c.Fluid, c.Ambient = fromGroups(0.03, 1e-5, 0.7, tt.ra*1e-10/0.7/9.80665/(0.125*100)), kelvin(300)
		near(t, "between the branches", film(t, c, kelvin(400)).Nu, tt.want, 1e-3, "by hand")
	}
}

// A stream that vanishes leaves the body at rest, whatever its wall.
func TestVanishingStream(t *testing.T) {
	for name, c := range forms() {
		for _, wall := range []float64{25, 25.0001, 26, 60} {
			still := film(t, c, celsius(wall)).Coefficient.SI()
			slow := c
			slow.Speed = speed(1e-10)
			near(t, fmt.Sprintf("%s, wall at %g °C", name, wall), film(t, slow, celsius(wall)).Coefficient.SI(), still, 1e-3*still, "continuity")
		}
	}
}

// A level plate can be in two bands at once; both are named, and without allocation.
func TestTwoBandsAtOnce(t *testing.T) {
	c := forms()["level plate"]
	c.Gravity = units.MetrePerSecondSquared.Of(0.02)
	c.Body, c.Length = plate(0.25), millimetres(500)
	c.Speed = speed(17)
	f := film(t, c, celsius(60))
	names := strings.Split(f.Handover, "; ")
	if len(names) != 2 || names[0] == "" || names[1] == "" || names[0] == names[1] {
		t.Errorf("Ra %g, Re %g: hand-over %q, want two bands", f.Ra, f.Re, f.Handover)
	}
	if n := len(slices.Collect(f.Used())); n != 5 {
		t.Errorf("%d uses, want 5", n)
	}
	if n := testing.AllocsPerRun(100, func() { _, _ = c.Film(celsius(60)) }); n != 0 {
		t.Errorf("allocates %v times", n)
	}
}

func TestFormsRefuse(t *testing.T) {
	list := forms()
	change := func(name string, f func(*surface.Convection)) surface.Convection {
		c := list[name]
		f(&c)
		return c
	}
	for _, tt := range []struct {
		field string
		c     surface.Convection
	}{
		{"position", change("level rod", func(c *surface.Convection) { c.Position = surface.AnyPosition })},
		{"position", change("level rod", func(c *surface.Convection) { c.Position = 9 })},
		{"position", change("level plate", func(c *surface.Convection) { c.Position = surface.AnyPosition })},
		{"length", change("level plate", func(c *surface.Convection) { c.Length = units.Length{} })},
		{"length", change("upright plate", func(c *surface.Convection) { c.Length = millimetres(-1) })},
		{"length", change("brick", func(c *surface.Convection) { c.Length = units.Length{} })},
		{"length", change("brick", func(c *surface.Convection) { c.Length = millimetres(math.NaN()) })},
		{"length", change("brick", func(c *surface.Convection) { c.Length = units.Metre.Of(2) })},
		{"length", change("brick", func(c *surface.Convection) { c.Length = millimetres(10) })},
		{"length", change("ball", func(c *surface.Convection) { c.Length = millimetres(10) })},
		{"length", change("upright rod", func(c *surface.Convection) { c.Length = millimetres(10) })},
		{"body", change("brick", func(c *surface.Convection) {
			c.Body = shape.Brick(millimetres(500), millimetres(500), millimetres(5))
		})},
		{"body", change("level tube", func(c *surface.Convection) { c.Body = c.Body.Exposing(shape.Outside | shape.Inside) })},
		{"body", change("shell", func(c *surface.Convection) { c.Body = c.Body.Exposing(shape.Inside) })},
		{"inclination", change("inclined plate", func(c *surface.Convection) { c.Inclination = units.Degree.Of(61) })},
		{"inclination", change("inclined plate", func(c *surface.Convection) { c.Inclination = units.Degree.Of(-1) })},
		{"inclination", change("inclined plate", func(c *surface.Convection) { c.Inclination = units.Degree.Of(math.NaN()) })},
		{"inclination", change("ball", func(c *surface.Convection) { c.Inclination = units.Degree.Of(1) })},
	} {
		var bad *units.ArgumentError
		_, err := tt.c.Film(celsius(60))
		if !errors.As(err, &bad) || bad.Field != "convection: "+tt.field || !errors.As(tt.c.Check(), &bad) {
			t.Errorf("%+v: %v, want an argument error for %q", tt.c, err, tt.field)
		}
		tt.c.Sources()
	}
	if surface.Upright.String() != "upright" || surface.Level.String() != "level" || surface.AnyPosition.String() != "any position" || surface.Position(9).String() != "unknown position" {
		t.Error("the positions do not name themselves")
	}
}

// scaled is a body of that form, s times as large.
func scaled(c surface.Convection, s float64) surface.Convection {
	c.Length = c.Length.Scale(s)
	l := func(x float64) units.Length { return millimetres(s * x) }
	switch c.Body.Family() {
	case shape.Spherical:
		c.Body = ball(s * 50)
	case shape.Cylindrical:
		c.Body = rod(s*20, s*100)
	case shape.Planar:
		c.Body = plate(s * s * 0.02).Exposing(c.Body.Exposed())
	case shape.Compact:
		c.Body = shape.Brick(l(200), l(100), l(60))
	}
	return c
}

// No form has a hidden jump in wall temperature, speed, size or pressure.
func TestFormsHaveNoHiddenJump(t *testing.T) {
	for _, name := range []string{"level rod", "upright rod", "upright plate", "inclined plate", "level plate", "level front", "level back", "brick"} {
		base := forms()[name]
		liquid := base
		liquid.Fluid = props.Water()
		for _, v := range []float64{0, 0.05, 1} {
			at := func(c surface.Convection) surface.Convection {
				c.Speed = speed(v)
				return c
			}
			for _, p := range []path{
				{name: "wall in air", at: func(s float64) (surface.Convection, units.Temperature) { return at(base), celsius(between(s, 26, 200)) }},
				{name: "cold wall in air", at: func(s float64) (surface.Convection, units.Temperature) { return at(base), celsius(between(s, -40, 24)) }},
				{name: "wall through ambient", crosses: true, at: func(s float64) (surface.Convection, units.Temperature) {
					return at(base), celsius(between(s, -25, 75))
				}},
				{name: "wall in water", at: func(s float64) (surface.Convection, units.Temperature) {
					c := at(liquid)
					c.Speed = c.Speed.Scale(0.1)
					return c, celsius(between(s, 26, 95))
				}},
				{name: "size in air", at: func(s float64) (surface.Convection, units.Temperature) {
					return at(scaled(base, logBetween(s, 0.1, 10))), celsius(60)
				}},
				{name: "size in water", at: func(s float64) (surface.Convection, units.Temperature) {
					return at(scaled(liquid, logBetween(s, 0.05, 1))), celsius(40)
				}},
				{name: "size from 0.1 mm to 10 m in air, in range or not", at: func(s float64) (surface.Convection, units.Temperature) {
					c := at(scaled(base, logBetween(s, 1e-3, 100)))
					c.Extrapolate = true
					return c, celsius(60)
				}},
				{name: "size from 0.1 mm to 10 m in water, in range or not", at: func(s float64) (surface.Convection, units.Temperature) {
					c := at(scaled(liquid, logBetween(s, 1e-3, 100)))
					c.Extrapolate = true
					return c, celsius(40)
				}},
				{name: "pressure", at: func(s float64) (surface.Convection, units.Temperature) {
					c := at(base)
					c.Pressure = units.Kilopascal.Of(between(s, 20, 200))
					return c, celsius(60)
				}},
			} {
				checkPath(t, fmt.Sprintf("%s, %s, %g m/s", name, p.name, v), p)
			}
		}
		slowest := 1e-6
		if strings.HasSuffix(name, "rod") {
			slowest = 0.02 // the formula of the stream begins at a Péclet number of 0.2
		}
		for _, wall := range []float64{25, 25.01, 26, 60} {
			checkPath(t, fmt.Sprintf("%s, speed, wall at %g °C", name, wall), path{at: func(s float64) (surface.Convection, units.Temperature) {
				c := base
				c.Speed = speed(logBetween(s, slowest, 20))
				return c, celsius(wall)
			}})
		}
	}
	// Slenderness of an upright rod, whose Nusselt number at rest has two formulas.
	checkPath(t, "slenderness", path{at: func(s float64) (surface.Convection, units.Temperature) {
		c := forms()["upright rod"]
		c.Body = rod(logBetween(s, 15, 25), 150)
		return c, celsius(25)
	}})
}

func checkPath(t *testing.T, name string, p path) {
	t.Helper()
	fall := 0.85
	if p.crosses {
		fall = 0.98
	}
	last, answers := largestStep(p, 64)
	if answers < 20 {
		t.Errorf("%s: only %d films", name, answers)
	}
	for steps := 128; steps <= 512; steps *= 2 {
		next, _ := largestStep(p, steps)
		if !(next <= fall*last) && next > 1e-9 {
			t.Errorf("%s: largest ratio of neighbours %.3g with %d steps, %.3g with half as many", name, next, steps, last)
		}
		last = next
	}
}

func TestFormsDoNotAllocate(t *testing.T) {
	for name, c := range forms() {
		c.Speed = speed(0.3)
		if n := testing.AllocsPerRun(100, func() { _, _ = c.Film(celsius(60)) }); n != 0 {
			t.Errorf("%s allocates %v times", name, n)
		}
	}
}

func FuzzForms(f *testing.F) {
	f.Add(uint8(0), 0.05, 0.1, 298.15, 1.0, 333.15)
	f.Add(uint8(7), 1e-4, 1e3, 274.0, 0.0, 280.0)
	f.Add(uint8(0x9e), 105.0, 7670.0, 1042.0, 0.096, 1167.0) // two bands at once
	f.Add(uint8(12), 1e150, 1e-150, 1e-300, 1e300, 1e300)
	names := []string{}
	for name := range forms() {
		names = append(names, name)
	}
	slices.Sort(names)
	f.Fuzz(func(t *testing.T, which uint8, size, length, ambient, v, wall float64) {
		c := forms()[names[int(which)%len(names)]]
		c.Ambient, c.Speed, c.Extrapolate = kelvin(ambient), speed(v), which > 127
		c.Length = c.Length.Scale(length)
		switch c.Body.Family() {
		case shape.Cylindrical:
			c.Body = rod(size, size*length)
		case shape.Planar:
			c.Body = plate(size).Exposing(c.Body.Exposed())
		case shape.Compact:
			c.Body = shape.Measured(units.CubicMetre.Of(size*size*size), squares(size*size*length))
		}
		steady, up, down := c, c, c
		steady.Fluid = fromGroups(0.026, 1.57e-5, 0.707, 1/300.0)
		up.Stream, down.Stream = surface.Upward, surface.Downward
		for _, part := range []surface.Part{c, steady, c.Low(), c.High(), up, down, up.Low(), down.Low()} {
			q, err := part.Flux(units.Duration{}, kelvin(wall))
			if err == nil && !(q.IsFinite() && q.SI()*(wall-ambient) >= 0) {
				t.Errorf("%+v at %v K: %v without an error", part, wall, q)
			}
			if err != nil {
				checkTyped(t, names[int(which)%len(names)], err)
			}
		}
	})
}

func BenchmarkForms(b *testing.B) {
	list := forms()
	// The dearest: three states of water and three correlations, two of which hand over.
	for _, name := range []string{"can", "level plate"} {
		c := scaled(list[name], 0.1)
		c.Fluid = props.Water()
		list[name+", hand-over in water"] = c
	}
	for name, c := range list {
		c.Speed = speed(0.3)
		b.Run(name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				_, _ = c.Film(celsius(60))
			}
		})
	}
}

// Every combination of form, size, speed and temperatures gives a finite positive coefficient and shares that add up, or a typed
// error; with Extrapolate only the fluid may still refuse.
func TestScanForms(t *testing.T) {
	answers, refusals := 0, 0
	for name, base := range forms() {
		for _, fluid := range fluids {
			for _, size := range []float64{0.001, 0.02, 1, 30, 100} { // 0.1 mm to 10 m
				for _, v := range []float64{0, 1e-4, 0.1, 20} {
					for _, ambient := range []float64{-40, 3, 25, 300} {
						for _, wall := range []float64{-50, 4, 24.999, 25, 25.001, 99, 600} {
							c := scaled(base, size)
							c.Fluid, c.Speed, c.Ambient = fluid, speed(v), celsius(ambient)
							where := fmt.Sprintf("%s, size %g, %s, %g m/s, %g °C in %g °C", name, size, fluid.Name(), v, wall, ambient)
							f, err := c.Film(celsius(wall))
							c.Extrapolate = true
							g, errG := c.Film(celsius(wall))
							if err != nil {
								refusals++
								checkTyped(t, where, err)
								if errG != nil {
									checkTyped(t, where, errG)
								} else if !g.Extrapolated {
									t.Errorf("%s: %v, but the extrapolated film does not say so", where, err)
								}
								continue
							}
							answers++
							if f != g {
								t.Errorf("%s: Extrapolate changes a film in range", where)
							}
							h, sum := f.Coefficient.SI(), f.ConductionShare+f.ForcedShare+f.NaturalShare
							if !(h > 0 && h < 1e9 && f.Nu > 0 && f.Scatter >= 0.1 && f.Scatter < 0.5) || math.Abs(sum-1) > 1e-12 || f.Extrapolated {
								t.Errorf("%s: h %g, Nu %g, scatter %g, shares %g, extrapolated %v", where, h, f.Nu, f.Scatter, sum, f.Extrapolated)
							}
							weights := map[correlations.Regime]float64{}
							for u := range f.Used() {
								weights[u.Correlation.Regime()] += u.Weight
							}
							for regime, w := range weights {
								if math.Abs(w-1) > 1e-12 {
									t.Errorf("%s: weights of %v add up to %g", where, regime, w)
								}
							}
						}
					}
				}
			}
		}
	}
	t.Logf("%d films, %d refusals", answers, refusals)
	if answers < 5000 || refusals < 1000 {
		t.Errorf("%d answers and %d refusals: the scan misses one of them", answers, refusals)
	}
}

// Without gravity a film is the forced correlation alone, and at rest the natural one, as each comes out when it is insisted on.
func TestFormsReduceToEachMode(t *testing.T) {
	for _, tt := range []struct {
		form            string
		natural, forced correlations.Correlation
	}{
		{"ball", correlations.ChurchillSphere(), correlations.WhitakerSphere()},
		{"level rod", correlations.ChurchillChuCylinder(), correlations.ChurchillBernsteinCylinder()},
		{"upright rod", correlations.YovanovichBody(), correlations.ChurchillBernsteinCylinder()},
		{"upright plate", correlations.ChurchillChuPlate(), correlations.PlateLaminar()},
		{"level plate", correlations.YovanovichBody(), correlations.PlateLaminar()},
		{"level back", correlations.RadziemskaPlateDown(), correlations.PlateLaminar()},
		{"brick", correlations.YovanovichBody(), correlations.YovanovichVanoverbekeBody()},
	} {
		c := forms()[tt.form]
		wall := celsius(60)
		if tt.form == "brick" {
			wall = celsius(25.2) // below the band in which the plate takes over
		}
		if tt.form == "level back" {
			c = scaled(c, 4) // above the band from rest
		}
		still := c
		still.Insist = tt.natural
		if tt.form != "level plate" { // which is the mean of two faces
			near(t, tt.form+" at rest", film(t, c, wall).Coefficient.SI(), film(t, still, wall).Coefficient.SI(), 1e-9, "alone")
		}
		c.Speed, c.Gravity = speed(1), units.MetrePerSecondSquared.Of(1e-12)
		moving := c
		moving.Insist = tt.forced
		near(t, tt.form+" in a stream", film(t, c, wall).Coefficient.SI(), film(t, moving, wall).Coefficient.SI(), 1e-6, "alone")
	}
}

// Without property variation a body that has no upper and lower face exchanges as much when it is colder as when it is hotter.
func TestFormsAreSymmetric(t *testing.T) {
	for name, c := range forms() {
		if name == "level front" || name == "level back" {
			continue
		}
		c.Fluid, c.Ambient = fromGroups(0.026, 1.57e-5, 0.707, 1/300.0), kelvin(300)
		for _, v := range []float64{0, 0.05, 1} {
			for _, d := range []float64{1e-3, 1, 60} {
				c.Speed = speed(v)
				hot, cold := film(t, c, kelvin(300+d)).Coefficient.SI(), film(t, c, kelvin(300-d)).Coefficient.SI()
				near(t, fmt.Sprintf("%s at %g m/s, %g K", name, v, d), cold, hot, 1e-9*hot, "symmetry")
			}
		}
	}
}

// Our own gravity functions of the faces of a level plate: on a square in a gas Yovanovich's correlation comes to within 6 % of that of the
// face where it hands over to it, on one in water, of which those of the faces know no more, to within 13 %.
func TestFacesHandOver(t *testing.T) {
	for _, tt := range []struct{ pr, tol float64 }{{0.71, 0.06}, {7, 0.13}} {
		for _, face := range []shape.Face{shape.Front, shape.Back} {
			c := surface.Convection{
				Body: plate(0.01).Exposing(face), Position: surface.Level, Length: millimetres(100),
				Fluid: fromGroups(0.026, 1.57e-5, tt.pr, 4.2e-4/tt.pr), Ambient: kelvin(300),
			}
			f := film(t, c, kelvin(340)) // Ra 1.04e4
			var h []float64
			for u := range f.Used() {
				h = append(h, u.Nu/u.Length.SI())
			}
			if f.Handover == "" || len(h) != 2 || !(math.Abs(h[0]/h[1]-1) <= tt.tol) {
				t.Errorf("%v, Pr %g, Ra %g, %q: Nu/L %v, want two within %g", face, tt.pr, f.Ra, f.Handover, h, tt.tol)
			}
		}
	}
}

package correlations_test

import (
	"math"
	"testing"

	"example.com/coolward/correlations"
)

// secondFormulas are pairs of formulas of different authors for the same.
var secondFormulas = []struct {
	first, second correlations.Correlation
	low, high     float64 // Re or Ra
	prandtl       []float64
	to            func(groups) groups // from the groups of the first to those of the second; nil if they are the same
	length        float64             // of the second over that of the first
}{
	{correlations.ChurchillSphere(), correlations.RaithbyHollandsSphere(), 1, 1e8, []float64{0.7, 7, 100}, nil, 1},
	{correlations.ChurchillSphere(), correlations.AmatoTienSphere(), 3e5, 8e8, []float64{2, 7}, nil, 1},
	{correlations.ChurchillSphere(), correlations.YovanovichBody(), 1, 1e7, []float64{0.7, 7, 100}, onSurface, math.Sqrt(math.Pi)},
	{correlations.WhitakerSphere(), correlations.CliftSphere(), 3.5, 7.6e4, []float64{0.7, 7, 100}, nil, 1},
	{correlations.CliftSphere(), correlations.RanzMarshallSphere(), 2, 200, []float64{0.7, 2}, nil, 1},
	{correlations.CliftSphere(), correlations.AcrivosGoddardSphere(), 0.05, 0.1, []float64{100}, nil, 1}, // creeping flow, Pe 5 to 10
	{correlations.WhitakerSphere(), correlations.YovanovichVanoverbekeBody(), 3.5, 7.6e4, []float64{0.7, 7}, onSurface, math.Sqrt(math.Pi)},
	{correlations.ChurchillChuCylinder(), correlations.MorganCylinderNatural(), 1e-5, 1e12, []float64{0.7}, nil, 1},
	{correlations.ChurchillBernsteinCylinder(), correlations.ZukauskasCylinder(), 1, 1e6, []float64{0.7, 7}, nil, 1},
	// From Re 10, where one handbook has it start: without a conduction limit it is half of the others at Re 1.
	{correlations.ChurchillBernsteinCylinder(), correlations.WhitakerCylinder(), 10, 1e5, []float64{0.7, 7, 100}, nil, 1},
	{correlations.ChurchillBernsteinCylinder(), correlations.HilpertCylinder(), 0.4, 4e5, []float64{0.7}, nil, 1},
	{correlations.ChurchillBernsteinCylinder(), correlations.NakaiOkazakiCylinder(), 0.2, 0.28, []float64{0.75}, nil, 1},
	{correlations.ChurchillChuPlate(), correlations.McAdamsPlateVertical(), 1e4, 1e12, []float64{0.7}, nil, 1},
	// McAdams has no Pr, and is 34 % below at Pr 7 where its turbulent branch starts.
	{correlations.ChurchillChuPlate(), correlations.McAdamsPlateVertical(), 1e4, 9e8, []float64{7}, nil, 1},
	{correlations.ChurchillChuPlate(), correlations.LeFevrePlate(), 1e4, 1e8, []float64{0.7, 7}, nil, 1},
	{correlations.HorizontalPlateUp(), correlations.GoldsteinPlateUp(), 1e4, 1.2e4, []float64{0.7}, nil, 1},
	{correlations.RadziemskaPlateDown(), correlations.McAdamsPlateDown(), 1e5, 1e9, []float64{0.7}, nil, 1},
	{correlations.PlateLaminar(), correlations.ChurchillOzoePlate(), 1e3, 5e5, []float64{0.7, 7, 100}, nil, 1},
	{correlations.PlateMixed(), correlations.WhitakerPlateMixed(), 5e5, 5.5e6, []float64{0.7, 7, 60}, nil, 1},
	// At Pr 7 Gnielinski is 60 % above the analogy of Chilton and Colburn.
	{correlations.PlateMixed(), correlations.GnielinskiPlate(), 2e6, 1e7, []float64{0.7}, nil, 1},
	{correlations.GnielinskiTube(), correlations.PetukhovTube(), 1e4, 5e6, []float64{0.7, 7, 200}, nil, 1},
	{correlations.GnielinskiTube(), correlations.DittusBoelterHeating(), 1e4, 5e5, []float64{0.7, 7}, nil, 1},
	{correlations.GnielinskiTube(), correlations.HausenTubeTransition(), 3000, 1e4, []float64{0.7, 7}, nil, 1},
	{correlations.GnielinskiTubeLaminar(), correlations.HausenTubeLaminar(), 1, 2300, []float64{0.7, 7, 100}, nil, 1},
	{correlations.GunnBed(), correlations.WakaoBed(), 15, 8500, []float64{0.7, 7}, nil, 1},
	{correlations.GunnBed(), correlations.GnielinskiBed(), 15, 8500, []float64{0.7, 7}, nil, 1},
	{correlations.BarCohenChannel(), correlations.ElenbaasChannel(), 0.1, 1e5, []float64{0.7}, nil, 1},
	{correlations.CattonEnclosure(), correlations.MacGregorEmeryEnclosure(), 1e4, 1e7, []float64{1, 7}, nil, 1},
	{correlations.BromleySphere(), correlations.FrederkingClarkSphere(), 5e7, 2e8, []float64{1}, nil, 1},
	// On a length 10 times as large, on which the second does not depend.
	{correlations.BerensonPlate(), correlations.FrederkingClarkSphere(), 1e6, 1e7, []float64{1}, func(g groups) groups { g.FilmRa *= 1000; return g }, 10},
}

// onSurface goes from the diameter of a sphere to the square root of its surface.
func onSurface(g groups) groups {
	root := math.Sqrt(math.Pi)
	g.Re, g.Ra = g.Re*root, g.Ra*root*root*root
	g.BodyNu, g.Gravity, g.Perimeter = 2*root, correlations.SphereGravity, root
	return g
}

// The formulas that are taken first meet a second one of other authors within the scatter of both, over the
// range that both hold in.
func TestSecondFormula(t *testing.T) {
	const long = 1e6 // a tube so long that its entry does not count
	for _, tt := range secondFormulas {
		worst := 0.0
		n := 0
		for x := tt.low; x <= tt.high; x *= 1.3 {
			for _, pr := range tt.prandtl {
				g := groups{Re: x, Ra: x, FilmRa: x, Pr: pr, ViscosityRatio: 1, PrandtlRatio: 1, TransitionRe: 5e5, Slenderness: long, VoidFraction: 0.4}
				if tt.first.Body() == "vertical channel" {
					g.Slenderness = 1
				}
				if tt.first.Body() == "enclosure between vertical walls" {
					g.Slenderness = 10
				}
				a, errA := tt.first.Nu(g)
				h := g
				if tt.to != nil {
					h = tt.to(g)
				}
				b, errB := tt.second.Nu(h)
				if errA != nil || errB != nil {
					t.Errorf("%s and %s: %v, %v", tt.first.Name(), tt.second.Name(), errA, errB)
					continue
				}
				b.Nu /= tt.length
				n++
				if a.Nu*(1-a.Scatter) > b.Nu*(1+b.Scatter) || b.Nu*(1-b.Scatter) > a.Nu*(1+a.Scatter) {
					t.Errorf("at %g, Pr %g: %.4g ± %g of %s and %.4g ± %g of %s do not meet", x, pr, a.Nu, a.Scatter, tt.first.Name(), b.Nu, b.Scatter, tt.second.Name())
				}
				worst = max(worst, math.Abs(b.Nu/a.Nu-1))
			}
		}
		t.Logf("%s against %s: %.0f %% at most, %d points", tt.second.Name(), tt.first.Name(), 100*worst, n)
		if n == 0 {
			t.Errorf("%s against %s: no points", tt.second.Name(), tt.first.Name())
		}
	}
}

// How far formulas are apart where one hands over to another, or a branch to the next: as computed from the
// printed coefficients with 40-digit arithmetic. None is smoothed.
func TestJumps(t *testing.T) {
	below := func(x float64) float64 { return math.Nextafter(x, 0) }
	re := func(x, pr float64) groups {
		return groups{Re: x, Pr: pr, ViscosityRatio: 1, PrandtlRatio: 1, TemperatureRatio: 1, Slenderness: 1e30, Rows: 20, PitchRatio: 1}
	}
	ra := func(x, pr float64) groups { return groups{Ra: x, Pr: pr, Slenderness: 10, FluxRa: x} }
	type c = correlations.Correlation
	at := func(f c, g func(x, pr float64) groups, pr float64, points ...float64) []float64 {
		var jumps []float64
		for _, x := range points {
			jumps = append(jumps, 100*(nu(t, f, g(x, pr))/nu(t, f, g(below(x), pr))-1))
		}
		return jumps
	}
	over := func(left, right c, g groups) []float64 { return []float64{100 * (nu(t, right, g)/nu(t, left, g) - 1)} }
	second := re(1e6, 0.7) // the enclosures at their common slenderness
	second.Ra, second.Slenderness = 1e6, 2
	for _, tt := range []struct {
		name string
		got  []float64
		want []float64
		tol  float64
	}{
		{"Morgan, natural", at(correlations.MorganCylinderNatural(), ra, 1, 1e-2, 1e2, 1e4, 1e7), []float64{-0.16, 0.19, -0.04, -0.76}, 0.006},
		{"Hilpert", at(correlations.HilpertCylinder(), re, 1, 4, 40, 4000, 40000), []float64{-0.59, 1.08, -0.31, 1.48}, 0.006},
		{"Morgan, forced", at(correlations.MorganCylinderForced(), re, 1, 4e-3, 0.09, 1, 35, 5e3, 5e4), []float64{0.01, 0.10, -0.62, -0.08, 0.88, -0.39}, 0.006},
		{"Zukauskas", at(correlations.ZukauskasCylinder(), re, 1, 40, 1000, 2e5), []float64{-1.66, 1.72, -0.93}, 0.006},
		{"Yuge, forced", at(correlations.YugeSphereForced(), re, 0.7, 1800), []float64{0.09}, 0.006},
		{"Clift", []float64{
			100 * (nu(t, correlations.CliftSphere(), re(math.Nextafter(100, 200), 1))/nu(t, correlations.CliftSphere(), re(100, 1)) - 1),
			100 * (nu(t, correlations.CliftSphere(), re(math.Nextafter(2000, 3000), 1))/nu(t, correlations.CliftSphere(), re(2000, 1)) - 1),
		}, []float64{0.04, -0.01}, 0.006},
		{"Vliet, laminar to turbulent", over(correlations.VlietPlateFluxLocal(), correlations.VlietPlateFluxTurbulent(), ra(2e13, 7)), []float64{31.0}, 0.06},
		{"horizontal plate, small to large", over(correlations.GoldsteinPlateUp(), correlations.HorizontalPlateUp(), ra(1e4, 0.7)), []float64{-8.5}, 0.06},
		{"Catton, low to tall", over(correlations.CattonEnclosureLow(), correlations.CattonEnclosure(), second), []float64{-10.3}, 0.06},
		{"Catton to MacGregor and Emery", over(correlations.CattonEnclosure(), correlations.MacGregorEmeryEnclosure(), ra(1e6, 1)), []float64{18.3}, 0.06},
		{"MacGregor and Emery to turbulent", over(correlations.MacGregorEmeryEnclosure(), correlations.MacGregorEmeryEnclosureTurbulent(), ra(1e7, 1)), []float64{-16.3}, 0.06},
		{"Hausen to Gnielinski", over(correlations.HausenTubeTransition(), correlations.GnielinskiTube(), re(1e4, 0.7)), []float64{-14.6}, 0.06},
		{"Clift to its short form", over(correlations.CliftSphere(), correlations.CliftSphereShort(), re(400, 0.7)), []float64{-7.4}, 0.06},
		{"Achenbach, drag crisis", over(correlations.AchenbachSphere(), correlations.AchenbachSphereSupercritical(), re(3e5, 0.7)), []float64{290}, 0.5},
		{"Collis and Williams", at(correlations.CollisWilliamsWire(), re, 0.7, 44), []float64{-0.23}, 0.006},
		{"McAdams, vertical", at(correlations.McAdamsPlateVertical(), ra, 0.7, 1e9), []float64{-4.69}, 0.006},
		{"Churchill and Chu plate", over(correlations.ChurchillChuPlateLaminar(), correlations.ChurchillChuPlate(), ra(1e9, 0.7)), []float64{33}, 0.6},
		{"Churchill and Chu cylinder", over(correlations.ChurchillChuCylinderLaminar(), correlations.ChurchillChuCylinder(), ra(1e9, 0.7)), []float64{65}, 0.6},
		{"horizontal plate, up", at(correlations.HorizontalPlateUp(), ra, 0.7, 1e7), []float64{6.42}, 0.006},
		{"Goldstein", at(correlations.GoldsteinPlateUp(), ra, 0.7, 200), []float64{-4.43}, 0.006},
		{"Fujii and Imura, flux up", at(correlations.FujiiImuraPlateFluxUp(), ra, 0.7, 2e8), []float64{23.1}, 0.06},
		{"plate, local, laminar to turbulent", over(correlations.PlateLaminarLocal(), correlations.PlateTurbulentLocal(), re(5e5, 0.7)), []float64{357}, 0.6},
		{"bank, aligned", at(correlations.ZukauskasBankAligned(), re, 1, 100, 1000, 2e5), []float64{1.0, 30, 0.9}, 0.1},
		{"bank, staggered", at(correlations.ZukauskasBankStaggered(), re, 1, 100, 1000, 2e5), []float64{-10, 37, 18}, 0.5},
		{"rotating sphere", at(correlations.KreithRotatingSphere(), re, 1, 5e4), []float64{-3.4}, 0.06},
		{"Churchill and Bernstein to the middle", over(correlations.ChurchillBernsteinCylinder(), correlations.ChurchillBernsteinCylinderMiddle(), re(2e4, 0.7)), []float64{10}, 0.6},
		{"Nakai and Okazaki to Churchill and Bernstein", over(correlations.NakaiOkazakiCylinder(), correlations.ChurchillBernsteinCylinder(), re(0.2/0.7, 0.7)), []float64{-9}, 0.5},
		{"Jakob, hexagon", at(correlations.JakobHexagonFaceOn(), re, 1, 1.95e4), []float64{100 * (87.15/87.33 - 1)}, 0.02},
		{"Gnielinski, joins of all Reynolds numbers", []float64{
			100 * (nu(t, correlations.GnielinskiTubeAll(), re(math.Nextafter(2300, 3000), 0.7))/nu(t, correlations.GnielinskiTubeAll(), re(2300, 0.7)) - 1),
			at(correlations.GnielinskiTubeAll(), re, 0.7, 4000)[0],
		}, []float64{0, 0}, 1e-9},
	} {
		for i, want := range tt.want {
			if !(math.Abs(tt.got[i]-want) <= tt.tol) {
				t.Errorf("%s, jump %d: %.4g %%, want %g ± %g", tt.name, i, tt.got[i], want, tt.tol)
			}
		}
	}
	// The mean over a plate is continuous where the boundary layer turns, whatever the transition.
	for _, rc := range []float64{1e5, 5e5, 3e6} {
		g := groups{Re: rc, Pr: 0.7, TransitionRe: rc}
		next := g
		next.Re = math.Nextafter(rc, 2*rc)
		for _, f := range []c{correlations.PlateMixed(), correlations.WhitakerPlateMixed()} {
			if a, b := nu(t, f, g), nu(t, f, next); math.Abs(b/a-1) > 1e-12 {
				t.Errorf("%s: %v to %v at the transition %g", f.Name(), a, b, rc)
			}
		}
	}
}

// The exponents of the published power laws, as slopes of log Nu, away from the branch points.
func TestExponents(t *testing.T) {
	for _, tt := range []struct {
		c     correlations.Correlation
		group correlations.Group
		at    float64
		want  float64
	}{
		{correlations.McAdamsSphere(), correlations.Reynolds, 1e3, 0.6},
		{correlations.HilpertCylinder(), correlations.Reynolds, 1e3, 0.466},
		{correlations.HilpertCylinder(), correlations.Prandtl, 7, 1.0 / 3},
		{correlations.ZukauskasCylinder(), correlations.Reynolds, 5e3, 0.6},
		{correlations.ZukauskasCylinder(), correlations.Prandtl, 50, 0.36},
		{correlations.ZukauskasCylinder(), correlations.PrandtlRatio, 2, 0.25},
		{correlations.WhitakerCylinder(), correlations.ViscosityRatio, 2, 0.25},
		{correlations.CollisWilliamsWire(), correlations.TemperatureRatio, 1.2, 0.17},
		{correlations.JakobSquareFaceOn(), correlations.Reynolds, 2e4, 0.675},
		{correlations.BedingfieldDrewCylinder(), correlations.Prandtl, 2, 0.44},
		{correlations.PlateTurbulent(), correlations.Reynolds, 1e7, 0.8},
		{correlations.VlietPlateFluxLocal(), correlations.FluxRayleigh, 1e8, 0.2},
		{correlations.RadziemskaPlateDown(), correlations.Rayleigh, 1e6, 0.2},
		{correlations.GlobeDropkinLayer(), correlations.Prandtl, 7, 0.074},
		{correlations.CattonEnclosure(), correlations.Slenderness, 5, -0.25},
		{correlations.MacGregorEmeryEnclosure(), correlations.Slenderness, 20, -0.3},
		{correlations.RaithbyHollandsAnnulus(), correlations.Rayleigh, 1e6, 0.25},
		{correlations.DittusBoelterHeating(), correlations.Prandtl, 7, 0.4},
		{correlations.DittusBoelterCooling(), correlations.Prandtl, 7, 0.3},
		{correlations.SiederTateTube(), correlations.ViscosityRatio, 2, 0.14},
		{correlations.MartinJet(), correlations.Prandtl, 2, 0.42},
		{correlations.MartinJetArray(), correlations.Reynolds, 1e4, 2.0 / 3},
		{correlations.ZukauskasBankStaggered(), correlations.PitchRatio, 1.2, 0},
		{correlations.NusseltPlate(), correlations.FilmRayleigh, 1e10, 0.25},
		{correlations.FrederkingClarkSphere(), correlations.FilmRayleigh, 1e9, 1.0 / 3},
		{correlations.SparrowAnsariCylinder(), correlations.Rayleigh, 5e4, 0.208},
	} {
		g := correlations.Middle(tt.c)
		if tt.c == correlations.ZukauskasBankStaggered() {
			g.Re, tt.want = 1e4, 0.2
		}
		if tt.c == correlations.HilpertCylinder() {
			g.Re = 1e3
		}
		correlations.Set(&g, tt.group, tt.at)
		more := g
		correlations.Set(&more, tt.group, tt.at*1.1)
		if got := math.Log(nu(t, tt.c, more)/nu(t, tt.c, g)) / math.Log(1.1); math.Abs(got-tt.want) > 1e-10 {
			t.Errorf("%s: %s to the power of %.6g, want %g", tt.c.Name(), tt.group, got, tt.want)
		}
	}
}

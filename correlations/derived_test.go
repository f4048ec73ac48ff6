package correlations_test

import (
	"math"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

// Formulas that are made of others, against those: published factors, exact integrations, and limits.
func TestFormsMadeOfOthers(t *testing.T) {
	tube := groups{Re: 2e4, Pr: 7, Slenderness: 8, PrandtlRatio: 2}
	still := groups{Ra: 1e7, Pr: 0.7, Inclination: units.Degree.Of(60)}
	flat, half := still, still
	flat.Inclination, half.Ra = units.Angle{}, still.Ra/2
	half.Inclination = units.Angle{}
	laminar := groups{Re: 1500, Pr: 7, Slenderness: 50}
	turbulent := groups{Re: 1e5, Pr: 7, Slenderness: 27}
	between := groups{Re: 2300 + 1700/4, Pr: 7, Slenderness: 27}
	low, high := between, between
	low.Re, high.Re = 2300, 4000
	all := correlations.GnielinskiTubeAll()
	slow := groups{Ra: 1e8, TransitionRa: 2e9, Inclination: units.Degree.Of(30), Pr: 0.7}
	rotating := groups{Re: 1, Pr: 0.7}
	disk := groups{Re: 1e5, Pr: 0.7, TransitionRe: 2.4e5}
	plate := groups{Re: 3e5, Pr: 0.7, TransitionRe: 5e5}
	single := groups{Re: 500, Pr: 7, VoidFraction: 1}
	film := groups{FilmRa: 1e12}
	for _, tt := range []struct {
		what      string
		got, want float64
		tolerance float64
	}{
		{"Gnielinski, entry: 1 + (1/8)^(2/3) = 1.25, and 2^0.11", nu(t, correlations.GnielinskiTubeEntry(), tube) / nu(t, correlations.GnielinskiTube(), tube), 1.25 * math.Pow(2, 0.11), 1e-13},
		{"Gnielinski, all Re: laminar", nu(t, all, laminar), nu(t, correlations.GnielinskiTubeLaminar(), laminar), 0},
		{"Gnielinski, all Re: turbulent, 1 + (1/27)^(2/3) = 10/9", nu(t, all, turbulent), nu(t, correlations.GnielinskiTube(), turbulent) * 10 / 9, 1e-13},
		{"Gnielinski, all Re: a quarter of the way from 2300 to 4000", nu(t, all, between), 0.75*nu(t, all, low) + 0.25*nu(t, all, high), 1e-13},
		{"inclined plate, upright", nu(t, correlations.ChurchillChuPlateInclined(), flat), nu(t, correlations.ChurchillChuPlateLaminar(), still), 0},
		{"inclined plate, 60°: half of gravity", nu(t, correlations.ChurchillChuPlateInclined(), still), nu(t, correlations.ChurchillChuPlateLaminar(), half), 1e-14},
		{"Fujii and Imura: the hot face up before the vortices is the hot face down", nu(t, correlations.FujiiImuraPlateUp(), slow), nu(t, correlations.FujiiImuraPlateDown(), slow), 1e-14},
		{"condensation on a sphere: exact integration 0.828210", nu(t, correlations.NusseltSphere(), film) / 1e3, 0.828210, 3e-3},
		{"condensation on a plate: exact integration 0.942809", nu(t, correlations.NusseltPlate(), film) / 1e3, 0.942809, 1e-3},
		{"condensation on a cylinder: exact integration 0.728019", nu(t, correlations.NusseltCylinder(), film) / 1e3, 0.728019, 2e-3},
		{"combined convection from a sphere without a stream: 0.44 Ra^(1/4)", nu(t, correlations.CombinedSphere(), groups{Ra: 1e4, Pr: 7, ViscosityRatio: 1}), 6.4, 1e-14},
		{"combined convection from a sphere without buoyancy: (126 + 57)/(1 + 52 + 100) Pr^(1/3) at Re 1", nu(t, correlations.CombinedSphere(), groups{Re: 1, Pr: 8, ViscosityRatio: 1}), 2 + 2*183.0/153, 1e-14},
		{"rotating sphere, slow: conduction", nu(t, correlations.KreithRotatingSphere(), rotating), 2, 0},
		{"rotating disk before the transition", nu(t, correlations.RotatingDiskMixed(), disk), nu(t, correlations.RotatingDisk(), disk), 0},
		{"plate before the transition", nu(t, correlations.PlateMixed(), plate), nu(t, correlations.PlateLaminar(), plate), 0},
		{"Whitaker's plate before the transition: 0.036 · 18.44 = 0.664", nu(t, correlations.WhitakerPlateMixed(), plate), nu(t, correlations.PlateLaminar(), plate), 3e-4},
		{"Gnielinski's bed of void fraction 1 is a sphere", nu(t, correlations.GnielinskiBed(), single), nu(t, correlations.GnielinskiSphere(), single), 0},
		{"Gunn's bed of void fraction 1 at rest is a sphere", nu(t, correlations.GunnBed(), groups{VoidFraction: 1}), 2, 1e-15},
		{"Catton, no flow", nu(t, correlations.CattonEnclosure(), groups{Ra: 1, Pr: 0.7, Slenderness: 5}), 1, 0},
		{"Catton, low, no flow", nu(t, correlations.CattonEnclosureLow(), groups{Ra: 1, Pr: 0.7, Slenderness: 1}), 1, 0},
		{"MacGregor and Emery, no flow", nu(t, correlations.MacGregorEmeryEnclosure(), groups{Ra: 1, Pr: 1, Slenderness: 20}), 1, 0},
		{"spherical shell, no flow", nu(t, correlations.RaithbyHollandsShell(), groups{Ra: 1, Pr: 0.7}), 1, 0},
		{"laminar film at its end, Re 30: 0.4731 against the wavy one (Nusselt: 4/3 (4/(3 Re))^(1/3))", nu(t, correlations.WavyFilmPlate(), groups{Re: 30}), 4.0 / 3 * math.Cbrt(4.0/90), 5e-3},
	} {
		if !(math.Abs(tt.got-tt.want) <= tt.tolerance*math.Abs(tt.want)) {
			t.Errorf("%s: got %.15g, want %.15g ± %g", tt.what, tt.got, tt.want, tt.tolerance)
		}
	}
}

// The creeping-flow branch of Clift, Grace and Weber tends to the asymptote of Acrivos and Goddard, 0.9913 Pe^(1/3),
// which the pages print as 1.249 (Pe/2)^(1/3).
func TestCreepingFlow(t *testing.T) {
	for _, pe := range []float64{1e3, 1e6, 1e9} {
		g := groups{Re: 0.1, Pr: pe / 0.1}
		a, b := nu(t, correlations.AcrivosGoddardSphere(), g), nu(t, correlations.CliftSphere(), g)
		if math.Abs(a/b-1) > 0.02 {
			t.Errorf("Pe %g: Acrivos and Goddard %v, Clift, Grace and Weber %v", pe, a, b)
		}
	}
}

// The limits of an open channel that Mechanical Engineers' Handbook, vol. 4, p. 387, table 1, prints.
func TestChannelLimits(t *testing.T) {
	const small, large = 1e-6, 1e12
	for _, tt := range []struct {
		c    correlations.Correlation
		el   float64
		want float64
	}{
		{correlations.BarCohenChannel(), small, small / 24},
		{correlations.BarCohenChannelOneSide(), small, small / 12},
		{correlations.BarCohenChannelFlux(), small, math.Sqrt(small / 48)},
		{correlations.BarCohenChannelFluxOneSide(), small, math.Sqrt(small / 24)},
		{correlations.BarCohenChannelFluxMiddle(), small, math.Sqrt(small / 12)},
		{correlations.ElenbaasChannel(), small, small / 24},
		{correlations.BarCohenChannel(), large, 0.59 * 1e3},
		{correlations.BarCohenChannelOneSide(), large, 0.59 * 1e3},
	} {
		got := nu(t, tt.c, groups{Ra: 4 * tt.el, FluxRa: 4 * tt.el, Slenderness: 4})
		if math.Abs(got/tt.want-1) > 1e-3 {
			t.Errorf("%s at El %g: %v, want %v", tt.c.Name(), tt.el, got, tt.want)
		}
	}
}

// The factors of the rows of a bank, as printed by Zukauskas (from memory).
func TestRowsOfBank(t *testing.T) {
	rows := []float64{1, 2, 3, 4, 5, 7, 10, 13, 16, 20, 100}
	for _, tt := range []struct {
		c    correlations.Correlation
		want []float64
	}{
		{correlations.ZukauskasBankAligned(), []float64{0.70, 0.80, 0.86, 0.90, 0.92, 0.95, 0.97, 0.98, 0.99, 1, 1}},
		{correlations.ZukauskasBankStaggered(), []float64{0.64, 0.76, 0.84, 0.89, 0.92, 0.95, 0.97, 0.98, 0.99, 1, 1}},
	} {
		g := groups{Re: 1e4, Pr: 0.7, PrandtlRatio: 1, PitchRatio: 1, Rows: 20}
		deep := nu(t, tt.c, g)
		last := 0.0
		for i, n := range rows {
			g.Rows = n
			if got := nu(t, tt.c, g) / deep; math.Abs(got-tt.want[i]) > 1e-14 {
				t.Errorf("%s, %g rows: %v, want %v", tt.c.Name(), n, got, tt.want[i])
			}
			g.Rows = n + 0.5
			if got := nu(t, tt.c, g); got < last {
				t.Errorf("%s: fewer with %g rows", tt.c.Name(), n+0.5)
			} else {
				last = got
			}
		}
	}
}

// The onset of motion in a layer heated from below is at Ra 1708, from theory; steeper layers start later.
func TestOnsetInLayer(t *testing.T) {
	layer := correlations.HollandsLayer()
	for _, tt := range []struct{ ra, tilt, low, high float64 }{
		{1707, 0, 1, 1},
		{1800, 0, 1.01, 1.2},
		{1708 * 1.9, 60, 1, 1},
		{1708 * 2.1, 60, 1.0001, 1.2},
	} {
		got := nu(t, layer, groups{Ra: tt.ra, Pr: 0.7, Slenderness: 20, Inclination: units.Degree.Of(tt.tilt)})
		if got < tt.low || got > tt.high {
			t.Errorf("Ra %g at %g°: %v, want %v to %v", tt.ra, tt.tilt, got, tt.low, tt.high)
		}
	}
}

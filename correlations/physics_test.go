package correlations_test

import (
	"errors"
	"math"
	"math/rand/v2"
	"slices"
	"strings"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

type groups = correlations.Groups

func nu(t *testing.T, c correlations.Correlation, g groups) float64 {
	t.Helper()
	r, err := c.Extrapolate(g)
	if err != nil {
		t.Fatalf("%s at %+v: %v", c.Name(), g, err)
	}
	return r.Nu
}

// Numbers at rest: 2 for a sphere is exact (Tosun, Modelling in Transport Phenomena, p. 82, eq. 4.3-28), as is
// 1 for a layer and 0 for a plate or cylinder without end. The formulas that tend to another number are named.
// Every formula is there at rest, and tends to it as the flow ceases.
func TestConductionLimit(t *testing.T) {
	byBody := map[string]float64{
		"sphere": 2, "packed bed": 2, "tube": 3.66, "cylinder in cross-flow": 0, "plate in a stream": 0,
		"plate in a stream, unheated start": 0, "plate in a stream, uniform flux": 0,
		"enclosure between vertical walls": 1, "layer heated from below": 1, "horizontal annulus": 1, "spherical shell": 1,
		"vertical channel": 0, "vertical channel, one wall adiabatic": 0, "vertical channel, uniform flux": 0,
		"vertical channel, one wall insulated, uniform flux": 0, "rotating disk": 0,
	}
	byName := map[string]float64{
		"Churchill and Chu horizontal cylinder, natural":          0.36,
		"Churchill and Chu horizontal cylinder, natural, laminar": 0.36,
		"Churchill and Bernstein cylinder, forced":                0.3,
		"Churchill and Chu vertical plate, natural":               0.825 * 0.825,
		"Churchill and Chu vertical plate, natural, laminar":      0.68,
		"Churchill and Chu vertical plate, natural, uniform flux": 0.825 * 0.825,
		"Churchill and Chu inclined plate, natural, laminar":      0.68,
		"tube, laminar, developed":                                3.656793458,
		"tube, laminar, developed, uniform flux":                  48.0 / 11,
		"Gunn packed or fluidised bed":                            7 - 10*0.4 + 5*0.4*0.4,
		"Gnielinski packed bed":                                   2 * (1 + 1.5*0.6),
		"Yovanovich convex body, natural":                         3.4,
		"Yovanovich and Vanoverbeke convex body, forced":          3.4,
	}
	atRest := 0
	for c := range correlations.All() {
		g := correlations.Middle(c)
		g.Pr, g.VoidFraction, g.BodyNu, g.Slenderness = 0.7, 0.4, 3.4, 0
		g.Re, g.Ra, g.FluxRa = 0, 0, 0
		r, err := c.Nu(g)
		var out *units.RangeError
		if errors.As(err, &out) {
			continue // it has no limit at rest
		}
		if c.Regime() == correlations.Boiling || c.Regime() == correlations.Condensing {
			continue // a film is never at rest
		}
		atRest++
		want, named := byName[c.Name()]
		if !named {
			var known bool
			if want, known = byBody[c.Body()]; !known {
				t.Errorf("%s: %v at rest, which no list has", c.Name(), r)
			}
		}
		if err != nil || math.Abs(r.Nu-want) > 1e-14*want || r.Extrapolated {
			t.Errorf("%s at rest: %+v, %v, want Nu %g", c.Name(), r, err, want)
		}
		g.Slenderness, g.TransitionRe = 20, 5e5
		last := math.Inf(1)
		for x := 1e-4; x > 1e-30; x /= 100 {
			g.Re, g.Ra, g.FluxRa = x, x, x
			excess := nu(t, c, g) - want
			if !(excess >= -1e-14*want && excess <= last+1e-14*want) {
				t.Errorf("%s: Nu − %g = %g at Re = Ra = %g, was %g", c.Name(), want, excess, x, last)
			}
			last = excess
		}
		// The slowest are Re^0.2 of Gunn, and the logarithm of Nakai and Okazaki: 1/35 at Re 1e-30.
		if limit := 1e-3; last > limit && !(strings.HasPrefix(c.Name(), "Nakai") && last < 0.031) && !strings.HasPrefix(c.Name(), "Churchill and Chu") {
			t.Errorf("%s tends to %g + %g", c.Name(), want, last)
		}
	}
	if atRest < 50 {
		t.Errorf("%d correlations have a limit at rest", atRest)
	}
}

// The exponents of the published formulas, as slopes of log(Nu − 2).
func TestSlopes(t *testing.T) {
	slope := func(c correlations.Correlation, lo, hi groups, ratio float64) float64 {
		return math.Log((nu(t, c, hi)-2)/(nu(t, c, lo)-2)) / math.Log(ratio)
	}
	churchill, ranz, whitaker := correlations.ChurchillSphere(), correlations.RanzMarshallSphere(), correlations.WhitakerSphere()
	for _, tt := range []struct {
		name           string
		got, want, tol float64
	}{
		{"Churchill, Ra^(1/4): laminar boundary layer", slope(churchill, groups{Ra: 1e4, Pr: 0.7}, groups{Ra: 1e8, Pr: 0.7}, 1e4), 0.25, 1e-12},
		{"Churchill, Pr → ∞: no influence of Pr", slope(churchill, groups{Ra: 1e6, Pr: 1e12}, groups{Ra: 1e6, Pr: 1e14}, 100), 0, 1e-6},
		{"Churchill, Pr → 0: Ra Pr alone counts", slope(churchill, groups{Ra: 1e6, Pr: 1e-14}, groups{Ra: 1e6, Pr: 1e-12}, 100), 0.25, 1e-6},
		{"Ranz and Marshall, Re^(1/2)", slope(ranz, groups{Re: 2, Pr: 0.7}, groups{Re: 200, Pr: 0.7}, 100), 0.5, 1e-12},
		{"Ranz and Marshall, Pr^(1/3)", slope(ranz, groups{Re: 50, Pr: 0.6}, groups{Re: 50, Pr: 2.4}, 4), 1.0 / 3, 1e-12},
		{"Whitaker, small Re: laminar Re^(1/2)", slope(whitaker, groups{Re: 1e-18, Pr: 1e6, ViscosityRatio: 1}, groups{Re: 1e-16, Pr: 1e6, ViscosityRatio: 1}, 100), 0.5, 1e-3},
		{"Whitaker, large Re: wake Re^(2/3)", slope(whitaker, groups{Re: 1e20, Pr: 1, ViscosityRatio: 1}, groups{Re: 1e22, Pr: 1, ViscosityRatio: 1}, 100), 2.0 / 3, 1e-3},
		{"Whitaker, Pr^0.4", slope(whitaker, groups{Re: 100, Pr: 1, ViscosityRatio: 1}, groups{Re: 100, Pr: 300, ViscosityRatio: 1}, 300), 0.4, 1e-12},
		{"Whitaker, viscosity ratio^(1/4)", slope(whitaker, groups{Re: 100, Pr: 7, ViscosityRatio: 1}, groups{Re: 100, Pr: 7, ViscosityRatio: 3}, 3), 0.25, 1e-12},
	} {
		if !(math.Abs(tt.got-tt.want) <= tt.tol) {
			t.Errorf("%s: slope %.6g, want %.6g ± %g", tt.name, tt.got, tt.want, tt.tol)
		}
	}
}

// More flow takes more heat: Nu rises with what drives it, within each branch of a formula.
func TestMonotone(t *testing.T) {
	// Where branches with a jump meet, in the driver of the correlation.
	branches := map[string][]float64{
		"Clift, Grace and Weber sphere, forced":                               {100, 2000},
		"Morgan horizontal cylinder, natural":                                 {1e-2, 1e2, 1e4, 1e7},
		"Hilpert cylinder, forced":                                            {4, 40, 4000, 40000},
		"Morgan cylinder, forced":                                             {4e-3, 9e-2, 1, 35, 5000, 5e4},
		"Zukauskas cylinder, forced":                                          {40, 1000, 2e5},
		"Collis and Williams wire, forced":                                    {44},
		"Jakob hexagonal cylinder, face on":                                   {1.95e4},
		"McAdams vertical plate, natural":                                     {1e9},
		"Goldstein, Sparrow and Jones horizontal plate, natural, hot face up": {200},
		"Zukauskas tube bank, aligned":                                        {100, 1000, 2e5},
		"Zukauskas tube bank, staggered":                                      {100, 1000, 2e5},
		"Kreith rotating sphere":                                              {5e4},
	}
	// The coefficient falls as a film of condensate grows.
	falls := map[string]bool{"wavy film on a vertical plate, condensation": true, "turbulent film on a vertical plate, condensation": true}
	random := rand.New(rand.NewPCG(5, 6))
	for c := range correlations.All() {
		if falls[c.Name()] || c.Regime() == correlations.Conduction {
			continue
		}
		constant := strings.HasPrefix(c.Name(), "tube, laminar, developed")
		for range 300 {
			g, _ := correlations.Random(c, random)
			more := g
			factor := math.Pow(10, 2*random.Float64()*random.Float64())
			from, to := g.Re, g.Re*factor
			more.Re *= factor
			if c.Regime() == correlations.Natural || c.Regime() == correlations.Boiling || c.Regime() == correlations.Condensing {
				from, to = g.Ra, g.Ra*factor
				more = g
				more.Ra, more.FluxRa, more.FilmRa = g.Ra*factor, g.FluxRa*factor, g.FilmRa*factor
			}
			if !c.Admits(more) || slices.ContainsFunc(branches[c.Name()], func(at float64) bool { return from < at && to >= at }) {
				continue
			}
			a, b := nu(t, c, g), nu(t, c, more)
			if b < a*(1-1e-14) || b <= a && factor > 1.01 && !constant && a > 1.0001 && a != 2 && a != 3.66 {
				t.Errorf("%s: Nu %v at %+v, %v at %g times the flow", c.Name(), a, g, b, factor)
			}
		}
	}
}

// Nu rises with Pr, and falls where a liquid is cooled.
func TestMonotoneInProperties(t *testing.T) {
	// Not in Pr: Yuge's number is on Gr, the exponent of Zukauskas changes at Pr 10, a curved boundary layer and
	// one in the entry of a tube are thinner at large Pr.
	except := []string{"Yuge sphere, natural", "Zukauskas cylinder, forced", "Popiel vertical cylinder, natural", "Le Fevre and Ede vertical cylinder, natural", "Baehr and Stephan tube, laminar, entry"}
	random := rand.New(rand.NewPCG(7, 8))
	for c := range correlations.All() {
		for range 100 {
			g, _ := correlations.Random(c, random)
			base := nu(t, c, g)
			more := [...]groups{g, g, g}
			if !slices.Contains(except, c.Name()) {
				more[0].Pr *= 1.3
			}
			more[1].ViscosityRatio *= 1.3
			more[2].PrandtlRatio *= 1.3
			for i, what := range []string{"Pr", "viscosity ratio", "Prandtl ratio"} {
				if got := nu(t, c, more[i]); got < base*(1-1e-14) {
					t.Errorf("%s: Nu %v at %+v, %v at 1.3 times the %s", c.Name(), base, g, got, what)
				}
			}
		}
	}
}

// Where both forced correlations hold they agree within their joint scatter.
func TestForcedCorrelationsAgree(t *testing.T) {
	ranz, whitaker := correlations.RanzMarshallSphere(), correlations.WhitakerSphere()
	worst := 0.0
	for re := 3.5; re <= 200; re *= 1.1 {
		for _, pr := range []float64{0.7, 1, 2.7} {
			g := groups{Re: re, Pr: pr, ViscosityRatio: 1}
			a, errA := ranz.Nu(g)
			b, errB := whitaker.Nu(g)
			if errA != nil || errB != nil {
				t.Fatal(errA, errB)
			}
			if a.Nu*(1-a.Scatter) > b.Nu*(1+b.Scatter) || b.Nu*(1-b.Scatter) > a.Nu*(1+a.Scatter) {
				t.Errorf("Re %g, Pr %g: %g ± %g and %g ± %g do not meet", re, pr, a.Nu, a.Scatter, b.Nu, b.Scatter)
			}
			worst = max(worst, math.Abs(a.Nu/b.Nu-1))
		}
	}
	t.Logf("largest difference of Ranz and Marshall from Whitaker: %.1f %%", 100*worst)
}

// Formulas of other authors at Re 1e4, Pr 0.7, from memory but for the first, whose abstract was read.
// Five lie within Whitaker's ±30 %. Two lie above: Gnielinski's expects the turbulence of a wind tunnel,
// and McAdams's is for gases alone, without a conduction limit. They are evaluated here, so that the
// figures are not ours.
func TestSpreadOfMethods(t *testing.T) {
	const re, pr = 1e4, 0.7
	r, err := correlations.WhitakerSphere().Nu(groups{Re: re, Pr: pr, ViscosityRatio: 1})
	if err != nil {
		t.Fatal(err)
	}
	laminar := 0.664 * math.Sqrt(re) * math.Cbrt(pr)
	turbulent := 0.037 * math.Pow(re, 0.8) * pr / (1 + 2.443*math.Pow(re, -0.1)*(math.Pow(pr, 2.0/3)-1))
	pe := re * pr
	for _, tt := range []struct {
		nu     float64
		within bool
		source string
	}{
		{2 + 0.47*math.Sqrt(re)*math.Pow(pr, 0.36), true, "Melissari and Argyropoulos 2005, Int. J. Heat Mass Transfer 48, 4362"},
		{2 + 0.6*math.Sqrt(re)*math.Cbrt(pr), true, "Ranz and Marshall 1952, stretched"},
		{2 + 0.300*math.Pow(re, 0.5664), true, "Yuge 1960, J. Heat Transfer 82, 214"},
		{2 + math.Sqrt(re/4+3e-4*math.Pow(re, 1.6)), true, "Achenbach 1978, 6th Int. Heat Transfer Conf. 5, 341"},
		{1 + (0.44*math.Sqrt(re)+0.034*math.Pow(re, 0.71))*math.Cbrt(pr)*math.Cbrt(1+1/pe), true, "Clift, Grace and Weber 1978, Bubbles, Drops and Particles, ch. 5"},
		{2 + math.Hypot(laminar, turbulent), false, "Gnielinski 1975, Forsch. Ing.-Wes. 41, 145"},
		{0.37 * math.Pow(re, 0.6), false, "McAdams 1954, Heat Transmission, 3rd ed."},
	} {
		if got := math.Abs(tt.nu/r.Nu-1) <= r.Scatter; got != tt.within {
			t.Errorf("%.1f of %s against %.1f ± %.0f %%: within is %v", tt.nu, tt.source, r.Nu, 100*r.Scatter, got)
		}
	}
}

// Natural convection: the other formulas for a sphere, from memory, within ±15 % of Churchill's.
func TestSpreadOfNaturalMethods(t *testing.T) {
	for _, tt := range []struct {
		ra, pr, nu float64
		source     string
	}{
		{1e3, 0.72, 2 + 0.392*math.Pow(1e3/0.72, 0.25), "Yuge 1960, J. Heat Transfer 82, 214, air"},
		{7.2e4, 0.72, 2 + 0.392*math.Pow(1e5, 0.25), "Yuge 1960, air, upper end"},
		{1e6, 6, 2 + 0.50*math.Pow(1e6, 0.25), "Amato and Tien 1972, Int. J. Heat Mass Transfer 15, 327, water"},
		{8e8, 6, 2 + 0.50*math.Pow(8e8, 0.25), "Amato and Tien 1972, water, upper end"},
		{1e6, 0.71, 16.2992207049, "Raithby and Hollands 1975, Adv. Heat Transfer 11, 265, laminar part, computed"},
		{1e8, 6, 55.4481030365, "Raithby and Hollands 1975, laminar part, computed"},
	} {
		r, err := correlations.ChurchillSphere().Nu(groups{Ra: tt.ra, Pr: tt.pr})
		if err != nil || !(math.Abs(tt.nu/r.Nu-1) <= r.Scatter) {
			t.Errorf("Ra %g, Pr %g: %v, %v, against %.2f (%s)", tt.ra, tt.pr, r, err, tt.nu, tt.source)
		}
	}
}

func TestMixIsEitherWhereTheOtherVanishes(t *testing.T) {
	some := correlations.Result{Nu: 9, Scatter: 0.3}
	rest := correlations.Result{Nu: 2, Scatter: 0.15}
	for _, tt := range []struct {
		forced, natural correlations.Result
		want            correlations.Mixture
	}{
		{some, rest, correlations.Mixture{Nu: 9, Scatter: 0.3, Forced: 1}},
		{rest, some, correlations.Mixture{Nu: 9, Scatter: 0.3, Natural: 1}},
		{some, some, correlations.Mixture{Nu: 2 + 7*math.Cbrt(2), Scatter: 0.3, Forced: 0.5, Natural: 0.5}},
		{rest, rest, correlations.Mixture{Nu: 2, Scatter: 0.15, Natural: 1}},
	} {
		got, err := correlations.Mix(tt.forced, tt.natural)
		if err != nil || math.Abs(got.Nu-tt.want.Nu) > 1e-14*tt.want.Nu {
			t.Errorf("Mix(%v, %v) = %+v, %v, want %+v", tt.forced, tt.natural, got, err, tt.want)
		}
		got.Nu = tt.want.Nu
		if got != tt.want {
			t.Errorf("Mix(%v, %v) = %+v, want %+v", tt.forced, tt.natural, got, tt.want)
		}
	}
}

// The blend lies between the larger of the two and their sum, is symmetric, and its shares are the
// sensitivities of Nu − 2.
func TestMixProperties(t *testing.T) {
	random := rand.New(rand.NewPCG(1, 2))
	for range 500 {
		f, n := math.Exp(12*random.Float64()-4), math.Exp(12*random.Float64()-4)
		a, err := correlations.Mix(correlations.Result{Nu: 2 + f}, correlations.Result{Nu: 2 + n})
		b, err2 := correlations.Mix(correlations.Result{Nu: 2 + n}, correlations.Result{Nu: 2 + f})
		if err != nil || err2 != nil {
			t.Fatal(err, err2)
		}
		if excess := a.Nu - 2; excess < max(f, n)*(1-1e-12) || excess > f+n || math.Abs(a.Nu-b.Nu) > 1e-12*a.Nu || math.Abs(a.Forced+a.Natural-1) > 1e-12 {
			t.Errorf("Mix of %g and %g: %+v and %+v", f, n, a, b)
		}
		const d = 1e-4
		up, _ := correlations.Mix(correlations.Result{Nu: 2 + f*(1+d)}, correlations.Result{Nu: 2 + n})
		down, _ := correlations.Mix(correlations.Result{Nu: 2 + f*(1-d)}, correlations.Result{Nu: 2 + n})
		if sensitivity := (up.Nu - down.Nu) / (2 * d * (a.Nu - 2)); math.Abs(sensitivity-a.Forced) > 1e-6 {
			t.Errorf("Mix of %g and %g: sensitivity %g, share %g", f, n, sensitivity, a.Forced)
		}
	}
}

// A stream against the buoyant flow: |F³ − N³|, with a scatter that is propagated through the difference, to 0.9 at most. It is either one
// where the other vanishes, is symmetric, and falls to the number at rest where both are equal.
func TestOpposedMix(t *testing.T) {
	b := correlations.Blend{Exponent: 3, Rest: 2, Opposed: true}
	random := rand.New(rand.NewPCG(9, 10))
	for range 500 {
		f, n := math.Exp(6*random.Float64()-2), math.Exp(6*random.Float64()-2)
		forced, natural := correlations.Result{Nu: 2 + f, Scatter: 0.3}, correlations.Result{Nu: 2 + n, Scatter: 0.15}
		m, err := b.Mix(forced, natural)
		other, err2 := b.Mix(natural, forced)
		if err != nil || err2 != nil {
			t.Fatal(err, err2)
		}
		fp, np := f*f*f, n*n*n
		want := 2 + math.Cbrt(math.Abs(fp-np))
		mean := (0.3*fp + 0.15*np) / (fp + np)
		scatter := max(mean, min(0.9, (0.3*fp+0.15*np)/math.Abs(fp-np)))
		if math.Abs(m.Nu-want) > 1e-9*want || math.Abs(m.Nu-other.Nu) > 1e-12*want || math.Abs(m.Scatter-scatter) > 1e-9 || math.Abs(m.Forced+m.Natural-1) > 1e-12 {
			t.Errorf("Mix of %g against %g: %+v, want Nu %g, scatter %g", f, n, m, want, scatter)
		}
		if m.Nu > 2+max(f, n)*(1+1e-12) {
			t.Errorf("Mix of %g against %g: %+v is above both", f, n, m)
		}
	}
	some, rest := correlations.Result{Nu: 9, Scatter: 0.3}, correlations.Result{Nu: 2, Scatter: 0.15}
	for _, tt := range []struct {
		forced, natural correlations.Result
		want            correlations.Mixture
	}{
		{some, rest, correlations.Mixture{Nu: 9, Scatter: 0.3, Forced: 1}},
		{rest, some, correlations.Mixture{Nu: 9, Scatter: 0.3, Natural: 1}},
		{some, some, correlations.Mixture{Nu: 2, Scatter: 0.9, Forced: 0.5, Natural: 0.5}},
	} {
		if got, err := b.Mix(tt.forced, tt.natural); err != nil || got != tt.want {
			t.Errorf("Mix(%v, %v) = %+v, %v, want %+v", tt.forced, tt.natural, got, err, tt.want)
		}
	}
}

package correlations

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/units"
)

// A printed limit admits what rounds to it: half a unit in its last digit.
func TestLimitIsAsPreciseAsItsDigits(t *testing.T) {
	for _, tt := range []struct {
		printed         string
		value, low, top float64
	}{
		{"0.7", 0.7, 0.65, 0.75},
		{"0.71", 0.71, 0.705, 0.715},
		{"2", 2, 1.5, 2.5},
		{"1.0", 1, 0.95, 1.05},
		{"3.2", 3.2, 3.15, 3.25},
		{"200", 200, 199.5, 200.5},
		{"380", 380, 379.5, 380.5},
		{"7.6e4", 76000, 75500, 76500},
		{"1e11", 1e11, 0.5e11, 1.5e11},
		{"5.7e-3", 5.7e-3, 5.65e-3, 5.75e-3},
		{"0", 0, 0, 0},
		{open, math.Inf(1), math.Inf(1), math.Inf(1)},
	} {
		l := limit(tt.printed)
		if l.value != tt.value || l.low != tt.low || l.high != tt.top || l.String() != tt.printed || l.Value() != tt.value {
			t.Errorf("limit(%q) = %+v, want %v, admitting %v to %v", tt.printed, l, tt.value, tt.low, tt.top)
		}
	}
	if r := within(Reynolds, "no", "number"); r.Admits(1) || r.Admits(0) || r.Admits(math.NaN()) {
		t.Error("a limit that is no number admits something")
	}
}

// Both sides of both ends of every range of every correlation.
func TestBoundaries(t *testing.T) {
	boxes := 0
	for c := range All() {
		for r := range c.Ranges() {
			boxes++
			for _, end := range []struct {
				at      float64
				outward float64
			}{{r.Min.low, math.Inf(-1)}, {r.Max.high, math.Inf(1)}} {
				if end.at == 0 || math.IsInf(end.at, 0) {
					continue // no other side: groups are finite and not negative
				}
				g := inRange(c)
				set(&g, r.Group, end.at)
				if res, err := c.Nu(g); err != nil || res.Extrapolated || !c.Admits(g) {
					t.Errorf("%s at %s %v: %v, %v", c.Name(), r.Group, end.at, res, err)
				}
				beyond := math.Nextafter(end.at, end.outward)
				set(&g, r.Group, beyond)
				var out *units.RangeError
				res, err := c.Nu(g)
				if !errors.As(err, &out) || c.Admits(g) {
					t.Errorf("%s at %s %v: %v, %v, want a range error", c.Name(), r.Group, beyond, res, err)
					continue
				}
				if out.Model != c.Name() || out.Quantity != r.Group.String() || out.Value.SI() != beyond ||
					out.Min.SI() != r.Min.value || out.Max.SI() != r.Max.value || out.Source != c.Citation() {
					t.Errorf("%s at %s %v: error fields %+v", c.Name(), r.Group, beyond, out)
				}
				if res, err := c.Extrapolate(g); err != nil || !res.Extrapolated {
					t.Errorf("%s at %s %v: Extrapolate gives %v, %v", c.Name(), r.Group, beyond, res, err)
				}
			}
		}
	}
	if boxes != 7 {
		t.Errorf("%d ranges, want 7: two of Churchill, two of Ranz and Marshall, three of Whitaker", boxes)
	}
}

// inRange returns groups in the middle of every range of c.
func inRange(c Correlation) Groups {
	g := Groups{Re: 100, Pr: 0.7, Ra: 1e6, ViscosityRatio: 1}
	for r := range c.Ranges() {
		if math.IsInf(r.Max.value, 1) {
			set(&g, r.Group, 2*r.Min.value)
		} else {
			set(&g, r.Group, (r.Min.value+r.Max.value)/2)
		}
	}
	return g
}

func set(g *Groups, group Group, x float64) {
	switch group {
	case Reynolds:
		g.Re = x
	case Prandtl:
		g.Pr = x
	case Rayleigh:
		g.Ra = x
	case ViscosityRatio:
		g.ViscosityRatio = x
	}
}

// Air from 0 to 300 °C is in range of everything that was measured in air.
func TestAirIsInRange(t *testing.T) {
	for _, tt := range []struct {
		pr     float64
		source string
	}{
		{0.7096, "0 °C; Lemmon et al. 2000, Lemmon and Jacobsen 2004, ideal-gas density, computed"},
		{0.7063, "25 °C; the same"},
		{0.6998, "100 °C; the same"},
		{0.6976, "177 °C, the least; the same"},
		{0.7013, "300 °C; the same"},
		{0.707, "300 K; Incropera and DeWitt, Table A.4, from memory"},
		{0.683, "550 K, the least; Incropera and DeWitt, Table A.4, from memory"},
	} {
		for c := range All() {
			g := inRange(c)
			g.Pr, g.ViscosityRatio = tt.pr, 1
			if _, err := c.Nu(g); err != nil {
				t.Errorf("air, Pr %g (%s): %v", tt.pr, tt.source, err)
			}
		}
	}
}

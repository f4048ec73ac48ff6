package correlations

import (
	"errors"
	"math"
	"math/rand/v2"
	"strings"
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
		{"1.95e4", 19500, 19450, 19550},
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

// Both sides of both ends of every range of every correlation, at several places of each side of its box.
func TestBoundaries(t *testing.T) {
	for seed := range uint64(4) {
		testBoundaries(t, seed)
	}
}

func testBoundaries(t *testing.T, seed uint64) {
	t.Helper()
	for c := range All() {
		for r := range c.Ranges() {
			for _, end := range []struct {
				limit       Limit
				at, outward float64
			}{{r.Min, r.Min.low, math.Inf(-1)}, {r.Max, r.Max.high, math.Inf(1)}} {
				if end.at == 0 || math.IsInf(end.at, 0) {
					continue // no other side: groups are finite and not negative
				}
				if r.Group >= fieldCount && end.at == math.SmallestNonzeroFloat64 {
					continue // follows from its factors
				}
				in, beyond := end.at, math.Nextafter(end.at, end.outward)
				if r.Group >= fieldCount || r.Group == Inclination {
					// A product and an angle are not set to the last bit.
					in, beyond = end.at*(1-1e-12*sign(end.outward)), end.at*(1+1e-12*sign(end.outward))
				}
				if end.at > math.SmallestNonzeroFloat64 {
					g, ok := sampleBy(c, r.Group, in, seed)
					if res, err := c.Nu(g); !ok || err != nil || res.Extrapolated || !c.Admits(g) {
						t.Errorf("%s at %s %v: %v, %v, %+v", c.Name(), r.Group, in, res, err, g)
					}
				}
				g, ok := sampleBy(c, r.Group, beyond, seed)
				if beyond == 0 {
					// 0 is refused as it is, though a product with it may be out of its range too. The text does not
					// say that the range begins at 0.
					g := middle(c)
					set(&g, r.Group, 0)
					var out *units.RangeError
					_, err := c.Nu(g)
					if c.Admits(g) || !errors.As(err, &out) {
						t.Errorf("%s at %s 0: %v", c.Name(), r.Group, err)
					} else if out.Quantity == r.Group.String() && (!out.Above || !strings.Contains(out.Error(), "above 0")) {
						t.Errorf("%s at %s 0: %v", c.Name(), r.Group, err)
					}
					continue
				}
				var out *units.RangeError
				res, err := c.Nu(g)
				if !ok || !errors.As(err, &out) || c.Admits(g) {
					t.Errorf("%s at %s %v: %v, %v, want a range error, %+v", c.Name(), r.Group, beyond, res, err, g)
					continue
				}
				scale := 1.0
				if r.Group == Inclination {
					scale = math.Pi / 180
				}
				if out.Model != c.Name() || out.Quantity != r.Group.String() || !near(out.Value.SI(), beyond*scale) ||
					!near(out.Min.SI(), r.Min.value*scale) || !near(out.Max.SI(), r.Max.value*scale) || out.Source != c.Citation() ||
					out.Above != (r.Min.low > r.Min.value) || out.Below != (r.Max.high < r.Max.value) || !strings.Contains(out.Error(), c.Citation()) {
					t.Errorf("%s at %s %v: error fields %+v", c.Name(), r.Group, beyond, out)
				}
				var none *units.ArgumentError
				if res, err := c.Extrapolate(g); (err != nil || !res.Extrapolated) && !errors.As(err, &none) {
					t.Errorf("%s at %s %v: Extrapolate gives %v, %v", c.Name(), r.Group, beyond, res, err)
				}
			}
		}
	}
}

func sign(x float64) float64 { return math.Copysign(1, x) }

func near(a, b float64) bool { return a == b || math.Abs(a-b) <= 1e-14*math.Abs(b) }

// middle returns groups in every range of c.
func middle(c Correlation) Groups {
	g, _ := sample(c, groupCount, 0)
	return g
}

// sample returns groups that are in every range of c but that of the pinned group, which is x, and
// whether there are any. Where there are many it is always the same.
func sample(c Correlation, pin Group, x float64) (Groups, bool) { return sampleBy(c, pin, x, 1) }

// sampleBy is sample with one of many answers.
func sampleBy(c Correlation, pin Group, x float64, seed uint64) (Groups, bool) {
	random := rand.New(rand.NewPCG(seed, 2))
	for range 5000 {
		g := draw(c, random, pin, x)
		if admitsBut(c, &g, pin) && (pin >= groupCount || near(pin.of(&g), x) || x < 1e-300) {
			return g, true
		}
	}
	return Groups{}, false
}

// draw returns groups at random, each near the range that c has for it, and the pinned one at x.
func draw(c Correlation, random *rand.Rand, pin Group, x float64) Groups {
	g := Groups{
		Re: 100, Pr: 0.7, Ra: 1e6, FluxRa: 1e6, FilmRa: 1e8, ViscosityRatio: 1, PrandtlRatio: 1, TemperatureRatio: 1,
		TransitionRe: 5e5, TransitionRa: 1e8, Inclination: units.Degree.Of(30), Slenderness: 20, UnheatedStart: 0.5,
		Standoff: 6, Reach: 5, JetArea: 0.02, VoidFraction: 0.4, PitchRatio: 1, Rows: 20, BodyNu: 3.4, Gravity: 1, Perimeter: 1.7,
	}
	within := func(r Range) float64 {
		low, high := r.Min.value, r.Max.value
		if math.IsInf(high, 1) {
			high = 1000 * max(low, 1)
		}
		if low == 0 {
			low = 1e-4 * high
		}
		return low * math.Pow(high/low, 0.02+0.96*random.Float64())
	}
	for r := range c.Ranges() {
		if r.Group < fieldCount {
			set(&g, r.Group, within(r))
		}
	}
	if pin < fieldCount {
		set(&g, pin, x)
	}
	for r := range c.Ranges() {
		switch {
		case r.Group < fieldCount || r.Group == pin || r.Admits(r.Group.of(&g)):
		case r.Group == Peclet && (pin == Reynolds || pin != Prandtl && random.IntN(2) == 0):
			g.Pr = within(r) / g.Re
		default:
			set(&g, r.Group, within(r))
		}
	}
	if pin == Peclet && random.IntN(2) == 0 {
		g.Pr = x / g.Re
	} else if pin >= fieldCount {
		set(&g, pin, x)
	}
	return g
}

func admitsBut(c Correlation, g *Groups, pin Group) bool {
	for r := range c.Ranges() {
		if r.Group != pin && !r.Admits(r.Group.of(g)) {
			return false
		}
	}
	return true
}

// set gives group the number x, a product by one of its factors.
func set(g *Groups, group Group, x float64) bool {
	switch group {
	case Reynolds:
		g.Re = x
	case Prandtl:
		g.Pr = x
	case Rayleigh:
		g.Ra = x
	case ViscosityRatio:
		g.ViscosityRatio = x
	case FluxRayleigh:
		g.FluxRa = x
	case FilmRayleigh:
		g.FilmRa = x
	case PrandtlRatio:
		g.PrandtlRatio = x
	case TemperatureRatio:
		g.TemperatureRatio = x
	case TransitionReynolds:
		g.TransitionRe = x
	case TransitionRayleigh:
		g.TransitionRa = x
	case Inclination:
		g.Inclination = units.Degree.Of(x)
	case Slenderness:
		g.Slenderness = x
	case UnheatedStart:
		g.UnheatedStart = x
	case Standoff:
		g.Standoff = x
	case Reach:
		g.Reach = x
	case JetArea:
		g.JetArea = x
	case VoidFraction:
		g.VoidFraction = x
	case PitchRatio:
		g.PitchRatio = x
	case Rows:
		g.Rows = x
	case BodyNusselt:
		g.BodyNu = x
	case Gravity:
		g.Gravity = x
	case Perimeter:
		g.Perimeter = x
	case Grashof:
		g.Ra = x * g.Pr
	case Peclet:
		g.Re = x / g.Pr
	case ChannelRayleigh:
		g.Ra = x * g.Slenderness
	case ChannelFluxRayleigh:
		g.FluxRa = x * g.Slenderness
	case InclinedRayleigh:
		g.Ra = x / math.Cos(g.Inclination.SI())
	case ScaledRayleigh:
		g.Ra = x * (0.2 + g.Pr) / g.Pr
	case Richardson:
		g.Ra = x * g.Pr * g.Re * g.Re
	case Curvature:
		g.Slenderness = x * quarter(g.Ra/g.Pr) / math.Sqrt(32)
	case SlotArea:
		g.JetArea = x * g.bestSlots()
	}
	return true
}

// Every group that is set is the one that is read.
func TestGroupsAreRead(t *testing.T) {
	for group := range groupCount {
		if group == Roughness {
			continue
		}
		g := draw(Correlation{}, rand.New(rand.NewPCG(1, 2)), groupCount, 0)
		set(&g, group, 0.25)
		if got := group.of(&g); !near(got, 0.25) {
			t.Errorf("%s is %v, want 0.25", group, got)
		}
		if group.String() == "" {
			t.Errorf("group %d has no name", group)
		}
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
		in := 0
		for c := range All() {
			for r := range c.Ranges() {
				// That of a gas or wider, and not for liquids alone.
				if r.Group != Prandtl || r.Min.value == 0 || r.Min.value > 0.71 || r.Max.value < 0.7 {
					continue
				}
				in++
				if !r.Admits(tt.pr) {
					t.Errorf("%s does not admit air, Pr %g (%s)", c.Name(), tt.pr, tt.source)
				}
			}
		}
		if in < 50 {
			t.Errorf("%d correlations for gases", in)
		}
	}
}

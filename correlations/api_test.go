package correlations_test

import (
	"errors"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

func TestEveryCorrelationSaysWhatItIs(t *testing.T) {
	names := map[string]bool{}
	for c := range correlations.All() {
		if names[c.Name()] {
			t.Errorf("two correlations are named %q", c.Name())
		}
		names[c.Name()] = true
		if got, err := correlations.Lookup(c.Name()); err != nil || got != c {
			t.Errorf("Lookup(%q) = %v, %v", c.Name(), got.Name(), err)
		}
		for what, text := range map[string]string{
			"body": c.Body(), "formula": c.Formula(), "length": c.Length(), "citation": c.Citation(), "evidence": c.Evidence(),
			"scatter origin": c.Scatter().Origin,
		} {
			if text == "" {
				t.Errorf("%s has no %s", c.Name(), what)
			}
		}
		if strings.HasPrefix(c.Regime().String(), "no ") || strings.HasPrefix(c.Reference().String(), "no ") || strings.HasPrefix(c.Status().String(), "no ") {
			t.Errorf("%s: regime %s, reference %s, status %s", c.Name(), c.Regime(), c.Reference(), c.Status())
		}
		text := c.String()
		for _, part := range []string{c.Name(), c.Formula(), c.Length(), c.Citation(), c.Status().String(), c.Reference().String()} {
			if !strings.Contains(text, part) {
				t.Errorf("%s: String does not contain %q:\n%s", c.Name(), part, text)
			}
		}
		for r := range c.Ranges() {
			if !strings.Contains(text, r.String()) {
				t.Errorf("%s: String does not contain %q", c.Name(), r)
			}
		}
		if !strings.Contains(c.Source(), c.Citation()) {
			t.Errorf("source %q", c.Source())
		}
	}
	if len(names) != 143 {
		t.Errorf("%d correlations, want 143", len(names))
	}
	for range correlations.All() {
		break // a loop may stop early
	}
}

func TestUnknownNameListsTheKnown(t *testing.T) {
	_, err := correlations.Lookup("Smith cube")
	var bad *units.ArgumentError
	if !errors.As(err, &bad) || bad.Value != "Smith cube" || !strings.Contains(bad.Accepted, correlations.WhitakerSphere().Name()) {
		t.Errorf("error %v", err)
	}
}

func TestZeroCorrelationIsNone(t *testing.T) {
	var c correlations.Correlation
	g := groups{Re: 10, Pr: 0.7, ViscosityRatio: 1}
	for _, f := range []func(groups) (correlations.Result, error){c.Nu, c.Extrapolate} {
		var bad *units.ArgumentError
		if r, err := f(g); !errors.As(err, &bad) || r != (correlations.Result{}) {
			t.Errorf("the zero Correlation gives %v, %v", r, err)
		}
	}
	if c.Admits(g) || c.Name() != "no correlation" || c.String() != "no correlation" || c.Source() != "no correlation" || c.Regime().String() != "no regime" {
		t.Errorf("the zero Correlation is %v", c)
	}
	for r := range c.Ranges() {
		t.Errorf("the zero Correlation has a range %v", r)
	}
}

func TestBadGroups(t *testing.T) {
	for c := range correlations.All() {
		for _, x := range []float64{-1, math.NaN(), math.Inf(1), math.Inf(-1)} {
			for group := correlations.Reynolds; group <= correlations.Perimeter; group++ {
				g := correlations.Middle(c)
				correlations.Set(&g, group, x)
				for _, f := range []func(groups) (correlations.Result, error){c.Nu, c.Extrapolate} {
					var bad *units.ArgumentError
					if _, err := f(g); !errors.As(err, &bad) || bad.Field != group.String() {
						t.Errorf("%s with %s %v: %v", c.Name(), group, x, err)
					}
				}
				if c.Admits(g) {
					t.Errorf("%s admits %s %v", c.Name(), group, x)
				}
			}
		}
		g := correlations.Middle(c)
		want, err := c.Nu(g)
		if g.UnheatedStart = math.Copysign(0, -1); err == nil {
			same := correlations.Middle(c)
			same.UnheatedStart = 0
			want, err = c.Nu(same)
		}
		if got, err2 := c.Nu(g); err != nil || err2 != nil || got != want {
			t.Errorf("%s with a negative 0: %v, %v, %v", c.Name(), got, err, err2)
		}
	}
	for _, x := range []float64{1.9, -1, math.NaN(), math.Inf(1)} {
		for i, pair := range [][2]float64{{x, 3}, {3, x}} {
			var bad *units.ArgumentError
			if _, err := correlations.Mix(correlations.Result{Nu: pair[0]}, correlations.Result{Nu: pair[1]}); !errors.As(err, &bad) {
				t.Errorf("Mix with Nu %v at %d: %v", x, i, err)
			}
		}
	}
	huge := correlations.Result{Nu: math.MaxFloat64}
	var bad *units.ArgumentError
	if m, err := correlations.Mix(huge, huge); !errors.As(err, &bad) || m != (correlations.Mixture{}) {
		t.Errorf("Mix that overflows: %v, %v", m, err)
	}
}

func TestWordsOfNoValue(t *testing.T) {
	for _, tt := range []struct{ got, want string }{
		{correlations.Regime(99).String(), "no regime"},
		{correlations.Reference(99).String(), "no reference temperature"},
		{correlations.Status(99).String(), "no status"},
		{correlations.Group(99).String(), "unknown group"},
		{correlations.Mixed.String(), "mixed"},
		{correlations.Prandtl.String(), "Prandtl number"},
		{correlations.Kind(99).String(), "no number"},
		{correlations.Correlation{}.Kind().String(), "no number"},
		{correlations.Local.String(), "local Nusselt number"},
		{correlations.Condensing.String(), "condensing"},
		{correlations.Bulk.String(), "mean bulk temperature"},
	} {
		if tt.got != tt.want {
			t.Errorf("got %q, want %q", tt.got, tt.want)
		}
	}
}

func TestNuDoesNotAllocate(t *testing.T) {
	for c := range correlations.All() {
		g := correlations.Middle(c)
		if n := testing.AllocsPerRun(100, func() { _, _ = c.Nu(g) }); n != 0 {
			t.Errorf("%s: Nu allocates %v times", c.Name(), n)
		}
		if n := testing.AllocsPerRun(100, func() { _ = c.Admits(g) }); n != 0 {
			t.Errorf("%s: Admits allocates %v times", c.Name(), n)
		}
	}
}

func FuzzNu(f *testing.F) {
	f.Add(0.0, 0.0, 0.0, 0.0, 0.0, 0.0)
	f.Add(100.0, 0.7, 1e6, 1.0, 1.0, 0.5)
	f.Add(1e308, 1e-308, 1e308, 1e308, 1e-308, 1e308)
	f.Add(1e308, 1e308, 1e308, 1e308, 1e308, 1e308)
	f.Add(math.NaN(), math.Inf(1), -1.0, 5e-324, 5e-324, 0.0)
	f.Add(0.0, 1e308, 0.0, 5e-324, 0.0, 5e-324)
	f.Fuzz(func(t *testing.T, re, pr, ra, x, y, z float64) {
		g := groups{
			Re: re, Pr: pr, Ra: ra, FluxRa: ra, FilmRa: ra, ViscosityRatio: x, PrandtlRatio: y, TemperatureRatio: z,
			TransitionRe: x, TransitionRa: y, Inclination: units.Degree.Of(z), Slenderness: x, UnheatedStart: z,
			Standoff: x, Reach: y, JetArea: z, VoidFraction: z, PitchRatio: y, Rows: x, BodyNu: x, Gravity: y, Perimeter: z,
		}
		for c := range correlations.All() {
			for _, nu := range []func(groups) (correlations.Result, error){c.Nu, c.Extrapolate} {
				r, err := nu(g)
				var bad *units.ArgumentError
				var out *units.RangeError
				switch {
				case err == nil && !(r.Nu >= 0 && r.Nu <= math.MaxFloat64):
					t.Errorf("%s at %+v: %+v without an error", c.Name(), g, r)
				case err != nil && !errors.As(err, &bad) && !errors.As(err, &out):
					t.Errorf("%s at %+v: error of type %T", c.Name(), g, err)
				}
			}
			if _, err := c.Nu(g); (err == nil) != c.Admits(g) {
				if _, ex := c.Extrapolate(g); ex == nil { // an overflow is no matter of the range
					t.Errorf("%s at %+v: Admits %v, error %v", c.Name(), g, c.Admits(g), err)
				}
			}
		}
	})
}

// In its range a correlation gives a number, whatever the groups.
func TestEveryNumberInRange(t *testing.T) {
	random := rand.New(rand.NewPCG(3, 4))
	for c := range correlations.All() {
		for range 200 {
			g, ok := correlations.Random(c, random)
			r, err := c.Nu(g)
			if !ok || err != nil || !(r.Nu > 0 && r.Nu <= math.MaxFloat64) || r.Extrapolated || r.Scatter != c.Scatter().Relative {
				t.Errorf("%s at %+v: %v, %v", c.Name(), g, r, err)
			}
			if e, err := c.Extrapolate(g); err != nil || e != r {
				t.Errorf("%s at %+v: Extrapolate gives %v, %v", c.Name(), g, e, err)
			}
		}
	}
}

func TestForAndCompare(t *testing.T) {
	n := 0
	for c := range correlations.For("sphere", correlations.Forced) {
		n++
		if c.Body() != "sphere" || c.Regime() != correlations.Forced {
			t.Errorf("%s is for a %s, %s", c.Name(), c.Body(), c.Regime())
		}
	}
	if n != 14 {
		t.Errorf("%d for a sphere in a stream, want 14", n)
	}
	for c := range correlations.For("cube on a string", correlations.Forced) {
		t.Errorf("%s is for a cube on a string", c.Name())
	}
	g := groups{Re: 1e4, Pr: 0.7, ViscosityRatio: 1}
	seen := 0
	for c, r := range correlations.Compare(correlations.For("sphere", correlations.Forced), g) {
		seen++
		if want, err := c.Nu(g); err != nil || r != want {
			t.Errorf("Compare gives %v for %s, want %v, %v", r, c.Name(), want, err)
		}
	}
	if seen != 7 {
		t.Errorf("%d apply at Re 1e4, Pr 0.7, want 7", seen)
	}
	for range correlations.For("sphere", correlations.Forced) {
		break // loops may stop early
	}
	for range correlations.Compare(correlations.All(), g) {
		break
	}
}

// What is said to be read was read somewhere, and what is recalled does not name a page alone.
func TestStatusAndEvidence(t *testing.T) {
	for c := range correlations.All() {
		memory := strings.HasPrefix(c.Evidence(), "recalled") || strings.HasPrefix(c.Evidence(), "recomputed") || strings.Contains(c.Evidence(), "from memory")
		if c.Status() == correlations.FromMemory && !memory || c.Status() == correlations.ReadOnPage && strings.HasPrefix(c.Evidence(), "recalled") {
			t.Errorf("%s: %s, %s", c.Name(), c.Status(), c.Evidence())
		}
		if s := c.Scatter(); s.Relative == 0 != strings.HasPrefix(s.Origin, "exact") {
			t.Errorf("%s: scatter %+v", c.Name(), s)
		}
		if local := strings.HasSuffix(c.Name(), ", local"); local && c.Kind() != correlations.Local {
			t.Errorf("%s: kind %s", c.Name(), c.Kind())
		}
		if (c.Kind() == correlations.MeanSherwood) != strings.HasPrefix(c.Formula(), "Sh =") {
			t.Errorf("%s: kind %s of %s", c.Name(), c.Kind(), c.Formula())
		}
	}
}

func BenchmarkNu(b *testing.B) {
	for c := range correlations.All() {
		g := correlations.Middle(c)
		b.Run(c.Name(), func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				_, _ = c.Nu(g)
			}
		})
	}
}

// BenchmarkPlain is Whitaker's formula and that of Churchill and Chu written down with math.Pow, to compare with.
func BenchmarkPlain(b *testing.B) {
	re, pr, mu, ra := 100.0, 0.7, 1.2, 1e6
	var sum float64
	b.Run("Whitaker sphere", func(b *testing.B) {
		for b.Loop() {
			sum += 2 + (0.4*math.Pow(re, 0.5)+0.06*math.Pow(re, 2.0/3))*math.Pow(pr, 0.4)*math.Pow(mu, 0.25)
		}
	})
	b.Run("Churchill and Chu plate", func(b *testing.B) {
		for b.Loop() {
			sum += math.Pow(0.825+0.387*math.Pow(ra, 1.0/6)/math.Pow(1+math.Pow(0.492/pr, 9.0/16), 8.0/27), 2)
		}
	})
	if sum < 0 {
		b.Error(sum)
	}
}

package eigen

import (
	"math"
	"testing"
)

// Values from mpmath 1.3.0 with 40 digits: exp(x²) erfc(x); from 1e6 on two terms of its asymptotic series.
func TestErfcx(t *testing.T) {
	for _, c := range []struct{ x, want float64 }{
		{-0.2, 1.2726020284831957118},
		{0, 1.0},
		{0.1, 0.89645697996912664193},
		{0.5, 0.61569034419292587487},
		{1, 0.42758357615580700441},
		{2, 0.25539567631050574387},
		{3.5, 0.1552936556088942974},
		{5, 0.11070463773306862637},
		{8, 0.069985166200880927723},
		{10, 0.056140992743822585858},
		{11.5, 0.048876546895982276458},
		{11.999, 0.046858099197526281752},
		{12, 0.04685422101489376262},
		{12.001, 0.046850343471997564089},
		{15, 0.037529606388505765746},
		{27, 0.020881607990420940674},
		{100, 0.0056416137829894329036},
		{1e6, 5.6418958354747419216e-7},
		{1e200, 5.6418958354775628695e-201},
	} {
		// math.Erfc and math.Exp are good to about one unit in the last place each
		if got := erfcx(c.x); ulps(got, c.want) > 4 {
			t.Errorf("erfcx(%v) = %.17g, want %.17g within 4 ULP, off by %.1f", c.x, got, c.want, ulps(got, c.want))
		}
	}
}

// The two forms must meet where one takes over from the other; the derivative there is −0.0039, so
// neighbouring arguments do not show.
func TestErfcxJoin(t *testing.T) {
	below, above := erfcx(math.Nextafter(12, 0)), erfcx(12)
	if ulps(below, above) > 4 {
		t.Errorf("erfcx just below 12 is %.17g, at 12 %.17g, want 4 ULP at most between them", below, above)
	}
}

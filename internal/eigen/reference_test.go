package eigen

import (
	"math"
	"testing"

	"example.com/coolward/internal/table"
)

// readTable returns the rows of a table of testdata, whose header says where it comes from.
func readTable(t *testing.T, name string) [][]string {
	t.Helper()
	_, rows := table.Read(t, "testdata/"+name)
	return rows
}

// ulps returns how many units in the last place of want lie between got and want.
func ulps(got, want float64) float64 {
	return math.Abs(got-want) / (math.Nextafter(math.Abs(want), math.Inf(1)) - math.Abs(want))
}

// The reference has 22 digits. Two units in the last place are what the roots are specified to; the
// coefficients follow from a root by some ten roundings.
func TestRoots(t *testing.T) {
	for _, b := range bodies {
		var worstRoot, worstC, worstMean float64
		for _, row := range readTable(t, b.name+"_roots.csv") {
			bi, zeta, c, mean := table.Number(t, row[1]), table.Number(t, row[3]), table.Number(t, row[4]), table.Number(t, row[5])
			n := int(table.Number(t, row[2]))
			got := b.root(n, bi)
			gotC, _, gotMean := b.coefficients(bi, got)
			if n%2 == 0 {
				gotC = -gotC
			}
			if n <= b.terms {
				z, c, m := b.new(bi).Term(n)
				if z != got || ulps(c, gotC) > 8 || ulps(m, gotMean) > 8 {
					t.Errorf("%s, Bi %v, n %d: stored term %v %v %v, want %v %v %v", b.name, bi, n, z, c, m, got, gotC, gotMean)
				}
			}
			if d := ulps(got, zeta); d > 2 {
				t.Errorf("%s, Bi %v, n %d: root %.17g, want %.17g within 2 ULP, off by %.1f", b.name, bi, n, got, zeta, d)
			}
			if d := ulps(gotC, c); d > 8 {
				t.Errorf("%s, Bi %v, n %d: coefficient %.17g, want %.17g within 8 ULP, off by %.1f", b.name, bi, n, gotC, c, d)
			}
			if d := ulps(gotMean, mean); d > 8 {
				t.Errorf("%s, Bi %v, n %d: coefficient of the mean %.17g, want %.17g within 8 ULP, off by %.1f", b.name, bi, n, gotMean, mean, d)
			}
			worstRoot, worstC, worstMean = math.Max(worstRoot, ulps(got, zeta)), math.Max(worstC, ulps(gotC, c)), math.Max(worstMean, ulps(gotMean, mean))
		}
		t.Logf("%s, worst: root %.2f, coefficient %.2f, coefficient of the mean %.2f ULP", b.name, worstRoot, worstC, worstMean)
	}
}

func TestTheta(t *testing.T) {
	const tolerance = 1e-13
	for _, b := range bodies {
		worst, worstLoss := 0.0, 0.0
		for _, row := range readTable(t, b.name+"_theta.csv") {
			bi, fo, want, loss := table.Number(t, row[1]), table.Number(t, row[2]), table.Number(t, row[4]), table.Number(t, row[5])
			s := b.new(bi)
			got := s.Mean(fo)
			if row[3] != "avg" {
				got = s.At(table.Number(t, row[3]), fo)
			} else {
				d := math.Abs(s.Loss(fo)/loss - 1)
				worstLoss = math.Max(worstLoss, d)
				if d > 1e-13 {
					t.Errorf("%s, Bi %v, Fo %v: loss %.17g, want %.17g within %g relative", b.name, bi, fo, s.Loss(fo), loss, 1e-13)
				}
			}
			d := math.Abs(got - want)
			worst = math.Max(worst, d)
			if bound := s.ErrorBound(fo); !(d <= bound && bound <= 1e-14) {
				t.Errorf("%s, Bi %v, Fo %v, x %v: error %.2g, bound %.2g, which is to be above it and below 1e-14", b.name, bi, fo, row[3], d, bound)
			}
			if !(d <= tolerance) {
				t.Errorf("%s, Bi %v, Fo %v, x %v: θ %.17g, want %.17g within %g", b.name, bi, fo, row[3], got, want, tolerance)
			}
		}
		t.Logf("%s, worst: θ %.2g absolute, 1 − mean %.2g relative", b.name, worst, worstLoss)
	}
}

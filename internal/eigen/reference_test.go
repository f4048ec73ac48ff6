package eigen

import (
	"encoding/csv"
	"math"
	"os"
	"strconv"
	"testing"
)

// readTable returns the rows of a table of testdata, whose header says where it comes from.
func readTable(t *testing.T, name string) [][]string {
	t.Helper()
	f, err := os.Open("testdata/" + name)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	r := csv.NewReader(f)
	r.Comment = '#'
	rows, err := r.ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	return rows[1:]
}

func number(t *testing.T, s string) float64 {
	t.Helper()
	x, err := strconv.ParseFloat(s, 64)
	if err != nil {
		t.Fatal(err)
	}
	return x
}

// ulps returns how many units in the last place of want lie between got and want.
func ulps(got, want float64) float64 {
	return math.Abs(got-want) / (math.Nextafter(math.Abs(want), math.Inf(1)) - math.Abs(want))
}

// The reference has 22 digits. Two units in the last place are what the roots are specified to; the
// coefficients follow from a root by some ten roundings.
func TestSphereRoots(t *testing.T) {
	var worstRoot, worstC, worstMean float64
	for _, row := range readTable(t, "sphere_roots.csv") {
		bi, zeta, c, mean := number(t, row[1]), number(t, row[3]), number(t, row[4]), number(t, row[5])
		n := int(number(t, row[2]))
		got, square := sphereRoot(n, bi)
		gotC, _, gotMean := sphereCoefficients(bi, square)
		if n%2 == 0 {
			gotC = -gotC
		}
		if n <= Terms {
			z, c, m := NewSphere(bi).Term(n)
			if z != got || c != gotC || m != gotMean {
				t.Errorf("Bi %v, n %d: stored term %v %v %v, want %v %v %v", bi, n, z, c, m, got, gotC, gotMean)
			}
		}
		if d := ulps(got, zeta); d > 2 {
			t.Errorf("Bi %v, n %d: root %.17g, want %.17g within 2 ULP, off by %.1f", bi, n, got, zeta, d)
		}
		if d := ulps(gotC, c); d > 8 {
			t.Errorf("Bi %v, n %d: coefficient %.17g, want %.17g within 8 ULP, off by %.1f", bi, n, gotC, c, d)
		}
		if d := ulps(gotMean, mean); d > 8 {
			t.Errorf("Bi %v, n %d: coefficient of the mean %.17g, want %.17g within 8 ULP, off by %.1f", bi, n, gotMean, mean, d)
		}
		worstRoot, worstC, worstMean = math.Max(worstRoot, ulps(got, zeta)), math.Max(worstC, ulps(gotC, c)), math.Max(worstMean, ulps(gotMean, mean))
	}
	t.Logf("worst: root %.2f, coefficient %.2f, coefficient of the mean %.2f ULP", worstRoot, worstC, worstMean)
}

func TestSphereTheta(t *testing.T) {
	const tolerance = 1e-13
	worst, worstLoss := 0.0, 0.0
	for _, row := range readTable(t, "sphere_theta.csv") {
		bi, fo, want, loss := number(t, row[1]), number(t, row[2]), number(t, row[4]), number(t, row[5])
		s := NewSphere(bi)
		got := s.Mean(fo)
		if row[3] != "avg" {
			got = s.At(number(t, row[3]), fo)
		} else {
			d := math.Abs(s.Loss(fo)/loss - 1)
			worstLoss = math.Max(worstLoss, d)
			if d > 1e-13 {
				t.Errorf("Bi %v, Fo %v: loss %.17g, want %.17g within %g relative", bi, fo, s.Loss(fo), loss, 1e-13)
			}
		}
		d := math.Abs(got - want)
		worst = math.Max(worst, d)
		if !(d <= tolerance) {
			t.Errorf("Bi %v, Fo %v, x %v: θ %.17g, want %.17g within %g", bi, fo, row[3], got, want, tolerance)
		}
	}
	t.Logf("worst: θ %.2g absolute, 1 − mean %.2g relative", worst, worstLoss)
}

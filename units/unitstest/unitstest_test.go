package unitstest_test

import (
	"fmt"
	"math"
	"strings"
	"testing"
	"testing/quick"

	"github.com/google/go-cmp/cmp"
	"github.com/stretchr/testify/assert"

	"example.com/coolward/units"
	"example.com/coolward/units/unitstest"
)

// A printer shows what an assertion says when it fails.
type printer struct{ said []string }

func (*printer) Helper() {}

func (p *printer) Errorf(format string, args ...any) {
	p.said = append(p.said, fmt.Sprintf(format, args...))
}

// A test suite checks a cooling time and an end temperature. The printer stands for the *testing.T of a test.
func Example() {
	t := new(printer)
	unitstest.Within(t, units.Minute.Of(51.1), units.Minute.Of(50.7), units.Minute.Of(0.5))
	unitstest.TemperatureWithin(t, units.Celsius.Of(50), units.Celsius.Of(52), units.KelvinDifference.Of(0.5), "centre of the %v ball", units.Millimetre.Of(60))
	fmt.Println(strings.Join(t.said, "\n"))
	// Output:
	// centre of the 60 mm ball
	// got  52 °C
	// want 50 °C
	// the difference is +2 K, allowed are ±500 mK
}

// A structure with quantities is compared by go-cmp.
func ExampleAbsolute() {
	type reading struct {
		Place string
		Wall  units.Length
	}
	got := reading{"north", units.Millimetre.Of(240.3)}
	want := reading{"north", units.Millimetre.Of(240)}
	fmt.Println(cmp.Equal(want, got, unitstest.Absolute(units.Millimetre.Of(0.5))))
	fmt.Println(cmp.Equal(want, got, unitstest.Relative(units.Metre, 1e-4)))
	// Output:
	// true
	// false
}

func TestAssertions(t *testing.T) {
	nan := units.Metre.Of(math.NaN())
	one, tolerance := units.Metre.Of(1), units.Millimetre.Of(1)
	for _, tt := range []struct {
		name string
		run  func(unitstest.TB) bool
		want bool
	}{
		{"equal", func(t unitstest.TB) bool { return unitstest.Within(t, one, one, units.Length{}) }, true},
		{"at the end", func(t unitstest.TB) bool { return unitstest.Within(t, units.Length{}, tolerance, tolerance) }, true},
		{"beyond", func(t unitstest.TB) bool { return unitstest.Within(t, one, units.Metre.Of(1.0011), tolerance) }, false},
		{"NaN", func(t unitstest.TB) bool { return unitstest.Within(t, one, nan, tolerance) }, false},
		{"NaN tolerance", func(t unitstest.TB) bool { return unitstest.Within(t, one, units.Metre.Of(1.1), nan) }, false},
		{"relative", func(t unitstest.TB) bool { return unitstest.WithinRelative(t, one, units.Metre.Of(1.0009), 1e-3) }, true},
		{"relative beyond", func(t unitstest.TB) bool { return unitstest.WithinRelative(t, one, units.Metre.Of(0.998), 1e-3) }, false},
		{"relative to zero", func(t unitstest.TB) bool { return unitstest.WithinRelative(t, units.Length{}, one, 1e-3) }, false},
		{"infinite", func(t unitstest.TB) bool {
			return unitstest.Within(t, units.Metre.Of(math.Inf(1)), units.Metre.Of(math.Inf(1)), tolerance)
		}, true},
		{"temperature", func(t unitstest.TB) bool {
			return unitstest.TemperatureWithin(t, units.Celsius.Of(20), units.Fahrenheit.Of(68), units.KelvinDifference.Of(1e-12))
		}, true},
	} {
		p := new(printer)
		if got := tt.run(p); got != tt.want || (len(p.said) == 0) != tt.want {
			t.Errorf("%s: %t with %q, want %t", tt.name, got, p.said, tt.want)
		}
	}
}

func TestOptions(t *testing.T) {
	next := func(x float64, n int) units.Length {
		for range n {
			x = math.Nextafter(x, math.Inf(1))
		}
		return units.Metre.Of(x)
	}
	f := func(x float64, steps uint8) bool {
		n := int(steps % 20)
		if math.IsNaN(x) || math.Abs(x) > 1e300 {
			return true
		}
		a, b := units.Metre.Of(x), next(x, n)
		return cmp.Equal(a, b, unitstest.ULP(units.Metre, uint64(n))) && (n == 0 || !cmp.Equal(a, b, unitstest.ULP(units.Metre, uint64(n-1))))
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
	assert.True(t, f(0, 1))
	assert.True(t, f(-5e-324, 3), "over zero")
	nan := units.Metre.Of(math.NaN())
	assert.False(t, cmp.Equal(nan, nan, unitstest.ULP(units.Metre, 5)))
	assert.False(t, cmp.Equal(nan, nan, unitstest.Absolute(units.Metre.Of(1))))
	assert.True(t, cmp.Equal(units.Celsius.Of(20), units.Celsius.Of(20.4), unitstest.Temperatures(units.KelvinDifference.Of(0.5))))
	assert.False(t, cmp.Equal(units.Celsius.Of(20), units.Celsius.Of(20.6), unitstest.Temperatures(units.KelvinDifference.Of(0.5))))
	assert.True(t, cmp.Equal(units.Metre.Of(1), units.Metre.Of(1)), "without an option, by Equal")
}

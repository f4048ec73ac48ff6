package uncertain

import (
	"math"
	"math/rand/v2"
	"slices"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
	"gonum.org/v1/gonum/floats"
	"gonum.org/v1/gonum/integrate/quad"
	"gonum.org/v1/gonum/stat"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/units"
)

// The moments of each distribution from integrals of its quantile, against the formulas of the guides, for limits 2 to 5.
func TestMoments(t *testing.T) {
	limits := Between(Number(2), Number(5))
	z := distuv.UnitNormal.Quantile(0.975)
	for _, c := range []struct {
		name      string
		d         Distribution[Number]
		mean, u   float64
		tolerance float64 // of the quadrature
		source    string
	}{
		{"rectangular", limits.Rectangular(), 3.5, 3 / math.Sqrt(12), 1e-9, "GUM 4.3.7, equation 7"},
		{"triangular", limits.Triangular(), 3.5, 1.5 / math.Sqrt(6), 1e-4, "GUM 4.3.9, equation 9b"},
		{"triangular with its mode at an end", limits.TriangularAt(2), 3, 3 / math.Sqrt(18), 1e-4, "moments of the triangle, integrated by hand"},
		{"trapezoidal", limits.Trapezoidal(0.4), 3.5, 1.5 * math.Sqrt((1+0.16)/6), 1e-4, "GUM 4.3.9, equation 9a"},
		{"trapezoidal, top 0", limits.Trapezoidal(0), 3.5, 1.5 / math.Sqrt(6), 1e-4, "GUM 4.3.9, equation 9b"},
		{"trapezoidal, top 1", limits.Trapezoidal(1), 3.5, 1.5 / math.Sqrt(3), 1e-9, "GUM 4.3.7, equation 7"},
		{"arc sine", limits.ArcSine(), 3.5, 1.5 / math.Sqrt2, 1e-6, "JCGM 101:2008, 6.4.6.3"},
		{"normal", limits.Normal(0.95), 3.5, 1.5 / z, 1e-3, "GUM 4.3.4"},
		{"log-normal", limits.LogNormal(0.95), math.Sqrt(10) * math.Exp(0.5*square(math.Log(2.5)/2/z)), math.NaN(), 1e-3, "mean of the log-normal"},
		{"Student's t", StudentT(Number(3.5), 0.5, 5), 3.5, math.NaN(), 1e-3, "symmetry"},
	} {
		require.Nil(t, c.d.fault, c.name)
		moment := func(f func(x float64) float64) float64 {
			return quad.Fixed(func(u float64) float64 { return f(c.d.quantile(u)) }, 0, 1, 2000, quad.Legendre{}, 0)
		}
		mean := moment(func(x float64) float64 { return x })
		u := math.Sqrt(moment(func(x float64) float64 { return square(x - mean) }))
		assert.InDelta(t, c.mean, mean, c.tolerance, "%s: mean, %s", c.name, c.source)
		assert.InDelta(t, c.mean, c.d.estimate, 1e-12, "%s: estimate, %s", c.name, c.source)
		if !math.IsNaN(c.u) {
			assert.InDelta(t, c.u, u, c.tolerance, "%s: deviation by quadrature, %s", c.name, c.source)
			assert.InDelta(t, c.u, c.d.uncertainty, 1e-12, "%s: standard uncertainty, %s", c.name, c.source)
		}
		if c.name == "log-normal" {
			assert.InDelta(t, u, c.d.uncertainty, c.tolerance, c.name)
			assert.InDelta(t, 2, c.d.quantile(0.025), 1e-12, "lower limit of the log-normal")
			assert.InDelta(t, 5, c.d.quantile(0.975), 1e-12, "upper limit of the log-normal")
		}
		for _, z := range []float64{-6, -2, -0.3, 0, 1, 4} { // the two ways into a law are one
			assert.InDelta(t, c.d.quantile(distuv.UnitNormal.CDF(z)), c.d.at(z), 1e-6*math.Cosh(z), "%s at z = %g", c.name, z)
		}
	}
}

// The limits that are stated are those that the values keep to.
func TestLimits(t *testing.T) {
	for _, c := range []struct {
		name      string
		limits    Limits[Number]
		low, high float64
	}{
		{"plus minus", PlusMinus(Number(60), 0.5), 59.5, 60.5},
		{"between", Between(Number(3), Number(5)), 3, 5},
		{"per cent", PerCent(Number(20), 10), 18, 22},
		{"per cent of a negative number", PerCent(Number(-20), 10), -22, -18},
		{"within a factor", WithinFactor(Number(12), 1.25), 9.6, 15},
	} {
		d := c.limits.Rectangular()
		assert.InDelta(t, c.low, d.quantile(0), 1e-12, c.name)
		assert.InDelta(t, c.high, d.quantile(1), 1e-12, c.name)
	}
}

// The pooled mean and standard deviation are those of all answers, also where blocks differ in size and mean.
func TestPool(t *testing.T) {
	lists := [][]float64{{1, 2, 4}, {10, 11}, {-3, 0, 5, 6, 7}}
	var s summary
	var blocks []*block
	for _, y := range lists {
		mean, deviation := stat.MeanStdDev(y, nil)
		blocks = append(blocks, &block{answers: y, moments: moments{mean, deviation}})
		s.answered += len(y)
	}
	s.pool(blocks)
	mean, deviation := stat.MeanStdDev(slices.Concat(lists...), nil)
	assert.InDelta(t, mean, s.mean, 1e-12)
	assert.InDelta(t, deviation, s.deviation, 1e-12)
}

func square(x float64) float64 { return x * x }

// The interpolated quantile of Student's t against gonum's, and against tables.
func TestStudentQuantile(t *testing.T) {
	for _, nu := range []float64{2.1, 3, 5, 18, 24, 1000} {
		s, exact := newStudent(nu), distuv.StudentsT{Sigma: 1, Nu: nu}
		for z := -6.0; z < 0; z += 0.0937 { // from a probability of 1e-9; gonum has fewer digits beyond
			want := exact.Quantile(distuv.UnitNormal.CDF(z))
			assert.InEpsilon(t, want, s.at(z), 1e-7, "nu %g, z %g", nu, z)
			assert.InEpsilon(t, -want, s.at(-z), 1e-7, "nu %g, z %g", nu, -z)
		}
	}
	for _, c := range []struct{ nu, p, want float64 }{ // W. S. Gosset's t as printed in GUM, Table G.2, from memory
		{4, 0.975, 2.78},
		{5, 0.995, 4.03},
		{16, 0.995, 2.92},
		{18, 0.975, 2.10},
	} {
		assert.InDelta(t, c.want, newStudent(c.nu).at(distuv.UnitNormal.Quantile(c.p)), 0.005, "nu %g, p %g", c.nu, c.p)
	}
}

// Every kind of quantity comes back from its SI number exactly.
func TestBuilder(t *testing.T) {
	x := 1.1e-3
	for name, got := range map[string]float64{
		"length":       builder[units.Length, units.Length]()(x).SI(),
		"duration":     builder[units.Duration, units.Duration]()(x).SI(),
		"temperature":  builder[units.Temperature, units.TemperatureDifference]()(x).SI(),
		"difference":   builder[units.TemperatureDifference, units.TemperatureDifference]()(x).SI(),
		"coefficient":  builder[units.HeatTransferCoefficient, units.HeatTransferCoefficient]()(x).SI(),
		"conductivity": builder[units.Conductivity, units.Conductivity]()(x).SI(),
		"effusivity":   builder[units.Effusivity, units.Effusivity]()(x).SI(),
		"mass flow":    builder[units.MassFlow, units.MassFlow]()(x).SI(),
		"transfer":     builder[units.MassTransferCoefficient, units.MassTransferCoefficient]()(x).SI(),
		"angle":        builder[units.Angle, units.Angle]()(x).SI(),
		"frequency":    builder[units.Frequency, units.Frequency]()(x).SI(),
		"resistance":   builder[units.ElectricalResistance, units.ElectricalResistance]()(x).SI(),
		"number":       builder[Number, Number]()(x).SI(),
	} {
		assert.Equal(t, x, got, name)
	}
}

// A length of somebody else has the methods of a quantity, and is refused.
type foreign float64

func (f foreign) SI() float64           { return float64(f) }
func (f foreign) Add(g foreign) foreign { return f + g }
func (f foreign) Sub(g foreign) foreign { return f - g }
func (f foreign) Scale(x float64) foreign {
	return f * foreign(x)
}
func (f foreign) Dynamic() units.Value { return units.Number(float64(f)) }

func TestForeignKind(t *testing.T) {
	var s Study
	Add(&s, "x", Normal(foreign(1), 1), Source("test"))
	_, err := Propagate(t.Context(), &s, func(Draw) (Number, error) { return 1, nil })
	require.ErrorContains(t, err, "kind")
	var fine Study
	Add(&fine, "x", Normal(Number(1), 1), Source("test"))
	var argument *units.ArgumentError
	_, err = Propagate(t.Context(), &fine, func(Draw) (foreign, error) { return 1, nil })
	require.ErrorAs(t, err, &argument)
	_, err = Linearise(&fine, func(Draw) (foreign, error) { return 1, nil })
	require.ErrorAs(t, err, &argument)
}

// Readings: GUM 4.2.3 with the twenty readings of its example 4.4.3, mean 100.14 °C, s 1.49 °C, u 0.33 °C (from memory).
func TestReadings(t *testing.T) {
	var all []units.Temperature
	for _, x := range []float64{
		96.90, 98.18, 98.25, 98.61, 99.03, 99.49, 99.56, 99.74, 99.89, 100.07,
		100.33, 100.42, 100.68, 100.95, 101.11, 101.20, 101.57, 101.84, 102.36, 102.72,
	} {
		all = append(all, units.Celsius.Of(x))
	}
	d := Readings(all...)
	assert.InDelta(t, 100.14, d.estimate-273.15, 0.005)
	assert.InDelta(t, 0.333, d.uncertainty, 0.0005)
	assert.Equal(t, 19.0, d.freedom)
	p := Sampled(all...)
	assert.InDelta(t, 1.489, p.uncertainty*math.Sqrt(20.0/19), 0.001)
	assert.Equal(t, all[0], p.of(p.quantile(0.001)))
	assert.Equal(t, all[19], p.of(p.quantile(0.999)))
	assert.Equal(t, all[10], p.of(p.quantile(0.5)))
}

// The correlation coefficients of a large draw are those that were stated.
func TestCorrelationReached(t *testing.T) {
	skew, flat := WithinFactor(Number(1), 3).LogNormal(0.95), Between(Number(0), Number(1)).Rectangular()
	bell, student := Normal(Number(0), 1), StudentT(Number(0), 1, 9)
	swing := Between(Number(-1), Number(1)).ArcSine()
	for _, c := range []struct {
		name  string
		a, b  Distribution[Number]
		r     float64
		ranks bool
	}{
		{"normal, normal", bell, bell, 0.7, false},
		{"normal, normal, opposite", bell, bell, -1, false},
		{"log-normal, rectangular", skew, flat, 0.6, false},
		{"log-normal, log-normal", skew, skew, -0.4, false},
		{"Student's t, rectangular", student, flat, -0.5, false},
		{"arc sine, rectangular", swing, flat, 0.8, false},
		{"ranks, normal, normal", bell, bell, 0.7, true},
		{"ranks, log-normal, rectangular", skew, flat, 0.6, true},
		{"ranks, log-normal, log-normal", skew, skew, -0.8, true},
		{"ranks, normal, arc sine", bell, swing, 1, true},
	} {
		var s Study
		a, b := Add(&s, "a", c.a, Source("test")), Add(&s, "b", c.b, Source("test"))
		if c.ranks {
			s.CorrelateRanks(a, b, c.r)
		} else {
			s.Correlate(a, b, c.r)
		}
		set, err := s.check()
		require.NoError(t, err, c.name)
		draw := newSampler(set, nil, nil, nil)
		var x, y []float64
		for i := range 60 {
			draw.draw(i)
			for j := range set.block {
				row := draw.hypercube.RawRowView(j)
				x, y = append(x, row[0]), append(y, row[1])
			}
		}
		want := c.r
		got := stat.Correlation(x, y, nil)
		assert.InDelta(t, set.product.At(0, 1), got, 0.012, "%s: product-moment coefficient of %d values", c.name, len(x)) // four times 1/sqrt(n) at most
		if c.ranks {
			got = stat.Correlation(ranks(x), ranks(y), nil)
		}
		assert.InDelta(t, want, got, 0.012, c.name)
	}
}

func ranks(x []float64) []float64 {
	sorted, index, r := slices.Clone(x), make([]int, len(x)), make([]float64, len(x))
	floats.Argsort(sorted, index)
	for rank, i := range index {
		r[i] = float64(rank)
	}
	return r
}

// The ends of pooled lists are those of one sorted list, with ties and empty lists.
func TestPooledEnds(t *testing.T) {
	random := rand.New(rand.NewPCG(1, 2))
	for range 500 {
		var lists [][]float64
		var all []float64
		for range 1 + random.IntN(40) {
			y := make([]float64, random.IntN(30))
			for i := range y {
				y[i] = float64(random.IntN(40))
			}
			slices.Sort(y)
			lists, all = append(lists, y), append(all, y...)
		}
		if len(all) == 0 {
			continue
		}
		slices.Sort(all)
		coverage := random.Float64()
		require.Equal(t, endsOf(all, coverage), pooledEnds(lists, coverage), "%v at %g", lists, coverage)
	}
}

// A hypercube has one value in each stratum of each column (M. D. McKay et al., Technometrics 21, 1979): the ascending
// values of a column, in strata, lie within one stratum of 0, 1, 2 … and the shift. Each value is uniform in each row, and no
// column knows of another.
func TestHypercube(t *testing.T) {
	const rows, n, repeats = 32, 3, 3000
	cells := make([]float64, rows*n)
	source := rand.NewPCG(3, 4)
	var mean, square, product [rows]float64
	column := make([]float64, rows)
	for range repeats {
		hypercube(cells, n, source)
		for c := range n {
			for j := range rows {
				column[j] = cells[j*n+c]
				require.True(t, column[j] >= 0 && column[j] < 1)
			}
			slices.Sort(column)
			for i := range column {
				column[i] = column[i]*rows - float64(i)
			}
			require.Less(t, slices.Max(column)-slices.Min(column), 1.0)
		}
		for j := range rows {
			a, b := cells[j*n]-0.5, cells[j*n+1]-0.5
			mean[j] += a / repeats
			square[j] += a * a / repeats
			product[j] += a * b / repeats
		}
	}
	for j := range rows { // five standard deviations of the means of 3000
		assert.InDelta(t, 0, mean[j], 5*math.Sqrt(1.0/12/repeats), "mean in row %d", j)
		assert.InDelta(t, 1.0/12, square[j], 5*math.Sqrt(1.0/180/repeats), "variance in row %d", j)
		assert.InDelta(t, 0, product[j], 5/12.0/math.Sqrt(repeats), "covariance in row %d", j)
	}
}

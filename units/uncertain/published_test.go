package uncertain_test

import (
	"math"
	"strconv"
	"testing"

	"github.com/stretchr/testify/require"
	"gonum.org/v1/gonum/stat"

	"example.com/coolward/units/uncertain"
)

// The worked examples of JCGM 101:2008, clause 9, and of JCGM 100:2008 (the GUM), annex H. Their inputs and
// printed results stand from memory, but the model of H.1 and the estimates of H.2, which were read on pages that repeat them.
// Exact values were recomputed analytically, by quadrature or (9.5) with 2e7 trials, by means of their own.

type (
	number = uncertain.Number
	result = uncertain.Result[number, number]
)

var example = uncertain.Source("worked example")

// normal declares a number with a normal distribution.
func normal(s *uncertain.Study, name string, mean, u float64) uncertain.Input[number] {
	return uncertain.Add(s, name, uncertain.Normal(number(mean), number(u)), example)
}

func rectangular(s *uncertain.Study, name string, low, high float64) uncertain.Input[number] {
	return uncertain.Add(s, name, uncertain.Between(number(low), number(high)).Rectangular(), example)
}

// propagate runs a study without shares, with many trials.
func propagate(t *testing.T, s *uncertain.Study, model func(uncertain.Draw) float64) result {
	t.Helper()
	s.OmitShares = true
	r, err := uncertain.Propagate(t.Context(), s, func(x uncertain.Draw) (number, error) { return number(model(x)), nil })
	require.NoError(t, err)
	return r
}

func linearise(t *testing.T, s *uncertain.Study, model func(uncertain.Draw) float64) uncertain.Linear[number, number] {
	t.Helper()
	l, err := uncertain.Linearise(s, func(x uncertain.Draw) (number, error) { return number(model(x)), nil })
	require.NoError(t, err)
	return l
}

// within checks a number that has a Monte Carlo error. One of twenty may be out by more than that error; a hundred are
// compared here with fixed seeds, so twice the error is allowed.
func within(t *testing.T, what string, got, err number, want float64) {
	t.Helper()
	if !(math.Abs(float64(got)-want) <= 2*float64(err)) {
		t.Errorf("%s: got %.7g ± %.2g, want %.7g", what, float64(got), float64(err), want)
	}
}

// prints checks the digits that a document prints.
func prints(t *testing.T, what string, got, printed, place float64) {
	t.Helper()
	if !(math.Abs(got-printed) <= place/2*(1+1e-9)) {
		t.Errorf("%s: got %.7g, printed %.7g with the last place %g", what, got, printed, place)
	}
}

// JCGM 101:2008, 9.2: the sum of four.
func TestAdditive(t *testing.T) {
	root3 := math.Sqrt(3)
	for _, c := range []struct {
		name           string
		add            func(s *uncertain.Study, name string, i int) uncertain.Input[number]
		u, half        float64 // exact
		gum, place     float64 // printed half-width of the GUM framework
		agrees         bool
		printed, width float64 // printed half-width of the Monte Carlo method, and how far its runs lie apart
		source         string
	}{
		{
			"normal", func(s *uncertain.Study, name string, _ int) uncertain.Input[number] { return normal(s, name, 0, 1) },
			2, 2 * 1.959963984540054, 3.92, 0.01, true, 3.92, 0.02, "JCGM 101:2008, 9.2.2, from memory; exact: normal quantile",
		},
		{
			"rectangular", func(s *uncertain.Study, name string, _ int) uncertain.Input[number] {
				return rectangular(s, name, -root3, root3)
			},
			2, 3.879406741347821, 3.92, 0.01, true, 3.88, 0.02, "JCGM 101:2008, 9.2.3 and annex E, from memory; exact: 2 sqrt 3 [2 − (3/5)^(1/4)]",
		},
		{
			"one of them large", func(s *uncertain.Study, name string, i int) uncertain.Input[number] {
				half := root3
				if i == 3 {
					half *= 10
				}
				return rectangular(s, name, -half, half)
			},
			10.14889156509222, 17.015814098928168, 19.9, 0.1, false, 17.0, 0.1, "JCGM 101:2008, 9.2.4, from memory; exact: quadrature",
		},
	} {
		t.Run(c.name, func(t *testing.T) {
			s := uncertain.Study{Seed: 92}
			var x [4]uncertain.Input[number]
			for i := range x {
				x[i] = c.add(&s, "X"+strconv.Itoa(i+1), i)
			}
			sum := func(d uncertain.Draw) (y float64) {
				for i := range x {
					y += float64(x[i].In(d))
				}
				return y
			}
			s.Digits, s.Trials = 3, 819200
			r := propagate(t, &s, sum)
			s.Digits = 2 // of the tolerances 0.05 and 0.5 with which the clause compares
			l := linearise(t, &s, sum)
			within(t, "mean", r.Mean, r.Errors.Mean, 0)
			within(t, "standard uncertainty", r.StandardUncertainty, r.Errors.StandardUncertainty, c.u)
			within(t, "low", r.Low, r.Errors.Low, -c.half)
			within(t, "high", r.High, r.Errors.High, c.half)
			prints(t, "linear standard uncertainty", float64(l.StandardUncertainty), c.u, 1e-12)
			prints(t, "linear half-width", float64(l.High), c.gum, c.place)
			prints(t, "half-width", float64(r.High-r.Low)/2, c.printed, 2*c.width+2*float64(r.Errors.Low))
			v, err := uncertain.Validate(l, r)
			require.NoError(t, err)
			if c.name == "rectangular" { // the exact difference of 0.0406 is close to the tolerance of 0.05
				require.True(t, v.Certain)
			}
			require.Equal(t, c.agrees, v.Valid, "%s: validation by JCGM 101:2008, 8.1: %+v", c.source, v)
		})
	}
}

// JCGM 101:2008, 9.3: calibration of a mass of 100 g; in milligrams. The quoted Monte Carlo results, u 0.0754 and
// [1.0834, 1.3825], are one run of 0.72e6 trials; exact are u 0.07547974 and [1.08443, 1.38357].
func TestMassCalibration(t *testing.T) {
	s := uncertain.Study{Seed: 93, Trials: 409600, Digits: 2}
	reference := normal(&s, "mRc", 100000, 0.050)
	added := normal(&s, "dmRc", 1.234, 0.020)
	air := rectangular(&s, "rho_a", 1.10, 1.30)
	weight := rectangular(&s, "rho_W", 7000, 9000)
	standard := rectangular(&s, "rho_R", 7950, 8050)
	model := func(x uncertain.Draw) float64 {
		buoyancy := (float64(air.In(x)) - 1.2) * (1/float64(weight.In(x)) - 1/float64(standard.In(x)))
		m, d := float64(reference.In(x)), float64(added.In(x))
		return (m - 100000) + d + (m+d)*buoyancy
	}
	r, l := propagate(t, &s, model), linearise(t, &s, model)
	within(t, "mean", r.Mean, r.Errors.Mean, 1.2340)
	within(t, "standard uncertainty", r.StandardUncertainty, r.Errors.StandardUncertainty, 0.07547973995542161)
	within(t, "low", r.Low, r.Errors.Low, 1.08443)
	within(t, "high", r.High, r.Errors.High, 1.38357)
	within(t, "shortest low", r.ShortestLow, r.Errors.Shortest, 1.08443)
	within(t, "shortest high", r.ShortestHigh, r.Errors.Shortest, 1.38357)
	prints(t, "quoted u of one run", float64(r.StandardUncertainty), 0.0754, 0.0003) // its standard error is 0.00006
	prints(t, "quoted width", float64(r.ShortestHigh-r.ShortestLow), 0.2991, 0.002)
	prints(t, "GUF1 estimate", float64(l.Estimate), 1.2340, 1e-4)
	prints(t, "GUF1 u", float64(l.StandardUncertainty), 0.0539, 1e-4)
	prints(t, "GUF1 u, exact", float64(l.StandardUncertainty), 0.05385164807134504, 1e-9)
	prints(t, "GUF1 low", float64(l.Low), 1.1285, 1e-4)
	prints(t, "GUF1 high", float64(l.High), 1.3395, 2e-4) // 1.33955 exactly, printed rounded down
	v, err := uncertain.Validate(l, r)
	require.NoError(t, err)
	require.False(t, v.Valid, "JCGM 101:2008, 9.3: the first-order result is not valid")
	prints(t, "d_low", float64(v.LowDifference), 0.0440, 0.002)
	prints(t, "d_high", float64(v.HighDifference), 0.0440, 0.002)
}

// JCGM 101:2008, 9.4: comparison loss X1² + X2², in 1e-6. Exact estimate x1² + 2u², exact u, and the exact shortest
// interval by quadrature over the distribution.
func TestComparisonLoss(t *testing.T) {
	for _, c := range []struct {
		r, x1                        float64
		u, low, high                 float64 // exact
		estimate, printedU           float64 // printed
		linear, linearU              float64
		printedLow, printedHigh, run float64 // quoted of one run, and the noise of that run
	}{
		{0, 0, 50, 0, 149.787, 50, 50, 0, 0, 0, 150, 1},
		{0, 0.010, 111.803, 0, 366.005, 150, 112, 100, 100, 0, 367, 2},
		{0, 0.050, 502.494, 1593.570, 3548.570, 2550, 502, 2500, 500, 1590, 3543, 12},
		{0.9, 0, 67.268, 0, 185.056, 50, 67, 0, 0, 0, 185, 1},
		{0.9, 0.010, 120.520, 12.652, 397.479, 150, 121, 100, 100, 13, 398, 2},
		{0.9, 0.050, 504.505, 1624.419, 3554.682, 2550, 505, 2500, 500, 1628, 3555, 12},
	} {
		t.Run(strconv.FormatFloat(c.r, 'g', -1, 64)+" "+strconv.FormatFloat(c.x1, 'g', -1, 64), func(t *testing.T) {
			s := uncertain.Study{Seed: 94, Digits: 2, Trials: 204800}
			x1, x2 := normal(&s, "X1", c.x1, 0.005), normal(&s, "X2", 0, 0.005)
			s.Correlate(x1, x2, c.r)
			loss := func(d uncertain.Draw) float64 {
				a, b := float64(x1.In(d)), float64(x2.In(d))
				return 1e6 * (a*a + b*b)
			}
			r, l := propagate(t, &s, loss), linearise(t, &s, loss)
			within(t, "mean", r.Mean, r.Errors.Mean, 1e6*(c.x1*c.x1+2*0.005*0.005))
			within(t, "standard uncertainty", r.StandardUncertainty, r.Errors.StandardUncertainty+0.0005, c.u)
			within(t, "shortest low", r.ShortestLow, r.Errors.Shortest+0.01, c.low)
			within(t, "shortest high", r.ShortestHigh, r.Errors.Shortest+0.01, c.high)
			prints(t, "mean", float64(r.Mean), c.estimate, 1+4*float64(r.Errors.Mean))
			prints(t, "standard uncertainty", float64(r.StandardUncertainty), c.printedU, 1+4*float64(r.Errors.StandardUncertainty))
			prints(t, "low of one run", float64(r.ShortestLow), c.printedLow, 1+2*c.run+4*float64(r.Errors.Shortest))
			prints(t, "high of one run", float64(r.ShortestHigh), c.printedHigh, 1+2*c.run+4*float64(r.Errors.Shortest))
			// The first-order framework sees nothing at x1 = 0 and never sees the correlation, as x2 = 0.
			prints(t, "linear estimate", float64(l.Estimate), c.linear, 1e-9)
			prints(t, "linear u", float64(l.StandardUncertainty), c.linearU, 1e-9)
			v, err := uncertain.Validate(l, r)
			require.NoError(t, err)
			require.False(t, v.Valid)
		})
	}
}

// gaugeBlock is the model of GUM H.1 and JCGM 101:2008, 9.5, for the deviation from 50 mm, in nanometres.
func gaugeBlock(ls, d, da, t, as, dt float64) float64 {
	return (ls - 50e6) + d - ls*(da*t+as*dt)
}

// JCGM 101:2008, 9.5: calibration of a gauge block. The clause has an interval with 99 %.
func TestGaugeBlock(t *testing.T) {
	build := func(coverage float64) (*uncertain.Study, func(uncertain.Draw) float64) {
		s := &uncertain.Study{Seed: 95, Coverage: coverage, Digits: 2, Trials: 200000}
		student := func(name string, mean, u, freedom float64) uncertain.Input[number] {
			return uncertain.Add(s, name, uncertain.StudentT(number(mean), number(u), freedom), example)
		}
		ls := student("Ls", 50000623, 25, 18)
		d0, d1, d2 := student("D0", 215, 6, 24), student("D1", 0, 4, 5), student("D2", 0, 7, 8)
		as := rectangular(s, "alpha_S", 9.5e-6, 13.5e-6)
		t0 := normal(s, "T0", -0.1, 0.2)
		swing := uncertain.Add(s, "Delta", uncertain.Between(number(-0.5), number(0.5)).ArcSine(), example)
		// Limits that are not known exactly (JCGM 101:2008, 6.4.3): the lower one is uniform within ±d.
		da, daEnd := rectangular(s, "delta alpha", 0, 1), rectangular(s, "end of delta alpha", -0.1e-6, 0.1e-6)
		dt, dtEnd := rectangular(s, "delta theta", 0, 1), rectangular(s, "end of delta theta", -0.025, 0.025)
		between := func(x uncertain.Draw, half float64, where, end uncertain.Input[number]) float64 {
			low := -half + float64(end.In(x))
			return low + (-2*low)*float64(where.In(x))
		}
		return s, func(x uncertain.Draw) float64 {
			d := float64(d0.In(x) + d1.In(x) + d2.In(x))
			return gaugeBlock(float64(ls.In(x)), d, between(x, 1e-6, da, daEnd), float64(t0.In(x)+swing.In(x)), float64(as.In(x)), between(x, 0.05, dt, dtEnd))
		}
	}
	s, model := build(0.99)
	r := propagate(t, s, model)
	within(t, "mean", r.Mean, r.Errors.Mean, 838)
	within(t, "standard uncertainty", r.StandardUncertainty, r.Errors.StandardUncertainty, 35.808)
	within(t, "low", r.Low, r.Errors.Low, 838-93.66)
	within(t, "high", r.High, r.Errors.High, 838+93.66)
	prints(t, "quoted u", float64(r.StandardUncertainty), 36, 1)
	prints(t, "quoted low", float64(r.Low), 745, 1+2*0.7+2*float64(r.Errors.Low)) // 744.34 exactly: the quoted end is of one run
	prints(t, "quoted high", float64(r.High), 932, 1+2*float64(r.Errors.High))

	s, model = build(0.95)
	r = propagate(t, s, model)
	within(t, "low at 95 %", r.Low, r.Errors.Low+0.01, 838-70.33)
	within(t, "high at 95 %", r.High, r.Errors.High+0.01, 838+70.33)
}

// GUM H.1: the same calibration, with the law of propagation of uncertainty.
func TestGaugeBlockLinear(t *testing.T) {
	s := uncertain.Study{Coverage: 0.99}
	student := func(name string, mean, u, freedom float64) uncertain.Input[number] {
		return uncertain.Add(&s, name, uncertain.StudentT(number(mean), number(u), freedom), example)
	}
	ls := student("ls", 50000623, 25, 18)
	d0, d1, d2 := student("d", 215, 5.8, 24), student("d1", 0, 3.9, 5), student("d2", 0, 6.7, 8)
	da := student("delta alpha", 0, 1e-6/math.Sqrt(3), 50)
	temperature := rectangular(&s, "theta", -0.1, -0.1)
	as := rectangular(&s, "alpha_s", 9.5e-6, 13.5e-6)
	// The GUM gives delta theta two degrees of freedom, of which t has no standard deviation; the same
	// effective number comes with 2 + 1e-9.
	dt := student("delta theta", 0, 0.05/math.Sqrt(3), 2+1e-9)
	l := linearise(t, &s, func(x uncertain.Draw) float64 {
		return gaugeBlock(float64(ls.In(x)), float64(d0.In(x)+d1.In(x)+d2.In(x)), float64(da.In(x)), float64(temperature.In(x)), float64(as.In(x)), float64(dt.In(x)))
	})
	prints(t, "estimate", float64(l.Estimate), 838, 1e-6)
	prints(t, "u_c, printed", float64(l.StandardUncertainty), 32, 1)
	prints(t, "u_c, recomputed", float64(l.StandardUncertainty), 31.6638, 1e-3)
	prints(t, "effective degrees of freedom, printed", float64(l.Freedom), 16.7, 0.12) // 16.75 from unrounded components
	prints(t, "effective degrees of freedom, recomputed", float64(l.Freedom), 16.752, 0.02)
	prints(t, "t99(16)", l.CoverageFactor, 2.92078, 1e-5)
	prints(t, "U99, recomputed", float64(l.High-l.Estimate), 92.48, 0.01)
	prints(t, "low", float64(l.Low), 745, 2) // JCGM 101:2008, Table 11: [745, 931]
	prints(t, "high", float64(l.High), 931, 2)
	for _, c := range []struct {
		input  string
		change float64
	}{{"ls", 25}, {"delta alpha", 2.887}, {"delta theta", 16.599}, {"theta", 0}, {"alpha_s", 0}} {
		for _, got := range l.Contributions {
			if got.Input == c.input {
				prints(t, "contribution of "+c.input, math.Abs(float64(got.Change)), c.change, 1e-3)
			}
		}
	}
}

// GUM H.2: resistance and reactance of a circuit from five sets of readings of voltage, current and phase. Table H.3;
// the rounded means and coefficients of Table H.2 would give u(R) 0.0700.
func TestResistanceAndReactance(t *testing.T) {
	v := []float64{5.007, 4.994, 5.005, 4.990, 4.999}
	i := []float64{19.663e-3, 19.639e-3, 19.640e-3, 19.685e-3, 19.678e-3}
	phi := []float64{1.0456, 1.0438, 1.0468, 1.0428, 1.0433}
	numbers := func(x []float64) []number {
		n := make([]number, len(x))
		for i := range x {
			n[i] = number(x[i])
		}
		return n
	}
	for _, c := range []struct {
		name              string
		of                func(v, i, phi float64) float64
		estimate, place   float64 // printed
		exact, u, printed float64
		alone             float64 // without the correlations
	}{
		{"R", func(v, i, phi float64) float64 { return v / i * math.Cos(phi) }, 127.732, 0.001, 127.73217, 0.071071, 0.071, 0.19454},
		{"X", func(v, i, phi float64) float64 { return v / i * math.Sin(phi) }, 219.847, 0.001, 219.84651, 0.29558, 0.295, 0.20091},
		{"Z", func(v, i, _ float64) float64 { return v / i }, 254.260, 0.001, 254.25970, 0.23634, 0.236, 0.20408},
	} {
		for _, correlated := range []bool{true, false} {
			var s uncertain.Study
			voltage := uncertain.Add(&s, "V", uncertain.Readings(numbers(v)...), example)
			current := uncertain.Add(&s, "I", uncertain.Readings(numbers(i)...), example)
			phase := uncertain.Add(&s, "phi", uncertain.Readings(numbers(phi)...), example)
			want := c.alone
			if correlated {
				s.Correlate(voltage, current, stat.Correlation(v, i, nil))
				s.Correlate(voltage, phase, stat.Correlation(v, phi, nil))
				s.Correlate(current, phase, stat.Correlation(i, phi, nil))
				want = c.u
			}
			l := linearise(t, &s, func(x uncertain.Draw) float64 {
				return c.of(float64(voltage.In(x)), float64(current.In(x)), float64(phase.In(x)))
			})
			prints(t, c.name+", printed", float64(l.Estimate), c.estimate, c.place)
			prints(t, c.name+", recomputed", float64(l.Estimate), c.exact, 1e-5)
			prints(t, "u("+c.name+"), recomputed", float64(l.StandardUncertainty), want, 2e-5)
			if correlated {
				// 0.295 is printed for u(X), from the second approach of the example; the first one, of full digits, gives 0.2956.
				prints(t, "u("+c.name+"), printed", float64(l.StandardUncertainty), c.printed, 0.0012)
			}
		}
	}
}

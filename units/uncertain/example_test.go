package uncertain_test

import (
	"context"
	"errors"
	"fmt"
	"math"
	"slices"

	"example.com/coolward/units"
	"example.com/coolward/units/uncertain"
)

// Crates of plums come into a cold room at 24 °C and may be loaded at 6 °C. Five earlier logs gave the time constant of a
// pallet; the air of the room swings with its thermostat.
func Example() {
	hours := units.Hour.Of
	s := uncertain.Study{Digits: 2, Trials: 500000}
	tau := uncertain.Add(&s, "time constant", uncertain.Readings(hours(5.1), hours(5.6), hours(4.9), hours(5.3), hours(5.8)),
		uncertain.Source("five logs of last season"))
	room := uncertain.Add(&s, "room", uncertain.Between(units.Celsius.Of(1), units.Celsius.Of(3)).ArcSine(),
		uncertain.Source("logger of the room"))
	fruit := uncertain.Add(&s, "fruit", uncertain.PlusMinus(units.Celsius.Of(24), units.KelvinDifference.Of(2)).Triangular(),
		uncertain.Assumed("a warm afternoon"))
	pallet := uncertain.Add(&s, "pallet", uncertain.WithinFactor(uncertain.Number(1), 1.2).LogNormal(0.95),
		uncertain.Model("how pallets differ from the mean"))

	r, err := uncertain.Propagate(context.Background(), &s, func(x uncertain.Draw) (units.Duration, error) {
		air := room.In(x)
		ratio := fruit.In(x).Sub(air).Ratio(units.Celsius.Of(6).Sub(air))
		return tau.In(x).Scale(math.Log(ratio) * float64(pallet.In(x))), nil
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(r)
	largest := slices.MaxFunc(r.Shares, func(a, b uncertain.Share) int {
		if a.Total < b.Total {
			return -1
		}
		return 1
	})
	fmt.Printf("Most of the spread comes from: %s.\n", largest.Inputs[0])
	best := slices.MinFunc(r.Halvings, func(a, b uncertain.Halving[units.Duration]) int {
		return a.StandardUncertainty.Compare(b.StandardUncertainty)
	})
	fmt.Printf("Known twice as well, it would leave a standard uncertainty of %.1f h instead of %.1f h.\n",
		best.StandardUncertainty.In(units.Hour), r.StandardUncertainty.In(units.Hour))
	// Output:
	// about 9.1 h, 7.0 to 11.9 h at 95 %
	// Most of the spread comes from: pallet.
	// Known twice as well, it would leave a standard uncertainty of 1.0 h instead of 1.3 h.
}

// A casting leaves the mould; two evaluations for each input tell how well its solidification time is known by V. Chvorinov's
// rule, time = B (V/A)², and whether that is enough.
func ExampleLinearise() {
	var s uncertain.Study
	constant := uncertain.Add(&s, "mould constant", uncertain.PerCent(uncertain.Number(1.5), 10).Rectangular(),
		uncertain.Source("two earlier castings"))
	modulus := uncertain.Add(&s, "modulus", uncertain.Normal(units.Millimetre.Of(12), units.Millimetre.Of(0.15)),
		uncertain.Source("drawing, tolerance of the pattern"))
	model := func(x uncertain.Draw) (units.Duration, error) {
		m := modulus.In(x).In(units.Millimetre)
		return units.Second.Of(float64(constant.In(x)) * m * m), nil
	}
	l, err := uncertain.Linearise(&s, model)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(l)
	for _, c := range l.Contributions {
		fmt.Printf("%s: %.2v\n", c.Input, c.Change)
	}
	r, err := uncertain.Propagate(context.Background(), &s, model)
	if err != nil {
		fmt.Println(err)
		return
	}
	v, err := uncertain.Validate(l, r)
	fmt.Println("linear enough:", v.Valid, err)
	// Output:
	// 3.6 ± 0.4 min at 95 %
	// mould constant: 12 s
	// modulus: 5.4 s
	// linear enough: true <nil>
}

// Two probes that were adjusted in the same bath err together, so their difference is known better than either.
func ExampleStudy_Correlate() {
	var s uncertain.Study
	probe := func(name string, reading units.Temperature) uncertain.Input[units.Temperature] {
		return uncertain.Add(&s, name, uncertain.Normal(reading, units.KelvinDifference.Of(0.2)), uncertain.Source("certificate of the bath"))
	}
	inlet, outlet := probe("inlet", units.Celsius.Of(2.4)), probe("outlet", units.Celsius.Of(5.9))
	rise := func(x uncertain.Draw) (units.TemperatureDifference, error) { return outlet.In(x).Sub(inlet.In(x)), nil }

	alone, err := uncertain.Linearise(&s, rise)
	fmt.Println(alone, err)
	s.Correlate(inlet, outlet, 0.9)
	together, err := uncertain.Linearise(&s, rise)
	fmt.Println(together, err)
	// Output:
	// 3.5 ± 0.6 K at 95 % <nil>
	// 3.50 ± 0.18 K at 95 % <nil>
}

// Where too few cases have an answer, the error says why.
func ExampleNoAnswerError() {
	var s uncertain.Study
	room := uncertain.Add(&s, "room", uncertain.PlusMinus(units.Celsius.Of(9), units.KelvinDifference.Of(1)).Rectangular(), uncertain.Source("logger"))
	target := units.Celsius.Of(7)
	_, err := uncertain.Propagate(context.Background(), &s, func(x uncertain.Draw) (units.Duration, error) {
		if room.In(x).Compare(target) >= 0 {
			return units.Duration{}, &units.NeverError{Place: "core", Target: target, Limit: room.In(x)}
		}
		return units.Hour.Of(1), nil
	})
	var none *uncertain.NoAnswerError
	if errors.As(err, &none) {
		fmt.Printf("%d of %d cases %v\n", none.Missing[0].Cases, none.Cases, none.Missing[0].Kind)
	}
	// Output:
	// 10240 of 10240 cases never reach it
}

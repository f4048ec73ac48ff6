package correlations_test

import (
	"errors"
	"fmt"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

// A hailstone falls through air at a Reynolds number of 20 000.
func Example() {
	r, err := correlations.WhitakerSphere().Nu(correlations.Groups{Re: 20e3, Pr: 0.71, ViscosityRatio: 1})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("Nu = %.0f, measured ones between %.0f and %.0f\n", r.Nu, r.Nu*(1-r.Scatter), r.Nu*(1+r.Scatter))
	// Output:
	// Nu = 90, measured ones between 63 and 117
}

// A spray chamber runs at Reynolds numbers that the data of one formula do not reach.
func ExampleCorrelation_Extrapolate() {
	drops := correlations.RanzMarshallSphere()
	g := correlations.Groups{Re: 350, Pr: 0.7}

	_, err := drops.Nu(g)
	var out *units.RangeError
	fmt.Println(errors.As(err, &out), out.Quantity, out.Value, "of at most", out.Max)

	r, err := drops.Extrapolate(g)
	fmt.Printf("Nu = %.1f, extrapolated: %v, error: %v\n", r.Nu, r.Extrapolated, err)
	// Output:
	// true Reynolds number 350 of at most 200
	// Nu = 12.0, extrapolated: true, error: <nil>
}

// How many formulas there are for each regime, and how many of them were read on a page.
func ExampleAll() {
	var all, read [correlations.Condensing + 1]int
	for c := range correlations.All() {
		all[c.Regime()]++
		if c.Status() == correlations.ReadOnPage {
			read[c.Regime()]++
		}
	}
	for r := correlations.Conduction; r <= correlations.Condensing; r++ {
		fmt.Printf("%-10s %3d, read on a page %2d\n", r, all[r], read[r])
	}
	// Output:
	// conduction   1, read on a page  1
	// natural     47, read on a page 14
	// forced      85, read on a page 33
	// mixed        1, read on a page  1
	// boiling      4, read on a page  1
	// condensing   5, read on a page  0
}

// A hot pipe across a room: what there is for it.
func ExampleFor() {
	for c := range correlations.For("horizontal cylinder", correlations.Natural) {
		fmt.Println(c.Name())
		for r := range c.Ranges() {
			fmt.Println("  ", r)
		}
	}
	// Output:
	// Churchill and Chu horizontal cylinder, natural
	//    Rayleigh number 1e-5 to 1e12
	//    Prandtl number above 0
	// Churchill and Chu horizontal cylinder, natural, laminar
	//    Rayleigh number 1e-6 to 1e9
	//    Prandtl number above 0
	// Morgan horizontal cylinder, natural
	//    Rayleigh number 1e-10 to 1e12
}

// How far methods differ for a rod across a wind of air.
func ExampleCompare() {
	wind := correlations.Groups{Re: 1e4, Pr: 0.7, ViscosityRatio: 1, PrandtlRatio: 1}
	for c, r := range correlations.Compare(correlations.For("cylinder in cross-flow", correlations.Forced), wind) {
		if c.Kind() == correlations.Mean {
			fmt.Printf("%.1f ± %.0f %%  %s\n", r.Nu, 100*r.Scatter, c.Name())
		}
	}
	// Output:
	// 53.3 ± 20 %  Churchill and Bernstein cylinder, forced
	// 50.8 ± 25 %  Hilpert cylinder, forced
	// 50.4 ± 20 %  Morgan cylinder, forced
	// 57.2 ± 15 %  Zukauskas cylinder, forced
	// 58.8 ± 25 %  Whitaker cylinder, forced
	// 59.7 ± 20 %  Sparrow, Abraham and Tong cylinder, forced
	// 52.7 ± 20 %  Khan, Culham and Yovanovich cylinder, forced
	// 51.0 ± 20 %  Kramers cylinder, forced
}

// A catalogue entry for a report.
func ExampleCorrelation_String() {
	c, err := correlations.Lookup("Ranz and Marshall sphere, forced")
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(c)
	// Output:
	// Ranz and Marshall sphere, forced
	//   Nu = 2 + 0.6 Re^(1/2) Pr^(1/3)
	//   length: diameter; properties at: film temperature
	//   Reynolds number 2 to 200
	//   Prandtl number 0.6 to 2.7
	//   scatter: ±20 % (not printed in the source; usual for forced convection on a single body, common practice, no source)
	//   source: W. E. Ranz and W. R. Marshall, Evaporation from drops, Chem. Eng. Prog. 48 (1952) 141-146 and 173-180
	//   status: read on a page: I. Tosun, Modelling in Transport Phenomena, p. 82, eq. 4.3-29; the range is that of the mass-transfer form, p. 84, eq. 4.3-33
	//   note: often stretched to Re 5e4 and Pr 380, which its data do not support; low above Re 1e4
}

// A lamp globe in a draught that is somewhat stronger than its own buoyancy.
func ExampleMix() {
	draught := correlations.Result{Nu: 12, Scatter: 0.3}
	buoyancy := correlations.Result{Nu: 8, Scatter: 0.15}
	m, err := correlations.Mix(draught, buoyancy)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("Nu = %.1f ± %.0f %%\n", m.Nu, 100*m.Scatter)
	// Output:
	// Nu = 12.7 ± 27 %
}

// A stream of cold air blows down on a warm upright wall.
func ExampleBlend() {
	wind := correlations.Result{Nu: 90, Scatter: 0.2}
	buoyancy := correlations.Result{Nu: 40, Scatter: 0.15}
	for _, opposed := range []bool{false, true} {
		m, err := correlations.Blend{Exponent: 3, Opposed: opposed}.Mix(wind, buoyancy)
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("opposed: %v, Nu = %.1f\n", opposed, m.Nu)
	}
	// Output:
	// opposed: false, Nu = 92.6
	// opposed: true, Nu = 87.3
}

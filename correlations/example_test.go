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

// A table of what there is for forced convection.
func ExampleAll() {
	for c := range correlations.All() {
		if c.Regime() != correlations.Forced {
			continue
		}
		fmt.Println(c.Name())
		for r := range c.Ranges() {
			fmt.Println("  ", r)
		}
	}
	// Output:
	// Ranz and Marshall sphere, forced
	//    Reynolds number 2 to 200
	//    Prandtl number 0.6 to 2.7
	// Whitaker sphere, forced
	//    Reynolds number 3.5 to 7.6e4
	//    Prandtl number 0.7 to 380
	//    viscosity ratio 1.0 to 3.2
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

package main

import (
	"fmt"
	"io"
	"text/tabwriter"

	"example.com/coolward/series"
)

// printTable prints values of all charts.
func printTable(out io.Writer, bodies []form) error {
	fmt.Fprintln(out, "Values by the exact series; r/R = 0 is the middle, 1 the surface; Q/Q0 is the part of the heat that has left.")
	for _, f := range bodies {
		fmt.Fprintf(out, "\n%s, R is %s\n\n", f.title, f.length)
		w := tabwriter.NewWriter(out, 0, 0, 2, ' ', tabwriter.AlignRight)
		fmt.Fprintln(w, "Bi\troot 1\tC 1\tFo\tθ middle\tθ r/R = 0.5\tθ surface\tQ/Q0\tone term, θ middle\t")
		for _, bi := range []float64{0.1, 1, 10} {
			modes, err := series.NewModes(f.family, bi)
			if err != nil {
				return err
			}
			first := modes.Term(1)
			for _, fo := range []float64{0.02, 0.2, 1, 5} {
				one, _ := modes.OneTerm(0, fo)
				fmt.Fprintf(w, "%v\t%.5f\t%.5f\t%v\t%.5f\t%.5f\t%.5f\t%.5f\t%.5f\t\n", bi, first.Root, first.Coefficient,
					fo, modes.Theta(0, fo), modes.Theta(0.5, fo), modes.Theta(1, fo), modes.Loss(fo), one)
			}
		}
		if err := w.Flush(); err != nil {
			return err
		}
	}
	return nil
}

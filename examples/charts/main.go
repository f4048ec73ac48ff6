// Command charts draws the charts that stand in every book on heat transfer, exactly and for any Biot number: the
// temperature in the middle of a plate, a long cylinder and a sphere over time, the temperature elsewhere beside it, and
// the heat that has left.
//
// It writes nine charts as PNG and as SVG and prints a table of values to check them, or another program, by. Run it
// with -help for its options.
package main

import (
	"errors"
	"flag"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"strings"

	"example.com/coolward/units/shape"
)

func main() {
	if err := run(os.Stdout, os.Args[1:]); err != nil {
		fmt.Fprintln(os.Stderr, "charts:", err)
		os.Exit(2)
	}
}

const usage = `charts: temperature and heat in a plate, a long cylinder and a sphere, as charts

  charts                     all nine charts, into the folder charts
  charts -out wall           into another folder
  charts -body sphere        those of one body: plate, cylinder or sphere
  charts -table              the table alone

For each body there are three charts:
  BODY-centre     temperature in the middle over the Fourier number, a curve for each Biot number
                  (M. P. Heisler, Transactions of the ASME 69 (1947) 227-236, had such charts first; from memory)
  BODY-position   temperature elsewhere over that in the middle, once the profile has settled (Fo 0.2 and later)
  BODY-heat       part of the heat that has left over Bi² Fo
                  (H. Gröber, Zeitschrift des VDI 69 (1925) 705-712, likewise; from memory)

θ = (T − ambient)/(start − ambient); Bi = h R/k and Fo = α t/R² with the radius R, or half
the thickness of a plate that is exposed on both faces. Unlike printed charts these are exact at early times too.
`

// A form is one of the three bodies.
type form struct {
	name, title, length string
	family              shape.Family
}

var forms = []form{
	{"plate", "Plate", "half the thickness", shape.Planar},
	{"cylinder", "Long cylinder", "the radius", shape.Cylindrical},
	{"sphere", "Sphere", "the radius", shape.Spherical},
}

// options is what the command line says.
type options struct {
	out       string
	forms     []form
	tableOnly bool
}

// readOptions reads the command line. Its errors fit on one line.
func readOptions(args []string) (options, error) {
	var o options
	var body string
	flags := flag.NewFlagSet("charts", flag.ContinueOnError)
	flags.SetOutput(io.Discard)
	flags.StringVar(&o.out, "out", "charts", "")
	flags.StringVar(&body, "body", "all", "")
	flags.BoolVar(&o.tableOnly, "table", false, "")
	if err := flags.Parse(args); err != nil {
		return o, err
	}
	if flags.NArg() > 0 {
		return o, fmt.Errorf("unexpected argument %q; -help lists the options", flags.Arg(0))
	}
	if o.out == "" {
		return o, errors.New("out: no folder named")
	}
	var names []string
	for _, f := range forms {
		if body == f.name || body == "all" {
			o.forms = append(o.forms, f)
		}
		names = append(names, f.name)
	}
	if len(o.forms) == 0 {
		return o, fmt.Errorf("body: %q not accepted; accepted: %s or all", body, strings.Join(names, ", "))
	}
	return o, nil
}

// run is the whole program.
func run(out io.Writer, args []string) error {
	o, err := readOptions(args)
	if errors.Is(err, flag.ErrHelp) {
		_, err = io.WriteString(out, usage)
		return err
	}
	if err != nil {
		return err
	}
	if err := printTable(out, o.forms); err != nil {
		return err
	}
	if o.tableOnly {
		return nil
	}
	if err := os.MkdirAll(o.out, 0o777); err != nil {
		return err
	}
	fmt.Fprintln(out, "\nCharts, each as .png and .svg:")
	for _, f := range o.forms {
		for _, c := range []struct {
			name string
			make func(form) (*chart, error)
		}{{"centre", centreChart}, {"position", positionChart}, {"heat", heatChart}} {
			drawn, err := c.make(f)
			if err != nil {
				return err
			}
			base := filepath.Join(o.out, f.name+"-"+c.name)
			if err := drawn.save(base); err != nil {
				return err
			}
			fmt.Fprintln(out, " ", base)
		}
	}
	return nil
}
